import type { Api } from '../lib/api';
import { Refusal } from '../lib/refusal';
import { scoreAlkenes } from './alkenes';

export interface Scored {
  metrics: Record<string, unknown>;
  /** one entry a record, for --out */
  lines: unknown[];
}

/** Sets that the product has no capability for yet, and what is missing. */
const NOT_COVERED: Readonly<Record<string, string>> = {
  reports: 'Pasted report lines are not read yet.',
  hcch: 'Structures with mapped atoms are not read yet, so a measured dihedral cannot be compared with its coupling.',
  protein_hnha: 'No relation for the peptide coupling of HN and Hα is held yet.',
  diastereomers: 'Candidates are not enumerated from a structure yet.',
  spectra: 'Spectra are not read yet.',
  nmredata: 'NMReDATA files are not read yet.',
};

export async function runScore(set: string, file: unknown, api: Api): Promise<Scored> {
  if (set === 'alkenes') return scoreAlkenes(file, api);
  const reason = NOT_COVERED[set];
  if (reason === undefined) throw new Refusal(`There is no set "${set}": alkenes, ${Object.keys(NOT_COVERED).join(', ')}.`);
  return { metrics: { set, covered: false, reason }, lines: [] };
}
