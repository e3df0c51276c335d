import { GlossaryScreen } from '@/components/help/GlossaryScreen';

export default function Route() {
  return <GlossaryScreen />;
}
