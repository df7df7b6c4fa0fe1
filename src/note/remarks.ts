// What an experienced checker would remark on although nothing is wrong with the words: a case that no combination takes
// up, a limit without a source.
import type { Under } from '../language/syntax.ts';
import type { Scope } from '../model/scope.ts';
import type { Answer } from './result.ts';
import type { StructureState } from './structure-state.ts';

export function remarksOn(state: StructureState, head: Scope, answers: readonly Answer[], index: number): void {
  limitsWithoutSource(state);
  // Where something is missing from the structure, what is used and what is not cannot be told.
  if (!state.report.flawed) unusedCases(state, head, answers, index);
}

function limitsWithoutSource({ scope, report }: StructureState): void {
  for (const statement of scope.statements) {
    if (statement.kind !== 'require' || statement.source !== undefined) continue;
    report.hint('limit-without-source', statement.limit.range, 'This limit has no source.', {
      hint: 'add it in quotes: "brief, 3.2" or the clause of the code',
    });
  }
}

/** A case is used by a combination of its structure or of the head, by a question of its own, or as the only case there is. */
function unusedCases(state: StructureState, head: Scope, answers: readonly Answer[], index: number): void {
  const { scope, report } = state;
  const used = new Set<string>();
  let combined = false;
  for (const statement of [...head.statements, ...scope.statements]) {
    if (statement.kind === 'combine') {
      combined = true;
      for (const term of statement.terms) used.add(term.case.text);
    }
    const under = statement.kind === 'find' || statement.kind === 'require' ? statement.under : undefined;
    for (const name of caseAsked(under)) used.add(name);
    if (statement.kind === 'show' && 'under' in statement.show) for (const name of caseAsked(statement.show.under)) used.add(name);
  }
  for (const answer of answers) if (answer.structure === index && answer.under !== null) used.add(answer.under);
  const named = new Map(scope.statements.flatMap(statement => (statement.kind === 'load' ? [[statement.case.text, statement.case.range] as const] : [])).reverse());
  for (const [name, range] of [...named].reverse()) {
    if (used.has(name)) continue;
    const what = combined ? 'is in no combination, and nothing asks about it alone' : 'is asked about by nothing';
    report.warn('unused-case', range, `${name} ${what}: its loads count nowhere.`, { hint: `add it to a combination, or ask under ${name}` });
  }
  for (const statement of scope.statements) {
    if (statement.kind === 'case' && !named.has(statement.name.text)) {
      report.warn('unused-case', statement.name.range, `${statement.name.text} has no load.`, { hint: 'give it one, or take the line out' });
    }
  }
}

function caseAsked(under: Under | undefined): string[] {
  return under?.kind === 'named' ? [under.name.text] : [];
}
