import type { PlaceName } from '../ui/Glyph';
import type { Path } from '../ui/RouteLink';

/** The five places, in order. */
export const PLACES: readonly { name: Extract<PlaceName, 'quick' | 'cases' | 'reviews' | 'relations' | 'team'>; href: Path }[] = [
  { name: 'quick', href: '/' },
  { name: 'cases', href: '/cases' },
  { name: 'reviews', href: '/reviews' },
  { name: 'relations', href: '/relations' },
  { name: 'team', href: '/team' },
];

/** The place a path belongs to: a case opened from anywhere is in Cases. */
export const placeOf = (pathname: string) =>
  PLACES.find(({ href }) => (href === '/' ? pathname === '/' : pathname === href || pathname.startsWith(`${href}/`)))?.name;

/** To the sign-in page and back to where one is, query included. */
export const signInPath = (from: string): Path => (from === '' || from.startsWith('/sign-in') ? '/sign-in' : `/sign-in?to=${encodeURIComponent(from)}`);
export const herePath = () => `${window.location.pathname}${window.location.search}`;

export const initials = (name: string) =>
  name.split(/\s+/).filter(Boolean).map((part) => [...part][0]!.toUpperCase()).filter((_, at, all) => at === 0 || at === all.length - 1).join('');
