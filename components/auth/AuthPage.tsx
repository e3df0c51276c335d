import { useEffect, type ReactNode } from 'react';
import { ScrollView, StyleSheet, View } from 'react-native';

import { uiAccount } from '@/shared/text/uiAccount';

import { color, size, space } from '../theme/tokens';
import { useLayout } from '../theme/useLayout';
import { Sign } from '../ui/Glyph';
import { Heading } from '../ui/Heading';
import { RichText } from '../ui/RichText';
import { Text } from '../ui/Text';

/** The pages before one is in: the sign with the name above, one narrow column, the foot at the foot. */
export function AuthPage({ title, lead, foot, children }: { title: string; lead?: string; foot?: string; children: ReactNode }) {
  const { isWide } = useLayout();
  useEffect(() => { document.title = `${title} · ${uiAccount.product}`; }, [title]);
  return (
    <ScrollView style={styles.scroll} contentContainerStyle={[styles.page, isWide && styles.pageWide]}>
      <View style={styles.column}>
        <View style={styles.brand}><Sign size={48} /><Text kind="h1">{uiAccount.product}</Text></View>
        <View>
          <Heading text={title} level={1} />
          {lead !== undefined && <View style={styles.lead}><RichText text={lead} tone="muted" /></View>}
        </View>
        {children}
        <View style={styles.spring} />
        {foot !== undefined && <RichText text={foot} kind="small" tone="muted" />}
      </View>
    </ScrollView>
  );
}

/** A rule with a word in its middle. */
export function RuleWith({ word }: { word: string }) {
  return (
    <View style={styles.rule}>
      <View style={styles.line} /><Text kind="small" tone="muted">{word}</Text><View style={styles.line} />
    </View>
  );
}

const styles = StyleSheet.create({
  scroll: { flex: 1, backgroundColor: color.paper },
  page: { flexGrow: 1, alignItems: 'center', paddingHorizontal: space.xl, paddingTop: space.huge, paddingBottom: space.xl },
  pageWide: { paddingTop: 72 },
  column: { flexGrow: 1, width: '100%', maxWidth: size.intake, gap: space.lg },
  brand: { flexDirection: 'row', alignItems: 'center', gap: space.md, paddingBottom: space.lg },
  lead: { paddingTop: space.xs },
  spring: { flexGrow: 1 },
  rule: { flexDirection: 'row', alignItems: 'center', gap: space.md, paddingVertical: space.sm },
  line: { flex: 1, borderTopWidth: 1, borderTopColor: color.rule },
});
