// Start of the command line: `tautline check` on a small note, and on a note of 300 lines, over `node -e 0`, pair by pair.
import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import process from 'node:process';
import { longNote, smallNote } from './notes.mjs';
import { median } from './statistics.mjs';

const PAIRS = 25;
const folder = mkdtempSync(join(tmpdir(), 'tautline-bench-'));

try {
  for (const [name, text] of [
    ['small note', smallNote()],
    ['300 lines', longNote()],
  ]) {
    const file = join(folder, `${name.replace(' ', '-')}.md`);
    writeFileSync(file, text);
    const run = ['dist/cli.cjs', 'check', file];
    // The first runs fill the compile cache and the disk's.
    for (let i = 0; i < 3; i += 1) time(run);
    const pairs = Array.from({ length: PAIRS }, () => ({ floor: time(['-e', '0']), check: time(run) }));
    const ratio = median(pairs.map(({ floor, check }) => check / floor));
    const [floor, check] = [median(pairs.map(pair => pair.floor)), median(pairs.map(pair => pair.check))];
    console.log(`check, ${name}: ${ratio.toFixed(2)} × node -e 0 (${check.toFixed(0)} ms over ${floor.toFixed(0)} ms)`);
  }
} finally {
  rmSync(folder, { recursive: true, force: true });
}

/** Wall time, ms. */
function time(parameters) {
  const start = performance.now();
  const { status, stderr } = spawnSync(process.execPath, parameters, { encoding: 'utf8' });
  if (status !== 0) throw new Error(`node ${parameters.join(' ')} ended with ${status}: ${stderr}`);
  return performance.now() - start;
}
