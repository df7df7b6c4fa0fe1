// What the command line needs of the process it runs in, so that a test can stand in for it.

export interface World {
  readonly cwd: string;
  readonly env: Readonly<Record<string, string | undefined>>;
  /** Results. */
  readonly out: Sink;
  /** Words about the run itself: wrong usage, what was written where. */
  readonly error: Sink;
}

export interface Sink {
  write(text: string): void;
  readonly isTerminal: boolean;
  /** Width of the terminal in characters; undefined where there is none. */
  readonly columns: number | undefined;
}

export const EXIT = { well: 0, attention: 1, usage: 2 } as const;

/** Thrown by a command for wrong usage, caught in one place; the message is a line for the person at the keyboard. */
export class UsageError extends Error {}
