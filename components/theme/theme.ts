import { useSyncExternalStore } from 'react';

import { COLOR_NAMES, colorProperty, palettes, type Scheme } from './tokens';

export type ThemeChoice = 'system' | Scheme;
export const THEME_CHOICES: readonly ThemeChoice[] = ['system', 'light', 'dark'];

const STORED_AT = 'throughbond.theme';
const darkQuery = () => window.matchMedia?.('(prefers-color-scheme: dark)');
const listeners = new Set<() => void>();

function readChoice(): ThemeChoice {
  try {
    const stored = window.localStorage.getItem(STORED_AT);
    return stored === 'light' || stored === 'dark' ? stored : 'system';
  } catch {
    return 'system'; // storage may be switched off; the system's theme then stands
  }
}

export const currentScheme = (): Scheme => {
  const choice = readChoice();
  return choice === 'system' ? (darkQuery()?.matches ? 'dark' : 'light') : choice;
};

/** Writes the palette to the document. */
export function applyTheme(): void {
  const scheme = currentScheme();
  const root = document.documentElement;
  for (const name of COLOR_NAMES) root.style.setProperty(colorProperty(name), palettes[scheme][name]);
  root.style.setProperty('color-scheme', scheme);
  root.dataset.theme = scheme;
  document.querySelectorAll('meta[name="theme-color"]').forEach((meta) => {
    meta.setAttribute('content', palettes[scheme].paper);
    meta.removeAttribute('media');
  });
}

function changed() {
  applyTheme();
  listeners.forEach((tell) => tell());
}

/** Applies the theme and goes on following the system and the other tabs, on every screen. Called once, before the first paint. */
export function followTheme(): void {
  applyTheme();
  darkQuery()?.addEventListener('change', changed);
  window.addEventListener('storage', changed);
}

function subscribe(tell: () => void) {
  listeners.add(tell);
  return () => { listeners.delete(tell); };
}

export function setThemeChoice(choice: ThemeChoice): void {
  try {
    if (choice === 'system') window.localStorage.removeItem(STORED_AT);
    else window.localStorage.setItem(STORED_AT, choice);
  } catch {
    // without storage the choice cannot be kept; nothing else depends on it
  }
  changed();
}

/** The theme on screen and the person's choice. Styles need neither: they use `color`, which follows by itself. */
export function useTheme(): { scheme: Scheme; choice: ThemeChoice; setChoice: (choice: ThemeChoice) => void } {
  const scheme = useSyncExternalStore(subscribe, currentScheme);
  const choice = useSyncExternalStore(subscribe, readChoice);
  return { scheme, choice, setChoice: setThemeChoice };
}
