import type { SingleBondInput } from '../../types/answer';
import type { FieldName, FieldProblem } from '../../types/reading';
import type { AngleRow, Registry } from '../../types/relation';
import { inputText } from '../../text/engine/input';
import { singleText as say } from '../../text/engine/single';
import { parseGroup } from '../groups/group';
import { applies, type Domain } from '../relations/applies';
import type { PathGroups } from '../relations/generalised';

/** Ids of the rows that the default picks from. */
export const GENERALISED_ID = 'vicinal-hh/generalised-1980';
export const PLAIN_ID = 'vicinal-hh/karplus-1963';

export interface Ask {
  field: FieldName;
  question: string;
  why: string;
}

export type SingleChoice = { row: AngleRow; groups: PathGroups | null; domain: Domain } | { ask: Ask } | { problems: FieldProblem[] };

const problem = (field: FieldName, code: string, sentence: string): { problems: FieldProblem[] } => ({ problems: [{ field, code, sentence, mends: [] }] });

const PLACES = ['front', 'front', 'rear', 'rear'] as const;

/** Reads the four groups: faults as problems, an empty place as a question. */
function readGroups(input: SingleBondInput): { groups: PathGroups | null } | { ask: Ask } | { problems: FieldProblem[] } {
  if (!input.groups) return { groups: null };
  const texts = [...input.groups.front, ...input.groups.rear];
  for (const [i, text] of texts.entries()) {
    const place = PLACES[i] ?? 'front';
    const read = parseGroup(text);
    if (!('fault' in read)) continue;
    if (read.fault.code === 'empty') return { ask: { field: `groups.${place}`, question: say.needGroup(place), why: say.needGroupWhy() } };
    return problem(`groups.${place}`, 'group', inputText.group(`groups.${place}`, read.fault));
  }
  return { groups: input.groups };
}

/** The first group whose neighbours are not told, as a question. */
function untold(groups: PathGroups): Ask {
  const texts = [...groups.front, ...groups.rear];
  const index = texts.findIndex((t) => {
    const read = parseGroup(t);
    return 'group' in read && read.group.neighbours === null;
  });
  const place = PLACES[index] ?? 'front';
  return { field: `groups.${place}`, question: say.needNeighbours(texts[index] ?? '', place), why: say.needNeighboursWhy() };
}

const angleRow = (registry: Registry, ref: string): AngleRow | null => {
  const row = registry.find(ref);
  return row && row.kind !== 'class-table' ? row : null;
};

/**
 * The relation for a single bond. Default by domain: all groups given and Δχ held → the generalised equation; groups
 * not given → the plain 1963 row with its outside spread; a group without Δχ → the plain row likewise. One missing or
 * half-told group stops the generalised equation with a question.
 */
export function chooseRelation(input: SingleBondInput, registry: Registry): SingleChoice {
  const read = readGroups(input);
  if (!('groups' in read)) return read;
  const { groups } = read;
  const wanted = input.relation === undefined || input.relation === '' ? 'default' : input.relation;
  if (wanted !== 'default') {
    const row = registry.find(wanted);
    if (!row) return problem('relation', 'unknown-relation', inputText.unknownRelation(wanted));
    if (row.kind === 'class-table') return problem('relation', 'wrong-relation', inputText.relationKind());
    if (row.kind === 'generalised' && !groups) return { ask: { field: 'groups', question: say.needGroups(), why: say.needGroupWhy() } };
    const domain = applies(row, groups);
    if (domain.reason === 'neighbours-not-told' && groups) return { ask: untold(groups) };
    return { row, groups, domain };
  }
  const generalised = angleRow(registry, GENERALISED_ID);
  if (groups && generalised) {
    const domain = applies(generalised, groups);
    if (domain.reason === 'neighbours-not-told') return { ask: untold(groups) };
    if (domain.verdict !== 'no') return { row: generalised, groups, domain };
  }
  const plain = angleRow(registry, PLAIN_ID);
  if (!plain) return problem('relation', 'unknown-relation', inputText.unknownRelation(PLAIN_ID));
  return { row: plain, groups, domain: applies(plain, groups) };
}
