import { router, type Href } from 'expo-router';
import type { ReactNode } from 'react';
import { View, type StyleProp, type ViewStyle } from 'react-native';

import { web, type Click } from './webProps';

/** A path of this product; an object form of Href is not used, so that a link can be read where it stands. */
export type Path = Extract<Href, string>;

/**
 * A link to a screen: a real anchor (open in a new tab, copy address), followed inside the page without a reload.
 * The only component that gives a style prop on: it draws nothing itself.
 */
export function RouteLink({ href, label, current, style, children, onFollow }: {
  href: Path; label?: string; current?: boolean; style?: StyleProp<ViewStyle>; children: ReactNode; onFollow?: () => void;
}) {
  const follow = (event: Click) => {
    if (event.button !== 0 || event.metaKey || event.ctrlKey || event.shiftKey || event.altKey) return;
    event.preventDefault();
    onFollow?.();
    router.push(href);
  };
  return (
    <View style={style} aria-label={label} {...web({ href: String(href), 'aria-current': current ? 'page' : undefined, onClick: follow })}>
      {children}
    </View>
  );
}
