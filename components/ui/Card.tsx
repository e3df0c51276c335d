import { useId, type ReactNode } from 'react';
import { Pressable, StyleSheet, View } from 'react-native';

import { border, color, radius, size, space } from '../theme/tokens';
import { Icon } from './Glyph';
import { Heading } from './Heading';
import { RichInline } from './RichText';
import { RouteLink, type Path } from './RouteLink';
import { Text } from './Text';
import { web } from './webProps';

/**
 * A card: with a title it is a named section. `flush` = its rows reach the edges (tables, lists, plots).
 */
export function Card({ title, aside, mark, level = 2, flush = false, tone = 'card', children }: {
  title?: string; aside?: ReactNode; mark?: ReactNode; level?: 2 | 3; flush?: boolean; tone?: 'card' | 'caution'; children?: ReactNode;
}) {
  const titleId = useId();
  return (
    <View role={title ? 'region' : undefined} aria-labelledby={title ? titleId : undefined} style={[styles.card, tone === 'caution' && styles.caution]}>
      {title !== undefined && (
        <View style={styles.header}>
          {mark}
          <View style={styles.title}><Heading id={titleId} text={title} level={level} kind="h2" /></View>
          {typeof aside === 'string' ? <Text kind="small" tone="muted"><RichInline text={aside} /></Text> : aside}
        </View>
      )}
      <View style={flush ? styles.flush : [styles.padded, title !== undefined && styles.underTitle]}>{children}</View>
    </View>
  );
}

/** Padding for a part of a flush card. */
export function CardBody({ children, gap = 'sm' }: { children: ReactNode; gap?: 'xs' | 'sm' | 'md' | 'lg' }) {
  return <View style={[styles.body, { gap: space[gap] }]}>{children}</View>;
}

interface RowWords { label?: string; value?: string; detail?: string; mark?: ReactNode; aside?: ReactNode; tone?: 'plain' | 'chosen' | 'query' }

/** A row that opens something: label muted, value strong, detail beneath, chevron at the right. */
export function PressRow({ onPress, expanded, ...words }: RowWords & { onPress: () => void; expanded?: boolean }) {
  return (
    <Pressable role="button" onPress={onPress} style={[styles.row, rowTones[words.tone ?? 'plain']]}
      {...web(expanded === undefined ? { 'aria-haspopup': 'dialog' } : { 'aria-expanded': expanded })}>
      <Words {...words} />
      <Icon name={expanded === undefined ? 'right' : expanded ? 'up' : 'down'} />
    </Pressable>
  );
}

/** A row that leads to another screen. */
export function LinkRow({ href, ...words }: RowWords & { href: Path }) {
  return (
    <RouteLink href={href} style={[styles.row, rowTones[words.tone ?? 'plain']]}>
      <Words {...words} />
      <Icon name="right" />
    </RouteLink>
  );
}

/** A row that only tells. */
export function PlainRow({ children, ...words }: RowWords & { children?: ReactNode }) {
  return (
    <View style={[styles.row, rowTones[words.tone ?? 'plain']]}>
      <Words {...words} />
      {children}
    </View>
  );
}

function Words({ label, value, detail, mark, aside }: RowWords) {
  return (
    <>
      {mark}
      <View style={styles.words}>
        <Text>
          {label !== undefined && <Text tone="muted"><RichInline text={label} /></Text>}
          {label !== undefined && value !== undefined && '\u2007'}
          {value !== undefined && <Text kind="strong"><RichInline text={value} /></Text>}
        </Text>
        {detail !== undefined && <Text kind="caption" tone="muted"><RichInline text={detail} /></Text>}
      </View>
      {aside}
    </>
  );
}

const rowTones = StyleSheet.create({ plain: {}, chosen: { backgroundColor: color.measuredTint }, query: { backgroundColor: color.cautionTint } });
const styles = StyleSheet.create({
  card: { backgroundColor: color.card, borderWidth: border.hair, borderColor: color.rule, borderRadius: radius.card, overflow: 'hidden' },
  caution: { backgroundColor: color.cautionTint, borderColor: color.cautionTint },
  header: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'baseline', columnGap: space.md, rowGap: space.xs, paddingTop: space.md, paddingHorizontal: space.lg, paddingBottom: space.sm },
  title: { flexGrow: 1, flexShrink: 1 },
  padded: { padding: space.lg },
  underTitle: { paddingTop: 0 },
  flush: {},
  body: { paddingHorizontal: space.lg, paddingVertical: space.md },
  row: {
    flexDirection: 'row', alignItems: 'center', gap: space.md, minHeight: size.row, paddingHorizontal: space.lg, paddingVertical: space.sm,
    borderTopWidth: border.hair, borderTopColor: color.ruleSoft,
  },
  words: { flex: 1, minWidth: 0 },
});
