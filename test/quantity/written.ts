// Values from text, for tests of what expressions come to.
import { parseProse } from '../../src/language/parse.ts';
import type { Operand } from '../../src/language/syntax.ts';
import { evaluate } from '../../src/quantity/evaluate.ts';
import type { Problem } from '../../src/quantity/problem.ts';
import type { Quantity } from '../../src/quantity/quantity.ts';
import { CONSTANTS } from '../../src/quantity/units.ts';

export interface Outcome {
  readonly quantity: Quantity | undefined;
  readonly problems: readonly Problem[];
}

/** What a text of quantities, constants and the names given comes to. Throws where it does not parse. */
export function written(text: string, names: Readonly<Record<string, Quantity | undefined>> = {}): Outcome {
  const { value, diagnostics } = parseProse(text, 0);
  if (!value) throw new Error(`${text}: ${diagnostics[0]?.message}`);
  const problems: Problem[] = [];
  const quantity = evaluate<Operand>(
    value,
    operand => {
      if (operand.kind === 'quantity') return operand.quantity;
      if (operand.kind === 'constant') return CONSTANTS[operand.name];
      return operand.kind === 'name' ? names[operand.name.text] : undefined;
    },
    problems,
  );
  return { quantity, problems };
}
