import type { CurvePlotInput } from '@/shared/plots/curvePlot';
import type { DialPlotInput } from '@/shared/plots/dialPlot';
import type { LadderPlotInput } from '@/shared/plots/ladderPlot';
import type { Grade } from '@/shared/types/answer';
import type { Ink } from '@/shared/types/trail';

/**
 * The finished report: every sentence and number of the sheet, in order. server/pdf draws it and computes nothing;
 * server/features/sheet makes it. Strings carry the text markup.
 */
export interface SheetModel {
  code: string;
  revision: number;
  projectName: string;
  question: string;
  subtitle: string;
  author: string;
  /** the moment the document states as its own: signature or save, never the clock */
  at: Date;
  /** null on a signed revision that still stands; else said on each page */
  mark: { word: string; sentence: string } | null;
  answers: SheetAnswer[];
  measured: { summary: string; facts: [string, string][]; readings: SheetReading[]; notes: string[]; files: SheetTable | null };
  calculations: SheetCalculation[];
  candidates: SheetTable | null;
  excluded: string[];
  calculatedNote: string;
  judged: {
    summary: string;
    paragraphs: [string, string][];
    evidence: SheetTable | null;
    checks: SheetTable | null;
    queries: { head: string; messages: string[] }[];
    signatures: SheetTable | null;
    unsigned: string;
    addenda: { head: string; text: string }[];
  };
  open: { lead: string; items: [string, string][] };
  cautions: string[];
  provenance: [string, string][];
  footer: { left: string; middle: string };
}

export interface SheetAnswer {
  ink: Ink;
  label: string;
  grade: Grade;
  gradeWord: string;
  sentence: string;
  detail: string;
}

export interface SheetReading {
  coupling: string;
  path: string;
  jTyped: string;
  seTyped: string;
  partnerTyped: string;
  from: string;
}

export interface SheetCalculation {
  title: string;
  relation: string;
  answer: { grade: Grade; gradeWord: string; sentence: string } | null;
  /** formula, numbers put in, spread, groups: label and text */
  lines: [string, string][];
  plot:
    | { kind: 'angle'; curve: Omit<CurvePlotInput, 'width' | 'height' | 'padding'>; dial: Pick<DialPlotInput, 'phiDeg' | 'arcs' | 'groups'>; measuredLabel: string; alt: string }
    | { kind: 'double'; ladder: Pick<LadderPlotInput, 'rows' | 'reading'>; names: Record<string, string>; measuredLabel: string; alt: string }
    | null;
  table: SheetTable | null;
}

export interface SheetTable {
  caption: string;
  /** share of the width, and how the cells stand; `number` = figures of one width, at the right */
  columns: { head: string; share: number; align: 'left' | 'number'; ink?: Ink }[];
  rows: { cells: string[]; strong?: boolean }[];
}
