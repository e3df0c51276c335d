import { router } from 'expo-router';
import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { dayWords } from '@/shared/format/when';
import { uiAccount } from '@/shared/text/uiAccount';
import { roleWords } from '@/shared/text/uiTeam';

import { useChangeName, useChangePassword, useSignOut, useSignOutEverywhere } from '../data/account';
import { draftKeys } from '../data/drafts';
import { useReader, type User } from '../data/reader';
import { newPasswordError } from '../auth/passwordRule';
import { FormSheet } from '../forms/FormSheet';
import { PasswordField } from '../forms/PasswordField';
import { fieldSentence, LoadProblem, ProblemNotice } from '../forms/ProblemNotice';
import { THEME_CHOICES, useTheme } from '../theme/theme';
import { size, space } from '../theme/tokens';
import { Button } from '../ui/Button';
import { Card, CardBody, LinkRow } from '../ui/Card';
import { Field } from '../ui/Field';
import { LinkButton } from '../ui/LinkButton';
import { LiveRegion } from '../ui/LiveRegion';
import { Notice } from '../ui/Notice';
import { RichText } from '../ui/RichText';
import { Screen, Stack } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';
import { Segments } from '../ui/Segments';
import { Text } from '../ui/Text';

const say = uiAccount.account;

export function AccountScreen() {
  const { user, isLoading, session } = useReader();
  return (
    <Screen title={say.title} aside={user?.email}>
      {user !== null ? <Account user={user} demoMailbox={session.data?.demo?.mailbox === true} />
        : isLoading ? <ScreenState kind="loading" title={uiAccount.loading} />
        : session.error ? <LoadProblem problem={session.error} again={() => void session.refetch()} isTrying={session.isFetching} />
        : <ScreenState kind="empty" title={say.nobody} hint={say.nobodyHint} action={<><LinkButton kind="primary" href="/sign-in?to=%2Faccount" label={uiAccount.signIn.act} /><LinkButton href="/" label={uiAccount.signIn.quickLook} /></>} />}
      {user === null && <View style={styles.column}><ThemeCard /></View>}
    </Screen>
  );
}

function Account({ user, demoMailbox }: { user: User; demoMailbox: boolean }) {
  return (
    <View style={styles.column}>
      <Stack>
        <NameCard user={user} />
        <Card title={say.projectsTitle} flush>
          {user.projects.length === 0 && <CardBody><Text tone="muted">{say.noProjects}</Text></CardBody>}
          {user.projects.map((project) => (
            <LinkRow key={project.id} href={`/team/${project.id}`} value={project.name} detail={`${roleWords[project.role]}${project.guestUntil ? `, ${say.guestUntil(dayWords(project.guestUntil, new Date()))}` : ''}`} />
          ))}
          {user.siteRole === 'administrator' && <LinkRow href="/admin" value={say.adminLink} detail={say.administrator} />}
          {demoMailbox && <LinkRow href="/mailbox" value={say.mailboxLink} />}
        </Card>
        <PasswordCard />
        <ThemeCard />
        <SignOutCard userId={user.id} />
      </Stack>
    </View>
  );
}

function NameCard({ user }: { user: User }) {
  const change = useChangeName();
  const [name, setName] = useState(user.name);
  const error = name.trim() === '' ? uiAccount.nameEmpty : fieldSentence(change.error, 'name');
  return (
    <Card title={say.nameTitle}>
      <View style={styles.form}>
        <Field label={uiAccount.name} value={name} onChange={setName} autoComplete="name" hint={say.nameHint} error={error} />
        {change.error && !fieldSentence(change.error, 'name') && <ProblemNotice problem={change.error} />}
        {change.isSuccess && name.trim() === user.name && <Notice tone="plain" text={say.nameSaved} />}
        <View style={styles.start}>
          <Button label={say.saveName} busy={change.isPending && uiAccount.saving} onPress={() => { if (name.trim() !== '' && name.trim() !== user.name) change.mutate({ name: name.trim() }); }} />
        </View>
      </View>
    </Card>
  );
}

function PasswordCard() {
  const change = useChangePassword();
  const [current, setCurrent] = useState('');
  const [next, setNext] = useState('');
  const [tried, setTried] = useState(false);
  const nextError = newPasswordError(next);
  const submit = () => {
    setTried(true);
    if (current === '' || nextError !== undefined) return;
    change.mutate({ current, next }, { onSuccess: () => { setCurrent(''); setNext(''); setTried(false); } });
  };
  const named = fieldSentence(change.error, 'current') ?? fieldSentence(change.error, 'next');
  return (
    <Card title={say.passwordTitle}>
      <View style={styles.form}>
        {change.isSuccess && <Notice tone="plain" text={say.passwordChanged} />}
        {named === undefined && <ProblemNotice problem={change.error} />}
        <PasswordField purpose="present" label={say.present} value={current} onChange={setCurrent}
          error={tried && current === '' ? uiAccount.signIn.emptyPassword : fieldSentence(change.error, 'current')} />
        <PasswordField purpose="new" label={uiAccount.newPassword} value={next} onChange={setNext} onSubmit={submit} hint={uiAccount.passwordRule}
          error={tried ? nextError ?? fieldSentence(change.error, 'next') : undefined} />
        <View style={styles.start}><Button label={say.changePassword} busy={change.isPending && uiAccount.saving} onPress={submit} /></View>
      </View>
      <LiveRegion message={change.isSuccess ? say.passwordChanged : ''} />
    </Card>
  );
}

function ThemeCard() {
  const { choice, setChoice } = useTheme();
  return (
    <Card title={say.themeTitle}>
      <View style={styles.form}>
        <Segments label={say.themeTitle} value={choice} onChange={setChoice} options={THEME_CHOICES.map((value) => ({ value, label: say.theme[value] }))} />
        <RichText text={say.themeHint} kind="small" tone="muted" />
      </View>
    </Card>
  );
}

function SignOutCard({ userId }: { userId: string }) {
  const here = useSignOut();
  const everywhere = useSignOutEverywhere();
  const [asked, setAsked] = useState<'here' | 'everywhere' | null>(null);
  const [unsent] = useState(() => draftKeys(userId).length);
  const leave = (which: 'here' | 'everywhere') =>
    (which === 'here' ? here : everywhere).mutate(undefined, { onSuccess: () => router.replace('/sign-in') });
  const ask = (which: 'here' | 'everywhere') => (draftKeys(userId).length > 0 ? setAsked(which) : leave(which));
  return (
    <Card title={say.signOutTitle}>
      <View style={styles.form}>
        <RichText text={say.signOutNote} />
        {unsent > 0 && <Notice text={say.unsent(unsent)} />}
        <ProblemNotice problem={here.error ?? everywhere.error} />
        <View style={styles.buttons}>
          <Button label={say.signOut} busy={here.isPending && say.signingOut} onPress={() => ask('here')} />
          <Button label={say.signOutEverywhere} busy={everywhere.isPending && say.signingOut} onPress={() => ask('everywhere')} />
        </View>
      </View>
      {asked !== null && (
        <FormSheet title={asked === 'here' ? say.signOut : say.signOutEverywhere} onClose={() => setAsked(null)} act={say.signOutAnyway} danger
          busy={(here.isPending || everywhere.isPending) && say.signingOut} onAct={() => leave(asked)} second={{ label: say.keep, onPress: () => setAsked(null) }}>
          <RichText text={say.unsent(draftKeys(userId).length)} />
        </FormSheet>
      )}
    </Card>
  );
}

const styles = StyleSheet.create({
  column: { maxWidth: size.text, width: '100%' },
  form: { gap: space.lg },
  start: { alignItems: 'flex-start' },
  buttons: { flexDirection: 'row', flexWrap: 'wrap', gap: space.md },
});
