import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';

import { space, type ColorName } from '../theme/tokens';
import { Button } from './Button';
import { ErrorIcon } from './Glyph';
import { RichInline } from './RichText';
import { Text } from './Text';
import { web } from './webProps';

/** One button that mends a field. */
export interface MendButton { label: string; onPress: () => void }

export interface FieldFrameProps {
  label: string;
  /** mark of an ink before the label */
  mark?: ReactNode;
  labelTone?: ColorName;
  hint?: string;
  /** one sentence: what, where, how to mend */
  error?: string;
  mends?: MendButton[];
  /** what was read from an odd but usable value */
  note?: string;
}

export const fieldIds = (id: string) => ({ label: `${id}-label`, hint: `${id}-hint`, error: `${id}-error`, note: `${id}-note` });
export const describedBy = (id: string, props: FieldFrameProps) => {
  const ids = fieldIds(id);
  return [props.error && ids.error, props.note && ids.note, props.hint && ids.hint].filter(Boolean).join(' ') || undefined;
};

/** Label above; error with its mends, note and hint below. Every field has this frame. */
export function FieldFrame({ id, label, mark, labelTone = 'muted', hint, error, mends, note, children }: FieldFrameProps & { id: string; children: ReactNode }) {
  const ids = fieldIds(id);
  return (
    <View style={styles.frame}>
      <View style={styles.label}>
        {mark}
        <Text id={ids.label} kind="label" tone={labelTone}><RichInline text={label} /></Text>
      </View>
      {children}
      <View {...web({ 'aria-live': 'polite' })} style={styles.below}>
        {error !== undefined && (
          <View style={styles.error}>
            <View style={styles.icon}><ErrorIcon /></View>
            <View style={styles.sentence}><Text id={ids.error} kind="small" tone="error"><RichInline text={error} /></Text></View>
          </View>
        )}
        {error !== undefined && mends !== undefined && mends.length > 0 && (
          <View style={styles.mends}>
            {mends.map((mend) => <Button key={mend.label} small label={mend.label} onPress={mend.onPress} about={label} />)}
          </View>
        )}
        {note !== undefined && <Text id={ids.note} kind="small" tone="ink"><RichInline text={note} /></Text>}
      </View>
      {hint !== undefined && <Text id={ids.hint} kind="caption" tone="muted"><RichInline text={hint} /></Text>}
    </View>
  );
}

const styles = StyleSheet.create({
  frame: { gap: space.xs, minWidth: 0, flexShrink: 1 },
  label: { flexDirection: 'row', alignItems: 'center', gap: 6, minHeight: 16 },
  below: { gap: space.sm },
  error: { flexDirection: 'row', gap: space.sm },
  icon: { paddingTop: 1 },
  sentence: { flex: 1 },
  mends: { flexDirection: 'row', flexWrap: 'wrap', gap: space.sm },
});
