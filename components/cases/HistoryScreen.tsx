import { router, useLocalSearchParams } from 'expo-router';
import { StyleSheet, View } from 'react-native';

import type { RevisionsResponse } from '@/shared/contracts/cases';
import { momentWords } from '@/shared/format/when';
import { uiCases } from '@/shared/text/uiCases';

import { useCase, useComparison, useEvents, useRevisions } from '../data/cases';
import { useReader } from '../data/reader';
import { LoadProblem } from '../forms/ProblemNotice';
import { SignInState } from '../forms/SignInState';
import { border, color, size, space } from '../theme/tokens';
import { useLayout } from '../theme/useLayout';
import { Tag } from '../ui/Badge';
import { Card, CardBody, PlainRow } from '../ui/Card';
import { LinkButton } from '../ui/LinkButton';
import { RichText } from '../ui/RichText';
import { Columns, Screen, Stack } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';
import { Select } from '../ui/Select';
import { Text } from '../ui/Text';

const say = uiCases.history;
type Revision = RevisionsResponse['revisions'][number];

/** Every revision, any two compared field by field, and what happened. Which two are compared is in the address. */
export function HistoryScreen({ caseId }: { caseId: string }) {
  const { isSignedIn, isLoading, reader } = useReader();
  const found = useCase(caseId, isSignedIn).data;
  const { data, error, isFetching, refetch } = useRevisions(caseId, isSignedIn);
  const isMissing = error !== null && (error.is('not-found') || error.is('invalid-input'));
  return (
    <Screen title={say.title} documentTitle={found ? `${found.code} · ${say.title}` : say.title} back={`/cases/${caseId}`}
      crumb={found ? uiCases.frame.crumb(found.code, found.project.name, found.revision) : undefined}>
      {data === undefined || reader === null
        ? (!isSignedIn && !isLoading ? <SignInState from={`/cases/${caseId}/history`} />
          : isMissing ? <ScreenState kind="empty" title={uiCases.frame.missing} hint={uiCases.frame.missingHint} action={<LinkButton href="/cases" label={uiCases.frame.backToCases} />} />
          : error !== null ? <LoadProblem problem={error} again={() => void refetch()} isTrying={isFetching} />
          : <ScreenState kind="loading" title={say.loading} />)
        : <Columns side="second" narrow={size.aside} first={<><Comparison caseId={caseId} revisions={data.revisions} /><Revisions revisions={data.revisions} /></>} second={<Events caseId={caseId} />} />}
    </Screen>
  );
}

function useChosen(revisions: readonly Revision[]): { from: number | null; to: number | null } {
  const params = useLocalSearchParams<{ from?: string; to?: string }>();
  const numbers = revisions.map((revision) => revision.number).sort((a, b) => b - a);
  const known = (text: string | undefined) => numbers.find((number) => String(number) === text);
  const to = known(params.to) ?? numbers[0] ?? null;
  const from = known(params.from) ?? numbers.find((number) => to !== null && number < to) ?? null;
  return { from, to };
}

function Comparison({ caseId, revisions }: { caseId: string; revisions: Revision[] }) {
  const { isWide } = useLayout();
  const { from, to } = useChosen(revisions);
  const { data, error, isFetching, refetch } = useComparison(caseId, from, to);
  const now = new Date();
  const options = [...revisions].sort((a, b) => b.number - a.number).map((revision) => ({
    value: String(revision.number), label: say.number(revision.number), detail: `${revision.by.name}, ${momentWords(revision.at, now)}${revision.reason === '' ? '' : ` · ${revision.reason}`}`,
  }));
  if (revisions.length < 2) return <Card><Text tone="muted">{say.onlyOne}</Text></Card>;
  return (
    <Card title={from !== null && to !== null ? say.compare(Math.min(from, to), Math.max(from, to)) : say.title} flush>
      <CardBody gap="md">
        <RichText kind="small" tone="muted" text={say.lead} />
        <View style={styles.pickers}>
          <View style={styles.picker}><Select label={say.from} value={from === null ? null : String(from)} onChange={(value) => router.setParams({ from: value })} options={options} placeholder={say.from} /></View>
          <View style={styles.picker}><Select label={say.to} value={to === null ? null : String(to)} onChange={(value) => router.setParams({ to: value })} options={options} placeholder={say.to} /></View>
        </View>
      </CardBody>
      {from !== null && to !== null && (from === to ? <CardBody><Text tone="muted">{say.nothing}</Text></CardBody>
        : data === undefined ? <CardBody>{error !== null ? <LoadProblem problem={error} again={() => void refetch()} isTrying={isFetching} /> : <Text tone="muted">{say.comparing}</Text>}</CardBody>
        : data.changes.length === 0 ? <CardBody><Text tone="muted">{say.nothing}</Text></CardBody>
        : data.changes.map((change) => (
          <View key={change.path} style={styles.change}>
            <RichText kind="strong" text={change.label} />
            <View style={[styles.pair, isWide && styles.pairWide]}>
              <View style={styles.side}><Text kind="caption" tone="muted">{say.before(data.from)}</Text><RichText kind="dense" struck tone="muted" text={change.before ?? say.empty} /></View>
              <View style={styles.side}><Text kind="caption" tone="muted">{say.before(data.to)}</Text><RichText kind="dense" text={change.after ?? say.empty} /></View>
            </View>
          </View>
        )))}
    </Card>
  );
}

function Revisions({ revisions }: { revisions: Revision[] }) {
  const now = new Date();
  return (
    <Card title={say.revisions} flush aside={String(revisions.length)}>
      {[...revisions].sort((a, b) => b.number - a.number).map((revision) => (
        <PlainRow key={revision.number} value={say.number(revision.number)}
          detail={[`${revision.by.name}, ${momentWords(revision.at, now)}`, revision.number === 1 ? say.first : say.changes(revision.changes), revision.reason, say.engine(revision.engineVersion), say.hash(revision.contentHash.slice(0, 12))].filter(Boolean).join(' · ')}>
          {revision.signed && <Tag text={say.signed} />}
        </PlainRow>
      ))}
    </Card>
  );
}

function Events({ caseId }: { caseId: string }) {
  const { data, error, isFetching, refetch } = useEvents(caseId);
  const now = new Date();
  return (
    <Card title={say.events} flush>
      {data === undefined && <CardBody>{error !== null ? <LoadProblem problem={error} again={() => void refetch()} isTrying={isFetching} /> : <Text tone="muted">{say.loading}</Text>}</CardBody>}
      {data?.events.length === 0 && <CardBody><Text tone="muted">{say.noEvents}</Text></CardBody>}
      <Stack gap="sm">{data && <View>{data.events.map((event, at) => <PlainRow key={at} value={event.text} detail={`${event.by}, ${momentWords(event.at, now)}`} />)}</View>}</Stack>
    </Card>
  );
}

const styles = StyleSheet.create({
  pickers: { flexDirection: 'row', flexWrap: 'wrap', gap: space.md },
  picker: { flexGrow: 1, flexBasis: 160, minWidth: 0 },
  change: { paddingHorizontal: space.lg, paddingVertical: space.md, gap: space.xs, borderTopWidth: border.hair, borderTopColor: color.ruleSoft },
  pair: { gap: space.xs },
  pairWide: { flexDirection: 'row', gap: space.lg },
  side: { flex: 1, minWidth: 0 },
});
