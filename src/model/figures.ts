// Reads the values of statements as plain SI numbers of the dimension that is due, with the words to say so where they
// are not. What a name or a length means is answered by whoever knows the note.
import type { Operand, Value } from '../language/syntax.ts';
import {
  type Dimension,
  divideDimensions,
  FORCE,
  FORCE_PER_LENGTH,
  LENGTH,
  MOMENT,
  multiplyDimensions,
  sameDimension,
} from '../quantity/dimension.ts';
import { dimensionName } from '../quantity/dimension-names.ts';
import { evaluate } from '../quantity/evaluate.ts';
import type { Problem } from '../quantity/problem.ts';
import type { Quantity } from '../quantity/quantity.ts';
import type { Report } from './report.ts';

/** What a figure must be, for its check and for the message. */
export interface Due {
  readonly dimension: Dimension;
  /** With its article: `a length`. */
  readonly words: string;
}

export class Figures {
  readonly #operand: (operand: Operand) => Quantity | undefined;
  readonly #report: Report;

  constructor(operand: (operand: Operand) => Quantity | undefined, report: Report) {
    this.#operand = operand;
    this.#report = report;
  }

  /** Undefined where the value cannot be had; a diagnostic then stands somewhere. */
  quantity(value: Value): Quantity | undefined {
    const problems: Problem[] = [];
    const quantity = evaluate(value, this.#operand, problems);
    for (const { code, range, message, hint } of problems) {
      this.#report.error(code, range, message, hint === undefined ? {} : { hint });
    }
    return problems.length > 0 ? undefined : quantity;
  }

  number(value: Value, due: Due): number | undefined {
    const quantity = this.quantity(value);
    if (quantity === undefined) return undefined;
    if (sameDimension(quantity.dimension, due.dimension)) return quantity.value;
    this.wrongKind(value, quantity, due);
    return undefined;
  }

  /** A figure that must be greater than zero, such as a length of a leg or a stiffness. */
  positive(value: Value, due: Due, what: string): number | undefined {
    const number = this.number(value, due);
    if (number === undefined || number > 0) return number;
    this.#report.error('bad-value', value.range, `${what} must be greater than zero.`);
    return undefined;
  }

  wrongKind(value: Value, quantity: Quantity, due: Due): void {
    const found = dimensionName(quantity.dimension);
    const hint = massForForce(quantity.dimension, due.dimension);
    this.#report.error(
      'wrong-dimension',
      value.range,
      `${capital(due.words)} is due here; this is ${found}.`,
      hint === undefined ? {} : { hint },
    );
  }
}

/** A mass, a mass per length and so on where the same of force is due: pounds are meant as a force. */
function massForForce(found: Dimension, due: Dimension): string | undefined {
  const acceleration = divideDimensions(FORCE, [0, 1, 0, 0, 0]);
  const isForce = [FORCE, FORCE_PER_LENGTH, MOMENT, divideDimensions(FORCE_PER_LENGTH, LENGTH)].some(kind =>
    sameDimension(kind, due),
  );
  return isForce && sameDimension(multiplyDimensions(found, acceleration), due) ? 'lbf?' : undefined;
}

function capital(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
