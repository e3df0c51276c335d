import { ReviewsScreen } from '@/components/reviews/ReviewsScreen';

export default function Route() {
  return <ReviewsScreen />;
}
