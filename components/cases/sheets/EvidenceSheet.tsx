import { useState } from 'react';
import { View } from 'react-native';

import { LIMITS } from '@/shared/limits';
import { bearingWords, evidenceKindWords } from '@/shared/text/uiCaseFields';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import { EVIDENCE_KINDS, type Evidence } from '@/shared/types/case';

import { FormSheet } from '../../forms/FormSheet';
import { useKeptForm } from '../../forms/useKeptForm';
import { Button } from '../../ui/Button';
import { CheckRow } from '../../ui/Choice';
import { TextArea } from '../../ui/Field';
import { Heading } from '../../ui/Heading';
import { Segments } from '../../ui/Segments';
import { Select } from '../../ui/Select';
import { CommentsAt } from '../parts/CommentsAt';
import { useCaseView } from '../caseContext';
import { emptyEvidence, newRowId, putEvidence, removeEvidence } from '../logic/edits';
import { formKey } from '../logic/formKeys';

const say = uiCaseParts.evidence;
const WHOLE = 'whole';

/** One piece of other evidence, and which of the case's files belong to it. */
export function EvidenceSheet({ id, onClose }: { id: string | null; onClose: () => void }) {
  const { found, content, editor, reader } = useCaseView();
  const existing = content.evidence.find((row) => row.id === id) ?? null;
  const [start] = useState<Evidence>(() => existing ?? emptyEvidence(newRowId()));
  const { form, set, drop } = useKeptForm<Evidence>(reader.id, formKey(found.id, existing === null ? 'evidence.new' : `evidence.${start.id}`), start);
  const [tried, setTried] = useState(false);
  const save = () => {
    setTried(true);
    if (form.text.trim() === '') return;
    const attachmentIds = form.attachmentIds.filter((each) => found.attachments.some((file) => file.id === each));
    editor.edit((before) => putEvidence(before, { ...form, id: start.id, attachmentIds }));
    drop();
    onClose();
  };
  const toggle = (file: string) => set({ attachmentIds: form.attachmentIds.includes(file) ? form.attachmentIds.filter((each) => each !== file) : [...form.attachmentIds, file] });
  return (
    <FormSheet title={existing === null ? say.newTitle : say.editTitle} onClose={onClose} act={say.save} onAct={save} onDiscard={drop}>
      <Select label={say.kind} value={form.kind} onChange={(kind) => set({ kind })} options={EVIDENCE_KINDS.map((value) => ({ value, label: evidenceKindWords[value] }))} placeholder={uiCaseParts.notTold} />
      <TextArea label={say.text} value={form.text} onChange={(text) => set({ text })} maxLength={LIMITS.evidenceText} lines={3} required error={tried && form.text.trim() === '' ? say.textEmpty : undefined} />
      <Segments label={say.bearing} value={form.bearing} onChange={(bearing) => set({ bearing })} options={(['for', 'against', 'neutral'] as const).map((value) => ({ value, label: bearingWords[value] }))} />
      <Select label={say.speaksOf} value={form.candidateId ?? WHOLE} onChange={(value) => set({ candidateId: value === WHOLE ? null : value })} placeholder={say.whole}
        options={[{ value: WHOLE, label: say.whole }, ...content.candidates.map((candidate) => ({ value: candidate.id, label: candidate.name || '?' }))]} />
      {found.attachments.length > 0 && (
        <View>
          <Heading text={say.files} level={3} />
          {found.attachments.map((file) => <CheckRow key={file.id} label={file.fileName} checked={form.attachmentIds.includes(file.id)} onPress={() => toggle(file.id)} />)}
        </View>
      )}
      {existing !== null && <Button kind="danger" label={uiCaseParts.remove} about={say.editTitle} onPress={() => { editor.remove(say.editTitle, (before) => removeEvidence(before, existing.id)); drop(); onClose(); }} />}
      {existing !== null && <CommentsAt target={`evidence/${existing.id}`} label={say.editTitle.toLowerCase()} />}
    </FormSheet>
  );
}
