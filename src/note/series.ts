// A question worked one alternative at a time: a measure, or an expression of measures, earlier results and values. Never
// a mixture of two alternatives.
import type { Measure, Operand, StatementOf, Under } from '../language/syntax.ts';
import { measure as takeMeasure } from '../mechanics/index.ts';
import { type AlternativeModel, alternativesUnder } from '../model/combinations.ts';
import type { Figures } from '../model/figures.ts';
import type { Definition } from '../model/names.ts';
import { operandsOf } from '../model/operands.ts';
import type { Measured, ResolvedMeasure, Seek } from '../model/question.ts';
import { dimensionOf, resolveMeasure } from '../model/questions.ts';
import type { Quantity } from '../quantity/quantity.ts';
import type { Range } from '../quantity/range.ts';
import type { Refusal } from './once.ts';
import type { Taken } from './second-road.ts';
import type { Solved } from './solved.ts';
import type { StructureState } from './structure-state.ts';

export type Question = StatementOf<'find' | 'require'>;

/** One value for each alternative, and which of them is the answer. */
export interface Series {
  readonly alternatives: readonly AlternativeModel[];
  readonly values: readonly Quantity[];
  readonly governing: number;
  /** Identifies the set of alternatives: two results mix well only where these agree. */
  readonly set: string;
  /** Where the question is one measure alone. */
  readonly measure: ResolvedMeasure | undefined;
  readonly measured: readonly Measured[];
  /** Every measure behind the governing value, those of earlier results included: what the checks are made on. */
  readonly taken: readonly Taken[];
  /** Whether anything was measured under a combination, so that there is something to say behind `under`. */
  readonly solved: Solved | undefined;
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
    // Without a measure of its own there is nothing that `under` could go for.
    if (measures.length === 0) return this.#ofResults(earlier as Series[], results);
    const own = this.#alternatives();
    if (own === undefined) return undefined;
    const resolved = this.#resolve(measures);
    const solved = state.solved(why => this.#refuse(why));
    if (resolved === undefined || solved === undefined || state.report.flawed) return undefined;
    if (own.some(({ cases }) => cases.some(name => state.report.flawedCases.has(name)))) return undefined;
    const running = this.#running(own, earlier as Series[], results);
    if (running === undefined) return undefined;
    return this.#work(
      running,
      own,
      resolved,
      solved,
      (earlier as Series[]).flatMap(series => series.taken),
    );
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
  #running(
    own: readonly AlternativeModel[],
    earlier: readonly Series[],
    results: readonly { readonly definition: Definition; readonly range: Range }[],
  ): readonly AlternativeModel[] | undefined {
    let running = own;
    let from = 'its own combination';
    for (const [i, series] of earlier.entries()) {
      if (series.alternatives.length < 2) continue;
      const { name } = results[i]!.definition;
      if (running.length > 1 && setOf(running) !== series.set) {
        this.#inputs.state.report.error(
          'bad-question',
          results[i]!.range,
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

  #ofResults(
    earlier: readonly Series[],
    results: readonly { readonly definition: Definition; readonly range: Range }[],
  ): Series | undefined {
    const running = this.#running([], earlier, results);
    if (running === undefined) return undefined;
    const count = Math.max(1, running.length);
    const values: Quantity[] = [];
    for (let i = 0; i < count; i++) {
      const value = this.#evaluate(i, () => undefined);
      if (value === undefined) return undefined;
      values.push(value);
    }
    return {
      alternatives: running,
      values,
      governing: this.#governing(values),
      set: setOf(running),
      measure: undefined,
      measured: [],
      taken: earlier.flatMap(series => series.taken),
      solved: earlier[0]?.solved,
    };
  }

  #work(
    running: readonly AlternativeModel[],
    own: readonly AlternativeModel[],
    resolved: ReadonlyMap<Measure, ResolvedMeasure>,
    solved: Solved,
    before: readonly Taken[],
  ): Series | undefined {
    const { what } = this.#question;
    const alone =
      what.kind === 'operand' && what.operand.kind === 'measure' ? resolved.get(what.operand.measure) : undefined;
    const values: Quantity[] = [];
    const measured: Measured[] = [];
    const taken: Taken[][] = [];
    for (const [i, alternative] of running.entries()) {
      const { factors } = own.length > 1 ? alternative : own[0]!;
      const here: Taken[] = [];
      taken.push(here);
      const value = this.#evaluate(i, asked => {
        const measure = resolved.get(asked)!;
        const found = takeMeasure(
          solved.analysis.structure,
          solved.solution(factors),
          measure,
          alone === undefined ? 'size' : this.#seek(),
        );
        measured.push(found);
        here.push({ measure, place: found.place, value: found.value, factors, solved });
        return { value: found.value, dimension: dimensionOf(asked) };
      });
      if (value === undefined) return undefined;
      values.push(value);
    }
    const governing = this.#governing(values);
    return {
      alternatives: running,
      values,
      governing,
      set: setOf(running),
      measure: alone,
      measured: alone === undefined ? [] : measured,
      taken: [...before, ...taken[governing]!],
      solved,
    };
  }

  #evaluate(index: number, measure: (measure: Measure) => Quantity | undefined): Quantity | undefined {
    const figures = this.#inputs.figures({
      measure,
      result: (definition, range) => {
        const series = this.#inputs.seriesOf(definition, range);
        return series?.values[series.values.length > 1 ? index : 0];
      },
    });
    return figures.quantity(this.#question.what);
  }

  /** Within one alternative, where a measure looks along a member. */
  #seek(): Seek {
    return this.#question.kind === 'require' && this.#question.comparison === '>=' ? 'least' : 'size';
  }

  /** Among alternatives: the least for `>=`, the greatest for a reaction with `<=`, otherwise the largest in size; the first among equals. */
  #governing(values: readonly Quantity[]): number {
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

function setOf(alternatives: readonly AlternativeModel[]): string {
  return alternatives.map(({ text }) => text).join('\n');
}
