// A worked question as an answer: the value in words, its place, the limit spelt out, met or not, and the two checks that
// stand behind it. A number that the checks do not bear out is not shown.

import type { Under, Value } from '../language/syntax.ts';
import { alternativesUnder } from '../model/combinations.ts';
import { operandsOf } from '../model/operands.ts';
import type { ResolvedMeasure } from '../model/question.ts';
import { dimensionOf, isMovement } from '../model/questions.ts';
import type { Report } from '../model/report.ts';
import { type Span, spansAt } from '../model/spans.ts';
import type { Structure } from '../model/structure.ts';
import { LENGTH, sameDimension } from '../quantity/dimension.ts';
import { dimensionName, siUnit } from '../quantity/dimension-names.ts';
import type { DisplayKind, DisplayUnits } from '../quantity/display.ts';
import { significant } from '../quantity/number.ts';
import type { Quantity } from '../quantity/quantity.ts';
import type { Range } from '../quantity/range.ts';
import { type Reversal, reversalInWords } from './one-sided.ts';
import { answerInWords, displayKind, show } from './phrases.ts';
import type { Alternative, Answer, AnswerPlace, Check } from './result.ts';
import { checkOf, isBorneOut, MOST_DIFFERENCE } from './second-road.ts';
import type { Question, Series } from './series.ts';
import { stiffnessFactor } from './stiffness.ts';
import type { StructureState } from './structure-state.ts';
import { isIndependent, isWanted } from './wanted.ts';
import { wantedAnswer } from './wanted-answer.ts';

export interface AnswerInputs {
  readonly question: Question;
  readonly structureIndex: number;
  readonly state: StructureState;
  readonly series: Series | undefined;
  readonly units: DisplayUnits;
  readonly wordsOf: (range: Range) => string;
  /** Reads the limit; `span` answers for the word in it. */
  readonly limitOf: (value: Value, span: (range: Range) => Quantity | undefined) => Quantity | undefined;
  readonly report: Report;
}

/** A limit is met by an answer that exceeds it by less than this part: rounding must not fail what is exactly at it. */
const AT_THE_LIMIT = 1e-9;

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

/** The alternative, where it was chosen among others, and the spans that are loaded, where they were. */
function governingInWords({ acting, governing, loaded }: Series): string | null {
  if (acting.length < 2 && loaded === undefined) return null;
  return acting[governing]?.text ?? loaded ?? null;
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

// Words

function inWords({ state, units }: AnswerInputs, series: Series): string {
  const value = series.values[series.governing]!;
  const structure = state.structure();
  if (series.measure === undefined || structure === undefined) return show(value, units, kindOf(series, value));
  return answerInWords(series.measure, value, units, structure, placeInMember(series));
}

/** How a value of the question is shown: as its measure, or as a movement where it is a length worked from movements. */
function kindOf({ measure, taken }: Series, { dimension }: Quantity): DisplayKind | undefined {
  if (measure !== undefined) return displayKind(measure);
  const moves = taken.some(({ measure: { kind } }) => isMovement(kind));
  return moves && sameDimension(dimension, LENGTH) ? 'deflection' : undefined;
}

function placeInMember(series: Series): { readonly member: number; readonly distance: number } | undefined {
  const found = series.measured[series.governing]?.place;
  if (found !== undefined) return found;
  const { measure } = series;
  return measure !== undefined && 'at' in measure && measure.at.kind === 'along' ? measure.at : undefined;
}

function placeOf({ measure, measured, governing, solved }: Series): AnswerPlace | undefined {
  const place = measured[governing]?.place;
  // Only an extreme has a place to tell; what is asked at a place is told there.
  if (place === undefined || measure === undefined || solved === undefined || 'at' in measure) return undefined;
  const { structure } = solved.analysis;
  const member = structure.members[place.member]!;
  return { member: member.name, from: structure.points[member.legs[0]!.from]!.name, distance: place.distance };
}

function sidesInWords({ state, units }: AnswerInputs, series: Series): string | undefined {
  const sides = series.measured[series.governing]?.sides;
  const structure = state.structure();
  if (sides === undefined || series.measure === undefined || structure === undefined) return undefined;
  const { dimension } = series.values[series.governing]!;
  const words = sides.map(value =>
    answerInWords(series.measure!, { value, dimension }, units, structure, placeInMember(series)),
  );
  return `${words[0]} before, ${words[1]} behind`;
}

// The limit

interface Limit {
  readonly quantity: Quantity;
  readonly display: string;
}

function readLimit(inputs: AnswerInputs, limit: Value, series: Series, value: Quantity): Limit | undefined {
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

// Judgement

/** Beside the least I there is nothing left to judge. */
function unjudged(limit: Limit | undefined): Judgement {
  return {
    limit: limit?.quantity,
    limitDisplay: limit?.display,
    utilisation: undefined,
    status: 'none',
    stiffnessFactor: undefined,
  };
}

function refuseWanted({ question, report }: AnswerInputs, why: string, hint: string): void {
  report.error('bad-question', question.name.range, `${question.name.text} is withheld: ${why}.`, { hint });
}

type Judgement = Pick<Answer, 'limit' | 'limitDisplay' | 'utilisation' | 'status' | 'stiffnessFactor'>;

function judge(
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

// Checks

interface Checked {
  readonly check: Check;
  /** The question's values, with what is rounding and nothing else taken as nothing. */
  readonly series: Series;
}

/** The worst of the checks of all that took part; undefined, and reported, where they do not bear the answer out. */
function checked(inputs: AnswerInputs, series: Series): Checked | undefined {
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
