import { useEffect, useState } from 'react';
import { View } from 'react-native';

import { VisuallyHidden } from './VisuallyHidden';
import { web } from './webProps';

/**
 * Speaks `message` when it changes. A short rest keeps a reader from hearing every keystroke's answer; the text on screen
 * is not delayed by it.
 */
export function LiveRegion({ message, restMs = 600 }: { message: string; restMs?: number }) {
  const [spoken, setSpoken] = useState('');
  useEffect(() => {
    const timer = setTimeout(() => setSpoken(message), restMs);
    return () => clearTimeout(timer);
  }, [message, restMs]);
  return (
    <View role="status" {...web({ 'aria-live': 'polite', 'aria-atomic': true })}>
      <VisuallyHidden>{spoken}</VisuallyHidden>
    </View>
  );
}
