/** Ids of the held relations that check files speak of (the rows are in shared/engine/relations/tables). */
export const RELATION_IDS = {
  karplus1959: 'vicinal-hh/karplus-1959',
  karplus1963: 'vicinal-hh/karplus-1963',
  threeTerm776: 'vicinal-hh/three-term-776',
  generalised: 'vicinal-hh/generalised-1980',
} as const;
