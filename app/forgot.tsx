import { ForgotScreen } from '@/components/auth/ForgotScreen';

export default function Route() {
  return <ForgotScreen />;
}
