// Entry on the desktop and on remote machines. The client and the page are bundles of their own, read when they are
// first needed, so that opening a README costs next to nothing.
import type { MarkdownIt } from 'markdown-it';
import type * as vscode from 'vscode';
import { stopClient, watchForNotes } from './activation.ts';

export function activate(context: vscode.ExtensionContext): { extendMarkdownIt: (md: MarkdownIt) => MarkdownIt } {
  watchForNotes(context, (...given) => {
    // The bundle is built from that very file.
    const { createClient } = require('./client.cjs') as typeof import('./client-node.ts');
    return createClient(...given);
  });
  return {
    extendMarkdownIt(md) {
      // The bundle is built from that very file.
      const { tautlinePlugin } = require('./page.cjs') as typeof import('../page/index.ts');
      return md.use(tautlinePlugin);
    },
  };
}

export function deactivate(): Promise<void> {
  return stopClient();
}
