import { degreeRange } from '@/shared/format/number';
import { numberText } from '@/shared/text/uiCaseFields';
import type { Calculation, Candidate, CandidateClaim } from '@/shared/types/case';
import type { QuickLookAnswer, QuickLookQuestion, QuickLookRefusal } from '@/shared/types/answer';

/** What a candidate says of one calculation, as a form holds it. */
export type ClaimForm = { kind: 'none' } | { kind: 'geometry'; geometry: 'cis' | 'trans' } | { kind: 'angle'; from: string; to: string };

export function claimForm(candidate: Candidate, calculation: Calculation): ClaimForm {
  const claim = candidate.claims.find((each) => each.calculationId === calculation.id);
  if (claim === undefined) return { kind: 'none' };
  return claim.kind === 'geometry' ? { kind: 'geometry', geometry: claim.geometry } : { kind: 'angle', from: numberText(claim.fromDeg), to: numberText(claim.toDeg) };
}

/** "−60", "60°", "149,5": an angle as typed; null when it is none. */
export function angleOf(typed: string): number | null {
  const text = typed.trim().replace(/°$/, '').trim().replace('−', '-').replace(',', '.');
  if (!/^[+-]?\d+(\.\d+)?$/.test(text)) return null;
  const value = Number(text);
  return value >= -180 && value <= 540 ? value : null;
}

/**
 * The claims that a form means. An angle stretch runs from the first angle on: when the second is the smaller one, it lies
 * past 180° (150 to −150 is 150 to 210). null = the two angles cannot be read.
 */
export function claimsOf(form: ClaimForm, calculationId: string): CandidateClaim[] | null {
  if (form.kind === 'none') return [];
  if (form.kind === 'geometry') return [{ calculationId, kind: 'geometry', geometry: form.geometry }];
  const [from, to] = [angleOf(form.from), angleOf(form.to)];
  if (from === null || to === null || from > 180) return null;
  const end = to < from ? to + 360 : to;
  return end > 540 || end - from > 360 ? null : [{ calculationId, kind: 'angle', fromDeg: from, toDeg: end }];
}

/** The allowed stretches that the calculation found, to be claimed with one press. */
export function arcChoices(result: QuickLookAnswer | QuickLookQuestion | QuickLookRefusal | undefined): { label: string; from: string; to: string }[] {
  if (result?.state !== 'answered' || result.single === null) return [];
  return result.single.arcs.map((arc) => ({
    label: degreeRange(arc.fromDeg, arc.toDeg), from: numberText(Math.round(arc.fromDeg)), to: numberText(Math.round(arc.toDeg)),
  }));
}

