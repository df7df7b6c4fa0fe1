// Entry in VS Code for the Web: one bundle, and the server in a web worker.
import type { MarkdownIt } from 'markdown-it';
import * as vscode from 'vscode';
import { LanguageClient } from 'vscode-languageclient/browser';
import { tautlinePlugin } from '../page/index.ts';
import { stopClient, watchForNotes } from './activation.ts';
import { CLIENT_ID, CLIENT_NAME, clientOptions, followTheme } from './client-options.ts';

// The compiler knows Node's globals only; a browser has this one.
declare const Worker: new (script: string) => globalThis.Worker;

export function activate(context: vscode.ExtensionContext): { extendMarkdownIt: (md: MarkdownIt) => MarkdownIt } {
  watchForNotes(context, createClient);
  return { extendMarkdownIt: md => md.use(tautlinePlugin) };
}

export function deactivate(): Promise<void> {
  return stopClient();
}

function createClient(context: vscode.ExtensionContext): LanguageClient {
  const script = vscode.Uri.joinPath(context.extensionUri, 'dist/server-web.js').toString(true);
  // The worker itself, not a function that makes one: the client asks that for `instanceof Worker`, which the worker
  // that VS Code puts in the browser's place is not.
  const client = new LanguageClient(CLIENT_ID, CLIENT_NAME, new Worker(script), clientOptions());
  followTheme(client, context);
  return client;
}
