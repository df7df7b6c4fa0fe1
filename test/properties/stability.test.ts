// Structures that can move are found, every one, and told how; those that can not are not.
import fc from 'fast-check';
import { expect } from 'vitest';
import { boundFreedoms } from '../../src/mechanics/freedoms.ts';
import { analyse, findRemedies, remedied } from '../../src/mechanics/index.ts';
import type { Structure } from '../../src/model/structure.ts';
import { primaryStructure } from '../../src/virtual-work/index.ts';
import { rotated } from './motions.ts';
import { holds } from './run.ts';
import { determinateStructures, structures } from './structures.ts';
import { inUnits } from './transform.ts';

const unloaded = (structure: Structure): Structure => ({ ...structure, loads: [] });

holds(
  'a stable structure is found stable, by both roads',
  structures(),
  structure => {
    const { stability } = analyse(unloaded(structure));
    expect(stability.stable).toBe(true);
    expect(stability.mechanisms).toEqual([]);
  },
  500,
);

// A determinate structure has nothing to spare: whatever is taken away, something can move.
holds(
  'a determinate structure without one restraint can move',
  fc.tuple(determinateStructures(), fc.nat(99)),
  ([structure, number]) => {
    const all = structure.supports.flatMap(({ restraints }, support) =>
      restraints.map((_, restraint) => ({ support, restraint })),
    );
    const gone = all[number % all.length]!;
    const supports = structure.supports.map((support, index) =>
      index === gone.support ? { ...support, restraints: support.restraints.toSpliced(gone.restraint, 1) } : support,
    );
    moves({ ...unloaded(structure), supports });
  },
  500,
);

holds(
  'a determinate structure with a member or a bar gone, or a hinge more, can move',
  fc.tuple(determinateStructures(), fc.nat(99), fc.nat(99)),
  ([structure, number, where]) => {
    const index = number % structure.members.length;
    const chosen = structure.members[index]!;
    if (chosen.kind === 'bar') {
      moves({ ...unloaded(structure), members: structure.members.toSpliced(index, 1) });
      return;
    }
    const leg = chosen.legs[where % chosen.legs.length]!;
    // A hinge that is there already, or at a free end, frees nothing.
    const point = leg.from;
    const hinged = structure.hinges.some(hinge => hinge.point === point);
    const carried = structure.members.filter(({ legs }) => legs.some(({ from, to }) => from === point || to === point));
    const turns = structure.supports.some(
      support => support.point === point && support.restraints.some(({ freedom }) => freedom.kind === 'rotation'),
    );
    const ends = carried.flatMap(({ legs }) => legs).filter(({ from, to }) => from === point || to === point).length;
    if (hinged || (ends < 2 && !turns)) return;
    moves({ ...unloaded(structure), hinges: [...structure.hinges, { point, member: index, range: structure.range }] });
  },
  500,
);

holds(
  'what is offered to hold it does, by both roads',
  fc.tuple(determinateStructures(), fc.nat(99)),
  ([structure, number]) => {
    const index = number % structure.supports.length;
    const supports = structure.supports.map((support, k) =>
      k === index ? { ...support, restraints: support.restraints.slice(1) } : support,
    );
    const free = { ...unloaded(structure), supports };
    const remedies = findRemedies(free, analyse(free).stability.mechanisms);
    // Holding again what was held is among the candidates, in one way or another.
    expect(remedies.length > 0 || boundFreedoms(free) > 300).toBe(true);
    for (const changes of remedies) {
      const held = changes.reduce(remedied, free);
      expect(analyse(held).stability.stable).toBe(true);
      expect(primaryStructure(held)).toBeDefined();
    }
  },
);

holds(
  'however it lies and in whatever units',
  fc.tuple(determinateStructures(), fc.constantFrom(1e-6, 1, 1e6), fc.integer({ min: -31, max: 31 })),
  ([structure, length, tenths]) => {
    const other = rotated(inUnits(unloaded(structure), length, 1e3), tenths / 10);
    expect(analyse(other).stability.stable).toBe(true);
    const first = other.supports[0]!;
    moves({ ...other, supports: [{ ...first, restraints: first.restraints.slice(1) }, ...other.supports.slice(1)] });
  },
);

/** Found unstable on both roads, in a movement that no restraint resists and that keeps the length of every leg. */
function moves(structure: Structure): void {
  expect(primaryStructure(structure)).toBeUndefined();
  const { stability } = analyse(structure);
  expect(stability.stable).toBe(false);
  expect(stability.mechanisms.length).toBeGreaterThan(0);
  for (const { movements, turning, points, members } of stability.mechanisms) {
    expect(points.length + turning.length + members.length).toBeGreaterThan(0);
    const largest = movements.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
    for (const { legs } of structure.members) {
      for (const { from, to, cosine, sine } of legs) {
        const along =
          cosine * (movements[2 * to]! - movements[2 * from]!) +
          sine * (movements[2 * to + 1]! - movements[2 * from + 1]!);
        expect(Math.abs(along)).toBeLessThanOrEqual(1e-8 * largest);
      }
    }
    for (const { point, restraints } of structure.supports) {
      for (const { freedom } of restraints) {
        if (freedom.kind === 'rotation') continue;
        const moved = freedom.x * movements[2 * point]! + freedom.y * movements[2 * point + 1]!;
        expect(Math.abs(moved)).toBeLessThanOrEqual(1e-8 * largest);
      }
    }
  }
}
