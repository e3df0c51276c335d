import { useState } from 'react';

import { LIMITS } from '@/shared/limits';
import { fieldWords } from '@/shared/text/uiCaseFields';
import { uiCaseParts } from '@/shared/text/uiCaseParts';

import { FieldCell, FieldRow, FormSheet } from '../../forms/FormSheet';
import { useKeptForm } from '../../forms/useKeptForm';
import { Field } from '../../ui/Field';
import { RichText } from '../../ui/RichText';
import { CommentsAt } from '../parts/CommentsAt';
import { useCaseView } from '../caseContext';
import { fieldProblem, temperatureProblem, type ConditionProblem } from '../logic/conditions';
import { formKey } from '../logic/formKeys';

const say = uiCaseParts.conditions;

/** Field, solvent, temperature, concentration: asked once for the case's spectrum. */
export function ConditionsSheet({ onClose }: { onClose: () => void }) {
  const { found, content, editor, reader } = useCaseView();
  const { form, set, drop } = useKeptForm(reader.id, formKey(found.id, 'conditions'), { ...content.conditions });
  const [tried, setTried] = useState(false);
  const [field, kelvin] = [fieldProblem(form.fieldMHz), temperatureProblem(form.temperatureK)];
  const save = () => {
    setTried(true);
    if (field !== null || kelvin !== null) return;
    editor.edit((before) => ({ ...before, conditions: { fieldMHz: form.fieldMHz.trim(), solvent: form.solvent.trim(), temperatureK: form.temperatureK.trim(), concentration: form.concentration.trim() } }));
    drop();
    onClose();
  };
  const shown = (problem: ConditionProblem, bad: string, small: string, mendLabel: (value: string) => string, put: (value: string) => void) =>
    !tried || problem === null ? {} : {
      error: problem.kind === 'not-a-number' ? bad : small,
      mends: problem.kind === 'too-small' && problem.meant !== null ? [{ label: mendLabel(problem.meant), onPress: () => put(problem.meant ?? '') }] : [],
    };
  const mend = (field !== null ? 1 : 0) + (kelvin !== null ? 1 : 0);
  return (
    <FormSheet title={say.editTitle} onClose={onClose} act={uiCaseParts.done} onAct={save} onDiscard={drop} foot={tried && mend > 0 ? `${uiCaseParts.readings.fieldsToMend(mend)} ${uiCaseParts.readings.nothingLost}` : undefined}>
      <RichText tone="muted" text={say.lead} />
      <FieldRow>
        <FieldCell><Field label={fieldWords.conditions.fieldMHz} unit={say.mhz} inputMode="decimal" value={form.fieldMHz} onChange={(fieldMHz) => set({ fieldMHz })} maxLength={LIMITS.conditionNumber}
          {...shown(field, say.fieldError, say.fieldSmall(form.fieldMHz.trim()), say.useMHz, (fieldMHz) => set({ fieldMHz }))} /></FieldCell>
        <FieldCell><Field label={fieldWords.conditions.temperatureK} unit={say.kelvin} inputMode="decimal" value={form.temperatureK} onChange={(temperatureK) => set({ temperatureK })} maxLength={LIMITS.conditionNumber}
          {...shown(kelvin, say.kelvinError, say.cold(form.temperatureK.trim()), say.useKelvin, (temperatureK) => set({ temperatureK }))} /></FieldCell>
      </FieldRow>
      <FieldRow>
        <FieldCell><Field label={fieldWords.conditions.solvent} value={form.solvent} onChange={(solvent) => set({ solvent })} maxLength={LIMITS.solvent} placeholder="CDCl₃" /></FieldCell>
        <FieldCell><Field label={fieldWords.conditions.concentration} value={form.concentration} onChange={(concentration) => set({ concentration })} maxLength={LIMITS.concentration} hint={say.concentrationHint} onSubmit={save} /></FieldCell>
      </FieldRow>
      <CommentsAt target="conditions" label={say.title.toLowerCase()} />
    </FormSheet>
  );
}
