import type { DoubleBondGeometry } from '../../types/answer';
import type { Hz } from '../../types/units';
import { hz, hzRange, inHundred, NBSP } from '../../format/number';

type EZ = { cis: 'E' | 'Z'; trans: 'E' | 'Z' } | null;
const Capital: Readonly<Record<DoubleBondGeometry, string>> = { cis: 'Cis', trans: 'Trans', geminal: 'Geminal' };
const ez = (d: EZ): string => (d ? ` Here trans is ${d.trans} and cis is ${d.cis}.` : '');

/** Sentences about a double bond. */
export const doubleText = {
  Capital,
  named: (g: 'cis' | 'trans', d: EZ) => (d ? `${Capital[g]} (${d[g]})` : Capital[g]),
  decided: (name: string, j: string, g: DoubleBondGeometry, className: string, inside: boolean) =>
    `${name}: ${j} lies ${inside ? 'among' : 'near'} the ${g} values known with ${className}`,
  decidedDetail: (other: DoubleBondGeometry, edgeHz: Hz, gapHz: Hz, side: 'largest' | 'smallest', d: EZ) =>
    `The ${side} ${other} value held there is ${hz(edgeHz)}, ${hz(gapHz)} ${side === 'largest' ? 'below' : 'above'}.${ez(d)}`,
  notGivenDecided: (g: 'cis' | 'trans', j: string) => `${Capital[g]} as far as ${j} tells without the groups`,
  notGivenDetail: () => `Electronegative groups lower both couplings, Si, Sn, B and metals raise them: give the groups for more.`,
  notGivenOpen: (j: string) => `${j} does not tell cis from trans without the groups`,
  between: (j: string, className: string) => `${j} lies between the cis and the trans values known with ${className}`,
  close: (j: string, className: string) => `${j} lies where cis and trans values come close with ${className}`,
  guarded: (j: string, className: string) => `${j} lies in a stretch that is left open with ${className}`,
  guardedDetail: (cis: [Hz, Hz], trans: [Hz, Hz], open: [Hz, Hz], d: EZ) =>
    `Held there: cis ${hzRange(...cis)}, trans ${hzRange(...trans)}; from ${hzRange(...open)} nothing is decided, because the groups move both.${ez(d)}`,
  beyond: (j: string, className: string) => `${j} lies outside the values known with ${className}`,
  noValues: (j: string, elements: string) => `No values are held for ${elements} on the bond: ${j} is not judged`,
  noValuesDetail: () => `A band from other groups would mislead here.`,
  betweenDetail: (below: Hz, above: Hz, d: EZ) => `It is ${hz(below)} below the smallest trans value and ${hz(above)} above the largest cis value we hold.${ez(d)}`,
  rangesDetail: (cis: [Hz, Hz], trans: [Hz, Hz], d: EZ) => `Held there: cis ${hzRange(...cis)}, trans ${hzRange(...trans)}.${ez(d)}`,
  limit: (j: string) => `${j} is a limit and decides neither cis nor trans`,
  diene: (j: string) => `${j} may be the single bond between two double bonds`,
  dieneDetail: (d: EZ) => `A cis CH=CH and the central bond of a diene both give about 10${NBSP}Hz.${ez(d)}`,
  rulesOut: (g: DoubleBondGeometry, className: string, range: [Hz, Hz], weight: number) =>
    `${Capital[g]}: held with ${className} from ${hzRange(range[0], range[1])}; its share is ${inHundred(weight)}.`,
  rulesOutLimit: (g: DoubleBondGeometry, low: Hz) => `${Capital[g]}: the smallest value held is ${hz(low)}.`,
  cannotWhich: () => 'Which C=C the two H sit on, where there are several.',
  cannotAbsolute: () => 'Absolute configuration: _J_ is the same for mirror images.',
  terminalName: (g: DoubleBondGeometry) => (g === 'geminal' ? 'Geminal ²_J_ of =CH₂' : `${Capital[g]} ³_J_ to =CH₂`),
  terminalNoEz: () => 'A =CH₂ has no E or Z: this says which of its two H couples.',
  terminalGeminalOnly: () => 'Both H sit on one carbon: the coupling is ²_J_, and the bond has no E or Z',
  terminalGeminalDetail: (range: [Hz, Hz] | null) => (range ? `Geminal values held on =CH₂: ${hzRange(range[0], range[1])} in size.` : ''),
  ethene: () => 'All four H are equivalent: no coupling shows in the plain spectrum',
  ethenDetail: () => 'It is read from ¹³C satellites or a deuterated sample.',
  noVicinal: () => 'No vicinal H,H coupling crosses this bond',
  noVicinalThree: () => 'Three groups leave one =CH. An allylic ⁴_J_ does not tell E from Z.',
  noVicinalFour: () => 'Four groups leave no =CH. ⁿ_J_(C,C) or NOE between the groups is left.',
  ringFits: (j: string, size: number) => `Cis by the ring: ${j} fits CH=CH in a ring of ${size}`,
  ringOutside: (j: string, size: number) => `${j} lies outside the values known for CH=CH in a ring of ${size}`,
  ringDetail: (parent: string, parentHz: Hz, range: [Hz, Hz]) => `${capitalise(parent)} has ${hz(parentHz)}; the range is ${hzRange(range[0], range[1])}.`,
  ringHetero: () => 'O, N or C=O in or beside the CH=CH moves it, mostly down.',
  ringLarge: (j: string) => `A ring of eight or more holds cis and trans; ${j} is read as in an open chain`,
  ringCheck: { id: 'ring-check', title: 'Ring size and pair', detail: 'Are both H on the C=C, and is the ring as large as told?' },
  ringNoEz: () => 'In this ring the double bond can only be cis: E or Z is not in question.',
  tieNote: () => 'A tie at the first atom and its neighbours: cis or trans only, no E or Z.',
  untoldNote: () => 'Neighbours are not told: cis or trans only, no E or Z.',
  ezNote: (d: { cis: 'E' | 'Z'; trans: 'E' | 'Z' }) => `Trans is ${d.trans} and cis is ${d.cis} with these groups.`,
  triNote: (carbon: string, higher: string, geometry: { cis: 'E' | 'Z'; trans: 'E' | 'Z' }) =>
    `${higher} ranks above ${carbon}: that carbon trans to the =CH means ${geometry.trans}, cis means ${geometry.cis}.`,
  triNotePlain: (carbon: string, geometry: { cis: 'E' | 'Z'; trans: 'E' | 'Z' }) => `${carbon} trans to the =CH means ${geometry.trans}, cis means ${geometry.cis}.`,
  next: {
    otherIsomer: (gapHz: Hz | null) => ({
      id: 'other-isomer', title: 'The other isomer’s _J_',
      detail: gapHz === null
        ? 'Lower: yours is trans. Higher: yours is cis.'
        : `Lower, by ${hz(gapHz)} or more in every pair held: yours is trans. Higher: yours is cis.`,
    }),
    noe: { id: 'noe', title: 'NOE between the two =CH', detail: 'Strong: cis. None, with a working control: trans.' },
    carbon: { id: '3jch', title: '³_J_(C,H) to the carbon group', detail: 'Larger when trans; needs both isomers.' },
    groups: { id: 'give-groups', title: 'The groups on both carbons', detail: 'No single band serves all classes: name at least the first atoms.' },
    satellites: { id: 'satellites', title: '¹³C satellites of the =CH', detail: 'They show the coupling of two equivalent H.' },
    cosy: { id: 'cosy', title: 'COSY: which two H couple', detail: 'Both on the same C=C, or one on each of two.' },
    carbonBoth: { id: '3jch-both', title: '³_J_(C,H) of both isomers', detail: 'The larger is trans for the same kind of carbon.' },
    carbonOne: { id: '3jch-one', title: '³_J_(C,H) of this isomer alone', detail: `C=O or CN carbon: 10.5${NBSP}Hz or more trans, 6.0 or less cis (common practice, no source); CHO alone never decides.` },
    noeOwnSide: { id: 'noe-side', title: 'NOE from the =CH', detail: 'To the group on its own side.' },
    noeGroups: { id: 'noe-groups', title: 'NOE between groups across the bond', detail: 'Close: on the same side.' },
    sign: { id: 'sign', title: 'The sign of _J_', detail: 'E.COSY or a simulation; geminal may be negative, vicinal is positive.' },
    partner: { id: 'partner', title: 'The partner’s splitting', detail: 'Equal within 2_σ_: the pair holds. If not: another partner, or a misread line.' },
    control: { id: 'noe', title: 'NOE between the two =CH, as a control', detail: 'Strong: cis. None, with a working control: trans.' },
  },
  steps: {
    classes: 'Class', classSummary: (name: string) => `known with ${name}`, weights: 'share', undecided: 'decides nothing', values: (n: number) => `${n} compounds held`,
    why: 'reason', setting: 'bond', groups: 'groups, left and right', notGiven: 'not given', ring: 'ring',
  },
  grade: {
    inside: 'More than 2_σ_ inside its class, likelihood 0.95 or more.',
    'near-edge': 'Within 2_σ_ of the stretch that decides nothing.',
    'outside-range': 'Outside the values held, though nearest to this class.',
    likelihood: 'By likelihood: assigned from 0.95, tentative from 0.80 (common practice, no source).',
    'undecided-stretch': 'Inside the stretch that decides nothing in this class (common practice, only withholds).',
    few: 'Too few compounds are held to assign.',
    neither: 'Far from both classes.',
    'no-values': 'No compound is held for this class.',
    limit: 'A limit is an interval, not a value.',
    'from-memory': 'A value of the class is from memory: tentative at most.',
    ring: 'By the ring size; _J_ is compared only.',
    'no-path': 'No vicinal path.',
    'diene': 'A vinyl group: the single bond gives the same size.',
    partner: 'The partners differ.',
    'ring-large': 'As in an open chain, tentative at most.',
  },
} as const;

function capitalise(s: string): string {
  return s.charAt(0).toUpperCase() + s.slice(1);
}
