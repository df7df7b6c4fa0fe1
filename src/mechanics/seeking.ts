// Which of several candidates answers a question.

import type { Measured, Seek } from '../model/question.ts';

/**
 * Takes candidates in order along the members; among equals the first stays. Values that differ by rounding, as those at
 * the two ends of a symmetric frame do, are equal.
 */
export class Search {
  best: Measured | undefined;
  readonly #seek: Seek;

  constructor(seek: Seek) {
    this.#seek = seek;
  }

  offer(candidate: Measured): void {
    if (this.best === undefined || this.#gain(candidate.value, this.best.value) > 0) this.best = candidate;
  }

  #gain(value: number, over: number): number {
    const margin = EQUAL * Math.max(Math.abs(value), Math.abs(over));
    switch (this.#seek) {
      case 'size':
        return Math.abs(value) - Math.abs(over) - margin;
      case 'greatest':
        return value - over - margin;
      case 'least':
        return over - value - margin;
    }
  }
}

/** Relative; some thousand ε. */
const EQUAL = 5e-13;
