import type { ReactElement } from 'react';
import { StyleSheet, View } from 'react-native';

import { useLayout } from '../theme/useLayout';
import { color, size, space } from '../theme/tokens';
import { buttonStyles, type ButtonKind } from './Button';
import { RichInline } from './RichText';
import { RouteLink, type Path } from './RouteLink';
import { Text } from './Text';

/** A link that looks like a button: it goes somewhere and changes nothing. */
export function LinkButton({ href, label, kind = 'plain', small = false, icon, grow }: {
  href: Path; label: string; kind?: Exclude<ButtonKind, 'danger'>; small?: boolean; icon?: ReactElement; grow?: number;
}) {
  const { isWide } = useLayout();
  return (
    <RouteLink href={href} style={[buttonStyles.base, buttonStyles[kind], small && isWide && buttonStyles.small, grow !== undefined && { flexGrow: grow, flexShrink: 1 }]}>
      {icon}
      <Text kind={small ? 'denseStrong' : 'strong'} tone={kind === 'primary' ? 'onInk' : 'ink'} align="center"><RichInline text={label} /></Text>
    </RouteLink>
  );
}

/** An underlined link in its own line, 48 high for a finger. */
export function TextLink({ href, label }: { href: Path; label: string }) {
  return (
    <RouteLink href={href} style={styles.line}>
      <View style={styles.underline}><Text kind="strong"><RichInline text={label} /></Text></View>
    </RouteLink>
  );
}

const styles = StyleSheet.create({
  line: { minHeight: size.touch, justifyContent: 'center', alignSelf: 'flex-start' },
  underline: { borderBottomWidth: 1, borderBottomColor: color.edge, paddingBottom: space.half },
});
