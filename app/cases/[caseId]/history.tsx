import { useLocalSearchParams } from 'expo-router';

import { HistoryScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  const { caseId } = useLocalSearchParams<{ caseId: string }>();
  return <HistoryScreen caseId={caseId} />;
}
