import { useMemo } from 'react';

import { bindCurve, curve, jAt, type CurveInputs } from '@/shared/engine/relations/curve';
import { isRelationRow } from '@/shared/engine/relations/registry';
import type { CurvePoint } from '@/shared/types/answer';

import { useRelation } from '../data/relations';

export interface DeviceCurve { points: readonly CurvePoint[]; at: (phiDeg: number) => number; even: boolean; reach: { minHz: number; maxHz: number } }

/**
 * A relation with its groups put in, run on this device: what the drawings turn with. The answer itself is always the server's.
 * `inputs` must keep its identity. null = still loading, not held, or not to be used with these groups.
 */
export function useDeviceCurve(ref: string, inputs: CurveInputs): { curve: DeviceCurve | null; isPending: boolean } {
  const { relation, isPending } = useRelation(ref);
  const drawn = useMemo(() => {
    if (!relation || !isRelationRow(relation.row) || relation.row.kind === 'class-table') return null;
    try {
      const bound = bindCurve(relation.row, inputs);
      return { points: curve(relation.row, inputs, 2), at: (phiDeg: number) => jAt(bound, phiDeg), even: bound.even, reach: bound.reach };
    } catch (error) {
      if (error instanceof RangeError) return null; // these groups are outside the relation: the answer says so
      throw error;
    }
  }, [relation, inputs]);
  return { curve: drawn, isPending };
}
