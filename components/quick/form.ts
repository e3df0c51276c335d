import type { QuickLookRequest } from '@/shared/contracts/quickLook';
import type { RingSize } from '@/shared/types/answer';
import type { GroupText } from '@/shared/types/group';

/** The quick look's inputs as they stand on screen, all as typed. '' = a group not chosen. */
export type GroupPair = [GroupText, GroupText];
export interface QuickForm {
  bond: 'single' | 'double';
  j: string;
  se: string;
  partner: string;
  fieldMHz: string;
  front: GroupPair;
  rear: GroupPair;
  turning: 'free' | 'ring' | 'unknown';
  /** '' = chosen by the domain */
  relation: string;
  left: GroupPair;
  right: GroupPair;
  ringSize: RingSize | null;
}

export const RING_SIZES: readonly RingSize[] = [3, 4, 5, 6, 7, 8];

export const emptyForm = (bond: QuickForm['bond'] = 'single'): QuickForm => ({
  bond, j: '', se: '', partner: '', fieldMHz: '', front: ['', ''], rear: ['', ''], turning: 'unknown', relation: '', left: ['', 'H'], right: ['', 'H'], ringSize: null,
});

export const isWhole = (...pairs: GroupPair[]): boolean => pairs.every((pair) => pair.every((group) => group !== ''));
export const countGiven = (...pairs: GroupPair[]): number => pairs.flat().filter((group) => group !== '').length;

/** Groups that leave no =CH on one end: there is no vicinal coupling to type, and the answer says what to measure instead. */
export const hasNoVicinalPath = (form: QuickForm): boolean =>
  form.bond === 'double' && isWhole(form.left, form.right) && ![form.left, form.right].every((pair) => pair.includes('H'));

/** Is there something to ask the server? */
export const isAsked = (form: QuickForm): boolean => form.j.trim() !== '' || hasNoVicinalPath(form);

const typed = (text: string) => (text.trim() === '' ? undefined : text);

/** The request; groups go only when all four are given, because a part of them answers nothing. */
export function toRequest(form: QuickForm): QuickLookRequest {
  const reading = { j: form.j, se: typed(form.se), partner: typed(form.partner), fieldMHz: typed(form.fieldMHz) };
  if (form.bond === 'single') {
    return {
      bond: 'single', ...reading, groups: isWhole(form.front, form.rear) ? { front: form.front, rear: form.rear } : null,
      turning: form.turning, relation: typed(form.relation),
    };
  }
  return { bond: 'double', ...reading, groups: isWhole(form.left, form.right) ? { left: form.left, right: form.right } : null, ringSize: form.ringSize };
}

/** Puts a value into the field that the server or the engine names (`errors[].pointer`, `mends[].field`, `choices[].field`). */
export function withField(form: QuickForm, field: string, value: string): QuickForm {
  switch (field) {
    case 'j': case 'se': case 'partner': case 'fieldMHz':
      return { ...form, [field]: value };
    case 'turning':
      return { ...form, turning: value === 'free' || value === 'ring' ? value : 'unknown' };
    case 'relation':
      return { ...form, relation: value === 'default' ? '' : value };
    case 'ringSize':
      return { ...form, ringSize: RING_SIZES.find((size) => String(size) === value) ?? null };
    case 'groups': {
      const blank: GroupPair = ['', ''];
      return form.bond === 'single' ? { ...form, front: blank, rear: blank } : { ...form, left: ['', 'H'], right: ['', 'H'] };
    }
    case 'groups.front': case 'groups.rear': case 'groups.left': case 'groups.right': {
      const side = field.slice('groups.'.length) as 'front' | 'rear' | 'left' | 'right';
      return { ...form, [side]: value.includes(SEPARATOR) ? pairFrom(value, form[side]) : withGroup(form[side], value) };
    }
    default:
      return form;
  }
}

const SEPARATOR = '~';
const pairFrom = (text: string, otherwise: GroupPair): GroupPair => {
  const parts = text.split(SEPARATOR).map((part) => part.trim());
  return parts.length === 2 ? [parts[0]!, parts[1]!] : otherwise;
};
/** A single group goes to the place that is still empty. */
const withGroup = (pair: GroupPair, group: GroupText): GroupPair => (pair[0] === '' ? [group, pair[1]] : [pair[0], group]);

const TEXT_KEYS = { j: 'j', se: 'se', partner: 'partner', fieldMHz: 'mhz', relation: 'relation' } as const;

/** The inputs as the query of a link; what is empty is left out, so that a link stays short. */
export function toQuery(form: QuickForm): string {
  const query = new URLSearchParams();
  if (form.bond === 'double') query.set('bond', 'double');
  for (const [key, name] of Object.entries(TEXT_KEYS) as [keyof typeof TEXT_KEYS, string][]) {
    if (key === 'relation' && form.bond === 'double') continue;
    if (form[key].trim() !== '') query.set(name, form[key]);
  }
  const blank = emptyForm();
  const sides = form.bond === 'single' ? (['front', 'rear'] as const) : (['left', 'right'] as const);
  for (const side of sides) if (form[side].join() !== blank[side].join()) query.set(side, form[side].join(SEPARATOR));
  if (form.bond === 'single' && form.turning !== 'unknown') query.set('turning', form.turning);
  if (form.bond === 'double' && form.ringSize !== null) query.set('ring', String(form.ringSize));
  const text = query.toString();
  return text === '' ? '' : `?${text}`;
}

const MAX_TEXT = 80;

/** Reads a link's query; anything it cannot read is as if it were not there. */
export function fromQuery(search: string): QuickForm {
  const query = new URLSearchParams(search);
  let form = emptyForm(query.get('bond') === 'double' ? 'double' : 'single');
  for (const [key, name] of Object.entries(TEXT_KEYS) as [keyof typeof TEXT_KEYS, string][]) {
    form = { ...form, [key]: (query.get(name) ?? '').slice(0, MAX_TEXT) };
  }
  for (const side of ['front', 'rear', 'left', 'right'] as const) {
    const text = query.get(side);
    if (text !== null && text.length <= 2 * MAX_TEXT) form = { ...form, [side]: pairFrom(text, form[side]) };
  }
  form = withField(form, 'turning', query.get('turning') ?? 'unknown');
  return withField(form, 'ringSize', query.get('ring') ?? '');
}

/** The first atom of a group, for a letter on the dial. */
export const firstAtom = (group: GroupText): string => /^[A-Z][a-z]?/.exec(group)?.[0] ?? '';
