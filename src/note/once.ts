// A value worked out once, when first asked for, that knows when it is asked for while it is being worked out.

export class Once<T> {
  #state: 'new' | 'working' | 'done' = 'new';
  #value: T | undefined;
  readonly #work: () => T | undefined;

  constructor(work: () => T | undefined) {
    this.#work = work;
  }

  /** Undefined where there is none, and where the value depends on itself; then `circle` is called. */
  get(circle: () => void): T | undefined {
    if (this.#state === 'working') {
      circle();
      return undefined;
    }
    if (this.#state === 'new') {
      this.#state = 'working';
      this.#value = this.#work();
      this.#state = 'done';
    }
    return this.#value;
  }
}
