// A text as the lines of a fence, for tests.
import type { SourceLine } from '../../src/language/syntax.ts';

export function linesOf(text: string): SourceLine[] {
  const lines: SourceLine[] = [];
  let start = 0;
  for (const line of text.split('\n')) {
    lines.push({ text: line, start });
    start += line.length + 1;
  }
  return lines;
}
