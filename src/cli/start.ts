// Starts the command line from the code that V8 made of it the last time. Node's own compile cache keeps what a file
// holds at its top level only; what runs inside functions, which is nearly all of a check, would be compiled afresh at
// every start and double its time.
import { readdirSync, readFileSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import { Script } from 'node:vm';

const folder = join(__dirname, 'cli');
const program = join(folder, 'program.cjs');
const { size, mtimeMs } = statSync(program);
// V8 itself refuses code of another version or of other flags; that the program is the same is ours to see to.
const cache = join(folder, `program-${process.version}-${process.arch}-${size}-${Math.trunc(mtimeMs)}.cache`);

const parameters = ['exports', 'require', 'module', '__filename', '__dirname'];
const cachedData = readIfThere(cache);
const script = new Script(`(function (${parameters.join(', ')}) {${readFileSync(program, 'utf8')}\n})`, {
  filename: program,
  ...(cachedData === undefined ? {} : { cachedData }),
});
const loaded = { exports: {} };
script.runInThisContext().call(loaded.exports, loaded.exports, createRequire(program), loaded, program, folder);

// Written at the end of a check, the command that CI and people run most, when all that it needs has been compiled.
const used = cachedData !== undefined && script.cachedDataRejected !== true;
if (!used && process.argv[2] === 'check') process.once('exit', keep);

function readIfThere(path: string): Buffer | undefined {
  try {
    return readFileSync(path);
  } catch {
    return undefined;
  }
}

/** Where the folder cannot be written, as in an installation for all users, every start is the first. */
function keep(): void {
  try {
    for (const name of readdirSync(folder)) if (name.endsWith('.cache')) rmSync(join(folder, name));
    const half = `${cache}.${process.pid}`;
    writeFileSync(half, script.createCachedData());
    renameSync(half, cache);
  } catch {
    // The next start tries again.
  }
}
