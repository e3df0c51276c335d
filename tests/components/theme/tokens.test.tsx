import { readFileSync } from 'node:fs';
import path from 'node:path';

import { colorProperty, palettes, type ColorName, type Scheme } from '@/components/theme/tokens';

import { contrast } from '../contrast';

const SCHEMES: Scheme[] = ['light', 'dark'];
const GROUNDS: ColorName[] = ['paper', 'card', 'field'];

/** WCAG 2.2, 1.4.3 (text 4.5 : 1) and 1.4.11 (controls and graphics 3 : 1); 7 : 1 for result words is the product's own measure. */
describe.each(SCHEMES)('contrast in the %s theme', (scheme) => {
  const paint = palettes[scheme];
  const ratio = (a: ColorName, b: ColorName) => contrast(paint[a], paint[b]);

  it.each(GROUNDS)('reads every text colour on %s', (ground) => {
    for (const text of ['ink', 'muted', 'measured', 'calculated', 'judged', 'caution', 'error'] as const) expect([text, ratio(text, ground) >= 4.5]).toEqual([text, true]);
  });

  it('reads inks on their tints and muted text on every tint it stands on', () => {
    const pairs: [ColorName, ColorName][] = [
      ['measured', 'measuredTint'], ['calculated', 'calculatedTint'], ['judged', 'judgedTint'], ['caution', 'cautionTint'], ['error', 'errorTint'], ['error', 'card'],
      ['muted', 'calculatedTint'], ['muted', 'judgedTint'], ['muted', 'measuredTint'], ['muted', 'cautionTint'], ['onInk', 'ink'], ['onInk', 'judged'],
    ];
    for (const [text, ground] of pairs) expect([text, ground, ratio(text, ground) >= 4.5]).toEqual([text, ground, true]);
  });

  it('gives the words of a result 7 : 1', () => {
    const pairs: [ColorName, ColorName][] = [
      ['calculatedWord', 'calculatedTint'], ['judgedWord', 'judgedTint'], ['calculatedWord', 'card'], ['judgedWord', 'card'],
      ['ink', 'calculatedTint'], ['ink', 'judgedTint'], ['ink', 'cautionTint'], ['ink', 'card'], ['ink', 'paper'],
    ];
    for (const [text, ground] of pairs) expect([text, ground, ratio(text, ground) >= 7]).toEqual([text, ground, true]);
  });

  it.each(GROUNDS)('shows the edge of a control on %s', (ground) => {
    expect(ratio('edge', ground)).toBeGreaterThanOrEqual(3);
    for (const mark of ['measured', 'calculated', 'judged', 'caution', 'error'] as const) expect(ratio(mark, ground)).toBeGreaterThanOrEqual(3);
  });
});

it('paints the same ground before the first script as after it', () => {
  const css = readFileSync(path.join(process.cwd(), 'public/app.css'), 'utf8');
  for (const scheme of SCHEMES) {
    for (const name of ['paper', 'ink', 'measured'] as const) {
      expect(css).toMatch(new RegExp(`data-theme="${scheme}"[^}]*${colorProperty(name)}: ${palettes[scheme][name]}`));
    }
  }
});
