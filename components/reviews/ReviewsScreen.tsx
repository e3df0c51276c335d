import { router } from 'expo-router';
import { StyleSheet, View } from 'react-native';

import type { ReviewRow, ReviewsResponse } from '@/shared/contracts/reviews';
import { momentWords, waited } from '@/shared/format/when';
import { uiCases } from '@/shared/text/uiCases';
import { uiReviews } from '@/shared/text/uiReviews';

import { AnswerLine, dueTone, dueWords, StateTag } from '../cases/list/caseRowParts';
import { useReader } from '../data/reader';
import { useClaim, useReviews } from '../data/reviews';
import { LoadProblem, ProblemNotice } from '../forms/ProblemNotice';
import { SignInState } from '../forms/SignInState';
import { border, color, size, space } from '../theme/tokens';
import { useLayout } from '../theme/useLayout';
import { Button } from '../ui/Button';
import { Card, CardBody } from '../ui/Card';
import { CautionIcon } from '../ui/Glyph';
import { LinkButton } from '../ui/LinkButton';
import { Notice } from '../ui/Notice';
import { RouteLink } from '../ui/RouteLink';
import { Screen, Stack } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';
import { Text } from '../ui/Text';

const say = uiReviews;

/** The reviewer's worklist: what one holds, what waits, what others hold, and one's own cases apart. */
export function ReviewsScreen() {
  const { isSignedIn, isLoading, reader } = useReader();
  const { data, error, isFetching, refetch } = useReviews(isSignedIn);
  const { isWide } = useLayout();
  return (
    <Screen title={say.title} aside={isWide ? reader?.name : undefined}>
      {!isSignedIn && !isLoading ? <SignInState from="/reviews" title={say.signInTitle} hint={say.signInHint} />
        : data === undefined && error !== null ? <LoadProblem problem={error} again={() => void refetch()} isTrying={isFetching} />
        : data === undefined ? <ScreenState kind="loading" title={say.loading} />
        : (
          <Stack>
            {error !== null && <Notice text={say.showingKept} action={<Button small label={uiCases.list.tryAgain} onPress={() => void refetch()} />} />}
            <Worklist list={data} />
          </Stack>
        )}
    </Screen>
  );
}

function Worklist({ list }: { list: ReviewsResponse }) {
  const { isWide } = useLayout();
  const nothing = list.heldByYou.length + list.waiting.length + list.heldByOthers.length + list.yourCases.length === 0;
  if (nothing) return <ScreenState kind="empty" title={say.none} hint={say.noneHint} action={<LinkButton href="/cases" label={uiCases.list.title} />} />;
  const first = <><Group title={say.held} aside={String(list.heldByYou.length)} rows={list.heldByYou} kind="held" none={say.noneHeld} /><Group title={say.waiting} aside={say.oldestFirst} rows={list.waiting} kind="waiting" none={say.noneWaiting} /></>;
  const second = (
    <>
      {list.heldByOthers.length > 0 && <Group title={say.others} aside={String(list.heldByOthers.length)} rows={list.heldByOthers} kind="others" none="" />}
      {list.yourCases.length > 0 && <Group title={say.yours} aside={String(list.yourCases.length)} rows={list.yourCases} kind="yours" none="" note={say.yoursNote} />}
    </>
  );
  if (!isWide) return <Stack>{first}{second}</Stack>;
  return <View style={styles.columns}><View style={styles.first}><Stack>{first}</Stack></View><View style={styles.second}><Stack>{second}</Stack></View></View>;
}

type Kind = 'held' | 'waiting' | 'others' | 'yours';

function Group({ title, aside, rows, kind, none, note }: { title: string; aside: string; rows: readonly ReviewRow[]; kind: Kind; none: string; note?: string }) {
  return (
    <Card title={title} aside={aside} flush>
      {note !== undefined && <CardBody><Text kind="small" tone="muted">{note}</Text></CardBody>}
      {rows.length === 0 && <CardBody><Text tone="muted">{none}</Text></CardBody>}
      <View role="list">{rows.map((row) => <Row key={row.caseId} row={row} kind={kind} />)}</View>
    </Card>
  );
}

function Row({ row, kind }: { row: ReviewRow; kind: Kind }) {
  const now = new Date();
  const claim = useClaim();
  const tone = dueTone({ dueOn: row.dueOn, state: row.state }, now);
  const status = [
    kind === 'yours' ? undefined : row.author.name,
    kind === 'waiting' || (kind === 'yours' && row.reviewer === null) ? say.waitingFor(waited(row.waitingSince, now)) : undefined,
    kind === 'others' && row.heldUntil !== null ? `${say.heldBy(row.reviewer?.name ?? '')}, ${say.freeAgain(momentWords(row.heldUntil, now))}` : undefined,
    kind === 'yours' && row.reviewer !== null ? say.heldBy(row.reviewer.name) : undefined,
    row.openQueries > 0 ? say.openQueries(row.openQueries) : undefined,
    row.answeredQueries > 0 ? say.answeredQueries(row.answeredQueries) : undefined,
    kind === 'held' && row.openQueries + row.answeredQueries === 0 ? (row.readyToSign ? say.allChecked : say.checkedOf(row.checked, row.checksTotal)) : undefined,
  ].filter(Boolean).join(' · ');
  const path = `/cases/${row.caseId}` as const;
  return (
    <View role="listitem" style={styles.row}>
      <View style={styles.head}>
        <Text kind="smallStrong" tone="muted">{row.code}</Text>
        <View style={styles.spring}><Text kind="small" tone="muted" oneLine>{row.projectName}</Text></View>
        {row.dueOn !== null && <View style={styles.due}>{tone === 'caution' && <CautionIcon size={14} />}<Text kind={tone === 'caution' ? 'smallStrong' : 'small'} tone={tone} noWrap>{dueWords(row.dueOn, now)}</Text></View>}
      </View>
      <RouteLink href={path} style={styles.link}><Text kind="strong">{row.question}</Text></RouteLink>
      <AnswerLine answer={row.answer} />
      {row.untested > 0 && <View style={styles.due}><CautionIcon size={14} /><Text kind="smallStrong" tone="caution">{say.untested(row.untested)}</Text></View>}
      <ProblemNotice problem={claim.error} />
      <View style={styles.foot}>
        <View style={styles.words}>{kind === 'yours' && <StateTag state={row.state} />}<Text kind="small" tone="muted">{status}</Text></View>
        {kind === 'waiting' && <Button label={say.take} about={row.code} busy={claim.isPending && say.taking} onPress={() => claim.mutate({ caseId: row.caseId }, { onSuccess: () => router.push(path) })} />}
        {kind === 'held' && (row.readyToSign ? <LinkButton kind="primary" href={path} label={say.sign} /> : <LinkButton href={path} label={say.goOn} />)}
        {kind === 'yours' && <LinkButton href={path} label={say.open} />}
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  columns: { flexDirection: 'row', alignItems: 'flex-start', gap: space.xl },
  first: { flex: 1, minWidth: 0 },
  second: { width: size.aside },
  row: { paddingHorizontal: space.lg, paddingVertical: space.md, gap: 2, borderTopWidth: border.hair, borderTopColor: color.ruleSoft },
  head: { flexDirection: 'row', alignItems: 'center', gap: space.sm },
  spring: { flex: 1, minWidth: 0 },
  due: { flexDirection: 'row', alignItems: 'center', gap: space.xs },
  link: { alignSelf: 'flex-start', minHeight: 24 },
  foot: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.sm, paddingTop: space.sm },
  words: { flex: 1, minWidth: 140, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: space.sm },
});
