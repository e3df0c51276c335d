import type { Hz } from '../../types/units';
import { fixed, hz, hzRange, inHundred, NBSP } from '../../format/number';
import type { DomainReason } from '../../engine/relations/applies';

const list = (words: readonly string[]): string =>
  words.length < 2 ? (words[0] ?? '') : `${words.slice(0, -1).join(', ')} or ${words[words.length - 1] ?? ''}`;
/** Stretches hold commas themselves, so three or more are parted by semicolons. */
const stretches = (parts: readonly string[]): string =>
  parts.length < 3 ? parts.join(', or ') : `${parts.slice(0, -1).join('; ')}; or ${parts[parts.length - 1] ?? ''}`;
/** Words get a capital at the start of a sentence; sector codes (sc, ap) stay as they are. */
const capital = (s: string): string => (/^[a-z]{4}/.test(s) ? s.charAt(0).toUpperCase() + s.slice(1) : s);

/** Sentences about a single bond. */
export const singleText = {
  list,
  stretches,
  angleName: (even: boolean) => (even ? '|_φ_|' : '_φ_'),
  angles: (parts: readonly string[]) => capital(stretches(parts)),
  noRoot: (j: string) => `No angle gives ${j} with these groups`,
  noRootPlain: (j: string) => `No angle gives ${j} by this relation`,
  reach: (minHz: Hz, maxHz: Hz, spreadHz: Hz) => `The relation reaches from ${hzRange(minHz, maxHz)}, and its error is ${hz(spreadHz)}.`,
  justBeyond: (j: string, missHz: Hz, above: boolean) =>
    `No angle gives ${j} exactly: it lies ${hz(missHz)} ${above ? 'above the largest' : 'below the smallest'} value of the relation, within the error.`,
  stillOpen: (part: string) => `Still open: ${part}, rare in an open chain but not excluded by _J_.`,
  ifTurning: (j: string, form: 'ap' | 'sc') =>
    `If the bond turns freely, ${j} is an average in which ${form === 'ap' ? 'the ap form weighs' : 'the sc forms weigh'} most.`,
  evenSign: () => 'The sign of _φ_ stays open.',
  coverage: () => `Arcs are at 95${NBSP}%, both errors taken together.`,
  averaged: (j: string) => `${j} may be an average over rotamers`,
  averagedDetail: (anglesText: string) =>
    `Read as one angle it gives ${anglesText}; read as an average it says only that sc and ap forms are both there. One angle is not supported.`,
  averagedNoAngle: () => 'Read as an average it says only that sc and ap forms are both there.',
  wide: (j: string) => `${j} leaves most angles open`,
  wideDetail: (parts: readonly string[], given: boolean) =>
    `Allowed at 95${NBSP}%: ${stretches(parts)}. ${given ? 'The error is too large to say more.' : 'Give the groups on both carbons for a narrower answer.'}`,
  wholeCircle: (j: string) => `${j} says nothing about the angle`,
  limitHeadline: (j: string, parts: readonly string[]) => `${capital(stretches(parts))} for ${j}`,
  limitEmpty: (j: string) => `No angle gives ${j}`,
  outsideDomain: () => 'No angle: the path lies outside this relation’s domain',
  domain: (reason: DomainReason, elements: readonly string[], spreadHz: Hz): string => {
    const of = list(elements);
    switch (reason) {
      case 'inside':
        return `Inside its domain, spread ${hz(spreadHz)}.`;
      case 'groups-not-given':
        return `Groups not given: spread ${hz(spreadHz)}, common practice without a source.`;
      case 'neighbours-not-told':
        return `The neighbours of ${of} are not told.`;
      case 'no-dchi':
        return `No Δ_χ_ is held for ${of}.`;
      case 'sp2-neighbour':
        return `An unsaturated group beside the path: spread ${hz(spreadHz)}.`;
      case 'crowded-electronegative':
        return `Three or more electronegative atoms on one carbon: spread ${hz(spreadHz)}.`;
      case 'polar-carbon':
        return `${of} on the path: a plain curve takes no account of it, spread ${hz(spreadHz)} or more.`;
      case 'not-hydrocarbon':
        return `${of} on the path: the curve is for hydrocarbon groups, spread ${hz(spreadHz)} or more.`;
    }
  },
  partnerDiffers: (a: string, b: string) => `${a} and ${b} at the partner differ by more than their errors`,
  partnerDetail: (gapHz: Hz, sigmaHz: Hz) =>
    `The gap is ${hz(gapHz, 2)} and 2_σ_ is ${hz(2 * sigmaHz, 2)}: no answer is drawn from the pair.`,
  rulesOutArc: (parts: readonly string[]) => `${capital(list(parts))}: outside the arcs at 95${NBSP}%.`,
  cannotSign: () => 'The sign of _φ_: this relation gives the same _J_ for both.',
  cannotAbsolute: () => 'Absolute configuration: _J_ is the same for mirror images.',
  cannotAverage: () => 'Whether one form or several are there: that takes a second coupling or temperature.',
  cannotRing: () => 'Three-membered and strongly bent rings: the relation fails there, and the ring size is not asked.',
  needGroup: (place: string) => `Which group is missing on the ${place} carbon?`,
  needGroupWhy: () => 'The generalised equation runs only when every group is given; H counts as one.',
  needNeighbours: (element: string, place: string) => `What else does the ${element} on the ${place} carbon carry?`,
  needNeighboursWhy: () => 'Its own atoms shift _J_: name them, as in C(H,H,H) or O(C), or leave the groups out.',
  needGroups: () => 'Which groups sit on the two carbons?',
  steps: {
    reading: 'Reading',
    relation: 'Relation',
    roots: 'Angles',
    grade: 'Grade',
    typed: 'typed',
    error: '± (one standard error)',
    partner: 'partner',
    groups: 'groups, front and rear',
    notGiven: 'not given',
    spread: 'spread',
    sigma: '_σ_ = √(±² + spread²)',
    coverage: `allowed |_J_(_φ_) − _J_|`,
    rootCount: (n: number) => (n === 0 ? 'no root' : n === 1 ? '1 root' : `${n} roots`),
    arcs: (n: number) => (n === 1 ? '1 arc' : `${n} arcs`),
    rootLabel: (i: number) => `root ${i + 1}`,
    arcLabel: (i: number) => `arc ${i + 1}`,
    within: (tolerance: Hz) => `≤ ${hz(tolerance, 2)}`,
    gradeTentative: 'An angle from one coupling is tentative at most (common practice, no source).',
    gradeOpen: 'Not decided: see the answer.',
    likelihood: (w: number) => inHundred(w),
  },
  next: {
    geminal: { id: 'geminal', title: 'Is it geminal?', detail: `Two H on one carbon: 10 to 15${NBSP}Hz in size is usual.` },
    fieldAndUnit: (jHz: Hz, fieldMHz: number | null) => {
      const field = fieldMHz ?? 500;
      const other = field === 400 ? 500 : 400;
      const ppm = Math.abs(jHz) / field;
      return {
        id: 'field-unit', title: 'Field and unit',
        detail: `${fixed(ppm, 4)} ppm at ${fixed(field, 0)}${NBSP}MHz is ${hz(Math.abs(jHz))}; at ${other}${NBSP}MHz ${hz(ppm * other)}.`,
      };
    },
    twoSplittings: { id: 'two-splittings', title: 'One splitting or two?', detail: 'The outer lines of a dd lie _J_ + _J_′ apart.' },
    groups: { id: 'groups', title: 'Groups', detail: 'Fewer electronegative groups raise the curve.' },
    carbon: { id: '3jch', title: '³_J_(C,H) on the same bond', detail: `About 8${NBSP}Hz when that C and H are anti, about 2 when gauche, as in cyclohexane (8.1 and 2.1${NBSP}Hz).` },
    noe: { id: 'noe', title: 'NOE between the two H', detail: 'Stronger for sp and sc than for ap: compare with a pair of known distance.' },
    temperature: { id: 'temperature', title: '_J_ at a second temperature', detail: `A change above 0.5${NBSP}Hz over 30${NBSP}K: an average. None: one form, or equal ones (common practice, no source).` },
    otherCoupling: (values: readonly string[]) => ({ id: 'other-coupling', title: 'The coupling to another H on the bond', detail: `By this relation ${list(values)}.` }),
    partner: { id: 'partner', title: 'The partner’s splitting', detail: 'Equal within 2_σ_: the pair holds. If not: another partner, or a misread line.' },
    giveGroups: { id: 'give-groups', title: 'The groups on both carbons', detail: 'Then the generalised equation applies, with a spread of 0.5 Hz in place of 3.' },
    cosy: { id: 'cosy', title: 'COSY cross peak of the pair', detail: 'It shows which two H couple; read both splittings again there.' },
  },
} as const;
