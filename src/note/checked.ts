// The checks behind a question's values: what they do not bear out is withheld, and told.
import { significant } from '../quantity/number.ts';
import type { AnswerInputs } from './answer-inputs.ts';
import { type Reversal, reversalInWords } from './one-sided.ts';
import type { Check } from './result.ts';
import { checkOf, isBorneOut, MOST_DIFFERENCE } from './second-road.ts';
import type { Series } from './series.ts';

export interface Checked {
  readonly check: Check;
  /** The question's values, with what is rounding and nothing else taken as nothing. */
  readonly series: Series;
}

/** The worst of the checks of all that took part; undefined, and reported, where they do not bear the answer out. */
export function checked(inputs: AnswerInputs, series: Series): Checked | undefined {
  if (series.reversal !== undefined) return refuseReversed(inputs, series.reversal);
  let [difference, residual, energy, rounding] = [0, 0, 0, 0];
  for (const taken of series.taken) {
    const one = checkOf(taken);
    difference = Math.max(difference, one.difference);
    residual = Math.max(residual, one.residual);
    energy = Math.max(energy, one.energy);
    rounding = Math.max(rounding, one.rounding);
  }
  const check = { difference, residual, energy };
  if (isBorneOut(check)) return { check, series: withoutRounding(series, rounding) };
  const { question, report } = inputs;
  report.error('answer-withheld', question.name.range, `${question.name.text} is withheld: ${whyWithheld(check)}.`, {
    hint: 'very stiff and very soft parts together leave too few digits: look for a stiffness that is out by a power of ten',
  });
  return undefined;
}

function refuseReversed({ question, units, report }: AnswerInputs, reversal: Reversal): undefined {
  const message = `${question.name.text} is withheld: ${reversalInWords(reversal, units)}.`;
  report.error('force-reversed', question.name.range, message, {
    hint: 'ask under alternatives that do not reverse it',
    related: [{ range: reversal.range, message: 'What is assumed stands here.' }],
  });
  return undefined;
}

function whyWithheld({ difference, residual, energy }: Check): string {
  if (difference === Infinity) return 'the second method finds no answer to hold it against';
  const accepted = `and at most ${MOST_DIFFERENCE} is accepted`;
  if (difference > MOST_DIFFERENCE) return `the two methods differ by ${significant(difference, 2)} of it, ${accepted}`;
  if (residual <= MOST_DIFFERENCE && energy > MOST_DIFFERENCE)
    return `the work of loads and ground and that of the internal forces differ by ${significant(energy, 2)} of it, ${accepted}`;
  return Number.isFinite(residual)
    ? `equilibrium leaves ${significant(residual, 2)} of the loads, ${accepted}`
    : 'equilibrium cannot be shown';
}

function withoutRounding(series: Series, rounding: number): Series {
  const { value, dimension } = series.values[series.governing]!;
  if (series.measure === undefined || value === 0 || Math.abs(value) > rounding) return series;
  return { ...series, values: series.values.with(series.governing, { value: 0, dimension }) };
}
