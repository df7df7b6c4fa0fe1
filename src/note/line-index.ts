// From an offset in a note's text to its line and column, and back to the words of a line. Lines end as Markdown and
// editors have it: at a line feed, a carriage return, or the two together.

/** Both count from 1; a column is a UTF-16 code unit, as in editors. */
export interface TextPosition {
  readonly line: number;
  readonly column: number;
}

export interface LineIndex {
  /** An offset past the end stands behind the last character. */
  positionAt(offset: number): TextPosition;
  /** The words of a line (from 1), its ending left out; empty for a line that is not there. */
  lineAt(line: number): string;
}

export function indexLines(text: string): LineIndex {
  const starts = lineStarts(text);
  return {
    positionAt(offset) {
      const within = Math.max(0, Math.min(offset, text.length));
      const index = lastAtMost(starts, within);
      return { line: index + 1, column: within - starts[index]! + 1 };
    },
    lineAt(line) {
      const start = starts[line - 1];
      if (start === undefined) return '';
      return text.slice(start, starts[line] ?? text.length).replace(/[\r\n]+$/, '');
    },
  };
}

function lineStarts(text: string): number[] {
  const starts = [0];
  for (let offset = 0; offset < text.length; offset++) {
    const code = text.charCodeAt(offset);
    if (code === 13 && text.charCodeAt(offset + 1) === 10) continue;
    if (code === 10 || code === 13) starts.push(offset + 1);
  }
  return starts;
}

/** Index of the last entry that is not greater than `value`; the first entry is 0, so that there is one. */
function lastAtMost(ascending: readonly number[], value: number): number {
  let low = 0;
  let high = ascending.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (ascending[middle]! <= value) low = middle;
    else high = middle - 1;
  }
  return low;
}
