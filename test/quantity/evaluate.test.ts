// What expressions come to, and why they do not.
import { describe, expect, test } from 'vitest';
import { siUnit } from '../../src/quantity/dimension-names.ts';
import { written } from './written.ts';

describe('values in SI', () => {
  test.for([
    // hand conversions: 1 in = 25.4 mm, 1 lbf = 4.4482216152605 N
    ['4.8 m', 4.8, 'm'],
    ['12 ft 6 1/2 in', 150.5 * 0.0254, 'm'],
    ['9 1/4 in', 0.23495, 'm'],
    ['0.75 kN/m2 * 3.2 m', 2400, 'N/m'],
    ['10 kN / 2 m', 5000, 'N/m'],
    ['1/4 in', 1 / 0.1016, '1/m'],
    ['(3 mm)^2', 9e-6, 'm2'],
    ['3 mm^2', 3e-6, 'm2'],
    ['(8 mm3)^(1/3)', 0.002, 'm'],
    ['sqrt(9 m2)', 3, 'm'],
    ['sqrt(2 m)^2', 2, 'm'],
    ['210 GPa * 1793.9072 cm4', 3767205.12, 'N m2'],
    ['2 kg * g0', 19.6133, 'N'],
    ['2 g0 * 3 kg', 58.8399, 'N'],
    ['-2^2', -4, ''],
    ['2^-1', 0.5, ''],
    ['2^3^2', 512, ''],
    ['min(3 m, 200 cm, 1 km)', 2, 'm'],
    ['max(3, 4, 2)', 4, ''],
    ['abs(-3 kN)', 3000, 'N'],
    ['ceil(4.3 m / 1 m)', 5, ''],
    ['ceil(0.6 m / 0.2 m)', 3, ''],
    ['floor(0.3 m / 0.1 m)', 3, ''],
    ['sin(30 deg)', 0.5, ''],
    ['sin(180 deg)', 0, ''],
    ['cos(90 deg)', 0, ''],
    ['cos(60 deg)', 0.5, ''],
    ['tan(45 deg)', 1, ''],
    ['sin(pi / 2)', 1, ''],
    ['180 deg', Math.PI, 'rad'],
    ['2 mrad + 0.5 mrad', 0.0025, 'rad'],
    ['2 * 3 mrad', 0.006, 'rad'],
    ['3 mrad / 2', 0.0015, 'rad'],
    ['1 + 3 mrad', 1.003, 'rad'],
    ['3 mrad * 2 m', 0.006, 'm'],
    ['3 mrad / 1 mrad', 3, ''],
    ['4 MN m/rad * 2 mrad', 8000, 'N m'],
    ['9 degF', 5, 'K'],
    ['5e-6 /K * 20 K', 1e-4, ''],
    ['7 kNm2 / 1 m', 7000, 'N m'],
    ['150 pcf / g0', (150 * 0.45359237) / 0.3048 ** 3, 'kg/m3'],
    ['2 × 3 m', 6, 'm'],
    ['0 m * 5', 0, 'm'],
    ['0e5 kN', 0, 'N'],
    ['2 s^-1 * 3 s', 6, ''],
  ] as const)('%s', ([text, value, unit]) => {
    const { quantity, problems } = written(text);
    expect(problems).toEqual([]);
    expect(siUnit(quantity!.dimension)).toBe(unit);
    expect(Math.abs(quantity!.value - value)).toBeLessThanOrEqual(1e-8 * Math.abs(value));
  });
});

test('an operand without a value makes no problem of its own', () => {
  expect(written('2 m + a * (b - 1 kN)', { a: undefined, b: { value: 1, dimension: [1, 1, -2, 0, 0] } })).toEqual({
    quantity: undefined,
    problems: [],
  });
});

/** The words at fault stand between brackets. */
describe('problems', () => {
  test.for([
    ['[3 kN + 2 m]', 'wrong-dimension', 'kN cannot be added to m here: the one is a force, the other a length.'],
    [
      '2 * ([3 kN - 2])',
      'wrong-dimension',
      'A plain number cannot be subtracted from kN here: the one is a number, the other a force.',
    ],
    ['5 m - [min(3 m, 2 kN)]', 'wrong-dimension', '`min` compares like with like; here are a length and a force.'],
    ['[sin(3 m)]', 'wrong-dimension', '`sin` takes an angle; here it is a length.'],
    ['[ceil(3 m)]', 'wrong-dimension', '`ceil` takes a plain number; here it is a length.'],
    ['[2 ^ (3 m)]', 'wrong-dimension', 'A power is a plain number; here it is a length.'],
    ['[(3 m) ^ 0.3]', 'wrong-dimension', 'A length cannot be raised to the power 0.3: no unit has that power.'],
    ['4 / 2 + [1 / 0]', 'domain', 'The divisor is zero here.'],
    ['[1 kN / (2 m - 2 m)]', 'domain', 'The divisor is zero here.'],
    ['[sqrt(-4 m2)]', 'domain', 'The square root of a negative value: -4 in SI.'],
    ['[(-2) ^ 0.5]', 'domain', 'A negative value has no power of 0.5.'],
    ['[0 ^ -1]', 'domain', 'Zero has no negative power.'],
    ['[tan(90 deg)]', 'domain', 'The tangent of a right angle has no value.'],
    ['2 + [1e20 * 1e20]', 'number-out-of-range', 'This comes to 1e40 in SI; values lie between 1e-30 and 1e30.'],
    ['[1e-20 / 1e20]', 'number-out-of-range', 'This comes to 1e-40 in SI; values lie between 1e-30 and 1e30.'],
    ['[10 ^ 999]', 'number-out-of-range', 'This comes to Infinity in SI; values lie between 1e-30 and 1e30.'],
  ] as const)('%s', ([marked, code, message]) => {
    const start = marked.indexOf('[');
    const text = marked.replace('[', '').replace(']', '');
    const parentheses = text[start - 1] === '(' && text[marked.indexOf(']') - 1] === ')' ? 1 : 0;
    const range = { start: start - parentheses, end: marked.indexOf(']') - 1 + parentheses };
    expect(written(text)).toMatchObject({ quantity: undefined, problems: [{ code, range, message }] });
  });
  test('one mistake tells one problem', () => {
    expect(written('(1 m + 1 kN) * 2 + (3 m - 1 kN)').problems).toHaveLength(2);
    expect(written('((1 m + 1 kN) * 2 + 3 s) ^ 2').problems).toHaveLength(1);
  });
});

describe('the SI unit of a dimension', () => {
  test.for([
    [[0, 0, 0, 0, 0], ''],
    [[0, 0, 0, 0, 1], 'rad'],
    [[1, 0, 0, 0, 1], 'm'],
    [[-1, 1, -2, 0, 0], 'Pa'],
    [[3, 1, -2, 0, 0], 'N m2'],
    [[2, 1, -3, 0, 0], 'kg m2/s3'],
    [[-1, 0, 0, -1, 0], '1/(m K)'],
    [[0.5, 0, 0, 0, 0], 'm0.5'],
    [[6, 0, 0, 0, 0], 'm6'],
  ] as const)('%o is `%s`', ([dimension, unit]) => {
    expect(siUnit(dimension)).toBe(unit);
  });
});
