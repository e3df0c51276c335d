import { useLocalSearchParams } from 'expo-router';

import { ResetScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  const { token } = useLocalSearchParams<{ token: string }>();
  return <ResetScreen token={token} />;
}
