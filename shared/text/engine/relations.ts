import { hz } from '../../format/number';
import type { RelationRow } from '../../types/relation';

export interface AppliesLine {
  verdict: 'yes' | 'doubtful' | 'no';
  text: string;
}

/** Where a relation applies, as lines of the Relations page. */
export const relationsText = {
  unit: (name: string): string => (/^(A|B|C|J0|J180|K|P[1-5]|R|floor)$/.test(name) ? 'Hz' : ''),
  applies: (row: RelationRow): AppliesLine[] => {
    switch (row.kind) {
      case 'generalised':
        return [
          { verdict: 'yes', text: 'H–C–C–H, both carbons sp³, every group given' },
          { verdict: 'yes', text: 'C, N, O, F, Cl, Br, I beside the path' },
          { verdict: 'doubtful', text: `an sp² group beside the path: spread ${hz(row.spreadOutsideHz)}` },
          { verdict: 'doubtful', text: `three or more electronegative atoms on one carbon: spread ${hz(row.spreadOutsideHz)}` },
          { verdict: 'no', text: 'three-membered and strongly bent rings' },
          { verdict: 'no', text: 'S, P, Si, Sn, B or a metal beside the path: no Δ_χ_ held' },
        ];
      case 'three-term':
      case 'two-branch':
        return [
          { verdict: 'yes', text: `H–C–C–H with C and H only: spread ${hz(row.spreadHz)}` },
          { verdict: 'doubtful', text: 'groups not given: spread 3.0 Hz, tentative at most' },
          { verdict: 'doubtful', text: 'O, N, F or halogen on a carbon: spread 3.0 Hz or more, tentative at most' },
          { verdict: 'no', text: 'three-membered and strongly bent rings' },
        ];
      case 'class-table':
        return [
          { verdict: 'yes', text: 'CH=CH in an open chain, or =CH₂ with one group, first atoms given' },
          { verdict: 'doubtful', text: 'groups not given: tentative at most' },
          { verdict: 'doubtful', text: 'rings: cis by the ring up to seven members, _J_ is compared only' },
          { verdict: 'no', text: 'three or four groups: no vicinal H,H pair' },
        ];
    }
  },
} as const;
