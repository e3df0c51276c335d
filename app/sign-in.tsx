import { SignInScreen } from '@/components/auth/SignInScreen';

export default function Route() {
  return <SignInScreen />;
}
