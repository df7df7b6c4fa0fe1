// Supports: springs, inclined and askew directions, settlements of each kind, hinges at supports.

import { describe, expect, it } from 'vitest';
import { analyse, combine, imposedPart, loadPart } from '../../src/mechanics/index.ts';
import { alongX, alongY, build, fixed, pinned, roller, rollerOn, turning } from './building.ts';
import { close, solve } from './reading.ts';

const L = 3.7;
const EI = 2.3e6;
const w = 4100;
const section = { EI };

describe('springs', () => {
  it('under the prop of a propped cantilever', () => {
    const k = 8e5;
    const beam = solve({
      points: { A: [0, 0], B: [L, 0] },
      members: ['A B'],
      section,
      supports: { A: [alongY(k)], B: fixed },
      cases: [[{ on: 'A B', w }]],
    });
    const R = (3 * w * L) / 8 / (1 + (3 * EI) / (k * L ** 3));
    close(beam.reaction('A').y, R);
    close(beam.deflection('A'), R / k);
  });

  it('under the middle of two spans', () => {
    const k = 6e5;
    const beam = solve({
      points: { A: [0, 0], B: [L, 0], C: [2 * L, 0] },
      members: ['A B C'],
      section,
      supports: { A: pinned, B: [alongY(k)], C: roller },
      cases: [[{ on: 'A B C', w }]],
    });
    close(beam.reaction('B').y, (5 * w * L) / 4 / (1 + (6 * EI) / (k * L ** 3)));
  });

  it('against turning, between pinned and fixed', () => {
    const k = 7e5;
    const beam = solve({
      points: { A: [0, 0], B: [L, 0] },
      members: ['A B'],
      section,
      supports: { A: [alongX(), alongY(), turning(k)] },
      cases: [[{ at: 'B', y: -900 }]],
    });
    close(beam.rotation('A'), (-900 * L) / k);
    close(beam.deflection('B'), (900 * L ** 3) / (3 * EI) + (900 * L * L) / k);
    close(beam.reaction('A').moment, 900 * L);
  });

  it('whose ground end moves', () => {
    const k = 5e5;
    const beam = solve({
      points: { A: [0, 0], B: [L, 0] },
      members: ['A B'],
      section,
      supports: { A: [alongY(k)], B: fixed },
      cases: [[{ move: 'A', y: -0.02 }]],
    });
    // Spring and beam in a row share the movement.
    const beamStiffness = (3 * EI) / L ** 3;
    close(beam.reaction('A').y, -0.02 / (1 / k + 1 / beamStiffness));
    close(beam.deflection('A'), 0.02 / (1 + beamStiffness / k));
  });

  it('at a roller on a slope, along it only', () => {
    const angle = 0.5;
    const k = 3e4;
    // A rigid bar along the slope would do; a short column of two bars keeps it plain: only the spring holds it along.
    const truss = solve({
      points: { A: [0, 0], B: [2, 0], C: [1, 1] },
      members: ['A B', 'B C', 'C A'],
      section: { EI: 1e9, EA: 1e12 },
      supports: {
        A: [...rollerOn(angle), alongX(k)],
        B: rollerOn(angle),
      },
      cases: [[{ at: 'C', y: -1000 }]],
    });
    // Down the slope: weight × sin; the spring resists with k cos² along the slope.
    const slide = (1000 * Math.sin(angle)) / (k * Math.cos(angle) ** 2);
    expect(truss.sway('A')).toBeCloseTo(-slide * Math.cos(angle), 6);
    close(truss.reaction('A').y + truss.reaction('B').y, 1000);
    close(truss.reaction('A').x + truss.reaction('B').x, 0, 1000);
  });
});

describe('held directions', () => {
  it('two that lie askew hold both', () => {
    const beam = solve({
      points: { A: [0, 0], B: [L, 0] },
      members: ['A B'],
      section: { EI, EA: 1e8 },
      supports: { A: [...rollerOn(0.3), ...rollerOn(-0.2)], B: roller },
      cases: [[{ at: { member: 'A B', distance: 1 }, y: -500, x: 200 }]],
    });
    close(beam.reaction('A').x, -200);
    close(beam.reaction('A').y, (500 * (L - 1)) / L);
    expect(beam.sway('A')).toBe(0);
  });

  it('one that is said twice holds once', () => {
    const structure = build({
      points: { A: [0, 0], B: [L, 0] },
      members: ['A B'],
      supports: { A: [...pinned, alongX()], B: roller },
    });
    expect(analyse(structure).redundancy).toBe(0);
  });

  it('imposed movement of a roller on a slope is that along its normal', () => {
    const angle = 0.4;
    const frame = solve({
      points: { A: [0, 0], B: [L, 0] },
      members: ['A B'],
      section: { EI, EA: 1e7 },
      supports: { A: pinned, B: rollerOn(angle) },
      cases: [[{ move: 'B', y: -0.01 }]],
    });
    // Determinate: no force; B keeps its distance from A, so it moves down only, by 0.01 cos / cos.
    close(frame.deflection('B'), 0.01);
    close(frame.sway('B'), 0, 0.01);
    expect(frame.along('moment', 'A B').value).toBe(0);
  });
});

describe('settlements', () => {
  const floor = build({
    points: { A: [0, 0], B: [L, 0], C: [2 * L, 0] },
    members: ['A B C'],
    section,
    supports: { A: pinned, B: roller, C: roller },
    cases: [
      [
        { on: 'A B C', w },
        { move: 'B', y: -0.006 },
      ],
      [{ at: 'B', y: -800 }],
    ],
  });

  it('are told apart from forces', () => {
    const analysis = analyse(floor);
    const factors = [1.2, 0.5];
    const whole = combine(analysis, factors);
    const loads = loadPart(analysis, factors);
    const imposed = imposedPart(analysis, factors);
    close(imposed.reactions[1]!.y, (1.2 * (-6 * EI * 0.006)) / L ** 3);
    close(imposed.movements[3 + 1]!, -1.2 * 0.006);
    close(loads.reactions[1]!.y, (1.2 * 5 * w * L) / 4 + 0.5 * 800);
    close(whole.reactions[1]!.y, loads.reactions[1]!.y + imposed.reactions[1]!.y);
    expect(analysis.parts[1]).toBeUndefined();
    close(imposedPart(analysis, [0, 1]).reactions[0]!.y, 0, 1);
  });

  it('of a determinate structure move it without force', () => {
    const frame = solve({
      points: { A: [0, 0], B: [0, 3], C: [4, 3] },
      members: ['A B', 'B C'],
      section: { EI: 1e6, EA: 1e8 },
      supports: { A: pinned, C: roller },
      cases: [[{ move: 'C', y: -0.02 }]],
    });
    close(frame.deflection('C'), 0.02);
    close(frame.sway('B'), (0.02 / 4) * 3);
    for (const chain of ['A B', 'B C']) {
      expect(Math.abs(frame.along('moment', chain).value)).toBeLessThan(1e-10 * ((1e6 * 0.02) / 16));
    }
  });

  it('of a sprung and a held direction at one point', () => {
    const beam = solve({
      points: { A: [0, 0], B: [L, 0] },
      members: ['A B'],
      section: { EI, EA: 1e7 },
      supports: { A: fixed, B: [alongX(), alongY(4e5)] },
      cases: [[{ move: 'B', x: 0.002, y: -0.01 }]],
    });
    close(beam.reaction('B').x, (1e7 * 0.002) / L);
    close(beam.reaction('B').y, -0.01 / (1 / 4e5 + L ** 3 / (3 * EI)));
  });
});

describe('hinges', () => {
  it('at a fixed support make it a pin for the member', () => {
    const beam = solve({
      points: { A: [0, 0], B: [L, 0] },
      members: ['A B'],
      section,
      hinges: ['A'],
      supports: { A: fixed, B: fixed },
      cases: [[{ on: 'A B', w }]],
    });
    close(beam.reaction('A').y, (3 * w * L) / 8);
    close(beam.reaction('A').moment, 0, w);
    // Its end turns, though the joint does not.
    close(beam.rotation('A'), (-w * L ** 3) / (48 * EI));
  });

  it('within a member split its moment', () => {
    const a = 1.4;
    const beam = solve({
      points: { A: [0, 0], H: [a, 0], B: [L, 0] },
      members: ['A H B'],
      section,
      hinges: ['H in A H B'],
      supports: { A: fixed, B: roller },
      cases: [[{ on: 'A H B', w }]],
    });
    const R = (w * (L - a)) / 2;
    close(beam.reaction('B').y, R);
    close(beam.moment('A H B', 0), -R * a - (w * a ** 2) / 2);
    expect(beam.moment('A H B', a)).toBe(0);
  });

  it('free one member of three, the others run on', () => {
    const structure = {
      points: { A: [0, 0], B: [0, 3], C: [4, 3], D: [0, 6] },
      members: ['A B D', 'B C'],
      section: { EI, EA: 1e8 },
      hinges: ['B in B C'],
      supports: { A: fixed, C: roller },
      cases: [[{ at: 'D', x: 300 }]],
    } as const;
    const frame = solve(structure);
    expect(frame.moment('B C', 0)).toBe(0);
    // Tension on the left of a member that goes up, its upper side.
    close(frame.moment('A B D', 3), -300 * 3);
    expect(analyse(build(structure)).redundancy).toBe(0);
  });

  it('take a couple on the member that is named', () => {
    const beam = solve({
      points: { A: [0, 0], B: [L, 0], C: [2 * L, 0] },
      members: ['A B', 'B C'],
      section,
      hinges: ['B'],
      supports: { A: fixed, B: roller, C: roller },
      cases: [[{ at: 'B in B C', couple: 500 }]],
    });
    close(beam.moment('B C', 0), -500);
    expect(beam.moment('A B', L)).toBe(0);
    close(beam.reaction('C').y, -500 / L);
  });
});
