import { useState } from 'react';

import { candidateName } from '@/shared/text/uiCaseFields';
import { uiReviews } from '@/shared/text/uiReviews';

import { useCaseView } from '../cases/caseContext';
import { useSign } from '../data/reviews';
import { FormSheet } from '../forms/FormSheet';
import { PasswordField } from '../forms/PasswordField';
import { fieldSentence, ProblemNotice } from '../forms/ProblemNotice';
import { AnswerStrip } from '../ui/AnswerStrip';
import { RadioRow, RadioRows } from '../ui/Choice';
import { Inline, Text } from '../ui/Text';

const say = uiReviews.signing;
/** The first bytes of a hash in groups, enough to compare by eye. */
export const hashGroups = (hash: string): string => `${hash.slice(0, 12).match(/.{4}/g)?.join('\u00A0') ?? ''}\u00A0…`;

/** The signature: what it means, the password, and the content it is fixed to. Never one tap. */
export function SignSheet({ onClose }: { onClose: () => void }) {
  const { found, content, reader } = useCaseView();
  // what was on screen when the sheet opened is what gets signed; a later version is refused by the server
  const [seen] = useState({ version: found.version, hash: found.contentHash, revision: found.revision });
  const sign = useSign(found.id);
  const [meaning, setMeaning] = useState<'review' | 'approval'>('review');
  const [password, setPassword] = useState('');
  const [tried, setTried] = useState(false);
  const submit = () => {
    setTried(true);
    if (password !== '') sign.mutate({ seenVersion: seen.version, contentHash: seen.hash, meaning, password }, { onSuccess: onClose, onError: () => setPassword('') });
  };
  const { answer } = content;
  const passwordError = fieldSentence(sign.error, 'password');
  return (
    <FormSheet title={say.title(seen.revision)} onClose={onClose} act={say.act(reader.name)} busy={sign.isPending && say.busy} onAct={submit}>
      {answer !== null && <AnswerStrip level={3} grade={answer.grade} ink="judged" headline={answer.statement.trim() || candidateName(content, answer.candidateId)} detail={answer.leftOpen} />}
      <RadioRows label={say.meaning}>
        <Text kind="label" tone="muted">{say.meaning}</Text>
        <RadioRow label={say.review} detail={say.reviewNote} chosen={meaning === 'review'} onPress={() => setMeaning('review')} />
        <RadioRow label={say.approval} detail={say.approvalNote} chosen={meaning === 'approval'} onPress={() => setMeaning('approval')} />
      </RadioRows>
      {sign.error?.is('changed-meanwhile')
        ? <ProblemNotice problem={sign.error} />
        : passwordError === undefined && <ProblemNotice problem={sign.error} />}
      <PasswordField purpose="present" label={say.password(reader.email)} value={password} onChange={setPassword} onSubmit={submit} enterKeyHint="done"
        error={tried && password === '' && !sign.isPending && sign.error === null ? say.passwordEmpty : passwordError} />
      <Text kind="small" tone="muted">{say.boundBefore} <Inline tone="ink">{hashGroups(seen.hash)}</Inline> {say.boundAfter}</Text>
    </FormSheet>
  );
}
