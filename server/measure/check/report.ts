import type { Check, Judgement, Outcome } from './types';

export interface Judged {
  check: Check;
  judgement: Judgement;
}

/** Sorting two or three numbers proves little, so this family stands by itself; only the very last line counts every check. */
const COUNTED_APART = 'pair_order';
const OUTCOMES: readonly Outcome[] = ['passed', 'failed', 'abstained', 'not covered'];

type Tally = Record<Outcome, number>;

/** The lines that `check` prints; the last one is `N passed, N failed, N abstained, N not covered`. */
export function reportLines(judged: Judged[]): string[] {
  const main = judged.filter(({ check }) => check.family !== COUNTED_APART);
  const apart = judged.filter(({ check }) => check.family === COUNTED_APART);
  const lines = [...new Set(main.map(({ check }) => check.family))].sort().map((family) => `${family}: ${counts(main.filter(({ check }) => check.family === family))}`);
  if (apart.length > 0) lines.push(`${COUNTED_APART} (by itself): ${counts(apart)}`);
  lines.push('');

  for (const [title, outcome] of [['Failed', 'failed'], ['Abstained', 'abstained']] as const) {
    const these = judged.filter(({ judgement }) => judgement.outcome === outcome);
    if (these.length === 0) continue;
    lines.push(`${title}:`);
    for (const { check, judgement } of these) {
      lines.push(`  ${check.id} [${check.relation}] given ${JSON.stringify(check.given)}`);
      lines.push(`    expected ${judgement.expected}`);
      lines.push(`    came ${judgement.came}${judgement.reason === '' || judgement.came.includes(judgement.reason) ? '' : `: ${judgement.reason}`}`);
    }
    lines.push('');
  }

  const uncovered = judged.filter(({ judgement }) => judgement.outcome === 'not covered');
  const relations = new Map<string, number>();
  for (const { check } of uncovered) relations.set(check.relation, (relations.get(check.relation) ?? 0) + 1);
  if (relations.size > 0) lines.push(`Not covered: ${[...relations].map(([relation, count]) => `${relation} (${count})`).join('; ')}`, '');

  lines.push('By provenance:');
  for (const kind of ['seen', 'from memory', 'common practice, no source', 'other']) {
    const these = judged.filter(({ check }) => provenanceOf(check) === kind);
    if (these.length > 0) lines.push(`  ${kind}: ${counts(these)}`);
  }
  const referenced = judged.filter(({ check }) => check.in_reference === true);
  lines.push('By whether the value is printed in the reference too:');
  lines.push(`  in the reference: ${counts(referenced)}`, `  not in it: ${counts(judged.filter(({ check }) => check.in_reference !== true))}`, '');

  lines.push(counts(judged));
  return lines;
}

export function tally(judged: Judged[]): Tally {
  const sum: Tally = { passed: 0, failed: 0, abstained: 0, 'not covered': 0 };
  for (const { judgement } of judged) sum[judgement.outcome] += 1;
  return sum;
}

const counts = (judged: Judged[]): string => {
  const sum = tally(judged);
  return OUTCOMES.map((outcome) => `${sum[outcome]} ${outcome}`).join(', ');
};

function provenanceOf(check: Check): string {
  return ['seen', 'from memory', 'common practice, no source'].find((start) => check.how.startsWith(start)) ?? 'other';
}
