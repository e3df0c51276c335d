import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { momentWords } from '@/shared/format/when';
import { stepWords, stepMeaning, uiReviews } from '@/shared/text/uiReviews';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import type { ReviewStep } from '@/shared/types/trail';

import { useCaseView } from '../cases/caseContext';
import { numberedSteps, stepNumberOf } from '../cases/logic/trailSteps';
import { useCheck, useClaim, useRelease } from '../data/reviews';
import { ProblemNotice } from '../forms/ProblemNotice';
import { border, color, size, space } from '../theme/tokens';
import { Button } from '../ui/Button';
import { Card } from '../ui/Card';
import { CautionIcon, Icon } from '../ui/Glyph';
import { RichText } from '../ui/RichText';
import { Text } from '../ui/Text';
import { QueryThread } from './QueryThread';

const say = uiReviews.column;

/** The review of a case: who holds it, the check-list, the queries, and the signature at the end. */
export function ReviewCard() {
  const { found, reader, now, open } = useCaseView();
  const { review, may, signatures } = found;
  const claim = useClaim();
  const release = useRelease(found.id);
  const inReview = found.state === 'in-review' || found.state === 'queried';
  const mine = review.reviewer?.id === reader.id;
  const until = review.heldUntil === null ? '' : momentWords(review.heldUntil, now);
  const aside = !inReview ? undefined : review.reviewer === null ? say.nobody : mine ? say.heldByYou(until) : say.heldBy(review.reviewer.name, until);
  const steps = numberedSteps(found.trail, review.queries);
  const reasonToSign = may.sign ? undefined : may.why['sign'];
  return (
    <Card title={say.title} aside={aside} flush>
      <View style={styles.body}>
        {review.submittedAt === null && <Text tone="muted">{say.notSubmitted}</Text>}
        <ProblemNotice problem={claim.error ?? release.error} />
        {may.claim && !mine && <Button kind="primary" label={say.claim} busy={claim.isPending && say.claiming} onPress={() => claim.mutate({ caseId: found.id })} />}
        {inReview && !may.claim && !mine && may.why['claim'] !== undefined && <Text kind="small" tone="muted">{may.why['claim']}</Text>}
      </View>
      {review.submittedAt !== null && review.checks.map((check) => <Check key={check.step} step={check.step} />)}
      {review.submittedAt !== null && <View style={[styles.body, styles.below]}>
        <Threads steps={steps} />
        {may.query && <Button label={say.newQuery} opens="dialog" onPress={() => open({ kind: 'query', stepKey: null })} />}
        {mine && inReview && <Button kind="primary" label={say.sign} opens="dialog" onPress={() => open({ kind: 'sign' })} disabledBecause={reasonToSign} />}
        {may.release && <Button kind="quiet" label={say.release} busy={release.isPending && say.releasing} onPress={() => release.mutate()} />}
      </View>}
      {signatures.length > 0 && (
        <View style={styles.signatures}>
          <Text kind="strong">{say.signatures}</Text>
          {signatures.map((signature, at) => (
            <View key={at} style={styles.signature}>
              <RichText kind="denseStrong" tone="judged" text={`${uiCaseParts.trail.meaning[signature.meaning]}: ${signature.name}`} />
              <Text kind="caption" tone="muted">{`${momentWords(signature.at, now)} · revision ${signature.revision} · ${signature.contentHash.slice(0, 12)}`}</Text>
            </View>
          ))}
        </View>
      )}
      {found.addenda.length > 0 && (
        <View style={styles.signatures}>
          <Text kind="strong">{say.addenda}</Text>
          {found.addenda.map((addendum) => (
            <View key={addendum.id} style={styles.signature}>
              <Text kind="dense">{addendum.text}</Text>
              <Text kind="caption" tone="muted">{`${addendum.by}, ${momentWords(addendum.at, now)} · ${addendum.hash.slice(0, 12)}`}</Text>
            </View>
          ))}
        </View>
      )}
    </Card>
  );
}

function Check({ step }: { step: ReviewStep }) {
  const { found, now } = useCaseView();
  const check = useCheck(found.id);
  const row = found.review.checks.find((each) => each.step === step);
  const query = found.review.queries.find((each) => each.step === step && each.state !== 'closed');
  const isChecked = row?.state === 'checked';
  return (
    <View style={styles.check}>
      <View style={styles.words}>
        <RichText kind="dense" text={stepWords[step]} />
        <RichText kind="caption" tone="muted" text={isChecked && row.by !== null && row.at !== null ? say.checkedBy(row.by.name, momentWords(row.at, now)) : stepMeaning[step]} />
        <ProblemNotice problem={check.error} />
      </View>
      {query !== undefined
        ? <View style={styles.state}><CautionIcon size={14} /><Text kind="denseStrong" tone="caution" noWrap>{say.queryNumber(query.number)}</Text></View>
        : !found.may.check && (isChecked
          ? <View style={styles.state}><Icon name="check" size={14} /><Text kind="denseStrong" noWrap>{say.checked}</Text></View>
          : <Text kind="denseStrong" tone="muted" noWrap>{say.open}</Text>)}
      {found.may.check && query === undefined && (
        <Button small label={isChecked ? say.checked : say.check} about={stepWords[step]} pressed={isChecked} icon={isChecked ? <Icon name="check" size={14} tone="onInk" /> : undefined}
          busy={check.isPending && uiCaseParts.comments.busy} onPress={() => check.mutate({ step, checked: !isChecked, revision: found.revision })} />
      )}
    </View>
  );
}

function Threads({ steps }: { steps: ReturnType<typeof numberedSteps> }) {
  const { found } = useCaseView();
  const [all, setAll] = useState(false);
  const { queries } = found.review;
  const live = queries.filter((query) => query.state !== 'closed');
  const closed = queries.filter((query) => query.state === 'closed');
  return (
    <>
      {live.map((query) => <QueryThread key={query.id} query={query} stepNumber={stepNumberOf(steps, query)} />)}
      {closed.length > 0 && (all
        ? closed.map((query) => <QueryThread key={query.id} query={query} stepNumber={stepNumberOf(steps, query)} />)
        : <Button small kind="quiet" label={say.showClosed(closed.length)} onPress={() => setAll(true)} />)}
    </>
  );
}

const styles = StyleSheet.create({
  body: { paddingHorizontal: space.lg, paddingBottom: space.md, gap: space.md },
  below: { paddingTop: space.md, borderTopWidth: border.hair, borderTopColor: color.rule },
  check: { flexDirection: 'row', alignItems: 'center', gap: space.sm, minHeight: size.row, paddingHorizontal: space.lg, paddingVertical: space.xs, borderTopWidth: border.hair, borderTopColor: color.ruleSoft },
  words: { flex: 1, minWidth: 0 },
  state: { flexDirection: 'row', alignItems: 'center', gap: 6 },
  signatures: { paddingHorizontal: space.lg, paddingVertical: space.md, gap: space.sm, borderTopWidth: border.hair, borderTopColor: color.rule },
  signature: { gap: 2 },
});
