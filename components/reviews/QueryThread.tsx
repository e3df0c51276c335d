import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import type { CaseQuery } from '@/shared/contracts/cases';
import { momentWords } from '@/shared/format/when';
import { LIMITS } from '@/shared/limits';
import { stepWords, uiReviews } from '@/shared/text/uiReviews';

import { useCaseView } from '../cases/caseContext';
import { useKeptText } from '../data/drafts';
import { useCloseQuery, useReply } from '../data/reviews';
import { ProblemNotice } from '../forms/ProblemNotice';
import { color, radius, space } from '../theme/tokens';
import { Button } from '../ui/Button';
import { TextArea } from '../ui/Field';
import { Heading } from '../ui/Heading';
import { Text } from '../ui/Text';

const say = uiReviews.column;

/** One query: what was asked and answered, and the next word in it. The reviewer stands on caution tint, the author on paper. */
export function QueryThread({ query, stepNumber }: { query: CaseQuery; stepNumber: number | null }) {
  const { now } = useCaseView();
  return (
    <View role="region" aria-label={say.threadTitle(query.number, stepWords[query.step])} style={styles.thread} id={`query-${query.number}`}>
      <View style={styles.head}>
        <View style={styles.title}><Heading level={3} kind="strong" text={say.threadTitle(query.number, stepNumber === null ? stepWords[query.step].toLowerCase() : say.stepNumber(stepNumber))} /></View>
        <Text kind="smallStrong" tone={query.state === 'open' ? 'caution' : 'muted'}>{say.states[query.state]}</Text>
      </View>
      {query.messages.map((message, at) => (
        <View key={at} style={[styles.message, message.from === 'author' ? styles.author : styles.reviewer]}>
          <Text kind="caption" tone="muted"><Text kind="label">{message.by.name}</Text>{` · ${momentWords(message.at, now)}`}</Text>
          <Text kind="dense">{message.text}</Text>
        </View>
      ))}
      {query.state !== 'closed' && <NextWord query={query} />}
    </View>
  );
}

function NextWord({ query }: { query: CaseQuery }) {
  const { found, reader } = useCaseView();
  const reply = useReply();
  const close = useCloseQuery();
  const { text, setText, clear } = useKeptText(reader.id, `text.${found.id}.query.${query.id}`);
  const [tried, setTried] = useState(false);
  const isHolder = found.may.query;
  if (!found.may.answerQuery && !isHolder) return null;
  const send = () => {
    setTried(true);
    if (text.trim() !== '') reply.mutate({ queryId: query.id, text }, { onSuccess: () => { clear(); setTried(false); } });
  };
  return (
    <View style={styles.next}>
      <ProblemNotice problem={reply.error ?? close.error} />
      <TextArea label={say.replyField(query.number)} value={text} onChange={setText} lines={2} maxLength={LIMITS.query} error={tried && text.trim() === '' ? say.replyEmpty : undefined} />
      <View style={styles.acts}>
        <Button small label={say.send} busy={reply.isPending && say.sending} onPress={send} />
        {isHolder && <Button small label={say.close(query.number)} busy={close.isPending && say.closing} onPress={() => close.mutate({ queryId: query.id, text: text.trim() || undefined }, { onSuccess: clear })} />}
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  thread: { gap: space.sm },
  head: { flexDirection: 'row', alignItems: 'baseline', gap: space.sm },
  title: { flex: 1 },
  message: { borderLeftWidth: 3, borderTopRightRadius: radius.control, borderBottomRightRadius: radius.control, paddingHorizontal: space.md, paddingVertical: 10, gap: 2 },
  reviewer: { borderLeftColor: color.caution, backgroundColor: color.cautionTint },
  author: { borderLeftColor: color.measured, backgroundColor: color.paper },
  next: { gap: space.sm },
  acts: { flexDirection: 'row', flexWrap: 'wrap', gap: space.sm },
});
