import { useState } from 'react';

import { GRADE_WORDS } from '@/shared/format/words';
import { LIMITS } from '@/shared/limits';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import { GRADES } from '@/shared/types/answer';
import type { PersonAnswer } from '@/shared/types/case';

import { FormSheet } from '../../forms/FormSheet';
import { useKeptForm } from '../../forms/useKeptForm';
import { AnswerStrip } from '../../ui/AnswerStrip';
import { Button } from '../../ui/Button';
import { RadioRow, RadioRows } from '../../ui/Choice';
import { Field, TextArea } from '../../ui/Field';
import { RichText } from '../../ui/RichText';
import { Segments } from '../../ui/Segments';
import { Text } from '../../ui/Text';
import { CommentsAt } from '../parts/CommentsAt';
import { useCaseView } from '../caseContext';
import { differsFromComputed, emptyAnswer, putAnswer } from '../logic/edits';
import { formKey } from '../logic/formKeys';

const say = uiCaseParts.answer;

/** The person's conclusion. The calculated one stands above it; whoever differs says why, and both stay visible. */
export function AnswerSheet({ onClose }: { onClose: () => void }) {
  const { found, content, editor, reader } = useCaseView();
  const computed = found.trail.answer;
  const { form, set, drop } = useKeptForm<PersonAnswer>(reader.id, formKey(found.id, 'answer'), content.answer ?? emptyAnswer());
  const [tried, setTried] = useState(false);
  const differs = differsFromComputed(form, computed);
  const lacksReason = differs && form.overrideReason.trim() === '';
  const save = () => {
    setTried(true);
    if (lacksReason) return;
    editor.edit((before) => putAnswer(before, { ...form, statement: form.statement.trim(), overrideReason: differs ? form.overrideReason : '' }));
    drop();
    onClose();
  };
  return (
    <FormSheet title={say.title} onClose={onClose} act={uiCaseParts.done} onAct={save} onDiscard={drop}>
      <RichText tone="muted" text={say.lead} />
      <AnswerStrip level={3} grade={computed.grade} ink="calculated" name={say.computed} headline={computed.headline} detail={computed.detail} />
      <Button label={say.take} onPress={() => set({ grade: computed.grade, candidateId: computed.candidateId })} />
      <Segments label={say.grade} value={form.grade} onChange={(grade) => set({ grade })} options={GRADES.map((value) => ({ value, label: GRADE_WORDS[value] }))} />
      <RadioRows label={say.candidate}>
        <Text kind="label" tone="muted">{say.candidate}</Text>
        {content.candidates.map((candidate) => <RadioRow key={candidate.id} label={candidate.name || '?'} chosen={form.candidateId === candidate.id} onPress={() => set({ candidateId: candidate.id })} />)}
        <RadioRow label={say.noneOfThese} chosen={form.candidateId === 'none'} onPress={() => set({ candidateId: 'none' })} />
        <RadioRow label={say.leftOpen} detail={content.candidates.length === 0 ? say.needsCandidates : undefined} chosen={form.candidateId === null} onPress={() => set({ candidateId: null })} />
      </RadioRows>
      {differs && (
        <TextArea label={say.override} value={form.overrideReason} onChange={(overrideReason) => set({ overrideReason })} maxLength={LIMITS.reasons} lines={2} required
          hint={say.overrideHint(`${GRADE_WORDS[computed.grade]}, ${computed.headline}`)} error={tried && lacksReason ? say.overrideEmpty : undefined} />
      )}
      <Field label={say.statement} value={form.statement} onChange={(statement) => set({ statement })} maxLength={LIMITS.statement} hint={say.statementHint} />
      <TextArea label={say.reasons} value={form.reasons} onChange={(reasons) => set({ reasons })} maxLength={LIMITS.reasons} lines={4} hint={say.reasonsHint} />
      <TextArea label={say.open} value={form.leftOpen} onChange={(leftOpen) => set({ leftOpen })} maxLength={LIMITS.reasons} lines={2} hint={say.openHint} />
      {content.answer !== null && <Button kind="danger" label={say.withdraw} onPress={() => { editor.remove(say.title, (before) => putAnswer(before, null)); drop(); onClose(); }} />}
      <CommentsAt target="answer" label={say.title.toLowerCase()} />
    </FormSheet>
  );
}
