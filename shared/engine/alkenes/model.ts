import type { DoubleBondGeometry } from '../../types/answer';
import type { AlkeneClassModel, AlkeneCompound, AlkeneModel, ClassDistribution, ClassTableRow } from '../../types/relation';
import type { SourcedHz } from '../../types/source';
import type { Hz } from '../../types/units';
import { groupOf } from '../groups/group';
import { kindOf } from './classify';

export const GEOMETRIES: readonly DoubleBondGeometry[] = ['cis', 'trans', 'geminal'];

/** A number that the class table keeps among its parameters. @throws RangeError when the row lacks it */
export function tableParameter(row: ClassTableRow, name: string): number {
  const value = row.parameterSets[0]?.values[name];
  if (value === undefined) throw new RangeError(`${row.id} has no parameter ${name}`);
  return value;
}

const valueOf = (c: AlkeneCompound, g: DoubleBondGeometry): Hz | null => (g === 'cis' ? c.cisHz : g === 'trans' ? c.transHz : c.geminalHz);

const mean = (list: readonly number[]): number => list.reduce((s, x) => s + x, 0) / list.length;
const squares = (list: readonly number[]): number => {
  const m = mean(list);
  return list.reduce((s, x) => s + (x - m) ** 2, 0);
};

/** The compounds of a class that hold one geometry, smallest coupling first. */
function valuesOf(compounds: readonly AlkeneCompound[], g: DoubleBondGeometry): SourcedHz[] {
  return compounds
    .flatMap((c) => {
      const jHz = c.doubtful ? null : valueOf(c, g);
      return jHz === null ? [] : [{ jHz, name: c.name, provenance: c.provenance, source: c.note ? `${c.source}; ${c.note}` : c.source }];
    })
    .sort((a, b) => a.jHz - b.jHz);
}

/** Spread inside the classes of one element, for one geometry, in Hz; at least the floor. */
function pooledSpread(groups: readonly (readonly number[])[], floor: Hz): Hz {
  const freedom = groups.reduce((s, g) => s + Math.max(0, g.length - 1), 0);
  const sum = groups.reduce((s, g) => s + (g.length > 1 ? squares(g) : 0), 0);
  return freedom === 0 ? floor : Math.max(floor, Math.sqrt(sum / freedom));
}

function distribution(values: SourcedHz[], pooled: Hz, floor: Hz, weight: number): ClassDistribution | null {
  const j = values.map((v) => v.jHz);
  const low = j[0];
  const high = j[j.length - 1];
  if (low === undefined || high === undefined) return null;
  const freedom = weight + j.length - 1;
  const spreadHz = Math.max(floor, Math.sqrt((weight * pooled ** 2 + squares(j)) / freedom));
  return {
    count: j.length,
    meanHz: mean(j),
    spreadHz,
    scaleHz: spreadHz * Math.sqrt(1 + 1 / j.length),
    degreesOfFreedom: freedom,
    rangeHz: [low, high],
    values,
  };
}

/**
 * Class distributions from the compounds of the table.
 * Each class and geometry is a Student t about the mean of its compounds; the squared spread is that of the class drawn
 * towards the spread pooled over the classes of one element (weight `d`), never below `floor`, and widened by
 * √(1 + 1/n) because the mean itself rests on n compounds. Doubtful rows stay out.
 */
export function alkeneModel(row: ClassTableRow): AlkeneModel {
  const floor = tableParameter(row, 'floor');
  const weight = tableParameter(row, 'd');
  const members = new Map<string, AlkeneCompound[]>(row.classes.map((c) => [c.id, []]));
  for (const c of row.compounds) {
    const kind = kindOf({ left: [groupOf(c.left[0]), groupOf(c.left[1])], right: [groupOf(c.right[0]), groupOf(c.right[1])] });
    const list = members.get(kind.classId);
    if (!list) throw new RangeError(`${c.name} belongs to class ${kind.classId}, which the row does not name`);
    list.push(c);
  }
  const numbers = (id: string, g: DoubleBondGeometry): number[] => valuesOf(members.get(id) ?? [], g).map((v) => v.jHz);
  const pure = row.classes.filter((c) => !c.mixed);
  const spreadFor = (g: DoubleBondGeometry): Hz => pooledSpread(pure.map((c) => numbers(c.id, g)), floor);
  const pooled = { cis: spreadFor('cis'), trans: spreadFor('trans'), geminal: spreadFor('geminal') };
  const classes: Record<string, AlkeneClassModel> = {};
  for (const c of row.classes) {
    const own = members.get(c.id) ?? [];
    const of = (g: DoubleBondGeometry): ClassDistribution | null => distribution(valuesOf(own, g), pooled[g], floor, weight);
    const gaps = own.flatMap((x) => (x.doubtful || x.cisHz === null || x.transHz === null ? [] : [x.transHz - x.cisHz]));
    classes[c.id] = {
      ...c,
      distributions: { cis: of('cis'), trans: of('trans'), geminal: of('geminal') },
      pairGapHz: gaps.length === 0 ? null : [Math.min(...gaps), Math.max(...gaps)],
    };
  }
  const full = (g: DoubleBondGeometry): [Hz, Hz] => {
    const all = valuesOf(row.compounds, g).map((v) => v.jHz);
    return [Math.min(...all), Math.max(...all)];
  };
  return { row, classes, fullHz: { cis: full('cis'), trans: full('trans'), geminal: full('geminal') } };
}
