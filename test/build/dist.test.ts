// What is shipped, as the build left it in dist/: `npm test` builds first.
import { spawn } from 'node:child_process';
import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';
import markdownIt from 'markdown-it';
import { expect, test } from 'vitest';
import {
  createProtocolConnection,
  type InitializeResult,
  StreamMessageReader,
  StreamMessageWriter,
} from 'vscode-languageserver/node';

const dist = resolve('dist');
const bundles = readdirSync(dist).filter(name => /\.[cm]?js$/.test(name));

test('opening a README reads a few kilobytes', () => {
  expect(statSync(join(dist, 'extension.cjs')).size).toBeLessThan(4000);
});

test('no bundle knows the machine that it was made on', () => {
  for (const name of bundles) expect(readFileSync(join(dist, name), 'utf8'), name).not.toContain(resolve('.'));
});

test('the licences of what is bundled are told', () => {
  const told = readFileSync(join(dist, 'third-party-licences.txt'), 'utf8');
  for (const name of ['markdown-it', 'mathjs', 'yaml', 'vscode-languageserver']) expect(told).toContain(`\n${name} `);
});

test('the markdown-it plugin works on its own', async () => {
  const { default: plugin } = await import(pathToFileURL(join(dist, 'markdown-it-plugin.mjs')).href);
  const note = readFileSync('test/editor/workspace/cantilever.md', 'utf8');
  const html = markdownIt().use(plugin).render(note);
  expect(html).toContain('<svg');
  expect(html).toContain('4.000');
});

test('the language server answers on standard streams, and ends when it is told to', async () => {
  const server = spawn(process.execPath, [join(dist, 'cli.cjs'), 'language-server', '--stdio']);
  const ended = new Promise(done => server.once('exit', done));
  const connection = createProtocolConnection(
    new StreamMessageReader(server.stdout),
    new StreamMessageWriter(server.stdin),
  );
  connection.listen();
  const greeting = { processId: null, rootUri: null, capabilities: {} };
  const { capabilities }: InitializeResult = await connection.sendRequest('initialize', greeting);
  expect(capabilities.hoverProvider).toBe(true);
  await connection.sendRequest('shutdown');
  await connection.sendNotification('exit');
  expect(await ended).toBe(0);
});
