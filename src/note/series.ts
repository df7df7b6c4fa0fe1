// A question worked one alternative at a time: a measure, or an expression of measures, earlier results and values. Never
// a mixture of two alternatives, nor of two sets of loaded spans where loads are patterned.
import type { Measure, Operand, StatementOf, Under } from '../language/syntax.ts';
import { combine, measure as takeMeasure, worstPatterns } from '../mechanics/index.ts';
import { type AlternativeModel, alternativesUnder } from '../model/combinations.ts';
import type { Figures } from '../model/figures.ts';
import type { Definition } from '../model/names.ts';
import { operandsOf } from '../model/operands.ts';
import { spansUnder } from '../model/patterns.ts';
import type { Measured, ResolvedMeasure, Seek } from '../model/question.ts';
import { dimensionOf, resolveMeasure } from '../model/questions.ts';
import type { Quantity } from '../quantity/quantity.ts';
import type { Range } from '../quantity/range.ts';
import { isLinear } from './linear.ts';
import type { Refusal } from './once.ts';
import { type Reversal, reversalsUnder } from './one-sided.ts';
import {
  allSets,
  loading,
  type Pattern,
  type PatternSpan,
  sameSpans,
  withPattern,
  wordsOfPattern,
} from './patterns.ts';
import type { Taken } from './second-road.ts';
import type { Solved } from './solved.ts';
import type { StructureState } from './structure-state.ts';

export type Question = StatementOf<'find' | 'require'>;

/** One value for each alternative, and which of them is the answer. */
export interface Series {
  readonly alternatives: readonly AlternativeModel[];
  /** The alternatives as they were worked: of patterned loads, those on the spans that are worst under each. */
  readonly acting: readonly AlternativeModel[];
  readonly values: readonly Quantity[];
  readonly governing: number;
  /** The spans that are loaded under the governing alternative, `live on A–B, C–D`; undefined where no load is patterned. */
  readonly loaded: string | undefined;
  /** Identifies the set of alternatives: two results mix well only where these agree. */
  readonly set: string;
  /** Where the question is one measure alone. */
  readonly measure: ResolvedMeasure | undefined;
  readonly measured: readonly Measured[];
  /** Every measure behind the governing value, those of earlier results included: what the checks are made on. */
  readonly taken: readonly Taken[];
  /** A force that is assumed to act one way, and that an alternative behind a value reverses; the most of several. */
  readonly reversal: Reversal | undefined;
  /** Whether anything was measured under a combination, so that there is something to say behind `under`. */
  readonly solved: Solved | undefined;
  /** For a later question: the spans of patterned loads under an alternative, and the value with some of them loaded. */
  readonly spansUnder: (index: number) => readonly PatternSpan[];
  readonly at: (index: number, pattern: Pattern | undefined) => Worked | undefined;
  /** Whether the value under an alternative is linear in what its spans bear, beside a fixed part. */
  readonly isLinear: (index: number) => boolean;
}

/** The question under one alternative and one set of loaded spans. */
export interface Worked {
  readonly value: Quantity;
  readonly taken: readonly Taken[];
  readonly measured: Measured | undefined;
}

export interface SeriesInputs {
  readonly state: StructureState;
  /** The series of an earlier result, of this or of another structure. */
  readonly seriesOf: (definition: Definition, range: Range) => Series | undefined;
  readonly figures: (frame: {
    readonly measure: (measure: Measure) => Quantity | undefined;
    readonly result: (definition: Definition, range: Range) => Quantity | undefined;
  }) => Figures;
  readonly plain: Figures;
  /** Whether what stands behind `under` names a combination or a case. */
  readonly isDefined: (under: Under | undefined) => boolean;
  readonly resultNamed: (operand: Operand) => Definition | undefined;
}

export function seriesOf(question: Question, inputs: SeriesInputs): Series | undefined {
  return new SeriesReader(question, inputs).read();
}

class SeriesReader {
  readonly #question: Question;
  readonly #inputs: SeriesInputs;
  readonly #spansKnown = new Map<number, readonly PatternSpan[]>();

  constructor(question: Question, inputs: SeriesInputs) {
    this.#question = question;
    this.#inputs = inputs;
  }

  read(): Series | undefined {
    const { state } = this.#inputs;
    const { what } = this.#question;
    const operands = operandsOf(what);
    const measures = operands.flatMap(operand => (operand.kind === 'measure' ? [operand.measure] : []));
    const results = operands.flatMap(operand => {
      const definition = this.#inputs.resultNamed(operand);
      return definition === undefined ? [] : [{ definition, range: operand.range }];
    });
    const earlier = results.map(({ definition, range }) => this.#inputs.seriesOf(definition, range));
    if (earlier.some(series => series === undefined)) return undefined;
    const before = (earlier as Series[]).map((series, i) => ({ series, ...results[i]! }));
    // Without a measure of its own there is nothing that `under` could go for.
    if (measures.length === 0) {
      const running = this.#running([], before);
      return running === undefined ? undefined : this.#work({ running, own: undefined, resolved: new Map(), before });
    }
    const own = this.#alternatives();
    if (own === undefined) return undefined;
    const resolved = this.#resolve(measures);
    const solved = state.solved(why => this.#refuse(why)) ?? state.trial;
    if (resolved === undefined || solved === undefined || state.report.flawed) return undefined;
    if (own.some(({ cases }) => cases.some(name => state.report.flawedCases.has(name)))) return undefined;
    const running = this.#running(own, before);
    return running === undefined
      ? undefined
      : this.#work({ running, own: { alternatives: own, solved }, resolved, before });
  }

  /** The alternatives that `under` asks for; an empty list is never returned. */
  #alternatives(): readonly AlternativeModel[] | undefined {
    const { state } = this.#inputs;
    if (state.report.flawed) return undefined;
    const asked = alternativesUnder(
      this.#question.under,
      state.combinations(why => this.#refuse(why)),
    );
    if (state.report.flawed) return undefined;
    if ('problem' in asked) {
      // A name that nothing defines was told, or stands in a line that could not be read, which was told too.
      if (!this.#inputs.isDefined(this.#question.under)) return undefined;
      const range = this.#question.under?.range ?? this.#question.what.range;
      state.report.error('bad-question', range, asked.problem, { hint: asked.hint });
      return undefined;
    }
    return asked.sound && asked.alternatives.length > 0 ? asked.alternatives : undefined;
  }

  #refuse(why: Refusal): void {
    const { name } = this.#question;
    const message = why === 'circle' ? 'depends on itself' : 'needs too many other values in a row';
    this.#inputs.state.report.error(
      why === 'circle' ? 'circular-value' : 'value-too-deep',
      name.range,
      `${name.text} ${message}.`,
    );
  }

  #resolve(measures: readonly Measure[]): ReadonlyMap<Measure, ResolvedMeasure> | undefined {
    const { state, plain } = this.#inputs;
    const geometry = state.geometry(why => this.#refuse(why));
    const structure = state.structure(why => this.#refuse(why));
    if (geometry === undefined || structure === undefined) return undefined;
    const resolved = new Map<Measure, ResolvedMeasure>();
    for (const measure of measures) {
      const found = resolveMeasure(measure, structure, geometry, plain, state.report);
      if (found === undefined) return undefined;
      resolved.set(measure, found);
    }
    return resolved;
  }

  /** The set of alternatives that the question runs over: its own, or those of the results in it; not two at once. */
  #running(own: readonly AlternativeModel[], before: readonly Earlier[]): readonly AlternativeModel[] | undefined {
    let running = own;
    let from = 'its own combination';
    for (const { series, definition, range } of before) {
      if (series.alternatives.length < 2) continue;
      const { name } = definition;
      if (running.length > 1 && setOf(running) !== series.set) {
        this.#inputs.state.report.error(
          'bad-question',
          range,
          `${name} has alternatives of another combination than ${from}: one expression cannot run over both.`,
          {
            hint: 'ask for the two in questions of their own, each with its limit',
          },
        );
        return undefined;
      }
      running = series.alternatives;
      from = name;
    }
    return running;
  }

  #work(job: Job): Series | undefined {
    const { running, own, before } = job;
    const worst: Worst[] = [];
    for (let index = 0; index < Math.max(1, running.length); index++) {
      const found = this.#worst(job, index);
      if (found === undefined) return undefined;
      worst.push(found);
    }
    const values = worst.map(({ worked }) => worked.value);
    const governing = this.#largest(values);
    const last: { index?: number; pattern?: Pattern; worked?: Worked | undefined } = {};
    return {
      alternatives: running,
      acting: running.map((alternative, index) => this.#acting(job, alternative, index, worst[index]!)),
      values,
      governing,
      loaded: wordsOfPattern(this.#spans(job, governing), worst[governing]!.pattern, this.#inputs.state),
      set: setOf(running),
      measure: this.#alone(job),
      measured: worst.flatMap(({ worked }) => worked.measured ?? []),
      taken: worst[governing]!.worked.taken,
      reversal: this.#reversal(job),
      solved: own?.solved ?? before[0]?.series.solved,
      spansUnder: index => this.#spans(job, index),
      at: (index, pattern) => {
        if (pattern === undefined || this.#spans(job, index).length === 0) return worst[index]!.worked;
        // A later question asks for one set of spans as often as it names this result.
        if (last.index !== index || last.pattern !== pattern)
          Object.assign(last, { index, pattern, worked: this.#worked(job, index, pattern) });
        return last.worked;
      },
      isLinear: index => this.#isLinear(job, index),
    };
  }

  #reversal({ own, before }: Job): Reversal | undefined {
    const structure = this.#inputs.state.structure();
    const mine =
      own === undefined || structure === undefined ? [] : reversalsUnder(own.solved, structure, own.alternatives);
    return [...mine, ...before.flatMap(({ series }) => series.reversal ?? [])].sort((a, b) => b.force - a.force)[0];
  }

  #acting(job: Job, alternative: AlternativeModel, index: number, { pattern }: Worst): AlternativeModel {
    const { state } = this.#inputs;
    const loaded = wordsOfPattern(this.#spans(job, index), pattern, state);
    if (loaded === undefined) return alternative;
    const { text } = alternative;
    return {
      ...alternative,
      // Of a case alone the name says no more than its spans do.
      text: alternative.cases.length === 1 && text === alternative.cases[0] ? loaded : `${text}, ${loaded}`,
      factors: this.#alone(job) === undefined ? alternative.factors : withPattern(alternative.factors, state, pattern),
    };
  }

  /** Under one alternative, with the worst set of spans loaded. */
  #worst(job: Job, index: number): Worst | undefined {
    const patterns = this.#patterns(job, index);
    if (patterns === undefined) return undefined;
    const found: Worst[] = [];
    for (const pattern of patterns) {
      const worked = this.#worked(job, index, pattern);
      if (worked === undefined) return undefined;
      found.push({ pattern, worked });
    }
    return found[this.#largest(found.map(({ worked }) => worked.value))];
  }

  /** The sets of spans among which the worst is; undefined, and reported, where there are too many. */
  #patterns(job: Job, index: number): readonly (Pattern | undefined)[] | undefined {
    const spans = this.#spans(job, index);
    if (spans.length === 0) return [undefined];
    const { state } = this.#inputs;
    const measure = this.#alone(job);
    if (job.own !== undefined && measure !== undefined && !(measure.kind === 'stress' && this.#seek() === 'least')) {
      const { analysis } = job.own.solved;
      return worstPatterns(analysis, factorsOf(job, index), measure).map(factors =>
        loading(spans.filter(span => span.state === state && factors[span.case] !== 0)),
      );
    }
    if (this.#isLinear(job, index)) return this.#adverse(job, index, spans);
    const sets = allSets(spans, Math.max(1, job.running.length));
    if (sets === undefined) {
      state.report.error(
        'too-large',
        this.#question.what.range,
        `${this.#question.name.text} would have to be tried with every set of ${spans.length} loaded spans: they are too many.`,
        { hint: 'ask for each measure in a question of its own, where no set need be tried' },
      );
    }
    return sets;
  }

  /** A linear expression has its largest and its least value with the spans loaded that add to it, and that take from it. */
  #adverse(job: Job, index: number, spans: readonly PatternSpan[]): readonly Pattern[] | undefined {
    const none = this.#worked(job, index, loading([]));
    const effects = spans.map(span => this.#worked(job, index, loading([span])));
    if (none === undefined || effects.some(effect => effect === undefined)) return undefined;
    const added = effects.map(effect => effect!.value.value - none.value.value);
    const noise = NEGLIGIBLE * Math.max(Math.abs(none.value.value), ...added.map(Math.abs));
    return [1, -1].map(sense => loading(spans.filter((_, i) => sense * added[i]! > noise)));
  }

  #isLinear(job: Job, index: number): boolean {
    return isLinear(this.#question.what, operand => {
      if (operand.kind === 'measure') return this.#isLinearMeasure(job, index, job.resolved.get(operand.measure)!);
      const definition = this.#inputs.resultNamed(operand);
      if (definition === undefined) return 'fixed';
      const { series } = job.before.find(({ definition: other }) => other === definition)!;
      const own = ownIndex(series, index);
      return series.spansUnder(own).length === 0 ? 'fixed' : series.isLinear(own) ? 'linear' : 'neither';
    });
  }

  /** A value at a place is linear in the loads, unless it jumps there: then the larger side is taken. */
  #isLinearMeasure(job: Job, index: number, asked: ResolvedMeasure): 'linear' | 'neither' {
    const { structure, cases } = job.own!.solved.analysis;
    if (asked.kind === 'reaction') return 'linear';
    if (!('at' in asked)) return 'neither';
    if (asked.kind === 'deflection' || asked.kind === 'sway') return 'linear';
    const factors = factorsOf(job, index);
    const smooth = ['moment', 'shear', 'force', 'sag'].includes(asked.kind);
    const jumps = cases.some(
      (solution, k) => factors[k] !== 0 && takeMeasure(structure, solution, asked, 'size').sides !== undefined,
    );
    return smooth && !jumps ? 'linear' : 'neither';
  }

  /** The spans whose loads may be left out under an alternative: of its own measures, and of the results in it. */
  #spans({ running, own, before }: Job, index: number): readonly PatternSpan[] {
    const { state } = this.#inputs;
    let spans = this.#spansKnown.get(index);
    if (spans === undefined) {
      const mine =
        own === undefined ? [] : spansUnder(own.solved.analysis.structure.cases, factorsOf({ running, own }, index));
      spans = sameSpans([
        ...mine.map(of => ({ state, case: of })),
        ...before.flatMap(({ series }) => series.spansUnder(ownIndex(series, index))),
      ]);
      this.#spansKnown.set(index, spans);
    }
    return spans;
  }

  #worked(job: Job, index: number, pattern: Pattern | undefined): Worked | undefined {
    const { state } = this.#inputs;
    const taken: Taken[] = [];
    const measured: Measured[] = [];
    const isAlone = this.#alone(job) !== undefined;
    const solution = job.own === undefined ? undefined : this.#solution(job.own.solved, factorsOf(job, index), pattern);
    const figures = this.#inputs.figures({
      measure: asked => {
        const { solved } = job.own!;
        const measure = job.resolved.get(asked)!;
        const found = takeMeasure(solved.analysis.structure, solution!, measure, isAlone ? this.#seek() : 'size');
        const factors = withPattern(factorsOf(job, index), state, pattern);
        measured.push(found);
        taken.push({ measure, place: found.place, value: found.value, factors, solved });
        return { value: found.value, dimension: dimensionOf(asked) };
      },
      result: (definition, range) => {
        const series = this.#inputs.seriesOf(definition, range);
        const worked = series?.at(ownIndex(series, index), pattern);
        if (worked !== undefined) taken.push(...worked.taken);
        return worked?.value;
      },
    });
    const value = figures.quantity(this.#question.what);
    return value === undefined ? undefined : { value, taken, measured: isAlone ? measured[0] : undefined };
  }

  /** Sets of spans that are only tried are not kept. */
  #solution(solved: Solved, factors: readonly number[], pattern: Pattern | undefined) {
    return pattern === undefined
      ? solved.solution(factors)
      : combine(solved.analysis, withPattern(factors, this.#inputs.state, pattern));
  }

  /** The measure that the question is, where it is one alone. */
  #alone({ resolved }: Job): ResolvedMeasure | undefined {
    const { what } = this.#question;
    return what.kind === 'operand' && what.operand.kind === 'measure' ? resolved.get(what.operand.measure) : undefined;
  }

  /** Within one alternative, where a measure looks along a member. */
  #seek(): Seek {
    return this.#question.kind === 'require' && this.#question.comparison === '>=' ? 'least' : 'size';
  }

  /** Among alternatives or sets of spans: the least for `>=`, the greatest for a reaction with `<=`, otherwise the largest in size; the first among equals. */
  #largest(values: readonly Quantity[]): number {
    const { what } = this.#question;
    const isReaction =
      what.kind === 'operand' && what.operand.kind === 'measure' && what.operand.measure.kind === 'reaction';
    let [best, rank] = [0, -Infinity];
    for (const [i, { value }] of values.entries()) {
      const score =
        this.#seek() === 'least' ? -value : this.#question.kind === 'require' && isReaction ? value : Math.abs(value);
      if (score > rank + 1e-12 * Math.abs(rank) || rank === -Infinity) [best, rank] = [i, score];
    }
    return best;
  }
}

/** What a question is worked from. */
interface Job {
  /** The alternatives it runs over; none where nothing in it has any. */
  readonly running: readonly AlternativeModel[];
  /** What its own measures are taken under. */
  readonly own: { readonly alternatives: readonly AlternativeModel[]; readonly solved: Solved } | undefined;
  readonly resolved: ReadonlyMap<Measure, ResolvedMeasure>;
  readonly before: readonly Earlier[];
}

/** A result that the question names. */
interface Earlier {
  readonly series: Series;
  readonly definition: Definition;
  readonly range: Range;
}

interface Worst {
  readonly pattern: Pattern | undefined;
  readonly worked: Worked;
}

/** An effect that is smaller beside the largest is none. */
const NEGLIGIBLE = 1e-12;

/** By case, of the question's own combination; all spans loaded. */
function factorsOf({ running, own }: Pick<Job, 'running' | 'own'>, index: number): readonly number[] {
  const [only, another] = own?.alternatives ?? [];
  return (another === undefined ? only : running[index])?.factors ?? [];
}

/** The alternative of an earlier result that goes with one of a question. */
function ownIndex(series: Series, index: number): number {
  return series.values.length > 1 ? index : 0;
}

function setOf(alternatives: readonly AlternativeModel[]): string {
  return alternatives.map(({ text }) => text).join('\n');
}
