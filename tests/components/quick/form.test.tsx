import fc from 'fast-check';

import { emptyForm, fromQuery, hasNoVicinalPath, isAsked, toQuery, toRequest, withField, type QuickForm } from '@/components/quick/form';
import { GROUP_PRESETS } from '@/shared/engine/groups/presets';
import { quickLookRequest } from '@/shared/contracts/quickLook';

const group = fc.constantFrom('', ...GROUP_PRESETS.map(({ text }) => text));
const pair = fc.tuple(group, group);
const typed = fc.string({ maxLength: 12 }).map((text) => text.trim());
const anyForm = fc.record<QuickForm>({
  bond: fc.constantFrom('single', 'double'), j: typed, se: typed, partner: typed, fieldMHz: typed, front: pair, rear: pair, left: pair, right: pair,
  turning: fc.constantFrom('free', 'ring', 'unknown'), relation: fc.constantFrom('', 'vicinal-hh/karplus-1963'), ringSize: fc.constantFrom(null, 5, 6, 8),
});
/** What a link carries: the other bond's groups stay behind. */
const carried = (form: QuickForm): QuickForm => {
  const blank = emptyForm(form.bond);
  return form.bond === 'single'
    ? { ...form, left: blank.left, right: blank.right, ringSize: null }
    : { ...form, front: blank.front, rear: blank.rear, turning: 'unknown', relation: '' };
};

describe('the inputs of a quick look', () => {
  it('come back from a link as they were', () => fc.assert(fc.property(anyForm, (form) => {
    expect(fromQuery(toQuery(form))).toEqual(carried(form));
  })));

  it('make a request that the contract takes, whatever was typed', () => fc.assert(fc.property(anyForm, (form) => {
    expect(quickLookRequest.safeParse(toRequest(form)).error?.issues ?? []).toEqual([]);
  })));

  it('read any query without a throw', () => fc.assert(fc.property(fc.string({ maxLength: 300 }), (text) => {
    expect(['single', 'double']).toContain(fromQuery(`?${text}`).bond);
  })));

  it('leave a part of the groups out of the request', () => {
    const part = { ...emptyForm(), j: '9.6', front: ['O(C)', 'C(C,H,H)'] as [string, string] };
    expect(toRequest(part)).toMatchObject({ groups: null });
    expect(toRequest({ ...part, rear: ['C(C,H,H)', 'H'] })).toMatchObject({ groups: { front: ['O(C)', 'C(C,H,H)'], rear: ['C(C,H,H)', 'H'] } });
  });

  it('ask nothing while no J is typed, but for a double bond without an H,H pair', () => {
    expect(isAsked(emptyForm())).toBe(false);
    expect(isAsked({ ...emptyForm('double'), left: ['C(C,H,H)', 'H'], right: ['O(C)', 'H'] })).toBe(false);
    const three = { ...emptyForm('double'), left: ['C(C,H,H)', 'C(=O,O)'] as [string, string], right: ['C(C,H,H)', 'H'] as [string, string] };
    expect(hasNoVicinalPath(three)).toBe(true);
    expect(isAsked(three)).toBe(true);
  });

  it('take a mend or a choice by the name of its field', () => {
    expect(withField(emptyForm(), 'j', '8.9').j).toBe('8.9');
    expect(withField(emptyForm(), 'se', '0.2').se).toBe('0.2');
    expect(withField(emptyForm('double'), 'ringSize', '6').ringSize).toBe(6);
    expect(withField(emptyForm('double'), 'ringSize', '60').ringSize).toBeNull();
    expect(withField(emptyForm(), 'groups.front', 'O(C)~H').front).toEqual(['O(C)', 'H']);
    expect(withField({ ...emptyForm(), rear: ['C(C,H,H)', ''] }, 'groups.rear', 'H').rear).toEqual(['C(C,H,H)', 'H']);
    expect(withField(emptyForm(), 'nothing', 'x')).toEqual(emptyForm());
  });
});
