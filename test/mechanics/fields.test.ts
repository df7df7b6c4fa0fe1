// Fields along members: consistent within, with the joints and with each other; superposition; global equilibrium.

import { describe, expect, it } from 'vitest';
import { analyse, combine, derivative, evaluate, type Solution } from '../../src/mechanics/index.ts';
import type { Structure } from '../../src/model/structure.ts';
import { alongX, alongY, build, type Description, fixed, pinned, rollerOn } from './building.ts';

/** A frame with something of everything. */
const frame: Description = {
  points: { A: [0, 0], B: [0.4, 3.1], C: [3, 4.2], D: [6.3, 2.9], E: [6, 0], F: [8.2, 2.4], G: [3.1, 0.5] },
  members: ['A B C', 'C D F', 'D E'],
  bars: ['B D', 'A G', 'G D'],
  sections: {
    'A B C': { EI: 5e6, EA: 9e8, mass: 40 },
    'C D F': { EI: 2e6, EA: 5e8, mass: 25 },
    'D E': { EI: 3e6, mass: 30 },
    'B D': { EA: 4e7, mass: 3 },
    'A G': { EA: 4e7 },
    'G D': { EA: 4e7 },
  },
  hinges: ['C', 'D in D E'],
  supports: {
    A: fixed,
    E: [...rollerOn(0.2), alongX(3e6)],
    G: [alongY(2e6)],
  },
  cases: [
    [{ weightOf: ['A B C', 'C D F', 'D E', 'B D'] }, { on: 'C D F', w: [500, 1900], from: 1, to: 5 }],
    [
      { on: 'A B C', w: 800, direction: { kind: 'square', x: 1, y: 0 } },
      { on: 'C D F', w: 300, direction: { kind: 'along', sense: -1 } },
      { at: { member: 'D E', distance: 1.1 }, x: 600, y: 100 },
      { at: { member: 'A B C', distance: 4.4 }, couple: 900 },
    ],
    [
      { at: 'F', x: 300, y: -2000 },
      { at: 'C in A B C', couple: -450 },
      { at: 'G', y: -700 },
    ],
    [
      { move: 'A', x: 0.004, rotation: 0.001 },
      { move: 'E', y: -0.01 },
      { move: 'G', y: -0.003 },
    ],
  ],
};

const structure = build(frame);
const analysis = analyse(structure);
const largest = (values: Iterable<number>) => Math.max(...[...values].map(Math.abs));

const eachPiece = (solution: Solution, check: (piece: Solution['members'][0]['pieces'][0], member: number) => void) =>
  solution.members.forEach(({ pieces }, m) => {
    for (const piece of pieces) check(piece, m);
  });

const expectSame = (a: readonly number[], b: readonly number[], tolerance: number) => {
  for (let k = 0; k < Math.max(a.length, b.length); k++) {
    expect(Math.abs((a[k] ?? 0) - (b[k] ?? 0))).toBeLessThanOrEqual(tolerance);
  }
};

describe('every case', () => {
  const cases = analysis.cases.map((solution, k) => ({ name: `case ${k}`, solution }));

  it.each(cases)('$name is in equilibrium as a whole', ({ solution }) => {
    let { x, y, moment } = solution.applied;
    const sizes: number[] = [];
    structure.supports.forEach(({ point }, k) => {
      const at = structure.points[point]!;
      const reaction = solution.reactions[k]!;
      x += reaction.x;
      y += reaction.y;
      moment += reaction.moment + at.x * reaction.y - at.y * reaction.x;
      sizes.push(reaction.x, reaction.y, reaction.moment);
    });
    for (const rest of [x, y, moment]) expect(Math.abs(rest)).toBeLessThanOrEqual(1e-12 * largest(sizes));
    expect(solution.residual).toBeLessThanOrEqual(1e-12);
  });

  it.each(cases)('$name: dM/dx = V, EI θ′ = M, v′ = θ, EA u′ = N', ({ solution }) => {
    eachPiece(solution, (piece, m) => {
      const { bendingStiffness, axialStiffness } = structure.sections[m]!;
      const { length } = structure.members[m]!;
      if (structure.members[m]!.kind === 'member') {
        const forces = 1e-12 * largest(piece.bendingMoment);
        expectSame(derivative(piece.bendingMoment), piece.shearForce, forces);
        expectSame(
          derivative(piece.rotation).map(value => value * bendingStiffness!),
          piece.bendingMoment,
          forces * length,
        );
        expectSame(derivative(piece.transverseMovement), piece.rotation, 1e-12 * largest(piece.rotation));
      }
      const stretch = derivative(piece.axialMovement);
      if (axialStiffness === undefined) expectSame(stretch, [], 0);
      else
        expectSame(
          stretch.map(value => value * axialStiffness),
          piece.axialForce,
          1e-12 * largest(piece.axialForce),
        );
    });
  });

  it.each(cases)('$name: fields end where the joints are, legs and pieces join without gaps', ({ solution }) => {
    const scale = largest(solution.movements);
    solution.members.forEach(({ pieces }, m) => {
      const { legs, kind, length } = structure.members[m]!;
      expect(pieces[0]!.start).toBe(0);
      expect(pieces.at(-1)!.end).toBe(length);
      pieces.forEach((piece, k) => {
        const leg = legs[piece.leg]!;
        if (k > 0) expect(piece.start).toBe(pieces[k - 1]!.end);
        const ends: [number, number, number][] = [];
        if (piece.start === leg.start) ends.push([0, leg.from, 0]);
        if (k === pieces.length - 1 || pieces[k + 1]!.leg !== piece.leg)
          ends.push([piece.end - piece.start, leg.to, 1]);
        for (const [s, p] of ends) {
          const along = evaluate(piece.axialMovement, s);
          const across = evaluate(piece.transverseMovement, s);
          const x = leg.cosine * along - leg.sine * across;
          const y = leg.sine * along + leg.cosine * across;
          expect(Math.abs(x - solution.movements[3 * p]!)).toBeLessThanOrEqual(1e-12 * scale);
          expect(Math.abs(y - solution.movements[3 * p + 1]!)).toBeLessThanOrEqual(1e-12 * scale);
        }
        if (kind === 'bar') expect(largest(piece.bendingMoment)).toBe(0);
      });
    });
  });

  it.each(cases)('$name: every point is in equilibrium', ({ solution }) => {
    const scale = 1e-12 * Math.max(largest(solution.reactions.flatMap(r => [r.x, r.y, r.moment])), 1);
    const sums = structure.points.map(() => ({ x: 0, y: 0 }));
    solution.members.forEach(({ pieces }, m) => {
      pieces.forEach((piece, k) => {
        const leg = structure.members[m]!.legs[piece.leg]!;
        const add = (p: number, s: number, sign: number) => {
          const N = sign * evaluate(piece.axialForce, s);
          const V = sign * evaluate(piece.shearForce, s);
          sums[p]!.x += leg.cosine * N + leg.sine * V;
          sums[p]!.y += leg.sine * N - leg.cosine * V;
        };
        if (piece.start === leg.start) add(leg.from, 0, 1);
        if (k === pieces.length - 1 || pieces[k + 1]!.leg !== piece.leg) add(leg.to, piece.end - piece.start, -1);
      });
    });
    structure.supports.forEach(({ point }, k) => {
      sums[point]!.x += solution.reactions[k]!.x;
      sums[point]!.y += solution.reactions[k]!.y;
    });
    const loads = pointLoads(structure, analysis.cases.indexOf(solution));
    sums.forEach((sum, p) => {
      expect(Math.abs(sum.x + loads[p]!.x)).toBeLessThanOrEqual(scale * 10);
      expect(Math.abs(sum.y + loads[p]!.y)).toBeLessThanOrEqual(scale * 10);
    });
  });
});

/** Forces at points, and the weight of bars half to each end. */
function pointLoads({ points, members, sections, loads }: Structure, caseIndex: number) {
  const sums = points.map(() => ({ x: 0, y: 0 }));
  for (const load of loads) {
    if (load.case !== caseIndex) continue;
    if (load.kind === 'force' && load.at.kind === 'point') {
      sums[load.at.point]!.x += load.x;
      sums[load.at.point]!.y += load.y;
    }
    if (load.kind !== 'self-weight') continue;
    for (const m of load.members) {
      if (members[m]!.kind === 'member') continue;
      const [leg] = members[m]!.legs;
      const half = (sections[leg!.section]!.massPerLength! * 9.80665 * leg!.length) / 2;
      sums[leg!.from]!.y -= half;
      sums[leg!.to]!.y -= half;
    }
  }
  return sums;
}

describe('superposition', () => {
  it('adds the cases term by term', () => {
    const factors = [1.35, -1.5, 0, 0.8];
    const whole = combine(analysis, factors);
    structure.points.forEach((_, p) => {
      const expected = factors.reduce((sum, factor, k) => sum + factor * analysis.cases[k]!.movements[3 * p]!, 0);
      expect(whole.movements[3 * p]).toBeCloseTo(expected, 14);
    });
    eachPiece(whole, (piece, m) => {
      const k = whole.members[m]!.pieces.indexOf(piece);
      const at = (solution: Solution) => evaluate(solution.members[m]!.pieces[k]!.bendingMoment, 0.3);
      const expected = factors.reduce((sum, factor, c) => sum + factor * at(analysis.cases[c]!), 0);
      expect(evaluate(piece.bendingMoment, 0.3)).toBeCloseTo(expected, 7);
    });
    expect(whole.applied.x).toBeCloseTo(1.35 * 0 - 1.5 * analysis.cases[1]!.applied.x, 9);
  });

  it('of one case with factor 1 is that case, and of none is nothing', () => {
    expect(combine(analysis, [0, 1, 0, 0])).toBe(analysis.cases[1]);
    const nothing = combine(analysis, [0, 0, 0, 0]);
    expect(largest(nothing.movements)).toBe(0);
    expect(nothing.members[0]!.pieces).toHaveLength(analysis.cases[0]!.members[0]!.pieces.length);
    expect(nothing.residual).toBe(0);
  });

  it('of a structure without cases is nothing either', () => {
    const bare = analyse(build({ ...frame, cases: [] }));
    expect(bare.stability.stable).toBe(true);
    const nothing = combine(bare, []);
    expect(nothing.members.map(field => field.pieces.length)).toEqual([2, 2, 1, 1, 1, 1]);
    expect(nothing.reactions).toHaveLength(3);
  });

  it('takes one factor a case', () => {
    expect(() => combine(analysis, [1, 2])).toThrow('2 factors were given for 4 cases');
  });

  it('doubles with the loads', () => {
    const doubled = analyse(
      build({
        ...frame,
        cases: [[{ on: 'C D F', w: [1000, 3800], from: 1, to: 5 }], [{ on: 'C D F', w: [500, 1900], from: 1, to: 5 }]],
      }),
    );
    const [two, one] = doubled.cases;
    two!.movements.forEach((value, k) => {
      expect(Math.abs(value - 2 * one!.movements[k]!)).toBeLessThanOrEqual(1e-14 * largest(two!.movements));
    });
  });
});

describe('reciprocity', () => {
  it('a unit force here moves there what a unit couple there turns here', () => {
    const both = analyse(
      build({
        ...frame,
        cases: [[{ at: 'F', y: -1 }], [{ at: 'B', couple: 1 }], [{ at: { member: 'D E', distance: 2 }, x: 1 }]],
      }),
    );
    const B = 3 * structure.points.findIndex(p => p.name === 'B');
    const F = 3 * structure.points.findIndex(p => p.name === 'F');
    const [force, couple, inside] = both.cases;
    expect(force!.movements[B + 2]! / -couple!.movements[F + 1]!).toBeCloseTo(1, 12);
    const piece = force!.members[2]!.pieces[0]!;
    const leg = structure.members[2]!.legs[0]!;
    const sway = leg.cosine * evaluate(piece.axialMovement, 2) - leg.sine * evaluate(piece.transverseMovement, 2);
    expect(sway / -inside!.movements[F + 1]!).toBeCloseTo(1, 12);
  });
});

describe('subdivision', () => {
  const beam = (legs: number) => {
    const points: Record<string, readonly [number, number]> = {};
    for (let k = 0; k <= legs; k++) points[`P${k}`] = [(12 * k) / legs, (5 * k) / legs];
    const chain = Object.keys(points).join(' ');
    return analyse(
      build({
        points,
        members: [chain],
        section: { EI: 3e6, EA: 5e8 },
        supports: { P0: pinned, [`P${legs}`]: rollerOn(1) },
        cases: [[{ on: chain, w: [300, 900], from: 2, to: 11 }]],
      }),
    ).cases[0]!;
  };

  it('changes nothing, be it in a hundred', () => {
    const whole = beam(1);
    for (const legs of [2, 3, 10, 100]) {
      const parts = beam(legs);
      for (let k = 0; k < 3; k++) {
        const end = parts.movements[3 * legs + k]!;
        expect(Math.abs(end - whole.movements[3 + k]!)).toBeLessThanOrEqual(1e-11 * largest(whole.movements));
      }
      expect(parts.residual).toBeLessThan(1e-12);
    }
  });
});
