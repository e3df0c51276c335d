/** Atomic numbers of the elements that a group may start with or carry. */
export const ATOMIC_NUMBERS: Readonly<Record<string, number>> = {
  H: 1, D: 1, Li: 3, Be: 4, B: 5, C: 6, N: 7, O: 8, F: 9, Na: 11, Mg: 12, Al: 13, Si: 14, P: 15, S: 16, Cl: 17, K: 19, Ti: 22, V: 23,
  Cr: 24, Mn: 25, Fe: 26, Co: 27, Ni: 28, Cu: 29, Zn: 30, Ga: 31, Ge: 32, As: 33, Se: 34, Br: 35, Zr: 40, Mo: 42, Ru: 44, Rh: 45,
  Pd: 46, Ag: 47, Cd: 48, In: 49, Sn: 50, Sb: 51, Te: 52, I: 53, W: 74, Re: 75, Os: 76, Ir: 77, Pt: 78, Au: 79, Hg: 80, Tl: 81, Pb: 82, Bi: 83,
};

/** Bonds that the first atom of a group has to its own neighbours; null = more than one number is common. */
export const BONDS_BESIDE_PATH: Readonly<Record<string, readonly number[]>> = {
  H: [0], D: [0], F: [0], Cl: [0], Br: [0], I: [0], C: [3], N: [2, 3, 4], O: [1], Si: [3], Ge: [3], Sn: [3], S: [1, 3, 5], Se: [1, 3, 5],
};

export const HALOGENS: ReadonlySet<string> = new Set(['F', 'Cl', 'Br', 'I']);

/** Elements whose weight on a carbon takes a plain Karplus curve out of its domain. */
export const ELECTRONEGATIVE: ReadonlySet<string> = new Set(['N', 'O', 'F', 'Cl', 'Br', 'I']);

const NON_METALS: ReadonlySet<string> = new Set(['H', 'D', 'C', 'N', 'O', 'F', 'P', 'S', 'Cl', 'As', 'Se', 'Br', 'Te', 'I']);

/** Electropositive first atoms (Si, Ge, Sn, B, metals): they raise the couplings of a double bond. */
export const isElectropositive = (element: string): boolean => element in ATOMIC_NUMBERS && !NON_METALS.has(element);
