import { AdminScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  return <AdminScreen />;
}
