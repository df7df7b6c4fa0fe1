// The second road as notes take it: in reach by one way or the other, and honest about rounding.
import { expect, test } from 'vitest';
import { analyse } from '../../src/mechanics/analyse.ts';
import type { Structure } from '../../src/model/structure.ts';
import { type InternalForces, SecondRoad } from '../../src/virtual-work/index.ts';
import { at, build } from './build.ts';
import { frame, girder } from './large.ts';

const never = () => {
  throw new Error('the force method needs no given forces');
};

test.each<[string, Structure, string]>([
  ['frame of 5 bays and 5 storeys', frame(5, 5, { posts: 3e6, beams: 6e6, EA: 7e8 }, 'fixed'), '0/5'],
  ['the same, axially stiff', frame(5, 5, { posts: 3e6, beams: 6e6 }, 'fixed'), '0/5'],
  [
    'frame of 10 bays and 10 storeys on pinned feet',
    frame(10, 10, { posts: 3e6, beams: 6e6, EA: 7e8 }, 'pinned'),
    '0/10',
  ],
  ['tower of 60 storeys', frame(1, 60, { posts: 3e6, beams: 6e6, EA: 7e8 }, 'fixed'), '0/60'],
  ['girder of 24 panels', girder(24, false), 'L12'],
  ['girder of 120 crossed panels', girder(120, true), 'L60'],
])('%s: by the force method', (_, structure, name) => {
  const point = structure.points.findIndex(candidate => candidate.name === name);
  const [x, y] = analyse(structure).cases[0]!.movements.subarray(3 * point, 3 * point + 2);
  const action = { at: { kind: 'point', point } as const, x: 0.6, y: -0.8, moment: 0 };
  const found = new SecondRoad(structure).movement([1], never, [action])!;
  expect(found.value / (0.6 * x! - 0.8 * y!)).toBeCloseTo(1, 10);
});

// 2,976 freedoms and 2,883 redundants.
test.each([7e8, undefined])('a frame past the force method, EA %s: from the forces of the first road', EA => {
  const stiffness = EA === undefined ? { posts: 3e6, beams: 6e6 } : { posts: 3e6, beams: 6e6, EA };
  const structure = frame(31, 31, stiffness, 'fixed');
  const [solution] = analyse(structure).cases;
  const road = new SecondRoad(structure);
  expect(road.forceMethod).toBeUndefined();
  const point = structure.points.findIndex(({ name }) => name === '0/31');
  const sway = [{ at: { kind: 'point', point } as const, x: 1, y: 0, moment: 0 }];
  const found = road.movement([1], () => solution!, sway)!;
  expect(found.value / solution!.movements[3 * point]!).toBeCloseTo(1, 11);
  expect(found.gap).toBeLessThan(1e-11);

  // One member's moment a thousandth off: nothing fits together any more.
  const wrong: InternalForces = {
    members: solution!.members.with(40, {
      pieces: solution!.members[40]!.pieces.map(piece => ({
        ...piece,
        bendingMoment: piece.bendingMoment.map(c => 1.001 * c),
      })),
    }),
  };
  expect(road.movement([1], () => wrong, sway)!.gap).toBeGreaterThan(1e-8);
});

test('a mechanism has no second road', () => {
  const structure = build({
    points: { A: [0, 0], B: [4, 0] },
    members: { R: { chain: 'A B', EI: 1e6 } },
    supports: { A: 'pinned' },
    loads: { all: [] },
  });
  expect(new SecondRoad(structure).movement([1], never, [])).toBeUndefined();
});

test('what should not move at all stays below the rounding', () => {
  // A load along axially stiff members, straight into the ground: what bends them is rounding.
  const structure = build({
    points: { A: [0, 0], B: [0.94, 2.74], C: [3, 3.2], D: [4.4, 1.7] },
    members: { P: { chain: 'A B', EI: 6e6 }, Q: { chain: 'B C', EI: 6e6 }, R: { chain: 'C D', EI: 6e6 } },
    supports: { A: 'fixed', C: 'fixed', D: 'fixed' },
    loads: { all: [{ line: 'P', size: [3e3, 1e3], from: 0.3, to: 1.7, direction: { kind: 'along', sense: 1 } }] },
  });
  const road = new SecondRoad(structure);
  const [solution] = analyse(structure).cases;
  for (const action of [
    { x: 1, y: 0, moment: 0 },
    { x: 0, y: 1, moment: 0 },
    { x: 0, y: 0, moment: 1 },
  ]) {
    const { value, rounding } = road.movement([1], never, [{ at: at(structure, '1 Q'), ...action }])!;
    expect(Math.abs(value)).toBeLessThanOrEqual(rounding);
    expect(rounding).toBeLessThan(1e-13);
  }
  for (const movement of solution!.movements) expect(Math.abs(movement)).toBeLessThan(1e-13);
});
