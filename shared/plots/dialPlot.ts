import type { Arc } from '../types/reading';
import { coordinate } from './scale';

/**
 * The dial: a Newman projection in a ring. φ grows clockwise from the top, where the front H stands; the rear H stands at φ.
 * `±120` positions are seen from the front.
 */
export interface DialPlotInput {
  size: number;
  radius: number;
  phiDeg: number;
  arcs: readonly Arc[];
  /** labels of [+120°, −120°] from the coupled H of that carbon; null = groups not given */
  groups: { front: readonly [string, string]; rear: readonly [string, string] } | null;
}

interface Point { x: number; y: number }
interface Spoke { from: Point; to: Point; label: string; at: Point; role: 'front-h' | 'rear-h' | 'front' | 'rear' }
export interface DialPlot {
  centre: Point;
  radius: number;
  ringWidth: number;
  rimRadius: number;
  /** open arc paths, to be stroked with the ring's width */
  arcs: string[];
  marker: Point;
  sectors: { label: string; at: Point }[];
  ticks: { from: Point; to: Point }[];
  spokes: Spoke[];
}

const SECTORS: readonly [string, number][] = [['sp', 0], ['+sc', 60], ['+ac', 120], ['ap', 180], ['−ac', -120], ['−sc', -60]];
const BORDERS = [30, 90, 150, -150, -90, -30];

export function dialPlot(input: DialPlotInput): DialPlot {
  const c = input.size / 2;
  const at = (radius: number, deg: number): Point => ({ x: c + radius * Math.sin((deg * Math.PI) / 180), y: c - radius * Math.cos((deg * Math.PI) / 180) });
  const R = input.radius;
  const ringWidth = R * 0.115;
  const rim = R * 0.42;
  const reach = R - ringWidth / 2 - R * 0.11;
  const arcPath = (fromDeg: number, toDeg: number): string => {
    // a full turn has no start: two halves
    if (toDeg - fromDeg >= 360 - 1e-9) return arcPath(fromDeg, fromDeg + 180) + arcPath(fromDeg + 180, fromDeg + 359.99);
    const a = at(R, fromDeg);
    const b = at(R, toDeg);
    return `M${coordinate(a.x)} ${coordinate(a.y)}A${coordinate(R)} ${coordinate(R)} 0 ${toDeg - fromDeg > 180 ? 1 : 0} 1 ${coordinate(b.x)} ${coordinate(b.y)}`;
  };
  const spoke = (role: Spoke['role'], deg: number, start: number, label: string): Spoke => ({
    role, label, from: at(start, deg), to: at(reach - R * 0.13, deg), at: at(reach, deg),
  });
  const { front, rear } = input.groups ?? { front: ['', ''] as const, rear: ['', ''] as const };
  return {
    centre: { x: c, y: c }, radius: R, ringWidth, rimRadius: rim,
    arcs: input.arcs.map((arc) => arcPath(arc.fromDeg, arc.toDeg)),
    marker: at(R, input.phiDeg),
    sectors: SECTORS.map(([label, deg]) => ({ label, at: at(R + ringWidth / 2 + R * 0.15, deg) })),
    ticks: BORDERS.map((deg) => ({ from: at(R - ringWidth / 2 - 2, deg), to: at(R + ringWidth / 2 + 2, deg) })),
    spokes: [
      spoke('rear', input.phiDeg + 120, rim, rear[0]), spoke('rear', input.phiDeg - 120, rim, rear[1]), spoke('rear-h', input.phiDeg, rim, 'H'),
      spoke('front', 120, 0, front[0]), spoke('front', -120, 0, front[1]), spoke('front-h', 0, 0, 'H'),
    ],
  };
}
