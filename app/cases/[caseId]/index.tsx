import { useLocalSearchParams } from 'expo-router';

import { CaseScreen } from '@/components/cases/CaseScreen';

export default function Route() {
  const { caseId } = useLocalSearchParams<{ caseId: string }>();
  return <CaseScreen caseId={caseId} />;
}
