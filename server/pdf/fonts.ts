import { readFileSync } from 'node:fs';
import path from 'node:path';

/** Faces embedded in the sheet; the files are the subsets that scripts/assets.mjs cuts. */
export const FACES = ['S400', 'S400i', 'S600', 'S700', 'B500i', 'B600', 'B600i'] as const;
export type Face = (typeof FACES)[number];

const FAMILY: Record<Face, string> = {
  S400: 'Source Sans 3 normal', S400i: 'Source Sans 3 italic', S600: 'Source Sans 3 normal', S700: 'Source Sans 3 normal',
  B500i: 'Brygada 1918 italic', B600: 'Brygada 1918 normal', B600i: 'Brygada 1918 italic',
};
/** Where a face lacks a character, the one that takes over: operators and brackets of a heading come from the text face. */
const FALLBACK: Partial<Record<Face, Face>> = { B600: 'S600', B600i: 'S600', B500i: 'S400i', S400i: 'S400' };

export interface FontBook {
  files: Record<Face, Buffer>;
  /** the face that can draw this character, or null when none of ours can */
  faceFor(face: Face, character: string): Face | null;
}

let book: FontBook | null = null;

/** Reads the fonts once a process. @param root the folder that holds `assets/` */
export function loadFonts(root: string): FontBook {
  if (book) return book;
  const folder = path.join(root, 'assets', 'fonts');
  const coverage = JSON.parse(readFileSync(path.join(folder, 'coverage.json'), 'utf8')) as Record<string, string>;
  const covered = new Map(FACES.map((face) => [face, new Set(coverage[FAMILY[face]] ?? '')] as const));
  book = {
    files: Object.fromEntries(FACES.map((face) => [face, readFileSync(path.join(folder, 'pdf', `${face}.ttf`))])) as Record<Face, Buffer>,
    faceFor(face, character) {
      let candidate: Face | undefined = face;
      while (candidate) {
        if (covered.get(candidate)?.has(character)) return candidate;
        candidate = FALLBACK[candidate];
      }
      return null;
    },
  };
  return book;
}
