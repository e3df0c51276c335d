import fc from 'fast-check';

import { CASE_SORTS, filterFrom, isFiltered, paramsOf, searchOf, type CaseFilter } from '@/components/cases/logic/listFilter';
import { LIMITS } from '@/shared/limits';
import { GRADES } from '@/shared/types/answer';
import { CASE_STATES } from '@/shared/types/case';

const filter: fc.Arbitrary<CaseFilter> = fc.record({
  q: fc.string({ minLength: 1, maxLength: 20 }).filter((text) => text.trim() === text && text !== ''), project: fc.uuid(), state: fc.constantFrom(...CASE_STATES), grade: fc.constantFrom(...GRADES),
  person: fc.uuid(), tag: fc.constantFrom('alkene', 'NOE', 'β-lactam'), sort: fc.constantFrom(...CASE_SORTS.filter((sort) => sort !== 'changed')),
}, { requiredKeys: [] });

describe('the filter of the log in the address', () => {
  it('comes back from the address as it went in', () => fc.assert(fc.property(filter, (each) => {
    expect(filterFrom(paramsOf(each))).toEqual(each);
    const search = new URLSearchParams(searchOf(each));
    expect(filterFrom(Object.fromEntries(search))).toEqual(each);
  })));

  it('leaves out what no list could be asked for', () => {
    expect(filterFrom({ state: 'lost', grade: 'certain', project: 'not-an-id', sort: 'price', q: '   ', tag: ['a', 'b'] })).toEqual({ tag: 'a' });
    expect(filterFrom({ q: 'x'.repeat(LIMITS.search + 50) }).q).toHaveLength(LIMITS.search);
  });

  it('takes a cleared filter out of the address and keeps the usual order unsaid', () => {
    expect(paramsOf({ sort: 'changed' })).toEqual({ q: undefined, project: undefined, state: undefined, grade: undefined, person: undefined, tag: undefined, sort: undefined });
    expect(searchOf({ q: 'enol ether' })).toBe(`q=enol+ether&limit=${LIMITS.pageSize}`);
    expect(searchOf({}, 'abc=')).toContain('cursor=abc%3D');
  });

  it('counts an order as no filter', () => {
    expect(isFiltered({ sort: 'due' })).toBe(false);
    expect(isFiltered({ tag: 'NOE' })).toBe(true);
  });
});
