// Who owns a statement: the note's head, or the structure it stands in.
import type { Statement, StatementOf } from '../language/syntax.ts';

/** A line that could not be read. What it would have defined is unknown, and so is whatever depends on it. */
export interface BrokenStatement {
  /** The keyword as written, also where it is none. */
  readonly keyword: string;
  /** The word behind the keyword, where there is one. */
  readonly name: string | undefined;
  /** Where it stands in the note. */
  readonly start: number;
}

export interface Scope {
  /** Undefined for the head. */
  readonly structure: StatementOf<'structure'> | undefined;
  /** The structure's name; for a note that never says `structure`, the file's. Undefined for the head of a note that does. */
  readonly name: string | undefined;
  readonly statements: readonly Statement[];
  readonly broken: readonly BrokenStatement[];
}

/** `head` and `structures` are as language users know them; `all` is the head, then the structures. */
export interface Scopes {
  readonly head: Scope;
  readonly structures: readonly Scope[];
}

export type Part =
  | { readonly kind: 'statement'; readonly statement: Statement }
  | { readonly kind: 'broken'; readonly broken: BrokenStatement };

/**
 * Divides a note's statements, in the order of the text. A note without a `structure` line is one structure named
 * `fallbackName`, with an empty head; one that has values only is a head and no structure.
 */
export function divide(parts: readonly Part[], fallbackName: string): Scopes {
  const scopes: {
    structure: StatementOf<'structure'> | undefined;
    statements: Statement[];
    broken: BrokenStatement[];
  }[] = [{ structure: undefined, statements: [], broken: [] }];
  for (const part of parts) {
    if (part.kind === 'statement' && part.statement.kind === 'structure') {
      scopes.push({ structure: part.statement, statements: [part.statement], broken: [] });
    } else if (part.kind === 'statement') {
      scopes.at(-1)!.statements.push(part.statement);
    } else if (part.broken.keyword === 'structure') {
      // The line begins some structure, whose name is not known: what follows must not fall to the one before.
      scopes.push({ structure: undefined, statements: [], broken: [part.broken] });
    } else {
      scopes.at(-1)!.broken.push(part.broken);
    }
  }
  const [head, ...rest] = scopes as [(typeof scopes)[number], ...typeof scopes];
  if (rest.length > 0) {
    return {
      head: { ...head, name: undefined },
      structures: rest.map(scope => ({ ...scope, name: scope.structure?.name.text ?? '' })),
    };
  }
  if (!head.statements.some(belongsToStructure)) return { head: { ...head, name: undefined }, structures: [] };
  const empty: Scope = { structure: undefined, name: undefined, statements: [], broken: [] };
  return { head: empty, structures: [{ ...head, name: fallbackName }] };
}

/** Whether a statement is of a structure and of nothing else; in the head of a note with structures it is misplaced. */
export function belongsToStructure(statement: Statement): boolean {
  switch (statement.kind) {
    case 'structure':
    case 'hinge':
    case 'member':
    case 'bar':
    case 'bars':
    case 'group':
    case 'point':
    case 'connection':
    case 'release':
    case 'support':
    case 'load':
    case 'find':
    case 'require':
    case 'show':
    case 'carry':
      return true;
    case 'case':
    case 'use':
    case 'let':
    case 'material':
    case 'section':
    case 'combine':
    case 'display':
    case 'assume':
      return false;
  }
}
