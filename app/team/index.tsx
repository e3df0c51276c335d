import { TeamScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  return <TeamScreen />;
}
