// A note's result after a change in its prose: nothing is worked out, only the places behind the change move.
import type { Structure } from '../model/structure.ts';
import type { Range } from '../quantity/range.ts';
import type { Change } from './change.ts';
import type { Answer, NamedValue, NameEntry, NoteResult, StructureResult } from './result.ts';
import { shifted } from './shift.ts';

export function movedResult(result: NoteResult, text: string, change: Change): NoteResult {
  if (change.shift === 0) return { ...result, text };
  const to = (range: Range): Range => shifted(range, change);
  return {
    ...result,
    text,
    fences: shifted(result.fences, change),
    structures: result.structures.map(structure => moveStructureResult(structure, to, change)),
    answers: result.answers.map(
      (answer): Answer => ({ ...answer, range: to(answer.range), nameRange: to(answer.nameRange) }),
    ),
    values: result.values.map(
      (value): NamedValue => ({ ...value, range: to(value.range), nameRange: to(value.nameRange) }),
    ),
    prose: result.prose.map(span => ({ ...span, range: to(span.range) })),
    names: result.names.map(
      ({ namespace, name, structure, definition, uses }): NameEntry => ({
        namespace,
        name,
        structure,
        definition: to(definition),
        uses: uses.map(to),
      }),
    ),
    diagnostics: shifted(result.diagnostics, change),
  };
}

/** An analysis knows no places; what it was made of does. */
function moveStructureResult(result: StructureResult, to: (range: Range) => Range, change: Change): StructureResult {
  const structure = result.structure === undefined ? undefined : moveStructure(result.structure, to);
  return { ...result, structure, range: to(result.range), shows: shifted(result.shows, change) };
}

function moveStructure(structure: Structure, to: (range: Range) => Range): Structure {
  const move = <T extends { readonly range: Range }>(parts: readonly T[]): T[] =>
    parts.map(part => ({ ...part, range: to(part.range) }));
  return {
    ...structure,
    range: to(structure.range),
    points: move(structure.points),
    sections: move(structure.sections),
    members: move(structure.members),
    hinges: move(structure.hinges),
    supports: move(structure.supports),
    loads: move(structure.loads),
  };
}
