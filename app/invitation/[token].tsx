import { useLocalSearchParams } from 'expo-router';

import { InvitationScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  const { token } = useLocalSearchParams<{ token: string }>();
  return <InvitationScreen token={token} />;
}
