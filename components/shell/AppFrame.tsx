import { QueryClientProvider } from '@tanstack/react-query';
import { usePathname } from 'expo-router';
import { Suspense, useEffect, useRef, useState, type ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';

import { uiText } from '@/shared/text/ui';

import { createQueryClient } from '../data/sessionEnd';
import { useLayout } from '../theme/useLayout';
import { color, radius, space } from '../theme/tokens';
import { ScreenCorner } from '../ui/screenCorner';
import { ScreenState } from '../ui/ScreenState';
import { Text } from '../ui/Text';
import { asElement, web, type Click } from '../ui/webProps';
import { Corner, Rail, Tabs } from './Navigation';
import { Strips } from './Strips';

/** The frame around every screen: strips above, rail at the left or tabs at the foot, and the one query client. */
export function AppFrame({ children }: { children: ReactNode }) {
  const [client] = useState(createQueryClient);
  return (
    <QueryClientProvider client={client}>
      <Frame>{children}</Frame>
    </QueryClientProvider>
  );
}

function Frame({ children }: { children: ReactNode }) {
  const { isWide } = useLayout();
  const main = useRef<View>(null);
  const pathname = usePathname();
  const first = useRef(true);
  useEffect(() => {
    // after a change of screen the keyboard and the reader begin at its content, as after a page load
    if (first.current) first.current = false;
    else if (!asElement(main.current)?.contains(document.activeElement)) asElement(main.current)?.focus();
  }, [pathname]);
  return (
    <View style={styles.frame}>
      <SkipLink onPress={() => asElement(main.current)?.focus()} />
      <Strips />
      <View style={styles.row}>
        {isWide && <Rail />}
        <View style={styles.column}>
          <View ref={main} role="main" id="main" style={styles.main} {...web({ tabIndex: -1 })}>
            <ScreenCorner value={isWide ? null : <Corner />}>
              <Suspense fallback={<View style={styles.wait}><ScreenState kind="loading" title={uiText.loading} /></View>}>{children}</Suspense>
            </ScreenCorner>
          </View>
          {!isWide && <Tabs />}
        </View>
      </View>
    </View>
  );
}

function SkipLink({ onPress }: { onPress: () => void }) {
  const [seen, setSeen] = useState(false);
  // the address is the router's: the focus moves, the address does not
  const skip = (event: Click) => {
    event.preventDefault();
    onPress();
  };
  return (
    <View {...web({ href: '#main', onClick: skip, onFocus: () => setSeen(true), onBlur: () => setSeen(false) })} style={[styles.skip, !seen && styles.away]}>
      <Text kind="strong" tone="onInk">{uiText.skipToContent}</Text>
    </View>
  );
}

const styles = StyleSheet.create({
  frame: { flex: 1, width: '100%', minHeight: 0, backgroundColor: color.paper },
  row: { flex: 1, flexDirection: 'row', minHeight: 0 },
  column: { flex: 1, minWidth: 0, minHeight: 0 },
  main: { flex: 1, minHeight: 0, minWidth: 0 },
  wait: { padding: space.lg },
  skip: { position: 'absolute', top: space.sm, left: space.sm, zIndex: 50, backgroundColor: color.ink, borderRadius: radius.control, padding: space.md },
  away: { top: -200 },
});
