// Reads what is asked of a structure: `sag of R1 between A and B`, `reaction at A horizontal`, and `under` behind it.

import { readBetween, readPlace } from './places.ts';
import type { Reader } from './reader.ts';
import type { Measure, MeasureKind, Name, Place, ReactionComponent, Stretch, Under } from './syntax.ts';
import { isMeasureKind, MEASURES } from './words.ts';

/** The measure whose first word stands here. `of` and `in` mean the same. */
export function readMeasure(reader: Reader): Measure | undefined {
  const word = reader.peek();
  if (word?.kind !== 'word' || !isMeasureKind(word.text)) {
    return reader.dueOneOf('a measure', Object.keys(MEASURES));
  }
  const from = reader.position;
  reader.skip(1);
  const kind = word.text;
  const parts = kind === 'reaction' ? readReaction(reader) : readWhere(reader, kind);
  return parts && { kind, ...parts, range: reader.since(from) };
}

/** `vertical`, `horizontal` or `moment`, where one stands here. */
export function readComponent(reader: Reader): ReactionComponent | undefined {
  const word = reader.peek();
  if (word?.kind !== 'word' || !isComponent(word.text)) return undefined;
  reader.skip(1);
  return word.text;
}

/** `under all`, `under service`, `under strength (b)`, when `under` stands here. */
export function readUnder(reader: Reader): Under | undefined {
  const from = reader.position;
  reader.skip(1);
  if (reader.takeWord('all')) return { kind: 'all', range: reader.since(from) };
  const name = reader.name('a combination or a case');
  if (!name) return undefined;
  const label = reader.isMark('(') ? readLabel(reader) : undefined;
  if (reader.failure) return undefined;
  return { kind: 'named', name, ...(label && { label }), range: reader.since(from) };
}

/**
 * A label in parentheses: a name or a whole number, and in a question the signs of the alternatives that `+-` made of
 * its line: `(b)`, `(2)`, `(c+-)`, `(+)`. Its text and range are without the parentheses.
 */
export function readLabel(reader: Reader): Name | undefined {
  reader.skip(1);
  const from = reader.position;
  let text = '';
  const token = reader.peek();
  if (token?.kind === 'word' || (token?.kind === 'number' && isWhole(token.text))) {
    text = token.text;
    reader.skip(1);
  }
  for (;;) {
    const sign = reader.takeMark('+') ?? reader.takeMark('-') ?? reader.takeMark('--');
    if (!sign) break;
    text += sign.text;
  }
  if (text === '') return reader.due('a label');
  const range = reader.since(from);
  return reader.mark(')', 'the end of the label') && { text, range };
}

function isWhole(digits: string): boolean {
  return /^\d+$/.test(digits);
}

function isComponent(word: string): word is ReactionComponent {
  return word === 'vertical' || word === 'horizontal' || word === 'moment';
}

type Parts = Omit<Measure, 'kind' | 'range'>;

function readReaction(reader: Reader): Parts | undefined {
  if (!reader.word('at', 'the point of the support')) return undefined;
  const at = readPlace(reader);
  const component = at && readComponent(reader);
  return at && { at, ...(component && { component }) };
}

/** `at PLACE [in M]`, or `of M [at PLACE | between END and END]`. */
function readWhere(reader: Reader, kind: MeasureKind): Parts | undefined {
  if (reader.takeWord('at')) {
    const at = readPlace(reader);
    const within = at && takeOf(reader) ? reader.name('a member') : undefined;
    return at && !reader.failure ? { at, ...(within && { in: within }) } : undefined;
  }
  if (!takeOf(reader)) return reader.due(`\`at\`, \`of\` or \`in\``, { hint: `\`${MEASURES[kind].form}\`` });
  const within = reader.name('a member or a group');
  if (!within) return undefined;
  let at: Place | undefined;
  let between: Stretch | undefined;
  if (reader.takeWord('at')) at = readPlace(reader);
  else if (reader.isWord('between')) between = readBetween(reader);
  return reader.failure ? undefined : { in: within, ...(at && { at }), ...(between && { between }) };
}

function takeOf(reader: Reader): boolean {
  return reader.takeWord('of') !== undefined || reader.takeWord('in') !== undefined;
}

/** Where a word stands that belongs to a question and not to a limit. */
export function findInLimit(reader: Reader): { readonly measure?: number; readonly under?: number } {
  let measure: number | undefined;
  let under: number | undefined;
  for (let ahead = 0; reader.peek(ahead); ahead++) {
    const token = reader.peek(ahead)!;
    if (token.kind !== 'word') continue;
    if (token.text === 'under') under ??= ahead;
    const located = reader.isWord('at', ahead + 1) || reader.isWord('of', ahead + 1) || reader.isWord('in', ahead + 1);
    if (isMeasureKind(token.text) && located) measure ??= ahead;
  }
  return { ...(measure !== undefined && { measure }), ...(under !== undefined && { under }) };
}
