import type { CaseResponse } from '@/shared/contracts/cases';
import { INKS, type Ink, type ReviewStep, type TrailStep } from '@/shared/types/trail';

/** A step with its number in the trail and the queries that are pinned to it. */
export interface NumberedStep { number: number; step: TrailStep; openQueries: number[]; allQueries: number[] }

type Query = CaseResponse['review']['queries'][number];

/** A query belongs to the step it names, or to the first step of its check when the step is gone from a later revision. */
function belongs(query: Query, step: TrailStep, steps: readonly TrailStep[]): boolean {
  if (query.stepKey !== null && steps.some((each) => each.key === query.stepKey)) return query.stepKey === step.key;
  return steps.find((each) => each.reviewStep === query.step)?.key === step.key;
}

/** The engine's steps in one line, numbered across the inks in their order. */
export function numberedSteps(trail: CaseResponse['trail'], queries: readonly Query[]): NumberedStep[] {
  const inOrder = INKS.flatMap((ink) => trail.steps.filter((step) => step.ink === ink));
  return inOrder.map((step, at) => {
    const own = queries.filter((query) => belongs(query, step, trail.steps));
    return { number: at + 1, step, openQueries: own.filter((query) => query.state !== 'closed').map((query) => query.number), allQueries: own.map((query) => query.number) };
  });
}

export const stepsOf = (steps: readonly NumberedStep[], ink: Ink): NumberedStep[] => steps.filter(({ step }) => step.ink === ink);

/** The number under which a query's step stands, for "Query 1, step 4". */
export const stepNumberOf = (steps: readonly NumberedStep[], query: Query): number | null => steps.find((each) => each.allQueries.includes(query.number))?.number ?? null;
/** The check-list's step for a step of the trail; a step outside every check goes under other evidence. */
export const reviewStepOf = (step: TrailStep | undefined): ReviewStep => step?.reviewStep ?? 'other-evidence';
