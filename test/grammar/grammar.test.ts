// The grammars on marked-up text, injected into the Markdown grammar that VS Code uses. A new case needs no code.
import { spawnSync } from 'node:child_process';
import { readdirSync } from 'node:fs';
import { expect, test } from 'vitest';

const folder = 'test/grammar';
const program = 'node_modules/vscode-tmgrammar-test/dist/unit.js';
const markdown = 'node_modules/tm-grammars/grammars/markdown.json';

for (const name of readdirSync(folder).filter(file => !file.endsWith('.ts'))) {
  test(`the scopes marked in ${name}`, () => {
    const { stdout, status } = spawnSync(process.execPath, [program, '--grammar', markdown, `${folder}/${name}`], {
      encoding: 'utf8',
    });
    // Languages of other fences are not loaded, and the runner says so, line by line.
    const told = stdout.split('\n').filter(line => !line.startsWith('grammar not found'));
    expect(status, told.join('\n')).toBe(0);
  });
}
