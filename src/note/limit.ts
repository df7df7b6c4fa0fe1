// The limit of a requirement: its figure, the span that it speaks of, and both spelt out.
import type { Value } from '../language/syntax.ts';
import { operandsOf } from '../model/operands.ts';
import type { Report } from '../model/report.ts';
import { type Span, spansAt } from '../model/spans.ts';
import type { Structure } from '../model/structure.ts';
import { LENGTH, sameDimension } from '../quantity/dimension.ts';
import { dimensionName } from '../quantity/dimension-names.ts';
import type { Quantity } from '../quantity/quantity.ts';
import type { Range } from '../quantity/range.ts';
import type { AnswerInputs } from './answer-inputs.ts';
import { kindOf } from './answer-words.ts';
import { show } from './phrases.ts';
import type { Series } from './series.ts';

export interface Limit {
  readonly quantity: Quantity;
  readonly display: string;
}

/** Undefined where it cannot be had, or is of another kind than what is asked (reported). */
export function readLimit(inputs: AnswerInputs, limit: Value, series: Series, value: Quantity): Limit | undefined {
  const structure = inputs.state.structure();
  let used: Span | undefined;
  const quantity = inputs.limitOf(limit, range => {
    used = spanOf(series, structure, range, inputs.report);
    return used === undefined ? undefined : { value: used.length, dimension: LENGTH };
  });
  if (quantity === undefined) return undefined;
  if (!sameDimension(quantity.dimension, value.dimension)) {
    inputs.report.error(
      'wrong-dimension',
      limit.range,
      `The limit is ${dimensionName(quantity.dimension)}, and what is asked is ${dimensionName(value.dimension)}.`,
    );
    return undefined;
  }
  return { quantity, display: limitInWords(inputs, limit, quantity, used, series) };
}

/** The span through the place of a measure; undefined where there is none, or two meet (reported). */
export function spanOf(
  series: Series,
  structure: Structure | undefined,
  range: Range,
  report: Report,
): Span | undefined {
  const { measure } = series;
  if (structure === undefined) return undefined;
  if (measure === undefined || measure.kind === 'reaction') {
    report.error('bad-question', range, `${measure === undefined ? 'An expression' : 'A reaction'} has no span.`, {
      hint: 'say length(P, Q)',
    });
    return undefined;
  }
  const place = series.measured[series.governing]?.place;
  const at = place !== undefined ? ({ kind: 'along', ...place } as const) : 'at' in measure ? measure.at : undefined;
  if (at === undefined) return undefined;
  const spans = spansAt(structure, at, 'stretch' in measure ? measure.stretch : undefined);
  const [only, another] = spans;
  if (only !== undefined && another === undefined) return only;
  report.error(
    'bad-question',
    range,
    only === undefined
      ? 'No member runs through this place, so it has no span.'
      : `${spans.length === 2 ? 'Two spans meet' : 'Several spans meet'} at this place: ${spans.map(({ from, to }) => `${from}–${to}`).join(', ')}.`,
    {
      hint: only === undefined ? 'say length(P, Q)' : `say which is meant: length(${only.from}, ${only.to})`,
    },
  );
  return undefined;
}

function limitInWords(
  { wordsOf, units }: AnswerInputs,
  limit: Value,
  quantity: Quantity,
  span: Span | undefined,
  series: Series,
): string {
  const shown = show(quantity, units, kindOf(series, quantity));
  if (isPlain(limit)) return wordsOf(limit.range).replace('-', '−');
  const spanWords =
    span === undefined
      ? ''
      : `span ${span.from}–${span.to} ${show({ value: span.length, dimension: LENGTH }, units, 'length')}`;
  return `${replaceSpans(limit, spanWords, wordsOf)} = ${shown}`;
}

function isPlain(limit: Value): boolean {
  return limit.kind === 'operand' ? limit.operand.kind === 'quantity' : limit.kind === 'negate' && isPlain(limit.of);
}

/** The limit as written, with the bare word `span` spelt out. */
function replaceSpans(limit: Value, words: string, wordsOf: (range: Range) => string): string {
  const spans = operandsOf(limit).filter(({ kind }) => kind === 'span');
  let text = '';
  let from = limit.range.start;
  for (const { range } of spans) {
    text += `${wordsOf({ start: from, end: range.start })} ${words} `;
    from = range.end;
  }
  text += wordsOf({ start: from, end: limit.range.end });
  return (
    spans.length > 0
      ? text
          .replace(/^ /, '')
          .replace(/ \/(?=\S)/g, ' / ')
          .replace(/ {2,}/g, ' ')
          .replace(/\( /g, '(')
          .replace(/ ([,)])/g, '$1')
      : text
  ).trim();
}
