import { StyleSheet, View } from 'react-native';

import { helpText } from '@/shared/text/help';

import { border, color, space } from '../theme/tokens';
import { useLayout } from '../theme/useLayout';
import { Card } from '../ui/Card';
import { LinkButton } from '../ui/LinkButton';
import { RichText } from '../ui/RichText';
import { Screen, Stack } from '../ui/Screen';

/** The words of the trade as they are used here. */
export function GlossaryScreen() {
  const { isWide } = useLayout();
  return (
    <Screen title={helpText.glossary} back="/help" crumb={helpText.title} actions={<LinkButton grow={1} href="/help" label={helpText.toHelp} />}>
      <Stack>
        <RichText tone="muted" text={helpText.glossaryLead} />
        <Card flush>
          <View role="list">
            {helpText.terms.map(([term, meaning]) => (
              <View key={term} role="listitem" style={[styles.entry, isWide && styles.wide]}>
                <View style={isWide && styles.term}><RichText kind="strong" text={term} /></View>
                <View style={styles.meaning}><RichText text={meaning} /></View>
              </View>
            ))}
          </View>
        </Card>
      </Stack>
    </Screen>
  );
}

const styles = StyleSheet.create({
  entry: { paddingHorizontal: space.lg, paddingVertical: space.md, borderTopWidth: border.hair, borderTopColor: color.ruleSoft, gap: space.xs },
  wide: { flexDirection: 'row', gap: space.xl },
  term: { width: 260 },
  meaning: { flexShrink: 1, maxWidth: 680 },
});
