// Sets of loaded spans: which of the spans of patterned loads bear their load, of one structure or of several at once.
import { type Analysis, combine, worstPatterns } from '../mechanics/index.ts';
import { loadedInWords, spansUnder } from '../model/patterns.ts';
import type { ResolvedMeasure } from '../model/question.ts';
import type { Alternative } from './result.ts';
import type { StructureState } from './structure-state.ts';

/** A span that may be loaded or not: a case of a structure. */
export interface PatternSpan {
  readonly state: StructureState;
  readonly case: number;
}

/** The spans that are loaded; all others of patterned loads are not. */
export type Pattern = ReadonlyMap<StructureState, ReadonlySet<number>>;

export function loading(spans: readonly PatternSpan[]): Pattern {
  const pattern = new Map<StructureState, Set<number>>();
  for (const { state, case: of } of spans) {
    const known = pattern.get(state) ?? new Set();
    pattern.set(state, known.add(of));
  }
  return pattern;
}

/** Factors by case of a structure, 0 for the spans that are not loaded. Without a pattern all are. */
export function withPattern(
  factors: readonly number[],
  state: StructureState,
  pattern: Pattern | undefined,
): readonly number[] {
  const cases = state.structure()?.cases;
  if (pattern === undefined || cases === undefined) return factors;
  const loaded = pattern.get(state);
  return factors.map((factor, k) => (cases[k]!.span === undefined || loaded?.has(k) ? factor : 0));
}

/** Each span once. */
export function sameSpans(spans: readonly PatternSpan[]): readonly PatternSpan[] {
  return spans.filter(
    (span, i) => spans.findIndex(({ state, case: of }) => state === span.state && of === span.case) === i,
  );
}

/** Past this many sets of spans, alternatives counted, trying them all takes more than a moment. */
const MOST_SETS = 2 ** 12;
/** As much work as that may be: sets, times the legs of the structures. */
const MOST_WORK = 2 ** 20;

/** Every set of the spans, none of them first; undefined where they are too many to be tried. */
export function allSets(spans: readonly PatternSpan[], alternatives: number): readonly Pattern[] | undefined {
  const count = 2 ** spans.length;
  let legs = 0;
  for (const state of new Set(spans.map(span => span.state)))
    for (const member of state.structure()?.members ?? []) legs += member.legs.length;
  if (count > MOST_SETS || count * alternatives * legs > MOST_WORK) return undefined;
  return Array.from({ length: count }, (_, set) => loading(spans.filter((_, i) => (set >> i) & 1)));
}

/** `live on A–B, C–D`; those of another structure with its name behind. Undefined where there are no spans. */
export function wordsOfPattern(
  spans: readonly PatternSpan[],
  pattern: Pattern | undefined,
  own: StructureState,
): string | undefined {
  if (spans.length === 0 || pattern === undefined) return undefined;
  const states = [...new Set(spans.map(({ state }) => state))];
  const words = states.flatMap(state => {
    const { cases, name } = state.structure()!;
    const indices = spans.flatMap(span => (span.state === state ? [span.case] : []));
    const behind = state === own ? '' : ` of ${name}`;
    return loadedInWords(cases, indices, index => pattern.get(state)?.has(index) === true).map(one => one + behind);
  });
  return words.join(', ');
}

/** An alternative with those sets of spans loaded among which the worst for a measure is; itself where nothing is patterned. */
export function worstAlternatives(
  analysis: Analysis,
  alternative: Alternative,
  measure: ResolvedMeasure,
): readonly Alternative[] {
  const spans = spansUnder(analysis.structure.cases, alternative.factors);
  if (spans.length === 0) return [alternative];
  return worstPatterns(analysis, alternative.factors, measure).map(factors => ({
    ...alternative,
    text: [alternative.text, ...loadedInWords(analysis.structure.cases, spans, k => factors[k] !== 0)].join(', '),
    factors,
    solution: () => combine(analysis, factors),
  }));
}
