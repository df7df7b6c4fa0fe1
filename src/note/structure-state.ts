// One structure of a note on its way from statements to a solution. Each stage is worked out when it is first asked for;
// a value that asks for a later stage than it may is a circle, and told as one.

import { type Analysis, type Conflict, MAX_FREEDOMS } from '../mechanics/index.ts';
import { buildStructure } from '../model/build.ts';
import { type CombinationModel, caseAlone, readCombinations } from '../model/combinations.ts';
import type { Geometry } from '../model/geometry.ts';
import { layOut } from '../model/layout.ts';
import type { Library } from '../model/library.ts';
import type { Names } from '../model/names.ts';
import { Report } from '../model/report.ts';
import type { BrokenStatement, Scope } from '../model/scope.ts';
import type { Structure } from '../model/structure.ts';
import { wantedSection } from '../model/wanted.ts';
import { nearest } from '../quantity/nearest.ts';
import { significant } from '../quantity/number.ts';
import type { Range } from '../quantity/range.ts';
import { describeInstability, describeNearInstability, remedyWords } from './instability.ts';
import type { SolvedStructures } from './memory.ts';
import { type Descent, Once, type Refusal } from './once.ts';
import { type Solved, solutionKey } from './solved.ts';
import type { Values } from './values.ts';

export interface StateInputs {
  readonly scope: Scope;
  readonly head: Scope;
  readonly names: Names;
  readonly values: Values;
  readonly stock: Library;
  readonly solved: SolvedStructures;
  readonly descent: Descent;
  readonly wordsOf: (range: Range) => string;
}

export class StructureState {
  readonly scope: Scope;
  readonly report = new Report();
  readonly #inputs: StateInputs;
  #excuse: string | undefined;
  readonly #geometry: Once<Geometry>;
  readonly #structure: Once<Structure>;
  readonly #solved: Once<Solved>;
  readonly #combinations: Once<readonly CombinationModel[]>;
  /** The analysis of a structure that can move freely, for a drawing of how; undefined for any other. */
  unstable: Analysis | undefined;
  /** What would hold it, each tried, in words, the least change first. */
  remedies: readonly string[] = [];
  /** A structure with a section still to be chosen, solved with a trial I: nothing of it may be shown as it is. */
  trial: Solved | undefined;

  constructor(inputs: StateInputs) {
    this.scope = inputs.scope;
    this.#inputs = inputs;
    this.#geometry = new Once(inputs.descent, () =>
      layOut(this.scope, inputs.values.figures(this.scope, this.report), this.report),
    );
    this.#structure = new Once(inputs.descent, () => this.#build());
    this.#solved = new Once(inputs.descent, () => this.#solve());
    this.#combinations = new Once(inputs.descent, () => this.#readCombinations());
  }

  geometry(refuse?: (why: Refusal) => void): Geometry | undefined {
    return this.#geometry.get(refuse);
  }

  /** What could be built, flawed or not; undefined where there is no member at all. */
  structure(refuse?: (why: Refusal) => void): Structure | undefined {
    return this.#structure.get(refuse);
  }

  /** Undefined where something is missing from the structure, or it is not stable. */
  solved(refuse?: (why: Refusal) => void): Solved | undefined {
    return this.#solved.get(refuse);
  }

  combinations(refuse?: (why: Refusal) => void): readonly CombinationModel[] {
    return this.#combinations.get(refuse) ?? [];
  }

  /** Why nothing of this structure can be told, in one line. */
  get withheld(): string | undefined {
    if ((this.solved() ?? this.trial) !== undefined && !this.report.flawed) return undefined;
    return this.#excuse ?? 'something of it cannot be read or is not evaluated';
  }

  #build(): Structure | undefined {
    const { scope, head, names, values, stock } = this.#inputs;
    const geometry = this.geometry();
    if (geometry === undefined) return undefined;
    if (brokenBeyond(scope.broken)) this.report.flawed = true;
    for (const { keyword, name } of scope.broken) {
      if (keyword === 'load' && name !== undefined) this.report.flawedCases.add(name);
    }
    this.#checkUnevaluated();
    const titles = new Map<string, string>();
    for (const statement of [...head.statements, ...scope.statements]) {
      if (statement.kind === 'case' && statement.title !== undefined)
        titles.set(statement.name.text, statement.title.text);
    }
    const isAssumed = (kind: 'axially stiff' | 'shear deformation') =>
      [...head.statements, ...scope.statements].some(
        statement => statement.kind === 'assume' && statement.assumption.kind === kind,
      );
    const structure = buildStructure({
      scope,
      names,
      geometry,
      stock,
      figures: values.figures(scope, this.report),
      report: this.report,
      titles,
      axiallyStiff: isAssumed('axially stiff'),
      shearDeformation: isAssumed('shear deformation'),
    });
    return structure.members.length === 0 ? undefined : structure;
  }

  /** Statements that are read but change what is evaluated in a way that this version cannot follow. */
  #checkUnevaluated(): void {
    for (const statement of [...this.#inputs.head.statements, ...this.scope.statements]) {
      const own = this.scope.statements.includes(statement);
      if (statement.kind === 'use') {
        this.report.flawed = true;
        if (own)
          this.report.error(
            'not-evaluated-yet',
            statement.range,
            'Another note or table is read but not evaluated by this version: answers that may depend on it are withheld.',
          );
      }
      if (statement.kind === 'carry') {
        this.report.flawed = true;
        this.report.error(
          'not-evaluated-yet',
          statement.range,
          'A carried reaction is read but not evaluated by this version: answers of this structure are withheld.',
          {
            hint: 'put the reaction on as a load, from its result: load dead: (seat of Rafter) down at D',
          },
        );
      }
    }
  }

  #solve(): Solved | undefined {
    const structure = this.structure();
    if (structure === undefined || this.report.flawed) return undefined;
    const solved = this.#inputs.solved.solve(structure, solutionKey(structure));
    const { stability, tooLarge, conflict } = solved.analysis;
    if (tooLarge !== undefined) return this.#refuseSize(structure, tooLarge);
    if (conflict !== undefined) return this.#conflict(structure, conflict);
    if (stability.stable) {
      const held = this.#held(structure, solved);
      if (wantedSection(structure) === undefined) return held;
      this.trial = held;
      return undefined;
    }
    this.unstable = solved.analysis;
    this.#excuse = 'it can move freely';
    this.remedies = remedyWords(structure, solved.remedies);
    this.report.diagnostics.push(
      ...describeInstability(structure, solved.analysis, solved.remedies, this.scope.statements),
    );
    return undefined;
  }

  /** A structure that is stable, if only just: too little so, and nothing is told of it. */
  #held(structure: Structure, solved: Solved): Solved | undefined {
    const near = describeNearInstability(structure, solved.analysis);
    if (near === undefined) return solved;
    this.report.diagnostics.push(near);
    if (near.severity !== 'error') return solved;
    this.#excuse = 'it is nearly unstable';
    return undefined;
  }

  #refuseSize(structure: Structure, tooLarge: NonNullable<Analysis['tooLarge']>): undefined {
    this.#excuse = 'the structure is too large';
    const { message, hint } = TOO_LARGE[tooLarge];
    this.report.error('too-large', structure.range, `${structure.name} ${message}`, { hint });
    return undefined;
  }

  /** A support is moved along members that keep their length, or such a member is heated or out of length between holds. */
  #conflict(structure: Structure, { case: index, member, amount }: Conflict): undefined {
    this.#excuse = 'what is imposed contradicts members that keep their length';
    const { name } = structure.cases[index]!;
    const own = structure.loads.filter(load => load.case === index);
    const moved = own.find(({ kind }) => kind === 'movement');
    const strained =
      own.find(load => (load.kind === 'heat' || load.kind === 'lengthen') && load.member === member) ??
      own.find(({ kind }) => kind === 'heat' || kind === 'lengthen');
    const size = `${significant(Math.abs(amount) * 1000)} mm`;
    const given = `${structure.members[member]!.name} would have to change its length by ${size}`;
    const rigid = 'it is axially stiff: the force would be without bound.';
    const message =
      strained === undefined
        ? `In ${name} a support moves so that ${structure.members[member]!.name} would change its length by ${size}, and ${rigid}`
        : `In ${name} ${strained.kind === 'heat' ? 'heat' : 'lack of fit'} has no room: ${given} against it, and ${rigid}`;
    const hint =
      strained === undefined
        ? 'give its section an area, or move the support across it'
        : strained.kind === 'heat' && strained.above !== strained.below
          ? 'give its section an area, or leave one end free; without a mean, heat bends only: 12 K above, -12 K below'
          : 'give its section an area, or leave one end free to move';
    this.report.error('bad-load', (strained ?? moved)?.range ?? structure.range, message, { hint });
    return undefined;
  }

  #readCombinations(): readonly CombinationModel[] {
    const { scope, head, values, wordsOf } = this.#inputs;
    const structure = this.structure();
    if (structure === undefined) return [];
    const { cases } = structure;
    const own = readCombinations(scope, cases, values.figures(scope, this.report), wordsOf, this.report);
    const shared = readCombinations(head, cases, values.figures(head, this.report), wordsOf, this.report);
    const names = new Set(own.map(({ name }) => name));
    const alone = cases.flatMap(({ span }, index) => (span === undefined ? [caseAlone(cases, index)] : []));
    return [...own, ...shared.filter(({ name }) => !names.has(name)), ...alone];
  }
}

const TOO_LARGE: Readonly<
  Record<NonNullable<Analysis['tooLarge']>, { readonly message: string; readonly hint: string }>
> = {
  freedoms: {
    message: `has more joints than are solved: ${MAX_FREEDOMS} freedoms are taken, three a joint.`,
    hint: 'divide it into structures that hand reactions on',
  },
  'axially-stiff': {
    message: 'has longer chains of axially stiff members than are solved.',
    hint: 'give their sections an area',
  },
  cases: {
    message: 'has more cases than are solved for so many members and loads.',
    hint: 'join cases that always act together, or divide the structure',
  },
};

/** Keywords whose broken line costs less than the whole structure: what it would have defined is missed where it is used. */
const CONTAINED = [
  'structure',
  'case',
  'material',
  'section',
  'let',
  'combine',
  'find',
  'require',
  'display',
  'show',
  'load',
];

/** Whether a line that could not be read may have been part of the structure itself. */
function brokenBeyond(broken: readonly BrokenStatement[]): boolean {
  return broken.some(({ keyword, name }) => {
    if (keyword === 'load') return name === undefined;
    if (CONTAINED.includes(keyword)) return keyword === 'structure';
    return !CONTAINED.includes(nearest(keyword, KEYWORDS) ?? '');
  });
}

const KEYWORDS = [
  ...CONTAINED,
  'use',
  'hinge',
  'member',
  'bar',
  'bars',
  'group',
  'point',
  'connection',
  'release',
  'support',
  'assume',
  'carry',
];
