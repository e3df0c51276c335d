import type { Caution, CautionId, RelationRef } from '../../types/answer';
import type { RelationRow } from '../../types/relation';
import type { Hz } from '../../types/units';
import { citationText } from '../../format/words';
import { cautionText } from '../../text/engine/cautions';

/** A relation as an answer cites it, with the spread that was used. */
export function relationRef(row: RelationRow, spreadHz: Hz = row.spreadHz, set = ''): RelationRef {
  return {
    id: row.id,
    version: row.version,
    name: set === '' ? row.name : `${row.name}, set ${set}`,
    formula: row.formula,
    citation: citationText(row.citation),
    ...(row.citation.doi === undefined ? {} : { doi: row.citation.doi }),
    spreadHz,
    spreadProvenance: row.spreadProvenance,
    provenance: row.provenance,
  };
}

export const caution = (id: CautionId): Caution => ({ id, text: cautionText[id] });

/** Cautions in the order first raised, each once. */
export const cautions = (ids: readonly (CautionId | false | null)[]): Caution[] =>
  [...new Set(ids.filter((id): id is CautionId => id !== false && id !== null))].map(caution);
