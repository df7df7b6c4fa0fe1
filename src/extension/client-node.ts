// The client on the desktop and on remote machines: the server is a process of its own.
import { join } from 'node:path';
import type * as vscode from 'vscode';
import { LanguageClient, type ServerOptions, TransportKind } from 'vscode-languageclient/node';
import { CLIENT_ID, CLIENT_NAME, clientOptions, followTheme } from './client-options.ts';

export function createClient(context: vscode.ExtensionContext): LanguageClient {
  const run = { module: join(context.extensionPath, 'dist/server.cjs'), transport: TransportKind.ipc };
  const server: ServerOptions = { run, debug: run };
  const client = new LanguageClient(CLIENT_ID, CLIENT_NAME, server, clientOptions());
  followTheme(client, context);
  return client;
}
