// Tokens and lines: what a scanner makes of a text, and where.
import { describe, expect, test } from 'vitest';
import { wordsOf } from '../../src/language/lines.ts';
import type { Scanned } from '../../src/language/tokens.ts';
import { indentation, scan } from '../../src/language/tokens.ts';

function scanned(text: string): Scanned {
  const into: Scanned = { tokens: [], fault: undefined };
  scan({ text, start: 0 }, into);
  return into;
}

/** Each token with its kind's first letter. */
function tokens(text: string): string {
  return scanned(text)
    .tokens.map(token => `${token.kind[0]}:${token.text}`)
    .join(' ');
}

describe('tokens', () => {
  test.for([
    ['4.8 m', 'n:4.8 w:m'],
    ['4.8m', 'n:4.8 w:m'],
    ['.5', 'n:.5'],
    ['5.', 'n:5 s:.'],
    ['2e3 2e 2e-3 2e−3', 'n:2e3 n:2 w:e n:2e-3 n:2e-3'],
    ['A--B', 'w:A m:-- w:B'],
    ['−5 − −', 'm:- n:5 m:- m:-'],
    ['a ≤ b ≥ c <= d', 'w:a m:<= w:b m:>= w:c m:<= w:d'],
    ['+- ±', 'm:+ m:- m:±'],
    ['mm² s⁻¹', 'w:mm r:2 w:s r:-1'],
    ['kN·m kN⋅m', 'w:kN m:· w:m w:kN m:· w:m'],
    ['b_1 β2 é', 'w:b_1 w:β2 w:é'],
    ['"a # b" # c', 's:a # b'],
    ['a#b', 'w:a s:# w:b'],
    ['# all', ''],
    ['a;b', 'w:a s:; w:b'],
    ['%%%%', 's:%%%%'],
  ] as const)('%s', ([text, expected]) => {
    expect(tokens(text)).toBe(expected);
  });
  test('a name is compared in NFC, its place is as written', () => {
    const [token] = scanned('e\u0301tage').tokens;
    expect(token).toMatchObject({ text: '\u00e9tage', start: 0, end: 6 });
  });
  test('a lone surrogate and characters beyond the first plane are single strays', () => {
    expect(scanned('\ud800 😀😀').tokens.map(({ start, end }) => [start, end])).toEqual([
      [0, 1],
      [2, 4],
      [4, 6],
    ]);
  });
  test('letters beyond the first plane make names', () => {
    expect(scanned('𝛿x').tokens).toMatchObject([{ kind: 'word', start: 0, end: 3 }]);
  });
  test('only the first fault of a line is kept', () => {
    expect(scanned('1,5 – “').fault).toMatchObject({ kind: 'decimal-comma', start: 1, end: 2 });
  });
  test('no fault in quotes or comments', () => {
    expect(scanned('"1,5 – “" # 1,5 –').fault).toBeUndefined();
  });
});

test('tabs indent to the next multiple of four', () => {
  expect(indentation(' \tx')).toEqual({ columns: 4, index: 2 });
  expect(indentation('\t  x')).toEqual({ columns: 6, index: 3 });
});

describe('words of a range', () => {
  const words = (text: string) => wordsOf(text, { start: 0, end: text.length });
  test.for([
    ['sag  of R1\tbetween A and B', 'sag of R1 between A and B'],
    ['sag of R1 # where\n  # it is\n  between A and B', 'sag of R1 between A and B'],
    ['sag of R1\n>   between A and B', 'sag of R1 between A and B'],
    ['tip\n> >= 3 mm', 'tip >= 3 mm'],
    ['tip\r\n  >= 3 mm', 'tip >= 3 mm'],
    ['a − b', 'a - b'],
    ['a "x  # − y" b', 'a "x # − y" b'],
  ] as const)('%j is %j', ([text, expected]) => {
    expect(words(text)).toBe(expected);
  });
  test('only those of the range', () => {
    expect(wordsOf('find a: sag of R1', { start: 8, end: 17 })).toBe('sag of R1');
  });
});
