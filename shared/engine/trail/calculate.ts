import type { QuickLookInput, QuickLookResult } from '../../types/answer';
import type { Calculation, CaseContent, Reading } from '../../types/case';
import type { Registry } from '../../types/relation';
import { trailText } from '../../text/engine/trail';
import { quickLook } from '../quick/quickLook';
import { ENGINE_VERSION } from '../version';

const refused = (bond: 'single' | 'double', code: string, sentence: string): QuickLookResult => ({
  state: 'refused', engineVersion: ENGINE_VERSION, bond, problems: [{ field: 'j', code, sentence, mends: [] }],
});

/** The nuclei as typed name two protons: `H,H`, `1H,1H`, `¹H–¹H`, or nothing. */
const isProtonPair = (nuclei: string): boolean => /^(?:H[,\-–/ ]*H)?$/i.test(nuclei.replace(/[¹1]/g, '').trim());

/** The typed J with the sign that was measured apart from it. */
function signed(reading: Reading): string {
  const typed = reading.j.trim();
  return reading.sign === 'negative' && /^[\d.,]/.test(typed) ? `-${typed}` : reading.j;
}

/** The quick look that a calculation stands for. */
export function inputOf(calculation: Calculation, reading: Reading, content: CaseContent): QuickLookInput {
  const numbers = { j: signed(reading), se: reading.se, partner: reading.partner, fieldMHz: content.conditions.fieldMHz };
  if (calculation.bond === 'single') {
    const { groups, turning, relation } = calculation;
    return { bond: 'single', ...numbers, groups: groups ?? null, ...(turning ? { turning } : {}), ...(relation ? { relation } : {}) };
  }
  return { bond: 'double', ...numbers, groups: calculation.groups ?? null, ringSize: calculation.ringSize ?? null };
}

/** One quick look for each calculation of a case. A reading over another path is refused, because no relation held reads it. */
export function calculate(calculation: Calculation, content: CaseContent, registry: Registry): QuickLookResult {
  const reading = content.readings.find((r) => r.id === calculation.readingId);
  if (!reading) return refused(calculation.bond, 'no-reading', trailText.missingReading());
  // a crowded double bond is answered without a vicinal J, whatever long-range splitting was read
  const answer = quickLook(inputOf(calculation, reading, content), registry);
  const noPath = answer.state === 'answered' && (answer.double?.setting === 'trisubstituted' || answer.double?.setting === 'tetrasubstituted');
  if (!noPath && (reading.path !== '3J' || !isProtonPair(reading.nuclei))) {
    return refused(calculation.bond, 'path', trailText.wrongPath(reading.path, reading.nuclei));
  }
  return answer;
}
