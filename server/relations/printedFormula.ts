import { effectiveDchi } from '@/shared/engine/relations/generalised';
import { bindCurve, jAt } from '@/shared/engine/relations/curve';
import { studentDensity } from '@/shared/engine/math/student';
import type { AngleRow, ParameterSet, RelationRow, Substituent } from '@/shared/types/relation';

/** One loading of mathjs, and only where a printed formula is evaluated: it takes about a second, which no start should wait for. */
async function evaluator(): Promise<(formula: string) => (numbers: Record<string, number | number[]>) => unknown> {
  const { all, create } = await import('mathjs');
  const math = create(all ?? {});
  return (formula) => {
    const compiled = math.compile(formula);
    return (numbers) => compiled.evaluate(numbers) as unknown;
  };
}

const RADIANS = Math.PI / 180;

/** Substituents on which the printed generalised equation is tried: none, one of each kind, four mixed. */
const TRIALS: readonly (readonly Substituent[])[] = [
  [],
  [{ dchiAlpha: 1.3, dchiBeta: [0.4], xi: 1 }],
  [{ dchiAlpha: 0.4, dchiBeta: [1.3, 0.4], xi: -1 }, { dchiAlpha: 1.7, dchiBeta: [], xi: 1 }],
  [{ dchiAlpha: 1.3, dchiBeta: [], xi: 1 }, { dchiAlpha: 1.3, dchiBeta: [0.4], xi: -1 }, { dchiAlpha: 0.85, dchiBeta: [0.4], xi: 1 }, { dchiAlpha: 0.4, dchiBeta: [], xi: -1 }],
];
const ANGLES = [-180, -137.5, -90, -61, -1, 0, 33, 60, 90, 121.25, 180] as const;

function scope(row: RelationRow, set: ParameterSet, phiDeg: number, substituents: readonly Substituent[]): Record<string, number | number[]> {
  const parameters = Object.fromEntries(
    Object.entries(set.values).map(([name, value]) => [name, row.degreeParameters.includes(name) ? value * RADIANS : value]),
  );
  // an empty list is no vector for mathjs: one substituent without weight stands for none
  const list = substituents.length > 0 ? substituents : [{ dchiAlpha: 0, dchiBeta: [], xi: 1 as const }];
  return row.kind === 'generalised'
    ? { ...parameters, phi: phiDeg * RADIANS, dchi: list.map((s) => effectiveDchi(set, s)), xi: list.map((s) => s.xi) }
    : { ...parameters, phi: phiDeg * RADIANS };
}

/** J by the printed formula, evaluated by mathjs from its text alone. */
export async function printedValue(row: AngleRow, set: ParameterSet, phiDeg: number, substituents: readonly Substituent[] = []): Promise<number> {
  const value = (await evaluator())(row.mathFormula)(scope(row, set, phiDeg, substituents));
  if (typeof value !== 'number') throw new Error(`${row.id}: the printed formula gives no number`);
  return value;
}

/**
 * Compares the printed formula with the function that calculates, at sample angles, sets and substituents.
 * @throws Error naming row, set and angle where they differ by more than 1e-9 Hz
 */
export async function verifyPrintedFormula(row: RelationRow): Promise<void> {
  const printedAt = (await evaluator())(row.mathFormula);
  if (row.kind === 'class-table') {
    for (const [J, m, s, nu] of [[15.8, 15.5, 0.9, 8], [10.9, 11.2, 1, 5], [20, 11, 1.5, 7]] as const) {
      const printed = printedAt({ J, m, s, nu });
      const own = studentDensity(J, m, s, nu);
      if (typeof printed !== 'number' || Math.abs(printed - own) > 1e-12) throw new Error(`${row.id}@${row.version}: the printed density gives ${String(printed)}, the engine ${own}`);
    }
    return;
  }
  for (const set of row.parameterSets) {
    for (const substituents of row.kind === 'generalised' ? TRIALS : [[]]) {
      const curve = bindCurve(row, { substituents, set: set.id });
      for (const phiDeg of ANGLES) {
        const printed = printedAt(scope(row, set, phiDeg, substituents));
        const own = jAt(curve, phiDeg);
        if (typeof printed !== 'number' || !(Math.abs(printed - own) <= 1e-9)) {
          throw new Error(`${row.id}@${row.version}, set ${set.id || 'only'}, ${phiDeg}°: the printed formula gives ${String(printed)}, the engine ${own}`);
        }
      }
    }
  }
}
