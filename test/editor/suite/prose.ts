// The built-in preview shows the structure and its answers, and values in the prose.
import * as vscode from 'vscode';
import { type EditorTest, editorTest, holds, open } from './editor-test.ts';

export const prose: readonly EditorTest[] = [
  editorTest('the preview shows the drawing, the answer and the value in the prose', async () => {
    const { document } = await open('cantilever.md');
    const html = await vscode.commands.executeCommand<string>('markdown.api.render', document);
    holds(/<svg[^>]*role="img"/.test(html), 'no drawing');
    holds(html.includes('4.000'), 'no answer');
    const paragraph = html.slice(html.lastIndexOf('The tip moves'));
    holds(paragraph.includes('4.000') && !paragraph.includes('tautline tip'), `the prose reads ${paragraph}`);
  }),

  editorTest('the notes of the sample project render without a throw and without errors', async () => {
    if (vscode.workspace.workspaceFolders === undefined) return;
    const notes = await vscode.workspace.findFiles('sample/*.md');
    holds(notes.length >= 5, `there are ${notes.length}`);
    for (const uri of notes) await vscode.window.showTextDocument(await vscode.workspace.openTextDocument(uri));
    await new Promise(resolve => setTimeout(resolve, 1500));
    for (const uri of notes) {
      const document = await vscode.workspace.openTextDocument(uri);
      const html = await vscode.commands.executeCommand<string>('markdown.api.render', document);
      holds(html.length > 100, `${uri.path} renders as ${html}`);
      const errors = vscode.languages
        .getDiagnostics(uri)
        .filter(({ source, severity, code }) => source === 'tautline' && severity === 0 && code !== 'limit-exceeded');
      holds(errors.length === 0, `${uri.path}: ${errors.map(({ message }) => message).join('; ')}`);
    }
  }),
];
