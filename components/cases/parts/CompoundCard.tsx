import { StyleSheet, View } from 'react-native';

import { withUnit } from '@/shared/text/uiCaseFields';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import type { CaseContent } from '@/shared/types/case';

import { space } from '../../theme/tokens';
import { Tag } from '../../ui/Badge';
import { Card, PlainRow, PressRow } from '../../ui/Card';
import { Text } from '../../ui/Text';
import { useCaseView } from '../caseContext';

const say = uiCaseParts;

/** "500 MHz, CDCl3, 298 K": what is told of the spectrum. */
export const conditionsLine = ({ conditions }: CaseContent): string => [
  conditions.fieldMHz.trim() && withUnit(conditions.fieldMHz, 'MHz'), conditions.solvent.trim(), conditions.temperatureK.trim() && withUnit(conditions.temperatureK, 'K'), conditions.concentration.trim(),
].filter(Boolean).join(', ');

/** The compound, the conditions of its spectrum, and the tags. */
export function CompoundCard() {
  const { content, mayEdit, open } = useCaseView();
  const { compound } = content;
  const detail = [compound.batch.trim() && say.compound.batch(compound.batch.trim()), compound.notebook.trim(), compound.formerNames.length > 0 && say.compound.formerly(compound.formerNames.join(', '))]
    .filter(Boolean).join(' · ');
  const words = { label: say.compound.title, value: compound.name.trim() || say.compound.untitled, detail: detail || undefined };
  const conditions = { label: say.conditions.title, value: conditionsLine(content) || say.conditions.none };
  return (
    <Card flush>
      {mayEdit
        ? <><PressRow {...words} onPress={() => open({ kind: 'compound' })} /><PressRow {...conditions} onPress={() => open({ kind: 'conditions' })} /></>
        : <><PlainRow {...words} /><PlainRow {...conditions} /></>}
      {compound.structureNote.trim() !== '' && <View style={styles.note}><Text kind="dense">{compound.structureNote}</Text></View>}
      {content.tags.length > 0 && <View style={styles.tags}>{content.tags.map((tag) => <Tag key={tag} text={tag} />)}</View>}
    </Card>
  );
}

const styles = StyleSheet.create({
  note: { paddingHorizontal: space.lg, paddingBottom: space.md },
  tags: { flexDirection: 'row', flexWrap: 'wrap', gap: space.sm, paddingHorizontal: space.lg, paddingBottom: space.md },
});
