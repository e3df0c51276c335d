import { MailboxScreen } from '@/components/mailbox/MailboxScreen';

export default function Route() {
  return <MailboxScreen />;
}
