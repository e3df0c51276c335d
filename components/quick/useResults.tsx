import { useCallback, useMemo, type ReactNode } from 'react';

import { quickText } from '@/shared/text/quick';

import type { LookedAt } from '../data/quickLook';
import { LazyAnswerPlots } from '../plots/LazyPlots';
import { Cautions, Plan, Sentences, TrailFold } from './Findings';
import type { OpenPart } from './GroupsCard';
import type { Slot } from './slots';

interface Results { plots: ReactNode; plan: ReactNode; limits: ReactNode; trail: ReactNode }
const NONE: Results = { plots: null, plan: null, limits: null, trail: null };

/** What follows an answer: drawings, what would decide, limits, trail. Drawn anew only for a new answer. */
export function useResults(looked: LookedAt | undefined, open: (part: OpenPart) => void): Results {
  const pickGroup = useCallback((slot: Slot) => open({ part: 'groups', slot }), [open]);
  return useMemo(() => {
    if (looked?.answer.state !== 'answered') return NONE;
    const { request, answer } = looked;
    const groups = request.bond === 'single' ? request.groups ?? null : null;
    return {
      plots: <LazyAnswerPlots answer={answer} groups={groups} onPickGroup={pickGroup} />,
      plan: (
        <>
          <Plan title={quickText.checkFirst} items={answer.checkFirst} />
          <Plan title={quickText.wouldDecide} items={answer.measureNext} numbered />
        </>
      ),
      limits: (
        <>
          <Sentences title={quickText.rulesOut} sentences={answer.rulesOut} />
          <Sentences title={quickText.cannotTell} sentences={answer.cannotTell} />
          <Cautions cautions={answer.cautions} />
        </>
      ),
      trail: <TrailFold steps={answer.steps} />,
    };
  }, [looked, pickGroup]);
}
