import type { DoubleBondInput, QuickLookInput, QuickLookResult, SingleBondInput } from '../../types/answer';
import type { FieldName, FieldProblem, HzReading } from '../../types/reading';
import type { AlkeneModel, Registry } from '../../types/relation';
import { hzAsTyped } from '../../format/number';
import { inputText } from '../../text/engine/input';
import { singleText } from '../../text/engine/single';
import { kindOf, type AlkeneGroups } from '../alkenes/classify';
import { parseGroup } from '../groups/group';
import { sizeText } from '../input/readHz';
import { ENGINE_VERSION } from '../version';
import { doubleAnswer, type DoubleContext, type DoubleVerdict } from './doubleContext';
import { emptyFinding, ladder } from './doubleFinding';
import { judgeDisubstituted, judgeNotGiven } from './doubleOpen';
import { judgeCrowded, judgeRing, judgeTerminal } from './doubleOther';
import { partnerGap, readAll, type Readings } from './reading';
import { answerSingle } from './singleBond';
import { chooseRelation } from './singleRelation';

const refuse = (bond: 'single' | 'double', problems: FieldProblem[]): QuickLookResult => ({ state: 'refused', engineVersion: ENGINE_VERSION, bond, problems });

function single(input: SingleBondInput, registry: Registry): QuickLookResult {
  const readings = readAll(input);
  const choice = chooseRelation(input, registry);
  const problems = [...('problems' in readings ? readings.problems : []), ...('problems' in choice ? choice.problems : [])];
  if ('problems' in readings || problems.length > 0) return refuse('single', problems);
  const { reading, notes } = readings;
  const question = { state: 'question' as const, engineVersion: ENGINE_VERSION, bond: 'single' as const, reading, notes };
  if (reading.jHz < 0) {
    const size = sizeText(reading);
    return {
      ...question, field: 'j', question: inputText.negativeQuestion(size), why: inputText.negativeWhy(),
      choices: [{ label: inputText.useHz(size), field: 'j', value: size }],
    };
  }
  if ('ask' in choice) return { ...question, ...choice.ask, choices: [] };
  if (!('row' in choice)) return refuse('single', choice.problems);
  return answerSingle(input, readings, choice.row, choice.groups, choice.domain);
}

function readAlkeneGroups(input: DoubleBondInput): { groups: AlkeneGroups | null } | { ask: 'left' | 'right' } | { problems: FieldProblem[] } {
  if (!input.groups) return { groups: null };
  const read = { left: input.groups.left.map(parseGroup), right: input.groups.right.map(parseGroup) };
  for (const side of ['left', 'right'] as const) {
    const field: FieldName = `groups.${side}`;
    for (const r of read[side]) {
      if (!('fault' in r)) continue;
      if (r.fault.code === 'empty') return { ask: side };
      return { problems: [{ field, code: 'group', sentence: inputText.group(field, r.fault), mends: [] }] };
    }
  }
  const [a, b, c, d] = [...read.left, ...read.right].map((r) => ('group' in r ? r.group : null));
  return a && b && c && d ? { groups: { left: [a, b], right: [c, d] } } : { groups: null };
}

/** Two partners that differ: no answer is drawn from the pair. */
function partnersDiffer(model: AlkeneModel, readings: Readings): DoubleVerdict | null {
  const { reading, partner } = readings;
  const gap = partnerGap(reading, partner);
  if (!partner || !gap?.differs) return null;
  return {
    grade: 'not-decided', reason: 'partner', likelihood: null, headline: singleText.partnerDiffers(hzAsTyped(reading), hzAsTyped(partner)),
    detail: singleText.partnerDetail(gap.gapHz, gap.sigmaHz), rulesOut: [], cannotTell: [], cautionIds: ['partner-differs'],
    checkFirst: [singleText.next.cosy, singleText.next.fieldAndUnit(reading.jHz, readings.fieldMHz)], measureNext: [singleText.next.cosy],
    finding: emptyFinding('not-given', ladder(model, null)), undecidedHz: null,
  };
}

function judge(context: DoubleContext): DoubleVerdict {
  const { input, kind } = context;
  if (kind && (kind.setting === 'trisubstituted' || kind.setting === 'tetrasubstituted')) return judgeCrowded(context);
  const differ = partnersDiffer(context.model, context.readings);
  if (differ) return differ;
  if (input.ringSize && !(kind && kind.setting === 'terminal')) return judgeRing(context);
  if (!kind) return judgeNotGiven(context);
  return kind.setting === 'terminal' ? judgeTerminal(context) : judgeDisubstituted(context, false);
}

const NO_READING: HzReading = { typed: '', jHz: 0, decimals: 1, limit: 'none', seHz: 0.2, seSource: 'default' };

function double(input: DoubleBondInput, registry: Registry): QuickLookResult {
  const model = registry.alkenes;
  const read = readAlkeneGroups(input);
  const kind = 'groups' in read && read.groups ? kindOf(read.groups) : null;
  const crowded = kind?.setting === 'trisubstituted' || kind?.setting === 'tetrasubstituted';
  // no vicinal H,H pair: the answer needs no J, so an empty field is no fault there
  const readings: ReturnType<typeof readAll> = crowded && input.j.trim() === '' ? { reading: NO_READING, partner: null, fieldMHz: null, notes: [] } : readAll(input);
  const problems = [...('problems' in readings ? readings.problems : []), ...('problems' in read ? read.problems : [])];
  if (!model) problems.push({ field: 'relation', code: 'unknown-relation', sentence: inputText.unknownRelation('double bonds'), mends: [] });
  if ('problems' in readings || problems.length > 0 || !model) return refuse('double', problems);
  if ('ask' in read) {
    return {
      state: 'question', engineVersion: ENGINE_VERSION, bond: 'double', field: `groups.${read.ask}`, question: singleText.needGroup(read.ask),
      why: inputText.group(`groups.${read.ask}`, { code: 'empty' }), reading: readings.reading, notes: readings.notes, choices: [{ label: 'H', field: `groups.${read.ask}`, value: 'H' }],
    };
  }
  const signKept = readings.reading.jHz < 0 ? { ...readings, notes: [...readings.notes, { field: 'j' as const, code: 'sign-dropped' as const, text: inputText.noteNegativeKept() }] } : readings;
  const context: DoubleContext = { input, readings: signKept, model, groups: 'groups' in read ? read.groups : null, kind };
  return doubleAnswer(context, judge(context));
}

/**
 * What one measured coupling says about the bond it was read on.
 * Pure: the same input and registry give the same digits. Values that cannot be used come back as problems with mends,
 * a missing fact as a question, everything else as an answer with its grade.
 * @param registry  the relations it may use
 */
export function quickLook(input: QuickLookInput, registry: Registry): QuickLookResult {
  return input.bond === 'single' ? single(input, registry) : double(input, registry);
}
