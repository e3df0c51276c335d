import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import type { ProjectResponse } from '@/shared/contracts/team';
import { LIMITS } from '@/shared/limits';
import { uiAccount } from '@/shared/text/uiAccount';
import { uiTeam } from '@/shared/text/uiTeam';

import { useChangeProject } from '../data/team';
import { FieldCell, FieldRow } from '../forms/FormSheet';
import { fieldSentence, ProblemNotice } from '../forms/ProblemNotice';
import { space } from '../theme/tokens';
import { Button } from '../ui/Button';
import { Card, PlainRow } from '../ui/Card';
import { CheckRow } from '../ui/Choice';
import { Field } from '../ui/Field';
import { Notice } from '../ui/Notice';

const say = uiTeam.project;
const HOURS = { from: 1, to: 168 } as const;
const DAYS = { from: 1, to: 90 } as const;

/** A whole number within limits, or null. */
export function wholeNumber(text: string, { from, to }: { from: number; to: number }): number | null {
  const value = /^\d{1,4}$/.test(text.trim()) ? Number(text.trim()) : NaN;
  return value >= from && value <= to ? value : null;
}

/** The rules of a project: changed by a lead, read by everyone in it. */
export function RulesCard({ project }: { project: ProjectResponse }) {
  if (!project.may.changeSettings) {
    return (
      <Card title={say.settings} flush aside={say.settingsReadOnly}>
        {project.notebookPattern !== '' && <PlainRow label={say.notebookPattern} value={project.notebookPattern} />}
        <PlainRow label={say.claimHours} value={`${project.claimHours} ${say.hours}`} />
        <PlainRow label={say.reviewDays} value={`${project.reviewDays} ${say.days}`} />
        <PlainRow label={say.peerReview} value={project.peerReview ? say.on : say.off} detail={say.peerReviewHint} />
      </Card>
    );
  }
  return <RulesForm project={project} />;
}

function RulesForm({ project }: { project: ProjectResponse }) {
  const change = useChangeProject(project.id);
  const [name, setName] = useState(project.name);
  const [pattern, setPattern] = useState(project.notebookPattern);
  const [hours, setHours] = useState(String(project.claimHours));
  const [days, setDays] = useState(String(project.reviewDays));
  const [peer, setPeer] = useState(project.peerReview);
  const [claimHours, reviewDays] = [wholeNumber(hours, HOURS), wholeNumber(days, DAYS)];
  const nameError = name.trim() === '' ? uiTeam.create.nameError : fieldSentence(change.error, 'name');
  const isChanged = name !== project.name || pattern !== project.notebookPattern || hours !== String(project.claimHours) || days !== String(project.reviewDays) || peer !== project.peerReview;
  const submit = () => {
    if (name.trim() === '' || claimHours === null || reviewDays === null) return;
    change.mutate({ name: name.trim(), notebookPattern: pattern.trim(), claimHours, reviewDays, peerReview: peer });
  };
  return (
    <Card title={say.settings} flush>
      <View style={styles.form}>
        <ProblemNotice problem={change.error !== null && change.error.errors.length === 0 ? change.error : null} />
        <Field label={say.name} value={name} onChange={setName} maxLength={LIMITS.projectName} error={nameError} />
        <Field label={say.notebookPattern} value={pattern} onChange={setPattern} maxLength={LIMITS.notebook} hint={say.notebookHint} error={fieldSentence(change.error, 'notebookPattern')} />
        <FieldRow>
          <FieldCell><Field label={say.claimHours} value={hours} onChange={setHours} unit={say.hours} inputMode="numeric" error={claimHours === null ? say.numberError(HOURS.from, HOURS.to) : fieldSentence(change.error, 'claimHours')} /></FieldCell>
          <FieldCell><Field label={say.reviewDays} value={days} onChange={setDays} unit={say.days} inputMode="numeric" error={reviewDays === null ? say.numberError(DAYS.from, DAYS.to) : fieldSentence(change.error, 'reviewDays')} /></FieldCell>
        </FieldRow>
      </View>
      <CheckRow label={say.peerReview} detail={say.peerReviewHint} checked={peer} onPress={() => setPeer(!peer)} />
      <View style={styles.form}>
        {change.isSuccess && !isChanged && <Notice tone="plain" text={say.saved} />}
        <Button label={say.saveSettings} busy={change.isPending && uiAccount.saving} onPress={submit} />
      </View>
    </Card>
  );
}

const styles = StyleSheet.create({ form: { gap: space.lg, paddingHorizontal: space.lg, paddingVertical: space.md } });
