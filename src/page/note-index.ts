// What the page looks up in a result again and again, worked out once for each result: fences by line, statements by
// place, diagnostics by place, lines.
import type { Diagnostic } from '../language/diagnostic.ts';
import type { Statement } from '../language/syntax.ts';
import { indexLines, type LineIndex } from '../note/line-index.ts';
import type { Fence, NoteResult } from '../note/result.ts';
import type { Range } from '../quantity/range.ts';

/** The fence whose opening marker stands on the line, counted from 0. */
export function fenceAtLine(note: NoteResult, line: number): Fence | undefined {
  return indexOf(note).fences.get(line);
}

/** Structures that the fence is the last to say something of. */
export function structuresEndingIn(note: NoteResult, fence: Fence): readonly number[] {
  return fence.structures.filter(structure => indexOf(note).lastFences.get(structure) === fence);
}

/** The statement that begins there. */
export function statementAt(note: NoteResult, start: number): Statement | undefined {
  return indexOf(note).statements.get(start);
}

/** Diagnostics whose words begin in the range, in order. */
export function diagnosticsIn(note: NoteResult, range: Range): readonly Diagnostic[] {
  const { diagnostics } = indexOf(note);
  const found: Diagnostic[] = [];
  for (let i = firstFrom(diagnostics, range.start); i < diagnostics.length; i++) {
    const diagnostic = diagnostics[i] as Diagnostic;
    if (diagnostic.range.start > range.end) break;
    found.push(diagnostic);
  }
  return found;
}

/** Source line of an offset, from 1. */
export function lineOf(note: NoteResult, offset: number): number {
  const index = indexOf(note);
  index.lines ??= indexLines(note.text);
  return index.lines.positionAt(offset).line;
}

interface NoteIndex {
  readonly fences: ReadonlyMap<number, Fence>;
  readonly lastFences: ReadonlyMap<number, Fence>;
  readonly statements: ReadonlyMap<number, Statement>;
  readonly diagnostics: readonly Diagnostic[];
  lines: LineIndex | undefined;
}

const indices = new WeakMap<NoteResult, NoteIndex>();

function indexOf(note: NoteResult): NoteIndex {
  const known = indices.get(note);
  if (known !== undefined) return known;
  const index: NoteIndex = {
    fences: new Map(note.fences.map(fence => [fence.firstLine, fence])),
    lastFences: new Map(note.fences.flatMap(fence => fence.structures.map(structure => [structure, fence] as const))),
    statements: new Map(
      note.fences.flatMap(({ statements }) => statements.map(statement => [statement.range.start, statement] as const)),
    ),
    diagnostics: [...note.diagnostics].sort((a, b) => a.range.start - b.range.start),
    lines: undefined,
  };
  indices.set(note, index);
  return index;
}

function firstFrom(diagnostics: readonly Diagnostic[], start: number): number {
  let [low, high] = [0, diagnostics.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((diagnostics[middle] as Diagnostic).range.start < start) low = middle + 1;
    else high = middle;
  }
  return low;
}
