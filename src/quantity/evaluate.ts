// Works an expression over plain values with dimensions. Dimensions are checked where they meet.

import type { Dimension } from './dimension.ts';
import { DIMENSIONLESS, sameDimension } from './dimension.ts';
import { dimensionName, isAngle, isRatio } from './dimension-names.ts';
import { tradeUnit } from './display.ts';
import type { BinaryOperator, Expression, FunctionName } from './expression.ts';
import { full, inRange, withoutNoise } from './number.ts';
import type { Problem, ProblemCode } from './problem.ts';
import type { Quantity } from './quantity.ts';
import type { Range } from './range.ts';

/**
 * The value of an expression in SI, or undefined. An operand without a value makes the whole undefined in silence, since
 * it has a diagnostic of its own; everything else that fails tells one problem at the smallest part that holds it.
 */
export function evaluate<Operand>(
  expression: Expression<Operand>,
  quantityOf: (operand: Operand) => Quantity | undefined,
  problems: Problem[],
): Quantity | undefined {
  switch (expression.kind) {
    case 'operand':
      return quantityOf(expression.operand);
    case 'negate': {
      const of = evaluate(expression.of, quantityOf, problems);
      return of && { value: -of.value, dimension: of.dimension };
    }
    case 'binary': {
      const left = evaluate(expression.left, quantityOf, problems);
      const right = evaluate(expression.right, quantityOf, problems);
      if (!left || !right) return undefined;
      return settle(combine(expression.operator, left, right), expression.range, problems);
    }
    case 'call': {
      const given: Quantity[] = [];
      for (const argument of expression.arguments) {
        const value = evaluate(argument, quantityOf, problems);
        if (value) given.push(value);
      }
      if (given.length < expression.arguments.length) return undefined;
      return settle(FUNCTIONS[expression.function](given), expression.range, problems);
    }
  }
}

/** Angles are ratios: one is kept only where it stands alone. */
export function withAngleAlone(dimension: Dimension): Dimension {
  if (dimension[4] === 0 || isAngle(dimension)) return dimension;
  return [dimension[0], dimension[1], dimension[2], dimension[3], 0];
}

/** A result, or why there is none. */
type Worked = Quantity | { readonly wrong: ProblemCode; readonly message: string; readonly hint?: string };

function settle(worked: Worked, range: Range, problems: Problem[]): Quantity | undefined {
  if ('wrong' in worked) {
    const { wrong, message, hint } = worked;
    problems.push({ code: wrong, range, message, ...(hint && { hint }) });
    return undefined;
  }
  if (!inRange(worked.value)) {
    const message = `This comes to ${full(worked.value)} in SI; values lie between 1e-30 and 1e30.`;
    problems.push({ code: 'number-out-of-range', range, message });
    return undefined;
  }
  return worked;
}

function combine(operator: BinaryOperator, left: Quantity, right: Quantity): Worked {
  switch (operator) {
    case '+':
    case '-': {
      if (!sameDimension(left.dimension, right.dimension)) return cannotAdd(operator, left.dimension, right.dimension);
      const value = operator === '+' ? left.value + right.value : left.value - right.value;
      return { value, dimension: isAngle(left.dimension) ? left.dimension : right.dimension };
    }
    case '*':
      return { value: left.value * right.value, dimension: product(left.dimension, right.dimension, 1) };
    case '/':
      if (right.value === 0) return { wrong: 'domain', message: 'The divisor is zero here.' };
      return { value: left.value / right.value, dimension: product(left.dimension, right.dimension, -1) };
    case '^':
      return raise(left, right);
  }
}

function cannotAdd(operator: '+' | '-', left: Dimension, right: Dimension): Worked {
  const [first, link, second] =
    operator === '+' ? [left, 'cannot be added to', right] : [right, 'cannot be subtracted from', left];
  const subject = tradeUnit(first) || 'A plain number';
  const object = tradeUnit(second) || 'a plain number';
  const kinds = `the one is ${dimensionName(first)}, the other ${dimensionName(second)}`;
  return { wrong: 'wrong-dimension', message: `${subject} ${link} ${object} here: ${kinds}.` };
}

function product(a: Dimension, b: Dimension, sense: 1 | -1): Dimension {
  return withAngleAlone([
    a[0] + sense * b[0],
    a[1] + sense * b[1],
    a[2] + sense * b[2],
    a[3] + sense * b[3],
    a[4] + sense * b[4],
  ]);
}

/** Powers of a quantity stay halves, thirds, quarters and sixths, so that dimensions compare exactly. */
const FINEST_POWER = 12;

function raise(base: Quantity, exponent: Quantity): Worked {
  if (!isRatio(exponent.dimension)) {
    return {
      wrong: 'wrong-dimension',
      message: `A power is a plain number; here it is ${dimensionName(exponent.dimension)}.`,
    };
  }
  const power = exponent.value;
  if (base.value === 0 && power < 0) return { wrong: 'domain', message: 'Zero has no negative power.' };
  if (base.value < 0 && !Number.isInteger(power)) {
    return { wrong: 'domain', message: `A negative value has no power of ${full(power)}.` };
  }
  const value = base.value ** power;
  if (isRatio(base.dimension)) return { value, dimension: DIMENSIONLESS };
  const parts = power * FINEST_POWER;
  if (Math.abs(parts - Math.round(parts)) > 1e-9) {
    const message = `${capital(dimensionName(base.dimension))} cannot be raised to the power ${full(power)}: no unit has that power.`;
    return { wrong: 'wrong-dimension', message };
  }
  const [length, mass, time, temperature] = base.dimension;
  return {
    value,
    dimension: [snap(length * power), snap(mass * power), snap(time * power), snap(temperature * power), 0],
  };
}

function snap(exponent: number): number {
  return Math.round(exponent * FINEST_POWER) / FINEST_POWER + 0; // + 0 turns -0 into 0
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

const FUNCTIONS: Readonly<Record<FunctionName, (given: readonly Quantity[]) => Worked>> = {
  min: given => extreme('min', Math.min, given),
  max: given => extreme('max', Math.max, given),
  abs: ([of]) => ({ value: Math.abs(of!.value), dimension: of!.dimension }),
  sqrt: ([of]) => {
    if (of!.value < 0)
      return { wrong: 'domain', message: `The square root of a negative value: ${full(of!.value)} in SI.` };
    const [length, mass, time, temperature] = of!.dimension;
    return { value: Math.sqrt(of!.value), dimension: [length / 2, mass / 2, time / 2, temperature / 2, 0] };
  },
  ceil: ([of]) => whole('ceil', Math.ceil, of!),
  floor: ([of]) => whole('floor', Math.floor, of!),
  sin: ([of]) => trigonometric('sin', sine, of!),
  cos: ([of]) => trigonometric('cos', angle => sine(angle + Math.PI / 2), of!),
  tan: ([of]) => {
    const cosine = sine((of?.value ?? 0) + Math.PI / 2);
    if (cosine === 0) return { wrong: 'domain', message: 'The tangent of a right angle has no value.' };
    return trigonometric('tan', angle => sine(angle) / cosine, of!);
  },
};

function extreme(name: string, choose: (...values: number[]) => number, given: readonly Quantity[]): Worked {
  const dimension = given[0]!.dimension;
  const other = given.find(quantity => !sameDimension(quantity.dimension, dimension));
  if (other) {
    const message = `\`${name}\` compares like with like; here are ${dimensionName(dimension)} and ${dimensionName(other.dimension)}.`;
    return { wrong: 'wrong-dimension', message };
  }
  return { value: choose(...given.map(quantity => quantity.value)), dimension };
}

/** Noise in the last place must not lift 3 to 4: `ceil(0.6 m / 0.2 m)`. */
function whole(name: string, round: (value: number) => number, of: Quantity): Worked {
  if (!isRatio(of.dimension)) {
    const unit = tradeUnit(of.dimension);
    const message = `\`${name}\` takes a plain number; here it is ${dimensionName(of.dimension)}.`;
    return {
      wrong: 'wrong-dimension',
      message,
      hint: `Divide by a unit first: \`${name}(… / (1 ${unit})) * 1 ${unit}\`.`,
    };
  }
  return { value: round(withoutNoise(of.value)), dimension: DIMENSIONLESS };
}

function trigonometric(name: string, work: (angle: number) => number, of: Quantity): Worked {
  if (!isRatio(of.dimension)) {
    return {
      wrong: 'wrong-dimension',
      message: `\`${name}\` takes an angle; here it is ${dimensionName(of.dimension)}.`,
    };
  }
  return { value: work(of.value), dimension: DIMENSIONLESS };
}

/** The sine, exactly zero and ±1 at the multiples of a right angle, as far as a double can name them. */
function sine(angle: number): number {
  const quarters = angle / (Math.PI / 2);
  const nearest = Math.round(quarters);
  if (Math.abs(quarters - nearest) > 4 * Number.EPSILON * Math.max(1, Math.abs(nearest))) return Math.sin(angle);
  return [0, 1, 0, -1][((nearest % 4) + 4) % 4]!;
}
