// Reads pieces (opaque operands, operators, parentheses, functions) into an expression with the range of every part.

import type { BinaryOperator, Expression } from './expression.ts';
import type { Shape } from './mathjs.ts';
import { parseShape } from './mathjs.ts';
import type { Piece } from './pieces.ts';
import { checkPieces } from './pieces.ts';
import type { Problem } from './problem.ts';
import type { Range } from './range.ts';
import { cover } from './range.ts';

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
  const problem = checkPieces(pieces, whole);
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
