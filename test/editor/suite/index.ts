// Entry of the suite in an extension host on Node. The results go to the file that the driver waits for, whole at once.
import { renameSync, writeFileSync } from 'node:fs';
import { results } from './results.ts';

export async function run(): Promise<void> {
  const file = process.env.TAUTLINE_RESULTS;
  if (file === undefined) throw new Error('TAUTLINE_RESULTS names no file');
  writeFileSync(`${file}.part`, JSON.stringify(await results()));
  renameSync(`${file}.part`, file);
}
