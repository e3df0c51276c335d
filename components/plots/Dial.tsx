import { useEffect, useRef } from 'react';
import { Pressable, StyleSheet, View } from 'react-native';
import Svg, { Circle, Line, Path, Text as SvgText } from 'react-native-svg';

import { degree } from '@/shared/format/number';
import { dialPlot } from '@/shared/plots/dialPlot';
import { quickText } from '@/shared/text/quick';
import type { GroupText } from '@/shared/types/group';
import type { Arc } from '@/shared/types/reading';

import { color, families, size as sizes } from '../theme/tokens';
import { asElement, web, type KeyPress } from '../ui/webProps';

export interface DialSlot { side: 'front' | 'rear'; at: 0 | 1 }
export interface DialProps {
  size: number;
  phiDeg: number;
  arcs: readonly Arc[];
  /** arcs closed by other evidence */
  faint?: readonly Arc[];
  groups: { front: readonly [GroupText, GroupText]; rear: readonly [GroupText, GroupText] } | null;
  /** what the shown angle gives, for its spoken value */
  spokenJ: string;
  onTurn?: (phiDeg: number) => void;
  onPickGroup?: (slot: DialSlot) => void;
  slotName?: (slot: DialSlot) => string;
}

/** φ in (−180, 180]. */
export const wrap = (deg: number): number => {
  const turned = ((((deg + 180) % 360) + 360) % 360) - 180;
  return turned === -180 ? 180 : turned;
};

/** First atom for a letter; an H that is not the coupled one is H′. */
const letter = (group: GroupText) => (group === 'H' ? 'H′' : (/^[A-Z][a-z]?/.exec(group)?.[0] ?? ''));

/**
 * A Newman projection in a ring. The ring carries the allowed arcs and the Klyne–Prelog sectors; the marker on it is a slider
 * (drag, arrow keys), and each letter a button that changes its group.
 */
export function Dial({ size, phiDeg, arcs, faint = [], groups, spokenJ, onTurn, onPickGroup, slotName }: DialProps) {
  const radius = size * 0.35;
  const isSmall = size < 200;
  const letters = groups && { front: groups.front.map(letter) as [string, string], rear: groups.rear.map(letter) as [string, string] };
  const plot = dialPlot({ size, radius, phiDeg, arcs, groups: letters });
  const pale = dialPlot({ size, radius, phiDeg, arcs: faint, groups: null }).arcs;
  const box = useRef<View>(null);
  return (
    <View ref={box} style={{ width: size, height: size }}>
      <Svg width={size} height={size} viewBox={`0 0 ${size} ${size}`} aria-hidden>
        <Circle cx={plot.centre.x} cy={plot.centre.y} r={radius} fill="none" stroke={color.rule} strokeWidth={plot.ringWidth} />
        {pale.map((d) => <Path key={d} d={d} fill="none" stroke={color.calculated} strokeOpacity={0.35} strokeWidth={plot.ringWidth} />)}
        {plot.arcs.map((d) => <Path key={d} d={d} fill="none" stroke={color.calculated} strokeWidth={plot.ringWidth} />)}
        {plot.ticks.map((tick) => <Line key={`${tick.from.x} ${tick.from.y}`} x1={tick.from.x} y1={tick.from.y} x2={tick.to.x} y2={tick.to.y} stroke={color.muted} strokeWidth={1} />)}
        {!isSmall && plot.sectors.map((sector) => (
          <SvgText key={sector.label} x={sector.at.x} y={sector.at.y + 4.5} textAnchor="middle" fontFamily={families.sans} fontSize={13} fill={color.muted}>{sector.label}</SvgText>
        ))}
        {plot.spokes.filter((spoke) => spoke.role.startsWith('rear')).map((spoke) => <Spoke key={`${spoke.role}${spoke.at.x}`} spoke={spoke} bare={isSmall} />)}
        <Circle cx={plot.centre.x} cy={plot.centre.y} r={plot.rimRadius} fill={color.card} stroke={color.ink} strokeWidth={2} />
        {plot.spokes.filter((spoke) => spoke.role.startsWith('front')).map((spoke) => <Spoke key={`${spoke.role}${spoke.at.x}`} spoke={spoke} bare={isSmall} />)}
        <Circle cx={plot.centre.x} cy={plot.centre.y} r={3.5} fill={color.ink} />
        <Circle cx={plot.marker.x} cy={plot.marker.y} r={7} fill={color.card} stroke={color.calculated} strokeWidth={3} />
      </Svg>
      {groups && onPickGroup && slotName && !isSmall && plot.spokes.filter((spoke) => !spoke.role.endsWith('-h')).map((spoke, index) => {
        const slot: DialSlot = { side: spoke.role === 'front' ? 'front' : 'rear', at: (index % 2) as 0 | 1 };
        return (
          <Pressable key={index} role="button" aria-label={quickText.changeGroup(slotName(slot), groups[slot.side][slot.at])} onPress={() => onPickGroup(slot)}
            {...web({ 'aria-haspopup': 'dialog' })} style={[styles.touch, { left: spoke.at.x - sizes.touch / 2, top: spoke.at.y - sizes.touch / 2 }]} />
        );
      })}
      {onTurn && <Marker at={plot.marker} phiDeg={phiDeg} spokenJ={spokenJ} onTurn={onTurn} centre={plot.centre} box={() => asElement(box.current)} />}
    </View>
  );
}

function Spoke({ spoke, bare }: { spoke: ReturnType<typeof dialPlot>['spokes'][number]; bare: boolean }) {
  const coupled = spoke.role.endsWith('-h');
  const rear = spoke.role.startsWith('rear');
  const bond = spoke.role === 'rear-h' ? color.calculated : rear ? color.edge : color.ink;
  const word = spoke.role === 'rear-h' ? color.calculated : rear ? color.muted : color.ink;
  return (
    <>
      <Line x1={spoke.from.x} y1={spoke.from.y} x2={spoke.to.x} y2={spoke.to.y} stroke={bond} strokeWidth={coupled ? 3.5 : 2.5} strokeLinecap="round" />
      {!bare && spoke.label !== '' && (
        <SvgText x={spoke.at.x} y={spoke.at.y + 5} textAnchor="middle" fontFamily={families.sans} fontSize={15} fontWeight={coupled ? '700' : '600'} fill={word}>{spoke.label}</SvgText>
      )}
    </>
  );
}

const STEP: Record<string, number> = { ArrowRight: 1, ArrowUp: 1, ArrowLeft: -1, ArrowDown: -1, PageUp: 15, PageDown: -15 };

function Marker({ at, centre, phiDeg, spokenJ, onTurn, box }: {
  at: { x: number; y: number }; centre: { x: number; y: number }; phiDeg: number; spokenJ: string; onTurn: (phiDeg: number) => void; box: () => HTMLElement | null;
}) {
  const handle = useRef<View>(null);
  const latest = useRef({ onTurn, centre, box });
  useEffect(() => { latest.current = { onTurn, centre, box }; });
  useEffect(() => {
    const node = asElement(handle.current);
    if (!node) return undefined;
    const move = (event: PointerEvent) => {
      if (!node.hasPointerCapture(event.pointerId)) return;
      const frame = latest.current.box()?.getBoundingClientRect();
      if (!frame) return;
      const angle = Math.atan2(event.clientX - frame.left - latest.current.centre.x, latest.current.centre.y - (event.clientY - frame.top));
      latest.current.onTurn(wrap(Math.round((angle * 180) / Math.PI)));
    };
    const down = (event: PointerEvent) => {
      event.preventDefault();
      node.focus();
      node.setPointerCapture(event.pointerId);
    };
    node.addEventListener('pointerdown', down);
    node.addEventListener('pointermove', move);
    return () => {
      node.removeEventListener('pointerdown', down);
      node.removeEventListener('pointermove', move);
    };
  }, []);
  const press = (event: KeyPress) => {
    const by = STEP[event.key];
    if (by === undefined) return;
    event.preventDefault();
    onTurn(wrap(Math.round(phiDeg) + by));
  };
  return (
    <View ref={handle} role="slider" aria-label={quickText.dialTurn.replaceAll('_', '')} aria-valuemin={-180} aria-valuemax={180} aria-valuenow={Math.round(phiDeg)}
      aria-valuetext={quickText.dialLabel(degree(phiDeg), spokenJ)} {...web({ tabIndex: 0, onKeyDown: press })}
      style={[styles.touch, styles.round, grab, { left: at.x - sizes.touch / 2, top: at.y - sizes.touch / 2 }]} />
  );
}

const grab: object = { touchAction: 'none', cursor: 'grab' };
const styles = StyleSheet.create({
  touch: { position: 'absolute', width: sizes.touch, height: sizes.touch },
  round: { borderRadius: sizes.touch / 2 },
});
