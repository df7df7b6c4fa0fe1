// The shell in a session with a client, over streams in one process: what is sent when, and what is not.
import { PassThrough } from 'node:stream';
import { afterEach, beforeEach, expect, test } from 'vitest';
import {
  createConnection,
  createProtocolConnection,
  type Diagnostic,
  type ProtocolConnection,
  StreamMessageReader,
  StreamMessageWriter,
} from 'vscode-languageserver/node';
import { serve } from '../../src/server/server.ts';
import { fenced } from './open.ts';

const uri = 'file:///notes/arm.md';
const ARM = fenced(`section Arm: EI 1 MN m2
member R1, Arm: A -- 2 m -- B
support A: fixed
load sign: 1.5 kN down at B
find tip: deflection at B`);

interface Told {
  readonly version?: number;
  readonly diagnostics: Diagnostic[];
}

let client: ProtocolConnection;
let told: Told[];
let version: number;

beforeEach(async () => {
  const [up, down] = [new PassThrough(), new PassThrough()];
  serve(createConnection(new StreamMessageReader(up), new StreamMessageWriter(down)));
  client = createProtocolConnection(new StreamMessageReader(down), new StreamMessageWriter(up));
  told = [];
  version = 1;
  client.onNotification('textDocument/publishDiagnostics', (message: Told) => void told.push(message));
  client.listen();
  await client.sendRequest('initialize', {
    processId: null,
    rootUri: null,
    capabilities: { textDocument: { hover: { contentFormat: ['markdown'] } } },
    initializationOptions: { theme: 'dark' },
  });
  await client.sendNotification('initialized', {});
});

afterEach(() => client.dispose());

test('a mistake is told as it is typed, and is gone when it is mended', async () => {
  await openNote(ARM);
  expect((await hearing(1)).diagnostics).toEqual([]);
  await change('fixed', 'fixd');
  const mistake = await hearing(2);
  expect(mistake.version).toBe(2);
  expect(mistake.diagnostics).toHaveLength(1);
  await change('fixd', 'fixed', ARM.replace('fixed', 'fixd'));
  expect((await hearing(3)).diagnostics).toEqual([]);
});

test('a hover is answered from the text as it is, and its drawing has the colours of the editor', async () => {
  await openNote(ARM);
  const light = { theme: 'light' };
  const first = await hoverOnMember();
  expect(first).toContain('4.000 mm down');
  await client.sendNotification('tautline/theme', light);
  expect(await hoverOnMember()).not.toBe(first);
  await change('1.5 kN', '3.0 kN');
  expect(await hoverOnMember()).toContain('8.000 mm down');
});

test('settings switch off values and drawings', async () => {
  await openNote(ARM);
  expect(await hints()).toHaveLength(1);
  const settings = { tautline: { valuesInText: false, drawingsInHovers: false } };
  await client.sendNotification('workspace/didChangeConfiguration', { settings });
  expect(await hints()).toBeNull();
  expect(await hoverOnMember()).not.toContain('data:');
});

test('a text without a fence is left alone', async () => {
  await openNote('# Tautline\n\nA plain text, with `code`.\n');
  expect(await hints()).toBeNull();
  expect(await client.sendRequest('textDocument/completion', at(2, 3))).toBeNull();
  expect(told).toEqual([]);
});

test('when the last fence goes, so do its diagnostics', async () => {
  await openNote(fenced('let a = b'));
  expect((await hearing(1)).diagnostics).toHaveLength(1);
  await change('tautline', 'text', fenced('let a = b'));
  expect((await hearing(2)).diagnostics).toEqual([]);
  await change('text', 'plain', fenced('let a = b').replace('tautline', 'text'));
  expect(await hints()).toBeNull();
  expect(told).toHaveLength(2);
});

test('a closed note takes its diagnostics along', async () => {
  await openNote(fenced('let a = b'));
  await hearing(1);
  await client.sendNotification('textDocument/didClose', { textDocument: { uri } });
  expect((await hearing(2)).diagnostics).toEqual([]);
});

function openNote(text: string): Promise<void> {
  return client.sendNotification('textDocument/didOpen', {
    textDocument: { uri, languageId: 'markdown', version, text },
  });
}

/** Replaces the first occurrence of the words in the text as it was. */
function change(words: string, by: string, text = ARM): Promise<void> {
  version += 1;
  const before = text.slice(0, text.indexOf(words)).split('\n');
  const start = { line: before.length - 1, character: before.at(-1)?.length ?? 0 };
  return client.sendNotification('textDocument/didChange', {
    textDocument: { uri, version },
    contentChanges: [{ range: { start, end: { ...start, character: start.character + words.length } }, text: by }],
  });
}

/** The diagnostics that came as number `count`. */
async function hearing(count: number): Promise<Told> {
  for (let tries = 0; tries < 500; tries += 1) {
    const heard = told[count - 1];
    if (heard !== undefined) return heard;
    await new Promise(resolve => setTimeout(resolve, 10));
  }
  throw new Error(`heard ${told.length} times, not ${count}`);
}

function at(line: number, character: number): object {
  return { textDocument: { uri }, position: { line, character } };
}

async function hoverOnMember(): Promise<string> {
  const shown: { contents: { value: string } } = await client.sendRequest('textDocument/hover', at(2, 8));
  return shown.contents.value;
}

function hints(): Promise<unknown[] | null> {
  const range = { start: { line: 0, character: 0 }, end: { line: 99, character: 0 } };
  return client.sendRequest('textDocument/inlayHint', { textDocument: { uri }, range });
}
