// The server in a Node process: over IPC when VS Code forks it, over standard streams for any editor. The process's own
// arguments say which: `--node-ipc`, `--stdio`, `--pipe`, `--socket`. It serves as soon as it is loaded.
import { createConnection, ProposedFeatures } from 'vscode-languageserver/node';
import { serve } from './server.ts';

serve(createConnection(ProposedFeatures.all));
