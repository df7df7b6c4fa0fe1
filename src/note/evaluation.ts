// One evaluation of a note: its values, structures and questions, each worked out when it is first asked for, then told in
// the order of the text.
import type { Diagnostic } from '../language/diagnostic.ts';
import type { Item, Operand, Statement, StatementOf, Value } from '../language/syntax.ts';
import type { Analysis } from '../mechanics/index.ts';
import { Library } from '../model/library.ts';
import { usesInValue } from '../model/name-uses.ts';
import type { Definition, Names } from '../model/names.ts';
import { operandsOf } from '../model/operands.ts';
import { isMovement } from '../model/questions.ts';
import { Report } from '../model/report.ts';
import { belongsToStructure, type Scope, type Scopes } from '../model/scope.ts';
import { LENGTH, sameDimension } from '../quantity/dimension.ts';
import { siUnit } from '../quantity/dimension-names.ts';
import { type DisplayUnits, METRIC, readDisplay } from '../quantity/display.ts';
import type { Quantity } from '../quantity/quantity.ts';
import type { Range } from '../quantity/range.ts';
import { answerTo } from './answers.ts';
import { doubtsOn } from './doubts.ts';
import type { SourceSpan } from './fences.ts';
import { spanOf } from './limit.ts';
import type { SolvedStructures } from './memory.ts';
import { Descent, Once } from './once.ts';
import { show } from './phrases.ts';
import { remarksOn, unusedSharedCombinations } from './remarks.ts';
import type { Answer, Combination, NamedValue, ProseValue, StructureResult } from './result.ts';
import { type Question, type Series, seriesOf } from './series.ts';
import { StructureState } from './structure-state.ts';
import { refuseNamed, Values } from './values.ts';

export interface EvaluationInputs {
  readonly text: string;
  readonly scopes: Scopes;
  readonly names: Names;
  readonly solved: SolvedStructures;
  readonly wordsOf: (range: Range) => string;
}

export class NoteEvaluation {
  readonly #inputs: EvaluationInputs;
  /** What is wrong outside structures: values, materials, sections, prose. */
  readonly #report = new Report();
  readonly #descent = new Descent();
  readonly #values: Values;
  readonly #library: Library;
  readonly #states: readonly StructureState[];
  readonly #display = new Map<Scope, DisplayUnits>();
  readonly #series = new Map<Definition, Once<Series>>();
  readonly #answers = new Map<Definition, Answer>();

  constructor(inputs: EvaluationInputs) {
    this.#inputs = inputs;
    const { names, scopes } = inputs;
    this.#values = new Values(
      names,
      this.#report,
      {
        geometry: (scope, range) => this.#geometry(scope, range),
        supported: scope =>
          scope.statements.flatMap(statement => (statement.kind === 'support' ? [statement.point.text] : [])),
        result: (definition, range) => this.#result(definition, range),
        span: (definition, range) => this.#spanOfResult(definition, range),
      },
      this.#descent,
    );
    this.#library = new Library(
      names,
      definition => this.#values.figures(definition.scope, this.#report),
      (item: Item) => inputs.wordsOf(item.range),
      this.#report,
    );
    this.#values.stock = this.#library;
    this.#readDisplay();
    this.#states = scopes.structures.map(
      scope =>
        new StructureState({
          scope,
          head: scopes.head,
          names,
          values: this.#values,
          stock: this.#library,
          solved: inputs.solved,
          descent: this.#descent,
          wordsOf: inputs.wordsOf,
        }),
    );
  }

  run(): { readonly structures: StructureResult[]; readonly answers: Answer[]; readonly values: NamedValue[] } {
    const { names } = this.#inputs;
    const answers: Answer[] = [];
    const values: NamedValue[] = [];
    // Told in the order of the text; worked out in the order of what depends on what.
    for (const definition of inTextOrder(names.entries)) {
      if (definition.namespace === 'value') values.push(this.#namedValue(definition));
      if (definition.namespace === 'result') {
        const answer = this.#answer(definition);
        if (answer !== undefined) answers.push(answer);
      }
      if (definition.namespace === 'section') this.#library.section(definition);
      if (definition.namespace === 'material') this.#library.material(definition);
    }
    const structures = this.#states.map((state, index) => this.#structureResult(state, index, answers));
    this.#reportHead();
    for (const state of this.#states) {
      const units = this.#unitsOf(state.scope);
      remarksOn(state, this.#inputs.scopes.head, units);
      doubtsOn(state, units);
    }
    unusedSharedCombinations(this.#inputs.scopes, this.#report);
    return { structures, answers, values };
  }

  /** A value in prose, as the structure last spoken of above it sees names. */
  prose(span: SourceSpan, value: Value | undefined, diagnostics: readonly Diagnostic[]): ProseValue {
    this.#report.diagnostics.push(...diagnostics);
    const common = {
      line: span.line + 1,
      text: this.#inputs.wordsOf({ start: span.start, end: span.start + span.text.length }),
      range: span.range,
    };
    const scope = this.#scopeAbove(span.range.start);
    if (value === undefined) return { ...common, quantity: undefined, unit: '', display: '' };
    this.#useNames(scope, value);
    const quantity = this.#values.figures(scope, this.#report).quantity(value);
    if (quantity === undefined) return { ...common, quantity, unit: '', display: '' };
    const answer = this.#answerNamed(scope, value);
    const display = answer?.quantity === undefined ? this.#show(scope, value, quantity) : answer.display;
    return { ...common, quantity, unit: siUnit(quantity.dimension), display };
  }

  diagnostics(): Diagnostic[] {
    return [...this.#report.diagnostics, ...this.#states.flatMap(state => state.report.diagnostics)];
  }

  /** Indices of the structures that statements are of. */
  structuresIn(statements: readonly Statement[]): number[] {
    const wanted = new Set(statements);
    return this.#states.flatMap((state, index) =>
      state.scope.statements.some(statement => wanted.has(statement)) ? [index] : [],
    );
  }

  // Structures

  #stateOf(scope: Scope): StructureState | undefined {
    return this.#states.find(state => state.scope === scope);
  }

  #geometry(scope: Scope, range: Range) {
    const state = this.#stateOf(scope);
    if (state === undefined) {
      this.#report.error(
        'bad-value',
        range,
        'A length between points is that of a structure; this stands before the first.',
        {
          hint: 'move the value behind the structure line',
        },
      );
      return undefined;
    }
    return state.geometry(() =>
      this.#report.error('circular-value', range, 'This length depends on the chain that it stands in.'),
    );
  }

  #structureResult(state: StructureState, index: number, answers: readonly Answer[]): StructureResult {
    const { scope } = state;
    const { head } = this.#inputs.scopes;
    const structure = state.structure();
    const solved = state.solved();
    const sentences = [...head.statements, ...scope.statements].flatMap(assumptionOf);
    const title = scope.structure?.title?.text;
    const combinations: Combination[] = state.combinations().map(({ name, kind, alternatives }) => ({
      name,
      kind,
      alternatives: alternatives.map(({ label, text, factors }) => ({
        label,
        text,
        factors,
        solution: () => this.#solution(state, factors),
      })),
    }));
    return {
      structure,
      name: scope.name ?? '',
      ...(title === undefined ? {} : { title }),
      range: structure?.range ?? scope.structure?.name.range ?? scope.statements[0]?.range ?? { start: 0, end: 0 },
      analysis: solved?.analysis ?? state.unstable ?? withoutCases(state.trial?.analysis),
      combinations: solved === undefined ? [] : combinations,
      answers: answers.flatMap((answer, i) => (answer.structure === index ? [i] : [])),
      assumptions: sentences,
      display: this.#unitsOf(scope),
      shows: scope.statements.filter((statement): statement is StatementOf<'show'> => statement.kind === 'show'),
      withheld: state.withheld,
      remedies: state.remedies,
    };
  }

  #solution(state: StructureState, factors: readonly number[]) {
    const solved = state.solved();
    if (solved === undefined)
      throw new Error('a combination of a structure without a solution was asked for its solution');
    return solved.solution(factors);
  }

  // Questions

  #seriesOf(definition: Definition, range: Range): Series | undefined {
    let once = this.#series.get(definition);
    if (once === undefined) {
      once = new Once(this.#descent, () => this.#workSeries(definition));
      this.#series.set(definition, once);
    }
    return once.get(why => refuseNamed(this.#report, definition, range, why));
  }

  #workSeries(definition: Definition): Series | undefined {
    const { statement, scope } = definition;
    const state = this.#stateOf(scope);
    if (state === undefined || !isQuestion(statement)) return undefined;
    return seriesOf(statement, {
      state,
      seriesOf: (earlier, range) => this.#seriesOf(earlier, range),
      figures: frame => this.#values.figures(scope, state.report, frame),
      plain: this.#values.figures(scope, state.report),
      isDefined: under =>
        under?.kind !== 'named' ||
        this.#inputs.names.find(scope, ['combination', 'case'], under.name.text) !== undefined,
      resultNamed: operand => this.#resultNamed(scope, operand),
    });
  }

  /** The result that an operand names: of this structure, or of another. */
  #resultNamed(scope: Scope, operand: Operand): Definition | undefined {
    const { names } = this.#inputs;
    if (operand.kind === 'name') {
      const found = names.find(scope, ['value', 'result'], operand.name.text);
      return found?.namespace === 'result' ? found : undefined;
    }
    if (operand.kind !== 'property') return undefined;
    const owner = names.find(scope, ['section', 'material', 'structure'], operand.of.text);
    if (owner?.namespace !== 'structure') return undefined;
    return names.entries.find(
      entry =>
        entry.namespace === 'result' &&
        entry.name === operand.property.text &&
        entry.scope.structure === owner.statement,
    );
  }

  #result(definition: Definition, range: Range): { readonly quantity: Quantity; readonly chosen: boolean } | undefined {
    const series = this.#seriesOf(definition, range);
    const quantity = this.#answer(definition)?.quantity;
    if (series === undefined || quantity === undefined) return undefined;
    return { quantity, chosen: series.values.length > 1 || series.loaded !== undefined };
  }

  #spanOfResult(definition: Definition, range: Range): Quantity | undefined {
    const series = this.#seriesOf(definition, range);
    const state = this.#stateOf(definition.scope);
    if (series === undefined || state === undefined) return undefined;
    const span = spanOf(series, state.structure(), range, state.report);
    return span === undefined ? undefined : { value: span.length, dimension: LENGTH };
  }

  #answer(definition: Definition): Answer | undefined {
    const known = this.#answers.get(definition);
    const { statement, scope } = definition;
    const state = this.#stateOf(scope);
    if (known !== undefined || state === undefined || !isQuestion(statement)) return known;
    const answer = answerTo({
      question: statement,
      structureIndex: this.#states.indexOf(state),
      state,
      series: this.#seriesOf(definition, statement.name.range),
      units: this.#unitsOf(scope),
      wordsOf: this.#inputs.wordsOf,
      limitOf: (limit, span) => this.#values.figures(scope, state.report, { span }).quantity(limit),
      report: state.report,
    });
    this.#answers.set(definition, answer);
    return answer;
  }

  #answerNamed(scope: Scope, value: Value): Answer | undefined {
    const definition = value.kind === 'operand' ? this.#resultNamed(scope, value.operand) : undefined;
    return definition === undefined ? undefined : this.#answer(definition);
  }

  // Values

  #namedValue(definition: Definition): NamedValue {
    const quantity = this.#values.named(definition, definition.definition);
    const { structure, statement, name, scope } = definition;
    // Without a `structure` line the values are the whole note's.
    const owner = scope.structure === undefined ? undefined : structure;
    const displayOf = (value: Value, shown: Quantity): string => this.#show(scope, value, shown);
    return {
      name: owner === undefined ? name : `${owner}.${name}`,
      quantity,
      unit: quantity === undefined ? '' : siUnit(quantity.dimension),
      // Shown when a face asks: most values are not, between one keystroke and the next.
      get display() {
        return quantity === undefined || statement.kind !== 'let' ? '' : displayOf(statement.value, quantity);
      },
      range: statement.range,
      nameRange: definition.definition,
    };
  }

  /** A length that is worked from movements is shown as one. */
  #show(scope: Scope, value: Value, quantity: Quantity): string {
    const movement = operandsOf(value).some(operand => {
      const result = this.#resultNamed(scope, operand);
      return (
        result !== undefined &&
        this.#seriesOf(result, operand.range)?.taken.some(({ measure }) => isMovement(measure.kind))
      );
    });
    const asMovement = movement && sameDimension(quantity.dimension, LENGTH);
    return show(quantity, this.#unitsOf(scope), asMovement ? 'deflection' : undefined);
  }

  #unitsOf(scope: Scope): DisplayUnits {
    return this.#display.get(scope) ?? this.#display.get(this.#inputs.scopes.head) ?? METRIC;
  }

  #readDisplay(): void {
    const { head, structures } = this.#inputs.scopes;
    for (const scope of [head, ...structures]) {
      let units = this.#unitsOf(scope);
      for (const statement of scope.statements) {
        if (statement.kind !== 'display') continue;
        const read = readDisplay(statement.setting, units);
        units = read.units;
        for (const { code, range, message, hint } of read.problems)
          this.#report.error(code, range, message, hint === undefined ? {} : { hint });
      }
      this.#display.set(scope, units);
    }
  }

  // Prose

  #scopeAbove(offset: number): Scope {
    const { head, structures } = this.#inputs.scopes;
    const above = structures.filter(scope => (scope.statements[0]?.range.start ?? 0) < offset);
    return above.at(-1) ?? structures[0] ?? head;
  }

  #useNames(scope: Scope, value: Value): void {
    this.#report.diagnostics.push(...this.#inputs.names.useInProse(scope, usesInValue(value)));
  }

  /** Statements of a structure in the head of a note with structures, and what the head holds that is not evaluated. */
  #reportHead(): void {
    const { statements } = this.#inputs.scopes.head;
    // A structure line is missing, or stands too far down: one mistake, told at the first line that it concerns.
    const misplaced = statements.find(belongsToStructure);
    if (misplaced !== undefined) {
      this.#report.error(
        'bad-statement',
        misplaced.keyword,
        `This ${misplaced.kind} belongs to a structure, and none has begun.`,
        {
          hint: 'write a structure line above it',
        },
      );
    }
    for (const statement of statements) {
      if (statement.kind === 'use') {
        this.#report.error(
          'not-evaluated-yet',
          statement.range,
          'Another note or table is read but not evaluated by this version: answers that may depend on it are withheld.',
        );
      }
    }
  }
}

/** Of a trial only what does not depend on its figures. */
function withoutCases(analysis: Analysis | undefined): Analysis | undefined {
  return analysis === undefined ? undefined : { ...analysis, cases: [], parts: [] };
}

function isQuestion(statement: Statement): statement is Question {
  return statement.kind === 'find' || statement.kind === 'require';
}

function assumptionOf(statement: Statement): string[] {
  if (statement.kind !== 'assume') return [];
  switch (statement.assumption.kind) {
    case 'sentence':
      return [statement.assumption.text.text];
    case 'axially stiff':
      return ['Members keep their length: axial deformation is not counted.'];
    case 'shear deformation':
      // The method's own words say it.
      return [];
  }
}

function inTextOrder(entries: readonly Definition[]): Definition[] {
  return [...entries].sort((a, b) => a.definition.start - b.definition.start);
}
