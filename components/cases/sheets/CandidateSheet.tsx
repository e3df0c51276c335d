import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { LIMITS } from '@/shared/limits';
import { fieldWords, readingName } from '@/shared/text/uiCaseFields';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import type { Calculation, CandidateClaim } from '@/shared/types/case';

import { FieldCell, FieldRow, FormSheet } from '../../forms/FormSheet';
import { useKeptForm } from '../../forms/useKeptForm';
import { space } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { Field, TextArea } from '../../ui/Field';
import { Heading } from '../../ui/Heading';
import { RichText } from '../../ui/RichText';
import { Segments } from '../../ui/Segments';
import { Text } from '../../ui/Text';
import { CommentsAt } from '../parts/CommentsAt';
import { useCaseView } from '../caseContext';
import { arcChoices, claimForm, claimsOf, type ClaimForm } from '../logic/claims';
import { emptyCandidate, newRowId, putCandidate, removeCandidate } from '../logic/edits';
import { formKey } from '../logic/formKeys';

const say = uiCaseParts.candidates;

/** One candidate: its name and what it claims of each calculation. */
export function CandidateSheet({ id, onClose }: { id: string | null; onClose: () => void }) {
  const { found, content, editor, reader } = useCaseView();
  const existing = content.candidates.find((row) => row.id === id) ?? null;
  const [start] = useState(() => existing ?? emptyCandidate(newRowId()));
  const { form, set, drop } = useKeptForm(reader.id, formKey(found.id, existing === null ? 'candidate.new' : `candidate.${start.id}`), {
    name: start.name, description: start.description, claims: Object.fromEntries(content.calculations.map((each) => [each.id, claimForm(start, each)])),
  });
  const [tried, setTried] = useState(false);
  const claims = content.calculations.map((each) => claimsOf(form.claims[each.id] ?? { kind: 'none' }, each.id));
  const save = () => {
    setTried(true);
    if (form.name.trim() === '' || claims.includes(null)) return;
    const kept = start.claims.filter((claim) => !content.calculations.some((each) => each.id === claim.calculationId));
    editor.edit((before) => putCandidate(before, { id: start.id, name: form.name.trim(), description: form.description, claims: [...kept, ...claims.flatMap((each): CandidateClaim[] => each ?? [])] }));
    drop();
    onClose();
  };
  return (
    <FormSheet title={existing === null ? say.newTitle : say.editTitle(existing.name)} onClose={onClose} act={say.save} onAct={save} onDiscard={drop}>
      <Field label={say.name} value={form.name} onChange={(name) => set({ name })} maxLength={LIMITS.candidateName} hint={say.nameHint} required autoFocus={existing === null}
        error={tried && form.name.trim() === '' ? say.nameEmpty : undefined} />
      <TextArea label={fieldWords.candidates.description} value={form.description} onChange={(description) => set({ description })} maxLength={LIMITS.note} lines={2} />
      <View style={styles.claims}>
        <Heading text={say.claims} level={3} />
        <RichText kind="small" tone="muted" text={content.calculations.length === 0 ? say.noCalculations : say.claimsHint} />
        {content.calculations.map((each, at) => (
          <Claim key={each.id} calculation={each} form={form.claims[each.id] ?? { kind: 'none' }} isBad={tried && claims[at] === null}
            onChange={(claim) => set({ claims: { ...form.claims, [each.id]: claim } })} />
        ))}
      </View>
      {existing !== null && <Button kind="danger" label={uiCaseParts.remove} about={existing.name} onPress={() => { editor.remove(existing.name, (before) => removeCandidate(before, existing.id)); drop(); onClose(); }} />}
      {existing !== null && <CommentsAt target={`candidates/${existing.id}`} label={existing.name} />}
    </FormSheet>
  );
}

function Claim({ calculation, form, isBad, onChange }: { calculation: Calculation; form: ClaimForm; isBad: boolean; onChange: (form: ClaimForm) => void }) {
  const { found, content } = useCaseView();
  const reading = content.readings.find((row) => row.id === calculation.readingId);
  const name = reading ? readingName(reading) : '?';
  const arcs = arcChoices(found.trail.calculations.find((each) => each.calculationId === calculation.id)?.result);
  return (
    <View style={styles.claim}>
      <Text kind="strong">{name}</Text>
      {calculation.bond === 'double'
        ? (
          <Segments label={`${say.claims}, ${name}`} value={form.kind === 'geometry' ? form.geometry : 'none'}
            onChange={(value) => onChange(value === 'none' ? { kind: 'none' } : { kind: 'geometry', geometry: value })}
            options={[{ value: 'none', label: say.noClaim }, { value: 'cis', label: say.cis }, { value: 'trans', label: say.trans }]} />
        )
        : (
          <>
            <Segments label={`${say.claims}, ${name}`} value={form.kind === 'angle' ? 'angle' : 'none'} onChange={(value) => onChange(value === 'none' ? { kind: 'none' } : { kind: 'angle', from: '', to: '' })}
              options={[{ value: 'none', label: say.noClaim }, { value: 'angle', label: say.angle }]} />
            {form.kind === 'angle' && (
              <>
                <FieldRow>
                  <FieldCell><Field label={`_φ_ ${say.from}`} unit="°" value={form.from} onChange={(from) => onChange({ ...form, from })} error={isBad ? say.angleError : undefined} /></FieldCell>
                  <FieldCell><Field label={`_φ_ ${say.to}`} unit="°" value={form.to} onChange={(to) => onChange({ ...form, to })} /></FieldCell>
                </FieldRow>
                {arcs.length > 0 && <View style={styles.arcs}>{arcs.map((arc) => <Button key={arc.label} small label={arc.label} about={name} onPress={() => onChange({ kind: 'angle', from: arc.from, to: arc.to })} />)}</View>}
              </>
            )}
          </>
        )}
    </View>
  );
}

const styles = StyleSheet.create({
  claims: { gap: space.md },
  claim: { gap: space.sm },
  arcs: { flexDirection: 'row', flexWrap: 'wrap', gap: space.sm },
});
