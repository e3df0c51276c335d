import { useState } from 'react';
import type { LayoutChangeEvent } from 'react-native';

/** Width that the page gives a drawing; 0 before it is known. */
export function useWidth(): [number, (event: LayoutChangeEvent) => void] {
  const [width, setWidth] = useState(0);
  return [width, (event) => setWidth(Math.round(event.nativeEvent.layout.width))];
}
