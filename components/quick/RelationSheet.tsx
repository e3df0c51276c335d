import { hz } from '@/shared/format/number';
import { applies } from '@/shared/engine/relations/applies';
import { isRelationRow } from '@/shared/engine/relations/registry';
import { singleText } from '@/shared/text/engine/single';
import { quickText } from '@/shared/text/quick';
import { uiText } from '@/shared/text/ui';

import { useRelations } from '../data/relations';
import { Button } from '../ui/Button';
import { RadioRow, RadioRows } from '../ui/Choice';
import { ScreenState } from '../ui/ScreenState';
import { Sheet } from '../ui/Sheet';
import { isWhole, type GroupPair } from './form';

/** The relations that speak about a single bond, each with what its domain says of these groups. */
export function RelationSheet({ front, rear, chosen, onChoose, onClose }: { front: GroupPair; rear: GroupPair; chosen: string; onChoose: (id: string) => void; onClose: () => void }) {
  const { data, error, refetch, isFetching } = useRelations();
  const groups = isWhole(front, rear) ? { front, rear } : null;
  return (
    <Sheet title={quickText.relationTitle} onClose={onClose}>
      {!data && !error && <ScreenState kind="loading" title={uiText.loading} />}
      {error && <ScreenState kind="error" title={error.body.title} hint={error.detail} action={<Button label={uiText.tryAgain} busy={isFetching && uiText.loading} onPress={() => void refetch()} />} />}
      {data && (
        <RadioRows label={quickText.relationTitle}>
          <RadioRow label={quickText.relationDefault} detail={quickText.relationDefaultDetail} chosen={chosen === ''} onPress={() => onChoose('')} />
          {data.relations.filter((relation) => relation.kind !== 'class-table' && relation.status !== 'superseded').map((relation) => {
            const domain = isRelationRow(relation.row) ? applies(relation.row, groups) : null;
            const said = domain === null ? hz(relation.spreadHz) : singleText.domain(domain.reason, domain.elements, domain.spreadHz);
            return (
              <RadioRow key={`${relation.id}@${relation.version}`} label={relation.name} detail={domain?.verdict === 'no' ? relation.citation : `${said} ${relation.citation}`} chosen={chosen === relation.id || chosen === `${relation.id}@${relation.version}`}
                disabledBecause={domain?.verdict === 'no' ? said : undefined} onPress={() => onChoose(relation.id)} />
            );
          })}
        </RadioRows>
      )}
    </Sheet>
  );
}
