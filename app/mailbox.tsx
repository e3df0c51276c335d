import { MailboxScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  return <MailboxScreen />;
}
