// Runs the tests one after the other; one that throws costs itself only.
import { activation } from './activation.ts';
import type { EditorTest } from './editor-test.ts';
import { figures } from './figures.ts';
import { prose } from './prose.ts';
import { typing } from './typing.ts';

const TESTS: readonly EditorTest[] = [...activation, ...typing, ...figures, ...prose];

export interface Result {
  readonly name: string;
  readonly error?: string;
}

export async function results(): Promise<Result[]> {
  const all: Result[] = [];
  for (const { name, body } of TESTS) {
    try {
      await body();
      all.push({ name });
    } catch (error) {
      all.push({ name, error: error instanceof Error ? (error.stack ?? error.message) : String(error) });
    }
  }
  return all;
}
