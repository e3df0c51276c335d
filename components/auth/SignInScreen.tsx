import { router, useLocalSearchParams } from 'expo-router';
import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { uiAccount } from '@/shared/text/uiAccount';

import { useSignIn } from '../data/account';
import { useSession } from '../data/session';
import { PasswordField } from '../forms/PasswordField';
import { fieldSentence, ProblemNotice } from '../forms/ProblemNotice';
import { space } from '../theme/tokens';
import { Button } from '../ui/Button';
import { Card, CardBody, PlainRow } from '../ui/Card';
import { Field } from '../ui/Field';
import { PlaceIcon } from '../ui/Glyph';
import { LinkButton, TextLink } from '../ui/LinkButton';
import { Notice } from '../ui/Notice';
import { Text } from '../ui/Text';
import { AuthPage, RuleWith } from './AuthPage';
import { safePath } from './safePath';

const say = uiAccount.signIn;

/** E-mail and password, then back to where one came from. */
export function SignInScreen() {
  const { to } = useLocalSearchParams<{ to?: string }>();
  const { data: session } = useSession();
  const signIn = useSignIn();
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const [tried, setTried] = useState(false);
  const after = safePath(to);

  const enter = (credentials: { email: string; password: string }) =>
    signIn.mutate(credentials, { onSuccess: () => router.replace(after) });
  const submit = () => {
    setTried(true);
    if (email.trim() !== '' && password !== '') enter({ email, password });
  };
  const demo = session?.demo ?? null;
  return (
    <AuthPage title={say.title} lead={say.lead} foot={say.foot}>
      {session?.user && <Notice tone="plain" text={say.already(session.user.name)} action={<LinkButton href={after} label={say.goOn} />} />}
      {to !== undefined && !session?.user && <Notice tone="plain" text={say.kept} />}
      <ProblemNotice problem={signIn.error} />
      <Field label={uiAccount.email} labelTone="ink" value={email} onChange={setEmail} onSubmit={submit} inputMode="email" autoComplete="username" autoFocus required
        error={tried && email.trim() === '' ? say.emptyEmail : fieldSentence(signIn.error, 'email')} />
      <View style={styles.password}>
        <PasswordField purpose="present" label={uiAccount.password} labelTone="ink" value={password} onChange={setPassword} onSubmit={submit} required enterKeyHint="go"
          error={tried && password === '' ? say.emptyPassword : fieldSentence(signIn.error, 'password')} />
        <View style={styles.forgotten}><TextLink href="/forgot" label={say.forgotten} /></View>
      </View>
      <Button kind="primary" label={say.act} busy={signIn.isPending && say.busy} onPress={submit} />
      {demo !== null && (
        <Card title={say.demoTitle} level={2} flush>
          <CardBody><Text kind="small" tone="muted">{say.demoLead}</Text></CardBody>
          {demo.accounts.map((account) => (
            <PlainRow key={account.email} value={account.name} detail={account.role}>
              <Button small label={say.act} about={account.name} busy={signIn.isPending && signIn.variables.email === account.email && say.busy}
                onPress={() => { setEmail(account.email); enter({ email: account.email, password: demo.password }); }} />
            </PlainRow>
          ))}
        </Card>
      )}
      <RuleWith word={say.noAccount} />
      <LinkButton href="/" label={say.quickLook} icon={<PlaceIcon place="quick" />} />
    </AuthPage>
  );
}

const styles = StyleSheet.create({
  password: { gap: 0 },
  forgotten: { flexDirection: 'row', justifyContent: 'flex-end', marginBottom: -space.md },
});
