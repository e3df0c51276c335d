import { usePathname } from 'expo-router';
import { StyleSheet, View } from 'react-native';

import { uiText } from '@/shared/text/ui';

import { useSession } from '../data/session';
import { border, color, radius, size, space } from '../theme/tokens';
import { Badge } from '../ui/Badge';
import { PlaceIcon, Sign } from '../ui/Glyph';
import { RouteLink } from '../ui/RouteLink';
import { Text } from '../ui/Text';
import { herePath, initials, placeOf, PLACES, signInPath } from './places';

function useAccount() {
  const { data } = useSession();
  usePathname(); // so that "sign in" knows where one is now
  return { user: data?.user ?? null, waiting: data?.reviewsWaiting ?? 0 };
}

/** The rail at the left of a wide screen. */
export function Rail() {
  const pathname = usePathname();
  const { user, waiting } = useAccount();
  const here = placeOf(pathname);
  return (
    <View role="navigation" aria-label={uiText.mainMenu} style={styles.rail}>
      <RouteLink href="/" label={uiText.product} style={styles.sign}><Sign size={44} /></RouteLink>
      {PLACES.map(({ name, href }) => (
        <RouteLink key={name} href={href} current={here === name} style={[styles.railItem, here === name && styles.railOn]}>
          <PlaceIcon place={name} tone={here === name ? 'onInk' : 'muted'} />
          <Text kind="label" tone={here === name ? 'onInk' : 'muted'}>{uiText.places[name]}</Text>
          {name === 'reviews' && <View style={styles.railBadge}><Badge count={waiting} /></View>}
        </RouteLink>
      ))}
      <View style={styles.spring} />
      <RouteLink href="/help" current={pathname.startsWith('/help')} style={styles.railItem}>
        <PlaceIcon place="help" tone="muted" />
        <Text kind="label" tone="muted">{uiText.help}</Text>
      </RouteLink>
      <RouteLink href={user ? '/account' : signInPath(herePath())} label={user ? `${uiText.account}, ${user.name}` : undefined} current={pathname === '/account'} style={styles.railItem}>
        {user ? <Initials name={user.name} /> : <PlaceIcon place="account" />}
        <Text kind="label" oneLine>{user ? user.name.split(/\s+/).at(-1)! : uiText.signIn}</Text>
      </RouteLink>
    </View>
  );
}

/** The tabs at the foot of a phone. */
export function Tabs() {
  const here = placeOf(usePathname());
  const { waiting } = useAccount();
  return (
    <View role="navigation" aria-label={uiText.mainMenu} style={styles.tabs}>
      {PLACES.map(({ name, href }) => (
        <RouteLink key={name} href={href} current={here === name} style={styles.tab}>
          {here === name && <View style={styles.tabOn} />}
          <PlaceIcon place={name} tone={here === name ? 'ink' : 'muted'} />
          <Text kind="label" tone={here === name ? 'ink' : 'muted'} align="center">{uiText.places[name]}</Text>
          {name === 'reviews' && <View style={styles.tabBadge}><Badge count={waiting} /></View>}
        </RouteLink>
      ))}
    </View>
  );
}

/** Help and account beside the title of a phone's top screens. */
export function Corner() {
  const { user } = useAccount();
  return (
    <View style={styles.corner}>
      <RouteLink href="/help" label={uiText.help} style={styles.cornerItem}><PlaceIcon place="help" tone="muted" /></RouteLink>
      <RouteLink href={user ? '/account' : signInPath(herePath())} label={user ? `${uiText.account}, ${user.name}` : uiText.signIn} style={styles.cornerItem}>
        {user ? <Initials name={user.name} /> : <PlaceIcon place="account" tone="muted" />}
      </RouteLink>
    </View>
  );
}

const Initials = ({ name }: { name: string }) => (
  <View style={styles.initials}><Text kind="label" align="center">{initials(name)}</Text></View>
);

const styles = StyleSheet.create({
  rail: { width: size.rail, backgroundColor: color.card, borderRightWidth: border.hair, borderRightColor: color.rule, alignItems: 'center', paddingVertical: 20, gap: space.xs },
  sign: { height: 48, marginBottom: space.md },
  railItem: { width: size.railItem, minHeight: size.railItemHeight, borderRadius: radius.control, alignItems: 'center', justifyContent: 'center', gap: space.xs },
  railOn: { backgroundColor: color.ink },
  railBadge: { position: 'absolute', top: 6, left: 46 },
  spring: { flex: 1 },
  tabs: { flexDirection: 'row', minHeight: size.tabs, borderTopWidth: border.hair, borderTopColor: color.rule, backgroundColor: color.card, paddingHorizontal: space.xs },
  tab: { flex: 1, minWidth: 0, alignItems: 'center', paddingTop: space.sm, gap: space.xs, minHeight: size.tabs - 1 },
  tabOn: { position: 'absolute', top: -1, left: space.md, right: space.md, height: 3, backgroundColor: color.ink },
  tabBadge: { position: 'absolute', top: 4, left: '50%', marginLeft: 8 },
  corner: { flexDirection: 'row', marginRight: -space.sm },
  cornerItem: { width: size.touch, height: size.touch, alignItems: 'center', justifyContent: 'center', borderRadius: radius.control },
  initials: { width: 32, height: 32, borderRadius: 16, borderWidth: border.hair, borderColor: color.edge, alignItems: 'center', justifyContent: 'center' },
});
