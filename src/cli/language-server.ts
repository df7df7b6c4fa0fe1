// `tautline language-server --stdio`: the language server for any editor.
import type { Arguments } from './options.ts';
import { EXIT, UsageError } from './world.ts';

/** Resolves when the server is listening; the process lives on until the editor ends it. */
export async function languageServer({ positionals, flags }: Arguments): Promise<number> {
  if (!flags.stdio) throw new UsageError('language-server needs --stdio, the only way it speaks');
  if (positionals.length > 0) throw new UsageError(`language-server takes no path, but was given ${positionals[0]}`);
  // It reads `--stdio` from the process's own arguments, and brings a library that no other command loads.
  await import('../server/node-main.ts');
  return EXIT.well;
}
