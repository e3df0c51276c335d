import type { DoubleBondGeometry } from '../../types/answer';
import { hzAsTyped } from '../../format/number';
import { doubleText as say } from '../../text/engine/double';
import { isHydrogen } from '../groups/group';
import { nameGeometries } from '../alkenes/descriptors';
import { judgeClass, undecidedStretch } from '../alkenes/judge';
import type { DoubleContext, DoubleVerdict } from './doubleContext';
import { carbonLadder, emptyFinding, geometriesOf, ladder, ringLadder } from './doubleFinding';
import { judgeDisubstituted } from './doubleOpen';

/** =CH₂: which of its couplings this is. It has no E or Z. */
export function judgeTerminal(context: DoubleContext): DoubleVerdict {
  const { readings, model, kind } = context;
  if (!kind) throw new RangeError('a terminal double bond needs its groups');
  const { reading } = readings;
  const cls = model.classes[kind.classId];
  if (!cls) throw new RangeError(`the class table has no class ${kind.classId}`);
  const base = {
    rulesOut: [] as string[], cannotTell: [say.terminalNoEz(), say.cannotAbsolute()], checkFirst: [], undecidedHz: undecidedStretch(cls, kind.elements, model.row),
    finding: { ...emptyFinding('terminal', ladder(model, cls)), classId: cls.id, className: cls.name },
  };
  const open = { grade: 'not-decided' as const, likelihood: null };
  if (kind.elements.length === 0) {
    return { ...base, ...open, reason: 'no-values', headline: say.ethene(), detail: say.ethenDetail(), cautionIds: ['symmetric-alkene'], measureNext: [say.next.satellites] };
  }
  if (kind.geminalOnly) {
    const range = model.fullHz.geminal;
    return { ...base, ...open, reason: 'no-path', headline: say.terminalGeminalOnly(), detail: say.terminalGeminalDetail(range), cautionIds: ['no-vicinal-path', 'sign-not-measured'], measureNext: [say.next.noeOwnSide] };
  }
  const judged = judgeClass(model.row, cls, kind.elements, reading, geometriesOf(true));
  const g = judged.geometry;
  const j = hzAsTyped(reading);
  const own = g ? cls.distributions[g] : null;
  const { cis, trans } = cls.distributions;
  const others = (['geminal', 'cis', 'trans'] as DoubleBondGeometry[]).filter((x) => x !== g && cls.distributions[x]);
  const size = Math.abs(reading.jHz);
  const finding = { ...base.finding, likelihoods: judged.likelihoods, geometry: g === 'geminal' ? null : g };
  const headline = g && own
    ? say.decided(say.terminalName(g), j, g, cls.name, size >= own.rangeHz[0] && size <= own.rangeHz[1])
    : !cis || !trans ? say.noValues(j, kind.elements.join(', '))
    : reading.limit !== 'none' ? say.limit(j)
    : reading.jHz > cis.rangeHz[1] && reading.jHz < trans.rangeHz[0] ? say.between(j, cls.name) : say.close(j, cls.name);
  return {
    ...base, finding, grade: g ? judged.grade : 'not-decided', reason: judged.reason, likelihood: g ? judged.likelihood : null, headline,
    detail: cis && trans ? say.rangesDetail(cis.rangeHz, trans.rangeHz, null) : say.noValuesDetail(),
    rulesOut: g ? others.map((x) => say.rulesOut(x, cls.name, cls.distributions[x]?.rangeHz ?? [0, 0], judged.likelihoods.find((l) => l.geometry === x)?.weight ?? 0)) : [],
    cautionIds: [judged.reason === 'undecided-stretch' && 'alkene-border', g === 'geminal' && 'sign-not-measured', kind.classId === 'none' && 'out-of-domain',
      Math.min(...others.map((x) => cls.distributions[x]?.count ?? 0), own?.count ?? 0) < 5 && 'small-sample'],
    measureNext: g === 'geminal' ? [say.next.sign] : g ? [say.next.control] : [say.next.noe, ...(reading.jHz > 0 && reading.jHz < 5 ? [say.next.sign] : [])],
  };
}

/** Three or four groups: no vicinal H,H pair, so no E or Z from ³J(H,H); the plan stands instead. */
export function judgeCrowded(context: DoubleContext): DoubleVerdict {
  const { model, groups, kind } = context;
  if (!groups || !kind) throw new RangeError('a crowded double bond needs its groups');
  const three = kind.setting === 'trisubstituted';
  const naming = nameGeometries(groups, kind);
  const far = three ? (groups.left.some(isHydrogen) ? groups.right : groups.left) : [];
  const hasCarbon = far.some((g) => g.element === 'C');
  return {
    grade: 'not-decided', reason: 'no-path', likelihood: null, headline: say.noVicinal(), detail: three ? say.noVicinalThree() : say.noVicinalFour(),
    rulesOut: [], cannotTell: [say.cannotAbsolute()], cautionIds: ['no-vicinal-path', naming.unusual && 'cis-trans-not-ez'], checkFirst: [],
    measureNext: three ? [...(hasCarbon ? [say.next.carbonBoth, say.next.carbonOne] : []), say.next.noeOwnSide] : [say.next.noeGroups],
    finding: {
      ...emptyFinding(three ? 'trisubstituted' : 'tetrasubstituted', three ? carbonLadder(model) : []),
      descriptors: naming.descriptors, descriptorNote: naming.note,
    },
    undecidedHz: null,
  };
}

/**
 * A CH=CH in a ring. Up to seven members it is cis by the ring, and J is compared with what such rings give; eight and
 * larger hold both, so J is read as in an open chain, tentative at most.
 */
export function judgeRing(context: DoubleContext): DoubleVerdict {
  const { input, readings, model, kind } = context;
  const { reading } = readings;
  const size = input.ringSize ?? 8;
  const ring = model.row.rings.find((r) => r.ringSize === size);
  if (!ring) throw new RangeError(`the class table has no ring of ${size}`);
  const compounds = [ring.parent, ...ring.others].sort((a, b) => a.jHz - b.jHz);
  const j = hzAsTyped(reading);
  if (size >= 8) {
    const open = judgeDisubstituted(context, true);
    return { ...open, detail: `${say.ringLarge(j)}. ${say.ringDetail(ring.parent.name, ring.parent.jHz, ring.rangeHz)}`, finding: { ...open.finding, setting: 'ring' } };
  }
  const slack = 2 * reading.seHz;
  // a hetero atom or a conjugated group on the bond: the compounds of that ring size that bear the same widen what is known
  const hetero = kind?.elements.some((e) => e !== 'C') ?? false;
  const conjugated = [...(context.groups?.left ?? []), ...(context.groups?.right ?? [])].some((g) => g.neighbours?.some((n) => n.order > 1));
  const held = ring.others.filter((c) => (c.bears === 'hetero' ? hetero : conjugated)).map((c) => c.jHz);
  const low = Math.min(ring.rangeHz[0], ...held);
  const high = Math.max(ring.rangeHz[1], ...held);
  const fits =
    reading.limit === 'upper' ? reading.jHz + slack >= low
    : reading.limit === 'lower' ? reading.jHz - slack <= high
    : reading.jHz >= low - slack && reading.jHz <= high + slack;
  const detail = `${say.ringDetail(ring.parent.name, ring.parent.jHz, ring.rangeHz)}${fits ? '' : ` ${say.ringHetero()}`}`;
  return {
    grade: fits ? 'assigned' : 'not-decided', reason: 'ring', likelihood: null, headline: fits ? say.ringFits(j, size) : say.ringOutside(j, size), detail,
    rulesOut: [], cannotTell: [say.ringNoEz(), say.cannotAbsolute()], cautionIds: ['ring-fact', reading.jHz < 0 && 'negative-vicinal'],
    checkFirst: fits ? [] : [say.ringCheck], measureNext: fits ? [] : [say.next.cosy],
    finding: { ...emptyFinding('ring', ringLadder(model, ring.rangeHz, compounds)), geometry: fits ? 'cis' : null },
    undecidedHz: null,
  };
}
