// Diagnostics come while the writer types and go when the mistake is mended.
import * as vscode from 'vscode';
import { type EditorTest, editorTest, holds, open, replace, until } from './editor-test.ts';

export const typing: readonly EditorTest[] = [
  editorTest('a mistake is underlined at its words as it is typed, and no more when it is mended', async () => {
    const editor = await open('cantilever.md');
    await replace(editor, 'support A: fixed', 'support Z: fixed');
    const found = await until('the unknown point', () =>
      errorsOf(editor.document).find(({ range }) => editor.document.getText(range) === 'Z'),
    );
    holds(found.message.includes('Z'), `said ${found.message}`);
    await replace(editor, 'support Z: fixed', 'support A: fixed');
    await until('silence', () => (errorsOf(editor.document).length === 0 ? true : undefined));
  }),

  editorTest('a limit that is passed is a diagnostic, and no more when it is raised', async () => {
    const editor = await open('cantilever.md');
    await replace(editor, '<= 4 kN m', '<= 2 kN m');
    await until('limit-exceeded', () => told(editor.document).find(({ code }) => code === 'limit-exceeded'));
    await replace(editor, '<= 2 kN m', '<= 4 kN m');
    await until('silence', () => (told(editor.document).length === 0 ? true : undefined));
  }),

  editorTest('a quick fix mends a long dash', async () => {
    const editor = await open('cantilever.md');
    await replace(editor, 'A -- 2 m', 'A — 2 m');
    const found = await until('long-dash', () => told(editor.document).find(({ code }) => code === 'long-dash'));
    const actions = await vscode.commands.executeCommand<vscode.CodeAction[]>(
      'vscode.executeCodeActionProvider',
      editor.document.uri,
      found.range,
    );
    const fix = actions.find(({ edit }) => edit !== undefined);
    holds(fix?.edit !== undefined, 'no fix is offered');
    if (fix?.edit !== undefined) await vscode.workspace.applyEdit(fix.edit);
    await until('silence', () => (told(editor.document).length === 0 ? true : undefined));
  }),
];

function told(document: vscode.TextDocument): vscode.Diagnostic[] {
  return vscode.languages.getDiagnostics(document.uri).filter(({ source }) => source === 'tautline');
}

function errorsOf(document: vscode.TextDocument): vscode.Diagnostic[] {
  return told(document).filter(({ severity }) => severity === vscode.DiagnosticSeverity.Error);
}
