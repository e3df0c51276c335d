import { Pressable, StyleSheet, View } from 'react-native';

import { plainText } from '@/shared/format/richText';

import { useLayout } from '../theme/useLayout';
import { border, color, radius, size, space } from '../theme/tokens';
import { Icon } from './Glyph';
import { RichInline } from './RichText';
import { Text } from './Text';
import { web } from './webProps';

/**
 * A filter: off, on, or with a value and a cross that takes it away. `opens` marks one that opens a sheet of choices.
 */
export function FilterChip({ label, value, on, onPress, onClear, clearLabel, opens = false }: {
  label: string; value?: string; on: boolean; onPress: () => void; onClear?: () => void; clearLabel?: string; opens?: boolean;
}) {
  const { isWide } = useLayout();
  const tone = on ? 'onInk' : 'ink';
  const height = { minHeight: isWide ? size.touchDense : size.touch };
  return (
    <View style={[styles.chip, height, on && styles.on]}>
      <Pressable role="button" onPress={onPress} {...web({ 'aria-pressed': opens ? undefined : on, 'aria-haspopup': opens ? 'dialog' : undefined })} style={[styles.press, height]}>
        <Text kind="denseStrong" tone={tone} noWrap><RichInline text={value ? `${label}: ${value}` : label} /></Text>
        {opens && !(on && onClear) && <Icon name="down" size={14} tone={tone} />}
      </Pressable>
      {on && onClear && clearLabel && (
        <Pressable role="button" aria-label={plainText(clearLabel)} onPress={onClear} style={[styles.clear, height]}>
          <Icon name="cross" size={12} tone={tone} />
        </Pressable>
      )}
    </View>
  );
}

const styles = StyleSheet.create({
  chip: { flexDirection: 'row', borderWidth: border.hair, borderColor: color.edge, borderRadius: radius.control, backgroundColor: color.card },
  on: { backgroundColor: color.ink, borderColor: color.ink },
  press: { flexDirection: 'row', alignItems: 'center', gap: 6, paddingHorizontal: space.md },
  clear: { width: size.touch, alignItems: 'center', justifyContent: 'center' },
});
