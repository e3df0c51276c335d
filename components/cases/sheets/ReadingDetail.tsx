import { StyleSheet, View } from 'react-native';

import { fieldWords, pathWords, readingName, signWords, withUnit } from '@/shared/text/uiCaseFields';
import { uiCaseParts } from '@/shared/text/uiCaseParts';

import { space } from '../../theme/tokens';
import { PlainRow } from '../../ui/Card';
import { Sheet } from '../../ui/Sheet';
import { CommentsAt } from '../parts/CommentsAt';
import { useCaseView } from '../caseContext';

/** A reading for someone who only reads, with the comments at it. */
export function ReadingDetail({ id, onClose }: { id: string; onClose: () => void }) {
  const { content } = useCaseView();
  const reading = content.readings.find((row) => row.id === id);
  if (reading === undefined) return null;
  const words = fieldWords.readings;
  const rows: [string, string][] = [
    [words.j, reading.j.trim() === '' ? '' : withUnit(reading.j, 'Hz')],
    [words.se, reading.se.trim() === '' ? uiCaseParts.readings.seDefault : withUnit(reading.se, 'Hz')],
    [words.partner, reading.partner.trim() === '' ? uiCaseParts.readings.partnerNone : withUnit(reading.partner, 'Hz')],
    [words.path, pathWords[reading.path]], [words.nuclei, reading.nuclei], [words.sign, signWords[reading.sign]], [words.where, reading.where], [words.method, reading.method], [words.note, reading.note],
  ];
  return (
    <Sheet title={uiCaseParts.readings.editTitle(readingName(reading))} onClose={onClose}>
      {rows.filter(([, value]) => value.trim() !== '').map(([label, value]) => <PlainRow key={label} label={label} value={value} />)}
      <View style={styles.comments}><CommentsAt target={`readings/${id}`} label={readingName(reading)} /></View>
    </Sheet>
  );
}

const styles = StyleSheet.create({ comments: { padding: space.lg } });
