import { CasesScreen } from '@/components/cases/CasesScreen';

export default function Route() {
  return <CasesScreen />;
}
