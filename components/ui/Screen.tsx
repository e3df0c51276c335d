import { use, useEffect, type ReactNode } from 'react';
import { ScrollView, StyleSheet, View } from 'react-native';

import { plainText } from '@/shared/format/richText';
import { uiText } from '@/shared/text/ui';

import { useLayout } from '../theme/useLayout';
import { border, color, size, space } from '../theme/tokens';
import { ActionsPlace } from './actionsPlace';
import { Icon, Sign } from './Glyph';
import { Heading } from './Heading';
import { RichInline } from './RichText';
import { RouteLink, type Path } from './RouteLink';
import { ScreenCorner } from './screenCorner';
import { Text } from './Text';

export interface ScreenProps {
  /** heading of level 1, and the page's title */
  title: string;
  /** page title, where it should say more than the heading */
  documentTitle?: string;
  crumb?: string;
  /** where the back arrow of a phone leads; without it the sign stands there */
  back?: Path;
  /** a short word at the right of the title */
  aside?: ReactNode;
  /** buttons: beside the title when wide, in a bar above the tabs on a phone */
  actions?: ReactNode;
  children: ReactNode;
}

/** The frame of every screen: title, actions, page padding, document title. */
export function Screen({ title, documentTitle, crumb, back, aside, actions, children }: ScreenProps) {
  const { isWide, isShort } = useLayout();
  const corner = use(ScreenCorner);
  const page = plainText(documentTitle ?? title);
  useEffect(() => { document.title = `${page} · ${uiText.product}`; }, [page]);
  const bar = actions !== undefined && !isWide && <View style={styles.bar}><ActionsPlace value="bar">{actions}</ActionsPlace></View>;
  return (
    <View style={styles.screen}>
      <ScrollView style={styles.scroll} contentContainerStyle={[styles.page, isWide && styles.pageWide]}>
        <View style={[styles.top, !isWide && styles.topPhone, isWide ? styles.topWide : back !== undefined && styles.topSub]}>
          {!isWide && (back === undefined
            ? <Sign />
            : <RouteLink href={back} label={uiText.back} style={styles.back}><Icon name="left" size={20} /></RouteLink>)}
          <View style={styles.title}>
            {crumb !== undefined && <Text kind="smallStrong" tone="muted"><RichInline text={crumb} /></Text>}
            <Heading text={title} level={1} kind={!isWide && back !== undefined ? 'h2' : 'h1'} />
          </View>
          {typeof aside === 'string' ? <Text kind="smallStrong" tone="muted"><RichInline text={aside} /></Text> : aside}
          {!isWide && back === undefined && corner}
          {isWide && actions !== undefined && <View style={styles.actions}><ActionsPlace value="head">{actions}</ActionsPlace></View>}
        </View>
        {children}
        {isShort && bar}
      </ScrollView>
      {!isShort && bar}
    </View>
  );
}

/** Cards under each other at the page's distance. */
export function Stack({ children, gap }: { children: ReactNode; gap?: 'sm' | 'md' | 'lg' | 'xl' }) {
  const { isWide } = useLayout();
  return <View style={{ gap: gap ? space[gap] : isWide ? space.lg : space.md }}>{children}</View>;
}

/** Two columns when wide, one under the other on a phone. The narrow one is `narrow` px wide, at the side named. */
export function Columns({ first, second, narrow, side }: { first: ReactNode; second: ReactNode; narrow: number; side: 'first' | 'second' }) {
  const { isWide } = useLayout();
  if (!isWide) return <Stack>{first}{second}</Stack>;
  const fixed = { width: narrow };
  return (
    <View style={styles.columns}>
      <View style={side === 'first' ? fixed : styles.rest}><Stack>{first}</Stack></View>
      <View style={side === 'second' ? fixed : styles.rest}><Stack>{second}</Stack></View>
    </View>
  );
}

const styles = StyleSheet.create({
  screen: { flex: 1, minHeight: 0, minWidth: 0, backgroundColor: color.paper },
  scroll: { flex: 1 },
  page: { paddingHorizontal: space.lg, paddingBottom: space.xl, flexGrow: 1 },
  pageWide: { paddingHorizontal: space.xxl, paddingTop: space.xl, paddingBottom: space.xxl, width: '100%', maxWidth: size.content + 2 * space.xxl },
  top: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.md, minHeight: size.top, paddingTop: space.lg, paddingBottom: space.md },
  topPhone: { columnGap: space.sm },
  topSub: { flexWrap: 'nowrap', alignItems: 'flex-start' },
  topWide: { alignItems: 'flex-end', minHeight: 0, paddingTop: 0, paddingBottom: space.lg },
  back: { width: size.touch, height: size.touch, marginLeft: -space.md, alignItems: 'center', justifyContent: 'center' },
  title: { flex: 1, minWidth: 120 },
  actions: { flexDirection: 'row', gap: space.md, alignItems: 'flex-start' },
  bar: {
    flexDirection: 'row', gap: space.md, minHeight: size.actions, paddingVertical: space.md, paddingHorizontal: space.lg, borderTopWidth: border.hair, borderTopColor: color.rule,
    backgroundColor: color.card, alignItems: 'flex-start',
  },
  columns: { flexDirection: 'row', gap: space.xl, alignItems: 'flex-start' },
  rest: { flex: 1, minWidth: 0 },
});
