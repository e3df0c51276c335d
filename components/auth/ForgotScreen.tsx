import { useState } from 'react';

import { uiAccount } from '@/shared/text/uiAccount';

import { useForgotPassword } from '../data/account';
import { useSession } from '../data/session';
import { fieldSentence, ProblemNotice } from '../forms/ProblemNotice';
import { Button } from '../ui/Button';
import { Field } from '../ui/Field';
import { LinkButton, TextLink } from '../ui/LinkButton';
import { Notice } from '../ui/Notice';
import { AuthPage } from './AuthPage';

const say = uiAccount.forgot;

/** Asks for a link by mail. The answer is the same for every address, so that nobody learns who has an account. */
export function ForgotScreen() {
  const forgot = useForgotPassword();
  const { data: session } = useSession();
  const [email, setEmail] = useState('');
  const [tried, setTried] = useState(false);
  const submit = () => {
    setTried(true);
    if (email.trim() !== '') forgot.mutate({ email });
  };
  if (forgot.isSuccess) {
    return (
      <AuthPage title={say.sentTitle}>
        <Notice tone="plain" text={say.sent(email.trim())} />
        {session?.demo?.mailbox === true && <LinkButton href="/mailbox" label={say.mailbox} />}
        <Button label={say.again} busy={forgot.isPending && uiAccount.sending} onPress={submit} />
        <TextLink href="/sign-in" label={say.back} />
      </AuthPage>
    );
  }
  return (
    <AuthPage title={say.title} lead={say.lead}>
      <ProblemNotice problem={forgot.error} />
      <Field label={uiAccount.email} labelTone="ink" value={email} onChange={setEmail} onSubmit={submit} inputMode="email" autoComplete="username" autoFocus required
        error={tried && email.trim() === '' ? uiAccount.signIn.emptyEmail : fieldSentence(forgot.error, 'email')} />
      <Button kind="primary" label={say.act} busy={forgot.isPending && uiAccount.sending} onPress={submit} />
      <TextLink href="/sign-in" label={say.back} />
    </AuthPage>
  );
}
