import { describe, expect, test } from 'vitest';
import { evaluateNote } from '../../src/note/evaluate.ts';
import type { NoteResult } from '../../src/note/result.ts';

// Notes that nobody writes in good faith, or that a slip of the hand makes: each is answered or refused in words, and in
// no more time than its size asks for. A hang would stop this suite at its time limit.

function evaluate(text: string): NoteResult {
  const result = evaluateNote(text, { path: 'hostile.md' });
  for (const { range, message } of result.diagnostics) {
    expect(range.start).toBeGreaterThanOrEqual(0);
    expect(range.end).toBeGreaterThanOrEqual(range.start);
    expect(range.end).toBeLessThanOrEqual(text.length);
    expect(message).not.toMatch(/NaN|undefined|\[object/);
  }
  for (const answer of result.answers) {
    if (answer.quantity !== undefined) expect(Number.isFinite(answer.quantity.value)).toBe(true);
    expect(answer.display).not.toMatch(/NaN|Infinity|undefined/);
  }
  return result;
}

const codes = (result: NoteResult) => [
  ...new Set(result.diagnostics.filter(({ severity }) => severity === 'error').map(({ code }) => code)),
];
const fence = (...lines: string[]) => `\`\`\`tautline\n${lines.join('\n')}\n\`\`\`\n`;
const BEAM = [
  'section S: EI 10 MN m2',
  'member R1: A -- 4 m -- B',
  'support A: pinned',
  'support B: roller',
  'load q: 2 kN/m down on R1',
  'find mid: deflection of R1',
];

describe('size', () => {
  test('10,000 empty fences', () => {
    expect(codes(evaluate('```tautline\n```\n\n'.repeat(10_000)))).toEqual([]);
  });
  test('50,000 fences that never close', () => {
    expect(evaluate('```tautline\n'.repeat(50_000)).fences.length).toBe(1);
  });
  test('a line of almost a megabyte', () => {
    expect(codes(evaluate(fence(`let x = ${'1 + '.repeat(240_000)}1`)))).toEqual(['too-large']);
  });
  test('a megabyte and one character', () => {
    const text = fence(...BEAM);
    expect(codes(evaluate(text + 'x'.repeat(1_000_000 - text.length)))).toEqual([]);
    expect(codes(evaluate(text + 'x'.repeat(1_000_001 - text.length)))).toEqual(['too-large']);
  });
  test('a fence of 64 kB and one character', () => {
    const pad = (size: number) => fence(...BEAM, `# ${'x'.repeat(size - fence(...BEAM, '# ').trimEnd().length)}`);
    expect(codes(evaluate(pad(65_536)))).toEqual([]);
    expect(codes(evaluate(pad(65_537)))).toEqual(['too-large']);
  });
  test('10,000 statements', () => {
    const values = Array.from({ length: 10_000 }, (_, i) => `let v${i} = ${i} mm`);
    const fences = Array.from({ length: 10 }, (_, i) => fence(...values.slice(1000 * i, 1000 * (i + 1))));
    expect(evaluate(fences.join('\n')).values.length).toBe(10_000);
  });
  test('values that each need the next, 200 in a row and 201', () => {
    const row = (count: number) =>
      fence(...Array.from({ length: count }, (_, i) => `let v${i} = ${i === count - 1 ? '1 mm' : `v${i + 1} + 1 mm`}`));
    expect(codes(evaluate(row(200)))).toEqual([]);
    expect(evaluate(row(200)).values[0]!.quantity!.value).toBeCloseTo(0.2, 12);
    expect(codes(evaluate(row(201)))).toEqual(['value-too-deep']);
    // In the order in which they are needed there is no bound.
    const forwards = Array.from({ length: 2_000 }, (_, i) => `let v${i} = ${i === 0 ? '1 mm' : `v${i - 1} + 1 mm`}`);
    expect(evaluate(fence(...forwards)).values[1999]!.quantity!.value).toBeCloseTo(2, 9);
  });
  test('3,000 members in chains that wait for each other', () => {
    const lines = Array.from({ length: 3000 }, (_, i) => `member M${i}: P${2999 - i} -- 1 m -- P${3000 - i}`);
    const parts = [
      ['structure X', 'section S: EI 10 MN m2', 'point P0: 0 m, 0 m', ...lines.slice(0, 1000)],
      lines.slice(1000, 2000),
      [...lines.slice(2000), 'support P0: fixed', 'load q: 1 N down at P3000', 'find d: deflection at P3000'],
    ];
    const result = evaluate(parts.map(part => fence(...part)).join('\n'));
    expect(result.structures[0]!.structure!.members.length).toBe(3000);
  });
});

describe('depth', () => {
  test('1,000 parentheses', () => {
    expect(codes(evaluate(fence(`let x = ${'('.repeat(1000)}1${')'.repeat(1000)}`)))).toEqual(['value-too-deep']);
  });
  test('1,000 signs, powers, calls', () => {
    evaluate(fence(`let x = ${'-'.repeat(1000)}1`));
    evaluate(fence(`let x = ${'2^'.repeat(1000)}1`));
    evaluate(fence(`let x = ${'abs('.repeat(1000)}1${')'.repeat(1000)}`));
  });
  test('1,000 quote marks around a fence', () => {
    const mark = '> '.repeat(1000);
    evaluate(`${mark}\`\`\`tautline\n${mark}let x = 1\n${mark}\`\`\`\n`);
  });
});

describe('characters', () => {
  test.each([
    ['NUL', '\u0000'],
    ['a lone surrogate', '\ud800'],
    ['a change of direction', '\u202e'],
    ['a byte order mark inside', '\ufeff'],
    ['a zero-width joiner', '\u200d'],
    ['a form feed', '\f'],
    ['an emoji', '🛶'],
  ])('%s anywhere in a note', (_, character) => {
    const note = fence(...BEAM);
    for (let at = 0; at < note.length; at += 5) evaluate(note.slice(0, at) + character + note.slice(at));
  });
  test('line ends of every kind', () => {
    for (const end of ['\r\n', '\r', '\n']) {
      const result = evaluate(fence(...BEAM).replace(/\n/g, end));
      expect(codes(result)).toEqual([]);
      expect(result.answers[0]!.quantity!.value).toBeCloseTo((5 * 2e3 * 4 ** 4) / (384 * 10e6), 12);
    }
  });
  test('names in any script, composed or not', () => {
    const result = evaluate(
      fence(
        'section Träger: EI 10 MN m2',
        'member δ1: é -- 4 m -- Ж',
        'support e\u0301: fixed',
        'load q: 2 kN down at Ж',
        'find 梁: deflection at Ж',
      ),
    );
    expect(codes(result)).toEqual([]);
    expect(result.answers[0]!.quantity!.value).toBeCloseTo((2e3 * 64) / 3 / 10e6, 12);
  });
});

describe('numbers', () => {
  test.each(['1e400', '1e31', '1e-31', '0/0', '1/0', 'sqrt(0 - 1)', '(0 - 1)^0.5', '1e20^2', 'tan(90 deg) ^ 9'])(
    '%s is refused',
    value => {
      const result = evaluate(fence(`let x = ${value}`));
      expect(codes(result).length).toBe(1);
      expect(result.values[0]?.quantity).toBeUndefined();
    },
  );
  test.each([
    ['a negative stiffness', 'section S: EI -10 MN m2'],
    ['no stiffness', 'section S: EI 0 MN m2'],
  ])('%s is refused', (_, section) => {
    const result = evaluate(fence(section, ...BEAM.slice(1)));
    expect(codes(result)).toEqual(['bad-value']);
    expect(result.answers[0]!.quantity).toBeUndefined();
  });
  test('huge and tiny units give the same beam', () => {
    const expected = (5 * 2e3 * 4 ** 4) / (384 * 10e6);
    for (const section of [
      'section S: EI 1e13 N mm2',
      'section S: EI 0.01 GPa m4',
      'section S: E 1e-3 Pa, I 1e10 m4',
    ]) {
      const result = evaluate(fence(section, 'member R1: A -- 0.004 km -- B', ...BEAM.slice(2)));
      expect(codes(result)).toEqual([]);
      expect(result.answers[0]!.quantity!.value).toBeCloseTo(expected, 12);
    }
  });
  test('a very stiff part beside a very soft one is answered or withheld, never wrong', () => {
    const result = evaluate(
      fence(
        'section S: EI 1e20 N m2, EA 1e25 N',
        'section T: EI 1e-3 N m2, EA 1e2 N',
        'member R1, S: A -- 4 m -- B',
        'member R2, T: B -- 1 m -- C',
        'support A: fixed',
        'load q: 1e-6 N down at C',
        'find tip: deflection at C',
      ),
    );
    const exact = (1e-6 * 1) / (3 * 1e-3);
    const { quantity } = result.answers[0]!;
    if (quantity !== undefined) expect(Math.abs(quantity.value / exact - 1)).toBeLessThan(1e-8);
  });
});

describe('geometry', () => {
  test.each([
    ['a leg of no length', 'member R1: A -- 0 m -- B', 'bad-geometry'],
    ['a leg of negative length', 'member R1: A -- -3 m -- B', 'bad-geometry'],
    ['a point twice in a chain', 'member R1: A -- 4 m -- B -- 2 m up -- A', 'bad-geometry'],
    ['half a chain', 'member R1: A -- 4 m --', 'bad-statement'],
    ['a force for a length', 'member R1: A -- 4 kN -- B', 'wrong-dimension'],
  ])('%s is told in one diagnostic', (_, member, code) => {
    expect(codes(evaluate(fence(BEAM[0]!, member, ...BEAM.slice(2))))).toEqual([code]);
  });
  test('a part joined to nothing is told, and the other structure is answered', () => {
    const result = evaluate(
      `${fence('structure One', ...BEAM, 'point P: 0 m, 3 m', 'member R2: P -- 2 m -- Q')}\n${fence('structure Two', ...BEAM)}`,
    );
    expect(codes(result)).toEqual(['unstable-structure']);
    expect(result.answers.map(({ quantity }) => quantity !== undefined)).toEqual([false, true]);
  });
  test('two points at one place are told', () => {
    const result = evaluate(fence(...BEAM, 'member R2: B -- 2 m -- C', 'point P: 6 m, 0 m', 'support P: fixed'));
    expect(result.diagnostics.map(({ code }) => code)).toContain('bad-geometry');
  });
});

describe('half a note', () => {
  test('every beginning of a note is read', () => {
    const note = fence(...BEAM);
    for (let end = 0; end <= note.length; end++) evaluate(note.slice(0, end));
  });
  test('every statement alone', () => {
    for (const line of BEAM) evaluate(fence(line));
  });
  test('every keyword alone', () => {
    for (const word of 'structure case use hinge let material section member bar bars group point connection release support load combine find require display assume show carry'.split(
      ' ',
    )) {
      expect(codes(evaluate(fence(word))).length).toBe(1);
      expect(codes(evaluate(fence(`${word} X`))).length).toBeLessThanOrEqual(1);
      expect(codes(evaluate(fence(`${word} X:`))).length).toBe(1);
    }
  });
});
