// Whether an expression is linear in some of its operands, beside a fixed part.
import type { Operand, Value } from '../language/syntax.ts';
import type { BinaryOperator } from '../quantity/expression.ts';

/** `fixed`: does not vary; `linear`: varies in proportion, beside a fixed part; `neither`. */
export type Kind = 'fixed' | 'linear' | 'neither';

export function isLinear(value: Value, kindOf: (operand: Operand) => Kind): boolean {
  return kindOfValue(value, kindOf) !== 'neither';
}

function kindOfValue(value: Value, kindOf: (operand: Operand) => Kind): Kind {
  switch (value.kind) {
    case 'operand':
      return kindOf(value.operand);
    case 'negate':
      return kindOfValue(value.of, kindOf);
    case 'binary':
      return kindOfBinary(value.operator, kindOfValue(value.left, kindOf), kindOfValue(value.right, kindOf));
    case 'call':
      return value.arguments.every(argument => kindOfValue(argument, kindOf) === 'fixed') ? 'fixed' : 'neither';
  }
}

function kindOfBinary(operator: BinaryOperator, left: Kind, right: Kind): Kind {
  if (left === 'fixed' && right === 'fixed') return 'fixed';
  if (left === 'neither' || right === 'neither') return 'neither';
  switch (operator) {
    case '+':
    case '-':
      return 'linear';
    case '*':
      return left === 'fixed' || right === 'fixed' ? 'linear' : 'neither';
    case '/':
      return right === 'fixed' ? 'linear' : 'neither';
    case '^':
      return 'neither';
  }
}
