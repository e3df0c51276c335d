import { useState } from 'react';

import { uiAccount } from '@/shared/text/uiAccount';

import { useResetPassword } from '../data/account';
import { PasswordField } from '../forms/PasswordField';
import { fieldSentence, ProblemNotice } from '../forms/ProblemNotice';
import { Button } from '../ui/Button';
import { LinkButton } from '../ui/LinkButton';
import { Notice } from '../ui/Notice';
import { AuthPage } from './AuthPage';
import { newPasswordError } from './passwordRule';

const say = uiAccount.reset;

/** Where the link of a mail leads: a new password, once. */
export function ResetScreen({ token }: { token: string }) {
  const reset = useResetPassword();
  const [next, setNext] = useState('');
  const [tried, setTried] = useState(false);
  const error = newPasswordError(next);
  const submit = () => {
    setTried(true);
    if (error === undefined) reset.mutate({ token, next });
  };
  if (reset.isSuccess) {
    return (
      <AuthPage title={say.doneTitle} lead={say.done}>
        <LinkButton kind="primary" href="/sign-in" label={uiAccount.signIn.act} />
      </AuthPage>
    );
  }
  const isGone = reset.error?.is('gone') === true || reset.error?.is('not-found') === true;
  return (
    <AuthPage title={say.title} lead={say.lead}>
      {isGone
        ? <Notice tone="error" text={say.gone} action={<LinkButton href="/forgot" label={say.askAgain} />} />
        : <ProblemNotice problem={reset.error} />}
      <PasswordField purpose="new" label={uiAccount.newPassword} labelTone="ink" value={next} onChange={setNext} onSubmit={submit} hint={uiAccount.passwordRule} required autoFocus
        error={tried ? error ?? fieldSentence(reset.error, 'next') : undefined} />
      <Button kind="primary" label={say.act} busy={reset.isPending && uiAccount.saving} onPress={submit} />
    </AuthPage>
  );
}
