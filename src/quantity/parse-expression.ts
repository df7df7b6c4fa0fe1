// Reads pieces (opaque operands, operators, parentheses, functions) into an expression. Everything that could be wrong
// is found here, at its place, so that the parser behind this only ever sees a well-formed text of symbols.

import type { BinaryOperator, Expression, FunctionName } from './expression.ts';
import type { Shape } from './mathjs.ts';
import { parseShape } from './mathjs.ts';
import type { Problem } from './problem.ts';
import type { Range } from './range.ts';
import { cover } from './range.ts';

export type Piece<Operand> =
  | { readonly kind: 'operand'; readonly operand: Operand; readonly range: Range }
  | { readonly kind: 'operator'; readonly operator: BinaryOperator; readonly range: Range }
  | { readonly kind: 'open' | 'close' | 'comma'; readonly range: Range }
  | { readonly kind: 'function'; readonly name: FunctionName; readonly range: Range };

/** Parentheses, signs and powers nested in one another. */
export const DEEPEST = 64;
/** Operands, operators and the rest, in one value. */
export const LONGEST = 2000;

/** The smallest and largest number of arguments. */
const ARGUMENTS: Readonly<Record<FunctionName, readonly [least: number, most: number]>> = {
  min: [1, Number.POSITIVE_INFINITY],
  max: [1, Number.POSITIVE_INFINITY],
  abs: [1, 1],
  sqrt: [1, 1],
  ceil: [1, 1],
  floor: [1, 1],
  sin: [1, 1],
  cos: [1, 1],
  tan: [1, 1],
};

export const FUNCTION_NAMES = Object.keys(ARGUMENTS) as readonly FunctionName[]; // the keys of the record above

export function isFunctionName(word: string): word is FunctionName {
  return Object.hasOwn(ARGUMENTS, word);
}

/**
 * The expression of the pieces, or undefined with one problem told. `^` is right associative and binds tighter than a
 * minus before it: `-a^b` is -(a^b). `whole` is where the value stands, for the case that there are no pieces.
 */
export function parseExpression<Operand>(
  pieces: readonly Piece<Operand>[],
  whole: Range,
  problems: Problem[],
): Expression<Operand> | undefined {
  const simple = withoutOperators(pieces);
  if (simple) return simple;
  const problem = check(pieces, whole);
  if (problem) {
    problems.push(problem);
    return undefined;
  }
  return build(shapeOf(pieces), pieces).expression;
}

/** A lone operand, possibly negated, needs no parser. */
function withoutOperators<Operand>(pieces: readonly Piece<Operand>[]): Expression<Operand> | undefined {
  const [first, second] = pieces;
  if (pieces.length === 1 && first!.kind === 'operand') return first;
  if (pieces.length === 2 && first!.kind === 'operator' && first!.operator === '-' && second!.kind === 'operand') {
    return { kind: 'negate', of: second!, range: cover(first!.range, second!.range) };
  }
  return undefined;
}

interface Level {
  /** Of the opening parenthesis. */
  readonly range: Range;
  /** The function whose arguments these are. */
  readonly call: (Piece<unknown> & { readonly kind: 'function' }) | undefined;
  commas: number;
  /** Signs and powers pending: each holds the rest of the term in its right hand. */
  pending: number;
}

/** Walks the pieces once, alternately expecting an operand and an operator. */
function check(pieces: readonly Piece<unknown>[], whole: Range): Problem | undefined {
  if (pieces.length === 0) return bad(whole, 'A value is missing here.');
  const levels: Level[] = [{ range: whole, call: undefined, commas: 0, pending: 0 }];
  let deep = 0;
  let complete = false;

  for (let index = 0; index < pieces.length; index++) {
    const piece = pieces[index]!;
    if (index === LONGEST) {
      const message = `A value has at most ${LONGEST} operands and operators.`;
      return { code: 'value-too-long', range: piece.range, message, hint: 'Give a part of it a name with `let`.' };
    }
    const level = levels[levels.length - 1]!;
    switch (piece.kind) {
      case 'operand':
        if (complete) return adjacent(piece.range);
        complete = true;
        break;
      case 'function':
        if (complete) return adjacent(piece.range);
        if (pieces[index + 1]?.kind !== 'open') {
          return bad(piece.range, `\`${piece.name}\` is a function; its argument stands in parentheses.`);
        }
        break;
      case 'open': {
        if (complete) return adjacent(piece.range);
        const before = pieces[index - 1];
        levels.push({
          range: piece.range,
          call: before?.kind === 'function' ? before : undefined,
          commas: 0,
          pending: 0,
        });
        deep++;
        break;
      }
      case 'close': {
        if (levels.length === 1)
          return bad(piece.range, 'This parenthesis closes nothing.', 'Leave it out, or open one before it.');
        if (!complete) return missing(pieces, index);
        const wrong = level.call && wrongCount(level.call, level.commas + 1);
        if (wrong) return wrong;
        levels.pop();
        deep -= 1 + level.pending;
        break;
      }
      case 'comma':
        if (!level.call) return bad(piece.range, 'A comma stands only between the arguments of a function.');
        if (!complete) return missing(pieces, index);
        level.commas++;
        deep -= level.pending;
        level.pending = 0;
        complete = false;
        break;
      case 'operator':
        if (!complete && piece.operator !== '-') return missing(pieces, index);
        if (!complete || piece.operator === '^') {
          level.pending++;
          deep++;
        } else {
          deep -= level.pending;
          level.pending = 0;
        }
        complete = false;
        break;
    }
    if (deep > DEEPEST) {
      const message = `Parentheses, signs and powers are nested more than ${DEEPEST} deep here.`;
      return { code: 'value-too-deep', range: piece.range, message, hint: 'Give a part of it a name with `let`.' };
    }
  }
  // A parenthesis left open is the mistake, whatever is missing behind it.
  const open = levels[levels.length - 1]!;
  if (levels.length > 1) return bad(open.range, 'This parenthesis is not closed.');
  return complete ? undefined : missing(pieces, pieces.length);
}

function bad(range: Range, message: string, hint?: string): Problem {
  return { code: 'bad-value', range, message, ...(hint && { hint }) };
}

/** Two operands without an operator between them; `range` is the second. */
export function adjacent(range: Range): Problem {
  return bad(range, 'Two operands stand side by side; nothing multiplies without a sign.', 'Put `*` between them.');
}

/** An operand is due before `pieces[index]`: the words at fault are the operator or parenthesis that lacks it. */
function missing(pieces: readonly Piece<unknown>[], index: number): Problem {
  const before = pieces[index - 1];
  const here = pieces[index];
  if (before?.kind === 'open' && here?.kind === 'close') {
    return bad(cover(before.range, here.range), 'The parentheses are empty; a value is missing between them.');
  }
  if (before?.kind === 'operator') {
    return bad(before.range, `A value is missing behind \`${before.operator}\`.`);
  }
  if (here?.kind === 'operator') return bad(here.range, `A value is missing before \`${here.operator}\`.`);
  return bad((here ?? before)!.range, 'A value is missing here.');
}

function wrongCount(call: Piece<unknown> & { readonly kind: 'function' }, count: number): Problem | undefined {
  const [least, most] = ARGUMENTS[call.name];
  if (count >= least && count <= most) return undefined;
  return bad(call.range, `\`${call.name}\` takes one argument; ${count} are given.`);
}

/** Shapes already read, by their text. Most values of a note share a few. */
const shapes = new Map<string, Shape>();
const MOST_SHAPES = 2000;

function shapeOf(pieces: readonly Piece<unknown>[]): Shape {
  let text = '';
  pieces.forEach((piece, index) => {
    text += symbolOf(piece, index);
  });
  const known = shapes.get(text);
  if (known) return known;
  const shape = parseShape(text);
  if (shapes.size >= MOST_SHAPES) shapes.clear();
  shapes.set(text, shape);
  return shape;
}

/** An operand's symbol holds the index of its piece, so that its range can be found again. */
function symbolOf(piece: Piece<unknown>, index: number): string {
  switch (piece.kind) {
    case 'operand':
      return `a${index}`;
    case 'operator':
      return piece.operator;
    case 'function':
      return `f${index}`;
    case 'open':
      return '(';
    case 'close':
      return ')';
    case 'comma':
      return ',';
  }
}

/** An expression with the pieces that its first and last words come from. */
interface Built<Operand> {
  readonly expression: Expression<Operand>;
  readonly first: number;
  readonly last: number;
}

function build<Operand>(shape: Shape, pieces: readonly Piece<Operand>[]): Built<Operand> {
  switch (shape.kind) {
    case 'symbol': {
      const index = Number(shape.name.slice(1));
      const piece = pieces[index]!;
      if (piece.kind !== 'operand') throw new Error(`symbol ${shape.name} is no operand but ${piece.kind}`);
      return { expression: piece, first: index, last: index };
    }
    case 'parenthesis': {
      const inner = build(shape.of, pieces);
      const first = inner.first - 1;
      const last = inner.last + 1;
      return { expression: { ...inner.expression, range: between(pieces, first, last) }, first, last };
    }
    case 'call': {
      const index = Number(shape.name.slice(1));
      const piece = pieces[index]!;
      if (piece.kind !== 'function') throw new Error(`symbol ${shape.name} is no function but ${piece.kind}`);
      const built = shape.of.map(argument => build(argument, pieces));
      const last = built[built.length - 1]!.last + 1;
      const range = between(pieces, index, last);
      const call = {
        kind: 'call',
        function: piece.name,
        arguments: built.map(argument => argument.expression),
        range,
      } as const;
      return { expression: call, first: index, last };
    }
    case 'operator': {
      const left = build(shape.of[0]!, pieces);
      if (shape.of.length === 1) {
        const first = left.first - 1;
        const range = between(pieces, first, left.last);
        return { expression: { kind: 'negate', of: left.expression, range }, first, last: left.last };
      }
      const right = build(shape.of[1]!, pieces);
      const binary = {
        kind: 'binary',
        operator: shape.operator as BinaryOperator, // the text held no other operators
        left: left.expression,
        right: right.expression,
        range: between(pieces, left.first, right.last),
      } as const;
      return { expression: binary, first: left.first, last: right.last };
    }
  }
}

function between(pieces: readonly Piece<unknown>[], first: number, last: number): Range {
  return { start: pieces[first]!.range.start, end: pieces[last]!.range.end };
}
