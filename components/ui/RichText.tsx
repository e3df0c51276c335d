import { StyleSheet, Text as NativeText } from 'react-native';

import { richText } from '@/shared/format/richText';

import { families } from '../theme/tokens';
import { Text, type TextProps } from './Text';

/** A sentence of ours: what stands between underscores (`³_J_`, `_φ_`) is set in the italic of the serif. */
export function RichText({ text, ...rest }: Omit<TextProps, 'children'> & { text: string }) {
  return (
    <Text {...rest}>
      <RichInline text={text} />
    </Text>
  );
}

/** The same inside a Text that is there already. */
export function RichInline({ text }: { text: string }) {
  return richText(text).map((token, at) =>
    token.italic ? (
      <NativeText key={at} style={styles.variable}>{token.text}</NativeText>
    ) : (
      token.text
    ));
}

// inherited by word: in a cell of a table no Text stands around it, and the renderer would paint it black and in its own size
const inherited: object = { color: 'inherit', fontSize: 'inherit', fontWeight: 'inherit', lineHeight: 'inherit' };
const styles = { variable: [StyleSheet.create({ face: { fontFamily: families.serif, fontStyle: 'italic' } }).face, inherited] };
