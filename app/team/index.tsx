import { TeamScreen } from '@/components/team/TeamScreen';

export default function Route() {
  return <TeamScreen />;
}
