// The server in a Node process: over standard streams for any editor, over IPC when VS Code forks it.
import { createConnection, ProposedFeatures } from 'vscode-languageserver/node';
import { serve } from './server.ts';

/** Speaks the protocol on standard input and output until the client ends it. */
export function serveStandardStreams(): void {
  serve(createConnection(ProposedFeatures.all, process.stdin, process.stdout));
}

/** Takes the way that the arguments of the process name: `--node-ipc`, `--stdio`, `--pipe`, `--socket`. */
export function serveAsArgued(): void {
  serve(createConnection(ProposedFeatures.all));
}
