import { createElement, useRef, useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { momentWords } from '@/shared/format/when';
import { uiCaseParts } from '@/shared/text/uiCaseParts';

import { asPath } from '../../auth/safePath';
import { attachmentPath } from '../../data/cases';
import { useUpload } from '../../data/upload';
import { ProblemNotice } from '../../forms/ProblemNotice';
import { FileLink } from '../../forms/FileLink';
import { border, color, radius, space } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { LiveRegion } from '../../ui/LiveRegion';
import { Notice } from '../../ui/Notice';
import { Text } from '../../ui/Text';
import { useCaseView } from '../caseContext';
import { bytesWords, fileProblem } from '../logic/fileCheck';

const say = uiCaseParts.evidence;

/** Files of the case: sent with their progress, returned byte for byte. */
export function Files() {
  const { found, now } = useCaseView();
  const upload = useUpload(found.id);
  const input = useRef<HTMLInputElement>(null);
  const [share, setShare] = useState(0);
  const [refused, setRefused] = useState<string | null>(null);
  const [stop, setStop] = useState<AbortController | null>(null);
  const choose = (file: File | undefined) => {
    if (file === undefined) return;
    const problem = fileProblem(file, found.attachments.length);
    setRefused(problem ?? null);
    if (problem !== undefined) return;
    const controller = new AbortController();
    setStop(controller);
    setShare(0);
    upload.mutate({ file, onProgress: setShare, signal: controller.signal }, { onSettled: () => setStop(null) });
  };
  const percent = Math.floor(share * 100);
  return (
    <View style={styles.files}>
      <Text kind="strong">{say.files}</Text>
      {found.attachments.length === 0 && <Text kind="small" tone="muted">{say.noFiles}</Text>}
      {found.attachments.map((file) => (
        <View key={file.id} style={styles.file}>
          <View style={styles.words}>
            <Text kind="dense">{file.fileName}</Text>
            <Text kind="caption" tone="muted">{`${bytesWords(file.bytes)} · ${say.fileBy(file.by.name, momentWords(file.at, now))} · ${file.sha256.slice(0, 12)}`}</Text>
          </View>
          <FileLink href={asPath(attachmentPath(file.id))} label={say.download} about={file.fileName} download={file.fileName} />
        </View>
      ))}
      {refused !== null && <Notice tone="error" text={refused} />}
      <ProblemNotice problem={upload.error} />
      {upload.error?.name === 'AbortError' && <Text kind="small" tone="muted">{say.stopped}</Text>}
      {upload.isPending && (
        <View style={styles.progress}>
          <Text kind="small">{say.uploading(upload.variables.file.name, percent)}</Text>
          <View role="progressbar" aria-label={upload.variables.file.name} aria-valuemin={0} aria-valuemax={100} aria-valuenow={percent} style={styles.bar}><View style={[styles.done, { width: `${percent}%` }]} /></View>
          <Button small label={say.stop} about={upload.variables.file.name} onPress={() => stop?.abort()} />
        </View>
      )}
      <LiveRegion message={upload.isSuccess ? say.uploaded(upload.data.fileName) : ''} restMs={0} />
      {found.may.attach ? (
        <View style={styles.attach}>
          {createElement('input', {
            ref: input, type: 'file', hidden: true, tabIndex: -1, 'aria-hidden': true,
            onChange: (event: { target: HTMLInputElement }) => { choose(event.target.files?.[0]); event.target.value = ''; },
          })}
          <Button small label={say.attach} busy={upload.isPending && say.sendingWord} onPress={() => input.current?.click()} />
          <Text kind="caption" tone="muted">{say.attachLimit}</Text>
        </View>
      ) : found.may.why['attach'] !== undefined && <Text kind="small" tone="muted">{found.may.why['attach']}</Text>}
    </View>
  );
}

const styles = StyleSheet.create({
  files: { paddingHorizontal: space.lg, paddingVertical: space.md, gap: space.sm, borderTopWidth: border.hair, borderTopColor: color.rule },
  file: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.md },
  words: { flex: 1, minWidth: 180 },
  progress: { gap: space.xs, alignItems: 'flex-start' },
  bar: { alignSelf: 'stretch', height: 8, borderRadius: radius.mark, backgroundColor: color.ruleSoft, overflow: 'hidden' },
  done: { height: 8, backgroundColor: color.measured },
  attach: { gap: space.xs, alignItems: 'flex-start' },
});
