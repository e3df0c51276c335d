/** One line of a check file. `for_reader` is left out on purpose: no adapter may read it. */
export interface Check {
  id: string;
  family: string;
  relation: string;
  given: Record<string, unknown>;
  expect_kind: ExpectKind;
  expected: unknown;
  never?: string[];
  tolerance?: number;
  unit?: string;
  how: string;
  in_reference?: boolean;
}

export const EXPECT_KINDS = ['value', 'list', 'map', 'map-or-not-decided', 'range-contains', 'verdict', 'action', 'property'] as const;
export type ExpectKind = (typeof EXPECT_KINDS)[number];

/** What the product answered, put in the words a check file uses. An adapter makes one of these and knows no expected answer. */
export type Came =
  | { kind: 'value'; value: number }
  | { kind: 'list'; values: unknown[] }
  | { kind: 'map'; map: Record<string, unknown> }
  | { kind: 'range'; from: number; to: number }
  /**
   * `words`: all that the answer states (cis, trans, E, Z, or `not decided`); `actions`: what it did with the input;
   * `printsAngle`: an angle was given beside it
   */
  | { kind: 'answer'; words: string[]; actions: string[]; printsAngle: boolean; reason: string }
  | { kind: 'property'; holds: boolean; detail: string }
  | { kind: 'not-covered'; reason: string }
  /** the API would not take the question as the adapter put it: a fault of ours, never an abstention */
  | { kind: 'unanswered'; reason: string };

export type Outcome = 'passed' | 'failed' | 'abstained' | 'not covered';

export interface Judgement {
  outcome: Outcome;
  expected: string;
  came: string;
  reason: string;
}

export const NOT_DECIDED = 'not decided';
