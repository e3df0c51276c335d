import { router } from 'expo-router';
import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { LIMITS } from '@/shared/limits';
import { uiCases } from '@/shared/text/uiCases';
import { uiTeam } from '@/shared/text/uiTeam';

import { useReopenCase, useSubmitCase, useSupersedeCase, useWithdrawCase } from '../../data/cases';
import { useAddendum } from '../../data/reviews';
import { FormSheet } from '../../forms/FormSheet';
import { PasswordField } from '../../forms/PasswordField';
import { fieldSentence, ProblemNotice } from '../../forms/ProblemNotice';
import { useKeptForm } from '../../forms/useKeptForm';
import { isDay } from '../../team/isDay';
import { space } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { Field, TextArea } from '../../ui/Field';
import { Notice } from '../../ui/Notice';
import { RichText } from '../../ui/RichText';
import { useCaseView } from '../caseContext';
import { placeOf } from '../logic/fieldSentences';
import { sheetFor } from '../logic/sheetFor';

const say = uiCases.act;

/** To review: the password signs the authorship. What is missing is listed, each gap leading to its place. */
export function SubmitSheet({ onClose }: { onClose: () => void }) {
  const { found, content, editor, reader, open } = useCaseView();
  const submit = useSubmitCase(found.id);
  const [password, setPassword] = useState('');
  const [due, setDue] = useState('');
  const [tried, setTried] = useState(false);
  const dueFits = due.trim() === '' || isDay(due.trim());
  const send = () => {
    setTried(true);
    if (password !== '' && dueFits) submit.mutate({ seenVersion: found.version, dueOn: due.trim() === '' ? null : due.trim(), password }, { onSuccess: onClose });
  };
  const gaps = submit.error?.errors.filter((error) => placeOf(error.pointer) !== null) ?? [];
  const passwordError = fieldSentence(submit.error, 'password');
  return (
    <FormSheet title={say.submitTitle(found.revision)} onClose={onClose} act={say.submit} busy={submit.isPending && say.submitBusy} onAct={send}
      actDisabledBecause={editor.isDirty ? say.submitSave : undefined}>
      <RichText text={say.submitLead} tone="muted" />
      {gaps.length > 0 && (
        <View style={styles.gaps}>
          <RichText kind="strong" tone="error" text={say.submitGaps(gaps.length)} />
          {gaps.map((gap) => <Notice key={gap.pointer + gap.detail} tone="error" text={gap.detail} action={<Button small label={say.gapsGo} about={gap.detail} onPress={() => open(sheetFor(gap.pointer, content))} />} />)}
        </View>
      )}
      {gaps.length === 0 && passwordError === undefined && <ProblemNotice problem={submit.error} />}
      <Field label={say.submitDue} value={due} onChange={setDue} placeholder="2027-01-15" hint={say.submitDueHint} error={tried && !dueFits ? uiTeam.project.dayError : fieldSentence(submit.error, 'dueOn')} />
      <PasswordField purpose="present" label={say.password(reader.email)} value={password} onChange={setPassword} onSubmit={send} enterKeyHint="done"
        error={tried && password === '' ? say.passwordEmpty : passwordError} />
    </FormSheet>
  );
}

/** Withdrawing and superseding: a reason, kept in the trail. */
export function ReasonSheet({ act, onClose }: { act: 'withdraw' | 'supersede'; onClose: () => void }) {
  const { found, reader } = useCaseView();
  const withdraw = useWithdrawCase(found.id);
  const supersede = useSupersedeCase(found.id);
  const { form, set, drop } = useKeptForm(reader.id, `text.${found.id}.${act}`, { reason: '' });
  const [tried, setTried] = useState(false);
  const isWithdraw = act === 'withdraw';
  const problem = isWithdraw ? withdraw.error : supersede.error;
  const send = () => {
    setTried(true);
    if (form.reason.trim() === '') return;
    const request = { seenVersion: found.version, reason: form.reason.trim() };
    if (isWithdraw) withdraw.mutate(request, { onSuccess: () => { drop(); onClose(); } });
    else supersede.mutate(request, { onSuccess: ({ newCaseId }) => { drop(); onClose(); router.push(`/cases/${newCaseId}`); } });
  };
  return (
    <FormSheet title={isWithdraw ? say.withdrawTitle : say.supersedeTitle} onClose={onClose} act={isWithdraw ? say.withdraw : say.supersede} danger={isWithdraw}
      busy={isWithdraw ? withdraw.isPending && say.withdrawBusy : supersede.isPending && say.supersedeBusy} onAct={send}>
      <RichText text={isWithdraw ? say.withdrawLead : say.supersedeLead} />
      <ProblemNotice problem={fieldSentence(problem, 'reason') === undefined ? problem : null} />
      <TextArea label={say.reason} value={form.reason} onChange={(reason) => set({ reason })} maxLength={LIMITS.note} lines={3} autoFocus required
        error={tried && form.reason.trim() === '' ? say.reasonEmpty : fieldSentence(problem, 'reason')} />
    </FormSheet>
  );
}

export function ReopenSheet({ onClose }: { onClose: () => void }) {
  const { found } = useCaseView();
  const reopen = useReopenCase(found.id);
  return (
    <FormSheet title={say.reopen} onClose={onClose} act={say.reopen} busy={reopen.isPending && say.reopenBusy} onAct={() => reopen.mutate({ seenVersion: found.version }, { onSuccess: onClose })}>
      <RichText text={say.reopenLead} />
      <ProblemNotice problem={reopen.error} />
    </FormSheet>
  );
}

/** A signed text beside a signed revision. */
export function AddendumSheet({ onClose }: { onClose: () => void }) {
  const { found, reader } = useCaseView();
  const addend = useAddendum(found.id);
  const { form, set, drop } = useKeptForm(reader.id, `text.${found.id}.addendum`, { text: '' });
  const [password, setPassword] = useState('');
  const [tried, setTried] = useState(false);
  const passwordError = fieldSentence(addend.error, 'password');
  const send = () => {
    setTried(true);
    if (form.text.trim() !== '' && password !== '') addend.mutate({ text: form.text, password }, { onSuccess: () => { drop(); onClose(); } });
  };
  return (
    <FormSheet title={say.addendTitle} onClose={onClose} act={say.addend} busy={addend.isPending && say.addendBusy} onAct={send}>
      <RichText text={say.addendLead} />
      <ProblemNotice problem={passwordError === undefined ? addend.error : null} />
      <TextArea label={say.addendText} value={form.text} onChange={(text) => set({ text })} maxLength={LIMITS.query} lines={4} autoFocus required error={tried && form.text.trim() === '' ? say.addendEmpty : fieldSentence(addend.error, 'text')} />
      <PasswordField purpose="present" label={say.password(reader.email)} value={password} onChange={setPassword} onSubmit={send} error={tried && password === '' ? say.passwordEmpty : passwordError} />
    </FormSheet>
  );
}

const styles = StyleSheet.create({ gaps: { gap: space.sm } });
