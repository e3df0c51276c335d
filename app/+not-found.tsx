import { NotFoundScreen } from '@/components/shell/NotFoundScreen';

export default function Route() {
  return <NotFoundScreen />;
}
