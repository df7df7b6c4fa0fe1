// The operands of a value, in the order in which they are written.
import type { Operand, Value } from '../language/syntax.ts';

export function operandsOf(value: Value): Operand[] {
  switch (value.kind) {
    case 'operand':
      return [value.operand];
    case 'negate':
      return operandsOf(value.of);
    case 'binary':
      return [...operandsOf(value.left), ...operandsOf(value.right)];
    case 'call':
      return value.arguments.flatMap(operandsOf);
  }
}
