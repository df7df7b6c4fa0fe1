// A solution read off at places along every member, by kinds of quantity, so that two of them can be held together.
import { expect } from 'vitest';
import { fieldAt } from '../../src/mechanics/field.ts';
import type { Solution } from '../../src/mechanics/solution.ts';
import type { Structure } from '../../src/model/structure.ts';

/** In the local axes of each member, so that they do not depend on how the structure lies. */
export interface Reading {
  /** By member and place: along the travel, and to the left of it. */
  readonly along: readonly number[];
  readonly across: readonly number[];
  readonly rotation: readonly number[];
  readonly axial: readonly number[];
  readonly shear: readonly number[];
  readonly moment: readonly number[];
  /** By support: x, y. */
  readonly reaction: readonly number[];
  readonly fixing: readonly number[];
}

/** Shares of a member's length: its ends, and places where nothing else stands. */
const PLACES = [0, 0.0137, 0.1171, 0.2323, 0.3719, 0.5173, 0.6311, 0.7577, 0.8837, 0.9917, 1];

export function read(structure: Structure, solution: Solution, places: readonly number[] = PLACES): Reading {
  const values = structure.members.flatMap(({ length }, member) =>
    places.map(place => fieldAt(solution.members[member]!, place * length, place === 1 ? 'before' : 'after')),
  );
  return {
    along: values.map(value => value.axialMovement),
    across: values.map(value => value.transverseMovement),
    rotation: values.map(value => value.rotation),
    axial: values.map(value => value.axialForce),
    shear: values.map(value => value.shearForce),
    moment: values.map(value => value.bendingMoment),
    reaction: solution.reactions.flatMap(({ x, y }) => [x, y]),
    fixing: solution.reactions.map(({ moment }) => moment),
  };
}

const KINDS = {
  along: 'movement',
  across: 'movement',
  rotation: 'rotation',
  axial: 'force',
  shear: 'force',
  moment: 'moment',
  reaction: 'force',
  fixing: 'moment',
} as const;

const NAMES = Object.keys(KINDS) as (keyof Reading)[];

/** With each kind of value times a factor. */
export function times(reading: Reading, factors: Partial<Record<keyof Reading, number>>): Reading {
  const result = { ...reading };
  for (const name of NAMES) result[name] = reading[name].map(value => value * (factors[name] ?? 1));
  return result;
}

/**
 * That both agree to `tolerance` of the largest of each kind. Movements and turns, forces and moments, have one scale
 * each, with the structure's legs for a lever. Where all should be nil, the scale of movements is what forces of that size
 * do to the stiffest leg, that of forces a thousandth of what imposed movements would do to it.
 */
export function expectSame(structure: Structure, found: Reading, wanted: Reading, tolerance: number): void {
  const scale = scalesOf(structure, wanted);
  for (const name of NAMES) {
    const allowed = tolerance * scale[KINDS[name]];
    expect(found[name].length, name).toBe(wanted[name].length);
    for (const [index, value] of wanted[name].entries()) {
      const difference = Math.abs(found[name][index]! - value);
      if (difference <= allowed) continue;
      const ratio = (difference / scale[KINDS[name]]).toExponential(1);
      expect.fail(
        `${name} ${index}: ${found[name][index]}, expected ${value}: ${ratio} of the largest, allowed ${tolerance}`,
      );
    }
  }
}

/** That a value is as wanted to within `allowed`. */
export function expectNear(found: number, wanted: number, allowed: number, name = 'value'): void {
  if (!(Math.abs(found - wanted) <= allowed))
    expect.fail(`${name}: ${found}, expected ${wanted}, allowed ${allowed} off`);
}

export interface Scales {
  readonly movement: number;
  readonly rotation: number;
  readonly force: number;
  readonly moment: number;
}

export function scalesOf(structure: Structure, reading: Reading): Scales {
  const lever = leverOf(structure);
  const flexibility = flexibilityOf(structure);
  const force = Math.max(
    largest([...reading.axial, ...reading.shear, ...reading.reaction]),
    largest([...reading.moment, ...reading.fixing]) / lever,
    flexibility === 0 ? 0 : (1e-3 * imposedMovement(structure)) / flexibility,
  );
  const movement = Math.max(
    largest([...reading.along, ...reading.across]),
    largest(reading.rotation) * lever,
    force * flexibility,
  );
  return { movement, rotation: movement / lever, force, moment: force * lever };
}

function imposedMovement({ loads, members, sections }: Structure): number {
  return largest(
    loads.map(load => {
      if (load.kind === 'movement' || load.kind === 'lengthen') return load.amount;
      if (load.kind !== 'heat') return 0;
      const { legs, length } = members[load.member]!;
      const { thermalExpansion, depth } = sections[legs[0]!.section]!;
      const bow = ((load.above - load.below) * length ** 2) / depth!;
      return thermalExpansion! * Math.max(Math.abs(load.above) * length, Math.abs(load.below) * length, Math.abs(bow));
    }),
  );
}

/** The mean length of a leg. */
export function leverOf({ members }: Structure): number {
  const lengths = members.flatMap(({ legs }) => legs.map(({ length }) => length));
  return lengths.reduce((sum, length) => sum + length, 0) / lengths.length;
}

/** Of the stiffest leg that gives at all, m/N. */
export function flexibilityOf({ members, sections }: Structure): number {
  let least = Infinity;
  for (const { kind, legs } of members) {
    for (const { section, length } of legs) {
      const { bendingStiffness, axialStiffness } = sections[section]!;
      if (axialStiffness !== undefined) least = Math.min(least, length / axialStiffness);
      if (kind === 'member') least = Math.min(least, length ** 3 / (3 * bendingStiffness!));
    }
  }
  return least === Infinity ? 0 : least;
}

export function largest(values: readonly number[]): number {
  return values.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
}
