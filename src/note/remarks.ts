// What an experienced checker would remark on although nothing is wrong with the words: a case that no combination takes
// up, a limit without a source.
import type { Statement, StatementOf, Under } from '../language/syntax.ts';
import { alternativesUnder } from '../model/combinations.ts';
import type { Report } from '../model/report.ts';
import type { Scope, Scopes } from '../model/scope.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { reversalsUnder, warnOfReversals } from './one-sided.ts';
import type { StructureState } from './structure-state.ts';

export function remarksOn(state: StructureState, head: Scope, units: DisplayUnits): void {
  limitsWithoutSource(state);
  unusedCombinations(state.scope, [state.scope], head, state.report);
  showsNotDrawn(state);
  // Where something is missing from the structure, what is used and what is not cannot be told.
  if (state.withheld !== undefined) return;
  reversedForces(state, units);
  unusedCases(state, head);
  casesWithoutLoad(state);
}

/** Combinations of the note's head that no structure's question takes up. */
export function unusedSharedCombinations({ head, structures }: Scopes, report: Report): void {
  unusedCombinations(head, [head, ...structures], head, report);
}

/** Of one scope, asked about in some. Without a question there is nothing yet that could ask. */
function unusedCombinations(scope: Scope, asking: readonly Scope[], head: Scope, report: Report): void {
  const combinations = combinationsOf(scope);
  if (combinations.size === 0) return;
  const used = new Set<string>();
  let asked = false;
  for (const one of asking) {
    const inReach = new Set([...combinationsOf(one), ...combinationsOf(head)].map(([name]) => name));
    for (const statement of one.statements) {
      const question = statement.kind === 'find' || statement.kind === 'require';
      asked ||= question;
      const under = question ? statement.under : showsUnder(statement);
      if (under === undefined && !question) continue;
      // The only one is meant where nothing is said.
      if (under === undefined ? inReach.size === 1 : under === 'all' || under.kind === 'all') {
        for (const name of inReach) used.add(name);
      } else if (under !== undefined && under !== 'all' && under.kind === 'named') used.add(under.name.text);
    }
  }
  if (!asked) return;
  for (const [name, statement] of combinations) {
    if (used.has(name)) continue;
    report.warn('unused-combination', statement.name.range, `Nothing asks about ${name}.`, {
      hint: `ask under ${name}, or take it out`,
    });
  }
}

/** By name, the first line of each. */
function combinationsOf({ statements }: Scope): ReadonlyMap<string, StatementOf<'combine'>> {
  const found = new Map<string, StatementOf<'combine'>>();
  for (const statement of statements) {
    if (statement.kind === 'combine' && !found.has(statement.name.text)) found.set(statement.name.text, statement);
  }
  return found;
}

/** What a `show` line looks at: a combination, or all of them where it shows reactions of all. */
function showsUnder(statement: Statement): Under | 'all' | undefined {
  if (statement.kind !== 'show') return undefined;
  const { show } = statement;
  const under = 'under' in show ? show.under : undefined;
  return under ?? (show.kind === 'reactions' ? 'all' : undefined);
}

function limitsWithoutSource({ scope, report }: StructureState): void {
  for (const statement of scope.statements) {
    if (statement.kind !== 'require' || statement.source !== undefined) continue;
    report.hint('limit-without-source', statement.limit.range, 'This limit has no source.', {
      hint: 'add it in quotes: "brief, 3.2" or the clause of the code',
    });
  }
}

/**
 * A case is used by a combination of its structure or of the head, or by a question of its own. Without a combination and
 * without a question there is nothing yet that it could be used by.
 */
function unusedCases({ scope, report }: StructureState, head: Scope): void {
  const statements = [...head.statements, ...scope.statements];
  const used = new Set<string>();
  let combined = false;
  let asked = false;
  let askedAtLarge = false;
  for (const statement of statements) {
    if (statement.kind === 'combine') {
      combined = true;
      for (const term of statement.terms) used.add(term.case.text);
    }
    if (statement.kind === 'show' && 'under' in statement.show) useCase(statement.show.under, used);
    if (statement.kind !== 'find' && statement.kind !== 'require') continue;
    asked = true;
    askedAtLarge ||= statement.under === undefined;
    useCase(statement.under, used);
  }
  if (combined ? false : !asked || askedAtLarge) return;
  const told = new Set<string>();
  for (const statement of statements) {
    if (statement.kind !== 'load' || used.has(statement.case.text) || told.has(statement.case.text)) continue;
    const { text, range } = statement.case;
    told.add(text);
    const what = combined ? 'is in no combination, and nothing asks about it alone' : 'is asked about by nothing';
    report.warn('unused-case', range, `${text} ${what}: its loads count nowhere.`, {
      hint: `add it to a combination, or ask under ${text}`,
    });
  }
}

/** A case that has a title and no load, in the structure that names it. */
function casesWithoutLoad({ scope, report }: StructureState): void {
  const loaded = new Set(
    scope.statements.flatMap(statement => (statement.kind === 'load' ? [statement.case.text] : [])),
  );
  for (const statement of scope.statements) {
    if (statement.kind !== 'case' || loaded.has(statement.name.text)) continue;
    report.warn('unused-case', statement.name.range, `${statement.name.text} has no load.`, {
      hint: 'give it one, or take the line out',
    });
  }
}

/** Under every alternative that someone may read: of the combinations, and of the cases that are asked about alone. */
function reversedForces(state: StructureState, units: DisplayUnits): void {
  const [structure, solved, combinations] = [state.structure(), state.solved(), state.combinations()];
  if (structure === undefined || solved === undefined) return;
  const summed = combinations.filter(({ kind }) => kind === 'combination');
  const asked = state.scope.statements.flatMap(statement => {
    if (statement.kind !== 'find' && statement.kind !== 'require') return [];
    const meant = alternativesUnder(statement.under, combinations);
    return 'problem' in meant ? [] : meant.alternatives;
  });
  const all = new Set([...(summed.length > 0 ? summed : combinations).flatMap(one => one.alternatives), ...asked]);
  warnOfReversals(reversalsUnder(solved, structure, [...all]), units, state.report);
}

/** What a page is asked to show and this version does not work out yet. */
function showsNotDrawn({ scope, report }: StructureState): void {
  for (const statement of scope.statements) {
    if (statement.kind !== 'show') continue;
    const what = { working: 'The working', contributions: 'The table of contributions' }[statement.show.kind as string];
    if (what === undefined) continue;
    report.hint(
      'not-evaluated-yet',
      statement.show.range,
      `${what} is not drawn by this version; the page leaves it out.`,
    );
  }
}

function useCase(under: Under | undefined, used: Set<string>): void {
  if (under?.kind === 'named') used.add(under.name.text);
}
