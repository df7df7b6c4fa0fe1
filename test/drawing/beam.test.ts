import { describe, expect, it } from 'vitest';
import { structureDrawing } from '../../src/drawing/index.ts';
import { METRIC } from '../../src/quantity/display.ts';
import { significant } from '../../src/quantity/number.ts';
import { acting, build, RAFTER, STEEL } from './structures.ts';
import { checkDrawing, textsOf } from './svg.ts';

const SERVICE = [1, 1, 0, 1];

function drawn(structure = RAFTER, factors: readonly number[] = SERVICE, name = 'service'): string[] {
  const { main, panels } = structureDrawing(structure, acting(structure, factors, name), METRIC);
  checkDrawing(main);
  expect(panels).toEqual([]);
  return textsOf(main);
}

describe('a level beam', () => {
  it('adds the loads of a case, self-weight told apart', () => {
    const weight = (27.13 * 9.80665) / 1000;
    expect(drawn()).toContain(`1.15 + self-weight ${significant(weight)} = ${significant(1.15 + weight)} kN/m`);
  });

  it('names each case once, and writes the values of a varying load over its ends', () => {
    const texts = drawn();
    for (const name of ['dead', 'snow']) expect(texts.filter(text => text === name)).toHaveLength(1);
    expect(texts).toEqual(expect.arrayContaining(['2.4 kN/m', '0.6', '3.1 kN/m', 'lamp 0.45 kN']));
  });

  it('tells the factor beside the case, and draws the factored load', () => {
    const texts = drawn(RAFTER, [1.35, 1.5, 0, 0], 'strength');
    expect(texts).toEqual(expect.arrayContaining(['dead × 1.35', 'snow × 1.5', '3.6 kN/m']));
  });

  it('draws a load that lifts over the beam, and says so', () => {
    expect(drawn(RAFTER, [1, 0, 1, 0], 'uplift')).toContain('1.9 kN/m up');
  });

  it('dimensions the chain', () => {
    expect(drawn()).toEqual(expect.arrayContaining(['4.800 m', '1.800 m']));
  });

  it('labels both sides of each jump of the shear and the free end', () => {
    // Statics by hand: turning about B, then upright.
    const w1 = 1.15 + (27.13 * 9.80665) / 1000;
    const a =
      ((w1 + 2.4) * 4.8 ** 2 * 0.5 - (w1 + 0.6) * 1.8 ** 2 * 0.5 - (0.5 * 2.5 * 1.8 * 2 * 1.8) / 3 - 0.45 * 1.8) / 4.8;
    const before = a - (w1 + 2.4) * 4.8;
    const after = (w1 + 0.6) * 1.8 + 0.5 * 2.5 * 1.8 + 0.45;
    expect(drawn()).toEqual(
      expect.arrayContaining([
        `+${significant(a)} kN`,
        `−${significant(-before)} kN`,
        `+${significant(after)} kN`,
        '+0.4500 kN',
      ]),
    );
  });

  it('tells the side in tension and the place of an extreme inside a span', () => {
    const texts = drawn();
    expect(texts.some(text => /^7\.86\d kN m, tension below, 2\.030 m from A$/.test(text))).toBe(true);
    expect(texts.some(text => /^6\.77\d kN m, tension above$/.test(text))).toBe(true);
  });

  it('tells which way it moves and how much that is exaggerated', () => {
    const texts = drawn();
    expect(texts.some(text => /^4\.44\d mm down, 2\.224 m from A$/.test(text))).toBe(true);
    expect(texts.some(text => /^1\.6\d\d mm up$/.test(text))).toBe(true);
    expect(texts).toContain('drawn × 80');
  });

  it('marks where the moment is zero', () => {
    expect(drawn()).toContain('4.060 m');
  });

  it('draws the loads alone where nothing is solved', () => {
    const free = build({ points: { A: [0, 0], B: [3, 0] }, members: { M: ['A', 'B'] }, cases: ['dead'] });
    const { main } = structureDrawing(free, { name: 'dead', factors: [1], solution: undefined }, METRIC);
    checkDrawing(main);
    expect(textsOf(main)).not.toContain('Shear');
  });

  it('puts the tension of a beam drawn from right to left on the same side', () => {
    const sides = [['A', 'B'] as const, ['B', 'A'] as const].map(chain => {
      const beam = build({
        points: { A: [0, 0], B: [4, 0] },
        members: { M: chain },
        supports: [
          ['A', 'pinned'],
          ['B', 'roller'],
        ],
        loads: () => [
          {
            case: 'dead',
            kind: 'line',
            member: 0,
            start: 0,
            end: 4,
            startIntensity: 3000,
            endIntensity: 3000,
            direction: { kind: 'global', x: 0, y: -1, onPlan: false },
          },
        ],
      });
      // w l² / 8
      return drawn(beam, [1], 'dead').find(text => text.startsWith('6.000 kN m'));
    });
    expect(sides).toEqual(['6.000 kN m, tension below, 2.000 m from A', '6.000 kN m, tension below, 2.000 m from B']);
  });

  it('tells heat and lack of fit by case, factored, over everything else', () => {
    const loads = [
      { case: 'sun', kind: 'heat', member: 0, above: 20, below: 20 },
      { case: 'sun', kind: 'heat', member: 0, above: 30, below: -5 },
      { case: 'frost', kind: 'heat', member: 0, above: -12, below: -12 },
      { case: 'fit', kind: 'lengthen', member: 0, amount: 0.003 },
      { case: 'fit', kind: 'lengthen', member: 0, amount: -0.0015 },
    ] as const;
    const beam = build({
      points: { A: [0, 0], B: [4, 0] },
      members: { M: ['A', 'B'] },
      supports: [['A', 'fixed']],
      cases: ['sun', 'frost', 'fit'],
      section: { ...STEEL, thermalExpansion: 12e-6 },
      loads: () => loads,
    });
    const texts = drawn(beam, [1.5, 1, 1], 'all');
    expect(texts).toEqual(
      expect.arrayContaining([
        'sun M heated 30 K',
        'sun M heated 45 K above, −7.5 K below',
        'frost M cooled 12 K',
        'fit M 3 mm too long',
        'fit M 1.5 mm too short',
      ]),
    );
  });
});
