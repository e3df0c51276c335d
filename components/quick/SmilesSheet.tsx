import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { LIMITS } from '@/shared/limits';
import { quickText } from '@/shared/text/quick';

import { useDoubleBonds } from '../data/quickLook';
import { space } from '../theme/tokens';
import { Button } from '../ui/Button';
import { Field } from '../ui/Field';
import { RadioRow, RadioRows } from '../ui/Choice';
import { RichText } from '../ui/RichText';
import { Sheet } from '../ui/Sheet';
import type { GroupPair, QuickForm } from './form';
import { groupLine } from './groupWords';

type Found = Pick<QuickForm, 'left' | 'right' | 'ringSize'>;
/** The card shows the first group of each carbon and folds an H away as the second. */
const hydrogenLast = ([a, b]: GroupPair): GroupPair => (a === 'H' ? [b, a] : [a, b]);

/** Groups on a C=C out of a pasted SMILES; one double bond is taken at once, of several one is chosen. */
export function SmilesSheet({ onUse, onClose }: { onUse: (found: Found) => void; onClose: () => void }) {
  const [smiles, setSmiles] = useState('');
  const find = useDoubleBonds();
  const toForm = (bond: NonNullable<typeof find.data>['bonds'][number]): Found => ({ left: hydrogenLast(bond.groups.left), right: hydrogenLast(bond.groups.right), ringSize: bond.ringSize });
  const read = () => {
    if (smiles.trim() === '') return;
    find.mutate(smiles.trim(), {
      onSuccess: ({ bonds, note }) => {
        const only = bonds.length === 1 && note === null ? bonds[0] : undefined;
        if (only) onUse(toForm(only));
      },
    });
  };
  const error = find.error?.field('smiles')?.detail ?? find.error?.detail;
  return (
    <Sheet title={quickText.smilesTitle} onClose={onClose} actions={
      <Button grow={1} kind="primary" label={quickText.smilesRead} busy={find.isPending && quickText.smilesReading} onPress={read} />
    }>
      <View style={styles.body}>
        <Field label={quickText.smilesLabel} value={smiles} onChange={(typed) => { setSmiles(typed); find.reset(); }} maxLength={LIMITS.smiles} hint={quickText.smilesHint} error={error} onSubmit={read} />
        {find.data?.note != null && <RichText kind="small" text={find.data.note} />}
        {find.data?.bonds.length === 0 && <RichText text={quickText.smilesNone} />}
      </View>
      {find.data && find.data.bonds.length > 0 && (
        <RadioRows label={quickText.smilesChoose}>
          {find.data.bonds.map((bond, at) => (
            <RadioRow key={at} label={bond.label} chosen={false} onPress={() => onUse(toForm(bond))}
              detail={[...bond.groups.left.map(groupLine), '=', ...bond.groups.right.map(groupLine), bond.ringSize === null ? '' : quickText.ringSize(bond.ringSize)].join(' ')} />
          ))}
        </RadioRows>
      )}
    </Sheet>
  );
}

const styles = StyleSheet.create({ body: { paddingHorizontal: space.lg, paddingBottom: space.md, gap: space.sm } });
