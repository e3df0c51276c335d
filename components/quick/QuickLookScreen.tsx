import { useDeferredValue, useMemo, useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { quickText } from '@/shared/text/quick';

import { useQuickLook } from '../data/quickLook';
import { LazyAnswerPlots, usePlotsAhead } from '../plots/LazyPlots';
import { size } from '../theme/tokens';
import { useLayout } from '../theme/useLayout';
import { Button } from '../ui/Button';
import { Columns, Screen, Stack } from '../ui/Screen';
import { Segments } from '../ui/Segments';
import { AnswerPart } from './AnswerPart';
import { copyText } from './copyText';
import { DoubleBondCard } from './DoubleBondCard';
import { Cautions, Plan, Sentences, TrailFold } from './Findings';
import { hasNoVicinalPath, isWhole } from './form';
import { GroupsCard, type OpenPart } from './GroupsCard';
import { KeepAsCase } from './KeepAsCase';
import { ReadingCard, sayings } from './ReadingCard';
import { useCopy } from './useCopy';
import { useQuickForm } from './useQuickForm';

const BONDS = [{ value: 'single', label: quickText.bonds.single }, { value: 'double', label: quickText.bonds.double }] as const;

/** Type a J, read what it allows. The answer is the server's; plots follow it without holding it up. */
export function QuickLookScreen() {
  const { form, set, setField, clear, request, link } = useQuickForm();
  const { answer, problem, waiting, refetch } = useQuickLook(request);
  const [open, setOpen] = useState<OpenPart>(null);
  const { copy, copied, part: copyPart } = useCopy();
  const { isWide } = useLayout();
  const answered = answer?.state === 'answered' && answer.bond === form.bond ? answer : null;
  // later answers do not wait for their drawings; the first shows the box that keeps the drawings' place
  const plotted = useDeferredValue(answered) ?? answered;
  usePlotsAhead(answered !== null);
  const say = useMemo(() => sayings(problem?.errors ?? [], waiting ? [] : answer?.notes ?? [], setField), [problem, answer, waiting, setField]);
  const groups = isWhole(form.front, form.rear) ? { front: form.front, rear: form.rear } : null;
  const asked = request !== null;
  const inputs = (
    <>
      <Segments label={quickText.bond} options={BONDS} value={form.bond} onChange={(bond) => set({ bond })} />
      {!hasNoVicinalPath(form) && <ReadingCard form={form} set={set} say={say} askField={problem?.errors.some(({ code }) => code?.startsWith('ppm')) ?? false} />}
      {form.bond === 'single'
        ? <GroupsCard form={form} set={set} say={say} relation={answered?.relation ?? null} open={open} onOpen={setOpen} />
        : <DoubleBondCard form={form} set={set} say={say} />}
      <AnswerPart asked={asked} answer={answer?.bond === form.bond ? answer : undefined} problem={problem} waiting={waiting} setField={setField}
        onRetry={() => void refetch()} onCopyText={answered ? () => copy(copyText(answered, link())) : undefined}
        onGroups={form.bond === 'single' ? () => setOpen({ part: 'groups' }) : undefined} />
      {copyPart}
    </>
  );
  const plots = plotted && asked && !problem && (
    <LazyAnswerPlots answer={plotted} groups={groups} onPickGroup={(slot) => setOpen({ part: 'groups', slot })} />
  );
  const shown = asked && !problem ? answered : null;
  const plan = shown && (
    <>
      <Plan title={quickText.checkFirst} items={shown.checkFirst} />
      <Plan title={quickText.wouldDecide} items={shown.measureNext} numbered />
    </>
  );
  const limits = shown && (
    <>
      <Sentences title={quickText.rulesOut} sentences={shown.rulesOut} />
      <Sentences title={quickText.cannotTell} sentences={shown.cannotTell} />
      <Cautions cautions={shown.cautions} />
    </>
  );
  const trail = shown && <TrailFold steps={shown.steps} />;
  const anew = asked && <View style={styles.clear}><Button kind="plain" small label={quickText.startAnew} onPress={clear} /></View>;
  const actions = (
    <>
      <Button grow={1} label={copied ? quickText.copied : quickText.copyLink} onPress={() => copy(link())} />
      <KeepAsCase grow={2} request={request} answered={answered !== null && !waiting && !problem} />
    </>
  );
  return (
    <Screen title={quickText.title} actions={actions} aside={isWide ? (asked ? quickText.notSaved : quickText.nothingTyped) : undefined}>
      {isWide
        ? <Columns side="first" narrow={size.intake} first={<>{inputs}{limits}{anew}</>} second={<>{plots}{plan}{trail}</>} />
        : <Stack>{inputs}{plots}{plan}{limits}{trail}{anew}</Stack>}
    </Screen>
  );
}

const styles = StyleSheet.create({ clear: { alignItems: 'flex-start' } });
