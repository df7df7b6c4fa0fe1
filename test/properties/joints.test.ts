// What holds of every structure holds with releases, connections and shear deformation as well.
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { analyse } from '../../src/mechanics/analyse.ts';
import { fieldAt } from '../../src/mechanics/field.ts';
import type { UnitAction } from '../../src/model/question.ts';
import type { Structure } from '../../src/model/structure.ts';
import {
  givenForces,
  internalForces,
  largestGap,
  movementFromForces,
  movementOf,
  prepare,
  virtualSystem,
  withLeastThrusts,
} from '../../src/virtual-work/index.ts';
import { jointedStructures, loosenedStructures } from './joints.ts';
import { explicit, mirrored, rotated } from './motions.ts';
import { expectNear, expectSame, largest, leverOf, type Reading, read, scalesOf, times } from './readings.ts';
import { allowed, analysed, holds, RUNS, SEED } from './run.ts';
import { inUnits, reversed, subdivided } from './transform.ts';

test('of every kind', () => {
  const sample = fc.sample(jointedStructures(), { seed: SEED, numRuns: RUNS });
  const legs = sample.flatMap(({ members }) => members.flatMap(member => member.legs));
  const ends = legs.flatMap(({ startAttachment, endAttachment }) => [startAttachment, endAttachment]);
  for (const count of [
    ends.filter(end => end?.freed.includes('axial')).length,
    ends.filter(end => end?.freed.includes('shear')).length,
    ends.filter(end => end?.turning !== undefined).length,
    sample.filter(({ sections }) => sections.some(section => section.shearStiffness !== undefined)).length,
  ]) {
    expect(count).toBeGreaterThan(100);
  }
});

holds('what comes loose is found, and something is told of it', loosenedStructures(), structure => {
  const { stability } = analyse(structure);
  expect(stability.stable).toBe(false);
  expect(stability.mechanisms.length).toBeGreaterThan(0);
  for (const { points, turning, members } of stability.mechanisms) {
    expect(points.length + turning.length + members.length).toBeGreaterThan(0);
  }
});

const only = (index: number) => [0, 0, 0].with(index, 1);

holds('stable, with as many redundants on both roads', jointedStructures(), structure => {
  const { stability, redundancy } = analysed(structure);
  expect(stability.mechanisms).toEqual([]);
  expect(prepare(structure)!.primary.elimination.redundants.length).toBe(redundancy);
});

holds('both roads move joints, ends of members and places alike', jointedStructures(), structure => {
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
      for (const part of [0, 0.17, 0.5, 0.83, 1]) {
        const distance = part * length;
        const at = { kind: 'along', member, distance } as const;
        for (const side of ['before', 'after'] as const) {
          const field = fieldAt(solution.members[member]!, distance, side);
          const { cosine, sine } = legs[field.leg]!;
          const x = cosine * field.axialMovement - sine * field.transverseMovement;
          const y = sine * field.axialMovement + cosine * field.transverseMovement;
          check(x, scale.movement, at, { x: 1, side }, `x ${side} ${part} of ${name}`);
          check(y, scale.movement, at, { y: 1, side }, `y ${side} ${part} of ${name}`);
          check(field.rotation, scale.rotation, at, { moment: 1, side }, `turn ${side} ${part} of ${name}`);
        }
      }
    }
  }
});

holds('both roads find the same forces, nil where they are freed', jointedStructures(), structure => {
  const analysis = analysed(structure);
  const forceMethod = prepare(structure)!;
  const { statics } = forceMethod.primary;
  for (const [index, solution] of analysis.cases.entries()) {
    const state = withLeastThrusts(statics, forceMethod.case(index).final, forceMethod.undeterminedStates);
    const { members } = internalForces(statics, state);
    const wanted = read(structure, solution);
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
    const { along, across, rotation } = wanted;
    expectSame(structure, { ...found, along, across, rotation }, wanted, allowed(analysis, 1e-9));
    const { force } = scalesOf(structure, wanted);
    for (const [m, { legs }] of structure.members.entries()) {
      for (const { start, length, startAttachment, endAttachment } of legs) {
        for (const [attachment, distance, side] of [
          [startAttachment, start, 'after'],
          [endAttachment, start + length, 'before'],
        ] as const) {
          const { axialForce, shearForce } = fieldAt(solution.members[m]!, distance, side);
          if (attachment?.freed.includes('axial')) expectNear(axialForce, 0, allowed(analysis, 1e-10) * force);
          if (attachment?.freed.includes('shear')) expectNear(shearForce, 0, allowed(analysis, 1e-10) * force);
        }
      }
    }
  }
});

holds(
  'from the forces of the first road, the second finds its movements, and no gap',
  jointedStructures(),
  structure => {
    const analysis = analysed(structure);
    const { primary } = prepare(structure)!;
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
      const moves = largest([...solution.movements]) > 1e-6 * scale.movement;
      if (moves) expect(largestGap(primary, given)).toBeLessThanOrEqual(allowed(analysis, 1e-9));
    }
  },
);

holds('reactions balance the loads', jointedStructures(), structure => {
  const analysis = analysed(structure);
  const reach = largest(structure.points.flatMap(({ x, y }) => [x, y])) + leverOf(structure);
  for (const solution of analysis.cases) {
    const sum = { ...solution.applied };
    for (const [support, { x, y, moment }] of solution.reactions.entries()) {
      const point = structure.points[structure.supports[support]!.point]!;
      sum.x += x;
      sum.y += y;
      sum.moment += moment + point.x * y - point.y * x;
    }
    const { force } = scalesOf(structure, read(structure, solution));
    const size = force + Math.abs(solution.applied.x) + Math.abs(solution.applied.y);
    const left = allowed(analysis, 1e-9) * (size + Math.abs(solution.applied.moment) / reach);
    expectNear(sum.x, 0, left);
    expectNear(sum.y, 0, left);
    expectNear(sum.moment, 0, left * reach);
  }
});

function sameAs(
  structure: Structure,
  other: Structure,
  tolerance: number,
  back: (reading: Reading) => Reading = reading => reading,
): void {
  const analysis = analysed(structure);
  for (const [index, solution] of analysed(other).cases.entries()) {
    const wanted = read(structure, analysis.cases[index]!);
    expectSame(structure, back(read(other, solution)), wanted, allowed(analysis, tolerance));
  }
}

const angles = fc.integer({ min: -31, max: 31 }).map(number => number / 10);
holds('turned as a whole', fc.tuple(jointedStructures(), angles), ([structure, angle]) => {
  const [cosine, sine] = [Math.cos(angle), Math.sin(angle)];
  sameAs(structure, rotated(explicit(structure), angle), 1e-9, reading => ({
    ...reading,
    reaction: reading.reaction.map((value, index, { [index + 1]: y, [index - 1]: x }) =>
      index % 2 === 0 ? cosine * value + sine * y! : cosine * value - sine * x!,
    ),
  }));
});

holds('mirrored', jointedStructures(), structure => {
  sameAs(structure, mirrored(explicit(structure)), 1e-10, reading => ({
    ...times(reading, { across: -1, rotation: -1, shear: -1, moment: -1, fixing: -1 }),
    reaction: reading.reaction.map((value, index) => (index % 2 === 0 ? -value : value)),
  }));
});

holds(
  'a member run the other way: reactions stay',
  fc.tuple(jointedStructures(), fc.nat(99)),
  ([structure, number]) => {
    // A couple on a member that runs through acts on the side before, which changes with the travel.
    const loads = structure.loads.filter(({ kind }) => kind !== 'couple');
    const plain = { ...structure, loads };
    const analysis = analysed(plain);
    for (const [index, solution] of analysed(reversed(plain, number % plain.members.length)).cases.entries()) {
      const wanted = read(plain, analysis.cases[index]!);
      const { reaction, fixing } = read(plain, solution);
      expectSame(plain, { ...wanted, reaction, fixing }, wanted, allowed(analysis, 1e-10));
    }
  },
);

holds(
  'a point more within a leg',
  fc.tuple(jointedStructures(), fc.nat(99), fc.nat(99), fc.integer({ min: 1, max: 19 })),
  ([structure, number, which, part]) => {
    const bending = structure.members.flatMap(({ kind }, index) => (kind === 'member' ? [index] : []));
    if (bending.length === 0) return;
    const member = bending[number % bending.length]!;
    const leg = which % structure.members[member]!.legs.length;
    sameAs(structure, subdivided(structure, member, leg, part / 20), 1e-9);
  },
);

const units = fc.constantFrom([1000, 1], [1 / 0.0254, 1 / 4448.2216152605], [0.001, 1e-6]);
holds('in other units', fc.tuple(jointedStructures(), units), ([structure, [length, force]]) => {
  const [one, other] = [1 / length!, 1 / force!];
  sameAs(structure, inUnits(structure, length!, force!), 1e-10, reading =>
    times(reading, {
      along: one,
      across: one,
      axial: other,
      shear: other,
      moment: one * other,
      reaction: other,
      fixing: one * other,
    }),
  );
});
