import { StyleSheet, View } from 'react-native';

import { fixed, hz, hzRange, inHundred } from '@/shared/format/number';
import { PROVENANCE_WORDS } from '@/shared/format/words';
import { quickText } from '@/shared/text/quick';
import type { DoubleBondFinding, LadderRow } from '@/shared/types/answer';
import type { HzReading } from '@/shared/types/reading';

import { space } from '../theme/tokens';
import { Card } from '../ui/Card';
import { Disclosure } from '../ui/Disclosure';
import { RichText } from '../ui/RichText';
import { Table } from '../ui/Table';
import { Ladder } from './Ladder';
import { useWidth } from './useWidth';

/** The ladder of a double bond; for a bond without a vicinal H,H pair the ladder is that of ³J(C,H) and bears no reading. */
export function DoubleBondPlots({ finding, reading, decided }: {
  finding: DoubleBondFinding; reading: HzReading;
  /** odds stand only beside an answer that they decide: next to "not decided" they would speak against it */
  decided: boolean;
}) {
  const [width, onLayout] = useWidth();
  const isCarbon = finding.setting === 'trisubstituted' || finding.setting === 'tetrasubstituted';
  const shown = isCarbon ? null : reading;
  const rows = finding.ladder;
  const say = quickText.columns;
  const range = (pair: [number, number]) => hzRange(pair[0], pair[1]);
  const label = quickText.ladderLabel(
    rows.map((row) => quickText.ladderRow(quickText.geometry[row.geometry], range(row.fullHz), row.classHz && range(row.classHz))).join('; '),
    shown ? hz(shown.jHz) : quickText.noneWord,
  );
  const held = rows.filter((row) => row.compounds.length > 0).map((row) => quickText.ladderCount(row.compounds.length, quickText.geometry[row.geometry])).join(', ');
  const notes = [
    isCarbon ? quickText.carbonNote : quickText.ladderNote(finding.className),
    held === '' ? '' : quickText.ladderTicks(held),
    rows.some((row) => row.geometry === 'geminal') ? quickText.ladderGeminal : '',
  ];
  const compounds = rows.flatMap((row) => row.compounds.map((compound) => ({ ...compound, geometry: row.geometry })));
  const weights = new Map(finding.likelihoods.map(({ geometry, weight }) => [geometry, weight]));
  return (
    <Card flush title={isCarbon ? quickText.carbonLadder : undefined}>
      <View style={styles.plot}>
        <View onLayout={onLayout} style={styles.box}>{width > 0 && <Ladder width={width} rows={rows} reading={shown} label={label} />}</View>
        <RichText kind="caption" tone="muted" text={notes.filter(Boolean).join(' ')} />
      </View>
      <Disclosure label={compounds.length > 0 ? quickText.ladderTable : quickText.ladderRanges} openLabel={quickText.hideTable}>
        <View style={styles.tables}>
          <Table caption={quickText.ladder} rows={rows} rowKey={(row) => row.geometry} columns={[
            { key: 'geometry', head: say.geometry, rowHeader: true, cell: (row) => quickText.geometry[row.geometry] },
            { key: 'full', head: say.full, cell: (row) => range(row.fullHz) },
            { key: 'class', head: say.inClass, cell: (row) => (row.classHz ? range(row.classHz) : '–') },
            ...(decided && weights.size > 1 ? [{ key: 'odds', head: say.likelihood, cell: (row: LadderRow) => { const weight = weights.get(row.geometry); return weight === undefined ? '–' : inHundred(weight); } }] : []),
          ]} />
          {compounds.length > 0 && (
            <Table caption={quickText.ladderTable} rows={compounds} rowKey={(row, at) => `${row.name}${at}`} columns={[
              { key: 'compound', head: say.compound, rowHeader: true, wraps: true, cell: (row) => row.name },
              { key: 'geometry', head: say.geometry, cell: (row) => quickText.geometry[row.geometry] },
              { key: 'j', head: say.j, numeric: true, tone: 'measured', cell: (row) => fixed(row.jHz, 1) },
              { key: 'source', head: say.source, wraps: true, cell: (row) => `${row.source}${row.provenance === 'seen' ? '' : ` (${PROVENANCE_WORDS[row.provenance]})`}` },
            ]} />
          )}
        </View>
      </Disclosure>
    </Card>
  );
}

const styles = StyleSheet.create({
  plot: { paddingHorizontal: space.lg, paddingVertical: space.md, gap: space.sm },
  box: { minHeight: 120 },
  tables: { gap: space.lg, paddingBottom: space.md },
});
