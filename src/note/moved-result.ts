// A note's result after changes in its prose: nothing is worked out, only the places behind each change move. What a face
// does not ask for is not moved either, since a writer's next keystroke comes before most of it is read.
import type { Structure } from '../model/structure.ts';
import type { Range } from '../quantity/range.ts';
import type { Change } from './change.ts';
import type { Answer, NamedValue, NameEntry, NoteResult, StructureResult } from './result.ts';
import { shifted } from './shift.ts';

/** Which result a moved one was made of, and by which changes in turn. */
const origins = new WeakMap<NoteResult, { readonly base: NoteResult; readonly changes: readonly Change[] }>();

/** Past so many changes the parts are moved once for all. */
const MOST_CHANGES = 24;

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
  const inTurn = <T>(data: T, move: (data: T, change: Change) => T): T => changes.reduce(move, data);
  const settled: { -readonly [K in keyof NoteResult]?: NoteResult[K] } = {};
  return {
    path: base.path,
    text,
    frontMatter: base.frontMatter,
    diagnostics: shifted(before.diagnostics, last),
    prose: before.prose.map(span => ({ ...span, range: shifted(span.range, last) })),
    get fences() {
      return (settled.fences ??= inTurn(base.fences, shifted));
    },
    get structures() {
      return (settled.structures ??= inTurn(base.structures, moveStructures));
    },
    get answers() {
      return (settled.answers ??= inTurn(base.answers, moveAnswers));
    },
    get values() {
      return (settled.values ??= inTurn(base.values, moveValues));
    },
    get names() {
      return (settled.names ??= inTurn(base.names, moveNames));
    },
    get fingerprint() {
      return base.fingerprint;
    },
  };
}

function moveAnswers(answers: readonly Answer[], change: Change): readonly Answer[] {
  return answers.map(answer => ({
    ...answer,
    range: shifted(answer.range, change),
    nameRange: shifted(answer.nameRange, change),
  }));
}

function moveValues(values: readonly NamedValue[], change: Change): readonly NamedValue[] {
  return values.map(value => ({
    ...value,
    range: shifted(value.range, change),
    nameRange: shifted(value.nameRange, change),
  }));
}

function moveNames(names: readonly NameEntry[], change: Change): readonly NameEntry[] {
  return names.map(({ namespace, name, structure, definition, uses }) => ({
    namespace,
    name,
    structure,
    definition: shifted(definition, change),
    uses: shifted(uses, change),
  }));
}

/** An analysis knows no places; what it was made of does. */
function moveStructures(structures: readonly StructureResult[], change: Change): readonly StructureResult[] {
  return structures.map(result => ({
    ...result,
    structure: result.structure && moveStructure(result.structure, change),
    range: shifted(result.range, change),
    shows: shifted(result.shows, change),
  }));
}

function moveStructure(structure: Structure, change: Change): Structure {
  const move = <T extends { readonly range: Range }>(parts: readonly T[]): T[] =>
    parts.map(part => ({ ...part, range: shifted(part.range, change) }));
  return {
    ...structure,
    range: shifted(structure.range, change),
    points: move(structure.points),
    sections: move(structure.sections),
    members: move(structure.members),
    hinges: move(structure.hinges),
    supports: move(structure.supports),
    loads: move(structure.loads),
  };
}
