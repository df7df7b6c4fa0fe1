// A worked question as an answer: the value in words, its place, the limit spelt out, met or not, and the two checks that
// stand behind it. A number that the checks do not bear out is not shown.

import type { Under, Value } from '../language/syntax.ts';
import { alternativesUnder } from '../model/combinations.ts';
import { operandsOf } from '../model/operands.ts';
import type { ResolvedMeasure } from '../model/question.ts';
import { dimensionOf } from '../model/questions.ts';
import { siUnit } from '../quantity/dimension-names.ts';
import type { Range } from '../quantity/range.ts';
import type { AnswerInputs } from './answer-inputs.ts';
import { governingInWords, inWords, placeOf, sidesInWords } from './answer-words.ts';
import { checked } from './checked.ts';
import { judge, unjudged } from './judgement.ts';
import { readLimit } from './limit.ts';
import type { Alternative, Answer } from './result.ts';
import type { Series } from './series.ts';
import { isIndependent, isWanted } from './wanted.ts';
import { wantedAnswer } from './wanted-answer.ts';

export function answerTo(inputs: AnswerInputs): Answer {
  const { question } = inputs;
  const common = {
    structure: inputs.structureIndex,
    name: question.name.text,
    kind: question.kind,
    measure: inputs.wordsOf(question.what.range),
    under: underInWords(inputs),
    comparison: question.kind === 'require' ? question.comparison : undefined,
    source: question.source?.text,
    range: question.range,
    nameRange: question.name.range,
  } as const;
  const borneOut = inputs.series === undefined ? undefined : checked(inputs, inputs.series);
  if (borneOut === undefined) return { ...common, ...WITHHELD, unit: unitOf(question.what) };
  const { series, check } = borneOut;
  const value = series.values[series.governing]!;
  const limit = question.kind === 'require' ? readLimit(inputs, question.limit, series, value) : undefined;
  const isTrial = isWanted(series);
  const wanted =
    isTrial && !isIndependent(series)
      ? wantedAnswer(question, series, limit?.quantity.value, inWords(inputs, series), inputs.units)
      : undefined;
  if (wanted?.kind === 'none') {
    refuseWanted(inputs, wanted.why, wanted.hint);
    return { ...common, ...WITHHELD, unit: unitOf(question.what) };
  }
  return {
    ...common,
    governing: governingInWords(series),
    loaded: series.loaded,
    quantity: value,
    unit: siUnit(value.dimension),
    display: inWords(inputs, series),
    place: placeOf(series),
    sides: sidesInWords(inputs, series),
    // A drawing would show the movements of the trial.
    asked: isTrial ? undefined : asked(series),
    check,
    ...(wanted === undefined ? judge(inputs, series, value, limit) : unjudged(limit)),
    ...wanted,
    kind: question.kind,
  };
}

const WITHHELD = {
  governing: null,
  loaded: undefined,
  quantity: undefined,
  display: '',
  place: undefined,
  sides: undefined,
  asked: undefined,
  limit: undefined,
  limitDisplay: undefined,
  utilisation: undefined,
  status: 'none',
  stiffnessFactor: undefined,
  check: undefined,
} as const;

/** The unit of an answer that is withheld: that of its measure, where it is one. */
function unitOf(what: Value): string {
  return what.kind === 'operand' && what.operand.kind === 'measure' ? siUnit(dimensionOf(what.operand.measure)) : '';
}

/** What `under` says, or what is meant where it is left out; null for a question that measures nothing of its own. */
function underInWords({ question, state, wordsOf }: AnswerInputs): string | null {
  if (question.under !== undefined) return underWords(question.under, wordsOf);
  if (!operandsOf(question.what).some(({ kind }) => kind === 'measure')) return null;
  const meant = alternativesUnder(undefined, state.combinations());
  return 'problem' in meant ? null : meant.name;
}

function underWords(under: Under, wordsOf: (range: Range) => string): string {
  if (under.kind === 'all') return 'all';
  return under.label === undefined ? under.name.text : `${under.name.text} (${wordsOf(under.label.range)})`;
}

function asked(series: Series): { readonly measure: ResolvedMeasure; readonly alternative: Alternative } | undefined {
  const { measure, solved } = series;
  if (measure === undefined || solved === undefined) return undefined;
  const { label, text, factors } = series.acting[series.governing]!;
  return { measure, alternative: { label, text, factors, solution: () => solved.solution(factors) } };
}

function refuseWanted({ question, report }: AnswerInputs, why: string, hint: string): void {
  report.error('bad-question', question.name.range, `${question.name.text} is withheld: ${why}.`, { hint });
}
