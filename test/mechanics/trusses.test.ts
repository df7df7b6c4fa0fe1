// Pin-jointed bars: unit-load formulas Σ F f L / EA as in textbooks on statics.

import { describe, expect, it } from 'vitest';
import { analyse } from '../../src/mechanics/index.ts';
import { build, fixed, pinned, roller } from './building.ts';
import { close, solve } from './reading.ts';

const EA = 4.1e6;
const P = 12e3;
const section = { EA };

describe('bars', () => {
  it('two that lean together', () => {
    const rise = 1.5;
    const half = 2.2;
    const length = Math.hypot(rise, half);
    const truss = solve({
      points: { A: [-half, 0], B: [half, 0], C: [0, rise] },
      bars: ['A C', 'C B'],
      section,
      supports: { A: pinned, B: pinned },
      cases: [[{ at: 'C', y: -P }]],
    });
    close(truss.deflection('C'), (P * length) / (2 * EA * (rise / length) ** 2));
    close(truss.force('A C'), -P / (2 * (rise / length)));
    expect(truss.along('moment', 'A C').value).toBe(0);
  });

  it('a wall bracket', () => {
    const a = 1.7;
    const truss = solve({
      points: { A: [0, 0], B: [0, a], C: [a, 0] },
      bars: ['A C', 'B C'],
      section,
      supports: { A: pinned, B: pinned },
      cases: [[{ at: 'C', y: -P }]],
    });
    close(truss.deflection('C'), ((P * a) / EA) * (1 + 2 * Math.SQRT2));
    close(truss.sway('C'), (-P * a) / EA);
  });

  it('three at one point, redundant', () => {
    const length = 2;
    const t = 0.6;
    const x = length * Math.tan(t);
    const description = {
      points: { A: [-x, 0], B: [0, 0], C: [x, 0], D: [0, -length] } as const,
      bars: ['A D', 'B D', 'C D'],
      section,
      supports: { A: pinned, B: pinned, C: pinned },
      cases: [[{ at: 'D', y: -P } as const]],
    };
    const truss = solve(description);
    close(truss.deflection('D'), (P * length) / (EA * (1 + 2 * Math.cos(t) ** 3)));
    expect(analyse(build(description)).redundancy).toBe(1);
  });

  it('a king post', () => {
    const a = 3;
    const h = 1.4;
    const rafter = Math.hypot(a, h);
    const truss = solve({
      points: { A: [0, 0], B: [a, 0], C: [2 * a, 0], D: [a, h] },
      bars: ['A B', 'B C', 'A D', 'D C', 'B D'],
      section,
      supports: { A: pinned, C: roller },
      cases: [[{ at: 'B', y: -P }]],
    });
    const expected = (P / EA) * (a ** 3 / (2 * h ** 2) + rafter ** 3 / (2 * h ** 2) + h);
    close(truss.deflection('B'), expected);
  });

  it('carry their weight half to each end, and turn with their chord', () => {
    const truss = solve({
      points: { A: [0, 0], B: [3, 4], C: [6, 0] },
      bars: ['A B', 'B C'],
      section: { EA, mass: 20 },
      supports: { A: pinned, C: pinned },
      cases: [[{ weightOf: ['A B', 'B C'] }]],
    });
    const weight = 20 * 9.80665 * 5;
    close(truss.force('A B'), -weight / 2 / 0.8);
    close(truss.reaction('A').y, weight);
    const shortening = (((weight / 2 / 0.8) * 5) / EA) * 1;
    close(truss.deflection('B'), shortening / 0.8);
    close(truss.along('rotation', 'A B').value, (-truss.deflection('B') * 3) / 25);
  });

  it('can be stressed along, and are not bent by a hinge', () => {
    const rod = solve({
      points: { A: [0, 0], B: [0, -5] },
      bars: ['A B'],
      section,
      hinges: ['A'],
      supports: { A: fixed, B: [{ freedom: { kind: 'movement', x: 1, y: 0 }, stiffness: Number.POSITIVE_INFINITY }] },
      cases: [[{ on: 'A B', w: 100 }]],
    });
    close(rod.deflection('B'), (100 * 5 ** 2) / (2 * EA));
    close(rod.along('force', 'A B').value, 500);
    close(rod.along('force', 'A B', 'least').value, 0, 500);
  });
});
