/**
 * Attributes that react-native-web passes to the page but that React Native's types do not list. Kept in one typed place, so
 * that a mistyped attribute is a type error and no component needs a cast of its own.
 */
export interface WebProps {
  'aria-describedby'?: string;
  'aria-invalid'?: boolean;
  'aria-required'?: boolean;
  'aria-controls'?: string;
  'aria-current'?: 'page' | 'step' | 'true';
  'aria-haspopup'?: 'dialog' | 'listbox';
  'aria-pressed'?: boolean;
  'aria-selected'?: boolean;
  'aria-checked'?: boolean;
  'aria-expanded'?: boolean;
  'aria-activedescendant'?: string;
  'aria-roledescription'?: string;
  'aria-level'?: number;
  'aria-modal'?: boolean;
  'aria-live'?: 'polite' | 'assertive' | 'off';
  'aria-atomic'?: boolean;
  'aria-orientation'?: 'horizontal' | 'vertical';
  tabIndex?: 0 | -1;
  lang?: string;
  href?: string;
  onKeyDown?: (event: KeyPress) => void;
  onClick?: (event: Click) => void;
  onFocus?: () => void;
  onBlur?: () => void;
}
/** What our handlers use of the page's own events. */
export interface KeyPress { key: string; shiftKey: boolean; ctrlKey: boolean; metaKey: boolean; altKey: boolean; preventDefault: () => void; stopPropagation: () => void }
export interface Click extends Omit<KeyPress, 'key'> { button: number }

export const web = (props: WebProps): object => Object.fromEntries(Object.entries(props).filter(([, value]) => value !== undefined));

/** The page element behind a react-native-web ref, for focus and measuring. */
export const asElement = (node: unknown): HTMLElement | null => (node instanceof HTMLElement ? node : null);
