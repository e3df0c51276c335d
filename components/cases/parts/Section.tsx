import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';

import { uiCases } from '@/shared/text/uiCases';
import type { Ink } from '@/shared/types/trail';

import { color, space } from '../../theme/tokens';
import { useLayout } from '../../theme/useLayout';
import { Heading } from '../../ui/Heading';
import { Mark } from '../../ui/Mark';
import { RichText } from '../../ui/RichText';

const WORDS: Record<Ink, string> = { measured: uiCases.frame.measured, calculated: uiCases.frame.calculated, judged: uiCases.frame.judged };

/** A stretch of the case in one ink: on a phone the line runs down its left margin, on a wide screen it has its own column. */
export function Section({ ink, aside, last = false, children }: { ink: Ink; aside?: string; last?: boolean; children: ReactNode }) {
  const { isWide } = useLayout();
  if (isWide) return <View style={styles.wide}>{children}</View>;
  return (
    <View role="region" aria-label={WORDS[ink]} style={[styles.section, !last && styles.more]}>
      <View style={[styles.line, { backgroundColor: color[ink] }, last && styles.lineEnd]} />
      <View style={styles.head}>
        <View style={styles.mark}><Mark ink={ink} size={20} /></View>
        <Heading text={WORDS[ink]} level={2} kind="trailHead" tone={ink} />
        {aside !== undefined && <View style={styles.aside}><RichText text={aside} kind="small" tone="muted" /></View>}
      </View>
      <View style={styles.parts}>{children}</View>
    </View>
  );
}

const styles = StyleSheet.create({
  wide: { gap: space.lg },
  section: { paddingLeft: 28, position: 'relative' },
  more: { paddingBottom: 20 },
  line: { position: 'absolute', left: 6, top: 14, bottom: -12, width: 4 },
  lineEnd: { bottom: 0 },
  head: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'baseline', columnGap: space.sm, paddingBottom: space.sm },
  mark: { position: 'absolute', left: -30, top: 1, backgroundColor: color.paper, paddingVertical: 1 },
  aside: { flexShrink: 1 },
  parts: { gap: space.md },
});
