// Entry of the suite inside the extension host. The results go to the file that the driver waits for, whole at once.
import { renameSync, writeFileSync } from 'node:fs';
import { activation } from './activation.ts';
import type { EditorTest } from './editor-test.ts';
import { figures } from './figures.ts';
import { prose } from './prose.ts';
import { typing } from './typing.ts';

const TESTS: readonly EditorTest[] = [...activation, ...typing, ...figures, ...prose];

export async function run(): Promise<void> {
  const results: { name: string; error?: string }[] = [];
  for (const { name, body } of TESTS) {
    try {
      await body();
      results.push({ name });
    } catch (error) {
      results.push({ name, error: error instanceof Error ? (error.stack ?? error.message) : String(error) });
    }
  }
  const file = process.env.TAUTLINE_RESULTS;
  if (file === undefined) throw new Error('TAUTLINE_RESULTS names no file');
  writeFileSync(`${file}.part`, JSON.stringify(results));
  renameSync(`${file}.part`, file);
}
