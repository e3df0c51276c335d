import { useId, useState } from 'react';
import { Pressable, StyleSheet, View } from 'react-native';

import { border, color, radius, size, space } from '../theme/tokens';
import { RadioRow, RadioRows } from './Choice';
import { describedBy, FieldFrame, fieldIds, type FieldFrameProps } from './FieldFrame';
import { Icon } from './Glyph';
import { RichInline } from './RichText';
import { Sheet } from './Sheet';
import { Text } from './Text';
import { web } from './webProps';

export interface SelectOption<Value extends string> { value: Value; label: string; detail?: string; disabledBecause?: string }

/** One of many, chosen in a sheet. `placeholder` stands while nothing is chosen. */
export function Select<Value extends string>({ options, value, onChange, placeholder, ...frame }: FieldFrameProps & {
  options: readonly SelectOption<Value>[]; value: Value | null; onChange: (value: Value) => void; placeholder: string;
}) {
  const id = useId();
  const [open, setOpen] = useState(false);
  const chosen = options.find((option) => option.value === value);
  return (
    <FieldFrame id={id} {...frame}>
      <Pressable
        role="button"
        aria-labelledby={`${fieldIds(id).label} ${id}-value`}
        onPress={() => setOpen(true)}
        {...web({ 'aria-haspopup': 'dialog', 'aria-describedby': describedBy(id, frame) })}
        style={[styles.box, frame.error !== undefined && styles.bad]}>
        <View style={styles.words}>
          <Text id={`${id}-value`} tone={chosen ? 'ink' : 'muted'}><RichInline text={chosen?.label ?? placeholder} /></Text>
        </View>
        <Icon name="down" size={14} />
      </Pressable>
      {open && (
        <Sheet title={frame.label} onClose={() => setOpen(false)}>
          <RadioRows label={frame.label}>
            {options.map((option) => (
              <RadioRow key={option.value} label={option.label} detail={option.detail} disabledBecause={option.disabledBecause} chosen={option.value === value}
                onPress={() => { onChange(option.value); setOpen(false); }} />
            ))}
          </RadioRows>
        </Sheet>
      )}
    </FieldFrame>
  );
}

const styles = StyleSheet.create({
  box: {
    minHeight: size.touch, flexDirection: 'row', alignItems: 'center', gap: space.sm, paddingHorizontal: space.md, borderWidth: border.hair, borderColor: color.edge,
    borderRadius: radius.control, backgroundColor: color.field,
  },
  bad: { borderColor: color.error, boxShadow: `0 0 0 1px ${color.error}` },
  words: { flex: 1, minWidth: 0 },
});
