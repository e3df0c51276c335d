import { relationRegistry } from '@/server/relations/registry';
import { arcsBetween, bindCurve, rootsOf } from '@/shared/engine';
import type { Substituent } from '@/shared/types/relation';

import { drawFrom } from '../lib/draw';
import { RELATION_IDS } from '../check/adapters/relationIds';
import { atMost, type Figure, median, rounded } from './figure';

const SAMPLES = 20_000;
const WARM_UP = 5_000;
/** 1.96 σ of a reading of ± 0.2 Hz with the relation's spread of 0.5 Hz */
const TOLERANCE_HZ = 1.96 * Math.hypot(0.2, 0.5);

/** One inversion of the generalised equation: substituents put in, every root, and the arcs at 95 %; each sample timed by itself. */
export function invertHla(): Figure[] {
  const row = relationRegistry().find(RELATION_IDS.generalised);
  if (row === undefined) throw new Error(`${RELATION_IDS.generalised} is not held.`);
  const draw = drawFrom(11);
  const huggins = [0.4, 0.85, 1.3, 1.7, 0.95, 0.75, 0.45];
  const one = (): number => huggins[Math.floor(draw() * huggins.length)] as number;
  const samples = Array.from({ length: SAMPLES }, () => ({
    jHz: 0.5 + draw() * 12,
    substituents: Array.from({ length: 1 + Math.floor(draw() * 4) }, (): Substituent => ({
      dchiAlpha: one(), dchiBeta: Array.from({ length: Math.floor(draw() * 4) }, one), xi: draw() < 0.5 ? 1 : -1,
    })),
  }));
  let roots = 0;
  const invert = ({ jHz, substituents }: (typeof samples)[number]): void => {
    const curve = bindCurve(row, { substituents });
    roots += rootsOf(curve, jHz).length + arcsBetween(curve, jHz - TOLERANCE_HZ, jHz + TOLERANCE_HZ).length;
  };
  for (const sample of samples.slice(0, WARM_UP)) invert(sample);
  const times = samples.map((sample) => {
    const begun = process.hrtime.bigint();
    invert(sample);
    return Number(process.hrtime.bigint() - begun) / 1e6;
  });
  const ms = median(times);
  // the sum is printed so that the work cannot be optimised away
  return [{ name: 'invert-hla-ms', value: rounded(ms), unit: 'ms', runs: SAMPLES, ...atMost(0.03, ms), rootsAndArcs: roots }];
}
