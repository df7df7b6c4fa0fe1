// Portal frames without axial strain against Kleinlogel, Rigid Frame Formulas: rectangular portals, k = I_b h / (I_c L);
// and other axially stiff structures, whose thrusts only equilibrium tells.

import { describe, expect, it } from 'vitest';
import { analyse } from '../../src/mechanics/index.ts';
import { alongX, build, fixed, pinned, roller, rollerOn } from './building.ts';
import { close, solve } from './reading.ts';

const h = 3.4;
const L = 6.1;
const EIc = 5.2e6;
const EIb = 8.9e6;
const k = (EIb * h) / (EIc * L);
const P = 9200;
const w = 6500;

const portal = (foot: typeof fixed | typeof pinned, load: object) =>
  solve({
    points: { A: [0, 0], B: [0, h], C: [L, h], D: [L, 0] },
    members: ['A B', 'B C', 'C D'],
    sections: { 'A B': { EI: EIc }, 'B C': { EI: EIb }, 'C D': { EI: EIc } },
    supports: { A: foot, D: foot },
    cases: [[load as never]],
  });

describe('rectangular portals, axially stiff', () => {
  it('pinned feet, load at beam level', () => {
    const frame = portal(pinned, { at: 'B', x: P });
    close(frame.sway('B'), (P * h ** 3 * (2 + 1 / k)) / (12 * EIc));
    close(frame.sway('C'), frame.sway('B'));
    close(frame.reaction('D').y, (P * h) / L);
    close(frame.reaction('A').x, -P / 2);
    close(frame.moment('B C', 0), (P * h) / 2);
    close(frame.force('B C'), -P / 2);
    close(frame.force('A B'), (P * h) / L);
  });

  it('pinned feet, uniform load on the beam', () => {
    const frame = portal(pinned, { on: 'B C', w });
    close(frame.reaction('A').x, (w * L ** 2) / (4 * h * (2 * k + 3)));
    close(frame.moment('B C', 0), (-w * L ** 2) / (4 * (2 * k + 3)));
    expect(frame.sway('B')).toBe(0);
    close(frame.force('B C'), (-w * L ** 2) / (4 * h * (2 * k + 3)));
    close(frame.force('C D'), (-w * L) / 2);
  });

  it('fixed feet, load at beam level', () => {
    const frame = portal(fixed, { at: 'B', x: P });
    close(frame.reaction('A').moment, (((P * h) / 2) * (3 * k + 1)) / (6 * k + 1));
    close(frame.moment('B C', 0), (((P * h) / 2) * 3 * k) / (6 * k + 1));
    close(frame.reaction('D').y, (3 * P * h * k) / (L * (6 * k + 1)));
    close(frame.sway('B'), (P * h ** 3 * (3 * k + 2)) / (12 * EIc * (6 * k + 1)));
  });

  it('fixed feet, uniform load on the beam', () => {
    const frame = portal(fixed, { on: 'B C', w });
    close(frame.moment('A B', 0), (w * L ** 2) / (12 * (k + 2)), w * L ** 2);
    close(frame.moment('B C', 0), (-w * L ** 2) / (6 * (k + 2)));
    close(frame.reaction('A').x, (w * L ** 2) / (4 * h * (k + 2)));
  });
});

describe('axially stiff members', () => {
  it('agree with a very large EA as far as that is exact', () => {
    const description = (EA?: number) => ({
      points: { A: [0, 0], B: [1, 3], C: [5, 4.5], D: [9, 3], E: [9, 0] } as const,
      members: ['A B C D', 'D E'],
      section: EA === undefined ? { EI: 1e6 } : { EI: 1e6, EA },
      supports: { A: pinned, E: fixed },
      cases: [[{ on: 'A B C D', w: 1000 } as const, { at: 'C', x: 700 } as const]],
    });
    const stiff = solve(description());
    const nearly = solve(description(1e13));
    for (const name of ['B', 'C', 'D']) {
      expect(stiff.sway(name)).toBeCloseTo(nearly.sway(name), 8);
      expect(stiff.deflection(name)).toBeCloseTo(nearly.deflection(name), 8);
    }
    for (const leg of [0, 1, 2]) {
      const [a, b] = [stiff, nearly].map(({ solution }) => solution.members[0]!.pieces[leg]!.axialForce[0]!);
      expect(Math.abs(a! - b!)).toBeLessThan(1e-4 * Math.abs(b!));
    }
    expect(stiff.solution.residual).toBeLessThan(1e-12);
  });

  it('share a load along them by length where both ends are held', () => {
    const a = 1.3;
    const beam = solve({
      points: { A: [0, 0], B: [a, 0], C: [4, 0] },
      members: ['A B C'],
      supports: { A: pinned, C: pinned },
      cases: [[{ at: 'B', x: 900 }]],
    });
    close(beam.reaction('A').x, (-900 * (4 - a)) / 4);
    close(beam.reaction('C').x, (-900 * a) / 4);
  });

  it('have no thrust from loads across them', () => {
    const beam = solve({
      points: { A: [0, 0], B: [4, 0] },
      members: ['A B'],
      supports: { A: fixed, B: fixed },
      cases: [[{ on: 'A B', w: 1000 }]],
    });
    expect(beam.along('force', 'A B').value).toBe(0);
    expect(beam.reaction('A').x).toBe(0);
  });

  it('share a thrust among parallel load paths as equal EA would', () => {
    // A bar of 2 m and, beside it, one of 4 m with a corner pulled straight: forces as 1/L.
    const rods = (section: { EA?: number }) =>
      solve({
        points: { A: [0, 0], B: [-2, 0], C: [4, 0] },
        bars: ['A B', 'A C'],
        section,
        supports: { B: pinned, C: pinned, A: roller },
        cases: [[{ at: 'A', x: 600 }]],
      });
    close(rods({}).force('A B'), 400);
    close(rods({}).force('A C'), -200);
    close(rods({ EA: 5 }).force('A B'), 400);
  });

  it('tie the movements of a closed triangle into those of a rigid body', () => {
    const frame = solve({
      points: { A: [0, 0], B: [3, 0], C: [1, 2], D: [4.2, 1.1] },
      members: ['A B', 'B C', 'C A', 'C D'],
      section: { EI: 1000 },
      supports: { A: pinned, B: [{ freedom: { kind: 'movement', x: 0, y: 1 }, stiffness: 500 }] },
      cases: [[{ at: 'D', y: -10 }]],
    });
    // Turning about A brings B down by 10 × 4.2 / 3 / 500, and C by a third of it.
    const down = (10 * 4.2) / 3 / 500;
    close(frame.deflection('B'), down);
    close(frame.deflection('C'), down / 3);
    close(frame.sway('C'), (down / 3) * 2);
  });

  it('follow imposed movements along them', () => {
    const frame = solve({
      points: { A: [0, 0], B: [0, 3], C: [5, 3] },
      members: ['A B', 'B C'],
      supports: { A: pinned, C: roller },
      cases: [[{ move: 'A', y: -0.01 }]],
    });
    close(frame.deflection('B'), 0.01);
    close(frame.along('force', 'A B').value, 0, 1);
  });

  it('stand on inclined rollers', () => {
    // A three-hinged pair: A on a surface at 40°, held along its normal, and C pinned.
    const angle = (40 * Math.PI) / 180;
    const frame = solve({
      points: { A: [0, 0], B: [3, 4], C: [6, 0] },
      members: ['A B C'],
      supports: { A: rollerOn(angle), C: pinned },
      cases: [[{ at: 'B', y: -1000 }]],
    });
    const { x, y } = frame.reaction('A');
    close(x * Math.cos(angle) + y * Math.sin(angle), 0, 1000);
    // Turning about C: the normal reaction N at (0, 0) has the lever 6 cos 40°.
    close(Math.hypot(x, y), (1000 * 3) / (6 * Math.cos(angle)));
    expect(frame.solution.residual).toBeLessThan(1e-12);
  });

  it('cannot follow a movement that would lengthen them', () => {
    const analysis = analyse(
      build({
        points: { A: [0, 0], B: [2, 0], C: [5, 0] },
        members: ['A B', 'B C'],
        supports: { A: pinned, C: pinned, B: roller },
        cases: [[{ on: 'A B', w: 10 }], [{ move: 'C', x: 0.003 }]],
      }),
    );
    expect(analysis.cases).toEqual([]);
    expect(analysis.conflict).toEqual({ case: 1, member: 1, amount: expect.closeTo(0.003, 12) });
    const moved = build({
      points: { A: [0, 0], B: [2, 0] },
      members: ['A B'],
      supports: { A: pinned, B: [alongX()].concat(roller) },
      cases: [
        [
          { move: 'A', x: 0.01 },
          { move: 'B', x: 0.01 },
        ],
      ],
    });
    expect(analyse(moved).conflict).toBeUndefined();
  });

  it('are given up where they tie too many movements together', () => {
    // A zigzag: each leg makes the movements of all before it follow.
    const points: Record<string, readonly [number, number]> = {};
    for (let k = 0; k <= 1500; k++) points[`P${k}`] = [k, k % 2];
    const chain = Object.keys(points).join(' ');
    const analysis = analyse(build({ points, members: [chain], supports: { P0: fixed }, cases: [] }));
    expect(analysis.tooLarge).toBe('axially-stiff');
  });
});
