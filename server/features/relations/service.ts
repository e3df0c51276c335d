import type { z } from 'zod';

import { fieldProblem } from '@/server/http/problems';
import type { EvaluateResponse, evaluateRequest, InvertResponse, invertRequest } from '@/shared/contracts/relations';
import { applies, arcsBetween, bindCurve, jAt, parseGroup, relationRef, rootsOf, workedFormula, type Curve } from '@/shared/engine';
import { inputText } from '@/shared/text/engine/input';
import { problemText } from '@/shared/text/problems';
import type { Registry, RelationRow } from '@/shared/types/relation';

type CurveRequest = Omit<z.output<typeof evaluateRequest>, 'phiDeg'>;

function refuseGroups(row: RelationRow, { groups, substituents }: CurveRequest): void {
  if (groups && substituents) throw fieldProblem('substituents', problemText.groupsOrSubstituents);
  for (const end of ['front', 'rear'] as const) {
    groups?.[end].forEach((text, place) => {
      const read = parseGroup(text);
      if ('fault' in read) throw fieldProblem(`groups/${end}/${place}`, inputText.group(`groups.${end}`, read.fault));
    });
  }
  if (row.kind !== 'generalised' || substituents) return;
  if (!groups) throw fieldProblem('groups', problemText.groupsNeeded);
  const { verdict, reason, elements } = applies(row, groups);
  if (verdict !== 'no') return;
  throw fieldProblem('groups', reason === 'no-dchi' ? problemText.noElectronegativity(elements.join(', ')) : problemText.neighboursUntold(elements.join(', ')));
}

/** A relation with what was given put in, and the spread that holds there. @throws Problem naming the field */
function bound(request: CurveRequest, registry: Registry): { curve: Curve; spreadHz: number } {
  const row = registry.find(request.relation);
  if (!row) throw fieldProblem('relation', problemText.relationUnknown);
  if (row.kind === 'class-table') throw fieldProblem('relation', problemText.relationGivesNoAngle);
  refuseGroups(row, request);
  const { set, groups, substituents } = request;
  try {
    const curve = bindCurve(row, { groups: groups ?? null, ...(substituents ? { substituents } : {}), ...(set ? { set } : {}) });
    return { curve, spreadHz: substituents ? row.spreadHz : applies(row, groups ?? null).spreadHz };
  } catch (error) {
    if (error instanceof RangeError) throw fieldProblem('set', problemText.setUnknown);
    throw error;
  }
}

const refOf = ({ row, set }: Curve, spreadHz: number) => relationRef(row, spreadHz, set.id);

export function evaluateRelation(request: z.output<typeof evaluateRequest>, registry: Registry): EvaluateResponse {
  const { curve, spreadHz } = bound(request, registry);
  return { relation: refOf(curve, spreadHz), phiDeg: request.phiDeg, jHz: jAt(curve, request.phiDeg), worked: workedFormula(curve) };
}

export function invertRelation({ jHz, toleranceHz, ...request }: z.output<typeof invertRequest>, registry: Registry): InvertResponse {
  const { curve, spreadHz } = bound(request, registry);
  const arcs = toleranceHz === undefined ? [] : arcsBetween(curve, jHz - toleranceHz, jHz + toleranceHz);
  return { relation: refOf(curve, spreadHz), jHz, roots: rootsOf(curve, jHz), arcs, reach: curve.reach };
}
