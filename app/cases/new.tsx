import { NewCaseScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  return <NewCaseScreen />;
}
