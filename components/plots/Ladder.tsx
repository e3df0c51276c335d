import { View } from 'react-native';
import Svg, { G, Line, Path, Rect, Text as SvgText, TSpan } from 'react-native-svg';

import { fixed } from '@/shared/format/number';
import { ladderPlot } from '@/shared/plots/ladderPlot';
import { quickText } from '@/shared/text/quick';
import type { LadderRow } from '@/shared/types/answer';
import type { HzReading } from '@/shared/types/reading';

import { color, families } from '../theme/tokens';

/** Known couplings of each geometry as bars and ticks, the reading as a band across. It grows with the reading; overlap is drawn. */
export function Ladder({ width, rows, reading, label }: { width: number; rows: readonly LadderRow[]; reading: Pick<HzReading, 'jHz' | 'seHz'> | null; label: string }) {
  const padding = { left: 76, right: 14, top: reading ? 36 : 8, bottom: 28 };
  const plot = ladderPlot({ width, padding, rowHeight: 46, rows, reading: reading ?? { jHz: 0, seHz: 0 } });
  const text = { fontFamily: families.sans, fontSize: 13, fill: color.muted };
  return (
    <View role="img" aria-label={label} style={{ width, height: plot.height }}>
      <Svg width={width} height={plot.height} viewBox={`0 0 ${width} ${plot.height}`}>
        {plot.xTicks.map((tick) => (
          <G key={tick.hz}>
            <Line x1={tick.x} y1={padding.top - 4} x2={tick.x} y2={plot.axisY} stroke={color.ruleSoft} strokeWidth={1} />
            {tick.labelled && <SvgText {...text} x={tick.x} y={plot.height - 7} textAnchor="middle">{fixed(tick.hz, 0)}</SvgText>}
          </G>
        ))}
        {plot.rows.map((row) => (
          <G key={row.geometry}>
            <Rect x={row.full.x} y={row.y} width={row.full.width} height={plot.barHeight} rx={2} fill={color.calculated} fillOpacity={0.2} />
            {row.inClass && <Rect x={row.inClass.x} y={row.y} width={Math.max(3, row.inClass.width)} height={plot.barHeight} rx={1} fill={color.calculated} />}
            {row.ticks.map((tick, at) => (
              <Line key={at} x1={tick.x} y1={row.y + plot.barHeight + 3} x2={tick.x} y2={row.y + plot.barHeight + 9} stroke={color.calculated} strokeWidth={1.5} />
            ))}
            <SvgText x={0} y={row.y + plot.barHeight / 2 + 5} fontFamily={families.sans} fontSize={15} fontWeight="600" fill={color.ink}>{quickText.geometry[row.geometry]}</SvgText>
          </G>
        ))}
        <Path d={`M${padding.left} ${plot.axisY}H${width - padding.right}`} stroke={color.edge} strokeWidth={1} />
        {reading && (
          <G>
            <Rect x={plot.measured.left} y={padding.top - 8} width={plot.measured.width} height={plot.axisY - padding.top + 8} fill={color.measured} fillOpacity={0.28} />
            <Path d={`M${plot.measured.x} ${padding.top - 8}V${plot.axisY}`} stroke={color.measured} strokeWidth={2} />
            <MeasuredLabel x={plot.measured.x} y={padding.top - 14} width={width} text={fixed(reading.jHz, 1)} />
          </G>
        )}
        <SvgText {...text} x={0} y={plot.height - 7}><TSpan fontFamily={families.serif} fontStyle="italic">J</TSpan> / Hz</SvgText>
      </Svg>
    </View>
  );
}

function MeasuredLabel({ x, y, width, text }: { x: number; y: number; width: number; text: string }) {
  const centre = Math.min(Math.max(x, 34), width - 34);
  return (
    <G>
      <Rect x={centre - 27} y={y - 10} width={10} height={10} fill={color.measured} />
      <SvgText x={centre - 12} y={y} fontFamily={families.sans} fontSize={15} fontWeight="700" fill={color.measured}>{text}</SvgText>
    </G>
  );
}
