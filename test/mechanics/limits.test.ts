// What is not analysed, and how long large structures take to be refused or solved.

import { describe, expect, it } from 'vitest';
import { analyse, MAX_FREEDOMS, MAX_PIECES } from '../../src/mechanics/index.ts';
import { build, fixed } from './building.ts';

describe('limits', () => {
  it('a structure with one freedom too many is refused before anything is allocated', () => {
    // Three freedoms a point, whether or not anything meets it.
    const withPoints = (count: number) => {
      const structure = build({ points: { A: [0, 0], B: [1, 0] }, members: ['A B'], supports: { A: fixed } });
      const spare = { name: 'P', x: 0, y: 0, range: { start: 0, end: 0 } };
      return { ...structure, points: [...structure.points, ...new Array(count - 2).fill(spare)] };
    };
    expect(analyse(withPoints(MAX_FREEDOMS / 3)).stability.stable).toBe(true);
    const refused = analyse(withPoints(MAX_FREEDOMS / 3 + 1));
    expect(refused.tooLarge).toBe('freedoms');
    expect(refused.cases).toEqual([]);
  });

  it('a structure with more cases than there is room for fields is refused', () => {
    const points: Record<string, readonly [number, number]> = {};
    for (let k = 0; k <= 1000; k++) points[`P${k}`] = [k, 0];
    const structure = build({ points, members: [Object.keys(points).join(' ')], supports: { P0: fixed } });
    const withCases = (count: number) => ({ ...structure, cases: new Array(count).fill({ name: 'dead' }) });
    expect(analyse(withCases(MAX_PIECES / 1000 + 1)).tooLarge).toBe('cases');
    expect(analyse(withCases(1)).tooLarge).toBeUndefined();
  });

  it('a member without a bending stiffness is a mistake of the caller', () => {
    const structure = build({ points: { A: [0, 0], B: [1, 0] }, members: ['A B'], section: { EA: 1 } });
    expect(() => analyse(structure)).toThrow('Member A B has section A B without a bending stiffness');
  });

  it('a thousand axially stiff storeys and bays are solved in a moment', () => {
    const points: Record<string, readonly [number, number]> = {};
    const members: string[] = [];
    const supports: Record<string, typeof fixed> = {};
    const name = (i: number, j: number) => `P${i}_${j}`;
    for (let i = 0; i <= 33; i++) for (let j = 0; j < 30; j++) points[name(i, j)] = [6 * j, 3 * i];
    for (let j = 0; j < 30; j++) supports[name(0, j)] = fixed;
    for (let i = 1; i <= 33; i++) {
      for (let j = 0; j < 30; j++) members.push(`${name(i - 1, j)} ${name(i, j)}`);
      members.push(Array.from({ length: 30 }, (_, j) => name(i, j)).join(' '));
    }
    const beams = members.filter(chain => chain.split(' ').length > 2);
    const structure = build({
      points,
      members,
      supports,
      section: { EI: 2e7 },
      cases: [[{ at: name(33, 0), x: 1000 }, ...beams.map(on => ({ on, w: 100 }))]],
    });
    const start = performance.now();
    const { cases } = analyse(structure);
    expect(performance.now() - start).toBeLessThan(2000);
    expect(cases[0]!.residual).toBeLessThan(1e-12);
    // All points of a storey sway alike.
    const sway = (j: number) => cases[0]!.movements[3 * Object.keys(points).indexOf(name(20, j))]!;
    expect(sway(29) / sway(0)).toBeCloseTo(1, 13);
  });
});
