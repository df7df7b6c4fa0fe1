// The force method's own figures (redundants, forces, what it refuses), against formulas and against itself with another
// primary structure.
import { describe, expect, test } from 'vitest';
import type { Structure } from '../../src/model/structure.ts';
import {
  type ForceMethod,
  type ForceState,
  forcesOfUnit,
  givenForces,
  internalForces,
  largestGap,
  movement,
  movementFromForces,
  movementOf,
  prepare,
  primaryStructure,
  stiffestFromTheGround,
  unknownForce,
  virtualSystem,
  withLeastThrusts,
} from '../../src/virtual-work/index.ts';
import { valueAt } from '../../src/virtual-work/polynomial.ts';
import type { Statics } from '../../src/virtual-work/statics.ts';
import { at, build, HELD, type Sketch } from './build.ts';
import { frame, girder } from './large.ts';

const EI = 4.2e6;
const EA = 6.8e8;
const w = 2.4e3;
const P = 5.5e3;

const down = (structure: Structure, place: string) => [{ at: at(structure, place), x: 0, y: -1, moment: 0 }];
const ones = (structure: Structure) => structure.cases.map(() => 1);

/** Axial force and bending moment at a place, all cases together. */
function forcesAt(forceMethod: ForceMethod, place: string): [axial: number, moment: number] {
  const { statics } = forceMethod.primary;
  const { structure } = statics;
  const response = forceMethod.respond(forceMethod.loading(ones(structure)));
  const state = withLeastThrusts(statics, response.final, forceMethod.undeterminedStates);
  const location = at(structure, place);
  if (location.kind !== 'along') throw new Error('a distance along a member is needed');
  const { pieces } = internalForces(statics, state).members[location.member]!;
  const piece = pieces.find(candidate => candidate.end >= location.distance)!;
  const distance = location.distance - piece.start;
  return [valueAt(piece.axialForce, distance), valueAt(piece.bendingMoment, distance)];
}

describe('redundants', () => {
  test('of two spans: the moment over the middle support', () => {
    const structure = build({
      points: { A: [0, 0], B: [5, 0], C: [9, 0] },
      members: { R: { chain: 'A B C', EI } },
      supports: { A: 'pinned', B: 'roller', C: 'roller' },
      loads: { all: [{ line: 'R', size: w }] },
    });
    const forceMethod = prepare(structure)!;
    const [state] = forceMethod.unitStates;
    expect(unknownForce(forceMethod.primary.statics, state!.redundant)).toMatchObject({ kind: 'moment', point: 1 });
    // Three-moment equation, and the flexibility of two simple spans against a couple on each.
    expect(forceMethod.case(0).redundants[0]! / ((-w * (5 ** 3 + 4 ** 3)) / (8 * 9))).toBeCloseTo(1, 12);
    expect(forceMethod.flexibility[0]! / (9 / (3 * EI))).toBeCloseTo(1, 12);
    expect(forceMethod.case(0).gaps[0]! / ((w * (5 ** 3 + 4 ** 3)) / (24 * EI))).toBeCloseTo(1, 12);
  });

  test('of a propped cantilever on a soft spring: its moment at the wall, so that the spring keeps its digits', () => {
    const k = 1e-6;
    const structure = build({
      points: { A: [0, 0], B: [5, 0] },
      members: { R: { chain: 'A B', EI } },
      supports: { A: 'fixed', B: { y: k } },
      loads: { all: [{ force: [0, -P], at: 'B' }] },
    });
    const forceMethod = prepare(structure)!;
    const tip = (P * 5 ** 3) / (3 * EI);
    expect(movement(forceMethod, [1], down(structure, 'B')) / (tip / (1 + (k * 5 ** 3) / (3 * EI)))).toBeCloseTo(1, 13);
    const [state] = forceMethod.unitStates;
    expect(unknownForce(forceMethod.primary.statics, state!.redundant).kind).toBe('reaction');
  });
});

describe('what a working shows', () => {
  test('another choice of redundant: the thrust at a foot, with M₀, m₁ and m as polynomials', () => {
    const [h, L, H] = [3.4, 6, 9.2e3];
    const structure = build({
      points: { A: [0, 0], B: [0, h], C: [L, h], D: [L, 0] },
      members: { P: { chain: 'A B', EI }, G: { chain: 'B C', EI: 2 * EI }, Q: { chain: 'C D', EI } },
      supports: { A: 'pinned', D: 'pinned' },
      loads: {
        all: [
          { line: 'G', size: w },
          { force: [H, 0], at: 'B' },
        ],
      },
    });
    const thrust = (statics: Statics) =>
      statics.firstReaction + statics.grounds.findIndex(({ point, x }) => point === 3 && x === 1);
    const forceMethod = prepare(structure, statics => {
      const freed = thrust(statics);
      return [...stiffestFromTheGround(statics).map(group => group.filter(unknown => unknown !== freed)), [freed]];
    })!;
    const { statics } = forceMethod.primary;
    const [state] = forceMethod.unitStates;
    expect(unknownForce(statics, state!.redundant)).toMatchObject({ kind: 'reaction', ground: { point: 3, x: 1 } });

    // D rolls; its thrust is to the right here. Origins at the starts of P (from A), G (from B) and Q (from C).
    const D0 = (H * h) / L + (w * L) / 2;
    const moments = (forces: ForceState) =>
      internalForces(statics, forces).members.map(({ pieces }) => pieces[0]!.bendingMoment);
    near(
      moments(forceMethod.case(0).primary),
      [
        [0, H],
        [H * h, w * L - D0, -w / 2],
        [0, 0],
      ],
      H * h,
    );
    near(
      moments(forcesOfUnit(statics, state!)),
      [
        [0, 1],
        [h, 0],
        [h, -1],
      ],
      h,
    );
    const virtual = virtualSystem(forceMethod.primary, [{ at: at(structure, 'B'), x: 1, y: 0, moment: 0 }]);
    near(
      moments(virtual),
      [
        [0, 1],
        [h, -h / L],
        [0, 0],
      ],
      h,
    );

    const k = (2 * h) / L;
    const inwards = H / 2 + (w * L ** 2) / (4 * h * (2 * k + 3));
    expect(forceMethod.case(0).redundants[0]! / -inwards).toBeCloseTo(1, 12);
  });
});

function near(found: readonly (readonly number[])[], wanted: readonly (readonly number[])[], scale: number): void {
  for (const [member, polynomial] of wanted.entries()) {
    for (let power = 0; power < Math.max(found[member]!.length, polynomial.length); power++) {
      const difference = (found[member]![power] ?? 0) - (polynomial[power] ?? 0);
      expect(Math.abs(difference), `member ${member}, power ${power}`).toBeLessThanOrEqual(1e-12 * scale);
    }
  }
}

describe('internal forces', () => {
  test('fixed beam under a load that grows along it', () => {
    const structure = build({
      points: { A: [0, 0], B: [6, 0] },
      members: { R: { chain: 'A B', EI } },
      supports: { A: 'fixed', B: 'fixed' },
      loads: { all: [{ line: 'R', size: [0, w] }] },
    });
    const forceMethod = prepare(structure)!;
    expect(forcesAt(forceMethod, '0 R')[1] / ((-w * 36) / 30)).toBeCloseTo(1, 12);
    expect(forcesAt(forceMethod, '6 R')[1] / ((-w * 36) / 20)).toBeCloseTo(1, 12);
  });

  test('portal on pinned feet under a load on its beam: thrust and knee moment', () => {
    const structure = build({
      points: { A: [0, 0], B: [0, 3.4], C: [6, 3.4], D: [6, 0] },
      members: { P: { chain: 'A B', EI }, G: { chain: 'B C', EI: 2 * EI }, Q: { chain: 'C D', EI } },
      supports: { A: 'pinned', D: 'pinned' },
      loads: { all: [{ line: 'G', size: w }] },
    });
    const forceMethod = prepare(structure)!;
    const k = (2 * 3.4) / 6;
    const knee = (w * 36) / (4 * (2 * k + 3));
    expect(forcesAt(forceMethod, '0 G')[1] / -knee).toBeCloseTo(1, 12);
    expect(forcesAt(forceMethod, '0 G')[0] / (-knee / 3.4)).toBeCloseTo(1, 12);
    expect(forcesAt(forceMethod, '1 P')[0] / (-w * 3)).toBeCloseTo(1, 12);
  });

  test('axially stiff beam between two pins: a load across draws no thrust, one along is shared by length', () => {
    const structure = build({
      points: { A: [0, 0], B: [5, 0] },
      members: { R: { chain: 'A B', EI } },
      supports: { A: 'pinned', B: 'pinned' },
      loads: { across: [{ force: [0, -P], at: '2 R' }], along: [{ force: [P, 0], at: '2 R' }] },
    });
    const forceMethod = prepare(structure)!;
    expect(forceMethod.undeterminedStates).toHaveLength(1);
    expect(forcesAt(forceMethod, '1 R')[0] / ((P * 3) / 5)).toBeCloseTo(1, 12);
    expect(forcesAt(forceMethod, '4 R')[0] / ((-P * 2) / 5)).toBeCloseTo(1, 12);
    expect(movement(forceMethod, [1, 1], down(structure, '2 R')) / ((P * 4 * 9) / (3 * EI * 5))).toBeCloseTo(1, 12);
  });
});

describe('places', () => {
  test('along a bar, which stays straight and stretches evenly', () => {
    const structure = build({
      points: { A: [0, 0], B: [0, -3], C: [4, -3] },
      bars: { a: { chain: 'A B', EA }, b: { chain: 'B C', EA } },
      supports: { A: 'pinned', C: 'pinned' },
      loads: { all: [{ force: [0, -P], at: 'B' }] },
    });
    const forceMethod = prepare(structure)!;
    const drop = (P * 3) / EA;
    expect(movement(forceMethod, [1], down(structure, '1 b')) / ((drop * 3) / 4)).toBeCloseTo(1, 12);
    expect(movement(forceMethod, [1], down(structure, '1 a')) / (drop / 3)).toBeCloseTo(1, 12);
    const turn = [{ at: at(structure, 'B b'), x: 0, y: 0, moment: 1 }];
    expect(movement(forceMethod, [1], turn) / (drop / 4)).toBeCloseTo(1, 12);
  });

  test('both ends of a member that runs on over a hinge', () => {
    const structure = build({
      points: { A: [0, 0], H: [2, 0], B: [5, 0] },
      members: { R: { chain: 'A H B', EI } },
      hinges: ['H'],
      supports: { A: 'fixed', B: 'roller' },
      loads: { all: [{ force: [0, -P], at: 'H' }] },
    });
    const forceMethod = prepare(structure)!;
    const turn = (side: 'before' | 'after', place: string) =>
      movement(forceMethod, [1], [{ at: at(structure, place), x: 0, y: 0, moment: 1, side }]);
    const drop = (P * 2 ** 3) / (3 * EI);
    expect(turn('before', 'H R') / ((-P * 2 ** 2) / (2 * EI))).toBeCloseTo(1, 12);
    expect(turn('after', 'H R') / (drop / 3)).toBeCloseTo(1, 12);
    expect(turn('after', '2 R') / (drop / 3)).toBeCloseTo(1, 12);
  });

  test('sag: the movement of a place against the chord, by three actions', () => {
    const structure = build({
      points: { A: [0, 0], B: [6, 0] },
      members: { R: { chain: 'A B', EI } },
      supports: { A: 'pinned', B: { y: 1e6 } },
      loads: { all: [{ line: 'R', size: w }] },
    });
    const forceMethod = prepare(structure)!;
    const actions = [
      { at: at(structure, '3 R'), x: 0, y: -1, moment: 0 },
      { at: at(structure, 'A'), x: 0, y: 0.5, moment: 0 },
      { at: at(structure, 'B'), x: 0, y: 0.5, moment: 0 },
    ];
    expect(movement(forceMethod, [1], actions) / ((5 * w * 6 ** 4) / (384 * EI))).toBeCloseTo(1, 12);
  });
});

describe('refused', () => {
  const span: Sketch = { points: { A: [0, 0], B: [5, 0] }, members: { R: { chain: 'A B', EI } }, supports: {} };

  test.each<[string, Sketch]>([
    ['a beam on one pin', { ...span, supports: { A: 'pinned' } }],
    ['a beam on two rollers', { ...span, supports: { A: 'roller', B: 'roller' } }],
    [
      'an unbraced panel of bars',
      {
        points: { A: [0, 0], B: [3, 0], C: [3, 2], D: [0, 2] },
        bars: { a: { chain: 'A B', EA }, b: { chain: 'B C', EA }, c: { chain: 'C D', EA }, d: { chain: 'D A', EA } },
        supports: { A: 'pinned', B: 'roller' },
      },
    ],
    [
      'two bars in line',
      {
        points: { A: [0, 0], B: [3, 0], C: [6, 0] },
        bars: { a: { chain: 'A B', EA }, b: { chain: 'B C', EA } },
        supports: { A: 'pinned', C: 'pinned' },
      },
    ],
    ['a member of unknown bending stiffness', { ...span, members: { R: { chain: 'A B' } }, supports: { A: 'fixed' } }],
  ])('%s', (_, sketch) => {
    expect(prepare(build(sketch))).toBeUndefined();
  });

  test('a movement that would stretch an axially stiff beam', () => {
    const structure = build({
      ...span,
      supports: { A: 'pinned', B: 'pinned' },
      loads: { sink: [{ move: 'B', by: [0, -0.01] }], pull: [{ move: 'B', by: [0.01, 0] }] },
    });
    const forceMethod = prepare(structure)!;
    expect(movement(forceMethod, [1, 0], down(structure, '2.5 R'))).toBeCloseTo(0.005, 15);
    expect(movement(forceMethod, [1, 1], down(structure, '2.5 R'))).toBeNaN();
  });
});

describe('conditioning', () => {
  test.each<[string, Structure, string, redundants: number]>([
    ['frame of 5 bays and 5 storeys', frame(5, 5, { posts: 3e6, beams: 6e6, EA }, 'fixed'), '0/5', 75],
    ['the same, axially stiff', frame(5, 5, { posts: 3e6, beams: 6e6 }, 'fixed'), '0/5', 75],
    ['the same on pinned feet', frame(5, 5, { posts: 3e6, beams: 6e6, EA }, 'pinned'), '0/5', 69],
    ['stiff posts, beams like string', frame(3, 4, { posts: 3e12, beams: 6, EA }, 'fixed'), '0/4', 36],
    ['posts like string, stiff beams', frame(3, 4, { posts: 3, beams: 6e12, EA: 1e15 }, 'fixed'), '0/4', 36],
    ['tower of 60 storeys', frame(1, 60, { posts: 3e6, beams: 6e6, EA }, 'fixed'), '0/60', 180],
    ['girder of 24 panels', girder(24, false), 'L12', 0],
    ['girder of 24 crossed panels', girder(24, true), 'L12', 24],
  ])('%s: another primary structure gives the same movement', (_, structure, place, redundants) => {
    const actions = [{ at: at(structure, place), x: 0.6, y: -0.8, moment: 0 }];
    const forceMethod = prepare(structure)!;
    expect(forceMethod.unitStates).toHaveLength(redundants);
    const other = prepare(structure, statics => stiffestFromTheGround(statics).map(group => group.toReversed()))!;
    expect(movement(other, [1], actions) / movement(forceMethod, [1], actions)).toBeCloseTo(1, 10);
  });

  test('girder of 24 panels: a bottom bar, by turning about the point above it', () => {
    const reaction = (25 * 5e3) / 2 - (25 * 300 * 1.7) / 48;
    const loads = Array.from({ length: 13 }, (_, panel) => 5e3 * (26 - 2 * panel)).reduce((a, b) => a + b);
    const expected = (reaction * 26 - loads + 25 * 300 * 1.7) / 1.7;
    expect(forcesAt(prepare(girder(24, false))!, '1 l13')[0] / expected).toBeCloseTo(1, 12);
  });
});

describe('given forces', () => {
  const structure = build({
    points: { A: [0, 0], B: [0, 4], C: [6, 5], D: [6, 0] },
    members: {
      P: { chain: 'A B', EI, EA, mass: 40 },
      G: { chain: 'B C', EI: 2 * EI, EA, mass: 60 },
      Q: { chain: 'C D', EI, EA },
    },
    bars: { t: { chain: 'A C', EA: EA / 9 } },
    supports: { A: { x: HELD, y: HELD, rotation: 3e6 }, D: { x: 4e6, y: 7e7 } },
    loads: {
      all: [
        { selfWeight: ['P', 'G'] },
        { line: 'G', size: [w, 2 * w], from: 1, to: 4.5 },
        { force: [P, 0], at: '3 P' },
        { couple: 2 * P, at: 'C' },
        { move: 'D', by: [0.004, -0.01] },
      ],
    },
  });
  const forceMethod = prepare(structure)!;
  const primary = primaryStructure(structure)!;
  const { statics } = primary;
  const actions = [
    { at: at(structure, '2.2 G'), x: 0.3, y: -1, moment: 0 },
    { at: at(structure, 'D'), x: 0, y: 0, moment: 1 },
  ];

  test('the right ones give the same movement and leave no gap', () => {
    const given = givenForces(primary, [1], internalForces(statics, forceMethod.case(0).final));
    const wanted = movementOf(forceMethod, [1], virtualSystem(forceMethod.primary, actions)).value;
    expect(movementFromForces(primary, given, actions).value / wanted).toBeCloseTo(1, 12);
    expect(largestGap(primary, given)).toBeLessThan(1e-12);
  });

  test('forces in equilibrium that do not fit together leave a gap', () => {
    const given = givenForces(primary, [1], internalForces(statics, forceMethod.case(0).primary));
    expect(largestGap(primary, given)).toBeGreaterThan(1e-3);
  });

  test('a frame of 3,000 freedoms has its primary structure at once', () => {
    const large = frame(31, 31, { posts: 3e6, beams: 6e6, EA }, 'fixed');
    expect(prepare(large)).toBeUndefined();
    const found = primaryStructure(large)!;
    expect(found.elimination.redundants).toHaveLength(3 * 31 * 31);
  });
});
