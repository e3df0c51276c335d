import { router } from 'expo-router';
import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import type { Member, ProjectResponse } from '@/shared/contracts/team';
import { dayWords, isPast, momentWords } from '@/shared/format/when';
import { roleWords, uiTeam } from '@/shared/text/uiTeam';

import { useReader } from '../data/reader';
import { useProject, useRemoveMember, useWithdrawInvitation } from '../data/team';
import { FormSheet } from '../forms/FormSheet';
import { LoadProblem, ProblemNotice } from '../forms/ProblemNotice';
import { SignInState } from '../forms/SignInState';
import { border, color, size, space } from '../theme/tokens';
import { Tag } from '../ui/Badge';
import { Button } from '../ui/Button';
import { Card, CardBody, PlainRow } from '../ui/Card';
import { Disclosure } from '../ui/Disclosure';
import { LinkButton } from '../ui/LinkButton';
import { RichText } from '../ui/RichText';
import { Columns, Screen } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';
import { Text } from '../ui/Text';
import { PersonSheet } from './PersonSheet';
import { RulesCard } from './RulesCard';

const say = uiTeam.project;

/** One project: who is in it, who is on the way, its rules, and what changed. */
export function ProjectScreen({ projectId }: { projectId: string }) {
  const { isSignedIn, isLoading } = useReader();
  const { data, error, isFetching, refetch } = useProject(projectId, isSignedIn);
  return (
    <Screen title={data?.name ?? uiTeam.title} crumb={data ? `${uiTeam.title} · ${data.key}` : undefined} back="/team"
      actions={data ? <LinkButton href={`/cases?project=${projectId}`} label={say.toCases} /> : undefined}>
      {!isSignedIn && !isLoading ? <SignInState from={`/team/${projectId}`} />
        : data === undefined && error !== null
          ? (error.is('not-found') || error.is('invalid-input') ? <ScreenState kind="empty" title={say.missing} action={<LinkButton href="/team" label={uiTeam.title} />} /> : <LoadProblem problem={error} again={() => void refetch()} isTrying={isFetching} />)
        : data === undefined ? <ScreenState kind="loading" title={say.loading} />
        : <Columns side="second" narrow={size.aside} first={<People project={data} />} second={<><RulesCard key={data.id} project={data} /><Log project={data} /></>} />}
    </Screen>
  );
}

function People({ project }: { project: ProjectResponse }) {
  const [sheet, setSheet] = useState<Member | 'invite' | null>(null);
  const [leaving, setLeaving] = useState<Member | null>(null);
  const remove = useRemoveMember(project.id);
  const withdraw = useWithdrawInvitation(project.id);
  const now = new Date();
  const guest = (member: Member) => member.guestUntil !== null && (isPast(member.guestUntil, now) ? say.guestOver(dayWords(member.guestUntil, now)) : say.guest(dayWords(member.guestUntil, now)));
  return (
    <>
      <Card title={say.members} flush aside={project.may.invite ? <Button small label={say.invite} opens="dialog" onPress={() => setSheet('invite')} /> : undefined}>
        {project.members.map((member) => (
          <View key={member.userId} style={styles.person}>
            <View style={styles.words}>
              <View style={styles.name}><Text kind="strong">{member.name}</Text>{member.isYou && <Tag text={say.you} tone="muted" />}{guest(member) && <Tag text={guest(member) || ''} tone={isPast(member.guestUntil ?? '', now) ? 'muted' : 'caution'} />}</View>
              <Text kind="small" tone="muted">{member.email}</Text>
              <Text kind="small">{`${roleWords[member.role]} · ${say.joined(momentWords(member.joinedAt, now).split(',')[0] ?? '')}`}</Text>
            </View>
            {project.may.changeMembers && <Button small label={say.change} about={member.name} opens="dialog" onPress={() => setSheet(member)} />}
          </View>
        ))}
      </Card>
      <ProblemNotice problem={withdraw.error} />
      {project.invitations.length > 0 && (
        <Card title={say.invitations} flush>
          {project.invitations.map((invitation) => (
            <View key={invitation.id} style={styles.person}>
              <View style={styles.words}>
                <Text kind="strong">{invitation.email}</Text>
                <Text kind="small" tone="muted">{say.invitation(roleWords[invitation.role], invitation.invitedBy, momentWords(invitation.sentAt, now))}</Text>
                <Text kind="small" tone="muted">{say.expires(momentWords(invitation.expiresAt, now))}</Text>
              </View>
              {project.may.invite && (
                <Button small label={say.withdraw} about={invitation.email} busy={withdraw.isPending && withdraw.variables.invitationId === invitation.id && uiTeam.create.busy}
                  onPress={() => withdraw.mutate({ invitationId: invitation.id })} />
              )}
            </View>
          ))}
        </Card>
      )}
      {sheet !== null && (
        <PersonSheet project={project} member={sheet === 'invite' ? null : sheet} onClose={() => setSheet(null)}
          onRemove={(member) => { setSheet(null); setLeaving(member); }} />
      )}
      {leaving !== null && (
        <FormSheet title={leaving.isYou ? say.leave : say.removeTitle(leaving.name)} onClose={() => setLeaving(null)} danger act={leaving.isYou ? say.leave : say.remove}
          busy={remove.isPending && uiTeam.create.busy} second={{ label: say.keep, onPress: () => setLeaving(null) }}
          onAct={() => remove.mutate({ userId: leaving.userId }, { onSuccess: () => { setLeaving(null); if (leaving.isYou) router.replace('/team'); } })}>
          <ProblemNotice problem={remove.error} />
          <RichText text={say.removeNote} />
        </FormSheet>
      )}
    </>
  );
}

function Log({ project }: { project: ProjectResponse }) {
  const now = new Date();
  return (
    <Card title={say.log} flush>
      {project.log.length === 0 && <CardBody><Text tone="muted">{say.noLog}</Text></CardBody>}
      {project.log.slice(0, SHOWN).map((line, at) => <PlainRow key={at} value={line.text} detail={`${line.by}, ${momentWords(line.at, now)}`} />)}
      {project.log.length > SHOWN && (
        <Disclosure label={say.olderLog(project.log.length - SHOWN)} openLabel={say.log}>
          {project.log.slice(SHOWN).map((line, at) => <PlainRow key={at} value={line.text} detail={`${line.by}, ${momentWords(line.at, now)}`} />)}
        </Disclosure>
      )}
    </Card>
  );
}

const SHOWN = 6;
const styles = StyleSheet.create({
  person: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.md, paddingHorizontal: space.lg, paddingVertical: space.md, borderTopWidth: border.hair, borderTopColor: color.ruleSoft },
  words: { flex: 1, minWidth: 180, gap: 2 },
  name: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.sm },
});
