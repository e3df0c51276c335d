import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { LIMITS } from '@/shared/limits';
import { fieldWords } from '@/shared/text/uiCaseFields';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import { uiCases } from '@/shared/text/uiCases';

import { FieldCell, FieldRow, FormSheet } from '../../forms/FormSheet';
import { useKeptForm } from '../../forms/useKeptForm';
import { space } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { Field, TextArea } from '../../ui/Field';
import { Icon } from '../../ui/Glyph';
import { CommentsAt } from '../parts/CommentsAt';
import { useCaseView } from '../caseContext';
import { addTag, removeTag } from '../logic/edits';
import { formKey } from '../logic/formKeys';

const say = uiCaseParts.compound;

/** Question, compound and tags. */
export function CompoundSheet({ onClose }: { onClose: () => void }) {
  const { found, content, editor, reader } = useCaseView();
  const { name, batch, notebook, structureNote } = content.compound;
  const { form, set, drop } = useKeptForm(reader.id, formKey(found.id, 'compound'), { question: content.question, name, batch, notebook, structureNote });
  const [tried, setTried] = useState(false);
  const save = () => {
    setTried(true);
    if (form.question.trim() === '') return;
    editor.edit((before) => ({
      ...before, question: form.question.trim(),
      compound: { ...before.compound, name: form.name.trim(), batch: form.batch.trim(), notebook: form.notebook.trim(), structureNote: form.structureNote },
    }));
    drop();
    onClose();
  };
  return (
    <FormSheet title={say.editTitle} onClose={onClose} act={uiCaseParts.done} onAct={save} onDiscard={drop}>
      <Field label={fieldWords.question} value={form.question} onChange={(question) => set({ question })} maxLength={LIMITS.question} required hint={uiCases.fresh.questionHint}
        error={tried && form.question.trim() === '' ? uiCases.fresh.questionEmpty : undefined} />
      <Field label={fieldWords.compound.name} value={form.name} onChange={(value) => set({ name: value })} maxLength={LIMITS.compoundName} hint={say.nameHint} />
      <FieldRow>
        <FieldCell><Field label={fieldWords.compound.batch} value={form.batch} onChange={(value) => set({ batch: value })} maxLength={LIMITS.batch} /></FieldCell>
        <FieldCell>
          <Field label={fieldWords.compound.notebook} value={form.notebook} onChange={(value) => set({ notebook: value })} maxLength={LIMITS.notebook}
            hint={found.project.notebookPattern === '' ? undefined : say.notebookLike(found.project.notebookPattern)} />
        </FieldCell>
      </FieldRow>
      <TextArea label={fieldWords.compound.structureNote} value={form.structureNote} onChange={(value) => set({ structureNote: value })} maxLength={LIMITS.structureNote} lines={3} />
      <Tags />
      <CommentsAt target="compound" label={say.title.toLowerCase()} />
    </FormSheet>
  );
}

/** Tags take effect at once: each is a word, added or taken away. */
function Tags() {
  const { content, editor } = useCaseView();
  const [typed, setTyped] = useState('');
  const add = () => { editor.edit((before) => addTag(before, typed)); setTyped(''); };
  return (
    <View style={styles.tags}>
      <Field label={say.addTag} value={typed} onChange={setTyped} onSubmit={add} onLeave={() => { if (typed.trim() !== '') add(); }} maxLength={LIMITS.tag} hint={say.tagHint}
        error={content.tags.length >= LIMITS.tags && typed !== '' ? say.tooManyTags : undefined} />
      {content.tags.length > 0 && (
        <View role="group" aria-label={say.tags} style={styles.row}>
          {content.tags.map((tag) => <Button key={tag} small label={tag} about={uiCaseParts.remove} icon={<Icon name="cross" size={12} />} onPress={() => editor.edit((before) => removeTag(before, tag))} />)}
        </View>
      )}
    </View>
  );
}

const styles = StyleSheet.create({
  tags: { gap: space.sm },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: space.sm },
});
