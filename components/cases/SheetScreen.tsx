import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { uiCases } from '@/shared/text/uiCases';

import { sheetPath, useCase, useSiText } from '../data/cases';
import { useReader } from '../data/reader';
import { FileLink } from '../forms/FileLink';
import { LoadProblem } from '../forms/ProblemNotice';
import { SignInState } from '../forms/SignInState';
import { useCopy } from '../quick/useCopy';
import { color, radius, size, space } from '../theme/tokens';
import { Button } from '../ui/Button';
import { Card } from '../ui/Card';
import { LinkButton } from '../ui/LinkButton';
import { Notice } from '../ui/Notice';
import { RichText } from '../ui/RichText';
import { Screen, Stack } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';
import { Segments } from '../ui/Segments';
import { Text } from '../ui/Text';

const say = uiCases.sheet;
/** The reader's own zone, named on the sheet. */
const zone = (): string => Intl.DateTimeFormat().resolvedOptions().timeZone || 'UTC';
/** Letter where it is the usual paper. */
const usualPaper = (): 'A4' | 'Letter' => (/-(US|CA|MX|PH|CL|CO|VE)\b/.test(navigator.language) ? 'Letter' : 'A4');

/** The PDF summary of the present revision, and the readings as a line for a report. */
export function SheetScreen({ caseId }: { caseId: string }) {
  const { isSignedIn, isLoading, reader } = useReader();
  const { data, error, isFetching, refetch } = useCase(caseId, isSignedIn);
  const [paper, setPaper] = useState(usualPaper);
  const isMissing = error !== null && (error.is('not-found') || error.is('invalid-input'));
  return (
    <Screen title={say.title} documentTitle={data ? `${data.code} · ${say.title}` : say.title} back={`/cases/${caseId}`}
      crumb={data ? uiCases.frame.crumb(data.code, data.project.name, data.revision) : undefined}>
      {data === undefined || reader === null
        ? (!isSignedIn && !isLoading ? <SignInState from={`/cases/${caseId}/sheet`} />
          : isMissing ? <ScreenState kind="empty" title={uiCases.frame.missing} hint={uiCases.frame.missingHint} action={<LinkButton href="/cases" label={uiCases.frame.backToCases} />} />
          : error !== null ? <LoadProblem problem={error} again={() => void refetch()} isTrying={isFetching} />
          : <ScreenState kind="loading" title={uiCases.frame.loading} />)
        : (
          <View style={styles.column}>
            <Stack>
              <Card title={data.content.question} aside={uiCases.frame.revision(data.revision)}>
                <View style={styles.form}>
                  <RichText text={say.lead} tone="muted" />
                  <Notice tone={data.signatures.length > 0 && data.state === 'signed' ? 'plain' : 'caution'} text={data.state === 'signed' ? say.signedMark : say.draftMark} />
                  <View style={styles.field}><Text kind="label" tone="muted">{say.paper}</Text><Segments label={say.paper} value={paper} onChange={setPaper} options={[{ value: 'A4', label: say.a4 }, { value: 'Letter', label: say.letter }]} /></View>
                  <Text kind="small" tone="muted">{say.zone(zone())}</Text>
                  <View style={styles.acts}>
                    <FileLink kind="primary" opensNew href={sheetPath(data.id, paper, data.revision, zone())} label={say.open} />
                    <FileLink href={sheetPath(data.id, paper, data.revision, zone())} download={`${data.code}-r${data.revision}.pdf`} label={say.download} />
                  </View>
                </View>
              </Card>
              <SiText caseId={data.id} hasReadings={data.content.readings.some((reading) => reading.j.trim() !== '')} />
            </Stack>
          </View>
        )}
    </Screen>
  );
}

function SiText({ caseId, hasReadings }: { caseId: string; hasReadings: boolean }) {
  const { data, error, isFetching, refetch } = useSiText(caseId);
  const { copy, copied, part } = useCopy();
  return (
    <Card title={say.siTitle}>
      <View style={styles.form}>
        <RichText text={say.siLead} tone="muted" />
        {data === undefined ? (error !== null ? <LoadProblem problem={error} again={() => void refetch()} isTrying={isFetching} /> : <Text tone="muted">{say.siLoading}</Text>)
          : !hasReadings || data.text.trim() === '' ? <Text tone="muted">{say.siNone}</Text>
          : (
            <>
              <View style={styles.text}><Text>{data.text}</Text></View>
              <View style={styles.acts}><Button label={copied ? say.copied : say.copy} onPress={() => copy(data.text)} /></View>
            </>
          )}
        {part}
      </View>
    </Card>
  );
}

const styles = StyleSheet.create({
  column: { maxWidth: size.text, width: '100%' },
  form: { gap: space.lg },
  field: { gap: space.xs },
  acts: { flexDirection: 'row', flexWrap: 'wrap', gap: space.md },
  text: { backgroundColor: color.paper, borderRadius: radius.control, padding: space.md },
});
