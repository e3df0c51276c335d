import { z } from 'zod';

import { doubleBondsResponse, type DoubleBondsResponse, quickLookResponse } from '@/shared/contracts/quickLook';

import { rowsOf } from '../check/readCheckFile';
import type { Api } from '../lib/api';
import { Refusal } from '../lib/refusal';
import type { Scored } from './runScore';
import { type Share, shareOf } from './wilson';

const record = z.object({
  id: z.string(),
  smiles: z.string(),
  geometry: z.enum(['E', 'Z']).nullable(),
  truth_usable: z.boolean(),
  J_vinyl_Hz: z.array(z.number()),
  tags: z.array(z.string()).default([]),
  source: z.unknown(),
});
type AlkeneRecord = z.infer<typeof record>;

type Verdict = 'cis' | 'trans' | 'not decided';
interface Line {
  id: string;
  /** what the product was asked: the structure without stereo marks, and one J */
  smiles: string;
  jHz: number[];
  answers: { bond: string; jHz: number; grade: string; geometry: 'cis' | 'trans' | null; headline: string }[];
  answer: Verdict;
  grade: string;
  reason: string;
}

/** On CH=CH each carbon carries one hydrogen, so E is always trans and Z always cis in the sense of the coupling. */
const TRUTH = { E: 'trans', Z: 'cis' } as const;
const GRADE_ORDER = ['not-decided', 'tentative', 'assigned'];

/** Takes the marks of geometry and configuration out of a SMILES; the product would ignore them, so it must not even see them. */
export const withoutStereo = (smiles: string): string => smiles.replace(/[/\\]/g, '').replace(/@+/g, '');

/** Puts each record's structure and couplings to the quick look and compares with the stated geometry. */
export async function scoreAlkenes(file: unknown, api: Api): Promise<Scored> {
  const parsed = z.array(record).safeParse(rowsOf(file, 'records'));
  if (!parsed.success) throw new Refusal(`This is not a file of the set alkenes: ${parsed.error.issues[0]?.path.join('.') ?? ''} ${parsed.error.issues[0]?.message ?? ''}`);
  const answered: { record: AlkeneRecord; line: Line }[] = [];
  for (const one of parsed.data) answered.push({ record: one, line: await ask(one, api) });

  const scored = answered.filter(({ record: one }) => one.truth_usable && one.geometry !== null);
  const memory = ({ record: one }: { record: AlkeneRecord }): boolean => JSON.stringify(one.source).includes('from memory');
  const ring = ({ record: one }: { record: AlkeneRecord }): boolean => one.tags.includes('ring');
  return {
    metrics: {
      set: 'alkenes', covered: true, records: answered.length, notScored: answered.length - scored.length,
      all: countsOf(scored),
      openChain: countsOf(scored.filter((one) => !ring(one))),
      // cis by construction: these prove only that a ring bond is not called trans
      ring: countsOf(scored.filter(ring)),
      seen: countsOf(scored.filter((one) => !memory(one))),
      fromMemory: countsOf(scored.filter(memory)),
    },
    lines: answered.map(({ line }) => line),
  };
}

interface Counts {
  scored: number;
  decided: Share;
  right: Share;
  /** a graded answer (assigned or tentative) with the wrong geometry, out of all scored */
  wrong: Share;
  wrongAssigned: Share;
  undecided: Share;
  assigned: number;
  tentative: number;
  idsWrong: string[];
  idsUndecided: string[];
}

function countsOf(scored: { record: AlkeneRecord; line: Line }[]): Counts {
  const isRight = ({ record: one, line }: (typeof scored)[number]): boolean => one.geometry !== null && line.answer === TRUTH[one.geometry];
  const decided = scored.filter(({ line }) => line.answer !== 'not decided');
  const wrong = decided.filter((one) => !isRight(one));
  const undecided = scored.filter(({ line }) => line.answer === 'not decided');
  return {
    scored: scored.length,
    decided: shareOf(decided.length, scored.length),
    right: shareOf(decided.filter(isRight).length, scored.length),
    wrong: shareOf(wrong.length, scored.length),
    wrongAssigned: shareOf(wrong.filter(({ line }) => line.grade === 'assigned').length, scored.length),
    undecided: shareOf(undecided.length, scored.length),
    assigned: decided.filter(({ line }) => line.grade === 'assigned').length,
    tentative: decided.filter(({ line }) => line.grade === 'tentative').length,
    idsWrong: wrong.map(({ record: one }) => one.id),
    idsUndecided: undecided.map(({ record: one }) => one.id),
  };
}

/**
 * One value a distinct C=C, or two readings of one C=C: which belongs to which is not told, so every value is put to every
 * CH=CH of its structure and the record counts as decided only if all answers agree; the grade is the weakest.
 */
async function ask(one: AlkeneRecord, api: Api): Promise<Line> {
  const smiles = withoutStereo(one.smiles);
  const line: Line = { id: one.id, smiles, jHz: one.J_vinyl_Hz, answers: [], answer: 'not decided', grade: 'not-decided', reason: '' };
  const found = await api.post('/api/structures/double-bonds', { smiles });
  if (found.status !== 200) return { ...line, reason: `the structure was refused: ${JSON.stringify(found.body).slice(0, 200)}` };
  for (const bond of distinct(vicinal(doubleBondsResponse.parse(found.body).bonds, one.tags.includes('ring')))) {
    for (const jHz of one.J_vinyl_Hz) {
      const answer = await api.post('/api/quick-look', { bond: 'double', j: jHz, groups: bond.groups, ringSize: bond.ringSize });
      if (answer.status !== 200) return { ...line, reason: `${jHz} Hz was refused` };
      const response = quickLookResponse.parse(answer.body);
      if (response.state === 'question') return { ...line, reason: response.question };
      line.answers.push({ bond: bond.label, jHz, grade: response.grade, geometry: response.double?.geometry ?? null, headline: response.headline });
    }
  }
  const grade = GRADE_ORDER.find((each) => line.answers.some((answer) => answer.grade === each)) ?? 'not-decided';
  const geometries = new Set(line.answers.map((answer) => answer.geometry));
  const [geometry] = geometries;
  if (grade === 'not-decided' || geometries.size !== 1 || geometry === null || geometry === undefined) return { ...line, reason: line.answers[0]?.headline ?? 'no CH=CH was found' };
  return { ...line, grade, answer: geometry };
}

type Bond = DoubleBondsResponse['bonds'][number];

/** The bonds with one hydrogen on each carbon; where the record is an open-chain one, ring bonds are not what its J was read from. */
function vicinal(bonds: Bond[], isRing: boolean): Bond[] {
  const oneHydrogen = (pair: Bond['groups']['left']): boolean => pair.filter((group) => group === 'H').length === 1;
  const both = bonds.filter((bond) => oneHydrogen(bond.groups.left) && oneHydrogen(bond.groups.right));
  const fitting = both.filter((bond) => (bond.ringSize !== null) === isRing);
  return fitting.length > 0 ? fitting : both;
}

function distinct(bonds: Bond[]): Bond[] {
  const key = (bond: Bond): string => JSON.stringify([[...bond.groups.left].sort(), [...bond.groups.right].sort()].sort().concat([[String(bond.ringSize)]]));
  return [...new Map(bonds.map((bond) => [key(bond), bond])).values()];
}
