import { useState } from 'react';

import { LIMITS } from '@/shared/limits';
import { stepWords, uiReviews } from '@/shared/text/uiReviews';
import { REVIEW_STEPS, type ReviewStep } from '@/shared/types/trail';

import { useCaseView } from '../cases/caseContext';
import { numberedSteps, reviewStepOf } from '../cases/logic/trailSteps';
import { useOpenQuery } from '../data/reviews';
import { FormSheet } from '../forms/FormSheet';
import { fieldSentence, ProblemNotice } from '../forms/ProblemNotice';
import { useKeptForm } from '../forms/useKeptForm';
import { TextArea } from '../ui/Field';
import { RichText } from '../ui/RichText';
import { Select, type SelectOption } from '../ui/Select';

const say = uiReviews.column;

/** A question to the author, pinned to a step of the trail or to a check as a whole. */
export function QuerySheet({ stepKey, onClose }: { stepKey: string | null; onClose: () => void }) {
  const { found, reader } = useCaseView();
  const ask = useOpenQuery(found.id);
  const { form, set, drop } = useKeptForm(reader.id, `text.${found.id}.new-query`, { place: '', text: '' });
  const [tried, setTried] = useState(false);
  const steps = numberedSteps(found.trail, found.review.queries);
  const place = stepKey === null ? form.place : `step:${stepKey}`;
  const options: SelectOption<string>[] = [
    ...steps.map(({ number, step }) => ({ value: `step:${step.key}`, label: `${number}  ${step.title}`, detail: step.reviewStep === null ? undefined : stepWords[step.reviewStep] })),
    ...REVIEW_STEPS.map((step) => ({ value: `check:${step}`, label: stepWords[step] })),
  ];
  const isKnown = options.some((option) => option.value === place);
  const submit = () => {
    setTried(true);
    if (!isKnown || form.text.trim() === '') return;
    const step = steps.find((each) => `step:${each.step.key}` === place)?.step;
    const check: ReviewStep = step === undefined ? (REVIEW_STEPS.find((each) => `check:${each}` === place) ?? 'other-evidence') : reviewStepOf(step);
    ask.mutate({ step: check, stepKey: step?.key ?? null, text: form.text }, { onSuccess: () => { drop(); onClose(); } });
  };
  return (
    <FormSheet title={say.newQueryTitle} onClose={onClose} act={say.ask} busy={ask.isPending && say.asking} onAct={submit}>
      <RichText tone="muted" text={say.newQueryLead} />
      <ProblemNotice problem={fieldSentence(ask.error, 'text') === undefined ? ask.error : null} />
      {stepKey === null
        ? <Select label={say.queryStep} value={isKnown ? place : null} onChange={(value) => set({ place: value })} options={options} placeholder={say.chooseStep} error={tried && !isKnown ? say.stepEmpty : undefined} />
        : <RichText kind="strong" text={options.find((option) => option.value === place)?.label ?? ''} />}
      <TextArea label={say.queryText} value={form.text} onChange={(text) => set({ text })} lines={4} maxLength={LIMITS.query} autoFocus
        error={tried && form.text.trim() === '' ? say.queryEmpty : fieldSentence(ask.error, 'text')} />
    </FormSheet>
  );
}
