// The same structure said otherwise answers the same: turned, moved, mirrored, run the other way, divided, in another
// order, in other units.
import fc from 'fast-check';
import type { Structure } from '../../src/model/structure.ts';
import { explicit, mirrored, rotated, translated } from './motions.ts';
import { expectSame, leverOf, type Reading, read, times } from './readings.ts';
import { allowed, analysed, holds } from './run.ts';
import { structures } from './structures.ts';
import { inUnits, reordered, reversed, subdivided } from './transform.ts';

/** That the other structure's readings, as `back` brings them to the first one's terms, are those of the first. */
function sameAs(
  structure: Structure,
  other: Structure,
  tolerance: number,
  back: (reading: Reading, other: Structure) => Reading,
): void {
  const analysis = analysed(structure);
  const limit = allowed(analysis, tolerance);
  for (const [index, solution] of analysed(other).cases.entries()) {
    expectSame(structure, back(read(other, solution), other), read(structure, analysis.cases[index]!), limit);
  }
}

holds('weight and loads on plan are line loads and forces', structures(), structure => {
  sameAs(structure, explicit(structure), 1e-12, reading => reading);
});

const angles = fc.integer({ min: -31, max: 31 }).map(number => number / 10);
holds('turned as a whole', fc.tuple(structures(), angles), ([structure, angle]) => {
  const [cosine, sine] = [Math.cos(angle), Math.sin(angle)];
  sameAs(structure, rotated(explicit(structure), angle), 1e-9, reading => ({
    ...reading,
    reaction: reading.reaction.map((value, index, { [index + 1]: y, [index - 1]: x }) =>
      index % 2 === 0 ? cosine * value + sine * y! : cosine * value - sine * x!,
    ),
  }));
});

holds('moved far away', structures(), structure => {
  const far = 1000 * leverOf(structure);
  sameAs(
    structure,
    translated(structure.loads.length ? explicit(structure) : structure, far, -far),
    1e-9,
    reading => reading,
  );
});

holds('mirrored: what leans the other way, and whose underside is the upper side', structures(), structure => {
  sameAs(structure, mirrored(explicit(structure)), 1e-10, reading => ({
    ...times(reading, { across: -1, rotation: -1, shear: -1, moment: -1, fixing: -1 }),
    reaction: reading.reaction.map((value, index) => (index % 2 === 0 ? -value : value)),
  }));
});

/** Places symmetric about the middle, so that those of a member run back are the same ones. */
const BOTH_WAYS = [0, 0.0137, 0.1171, 0.2323, 0.3719, 0.4871, 0.5129, 0.6281, 0.7677, 0.8829, 0.9863, 1];

holds('a member run the other way', fc.tuple(structures(), fc.nat(99)), ([structure, number]) => {
  const member = number % structure.members.length;
  const analysis = analysed(structure);
  const other = reversed(structure, member);
  const count = BOTH_WAYS.length;
  const back = (values: readonly number[], sign: number) => [
    ...values.slice(0, member * count),
    ...values
      .slice(member * count, (member + 1) * count)
      .map(value => sign * value)
      .toReversed(),
    ...values.slice((member + 1) * count),
  ];
  for (const [index, solution] of analysed(other).cases.entries()) {
    const reading = read(other, solution, BOTH_WAYS);
    const found: Reading = {
      ...reading,
      along: back(reading.along, -1),
      across: back(reading.across, -1),
      rotation: back(reading.rotation, 1),
      axial: back(reading.axial, 1),
      shear: back(reading.shear, 1),
      moment: back(reading.moment, -1),
    };
    expectSame(structure, found, read(structure, analysis.cases[index]!, BOTH_WAYS), allowed(analysis, 1e-11));
  }
});

holds(
  'a point more within a leg',
  fc.tuple(structures(), fc.nat(99), fc.nat(99), fc.integer({ min: 1, max: 19 })),
  ([structure, number, which, part]) => {
    const bending = structure.members.flatMap(({ kind }, index) => (kind === 'member' ? [index] : []));
    if (bending.length === 0) return;
    const member = bending[number % bending.length]!;
    const leg = which % structure.members[member]!.legs.length;
    sameAs(structure, subdivided(structure, member, leg, part / 20), 1e-10, reading => reading);
  },
);

holds(
  'every leg of a member in ten',
  fc.tuple(structures(), fc.nat(99)),
  ([structure, number]) => {
    const bending = structure.members.flatMap(({ kind }, index) => (kind === 'member' ? [index] : []));
    if (bending.length === 0) return;
    const member = bending[number % bending.length]!;
    let divided = structure;
    for (let leg = structure.members[member]!.legs.length - 1; leg >= 0; leg--) {
      for (let parts = 10; parts > 1; parts--) divided = subdivided(divided, member, leg, (parts - 1) / parts);
    }
    sameAs(structure, divided, 1e-8, reading => reading);
  },
  60,
);

holds('points, members, supports and loads the other way about', structures(), structure => {
  const [members, supports] = [structure.members.length, structure.supports.length];
  const back = (values: readonly number[], groups: number) => {
    const size = values.length / groups;
    return Array.from({ length: groups }, (_, group) =>
      values.slice((groups - 1 - group) * size, (groups - group) * size),
    ).flat();
  };
  sameAs(structure, reordered(structure), 1e-10, reading => ({
    along: back(reading.along, members),
    across: back(reading.across, members),
    rotation: back(reading.rotation, members),
    axial: back(reading.axial, members),
    shear: back(reading.shear, members),
    moment: back(reading.moment, members),
    reaction: back(reading.reaction, supports),
    fixing: back(reading.fixing, supports),
  }));
});

const units = fc.constantFrom(
  // Newton and millimetre, kip and inch, meganewton and kilometre.
  [1000, 1],
  [1 / 0.0254, 1 / 4448.2216152605],
  [0.001, 1e-6],
);
holds('in other units', fc.tuple(structures(), units), ([structure, [length, force]]) => {
  sameAs(structure, inUnits(structure, length!, force!), 1e-10, reading => {
    const [one, other] = [1 / length!, 1 / force!];
    return times(reading, {
      along: one,
      across: one,
      axial: other,
      shear: other,
      moment: one * other,
      reaction: other,
      fixing: one * other,
    });
  });
});
