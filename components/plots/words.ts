import { degree, degreeRange } from '@/shared/format/number';
import { SECTOR_SHORT, SECTOR_WORDS } from '@/shared/format/words';
import { quickText } from '@/shared/text/quick';
import type { Arc, Root } from '@/shared/types/reading';

const listed = (parts: readonly string[]) => (parts.length === 0 ? quickText.noneWord : parts.join('; '));

/** What a plot shows, as text for its name. */
export const rootsWords = (roots: readonly Root[]) => listed(roots.map((root) => `${degree(root.phiDeg)}, ${SECTOR_WORDS[root.sector]}`));
export const arcsWords = (arcs: readonly Arc[]) => listed(arcs.map((arc) => degreeRange(arc.fromDeg, arc.toDeg)));
export const sectorsShort = (arc: Arc) => arc.sectors.map((sector) => SECTOR_SHORT[sector]).join(', ');
