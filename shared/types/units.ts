/** A frequency difference or coupling in hertz, signed unless a comment says "size". */
export type Hz = number;
/** An angle in degrees; the range is stated where it enters. */
export type Degrees = number;
/** A probability or weight between 0 and 1. */
export type Fraction = number;
