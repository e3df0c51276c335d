import { AccountScreen } from '@/components/account/AccountScreen';

export default function Route() {
  return <AccountScreen />;
}
