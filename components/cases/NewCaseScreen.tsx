import { router, useLocalSearchParams } from 'expo-router';
import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { LIMITS } from '@/shared/limits';
import { roleWords } from '@/shared/text/uiTeam';
import { uiCases } from '@/shared/text/uiCases';

import { useCreateCase } from '../data/cases';
import { useReader, type User } from '../data/reader';
import { fieldSentence, ProblemNotice } from '../forms/ProblemNotice';
import { SignInState } from '../forms/SignInState';
import { useKeptForm } from '../forms/useKeptForm';
import { size, space } from '../theme/tokens';
import { Button } from '../ui/Button';
import { Card } from '../ui/Card';
import { Field } from '../ui/Field';
import { LinkButton } from '../ui/LinkButton';
import { RichText } from '../ui/RichText';
import { Screen } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';
import { Select } from '../ui/Select';

const say = uiCases.fresh;

/** A case from a question alone; from a reading the quick look opens one in a single step. */
export function NewCaseScreen() {
  const { project } = useLocalSearchParams<{ project?: string }>();
  const { reader, isLoading, isSignedIn } = useReader();
  return (
    <Screen title={say.title} back="/cases">
      {reader === null ? (isLoading ? <ScreenState kind="loading" title={uiCases.list.loading} /> : <SignInState from="/cases/new" />)
        : reader.projects.every((each) => each.role === 'reader') ? <ScreenState kind="empty" title={say.title} hint={say.noProject} action={<LinkButton href="/" label={uiCases.list.startQuick} />} />
        : <Form user={reader} wanted={project} isSignedIn={isSignedIn} />}
    </Screen>
  );
}

function Form({ user, wanted, isSignedIn }: { user: User; wanted: string | undefined; isSignedIn: boolean }) {
  const projects = user.projects.filter((project) => project.role !== 'reader');
  const start = projects.find((project) => project.id === wanted) ?? (projects.length === 1 ? projects[0] : undefined);
  const { form, set, drop } = useKeptForm(user.id, 'new-case', { projectId: start?.id ?? '', question: '', compound: '' });
  const create = useCreateCase();
  const [tried, setTried] = useState(false);
  const projectId = projects.some((project) => project.id === form.projectId) ? form.projectId : '';
  const submit = () => {
    setTried(true);
    if (projectId === '' || form.question.trim() === '' || !isSignedIn) return;
    create.mutate({ projectId, question: form.question.trim(), ...(form.compound.trim() === '' ? {} : { compoundName: form.compound.trim() }) },
      { onSuccess: (found) => { drop(); router.replace(`/cases/${found.id}`); } });
  };
  return (
    <View style={styles.column}>
      <Card>
        <View style={styles.form}>
          <RichText text={say.lead} tone="muted" />
          <ProblemNotice problem={create.error} />
          <Select label={say.project} value={projectId === '' ? null : projectId} onChange={(id) => set({ projectId: id })} placeholder={say.chooseProject}
            options={projects.map((project) => ({ value: project.id, label: `${project.key} · ${project.name}`, detail: roleWords[project.role] }))}
            error={tried && projectId === '' ? say.projectEmpty : fieldSentence(create.error, 'projectId')} />
          <Field label={say.question} value={form.question} onChange={(question) => set({ question })} hint={say.questionHint} maxLength={LIMITS.question} required autoFocus
            error={tried && form.question.trim() === '' ? say.questionEmpty : fieldSentence(create.error, 'question')} />
          <Field label={say.compound} value={form.compound} onChange={(compound) => set({ compound })} hint={say.compoundHint} maxLength={LIMITS.compoundName} onSubmit={submit}
            error={fieldSentence(create.error, 'compoundName')} />
          <Button kind="primary" label={say.act} busy={create.isPending && say.busy} onPress={submit} />
          <RichText text={say.orQuick} kind="small" tone="muted" />
        </View>
      </Card>
    </View>
  );
}

const styles = StyleSheet.create({
  column: { maxWidth: size.text, width: '100%' },
  form: { gap: space.lg },
});
