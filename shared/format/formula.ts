const SUB = '₀₁₂₃₄₅₆₇₈₉';

/** "CDCl3" as CDCl₃, "DMSO-d6" as DMSO-d₆: digits behind a letter or bracket go down. Ratios and percentages stay as typed. */
export const formulaDigits = (typed: string): string =>
  typed.replace(/(?<=[A-Za-z)\]])\d{1,2}(?![\d.,%:])/g, (digits) => [...digits].map((digit) => SUB[Number(digit)] ?? digit).join(''));
