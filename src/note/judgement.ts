// Whether a requirement is met, by how much of its limit, and what an exceeded one asks for.
import { isMovement } from '../model/questions.ts';
import { significant } from '../quantity/number.ts';
import type { Quantity } from '../quantity/quantity.ts';
import type { AnswerInputs } from './answer-inputs.ts';
import { inWords, kindOf } from './answer-words.ts';
import type { Limit } from './limit.ts';
import { show } from './phrases.ts';
import type { Answer } from './result.ts';
import type { Series } from './series.ts';
import { stiffnessFactor } from './stiffness.ts';

/** A limit is met by an answer that exceeds it by less than this part: rounding must not fail what is exactly at it. */
const AT_THE_LIMIT = 1e-9;

/** Beside the least I there is nothing left to judge. */
export function unjudged(limit: Limit | undefined): Judgement {
  return {
    limit: limit?.quantity,
    limitDisplay: limit?.display,
    utilisation: undefined,
    status: 'none',
    stiffnessFactor: undefined,
  };
}

export type Judgement = Pick<Answer, 'limit' | 'limitDisplay' | 'utilisation' | 'status' | 'stiffnessFactor'>;

export function judge(
  inputs: AnswerInputs,
  series: Series,
  { value, dimension }: Quantity,
  limit: Limit | undefined,
): Judgement {
  const { question } = inputs;
  const none = {
    limit: undefined,
    limitDisplay: undefined,
    utilisation: undefined,
    status: 'none',
    stiffnessFactor: undefined,
  } as const;
  if (question.kind === 'find' || limit === undefined) return none;
  const most = limit.quantity.value;
  const shown = { limit: limit.quantity, limitDisplay: limit.display };
  if (question.comparison === '>=') {
    const met = value >= most - AT_THE_LIMIT * Math.abs(most);
    if (!met) reportBelow(inputs, series, limit);
    return { ...none, ...shown, status: met ? 'ok' : 'fails' };
  }
  const isReaction = series.measure?.kind === 'reaction';
  const compared = isReaction ? value : Math.abs(value);
  const met = compared <= most + AT_THE_LIMIT * Math.abs(most);
  const utilisation = most > 0 ? Math.abs(value) / most : undefined;
  const { measure, solved } = series;
  const factors = series.alternatives[series.governing]?.factors;
  const factor =
    met || measure === undefined || solved === undefined || factors === undefined
      ? undefined
      : stiffnessFactor(measure, value, most, factors, solved);
  if (!met) reportAbove(inputs, { value, dimension }, series, limit, factor);
  return { ...shown, utilisation, status: met ? 'ok' : 'fails', stiffnessFactor: factor };
}

function reportAbove(
  inputs: AnswerInputs,
  value: Quantity,
  series: Series,
  limit: Limit,
  factor: number | undefined,
): void {
  const { question } = inputs;
  const words = enoughDigits(inputs, value, limit.quantity, series);
  const movement = series.measure !== undefined && isMovement(series.measure.kind);
  const stiffness =
    factor !== undefined
      ? ` Stiffness must rise by a factor of ${significant(factor, 3)}.`
      : movement
        ? ' More stiffness alone does not mend it: what is imposed passes the limit by itself.'
        : '';
  inputs.report.warn(
    'limit-exceeded',
    question.name.range,
    `${question.name.text} is over its limit: ${words.value}, limit ${words.limit}${limitSource(limit, words.limit)}.${stiffness}`,
  );
}

function reportBelow(inputs: AnswerInputs, series: Series, limit: Limit): void {
  const { question } = inputs;
  const value = series.values[series.governing]!;
  const words = enoughDigits(inputs, value, limit.quantity, series);
  inputs.report.warn(
    'limit-exceeded',
    question.name.range,
    `${question.name.text} is under its limit: ${inWords(inputs, series)}, where at least ${words.limit} is asked.`,
  );
}

/** More digits where rounding to four would hide that a limit is not met. */
function enoughDigits(
  { units }: AnswerInputs,
  value: Quantity,
  limit: Quantity,
  series: Series,
): { readonly value: string; readonly limit: string } {
  const kind = kindOf(series, value);
  const size = { ...value, value: Math.abs(value.value) };
  const short = { value: show(size, units, kind), limit: show(limit, units, kind) };
  if (short.value !== short.limit || limit.value === 0) return short;
  const ratio = size.value / limit.value;
  return { value: `${short.value} (${significant((ratio - 1) * 100, 2)} % more)`, limit: short.limit };
}

function limitSource(limit: Limit, shown: string): string {
  const words = limit.display.replace(/ = .*$/, '');
  return words === shown || words === limit.display ? '' : ` (${words})`;
}
