// Combinations as factors of cases: every line of a name is an alternative, and every `+-` in it doubles them.
import type { StatementOf, Term, Under } from '../language/syntax.ts';
import { DIMENSIONLESS } from '../quantity/dimension.ts';
import type { Range } from '../quantity/range.ts';
import type { Due, Figures } from './figures.ts';
import { wholeCase } from './patterns.ts';
import type { Report } from './report.ts';
import type { Scope } from './scope.ts';
import type { LoadCase } from './structure.ts';

export interface CombinationModel {
  readonly name: string;
  readonly kind: 'combination' | 'case';
  /** Empty where no alternative can be worked out. */
  readonly alternatives: readonly AlternativeModel[];
  /** False where some line of it could not be read: what governs is then not known. */
  readonly sound: boolean;
}

export interface AlternativeModel {
  /** `b`, `c+`, `+`; undefined for the only one of its name. */
  readonly label: string | undefined;
  /** The label of its line, without signs. */
  readonly line: string | undefined;
  /** As written, blanks normalised: `strength (b): 1.35 dead + 1.5 wind`. */
  readonly text: string;
  /** One factor for each of the structure's cases. */
  readonly factors: readonly number[];
  /** Names of the cases that take part, those that the structure has no load of included. */
  readonly cases: readonly string[];
}

const A_FACTOR: Due = { dimension: DIMENSIONLESS, words: 'a number' };

/** `+-` doubles the alternatives; past this many, a line is refused. */
const MOST_ALTERNATIVES = 1024;

type Line = StatementOf<'combine'>;

/** The combinations a scope defines, for the cases of one structure. A combination of the head is read once for each. */
export function readCombinations(
  scope: Scope,
  cases: readonly LoadCase[],
  figures: Figures,
  wordsOf: (range: Range) => string,
  report: Report,
): CombinationModel[] {
  const lines = new Map<string, Line[]>();
  for (const statement of scope.statements) {
    if (statement.kind !== 'combine') continue;
    const name = statement.name.text;
    const known = lines.get(name);
    if (known === undefined) lines.set(name, [statement]);
    else if (!known.some(other => other.label?.text === statement.label?.text)) known.push(statement);
  }
  const combinations: CombinationModel[] = [];
  for (const [name, statements] of lines) {
    const read = statements.map(statement => readLine(statement, cases, figures, wordsOf, report));
    const broken = scope.broken.some(
      line => line.keyword === 'combine' && (line.name === undefined || line.name === name),
    );
    combinations.push({
      name,
      kind: 'combination',
      alternatives: read.flatMap(alternatives => alternatives ?? []),
      sound: !broken && read.every(alternatives => alternatives !== undefined),
    });
  }
  return combinations;
}

/** A whole case alone: one alternative with the factor 1. */
export function caseAlone(cases: readonly LoadCase[], index: number): CombinationModel {
  const { name } = cases[index]!;
  const factors = cases.map((_, i) => (wholeCase(cases, i) === index ? 1 : 0));
  const alternative = { label: undefined, line: undefined, text: name, factors, cases: [name] };
  return { name, kind: 'case', alternatives: [alternative], sound: true };
}

function readLine(
  statement: Line,
  cases: readonly LoadCase[],
  figures: Figures,
  wordsOf: (range: Range) => string,
  report: Report,
): AlternativeModel[] | undefined {
  const factors: number[] = [];
  for (const term of statement.terms) {
    const factor = term.factor === undefined ? 1 : figures.number(term.factor, A_FACTOR);
    if (factor === undefined) return undefined;
    factors.push(factor);
  }
  const doubled = statement.terms.filter(term => term.sign === '+-').length;
  if (2 ** doubled > MOST_ALTERNATIVES) {
    report.error(
      'too-large',
      statement.range,
      `${doubled} signs +- make ${2 ** doubled} alternatives; at most ${MOST_ALTERNATIVES} are worked.`,
      {
        hint: 'write the alternatives that matter as lines of their own',
      },
    );
    return undefined;
  }
  const sum = wordsOf({ start: statement.terms[0]!.range.start, end: statement.terms.at(-1)!.range.end });
  const alternatives: AlternativeModel[] = [];
  for (let choice = 0; choice < 2 ** doubled; choice++) {
    alternatives.push(alternative(statement, factors, cases, sum, signs(doubled, choice)));
  }
  return alternatives;
}

/** `++`, `+-`, `-+`, `--` for two doubled terms, in that order. */
function signs(doubled: number, choice: number): string {
  let text = '';
  for (let i = doubled - 1; i >= 0; i--) text += (choice >> i) & 1 ? '-' : '+';
  return text;
}

function alternative(
  statement: Line,
  factors: readonly number[],
  cases: readonly LoadCase[],
  sum: string,
  chosen: string,
): AlternativeModel {
  const name = statement.name.text;
  const line = statement.label?.text;
  const label = `${line ?? ''}${chosen}`;
  const totals = cases.map(() => 0);
  let doubled = 0;
  statement.terms.forEach((term, i) => {
    const sign = signOf(term, chosen[term.sign === '+-' ? doubled++ : 0]);
    // Its spans, where it is patterned, bear its name.
    for (const [index, { name: other }] of cases.entries())
      if (other === term.case.text) totals[index]! += sign * factors[i]!;
  });
  return {
    label: label === '' ? undefined : label,
    line,
    text: `${name}${label === '' ? '' : ` (${label})`}: ${sum}`,
    factors: totals,
    cases: statement.terms.map(term => term.case.text),
  };
}

function signOf(term: Term, chosen: string | undefined): 1 | -1 {
  if (term.sign === '+-') return chosen === '-' ? -1 : 1;
  return term.sign === '-' ? -1 : 1;
}

/** What `under` asks for, or why it asks for nothing. */
export type Asked =
  | Pick<CombinationModel, 'name' | 'alternatives' | 'sound'>
  | { readonly problem: string; readonly hint: string };

/**
 * The alternatives behind `under`, or those that are meant where it is left out: the only combination, or the only case
 * of a structure without one.
 */
export function alternativesUnder(under: Under | undefined, combinations: readonly CombinationModel[]): Asked {
  const summed = combinations.filter(({ kind }) => kind === 'combination');
  if (under === undefined) return leftOut(combinations, summed);
  if (under.kind === 'all') {
    if (summed.length === 0)
      return { problem: 'There is no combination.', hint: 'write one: combine service: dead + …' };
    return {
      name: 'all',
      alternatives: summed.flatMap(({ alternatives }) => alternatives),
      sound: summed.every(({ sound }) => sound),
    };
  }
  const found = combinations.find(({ name }) => name === under.name.text);
  if (found === undefined)
    return {
      problem: `This structure has no load of ${under.name.text}.`,
      hint: 'ask under a combination or a case that it has',
    };
  if (under.label === undefined) return found;
  const label = under.label.text;
  const alternatives = found.alternatives.filter(
    alternative => alternative.label === label || alternative.line === label,
  );
  if (alternatives.length > 0) return { name: found.name, alternatives, sound: found.sound };
  const labels = found.alternatives.flatMap(alternative =>
    alternative.label === undefined ? [] : [`(${alternative.label})`],
  );
  return {
    problem: `${found.name} has no alternative (${label}).`,
    hint: labels.length === 0 ? `${found.name} has one line, without a label` : `it has ${labels.join(', ')}`,
  };
}

function leftOut(combinations: readonly CombinationModel[], summed: readonly CombinationModel[]): Asked {
  const [only, another] = summed.length > 0 ? summed : combinations;
  if (only === undefined) return { problem: 'Nothing acts on this structure.', hint: 'give it a load' };
  if (another === undefined) return only;
  const what = summed.length > 0 ? 'combinations' : 'cases and no combination';
  return { problem: `There are several ${what}: say under which.`, hint: `write under ${only.name}` };
}
