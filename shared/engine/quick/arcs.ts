import type { Arc, Sector } from '../../types/reading';
import type { Degrees } from '../../types/units';
import { degree, degreeRange } from '../../format/number';
import { SECTOR_SHORT, SECTOR_WORDS } from '../../format/words';
import { sectorsOf } from '../relations/angles';

/** One allowed stretch as a sentence names it. */
export interface ArcPart {
  fromDeg: Degrees;
  toDeg: Degrees;
  sectors: Sector[];
  text: string;
  /** the same without the name of the angle, for all but the first in a sentence */
  short: string;
  /** all of it within sp: eclipsed, rare in an open chain */
  eclipsed: boolean;
}

const unsigned = (s: string): string => s.replace(/^[+−]/, '');

function nameOf(sectors: readonly Sector[], even: boolean): string {
  const dress = (s: string): string => (even ? unsigned(s) : s);
  const [first] = sectors;
  const last = sectors[sectors.length - 1];
  if (!first || !last) return '';
  if (sectors.length === 1) return dress(SECTOR_WORDS[first]);
  return `${dress(SECTOR_SHORT[first])} to ${dress(SECTOR_SHORT[last])}`;
}

/** The halves of an even relation as one: what of each arc lies on 0 to 180. */
function half(arcs: readonly Arc[]): { fromDeg: Degrees; toDeg: Degrees }[] {
  return arcs
    .map(({ fromDeg, toDeg }) => ({ fromDeg: Math.max(0, fromDeg), toDeg: Math.min(180, toDeg) }))
    .filter(({ fromDeg, toDeg }) => toDeg > fromDeg + 1e-9);
}

/** Arcs in words: signed where the halves differ, by size of φ where they mirror each other. The largest J side (ap) comes first. */
export function arcParts(arcs: readonly Arc[], even: boolean, angle: string): ArcPart[] {
  const stretches = even ? half(arcs) : arcs.map(({ fromDeg, toDeg }) => ({ fromDeg, toDeg }));
  return stretches
    .map(({ fromDeg, toDeg }) => {
      const sectors = sectorsOf(fromDeg, toDeg);
      const range = even && fromDeg === 0 ? `up to ${degree(toDeg)}` : degreeRange(fromDeg, toDeg);
      const name = nameOf(sectors, even);
      return { fromDeg, toDeg, sectors, text: `${name}, ${angle} ${range}`, short: `${name}, ${range}`, eclipsed: sectors.length === 1 && sectors[0] === 'sp' };
    })
    .sort((a, b) => fromAnti(a) - fromAnti(b) || a.fromDeg - b.fromDeg);
}

const fromAnti = ({ fromDeg, toDeg }: { fromDeg: Degrees; toDeg: Degrees }): Degrees => {
  const middle = (fromDeg + toDeg) / 2;
  return 180 - Math.abs(middle > 180 ? middle - 360 : middle);
};

/** Parts as one run of a sentence: the angle is named once. */
export const partTexts = (parts: readonly ArcPart[]): string[] => parts.map((p, i) => (i === 0 ? p.text : p.short));

/** Share of the circle that arcs cover. */
export const coveredShare = (arcs: readonly Arc[]): number => arcs.reduce((s, a) => s + a.toDeg - a.fromDeg, 0) / 360;

/** Sectors that no arc enters. */
export function closedSectors(arcs: readonly Arc[], even: boolean): string[] {
  const open = new Set(arcs.flatMap((a) => a.sectors));
  const all: Sector[] = ['sp', '+sc', '+ac', 'ap', '-ac', '-sc'];
  const closed = all.filter((s) => !open.has(s)).map((s) => (even ? unsigned(SECTOR_WORDS[s]) : SECTOR_WORDS[s]));
  return [...new Set(closed)];
}
