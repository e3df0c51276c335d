import { ForgotScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  return <ForgotScreen />;
}
