// Measures: places, sides, stretches, groups, and which of several values is the answer.

import { describe, expect, it } from 'vitest';
import { analyse, combine, fieldAt, measure, movementAt } from '../../src/mechanics/index.ts';
import type { MemberStretch, ResolvedMeasure, Seek } from '../../src/model/question.ts';
import { build, type Description, fixed, member, pinned, point, roller } from './building.ts';
import { close, solve } from './reading.ts';

const asked = (description: Description, measureOf: ResolvedMeasure, seek: Seek = 'size') => {
  const structure = build(description);
  const analysis = analyse(structure);
  const solution = combine(
    analysis,
    structure.cases.map(() => 1),
  );
  return measure(structure, solution, measureOf, seek);
};

const L = 5.2;
const EI = 2.9e6;
const w = 3300;

const simple: Description = {
  points: { A: [0, 0], B: [L, 0] },
  members: ['A B'],
  section: { EI, A: 0.01, W: 4e-4 },
  supports: { A: pinned, B: roller },
  cases: [[{ on: 'A B', w }]],
};

describe('the value sought', () => {
  const at = (kind: 'moment' | 'shear' | 'rotation' | 'sagging' | 'hogging', seek: Seek, stretch?: MemberStretch) =>
    asked(simple, stretch === undefined ? { kind, along: [0] } : { kind, along: [0], stretch }, seek);

  it('among equals is the first along the member', () => {
    expect(at('shear', 'size').value).toBeGreaterThan(0);
    expect(at('shear', 'size').place).toEqual({ member: 0, distance: 0 });
    expect(at('rotation', 'size').place!.distance).toBe(0);
    expect(at('moment', 'least').place!.distance).toBe(0);
  });

  it('with its sign', () => {
    close(at('shear', 'greatest').value, (w * L) / 2);
    close(at('shear', 'least').value, (-w * L) / 2);
    expect(at('shear', 'least').place!.distance).toBe(L);
  });

  it('of a kind is never negative', () => {
    expect(at('hogging', 'size').value).toBe(0);
    expect(at('sagging', 'least').value).toBe(0);
    close(at('sagging', 'least', { start: 1, end: 2 }).value, (w * 1 * (L - 1)) / 2);
  });

  it('within a stretch', () => {
    const right = at('moment', 'size', { start: 3, end: 4 });
    close(right.value, (w * 3 * (L - 3)) / 2);
    expect(right.place).toEqual({ member: 0, distance: 3 });
  });
});

describe('sides of a jump', () => {
  const loaded: Description = {
    ...simple,
    points: { A: [0, 0], P: [2, 0], B: [L, 0] },
    members: ['A P B'],
    cases: [
      [
        { at: 'P', y: -1000 },
        { at: { member: 'A P B', distance: 2 }, couple: -700 },
      ],
    ],
  };
  const V = (1000 * (L - 2)) / L - 700 / L;

  it('both are told, and the larger is the answer', () => {
    const shear = asked(loaded, { kind: 'shear', at: { kind: 'along', member: 0, distance: 2 } });
    close(shear.sides![0], V);
    close(shear.sides![1], V - 1000);
    close(shear.value, V - 1000 < -V ? V - 1000 : V);
    const moment = asked(loaded, { kind: 'moment', along: [0] }, 'greatest');
    close(moment.sides![0], V * 2);
    close(moment.sides![1], V * 2 + 700);
    close(moment.value, V * 2 + 700);
    expect(moment.place!.distance).toBe(2);
  });

  it('the one that is sought', () => {
    const place = { kind: 'along', member: 0, distance: 2 } as const;
    close(asked(loaded, { kind: 'moment', at: place }, 'least').value, V * 2);
    close(asked(loaded, { kind: 'moment', at: place }, 'greatest').value, V * 2 + 700);
  });

  it('there are none where nothing jumps, nor at the ends', () => {
    expect(asked(loaded, { kind: 'moment', at: { kind: 'along', member: 0, distance: 1 } }).sides).toBeUndefined();
    expect(asked(loaded, { kind: 'shear', at: { kind: 'along', member: 0, distance: 0 } }).sides).toBeUndefined();
    expect(asked(loaded, { kind: 'deflection', at: { kind: 'along', member: 0, distance: 2 } }).sides).toBeUndefined();
  });

  it('the rotation jumps at a hinge', () => {
    const hinged: Description = {
      points: { A: [0, 0], H: [2, 0], B: [L, 0] },
      members: ['A H B'],
      section: { EI },
      hinges: ['H'],
      supports: { A: fixed, B: roller },
      cases: [[{ at: 'H', y: -500 }]],
    };
    const before = (-500 * 4) / (2 * EI);
    const after = (500 * 8) / (3 * EI) / (L - 2);
    for (const at of [
      { kind: 'along', member: 0, distance: 2 },
      { kind: 'point', point: 1 },
      { kind: 'point', point: 1, member: 0 },
    ] as const) {
      const rotation = asked(hinged, { kind: 'rotation', at });
      close(rotation.sides![0], before);
      close(rotation.sides![1], after);
      close(rotation.value, Math.abs(before) > after ? before : after);
    }
  });
});

describe('sag', () => {
  const overhang: Description = {
    points: { A: [0, 0], B: [L, 0], C: [L + 2, 0] },
    members: ['A B C'],
    section: { EI },
    supports: { A: pinned, B: roller },
    cases: [
      [
        { on: 'A B C', w, to: L },
        { move: 'B', y: -0.02 },
      ],
    ],
  };

  it('does not count what the ends of the stretch move', () => {
    const sag = asked(overhang, { kind: 'sag', along: [0], stretch: { start: 0, end: L }, reversed: false });
    close(sag.value, (5 * w * L ** 4) / (384 * EI));
    close(sag.place!.distance, L / 2);
  });

  it('turns its sign with the way it is read', () => {
    const sag = asked(overhang, { kind: 'sag', along: [0], stretch: { start: 0, end: L }, reversed: true });
    close(sag.value, (-5 * w * L ** 4) / (384 * EI));
  });

  it('of a straight overhang is nil', () => {
    expect(asked(overhang, { kind: 'sag', along: [0], stretch: { start: L, end: L + 2 }, reversed: false }).value).toBe(
      0,
    );
  });

  it('is square to an inclined member, towards its underside', () => {
    const rafter: Description = {
      points: { A: [0, 0], B: [4, 3] },
      members: ['A B'],
      section: { EI, EA: 1e8 },
      supports: { A: pinned, B: pinned },
      cases: [[{ on: 'A B', w: 1000 }]],
    };
    close(asked(rafter, { kind: 'sag', along: [0], reversed: false }).value, (5 * 800 * 5 ** 4) / (384 * EI));
    const back: Description = { ...rafter, members: ['B A'], cases: [[{ on: 'B A', w: 1000 }]] };
    close(asked(back, { kind: 'sag', along: [0], reversed: false }).value, (-5 * 800 * 5 ** 4) / (384 * EI));
  });

  it('of a member with a bend is measured from the straight line between its ends', () => {
    // A three-hinged-looking roof, rigid: turn it as a whole and nothing sags.
    const roof: Description = {
      points: { A: [0, 0], B: [2, 1], C: [4, 0] },
      members: ['A B C'],
      section: { EI, EA: 1e8 },
      supports: { A: pinned, C: roller },
      cases: [[{ move: 'C', y: -0.03 }]],
    };
    expect(asked(roof, { kind: 'sag', along: [0], reversed: false }).value).toBeCloseTo(0, 14);
    // Loaded, B departs from the level chord A–C by its deflection.
    const loaded: Description = { ...roof, cases: [[{ at: 'B', y: -1000 }]] };
    close(asked(loaded, { kind: 'sag', along: [0], reversed: false }).value, solve(loaded).deflection('B'));
  });
});

describe('movement along inclined legs', () => {
  const rafter: Description = {
    points: { A: [0, 0], B: [3, 4], C: [3, 9] },
    members: ['A B C'],
    section: { EI, EA: 4e6 },
    supports: { A: fixed },
    cases: [
      [
        { at: 'C', x: 400, y: -900 },
        { on: 'A B C', w: 200 },
      ],
    ],
  };

  it('combines what is along and what is across', () => {
    const structure = build(rafter);
    const solution = combine(analyse(structure), [1]);
    const field = solution.members[0]!;
    const sway = measure(structure, solution, { kind: 'sway', along: [0] }, 'size');
    const deflection = measure(structure, solution, { kind: 'deflection', along: [0] }, 'size');
    const tip = point(structure, 'C');
    close(sway.value, solution.movements[3 * tip]!);
    for (let k = 0; k <= 200; k++) {
      const { x, y } = movementAt(field, structure.members[0]!.legs, (10 * k) / 200);
      expect(Math.abs(x)).toBeLessThanOrEqual(Math.abs(sway.value) * (1 + 1e-12));
      expect(Math.abs(y)).toBeLessThanOrEqual(Math.abs(deflection.value) * (1 + 1e-12));
    }
    const there = movementAt(field, structure.members[0]!.legs, deflection.place!.distance);
    close(-there.y, deflection.value);
  });

  it('agrees with the joint at a bend, on both legs', () => {
    const structure = build(rafter);
    const solution = combine(analyse(structure), [1]);
    const B = point(structure, 'B');
    for (const side of ['before', 'after'] as const) {
      const { leg, axialMovement, transverseMovement, rotation } = fieldAt(solution.members[0]!, 5, side);
      const { cosine, sine } = structure.members[0]!.legs[leg]!;
      close(cosine * axialMovement - sine * transverseMovement, solution.movements[3 * B]!);
      close(sine * axialMovement + cosine * transverseMovement, solution.movements[3 * B + 1]!);
      close(rotation, solution.movements[3 * B + 2]!);
    }
  });
});

describe('groups', () => {
  it('answer with their worst member, the first of equals', () => {
    const pair: Description = {
      points: { A: [0, 0], B: [4, 0], C: [8, 0], D: [12, 0] },
      members: ['A B', 'B C', 'C D'],
      section: { EI },
      hinges: ['B', 'C'],
      supports: { A: pinned, B: roller, C: roller, D: roller },
      cases: [
        [
          { on: 'A B', w: 100 },
          { on: 'B C', w: 300 },
          { on: 'C D', w: 300 },
        ],
      ],
    };
    const worst = asked(pair, { kind: 'sagging', along: [0, 1, 2] });
    close(worst.value, (300 * 16) / 8);
    expect(worst.place!.member).toBe(member(build(pair), 'B C'));
    expect(asked(pair, { kind: 'sagging', along: [0, 1, 2] }, 'least').place).toEqual({ member: 0, distance: 0 });
    expect(asked(pair, { kind: 'deflection', along: [2, 1] }).place!.member).toBe(2);
  });
});

describe('stress', () => {
  const column: Description = {
    points: { A: [0, 0], B: [0, 4] },
    members: ['A B'],
    section: { EI, A: 0.012, W: 5e-4 },
    supports: { A: fixed },
    cases: [[{ at: 'B', x: 900, y: -6000 }]],
  };

  it('is the largest of N/A and M/W together', () => {
    const stress = asked(column, { kind: 'stress', along: [0] });
    close(stress.value, 6000 / 0.012 + (900 * 4) / 5e-4);
    expect(stress.place).toEqual({ member: 0, distance: 0 });
    close(asked(column, { kind: 'stress', along: [0] }, 'least').value, 6000 / 0.012);
    close(
      asked(column, { kind: 'stress', at: { kind: 'along', member: 0, distance: 3 } }).value,
      6000 / 0.012 + 900 / 5e-4,
    );
  });

  it('finds its least where the moment is nil inside', () => {
    const beam: Description = {
      points: { A: [0, 0], B: [6, 0] },
      members: ['A B'],
      section: { EI, A: 0.02, W: 3e-4 },
      supports: { A: fixed, B: fixed },
      cases: [[{ on: 'A B', w }]],
    };
    const least = asked(beam, { kind: 'stress', along: [0] }, 'least');
    expect(least.value).toBeCloseTo(0, 3);
    close(least.place!.distance, 3 - Math.sqrt(3));
  });

  it('says which figure is missing', () => {
    const bare = { ...column, section: { EI, A: 0.012 } };
    expect(asked(bare, { kind: 'stress', along: [0] })).toEqual({
      value: Number.NaN,
      missing: { section: 0, figure: 'sectionModulus' },
    });
    expect(asked({ ...column, section: { EI, W: 1e-4 } }, { kind: 'stress', along: [0] }).missing).toEqual({
      section: 0,
      figure: 'area',
    });
  });

  it('needs no area where there is no axial force, and no modulus of a bar', () => {
    close(
      asked({ ...simple, section: { EI, W: 4e-4 } }, { kind: 'stress', along: [0] }).value,
      (w * L ** 2) / 8 / 4e-4,
    );
    const rod: Description = {
      points: { A: [0, 0], B: [2, 0] },
      bars: ['A B'],
      section: { EA: 1e6, A: 2e-4 },
      supports: { A: pinned, B: roller },
      cases: [[{ at: 'B', x: 300 }]],
    };
    close(asked(rod, { kind: 'stress', along: [0] }).value, 300 / 2e-4);
  });
});

describe('reactions', () => {
  const propped: Description = {
    points: { A: [0, 0], B: [L, 0] },
    members: ['A B'],
    section: { EI },
    supports: { A: fixed, B: roller },
    cases: [[{ on: 'A B', w }]],
  };

  it('are told by component', () => {
    close(asked(propped, { kind: 'reaction', support: 0, component: 'vertical' }).value, (5 * w * L) / 8);
    close(asked(propped, { kind: 'reaction', support: 0, component: 'moment' }).value, (w * L ** 2) / 8);
    expect(asked(propped, { kind: 'reaction', support: 0, component: 'horizontal' }).value).toBe(0);
    expect(asked(propped, { kind: 'reaction', support: 1, component: 'moment' }).value).toBe(0);
  });
});

describe('rotations of points', () => {
  const truss: Description = {
    points: { A: [0, 0], B: [4, 0], C: [2, 3] },
    bars: ['A B', 'B C', 'C A'],
    section: { EA: 1e5 },
    supports: { A: pinned, B: roller },
    cases: [[{ at: 'C', x: 100 }]],
  };

  it('where only bars meet are those of the bars', () => {
    const structure = build(truss);
    const solution = combine(analyse(structure), [1]);
    const rotation = measure(structure, solution, { kind: 'rotation', at: { kind: 'point', point: 2 } }, 'size');
    const chords = [1, 2].map(m => fieldAt(solution.members[m]!, 0).rotation);
    close(rotation.value, Math.abs(chords[0]!) >= Math.abs(chords[1]!) ? chords[0]! : chords[1]!);
  });
});
