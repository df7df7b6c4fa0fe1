// Quantities as a note shows them.
import { describe, expect, test } from 'vitest';
import type { DisplayKind, DisplayUnits } from '../../src/quantity/display.ts';
import { METRIC, readDisplay, showQuantity, tradeUnit, US } from '../../src/quantity/display.ts';
import { written } from './written.ts';

function shown(text: string, units: DisplayUnits, kind?: DisplayKind): string {
  return showQuantity(written(text).quantity!, units, kind).text;
}

describe('metric', () => {
  test.for([
    ['12.5 kN', undefined, '12.50 kN'],
    ['0.001648703049 m', 'deflection', '1.649 mm'],
    ['10 mm', 'deflection', '10.00 mm'],
    ['4.8 m', undefined, '4.800 m'],
    ['2.4 kN m', undefined, '2.400 kN m'],
    ['0.0005923905501 rad', undefined, '0.0005924 rad'],
    ['0.0005923905501', 'rotation', '0.0005924 rad'],
    ['1.15 kN/m', undefined, '1.150 kN/m'],
    ['355 MPa', undefined, '355.0 MPa'],
    ['0.75 kN/m2', undefined, '0.7500 kN/m2'],
    ['75 kPa', 'stress', '0.07500 MPa'],
    ['210 GPa', undefined, '210000 MPa'],
    ['4410 cm4', undefined, '4410 cm4'],
    ['39.7 cm2', undefined, '39.70 cm2'],
    ['12 m * 3 m', undefined, '36.00 m2'],
    ['167 cm3', undefined, '167.0 cm3'],
    ['24 MN m2', undefined, '24000 kN m2'],
    ['7850 kg/m3', undefined, '7850 kg/m3'],
    ['24 kN/m3', undefined, '24.00 kN/m3'],
    ['450 kg', undefined, '450.0 kg'],
    ['12.1 kg/m', undefined, '12.10 kg/m'],
    ['25 degC', undefined, '25.00 K'],
    ['5e-6 /K', undefined, '5.000e-6 1/K'],
    ['0.25', undefined, '0.2500'],
    ['3 m / 1 s', undefined, '3.000 m/s'],
    ['0 kN', undefined, '0 kN'],
  ] as const)('%s (%s) is %s', ([text, kind, expected]) => {
    expect(shown(text, METRIC, kind)).toBe(expected);
  });
});

describe('us', () => {
  test.for([
    ['1200 lbf', undefined, '1.200 kip'],
    ['12 ft 6 in', undefined, '12.50 ft'],
    ['0.25 in', 'deflection', '0.2500 in'],
    ['36 kip in', undefined, '3.000 kip ft'],
    ['50 ksi', undefined, '50.00 ksi'],
    ['50 psf', undefined, '50.00 psf'],
    ['240 plf', undefined, '0.2400 kip/ft'],
    ['150 pcf', undefined, '150.0 pcf'],
    ['8 in2', undefined, '8.000 in2'],
    ['178 in4', undefined, '178.0 in4'],
    ['29000 ksi * 178 in4', undefined, '5162000 kip in2'],
    ['490 lb / 1 ft^3', undefined, '490.0 lb/ft3'],
  ] as const)('%s (%s) is %s', ([text, kind, expected]) => {
    expect(shown(text, US, kind)).toBe(expected);
  });
});

test('a unit, a number and both', () => {
  expect(showQuantity(written('1.5 kN').quantity!, METRIC)).toEqual({ number: '1.500', unit: 'kN', text: '1.500 kN' });
  expect(showQuantity(written('1.5').quantity!, METRIC)).toEqual({ number: '1.500', unit: '', text: '1.500' });
});

test('units for messages', () => {
  expect(tradeUnit([1, 1, -2, 0, 0])).toBe('kN');
  expect(tradeUnit([0, 0, 0, 0, 0])).toBe('');
});

describe('a choice by kind', () => {
  const choice = (...rows: readonly (readonly [kind: string, units: string])[]) => ({
    kind: 'units' as const,
    units: rows.map(([text, units], index) => ({
      name: { text, range: { start: 10 * index, end: 10 * index + 1 } },
      units,
      range: { start: 10 * index + 5, end: 10 * index + 6 },
    })),
  });
  test('leaves the kinds that it does not name', () => {
    const { units, problems } = readDisplay(choice(['force', 'N'], ['moment', 'N·m'], ['line load', 'N/mm']), METRIC);
    expect(problems).toEqual([]);
    expect(shown('1.5 kN', units)).toBe('1500 N');
    expect(shown('1.5 kN m', units)).toBe('1500 N·m');
    expect(shown('1.5 kN/m', units)).toBe('1.500 N/mm');
    expect(shown('1.5 m', units)).toBe('1.500 m');
  });
  test('tells what does not fit at its place', () => {
    const { units, problems } = readDisplay(choice(['forse', 'N'], ['force', 'kn'], ['stress', 'kN']), METRIC);
    expect(problems.map(({ code, range, hint }) => [code, range.start, hint])).toEqual([
      ['bad-value', 0, '`force`?'],
      ['unknown-unit', 15, undefined],
      ['wrong-dimension', 25, undefined],
    ]);
    expect(units).toEqual(METRIC);
  });
  test('a whole system', () => {
    expect(readDisplay({ kind: 'us' }, METRIC).units).toBe(US);
    expect(readDisplay({ kind: 'metric' }, US).units).toBe(METRIC);
  });
});
