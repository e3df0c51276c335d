import { useState } from 'react';

import type { CaseResponse } from '@/shared/contracts/cases';
import { uiCases } from '@/shared/text/uiCases';

import { useCase, useSaveCase } from '../data/cases';
import { useReader, type User } from '../data/reader';
import { LoadProblem } from '../forms/ProblemNotice';
import { SignInState } from '../forms/SignInState';
import { LinkButton } from '../ui/LinkButton';
import { Screen } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';
import { CaseContext, type CaseSheet, type CaseView } from './caseContext';
import { CaseLayout } from './CaseLayout';
import { useCaseEditor } from './logic/useCaseEditor';
import { VersionsView } from './parts/VersionsView';
import { CaseSheets } from './sheets/CaseSheets';

/** A case: loads it, then shows it whole. A lost session keeps what is on screen. */
export function CaseScreen({ caseId }: { caseId: string }) {
  const { reader, isSignedIn, isLoading } = useReader();
  const { data, error, isFetching, refetch } = useCase(caseId, isSignedIn);
  if (data !== undefined && reader !== null) {
    return <OpenCase key={data.id} found={data} reader={reader} isSignedIn={isSignedIn} isOutdated={error !== null && isSignedIn} refetch={() => void refetch()} />;
  }
  const isMissing = error !== null && (error.is('not-found') || error.is('invalid-input'));
  return (
    <Screen title={isMissing ? uiCases.frame.missing : uiCases.list.title} back="/cases">
      {!isSignedIn && !isLoading ? <SignInState from={`/cases/${caseId}`} />
        : isMissing ? <ScreenState kind="empty" title={uiCases.frame.missing} hint={uiCases.frame.missingHint} action={<LinkButton href="/cases" label={uiCases.frame.backToCases} />} />
        : error !== null ? <LoadProblem problem={error} again={() => void refetch()} isTrying={isFetching} />
        : <ScreenState kind="loading" title={uiCases.frame.loading} />}
    </Screen>
  );
}

function OpenCase({ found, reader, isSignedIn, isOutdated, refetch }: { found: CaseResponse; reader: User; isSignedIn: boolean; isOutdated: boolean; refetch: () => void }) {
  const { mutateAsync } = useSaveCase(found.id);
  // whoever reviews does not write: a saved change would take the case out of their hands
  const mayEdit = found.may.edit && found.review.reviewer?.id !== reader.id;
  const editor = useCaseEditor({ found, reader: reader.id, isSignedIn, mayEdit, save: mutateAsync, refetch });
  const [sheet, setSheet] = useState<CaseSheet | null>(null);
  const view: CaseView = { found, content: editor.content, editor, mayEdit, reader, now: new Date(), open: setSheet };
  return (
    <CaseContext value={view}>
      {editor.state.status === 'conflict' ? <VersionsView /> : <CaseLayout isOutdated={isOutdated} />}
      {sheet !== null && editor.state.status !== 'conflict' && <CaseSheets sheet={sheet} onClose={() => setSheet(null)} />}
    </CaseContext>
  );
}
