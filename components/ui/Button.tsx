import { use, useId, type ReactElement, type Ref } from 'react';
import { Pressable, StyleSheet, View } from 'react-native';

import { plainText } from '@/shared/format/richText';

import { useLayout } from '../theme/useLayout';
import { border, color, radius, size, space, type ColorName } from '../theme/tokens';
import { ActionsPlace } from './actionsPlace';
import { RichInline } from './RichText';
import { Text } from './Text';
import { web } from './webProps';

export type ButtonKind = 'primary' | 'plain' | 'danger' | 'quiet';

export interface ButtonProps {
  /** visible text (markup allowed), and the spoken name of an icon alone */
  label: string;
  onPress: () => void;
  /** one primary button a screen */
  kind?: ButtonKind;
  icon?: ReactElement;
  iconOnly?: boolean;
  /** 40 high inside cards on a wide screen; a phone keeps its 48 */
  small?: boolean;
  /** keeps its label, refuses a second press, and says so with this word ("saving") */
  busy?: string | false;
  /** never dead without a reason: it stands as text below */
  disabledBecause?: string;
  /** a toggle's state */
  pressed?: boolean;
  expanded?: boolean;
  /** takes the room there is, in a row of buttons */
  grow?: number;
  /** what it acts on, where the label alone would repeat ("Remove", "H2–H3") */
  about?: string;
  buttonRef?: Ref<View>;
  opens?: 'dialog' | 'listbox';
}

export function Button({
  label, onPress, kind = 'plain', icon, iconOnly = false, small = false, busy = false, disabledBecause, pressed, expanded, grow, about, buttonRef, opens,
}: ButtonProps) {
  const { isWide } = useLayout();
  const place = use(ActionsPlace);
  const reasonId = useId();
  const isBusy = busy !== false;
  const off = isBusy || disabledBecause !== undefined;
  const tone = toneOf(kind, disabledBecause !== undefined);
  const spoken = about ? `${label}, ${about}` : iconOnly ? label : undefined;
  return (
    <View style={grow !== undefined && place === 'bar' && { flexGrow: grow, flexShrink: 1 }}>
      <Pressable
        ref={buttonRef}
        role="button"
        aria-label={spoken === undefined ? undefined : plainText(spoken)}
        disabled={disabledBecause !== undefined}
        aria-busy={isBusy || undefined}
        onPress={off ? undefined : onPress}
        {...web({
          'aria-describedby': disabledBecause === undefined ? undefined : reasonId, 'aria-pressed': pressed, 'aria-expanded': expanded, 'aria-haspopup': opens,
        })}
        style={(state) => [
          styles.base, styles[kind], small && isWide && styles.small, iconOnly && styles.square, iconOnly && small && isWide && styles.squareSmall,
          disabledBecause !== undefined && styles.off, pressed && styles.primary, state.pressed && !off && styles.held,
        ]}>
        {icon}
        {!iconOnly && <Text kind={small ? 'denseStrong' : 'strong'} tone={pressed ? 'onInk' : tone} align="center"><RichInline text={label} /></Text>}
        {isBusy && <Text kind="small" tone={tone}>{busy}</Text>}
      </Pressable>
      {disabledBecause !== undefined && <View style={styles.reason}><Text id={reasonId} kind="small" tone="muted"><RichInline text={disabledBecause} /></Text></View>}
    </View>
  );
}

const toneOf = (kind: ButtonKind, off: boolean): ColorName => (off ? 'muted' : kind === 'primary' ? 'onInk' : kind === 'danger' ? 'error' : 'ink');

const looks = {
  base: {
    minHeight: size.touch, minWidth: size.touch, borderRadius: radius.control, borderWidth: border.hair, paddingHorizontal: space.lg, paddingVertical: space.xs,
    flexDirection: 'row', alignItems: 'center', justifyContent: 'center', gap: space.sm, borderColor: color.edge, backgroundColor: color.card,
  },
  primary: { backgroundColor: color.ink, borderColor: color.ink },
  plain: {},
  danger: { borderColor: color.error },
  quiet: { borderColor: 'transparent', backgroundColor: 'transparent' },
  small: { minHeight: size.touchDense, paddingHorizontal: space.md },
} as const;
export const buttonStyles = StyleSheet.create(looks);
const styles = StyleSheet.create({
  ...looks,
  square: { width: size.touch, paddingHorizontal: 0 },
  squareSmall: { width: size.touchDense, minWidth: size.touchDense },
  off: { backgroundColor: 'transparent', borderStyle: 'dashed', borderColor: color.edge },
  held: { opacity: 0.75 },
  reason: { paddingTop: space.xs },
});
