// Loads of every kind: what they amount to, and where they stand.

import { describe, expect, it } from 'vitest';
import type { LineDirection } from '../../src/model/structure.ts';
import { alongX, alongY, fixed, type LoadFigures, pinned, roller, turning } from './building.ts';
import { close, solve } from './reading.ts';

const EI = 3e6;
const EA = 2e8;

/** A cantilever that rises 4 in 3 from its foot A. */
const raking = (...loads: LoadFigures[]) =>
  solve({
    points: { A: [0, 0], B: [3, 4] },
    members: ['A B'],
    section: { EI, EA, mass: 35 },
    supports: { A: fixed },
    cases: [loads],
  });

const line = (direction: LineDirection) => ({ on: 'A B', w: 100, direction });

describe('line loads on a leg that rises 4 in 3', () => {
  it('down, per length', () => {
    const { x, y, moment } = raking(line({ kind: 'global', x: 0, y: -1, onPlan: false })).reaction('A');
    close(x, 0, 1);
    close(y, 500);
    close(moment, 500 * 1.5);
  });

  it('down, per length on plan', () => {
    const { y, moment } = raking(line({ kind: 'global', x: 0, y: -1, onPlan: true })).reaction('A');
    close(y, 300);
    close(moment, 300 * 1.5);
  });

  it('square to it, on the side that points down', () => {
    const { x, y, moment } = raking(line({ kind: 'square', x: 0, y: -1 })).reaction('A');
    close(x, -400);
    close(y, 300);
    close(moment, 500 * 2.5);
  });

  it('square to it, on the side that points left', () => {
    const { x, y } = raking(line({ kind: 'square', x: -1, y: 0 })).reaction('A');
    close(x, 400);
    close(y, -300);
  });

  it('along it, with and against the travel', () => {
    const up = raking(line({ kind: 'along', sense: 1 }));
    close(up.reaction('A').x, -300);
    close(up.reaction('A').y, -400);
    close(up.along('force', 'A B').value, 500);
    close(up.sway('B'), (0.6 * 100 * 25) / (2 * EA));
    close(raking(line({ kind: 'along', sense: -1 })).along('force', 'A B').value, -500);
  });

  it('of which a part varies along a bent member', () => {
    // Two legs; the load runs from the middle of the first to the middle of the second.
    const frame = solve({
      points: { A: [0, 0], B: [4, 0], C: [4, 2] },
      members: ['A B C'],
      section: { EI, EA },
      supports: { A: fixed },
      cases: [[{ on: 'A B C', w: [0, 90], from: 2, to: 5, direction: { kind: 'global', x: 0, y: -1, onPlan: false } }]],
    });
    close(frame.reaction('A').y, 0.5 * 90 * 3);
    // 0 to 60 N/m over the last 2 m of the level leg, 60 to 90 N/m on the first metre of the upright one.
    close(frame.reaction('A').moment, 60 * (2 + 4 / 3) + 75 * 4);
    close(frame.moment('A B C', 4), 0, 1000);
    close(frame.solution.members[0]!.pieces.at(-1)!.end, 6);
  });
});

describe('self-weight', () => {
  it('is mass times standard gravity, times its factor', () => {
    close(raking({ weightOf: ['A B'] }).reaction('A').y, 35 * 9.80665 * 5);
    close(raking({ weightOf: ['A B'], factor: 1.1 }).reaction('A').y, 1.1 * 35 * 9.80665 * 5);
    close(raking({ weightOf: ['A B'] }).reaction('A').moment, 35 * 9.80665 * 5 * 1.5);
  });
});

describe('forces and couples on the way', () => {
  it('stand the same beside a point as on it', () => {
    const beam = (distance: number) =>
      solve({
        points: { A: [0, 0], P: [1.7, 0], B: [4, 0] },
        members: ['A P B'],
        section: { EI },
        supports: { A: pinned, B: roller },
        cases: [[{ at: { member: 'A P B', distance }, y: -800 }]],
      });
    const on = beam(1.7);
    for (const shift of [-1e-12, 1e-12]) {
      close(beam(1.7 + shift).deflection('P'), on.deflection('P'));
      expect(beam(1.7 + shift).solution.members[0]!.pieces).toHaveLength(2);
    }
    // A micrometre away it is a place of its own, and makes next to no difference.
    expect(beam(1.7 + 1e-6).solution.members[0]!.pieces).toHaveLength(3);
    expect(Math.abs(beam(1.7 + 1e-6).deflection('P') / on.deflection('P') - 1)).toBeLessThan(1e-6);
  });

  it('that are askew act along and across', () => {
    const frame = raking({ at: { member: 'A B', distance: 2.5 }, x: 50, y: -20 });
    close(frame.reaction('A').x, -50);
    close(frame.reaction('A').y, 20);
    close(frame.reaction('A').moment, 50 * 2 + 20 * 1.5);
    close(frame.along('force', 'A B').value, 50 * 0.6 - 20 * 0.8);
    expect(frame.along('force', 'A B', 'least').value).toBeCloseTo(0, 9);
  });

  it('jump in shear, axial force and moment by what acts', () => {
    const frame = raking(
      { at: { member: 'A B', distance: 2 }, x: 70 },
      { at: { member: 'A B', distance: 2 }, couple: 30 },
    );
    const [before, after] = frame.solution.members[0]!.pieces;
    const end = (p: readonly number[]) => p.reduceRight((sum, c) => sum * 2 + c, 0);
    close(after!.axialForce[0]! - end(before!.axialForce), -70 * 0.6);
    close(after!.shearForce[0]! - end(before!.shearForce), -70 * 0.8);
    close(after!.bendingMoment[0]! - end(before!.bendingMoment), -30, 300);
  });

  it('a couple at a joint turns all that is fixed to it', () => {
    const frame = solve({
      points: { A: [0, 0], B: [4, 0], C: [8, 0] },
      members: ['A B', 'B C'],
      section: { EI },
      supports: { A: fixed, B: roller, C: fixed },
      cases: [[{ at: 'B', couple: 600 }]],
    });
    close(frame.rotation('B'), 600 / ((2 * 4 * EI) / 4));
    close(frame.moment('A B', 4), 300);
    close(frame.moment('B C', 0), -300);
  });

  it('a couple on a bar is resisted by a pair of forces at its ends', () => {
    const rod = solve({
      points: { A: [0, 0], B: [2, 0] },
      bars: ['A B'],
      section: { EA },
      supports: { A: pinned, B: roller },
      cases: [[{ at: { member: 'A B', distance: 0.5 }, couple: 100 }]],
    });
    close(rod.reaction('A').y, 50);
    close(rod.reaction('B').y, -50);
    expect(rod.along('moment', 'A B').value).toBe(0);
  });
});

describe('loads on supports', () => {
  it('go straight into them', () => {
    const beam = solve({
      points: { A: [0, 0], B: [2, 0] },
      members: ['A B'],
      section: { EI, EA },
      supports: { A: fixed, B: [alongX(), alongY(), turning()] },
      cases: [
        [
          { at: 'B', x: 5, y: -7 },
          { at: 'B', couple: 3 },
        ],
      ],
    });
    expect(beam.reaction('B')).toEqual({ x: -5, y: 7, moment: -3 });
    expect(beam.along('moment', 'A B').value).toBe(0);
  });

  it('no load gives exactly nothing', () => {
    const { solution } = raking({ at: 'B', x: 0, y: 0 });
    expect([...solution.movements].every(value => value === 0)).toBe(true);
    expect(solution.reactions).toEqual([{ x: 0, y: 0, moment: 0 }]);
    expect(solution.residual).toBe(0);
  });
});
