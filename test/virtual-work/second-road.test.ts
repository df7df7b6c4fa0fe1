// The second road as notes take it: in reach by one way or the other, and honest about rounding.
import { expect, test } from 'vitest';
import { analyse } from '../../src/mechanics/analyse.ts';
import type { Structure } from '../../src/model/structure.ts';
import { type InternalForces, SecondRoad } from '../../src/virtual-work/index.ts';
import { at, build, type Sketch } from './build.ts';

const never = () => {
  throw new Error('the force method needs no given forces');
};

/** 31 bays and 31 storeys: 2,976 freedoms, 2,883 redundants. */
function largeFrame(EA: number | undefined): Structure {
  const axial = EA === undefined ? {} : { EA };
  const sketch: Sketch = { points: {}, members: {}, supports: {} };
  for (let bay = 0; bay < 32; bay++) {
    sketch.supports[`${bay}/0`] = 'fixed';
    for (let storey = 0; storey < 32; storey++) {
      sketch.points[`${bay}/${storey}`] = [5 * bay, 3.2 * storey];
      if (storey === 0) continue;
      sketch.members![`C${bay}/${storey}`] = { chain: `${bay}/${storey - 1} ${bay}/${storey}`, EI: 3e6, ...axial };
      if (bay === 0) continue;
      sketch.members![`B${bay}/${storey}`] = { chain: `${bay - 1}/${storey} ${bay}/${storey}`, EI: 6e6, ...axial };
    }
  }
  const wind = Array.from({ length: 31 }, (_, storey) => ({ force: [9e3, 0] as const, at: `0/${storey + 1}` }));
  return build({ ...sketch, loads: { wind: [...wind, { line: 'B3/7', size: 4e3 }] } });
}

test.each([7e8, undefined])('a frame past the force method, EA %s: from the forces of the first road', EA => {
  const structure = largeFrame(EA);
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
