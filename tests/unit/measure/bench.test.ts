import { atLeast, atMost, median, rounded } from '@/server/measure/bench/figure';
import { quickLookInputs } from '@/server/measure/bench/inputs';
import { drawFrom } from '@/server/measure/lib/draw';
import { quickLookRequest } from '@/shared/contracts/quickLook';
import { quickLook } from '@/shared/engine';
import { heldForTests } from '../../helpers/registry';

describe('the inputs of the load', () => {
  const inputs = quickLookInputs(1000);
  it('are a thousand different ones, half of each kind of bond, the same in each run', () => {
    expect(new Set(inputs.map((input) => JSON.stringify(input))).size).toBe(1000);
    expect(inputs.filter(({ bond }) => bond === 'double')).toHaveLength(500);
    expect(quickLookInputs(1000)).toEqual(inputs);
  });
  it('can all be answered, so that no refusal is counted as a fast answer', () => {
    const states = inputs.map((input) => quickLook(quickLookRequest.parse(input), heldForTests()).state);
    expect(new Set(states)).toEqual(new Set(['answered']));
  });
});

describe('a figure', () => {
  it('is the middle of its runs', () => {
    expect(median([3, 1, 2])).toBe(2);
    expect(median([4, 1, 3, 2])).toBe(2.5);
    expect(() => median([])).toThrow();
  });
  it('tells its limit and whether it was reached, the limit itself included', () => {
    expect(atMost(3, 3)).toEqual({ limit: '<= 3', ok: true });
    expect(atMost(3, 3.01).ok).toBe(false);
    expect(atLeast(0.4, 0.4)).toEqual({ limit: '>= 0.4', ok: true });
    expect(atLeast(0.4, 0.39).ok).toBe(false);
    expect(rounded(1.23456)).toBe(1.235);
  });
});

describe('the seeded draw', () => {
  it('stays in [0, 1) and repeats from its seed', () => {
    const [one, same, other] = [drawFrom(1), drawFrom(1), drawFrom(2)];
    const values = Array.from({ length: 500 }, one);
    expect(Array.from({ length: 500 }, same)).toEqual(values);
    expect(other()).not.toBe(values[0]);
    expect(Math.min(...values)).toBeGreaterThanOrEqual(0);
    expect(Math.max(...values)).toBeLessThan(1);
  });
});
