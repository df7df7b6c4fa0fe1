// Movements by the unit load against the formulas of the handbooks. L, EI, EA, P, w as usual; down is positive here.
import { expect, test } from 'vitest';
import { movement, prepare } from '../../src/virtual-work/index.ts';
import { at, build, HELD, type Sketch } from './build.ts';

const L = 4.8;
const EI = 3.767e6;
const EA = 7.1e8;
const P = 7.3e3;
const w = 2.35e3;
const M = 5.1e3;
const k = 8.4e5;
const settlement = 0.0065;

type Direction = 'down' | 'right' | 'turn';
const DIRECTIONS = {
  down: { x: 0, y: -1, moment: 0 },
  right: { x: 1, y: 0, moment: 0 },
  turn: { x: 0, y: 0, moment: 1 },
};

/** Every case with a factor of 1. */
function check(name: string, sketch: Sketch, expected: Record<string, number>): void {
  test(name, () => {
    const structure = build(sketch);
    const forceMethod = prepare(structure)!;
    for (const [key, value] of Object.entries(expected)) {
      const [direction, ...place] = key.split(' ');
      const action = { ...DIRECTIONS[direction as Direction], at: at(structure, place.join(' ')) };
      const found = movement(
        forceMethod,
        structure.cases.map(() => 1),
        [action],
      );
      if (value === 0) expect(Math.abs(found), key).toBeLessThan(1e-15);
      else expect(found / value, key).toBeCloseTo(1, 10);
    }
  });
}

const span = { A: [0, 0], B: [L, 0] } as const;
const beam = { members: { R: { chain: 'A B', EI } }, points: span };
const simple = { ...beam, supports: { A: 'pinned', B: 'roller' } } as const;
const cantilever = { ...beam, supports: { A: 'fixed' } } as const;
const propped = { ...beam, supports: { A: 'roller', B: 'fixed' } } as const;
const fixed = { ...beam, supports: { A: 'fixed', B: 'fixed' } } as const;

check(
  'cantilever, load at the tip',
  { ...cantilever, loads: { a: [{ force: [0, -P], at: 'B' }] } },
  {
    'down B': (P * L ** 3) / (3 * EI),
    'turn B': (-P * L ** 2) / (2 * EI),
    [`down ${L / 2} R`]: (5 * P * L ** 3) / (48 * EI),
    'down A': 0,
    'turn A': 0,
  },
);

check(
  'cantilever, uniform load',
  { ...cantilever, loads: { a: [{ line: 'R', size: w }] } },
  {
    'down B': (w * L ** 4) / (8 * EI),
    'turn B R': (-w * L ** 3) / (6 * EI),
  },
);

check(
  'cantilever, couple at the tip',
  { ...cantilever, loads: { a: [{ couple: -M, at: 'B' }] } },
  {
    'down B': (M * L ** 2) / (2 * EI),
  },
);

check(
  'cantilever, triangular load towards the tip',
  { ...cantilever, loads: { a: [{ line: 'R', size: [0, w] }] } },
  {
    'down B': (11 * w * L ** 4) / (120 * EI),
    'turn B': (-w * L ** 3) / (8 * EI),
  },
);

check(
  'simple span, uniform load',
  { ...simple, loads: { a: [{ line: 'R', size: w }] } },
  {
    [`down ${L / 2} R`]: (5 * w * L ** 4) / (384 * EI),
    'turn A': (-w * L ** 3) / (24 * EI),
    'turn B': (w * L ** 3) / (24 * EI),
    'down B': 0,
  },
);

check(
  'simple span, uniform load on a part',
  { ...simple, loads: { a: [{ line: 'R', size: w, to: 1.7 }] } },
  {
    'down 1.2 R':
      ((w * 1.2) / (24 * EI * L)) * ((1.7 * (2 * L - 1.7)) ** 2 - 2 * 1.7 * 1.2 ** 2 * (2 * L - 1.7) + L * 1.2 ** 3),
  },
);

check(
  'simple span, load off the middle',
  { ...simple, loads: { a: [{ force: [0, -P], at: '1.3 R' }] } },
  {
    'down 1.3 R': (P * 1.3 ** 2 * (L - 1.3) ** 2) / (3 * EI * L),
    'turn A': (-P * 1.3 * (L - 1.3) * (2 * L - 1.3)) / (6 * EI * L),
  },
);

check(
  'simple span, couple off the middle',
  { ...simple, loads: { a: [{ couple: -M, at: '1.3 R' }] } },
  {
    'down 1.3 R': (M * 1.3 * (L - 1.3) * (L - 2.6)) / (3 * EI * L),
  },
);

check(
  'propped cantilever, uniform load',
  { ...propped, loads: { a: [{ line: 'R', size: w }] } },
  {
    [`down ${L / 2} R`]: (w * L ** 4) / (192 * EI),
    'turn A': (-w * L ** 3) / (48 * EI),
  },
);

check(
  'propped cantilever, load off the middle',
  { ...propped, loads: { a: [{ force: [0, -P], at: '1.3 R' }] } },
  {
    'down 1.3 R': (P * 1.3 ** 2 * (L - 1.3) ** 3 * (3 * L + 1.3)) / (12 * EI * L ** 3),
  },
);

check(
  'propped cantilever, the prop a spring',
  {
    ...beam,
    supports: { A: { y: k }, B: 'fixed' },
    loads: { a: [{ line: 'R', size: w }] },
  },
  {
    'down A': (3 * w * L) / 8 / (1 + (3 * EI) / (k * L ** 3)) / k,
  },
);

check(
  'propped cantilever, the prop sinks',
  { ...propped, loads: { a: [{ move: 'A', by: [0, -settlement] }] } },
  {
    'down A': settlement,
    [`down ${L / 2} R`]: (5 * settlement) / 16,
  },
);

check(
  'fixed beam, uniform load',
  { ...fixed, loads: { a: [{ line: 'R', size: w }] } },
  {
    [`down ${L / 2} R`]: (w * L ** 4) / (384 * EI),
    [`turn ${L / 2} R`]: 0,
  },
);

check(
  'fixed beam, load off the middle',
  { ...fixed, loads: { a: [{ force: [0, -P], at: '1.3 R' }] } },
  {
    'down 1.3 R': (P * 1.3 ** 3 * (L - 1.3) ** 3) / (3 * EI * L ** 3),
  },
);

check(
  'fixed beam, one end turned',
  { ...fixed, loads: { a: [{ move: 'A', by: { turn: 0.002 } }] } },
  {
    'turn A': 0.002,
    [`down ${L / 2} R`]: (-0.002 * L) / 8,
  },
);

check(
  'two spans, uniform load on one',
  {
    points: { A: [0, 0], B: [L, 0], C: [2 * L, 0] },
    members: { R: { chain: 'A B C', EI } },
    supports: { A: 'pinned', B: 'roller', C: 'roller' },
    loads: { a: [{ line: 'R', size: w, to: L }] },
  },
  {
    [`down ${L / 2} R`]: (7 * w * L ** 4) / (768 * EI),
    [`down ${1.5 * L} R`]: (-w * L ** 4) / (256 * EI),
    'turn B': (w * L ** 3) / (48 * EI),
  },
);

check(
  'two spans, the middle support sinks',
  {
    points: { A: [0, 0], B: [L, 0], C: [2 * L, 0] },
    members: { R: { chain: 'A B C', EI } },
    supports: { A: 'pinned', B: 'roller', C: 'roller' },
    loads: { a: [{ move: 'B', by: [0, -settlement] }] },
  },
  {
    'down B': settlement,
    [`down ${L / 2} R`]: (11 * settlement) / 16,
  },
);

check(
  'two spans, the middle support a spring',
  {
    points: { A: [0, 0], B: [L, 0], C: [2 * L, 0] },
    members: { R: { chain: 'A B C', EI } },
    supports: { A: 'pinned', B: { y: k }, C: 'roller' },
    loads: { a: [{ line: 'R', size: w }] },
  },
  {
    'down B': (5 * w * L) / 4 / (1 + (6 * EI) / (k * L ** 3)) / k,
  },
);

const h = 3.4;
const EIb = 2.3 * EI;
const ratio = ((EIb / EI) * h) / L;
const portal = {
  points: { A: [0, 0], B: [0, h], C: [L, h], D: [L, 0] },
  members: { P: { chain: 'A B', EI }, G: { chain: 'B C', EI: EIb }, Q: { chain: 'C D', EI } },
} as const;

check(
  'portal on pinned feet, axially stiff, load at the eaves',
  {
    ...portal,
    supports: { A: 'pinned', D: 'pinned' },
    loads: { a: [{ force: [P, 0], at: 'B' }] },
  },
  {
    'right B': (P * h ** 3 * (2 + 1 / ratio)) / (12 * EI),
    'right C': (P * h ** 3 * (2 + 1 / ratio)) / (12 * EI),
    'down B': 0,
  },
);

check(
  'portal on fixed feet, axially stiff, load at the eaves',
  {
    ...portal,
    supports: { A: 'fixed', D: 'fixed' },
    loads: { a: [{ force: [P, 0], at: 'B' }] },
  },
  {
    'right B': (P * h ** 3 * (3 * ratio + 2)) / (12 * EI * (6 * ratio + 1)),
  },
);

check(
  'bracket of a level bar and a tie',
  {
    points: { A: [0, 0], B: [0, 2], C: [2, 0] },
    bars: { b: { chain: 'A C', EA }, t: { chain: 'B C', EA } },
    supports: { A: 'pinned', B: 'pinned' },
    loads: { a: [{ force: [0, -P], at: 'C' }] },
  },
  {
    'down C': ((P * 2) / EA) * (1 + 2 * Math.SQRT2),
    'right C': (-P * 2) / EA,
  },
);

const t = 0.61;
check(
  'three bars, one of them redundant',
  {
    points: { A: [-3 * Math.tan(t), 3], B: [0, 3], C: [3 * Math.tan(t), 3], D: [0, 0] },
    bars: { a: { chain: 'A D', EA }, b: { chain: 'B D', EA }, c: { chain: 'C D', EA } },
    supports: { A: 'pinned', B: 'pinned', C: 'pinned' },
    loads: { a: [{ force: [0, -P], at: 'D' }] },
  },
  {
    'down D': (P * 3) / (EA * (1 + 2 * Math.cos(t) ** 3)),
    'right D': 0,
  },
);

check(
  'strut on an inclined roller',
  {
    points: span,
    members: { R: { chain: 'A B', EI, EA } },
    supports: { A: 'pinned', B: { angle: Math.PI / 6 } },
    loads: { a: [{ force: [P, 0], at: 'B' }] },
  },
  {
    'right B': (P * L) / EA,
    'down B': (-Math.tan(Math.PI / 6) * P * L) / EA,
  },
);

check(
  'two axially stiff spans hung from a hinge',
  {
    points: { A: [0, 0], H: [2, 0], B: [L, 0] },
    members: { R: { chain: 'A H B', EI } },
    hinges: ['H'],
    supports: { A: 'fixed', B: 'roller' },
    loads: { a: [{ force: [0, -P], at: 'H' }] },
  },
  {
    'down H': (P * 2 ** 3) / (3 * EI),
    'turn H R': (-P * 2 ** 2) / (2 * EI),
  },
);

check(
  'sprung foot',
  {
    points: { A: [0, 0], B: [0, 3.2] },
    members: { M: { chain: 'A B', EI } },
    supports: { A: { x: HELD, y: HELD, rotation: 2.8e6 } },
    loads: { a: [{ force: [P, 0], at: 'B' }] },
  },
  {
    'right B': (P * 3.2 ** 3) / (3 * EI) + (P * 3.2 ** 2) / 2.8e6,
  },
);
