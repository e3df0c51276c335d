import { createElement } from 'react';
import { View } from 'react-native';

import { buttonStyles } from '../ui/Button';
import { Text } from '../ui/Text';
import { useLayout } from '../theme/useLayout';

/** A link to a file of the server: the browser opens or keeps it; the page stays. */
export function FileLink({ href, label, about, download, kind = 'plain', opensNew = false }: {
  href: string; label: string; about?: string; download?: string; kind?: 'plain' | 'primary'; opensNew?: boolean;
}) {
  const { isWide } = useLayout();
  return createElement('a', {
    href, download, style: { textDecoration: 'none', color: 'inherit', display: 'flex' }, 'aria-label': about === undefined ? undefined : `${label}, ${about}`,
    ...(opensNew ? { target: '_blank', rel: 'noopener' } : {}),
  },
  <View style={[buttonStyles.base, buttonStyles[kind], isWide && buttonStyles.small, { flexGrow: 1 }]}>
    <Text kind="strong" tone={kind === 'primary' ? 'onInk' : 'ink'} align="center">{label}</Text>
  </View>);
}
