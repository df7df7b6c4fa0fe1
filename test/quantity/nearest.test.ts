// The word that was likely meant.
import { expect, test } from 'vitest';
import { nearest } from '../../src/quantity/nearest.ts';

test.for([
  ['memebr', ['member', 'bar', 'number'], 'member'],
  ['kn', ['mm', 'kN', 'km'], 'kN'],
  ['suport', ['support', 'show'], 'support'],
  ['dwon', ['down', 'up'], 'down'],
  ['x', ['y', 'z'], undefined],
  ['furlong', ['ft', 'm'], undefined],
  ['load', ['load'], undefined],
  ['R12', ['R1', 'R2', 'Q9'], 'R1'],
] as const)('%s', ([word, candidates, expected]) => {
  expect(nearest(word, candidates)).toBe(expected);
});

test('a very long word is near to nothing', () => {
  expect(nearest('a'.repeat(1e6), ['a'.repeat(1e6 - 1)])).toBeUndefined();
});
