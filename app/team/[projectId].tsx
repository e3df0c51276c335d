import { useLocalSearchParams } from 'expo-router';

import { ProjectScreen } from '@/components/team/ProjectScreen';

export default function Route() {
  const { projectId } = useLocalSearchParams<{ projectId: string }>();
  return <ProjectScreen projectId={projectId} />;
}
