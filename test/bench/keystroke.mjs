// From a keystroke to the diagnostics of the text it made, on a note of 300 lines, over a server that only echoes. Both
// run as VS Code runs them (forked, IPC) and take the same keystrokes in turn: every 30 ms as a person types, and
// without a pause.
import { fork } from 'node:child_process';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import process from 'node:process';
import { build } from 'esbuild';
import { longNote } from './notes.mjs';
import { quantile } from './statistics.mjs';

const { createProtocolConnection, IPCMessageReader, IPCMessageWriter } = createRequire(import.meta.url)(
  'vscode-languageserver/node',
);

const WARM_UP = 300;
const PACED = 300;
const TIGHT = 600;
const PACE = 30;
const uri = 'file:///bench/note.md';

await build({
  entryPoints: ['test/bench/echo-server.mjs'],
  outfile: 'out/bench/echo-server.cjs',
  bundle: true,
  minify: true,
  platform: 'node',
  format: 'cjs',
});

const text = longNote();
/** The change that the keystroke number `i` makes; no text comes twice where the frame depends on it. */
const KEYSTROKES = {
  'in prose': i => changeAt('Nothing here depends', 8, i % 2, i % 2 === 0 ? 'x' : ''),
  'in a figure that the frame depends on': i => changeAt('0.6000 kN/m2', 2, 4, String(5000 + i)),
};

let sent = 0;
for (const [what, keystrokes] of Object.entries(KEYSTROKES)) {
  const ours = await start('dist/server.cjs');
  const echo = await start('out/bench/echo-server.cjs');
  await measure(ours, echo, keystrokes, WARM_UP, 0);
  show(`${what}, every ${PACE} ms`, await measure(ours, echo, keystrokes, PACED, PACE));
  show(`${what}, without a pause`, await measure(ours, echo, keystrokes, TIGHT, 0));
  ours.stop();
  echo.stop();
}
process.exit(0);

/** Replaces so many characters, so far behind where the words stand in the note, in the note as it was opened. */
function changeAt(words, behind, replaced, by) {
  const before = text.slice(0, text.indexOf(words) + behind).split('\n');
  const [line, character] = [before.length - 1, before.at(-1).length];
  return { range: { start: { line, character }, end: { line, character: character + replaced } }, text: by };
}

async function measure(ours, echo, keystrokes, count, pace) {
  const times = { ours: [], echo: [] };
  for (let i = 0; i < count; i += 1) {
    const keystroke = keystrokes(sent);
    sent += 1;
    const order = i % 2 === 0 ? ['ours', 'echo'] : ['echo', 'ours'];
    for (const name of order) {
      times[name].push(await { ours, echo }[name].type(keystroke));
      if (pace > 0) await new Promise(resolve => setTimeout(resolve, pace));
    }
  }
  return times;
}

function show(what, { ours, echo }) {
  const figures = [0.5, 0.95].map(part => {
    const [mine, floor] = [quantile(ours, part), quantile(echo, part)];
    return `p${100 * part} ${(mine / floor).toFixed(2)} × (${mine.toFixed(2)} ms over ${floor.toFixed(2)} ms)`;
  });
  console.log(`${what}: ${figures.join(', ')}`);
}

async function start(file) {
  const child = fork(join(process.cwd(), file), ['--node-ipc'], { stdio: ['ignore', 'inherit', 'inherit', 'ipc'] });
  const connection = createProtocolConnection(new IPCMessageReader(child), new IPCMessageWriter(child));
  let version = 1;
  let arrived = () => {};
  connection.onNotification('textDocument/publishDiagnostics', told => {
    if (told.version === version) arrived();
  });
  connection.listen();
  await connection.sendRequest('initialize', { processId: process.pid, rootUri: null, capabilities: {} });
  await connection.sendNotification('initialized', {});
  const told = () =>
    new Promise(resolve => {
      arrived = resolve;
    });
  const opened = told();
  void connection.sendNotification('textDocument/didOpen', {
    textDocument: { uri, languageId: 'markdown', version, text },
  });
  await opened;
  return {
    async type(contentChange) {
      version += 1;
      const done = told();
      const begin = performance.now();
      void connection.sendNotification('textDocument/didChange', {
        textDocument: { uri, version },
        contentChanges: [contentChange],
      });
      await done;
      return performance.now() - begin;
    },
    stop: () => child.kill(),
  };
}
