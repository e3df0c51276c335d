/** Words of the quick look that the server adds to the engine's. */
export const quickLookText = {
  whichBond: (count: number) => `The structure holds ${count} C=C bonds. Which one is _J_ from?`,
  whichBondWhy: 'The class of the double bond decides which values cis and trans have.',
  smilesOrGroups: 'Give the groups or a SMILES, not both.',
} as const;
