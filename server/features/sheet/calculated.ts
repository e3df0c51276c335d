import type { SheetCalculation, SheetModel, SheetTable } from '@/server/pdf/model';
import { readingLabel } from '@/server/features/cases/listing';
import { curve, groupLabel, groupOf } from '@/shared/engine';
import { degree, degreeRange, fixed, hz, hzAsTyped, hzRange, inHundred, NBSP } from '@/shared/format/number';
import { plainText } from '@/shared/format/richText';
import { GRADE_WORDS, PROVENANCE_WORDS, SECTOR_SHORT } from '@/shared/format/words';
import { sheetText as words } from '@/shared/text/sheet';
import type { QuickLookAnswer } from '@/shared/types/answer';
import type { Calculation } from '@/shared/types/case';
import type { CaseTrail } from '@/shared/types/trail';
import { literal } from '@/server/pdf/textLayout';
import { sentences, type SheetInput } from './input';

type Made = CaseTrail['calculations'][number];

/** Short name of a group; text that is no group stands as typed. */
function groupName(text: string): string {
  try {
    return groupLabel(groupOf(text));
  } catch {
    return literal(text);
  }
}
/** On the dial there is room for few letters: a longer name gives way to its first atom. */
function shortName(text: string): string {
  const name = groupName(text);
  if ([...name].length <= 3) return name;
  try {
    return groupOf(text).element;
  } catch {
    return '';
  }
}
const pair = ([a, b]: readonly [string, string]): string => `${groupName(a)}, ${groupName(b)}`;

function groupsText(calculation: Calculation): string {
  if (calculation.bond === 'single') return calculation.groups ? words.groupsSingle(pair(calculation.groups.front), pair(calculation.groups.rear)) : words.groupsNotGiven;
  return calculation.groups ? words.groupsDouble(pair(calculation.groups.left), pair(calculation.groups.right)) : words.groupsNotGiven;
}

const rootsText = (answer: QuickLookAnswer): string =>
  answer.single?.roots.map(({ phiDeg, sector }) => `${degree(phiDeg, 1)} (${SECTOR_SHORT[sector]})`).join(', ') ?? '';
const arcsText = (answer: QuickLookAnswer): string =>
  answer.single?.arcs.map(({ fromDeg, toDeg }) => (toDeg - fromDeg >= 360 - 1e-6 ? words.everyAngle : degreeRange(fromDeg, toDeg))).join('; ') ?? '';

function anglePlot(input: SheetInput, calculation: Calculation, answer: QuickLookAnswer): SheetCalculation['plot'] {
  const { single, relation, reading } = answer;
  const row = relation ? input.registry.find(`${relation.id}@${relation.version}`) : undefined;
  if (!single || !relation || !row || row.kind === 'class-table' || calculation.bond !== 'single') return null;
  const groups = calculation.groups ?? null;
  // the root farthest from 0: there the two H do not hide each other
  const first = [...single.roots].sort((a, b) => Math.abs(b.phiDeg) - Math.abs(a.phiDeg))[0];
  const arc = single.arcs[0];
  return {
    kind: 'angle',
    curve: { points: curve(row, row.kind === 'generalised' ? { groups } : {}, 2), spreadHz: relation.spreadHz, reading: { jHz: reading.jHz, seHz: reading.seHz, limit: reading.limit }, roots: single.roots, arcs: single.arcs },
    dial: {
      phiDeg: first?.phiDeg ?? (arc ? (arc.fromDeg + arc.toDeg) / 2 : 60), arcs: single.arcs,
      groups: groups ? { front: [shortName(groups.front[0]), shortName(groups.front[1])], rear: [shortName(groups.rear[0]), shortName(groups.rear[1])] } : null,
    },
    measuredLabel: words.measuredAt(hzAsTyped(reading)),
    alt: words.curveAlt(hzAsTyped(reading), single.roots.length === 0 ? plainText(words.noRoot) : plainText(rootsText(answer)), plainText(arcsText(answer))),
  };
}

function doublePlot(answer: QuickLookAnswer): SheetCalculation['plot'] {
  const { double, reading } = answer;
  if (!double || double.ladder.length === 0) return null;
  const names: Record<string, string> = { cis: `_${words.geometry.cis}_`, trans: `_${words.geometry.trans}_`, geminal: words.geometry.geminal };
  return {
    kind: 'double', names, ladder: { rows: double.ladder, reading: { jHz: reading.jHz, seHz: reading.seHz } }, measuredLabel: words.measuredAt(hzAsTyped(reading)),
    alt: words.ladderAlt(hzAsTyped(reading), double.ladder.map((row) => words.ladderRow(words.geometry[row.geometry], hzRange(...row.fullHz), row.classHz ? hzRange(...row.classHz) : null)).join(' ')),
  };
}

function answeredLines(calculation: Calculation, answer: QuickLookAnswer, said: Set<string>): [string, string][] {
  const lines: [string, string][] = [];
  const step = answer.steps.find(({ formula }) => formula !== undefined);
  if (step?.formula && !said.has(step.formula)) lines.push([words.formula, step.formula]);
  if (step?.worked) lines.push([words.worked, step.worked]);
  const bond = calculation.bond === 'single' ? words.turning[calculation.turning ?? 'unknown'] : calculation.ringSize ? words.ringSize(calculation.ringSize) : '';
  lines.push([words.groups, [groupsText(calculation), bond].filter((part) => part !== '').join('; ')]);
  if (answer.relation) lines.push([words.spread, words.spreadText(hz(answer.relation.spreadHz, 2).replace(/(\.\d)0(?=\u00a0)/, '$1'), PROVENANCE_WORDS[answer.relation.spreadProvenance])]);
  if (answer.single) {
    lines.push([words.roots, answer.single.roots.length === 0 ? words.noRoot : rootsText(answer)]);
    if (answer.single.arcs.length > 0) lines.push([words.arcs, words.arcsText(arcsText(answer), `${fixed(answer.single.coverage * 100, 0)}${NBSP}%`, hz(answer.single.sigmaHz, 2))]);
  }
  if (answer.double && answer.double.likelihoods.length > 0) {
    lines.push([words.likelihoods, answer.double.likelihoods.map(({ geometry, weight }) => `${words.geometry[geometry]} ${inHundred(weight)}`).join(', ')]);
  }
  if (answer.rulesOut.length > 0) lines.push([words.rulesOut, answer.rulesOut.join(' ')]);
  const fresh = answer.cannotTell.filter((sentence) => !said.has(sentence));
  if (fresh.length > 0) lines.push([words.cannotTell, fresh.join(' ')]);
  for (const one of [...fresh, step?.formula ?? '']) said.add(one);
  return lines;
}

/** @param said formulas and sentences that an earlier calculation of this sheet has printed: they are not repeated */
function calculationPart(input: SheetInput, made: Made, said: Set<string>): SheetCalculation | null {
  const { content } = input;
  const calculation = content.calculations.find(({ id }) => id === made.calculationId);
  const at = content.readings.findIndex(({ id }) => id === made.readingId);
  const reading = content.readings[at];
  if (!calculation || !reading) return null;
  const { result } = made;
  const title = literal(readingLabel(reading, at));
  if (result.state === 'refused') {
    return { title, relation: '', answer: null, plot: null, table: null, lines: result.problems.map(({ sentence }): [string, string] => [words.refused, sentence]) };
  }
  if (result.state === 'question') {
    return { title, relation: '', answer: null, plot: null, table: null, lines: [[words.asked, `${result.question} ${result.why}`]] };
  }
  const { relation } = result;
  return {
    title: `${title} ${result.reading.limit === 'none' ? '= ' : ''}${hzAsTyped(result.reading)} ± ${hz(result.reading.seHz, result.reading.seHz < 0.1 ? 2 : 1)}`,
    relation: relation ? `${relation.name}; ${relation.citation}${relation.doi ? `; doi ${relation.doi}` : ''}; ${relation.id}, ${words.version(relation.version)}` : '',
    answer: { grade: result.grade, gradeWord: GRADE_WORDS[result.grade], sentence: sentences(result.headline, result.detail) },
    plot: result.bond === 'single' ? anglePlot(input, calculation, result) : doublePlot(result),
    lines: answeredLines(calculation, result, said), table: null,
  };
}

function candidatesTable(input: SheetInput): SheetTable | null {
  const { content, trail } = input;
  if (content.candidates.length === 0) return null;
  const label = (calculationId: string) => {
    const made = trail.calculations.find((one) => one.calculationId === calculationId);
    const at = content.readings.findIndex(({ id }) => id === made?.readingId);
    const reading = content.readings[at];
    return reading ? readingLabel(reading, at) : '';
  };
  const rows = content.candidates.map((candidate) => {
    const finding = trail.candidates.find(({ candidateId }) => candidateId === candidate.id);
    const status = finding?.status ?? 'not-tested';
    const why = finding?.verdicts.filter(({ verdict }) => verdict !== 'not-tested').map((verdict) => `${literal(label(verdict.calculationId))}: ${verdict.why}`).join(' ') ?? '';
    const name = [literal(candidate.name.trim()), literal(candidate.description.trim())].filter((part) => part !== '').join('; ');
    return { cells: [name, words.verdictWord[status], why] };
  });
  const allOut = trail.candidates.length > 0 && trail.candidates.every(({ status }) => status === 'excluded');
  rows.push({ cells: [words.noneOfThese, allOut ? words.noneOfTheseFits : words.noneOfTheseOpen, ''] });
  return {
    caption: words.candidates,
    columns: [{ head: words.candidate, share: 30, align: 'left' }, { head: words.verdict, share: 14, align: 'left' }, { head: words.why, share: 56, align: 'left' }],
    rows,
  };
}

export function calculatedPart(input: SheetInput): Pick<SheetModel, 'calculations' | 'candidates' | 'excluded' | 'calculatedNote'> {
  const { trail } = input;
  const said = new Set<string>();
  return {
    calculations: trail.calculations.flatMap((made) => calculationPart(input, made, said) ?? []),
    candidates: candidatesTable(input),
    excluded: trail.notTested.length > 0 ? [words.notTestedLine(trail.notTested.join(', '))] : [],
    calculatedNote: trail.calculations.length === 0 ? words.noCalculation : [...new Set(trail.relations.map(({ name }) => name))].join('; '),
  };
}
