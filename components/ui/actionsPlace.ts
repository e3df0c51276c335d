import { createContext } from 'react';

/** Where a screen's actions stand: in the bar of a phone buttons share the width, beside a title they keep their own. */
export const ActionsPlace = createContext<'bar' | 'head'>('bar');
