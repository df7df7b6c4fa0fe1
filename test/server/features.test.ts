// Diagnostics, quick fixes, values beside the text and completion, as plain data of the protocol.
import { describe, expect, test } from 'vitest';
import { codeActions } from '../../src/server/code-actions.ts';
import { completions } from '../../src/server/completion.ts';
import { diagnosticsOf } from '../../src/server/diagnostics.ts';
import { inlayHints } from '../../src/server/inlay-hints.ts';
import { fenced, open } from './open.ts';

const CANTILEVER = `section Arm: EI 1 MN m2
member R1, Arm: A -- 2 m -- B
support A: fixed
load sign: 1.5 kN down at B
find tip: deflection at B
require root: moment at A in R1 <= 4 kN m "brief"
let half = 1.5 kN / 2`;

describe('diagnostics', () => {
  test('stand at their words, with code and severity', () => {
    const { note } = open(fenced('let a = b'));
    expect(diagnosticsOf(note)).toMatchObject([
      {
        range: { start: { line: 1, character: 8 }, end: { line: 1, character: 9 } },
        severity: 1,
        code: 'unknown-name',
        source: 'tautline',
      },
    ]);
  });

  test('carry the hint on a line of its own', () => {
    const { note } = open(fenced(CANTILEVER.replace('support A', 'suport A')));
    const [first] = diagnosticsOf(note);
    expect(first?.message).toMatch(/\n.*support/);
  });

  test('are none where nothing is wrong', () => {
    expect(diagnosticsOf(open(fenced(CANTILEVER)).note)).toEqual([]);
  });
});

describe('quick fixes', () => {
  const text = fenced(CANTILEVER.replace('-- 2 m', '— 2 m'));
  const line = (number: number) => ({ start: { line: number, character: 0 }, end: { line: number, character: 40 } });

  test('come with the diagnostic that the range touches', () => {
    const [fix] = codeActions(open(text).note, line(2));
    expect(fix).toMatchObject({ kind: 'quickfix', edit: { changes: { 'file:///note.md': [{ newText: '--' }] } } });
  });

  test('and not elsewhere', () => {
    expect(codeActions(open(text).note, line(4))).toEqual([]);
  });
});

describe('values beside the text', () => {
  const everywhere = { start: { line: 0, character: 0 }, end: { line: 99, character: 0 } };
  const labels = (text: string): string[] => {
    const { note } = open(text);
    return inlayHints(note, everywhere).map(({ position, label }) => `${position.line}:${position.character} ${label}`);
  };

  test('at the end of find, require and let, and behind a value in the prose', () => {
    expect(labels(`${fenced(CANTILEVER)}\nIt moves \`tautline tip\`.`)).toEqual([
      '5:25 = 4.000 mm down',
      '6:49 = 3.000 kN m, tension above, met, use 0.750',
      '7:21 = 0.7500 kN',
      '10:23 = 4.000 mm down',
    ]);
  });

  test('a requirement that is not met says so', () => {
    expect(labels(fenced(CANTILEVER.replace('4 kN m', '2 kN m')))[1]).toMatch(/not met, use 1\.50$/);
  });

  test('what is withheld says so, and a value that is none says nothing', () => {
    const text = CANTILEVER.replace('support A: fixed', 'support A: pinned').replace('1.5 kN / 2', 'nothing');
    expect(labels(fenced(text))).toEqual(['5:25 withheld', '6:49 withheld']);
  });

  test('only those that the editor shows', () => {
    const { note } = open(fenced(CANTILEVER));
    const first = { start: { line: 0, character: 0 }, end: { line: 5, character: 0 } };
    expect(inlayHints(note, first)).toHaveLength(1);
  });
});

describe('completion', () => {
  const offered = (marked: string): string[] => {
    const { note, position } = open(marked);
    return completions(note, position, true).map(({ label }) => label);
  };

  test('statements at the start of a line', () => {
    expect(offered(fenced(`${CANTILEVER}\nre¦`))).toEqual(expect.arrayContaining(['require', 'release', 'member']));
  });

  test.each([
    ['find x: ¦', ['deflection', 'reaction', 'half', 'tip']],
    ['find x: deflection at ¦', ['A', 'B']],
    ['find x: moment in ¦', ['R1']],
    ['find x: deflection at B under ¦', ['sign', 'all']],
    ['require x: deflection at B <= ¦', ['span', 'half']],
    ['load ¦', ['sign']],
    ['load sign: 2 kN/m down on ¦', ['R1', 'plan']],
    ['load sign: self¦', ['self-weight']],
    ['combine all2: 1.35 ¦', ['sign']],
    ['support ¦', ['A', 'B']],
    ['support B: ¦', ['pinned', 'roller']],
    ['member R2, ¦', ['Arm']],
    ['member R2: B -- 3 m -- ¦', ['A']],
    ['section Q: i-¦', ['i-shape', 'solid']],
    ['let z = 2 * ¦', ['half', 'sqrt']],
  ])('%s', (typed, wanted) => {
    expect(offered(fenced(`${CANTILEVER}\n${typed}`))).toEqual(expect.arrayContaining(wanted));
  });

  test('goes on over the lines of one statement', () => {
    expect(offered(fenced(`${CANTILEVER}\nfind x: deflection\n  at ¦`))).toEqual(expect.arrayContaining(['A', 'B']));
  });

  test('puts a blank behind a mark, and replaces the word that is begun', () => {
    const { note, position } = open(fenced(`${CANTILEVER}\nfind x:def¦`));
    const item = completions(note, position, true).find(({ label }) => label === 'deflection');
    expect(item?.textEdit).toMatchObject({
      newText: ' deflection',
      range: { start: { character: 7 }, end: { character: 10 } },
    });
  });

  test.each([
    ['in the prose', `support ¦A\n\n${fenced(CANTILEVER)}`],
    ['in a fence of another kind', `${fenced(CANTILEVER)}\n\`\`\`js\n¦\n\`\`\`\n`],
    ['on the marker of a fence', fenced(CANTILEVER).replace('```tautline', '```taut¦line')],
    ['in a quoted text', fenced(`${CANTILEVER}\nfind x: deflection at B "from ¦"`)],
  ])('is silent %s', (_, marked) => {
    expect(offered(marked)).toEqual([]);
  });
});
