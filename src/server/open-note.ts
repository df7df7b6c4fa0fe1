// A note that is open in an editor: its text with the result that belongs to exactly that text. Every feature is a
// function of one of these and a position, and answers in the protocol's plain data.
import type { Range as ProtocolRange } from 'vscode-languageserver';
import type { TextDocument } from 'vscode-languageserver-textdocument';
import type { NoteResult } from '../note/result.ts';
import type { Range } from '../quantity/range.ts';

export interface OpenNote {
  readonly document: TextDocument;
  readonly result: NoteResult;
}

/** The protocol counts lines and UTF-16 units from 0; a range of ours counts units from the start of the text. */
export function toProtocol(note: OpenNote, { start, end }: Range): ProtocolRange {
  return { start: note.document.positionAt(start), end: note.document.positionAt(end) };
}

export function toOffsets(note: OpenNote, { start, end }: ProtocolRange): Range {
  return { start: note.document.offsetAt(start), end: note.document.offsetAt(end) };
}

/** Both ends count as inside: a cursor behind a word is still on it. */
export function holds(range: Range, offset: number): boolean {
  return range.start <= offset && offset <= range.end;
}

export function meets(a: Range, b: Range): boolean {
  return a.start <= b.end && b.start <= a.end;
}

/** Index of the structure that is being spoken of at a place: the last one that begins above it. */
export function structureAt(result: NoteResult, offset: number): number | undefined {
  const index = result.structures.findLastIndex(({ range }) => range.start <= offset);
  return index >= 0 ? index : result.structures.length > 0 ? 0 : undefined;
}
