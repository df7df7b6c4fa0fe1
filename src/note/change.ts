// What a keystroke changed in a text, and whether it can have changed which lines are a fence. Most keystrokes stay within
// the words of one line; then the blocks of the text before still hold, and need not be found again.

/** The one stretch in which two texts differ: `before.slice(start, oldEnd)` became `after.slice(start, newEnd)`. */
export interface Change {
  readonly start: number;
  readonly oldEnd: number;
  readonly newEnd: number;
  /** What is added to every place behind the change. */
  readonly shift: number;
}

/** Undefined for equal texts. */
export function changeBetween(before: string, after: string): Change | undefined {
  const shorter = Math.min(before.length, after.length);
  let start = 0;
  while (start < shorter && before.charCodeAt(start) === after.charCodeAt(start)) start++;
  if (start === before.length && start === after.length) return undefined;
  let tail = 0;
  const room = shorter - start;
  while (tail < room && before.charCodeAt(before.length - 1 - tail) === after.charCodeAt(after.length - 1 - tail))
    tail++;
  return { start, oldEnd: before.length - tail, newEnd: after.length - tail, shift: after.length - before.length };
}

/**
 * Whether a change in prose leaves every block as it was: it is within one line, behind a letter of it, and the line holds
 * none of the marks that can begin or end a fence, a code span, an HTML block or a table, before the change or after it.
 */
export function keepsProse(before: string, after: string, change: Change): boolean {
  const lines = linesOf(before, after, change);
  return (
    lines !== undefined && PROSE_LEAD.test(lines.lead) && !PROSE_MARKS.test(lines.old) && !PROSE_MARKS.test(lines.new)
  );
}

/**
 * Whether a change inside a fence leaves it a fence: it is within one line, behind a word of it that stands in the
 * fence's own part of the line, which begins at `lineStart`, and no mark of a fence takes part.
 */
export function keepsFence(before: string, after: string, change: Change, lineStart: number): boolean {
  const lines = linesOf(before, after, change);
  if (lines === undefined || change.start < lineStart) return false;
  const behindWord = after.slice(lineStart, change.start).trim() !== '';
  return behindWord && !FENCE_MARKS.test(lines.old) && !FENCE_MARKS.test(lines.new);
}

/** Quote marks, list markers and heading marks, then a letter. */
const PROSE_LEAD = /^[ \t>]*(?:(?:[-*+]|\d{1,9}[.)]|#{1,6})[ \t]+)*\p{L}/u;
const PROSE_MARKS = /[`~<|[\]\\]|[^ \t>].*>/;
const FENCE_MARKS = /[`~]/;

interface Lines {
  /** What stands before the change on its line. */
  readonly lead: string;
  readonly old: string;
  readonly new: string;
}

/** Undefined where the change takes away a line's end, or brings one. */
function linesOf(before: string, after: string, { start, oldEnd, newEnd }: Change): Lines | undefined {
  if (/[\r\n]/.test(before.slice(start, oldEnd)) || /[\r\n]/.test(after.slice(start, newEnd))) return undefined;
  let beginning = start;
  while (beginning > 0 && !isLineEnd(after, beginning - 1)) beginning--;
  let tail = newEnd;
  while (tail < after.length && !isLineEnd(after, tail)) tail++;
  const rest = after.slice(newEnd, tail);
  const lead = after.slice(beginning, start);
  return { lead, old: lead + before.slice(start, oldEnd) + rest, new: lead + after.slice(start, newEnd) + rest };
}

function isLineEnd(text: string, at: number): boolean {
  const code = text.charCodeAt(at);
  return code === 10 || code === 13;
}
