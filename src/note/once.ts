// A value worked out once, when first asked for, that knows when it is asked for while it is being worked out.

/** How deep values of one evaluation stand in each other's work. */
export class Descent {
  depth = 0;
}

/** Values are worked out as they are asked for; so many, each defined behind its use, no note needs. */
export const MOST_IN_A_ROW = 200;

export type Refusal = 'circle' | 'too deep';

export class Once<T> {
  #state: 'new' | 'working' | 'done' = 'new';
  #value: T | undefined;
  readonly #work: () => T | undefined;
  readonly #descent: Descent;

  constructor(descent: Descent, work: () => T | undefined) {
    this.#descent = descent;
    this.#work = work;
  }

  /** Undefined where there is none, where the value depends on itself, or on too many others in a row; then `refuse` is called. */
  get(refuse: (why: Refusal) => void = () => undefined): T | undefined {
    if (this.#state === 'done') return this.#value;
    if (this.#state === 'working') {
      refuse('circle');
      return undefined;
    }
    if (this.#descent.depth >= MOST_IN_A_ROW) {
      refuse('too deep');
      return undefined;
    }
    this.#state = 'working';
    this.#descent.depth++;
    this.#value = this.#work();
    this.#descent.depth--;
    this.#state = 'done';
    return this.#value;
  }
}
