import { hz } from '@/shared/format/number';
import { relationText } from '@/shared/text/relations';
import { uiText } from '@/shared/text/ui';
import type { RelationSummary } from '@/shared/contracts/relations';

import { useRelations } from '../data/relations';
import { Button } from '../ui/Button';
import { Card, LinkRow } from '../ui/Card';
import { CautionIcon } from '../ui/Glyph';
import { Mark } from '../ui/Mark';
import { RichText } from '../ui/RichText';
import { Screen, Stack } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';
import { Tag } from '../ui/Badge';
import { relationPath } from './relationPath';

/** The list of every held relation, by what it speaks about. */
export function RelationsScreen() {
  const { data, error, refetch, isFetching } = useRelations();
  const couplings = [...new Set(data?.relations.map((relation) => relation.coupling) ?? [])];
  return (
    <Screen title={relationText.title}>
      {!data && !error && <ScreenState kind="loading" title={relationText.loading} />}
      {!data && error && (
        <ScreenState kind="error" title={error.body.title} hint={error.detail} action={<Button label={uiText.tryAgain} busy={isFetching && uiText.loading} onPress={() => void refetch()} />} />
      )}
      {data && (
        <Stack>
          <RichText tone="muted" text={relationText.intro} />
          {couplings.map((coupling) => (
            <Card key={coupling} title={coupling} flush>
              {data.relations.filter((relation) => relation.coupling === coupling).map((relation) => <Row key={`${relation.id}@${relation.version}`} relation={relation} />)}
            </Card>
          ))}
        </Stack>
      )}
    </Screen>
  );
}

function Row({ relation }: { relation: RelationSummary }) {
  const marked = relation.provenance !== 'seen' || relation.spreadProvenance !== 'seen';
  return (
    <LinkRow href={relationPath(relation)} mark={marked ? <CautionIcon size={16} /> : <Mark ink="calculated" size={13} />} value={relation.name}
      detail={[relation.kind === 'class-table' ? relationText.kind['class-table'] : relationText.spread(hz(relation.spreadHz)), relation.citation].join(' · ')}
      aside={relation.status === 'current' ? undefined : <Tag text={relationText.status[relation.status]} tone={relation.status === 'doubtful' ? 'caution' : 'muted'} />} />
  );
}
