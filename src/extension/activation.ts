// What the extension does on the desktop, on a remote machine and on the web alike: it looks on until a note with a
// fence is open, and only then starts the server. It sends nothing anywhere.
import * as vscode from 'vscode';
import type { BaseLanguageClient } from 'vscode-languageclient';
import { mayHoldCalculation } from '../note/calculation-mark.ts';

/** Makes the client, not yet started; called once, when the first note is open. */
export type ClientFactory = (context: vscode.ExtensionContext) => BaseLanguageClient;

let client: BaseLanguageClient | undefined;

export function watchForNotes(context: vscode.ExtensionContext, createClient: ClientFactory): void {
  const { subscriptions } = context;
  const watching: vscode.Disposable[] = [];
  const consider = (document: vscode.TextDocument): void => {
    if (client !== undefined || !isNote(document)) return;
    for (const watch of watching) watch.dispose();
    client = createClient(context);
    void client.start();
  };

  subscriptions.push(vscode.commands.registerCommand('tautline.restart', restart));
  watching.push(
    vscode.workspace.onDidOpenTextDocument(consider),
    vscode.workspace.onDidChangeTextDocument(({ document }) => consider(document)),
  );
  subscriptions.push(...watching);
  for (const document of vscode.workspace.textDocuments) consider(document);
}

async function restart(): Promise<void> {
  await client?.stop();
  await client?.start();
}

export async function stopClient(): Promise<void> {
  await client?.stop();
  client = undefined;
}

function isNote(document: vscode.TextDocument): boolean {
  return document.languageId === 'markdown' && mayHoldCalculation(document.getText());
}
