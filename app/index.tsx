import { QuickLookScreen } from '@/components/quick/QuickLookScreen';

export default function Route() {
  return <QuickLookScreen />;
}
