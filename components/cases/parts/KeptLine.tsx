import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { momentWords } from '@/shared/format/when';
import { LIMITS } from '@/shared/limits';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import { uiCases } from '@/shared/text/uiCases';

import { herePath, signInPath } from '../../shell/places';
import { space } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { Field } from '../../ui/Field';
import { LinkButton } from '../../ui/LinkButton';
import { LiveRegion } from '../../ui/LiveRegion';
import { Notice } from '../../ui/Notice';
import { Text } from '../../ui/Text';
import { useCaseView } from '../caseContext';

const say = uiCases.kept;

/** Where what is on screen is kept: on this device or on the server; and what to do when it does not get there by itself. */
export function KeptLine() {
  const { editor, mayEdit, now, open } = useCaseView();
  const { state } = editor;
  if (!mayEdit && !editor.isDirty) return null;
  const discard = <Button small label={say.discard} opens="dialog" onPress={() => open({ kind: 'discard' })} />;
  const words = editor.lacksReason ? say.reason : {
    same: say.sameAt(momentWords(state.base.changedAt, now)), waiting: say.waiting, saving: say.saving, offline: say.offline,
    'signed-out': say.signedOut, conflict: say.conflict, refused: say.refused,
  }[state.status];
  const isAside = state.status === 'same' || state.status === 'waiting' || state.status === 'saving';
  return (
    <View style={styles.block}>
      <LiveRegion message={words} />
      {editor.removed !== null && <Notice tone="plain" text={uiCaseParts.removed(editor.removed.name)} action={<Button small label={uiCaseParts.undo} onPress={editor.removed.undo} />} />}
      {!editor.isKept && editor.isDirty && <Notice text={say.notKept} />}
      {editor.lacksReason ? <ReasonBox />
        : isAside ? <Text kind="small" tone="muted">{state.reason !== '' && state.needsReason ? `${words} · ${say.reasonIs(state.reason)}` : words}</Text>
        : state.status === 'refused' ? <Notice tone="error" text={`**${say.refused}.** ${state.problem?.sentence ?? ''}`} detail={Object.values(state.problem?.fields ?? {}).join(' ')} action={<><Button small label={say.tryNow} onPress={editor.again} />{discard}</>} />
        : state.status === 'signed-out' ? <Notice text={words} action={<LinkButton small href={signInPath(herePath())} label={say.signIn} />} />
        : <Notice text={words} action={state.status === 'offline' ? <Button small label={say.tryNow} onPress={editor.again} /> : undefined} />}
      {!mayEdit && editor.isDirty && state.status !== 'refused' && <Notice text={say.stuck(momentWords(new Date().toISOString(), now))} action={discard} />}
    </View>
  );
}

/** One reason for the burst of changes; the save waits for it, the typing does not. */
function ReasonBox() {
  const { editor } = useCaseView();
  const [typed, setTyped] = useState('');
  const keep = () => { if (typed.trim() !== '') editor.setReason(typed.trim()); };
  return (
    <Notice text={`**${say.reasonTitle}** ${say.reasonHint}`} action={
      <View style={styles.reason}>
        <View style={styles.field}><Field label={say.reasonField} value={typed} onChange={setTyped} onSubmit={keep} maxLength={LIMITS.note} required /></View>
        <Button label={say.reasonKeep} onPress={keep} />
      </View>
    } />
  );
}

const styles = StyleSheet.create({
  block: { gap: space.sm },
  reason: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', gap: space.md, flexGrow: 1 },
  field: { flexGrow: 1, flexBasis: 220, minWidth: 0 },
});
