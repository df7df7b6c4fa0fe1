// Entry of the server bundle that runs as a web worker in VS Code for the Web.
import { BrowserMessageReader, BrowserMessageWriter, createConnection } from 'vscode-languageserver/browser';
import { serve } from './server.ts';

// A worker's global is its message port; the compiler only knows Node's global here.
const port = globalThis as unknown as ConstructorParameters<typeof BrowserMessageReader>[0];

serve(createConnection(new BrowserMessageReader(port), new BrowserMessageWriter(port)));
