// Cuts a line of a fence into tokens with their places. Hand-written, linear in the text, and never at a loss: what
// means nothing becomes a stray token, and the first mistake of spelling is kept for the statement's diagnostic.

import { RAISED } from '../quantity/unit-text.ts';
import type { SourceLine } from './syntax.ts';

export type TokenKind = 'word' | 'number' | 'string' | 'mark' | 'raised' | 'stray';

/** `start` and `end` as in a range, so that a token can stand for one. */
export interface Token {
  readonly kind: TokenKind;
  /**
   * A word in NFC, a string without its quotes, raised digits as plain ones, a mark in ASCII (`≤` is `<=`, `−` is `-`;
   * `×`, `·` and `±` stay), anything else as written.
   */
  readonly text: string;
  readonly start: number;
  readonly end: number;
  /** Whether white space or the line's start stands before it. */
  readonly spaced: boolean;
}

/** A mistake that no grammar is needed to see. */
export interface Fault {
  readonly kind: 'decimal-comma' | 'long-dash' | 'open-quote' | 'curly-quote';
  readonly start: number;
  readonly end: number;
}

export interface Scanned {
  readonly tokens: Token[];
  fault: Fault | undefined;
}

/** Appends the tokens of one physical line. A comment ends it. */
export function scan(line: SourceLine, into: Scanned): void {
  const { text, start } = line;
  const { tokens } = into;
  let index = 0;
  let spaced = true;

  const push = (kind: TokenKind, words: string, end: number) => {
    tokens.push({ kind, text: words, start: start + index, end: start + end, spaced });
    index = end;
    spaced = false;
  };
  const fault = (kind: Fault['kind'], end: number) => {
    into.fault ??= { kind, start: start + index, end: start + end };
  };

  while (index < text.length) {
    const code = text.charCodeAt(index);
    if (isBlankAt(text, index)) {
      index++;
      spaced = true;
      continue;
    }
    if (code === HASH && spaced) return;

    if (isDigit(code) || (code === POINT && isDigit(text.charCodeAt(index + 1)))) {
      const end = numberEnd(text, index);
      push('number', text.slice(index, end).replace(MINUS_SIGN, '-'), end);
      continue;
    }
    const wordStart = letterLength(text, index);
    if (wordStart > 0) {
      const end = wordEnd(text, index + wordStart);
      const word = text.slice(index, end);
      push('word', isAscii(word) ? word : word.normalize('NFC'), end);
      continue;
    }
    if (code === QUOTE) {
      const close = text.indexOf('"', index + 1);
      if (close < 0) fault('open-quote', text.length);
      const end = close < 0 ? text.length : close + 1;
      push('string', text.slice(index + 1, close < 0 ? end : close), end);
      continue;
    }
    if (code === COMMA && isDigit(text.charCodeAt(index - 1)) && isDigit(text.charCodeAt(index + 1))) {
      fault('decimal-comma', index + 1);
    }
    const character = text[index]!;
    const mark = MARKS[character];
    if (mark !== undefined) {
      const double = PAIRS[mark + (MARKS[text[index + 1]!] ?? '')];
      push('mark', double ?? mark, index + (double ? 2 : 1));
      continue;
    }
    if (RAISED[character] !== undefined) {
      let end = index;
      let digits = '';
      while (end < text.length && RAISED[text[end]!] !== undefined) digits += RAISED[text[end++]!];
      push('raised', digits, end);
      continue;
    }
    if (LONG_DASHES.includes(character)) fault('long-dash', index + 1);
    if (CURLY_QUOTES.includes(character)) fault('curly-quote', index + 1);
    push('stray', text.slice(index, strayEnd(text, index)), strayEnd(text, index));
  }
}

/** Columns of white space at a line's start (a tab reaches the next multiple of four), and where they end. */
export function indentation(text: string): { columns: number; index: number } {
  let columns = 0;
  let index = 0;
  for (; index < text.length && isBlankAt(text, index); index++) {
    columns = text.charCodeAt(index) === TAB ? columns - (columns % 4) + 4 : columns + 1;
  }
  return { columns, index };
}

/** Any Unicode white space. */
export function isBlankAt(text: string, index: number): boolean {
  const code = text.charCodeAt(index);
  if (code < 0x80) return code === 0x20 || (code >= 0x09 && code <= 0x0d);
  return BLANK.test(text[index]!);
}

const MARKS: Readonly<Record<string, string>> = {
  '(': '(',
  ')': ')',
  ',': ',',
  ':': ':',
  '+': '+',
  '-': '-',
  '−': '-',
  '*': '*',
  '×': '×',
  '·': '·',
  '⋅': '·',
  '/': '/',
  '^': '^',
  '=': '=',
  '<': '<',
  '>': '>',
  '≤': '<=',
  '≥': '>=',
  '±': '±',
};

/** Marks of two characters. `+-` is put together only where a combination reads it. */
const PAIRS: Readonly<Record<string, string>> = { '--': '--', '<=': '<=', '>=': '>=' };

export const LONG_DASHES = '–—‒―';
export const CURLY_QUOTES = '“”„‟«»';
const MINUS_SIGN = '−';
const BLANK = /^\s$/;
const LETTER = /^\p{L}$/u;
const NAME_PART = /^[\p{L}\p{M}\p{Nd}]$/u;

const TAB = 0x09;
const HASH = 0x23;
const QUOTE = 0x22;
const COMMA = 0x2c;
const POINT = 0x2e;
const UNDERSCORE = 0x5f;

function isDigit(code: number): boolean {
  return code >= 0x30 && code <= 0x39;
}

function isAsciiLetter(code: number): boolean {
  return (code >= 0x61 && code <= 0x7a) || (code >= 0x41 && code <= 0x5a);
}

function isAscii(word: string): boolean {
  for (let index = 0; index < word.length; index++) if (word.charCodeAt(index) >= 0x80) return false;
  return true;
}

/** The length of the letter at `index`, 0 where there is none. */
function letterLength(text: string, index: number): number {
  const code = text.charCodeAt(index);
  if (code < 0x80) return isAsciiLetter(code) ? 1 : 0;
  const character = String.fromCodePoint(text.codePointAt(index)!);
  return LETTER.test(character) ? character.length : 0;
}

function wordEnd(text: string, from: number): number {
  let index = from;
  while (index < text.length) {
    const code = text.charCodeAt(index);
    if (code < 0x80) {
      if (!isAsciiLetter(code) && !isDigit(code) && code !== UNDERSCORE) break;
      index++;
      continue;
    }
    const character = String.fromCodePoint(text.codePointAt(index)!);
    if (!NAME_PART.test(character)) break;
    index += character.length;
  }
  return index;
}

/** Digits, a point with digits behind it, an exponent with digits in it. */
function numberEnd(text: string, from: number): number {
  let index = digitsEnd(text, from);
  if (text.charCodeAt(index) === POINT && isDigit(text.charCodeAt(index + 1))) index = digitsEnd(text, index + 1);
  if (text[index] === 'e' || text[index] === 'E') {
    const sign = text[index + 1] === '+' || text[index + 1] === '-' || text[index + 1] === MINUS_SIGN ? 1 : 0;
    if (isDigit(text.charCodeAt(index + 1 + sign))) return digitsEnd(text, index + 1 + sign);
  }
  return index;
}

function digitsEnd(text: string, from: number): number {
  let index = from;
  while (isDigit(text.charCodeAt(index))) index++;
  return index;
}

/** One character that means nothing with those of its like behind it, so that noise makes few tokens. */
function strayEnd(text: string, from: number): number {
  if (text.codePointAt(from)! > 0xffff) return from + 2;
  let index = from + 1;
  while (index < text.length && text[index] === text[from]) index++;
  return index;
}
