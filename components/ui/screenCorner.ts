import { createContext, type ReactNode } from 'react';

/** What the shell puts beside the title of a top screen on a phone: help and account. */
export const ScreenCorner = createContext<ReactNode>(null);
