import { useCallback, useDeferredValue, useMemo, useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { quickText } from '@/shared/text/quick';

import { useQuickLook } from '../data/quickLook';
import { usePlotsAhead } from '../plots/LazyPlots';
import { size } from '../theme/tokens';
import { useLayout } from '../theme/useLayout';
import { Button } from '../ui/Button';
import { Columns, Screen, Stack } from '../ui/Screen';
import { Segments } from '../ui/Segments';
import { AnswerPart } from './AnswerPart';
import { copyText } from './copyText';
import { DoubleBondCard } from './DoubleBondCard';
import { hasNoVicinalPath, type QuickForm } from './form';
import { GroupsCard, type OpenPart } from './GroupsCard';
import { KeepAsCase } from './KeepAsCase';
import { ReadingCard } from './ReadingCard';
import { useCopy } from './useCopy';
import { useQuickForm } from './useQuickForm';
import { useResults } from './useResults';
import { useSame, useSayings } from './useSame';

const BONDS = [{ value: 'single', label: quickText.bonds.single }, { value: 'double', label: quickText.bonds.double }] as const;
const NOTHING: never[] = [];

/** Type a J, read what it allows. The answer is the server's; findings and drawings follow it without holding it up. */
export function QuickLookScreen() {
  const { form, set, setField, clear, request, link } = useQuickForm();
  const { looked, problem, waiting, refetch } = useQuickLook(request);
  const [open, setOpen] = useState<OpenPart>(null);
  const { copy, copied, part: copyPart } = useCopy();
  const { isWide } = useLayout();
  const asked = request !== null;
  const here = looked?.answer.bond === form.bond ? looked : undefined;
  const answered = here?.answer.state === 'answered' ? here.answer : null;
  const errors = problem?.errors ?? NOTHING;
  const say = useSayings(errors, problem ? NOTHING : here?.answer.notes ?? NOTHING, setField);
  const setBond = useCallback((bond: QuickForm['bond']) => set({ bond }), [set]);
  const { front, rear, turning, relation, left, right, ringSize } = form;
  const single = useMemo(() => ({ front, rear, turning, relation }), [front, rear, turning, relation]);
  const double = useMemo(() => ({ left, right, ringSize }), [left, right, ringSize]);
  const cited = useSame(answered?.relation ?? null);
  const inputs = (
    <>
      <Segments label={quickText.bond} options={BONDS} value={form.bond} onChange={setBond} />
      {!hasNoVicinalPath(form) && <ReadingCard form={form} set={set} say={say} askField={errors.some(({ code }) => code?.startsWith('ppm') ?? false)} />}
      {form.bond === 'single'
        ? <GroupsCard form={single} set={set} say={say} relation={cited} open={open} onOpen={setOpen} />
        : <DoubleBondCard form={double} set={set} say={say} />}
      <AnswerPart asked={asked} answer={here?.answer} problem={problem} waiting={waiting} setField={setField}
        onRetry={() => void refetch()} onCopyText={answered && !waiting ? () => copy(copyText(answered, link())) : undefined}
        onGroups={form.bond === 'single' ? () => setOpen({ part: 'groups' }) : undefined} />
      {copyPart}
    </>
  );
  const anew = asked && <View style={styles.clear}><Button small label={quickText.startAnew} onPress={clear} /></View>;
  const actions = (
    <>
      <Button grow={1} label={copied ? quickText.copied : quickText.copyLink} onPress={() => copy(link())} />
      <KeepAsCase grow={2} request={request} answered={answered !== null && !waiting && !problem} />
    </>
  );
  usePlotsAhead(answered !== null);
  // the strip is painted first; the first answer at once brings the box that keeps the drawings' place
  const settled = useDeferredValue(here) ?? here;
  const { plots, plan, limits, trail } = useResults(asked && !problem ? settled : undefined, setOpen);
  return (
    <Screen title={quickText.title} actions={actions} aside={isWide ? (asked ? quickText.notSaved : quickText.nothingTyped) : undefined}>
      {isWide
        ? <Columns side="first" narrow={size.intake} first={<>{inputs}{limits}{anew}</>} second={<>{plots}{plan}{trail}</>} />
        : <Stack>{inputs}{plots}{plan}{limits}{trail}{anew}</Stack>}
    </Screen>
  );
}

const styles = StyleSheet.create({ clear: { alignItems: 'flex-start' } });
