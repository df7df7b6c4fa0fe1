// The process around the command line: its streams, its arguments and its exit status.
import { run } from './run.ts';
import { EXIT, type Sink } from './world.ts';

// A reader that has seen enough (`tautline check … | head`) closes the pipe: that is no failure of ours.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code !== 'EPIPE') throw error;
  process.exit();
});

// The exit status is set rather than the process ended, so that what is written to a pipe gets there.
try {
  process.exitCode = await run(process.argv.slice(2), {
    cwd: process.cwd(),
    env: process.env,
    out: sinkOf(process.stdout),
    error: sinkOf(process.stderr),
  });
} catch (error) {
  // A mistake of ours, which must not look like a verdict on a note.
  console.error('tautline: a mistake in the program, please report it:', error);
  process.exitCode = EXIT.usage;
}

function sinkOf(stream: NodeJS.WriteStream): Sink {
  return {
    write: text => void stream.write(text),
    isTerminal: stream.isTTY === true,
    columns: stream.isTTY ? stream.columns : undefined,
  };
}
