import { useState } from 'react';

import type { Member, ProjectResponse } from '@/shared/contracts/team';
import { PROJECT_ROLES, type ProjectRole } from '@/shared/types/roles';
import { roleMeaning, roleWords, uiTeam } from '@/shared/text/uiTeam';
import { uiAccount } from '@/shared/text/uiAccount';

import { useChangeMember, useInvite } from '../data/team';
import { FormSheet } from '../forms/FormSheet';
import { fieldSentence, ProblemNotice } from '../forms/ProblemNotice';
import { Button } from '../ui/Button';
import { RadioRow, RadioRows } from '../ui/Choice';
import { Field } from '../ui/Field';
import { isDay } from './isDay';

const say = uiTeam.project;

/** Inviting a person, or changing the role of one who is in. */
export function PersonSheet({ project, member, onClose, onRemove }: {
  project: ProjectResponse; member: Member | null; onClose: () => void; onRemove: (member: Member) => void;
}) {
  const invite = useInvite(project.id);
  const change = useChangeMember(project.id);
  const [email, setEmail] = useState('');
  const [role, setRole] = useState<ProjectRole>(member?.role ?? 'chemist');
  const [until, setUntil] = useState(member?.guestUntil ?? '');
  const [tried, setTried] = useState(false);
  const act = member === null ? invite : change;
  const untilFits = until.trim() === '' || isDay(until.trim());
  const emailError = member === null && email.trim() === '' ? uiAccount.signIn.emptyEmail : fieldSentence(act.error, 'email');
  const guestUntil = until.trim() === '' ? null : until.trim();
  const submit = () => {
    setTried(true);
    if (!untilFits || (member === null && email.trim() === '')) return;
    if (member === null) invite.mutate({ email, role, guestUntil }, { onSuccess: onClose });
    else change.mutate({ userId: member.userId, role, guestUntil }, { onSuccess: onClose });
  };
  const named = fieldSentence(act.error, 'email') ?? fieldSentence(act.error, 'guestUntil') ?? fieldSentence(act.error, 'role');
  return (
    <FormSheet title={member === null ? say.inviteTitle : say.changeTitle(member.name)} onClose={onClose} act={member === null ? say.inviteAct : say.save} onAct={submit}
      busy={act.isPending && (member === null ? uiAccount.sending : uiAccount.saving)}>
      {named === undefined && <ProblemNotice problem={act.error} />}
      {member === null && (
        <Field label={uiAccount.email} value={email} onChange={setEmail} inputMode="email" autoComplete="off" required autoFocus error={tried ? emailError : undefined} />
      )}
      <RadioRows label={say.role}>
        {PROJECT_ROLES.map((each) => <RadioRow key={each} label={roleWords[each]} detail={roleMeaning[each]} chosen={role === each} onPress={() => setRole(each)} />)}
      </RadioRows>
      <Field label={say.guestUntil} value={until} onChange={setUntil} onSubmit={submit} placeholder="2027-03-31" hint={say.guestHint}
        error={tried && !untilFits ? say.dayError : fieldSentence(act.error, 'guestUntil') ?? fieldSentence(act.error, 'role')} />
      {member !== null && <Button kind="danger" label={member.isYou ? say.leave : say.remove} onPress={() => onRemove(member)} />}
    </FormSheet>
  );
}
