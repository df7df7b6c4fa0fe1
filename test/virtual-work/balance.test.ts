// A solution is held against equilibrium and energy: true ones pass, and one that is spoiled anywhere is found out.
import { describe, expect, it } from 'vitest';
import { analyse, type Solution } from '../../src/mechanics/index.ts';
import type { Structure } from '../../src/model/structure.ts';
import { SecondRoad } from '../../src/virtual-work/index.ts';
import { build, type Sketch } from './build.ts';

/** A portal on a pin and a spring, with a brace: loads of every kind, and a support that moves. */
const SKETCH: Sketch = {
  points: { A: [0, 0], B: [0, 4], C: [3, 4.5], D: [6, 4], E: [6, 0] },
  members: { post: { chain: 'A B', EI: 8e6, EA: 9e8, mass: 40 }, roof: { chain: 'B C D', EI: 6e6, EA: 7e8 } },
  bars: { stay: { chain: 'A D', EA: 5e7 } },
  supports: { A: 'pinned', D: { y: 4e6, x: 1e6 }, B: { x: Infinity } },
  loads: {
    all: [
      { line: 'roof', size: [2e3, 5e3] },
      { force: [3e3, -7e3], at: '1.5 roof' },
      { couple: 4e3, at: '1 post' },
      { selfWeight: ['post'] },
      { move: 'A', by: [0.003, -0.002] },
    ],
  },
};

function balance(structure: Structure, solution: Solution) {
  return new SecondRoad(structure).balance([1], solution);
}

describe('a solution', () => {
  const structure = build(SKETCH);
  const [solution] = analyse(structure).cases;

  it('balances, and so does its work', () => {
    const { equilibrium, energy } = balance(structure, solution!);
    expect(equilibrium).toBeLessThan(1e-13);
    expect(energy).toBeLessThan(1e-12);
  });

  it('is found out by equilibrium where a reaction is wrong by a millionth', () => {
    const [first, ...others] = solution!.reactions;
    const spoiled = { ...solution!, reactions: [{ ...first!, y: first!.y * (1 + 1e-6) }, ...others] };
    expect(balance(structure, spoiled).equilibrium).toBeGreaterThan(1e-8);
  });

  it('is found out by equilibrium where a moment is wrong by a millionth', () => {
    const [first, ...others] = solution!.members;
    const pieces = first!.pieces.map(piece => ({
      ...piece,
      bendingMoment: piece.bendingMoment.map(value => value * (1 + 1e-6)),
    }));
    expect(balance(structure, { ...solution!, members: [{ pieces }, ...others] }).equilibrium).toBeGreaterThan(1e-9);
  });

  it('is found out by its energy where the movements are those of a frame stiffer by a millionth', () => {
    const stiffer = build({
      ...SKETCH,
      members: { ...SKETCH.members, roof: { chain: 'B C D', EI: 6e6 * (1 + 1e-6), EA: 7e8 } },
    });
    expect(balance(stiffer, solution!).energy).toBeGreaterThan(1e-9);
  });

  it('of couples alone, and of movements that cause no force, is compared with what went into it', () => {
    const beam: Sketch = {
      points: { A: [0, 0], B: [3, 1] },
      members: { beam: { chain: 'A B', EI: 8e6 } },
      supports: { A: 'pinned', B: 'roller' },
    };
    for (const load of [
      { couple: 5e3, at: '1 beam' },
      { move: 'B', by: [0, -0.01] },
    ] as const) {
      const turned = build({ ...beam, loads: { all: [load] } });
      const { equilibrium, energy } = balance(turned, analyse(turned).cases[0]!);
      expect(equilibrium).toBeLessThan(1e-13);
      expect(energy).toBeLessThan(1e-12);
    }
  });

  it('without load or movement balances exactly', () => {
    const still = build({ ...SKETCH, loads: { none: [] } });
    expect(balance(still, analyse(still).cases[0]!)).toEqual({ equilibrium: 0, energy: 0 });
  });
});
