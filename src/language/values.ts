// Reads a value: cuts it out of a statement, names its operands, and has the expression over them parsed.
// Measures and places know more of the language than a value does; a reader of measures is handed in where one may stand.

import type { BinaryOperator } from '../quantity/expression.ts';
import { nearest } from '../quantity/nearest.ts';
import { parseExpression } from '../quantity/parse-expression.ts';
import type { Piece } from '../quantity/pieces.ts';
import { adjacent, FUNCTION_NAMES, isFunctionName, LONGEST } from '../quantity/pieces.ts';
import type { Problem } from '../quantity/problem.ts';
import { unitNamed } from '../quantity/units.ts';
import { readQuantity } from './quantities.ts';
import type { Reader } from './reader.ts';
import { asWritten, rangeOf } from './reader.ts';
import type { Measure, Name, Operand, Value } from './syntax.ts';
import type { Token } from './tokens.ts';
import { EXTENTS, endsValue, isExtentFunction, isMeasureKind, isNameless, VALUE_ENDS, VALUE_WORDS } from './words.ts';

/** What a value may hold, and what ends it, beyond the usual. */
export interface ValueContext {
  /** Reads a measure, where one may be an operand. */
  readonly measure?: (reader: Reader) => Measure | undefined;
  /** The bare `span` of a question. */
  readonly span?: true;
  /** Between dimensions of a shape `×` separates. */
  readonly timesEnds?: true;
}

export const PLAIN: ValueContext = {};

/** The value that begins here, up to the first word or mark that ends one. Fails where there is none. */
export function readValue(reader: Reader, context: ValueContext = PLAIN): Value | undefined {
  return parse(reader, collect(reader, context, false));
}

/** A value in parentheses, and nothing behind them. */
export function readParenthesised(reader: Reader): Value | undefined {
  return parse(reader, collect(reader, PLAIN, true));
}

/** The tokens from the parenthesis here to the one that closes it; undefined where none does. */
export function parenthesisLength(reader: Reader): number | undefined {
  let depth = 0;
  for (let ahead = 0; ; ahead++) {
    const token = reader.peek(ahead);
    if (!token) return undefined;
    if (reader.isMark('(', ahead)) depth++;
    else if (reader.isMark(')', ahead) && --depth === 0) return ahead + 1;
  }
}

/** Whether a value begins here by its looks: a number, a parenthesis, a sign or a function with its parenthesis. */
export function beginsQuantity(reader: Reader): boolean {
  const token = reader.peek();
  if (!token) return false;
  if (token.kind === 'number') return true;
  if (token.kind === 'mark') return token.text === '(' || token.text === '-';
  return token.kind === 'word' && reader.isMark('(', 1) && (isFunctionName(token.text) || isExtentFunction(token.text));
}

function parse(reader: Reader, pieces: Piece<Operand>[] | undefined): Value | undefined {
  if (!pieces) return undefined;
  const problems: Problem[] = [];
  const value = parseExpression(pieces, reader.here(), problems);
  return value ?? refuse(reader, problems[0]!);
}

/** Where a word stands that may be mistyped for one that ends a value, it is offered. */
function refuseAdjacent(reader: Reader, token: Token): undefined {
  const problem = adjacent(rangeOf(token));
  const near = token.kind === 'word' ? nearest(token.text, VALUE_ENDS) : undefined;
  return refuse(reader, near ? { ...problem, hint: `\`${near}\`?` } : problem);
}

function refuse(reader: Reader, problem: Problem): undefined {
  return reader.fail(problem.code, problem.range, problem.message, problem.hint ? { hint: problem.hint } : {});
}

/** Collects pieces until an operand is complete and something stands there that ends a value. */
function collect(reader: Reader, context: ValueContext, single: boolean): Piece<Operand>[] | undefined {
  const pieces: Piece<Operand>[] = [];
  let depth = 0;
  let complete = false;
  for (let token = reader.peek(); token; token = reader.peek()) {
    if (complete && depth === 0 && (single || ends(token, context))) break;
    if (token.kind === 'mark') {
      if (token.text === '--') {
        return reader.fail('bad-value', token, '`--` stands only between the points of a chain.', {
          hint: 'Two minus signs stand with a blank between them.',
        });
      }
      const piece = pieceOf(token, depth);
      // Nothing that a value is made of: it ends here, and what is missing or open is found among the pieces.
      if (!piece) break;
      if (piece.kind === 'open') depth++;
      if (piece.kind === 'close') depth--;
      complete = piece.kind === 'close';
      reader.skip(1);
      pieces.push(piece);
      if (depth < 0) break;
      continue;
    }
    if (token.kind === 'raised') {
      return reader.fail('bad-value', token, 'Raised digits stand only behind a unit.', {
        hint: `To raise a value write \`^${token.text}\`.`,
      });
    }
    if (token.kind !== 'word' && token.kind !== 'number') break;
    // A word that cannot be an operand leaves open what is open: `(2 m down on R1`.
    if (complete && token.kind === 'word' && (endsValue(token.text) || isNameless(token.text))) break;
    if (complete) return refuseAdjacent(reader, token);
    if (pieces.length > LONGEST) break;
    const piece = readOperand(reader, context);
    if (!piece) return undefined;
    pieces.push(piece);
    complete = piece.kind === 'operand';
  }
  return pieces;
}

/** Whether the token ends a value that is complete before it. */
function ends(token: Token, context: ValueContext): boolean {
  switch (token.kind) {
    case 'word':
      return endsValue(token.text) || isNameless(token.text) || token.text === 'of';
    case 'mark':
      return END_MARKS.has(token.text) || (context.timesEnds === true && token.text === '×');
    case 'string':
    case 'stray':
      return true;
    default:
      return false;
  }
}

const END_MARKS: ReadonlySet<string> = new Set([',', '--', '<=', '>=', ':', '=', '<', '>', '±', '·']);

function pieceOf(token: Token, depth: number): Exclude<Piece<Operand>, { readonly kind: 'operand' }> | undefined {
  const range = rangeOf(token);
  switch (token.text) {
    case '(':
      return { kind: 'open', range };
    case ')':
      return { kind: 'close', range };
    case ',':
      return depth > 0 ? { kind: 'comma', range } : undefined;
    case '×':
      return { kind: 'operator', operator: '*', range };
    default:
      return OPERATORS.has(token.text)
        ? { kind: 'operator', operator: token.text as BinaryOperator, range } // the set holds just these
        : undefined;
  }
}

const OPERATORS: ReadonlySet<string> = new Set<BinaryOperator>(['+', '-', '*', '/', '^']);

function readOperand(reader: Reader, context: ValueContext): Piece<Operand> | undefined {
  const token = reader.peek()!;
  const range = rangeOf(token);
  if (token.kind === 'number') return operandPiece(readQuantity(reader));
  const word = token.text;
  const called = reader.isMark('(', 1);

  if (isFunctionName(word)) {
    reader.skip(1);
    return { kind: 'function', name: word, range };
  }
  if (isExtentFunction(word) && called) return operandPiece(readExtent(reader));
  if (word === 'span') {
    if (!context.span) return reader.fail('bad-value', token, '`span` alone stands only in `find` and `require`.');
    reader.skip(1);
    return operandPiece({ kind: 'span', range });
  }
  const property = readProperty(reader);
  if (property) return operandPiece(property);
  if (isMeasureKind(word)) {
    if (!context.measure) {
      return reader.fail(
        'bad-value',
        token,
        `A measure (${asWritten(token)}) stands only in \`find\` and \`require\`.`,
        {
          hint: 'Ask it in a `find` and use the name of that here.',
        },
      );
    }
    const measure = context.measure(reader);
    return measure && operandPiece({ kind: 'measure', measure, range: measure.range });
  }
  if (word === 'pi' || word === 'g0') {
    reader.skip(1);
    return operandPiece({ kind: 'constant', name: word, range });
  }
  if (unitNamed(word)) {
    const before = reader.isMark('*', -1) ? reader.peek(-2) : undefined;
    const joined = before?.kind === 'word' && unitNamed(before.text) !== undefined;
    return reader.fail('bad-value', token, `\`${word}\` is a unit; it stands only behind a number or another unit.`, {
      hint: joined ? `Units are joined by a blank or \`·\`: \`${before.text} ${word}\`.` : `\`1 ${word}\`?`,
    });
  }
  if (called && !reader.peek(1)!.spaced) {
    const near = nearest(word, VALUE_WORDS);
    const hint = near
      ? `\`${near}\`?`
      : `Functions are ${FUNCTION_NAMES.join(', ')}; nothing multiplies without a sign.`;
    return reader.fail('bad-value', token, `${asWritten(token)} is no function.`, { hint });
  }
  const name = reader.name('a value');
  return name && operandPiece({ kind: 'name', name, range });
}

function operandPiece(operand: Operand | undefined): Piece<Operand> | undefined {
  return operand && { kind: 'operand', operand, range: operand.range };
}

/** `I of RHS`, `fm of C24`, `k of Gauge`. A measure is no property. */
function readProperty(reader: Reader): Operand | undefined {
  const from = reader.position;
  const hyphened = reader.isHyphened('shear', 'area') ? 2 : 0;
  const word = reader.peek()!;
  if (!reader.isWord('of', 1 + hyphened) || (isMeasureKind(word.text) && !hyphened)) return undefined;
  reader.skip(1 + hyphened);
  const property: Name = { text: hyphened ? 'shear-area' : word.text, range: reader.since(from) };
  reader.skip(1);
  const of = reader.name('a section, a material or a structure');
  return of && { kind: 'property', property, of, range: reader.since(from) };
}

function readExtent(reader: Reader): Operand | undefined {
  const from = reader.position;
  const word = reader.next()!.text;
  if (!isExtentFunction(word)) throw new Error(`no extent function: ${word}`);
  reader.skip(1);
  const names: Name[] = [];
  do {
    const name = reader.name(word === 'span' ? 'a result' : 'a point');
    if (!name) return undefined;
    names.push(name);
  } while (reader.takeMark(','));
  if (!reader.mark(')', `the end of \`${word}\``)) return undefined;
  const { counts, form } = EXTENTS[word];
  const range = reader.since(from);
  if (!counts.includes(names.length)) {
    return reader.fail('bad-value', range, `\`${word}\` is written \`${form}\`; ${names.length} names are given.`);
  }
  return { kind: 'extent', function: word, arguments: names, range };
}
