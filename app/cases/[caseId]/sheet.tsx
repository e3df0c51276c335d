import { useLocalSearchParams } from 'expo-router';

import { SheetScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  const { caseId } = useLocalSearchParams<{ caseId: string }>();
  return <SheetScreen caseId={caseId} />;
}
