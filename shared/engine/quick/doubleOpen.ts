import type { CautionId, DoubleBondGeometry, NextMeasurement } from '../../types/answer';
import type { AlkeneClassModel } from '../../types/relation';
import { hzAsTyped } from '../../format/number';
import { doubleText as say } from '../../text/engine/double';
import { isVinyl } from '../groups/group';
import { nameGeometries } from '../alkenes/descriptors';
import { judgeClass, judgeWithoutGroups, undecidedStretch, type ClassVerdict } from '../alkenes/judge';
import type { DoubleContext, DoubleVerdict } from './doubleContext';
import { emptyFinding, geometriesOf, ladder } from './doubleFinding';

/** Where a diene's central single bond couples (couplings of s-trans dienes, about 10 Hz; width common practice). */
const DIENE_HZ = [9.5, 11.5] as const;
/** Below so many compounds a class ranks only (our choice; it only adds a caution). */
const FEW_COMPOUNDS = 5;

const twoWays = (cls: AlkeneClassModel): boolean => cls.distributions.cis !== null && cls.distributions.trans !== null;

/** The reason why nothing is decided, in a sentence, and where the value lies. */
function openWords(context: DoubleContext, cls: AlkeneClassModel, descriptors: ReturnType<typeof nameGeometries>['descriptors']): { headline: string; detail: string } {
  const { reading } = context.readings;
  const j = hzAsTyped(reading);
  const cis = cls.distributions.cis;
  const trans = cls.distributions.trans;
  if (!cis || !trans) return { headline: say.noValues(j, (context.kind?.elements ?? []).filter((e) => e !== 'C').join(', ') || 'these groups'), detail: say.noValuesDetail() };
  const ranges = say.rangesDetail(cis.rangeHz, trans.rangeHz, descriptors);
  if (reading.limit !== 'none') return { headline: say.limit(j), detail: ranges };
  const below = trans.rangeHz[0] - reading.jHz;
  const above = reading.jHz - cis.rangeHz[1];
  if (below > 0 && above > 0) return { headline: say.between(j, cls.name), detail: say.betweenDetail(below, above, descriptors) };
  const stretch = undecidedStretch(cls, context.kind?.elements ?? [], context.model.row);
  if (stretch && reading.jHz >= stretch[0] && reading.jHz <= stretch[1]) {
    return { headline: say.guarded(j, cls.name), detail: say.guardedDetail(cis.rangeHz, trans.rangeHz, stretch, descriptors) };
  }
  const outside = reading.jHz > trans.rangeHz[1] || reading.jHz < Math.min(cis.rangeHz[0], trans.rangeHz[0]);
  return { headline: outside ? say.beyond(j, cls.name) : say.close(j, cls.name), detail: ranges };
}

function nextFor(context: DoubleContext, cls: AlkeneClassModel | null, decided: boolean): NextMeasurement[] {
  if (context.kind?.symmetric) return [say.next.satellites, say.next.otherIsomer(cls?.pairGapHz?.[0] ?? null)];
  if (decided) return [say.next.control];
  const withCarbon = context.groups === null || [...context.groups.left, ...context.groups.right].some((g) => g.element === 'C');
  return [
    ...(context.groups === null ? [say.next.groups] : []),
    say.next.otherIsomer(cls?.pairGapHz?.[0] ?? null),
    say.next.noe,
    ...(withCarbon ? [say.next.carbon] : []),
  ];
}

/** Geometries that an upper limit alone closes: it lies below the undecided stretch, and below every value held by twice the spread. */
function closedByLimit(context: DoubleContext, cls: AlkeneClassModel): string[] {
  const { reading } = context.readings;
  const stretch = undecidedStretch(cls, context.kind?.elements ?? [], context.model.row);
  if (reading.limit !== 'upper' || (stretch && reading.jHz >= stretch[0])) return [];
  return (['cis', 'trans'] as const).flatMap((g) => {
    const d = cls.distributions[g];
    return d && reading.jHz + 2 * d.spreadHz < d.rangeHz[0] ? [say.rulesOutLimit(g, d.rangeHz[0])] : [];
  });
}

/** A CH=CH with one group on each carbon, in an open chain. `cap` keeps it tentative (large rings). */
export function judgeDisubstituted(context: DoubleContext, cap: boolean): DoubleVerdict {
  const { readings, model, groups, kind } = context;
  const { reading } = readings;
  if (!groups || !kind) return judgeNotGiven(context);
  const cls = model.classes[kind.classId];
  if (!cls) throw new RangeError(`the class table has no class ${kind.classId}`);
  const naming = nameGeometries(groups, kind);
  const vinyl = [...groups.left, ...groups.right].some(isVinyl);
  const diene = vinyl && reading.limit === 'none' && reading.jHz >= DIENE_HZ[0] && reading.jHz <= DIENE_HZ[1];
  const judged: ClassVerdict = judgeClass(model.row, cls, kind.elements, reading, geometriesOf(false));
  const g = diene ? null : judged.geometry === 'geminal' ? null : judged.geometry;
  const grade = diene || !g ? 'not-decided' : cap && judged.grade === 'assigned' ? 'tentative' : judged.grade;
  const j = hzAsTyped(reading);
  const own = g ? cls.distributions[g] : null;
  const other: DoubleBondGeometry = g === 'cis' ? 'trans' : 'cis';
  const rival = cls.distributions[other];
  let said = openWords(context, cls, naming.descriptors);
  if (diene) said = { headline: say.diene(j), detail: say.dieneDetail(naming.descriptors) };
  else if (g && own && rival) {
    const inside = reading.jHz >= own.rangeHz[0] && reading.jHz <= own.rangeHz[1];
    const edge = g === 'trans' ? rival.rangeHz[1] : rival.rangeHz[0];
    said = {
      headline: say.decided(say.named(g, naming.descriptors), j, g, cls.name, inside),
      detail: say.decidedDetail(other, edge, Math.abs(reading.jHz - edge), g === 'trans' ? 'largest' : 'smallest', naming.descriptors),
    };
  }
  const otherWeight = judged.likelihoods.find((l) => l.geometry === other)?.weight ?? 0;
  const few = twoWays(cls) && Math.min(cls.distributions.cis?.count ?? 0, cls.distributions.trans?.count ?? 0) < FEW_COMPOUNDS;
  const border: CautionId | false = !diene && twoWays(cls) && ['undecided-stretch', 'near-edge', 'likelihood'].includes(judged.reason) && 'alkene-border';
  return {
    grade, reason: diene ? 'diene' : cap && g ? 'ring-large' : judged.reason, likelihood: grade === 'not-decided' ? null : judged.likelihood, ...said,
    rulesOut: g && rival ? [say.rulesOut(other, cls.name, rival.rangeHz, otherWeight)] : closedByLimit(context, cls),
    cannotTell: [say.cannotWhich(), say.cannotAbsolute()],
    cautionIds: [border, diene && 'diene-single-bond', few && 'small-sample', kind.symmetric && 'symmetric-alkene', kind.classId === 'none' && 'out-of-domain',
      judged.reason === 'undecided-stretch' && 'common-practice', judged.reason === 'from-memory' && 'from-memory', cap && 'ring-fact'],
    checkFirst: [],
    measureNext: diene ? [say.next.cosy, say.next.otherIsomer(cls.pairGapHz?.[0] ?? null), say.next.noe] : nextFor(context, cls, grade === 'assigned'),
    finding: {
      ...emptyFinding('disubstituted', ladder(model, cls)), classId: cls.id, className: cls.name, likelihoods: judged.likelihoods, geometry: g,
      descriptors: naming.descriptors, descriptor: g && naming.descriptors ? naming.descriptors[g] : null, descriptorNote: naming.note,
    },
    undecidedHz: undecidedStretch(cls, kind.elements, model.row),
  };
}

/** Groups not given: never assigned. */
export function judgeNotGiven(context: DoubleContext): DoubleVerdict {
  const { readings, model } = context;
  const judged = judgeWithoutGroups(readings.reading);
  const j = hzAsTyped(readings.reading);
  const g = judged.geometry === 'geminal' ? null : judged.geometry;
  return {
    grade: judged.grade, reason: judged.reason, likelihood: null,
    headline: g ? say.notGivenDecided(g, j) : readings.reading.limit !== 'none' ? say.limit(j) : say.notGivenOpen(j),
    detail: say.notGivenDetail(), rulesOut: [], cannotTell: [say.cannotWhich(), say.cannotAbsolute()],
    cautionIds: ['groups-not-given', 'common-practice', !g && 'alkene-border'],
    checkFirst: [], measureNext: nextFor(context, null, false),
    finding: { ...emptyFinding('not-given', ladder(model, null)), geometry: g }, undecidedHz: null,
  };
}
