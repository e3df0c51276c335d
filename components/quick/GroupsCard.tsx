import { lazy, memo, Suspense } from 'react';

import { hz } from '@/shared/format/number';
import { quickText } from '@/shared/text/quick';
import type { RelationRef } from '@/shared/types/answer';

import { Card, PressRow } from '../ui/Card';
import { RadioRow, RadioRows } from '../ui/Choice';
import { Mark } from '../ui/Mark';
import { Notice } from '../ui/Notice';
import { Sheet } from '../ui/Sheet';
import { countGiven, firstAtom, isWhole, type QuickForm } from './form';
import type { SayOf } from './ReadingCard';
import type { Slot } from './slots';

const GroupsSheet = lazy(async () => ({ default: (await import('./GroupsSheet')).GroupsSheet }));
const RelationSheet = lazy(async () => ({ default: (await import('../plots/entry')).RelationSheet }));

export type OpenPart = { part: 'groups'; slot?: Slot } | { part: 'turning' } | { part: 'relation' } | null;
const TURNINGS = ['free', 'ring', 'unknown'] as const;

/** Groups, turning and relation of a single bond: three rows that open a sheet each. */
export const GroupsCard = memo(function GroupsCard({ form, set, say, relation, open, onOpen }: {
  form: Pick<QuickForm, 'front' | 'rear' | 'turning' | 'relation'>; set: (change: Partial<QuickForm>) => void; say: SayOf; relation: RelationRef | null;
  open: OpenPart; onOpen: (part: OpenPart) => void;
}) {
  const given = countGiven(form.front, form.rear);
  const value = isWhole(form.front, form.rear)
    ? `${quickText.front} ${form.front.map(firstAtom).join(', ')}\u2007·\u2007${quickText.rear} ${form.rear.map(firstAtom).join(', ')}`
    : given === 0 ? quickText.notGiven : quickText.partGiven(given);
  const trouble = ['groups', 'groups.front', 'groups.rear', 'relation', 'turning'].map(say).find((entry) => entry.error !== undefined)?.error;
  const close = () => onOpen(null);
  return (
    <Card flush>
      <PressRow label={quickText.groups} value={value} onPress={() => onOpen({ part: 'groups' })} />
      <PressRow label={quickText.turning} value={quickText.turnings[form.turning]} onPress={() => onOpen({ part: 'turning' })} />
      <PressRow mark={<Mark ink="calculated" size={13} />} value={relation?.name ?? quickText.relation}
        detail={[relation ? quickText.spread(hz(relation.spreadHz)) : '', form.relation === '' ? quickText.relationBy : ''].filter(Boolean).join(' · ')}
        onPress={() => onOpen({ part: 'relation' })} />
      {trouble !== undefined && <Notice tone="error" text={trouble} />}
      <Suspense fallback={null}>
        {open?.part === 'groups' && <GroupsSheet groups={form} start={open.slot} onUse={(groups) => { set(groups); close(); }} onClose={close} />}
        {open?.part === 'relation' && <RelationSheet front={form.front} rear={form.rear} chosen={form.relation} onChoose={(id) => { set({ relation: id }); close(); }} onClose={close} />}
      </Suspense>
      {open?.part === 'turning' && (
        <Sheet title={quickText.turning} onClose={close}>
          <RadioRows label={quickText.turning}>
            {TURNINGS.map((turning) => <RadioRow key={turning} label={quickText.turnings[turning]} chosen={form.turning === turning} onPress={() => { set({ turning }); close(); }} />)}
          </RadioRows>
        </Sheet>
      )}
    </Card>
  );
});
