// What can be wrong with a value: the diagnostics of this room, before a note's own code makes them its own.
import type { Range } from './range.ts';

export type ProblemCode =
  | 'bad-value' // words that do not make a value
  | 'unknown-unit'
  | 'wrong-dimension'
  | 'number-out-of-range' // not finite, or outside 1e-30 … 1e30
  | 'value-too-deep' // nesting past the bound of 64
  | 'value-too-long' // more than 2000 operands and operators
  | 'decimal-comma'
  | 'domain'; // sqrt of a negative quantity, division by zero …

export interface Problem {
  readonly code: ProblemCode;
  readonly range: Range;
  /** One line, in the engineer's terms: what was expected and what was found. */
  readonly message: string;
  /** The least that mends it. */
  readonly hint?: string;
}
