// Entry of the server in a Node process. It speaks the way that the arguments of the process name: `--node-ipc` when
// VS Code forks it, `--stdio` for any other editor.
import { createConnection, ProposedFeatures } from 'vscode-languageserver/node';
import { serve } from './server.ts';

serve(createConnection(ProposedFeatures.all));
