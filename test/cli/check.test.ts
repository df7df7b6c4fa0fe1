import { mkdirSync, symlinkSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, describe, expect, it } from 'vitest';
import { MAX_NOTE_BYTES } from '../../src/cli/files.ts';
import { type Folder, folderOf } from './world.ts';

let folder: Folder;
afterEach(() => folder.remove());

function open(files: Parameters<typeof folderOf>[0]): Folder {
  folder = folderOf(files);
  return folder;
}

/** A cantilever of 2 m, EI 10 MN m²: the tip moves 0.8 mm for 3 kN. */
const note = (limit: string): string => `# Bracket

\`\`\`tautline
section S: EI 10 MN m2
member B1: A -- 2 m -- B
support A: fixed
load dead: 3 kN down at B
require tip: deflection at B <= ${limit} "brief"
\`\`\`
`;
const WELL = note('1 mm');
const EXCEEDED = note('0.5 mm');
const BROKEN = '```tautline\nmembr B1: A -- 2 m -- B\n```\n';

describe('exit status', () => {
  it('is 0 when all is well', async () => {
    const { status, out, error } = await open({ 'a.md': WELL }).run('check', 'a.md');
    expect(status).toBe(0);
    expect(out).toContain('1 note, 1 of 1 requirement met\n');
    expect(error).toBe('');
  });

  it('is 1 for a requirement that is not met', async () => {
    const { status, out } = await open({ 'a.md': EXCEEDED }).run('check', 'a.md');
    expect(status).toBe(1);
    expect(out).toMatch(/tip {2}deflection at B under dead +0\.8000 mm down +≤ 0\.5 mm +1\.600 +not met/);
  });

  it('is 1 for an error, in whichever note', async () => {
    const { status, out } = await open({ 'a.md': WELL, 'b.md': BROKEN }).run('check', 'a.md', 'b.md');
    expect(status).toBe(1);
    expect(out).toContain('b.md:2:1: error unknown-statement:');
    expect(out).toContain('     2 | membr B1: A -- 2 m -- B\n       | ^^^^^\n');
  });

  it.each([
    [[], 'language-server'],
    [['chek', 'a.md'], 'there is no command chek'],
    [['check'], 'needs the path'],
    [['check', '--jsn', 'a.md'], '--jsn'],
    [['check', '--color', 'blue', 'a.md'], 'auto, always or never'],
    [['check', 'missing.md'], 'missing.md: there is no such file or folder'],
    [['print'], 'needs the path'],
    [['language-server'], '--stdio'],
  ])('is 2 for wrong usage: %j', async (args, words) => {
    const { status, out, error } = await open({ 'a.md': WELL }).run(...args);
    expect(status).toBe(2);
    expect(out).toBe('');
    expect(error).toContain(words);
  });

  it('is 0 for the help and the version', async () => {
    open({});
    expect(await folder.run('--version')).toMatchObject({ status: 0, out: expect.stringMatching(/^\d+\.\d+\.\d+\n$/) });
    for (const args of [['--help'], ['-h'], ['check', '--help']]) {
      const { status, out } = await folder.run(...args);
      expect(status).toBe(0);
      expect(out).toContain('tautline check PATH…');
      expect(out).toContain('wrong usage');
    }
  });
});

describe('folders', () => {
  it('are searched for notes in a stable order, without node_modules and dot folders', async () => {
    open({
      'notes/b.md': WELL,
      'notes/a.md': WELL,
      'notes/deep/c.md': WELL,
      'notes/README.md': '# No calculation\n',
      'notes/d.txt': WELL,
      'notes/node_modules/e.md': BROKEN,
      'notes/.hidden/f.md': BROKEN,
    });
    const { status, out } = await folder.run('check', '--json', 'notes');
    expect(status).toBe(0);
    expect(pathsOf(out)).toEqual(['notes/a.md', 'notes/b.md', 'notes/deep/c.md']);
    expect(pathsOf((await folder.run('check', '--json', './notes/', 'notes/a.md')).out)).toHaveLength(3);
    expect(pathsOf((await folder.run('check', '--json', 'notes/b.md', 'notes')).out)[0]).toBe('notes/b.md');
  });

  it('are not needed: a note without a calculation may be named, and is well', async () => {
    const { status, out } = await open({ 'README.md': '# Nothing\n' }).run('check', 'README.md');
    expect({ status, out }).toEqual({
      status: 0,
      out: 'README.md\n\n  no tautline fence\n\n1 note, 0 of 0 requirements met\n',
    });
  });

  it('without a note say so', async () => {
    const { status, out, error } = await open({ 'a/README.md': '# Nothing\n' }).run('check', 'a');
    expect({ status, out }).toEqual({ status: 0, out: '' });
    expect(error).toContain('No note');
  });
});

describe('files that are not read', () => {
  it('are refused with their reason: binary, too large, not UTF-8', async () => {
    open({
      'binary.md': Uint8Array.of(35, 0, 1),
      'latin.md': Uint8Array.of(0x33, 0x30, 0xb0),
      'large.md': '#'.repeat(MAX_NOTE_BYTES + 1),
    });
    for (const [path, code, words] of [
      ['binary.md', 'unreadable-note', 'NUL'],
      ['latin.md', 'unreadable-note', 'UTF-8'],
      ['large.md', 'too-large', '1 MB'],
    ] as const) {
      const { status, out } = await folder.run('check', path);
      expect(status).toBe(1);
      expect(out).toContain(`${path}:1:1: error ${code}:`);
      expect(out).toContain(words);
    }
  });

  it('are only spoken of below a folder when they hold a calculation', async () => {
    open({
      'log.md': '#'.repeat(MAX_NOTE_BYTES + 1),
      'note.md': `${'#'.repeat(MAX_NOTE_BYTES - 70_000)}\n${'x'.repeat(70_000)}\n\`\`\`tautline\n\`\`\`\n`,
      'image.md': Uint8Array.of(0x89, 0, 0),
    });
    expect(pathsOf((await folder.run('check', '--json', '.')).out)).toEqual(['note.md']);
  });

  it('are those outside the root, whatever leads there', async () => {
    open({ 'outside.md': WELL, 'root/a.md': WELL });
    symlinkSync('../outside.md', join(folder.path, 'root/link.md'));
    symlinkSync('a.md', join(folder.path, 'root/inside.md'));
    mkdirSync(join(folder.path, 'far'));
    writeFileSync(join(folder.path, 'far/b.md'), WELL);
    symlinkSync('../far', join(folder.path, 'root/far'));

    const { status, out } = await folder.run('check', 'root/link.md');
    expect(status).toBe(1);
    expect(out).toContain('leads out of the folder');
    expect(out).not.toContain('Bracket');
    // Below a folder a link outwards is not even looked into, and one to a folder is not followed.
    expect(pathsOf((await folder.run('check', '--json', 'root')).out)).toEqual(['root/a.md', 'root/inside.md']);
  });
});

describe('what is written', () => {
  it('is coloured on a terminal only, and not against NO_COLOR', async () => {
    open({ 'a.md': EXCEEDED });
    const coloured = async (world: Parameters<Folder['runWith']>[0], ...args: string[]) =>
      (await folder.runWith(world, 'check', ...args, 'a.md')).out.includes('\u001b[');
    expect(await coloured({})).toBe(false);
    expect(await coloured({ columns: 100 })).toBe(true);
    expect(await coloured({ columns: 100, env: { NO_COLOR: '1' } })).toBe(false);
    expect(await coloured({ columns: 100, env: { NO_COLOR: '' } })).toBe(true);
    expect(await coloured({ columns: 100, env: { TERM: 'dumb' } })).toBe(false);
    expect(await coloured({ env: { NO_COLOR: '1' } }, '--color', 'always')).toBe(true);
    expect(await coloured({ columns: 100 }, '--color=never')).toBe(false);
  });

  it('counts columns as editors do, behind a byte order mark too', async () => {
    const { out } = await open({ 'a.md': `\ufeff${BROKEN}`, 'b.md': BROKEN.replaceAll('\n', '\r\n') }).run(
      'check',
      '--json',
      'a.md',
      'b.md',
    );
    for (const { diagnostics } of JSON.parse(out).notes) {
      expect(diagnostics).toMatchObject([{ line: 2, column: 1, endLine: 2, endColumn: 6 }]);
    }
  });

  it('never holds control characters, in JSON either', async () => {
    const hostile = '```tautline\nmembr\u001b[2J \u202e: A\n```\n';
    for (const args of [
      ['check', 'a.md'],
      ['check', '--json', 'a.md'],
    ]) {
      const { out } = await open({ 'a.md': hostile }).run(...args);
      // biome-ignore lint/suspicious/noControlCharactersInRegex: they are what must not be there.
      expect(out).not.toMatch(/[\u0000-\u0009\u000b-\u001f\u007f-\u009f\u202a-\u202e]/);
      folder.remove();
    }
    open({});
  });
});

function pathsOf(json: string): string[] {
  return JSON.parse(json).notes.map(({ path }: { path: string }) => path);
}
