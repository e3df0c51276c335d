import type { Caution, Grade, RelationRef, SingleBondFinding } from '../../types/answer';
import type { HzReading } from '../../types/reading';
import type { TrailStep } from '../../types/trail';
import type { Hz } from '../../types/units';
import { degree, degreeRange, fixed, hz, hzAsTyped } from '../../format/number';
import { SECTOR_SHORT } from '../../format/words';
import { singleText } from '../../text/engine/single';
import { workedFormula } from '../relations/worked';
import type { Curve } from '../relations/curve';
import type { PathGroups } from '../relations/generalised';

const say = singleText.steps;
const of = (flags: readonly Caution[], ids: readonly string[]): Caution[] => flags.filter((f) => ids.includes(f.id));

/** The measured step: what was typed, and how it was read. */
export function readingStep(reading: HzReading, partner: HzReading | null, flags: readonly Caution[]): TrailStep {
  const value = (r: HzReading): string => `${hzAsTyped(r)} ± ${fixed(r.seHz, 2)}`;
  return {
    key: 'reading', ink: 'measured', reviewStep: 'reciprocity', title: say.reading,
    summary: partner ? `${value(reading)}; ${say.partner} ${hzAsTyped(partner)}` : value(reading),
    inputs: [
      { label: say.typed, value: reading.typed },
      { label: say.error, value: hz(reading.seHz, 2) },
      ...(partner ? [{ label: say.partner, value: partner.typed }] : []),
    ],
    flags: of(flags, ['partner-differs', 'limit-used', 'larger-than-usual', 'smaller-than-usual', 'coarse-reading', 'negative-vicinal', 'sign-not-measured', 'exchange-partner']),
  };
}

/** Steps of a single bond: reading, relation, angles, grade; each readable by itself. */
export function singleSteps(parts: {
  reading: HzReading; partner: HzReading | null; relation: RelationRef; curve: Curve | null; groups: PathGroups | null; domainText: string;
  finding: SingleBondFinding | null; toleranceHz: Hz; grade: Grade; headline: string; flags: readonly Caution[];
}): TrailStep[] {
  const { reading, partner, relation, curve, groups, domainText, finding, toleranceHz, grade, headline, flags } = parts;
  return [
    readingStep(reading, partner, flags),
    {
      key: 'relation', ink: 'calculated', reviewStep: 'domain', title: say.relation, summary: `${relation.name}. ${domainText}`,
      inputs: [
        { label: say.groups, value: groups ? `${groups.front.join(', ')} · ${groups.rear.join(', ')}` : say.notGiven },
        { label: say.spread, value: hz(relation.spreadHz) },
      ],
      relation, formula: relation.formula, ...(curve ? { worked: workedFormula(curve) } : {}),
      flags: of(flags, ['out-of-domain', 'polar-carbon', 'sp2-neighbour', 'groups-not-given', 'from-memory', 'common-practice', 'relation-superseded']),
    },
    ...(finding
      ? [{
          key: 'roots', ink: 'calculated' as const, reviewStep: 'second-root' as const, title: say.roots,
          summary: `${say.rootCount(finding.roots.length)}, ${say.arcs(finding.arcs.length)}`,
          inputs: [
            { label: say.sigma, value: hz(finding.sigmaHz, 2) },
            { label: say.coverage, value: say.within(toleranceHz) },
            ...finding.roots.map((r, i) => ({ label: say.rootLabel(i), value: `${degree(r.phiDeg, 1)} (${SECTOR_SHORT[r.sector]})` })),
            ...finding.arcs.map((a, i) => ({ label: say.arcLabel(i), value: degreeRange(a.fromDeg, a.toDeg, 1) })),
          ],
          flags: of(flags, ['several-roots', 'beyond-reach', 'may-be-averaged']),
        }]
      : []),
    {
      key: 'grade', ink: 'calculated', reviewStep: null, title: say.grade, summary: headline,
      inputs: [{ label: say.grade, value: grade === 'tentative' ? say.gradeTentative : say.gradeOpen }],
      flags: of(flags, ['relative-only']),
    },
  ];
}
