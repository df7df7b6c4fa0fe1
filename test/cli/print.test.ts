import { readdirSync, readFileSync, symlinkSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, describe, expect, it } from 'vitest';
import { type Folder, folderOf } from './world.ts';

let folder: Folder;
afterEach(() => folder.remove());

const NOTE = `---
title: Bracket
---

# Bracket

![sketch](sketch.png) ![far](../far.png) ![net](https://example.org/a.png)

\`\`\`tautline
section S: EI 10 MN m2
member B1: A -- 2 m -- B
support A: fixed
load dead: 3 kN down at B
require tip: deflection at B <= 0.5 mm "brief"
\`\`\`

The tip moves \`tautline tip\`.
`;
const PIXEL = Uint8Array.of(0x89, 0x50, 0x4e, 0x47);

describe('print', () => {
  it('writes a page that needs nothing else, whatever it says', async () => {
    folder = folderOf({ 'notes/a.md': NOTE, 'notes/sketch.png': PIXEL, 'far.png': PIXEL });
    const { status, out, error } = await folder.run('print', 'notes/a.md', '-o', 'page.html');
    expect({ status, error }).toEqual({ status: 0, error: '' });
    expect(out).toBe('page.html: written; 1 note, 0 of 1 requirement met, 1 not met\n');

    const page = readFileSync(join(folder.path, 'page.html'), 'utf8');
    for (const part of [/^<!doctype html>/, /<title>Bracket<\/title>/, /0\.8000\smm down/]) {
      expect(part.test(page), String(part)).toBe(true);
    }
    expect(page.match(/<script|<link|@import|url\((?!data:|#)|src="(?!data:)/i)).toBeNull();
    // The image beside the note is taken in; one outside its folder, and one on the network, are told in words.
    expect(page.match(/data:image\/png;base64,iVBORw==/g)).toHaveLength(1);
    expect(page.match(/\[image: \w+\]/g)).toEqual(['[image: far]', '[image: net]']);
    expect(readdirSync(folder.path).sort()).toEqual(['far.png', 'notes', 'page.html']);
  });

  it('writes to standard output without -o', async () => {
    folder = folderOf({ 'a.md': '# Prose\n' });
    const { status, out } = await folder.run('print', 'a.md');
    expect(status).toBe(0);
    expect(out).toMatch(/^<!doctype html>[\s\S]*<h1>Prose<\/h1>/);
  });

  it('is the same page each time', async () => {
    folder = folderOf({ 'a.md': NOTE });
    expect((await folder.run('print', 'a.md')).out).toBe((await folder.run('print', 'a.md')).out);
  });

  it.each([
    [['.'], 'takes one note'],
    [['a.md', 'a.md'], 'one note'],
    [['a.md', '-o', 'a.md'], 'overwrite its note'],
    [['a.md', '-o', './link.md'], 'overwrite its note'],
    [['a.md', '-o', '.'], 'is a folder'],
    [['a.md', '-o', 'missing/page.html'], 'cannot be written'],
  ])('refuses %j and leaves everything as it was', async (args, words) => {
    folder = folderOf({ 'a.md': NOTE });
    symlinkSync('a.md', join(folder.path, 'link.md'));
    const { status, error } = await folder.run('print', ...args);
    expect(status).toBe(2);
    expect(error).toContain(words);
    expect(readdirSync(folder.path).sort()).toEqual(['a.md', 'link.md']);
    expect(readFileSync(join(folder.path, 'a.md'), 'utf8')).toBe(NOTE);
  });

  it('says why a file is no note', async () => {
    folder = folderOf({ 'a.md': Uint8Array.of(0) });
    expect(await folder.run('print', 'a.md', '-o', 'b.html')).toMatchObject({
      status: 1,
      error: expect.stringContaining('NUL'),
    });
    expect(readdirSync(folder.path)).toEqual(['a.md']);
  });
});
