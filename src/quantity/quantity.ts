// A number with a dimension, in SI. Units exist only where text is read or shown.
import type { Dimension } from './dimension.ts';

/** `value` is in coherent SI units (m, kg, s, K, rad and their products), unrounded. */
export interface Quantity {
  readonly value: number;
  readonly dimension: Dimension;
}
