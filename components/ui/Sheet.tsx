import { useEffect, useId, useRef, type ReactNode } from 'react';
import { createPortal } from 'react-dom';
import { Pressable, ScrollView, StyleSheet, View } from 'react-native';

import { uiText } from '@/shared/text/ui';

import { useLayout } from '../theme/useLayout';
import { border, color, radius, size, space } from '../theme/tokens';
import { Icon } from './Glyph';
import { Heading } from './Heading';
import { asElement, web } from './webProps';

const FOCUSABLE = 'a[href], button:not([disabled]), input, textarea, select, [tabindex="0"]';

/**
 * A dialog: from the foot on a phone, centred when wide. Focus stays inside, Esc and the cross close it, and focus goes back to
 * where it came from. Mount it when it opens, unmount it to close.
 */
export function Sheet({ title, onClose, children, actions }: { title: string; onClose: () => void; children: ReactNode; actions?: ReactNode }) {
  const { isWide } = useLayout();
  const titleId = useId();
  const panel = useRef<View>(null);
  const close = useRef(onClose);
  useEffect(() => { close.current = onClose; });
  useEffect(() => {
    const before = document.activeElement;
    const box = asElement(panel.current);
    const wanted = box?.querySelector<HTMLElement>('[autofocus], input, [role="radio"][tabindex="0"]') ?? box?.querySelector<HTMLElement>(FOCUSABLE);
    if (!box?.contains(document.activeElement)) wanted?.focus();
    // the browser's own event: text fields end React's, and a sheet over this one is no part of it in the document
    const hold = (event: KeyboardEvent) => {
      if (box === null) return;
      if (event.key === 'Escape') {
        event.stopPropagation();
        event.preventDefault();
        close.current();
        return;
      }
      if (event.key !== 'Tab') return;
      const inside = [...box.querySelectorAll<HTMLElement>(FOCUSABLE)].filter((node) => node.tabIndex >= 0);
      const edge = event.shiftKey ? inside[0] : inside[inside.length - 1];
      const other = event.shiftKey ? inside[inside.length - 1] : inside[0];
      if (document.activeElement === edge || !inside.includes(document.activeElement as HTMLElement)) {
        event.preventDefault();
        other?.focus();
      }
    };
    box?.addEventListener('keydown', hold);
    return () => {
      box?.removeEventListener('keydown', hold);
      if (before instanceof HTMLElement && before.isConnected) before.focus();
    };
  }, []);
  return createPortal(
    <View style={[styles.dim, dimFixed, isWide && styles.dimWide]}>
      <Pressable style={styles.outside} onPress={onClose} tabIndex={-1} aria-hidden />
      <View ref={panel} role="dialog" aria-labelledby={titleId} style={[styles.panel, isWide && styles.panelWide]} {...web({ 'aria-modal': true })}>
        <View style={styles.head}>
          <View style={styles.title}><Heading id={titleId} text={title} level={2} /></View>
          <Pressable role="button" aria-label={uiText.close} onPress={onClose} style={styles.close}><Icon name="cross" /></Pressable>
        </View>
        <ScrollView style={styles.scroll} contentContainerStyle={styles.content}>{children}</ScrollView>
        {actions !== undefined && <View style={styles.actions}>{actions}</View>}
      </View>
    </View>,
    document.body,
  );
}

const dimFixed: object = { position: 'fixed' };
const styles = StyleSheet.create({
  dim: { top: 0, right: 0, bottom: 0, left: 0, backgroundColor: color.dim, justifyContent: 'flex-end', alignItems: 'center', zIndex: 100 },
  dimWide: { justifyContent: 'center' },
  outside: { position: 'absolute', top: 0, right: 0, bottom: 0, left: 0 },
  panel: {
    width: '100%', maxWidth: size.sheet, maxHeight: '92%', backgroundColor: color.card, borderTopLeftRadius: radius.card, borderTopRightRadius: radius.card,
    borderWidth: border.hair, borderColor: color.rule, overflow: 'hidden',
  },
  panelWide: { borderRadius: radius.card, maxHeight: '88%' },
  head: { flexDirection: 'row', alignItems: 'center', gap: space.md, paddingLeft: space.lg, paddingRight: space.xs, paddingVertical: space.xs, borderBottomWidth: border.hair, borderBottomColor: color.ruleSoft },
  title: { flex: 1 },
  close: { width: size.touch, height: size.touch, alignItems: 'center', justifyContent: 'center', borderRadius: radius.control },
  scroll: { flexGrow: 0, flexShrink: 1 },
  content: { paddingVertical: space.md },
  actions: { flexDirection: 'row', gap: space.md, padding: space.md, paddingHorizontal: space.lg, borderTopWidth: border.hair, borderTopColor: color.rule },
});
