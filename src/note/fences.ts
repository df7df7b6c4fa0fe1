// Finds the calculation in a Markdown text: the fences whose info string starts with the word `tautline`, and the inline
// code spans that hold a value. Which lines are a fence is markdown-it's own decision; only places are worked out here.
import markdownIt, { type MarkdownIt, type Token } from 'markdown-it';
import type { SourceLine } from '../language/syntax.ts';
import type { Range } from '../quantity/range.ts';
import { mayHoldCalculation } from './calculation-mark.ts';

export { mayHoldCalculation };

export interface SourceFence {
  readonly kind: 'calculation' | 'record' | 'sign';
  /** From the opening marker to the end of the closing one. */
  readonly range: Range;
  /** Source lines counted from 0; `firstLine` is the opening marker's, `lastLine` the closing one's. */
  readonly firstLine: number;
  readonly lastLine: number;
  readonly lines: readonly SourceLine[];
}

export interface SourceSpan {
  /** The whole span, backticks included. */
  readonly range: Range;
  /** What stands behind the word `tautline`, and where. */
  readonly text: string;
  readonly start: number;
  /** Source line, from 0. */
  readonly line: number;
}

export interface Source {
  readonly fences: readonly SourceFence[];
  readonly spans: readonly SourceSpan[];
}

/** `skip` is the length of the front matter, which is not Markdown. */
export function readSource(text: string, skip: number): Source {
  if (!mayHoldCalculation(text)) return { fences: [], spans: [] };
  const starts = lineStarts(text, skip);
  const tokens = blocks().parse(text.slice(skip), {});
  const fences: SourceFence[] = [];
  for (const token of tokens) {
    if (token.type !== 'fence' || token.map === null) continue;
    const kind = fenceKind(token.info);
    if (kind === undefined) continue;
    fences.push(fenceAt(text, starts, token.map, token.content, kind));
  }
  const spans = fences.length > 0 ? findSpans(text, starts, tokens) : [];
  const shift = skip === 0 ? 0 : countLines(text, skip);
  return shift === 0 ? { fences, spans } : shiftLines({ fences, spans }, shift);
}

let blockParser: MarkdownIt | undefined;
let inlineParser: MarkdownIt | undefined;

/** Block structure only: the rules of the editor's own preview, without looking inside paragraphs. */
function blocks(): MarkdownIt {
  if (blockParser === undefined) {
    blockParser = markdownIt({ html: true });
    blockParser.core.ruler.enableOnly(['normalize', 'block']);
  }
  return blockParser;
}

function inlines(): MarkdownIt {
  inlineParser ??= markdownIt({ html: true });
  return inlineParser;
}

function fenceKind(info: string): SourceFence['kind'] | undefined {
  const [first, second] = info.trim().split(/\s+/, 2);
  if (first !== 'tautline') return undefined;
  return second === 'record' || second === 'sign' ? second : 'calculation';
}

/** Where each line begins, line endings as Markdown knows them: LF, CR, CRLF. */
function lineStarts(text: string, from: number): number[] {
  const starts = [from];
  for (let i = from; i < text.length; i++) {
    const code = text.charCodeAt(i);
    if (code === 10 || (code === 13 && text.charCodeAt(i + 1) !== 10)) starts.push(i + 1);
  }
  return starts;
}

function countLines(text: string, to: number): number {
  let count = 0;
  for (let i = 0; i < to; i++) {
    const code = text.charCodeAt(i);
    if (code === 10 || (code === 13 && text.charCodeAt(i + 1) !== 10)) count++;
  }
  return count;
}

function lineText(text: string, starts: readonly number[], line: number): string {
  const start = starts[line]!;
  let end = starts[line + 1] ?? text.length;
  while (end > start && (text.charCodeAt(end - 1) === 10 || text.charCodeAt(end - 1) === 13)) end--;
  return text.slice(start, end);
}

function fenceAt(
  text: string,
  starts: readonly number[],
  map: readonly [number, number],
  content: string,
  kind: SourceFence['kind'],
): SourceFence {
  const [first, past] = map;
  const contents = content === '' ? [] : content.replace(/\n$/, '').split('\n');
  const lines = contents.map((shown, i) => sourceLine(text, starts, first + 1 + i, shown));
  const last = Math.max(first, Math.min(past, starts.length) - 1);
  const opening = lineText(text, starts, first);
  const marker = opening.search(/[`~]{3}/);
  return {
    kind,
    range: {
      start: starts[first]! + Math.max(marker, 0),
      end: starts[last]! + lineText(text, starts, last).trimEnd().length,
    },
    firstLine: first,
    lastLine: last,
    lines,
  };
}

/**
 * The part of a source line that the fence holds. Markdown strips the container's prefix (a quote mark, a list's
 * indentation) and may turn a tab into blanks or NUL into a replacement mark, so the end of the line is what is matched.
 */
function sourceLine(text: string, starts: readonly number[], line: number, shown: string): SourceLine {
  const start = starts[line] ?? text.length;
  const source = line < starts.length ? lineText(text, starts, line) : '';
  if (source.length >= shown.length && source.endsWith(shown)) {
    return { text: shown, start: start + source.length - shown.length };
  }
  const words = shown.trimStart().length;
  let from = source.length - words;
  const blanks = shown.length - words;
  for (let i = 0; i < blanks && from > 0 && /[ \t]/.test(source[from - 1]!); i++) from--;
  from = Math.max(0, from);
  return { text: source.slice(from), start: start + from };
}

/** markdown-it says which code spans a paragraph, a heading or a table's cell has; the text is searched for them in turn. */
function findSpans(text: string, starts: readonly number[], tokens: readonly Token[]): SourceSpan[] {
  const spans: SourceSpan[] = [];
  let cursor = 0;
  let map: readonly [number, number] = [0, 0];
  for (const token of tokens) {
    // A cell has no lines of its own: it stands in those of its row.
    map = token.map ?? map;
    if (token.type !== 'inline' || !token.content.includes('tautline')) continue;
    const end = starts[map[1]] ?? text.length;
    cursor = Math.max(cursor, starts[map[0]]!);
    const [inline] = inlines().parseInline(token.content, {});
    for (const { type, markup, content } of inline?.children ?? []) {
      if (type !== 'code_inline') continue;
      const found = findSpan(text, cursor, end, markup, content);
      if (found === undefined) continue;
      cursor = found.end;
      const span = readSpan(text, found, markup.length, lineOf(starts, found.start));
      if (span !== undefined) spans.push(span);
    }
  }
  return spans;
}

function readSpan(text: string, range: Range, marks: number, line: number): SourceSpan | undefined {
  const inside = text.slice(range.start + marks, range.end - marks);
  const lead = /^\s*tautline(?=\s)\s*/.exec(inside);
  if (lead === null) return undefined;
  const expression = inside.slice(lead[0].length).trimEnd();
  return expression === '' ? undefined : { range, text: expression, start: range.start + marks + lead[0].length, line };
}

function findSpan(text: string, from: number, end: number, markup: string, content: string): Range | undefined {
  const words = content.replace(/\s+/g, '');
  for (let start = text.indexOf(markup, from); start >= 0 && start < end; ) {
    const run = runLength(text, start);
    if (run === markup.length) {
      const close = closingRun(text, start + run, end, run);
      if (close !== undefined) {
        const inside = text.slice(start + run, close);
        // A quote mark may stand at the start of a further line of the span, so only the words are compared.
        if (inside.replace(/\n[ \t]*>+/g, '\n').replace(/\s+/g, '') === words) return { start, end: close + run };
      }
    }
    start = text.indexOf(markup, start + run);
  }
  return undefined;
}

function closingRun(text: string, from: number, end: number, length: number): number | undefined {
  for (let at = text.indexOf('`', from); at >= 0 && at < end; ) {
    const run = runLength(text, at);
    if (run === length) return at;
    at = text.indexOf('`', at + run);
  }
  return undefined;
}

function runLength(text: string, at: number): number {
  let end = at;
  while (text.charCodeAt(end) === 96) end++;
  return Math.max(1, end - at);
}

function lineOf(starts: readonly number[], offset: number): number {
  let [low, high] = [0, starts.length - 1];
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (starts[middle]! <= offset) low = middle;
    else high = middle - 1;
  }
  return low;
}

function shiftLines(source: Source, by: number): Source {
  return {
    fences: source.fences.map(fence => ({
      ...fence,
      firstLine: fence.firstLine + by,
      lastLine: fence.lastLine + by,
    })),
    spans: source.spans.map(span => ({ ...span, line: span.line + by })),
  };
}
