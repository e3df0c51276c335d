import { useLocalSearchParams } from 'expo-router';

import { CaseScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  const { caseId } = useLocalSearchParams<{ caseId: string }>();
  return <CaseScreen caseId={caseId} />;
}
