// Hovers, values beside the text and completion, on a cantilever of 2 m with EI = 1 MN m² and 1.5 kN at its tip:
// the tip moves P L³ / 3 E I = 4 mm down, the moment at the wall is P L = 3 kN m.
import * as vscode from 'vscode';
import { type EditorTest, editorTest, holds, open, placeOf, until } from './editor-test.ts';

export const figures: readonly EditorTest[] = [
  editorTest('a hover on a member shows how far its tip moves, with a drawing', async () => {
    const text = await hoverText('member R1', 'member '.length);
    holds(text.includes('4.000 mm down'), `said ${text}`);
    holds(text.includes('data:image/svg+xml;base64,'), 'no drawing');
  }),

  editorTest('a hover on a support shows its reaction', async () => {
    const text = await hoverText('support A', 'support '.length);
    holds(text.includes('1.500 kN up'), `said ${text}`);
  }),

  editorTest('a hover on a load shows its resultant', async () => {
    const text = await hoverText('1.5 kN down', 1);
    holds(text.includes('1.500 kN down'), `said ${text}`);
  }),

  editorTest('a hover on a result shows its value, limit and use', async () => {
    const text = await hoverText('require root', 'require '.length);
    holds(text.includes('3.000 kN m'), `said ${text}`);
    holds(text.includes('at most 4 kN m'), `said ${text}`);
    holds(text.includes('0.750'), `said ${text}`);
  }),

  editorTest('a hover on a value shows it', async () => {
    const text = await hoverText('let half', 'let '.length);
    holds(text.includes('0.7500 kN'), `said ${text}`);
  }),

  editorTest('no hover of ours in the prose', async () => {
    const text = await hoverText('One arm', 1, false);
    holds(text === '', `said ${text}`);
  }),

  editorTest('values stand at the end of find, require and let, and beside the prose value', async () => {
    const { document } = await open('cantilever.md');
    const whole = new vscode.Range(0, 0, document.lineCount, 0);
    const hints = await until('inlay hints', async () => {
      const shown = await vscode.commands.executeCommand<vscode.InlayHint[]>(
        'vscode.executeInlayHintProvider',
        document.uri,
        whole,
      );
      return shown.length > 0 ? shown : undefined;
    });
    const labels = hints.map(({ label, position }) => `${document.lineAt(position.line).text.split(' ')[0]} ${label}`);
    for (const wanted of ['find = 4.000 mm down', 'require = ', 'let = 0.7500 kN', 'The = 4.000 mm down']) {
      holds(
        labels.some(label => label.startsWith(wanted)),
        `no ${wanted} in ${labels.join(' | ')}`,
      );
    }
  }),

  editorTest('completion offers statements at the start of a line, and the names of the note', async () => {
    const { document } = await open('cantilever.md');
    const first = await labelsAt(document, placeOf(document, 'find tip'));
    for (const wanted of ['member', 'support', 'require']) holds(first.includes(wanted), `no ${wanted}`);
    const points = await labelsAt(document, placeOf(document, 'at B\nrequire', 3));
    for (const wanted of ['A', 'B']) holds(points.includes(wanted), `no ${wanted}`);
  }),

  editorTest('completion is silent in the prose', async () => {
    const { document } = await open('cantilever.md');
    const labels = await labelsAt(document, placeOf(document, 'fixed at the wall'));
    holds(!labels.includes('require'), 'offers statements in the prose');
  }),
];

async function hoverText(words: string, behind: number, expected = true): Promise<string> {
  const { document } = await open('cantilever.md');
  const ask = async (): Promise<string> => {
    const hovers = await vscode.commands.executeCommand<vscode.Hover[]>(
      'vscode.executeHoverProvider',
      document.uri,
      placeOf(document, words, behind),
    );
    return hovers
      .flatMap(({ contents }) => contents)
      .map(content => (typeof content === 'string' ? content : content.value))
      .join('\n');
  };
  return expected ? until(`a hover on ${words}`, async () => (await ask()) || undefined) : ask();
}

async function labelsAt(document: vscode.TextDocument, position: vscode.Position): Promise<string[]> {
  const list = await vscode.commands.executeCommand<vscode.CompletionList>(
    'vscode.executeCompletionItemProvider',
    document.uri,
    position,
  );
  // The editor itself offers the words of the text.
  const offered = list.items.filter(({ kind }) => kind !== vscode.CompletionItemKind.Text);
  return offered.map(({ label }) => (typeof label === 'string' ? label : label.label));
}
