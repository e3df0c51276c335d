import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';

import { border, color, radius, space } from '../theme/tokens';
import { CautionIcon, ErrorIcon, Icon } from './Glyph';
import { RichInline } from './RichText';
import { Inline, Text } from './Text';

export type NoticeTone = 'caution' | 'error' | 'plain';

/** `**…**` at the start of a notice is its strong part. */
const parts = (text: string) => /^\*\*(.+?)\*\*\s*(.*)$/s.exec(text)?.slice(1, 3) ?? ['', text];

function Words({ text, tone, slim = false }: { text: string; tone: NoticeTone; slim?: boolean }) {
  const [strong = '', rest = ''] = parts(text);
  return (
    <Text kind={slim ? 'caption' : 'text'}>
      {strong !== '' && <Inline strong tone={tone === 'caution' ? 'caution' : tone === 'error' ? 'error' : undefined}><RichInline text={strong} /> </Inline>}
      <RichInline text={rest} />
    </Text>
  );
}

const ICONS = { caution: <CautionIcon />, error: <ErrorIcon />, plain: <Icon name="check" /> };

/** A box within the page: a caution, an error with what to do, or something done. */
export function Notice({ tone = 'caution', text, detail, action }: { tone?: NoticeTone; text: string; detail?: string; action?: ReactNode }) {
  return (
    <View role={tone === 'error' ? 'alert' : 'note'} style={[styles.box, boxes[tone]]}>
      <View style={styles.icon}>{ICONS[tone]}</View>
      <View style={styles.words}>
        <Words text={text} tone={tone} />
        {detail !== undefined && <Text kind="small" tone="muted"><RichInline text={detail} /></Text>}
        {action !== undefined && <View style={styles.action}>{action}</View>}
      </View>
    </View>
  );
}

/** A strip over the full width at the top of the page. */
export function NoticeStrip({ tone = 'caution', text, action, slim = false }: { tone?: NoticeTone; text: string; action?: ReactNode; slim?: boolean }) {
  return (
    <View role="status" style={[styles.strip, strips[tone], slim && styles.slim]}>
      {!slim && <View style={styles.icon}>{ICONS[tone]}</View>}
      <View style={styles.words}><Words text={text} tone={tone} slim={slim} /></View>
      {action}
    </View>
  );
}

const boxes = StyleSheet.create({ caution: { backgroundColor: color.cautionTint }, error: { backgroundColor: color.errorTint }, plain: { backgroundColor: color.ruleSoft } });
const strips = StyleSheet.create({
  caution: { backgroundColor: color.cautionTint, borderBottomColor: color.caution },
  error: { backgroundColor: color.errorTint, borderBottomColor: color.error },
  plain: { backgroundColor: color.calculatedTint, borderBottomColor: color.calculated },
});
const styles = StyleSheet.create({
  box: { flexDirection: 'row', gap: 10, padding: space.md, borderRadius: radius.control },
  strip: { flexDirection: 'row', alignItems: 'center', flexWrap: 'wrap', gap: 10, paddingVertical: space.sm, paddingHorizontal: space.lg, borderBottomWidth: border.hair },
  slim: { paddingVertical: space.xs },
  icon: { paddingTop: 3 },
  words: { flex: 1, minWidth: 200, gap: space.xs },
  action: { flexDirection: 'row', flexWrap: 'wrap', gap: space.sm, paddingTop: space.xs },
});
