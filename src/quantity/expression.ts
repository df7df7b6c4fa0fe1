// An arithmetic expression over operands that another room defines.
import type { Range } from './range.ts';

export type BinaryOperator = '+' | '-' | '*' | '/' | '^';
export type FunctionName = 'min' | 'max' | 'abs' | 'sqrt' | 'ceil' | 'floor' | 'sin' | 'cos' | 'tan';

/** `range` covers the words of the whole (sub)expression, its outer parentheses included. */
export type Expression<Operand> =
  | { readonly kind: 'operand'; readonly operand: Operand; readonly range: Range }
  | { readonly kind: 'negate'; readonly of: Expression<Operand>; readonly range: Range }
  | {
      readonly kind: 'binary';
      readonly operator: BinaryOperator;
      readonly left: Expression<Operand>;
      readonly right: Expression<Operand>;
      readonly range: Range;
    }
  | {
      readonly kind: 'call';
      readonly function: FunctionName;
      readonly arguments: readonly Expression<Operand>[];
      readonly range: Range;
    };
