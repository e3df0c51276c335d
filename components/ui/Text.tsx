import type { ReactNode } from 'react';
import { StyleSheet, Text as NativeText } from 'react-native';

import { color, type, type ColorName, type TypeName } from '../theme/tokens';

export interface TextProps {
  children: ReactNode;
  kind?: TypeName;
  tone?: ColorName;
  align?: 'left' | 'center' | 'right';
  /** numbers with their unit, and names such as H2–H3, never part */
  noWrap?: boolean;
  struck?: boolean;
  /** one line, cut with an ellipsis; the whole text must be readable elsewhere */
  oneLine?: boolean;
  id?: string;
  hidden?: boolean;
}

/** Text in one of the fixed kinds; inside another Text only what is given changes. */
export function Text({ children, kind = 'text', tone = 'ink', align, noWrap, struck, oneLine, id, hidden }: TextProps) {
  return (
    <NativeText
      id={id}
      aria-hidden={hidden}
      numberOfLines={oneLine ? 1 : undefined}
      style={[styles[kind], { color: color[tone] }, align && aligned[align], noWrap && wraps.none, struck && wraps.struck]}>
      {children}
    </NativeText>
  );
}

/** Bold, tone or italic inside a Text. */
export function Inline({ children, tone, strong }: { children: ReactNode; tone?: ColorName; strong?: boolean }) {
  return <NativeText style={[strong && wraps.strong, tone && { color: color[tone] }]}>{children}</NativeText>;
}

const styles = StyleSheet.create(type);
const aligned = StyleSheet.create({ left: { textAlign: 'left' }, center: { textAlign: 'center' }, right: { textAlign: 'right' } });
const noWrapStyle: object = { whiteSpace: 'nowrap' };
const wraps = { none: noWrapStyle, ...StyleSheet.create({ struck: { textDecorationLine: 'line-through' }, strong: { fontWeight: '600' } }) };
