// `tautline language-server --stdio`: the language server for any editor.
import { serveStandardStreams } from '../server/node.ts';
import type { Arguments } from './options.ts';
import { EXIT, UsageError } from './world.ts';

/** Returns at once; the process lives on until the editor ends it. */
export function languageServer({ positionals, flags }: Arguments): number {
  if (!flags.stdio) throw new UsageError('language-server needs --stdio, the only way it speaks');
  if (positionals.length > 0) throw new UsageError(`language-server takes no path, but was given ${positionals[0]}`);
  serveStandardStreams();
  return EXIT.well;
}
