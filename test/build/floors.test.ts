// The house as it stands, and each kind of breach once.
import { describe, expect, test } from 'vitest';
import { breaches, sources } from '../../src/build/floors.mts';

const check = (files: Record<string, string>): string[] => breaches(new Map(Object.entries(files)));

test('the import floors hold', () => {
  expect(breaches(sources())).toEqual([]);
});

describe('a breach is told', () => {
  test('an import up a floor, of a type as well', () => {
    expect(check({ 'model/a.ts': "import type { B } from '../note/b.ts';", 'note/b.ts': '' })).toEqual([
      'model/a.ts: note lies above model',
    ]);
  });

  test('an import across a floor', () => {
    expect(check({ 'drawing/a.ts': "export { b } from '../working/b.ts';", 'working/b.ts': '' })).toEqual([
      'drawing/a.ts: drawing and working lie on one floor and do not know each other',
    ]);
  });

  test('a circle of files', () => {
    expect(check({ 'note/a.ts': "import './b.ts';", 'note/b.ts': "const a = import('./a.ts');" })).toEqual([
      'circle: note/a.ts → note/b.ts → note/a.ts',
    ]);
  });

  test("a room's own entry file", () => {
    expect(check({ 'note/a.ts': "import { b } from './index.ts';", 'note/index.ts': '' })).toEqual([
      'note/a.ts: a room does not import its own entry file',
    ]);
  });

  test('the file system, a package and the clock in the core', () => {
    const text = "import { readFileSync } from 'node:fs';\nimport katex from 'katex';\nconst now = Date.now();";
    expect(check({ 'model/a.ts': text })).toEqual([
      'model/a.ts: the core does not import node:fs',
      'model/a.ts: model does not import the package katex',
      'model/a.ts: the core does not use Date',
    ]);
  });

  test('but not what a comment says', () => {
    expect(
      check({ 'model/a.ts': "// never import x from '../note/b.ts' or call Date.now()\n/* process.exit() */" }),
    ).toEqual([]);
  });
});
