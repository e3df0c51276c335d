import { useState } from 'react';
import { Pressable, StyleSheet, View } from 'react-native';

import { momentWords } from '@/shared/format/when';
import { uiCases } from '@/shared/text/uiCases';

import { border, color, size, space } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { Card } from '../../ui/Card';
import { Glyph } from '../../ui/Glyph';
import { Heading } from '../../ui/Heading';
import { LinkButton } from '../../ui/LinkButton';
import { RichText } from '../../ui/RichText';
import { Screen, Stack } from '../../ui/Screen';
import { Text } from '../../ui/Text';
import { web } from '../../ui/webProps';
import { useCaseView } from '../caseContext';
import { differences, merge, sameParts, usualChoice, type Difference, type Side } from '../logic/versions';
import { asPath } from '../../auth/safePath';

const say = uiCases.versions;

/** Someone else saved while this person was editing: both versions, chosen field by field; nothing is lost unchosen. */
export function VersionsView() {
  const { found, content, editor, now } = useCaseView();
  const { base, theirs } = editor.state;
  const [choices, setChoices] = useState<Record<string, Side>>({});
  if (theirs === null) return null;
  const all = differences(base.content, content, theirs.content);
  const both = all.filter((each) => each.changedBy === 'both');
  const single = all.filter((each) => each.changedBy !== 'both');
  const choice = (each: Difference) => choices[each.path] ?? usualChoice(each);
  const choose = (path: string, side: Side) => setChoices((before) => ({ ...before, [path]: side }));
  const time = momentWords(theirs.changedAt, now);
  const card = (each: Difference) => (
    <Choice key={each.path} difference={each} chosen={choice(each)} onChoose={(side) => choose(each.path, side)} revision={base.revision}
      theirName={theirs.changedBy} theirWhere={say.theirsWhere(time, theirs.revision)} />
  );
  return (
    <Screen title={say.title} documentTitle={`${found.code} · ${say.title}`} crumb={say.crumb(found.code, base.revision)} back="/cases" actions={
      <>
        <LinkButton href={asPath(`/cases/${found.id}/history?to=${theirs.revision}`)} label={say.show(theirs.revision)} grow={1} />
        <Button kind="primary" label={say.save(theirs.revision + 1)} grow={1} onPress={() => editor.choose(merge(base.content, content, theirs.content, choices))} />
      </>
    }>
      <View style={styles.column}>
        <Stack>
          <RichText text={say.lead(theirs.changedBy, theirs.revision, time)} />
          {both.length > 0 && single.length > 0 && <Heading text={say.bothTitle} level={2} kind="h3" />}
          {both.map(card)}
          {single.length > 0 && (
            <>
              <Heading text={say.oneTitle} level={2} kind="h3" />
              <RichText kind="small" tone="muted" text={say.oneHint} />
              {single.map(card)}
            </>
          )}
          <RichText kind="small" tone="muted" text={say.sameCount(sameParts(content, theirs.content))} />
        </Stack>
      </View>
    </Screen>
  );
}

function Choice({ difference, chosen, onChoose, revision, theirName, theirWhere }: {
  difference: Difference; chosen: Side; onChoose: (side: Side) => void; revision: number; theirName: string; theirWhere: string;
}) {
  const row = (side: Side, name: string, where: string, value: string | null) => (
    <Pressable role="radio" onPress={() => onChoose(side)} {...web({ 'aria-checked': chosen === side })} style={[styles.row, chosen === side && styles.chosen]}>
      <Dot on={chosen === side} />
      <View style={styles.words}>
        <Text kind="strong">{name}</Text>
        {difference.isFigure ? <Text kind="small" tone="muted">{where}</Text> : <><RichText kind="dense" text={value ?? say.empty} /><Text kind="caption" tone="muted">{where}</Text></>}
      </View>
      {difference.isFigure && <Text kind="h2" tone="measured" noWrap>{value ?? say.empty}</Text>}
    </Pressable>
  );
  return (
    <Card flush>
      <View style={styles.head}>
        <RichText kind="strong" text={difference.label} />
        <RichText kind="small" tone="muted" text={difference.was === null ? say.wasEmpty(revision) : say.was(difference.was, revision)} />
      </View>
      <View role="radiogroup" aria-label={difference.label.replaceAll('_', '')}>
        {row('mine', say.yours, say.yoursWhere, difference.mine)}
        {row('theirs', theirName, theirWhere, difference.theirs)}
      </View>
    </Card>
  );
}

const Dot = ({ on }: { on: boolean }) => (
  <Glyph size={22} box="0 0 22 22">
    <circle cx={11} cy={11} r={9.5} fill={color.field} stroke={on ? color.ink : color.edge} strokeWidth={2} />
    {on && <circle cx={11} cy={11} r={5} fill={color.ink} />}
  </Glyph>
);

const styles = StyleSheet.create({
  column: { maxWidth: size.text, width: '100%' },
  head: { paddingHorizontal: space.lg, paddingTop: space.md, paddingBottom: space.sm },
  row: { flexDirection: 'row', alignItems: 'center', gap: space.md, minHeight: size.rowTall, paddingHorizontal: space.lg, paddingVertical: space.sm, borderTopWidth: border.hair, borderTopColor: color.ruleSoft },
  chosen: { backgroundColor: color.measuredTint },
  words: { flex: 1, minWidth: 0 },
});
