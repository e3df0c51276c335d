import { memo } from 'react';
import { View } from 'react-native';
import Svg, { Circle, G, Path, Rect, Text as SvgText, TSpan } from 'react-native-svg';
import { VictoryArea } from 'victory-native/lib/components/victory-area';
import { VictoryAxis } from 'victory-native/lib/components/victory-axis';
import { VictoryChart } from 'victory-native/lib/components/victory-chart';
import { VictoryLine } from 'victory-native/lib/components/victory-line';

import { fixed, degree } from '@/shared/format/number';
import { curvePlot, type CurvePlot } from '@/shared/plots/curvePlot';
import { linearScale } from '@/shared/plots/scale';
import { quickText } from '@/shared/text/quick';
import type { CurvePoint } from '@/shared/types/answer';
import type { Arc, HzReading, Root } from '@/shared/types/reading';

import { color, families } from '../theme/tokens';

export interface CurveProps {
  width: number;
  height: number;
  points: readonly CurvePoint[];
  spreadHz: number;
  /** null = the relation by itself */
  reading: Pick<HzReading, 'jHz' | 'seHz' | 'limit'> | null;
  roots: readonly Root[];
  arcs: readonly Arc[];
  /** angle shown on the dial, and what this relation gives there */
  shown: CurvePoint | null;
  /** spoken name of the whole drawing */
  label: string;
}

const PADDING = { left: 34, right: 14, top: 30, bottom: 30 };
const NO_READING = { jHz: 0, seHz: 0, limit: 'none' } as const;
const RING = 5;
const tick = { fontFamily: families.sans, fontSize: 13, fill: color.muted };

/**
 * J against φ: the relation with its spread as a band, the measured J as a line with its error, allowed arcs shaded and as bars on
 * the axis, roots as rings. Victory draws axes, band and line; what turns with the dial lies above it, so that turning redraws
 * one dot only.
 */
export function Curve({ width, height, points, spreadHz, reading, roots, arcs, shown, label }: CurveProps) {
  const plot = curvePlot({ width, height, padding: PADDING, points, spreadHz, reading: reading ?? NO_READING, roots, arcs });
  const bottomHz = plot.yTicks[0]?.hz ?? 0;
  const x = linearScale([-180, 180], [plot.axis.x0, plot.axis.x1]);
  const y = linearScale([bottomHz, plot.topHz], [plot.axis.y0, plot.axis.y1]);
  const { x0, x1, y0, y1 } = plot.axis;
  return (
    <View role="img" aria-label={label} style={{ width, height }}>
      <Svg width={width} height={height} viewBox={`0 0 ${width} ${height}`}>
        {plot.bars.map((bar) => <Rect key={`${bar.fromDeg}`} x={bar.x} y={y1} width={bar.width} height={y0 - y1} fill={color.calculatedTint} />)}
        {plot.yTicks.map((line) => <Path key={line.hz} d={`M${x0} ${line.y}H${x1}`} stroke={color.ruleSoft} strokeWidth={1} />)}
        <Relation width={width} height={height} points={points} spreadHz={spreadHz} bottomHz={bottomHz} topHz={plot.topHz} yTicks={plot.yTicks} />
        {reading && (
          <G>
            <Rect x={x0} y={plot.measured.top} width={x1 - x0} height={Math.max(1, plot.measured.height)} fill={color.measured} fillOpacity={0.18} />
            <Path d={`M${x0} ${plot.measured.y}H${x1}`} stroke={color.measured} strokeWidth={1.5} />
            <Rect x={x0 - 5} y={plot.measured.y - 5} width={10} height={10} fill={color.measured} />
          </G>
        )}
        {plot.bars.map((bar) => <Path key={`${bar.fromDeg}`} d={`M${bar.x} ${y0}h${bar.width}`} stroke={color.calculated} strokeWidth={6} />)}
        {plot.rings.map((ring) => <Ring key={ring.x} ring={ring} shown={shown} />)}
        {shown && <Circle cx={x(shown.phiDeg)} cy={y(Math.min(plot.topHz, Math.max(bottomHz, shown.jHz)))} r={6} fill={color.calculated} stroke={color.calculated} strokeWidth={2.5} />}
        {reading && <MeasuredWord text={quickText.measuredWord(fixed(reading.jHz, 1))} plot={plot} />}
        <SvgText x={x0 - 22} y={y1 - 12} fontFamily={families.sans} fontSize={13} fill={color.muted}>
          <TSpan fontFamily={families.serif} fontStyle="italic">J</TSpan> / Hz
        </SvgText>
        <SvgText x={width - 2} y={y1 - 12} textAnchor="end" fontFamily={families.sans} fontSize={13} fill={color.muted}>
          <TSpan fontFamily={families.serif} fontStyle="italic">φ</TSpan>, signed
        </SvgText>
      </Svg>
    </View>
  );
}

/** Axes, band and line: unchanged while the dial turns. */
const Relation = memo(function Relation({ width, height, points, spreadHz, bottomHz, topHz, yTicks }: {
  width: number; height: number; points: readonly CurvePoint[]; spreadHz: number; bottomHz: number; topHz: number; yTicks: CurvePlot['yTicks'];
}) {
  const clamp = (hz: number) => Math.min(topHz, Math.max(bottomHz, hz));
  const line = points.map((point) => ({ x: point.phiDeg, y: clamp(point.jHz) }));
  const band = points.map((point) => ({ x: point.phiDeg, y: clamp(point.jHz + spreadHz), y0: clamp(point.jHz - spreadHz) }));
  return (
    <G>
      <VictoryChart standalone={false} width={width} height={height} padding={PADDING} domain={{ x: [-180, 180], y: [bottomHz, topHz] }}>
        <VictoryAxis dependentAxis axisValue={-180} tickValues={yTicks.map(({ hz }) => hz)} tickFormat={(hz: number) => fixed(hz, 0)}
          style={{ axis: { stroke: 'none' }, ticks: { stroke: 'none', size: 0 }, grid: { stroke: 'none' }, tickLabels: { ...tick, padding: 8 } }} />
        <VictoryAxis axisValue={bottomHz} tickValues={width < 280 ? [-180, -90, 0, 90, 180] : [-180, -120, -60, 0, 60, 120, 180]} tickFormat={(deg: number) => degree(deg)}
          style={{ axis: { stroke: color.edge, strokeWidth: 1 }, ticks: { stroke: color.edge, size: 5 }, grid: { stroke: 'none' }, tickLabels: { ...tick, padding: 4 } }} />
        <VictoryArea data={band} interpolation="linear" style={{ data: { fill: color.calculated, fillOpacity: 0.22, stroke: 'none' } }} />
        <VictoryLine data={line} interpolation="linear" style={{ data: { stroke: color.calculated, strokeWidth: 2.5 } }} />
      </VictoryChart>
    </G>
  );
});

function Ring({ ring, shown }: { ring: CurvePlot['rings'][number]; shown: CurvePoint | null }) {
  if (ring.width > 0) {
    return <Rect x={ring.x - ring.width / 2 - RING} y={ring.y - RING} width={ring.width + 2 * RING} height={2 * RING} rx={RING} fill={color.card} stroke={color.calculated} strokeWidth={2.5} />;
  }
  const isShown = shown !== null && ring.roots.some((root) => Math.abs(root.phiDeg - shown.phiDeg) < 0.5);
  return <Circle cx={ring.x} cy={ring.y} r={RING} fill={isShown ? color.calculated : color.card} stroke={color.calculated} strokeWidth={2.5} />;
}

/** The word on the measured line, where the curve leaves it most room; its halo keeps it readable over grid and band. */
function MeasuredWord({ text, plot }: { text: string; plot: CurvePlot }) {
  const quarter = plot.axis.x0 + (plot.axis.x1 - plot.axis.x0) / 4;
  const above = plot.measured.y - plot.axis.y1 > 24;
  const at = { x: quarter, y: above ? plot.measured.y - 9 : plot.measured.y + 19, textAnchor: 'middle', fontFamily: families.sans, fontSize: 14, fontWeight: '600' } as const;
  return (
    <G>
      <SvgText {...at} fill="none" stroke={color.card} strokeWidth={4} strokeLinejoin="round">{text}</SvgText>
      <SvgText {...at} fill={color.measured}>{text}</SvgText>
    </G>
  );
}
