// The process around the command line: its streams, its arguments and its exit status.
import { fstatSync, writeSync } from 'node:fs';
import { run } from './run.ts';
import { EXIT, type Sink } from './world.ts';

const world = { cwd: process.cwd(), env: process.env, out: sinkOf('stdout'), error: sinkOf('stderr') };

// The exit status is set rather than the process ended, so that what is written to a terminal gets there.
run(process.argv.slice(2), world).then(
  status => {
    process.exitCode = status;
  },
  (error: unknown) => {
    // A mistake of ours, which must not look like a verdict on a note.
    console.error('tautline: a mistake in the program, please report it:', error);
    process.exitCode = EXIT.usage;
  },
);

/** A terminal is written to as Node does it; a pipe or a file directly, which spares the start Node's stream library. */
function sinkOf(name: 'stdout' | 'stderr'): Sink {
  const descriptor = { stdout: 1, stderr: 2 }[name];
  if (!isCharacterDevice(descriptor)) {
    return { write: text => writeAll(descriptor, text), isTerminal: false, columns: undefined };
  }
  const stream = process[name];
  return {
    write: text => void stream.write(text),
    isTerminal: stream.isTTY === true,
    columns: stream.isTTY ? stream.columns : undefined,
  };
}

function isCharacterDevice(descriptor: number): boolean {
  try {
    return fstatSync(descriptor).isCharacterDevice();
  } catch {
    return false;
  }
}

function writeAll(descriptor: number, text: string): void {
  const bytes = Buffer.from(text);
  for (let written = 0; written < bytes.length; ) {
    try {
      written += writeSync(descriptor, bytes, written);
    } catch (error) {
      if (!(error instanceof Error && 'code' in error)) throw error;
      // A reader that has seen enough (`tautline check … | head`) closes the pipe: that is no failure of ours.
      if (error.code === 'EPIPE') process.exit();
      if (error.code !== 'EAGAIN') throw error;
      // The pipe is full: its reader needs a moment.
      Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0, 5);
    }
  }
}
