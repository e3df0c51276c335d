import { AccountScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  return <AccountScreen />;
}
