// The thin shell that speaks the protocol: it keeps the open notes, evaluates each version of a text once, and hands the
// features what they read. It knows neither Node nor the browser.
import {
  CodeActionKind,
  type Connection,
  type InitializeResult,
  TextDocumentSyncKind,
  TextDocuments,
} from 'vscode-languageserver';
import { TextDocument } from 'vscode-languageserver-textdocument';
import { codeActions } from './code-actions.ts';
import { completions, TRIGGER_CHARACTERS } from './completion.ts';
import { hover } from './hover/hover.ts';
import { inlayHints } from './inlay-hints.ts';
import { NoteKeeper } from './note-keeper.ts';
import { DEFAULT_SETTINGS, readSettings, type Settings } from './settings.ts';
import { readTheme, THEME_NOTIFICATION, type Theme } from './theme.ts';

export function serve(connection: Connection): void {
  const documents = new TextDocuments(TextDocument);
  const keeper = new NoteKeeper(
    (uri, version, diagnostics) => void connection.sendDiagnostics({ uri, version, diagnostics }),
    message => connection.console.error(message),
  );
  let settings: Settings = DEFAULT_SETTINGS;
  let theme: Theme = 'light';
  let hoverFormat: 'markdown' | 'plaintext' = 'plaintext';
  let refreshesHints = false;
  let snippets = false;

  connection.onInitialize((params): InitializeResult => {
    const { textDocument, workspace } = params.capabilities;
    hoverFormat = textDocument?.hover?.contentFormat?.includes('markdown') ? 'markdown' : 'plaintext';
    snippets = textDocument?.completion?.completionItem?.snippetSupport === true;
    refreshesHints = workspace?.inlayHint?.refreshSupport === true;
    theme = readTheme(params.initializationOptions);
    return { capabilities: CAPABILITIES, serverInfo: { name: 'tautline' } };
  });
  connection.onDidChangeConfiguration(({ settings: sent }) => {
    settings = readSettings(typeof sent === 'object' && sent !== null ? Reflect.get(sent, 'tautline') : undefined);
    if (refreshesHints) void connection.languages.inlayHint.refresh();
  });
  connection.onNotification(THEME_NOTIFICATION, (sent: unknown) => {
    theme = readTheme(sent);
  });

  documents.onDidChangeContent(({ document }) => keeper.changed(document));
  documents.onDidClose(({ document }) => keeper.closed(document.uri));

  const noteAt = (uri: string) => keeper.noteOf(documents.get(uri));
  connection.onHover(({ textDocument, position }) => {
    const note = noteAt(textDocument.uri);
    const drawings = settings.drawingsInHovers ? theme : undefined;
    return note && hover(note, position, { format: hoverFormat, drawings });
  });
  connection.languages.inlayHint.on(({ textDocument, range }) => {
    const note = settings.valuesInText ? noteAt(textDocument.uri) : undefined;
    return note && inlayHints(note, range);
  });
  connection.onCompletion(({ textDocument, position }) => {
    const note = noteAt(textDocument.uri);
    return note && completions(note, position, snippets);
  });
  connection.onCodeAction(({ textDocument, range }) => {
    const note = noteAt(textDocument.uri);
    return note && codeActions(note, range);
  });

  documents.listen(connection);
  connection.listen();
}

const CAPABILITIES: InitializeResult['capabilities'] = {
  textDocumentSync: TextDocumentSyncKind.Incremental,
  hoverProvider: true,
  inlayHintProvider: true,
  completionProvider: { triggerCharacters: [...TRIGGER_CHARACTERS] },
  codeActionProvider: { codeActionKinds: [CodeActionKind.QuickFix] },
};
