import { useMemo } from 'react';
import { View } from 'react-native';

import { degree, fixed } from '@/shared/format/number';
import { quickText } from '@/shared/text/quick';
import type { CurveInputs } from '@/shared/engine/relations/curve';

import { useLayout } from '../theme/useLayout';
import { Table } from '../ui/Table';
import { Disclosure } from '../ui/Disclosure';
import { Curve } from './Curve';
import { PlotBox } from './PlotBox';
import { useDeviceCurve } from './useDeviceCurve';
import { useWidth } from './useWidth';

export interface RelationCurveProps {
  relation: string;
  spreadHz: number;
  inputs: CurveInputs;
  /** an angle to mark, with what the server gives there */
  at?: { phiDeg: number; jHz: number } | null;
}

/** The curve of a relation by itself: its spread as a band, and its table twin. */
export function RelationCurve({ relation, spreadHz, inputs, at = null }: RelationCurveProps) {
  const { curve, isPending } = useDeviceCurve(relation, inputs);
  const [width, onLayout] = useWidth();
  const { isWide } = useLayout();
  const height = isWide ? 320 : 250;
  const rows = useMemo(() => curve?.points.filter((point) => Math.round(point.phiDeg) % 30 === 0) ?? [], [curve]);
  if (!curve) return <PlotBox bond="single" height={height} note={isPending ? quickText.plotsLoading : quickText.noCurve} />;
  const say = quickText.columns;
  return (
    <View>
      <View onLayout={onLayout} style={{ minHeight: height, marginHorizontal: 16 }}>
        {width > 0 && <Curve width={width} height={height} points={curve.points} spreadHz={spreadHz} reading={null} roots={[]} arcs={[]} shown={at} label={quickText.relationCurveLabel(fixed(curve.reach.minHz, 1), fixed(curve.reach.maxHz, 1))} />}
      </View>
      <Disclosure label={quickText.relationTable} openLabel={quickText.hideTable}>
        <Table caption={quickText.tableCurve} rows={rows} rowKey={(point) => String(point.phiDeg)} columns={[
          { key: 'phi', head: say.phi, rowHeader: true, numeric: true, cell: (point) => degree(point.phiDeg) },
          { key: 'j', head: say.j, numeric: true, tone: 'calculated', cell: (point) => fixed(point.jHz, 2) },
          { key: 'low', head: say.low, numeric: true, cell: (point) => fixed(Math.max(0, point.jHz - spreadHz), 1) },
          { key: 'high', head: say.high, numeric: true, cell: (point) => fixed(point.jHz + spreadHz, 1) },
        ]} />
      </Disclosure>
    </View>
  );
}
