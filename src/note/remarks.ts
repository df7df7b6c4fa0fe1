// What an experienced checker would remark on although nothing is wrong with the words: a case that no combination takes
// up, a limit without a source.
import type { Under } from '../language/syntax.ts';
import { alternativesUnder } from '../model/combinations.ts';
import type { Scope } from '../model/scope.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { reversalsUnder, warnOfReversals } from './one-sided.ts';
import type { StructureState } from './structure-state.ts';

export function remarksOn(state: StructureState, head: Scope, units: DisplayUnits): void {
  limitsWithoutSource(state);
  showsNotDrawn(state);
  // Where something is missing from the structure, what is used and what is not cannot be told.
  if (state.withheld !== undefined) return;
  reversedForces(state, units);
  unusedCases(state, head);
  casesWithoutLoad(state);
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
