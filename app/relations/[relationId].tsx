import { useLocalSearchParams } from 'expo-router';

import { RelationScreen } from '@/components/relations/RelationScreen';

export default function Route() {
  const { relationId } = useLocalSearchParams<{ relationId: string }>();
  return <RelationScreen relationId={relationId} />;
}
