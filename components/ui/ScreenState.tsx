import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';

import { border, color, radius, size, space } from '../theme/tokens';
import { Heading } from './Heading';
import { RichInline } from './RichText';
import { Text } from './Text';
import { web } from './webProps';

/** What a screen (or a part of one) shows when it has nothing to show yet. */
export function ScreenState({ kind, title, hint, action, level = 2 }: {
  kind: 'loading' | 'empty' | 'error'; title: string; hint?: string; action?: ReactNode; level?: 2 | 3;
}) {
  return (
    <View role={kind === 'error' ? 'alert' : 'status'} aria-busy={kind === 'loading' || undefined} style={[styles.box, kind === 'loading' && styles.loading]} {...web({ 'aria-live': kind === 'error' ? 'assertive' : 'polite' })}>
      {kind === 'loading'
        ? <Text tone="muted"><RichInline text={title} /></Text>
        : <Heading text={title} level={level} tone={kind === 'error' ? 'error' : 'ink'} />}
      {hint !== undefined && <View style={styles.hint}><Text><RichInline text={hint} /></Text></View>}
      {action !== undefined && <View style={styles.action}>{action}</View>}
    </View>
  );
}

const styles = StyleSheet.create({
  box: { padding: space.xl, gap: space.sm, borderWidth: border.hair, borderStyle: 'dashed', borderColor: color.edge, borderRadius: radius.card },
  loading: { borderColor: 'transparent' },
  hint: { maxWidth: size.text },
  action: { flexDirection: 'row', flexWrap: 'wrap', gap: space.md, paddingTop: space.sm },
});
