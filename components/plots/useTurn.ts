import { useCallback, useEffect, useRef, useState } from 'react';

import { wrap } from './Dial';

const TURN_MS = 260;
const still = () => window.matchMedia?.('(prefers-reduced-motion: reduce)').matches ?? true;

/** The shown angle. `turnTo` lets the rear carbon turn there the short way, `set` puts it there at once. */
export function useTurn(startDeg: number): { phiDeg: number; set: (deg: number) => void; turnTo: (deg: number) => void } {
  const [phiDeg, setPhi] = useState(startDeg);
  const frame = useRef(0);
  const now = useRef(startDeg);
  const put = useCallback((deg: number) => {
    now.current = deg;
    setPhi(deg);
  }, []);
  const set = useCallback((deg: number) => {
    cancelAnimationFrame(frame.current);
    put(deg);
  }, [put]);
  const turnTo = useCallback((deg: number) => {
    cancelAnimationFrame(frame.current);
    if (still()) return put(deg);
    const from = now.current;
    const by = wrap(deg - from);
    let begun: number | undefined;
    const step = (time: number) => {
      begun ??= time;
      const part = Math.min(1, (time - begun) / TURN_MS);
      put(part === 1 ? deg : wrap(from + by * (1 - (1 - part) ** 3)));
      if (part < 1) frame.current = requestAnimationFrame(step);
    };
    frame.current = requestAnimationFrame(step);
  }, [put]);
  useEffect(() => () => cancelAnimationFrame(frame.current), []);
  return { phiDeg, set, turnTo };
}
