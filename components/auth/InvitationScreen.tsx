import { router } from 'expo-router';
import { useState } from 'react';

import { dayWords } from '@/shared/format/when';
import { uiAccount } from '@/shared/text/uiAccount';
import { roleMeaning, roleWords } from '@/shared/text/uiTeam';

import { useAcceptInvitation, useInvitation } from '../data/account';
import { PasswordField } from '../forms/PasswordField';
import { fieldSentence, LoadProblem, ProblemNotice } from '../forms/ProblemNotice';
import { Button } from '../ui/Button';
import { Field } from '../ui/Field';
import { LinkButton } from '../ui/LinkButton';
import { RichText } from '../ui/RichText';
import { ScreenState } from '../ui/ScreenState';
import { AuthPage } from './AuthPage';
import { newPasswordError } from './passwordRule';

const say = uiAccount.invitation;

/** Where the link of an invitation leads: join with the account one has, or make one. */
export function InvitationScreen({ token }: { token: string }) {
  const { data, error, isFetching, refetch } = useInvitation(token);
  const accept = useAcceptInvitation(token);
  const [name, setName] = useState('');
  const [password, setPassword] = useState('');
  const [tried, setTried] = useState(false);

  if (error?.is('gone') || error?.is('not-found') || error?.is('invalid-input')) {
    return <AuthPage title={say.goneTitle} lead={say.gone}><LinkButton href="/" label={uiAccount.signIn.quickLook} /></AuthPage>;
  }
  if (!data) {
    return (
      <AuthPage title={uiAccount.product}>
        {error ? <LoadProblem problem={error} again={() => void refetch()} isTrying={isFetching} /> : <ScreenState kind="loading" title={say.loading} />}
      </AuthPage>
    );
  }
  const passwordError = data.hasAccount ? (password === '' ? uiAccount.signIn.emptyPassword : undefined) : newPasswordError(password);
  const nameError = !data.hasAccount && name.trim() === '' ? uiAccount.nameEmpty : undefined;
  const submit = () => {
    setTried(true);
    if (passwordError === undefined && nameError === undefined)
      accept.mutate(data.hasAccount ? { password } : { name: name.trim(), password }, { onSuccess: () => router.replace('/cases') });
  };
  return (
    <AuthPage title={say.title(data.projectName)} lead={`${say.lead(data.invitedBy, roleWords[data.role])}${data.guestUntil ? ` ${say.guest(dayWords(data.guestUntil, new Date()))}` : ''}`}>
      <RichText text={`${say.role(roleWords[data.role], roleMeaning[data.role])} ${say.forAddress(data.email)}`} />
      <RichText text={data.hasAccount ? say.hasAccount : say.newAccount} tone="muted" />
      <ProblemNotice problem={accept.error} />
      {!data.hasAccount && (
        <Field label={uiAccount.name} labelTone="ink" value={name} onChange={setName} autoComplete="name" required autoFocus
          error={tried ? nameError ?? fieldSentence(accept.error, 'name') : undefined} />
      )}
      <PasswordField purpose={data.hasAccount ? 'present' : 'new'} label={uiAccount.password} labelTone="ink" value={password} onChange={setPassword} onSubmit={submit} required
        hint={data.hasAccount ? undefined : uiAccount.passwordRule} error={tried ? passwordError ?? fieldSentence(accept.error, 'password') : undefined} />
      <Button kind="primary" label={say.accept} busy={accept.isPending && say.busy} onPress={submit} />
    </AuthPage>
  );
}
