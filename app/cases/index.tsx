import { CasesScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  return <CasesScreen />;
}
