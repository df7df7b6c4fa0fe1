// The floor: a server that keeps the text as ours does and answers each change with one diagnostic, having read nothing.
import { createConnection, ProposedFeatures, TextDocumentSyncKind, TextDocuments } from 'vscode-languageserver/node';
import { TextDocument } from 'vscode-languageserver-textdocument';

const connection = createConnection(ProposedFeatures.all);
const documents = new TextDocuments(TextDocument);
const place = { start: { line: 0, character: 0 }, end: { line: 0, character: 1 } };

connection.onInitialize(() => ({ capabilities: { textDocumentSync: TextDocumentSyncKind.Incremental } }));
documents.onDidChangeContent(({ document: { uri, version } }) => {
  void connection.sendDiagnostics({ uri, version, diagnostics: [{ range: place, message: 'echo' }] });
});
documents.listen(connection);
connection.listen();
