import { NewCaseScreen } from '@/components/cases/NewCaseScreen';

export default function Route() {
  return <NewCaseScreen />;
}
