// What a random structure is drawn from: small whole numbers, so that one that fails shrinks. Any recipe gives a structure.
import fc from 'fast-check';

export interface Options {
  /** Without springs, imposed movements, heat and lack of fit. */
  readonly forcesOnly?: boolean;
  /** Without axially stiff members. */
  readonly stretching?: boolean;
}

export interface Recipe {
  readonly shape: 'beam' | 'frame' | 'girder' | 'tree';
  readonly size: number;
  readonly width: number;
  /** Whole numbers that are read in turn, again from the first when they run out. */
  readonly places: readonly number[];
  readonly stiffness: readonly number[];
  readonly supports: readonly number[];
  readonly hinges: readonly number[];
  readonly loads: readonly number[];
}

const numbers = (most: number) => fc.array(fc.nat(9999), { minLength: 1, maxLength: most });

export const recipes: fc.Arbitrary<Recipe> = fc.record({
  shape: fc.constantFrom('beam', 'frame', 'girder', 'tree'),
  size: fc.nat(11),
  width: fc.nat(2),
  places: numbers(40),
  stiffness: numbers(20),
  supports: numbers(8),
  hinges: numbers(6),
  loads: numbers(60),
});

/** Reads whole numbers in turn. */
export class Draw {
  #at = 0;
  readonly #numbers: readonly number[];

  constructor(list: readonly number[]) {
    this.#numbers = list;
  }

  nat(): number {
    return this.#numbers[this.#at++ % this.#numbers.length]!;
  }

  below(count: number): number {
    // The turn of the list takes part, so that a short list does not say the same for ever.
    const turn = Math.floor(this.#at / this.#numbers.length);
    return (this.nat() + 7 * turn) % count;
  }

  of<T>(list: readonly T[]): T {
    return list[this.below(list.length)]!;
  }
}
