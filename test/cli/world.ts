// A process to run the command line in, and a folder on disk for it to read.
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { run } from '../../src/cli/run.ts';
import type { Sink, World } from '../../src/cli/world.ts';

export interface Outcome {
  readonly status: number;
  readonly out: string;
  readonly error: string;
}

export interface Folder {
  readonly path: string;
  run(...args: string[]): Promise<Outcome>;
  runWith(world: Partial<Pick<World, 'env'>> & { columns?: number }, ...args: string[]): Promise<Outcome>;
  remove(): void;
}

/** `files`: paths in the folder to their contents. */
export function folderOf(files: Readonly<Record<string, string | Uint8Array>>): Folder {
  const path = mkdtempSync(join(tmpdir(), 'tautline-'));
  for (const [name, contents] of Object.entries(files)) {
    mkdirSync(dirname(join(path, name)), { recursive: true });
    writeFileSync(join(path, name), contents);
  }
  const runWith: Folder['runWith'] = async ({ env = {}, columns }, ...args) => {
    const out: string[] = [];
    const error: string[] = [];
    const status = await run(args, { cwd: path, env, out: sinkOf(out, columns), error: sinkOf(error, columns) });
    return { status, out: out.join(''), error: error.join('') };
  };
  return {
    path,
    run: (...args) => runWith({}, ...args),
    runWith,
    remove: () => rmSync(path, { recursive: true }),
  };
}

/** A terminal where it has columns, else a pipe. */
function sinkOf(lines: string[], columns: number | undefined): Sink {
  return { write: text => void lines.push(text), isTerminal: columns !== undefined, columns };
}
