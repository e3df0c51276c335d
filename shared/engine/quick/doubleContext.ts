import type { CautionId, DoubleBondFinding, DoubleBondInput, Grade, NextMeasurement, QuickLookAnswer } from '../../types/answer';
import type { AlkeneModel } from '../../types/relation';
import type { TrailStep } from '../../types/trail';
import { hzRange, inHundred } from '../../format/number';
import { singleText } from '../../text/engine/single';
import { doubleText as say } from '../../text/engine/double';
import type { AlkeneGroups, AlkeneKind } from '../alkenes/classify';
import { ENGINE_VERSION } from '../version';
import type { Readings } from './reading';
import { cautions, relationRef } from './refs';
import { readingStep } from './singleSteps';

/** Above this a vicinal coupling across C=C is unusual; below the other it is for an open chain (common practice, no source). */
export const LARGE_DOUBLE_HZ = 25;
const SMALL_DOUBLE_HZ = 2;

/** Everything that the judges of a double bond start from. */
export interface DoubleContext {
  input: DoubleBondInput;
  readings: Readings;
  model: AlkeneModel;
  groups: AlkeneGroups | null;
  kind: AlkeneKind | null;
}

/** What a judge of a double bond concludes; the rest of the answer is the same for all. */
export interface DoubleVerdict {
  grade: Grade;
  reason: keyof typeof say.grade;
  likelihood: number | null;
  headline: string;
  detail: string;
  rulesOut: string[];
  cannotTell: string[];
  cautionIds: (CautionId | false)[];
  checkFirst: NextMeasurement[];
  measureNext: NextMeasurement[];
  finding: DoubleBondFinding;
  undecidedHz: [number, number] | null;
}

function classStep({ input, groups }: DoubleContext, v: DoubleVerdict, relation: QuickLookAnswer['relation'], flags: QuickLookAnswer['cautions']): TrailStep {
  const { finding } = v;
  const s = say.steps;
  return {
    key: 'relation', ink: 'calculated', reviewStep: 'domain', title: singleText.steps.relation,
    summary: finding.className ? `${relation?.name ?? ''}: ${s.classSummary(finding.className)}` : (relation?.name ?? ''),
    inputs: [
      { label: s.groups, value: groups && input.groups ? `${input.groups.left.join(', ')} · ${input.groups.right.join(', ')}` : s.notGiven },
      ...(input.ringSize ? [{ label: s.ring, value: String(input.ringSize) }] : []),
      ...finding.ladder.flatMap((row) => (row.classHz ? [{ label: row.geometry, value: `${hzRange(row.classHz[0], row.classHz[1])}, ${s.values(row.compounds.length)}` }] : [])),
      ...(v.undecidedHz ? [{ label: s.undecided, value: hzRange(v.undecidedHz[0], v.undecidedHz[1]) }] : []),
    ],
    ...(relation ? { relation, formula: relation.formula } : {}),
    flags: flags.filter((f) => ['groups-not-given', 'small-sample', 'ring-fact', 'no-vicinal-path', 'common-practice', 'out-of-domain', 'from-memory'].includes(f.id)),
  };
}

/** Settings with a vicinal H,H pair whose partner can be read. */
const PAIRED: ReadonlySet<DoubleBondFinding['setting']> = new Set(['disubstituted', 'terminal', 'not-given']);

/** Puts a verdict into an answer with its steps. */
export function doubleAnswer(context: DoubleContext, v: DoubleVerdict): QuickLookAnswer {
  const { readings, model } = context;
  const { reading, partner, notes } = readings;
  const openChain = v.finding.setting === 'disubstituted' || v.finding.setting === 'not-given';
  const flags = cautions([
    reading.limit !== 'none' && 'limit-used',
    notes.some((n) => n.code === 'digits-coarse') && 'coarse-reading',
    reading.jHz > LARGE_DOUBLE_HZ && 'larger-than-usual',
    openChain && reading.jHz < 0 && 'negative-vicinal',
    openChain && reading.jHz > 0 && reading.jHz < SMALL_DOUBLE_HZ && 'smaller-than-usual',
    ...v.cautionIds,
  ]);
  const relation = relationRef(model.row);
  const weights = v.finding.likelihoods.map((l) => ({ label: l.geometry, value: inHundred(l.weight) }));
  const steps: TrailStep[] = [
    ...(reading.typed === '' ? [] : [readingStep(reading, partner, flags)]),
    classStep(context, v, relation, flags),
    {
      key: 'grade', ink: 'calculated', reviewStep: null, title: singleText.steps.grade, summary: v.headline,
      inputs: [...weights, { label: say.steps.why, value: say.grade[v.reason] }],
      flags: flags.filter((f) => ['alkene-border', 'diene-single-bond', 'symmetric-alkene', 'cis-trans-not-ez', 'negative-vicinal', 'larger-than-usual', 'smaller-than-usual'].includes(f.id)),
    },
  ];
  return {
    state: 'answered', engineVersion: ENGINE_VERSION, bond: 'double', reading, partner, notes, grade: v.grade, likelihood: v.likelihood,
    headline: v.headline, detail: v.detail.trim(), rulesOut: v.rulesOut, cannotTell: v.cannotTell, cautions: flags,
    checkFirst: v.checkFirst.length > 0 || reading.jHz <= LARGE_DOUBLE_HZ
      ? v.checkFirst
      : [singleText.next.fieldAndUnit(reading.jHz, readings.fieldMHz), singleText.next.twoSplittings, say.next.cosy],
    measureNext: [...v.measureNext, ...(partner || !PAIRED.has(v.finding.setting) ? [] : [say.next.partner])].slice(0, 4),
    relation, single: null, double: v.finding, steps,
  };
}
