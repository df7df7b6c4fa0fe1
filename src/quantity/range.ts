// A stretch of a note's text. Every token, statement and diagnostic carries one.

/** Half-open, in UTF-16 code units from the start of the note's text: the words are `text.slice(start, end)`. */
export interface Range {
  readonly start: number;
  readonly end: number;
}

/** The smallest range that holds both. */
export function cover(first: Range, second: Range): Range {
  return { start: Math.min(first.start, second.start), end: Math.max(first.end, second.end) };
}
