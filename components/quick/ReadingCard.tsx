import { memo } from 'react';
import { StyleSheet, View } from 'react-native';

import type { FieldError } from '@/shared/contracts/problem';
import { LIMITS } from '@/shared/limits';
import { quickText } from '@/shared/text/quick';
import type { InputNote } from '@/shared/types/reading';

import { space } from '../theme/tokens';
import { Card } from '../ui/Card';
import { Disclosure } from '../ui/Disclosure';
import { Field, NumberField } from '../ui/Field';
import { Mark } from '../ui/Mark';
import { RichText } from '../ui/RichText';
import { Text } from '../ui/Text';
import type { QuickForm } from './form';

export interface FieldSay { error?: string; mends?: { label: string; onPress: () => void }[]; note?: string }
export type SayOf = (field: string) => FieldSay;

/** What stands under a field: the server's sentence with its mends, or what it understood. */
export function sayings(errors: readonly FieldError[], notes: readonly InputNote[], setField: (field: string, value: string) => void): SayOf {
  return (field) => {
    const place = `#/${field.replace('.', '/')}`;
    // a fault in one group (`#/groups/front/0`) is told where the groups stand
    const error = errors.find(({ pointer }) => pointer === place || (field.startsWith('groups.') && pointer.startsWith(`${place}/`)));
    if (error) return { error: error.detail, mends: error.mends?.map((mend) => ({ label: mend.label, onPress: () => setField(mend.field, mend.value) })) };
    const said = notes.filter((note) => note.field === field && note.code !== 'default-error').map((note) => note.text);
    return said.length > 0 ? { note: said.join(' ') } : {};
  };
}

/** What was understood stands under both fields over the card's width, so that no field changes its width for it. */
const faultOf = ({ error, mends }: FieldSay): FieldSay => ({ error, mends });

/** The measured J, its ±, and what is asked only now and then: the partner's splitting and the field. */
export const ReadingCard = memo(function ReadingCard({ form, set, say, askField }: { form: QuickForm; set: (change: Partial<QuickForm>) => void; say: SayOf; askField: boolean }) {
  const unfolded = askField || form.partner !== '' || form.fieldMHz !== '' || say('partner').error !== undefined || say('fieldMHz').error !== undefined;
  // a sentence under a field needs the card's width, and so does a long number
  const wide = (field: 'j' | 'se') => say(field).error !== undefined || form[field].length > 6;
  const notes = [say('j').note, say('se').note].filter((note) => note !== undefined);
  return (
    <Card flush>
      <View style={styles.body}>
        <View style={styles.pair}>
          <View style={[styles.j, wide('j') && styles.alone]}>
            <NumberField label={quickText.measured} labelTone="measured" mark={<Mark ink="measured" size={13} />} spoken={quickText.measuredSpoken} unit={quickText.hz}
              value={form.j} onChange={(j) => set({ j })} maxLength={LIMITS.hzText} autoFocus={form.j === ''} enterKeyHint="done" {...faultOf(say('j'))} />
          </View>
          <View style={[styles.se, wide('se') && styles.alone]}>
            <NumberField look="small" label={quickText.error} spoken={quickText.errorSpoken} unit={quickText.hz} placeholder={quickText.defaultErrorValue}
              value={form.se} onChange={(se) => set({ se })} maxLength={LIMITS.hzText} {...faultOf(say('se'))} />
          </View>
        </View>
        {notes.length > 0 && <RichText kind="small" text={notes.join(' ')} />}
        {form.se === '' && <Text kind="caption" tone="muted">{quickText.defaultError}</Text>}
      </View>
      <Disclosure label={quickText.more} openLabel={unfolded ? quickText.more : quickText.fewer} heldOpen={unfolded}>
        <View style={[styles.body, styles.more]}>
          <Field label={quickText.partner} unit={quickText.hz} inputMode="decimal" value={form.partner} onChange={(partner) => set({ partner })} maxLength={LIMITS.hzText} hint={quickText.partnerHint} {...say('partner')} />
          <Field label={quickText.field} unit={quickText.mhz} inputMode="decimal" value={form.fieldMHz} onChange={(fieldMHz) => set({ fieldMHz })} maxLength={LIMITS.hzText} hint={quickText.fieldHint} {...say('fieldMHz')} />
        </View>
      </Disclosure>
    </Card>
  );
});

const styles = StyleSheet.create({
  body: { padding: space.lg, paddingTop: space.md, gap: space.sm },
  pair: { flexDirection: 'row', flexWrap: 'wrap', gap: space.lg },
  j: { flexGrow: 1.35, flexShrink: 1, flexBasis: 150, minWidth: 0 },
  se: { flexGrow: 1, flexShrink: 1, flexBasis: 118, minWidth: 0 },
  alone: { flexBasis: '100%' },
  more: { gap: space.lg, paddingTop: space.sm },
});
