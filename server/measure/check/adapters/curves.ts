import { evaluateResponse, invertResponse } from '@/shared/contracts/relations';

import type { Api } from '../../lib/api';
import { drawFrom } from '../../lib/draw';
import { asList, asNumber, asRecord } from '../../lib/read';
import type { Came } from '../types';
import { type Adapter, notCovered, unknownKey } from './adapter';
import { refusedOr } from './quickLook';

/** One path and no other is held by the H–C–C–H relations. */
const PATH = 'H-C-C-H';
const MIRROR_SAMPLES = 200;
const MIRROR_TOLERANCE_HZ = 1e-9;

interface Substituent {
  dchiAlpha: number;
  dchiBeta: number[];
  xi: 1 | -1;
}

/** J of a relation without substituent terms at one φ. */
export const curveAt = (relation: string): Adapter => async (given, api) => {
  const stranger = unknownKey(given, ['path', 'phi_deg']);
  if (stranger !== undefined) return notCovered(`${stranger} has no place in the product yet`);
  if (given.path !== undefined && given.path !== PATH) return notCovered(`no relation for the path ${JSON.stringify(given.path)} yet`);
  return evaluate(api, { relation, phiDeg: given.phi_deg });
};

/** J of the generalised equation at one φ with the substituents spelled out. */
export const generalisedAt = (relation: string): Adapter => async (given, api) => {
  const stranger = unknownKey(given, ['phi_deg', 'set', 'substituents']);
  if (stranger !== undefined) return notCovered(`${stranger} has no place in the product yet`);
  return evaluate(api, { relation, set: given.set, phiDeg: given.phi_deg, substituents: substituentsFrom(given.substituents) });
};

/** All φ of one J inside the range asked for. */
export const inverseOf = (relation: string): Adapter => async (given, api) => {
  const stranger = unknownKey(given, ['J', 'range_deg']);
  if (stranger !== undefined) return notCovered(`${stranger} has no place in the product yet`);
  const [from = -180, to = 180] = (asList(given.range_deg) ?? []).map(Number);
  const answer = await api.post('/api/relations/invert', { relation, jHz: given.J });
  if (answer.status !== 200) return refusedOr(answer);
  const { roots } = invertResponse.parse(answer.body);
  return { kind: 'list', values: roots.map((root) => root.phiDeg).filter((phiDeg) => phiDeg >= from && phiDeg <= to) };
};

/** A mirror image has the same J: φ and every ξ change sign together. Sampled over substituents and, besides the φ given, the whole circle. */
export const mirrorRule = (relation: string): Adapter => async (given, api) => {
  const phiGiven = asNumber(given.phi_deg);
  if (phiGiven === undefined || given.xi_all_flipped_and_phi_negated !== true) return notCovered('another property than the mirror rule');
  const draw = drawFrom(20260);
  let worst = 0;
  for (let sample = 0; sample < MIRROR_SAMPLES; sample += 1) {
    const phiDeg = sample % 2 === 0 ? phiGiven : draw() * 360 - 180;
    const substituents = Array.from({ length: 1 + Math.floor(draw() * 4) }, (): Substituent => ({
      dchiAlpha: draw() * 1.7,
      dchiBeta: Array.from({ length: Math.floor(draw() * 4) }, () => draw() * 1.7),
      xi: draw() < 0.5 ? 1 : -1,
    }));
    const mirrored = substituents.map((one): Substituent => ({ ...one, xi: one.xi === 1 ? -1 : 1 }));
    const here = await evaluate(api, { relation, set: given.set, phiDeg, substituents });
    const there = await evaluate(api, { relation, set: given.set, phiDeg: -phiDeg, substituents: mirrored });
    if (here.kind !== 'value' || there.kind !== 'value') return here.kind === 'value' ? there : here;
    worst = Math.max(worst, Math.abs(here.value - there.value));
  }
  return { kind: 'property', holds: worst <= MIRROR_TOLERANCE_HZ, detail: `largest difference ${worst} Hz over ${MIRROR_SAMPLES} samples` };
};

async function evaluate(api: Api, request: Record<string, unknown>): Promise<Came> {
  const answer = await api.post('/api/relations/evaluate', request);
  return answer.status === 200 ? { kind: 'value', value: evaluateResponse.parse(answer.body).jHz } : refusedOr(answer);
}

function substituentsFrom(given: unknown): unknown {
  return asList(given)?.map((one) => {
    const substituent = asRecord(one);
    return { dchiAlpha: substituent?.dchi_alpha, dchiBeta: substituent?.dchi_beta ?? [], xi: substituent?.xi };
  });
}
