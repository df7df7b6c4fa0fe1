// A note's result after changes in its prose: nothing is worked out, only the places behind each change move. What a face
// does not ask for is not moved either, since a writer's next keystroke comes before most of it is read.
import type { Structure } from '../model/structure.ts';
import type { Range } from '../quantity/range.ts';
import type { Change } from './change.ts';
import type { Answer, NamedValue, NameEntry, NoteResult, StructureResult } from './result.ts';
import { shifted } from './shift.ts';

/** Which result a moved one was made of, and by which changes in turn. */
const origins = new WeakMap<NoteResult, { readonly base: NoteResult; readonly changes: readonly Change[] }>();

/** Past so many changes a new base is begun, so that no place is moved by a long history. */
const MOST_CHANGES = 200;

export function movedResult(result: NoteResult, text: string, change: Change): NoteResult {
  const { base, changes } = origins.get(result) ?? { base: result, changes: [] };
  const all = [...changes, change];
  const moved = later(base, result, text, change, all);
  if (all.length < MOST_CHANGES) origins.set(moved, { base, changes: all });
  return moved;
}

function later(
  base: NoteResult,
  before: NoteResult,
  text: string,
  last: Change,
  changes: readonly Change[],
): NoteResult {
  const settled: { -readonly [K in keyof NoteResult]?: NoteResult[K] } = {};
  return {
    path: base.path,
    text,
    frontMatter: base.frontMatter,
    isCalculation: base.isCalculation,
    diagnostics: shifted(before.diagnostics, [last]),
    prose: before.prose.map(span => ({ ...span, range: shifted(span.range, [last]) })),
    get fences() {
      return (settled.fences ??= shifted(base.fences, changes));
    },
    get structures() {
      return (settled.structures ??= moveStructures(base.structures, changes));
    },
    get answers() {
      return (settled.answers ??= moveAnswers(base.answers, changes));
    },
    get values() {
      return (settled.values ??= moveValues(base.values, changes));
    },
    get names() {
      return (settled.names ??= moveNames(base.names, changes));
    },
    get fingerprint() {
      return base.fingerprint;
    },
  };
}

function moveAnswers(answers: readonly Answer[], changes: readonly Change[]): readonly Answer[] {
  return answers.map(answer => ({
    ...answer,
    range: shifted(answer.range, changes),
    nameRange: shifted(answer.nameRange, changes),
  }));
}

function moveValues(values: readonly NamedValue[], changes: readonly Change[]): readonly NamedValue[] {
  return values.map(value => ({
    ...value,
    range: shifted(value.range, changes),
    nameRange: shifted(value.nameRange, changes),
  }));
}

function moveNames(names: readonly NameEntry[], changes: readonly Change[]): readonly NameEntry[] {
  return names.map(({ namespace, name, structure, definition, uses }) => ({
    namespace,
    name,
    structure,
    definition: shifted(definition, changes),
    uses: shifted(uses, changes),
  }));
}

/** An analysis knows no places; what it was made of does. */
function moveStructures(
  structures: readonly StructureResult[],
  changes: readonly Change[],
): readonly StructureResult[] {
  return structures.map(result => ({
    ...result,
    structure: result.structure && moveStructure(result.structure, changes),
    range: shifted(result.range, changes),
    shows: shifted(result.shows, changes),
  }));
}

function moveStructure(structure: Structure, changes: readonly Change[]): Structure {
  const move = <T extends { readonly range: Range }>(parts: readonly T[]): T[] =>
    parts.map(part => ({ ...part, range: shifted(part.range, changes) }));
  return {
    ...structure,
    range: shifted(structure.range, changes),
    points: move(structure.points),
    sections: move(structure.sections),
    members: move(structure.members),
    hinges: move(structure.hinges),
    supports: move(structure.supports),
    loads: move(structure.loads),
  };
}
