// Properties of equilibrium and of the fields within members.
import { expect } from 'vitest';
import { fieldAt } from '../../src/mechanics/field.ts';
import type { FieldPiece, Solution } from '../../src/mechanics/solution.ts';
import type { Load, Structure } from '../../src/model/structure.ts';
import { explicit } from './motions.ts';
import { expectNear, expectSame, largest, leverOf, read, type Scales, scalesOf, times } from './readings.ts';
import { allowed, analysed, holds } from './run.ts';
import { determinateStructures, structures } from './structures.ts';
import { merged } from './transform.ts';

holds('reactions balance the loads', structures(), structure => {
  const analysis = analysed(structure);
  for (const [index, solution] of analysis.cases.entries()) {
    const sum = resultantOf(structure, index);
    const tolerance = 1e-9 * sum.size;
    expectNear(solution.applied.x, sum.x, tolerance);
    expectNear(solution.applied.y, sum.y, tolerance);
    const reach = largest(structure.points.flatMap(({ x, y }) => [x, y])) + leverOf(structure);
    expectNear(solution.applied.moment, sum.moment, tolerance * reach);
    for (const [support, { x, y, moment }] of solution.reactions.entries()) {
      const point = structure.points[structure.supports[support]!.point]!;
      sum.x += x;
      sum.y += y;
      sum.moment += moment + point.x * y - point.y * x;
      sum.size += Math.abs(x) + Math.abs(y) + Math.abs(moment) / reach;
    }
    const least = scalesOf(structure, read(structure, solution)).force;
    const left = allowed(analysis, 1e-10) * Math.max(sum.size, least);
    expectNear(sum.x, 0, left);
    expectNear(sum.y, 0, left);
    expectNear(sum.moment, 0, left * reach);
  }
});

holds('every point is in balance: members, loads and supports', structures(), structure => {
  const analysis = analysed(structure);
  for (const [index, solution] of analysis.cases.entries()) {
    const scale = scalesOf(structure, read(structure, solution));
    const tolerance = allowed(analysis, 1e-10);
    for (const [point, { x, y, moment }] of unbalanced(structure, index, solution).entries()) {
      const name = structure.points[point]!.name;
      expectNear(x, 0, tolerance * scale.force, name);
      expectNear(y, 0, tolerance * scale.force, name);
      expectNear(moment, 0, tolerance * scale.moment, name);
    }
  }
});

holds('fields: dM/dx = V, dφ/dx = M/EI + κ, φ = dv/dx, du/dx = N/EA + ε, term by term', structures(), structure => {
  const analysis = analysed(structure);
  for (const [index, solution] of analysis.cases.entries()) {
    const scale = scalesOf(structure, read(structure, solution));
    for (const [m, member] of structure.members.entries()) {
      for (const piece of solution.members[m]!.pieces) {
        const { bendingStiffness, axialStiffness } = structure.sections[member.legs[piece.leg]!.section]!;
        const flexibility = {
          bending: member.kind === 'bar' ? 0 : 1 / bendingStiffness!,
          axial: axialStiffness === undefined ? 0 : 1 / axialStiffness,
        };
        checkPiece(piece, flexibility, freeStrains(structure, index, m, piece.leg), scale, allowed(analysis, 1e-10));
      }
    }
  }
});

holds('joints do not come apart: the ends of members move and turn as their points', structures(), structure => {
  const analysis = analysed(structure);
  for (const solution of analysis.cases) {
    const scale = scalesOf(structure, read(structure, solution));
    const tolerance = allowed(analysis, 1e-11);
    for (const [m, { kind, legs }] of structure.members.entries()) {
      for (const leg of legs) {
        for (const [point, distance, side] of [
          [leg.from, leg.start, 'after'],
          [leg.to, leg.start + leg.length, 'before'],
        ] as const) {
          const field = fieldAt(solution.members[m]!, distance, side);
          const [x, y, turn] = solution.movements.subarray(3 * point, 3 * point + 3);
          const name = `${structure.members[m]!.name} at ${structure.points[point]!.name}`;
          expectNear(leg.cosine * x! + leg.sine * y!, field.axialMovement, tolerance * scale.movement, name);
          expectNear(leg.cosine * y! - leg.sine * x!, field.transverseMovement, tolerance * scale.movement, name);
          const hinged = structure.hinges.some(hinge => hinge.point === point && (hinge.member ?? m) === m);
          if (kind === 'member' && !hinged) expectNear(turn!, field.rotation, tolerance * scale.rotation, name);
        }
      }
    }
  }
});

holds(
  'moved supports, heat and lack of fit stress nothing that is statically determinate',
  determinateStructures(),
  structure => {
    const imposed = ['movement', 'heat', 'lengthen'];
    const moved = { ...structure, loads: structure.loads.filter(load => imposed.includes(load.kind)) };
    const analysis = analysed(moved);
    const found = read(moved, analysis.cases[2]!);
    const none = times(found, { axial: 0, shear: 0, moment: 0, reaction: 0, fixing: 0 });
    expectSame(moved, found, none, allowed(analysis, 1e-10));
  },
);

holds('no load gives nothing at all', structures(), structure => {
  const bare = merged(structure, [0, 0, 0]);
  const solution = analysed(bare).cases[0]!;
  for (const values of Object.values(read(bare, solution))) {
    for (const value of values) expect(Math.abs(value)).toBe(0);
  }
});

/** The loads of a case as one force and one couple about the origin, from what was said of them. */
function resultantOf(structure: Structure, index: number) {
  const sum = { x: 0, y: 0, moment: 0, size: 0 };
  const force = (atX: number, atY: number, x: number, y: number) => {
    sum.x += x;
    sum.y += y;
    sum.moment += atX * y - atY * x;
    sum.size += Math.abs(x) + Math.abs(y);
  };
  for (const load of explicit(structure).loads) {
    if (load.case !== index) continue;
    if (load.kind === 'force') {
      const [x, y] = placeOf(structure, load);
      force(x, y, load.x, load.y);
    } else if (load.kind === 'couple') {
      sum.moment += load.moment;
      sum.size += Math.abs(load.moment) / leverOf(structure);
    } else if (load.kind === 'line') {
      for (const leg of structure.members[load.member]!.legs) {
        const start = Math.max(load.start, leg.start);
        const end = Math.min(load.end, leg.start + leg.length);
        if (end <= start) continue;
        const slope = (load.endIntensity - load.startIntensity) / (load.end - load.start);
        const from = structure.points[leg.from]!;
        const { direction } = load;
        const side = direction.kind === 'square' && leg.cosine * direction.y - leg.sine * direction.x < 0 ? -1 : 1;
        const [x, y] =
          direction.kind === 'along'
            ? [direction.sense * leg.cosine, direction.sense * leg.sine]
            : direction.kind === 'square'
              ? [-leg.sine * side, leg.cosine * side]
              : [direction.x, direction.y];
        // Simpson's rule, exact for the moment of a linear load.
        for (const [distance, weight] of [
          [start, 1],
          [(start + end) / 2, 4],
          [end, 1],
        ] as const) {
          const intensity = load.startIntensity + slope * (distance - load.start);
          const share = (weight * (end - start) * intensity) / 6;
          const within = distance - leg.start;
          force(from.x + within * leg.cosine, from.y + within * leg.sine, share * x, share * y);
        }
      }
    }
  }
  return sum;
}

function placeOf(structure: Structure, load: Extract<Load, { kind: 'force' | 'couple' }>): [x: number, y: number] {
  if (load.at.kind === 'point') {
    const { x, y } = structure.points[load.at.point]!;
    return [x, y];
  }
  const { distance, member } = load.at;
  const leg = structure.members[member]!.legs.findLast(candidate => candidate.start <= distance)!;
  const from = structure.points[leg.from]!;
  return [from.x + (distance - leg.start) * leg.cosine, from.y + (distance - leg.start) * leg.sine];
}

/** What members, loads and supports leave on each point. Couples: of the joint; those on hinged ends have no part. */
function unbalanced(structure: Structure, index: number, solution: Solution) {
  const sums = structure.points.map(() => ({ x: 0, y: 0, moment: 0 }));
  const hinged = (point: number, member: number) =>
    structure.hinges.some(hinge => hinge.point === point && (hinge.member ?? member) === member);
  for (const [m, { kind, legs }] of structure.members.entries()) {
    for (const [l, leg] of legs.entries()) {
      const pieces = solution.members[m]!.pieces.filter(piece => piece.leg === l);
      for (const [point, piece, s, sense] of [
        [leg.from, pieces[0]!, 0, 1],
        [leg.to, pieces.at(-1)!, pieces.at(-1)!.end - pieces.at(-1)!.start, -1],
      ] as const) {
        const axial = sense * valueAt(piece.axialForce, s);
        const shear = sense * valueAt(piece.shearForce, s);
        const sum = sums[point]!;
        sum.x += axial * leg.cosine + shear * leg.sine;
        sum.y += axial * leg.sine - shear * leg.cosine;
        if (kind === 'member' && !hinged(point, m)) sum.moment += sense * valueAt(piece.bendingMoment, s);
      }
    }
  }
  for (const load of explicit(structure).loads) {
    if (load.case !== index) continue;
    if (load.kind !== 'force' && load.kind !== 'couple') continue;
    const point = pointOf(structure, load);
    if (point === undefined) continue;
    if (load.kind === 'force') {
      sums[point]!.x += load.x;
      sums[point]!.y += load.y;
    } else if (load.at.kind === 'point' && load.at.member === undefined) {
      sums[point]!.moment += load.moment;
    } else {
      const member = load.at.kind === 'point' ? load.at.member! : load.at.member;
      if (!hinged(point, member)) sums[point]!.moment += load.moment;
    }
  }
  for (const [support, { x, y, moment }] of solution.reactions.entries()) {
    const sum = sums[structure.supports[support]!.point]!;
    sum.x += x;
    sum.y += y;
    sum.moment += moment;
  }
  return sums;
}

/** The point that a load stands at, be it said as a place along a member. */
function pointOf(structure: Structure, { at }: Extract<Load, { kind: 'force' | 'couple' }>): number | undefined {
  if (at.kind === 'point') return at.point;
  for (const leg of structure.members[at.member]!.legs) {
    if (Math.abs(leg.start - at.distance) < 1e-9 * leg.length) return leg.from;
    if (Math.abs(leg.start + leg.length - at.distance) < 1e-9 * leg.length) return leg.to;
  }
  return undefined;
}

function checkPiece(
  piece: FieldPiece,
  flexibility: { bending: number; axial: number },
  free: { curvature: number; strain: number },
  scale: Scales,
  tolerance: number,
): void {
  const length = piece.end - piece.start;
  const same = (name: string, derived: readonly number[], value: readonly number[], factor: number, size: number) => {
    for (let power = 0; power < Math.max(derived.length - 1, value.length); power++) {
      const slope = (power + 1) * (derived[power + 1] ?? 0);
      const weight = length ** (power + 1);
      expectNear(slope * weight, factor * (value[power] ?? 0) * weight, tolerance * size, `${name}, power ${power}`);
    }
  };
  same('dM/dx', piece.bendingMoment, piece.shearForce, 1, scale.moment);
  if (flexibility.bending > 0) {
    same('dφ/dx', piece.rotation, linear(piece.bendingMoment, flexibility.bending, free.curvature), 1, scale.rotation);
    same('dv/dx', piece.transverseMovement, piece.rotation, 1, scale.movement);
  }
  same('du/dx', piece.axialMovement, linear(piece.axialForce, flexibility.axial, free.strain), 1, scale.movement);
}

/** Coefficients times a factor, and a constant added. */
function linear(coefficients: readonly number[], factor: number, constant: number): number[] {
  return coefficients.map((coefficient, power) => factor * coefficient + (power === 0 ? constant : 0));
}

/** What heat and lack of fit of a case do to a leg that nothing restrains: curvature as by a sagging moment, and strain. */
function freeStrains({ loads, members, sections }: Structure, index: number, member: number, leg: number) {
  const { legs, length } = members[member]!;
  const { thermalExpansion, depth } = sections[legs[leg]!.section]!;
  let [curvature, strain] = [0, 0];
  for (const load of loads) {
    if (load.case !== index || (load.kind !== 'heat' && load.kind !== 'lengthen') || load.member !== member) continue;
    if (load.kind === 'lengthen') strain += load.amount / length;
    else {
      curvature -= (thermalExpansion! * (load.above - load.below)) / depth!;
      strain += thermalExpansion! * (load.above / 2 + load.below / 2);
    }
  }
  return { curvature, strain };
}

function valueAt(coefficients: readonly number[], x: number): number {
  return coefficients.reduceRight((sum, coefficient) => sum * x + coefficient, 0);
}
