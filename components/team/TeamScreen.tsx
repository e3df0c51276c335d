import { router } from 'expo-router';
import { useState } from 'react';

import type { TeamResponse } from '@/shared/contracts/team';
import { LIMITS } from '@/shared/limits';
import { roleWords, uiTeam } from '@/shared/text/uiTeam';

import { useReader } from '../data/reader';
import { useCreateProject, useTeam } from '../data/team';
import { FormSheet } from '../forms/FormSheet';
import { fieldSentence, LoadProblem, ProblemNotice } from '../forms/ProblemNotice';
import { SignInState } from '../forms/SignInState';
import { Tag } from '../ui/Badge';
import { Button } from '../ui/Button';
import { Card, LinkRow } from '../ui/Card';
import { Field } from '../ui/Field';
import { Icon } from '../ui/Glyph';
import { LinkButton } from '../ui/LinkButton';
import { Screen, Stack } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';

/** The projects one is in. */
export function TeamScreen() {
  const { isSignedIn, isLoading } = useReader();
  const { data, error, isFetching, refetch } = useTeam(isSignedIn);
  const [creating, setCreating] = useState(false);
  return (
    <Screen title={uiTeam.title} aside={data && data.projects.length > 0 ? uiTeam.count(data.projects.length) : undefined}
      actions={data?.mayCreateProject ? <Button kind="primary" icon={<Icon name="plus" tone="onInk" />} label={uiTeam.newProject} opens="dialog" onPress={() => setCreating(true)} /> : undefined}>
      {!isSignedIn && !isLoading ? <SignInState from="/team" />
        : data === undefined && error !== null ? <LoadProblem problem={error} again={() => void refetch()} isTrying={isFetching} />
        : data === undefined ? <ScreenState kind="loading" title={uiTeam.loading} />
        : <Projects team={data} />}
      {creating && <CreateProject onClose={() => setCreating(false)} />}
    </Screen>
  );
}

function Projects({ team }: { team: TeamResponse }) {
  return (
    <Stack>
      {team.projects.length === 0
        ? <ScreenState kind="empty" title={uiTeam.emptyTitle} hint={team.mayCreateProject ? uiTeam.emptyCreateHint : uiTeam.emptyHint} />
        : (
          <Card flush>
            {team.projects.map((project) => (
              <LinkRow key={project.id} href={`/team/${project.id}`} value={project.name}
                detail={[project.key, uiTeam.cases(project.caseCount), project.yourRole ? uiTeam.yourRole(roleWords[project.yourRole]) : uiTeam.notMember].join(' · ')}
                aside={project.isDemo ? <Tag text={uiTeam.demo} tone="muted" /> : undefined} />
            ))}
          </Card>
        )}
      {team.mayAdminister && <LinkButton href="/admin" label={uiTeam.administer} />}
    </Stack>
  );
}

function CreateProject({ onClose }: { onClose: () => void }) {
  const create = useCreateProject();
  const [key, setKey] = useState('');
  const [name, setName] = useState('');
  const [tried, setTried] = useState(false);
  const fits = new RegExp(`^[A-Z][A-Z0-9]{${LIMITS.projectKeyMin - 1},${LIMITS.projectKeyMax - 1}}$`).test(key.trim().toUpperCase());
  const say = uiTeam.create;
  const submit = () => {
    setTried(true);
    if (fits && name.trim() !== '') create.mutate({ key: key.trim().toUpperCase(), name: name.trim() }, { onSuccess: (project) => { onClose(); router.push(`/team/${project.id}`); } });
  };
  const keyError = fieldSentence(create.error, 'key');
  const nameError = fieldSentence(create.error, 'name');
  return (
    <FormSheet title={say.title} onClose={onClose} act={say.act} busy={create.isPending && say.busy} onAct={submit}>
      {keyError === undefined && nameError === undefined && <ProblemNotice problem={create.error} />}
      <Field label={say.key} value={key} onChange={(typed) => setKey(typed.toUpperCase())} hint={say.keyHint} required autoFocus maxLength={LIMITS.projectKeyMax} error={tried && !fits ? say.keyError : keyError} />
      <Field label={say.name} value={name} onChange={setName} onSubmit={submit} required maxLength={LIMITS.projectName} error={tried && name.trim() === '' ? say.nameError : nameError} />
    </FormSheet>
  );
}
