import { useLocalSearchParams } from 'expo-router';

import { ProjectScreen } from '@/components/screens/lazyScreens';

export default function Route() {
  const { projectId } = useLocalSearchParams<{ projectId: string }>();
  return <ProjectScreen projectId={projectId} />;
}
