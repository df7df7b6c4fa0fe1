// What is said to be the largest along a member is: nothing sampled is larger, and at its place it is what is said.
import fc from 'fast-check';
import { expect } from 'vitest';
import { type FieldValues, fieldAt } from '../../src/mechanics/field.ts';
import { measure } from '../../src/mechanics/measure.ts';
import type { Leg } from '../../src/model/structure.ts';
import { expectNear, read, type Scales, scalesOf } from './readings.ts';
import { analysed, holds } from './run.ts';
import { structures } from './structures.ts';

/** Each quantity as the fields give it, and the scale that its rounding is relative to. */
const QUANTITIES = {
  deflection: {
    scale: 'movement',
    of: (field: FieldValues, { cosine, sine }: Leg) => -sine * field.axialMovement - cosine * field.transverseMovement,
  },
  sway: {
    scale: 'movement',
    of: (field: FieldValues, { cosine, sine }: Leg) => cosine * field.axialMovement - sine * field.transverseMovement,
  },
  rotation: { scale: 'rotation', of: (field: FieldValues) => field.rotation },
  moment: { scale: 'moment', of: (field: FieldValues) => field.bendingMoment },
  shear: { scale: 'force', of: (field: FieldValues) => field.shearForce },
  force: { scale: 'force', of: (field: FieldValues) => field.axialForce },
} as const satisfies Record<string, { scale: keyof Scales; of: (field: FieldValues, leg: Leg) => number }>;

const kinds = fc.constantFrom(...(Object.keys(QUANTITIES) as (keyof typeof QUANTITIES)[]));
const SAMPLES = 300;

holds(
  'the largest, greatest and least along a member',
  fc.tuple(structures(), fc.nat(99), kinds),
  ([structure, number, kind]) => {
    const member = number % structure.members.length;
    const { length, legs } = structure.members[member]!;
    const { scale, of } = QUANTITIES[kind];
    for (const solution of analysed(structure).cases) {
      const field = solution.members[member]!;
      const valueAt = (distance: number, side: 'before' | 'after') => {
        const values = fieldAt(field, distance, side);
        return of(values, legs[values.leg]!);
      };
      let [most, least] = [Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY];
      for (let sample = 0; sample <= SAMPLES; sample++) {
        const value = valueAt((sample / SAMPLES) * length, 'after');
        most = Math.max(most, value);
        least = Math.min(least, value);
      }
      const rounding = 1e-11 * scalesOf(structure, read(structure, solution))[scale];
      const seek = (what: 'size' | 'greatest' | 'least') => {
        const { value, place } = measure(structure, solution, { kind, along: [member] }, what);
        const sides = [valueAt(place!.distance, 'before'), valueAt(place!.distance, 'after')];
        expectNear(Math.min(...sides.map(side => Math.abs(side - value))), 0, rounding, `${kind} at its place`);
        return value;
      };
      expect(Math.abs(seek('size'))).toBeGreaterThanOrEqual(Math.max(most, -least) - rounding);
      expect(seek('greatest')).toBeGreaterThanOrEqual(most - rounding);
      expect(seek('least')).toBeLessThanOrEqual(least + rounding);
    }
  },
);
