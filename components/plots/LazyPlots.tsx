import { useQueryClient } from '@tanstack/react-query';
import { Component, lazy, memo, Suspense, useEffect, type ReactNode } from 'react';

import { quickText } from '@/shared/text/quick';
import { uiText } from '@/shared/text/ui';

import { relationsOptions } from '../data/relations';
import { Button } from '../ui/Button';
import { Notice } from '../ui/Notice';
import type { AnswerPlotsProps } from './AnswerPlots';
import type { RelationCurveProps } from './RelationCurve';
import { PlotBox } from './PlotBox';

/**
 * The only door to the drawing libraries: one chunk, loaded with the first plot. Every area draws through here, because a
 * library asked for from two lazy places would move into the first page.
 */
const load = () => import('./entry');
const Plots = lazy(async () => ({ default: (await load()).AnswerPlots }));
const OneCurve = lazy(async () => ({ default: (await load()).RelationCurve }));

/** Fetches drawings and relations side by side, once the first answer is there: never before it, and not one after the other. */
export function usePlotsAhead(wanted: boolean): void {
  const client = useQueryClient();
  useEffect(() => {
    if (!wanted) return;
    void load().catch(() => undefined); // asked again, and told, by the drawing itself
    void client.prefetchQuery(relationsOptions);
  }, [wanted, client]);
}

export const LazyAnswerPlots = memo(function LazyAnswerPlots(props: AnswerPlotsProps) {
  return (
    <PlotBoundary>
      <Suspense fallback={<PlotBox bond={props.answer.bond} note={quickText.plotsLoading} />}><Plots {...props} /></Suspense>
    </PlotBoundary>
  );
});

export function LazyRelationCurve(props: RelationCurveProps) {
  return (
    <PlotBoundary>
      <Suspense fallback={<PlotBox bond="single" note={quickText.plotsLoading} height={300} />}><OneCurve {...props} /></Suspense>
    </PlotBoundary>
  );
}

/** A drawing that did not arrive or that failed must not take the answer with it. */
class PlotBoundary extends Component<{ children: ReactNode }, { failed: boolean }> {
  override state = { failed: false };
  static getDerivedStateFromError() {
    return { failed: true };
  }
  override render() {
    if (!this.state.failed) return this.props.children;
    return <Notice text={quickText.plotsAway} action={<Button small label={uiText.reload} onPress={() => window.location.reload()} />} />;
  }
}
