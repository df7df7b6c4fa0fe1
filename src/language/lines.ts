// Gathers a fence's physical lines into logical ones: continuations joined, comments and blank lines gone.

import type { Range } from '../quantity/range.ts';
import type { SourceLine } from './syntax.ts';
import type { Scanned, Token } from './tokens.ts';
import { indentation, isBlankAt, scan } from './tokens.ts';

/** One statement's worth of tokens, at least one. */
export interface LogicalLine extends Scanned {
  readonly tokens: Token[];
}

export interface LogicalLines {
  readonly lines: readonly LogicalLine[];
  /** Indented lines that continue nothing: the first of each run of them. */
  readonly strays: readonly Range[];
}

/**
 * A line indented more than the fence's first statement continues the one above it. A line with only a comment is as
 * if not there; a blank one ends a statement.
 */
export function logicalLines(lines: readonly SourceLine[]): LogicalLines {
  const gathered: LogicalLine[] = [];
  const strays: Range[] = [];
  let base: number | undefined;
  let current: LogicalLine | undefined;
  let inStray = false;

  for (const line of lines) {
    const { columns, index } = indentation(line.text);
    if (index === line.text.length) {
      current = undefined;
      inStray = false;
      continue;
    }
    if (line.text[index] === '#') continue;
    base ??= columns;
    if (columns <= base) {
      current = { tokens: [], fault: undefined };
      gathered.push(current);
      inStray = false;
    } else if (!current) {
      if (!inStray) strays.push({ start: line.start + index, end: line.start + trimmedEnd(line.text) });
      inStray = true;
      continue;
    }
    scan(line, current);
  }
  return { lines: gathered, strays };
}

/**
 * The words of a range of a note's text with every run of white space as one blank: line ends, comments and the marks
 * of a block quote inside it are gone, and a minus sign is a hyphen.
 */
export function wordsOf(text: string, range: Range): string {
  let words = '';
  let index = range.start;
  let gap = false;
  let inQuotes = false;
  while (index < range.end) {
    const character = text[index]!;
    if (isBlankAt(text, index)) {
      gap = true;
      index++;
      if (character === '\n' || character === '\r') {
        inQuotes = false;
        index = quoteMarksEnd(text, index, range.end);
      }
      continue;
    }
    if (character === '#' && gap && !inQuotes) {
      while (index < range.end && text[index] !== '\n' && text[index] !== '\r') index++;
      continue;
    }
    if (gap && words !== '') words += ' ';
    gap = false;
    if (character === '"') inQuotes = !inQuotes;
    words += !inQuotes && character === '−' ? '-' : character;
    index++;
  }
  return words;
}

/** Behind a line end: past the `>` of block quotes, but not past a `>=` that begins a continued line. */
function quoteMarksEnd(text: string, from: number, end: number): number {
  let index = from;
  while (index < end) {
    if (text[index] === '>' && text[index + 1] !== '=') index++;
    else if (isBlankAt(text, index) && text[index] !== '\n' && text[index] !== '\r') index++;
    else break;
  }
  return index;
}

function trimmedEnd(text: string): number {
  let end = text.length;
  while (end > 0 && isBlankAt(text, end - 1)) end--;
  return end;
}
