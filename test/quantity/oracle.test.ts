// Random expressions with units, worked here and by the full unit type of mathjs.
import fc from 'fast-check';
import type { Unit } from 'mathjs';
import { all, create } from 'mathjs';
import { expect, test } from 'vitest';
import { written } from './written.ts';

const math = create(all!);

/** An expression as a note writes it and as the oracle reads it. */
interface Pair {
  readonly note: string;
  readonly oracle: string;
}

const UNITS: readonly Pair[] = [
  ['', ''],
  ['m', 'm'],
  ['mm', 'mm'],
  ['ft', 'ft'],
  ['in', 'inch'],
  ['kN', 'kN'],
  ['lbf', 'lbf'],
  ['kN m', 'kN*m'],
  ['kNm', 'kN*m'],
  ['kN/m', 'kN/m'],
  ['N/mm2', 'N/mm^2'],
  ['mm⁴', 'mm^4'],
  ['kg/m3', 'kg/m^3'],
  ['s', 's'],
  ['/K', 'K^-1'],
].map(([note, oracle]) => ({ note: note!, oracle: oracle! }));

const quantity: fc.Arbitrary<Pair> = fc
  .tuple(fc.integer({ min: 1, max: 99_999 }), fc.constantFrom(0, 1, 3), fc.constantFrom(...UNITS))
  .map(([digits, places, unit]) => {
    const number = (digits / 10 ** places).toFixed(places);
    return {
      note: unit.note === '' ? number : `${number} ${unit.note}`,
      oracle: unit.oracle === '' ? number : `(${number} ${unit.oracle})`,
    };
  });

const { expression } = fc.letrec<{ expression: Pair }>(tie => ({
  expression: fc.oneof(
    { maxDepth: 4, withCrossShrink: true },
    quantity,
    join(tie('expression'), ' + '),
    join(tie('expression'), ' - '),
    join(tie('expression'), ' * '),
    join(tie('expression'), ' / '),
    wrap(tie('expression'), of => `- ${of}`),
    wrap(tie('expression'), of => `(${of})`),
    wrap(tie('expression'), of => `abs(${of})`),
    wrap(tie('expression'), of => `(${of})^2`),
    wrap(tie('expression'), of => `(${of})^-1`),
    wrap(tie('expression'), of => `((${of})^2)^0.5`),
  ),
}));

function join(of: fc.Arbitrary<Pair>, operator: string): fc.Arbitrary<Pair> {
  return fc.tuple(of, of).map(([left, right]) => ({
    note: left.note + operator + right.note,
    oracle: left.oracle + operator + right.oracle,
  }));
}

function wrap(of: fc.Arbitrary<Pair>, words: (of: string) => string): fc.Arbitrary<Pair> {
  return of.map(pair => ({ note: words(pair.note), oracle: words(pair.oracle) }));
}

test('values and dimensions agree', () => {
  let compared = 0;
  fc.assert(
    fc.property(expression, ({ note, oracle }) => {
      const { quantity: ours, problems } = written(note);
      const theirs = worked(oracle);
      if (theirs === 'mismatch') expect(ours).toBeUndefined();
      else if (ours) {
        expect(ours.dimension.slice(0, 4)).toEqual(theirs.dimension);
        // Differences of nearly equal values agree to the size of what was subtracted, not of what is left.
        const scale = Math.max(Math.abs(theirs.value), magnitude(oracle) * 1e-6);
        expect(Math.abs(ours.value - theirs.value)).toBeLessThanOrEqual(1e-9 * scale);
        compared++;
      } else expect(['domain', 'number-out-of-range', 'wrong-dimension']).toContain(problems[0]?.code);
    }),
    { numRuns: 500, seed: 20 },
  );
  expect(compared).toBeGreaterThan(100);
});

/** Length, mass, time and temperature of the oracle's dimensions. */
function worked(text: string): { value: number; dimension: number[] } | 'mismatch' {
  let result: number | Unit;
  try {
    result = math.evaluate(text);
  } catch {
    return 'mismatch';
  }
  if (typeof result === 'number') return { value: result, dimension: [0, 0, 0, 0] };
  // The unit type keeps its value in SI and its dimensions in this order: mass, length, time, current, temperature.
  const { value, dimensions } = result as unknown as { value: number; dimensions: number[] };
  const [mass, length, time, , temperature] = dimensions as [number, number, number, number, number];
  return { value, dimension: [length, mass, time, temperature].map(power => power + 0) };
}

/** The value with every minus a plus: an upper bound of what was added up. */
function magnitude(text: string): number {
  const bound = worked(text.replaceAll(' - ', ' + ').replaceAll('-', '').replaceAll('^1', '^-1'));
  return bound === 'mismatch' ? 0 : Math.abs(bound.value);
}
