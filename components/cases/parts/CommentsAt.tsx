import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import type { CaseComment } from '@/shared/contracts/cases';
import { momentWords } from '@/shared/format/when';
import { LIMITS } from '@/shared/limits';
import { uiCaseParts } from '@/shared/text/uiCaseParts';

import { useComment, useResolveComment } from '../../data/cases';
import { useKeptText } from '../../data/drafts';
import { ProblemNotice } from '../../forms/ProblemNotice';
import { border, color, radius, space } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { Card, CardBody } from '../../ui/Card';
import { TextArea } from '../../ui/Field';
import { Heading } from '../../ui/Heading';
import { Text } from '../../ui/Text';
import { useCaseView } from '../caseContext';

const say = uiCaseParts.comments;

/** Comments at one value, and the field for a new one. `target` is the path of a value (`readings/<id>`) or a step's key. */
export function CommentsAt({ target, label }: { target: string; label: string }) {
  const { found } = useCaseView();
  const here = found.comments.filter((comment) => comment.target === target || comment.target.startsWith(`${target}/`));
  return (
    <View style={styles.block}>
      <Heading text={say.title} level={3} />
      <CommentList comments={here} />
      <NewComment target={target} label={label} />
    </View>
  );
}

function CommentList({ comments, withTarget = false }: { comments: readonly CaseComment[]; withTarget?: boolean }) {
  const [all, setAll] = useState(false);
  const open = comments.filter((comment) => comment.resolvedAt === null);
  const resolved = comments.filter((comment) => comment.resolvedAt !== null);
  return (
    <View style={styles.list}>
      {comments.length === 0 && <Text kind="small" tone="muted">{say.none}</Text>}
      {[...open, ...(all ? resolved : [])].map((comment) => <Comment key={comment.id} comment={comment} withTarget={withTarget} />)}
      {resolved.length > 0 && !all && <Button small kind="quiet" label={say.showResolved(resolved.length)} onPress={() => setAll(true)} />}
    </View>
  );
}

function Comment({ comment, withTarget }: { comment: CaseComment; withTarget: boolean }) {
  const { found, now } = useCaseView();
  const resolve = useResolveComment();
  const isResolved = comment.resolvedAt !== null;
  return (
    <View style={[styles.comment, isResolved && styles.resolved]}>
      <Text kind="caption" tone="muted"><Text kind="label">{comment.by.name}</Text>{` · ${momentWords(comment.at, now)} · ${withTarget ? `${say.at(comment.targetLabel)} · ` : ''}${say.atRevision(comment.revision)}`}</Text>
      <Text kind="dense">{comment.text}</Text>
      {comment.resolvedBy !== null && comment.resolvedAt !== null && <Text kind="caption" tone="muted">{say.resolved(comment.resolvedBy.name, momentWords(comment.resolvedAt, now))}</Text>}
      <ProblemNotice problem={resolve.error} />
      {found.may.comment && (
        <View style={styles.start}>
          <Button small kind="quiet" label={isResolved ? say.reopen : say.resolve} about={comment.text.slice(0, 40)} busy={resolve.isPending && say.busy} onPress={() => resolve.mutate({ commentId: comment.id, resolved: !isResolved })} />
        </View>
      )}
    </View>
  );
}

function NewComment({ target, label }: { target: string; label: string }) {
  const { found, reader } = useCaseView();
  const add = useComment(found.id);
  const { text, setText, clear } = useKeptText(reader.id, `text.${found.id}.comment.${target}`);
  const [tried, setTried] = useState(false);
  if (!found.may.comment) return found.may.why['comment'] === undefined ? null : <Text kind="small" tone="muted">{found.may.why['comment']}</Text>;
  const submit = () => {
    setTried(true);
    if (text.trim() !== '') add.mutate({ target, text }, { onSuccess: () => { clear(); setTried(false); } });
  };
  return (
    <View style={styles.form}>
      <ProblemNotice problem={add.error} />
      <TextArea label={say.addTitle(label)} value={text} onChange={setText} lines={2} maxLength={LIMITS.comment} error={tried && text.trim() === '' ? say.empty : undefined} />
      <View style={styles.start}><Button small label={say.save} busy={add.isPending && say.busy} onPress={submit} /></View>
    </View>
  );
}

/** Every comment of the case, wherever it stands. */
export function CommentsCard() {
  const { found } = useCaseView();
  const open = found.comments.filter((comment) => comment.resolvedAt === null).length;
  return (
    <Card title={say.title} flush aside={open > 0 ? say.open(open) : undefined}>
      <CardBody gap="md">
        <CommentList comments={found.comments} withTarget />
        <NewComment target="case" label={say.whole} />
      </CardBody>
    </Card>
  );
}

const styles = StyleSheet.create({
  block: { gap: space.sm },
  list: { gap: space.sm, alignItems: 'stretch' },
  comment: { backgroundColor: color.paper, borderLeftWidth: 3, borderLeftColor: color.edge, borderTopRightRadius: radius.control, borderBottomRightRadius: radius.control, paddingHorizontal: space.md, paddingVertical: space.sm, gap: 2, borderWidth: 0 },
  resolved: { opacity: 1, borderLeftWidth: border.hair },
  form: { gap: space.sm },
  start: { flexDirection: 'row' },
});
