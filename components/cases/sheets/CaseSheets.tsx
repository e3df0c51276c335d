import { QuerySheet } from '../../reviews/QuerySheet';
import { SignSheet } from '../../reviews/SignSheet';
import { useCaseView, type CaseSheet } from '../caseContext';
import { AddendumSheet, ReasonSheet, ReopenSheet, SubmitSheet } from './ActSheets';
import { AnswerSheet } from './AnswerSheet';
import { CalculationSheet } from './CalculationSheet';
import { CandidateSheet } from './CandidateSheet';
import { CompoundSheet } from './CompoundSheet';
import { ConditionsSheet } from './ConditionsSheet';
import { EvidenceSheet } from './EvidenceSheet';
import { DiscardSheet, MoreSheet, TrailSheet } from './MoreSheet';
import { ReadingDetail } from './ReadingDetail';
import { ReadingSheet } from './ReadingSheet';
import { StepSheet } from './StepSheet';

/** The sheet that is open over the case. */
export function CaseSheets({ sheet, onClose }: { sheet: CaseSheet; onClose: () => void }) {
  const { mayEdit } = useCaseView();
  switch (sheet.kind) {
    case 'compound': return <CompoundSheet onClose={onClose} />;
    case 'conditions': return <ConditionsSheet onClose={onClose} />;
    case 'reading': return mayEdit || sheet.id === null ? <ReadingSheet key={sheet.id ?? 'new'} id={sheet.id} onClose={onClose} /> : <ReadingDetail id={sheet.id} onClose={onClose} />;
    case 'calculation': return <CalculationSheet key={sheet.id ?? 'new'} readingId={sheet.readingId} id={sheet.id} onClose={onClose} />;
    case 'candidate': return <CandidateSheet key={sheet.id ?? 'new'} id={sheet.id} onClose={onClose} />;
    case 'evidence': return <EvidenceSheet key={sheet.id ?? 'new'} id={sheet.id} onClose={onClose} />;
    case 'answer': return <AnswerSheet onClose={onClose} />;
    case 'step': return <StepSheet stepKey={sheet.key} onClose={onClose} />;
    case 'query': return <QuerySheet stepKey={sheet.stepKey} onClose={onClose} />;
    case 'sign': return <SignSheet onClose={onClose} />;
    case 'submit': return <SubmitSheet onClose={onClose} />;
    case 'withdraw': case 'supersede': return <ReasonSheet act={sheet.kind} onClose={onClose} />;
    case 'reopen': return <ReopenSheet onClose={onClose} />;
    case 'addend': return <AddendumSheet onClose={onClose} />;
    case 'more': return <MoreSheet onClose={onClose} />;
    case 'trail': return <TrailSheet onClose={onClose} />;
    case 'discard': return <DiscardSheet onClose={onClose} />;
  }
}
