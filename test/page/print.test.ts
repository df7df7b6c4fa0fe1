import { describe, expect, it } from 'vitest';
import { evaluateNote } from '../../src/note/evaluate.ts';
import { printPage } from '../../src/page/index.ts';
import { checkTags } from '../drawing/svg.ts';
import { CANTILEVER, fenced, print, RAFTER, STYLESHEET, wordsOf } from './notes.ts';

const FRONT = `---
title: Slip canopy
project: Fenwater boathouse
number: BH-01
revision: B
status: for check
---
`;

describe('the printed page', () => {
  it('stands alone: no script, nothing from elsewhere, and a policy that says so', () => {
    const html = print(`${RAFTER}\n![plan](https://example.org/plan.png) ![inline](data:image/png;base64,AAAA)`);
    expect(html).toContain(`<meta http-equiv="Content-Security-Policy" content="default-src 'none';`);
    expect(html).not.toMatch(/<script|<link|@import|src="http|url\((?!#)/);
    expect(html).toContain('[image: plan]');
    expect(html).toContain('<img src="data:image/png;base64,AAAA" alt="inline">');
    checkTags(html.replace(/<style>[\s\S]*?<\/style>/, ''));
  });

  it('takes in the images that it is given', () => {
    const note = evaluateNote('![plan](plan.png)', { path: 'note.md' });
    const html = printPage(note, {
      stylesheet: '',
      version: '1',
      imageOf: source => (source === 'plan.png' ? 'data:image/png;base64,BBBB' : undefined),
    });
    expect(html).toContain('<img src="data:image/png;base64,BBBB" alt="plan">');
  });

  it('carries number, revision, status, fingerprint and version on every sheet', () => {
    const text = FRONT + RAFTER;
    const { fingerprint } = evaluateNote(text, { path: 'note.md' });
    const html = print(text);
    expect(html).toContain(`BH-01 · revision B · for check · inputs ${fingerprint} · tautline 1.2.3\\A Slip canopy`);
    expect(html).toContain('content:"page " counter(page) " of " counter(pages)');
    expect(html).toContain('<p class="tautline-project">Fenwater boathouse</p>');
  });

  it('leaves the paper to the printer, so that A4 and Letter both serve', () => {
    const html = print(RAFTER);
    expect(html).toContain('@page{margin:14mm 15mm 19mm;');
    expect(html).not.toMatch(/@page\{[^}]*size:/);
  });

  it('hides the front matter, and keeps line numbers true behind it', () => {
    const html = print(`${FRONT}\n${fenced(`${CANTILEVER}combin x: live`)}`);
    expect(html).not.toContain('revision: B');
    expect(wordsOf(html)).toContain('Error, line 15.');
  });

  it('takes its title from the front matter, and heads the page with it where the note does not', () => {
    expect(print(`${FRONT}# Own title\n`)).not.toContain('<h1>Slip canopy</h1>');
    expect(print(`${FRONT}Text.\n`)).toContain('<h1>Slip canopy</h1>');
    expect(print(`${FRONT}Text.\n`)).toContain('<title>Slip canopy</title>');
  });

  it('hides comments and shows any other HTML of the note as it is written', () => {
    const html = print('<!-- hidden -->\n\n<div onclick="x">block</div>\n\nA <b>word</b> <!-- hidden --> here.\n');
    expect(html).not.toContain('hidden');
    expect(html).toContain('&lt;div onclick=&quot;x&quot;&gt;block&lt;/div&gt;');
    expect(html).toContain('A &lt;b&gt;word&lt;/b&gt;');
  });

  it('does not let front matter out of the style element or the running lines', () => {
    const html = print(`---\nnumber: '";}</style><script>x'\ntitle: '</title><script>'\n---\ntext\n`);
    expect(html).not.toContain('<script');
    expect(html.match(/<\/style>/g)).toHaveLength(1);
  });

  it('takes in the styles of formulas only where there are formulas', () => {
    const note = evaluateNote(RAFTER, { path: 'note.md' });
    const html = printPage(note, { stylesheet: STYLESHEET, version: '1', katexStyles: () => '.katex{color:red}' });
    expect(html).not.toContain('.katex{');
  });

  it('prints a note without a fence', () => {
    expect(print('# Plain\n\nText.\n')).toContain('<p>Text.</p>');
  });
});
