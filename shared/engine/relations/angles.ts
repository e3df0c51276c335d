import type { Sector } from '../../types/reading';
import type { Degrees } from '../../types/units';
import { wrapDegrees } from '../math/angles';

/** Klyne–Prelog sectors by their borders, once around from −180 (IUPAC Gold Book, torsion angle: sp ±30, sc 30–90, ac 90–150, ap 150–180). */
const SECTORS: readonly { from: Degrees; to: Degrees; sector: Sector }[] = [
  { from: -180, to: -150, sector: 'ap' },
  { from: -150, to: -90, sector: '-ac' },
  { from: -90, to: -30, sector: '-sc' },
  { from: -30, to: 30, sector: 'sp' },
  { from: 30, to: 90, sector: '+sc' },
  { from: 90, to: 150, sector: '+ac' },
  { from: 150, to: 180, sector: 'ap' },
];

/** The sector of one angle; an angle on a border belongs to the sector that begins there. */
export function sectorOf(phiDeg: Degrees): Sector {
  const phi = wrapDegrees(phiDeg);
  return SECTORS.find(({ from, to }) => phi >= from && phi < to)?.sector ?? 'ap';
}

/** Every sector that a stretch enters, in the order it is met; a stretch that only touches a border does not enter. */
export function sectorsOf(fromDeg: Degrees, toDeg: Degrees): Sector[] {
  const hair = 1e-9;
  const met: Sector[] = [];
  for (const turn of [-360, 0, 360]) {
    for (const { from, to, sector } of SECTORS) {
      if (to + turn > fromDeg + hair && from + turn < toDeg - hair && met[met.length - 1] !== sector) met.push(sector);
    }
  }
  if (met.length === 0) return [sectorOf((fromDeg + toDeg) / 2)];
  return met.length > 1 && met[0] === met[met.length - 1] ? met.slice(0, -1) : met;
}
