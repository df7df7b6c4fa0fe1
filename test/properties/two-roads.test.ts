// The two roads to a movement: the displacement method and the unit load on the force method.
import fc from 'fast-check';
import { expect } from 'vitest';
import { fieldAt, movementAt } from '../../src/mechanics/field.ts';
import { measure } from '../../src/mechanics/measure.ts';
import { combine } from '../../src/mechanics/superposition.ts';
import type { UnitAction } from '../../src/model/question.ts';
import {
  givenForces,
  internalForces,
  largestGap,
  movementFromForces,
  movementOf,
  prepare,
  SecondRoad,
  virtualSystem,
  withLeastThrusts,
} from '../../src/virtual-work/index.ts';
import { expectNear, expectSame, largest, read, scalesOf } from './readings.ts';
import { allowed, analysed, holds } from './run.ts';
import { structures } from './structures.ts';

/** Case by case: one factor of 1. */
const only = (index: number) => [0, 0, 0].with(index, 1);

holds('points and places along members move alike on both', structures(), structure => {
  const analysis = analysed(structure);
  const forceMethod = prepare(structure)!;
  const tolerance = allowed(analysis, 1e-11);
  for (const [index, solution] of analysis.cases.entries()) {
    const scale = scalesOf(structure, read(structure, solution));
    const check = (value: number, size: number, at: UnitAction['at'], action: Partial<UnitAction>, name: string) => {
      const virtual = virtualSystem(forceMethod.primary, [{ at, x: 0, y: 0, moment: 0, ...action }]);
      const { value: other, rounding } = movementOf(forceMethod, only(index), virtual);
      expectNear(value, other, Math.max(rounding, tolerance * size), name);
    };
    for (const [point, { name }] of structure.points.entries()) {
      const at = { kind: 'point', point } as const;
      const [x, y, turn] = solution.movements.subarray(3 * point, 3 * point + 3);
      check(x!, scale.movement, at, { x: 1 }, `x of ${name}`);
      check(y!, scale.movement, at, { y: 1 }, `y of ${name}`);
      check(turn!, scale.rotation, at, { moment: 1 }, `turn of ${name}`);
    }
    for (const [member, { name, length, legs }] of structure.members.entries()) {
      for (const part of [0.17, 0.5, 0.83]) {
        const at = { kind: 'along', member, distance: part * length } as const;
        const field = solution.members[member]!;
        const { x, y } = movementAt(field, legs, at.distance);
        check(x, scale.movement, at, { x: 1 }, `x at ${part} of ${name}`);
        check(y, scale.movement, at, { y: 1 }, `y at ${part} of ${name}`);
        for (const side of ['before', 'after'] as const) {
          const turn = fieldAt(field, at.distance, side).rotation;
          check(turn, scale.rotation, at, { moment: 1, side }, `turn ${side} ${part} of ${name}`);
        }
      }
    }
  }
});

holds('every solution balances, and its work is that of its forces (Clapeyron)', structures(), structure => {
  const analysis = analysed(structure);
  const secondRoad = new SecondRoad(structure);
  const tolerance = allowed(analysis, 1e-11);
  const check = (factors: readonly number[]) => {
    const { equilibrium, energy } = secondRoad.balance(factors, combine(analysis, factors));
    expect(equilibrium).toBeLessThanOrEqual(tolerance);
    expect(energy).toBeLessThanOrEqual(tolerance);
  };
  for (const index of structure.cases.keys()) check(only(index));
  check([1.35, -0.9, 1.5]);
});

const powers = fc.array(fc.integer({ min: -6, max: 6 }), { minLength: 1, maxLength: 9 });

holds('stiff and soft together, up to 1e12 apart', fc.tuple(structures(), powers), ([plain, exponents]) => {
  const scaled = (value: number | undefined, index: number) =>
    value === undefined ? undefined : value * 10 ** exponents[index % exponents.length]!;
  const sections = plain.sections.map((section, index) => ({
    ...section,
    bendingStiffness: scaled(section.bendingStiffness, 2 * index),
    axialStiffness: scaled(section.axialStiffness, 2 * index + 1),
  }));
  const structure = { ...plain, sections };
  const analysis = analysed(structure);
  const forceMethod = prepare(structure)!;
  const tolerance = Math.min(allowed(analysis, 1e-11), 1e-3);
  for (const [index, solution] of analysis.cases.entries()) {
    // Past what the first road can solve, its residual says so, and the answer is withheld.
    if (solution.residual > 1e-9) continue;
    const { movement } = scalesOf(structure, read(structure, solution));
    for (const [point, { name }] of structure.points.entries()) {
      const virtual = virtualSystem(forceMethod.primary, [
        { at: { kind: 'point', point }, x: 0.6, y: -0.8, moment: 0 },
      ]);
      const { value, rounding } = movementOf(forceMethod, only(index), virtual);
      const [x, y] = solution.movements.subarray(3 * point, 3 * point + 2);
      expectNear(0.6 * x! - 0.8 * y!, value, Math.max(rounding, tolerance * movement), name);
    }
  }
});

holds('the largest sag is the movement of its place against the chord', structures(), structure => {
  const analysis = analysed(structure);
  const forceMethod = prepare(structure)!;
  for (const [index, solution] of analysis.cases.entries()) {
    const scale = scalesOf(structure, read(structure, solution));
    for (const [member, { legs, length }] of structure.members.entries()) {
      if (legs.length > 1) continue;
      const { value, place } = measure(structure, solution, { kind: 'sag', along: [member], reversed: false }, 'size');
      const part = place!.distance / length;
      // Towards the underside, which is to the right of the travel.
      const [x, y] = [legs[0]!.sine, -legs[0]!.cosine];
      const action = (distance: number, size: number) => ({
        at: { kind: 'along', member, distance } as const,
        x: size * x,
        y: size * y,
        moment: 0,
      });
      const actions = [action(place!.distance, 1), action(0, part - 1), action(length, -part)];
      const other = movementOf(forceMethod, only(index), virtualSystem(forceMethod.primary, actions));
      expectNear(value, other.value, Math.max(other.rounding, allowed(analysis, 1e-11) * scale.movement));
    }
  }
});

holds('both find the same forces in members, those of axially stiff ones included', structures(), structure => {
  const analysis = analysed(structure);
  const forceMethod = prepare(structure)!;
  const { statics } = forceMethod.primary;
  for (const [index, solution] of analysis.cases.entries()) {
    const state = withLeastThrusts(statics, forceMethod.case(index).final, forceMethod.undeterminedStates);
    const { members } = internalForces(statics, state);
    const found = read(structure, {
      ...solution,
      members: solution.members.map((field, m) => ({
        pieces: members[m]!.pieces.map(piece => ({
          ...field.pieces[0]!,
          ...piece,
          shearForce: piece.bendingMoment.slice(1).map((coefficient, power) => (power + 1) * coefficient),
        })),
      })),
    });
    const wanted = read(structure, solution);
    const { along, across, rotation } = wanted;
    expectSame(structure, { ...found, along, across, rotation }, wanted, allowed(analysis, 1e-9));
  }
});

holds('from the forces of the first road, the second finds its movements, and no gap', structures(), structure => {
  const analysis = analysed(structure);
  const forceMethod = prepare(structure)!;
  const { primary } = forceMethod;
  for (const [index, solution] of analysis.cases.entries()) {
    const scale = scalesOf(structure, read(structure, solution));
    const given = givenForces(primary, only(index), solution);
    for (const point of structure.points.keys()) {
      const [x, y] = solution.movements.subarray(3 * point, 3 * point + 2);
      const at = { kind: 'point', point } as const;
      const tolerance = allowed(analysis, 1e-9) * scale.movement;
      expectNear(x!, movementFromForces(primary, given, [{ at, x: 1, y: 0, moment: 0 }]).value, tolerance);
      expectNear(y!, movementFromForces(primary, given, [{ at, x: 0, y: 1, moment: 0 }]).value, tolerance);
    }
    // Where nothing moves (forces that run straight into a support), a gap of nothing has no size to compare with.
    const moves = largest([...solution.movements]) > 1e-6 * scale.movement;
    if (moves) expect(largestGap(primary, given)).toBeLessThanOrEqual(allowed(analysis, 1e-9));
  }
});

holds('both count the same redundants', structures(), structure => {
  const { elimination } = prepare(structure)!.primary;
  // Springs at one point in one direction are one to the second road; the random structures have no such.
  expect(elimination.redundants.length).toBe(analysed(structure).redundancy);
});
