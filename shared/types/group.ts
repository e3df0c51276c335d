/**
 * A group on a carbon, named by its first atom and that atom's other neighbours.
 *
 * Written as text (`GroupText`): the atom's symbol, then its neighbours in parentheses, each with `=` or `#` before
 * it for a double or triple bond: `C(H,H,H)` methyl, `C(=O,O)` carboxylate or ester, `C(=C,C)` aryl or vinyl,
 * `C(#N)` nitrile, `O(C)` alkoxy, `O(H)` hydroxy, `H`, `Cl`, `Si(C,C,C)`. A bare `C`, `N`, `O`, `S`, `Si` … says the first
 * atom only: its neighbours are not told.
 */
export type GroupText = string;

export interface GroupNeighbour {
  element: string;
  order: 1 | 2 | 3;
}

export interface Group {
  element: string;
  /** null = not told (bare first atom); [] = none but the path carbon, as in a halogen or H */
  neighbours: GroupNeighbour[] | null;
}
