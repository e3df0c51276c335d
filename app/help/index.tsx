import { HelpScreen } from '@/components/help/HelpScreen';

export default function Route() {
  return <HelpScreen />;
}
