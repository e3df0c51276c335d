import { StyleSheet, View } from 'react-native';

import { LIMITS } from '@/shared/limits';
import { bearingWords, candidateName, evidenceKindWords } from '@/shared/text/uiCaseFields';
import { uiCaseParts } from '@/shared/text/uiCaseParts';

import { border, color, space } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { Card, CardBody } from '../../ui/Card';
import { Icon } from '../../ui/Glyph';
import { RichText } from '../../ui/RichText';
import { Text } from '../../ui/Text';
import { useCaseView } from '../caseContext';
import { Files } from './Files';

const say = uiCaseParts.evidence;
const SIGN = { for: '+', against: '−', neutral: '·' } as const;

/** Other facts for and against, with their files; weighed by people. */
export function EvidenceCard() {
  const { content, found, mayEdit, open } = useCaseView();
  return (
    <Card title={say.title} flush>
      <CardBody><RichText kind="small" tone="muted" text={content.evidence.length === 0 ? say.none : say.lead} /></CardBody>
      <View role="list">
        {content.evidence.map((row) => (
          <View key={row.id} role="listitem" style={styles.row}>
            <View style={styles.sign}><Text kind="h3" align="center">{SIGN[row.bearing]}</Text></View>
            <View style={styles.words}>
              <Text kind="small" tone="muted">{`${evidenceKindWords[row.kind]}, ${bearingWords[row.bearing]}${row.candidateId === null ? '' : ` ${candidateName(content, row.candidateId)}`}`}</Text>
              <Text>{row.text}</Text>
              {row.attachmentIds.length > 0 && <Text kind="caption" tone="muted">{found.attachments.filter((file) => row.attachmentIds.includes(file.id)).map((file) => file.fileName).join(', ')}</Text>}
            </View>
            {mayEdit && <Button small kind="quiet" label={uiCaseParts.edit} about={evidenceKindWords[row.kind]} opens="dialog" onPress={() => open({ kind: 'evidence', id: row.id })} />}
          </View>
        ))}
      </View>
      {mayEdit && (
        <View style={styles.pad}>
          <Button small label={say.add} icon={<Icon name="plus" />} opens="dialog" onPress={() => open({ kind: 'evidence', id: null })} disabledBecause={content.evidence.length >= LIMITS.evidence ? say.tooManyRows : undefined} />
        </View>
      )}
      <Files />
    </Card>
  );
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-start', gap: space.md, paddingHorizontal: space.lg, paddingVertical: space.md, borderTopWidth: border.hair, borderTopColor: color.ruleSoft },
  sign: { width: 20 },
  words: { flex: 1, minWidth: 160, gap: 2 },
  pad: { paddingHorizontal: space.lg, paddingBottom: space.md, alignItems: 'flex-start' },
});
