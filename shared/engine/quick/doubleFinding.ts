import type { DoubleBondFinding, DoubleBondGeometry, LadderRow } from '../../types/answer';
import type { AlkeneClassModel, AlkeneModel } from '../../types/relation';
import type { SourcedHz } from '../../types/source';
import type { Hz } from '../../types/units';
import { GEOMETRIES } from '../alkenes/model';

/** The ladder of H,H couplings: full range over every class, and range and compounds of the class at hand. */
export function ladder(model: AlkeneModel, cls: AlkeneClassModel | null): LadderRow[] {
  const order: DoubleBondGeometry[] = ['geminal', 'cis', 'trans'];
  return order.map((geometry) => {
    const own = cls?.distributions[geometry] ?? null;
    return { geometry, fullHz: model.fullHz[geometry], classHz: own?.rangeHz ?? null, compounds: own?.values ?? [] };
  });
}

/** The ladder of a ring size: cis only. */
export function ringLadder(model: AlkeneModel, rangeHz: [Hz, Hz], compounds: SourcedHz[]): LadderRow[] {
  return [{ geometry: 'cis', fullHz: model.fullHz.cis, classHz: rangeHz, compounds }];
}

/** ³J(C,H) across C=C: full ranges, and as class range the part where only one geometry is held. */
export function carbonLadder(model: AlkeneModel): LadderRow[] {
  const of = (g: 'cis' | 'trans'): SourcedHz[] =>
    model.row.carbonCouplings.filter((c) => c.geometry === g).map(({ jHz, name, provenance, source }) => ({ jHz, name, provenance, source })).sort((a, b) => a.jHz - b.jHz);
  const cis = of('cis');
  const trans = of('trans');
  const range = (list: SourcedHz[]): [Hz, Hz] => [list[0]?.jHz ?? 0, list[list.length - 1]?.jHz ?? 0];
  const [cisLow, cisHigh] = range(cis);
  const [transLow, transHigh] = range(trans);
  return [
    { geometry: 'cis', fullHz: [cisLow, cisHigh], classHz: [cisLow, Math.min(cisHigh, transLow)], compounds: cis },
    { geometry: 'trans', fullHz: [transLow, transHigh], classHz: [Math.max(transLow, cisHigh), transHigh], compounds: trans },
  ];
}

/** A finding with nothing decided, to be filled. */
export function emptyFinding(setting: DoubleBondFinding['setting'], rows: LadderRow[]): DoubleBondFinding {
  return {
    setting, classId: null, className: null, likelihoods: [], geometry: null, descriptors: null, descriptor: null, descriptorNote: null, ladder: rows,
  };
}

export const geometriesOf = (geminalToo: boolean): readonly DoubleBondGeometry[] => (geminalToo ? GEOMETRIES : ['cis', 'trans']);
