import { useLocalSearchParams } from 'expo-router';

import { InvitationScreen } from '@/components/auth/InvitationScreen';

export default function Route() {
  const { token } = useLocalSearchParams<{ token: string }>();
  return <InvitationScreen token={token} />;
}
