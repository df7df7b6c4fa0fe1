// What an expression is put together from, and the check that the pieces make one: everything that could be wrong is
// found here, at its place, so that the parser behind it only ever sees a well-formed text of symbols.

import type { BinaryOperator, FunctionName } from './expression.ts';
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
export function checkPieces(pieces: readonly Piece<unknown>[], whole: Range): Problem | undefined {
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
