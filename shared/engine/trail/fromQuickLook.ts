import type { DoubleBondFinding, QuickLookAnswer, QuickLookInput, QuickLookResult } from '../../types/answer';
import type { Calculation, Candidate, CaseContent } from '../../types/case';
import { degreeRange } from '../../format/number';
import { plainText } from '../../format/richText';
import { singleText } from '../../text/engine/single';
import { trailText } from '../../text/engine/trail';
import { arcParts } from '../quick/arcs';

const READING = 'r1';
const CALCULATION = 'c1';

function calculationOf(input: QuickLookInput): Calculation {
  // the numbers live in the reading; what is left says how they are turned into geometry
  if (input.bond === 'single') {
    const { groups, turning, relation } = input;
    return { id: CALCULATION, readingId: READING, bond: 'single', ...(groups === undefined ? {} : { groups }), ...(turning ? { turning } : {}), ...(relation ? { relation } : {}) };
  }
  const { groups, ringSize } = input;
  return { id: CALCULATION, readingId: READING, bond: 'double', ...(groups === undefined ? {} : { groups }), ...(ringSize === undefined ? {} : { ringSize }) };
}

/** Both geometries with their claims; without a vicinal pair they stay untested, and a small ring has no alternative. */
function geometries(finding: DoubleBondFinding, ringSize: number | null): Candidate[] {
  if (finding.setting === 'terminal' || finding.setting === 'tetrasubstituted') return [];
  if (finding.setting === 'ring' && (ringSize ?? 8) < 8) return [];
  const testable = finding.setting !== 'trisubstituted';
  const one = (geometry: 'cis' | 'trans'): Candidate => ({
    id: geometry,
    name: trailText.first[geometry](finding.descriptors?.[geometry] ?? null),
    description: '',
    claims: testable ? [{ calculationId: CALCULATION, kind: 'geometry', geometry }] : [],
  });
  return [one('cis'), one('trans')];
}

/** One candidate for each allowed arc. */
function arcCandidates(answer: QuickLookAnswer): Candidate[] {
  const arcs = answer.single?.arcs ?? [];
  // the whole circle is no alternative to anything
  return arcs.filter((a) => a.toDeg - a.fromDeg < 360 - 1e-9).map((arc, i) => {
    const [part] = arcParts([arc], false, singleText.angleName(false));
    return {
      id: `arc${i + 1}`,
      name: part ? plainText(part.text) : degreeRange(arc.fromDeg, arc.toDeg),
      description: '',
      claims: [{ calculationId: CALCULATION, kind: 'angle', fromDeg: arc.fromDeg, toDeg: arc.toDeg }],
    };
  });
}

/** A case that holds all a quick look held: reading, conditions, calculation, and its candidates, so that nothing is typed twice. */
export function contentFromQuickLook(input: QuickLookInput, result: QuickLookResult): CaseContent {
  const answer = result.state === 'answered' ? result : null;
  const double = answer?.double ?? null;
  const candidates = double ? geometries(double, input.bond === 'double' ? (input.ringSize ?? null) : null) : answer ? arcCandidates(answer) : [];
  const negative = result.state !== 'refused' && result.reading.jHz < 0;
  const question = input.bond === 'single' ? trailText.first.singleQuestion : double?.descriptors ? trailText.first.doubleEzQuestion : trailText.first.doubleQuestion;
  return {
    format: 1,
    question,
    compound: { name: '', batch: '', notebook: '', structureNote: '', formerNames: [] },
    conditions: { fieldMHz: input.fieldMHz ?? '', solvent: '', temperatureK: '', concentration: '' },
    readings: [{
      id: READING, atomA: '', atomB: '', nuclei: 'H,H', path: '3J', j: input.j, se: input.se ?? '', partner: input.partner ?? '',
      sign: negative ? 'negative' : 'not-measured', where: '', method: '', note: '',
    }],
    calculations: [calculationOf(input)],
    candidates,
    evidence: [],
    answer: null,
    tags: [],
  };
}
