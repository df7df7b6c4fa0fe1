// What the tests of the suite share: opening a note, and waiting for what the editor does in its own time.
import * as vscode from 'vscode';
import cantilever from '../workspace/cantilever.md';
import readme from '../workspace/README.md';

export interface EditorTest {
  readonly name: string;
  readonly body: () => Promise<void>;
}

export function editorTest(name: string, body: () => Promise<void>): EditorTest {
  return { name, body };
}

/** The notes of the workspace, for a workbench without files. */
const NOTES: Readonly<Record<string, string>> = { 'cantilever.md': cantilever, 'README.md': readme };

/** A note of the workspace, in an editor, as it was at the start. */
export async function open(name: string): Promise<vscode.TextEditor> {
  const [folder] = vscode.workspace.workspaceFolders ?? [];
  if (folder === undefined) {
    return vscode.window.showTextDocument(
      await vscode.workspace.openTextDocument({ language: 'markdown', content: NOTES[name] ?? '' }),
    );
  }
  const document = await vscode.workspace.openTextDocument(vscode.Uri.joinPath(folder.uri, name));
  const editor = await vscode.window.showTextDocument(document);
  if (document.isDirty) await vscode.commands.executeCommand('workbench.action.files.revert');
  return editor;
}

/** Where the first occurrence of the words begins, or a place inside it. */
export function placeOf(document: vscode.TextDocument, words: string, behind = 0): vscode.Position {
  const offset = document.getText().indexOf(words);
  if (offset < 0) throw new Error(`the note does not say ${words}`);
  return document.positionAt(offset + behind);
}

export async function replace(editor: vscode.TextEditor, words: string, by: string): Promise<void> {
  const start = placeOf(editor.document, words);
  const end = placeOf(editor.document, words, words.length);
  const done = await editor.edit(edit => edit.replace(new vscode.Range(start, end), by));
  if (!done) throw new Error(`could not replace ${words}`);
}

/** Asks again until there is an answer. */
export async function until<T>(what: string, ask: () => T | undefined | Promise<T | undefined>): Promise<T> {
  const end = Date.now() + 15_000;
  while (Date.now() < end) {
    const answer = await ask();
    if (answer !== undefined) return answer;
    await new Promise(resolve => setTimeout(resolve, 50));
  }
  throw new Error(`waited in vain for ${what}`);
}

export function extension(): vscode.Extension<unknown> {
  const found = vscode.extensions.getExtension('tautline.tautline');
  if (found === undefined) throw new Error('the extension is not installed');
  return found;
}

export function holds(condition: boolean, otherwise: string): void {
  if (!condition) throw new Error(otherwise);
}
