// A diagnostic as a person reads it on a terminal: place, severity, code and message in one line that other programs can
// match, then the source line with carets under the words, the hint, and what it is related to.
import type { Diagnostic, Severity } from '../language/diagnostic.ts';
import type { LineIndex, TextPosition } from '../note/line-index.ts';
import type { Range } from '../quantity/range.ts';
import { safeText, widthOf } from './safe-text.ts';
import type { Style } from './style.ts';

/** A longer source line is cut on both sides of the words. */
const LONGEST_SOURCE = 140;
const CUT = '…';
/** A message may quote a name, and a name may be as long as a fence. */
const LONGEST_MESSAGE = 400;

export function diagnosticText(diagnostic: Diagnostic, path: string, lines: LineIndex, style: Style): string[] {
  const { severity, code, message, range, hint, related = [] } = diagnostic;
  const coloured = colourOf(severity, style);
  return [
    `${placeText(path, lines.positionAt(range.start), style)} ${coloured(severity)} ${code}: ${style.strong(shortened(message))}`,
    ...excerpt(range, lines, coloured, style),
    ...(hint === undefined ? [] : [`${GUTTER_BLANK}${style.hint('hint:')} ${shortened(hint)}`]),
    ...related.flatMap(place => [
      `${GUTTER_BLANK}${placeText(path, lines.positionAt(place.range.start), style)} ${shortened(place.message)}`,
      ...excerpt(place.range, lines, style.soft, style),
    ]),
  ];
}

const GUTTER = 6;
const GUTTER_BLANK = ' '.repeat(GUTTER + 3);

function placeText(path: string, { line, column }: TextPosition, style: Style): string {
  return style.soft(`${safeText(path)}:${line}:${column}:`);
}

function shortened(message: string): string {
  return safeText(message.length > LONGEST_MESSAGE ? message.slice(0, LONGEST_MESSAGE) + CUT : message);
}

/** The first line that the range touches, and carets under the part of it that the range covers. */
function excerpt(range: Range, lines: LineIndex, coloured: (text: string) => string, style: Style): string[] {
  const start = lines.positionAt(range.start);
  const end = lines.positionAt(range.end);
  const source = lines.lineAt(start.line);
  if (source === '') return [];
  const from = start.column - 1;
  const to = Math.max(from, end.line === start.line ? end.column - 1 : source.length);
  const window = cutAround(source, from, to);
  const before = window.lead + safeText(source.slice(window.start, from));
  const words = safeText(source.slice(from, Math.min(window.end, to)));
  const after = safeText(source.slice(Math.min(to, window.end), window.end)) + window.trail;
  const carets = '^'.repeat(Math.max(1, widthOf(words)));
  return [
    `${style.soft(`${String(start.line).padStart(GUTTER)} |`)} ${before}${words}${after}`,
    `${style.soft(`${' '.repeat(GUTTER)} |`)} ${' '.repeat(widthOf(before))}${coloured(carets)}`,
  ];
}

/** The part of a long line that is shown; the start of the range is always in it. */
function cutAround(source: string, from: number, to: number) {
  if (source.length <= LONGEST_SOURCE) return { start: 0, end: source.length, lead: '', trail: '' };
  const room = Math.max(0, LONGEST_SOURCE - (to - from));
  const start = Math.max(0, Math.min(from - Math.floor(room / 2), source.length - LONGEST_SOURCE));
  const end = Math.min(source.length, start + LONGEST_SOURCE);
  return { start, end, lead: start > 0 ? CUT : '', trail: end < source.length ? CUT : '' };
}

function colourOf(severity: Severity, style: Style): (text: string) => string {
  return { error: style.error, warning: style.warning, hint: style.hint }[severity];
}
