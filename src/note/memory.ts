// What evaluations leave behind for the next: structures already solved, and what was read of each note.
import type { Diagnostic } from '../language/diagnostic.ts';
import type { Statement } from '../language/syntax.ts';
import type { Part } from '../model/scope.ts';
import type { Structure } from '../model/structure.ts';
import type { Source } from './fences.ts';
import type { FrontMatterBlock } from './front-matter.ts';
import type { NoteResult } from './result.ts';
import { Solved } from './solved.ts';

/** What one fence says. */
export interface FenceRead {
  /** Where the fence stood when it was read. */
  readonly start: number;
  readonly statements: readonly Statement[];
  /** The statements and the lines that could not be read, in the order of the text. */
  readonly parts: readonly Part[];
  readonly diagnostics: readonly Diagnostic[];
}

/** A note as it was last read and evaluated. */
export interface NoteState {
  readonly front: FrontMatterBlock;
  readonly source: Source;
  /** For each fence. */
  readonly reads: readonly FenceRead[];
  readonly solved: SolvedStructures;
  readonly result: NoteResult;
}

/** The last state of each note. One memory serves many evaluations of many notes. */
export class Memory {
  readonly #notes = new Map<string, NoteState>();

  lastOf(path: string): NoteState | undefined {
    return this.#notes.get(path);
  }

  keep(path: string, state: NoteState): void {
    // Used last, dropped last.
    this.#notes.delete(path);
    this.#notes.set(path, state);
    if (this.#notes.size > MOST_NOTES) this.#notes.delete(this.#notes.keys().next().value!);
  }
}

const MOST_NOTES = 64;

/**
 * The structures that one evaluation solves. One that the evaluation before solved too is taken from there; what neither
 * asked for is let go, since a drawn-out edit would otherwise leave a solution for each keystroke.
 */
export class SolvedStructures {
  readonly #before: ReadonlyMap<string, Solved>;
  readonly #now = new Map<string, Solved>();

  constructor(before: SolvedStructures | undefined) {
    this.#before = before === undefined ? new Map() : before.#now;
  }

  /** `key` is all that the solution depends on. */
  solve(structure: Structure, key: string): Solved {
    const solved = this.#now.get(key) ?? this.#before.get(key) ?? new Solved(structure);
    this.#now.set(key, solved);
    return solved;
  }
}
