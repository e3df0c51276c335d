import { fixed } from '../../format/number';
import type { Curve } from './curve';
import { effectiveDchi } from './generalised';

const term = (value: number, decimals: number, what: string): string => `${value < 0 ? '−' : '+'} ${fixed(Math.abs(value), decimals)}${what}`;
const lead = (text: string): string => text.replace(/^\+ /, '').replace(/^− /, '−');

/** The formula with its numbers put in. */
export function workedFormula(curve: Curve): string {
  const v = (name: string): number => curve.set.values[name] ?? 0;
  switch (curve.row.kind) {
    case 'three-term':
      return curve.row.form === 'fourier'
        ? `³_J_ = ${lead(term(v('A'), 2, ''))} ${term(v('B'), 2, ' cos _φ_')} ${term(v('C'), 2, ' cos 2_φ_')}`
        : `³_J_ = ${lead(term(v('A'), 2, ' cos²_φ_'))} ${term(v('B'), 2, ' cos _φ_')} ${term(v('C'), 2, '')}`;
    case 'two-branch':
      return `³_J_ = ${fixed(v('J0'), 1)} cos²_φ_ ${term(v('K'), 2, '')} up to 90°, ${fixed(v('J180'), 1)} cos²_φ_ ${term(v('K'), 2, '')} from 90°`;
    case 'generalised': {
      const head = `³_J_ = ${lead(term(v('P1'), 2, ' cos²_φ_'))} ${term(v('P2'), 2, ' cos _φ_')}${v('P3') === 0 ? '' : ` ${term(v('P3'), 2, '')}`}`;
      const groups = curve.substituents.map((s) => {
        const d = effectiveDchi(curve.set, s);
        const angle = `${s.xi > 0 ? '' : '−'}_φ_ + ${fixed(v('P6') * Math.abs(d), 1)}°`;
        return `${term(d, 3, ` [${fixed(v('P4'), 2)} ${term(v('P5'), 2, ` cos²(${angle})`)}]`)}`;
      });
      return [head, ...groups].join(' ');
    }
  }
}
