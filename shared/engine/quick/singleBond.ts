import type { CautionId, NextMeasurement, QuickLookAnswer, SingleBondFinding, SingleBondInput } from '../../types/answer';
import type { HzReading } from '../../types/reading';
import type { AngleRow } from '../../types/relation';
import type { Hz } from '../../types/units';
import { degree, hzAsTyped } from '../../format/number';
import { singleText as say } from '../../text/engine/single';
import { ENGINE_VERSION } from '../version';
import type { Domain } from '../relations/applies';
import { arcsBetween, bindCurve, rootsOf, type Curve } from '../relations/curve';
import type { PathGroups } from '../relations/generalised';
import { arcParts, closedSectors, coveredShare, partTexts, type ArcPart } from './arcs';
import type { Readings } from './reading';
import { partnerGap } from './reading';
import { cautions, relationRef } from './refs';
import { secondCouplings } from './secondCoupling';
import { readingStep, singleSteps } from './singleSteps';

/** Arcs cover 95 % of a normal error. */
export const COVERAGE = 0.95;
export const COVERAGE_FACTOR = 1.96;
/** Middle values that a turning bond gives as an average, in Hz (common practice, no source). */
const AVERAGED_HZ: readonly [Hz, Hz] = [5, 8.5];
/** Above this a vicinal coupling across a single bond is unusual (common practice, no source). */
const LARGE_HZ = 16;
/** Arcs that cover more of the circle than this say too little for a tentative answer (our choice; it only withholds). */
const WIDE_SHARE = 2 / 3;

/** Roots, arcs and reach of a reading on a curve. For a limit the arcs hold every φ that the limit allows. */
export function findAngles(curve: Curve, reading: HzReading, spreadHz: Hz): SingleBondFinding {
  const sigmaHz = Math.hypot(reading.seHz, spreadHz);
  const tolerance = COVERAGE_FACTOR * sigmaHz;
  const j = reading.jHz;
  // a limit has no error of its own: it is already a bound, so only the relation's spread widens it
  const slack = COVERAGE_FACTOR * spreadHz;
  const arcs =
    reading.limit === 'upper' ? arcsBetween(curve, -Infinity, j + slack)
    : reading.limit === 'lower' ? arcsBetween(curve, j - slack, Infinity)
    : arcsBetween(curve, j - tolerance, j + tolerance);
  return {
    roots: reading.limit === 'none' ? rootsOf(curve, j) : [],
    arcs, coverage: COVERAGE, sigmaHz, reach: curve.reach, even: curve.even,
  };
}

/** Where the domain, the plain row or the reading put a caution. */
function cautionIds(input: SingleBondInput, readings: Readings, row: AngleRow, domain: Domain, finding: SingleBondFinding | null): (CautionId | false)[] {
  const { reading, notes } = readings;
  return [
    finding !== null && finding.arcs.length > 0 && 'relative-only',
    reading.limit !== 'none' && 'limit-used',
    notes.some((n) => n.code === 'digits-coarse') && 'coarse-reading',
    reading.jHz > LARGE_HZ && 'larger-than-usual',
    domain.reason === 'groups-not-given' && 'groups-not-given',
    domain.reason === 'polar-carbon' && 'polar-carbon',
    domain.reason === 'sp2-neighbour' && 'sp2-neighbour',
    (domain.verdict === 'no' || domain.reason === 'not-hydrocarbon' || domain.reason === 'crowded-electronegative') && 'out-of-domain',
    finding !== null && (row.spreadProvenance === 'practice' || domain.reason === 'groups-not-given') && 'common-practice',
    finding !== null && (row.spreadProvenance === 'memory' || row.provenance !== 'seen') && 'from-memory',
    row.status === 'superseded' && 'relation-superseded',
    finding !== null && finding.arcs.length > 1 && 'several-roots',
    finding !== null && finding.roots.length === 0 && reading.limit === 'none' && 'beyond-reach',
    isAveraged(input, reading) && 'may-be-averaged',
  ];
}

const isAveraged = (input: SingleBondInput, reading: HzReading): boolean =>
  input.turning !== 'ring' && reading.limit === 'none' && reading.jHz >= AVERAGED_HZ[0] && reading.jHz <= AVERAGED_HZ[1];

interface Words {
  grade: QuickLookAnswer['grade'];
  headline: string;
  detail: string;
}

/** The answer in words: at most three sentences, the conclusion first. */
function words(input: SingleBondInput, reading: HzReading, finding: SingleBondFinding, parts: readonly ArcPart[], spreadHz: Hz, given: boolean): Words {
  const j = hzAsTyped(reading);
  const texts = partTexts(parts);
  const { minHz, maxHz } = finding.reach;
  if (finding.arcs.length === 0) {
    return { grade: 'not-decided', headline: given ? say.noRoot(j) : say.noRootPlain(j), detail: say.reach(minHz, maxHz, spreadHz) };
  }
  if (coveredShare(finding.arcs) > 1 - 1e-9) return { grade: 'not-decided', headline: say.wholeCircle(j), detail: say.reach(minHz, maxHz, spreadHz) };
  if (isAveraged(input, reading)) {
    const roots = finding.roots.filter((r) => !finding.even || r.phiDeg >= 0).map((r) => degree(r.phiDeg));
    const angles = `${say.angleName(finding.even)} ${say.list(roots)}`;
    return { grade: 'not-decided', headline: say.averaged(j), detail: roots.length > 0 ? say.averagedDetail(angles) : say.averagedNoAngle() };
  }
  if (coveredShare(finding.arcs) > WIDE_SHARE) return { grade: 'not-decided', headline: say.wide(j), detail: say.wideDetail(texts, given) };
  if (reading.limit !== 'none') return { grade: 'tentative', headline: say.limitHeadline(j, texts), detail: say.coverage() };
  // in an open chain an eclipsed stretch is named second; in a ring it is as good as the others
  const open = input.turning === 'ring' ? [] : parts.filter((p) => p.eclipsed);
  const lead = open.length === parts.length ? parts : parts.filter((p) => !open.includes(p));
  const sentences: string[] = [];
  if (finding.roots.length === 0) {
    const above = reading.jHz > maxHz;
    sentences.push(say.justBeyond(j, above ? reading.jHz - maxHz : minHz - reading.jHz, above));
  }
  if (open.length > 0 && open.length < parts.length) sentences.push(say.stillOpen(say.stretches(partTexts(open))));
  if (sentences.length < 2 && input.turning !== 'ring') sentences.push(say.ifTurning(j, reading.jHz > AVERAGED_HZ[1] ? 'ap' : 'sc'));
  if (sentences.length < 2 && finding.even) sentences.push(say.evenSign());
  return { grade: 'tentative', headline: say.angles(partTexts(lead)), detail: sentences.join(' ') };
}

function nextSteps(input: SingleBondInput, row: AngleRow, groups: PathGroups | null, finding: SingleBondFinding | null, parts: readonly ArcPart[]): NextMeasurement[] {
  const next: NextMeasurement[] = [];
  if (!groups) next.push(say.next.giveGroups);
  if (finding && groups && row.kind === 'generalised') {
    const values = secondCouplings(row, groups, finding.roots, COVERAGE_FACTOR * finding.sigmaHz);
    if (values.length > 0) next.push(say.next.otherCoupling(values));
  }
  next.push(say.next.carbon);
  const anti = parts.filter((p) => p.sectors.includes('ap')).length;
  if (anti > 0 && anti < parts.length) next.push(say.next.noe);
  if (input.turning !== 'ring') next.push(say.next.temperature);
  if (!input.partner) next.push(say.next.partner);
  return next.slice(0, 4);
}

/** The answer to one coupling across a single bond. An angle from one J is tentative at most. */
export function answerSingle(input: SingleBondInput, readings: Readings, row: AngleRow, groups: PathGroups | null, domain: Domain): QuickLookAnswer {
  const { reading, partner, notes, fieldMHz } = readings;
  const base = { state: 'answered' as const, engineVersion: ENGINE_VERSION, bond: 'single' as const, reading, partner, notes, likelihood: null, double: null };
  const absolute = say.cannotAbsolute();
  const gap = partnerGap(reading, partner);
  if (partner && gap?.differs) {
    const flags = cautions(['partner-differs']);
    return {
      ...base, grade: 'not-decided', headline: say.partnerDiffers(hzAsTyped(reading), hzAsTyped(partner)), detail: say.partnerDetail(gap.gapHz, gap.sigmaHz),
      rulesOut: [], cannotTell: [absolute], cautions: flags, checkFirst: [say.next.cosy, say.next.fieldAndUnit(reading.jHz, fieldMHz)],
      measureNext: [say.next.cosy], relation: null, single: null, steps: [readingStep(reading, partner, flags)],
    };
  }
  const usable = domain.verdict !== 'no';
  const curve = usable ? bindCurve(row, { groups }) : null;
  const finding = curve ? findAngles(curve, reading, domain.spreadHz) : null;
  const relation = relationRef(row, domain.spreadHz, curve?.set.id ?? '');
  const parts = finding ? arcParts(finding.arcs, finding.even, say.angleName(finding.even)) : [];
  const domainText = say.domain(domain.reason, domain.elements, domain.spreadHz);
  const said: Words = finding
    ? words(input, reading, finding, parts, domain.spreadHz, groups !== null)
    : { grade: 'not-decided', headline: say.outsideDomain(), detail: domainText };
  const flags = cautions(cautionIds(input, readings, row, domain, finding));
  const closed = finding && said.grade === 'tentative' ? closedSectors(finding.arcs, finding.even) : [];
  const check = !finding || finding.arcs.length === 0 || reading.jHz > LARGE_HZ;
  return {
    ...base, ...said,
    rulesOut: closed.length > 0 ? [say.rulesOutArc(closed)] : [],
    cannotTell: [
      ...(finding?.even ? [say.cannotSign()] : []), absolute,
      ...(input.turning === 'ring' ? [say.cannotRing()] : [say.cannotAverage()]),
    ],
    cautions: flags,
    checkFirst: check && finding ? [say.next.geminal, say.next.fieldAndUnit(reading.jHz, fieldMHz), say.next.twoSplittings, say.next.groups] : [],
    measureNext: nextSteps(input, row, groups, finding, parts),
    relation,
    single: finding,
    steps: singleSteps({
      reading, partner, relation, curve, groups, domainText, finding, grade: said.grade, headline: said.headline, flags,
      toleranceHz: COVERAGE_FACTOR * (reading.limit === 'none' ? (finding?.sigmaHz ?? 0) : domain.spreadHz),
    }),
  };
}
