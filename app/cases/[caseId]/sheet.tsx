import { useLocalSearchParams } from 'expo-router';

import { SheetScreen } from '@/components/cases/SheetScreen';

export default function Route() {
  const { caseId } = useLocalSearchParams<{ caseId: string }>();
  return <SheetScreen caseId={caseId} />;
}
