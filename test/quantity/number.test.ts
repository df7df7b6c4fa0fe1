// Decimal literals, and significant figures by the rule of rounding half away from zero.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { full, inRange, readDecimal, significant } from '../../src/quantity/number.ts';

describe('four significant figures', () => {
  test.for([
    [0, '0'],
    [-0, '0'],
    [10, '10.00'],
    [0.5, '0.5000'],
    [2.0625, '2.063'],
    [-2.0625, '-2.063'],
    [1.0005, '1.001'],
    [2.0005, '2.001'],
    [0.1 + 0.2, '0.3000'],
    [999.95, '1000'],
    [999.949, '999.9'],
    [9999.5, '10000'],
    [123456, '123500'],
    [9999499, '9999000'],
    [9999500, '1.000e7'],
    [1e7, '1.000e7'],
    [1.2345e7, '1.235e7'],
    [0.0005923905501, '0.0005924'],
    [0.00009999499, '9.999e-5'],
    [0.0000999995, '0.0001000'],
    [1.2345e-7, '1.235e-7'],
    [-0.9981458606, '-0.9981'],
    [4.443278203, '4.443'],
    [1.35, '1.350'],
  ] as const)('%d is %s', ([value, shown]) => {
    expect(significant(value)).toBe(shown);
  });
  test('other numbers of figures', () => {
    expect(significant(1793.9072, 6)).toBe('1793.91');
    expect(significant(0.3332459, 3)).toBe('0.333');
    expect(significant(9.96, 1)).toBe('10');
  });
  test('is within half a unit of the last figure, of the same sign', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-12, max: 1e12, noNaN: true }), fc.boolean(), (size, negative) => {
        const value = negative ? -size : size;
        const shown = Number(significant(value));
        const last = 10 ** (Math.floor(Math.log10(size)) - 3);
        return Math.sign(shown) === Math.sign(value) && Math.abs(shown - value) <= last * 0.5000001;
      }),
    );
  });
});

describe('all that is known', () => {
  test.for([
    [0.1 + 0.2, '0.3'],
    [2009.9999999999998, '2010'],
    [0.012400000000000001, '0.0124'],
    [83599999.99999999, '83600000'],
    [1e21, '1e21'],
    [1.5e-9, '1.5e-9'],
    [1 / 3, '0.33333333333333'],
  ] as const)('%d is %s', ([value, shown]) => {
    expect(full(value)).toBe(shown);
  });
});

describe('decimal literals', () => {
  test.for([
    ['12.4', 124, -1],
    ['.5', 5, -1],
    ['5e-6', 5, -6],
    ['0.075', 75, -3],
    ['1.50E+3', 150, 1],
    ['007', 7, 0],
  ] as const)('%s', ([text, digits, tens]) => {
    expect(readDecimal(text)).toEqual({ digits, tens });
  });
  test('a long one is read as a double', () => {
    expect(readDecimal('0.30000000000000004')).toEqual({ digits: 0.30000000000000004, tens: 0 });
    expect(readDecimal('12345678901234567890e2')).toEqual({ digits: Number('12345678901234567890e2'), tens: 0 });
  });
});

test('what a note may hold', () => {
  for (const value of [0, 1e30, -1e30, 1e-30, 1]) expect(inRange(value)).toBe(true);
  for (const value of [1.0001e30, 9.99e-31, Number.NaN, Number.POSITIVE_INFINITY]) expect(inRange(value)).toBe(false);
});
