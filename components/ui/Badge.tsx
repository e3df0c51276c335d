import { StyleSheet, View } from 'react-native';

import { uiText } from '@/shared/text/ui';
import { border, color, radius, space } from '../theme/tokens';
import { RichInline } from './RichText';
import { Text } from './Text';
import { VisuallyHidden } from './VisuallyHidden';

/** A count beside the name of a place. */
export function Badge({ count }: { count: number }) {
  if (count < 1) return null;
  return (
    <View style={styles.badge}>
      <Text kind="label" tone="onInk" hidden>{count > 99 ? '99+' : String(count)}</Text>
      <VisuallyHidden>{uiText.reviewsWaiting(count)}</VisuallyHidden>
    </View>
  );
}

/** A short fact in a box: a state, a person, a date. */
export function Tag({ text, tone = 'plain' }: { text: string; tone?: 'plain' | 'caution' | 'muted' }) {
  return (
    <View style={[styles.tag, tone === 'caution' && styles.caution, tone === 'muted' && styles.muted]}>
      <Text kind="smallStrong" tone={tone === 'caution' ? 'caution' : tone === 'muted' ? 'muted' : 'ink'}><RichInline text={text} /></Text>
    </View>
  );
}

const styles = StyleSheet.create({
  badge: { minWidth: 20, height: 20, borderRadius: 10, backgroundColor: color.judged, alignItems: 'center', justifyContent: 'center', paddingHorizontal: 5 },
  tag: { minHeight: 28, justifyContent: 'center', alignSelf: 'flex-start', paddingHorizontal: 10, paddingVertical: space.xs, borderRadius: radius.control, borderWidth: border.hair, borderColor: color.rule, backgroundColor: color.card },
  caution: { backgroundColor: color.cautionTint, borderColor: color.cautionTint },
  muted: { backgroundColor: 'transparent' },
});
