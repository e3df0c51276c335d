import type { ReactNode } from 'react';

import { uiText } from '@/shared/text/ui';

import { ApiProblem, asApiProblem } from '../data/problems';
import { Button } from '../ui/Button';
import { Notice } from '../ui/Notice';
import { ScreenState } from '../ui/ScreenState';

/** A failed act: what the server said, and the request's number for a fault of ours. Never only a toast. */
export function ProblemNotice({ problem, action }: { problem: Error | null; action?: ReactNode }) {
  if (problem === null || problem.name === 'AbortError') return null;
  const told = asApiProblem(problem);
  return <Notice tone="error" text={told.detail} detail={told.is('internal') && told.body.requestId ? uiText.requestNumber(told.body.requestId) : undefined} action={action} />;
}

/** A load that failed with nothing to show in its place. */
export function LoadProblem({ problem, again, isTrying }: { problem: Error; again: () => void; isTrying: boolean }) {
  const told = asApiProblem(problem);
  return (
    <ScreenState kind="error" title={told.body.title} hint={told.detail}
      action={<Button label={uiText.tryAgain} busy={isTrying && uiText.loading} onPress={again} />} />
  );
}

/** The sentence for one field of a refused form. */
export const fieldSentence = (problem: Error | null, field: string): string | undefined =>
  problem instanceof ApiProblem ? problem.field(field)?.detail : undefined;
