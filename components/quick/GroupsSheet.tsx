import { useState } from 'react';
import { Pressable, StyleSheet, View } from 'react-native';

import { quickText } from '@/shared/text/quick';
import type { GroupText } from '@/shared/types/group';

import { border, color, radius, size, space } from '../theme/tokens';
import { Button } from '../ui/Button';
import { RichInline } from '../ui/RichText';
import { Sheet } from '../ui/Sheet';
import { Text } from '../ui/Text';
import { web } from '../ui/webProps';
import type { GroupPair } from './form';
import { GroupGrid } from './GroupGrid';
import { groupLine } from './groupWords';
import { slotLabel, SLOTS, type Slot } from './slots';

export interface Groups { front: GroupPair; rear: GroupPair }

/** The four groups of a single bond, picked one after another; nothing changes outside until they are used. */
export function GroupsSheet({ groups, start, onUse, onClose }: { groups: Groups; start?: Slot; onUse: (groups: Groups) => void; onClose: () => void }) {
  const [draft, setDraft] = useState(groups);
  const [slot, setSlot] = useState<Slot>(start ?? firstEmpty(groups) ?? { side: 'front', at: 0 });
  const missing = SLOTS.filter(({ side, at }) => draft[side][at] === '').length;
  const pick = (group: GroupText) => {
    const pair: GroupPair = [...draft[slot.side]];
    pair[slot.at] = group;
    const next = { ...draft, [slot.side]: pair };
    setDraft(next);
    setSlot(firstEmpty(next) ?? slot);
  };
  const blank = { front: ['', ''] as GroupPair, rear: ['', ''] as GroupPair };
  return (
    <Sheet title={quickText.groupsTitle} onClose={onClose} actions={
      <>
        <Button grow={1} label={quickText.clearGroups} onPress={() => onUse(blank)} />
        <Button grow={1} kind="primary" label={quickText.useGroups} onPress={() => onUse(draft)} disabledBecause={missing > 0 ? quickText.needAll(missing) : undefined} />
      </>
    }>
      <View style={styles.help}><Text kind="small" tone="muted">{quickText.groupsHelp}</Text></View>
      <View role="radiogroup" aria-label={quickText.groupsTitle} style={styles.slots}>
        {SLOTS.map((entry) => {
          const on = entry.side === slot.side && entry.at === slot.at;
          const group = draft[entry.side][entry.at];
          return (
            <Pressable key={entry.label} role="radio" onPress={() => setSlot({ side: entry.side, at: entry.at })} {...web({ 'aria-checked': on })} style={[styles.slot, on && styles.on]}>
              <Text kind="caption" tone="muted">{entry.label}</Text>
              <Text kind="strong" tone={group === '' ? 'muted' : 'ink'}><RichInline text={groupLine(group)} /></Text>
            </Pressable>
          );
        })}
      </View>
      <GroupGrid key={`${slot.side}${slot.at}`} label={quickText.pickFor(slotLabel(slot))} value={draft[slot.side][slot.at]} onPick={pick} />
    </Sheet>
  );
}

const firstEmpty = (groups: Groups): Slot | undefined => SLOTS.find(({ side, at }) => groups[side][at] === '');

const styles = StyleSheet.create({
  help: { paddingHorizontal: space.lg, paddingBottom: space.md },
  slots: { flexDirection: 'row', flexWrap: 'wrap', gap: space.sm, paddingHorizontal: space.lg, paddingBottom: space.md },
  slot: {
    flexGrow: 1, flexBasis: '45%', minHeight: size.rowTall, justifyContent: 'center', paddingHorizontal: space.md, borderWidth: border.hair, borderColor: color.rule, borderRadius: radius.control,
    backgroundColor: color.card,
  },
  on: { borderColor: color.measured, backgroundColor: color.measuredTint, boxShadow: `0 0 0 1px ${color.measured}` },
});
