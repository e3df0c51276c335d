import { ReviewsScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  return <ReviewsScreen />;
}
