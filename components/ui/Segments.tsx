import { useRef } from 'react';
import { Pressable, StyleSheet, View } from 'react-native';

import { plainText } from '@/shared/format/richText';

import { border, color, radius, size, space } from '../theme/tokens';
import { RichInline } from './RichText';
import { Text } from './Text';
import { asElement, web, type KeyPress } from './webProps';

export interface Option<Value extends string> { value: Value; label: string }

/** One of a few, side by side; arrow keys move and choose, as in any radio group. */
export function Segments<Value extends string>({ label, options, value, onChange }: {
  label: string; options: readonly Option<Value>[]; value: Value; onChange: (value: Value) => void;
}) {
  const buttons = useRef(new Map<Value, View>());
  const step = (event: KeyPress) => {
    const by = event.key === 'ArrowRight' || event.key === 'ArrowDown' ? 1 : event.key === 'ArrowLeft' || event.key === 'ArrowUp' ? -1 : 0;
    if (by === 0) return;
    event.preventDefault();
    const at = options.findIndex((option) => option.value === value);
    const next = options[(at + by + options.length) % options.length];
    if (!next) return;
    onChange(next.value);
    asElement(buttons.current.get(next.value))?.focus();
  };
  return (
    <View role="radiogroup" aria-label={plainText(label)} style={styles.group} {...web({ onKeyDown: step })}>
      {options.map((option, at) => {
        const on = option.value === value;
        return (
          <Pressable
            key={option.value}
            ref={(node) => { if (node) buttons.current.set(option.value, node); else buttons.current.delete(option.value); }}
            role="radio"
            onPress={() => onChange(option.value)}
            {...web({ 'aria-checked': on, tabIndex: on ? 0 : -1 })}
            style={[styles.item, at > 0 && styles.divided, on && styles.on]}>
            <Text kind="denseStrong" tone={on ? 'onInk' : 'ink'} align="center"><RichInline text={option.label} /></Text>
          </Pressable>
        );
      })}
    </View>
  );
}

const styles = StyleSheet.create({
  group: { flexDirection: 'row', borderWidth: border.hair, borderColor: color.edge, borderRadius: radius.control, backgroundColor: color.card, overflow: 'hidden' },
  item: { flexGrow: 1, flexShrink: 1, minHeight: size.touch - 2, alignItems: 'center', justifyContent: 'center', paddingHorizontal: space.sm, paddingVertical: space.xs },
  divided: { borderLeftWidth: border.hair, borderLeftColor: color.rule },
  on: { backgroundColor: color.ink },
});
