import { StyleSheet, View } from 'react-native';

import { uiText } from '@/shared/text/ui';

import { color, size, space } from '../theme/tokens';
import { RouteLink } from './RouteLink';
import { Text } from './Text';

/** Leads to the one help page, at the part that speaks of what stands here. */
export function HelpLink({ part, label = uiText.help }: { part: string; label?: string }) {
  return (
    <RouteLink href={`/help#${part}`} style={styles.link}>
      <View style={styles.under}><Text kind="smallStrong">{label}</Text></View>
    </RouteLink>
  );
}

const styles = StyleSheet.create({
  link: { minHeight: size.touch, justifyContent: 'center', alignSelf: 'flex-start' },
  under: { borderBottomWidth: 1, borderBottomColor: color.edge, paddingBottom: space.half },
});
