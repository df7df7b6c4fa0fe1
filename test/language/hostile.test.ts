// No text makes the parser fail, leave the text, take long, or change its mind.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { parseProse, parseStatements } from '../../src/language/parse.ts';
import { STATEMENTS } from '../../src/language/statements/table.ts';
import type { SourceLine } from '../../src/language/syntax.ts';
import { MEASURES } from '../../src/language/words.ts';
import { UNIT_NAMES } from '../../src/quantity/units.ts';
import { linesOf } from './source.ts';

const EXAMPLES = Object.values(STATEMENTS).flatMap(form => form.examples);
const WORDS = [
  ...new Set(EXAMPLES.flatMap(example => example.split(/ +/))),
  ...UNIT_NAMES,
  ...Object.keys(MEASURES),
  ...['constructor', '__proto__', 'toString', 'hasOwnProperty', 'NaN', 'Infinity', 'true', 'null', 'undefined'],
  ...[
    '(',
    ')',
    ',',
    '--',
    '-',
    '+',
    '+-',
    '*',
    '/',
    '^',
    '<=',
    '>=',
    ':',
    '=',
    '"',
    '#',
    '–',
    '²',
    '·',
    '×',
    '\t',
    '\u00a0',
  ],
  ...[
    '1e999',
    '1e-999',
    '0',
    '1/0',
    '1,5',
    '12 ft 6 1/2 in',
    '9 1/0 in',
    '!',
    '%',
    '[',
    ']',
    '{',
    '}',
    ';',
    '\\',
    '\0',
    '\ud800',
    '💥',
  ],
];

/** Checks what holds for every text. */
function check(text: string): void {
  const lines = linesOf(text);
  const parsed = parseStatements(lines);
  for (const { range } of [...parsed.statements, ...parsed.diagnostics, ...parsed.broken]) {
    expect(range.start).toBeGreaterThanOrEqual(0);
    expect(range.end).toBeLessThanOrEqual(text.length);
    expect(range.end).toBeGreaterThanOrEqual(range.start);
  }
  for (const statement of parsed.statements) checkPlaces(statement, statement.range, text);
  for (const diagnostic of parsed.diagnostics) {
    expect(diagnostic.message).not.toMatch(/\n/);
    for (const edit of diagnostic.fix?.edits ?? []) expect(edit.range.end).toBeLessThanOrEqual(text.length);
  }
  expect(parseStatements(lines)).toEqual(parsed);
}

/** Every part lies within the part around it; every name reads as its words. */
function checkPlaces(part: unknown, around: { start: number; end: number }, text: string): void {
  if (typeof part !== 'object' || part === null) return;
  if (Array.isArray(part)) {
    for (const one of part) checkPlaces(one, around, text);
    return;
  }
  // The range of a unit that `display` sets leaves out the name beside it.
  if ('units' in part && typeof part.units === 'string') return;
  let within = around;
  if ('range' in part) {
    within = part.range as typeof around; // every range of the tree has this shape
    if (within.start < around.start || within.end > around.end)
      throw new Error(`a part leaves the one around it: ${text}`);
    if (within.start >= within.end) throw new Error(`a part is empty: ${text}`);
    if ('text' in part && typeof part.text === 'string' && !text.slice(within.start, within.end).startsWith('"')) {
      const words = text.slice(within.start, within.end);
      if (words.normalize('NFC').replace(/\s+/g, '') !== part.text.replace(/\s+/g, ''))
        throw new Error(`${words} is not ${part.text}`);
    }
  }
  for (const [key, one] of Object.entries(part)) if (key !== 'range') checkPlaces(one, within, text);
}

describe('any text', () => {
  test('words of the language in any order', () => {
    const line = fc.tuple(
      fc.constantFrom(...Object.keys(STATEMENTS)),
      fc.array(fc.constantFrom(...WORDS), { maxLength: 12 }),
    );
    const text = fc
      .array(line, { maxLength: 6 })
      .map(lines => lines.map(([keyword, words]) => [keyword, ...words].join(' ')).join('\n'));
    fc.assert(fc.property(text, check), { numRuns: 1500, seed: 7 });
  });
  test('examples with edits', () => {
    const edit = fc.tuple(
      fc.constantFrom(...EXAMPLES),
      fc.nat(),
      fc.nat(8),
      fc.oneof(fc.constantFrom(...WORDS), fc.string({ unit: 'grapheme' })),
    );
    const text = edit.map(([example, at, length, words]) => {
      const start = at % (example.length + 1);
      return example.slice(0, start) + words + example.slice(start + length);
    });
    fc.assert(fc.property(text, check), { numRuns: 3000, seed: 7 });
  });
  test('noise', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary', maxLength: 200 }), check), { numRuns: 500, seed: 7 });
  });
  test('in prose', () => {
    const text = fc.array(fc.constantFrom(...WORDS), { maxLength: 10 }).map(words => words.join(' '));
    fc.assert(
      fc.property(text, words => {
        const { value, diagnostics } = parseProse(words, 0);
        return diagnostics.length === (value ? 0 : 1) && diagnostics.every(({ range }) => range.end <= words.length);
      }),
      { numRuns: 1000, seed: 7 },
    );
  });
});

describe('bounds', () => {
  test('64 deep passes, 65 does not', () => {
    expect(parseStatements(linesOf(`let a = ${'('.repeat(64)}1${')'.repeat(64)}`)).diagnostics).toEqual([]);
    expect(parseStatements(linesOf(`let a = ${'- '.repeat(64)}1`)).diagnostics).toEqual([]);
    expect(parseStatements(linesOf(`let a = 2${'^2'.repeat(64)}`)).diagnostics).toEqual([]);
    for (const value of [
      `${'('.repeat(65)}1${')'.repeat(65)}`,
      `${'- '.repeat(65)}1`,
      `2${'^2'.repeat(65)}`,
      '('.repeat(1000),
    ]) {
      expect(parseStatements(linesOf(`let a = ${value}`)).diagnostics).toMatchObject([{ code: 'value-too-deep' }]);
    }
  });
  test('terms and factors one after another are not deep', () => {
    expect(parseStatements(linesOf(`let a = 1${' + -(2)^2'.repeat(200)}`)).diagnostics).toEqual([]);
  });
  test('2000 operands and operators pass, more do not', () => {
    expect(parseStatements(linesOf(`let a = - 1${' + 1'.repeat(999)}`)).diagnostics).toEqual([]);
    expect(parseStatements(linesOf(`let a = 1${' + 1'.repeat(1000)}`)).diagnostics).toMatchObject([
      { code: 'value-too-long' },
    ]);
  });
});

describe('long texts take time in proportion', () => {
  const noise = Array.from({ length: 1e6 }, (_, index) =>
    String.fromCharCode(32 + ((index * 7919 + (index >> 3) * 31) % 95)),
  ).join('');
  test.for([
    ['10,000 statements', `${EXAMPLES.join('\n')}\n`.repeat(Math.ceil(10_000 / EXAMPLES.length))],
    ['noise', noise],
    ['noise behind a keyword', `let a = ${noise.replaceAll('#', '')}`],
    ['a long sum', `let a = ${'1+'.repeat(5e5)}`],
    ['open parentheses', `load a: ${'('.repeat(5e5)}`],
    ['quotes', `let a = ${'"'.repeat(1e6)}`],
    ['items', `material a: ${'E 1 m, '.repeat(1.4e5)}`],
    ['a chain', `member a: A${' -- 1 m -- B'.repeat(8e4)}`],
    ['digits', `let a = ${'1'.repeat(1e6)}`],
    ['raised digits', `let a = 1 m${'²'.repeat(1e6)}`],
    ['strays', `let a = ${'%@'.repeat(5e5)}`],
    ['dashes', `member a: A ${'–'.repeat(1e6)}`],
    ['continuations', `let a = 1\n${'  + 1\n'.repeat(1.6e5)}`],
    ['a word', `let ${'x'.repeat(1e6)}`],
    ['combining marks', `let e${'\u0301'.repeat(1e6)}`],
    ['measures', `find a: ${'moment at ('.repeat(9e4)}`],
    ['limits', `require a: moment in R <= ${'moment under '.repeat(8e4)}`],
    ['terms', `combine a: g${' + g'.repeat(2.5e5)}`],
    ['blank lines', '\n  \n'.repeat(2.5e5)],
  ] as const)('%s', ([, text]) => {
    const lines = linesOf(text);
    expect(Math.min(secondsFor(lines), secondsFor(lines))).toBeLessThan(1);
  });
});

/** Processor time, which other work on the machine does not stretch. */
function secondsFor(lines: readonly SourceLine[]): number {
  const before = process.cpuUsage();
  parseStatements(lines);
  const { user, system } = process.cpuUsage(before);
  return (user + system) / 1e6;
}
