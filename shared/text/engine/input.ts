import type { FieldName } from '../../types/reading';
import type { GroupFault } from '../../engine/groups/group';
import { fixed, hz, NBSP } from '../../format/number';

/** What the reading's gate says. One sentence each: what, where, how to mend it. */
const WHERE: Partial<Record<FieldName, string>> = {
  j: '_J_', se: '±', partner: 'the partner’s splitting', fieldMHz: 'the field', 'groups.front': 'the front groups', 'groups.rear': 'the rear groups',
  'groups.left': 'the left groups', 'groups.right': 'the right groups',
};
const at = (field: FieldName): string => WHERE[field] ?? field;
const shown = (typed: string): string => `“${typed.trim().slice(0, 40)}”`;

export const inputText = {
  empty: (field: FieldName) => `Type ${at(field)} in Hz: 9.6, 9,6 and 9.6${NBSP}Hz are all read.`,
  tooLong: (field: FieldName) => `${at(field)} takes one number of at most 40 characters.`,
  notANumber: (field: FieldName, typed: string) => `${shown(typed)} in ${at(field)} is not a number: type it in Hz, as in 9.6.`,
  twoNumbers: (field: FieldName, typed: string) => `${shown(typed)} in ${at(field)} holds more than one number: choose one, each coupling is read by itself.`,
  zero: () => `0${NBSP}Hz in _J_ is no measured splitting: type the line width as a limit, as in < 1.`,
  ppm: (typed: string, fieldKnown: boolean) =>
    fieldKnown
      ? `${shown(typed)} in _J_ is a distance in ppm: take it times the field.`
      : `${shown(typed)} in _J_ is a distance in ppm: type the field in MHz, or _J_ in Hz.`,
  ppmSuspected: (typed: string, fieldKnown: boolean) =>
    fieldKnown
      ? `${shown(typed)} in _J_ is below 0.3${NBSP}Hz: was it read in ppm? Then take it times the field.`
      : `${shown(typed)} in _J_ is below 0.3${NBSP}Hz: was it read in ppm? Type the field in MHz, or _J_ in Hz.`,
  otherUnit: (field: FieldName, unit: string) => `${at(field)} is read in Hz, not ${unit}: convert it first.`,
  tooLarge: (jHz: number) => `${hz(jHz, 0)} in _J_ is out of any H,H range: is it ¹_J_(C,H)? Type ³_J_(H,H) in Hz.`,
  limitNegative: () => 'A limit in _J_ is a size: type it without the sign, as in < 1.5.',
  useHz: (value: string) => `Use ${value}${NBSP}Hz`,
  useLimit: (value: string) => `Use < ${value}${NBSP}Hz`,
  use: (value: string) => `Use ${value}`,
  seZero: () => `± 0 is no error: a reading has one, ${hz(0.2)} stands when none is known.`,
  seNegative: () => `± is a size: type it without the sign, ${hz(0.2)} stands when none is known.`,
  seLarge: (value: number) => `± ${hz(value)} is larger than any coupling here can bear: type one standard error in Hz.`,
  fieldRange: (typed: string) => `${shown(typed)} in the field is outside 20 to 1500${NBSP}MHz: type the ¹H frequency, as in 500.`,
  temperature: (typed: string) => `${shown(typed)} is no temperature in K.`,
  noteComma: (typed: string, read: string) => `Decimal comma: ${typed.trim()} is read as ${read}${NBSP}Hz.`,
  noteUnit: (read: string) => `The unit was typed: ${read}${NBSP}Hz.`,
  noteApproximate: (read: string, se: number) => `Read as ${read} ± ${hz(se)}, because it was typed as about.`,
  noteDefaultError: () => `± ${hz(0.2)} stands until you type your own (common practice, no source).`,
  noteLimit: (read: string, upper: boolean) => (upper ? `A limit: any _J_ up to ${read}${NBSP}Hz, never 0.` : `A limit: any _J_ from ${read}${NBSP}Hz up.`),
  noteRange: (from: string, to: string, middle: number, se: number) => `${from} to ${to} is read as ${fixed(middle, 2)} ± ${fixed(se, 2)}${NBSP}Hz.`,
  noteError: (read: string, se: string) => `Read as ${read} with ± ${se}${NBSP}Hz.`,
  noteCoarse: (typed: string) => `${typed.trim()} was typed without decimals: rounding alone is ± ${hz(0.29, 2)}.`,
  noteNegativeKept: () => 'The sign is kept as typed; a plain spectrum shows the size only.',
  negativeQuestion: (size: string) => `Is ${size}${NBSP}Hz the size of this coupling?`,
  negativeWhy: () => 'A vicinal H,H coupling across a single bond is positive; two H on one carbon couple with a negative ²_J_.',
  group: (field: FieldName, fault: GroupFault): string => {
    switch (fault.code) {
      case 'empty':
        return `One of ${at(field)} is missing: choose it, H included.`;
      case 'form':
        return `${shown(fault.text)} in ${at(field)} is not read: write the first atom and its neighbours, as in C(=O,O).`;
      case 'element':
        return `${shown(fault.symbol)} in ${at(field)} is no element that is held: write its symbol, as in Si(C,C,C).`;
      case 'bonds':
        return `${fault.element} in ${at(field)} has ${fault.has} bonds to its neighbours where ${fault.needs} are needed: name them all, H included.`;
    }
  },
  unknownRelation: (id: string) => `${shown(id)} is no relation that is held: choose one from the list.`,
  relationKind: () => 'This relation does not speak about this bond: choose one from the list.',
} as const;
