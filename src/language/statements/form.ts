// What every statement's file says of it: one description from which parser, help, completion and reference are drawn.

import type { Reader } from '../reader.ts';
import type { Statement, StatementKind } from '../syntax.ts';

/** A statement without what all have in common. */
export type StatementBody = Statement extends infer S
  ? S extends Statement
    ? Omit<S, 'range' | 'keyword' | 'source'>
    : never
  : never;

export interface StatementForm {
  readonly keyword: StatementKind;
  /** One line: what it says of a structure. */
  readonly help: string;
  /** Its form, a source in quotes behind it left out. Words in capitals are the writer's. */
  readonly grammar: string;
  readonly examples: readonly string[];
  /** For completion, in the snippet syntax of the language server protocol. */
  readonly skeleton: string;
  /** Reads what stands behind the keyword. Undefined with a failure in the reader. */
  readonly read: (reader: Reader) => StatementBody | undefined;
}

/** The `:` between a statement's head and its body. */
export function colon(reader: Reader, what: string): boolean {
  return reader.mark(':', `${what} stands behind it`) !== undefined;
}

/** A snippet from a text with what is to be filled in between braces, a choice with strokes: `{down|up}`. */
export function snippet(skeleton: string): string {
  let count = 0;
  return skeleton.replace(/\{([^}]*)\}/g, (_, words: string) => {
    count++;
    return words.includes('|') ? `$\{${count}|${words.replaceAll('|', ',')}|}` : `$\{${count}:${words}}`;
  });
}
