import { uiCases } from '@/shared/text/uiCases';
import { uiReviews } from '@/shared/text/uiReviews';

import { useClaim } from '../../data/reviews';
import { useLayout } from '../../theme/useLayout';
import { Button } from '../../ui/Button';
import { LinkButton } from '../../ui/LinkButton';
import { useCaseView } from '../caseContext';

/** The one act that comes next for this person in this state. On a wide screen the review has its own column with its own acts. */
export function PrimaryAct() {
  const { found, reader, open } = useCaseView();
  const claim = useClaim();
  const { isWide } = useLayout();
  const grow = isWide ? undefined : 2;
  const { may, review, author } = found;
  const openQuery = review.queries.find((query) => query.state === 'open');
  if (author.id === reader.id && openQuery !== undefined && may.answerQuery) {
    const go = () => { const place = document.getElementById(`query-${openQuery.number}`); place?.scrollIntoView({ block: 'center' }); place?.querySelector('textarea')?.focus(); };
    return <Button kind="primary" label={uiReviews.column.replyField(openQuery.number)} onPress={go} grow={grow} />;
  }
  if (may.submit) return <Button kind="primary" label={uiCases.act.submit} opens="dialog" onPress={() => open({ kind: 'submit' })} grow={grow} />;
  if (isWide) return null;
  if (may.sign) return <Button kind="primary" label={uiReviews.column.sign} opens="dialog" onPress={() => open({ kind: 'sign' })} grow={grow} />;
  if (may.claim && review.reviewer?.id !== reader.id) return <Button kind="primary" label={uiReviews.column.claim} busy={claim.isPending && uiReviews.column.claiming} onPress={() => claim.mutate({ caseId: found.id })} grow={grow} />;
  return <LinkButton href={`/cases/${found.id}/sheet`} label={uiCases.frame.sheet} grow={grow} />;
}
