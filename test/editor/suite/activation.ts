// The extension wakes for Markdown and for nothing else, and leaves a note without a fence alone.
import * as vscode from 'vscode';
import { type EditorTest, editorTest, extension, holds, open, until } from './editor-test.ts';

export const activation: readonly EditorTest[] = [
  editorTest('is asleep when the workbench opens', async () => {
    holds(!extension().isActive, 'active before any Markdown was open');
  }),

  editorTest('stays asleep for a text that is not Markdown', async () => {
    await vscode.window.showTextDocument(
      await vscode.workspace.openTextDocument({ language: 'plaintext', content: 'x' }),
    );
    await new Promise(resolve => setTimeout(resolve, 500));
    holds(!extension().isActive, 'active for plain text');
  }),

  editorTest('wakes for Markdown, in little time', async () => {
    await open('README.md');
    await until('activation', () => (extension().isActive ? true : undefined));
  }),

  editorTest('finds nothing in a note without a fence', async () => {
    const { document } = await open('README.md');
    await new Promise(resolve => setTimeout(resolve, 1000));
    const told = vscode.languages.getDiagnostics(document.uri).filter(({ source }) => source === 'tautline');
    holds(told.length === 0, `told ${told.map(({ message }) => message).join('; ')}`);
    const html = await vscode.commands.executeCommand<string>('markdown.api.render', document);
    holds(!/tautline/i.test(html), 'the preview of a plain README mentions the extension');
  }),

  editorTest('works in a workspace that is not trusted', async () => {
    const { capabilities } = extension().packageJSON;
    holds(capabilities.untrustedWorkspaces.supported === true, 'not declared');
  }),
];
