import { describe, expect, it } from 'vitest';
import { noteText, summaryText } from '../../src/cli/note-text.ts';
import { styleOf } from '../../src/cli/style.ts';
import { ANGLE } from '../../src/quantity/dimension.ts';
import { answerWith, diagnosticAt, RAFTER, resultWith, structureWith } from './result.ts';

const plain = styleOf(false);

describe('answers for a person', () => {
  it('stand in columns, decimal points under one another', () => {
    expect(`\n${noteText(RAFTER, 120, plain)}`).toBe(`
rafter.md  Slip canopy

  Rafter Canopy rafter R1 · 2 of 3 requirements met, highest use 1.083 (mid)
    tip    deflection at C under service             1.649 mm up    ≤ 10.00 mm  0.165  met
    mid    sag of R1 between A and B under service  14.443 mm       ≤ 13.33 mm  1.083  not met
           service (b): dead + 0.7 snow
    seat   reaction at A under uplift                0.9981 kN       ≥ 0 kN            met
    slope  rotation at C under service               0.0005924 rad                     not checked
`);
  });

  it('wrap the question on a narrow terminal', () => {
    const text = noteText(RAFTER, 80, plain);
    expect(text).toContain('mid    sag of R1 between A and B');
    expect(text).toContain('           under service\n');
    expect(Math.max(...text.split('\n').map(line => line.length))).toBeLessThan(92);
  });

  it('never round a requirement across its limit', () => {
    const result = resultWith({
      structures: [structureWith({ answers: [0, 1, 2] })],
      answers: [
        answerWith({ name: 'a', utilisation: 1.00004, status: 'fails' }),
        answerWith({ name: 'b', utilisation: 0.99996, status: 'ok' }),
        answerWith({ name: 'c', utilisation: 1, status: 'ok' }),
      ],
    });
    const uses = noteText(result, 120, plain).match(/[01]\.\d+(?= {2})/g);
    expect(uses).toEqual(['1.00004', '1.000', '1.000']);
  });

  it('say that a value is withheld, and why none is given', () => {
    const result = resultWith({
      structures: [structureWith({ answers: [0], withheld: 'nothing holds the frame sideways' })],
      answers: [answerWith({ quantity: undefined, display: '', status: 'none', utilisation: undefined })],
    });
    const text = noteText(result, 120, plain);
    expect(text).toContain('answers are withheld: nothing holds the frame sideways');
    expect(text).toMatch(/tip {2}deflection at C under service {2}– +≤ 10.00 mm +withheld/);
  });

  it('of a note that only holds values are its values', () => {
    const value = { unit: '', range: { start: 0, end: 0 }, nameRange: { start: 0, end: 0 } };
    const result = resultWith({
      values: [
        { ...value, name: 'turn', quantity: { value: 1, dimension: ANGLE }, display: '1.000 rad' },
        { ...value, name: 'ratio', quantity: undefined, display: '' },
      ],
    });
    expect(noteText(result, 120, plain)).toBe('rafter.md\n\n  turn   1.000 rad\n  ratio\n');
  });
});

describe('diagnostics for a person', () => {
  const text = 'x\nmember R1, RSH: A -- 4.8 m -- B\nsection RHS: EI 1 MN m2\n';

  it('show the source line with carets, the hint and related places', () => {
    const diagnostics = [
      diagnosticAt(text, 'RSH', {
        hint: 'did you mean RHS?',
        related: [{ range: diagnosticAt(text, 'RHS').range, message: 'RHS is defined here.' }],
      }),
    ];
    expect(`\n${noteText(resultWith({ text, diagnostics }), 120, plain)}`).toBe(`
rafter.md

rafter.md:2:12: error unknown-name: No section named RSH.
     2 | member R1, RSH: A -- 4.8 m -- B
       |            ^^^
         hint: did you mean RHS?
         rafter.md:3:9: RHS is defined here.
     3 | section RHS: EI 1 MN m2
       |         ^^^
`);
  });

  it('point at the first line of a statement that goes on', () => {
    const long = 'load dead: 1 kN/m\n  down on R1\n';
    const lines = noteText(resultWith({ text: long, diagnostics: [diagnosticAt(long, 'kN/m\n  down')] }), 120, plain);
    expect(lines).toContain('     1 | load dead: 1 kN/m\n       |              ^^^^\n');
  });

  it('cut a long line around the words', () => {
    const long = `${'a'.repeat(500)} RSH ${'b'.repeat(500)}`;
    const lines = noteText(resultWith({ text: long, diagnostics: [diagnosticAt(long, 'RSH')] }), 120, plain).split(
      '\n',
    );
    const [source, carets] = lines.slice(3, 5);
    expect(source!.length).toBeLessThan(160);
    expect(carets!.indexOf('^^^')).toBe(source!.indexOf('RSH'));
  });

  it('put carets under words behind tabs, wide letters and combining marks', () => {
    const wide = 'let\t橋é = RSH';
    const lines = noteText(resultWith({ text: wide, diagnostics: [diagnosticAt(wide, 'RSH')] }), 120, plain).split(
      '\n',
    );
    // Two columns for the wide letter, none for the mark.
    expect(lines[3]).toBe('     1 | let 橋é = RSH');
    expect(lines[4]).toBe(`       | ${' '.repeat('let '.length + 2 + 1 + ' = '.length)}^^^`);
  });

  it('never pass on what steers a terminal or turns text round', () => {
    const hostile = 'let \u001b[2Ja = \u202eb\u0007';
    const result = resultWith({
      path: 'a\u001b]0;x\u0007.md',
      text: hostile,
      frontMatter: { title: '\u2066t\u009b1m' },
      structures: [structureWith({ name: '\u001bS', answers: [0] })],
      answers: [answerWith({ name: '\u001b[31m', measure: '\u202d', display: '\u001b1' })],
      diagnostics: [diagnosticAt(hostile, 'b', { message: '\u001bm', hint: '\u0085' })],
    });
    const shown = noteText(result, 120, plain);
    // biome-ignore lint/suspicious/noControlCharactersInRegex: they are what must not be there.
    expect(shown).not.toMatch(/[\u0000-\u0009\u000b-\u001f\u007f-\u009f\u202a-\u202e\u2066-\u2069]/);
    expect(shown).toContain('‹U+001B›[2Ja = ‹U+202E›b');
  });
});

describe('the summary', () => {
  it('counts notes, requirements and mistakes', () => {
    const text = 'RSH';
    const broken = resultWith({
      diagnostics: [
        diagnosticAt(text, 'RSH'),
        diagnosticAt(text, 'RSH', { severity: 'warning' }),
        diagnosticAt(text, 'RSH', { severity: 'hint' }),
      ],
    });
    expect(summaryText([RAFTER, broken], plain)).toBe(
      '2 notes, 2 of 3 requirements met, 1 not met, 1 error, 1 warning\n',
    );
    expect(summaryText([resultWith({})], plain)).toBe('1 note, 0 of 0 requirements met\n');
  });
});

describe('colour', () => {
  it('wraps words and changes nothing else', () => {
    const coloured = noteText(RAFTER, 120, styleOf(true));
    expect(coloured).toContain('\u001b[31mnot met\u001b[39m');
    // biome-ignore lint/suspicious/noControlCharactersInRegex: they are what is taken away.
    expect(coloured.replace(/\u001b\[\d+m/g, '')).toBe(noteText(RAFTER, 120, plain));
  });
});
