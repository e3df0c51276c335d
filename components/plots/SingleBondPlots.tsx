import { useEffect, useMemo } from 'react';
import { StyleSheet, View } from 'react-native';

import { degree, degreeRange, fixed, hz } from '@/shared/format/number';
import { quickText } from '@/shared/text/quick';
import type { RelationRef, SingleBondFinding } from '@/shared/types/answer';
import type { HzReading, Root } from '@/shared/types/reading';
import { SECTOR_SHORT } from '@/shared/format/words';

import { border, color, space } from '../theme/tokens';
import { useLayout } from '../theme/useLayout';
import { Button } from '../ui/Button';
import { Card } from '../ui/Card';
import { Disclosure } from '../ui/Disclosure';
import { RichText } from '../ui/RichText';
import { Table } from '../ui/Table';
import { Text } from '../ui/Text';
import { slotLabel } from '../quick/slots';
import type { AnswerPlotsProps } from './AnswerPlots';
import { Curve } from './Curve';
import { Dial } from './Dial';
import { PLOT_HEIGHT, PlotBox } from './PlotBox';
import { useDeviceCurve, type DeviceCurve } from './useDeviceCurve';
import { useTurn } from './useTurn';
import { useWidth } from './useWidth';
import { arcsWords, rootsWords, sectorsShort } from './words';

interface Props extends Pick<AnswerPlotsProps, 'groups' | 'onPickGroup' | 'beside'> { finding: SingleBondFinding; relation: RelationRef; reading: HzReading }

const NO_GROUPS = {};
/** The angle shown first: the last root (towards ap), else the middle of the widest arc, else 180°. */
function startAngle(finding: SingleBondFinding): number {
  const last = finding.roots.at(-1);
  if (last) return last.phiDeg;
  const widest = [...finding.arcs].sort((a, b) => b.toDeg - b.fromDeg - (a.toDeg - a.fromDeg))[0];
  return widest ? (widest.fromDeg + widest.toDeg) / 2 : 180;
}

/** Dial and curve of a single bond, turning together. */
export function SingleBondPlots({ finding, relation, reading, groups, onPickGroup, beside = false }: Props) {
  const inputs = useMemo(() => (groups ? { groups } : NO_GROUPS), [groups]);
  const { curve, isPending } = useDeviceCurve(`${relation.id}@${relation.version}`, inputs);
  const start = startAngle(finding);
  const { phiDeg, set, turnTo } = useTurn(start);
  useEffect(() => set(start), [start, set]);
  if (!curve) return <PlotBox bond="single" note={isPending ? quickText.plotsLoading : quickText.plotsAway} />;
  const jHz = curve.at(phiDeg);
  const turn = { phiDeg, jHz, set, turnTo };
  return (
    <Card flush>
      <View style={beside && styles.beside}>
        <View style={beside && styles.narrow}><DialPart finding={finding} groups={groups} onPickGroup={onPickGroup} turn={turn} /></View>
        <View style={[styles.ruled, beside && styles.broad]}><CurvePart finding={finding} relation={relation} reading={reading} curve={curve} turn={turn} /></View>
      </View>
      <Disclosure label={finding.roots.length + finding.arcs.length > 0 ? quickText.curveTable : quickText.relationTable} openLabel={quickText.hideTable}>
        <Twin finding={finding} curve={curve} spreadHz={relation.spreadHz} />
      </Disclosure>
    </Card>
  );
}

interface Turn { phiDeg: number; jHz: number; set: (deg: number) => void; turnTo: (deg: number) => void }

function DialPart({ finding, groups, onPickGroup, turn }: Pick<Props, 'finding' | 'groups' | 'onPickGroup'> & { turn: Turn }) {
  const [width, onLayout] = useWidth();
  const size = Math.min(width, 340);
  const isAt = (root: Root) => Math.abs(root.phiDeg - turn.phiDeg) < 0.5;
  return (
    <View style={styles.dial}>
      <View onLayout={onLayout} style={styles.centre}>
        {size > 0 && <Dial size={size} phiDeg={turn.phiDeg} arcs={finding.arcs} groups={groups} spokenJ={hz(turn.jHz)} onTurn={turn.set} onPickGroup={onPickGroup} slotName={slotLabel} />}
      </View>
      <View style={styles.turning}>
        <Button small label={quickText.turnBack} about={quickText.turnBackSpoken} onPress={() => turn.turnTo(turn.phiDeg - 5)} />
        <View style={styles.value}>
          <RichText kind="strong" align="center" text={quickText.marker(degree(turn.phiDeg), hz(turn.jHz))} />
          <Text kind="caption" tone="muted" align="center">{quickText.onDeviceShort}</Text>
        </View>
        <Button small label={quickText.turnOn} about={quickText.turnOnSpoken} onPress={() => turn.turnTo(turn.phiDeg + 5)} />
      </View>
      {finding.roots.length > 0 && (
        <View role="group" aria-label={quickText.rootsLabel} style={styles.roots}>
          {finding.roots.map((root) => <Button key={root.phiDeg} small label={degree(root.phiDeg)} pressed={isAt(root)} about={quickText.rootsLabel} onPress={() => turn.turnTo(root.phiDeg)} />)}
        </View>
      )}
    </View>
  );
}

function CurvePart({ finding, relation, reading, curve, turn }: Pick<Props, 'finding' | 'relation' | 'reading'> & { curve: DeviceCurve; turn: Turn }) {
  const [width, onLayout] = useWidth();
  const { isWide } = useLayout();
  const height = isWide ? 280 : PLOT_HEIGHT.curve;
  const notes = [finding.arcs.length > 0 ? quickText.curveNote : quickText.curveNoteBand, curve.even ? quickText.curveNoteEven : quickText.curveNoteUneven];
  return (
    <View style={styles.curve}>
      <View onLayout={onLayout} style={{ minHeight: height }}>
        {width > 0 && (
          <Curve width={width} height={height} points={curve.points} spreadHz={relation.spreadHz} reading={reading} roots={finding.roots} arcs={finding.arcs}
            shown={{ phiDeg: turn.phiDeg, jHz: turn.jHz }} label={quickText.curveLabel(rootsWords(finding.roots), arcsWords(finding.arcs))} />
        )}
      </View>
      <RichText kind="caption" tone="muted" text={notes.join(' ')} />
    </View>
  );
}

/** The same values as tables: roots, arcs, and the curve every 15°. */
function Twin({ finding, curve, spreadHz }: { finding: SingleBondFinding; curve: DeviceCurve; spreadHz: number }) {
  const say = quickText.columns;
  const every = curve.points.filter((point) => Math.round(point.phiDeg) % 30 === 0);
  return (
    <View style={styles.tables}>
      {finding.roots.length > 0 && (
        <Table caption={quickText.tableRoots} rows={finding.roots} rowKey={(root) => String(root.phiDeg)} columns={[
          { key: 'phi', head: say.root, rowHeader: true, numeric: true, cell: (root) => degree(root.phiDeg, 1) },
          { key: 'sector', head: say.sector, cell: (root) => SECTOR_SHORT[root.sector] },
        ]} />
      )}
      {finding.arcs.length > 0 && (
        <Table caption={quickText.tableArcs} rows={finding.arcs} rowKey={(arc) => String(arc.fromDeg)} columns={[
          { key: 'arc', head: say.arc, rowHeader: true, cell: (arc) => degreeRange(arc.fromDeg, arc.toDeg, 1) },
          { key: 'sectors', head: say.sector, cell: sectorsShort },
        ]} />
      )}
      <Table caption={quickText.tableCurve} rows={every} rowKey={(point) => String(point.phiDeg)} columns={[
        { key: 'phi', head: say.phi, rowHeader: true, numeric: true, cell: (point) => degree(point.phiDeg) },
        { key: 'j', head: say.j, numeric: true, tone: 'calculated', cell: (point) => fixed(point.jHz, 1) },
        { key: 'low', head: say.low, numeric: true, cell: (point) => fixed(Math.max(0, point.jHz - spreadHz), 1) },
        { key: 'high', head: say.high, numeric: true, cell: (point) => fixed(point.jHz + spreadHz, 1) },
      ]} />
    </View>
  );
}

const styles = StyleSheet.create({
  dial: { paddingHorizontal: space.lg, paddingVertical: space.sm, gap: space.sm },
  centre: { alignItems: 'center', width: '100%' },
  turning: { flexDirection: 'row', alignItems: 'center', justifyContent: 'center', gap: space.md },
  value: { minWidth: 150 },
  roots: { flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'center', gap: space.sm, paddingBottom: space.xs },
  curve: { paddingHorizontal: space.lg, paddingVertical: space.md, gap: space.sm },
  ruled: { borderTopWidth: border.hair, borderTopColor: color.ruleSoft },
  // wraps to one below the other where the two do not fit
  beside: { flexDirection: 'row', flexWrap: 'wrap' },
  narrow: { flexGrow: 1, flexShrink: 1, flexBasis: 232, minWidth: 0 },
  broad: { flexGrow: 2, flexShrink: 1, flexBasis: 300, minWidth: 0, borderTopWidth: 0 },
  tables: { gap: space.lg, paddingBottom: space.md },
});
