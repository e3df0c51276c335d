import { useRef, useState } from 'react';
import { type TextInput, View, StyleSheet } from 'react-native';

import { LIMITS } from '@/shared/limits';
import { fieldWords, pathWords, readingName, signWords } from '@/shared/text/uiCaseFields';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import { COUPLING_PATHS, SIGN_STATES, type Reading } from '@/shared/types/case';

import { FieldCell, FieldRow, FormSheet } from '../../forms/FormSheet';
import { useKeptForm } from '../../forms/useKeptForm';
import { space } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { Disclosure } from '../../ui/Disclosure';
import { Field, NumberField, TextArea } from '../../ui/Field';
import { LiveRegion } from '../../ui/LiveRegion';
import { Mark } from '../../ui/Mark';
import { RichText } from '../../ui/RichText';
import { Select } from '../../ui/Select';
import { CommentsAt } from '../parts/CommentsAt';
import { useCaseView } from '../caseContext';
import { emptyReading, moveReading, newRowId, putReading, removeReading } from '../logic/edits';
import { formKey } from '../logic/formKeys';
import { checkReading, nextAtoms } from '../logic/readingForm';

const say = uiCaseParts.readings;

/**
 * One reading. Enter keeps it and, for a new one, opens the next with the atom where the last ended: thirty readings go by
 * keyboard alone. What the engine cannot read is named at its field; it may still be kept as typed.
 */
export function ReadingSheet({ id, onClose }: { id: string | null; onClose: () => void }) {
  const [round, setRound] = useState({ id, count: 0, after: null as Reading | null });
  return <Form key={round.count} id={round.id} after={round.after} saved={round.count} onClose={onClose}
    onNext={(kept) => setRound({ id: null, count: round.count + 1, after: kept })} />;
}

function Form({ id, after, saved, onClose, onNext }: { id: string | null; after: Reading | null; saved: number; onClose: () => void; onNext: (kept: Reading) => void }) {
  const { found, content, editor, reader } = useCaseView();
  const existing = content.readings.find((row) => row.id === id) ?? null;
  const [start] = useState<Reading>(() => existing ?? { ...emptyReading(newRowId()), ...(after ? { ...nextAtoms(after), se: after.se, where: after.where, method: after.method } : {}) });
  const { form, set, drop } = useKeptForm<Reading>(reader.id, formKey(found.id, existing === null ? 'reading.new' : `reading.${start.id}`), start);
  const [tried, setTried] = useState(false);
  const first = useRef<TextInput>(null);
  const check = checkReading(form, content.conditions);
  const errors = tried ? check.errors : {};
  const count = Object.keys(check.errors).length;
  const blocks = check.errors.atoms !== undefined || form.j.trim() === '';

  const keep = (anyway: boolean): Reading | null => {
    setTried(true);
    if (blocks || (count > 0 && !anyway)) return null;
    // a kept form may carry the id of a row that was saved since: a new reading then gets its own
    const row = { ...form, id: existing === null && content.readings.some((each) => each.id === form.id) ? newRowId() : form.id };
    editor.edit((before) => putReading(before, row));
    drop();
    return row;
  };
  const save = () => { if (keep(false) !== null) onClose(); };
  const saveNext = () => { const kept = keep(false); if (kept !== null) onNext(kept); };
  const submit = existing === null ? saveNext : save;
  const mends = (field: 'j' | 'se' | 'partner') => ({
    error: errors[field],
    mends: tried ? check.problems.filter((problem) => problem.field === field).flatMap((problem) => problem.mends).map((mend) => ({
      label: mend.label,
      onPress: () => { if (mend.field === 'j' || mend.field === 'se' || mend.field === 'partner') set({ [mend.field]: mend.value }); },
    })) : [],
    note: check.notes.filter((note) => note.field === field && note.code !== 'default-error').map((note) => note.text).join(' ') || undefined,
  });
  return (
    <FormSheet title={existing === null ? say.newTitle : say.editTitle(readingName(existing))} onClose={onClose} act={existing === null ? say.next : say.save} onAct={submit}
      onDiscard={drop} second={existing === null ? { label: say.save, onPress: save } : undefined}
      foot={tried && count > 0 ? `${say.fieldsToMend(count)} ${say.nothingLost}` : undefined}>
      <LiveRegion message={saved > 0 && after !== null ? say.savedOne(readingName(after), content.readings.length) : ''} restMs={0} />
      {existing === null && <RichText kind="small" tone="muted" text={say.keyboard} />}
      <FieldRow>
        <FieldCell><Field inputRef={first} label={say.atomA} value={form.atomA} onChange={(atomA) => set({ atomA })} onSubmit={submit} maxLength={LIMITS.atomLabel} hint={say.atomHint} autoFocus={existing === null && form.atomA === ''} required error={errors.atoms} /></FieldCell>
        <FieldCell><Field label={say.atomB} value={form.atomB} onChange={(atomB) => set({ atomB })} onSubmit={submit} maxLength={LIMITS.atomLabel} autoFocus={existing === null && form.atomA !== ''} required /></FieldCell>
      </FieldRow>
      <FieldRow>
        <FieldCell grow={2}><NumberField label={say.j} labelTone="measured" mark={<Mark ink="measured" size={13} />} spoken={say.jSpoken} unit={say.hz} value={form.j} onChange={(j) => set({ j })} onSubmit={submit} maxLength={LIMITS.hzText} hint={say.jHint} {...mends('j')} /></FieldCell>
        <FieldCell><NumberField look="small" label={say.se} spoken={say.seSpoken} unit={say.hz} value={form.se} onChange={(se) => set({ se })} onSubmit={submit} placeholder="0.2" maxLength={LIMITS.hzText} hint={say.seDefaultHint} {...mends('se')} /></FieldCell>
      </FieldRow>
      <Field label={say.partner} unit={say.hz} inputMode="decimal" value={form.partner} onChange={(partner) => set({ partner })} onSubmit={submit} maxLength={LIMITS.hzText} hint={say.partnerHint} {...mends('partner')} />
      <Select label={fieldWords.readings.path} value={form.path} onChange={(path) => set({ path })} options={COUPLING_PATHS.map((value) => ({ value, label: pathWords[value] }))} placeholder={uiCaseParts.notTold} />
      <Disclosure label={say.more} edge="none" startOpen={form.where !== '' || form.method !== '' || form.note !== '' || form.sign !== 'not-measured'}>
        <View style={styles.more}>
          <FieldRow>
            <FieldCell><Field label={say.nuclei} value={form.nuclei} onChange={(nuclei) => set({ nuclei })} maxLength={LIMITS.nuclei} /></FieldCell>
            <FieldCell><Select label={fieldWords.readings.sign} value={form.sign} onChange={(sign) => set({ sign })} options={SIGN_STATES.map((value) => ({ value, label: signWords[value] }))} placeholder={uiCaseParts.notTold} /></FieldCell>
          </FieldRow>
          <Field label={say.where} value={form.where} onChange={(where) => set({ where })} maxLength={LIMITS.where} hint={say.whereHint} />
          <Field label={say.method} value={form.method} onChange={(method) => set({ method })} maxLength={LIMITS.method} hint={say.methodHint} />
          <TextArea label={say.note} value={form.note} onChange={(note) => set({ note })} maxLength={LIMITS.note} lines={2} />
        </View>
      </Disclosure>
      {tried && count > 0 && !blocks && <Button label={say.keepAsTyped} onPress={() => { if (keep(true) !== null) onClose(); }} />}
      {existing !== null && <ExistingRow id={existing.id} onClose={onClose} drop={drop} />}
    </FormSheet>
  );
}

/** What one does with a reading that is there: calculate it, move it, remove it, talk about it. */
function ExistingRow({ id, onClose, drop }: { id: string; onClose: () => void; drop: () => void }) {
  const { content, editor, open } = useCaseView();
  const reading = content.readings.find((row) => row.id === id);
  if (reading === undefined) return null;
  const at = content.readings.indexOf(reading);
  return (
    <>
      <View style={styles.acts}>
        {reading.path === '3J' && <Button small label={uiCaseParts.calculation.add} opens="dialog" onPress={() => open({ kind: 'calculation', readingId: id, id: null })} />}
        {at > 0 && <Button small label={say.moveUp} onPress={() => editor.edit((before) => moveReading(before, id, -1))} />}
        {at < content.readings.length - 1 && <Button small label={say.moveDown} onPress={() => editor.edit((before) => moveReading(before, id, 1))} />}
        <Button small kind="danger" label={uiCaseParts.remove} about={readingName(reading)} onPress={() => { editor.remove(readingName(reading), (before) => removeReading(before, id)); drop(); onClose(); }} />
      </View>
      <CommentsAt target={`readings/${id}`} label={readingName(reading)} />
    </>
  );
}

const styles = StyleSheet.create({
  more: { gap: space.lg, paddingTop: space.md },
  acts: { flexDirection: 'row', flexWrap: 'wrap', gap: space.sm },
});
