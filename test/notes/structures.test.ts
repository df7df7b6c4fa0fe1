// Notes as wholes: several fences and structures, values and results by name, prose, units, and what is not evaluated yet.
import { describe, expect, it } from 'vitest';
import { toJson } from '../../src/note/report.ts';
import { checkAnswers, checkNumber, checkValues, codesOf, evaluated, fenced, solved } from './check-note.ts';

const EI = 10e6;

describe('a note', () => {
  it('goes on where the last fence stopped, and shares what stands before the first structure', () => {
    const note = toJson(
      evaluated(`# Two beams

${fenced('section S: EI 10 MN m2\nlet w = 3 kN/m\ncombine total: 1.5 live')}
Prose.

${fenced('structure One\nmember B1: A -- 4 m -- B\nsupport A: pinned')}
- in a list:

  ~~~ tautline
  support B: roller
  load live: w down on B1
  find most: moment in B1
  ~~~

> ${fenced('structure Two\nmember B1: A -- 2 m -- B\nsupport A: fixed\nload live: 2 * w down on B1\nfind most: moment in B1').trimEnd().replaceAll('\n', '\n> ')}

${fenced('find tip: deflection at B').replace('```tautline', '```python')}
`),
    );
    expect(codesOf(note)).toEqual([]);
    expect(note.structures.map(({ name }) => name)).toEqual(['One', 'Two']);
    checkAnswers(note, { 'One.most': (1.5 * 3e3 * 16) / 8, 'Two.most': (-1.5 * 6e3 * 4) / 2 });
    expect(note.answers).toHaveLength(2);
  });

  it('without a structure line has one, named after the file', () => {
    const note = toJson(
      evaluated(
        fenced(
          'section S: EI 10 MN m2\nmember B1: A -- 4 m -- B\nsupport A: fixed\nload live: 1 kN down at B\nfind tip: deflection at B',
        ),
        'notes/garden-gate.md',
      ),
    );
    expect(note.structures).toEqual([{ name: 'garden-gate', redundancy: 0, stable: true }]);
    checkAnswers(note, { 'garden-gate.tip': (1e3 * 64) / (3 * EI) });
  });

  it('with values only has no structure and no error', () => {
    const note = toJson(
      evaluated(`${fenced('let a = 4.8 m\nlet b = sqrt(2) * a / 3')}\nThe side is \`tautline b\`.\n`),
    );
    expect(note.structures).toEqual([]);
    expect(note.diagnostics).toEqual([]);
    checkValues(note, { a: 4.8, b: (Math.SQRT2 * 4.8) / 3 });
    expect(note.prose).toMatchObject([{ line: 6, text: 'b', unit: 'm', display: '2.263 m' }]);
  });

  it('without a fence is left alone', () => {
    const note = toJson(
      evaluated('# Notes\n\nThe `tautline tip` is nothing here.\n\n```\nmember R1: A -- 4 m -- B\n```\n'),
    );
    expect(note).toMatchObject({ structures: [], answers: [], values: {}, prose: [], diagnostics: [] });
  });
});

describe('values', () => {
  it('bind a number to its units, and check dimensions', () => {
    const note = solved(`
let line  = 0.75 kN/m2 * 3.2 m
let pair  = 10 kN / 2 m
let area  = (3 mm)^2
let long  = 12 ft 6 1/2 in
let alpha = 5e-6 /K * 20 K
let most  = max(2 m, 150 cm, 3 ft)
let up_to = ceil(7.2 m / 0.4 m)
let turn  = 2 * sin(30 deg) + cos(pi) + tan(45 deg) + abs(-1)
let force_g = 100 kg * g0
let minus = -2 ^ 2
let trade = 12.4 mm2 + 3 cm²
let couple = 5 kN·m + 1 kNm + 2 kN m`);
    checkValues(note, {
      line: 2400,
      pair: 5000,
      area: 9e-6,
      long: 12.5 * 0.3048 + 0.5 * 0.0254,
      alpha: 1e-4,
      most: 2,
      up_to: 18,
      turn: 1 - 1 + 1 + 1,
      force_g: 980.665,
      minus: -4,
      trade: 12.4e-6 + 3e-4,
      couple: 8e3,
    });
    expect(codesOf(note)).toEqual([]);
    expect(note.values.line!.unit).toBe('N/m');
    expect(note.values.couple!.unit).toBe('N m');
  });

  it('of another structure are reached with `of`, and so are its results', () => {
    const note = solved(`
section S: EI 10 MN m2
structure Joist
let pitch = 400 mm
member J1: A -- 4 m -- B
support A: pinned
support B: roller
load dead: (2 kN/m2 * pitch) down on J1
find seat: reaction at B

structure Beam
let line = 2 * seat of Joist / pitch of Joist
member B1: A -- 5 m -- B
support A: pinned
support B: roller
load dead: line down on B1
find most: moment in B1
require less: most of Beam <= 60 kN m "a"
require same: seat of Joist <= 2 kN "a"`);
    checkValues(note, { 'Joist.pitch': 0.4, 'Beam.line': (2 * 1600) / 0.4 });
    checkAnswers(note, {
      most: (8e3 * 25) / 8,
      less: { value: 25e3, status: 'ok', under: null },
      same: { value: 1600, utilisation: 0.8 },
    });
    expect(codesOf(note)).toEqual([]);
  });

  it('in prose are those of the structure last spoken of, or of another by name', () => {
    const note = toJson(
      evaluated(`${fenced('section S: EI 10 MN m2\nlet w = 2 kN/m')}
${fenced('structure One\nmember B1: A -- 4 m -- B\nsupport A: fixed\nload live: w down on B1\nfind tip: deflection at B')}
One: \`tautline tip\`.

${fenced('structure Two\nmember B1: A -- 2 m -- B\nsupport A: fixed\nload live: w down on B1\nfind tip: deflection at B')}
Two: \`tautline tip\`, that is \`tautline tip of One / tip\` times less, over \`tautline length(B1)\`, with \`tautline w * 2 m\`.
`),
    );
    const tip = (length: number) => (2e3 * length ** 4) / (8 * EI);
    const wanted = [tip(4), tip(2), 16, 2, 4e3];
    expect(note.prose).toHaveLength(5);
    for (const [index, value] of wanted.entries()) checkNumber(`prose ${index}`, note.prose[index]!.value, value);
  });

  it('that add unlike things are refused where they stand, and cost only what depends on them', () => {
    const note = solved(`
section S: EI 10 MN m2
let good = 3 kN/m
let bad  = 3 kN + 2 m
structure One
member B1: A -- 4 m -- B
support A: pinned
support B: roller
load dead: good down on B1
find most: moment in B1
structure Two
member B1: A -- 4 m -- B
support A: pinned
support B: roller
load dead: bad down on B1
find most: moment in B1`);
    expect(codesOf(note)).toEqual(['wrong-dimension']);
    expect(note.diagnostics[0]).toMatchObject({ line: 5 });
    checkAnswers(note, { 'One.most': 6e3, 'Two.most': { value: null } });
  });
});

describe('units', () => {
  it('of the United States give the same structure', () => {
    // 5wL⁴/384EI and wL²/8 in kip and inch; 12 ft span, 200 plf, E 29000 ksi, I 48 in⁴.
    const note = solved(`
display: us
material A36: E 29000 ksi, fy 36 ksi
section W: I 48 in4, A 5 in2, depth 8 in, A36
member B1: A -- 12 ft -- B
support A: pinned
support B: roller
load live: 200 plf down on B1
require mid: deflection of B1 <= span/360 "IBC Table 1604.3"
find most: moment in B1
find seat: reaction at A
find top:  stress in B1`);
    const [inch, lbf] = [0.0254, 4.4482216152605];
    const w = 200 / 12;
    const mid = (5 * w * 144 ** 4) / (384 * 29e6 * 48);
    const most = (w * 144 ** 2) / 8;
    checkAnswers(note, {
      mid: { value: mid * inch, limit: 0.4 * inch, display: '0.06703 in down' },
      most: { value: most * lbf * inch, display: '3.600 kip ft, tension below' },
      seat: { value: 1200 * lbf, display: '1.200 kip up' },
      top: { value: (((most * 4) / 48) * lbf) / inch ** 2, display: '3.600 ksi' },
    });
    expect(mid.toPrecision(4)).toBe('0.06703');
  });

  it('are shown by kind as the note chooses', () => {
    const note = solved(`
display: force N, deflection cm, moment kN m
section S: EI 10 MN m2
member B1: A -- 2 m -- B
support A: fixed
load live: 1.5 kN down at B
find tip:  deflection at B
find seat: reaction at A
find root: moment in B1`);
    checkAnswers(note, {
      tip: { value: 4e-4, display: '0.04000 cm down' },
      seat: { value: 1.5e3, display: '1500 N up' },
      root: -3e3,
    });
  });
});

describe('what is read but not evaluated yet', () => {
  it('is told at its place and withholds what depends on it, and nothing else', () => {
    const note = solved(`
section S: EI 10 MN m2
structure One
member B1: A -- 4 m -- B -- 4 m -- C
support A: pinned
support B: roller
support C: roller
load live: 3 kN/m down on B1
carry: reaction of Two at B onto C
find most: moment in B1

structure Two
member B1: A -- 4 m -- B
support A: pinned
support B: roller
load live: 3 kN/m down on B1
find most: moment in B1`);
    expect(codesOf(note)).toEqual(['not-evaluated-yet']);
    expect(note.diagnostics.find(({ code }) => code === 'not-evaluated-yet')).toMatchObject({
      severity: 'error',
      line: 10,
    });
    checkAnswers(note, { 'One.most': { value: null, display: '', status: 'none' }, 'Two.most': 6e3 });
  });
});
