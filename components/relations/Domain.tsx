import { StyleSheet, View } from 'react-native';

import type { RelationSummary } from '@/shared/contracts/relations';
import { relationText } from '@/shared/text/relations';

import { border, color, space } from '../theme/tokens';
import { Card } from '../ui/Card';
import { CautionIcon, Icon } from '../ui/Glyph';
import { RichText } from '../ui/RichText';
import { Text } from '../ui/Text';

const ICON = { yes: <Icon name="check" tone="calculated" />, doubtful: <CautionIcon size={16} />, no: <Icon name="cross" /> };
const TONE = { yes: 'calculated', doubtful: 'caution', no: 'ink' } as const;

export function AppliesTo({ relation }: { relation: RelationSummary }) {
  return (
    <Card title={relationText.applies} flush>
      <View role="list">
        {relation.applies.map((line) => (
          <View key={line.text} role="listitem" style={styles.row}>
            <View style={styles.icon}>{ICON[line.verdict]}</View>
            <View style={styles.words}><RichText kind="dense" text={line.text} /></View>
            <Text kind="smallStrong" tone={TONE[line.verdict]}>{relationText.verdict[line.verdict]}</Text>
          </View>
        ))}
      </View>
    </Card>
  );
}

export function FailsWhen({ failures }: { failures: readonly string[] }) {
  if (failures.length === 0) return null;
  return (
    <Card title={relationText.failsWhen} flush>
      <View role="list">
        {failures.map((failure) => <View key={failure} role="listitem" style={styles.row}><View style={styles.words}><RichText kind="dense" text={failure} /></View></View>)}
      </View>
    </Card>
  );
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', gap: space.md, paddingHorizontal: space.lg, paddingVertical: space.sm, borderTopWidth: border.hair, borderTopColor: color.ruleSoft },
  icon: { width: 16, paddingTop: 2 },
  words: { flex: 1, minWidth: 0 },
});
