// Properties of linear elastic structures: superposition, proportion, reciprocity and energy.
import fc from 'fast-check';
import { expect } from 'vitest';
import type { Solution } from '../../src/mechanics/solution.ts';
import { combine } from '../../src/mechanics/superposition.ts';
import type { Location, Structure } from '../../src/model/structure.ts';
import { energyOf, movementAtLocation, workOfLoads, workOnStrains } from './energy.ts';
import { expectSame, flexibilityOf, read, scalesOf, times } from './readings.ts';
import { allowed, analysed, holds } from './run.ts';
import { structures } from './structures.ts';
import { merged, stiffened, type WithoutCase, withLoads } from './transform.ts';

const factors = fc.tuple(...[1, 2, 3].map(() => fc.integer({ min: -20, max: 20 }).map(number => number / 8)));

holds('cases combine as their loads do', fc.tuple(structures(), factors), ([structure, numbers]) => {
  const analysis = analysed(structure);
  const together = merged(structure, numbers);
  const wanted = read(together, analysed(together).cases[0]!);
  expectSame(structure, read(structure, combine(analysis, numbers)), wanted, allowed(analysis, 1e-11));
});

holds(
  'loads times a factor give all results times it',
  fc.tuple(structures(), fc.constantFrom(-1, 1e-6, -1e3, 1e6)),
  ([structure, factor]) => {
    const analysis = analysed(structure);
    const more = merged(structure, [0, 0, factor]);
    const all = {
      along: factor,
      across: factor,
      rotation: factor,
      axial: factor,
      shear: factor,
      moment: factor,
      reaction: factor,
      fixing: factor,
    };
    const wanted = times(read(structure, analysis.cases[2]!), all);
    expectSame(more, read(more, analysed(more).cases[0]!), wanted, allowed(analysis, 1e-12));
  },
);

holds(
  'stiffness times a factor: movements through it, forces as before',
  fc.tuple(structures({ forcesOnly: true }), fc.constantFrom(0.5, 3, 1e4)),
  ([structure, factor]) => {
    const analysis = analysed(structure);
    const stiff = stiffened(structure, factor);
    const inverse = 1 / factor;
    for (const [index, solution] of analysed(stiff).cases.entries()) {
      const wanted = times(read(structure, analysis.cases[index]!), {
        along: inverse,
        across: inverse,
        rotation: inverse,
      });
      expectSame(stiff, read(stiff, solution), wanted, allowed(analysis, 1e-10));
    }
  },
);

const actions = fc.record({
  member: fc.nat(99),
  place: fc.integer({ min: 1, max: 28 }),
  kind: fc.constantFrom('x', 'y', 'turn'),
});

holds(
  'Maxwell: the movement here of a unit action there is that there of one here',
  fc.tuple(structures(), actions, actions),
  ([structure, one, other]) => {
    const [first, second] = [unitAction(structure, one), unitAction(structure, other)];
    const unit = withLoads(structure, [[first.load], [second.load]]);
    const analysis = analysed(unit);
    const [underFirst, underSecond] = analysis.cases;
    const movement = ({ at, kind }: UnitAction, solution = underFirst!) => movementAtLocation(unit, solution, at)[kind];
    const scale = Math.max(scaleOf(unit, underSecond!, first.kind), scaleOf(unit, underFirst!, second.kind));
    const difference = movement(first, underSecond) - movement(second, underFirst);
    expect(Math.abs(difference) / scale).toBeLessThanOrEqual(allowed(analysis, 1e-11));
  },
);

holds(
  'Betti: one set of loads works on the movements of another as that on its own',
  structures({ forcesOnly: true }),
  structure => {
    const analysis = analysed(structure);
    const [first, second] = analysis.cases;
    const [here, there] = [workOfLoads(structure, 0, second!), workOfLoads(structure, 1, first!)];
    const own = Math.abs(workOfLoads(structure, 0, first!).value * workOfLoads(structure, 1, second!).value);
    const scale = Math.max(Math.sqrt(own), here.size, there.size, leastWork(structure, first!, second!));
    expect(Math.abs(here.value - there.value) / scale).toBeLessThanOrEqual(allowed(analysis, 1e-10));
  },
);

holds(
  'Maysel: loads work on the movements of heat and misfits as their forces do on the strains',
  structures(),
  structure => {
    const bare = structure.loads.filter(({ kind }) => kind !== 'movement' && kind !== 'heat' && kind !== 'lengthen');
    const strains = structure.loads.filter(({ kind }) => kind === 'heat' || kind === 'lengthen');
    const apart = withLoads(structure, [bare, strains]);
    const analysis = analysed(apart);
    const [forces, strained] = analysis.cases;
    const work = workOfLoads(apart, 0, strained!);
    const scale = Math.max(work.size, leastWork(apart, forces!, strained!));
    const difference = work.value - workOnStrains(apart, 1, forces!);
    expect(Math.abs(difference) / scale).toBeLessThanOrEqual(allowed(analysis, 1e-10));
  },
);

holds('Clapeyron: the loads and the ground work as much as the members and springs store', structures(), structure => {
  const analysis = analysed(structure);
  for (const [index, solution] of analysis.cases.entries()) {
    const { loads, ground, strains, stored } = energyOf(structure, index, solution);
    const scale = Math.max(
      loads.size,
      Math.abs(ground),
      Math.abs(strains),
      stored,
      leastWork(structure, solution, solution),
    );
    expect(Math.abs(loads.value + ground - strains - stored) / scale).toBeLessThanOrEqual(allowed(analysis, 1e-10));
  }
});

function scaleOf(structure: Structure, solution: Solution, kind: UnitAction['kind']): number {
  return scalesOf(structure, read(structure, solution))[kind === 'turn' ? 'rotation' : 'movement'];
}

/** What forces like these do on the stiffest leg: a scale where no work is done at all. */
function leastWork(structure: Structure, one: Solution, other: Solution): number {
  const force = (solution: Solution) => scalesOf(structure, read(structure, solution)).force;
  return Math.max(force(one) * force(other) * flexibilityOf(structure), Number.MIN_VALUE);
}

interface UnitAction {
  readonly at: Location;
  readonly kind: 'x' | 'y' | 'turn';
  readonly load: WithoutCase;
}

/** On a member anywhere; on bars, which carry loads at their points only, a force there. */
function unitAction(
  structure: Structure,
  drawn: { member: number; place: number; kind: UnitAction['kind'] },
): UnitAction {
  const bending = structure.members.flatMap((candidate, index) => (candidate.kind === 'member' ? [index] : []));
  const member = bending[drawn.member % bending.length];
  const at: Location =
    member === undefined
      ? { kind: 'point', point: drawn.place % structure.points.length }
      : { kind: 'along', member, distance: (drawn.place / 29) * structure.members[member]!.length };
  const kind = member === undefined && drawn.kind === 'turn' ? 'x' : drawn.kind;
  const load: WithoutCase =
    kind === 'turn'
      ? { kind: 'couple', moment: 1, at }
      : { kind: 'force', x: kind === 'x' ? 1 : 0, y: kind === 'y' ? 1 : 0, at };
  return { at, kind, load };
}
