import { memo, useState } from 'react';
import { Pressable, StyleSheet, View } from 'react-native';

import { quickText } from '@/shared/text/quick';
import type { GroupText } from '@/shared/types/group';

import { border, color, radius, size, space } from '../theme/tokens';
import { Card, PressRow } from '../ui/Card';
import { Button } from '../ui/Button';
import { ErrorIcon, Icon } from '../ui/Glyph';
import { RichInline } from '../ui/RichText';
import { Sheet } from '../ui/Sheet';
import { Inline, Text } from '../ui/Text';
import { RadioRow, RadioRows } from '../ui/Choice';
import { web } from '../ui/webProps';
import { countGiven, isWhole, RING_SIZES, type GroupPair, type QuickForm } from './form';
import { GroupGrid } from './GroupGrid';
import { groupWords } from './groupWords';
import type { SayOf } from './ReadingCard';
import { SmilesSheet } from './SmilesSheet';

type Slot = { side: 'left' | 'right'; at: 0 | 1 };
const LABELS = {
  left: [quickText.slots.leftUpper, quickText.slots.leftLower],
  right: [quickText.slots.rightUpper, quickText.slots.rightLower],
} as const;

/** The groups on both carbons of a C=C, the ring it may sit in, and the way from a SMILES. */
export const DoubleBondCard = memo(function DoubleBondCard({ form, set, say }: { form: Pick<QuickForm, 'left' | 'right' | 'ringSize'>; set: (change: Partial<QuickForm>) => void; say: SayOf }) {
  const [open, setOpen] = useState<Slot | 'ring' | 'smiles' | null>(null);
  const [wantsMore, setWantsMore] = useState(false);
  const four = wantsMore || form.left[1] !== 'H' || form.right[1] !== 'H';
  const given = countGiven(form.left, form.right) - (four ? 0 : 2);
  const close = () => setOpen(null);
  const pick = (slot: Slot, group: GroupText) => {
    const pair: GroupPair = [...form[slot.side]];
    pair[slot.at] = group;
    set({ [slot.side]: pair });
    close();
  };
  const box = (slot: Slot) => <GroupBox key={`${slot.side}${slot.at}`} label={LABELS[slot.side][slot.at]} group={form[slot.side][slot.at]} onPress={() => setOpen(slot)} />;
  const trouble = ['groups', 'groups.left', 'groups.right', 'ringSize'].map(say).find((entry) => entry.error !== undefined);
  return (
    <Card flush>
      <View style={styles.body}>
        <Text kind="label" tone="muted">{quickText.doubleGroups}</Text>
        <View style={styles.bond}>
          <View style={styles.side}>{box({ side: 'left', at: 0 })}{four && box({ side: 'left', at: 1 })}</View>
          <Text kind="h3" noWrap><BondWords four={four} /></Text>
          <View style={styles.side}>{box({ side: 'right', at: 0 })}{four && box({ side: 'right', at: 1 })}</View>
        </View>
        {!isWhole(form.left, form.right) && given > 0 && <Text kind="small" tone="muted">{quickText.partGiven(given + (four ? 0 : 2))}</Text>}
        {trouble?.error !== undefined && <View style={styles.error}><ErrorIcon /><View style={styles.words}><Text kind="small" tone="error"><RichInline text={trouble.error} /></Text></View></View>}
        <View style={styles.buttons}>
          <Button small label={four ? quickText.twoGroups : quickText.moreGroups} onPress={() => { setWantsMore(!four); if (four) set({ left: [form.left[0], 'H'], right: [form.right[0], 'H'] }); }} />
          <Button small label={quickText.smiles} opens="dialog" onPress={() => setOpen('smiles')} />
        </View>
      </View>
      <PressRow label={quickText.ring} value={form.ringSize === null ? quickText.ringNone : quickText.ringSize(form.ringSize)} onPress={() => setOpen('ring')} />
      {open === 'ring' && (
        <Sheet title={quickText.ringTitle} onClose={close}>
          <RadioRows label={quickText.ringTitle}>
            <RadioRow label={quickText.ringNone} chosen={form.ringSize === null} onPress={() => { set({ ringSize: null }); close(); }} />
            {RING_SIZES.map((ringSize) => <RadioRow key={ringSize} label={quickText.ringSize(ringSize)} chosen={form.ringSize === ringSize} onPress={() => { set({ ringSize }); close(); }} />)}
          </RadioRows>
        </Sheet>
      )}
      {open === 'smiles' && <SmilesSheet onClose={close} onUse={(found) => { set(found); close(); }} />}
      {open !== null && typeof open === 'object' && (
        <Sheet title={LABELS[open.side][open.at]} onClose={close}>
          <GroupGrid label={LABELS[open.side][open.at]} value={form[open.side][open.at]} onPick={(group) => pick(open, group)} />
        </Sheet>
      )}
    </Card>
  );
});

/** CH = CH, the sign from the interface face, which has it at the right weight. */
const BondWords = ({ four }: { four: boolean }) => <>{four ? 'C' : 'CH'}<Inline> = </Inline>{four ? 'C' : 'CH'}</>;

function GroupBox({ label, group, onPress }: { label: string; group: GroupText; onPress: () => void }) {
  const words = groupWords(group);
  const isEmpty = group === '';
  return (
    <Pressable role="button" aria-label={`${label}: ${isEmpty ? quickText.notChosen : `${words.label} ${words.sublabel}`}`} onPress={onPress} {...web({ 'aria-haspopup': 'dialog' })} style={styles.box}>
      <View style={styles.words}>
        <Text kind={isEmpty ? 'text' : 'strong'} tone={isEmpty ? 'muted' : 'ink'}>
          {isEmpty ? quickText.pickGroup : words.label}
          {words.sublabel !== '' && <Text kind="caption" tone="muted"> <RichInline text={words.sublabel} /></Text>}
        </Text>
      </View>
      <Icon name="down" size={14} />
    </Pressable>
  );
}

const styles = StyleSheet.create({
  body: { padding: space.lg, paddingTop: space.md, gap: space.sm },
  bond: { flexDirection: 'row', alignItems: 'center', gap: space.sm },
  side: { flex: 1, minWidth: 0, gap: space.sm },
  box: {
    minHeight: size.touch, flexDirection: 'row', alignItems: 'center', gap: space.xs, paddingHorizontal: space.md, borderWidth: border.hair, borderColor: color.edge,
    borderRadius: radius.control, backgroundColor: color.field,
  },
  words: { flex: 1, minWidth: 0 },
  error: { flexDirection: 'row', gap: space.sm },
  buttons: { flexDirection: 'row', flexWrap: 'wrap', gap: space.sm },
});
