// Which structures can move without strain, and how that is told: decided by geometry alone, whatever the stiffnesses,
// units, size and orientation.

import { describe, expect, it } from 'vitest';
import { analyse, MAX_MECHANISMS } from '../../src/mechanics/index.ts';
import { alongX, alongY, build, type Description, fixed, pinned, roller, rollerOn, turning } from './building.ts';

const stability = (description: Description) => analyse(build(description)).stability;

/** Mechanisms with names for indices, and movements rounded. */
const told = (description: Description) => {
  const structure = build(description);
  const analysis = analyse(structure);
  expect(analysis.stability.stable).toBe(analysis.stability.mechanisms.length === 0);
  if (!analysis.stability.stable) expect(analysis.cases).toEqual([]);
  return analysis.stability.mechanisms.map(({ kind, movements, points, members, turning: turned }) => ({
    kind,
    points: points.map(p => structure.points[p]!.name).join(' '),
    moves: points.map(p => [...movements.subarray(2 * p, 2 * p + 2)].map(value => Number(value.toFixed(9)))),
    members: members.map(m => structure.members[m]!.name),
    turning: turned.map(p => structure.points[p]!.name).join(' '),
  }));
};

const portal: Description = {
  points: { A: [0, 0], B: [0, 3], C: [4, 3], D: [4, 0] },
  members: ['A B', 'B C', 'C D'],
  section: { EI: 1e6, EA: 1e8 },
  cases: [[{ on: 'B C', w: 100 }]],
};

describe('rigid bodies', () => {
  it('a portal on two rollers moves level', () => {
    expect(told({ ...portal, supports: { A: roller, D: roller } })).toEqual([
      {
        kind: 'rigid-body',
        points: 'A B C D',
        moves: [
          [1, 0],
          [1, 0],
          [1, 0],
          [1, 0],
        ],
        members: ['A B', 'B C', 'C D'],
        turning: '',
      },
    ]);
  });

  it('a beam on one pin turns about it', () => {
    expect(
      told({ points: { A: [0, 0], B: [4, 0] }, members: ['A B'], section: { EI: 1 }, supports: { A: pinned } }),
    ).toEqual([{ kind: 'rigid-body', points: 'B', moves: [[0, -1]], members: ['A B'], turning: 'A' }]);
  });

  it('a floating beam moves level, upright, and turns', () => {
    const found = told({ points: { A: [0, 0], B: [4, 0] }, members: ['A B'], section: { EI: 1, EA: 1 } });
    expect(found.map(m => m.kind)).toEqual(['rigid-body', 'rigid-body', 'rigid-body']);
    expect(found.map(m => m.moves)).toEqual([
      [
        [1, 0],
        [1, 0],
      ],
      [
        [0, -1],
        [0, -1],
      ],
      [
        [0, -1],
        [0, 1],
      ],
    ]);
  });

  it('three rollers whose normals meet in one point let it turn about that', () => {
    // Normals through (2, 2): from A level, from B upright, from C at 45°.
    const found = told({
      points: { A: [0, 2], B: [2, 0], C: [4, 4], D: [4, 2] },
      members: ['A D', 'B D', 'C D'],
      section: { EI: 1e3, EA: 1e5 },
      supports: { A: [alongX()], B: [alongY()], C: rollerOn(-Math.PI / 4) },
    });
    expect(found).toHaveLength(1);
    expect(found[0]!.kind).toBe('rigid-body');
    expect(found[0]!.points).toBe('A B C D');
  });

  it('a part that is joined to nothing else is told alone', () => {
    const found = told({
      points: { A: [0, 0], B: [4, 0], C: [6, 0], D: [9, 0] },
      members: ['A B', 'C D'],
      section: { EI: 1, EA: 1 },
      supports: { A: fixed, C: pinned },
    });
    expect(found).toEqual([{ kind: 'rigid-body', points: 'D', moves: [[0, -1]], members: ['C D'], turning: 'C' }]);
  });

  it('a fixed support behind a hinge does not keep a member from turning', () => {
    expect(
      told({
        points: { A: [0, 0], B: [4, 0] },
        members: ['A B'],
        section: { EI: 1 },
        hinges: ['A'],
        supports: { A: fixed },
      }),
    ).toEqual([{ kind: 'rigid-body', points: 'B', moves: [[0, -1]], members: ['A B'], turning: 'A' }]);
  });
});

describe('mechanisms', () => {
  it('posts hinged at both ends let the beam sway', () => {
    expect(told({ ...portal, hinges: ['B', 'C'], supports: { A: pinned, D: pinned } })).toEqual([
      {
        kind: 'mechanism',
        points: 'B C',
        moves: [
          [1, 0],
          [1, 0],
        ],
        members: ['A B', 'B C', 'C D'],
        turning: 'A D',
      },
    ]);
  });

  it('each storey sways on its own', () => {
    const found = told({
      points: { A: [0, 0], B: [4, 0], C: [0, 3], D: [4, 3], E: [0, 6], F: [4, 6] },
      members: ['C D', 'E F'],
      bars: ['A C', 'B D', 'C E', 'D F'],
      section: { EI: 1, EA: 1 },
      supports: { A: pinned, B: pinned },
    });
    expect(found.map(m => m.points).sort()).toEqual(['C D', 'E F']);
    expect(found.every(m => m.kind === 'mechanism')).toBe(true);
  });

  it('a truss panel without its brace', () => {
    const braced: Description = {
      points: { A: [0, 0], B: [2, 0], C: [4, 0], D: [0, 2], E: [2, 2], F: [4, 2] },
      bars: ['A B', 'B C', 'D E', 'E F', 'A D', 'B E', 'C F', 'A E', 'B F'],
      section: { EA: 1 },
      supports: { A: pinned, C: roller },
    };
    expect(told(braced)).toEqual([]);
    const [found, ...others] = told({ ...braced, bars: braced.bars!.filter(bar => bar !== 'B F') });
    expect(others).toEqual([]);
    expect(found!.kind).toBe('mechanism');
    expect(found!.points).toContain('F');
  });

  it('three hinges on one line', () => {
    const arch = (rise: number): Description => ({
      points: { A: [0, 0], B: [3, rise], C: [6, 0] },
      members: ['A B', 'B C'],
      section: { EI: 1e3, EA: 1e5 },
      hinges: ['B'],
      supports: { A: pinned, C: pinned },
    });
    expect(told(arch(0))).toEqual([
      { kind: 'mechanism', points: 'B', moves: [[0, -1]], members: ['A B', 'B C'], turning: 'A C' },
    ]);
    // A millionth of the span is a very soft arch, not a mechanism.
    expect(told(arch(6e-6))).toEqual([]);
  });

  it('hinges on one inclined line, coordinates rounded', () => {
    const d = 1 / 3;
    expect(
      told({
        points: { A: [0, 0], B: [Math.SQRT2 * d, Math.sqrt(5) * d], C: [Math.SQRT2, Math.sqrt(5)] },
        bars: ['A B', 'B C'],
        section: { EA: 1e5 },
        supports: { A: pinned, C: pinned },
      }),
    ).toHaveLength(1);
  });

  it('two upright bars in line whose directions are rounded differently', () => {
    expect(
      told({
        points: { A: [0.1, 0], B: [0.1 + 3 * Math.cos(Math.PI / 2), 3], C: [0.1 - 2e-16, 5] },
        bars: ['A B', 'B C'],
        section: { EA: 1e5 },
        supports: { A: pinned, C: pinned },
      }),
    ).toEqual([{ kind: 'mechanism', points: 'B', moves: [[1, 0]], members: ['A B', 'B C'], turning: '' }]);
  });

  it('two hinges in one span, axially stiff', () => {
    const [found] = told({
      points: { A: [0, 0], B: [2, 0], C: [5, 0], D: [7, 0] },
      members: ['A B C D'],
      section: { EI: 1 },
      hinges: ['B', 'C'],
      supports: { A: pinned, D: fixed },
    });
    expect(found).toEqual({
      kind: 'mechanism',
      points: 'B',
      moves: [[0, -1]],
      members: ['A B C D'],
      turning: 'A C',
    });
  });

  it('a couple on a joint that nothing keeps from turning', () => {
    expect(
      told({
        points: { A: [0, 0], B: [4, 0], C: [2, 2] },
        bars: ['A B', 'B C', 'C A'],
        section: { EA: 1 },
        supports: { A: pinned, B: roller },
        cases: [[{ at: 'C', couple: 5 }]],
      }),
    ).toEqual([{ kind: 'mechanism', points: '', moves: [], members: [], turning: 'C' }]);
  });

  it('a load on a point that no member meets', () => {
    const found = told({
      points: { A: [0, 0], B: [4, 0], C: [2, 2] },
      members: ['A B'],
      section: { EI: 1 },
      supports: { A: fixed },
      cases: [[{ at: 'C', y: -5 }]],
    });
    expect(found.map(m => m.points)).toEqual(['C', 'C']);
  });

  it('a rigid body that is free as well is told apart', () => {
    const found = told({
      points: { A: [0, 0], B: [3, 0], C: [6, 0] },
      members: ['A B', 'B C'],
      section: { EI: 1, EA: 1 },
      hinges: ['B'],
      supports: { A: roller, B: roller, C: roller },
    });
    expect(found.map(m => m.kind)).toEqual(['rigid-body']);
    const floating = told({
      points: { A: [0, 0], B: [3, 0], C: [6, 0] },
      members: ['A B', 'B C'],
      section: { EI: 1, EA: 1 },
      hinges: ['B'],
    });
    expect(floating.map(m => m.kind)).toEqual(['rigid-body', 'rigid-body', 'rigid-body', 'mechanism']);
    // The first leg stays where it is.
    expect(floating[3]).toMatchObject({ points: 'C', members: ['B C'], turning: 'B' });
  });

  it('more than can be told are cut off', () => {
    const points: Record<string, readonly [number, number]> = {};
    for (let k = 0; k < 400; k++) points[`P${k}`] = [k % 20, Math.floor(k / 20)];
    const names = Object.keys(points);
    const members = names.filter((_, k) => k % 2 === 0).map((name, k) => `${name} ${names[2 * k + 1]}`);
    const { stable, mechanisms } = stability({ points, members, section: { EI: 1, EA: 1 } });
    expect(stable).toBe(false);
    expect(mechanisms).toHaveLength(MAX_MECHANISMS);
  });
});

describe('stable structures', () => {
  const soft = 1e-12;

  it('a beam on springs softer than itself by a million million', () => {
    const beam: Description = {
      points: { A: [0, 0], B: [2, 0], C: [4, 0] },
      members: ['A B C'],
      section: { EI: 1e6, EA: 1e8 },
      supports: { A: [alongX(1e6 * soft), alongY(1e6 * soft)], C: [alongY(1e6 * soft)] },
      cases: [[{ at: 'B', y: -1 }]],
    };
    const analysis = analyse(build(beam));
    expect(analysis.stability.stable).toBe(true);
    const [solution] = analysis.cases;
    expect(solution!.residual).toBeLessThan(1e-10);
    expect(solution!.reactions[0]!.y).toBeCloseTo(0.5, 9);
    expect(solution!.movements[4]! / (-0.5 / (1e6 * soft))).toBeCloseTo(1, 9);
    expect(told({ ...beam, supports: { A: pinned } })).toHaveLength(1);
  });

  it('frames of stiff and soft members', () => {
    for (const stiff of [1e3, 1e6, 1e9, 1e12]) {
      const mixed: Description = {
        ...portal,
        sections: { 'B C': { EI: 1e6 * stiff, EA: 1e8 * stiff } },
        supports: { A: pinned, D: pinned },
        cases: [[{ at: 'B', x: 100 }]],
      };
      const { stability: found, cases } = analyse(build(mixed));
      expect(found.stable).toBe(true);
      expect(cases[0]!.residual).toBeLessThan(1e-11);
      expect(told({ ...mixed, hinges: ['B', 'C'] })).toHaveLength(1);
    }
  });

  it('in millimetres or kilometres, upright or leaning, near the origin or far from it', () => {
    for (const scale of [1e-3, 1, 1e3]) {
      for (const angle of [0, 0.3, 2]) {
        for (const offset of [0, 1000]) {
          const place = ([x, y]: readonly [number, number]): readonly [number, number] => [
            scale * (offset + x * Math.cos(angle) - y * Math.sin(angle)),
            scale * (offset + x * Math.sin(angle) + y * Math.cos(angle)),
          ];
          const points = Object.fromEntries(Object.entries(portal.points).map(([name, at]) => [name, place(at)]));
          const at = { ...portal, points, cases: [], section: { EI: 1e6, EA: 1e8 / scale ** 2 } };
          expect(told({ ...at, supports: { A: pinned, D: pinned } })).toEqual([]);
          expect(told({ ...at, supports: { A: rollerOn(angle), D: rollerOn(angle) } })).toHaveLength(1);
          expect(told({ ...at, hinges: ['B', 'C'], supports: { A: pinned, D: pinned } })).toHaveLength(1);
          expect(told({ ...at, hinges: ['B', 'C'], supports: { A: fixed, D: pinned } })).toEqual([]);
          expect(
            told({ ...at, section: { EI: 1 }, hinges: ['B', 'C'], supports: { A: pinned, D: pinned } }),
          ).toHaveLength(1);
        }
      }
    }
  });

  it('a long chain of short legs is soft, not loose', () => {
    const chain = (legs: number, supports: Description['supports']): Description => {
      const points: Record<string, readonly [number, number]> = {};
      for (let k = 0; k <= legs; k++) points[`P${k}`] = [(30 * k) / legs, 0];
      return { points, members: [Object.keys(points).join(' ')], section: { EI: 1e6, EA: 1e9 }, supports: supports! };
    };
    for (const legs of [10, 300, 2000]) {
      expect(told(chain(legs, { P0: fixed }))).toEqual([]);
      const [found, ...others] = told(chain(legs, { P0: pinned }));
      expect(others).toEqual([]);
      expect(found!.kind).toBe('rigid-body');
    }
  });

  it('without a freedom left', () => {
    const analysis = analyse(
      build({
        points: { A: [0, 0], B: [4, 0] },
        members: ['A B'],
        section: { EI: 1 },
        supports: { A: fixed, B: [...pinned, turning()] },
        cases: [[{ on: 'A B', w: 1 }]],
      }),
    );
    expect(analysis.stability).toEqual({ stable: true, mechanisms: [], condition: 1 });
    expect(analysis.redundancy).toBe(3);
    expect(analysis.cases[0]!.reactions[0]!.y).toBe(2);
  });
});

describe('redundancy', () => {
  const of = (description: Description) => analyse(build(description)).redundancy;

  it('of a portal by its feet and hinges', () => {
    expect(of({ ...portal, supports: { A: fixed, D: fixed } })).toBe(3);
    expect(of({ ...portal, supports: { A: pinned, D: pinned } })).toBe(1);
    expect(of({ ...portal, supports: { A: pinned, D: roller } })).toBe(0);
    expect(of({ ...portal, hinges: ['B in B C'], supports: { A: pinned, D: pinned } })).toBe(0);
    expect(of({ ...portal, section: { EI: 1 }, supports: { A: fixed, D: fixed } })).toBe(3);
  });

  it('counts springs and bars', () => {
    expect(of({ ...portal, bars: ['A C'], supports: { A: fixed, D: fixed } })).toBe(4);
    expect(of({ ...portal, supports: { A: fixed, D: [alongX(5), alongY(5)] } })).toBe(2);
    expect(of({ ...portal, supports: { A: fixed, D: [...pinned, alongX(5)] } })).toBe(2);
  });

  it('does not change with points along a member', () => {
    const points = { A: [0, 0], P: [1, 0], Q: [2, 0], B: [4, 0] } as const;
    expect(of({ points, members: ['A P Q B'], section: { EI: 1 }, supports: { A: fixed, B: fixed } })).toBe(3);
  });
});
