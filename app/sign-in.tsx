import { SignInScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  return <SignInScreen />;
}
