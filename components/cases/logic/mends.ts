import type { Calculation, CaseContent } from '@/shared/types/case';

import { withField, emptyForm, isWhole, type QuickForm } from '../../quick/form';
import { putCalculation, putReading } from './edits';

/** A calculation's inputs in the form that the quick look's pickers work on; the numbers stay in the reading. */
export function formOf(calculation: Calculation): QuickForm {
  const form = emptyForm(calculation.bond);
  if (calculation.bond === 'single') {
    return { ...form, ...(calculation.groups ? { front: calculation.groups.front, rear: calculation.groups.rear } : {}), turning: calculation.turning ?? 'unknown', relation: calculation.relation === 'default' ? '' : calculation.relation ?? '' };
  }
  return { ...form, ...(calculation.groups ? { left: calculation.groups.left, right: calculation.groups.right } : {}), ringSize: calculation.ringSize ?? null };
}

/** The calculation that a form means; groups count only when all four are given. */
export function calculationOf(form: QuickForm, ids: { id: string; readingId: string }): Calculation {
  if (form.bond === 'single') {
    return {
      ...ids, bond: 'single', turning: form.turning, groups: isWhole(form.front, form.rear) ? { front: form.front, rear: form.rear } : null,
      ...(form.relation === '' ? {} : { relation: form.relation }),
    };
  }
  return { ...ids, bond: 'double', groups: isWhole(form.left, form.right) ? { left: form.left, right: form.right } : null, ringSize: form.ringSize };
}

/** Puts the value of a mend, or of a choice the engine offers, where it belongs: reading, conditions or calculation. */
export function applyMend(content: CaseContent, calculationId: string, { field, value }: { field: string; value: string }): CaseContent {
  const calculation = content.calculations.find((row) => row.id === calculationId);
  const reading = content.readings.find((row) => row.id === calculation?.readingId);
  if (calculation === undefined || reading === undefined) return content;
  if (field === 'j' || field === 'se' || field === 'partner') return putReading(content, { ...reading, [field]: value });
  if (field === 'fieldMHz' || field === 'temperatureK') return { ...content, conditions: { ...content.conditions, [field]: value } };
  return putCalculation(content, calculationOf(withField(formOf(calculation), field, value), { id: calculation.id, readingId: calculation.readingId }));
}
