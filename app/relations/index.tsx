import { RelationsScreen } from '@/components/relations/RelationsScreen';

export default function Route() {
  return <RelationsScreen />;
}
