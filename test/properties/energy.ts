// Work and energy by quadrature of the fields, without any help of the solver's: Gauss's rule is exact for the degrees
// that occur.
import { fieldAt, movementAt } from '../../src/mechanics/field.ts';
import type { FieldPiece, Solution } from '../../src/mechanics/solution.ts';
import { STANDARD_GRAVITY } from '../../src/model/gravity.ts';
import type { Leg, LineDirection, Load, Location, Restraint, Structure } from '../../src/model/structure.ts';

/** A sum beside the sum of its terms' sizes. */
export interface Work {
  value: number;
  size: number;
}

export interface MovementAt {
  readonly x: number;
  readonly y: number;
  readonly turn: number;
}

/** Of a place; turns: of the section, or of the joint at a point. */
export function movementAtLocation(structure: Structure, solution: Solution, at: Location): MovementAt {
  if (at.kind === 'point') {
    const [x, y, turn] = solution.movements.subarray(3 * at.point, 3 * at.point + 3);
    return { x: x!, y: y!, turn: turn! };
  }
  const field = solution.members[at.member]!;
  const { x, y } = movementAt(field, structure.members[at.member]!.legs, at.distance);
  return { x, y, turn: fieldAt(field, at.distance).rotation };
}

/** Σ load · movement of one case's loads on the movements of any solution; what is imposed is no load. */
export function workOfLoads(structure: Structure, index: number, solution: Solution): Work {
  const work: Work = { value: 0, size: 0 };
  for (const load of structure.loads) {
    if (load.case === index) addWork(structure, load, solution, work);
  }
  return work;
}

export interface Energy {
  /** Half the loads' work. */
  readonly loads: Work;
  /** What the ground works by moving under the reactions: half of Σ R g, as both grow together. */
  readonly ground: number;
  /** What the forces work on the strains of heat and lack of fit: half of Σ∫(N ε + M κ) dx. */
  readonly strains: number;
  /** Half of Σ∫(N²/EA + M²/EI) dx + Σ k (movement against the ground)². */
  readonly stored: number;
}

export function energyOf(structure: Structure, index: number, solution: Solution): Energy {
  const loads = workOfLoads(structure, index, solution);
  let stored = 0;
  for (const [m, member] of structure.members.entries()) {
    for (const piece of solution.members[m]!.pieces) {
      const { axialStiffness, bendingStiffness } = structure.sections[member.legs[piece.leg]!.section]!;
      if (axialStiffness !== undefined) stored += squareIntegral(piece, 'axialForce') / axialStiffness;
      if (member.kind === 'member') stored += squareIntegral(piece, 'bendingMoment') / bendingStiffness!;
    }
  }
  let ground = 0;
  for (const [s, { point, restraints }] of structure.supports.entries()) {
    const imposed = imposedAt(structure, index, point);
    const reaction = solution.reactions[s]!;
    ground += reaction.x * imposed.x + reaction.y * imposed.y + reaction.moment * imposed.turn;
    const moved = movementAtLocation(structure, solution, { kind: 'point', point });
    for (const { freedom, stiffness } of restraints) {
      if (stiffness < Infinity) stored += stiffness * (part(moved, freedom) - part(imposed, freedom)) ** 2;
    }
  }
  const strains = workOnStrains(structure, index, solution) / 2;
  return { loads: { value: loads.value / 2, size: loads.size / 2 }, ground: ground / 2, strains, stored: stored / 2 };
}

/** Σ∫(N ε + M κ) dx: the forces of any solution, the strains that heat and lack of fit of one case cause by themselves. */
export function workOnStrains(structure: Structure, index: number, solution: Solution): number {
  let work = 0;
  for (const load of structure.loads) {
    if (load.case !== index || (load.kind !== 'heat' && load.kind !== 'lengthen')) continue;
    const { legs, length } = structure.members[load.member]!;
    for (const piece of solution.members[load.member]!.pieces) {
      const { thermalExpansion, depth } = structure.sections[legs[piece.leg]!.section]!;
      if (load.kind === 'lengthen') {
        work += (load.amount / length) * integral(piece, 'axialForce');
        continue;
      }
      const [upper, under] = [thermalExpansion! * load.above, thermalExpansion! * load.below];
      work += ((upper + under) / 2) * integral(piece, 'axialForce');
      // A moment works by stretching the underside and pressing the upper side.
      work += ((under - upper) / depth!) * integral(piece, 'bendingMoment');
    }
  }
  return work;
}

function imposedAt(structure: Structure, index: number, point: number): MovementAt {
  let [x, y, turn] = [0, 0, 0];
  for (const load of structure.loads) {
    if (load.kind !== 'movement' || load.case !== index || load.point !== point) continue;
    if (load.freedom.kind === 'rotation') {
      turn += load.amount;
    } else {
      x += load.freedom.x * load.amount;
      y += load.freedom.y * load.amount;
    }
  }
  return { x, y, turn };
}

function part(moved: MovementAt, freedom: Restraint['freedom']): number {
  return freedom.kind === 'rotation' ? moved.turn : moved.x * freedom.x + moved.y * freedom.y;
}

function addWork(structure: Structure, load: Load, solution: Solution, work: Work): void {
  const add = (value: number) => {
    work.value += value;
    work.size += Math.abs(value);
  };
  switch (load.kind) {
    case 'force': {
      const { x, y } = movementAtLocation(structure, solution, load.at);
      add(load.x * x + load.y * y);
      return;
    }
    case 'couple':
      add(load.moment * movementAtLocation(structure, solution, load.at).turn);
      return;
    case 'self-weight':
      for (const member of load.members) {
        const { kind, legs } = structure.members[member]!;
        for (const leg of legs) {
          const weight = (structure.sections[leg.section]!.massPerLength ?? 0) * STANDARD_GRAVITY * load.factor;
          if (kind === 'bar') {
            for (const point of [leg.from, leg.to]) {
              add((-weight * leg.length * movementAtLocation(structure, solution, { kind: 'point', point }).y) / 2);
            }
          } else {
            overPieces(structure, solution, member, leg.start, leg.start + leg.length, (_, y) => -weight * y, add);
          }
        }
      }
      return;
    case 'line': {
      const slope = (load.endIntensity - load.startIntensity) / (load.end - load.start);
      overPieces(
        structure,
        solution,
        load.member,
        load.start,
        load.end,
        (x, y, distance, leg) => {
          const [directionX, directionY] = perLength(leg, load.direction);
          return (load.startIntensity + slope * (distance - load.start)) * (directionX * x + directionY * y);
        },
        add,
      );
      return;
    }
    case 'movement':
    case 'heat':
    case 'lengthen':
      return;
  }
}

function perLength({ cosine, sine }: Leg, direction: LineDirection): [x: number, y: number] {
  switch (direction.kind) {
    case 'along':
      return [direction.sense * cosine, direction.sense * sine];
    case 'square': {
      const side = -sine * direction.x + cosine * direction.y < 0 ? -1 : 1;
      return [-sine * side, cosine * side];
    }
    case 'global': {
      const share = direction.onPlan ? Math.abs(cosine) : 1;
      return [direction.x * share, direction.y * share];
    }
  }
}

/** Gauss's five points and weights for −1 to 1, exact to degree 9. */
const GAUSS: readonly (readonly [place: number, weight: number])[] = (() => {
  const root = 2 * Math.sqrt(10 / 7);
  const [near, far] = [Math.sqrt(5 - root) / 3, Math.sqrt(5 + root) / 3];
  const [heavy, light] = [(322 + 13 * Math.sqrt(70)) / 900, (322 - 13 * Math.sqrt(70)) / 900];
  return [
    [0, 128 / 225],
    [-near, heavy],
    [near, heavy],
    [-far, light],
    [far, light],
  ];
})();

function overPieces(
  structure: Structure,
  solution: Solution,
  member: number,
  from: number,
  to: number,
  density: (x: number, y: number, distance: number, leg: Leg) => number,
  add: (value: number) => void,
): void {
  const { legs } = structure.members[member]!;
  for (const piece of solution.members[member]!.pieces) {
    const start = Math.max(from, piece.start);
    const end = Math.min(to, piece.end);
    if (end <= start) continue;
    const leg = legs[piece.leg]!;
    for (const [place, weight] of GAUSS) {
      const distance = (start + end) / 2 + (place * (end - start)) / 2;
      const along = valueAt(piece.axialMovement, distance - piece.start);
      const across = valueAt(piece.transverseMovement, distance - piece.start);
      const x = leg.cosine * along - leg.sine * across;
      const y = leg.sine * along + leg.cosine * across;
      add((weight * (end - start) * density(x, y, distance, leg)) / 2);
    }
  }
}

function integral(piece: FieldPiece, name: 'axialForce' | 'bendingMoment'): number {
  const length = piece.end - piece.start;
  let sum = 0;
  for (const [place, weight] of GAUSS) sum += (weight * length * valueAt(piece[name], ((1 + place) * length) / 2)) / 2;
  return sum;
}

function squareIntegral(piece: FieldPiece, name: 'axialForce' | 'bendingMoment'): number {
  const length = piece.end - piece.start;
  let sum = 0;
  for (const [place, weight] of GAUSS)
    sum += (weight * length * valueAt(piece[name], ((1 + place) * length) / 2) ** 2) / 2;
  return sum;
}

function valueAt(coefficients: readonly number[], x: number): number {
  return coefficients.reduceRight((sum, coefficient) => sum * x + coefficient, 0);
}
