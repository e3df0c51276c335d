/** Subscript and superscript digits count as digits: "CDCl₃" is found by "cdcl3". NFKD also parts letters from their accents. */
export function compoundWords(text: string): string[] {
  return text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase().split(/[^\p{L}\p{N}]+/u).filter((word) => word !== '');
}
