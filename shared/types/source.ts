/** Where a number comes from: seen in a public text; common practice without a source; recalled, not seen. */
export type Provenance = 'seen' | 'practice' | 'memory';

/** A printed source. `doi` without the resolver's address. */
export interface Citation {
  authors: string;
  year: number | null;
  where: string;
  doi?: string;
}

/** One value together with where it was seen. */
export interface SourcedHz {
  jHz: number;
  /** name of the compound or case it was measured in */
  name: string;
  provenance: Provenance;
  source: string;
}
