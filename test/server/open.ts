// A note as an editor has it open. The mark ¦ in the text is the cursor, and no part of the note.
import type { Hover, Position } from 'vscode-languageserver';
import { TextDocument } from 'vscode-languageserver-textdocument';
import { evaluateNote } from '../../src/note/evaluate.ts';
import type { HoverOptions } from '../../src/server/hover/hover.ts';
import { hover } from '../../src/server/hover/hover.ts';
import type { OpenNote } from '../../src/server/open-note.ts';

export interface Opened {
  readonly note: OpenNote;
  readonly position: Position;
}

export function open(marked: string): Opened {
  const cursor = marked.indexOf('¦');
  const text = marked.replace('¦', '');
  const document = TextDocument.create('file:///note.md', 'markdown', 1, text);
  const position = document.positionAt(Math.max(cursor, 0));
  return { note: { document, result: evaluateNote(text, { path: 'note.md' }) }, position };
}

/** Statements in a fence. */
export function fenced(statements: string): string {
  return `\`\`\`tautline\n${statements}\n\`\`\`\n`;
}

/** What a hover at the cursor says, as plain lines; none where there is no hover. */
export function hoverLines(
  marked: string,
  options: HoverOptions = { format: 'plaintext', drawings: undefined },
): string[] {
  const { note, position } = open(marked);
  return linesOf(hover(note, position, options));
}

function linesOf(shown: Hover | undefined): string[] {
  if (shown === undefined) return [];
  const { contents } = shown;
  if (typeof contents !== 'object' || !('value' in contents)) throw new Error('a hover of an old kind');
  return contents.value.split('\n');
}
