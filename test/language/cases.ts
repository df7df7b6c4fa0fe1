// Reads text files of named cases. A case is `=== name`, the input, `---`, and what should come of it.
// `UPDATE=1 npm test` writes anew what comes of each; the difference is then read.
import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';

interface Case {
  readonly name: string;
  readonly input: string;
  readonly expected: string;
}

/** Runs every file of a folder whose name begins so, through `run`. */
export function checkCases(folder: URL, prefix: string, run: (input: string) => string): void {
  for (const file of readdirSync(folder).filter(name => name.startsWith(prefix))) {
    const path = new URL(file, folder);
    const cases = readCases(readFileSync(path, 'utf8'));
    if (process.env.UPDATE) {
      writeFileSync(path, cases.map(({ name, input }) => `=== ${name}\n${input}\n---\n${run(input)}\n`).join('\n'));
    }
    describe(file, () => {
      test.for(cases)('$name', ({ input, expected }) => {
        expect(run(input)).toBe(process.env.UPDATE ? run(input) : expected);
      });
    });
  }
}

function readCases(text: string): Case[] {
  return text
    .split(/^=== /m)
    .slice(1)
    .map(part => {
      const [head, expected = ''] = part.split(/^---$/m) as [string, string?];
      const end = head.indexOf('\n');
      return { name: head.slice(0, end), input: head.slice(end + 1).replace(/\n$/, ''), expected: expected.trim() };
    });
}
