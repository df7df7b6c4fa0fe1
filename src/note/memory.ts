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
  readonly result: NoteResult;
}

/** Structures solved lately, by all that their solution depends on, and the last state of each note. One memory serves many evaluations of many notes. */
export class Memory {
  readonly #solved = new Map<string, Solved>();
  readonly #notes = new Map<string, NoteState>();

  lastOf(path: string): NoteState | undefined {
    return this.#notes.get(path);
  }

  keep(path: string, state: NoteState): void {
    this.#notes.delete(path);
    this.#notes.set(path, state);
    if (this.#notes.size > MOST_REMEMBERED) this.#notes.delete(this.#notes.keys().next().value!);
  }

  solve(structure: Structure, key: string): Solved {
    const known = this.#solved.get(key);
    if (known !== undefined) {
      // Used last, dropped last.
      this.#solved.delete(key);
      this.#solved.set(key, known);
      return known;
    }
    const solved = new Solved(structure);
    this.#solved.set(key, solved);
    if (this.#solved.size > MOST_REMEMBERED) this.#solved.delete(this.#solved.keys().next().value!);
    return solved;
  }
}

const MOST_REMEMBERED = 64;
