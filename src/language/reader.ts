// Walks the tokens of one statement. The first failure is the statement's diagnostic; readers return undefined behind it.

import { nearest } from '../quantity/nearest.ts';
import type { Range } from '../quantity/range.ts';
import type { DiagnosticCode } from './codes.ts';
import type { Diagnostic } from './diagnostic.ts';
import type { Name, Quoted } from './syntax.ts';
import type { Token } from './tokens.ts';
import { whyNoName } from './words.ts';

/** What a diagnostic may carry beyond its message. */
export type Remedy = Pick<Diagnostic, 'hint' | 'fix'>;

export class Reader {
  readonly tokens: readonly Token[];
  failure: Diagnostic | undefined;
  private index: number;

  constructor(tokens: readonly Token[], index = 0) {
    this.tokens = tokens;
    this.index = index;
  }

  /** The position, to look back to with `since`. */
  get position(): number {
    return this.index;
  }

  get atEnd(): boolean {
    return this.index >= this.tokens.length;
  }

  peek(ahead = 0): Token | undefined {
    return this.tokens[this.index + ahead];
  }

  next(): Token | undefined {
    return this.tokens[this.index++];
  }

  skip(count: number): void {
    this.index += count;
  }

  isWord(word: string, ahead = 0): boolean {
    const token = this.tokens[this.index + ahead];
    return token !== undefined && token.kind === 'word' && token.text === word;
  }

  isMark(mark: string, ahead = 0): boolean {
    const token = this.tokens[this.index + ahead];
    return token !== undefined && token.kind === 'mark' && token.text === mark;
  }

  /** Whether the words stand here as one, joined by hyphens without blanks: `self-weight`. */
  isHyphened(first: string, second: string, ahead = 0): boolean {
    return (
      this.isWord(first, ahead) &&
      this.isMark('-', ahead + 1) &&
      this.isWord(second, ahead + 2) &&
      !this.peek(ahead + 1)!.spaced &&
      !this.peek(ahead + 2)!.spaced
    );
  }

  takeWord(word: string): Token | undefined {
    return this.isWord(word) ? this.next() : undefined;
  }

  takeMark(mark: string): Token | undefined {
    return this.isMark(mark) ? this.next() : undefined;
  }

  /** Takes the word or fails: `why` says what it is for. */
  word(word: string, why: string): Token | undefined {
    return this.takeWord(word) ?? this.due(`\`${word}\` (${why})`);
  }

  mark(mark: string, why: string): Token | undefined {
    return this.takeMark(mark) ?? this.due(`\`${mark}\` (${why})`);
  }

  /** A name in its role: `a point`, `a member`. */
  name(role: string): Name | undefined {
    const token = this.peek();
    if (token?.kind !== 'word') return this.due(role);
    const why = whyNoName(token.text);
    if (why) return this.fail('reserved-name', token, why, { hint: `Here ${role} is due.` });
    this.index++;
    return { text: token.text, range: rangeOf(token) };
  }

  /** Names separated by commas; a comma before `patterned` is left. */
  names(role: string): Name[] | undefined {
    const names: Name[] = [];
    do {
      const name = this.name(role);
      if (!name) return undefined;
      names.push(name);
    } while (this.isMark(',') && !this.isWord('patterned', 1) && this.takeMark(','));
    return names;
  }

  quoted(): Quoted | undefined {
    const token = this.peek();
    if (token?.kind !== 'string') return undefined;
    this.index++;
    return { text: token.text, range: rangeOf(token) };
  }

  /** From the token at `from` to the last one read. */
  since(from: number): Range {
    const last = this.tokens[Math.max(from, this.index - 1)] ?? this.tokens[this.tokens.length - 1]!;
    return { start: (this.tokens[from] ?? last).start, end: last.end };
  }

  /** The token here, or the last of the statement. */
  here(): Range {
    return rangeOf(this.peek() ?? this.tokens[this.tokens.length - 1]!);
  }

  /** Fails because something else is due here: `a point`, `` `on` (the member) ``. */
  due(what: string, remedy?: Remedy): undefined {
    const token = this.peek();
    const message = token
      ? `${asWritten(token)} stands where ${what} is due.`
      : `The statement ends where ${what} is due.`;
    return this.fail('bad-statement', this.here(), message, remedy);
  }

  /** Fails because one of a few words is due here; offers the nearest. */
  dueOneOf(what: string, words: readonly string[]): undefined {
    const token = this.peek();
    const near = token?.kind === 'word' ? nearest(token.text, words) : undefined;
    const hint = near ? `\`${near}\`?` : `One of ${words.map(word => `\`${word}\``).join(', ')}.`;
    return this.due(what, { hint });
  }

  /** Keeps the first failure of the statement. */
  fail(code: DiagnosticCode, range: Range, message: string, remedy?: Remedy): undefined {
    this.failure ??= { code, severity: 'error', range: rangeOf(range), message, ...remedy };
    return undefined;
  }
}

export function rangeOf(token: Range): Range {
  return { start: token.start, end: token.end };
}

/** Tokens as text, blanks normalised. */
export function print(tokens: readonly Token[]): string {
  let text = '';
  for (const token of tokens) {
    if (token.spaced && text !== '') text += ' ';
    text += token.kind === 'string' ? `"${token.text}"` : token.text;
  }
  return text;
}

/** A token in a message. A character that cannot be seen is named by its number. */
export function asWritten(token: Token): string {
  if (token.kind === 'string') return `"${shortened(token.text)}"`;
  const code = token.text.codePointAt(0) ?? 0;
  if (token.kind === 'stray' && UNSEEN.test(token.text)) {
    return `An invisible character (U+${code.toString(16).toUpperCase().padStart(4, '0')})`;
  }
  return `\`${shortened(token.text)}\``;
}

const UNSEEN = /^[\p{C}\p{Z}\p{M}]/u;
const LONGEST_SHOWN = 40;

function shortened(text: string): string {
  return text.length > LONGEST_SHOWN ? `${text.slice(0, LONGEST_SHOWN)}…` : text;
}
