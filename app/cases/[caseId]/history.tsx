import { useLocalSearchParams } from 'expo-router';

import { HistoryScreen } from '@/components/cases/HistoryScreen';

export default function Route() {
  const { caseId } = useLocalSearchParams<{ caseId: string }>();
  return <HistoryScreen caseId={caseId} />;
}
