import type { RelationSummary } from '@/shared/contracts/relations';
import { evaluate } from '@/shared/engine/relations/curve';
import { relationRef } from '@/shared/engine/quick/refs';
import { hzRange, hz } from '@/shared/format/number';
import { relationsText } from '@/shared/text/engine/relations';
import type { RelationRow } from '@/shared/types/relation';

/** A relation as the Relations page shows it; checks are calculated by the same engine that answers. */
export function relationSummary(row: RelationRow): RelationSummary {
  return {
    ...relationRef(row),
    status: row.status,
    kind: row.kind,
    coupling: `${row.nuclei}, ${row.path}`,
    domain: row.domain.join('; '),
    failures: row.failures,
    checkedBy: row.checkedBy,
    parameters: row.parameterSets.flatMap((set) =>
      Object.entries(set.values).map(([name, value]) => ({
        set: set.id === '' ? null : set.id, name, value, unit: row.degreeParameters.includes(name) ? '°' : relationsText.unit(name), provenance: set.provenance,
      })),
    ),
    applies: relationsText.applies(row),
    checks: row.checks.map((check) => ({
      name: check.name,
      phiDeg: check.phiDeg,
      calculatedHz: row.kind === 'class-table' ? check.measuredHz[0] : evaluate(row, { phiDeg: check.phiDeg, substituents: check.substituents, ...(check.set === '' ? {} : { set: check.set }) }),
      measured: check.measuredHz[0] === check.measuredHz[1] ? hz(check.measuredHz[0], 2) : hzRange(check.measuredHz[0], check.measuredHz[1]),
      source: check.source,
    })),
    row: { ...row },
  };
}
