// Hover on a statement's keyword: the line of help and the examples that its own file in the language gives.
import { STATEMENTS } from '../../language/statements/table.ts';
import type { StatementKind } from '../../language/syntax.ts';
import type { Card } from './card.ts';

export function keywordCard(kind: StatementKind): Card {
  const { help, grammar, examples } = STATEMENTS[kind];
  const rows = [{ label: 'Form', text: grammar }, ...examples.map(text => ({ label: 'Such as', text }))];
  return { title: kind, about: help, rows };
}
