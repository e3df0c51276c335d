import { useState } from 'react';

import { readingName } from '@/shared/text/uiCaseFields';
import { uiCaseParts } from '@/shared/text/uiCaseParts';

import { FormSheet } from '../../forms/FormSheet';
import { DoubleBondCard } from '../../quick/DoubleBondCard';
import { emptyForm, type QuickForm } from '../../quick/form';
import { GroupsCard, type OpenPart } from '../../quick/GroupsCard';
import { Button } from '../../ui/Button';
import { RichText } from '../../ui/RichText';
import { Segments } from '../../ui/Segments';
import { CommentsAt } from '../parts/CommentsAt';
import { useCaseView } from '../caseContext';
import { newRowId, putCalculation, removeCalculation } from '../logic/edits';
import { applyMend, calculationOf, formOf } from '../logic/mends';
import { sayOfResult } from '../logic/sayOfResult';

const say = uiCaseParts.calculation;

/** What lies between the two protons of a reading: the same pickers as in the quick look, the numbers come from the reading. */
export function CalculationSheet({ readingId, id, onClose }: { readingId: string; id: string | null; onClose: () => void }) {
  const { found, content, editor } = useCaseView();
  const reading = content.readings.find((row) => row.id === readingId);
  const existing = content.calculations.find((row) => row.id === id) ?? null;
  const [form, setForm] = useState<QuickForm>(() => (existing ? formOf(existing) : emptyForm('single')));
  const [open, setOpen] = useState<OpenPart>(null);
  const set = (change: Partial<QuickForm>) => setForm((before) => ({ ...before, ...change }));
  if (reading === undefined) return null;
  const result = found.trail.calculations.find((each) => each.calculationId === id)?.result;
  const sayOf = sayOfResult(existing !== null && existing.bond === form.bond ? result : undefined, (field, value) => {
    if (field === 'j' || field === 'se' || field === 'partner' || field === 'fieldMHz') { editor.edit((before) => applyMend(before, existing?.id ?? '', { field, value })); onClose(); }
  });
  const save = () => {
    editor.edit((before) => putCalculation(before, calculationOf(form, { id: existing?.id ?? newRowId(), readingId })));
    onClose();
  };
  const name = readingName(reading);
  const remove = () => {
    if (existing !== null) editor.remove(`${say.title} ${name}`, (before) => removeCalculation(before, existing.id));
    onClose();
  };
  return (
    <FormSheet title={existing === null ? say.addTitle(name) : say.editTitle(name)} onClose={onClose} act={say.save} onAct={save}>
      {reading.path !== '3J' && <RichText text={say.onlyVicinal} tone="muted" />}
      <Segments label={say.kind} value={form.bond} onChange={(bond) => set({ bond })} options={[{ value: 'single', label: say.single }, { value: 'double', label: say.double }]} />
      <RichText kind="small" tone="muted" text={say.groupsHint} />
      {form.bond === 'single'
        ? <GroupsCard form={form} set={set} say={sayOf} relation={result?.state === 'answered' ? result.relation : null} open={open} onOpen={setOpen} />
        : <DoubleBondCard form={form} set={set} say={sayOf} />}
      {existing !== null && <Button kind="danger" label={say.remove} onPress={remove} />}
      {existing !== null && <CommentsAt target={`calculations/${existing.id}`} label={say.editTitle(name)} />}
    </FormSheet>
  );
}
