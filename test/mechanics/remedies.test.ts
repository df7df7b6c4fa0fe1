// Changes that would hold what is free: which are found, in which order, and that they hold.

import { describe, expect, it } from 'vitest';
import { analyse, findPanel, findRemedies, type Remedy, remedied } from '../../src/mechanics/index.ts';
import type { Structure } from '../../src/model/structure.ts';
import { build, type Description, fixed, pinned, roller } from './building.ts';

/** In words, with names for indices. Every set is made, and leaves nothing free. */
const remedies = (description: Description) => {
  const structure = build(description);
  const { stability } = analyse(structure);
  return findRemedies(structure, stability.mechanisms).map(changes => {
    let changed = structure;
    for (const change of changes) changed = remedied(changed, change);
    expect(analyse(changed).stability.stable).toBe(true);
    return changes.map(change => told(structure, change)).join(' + ');
  });
};

function told({ points, supports, hinges }: Structure, remedy: Remedy): string {
  const name = (point: number) => points[point]!.name;
  switch (remedy.kind) {
    case 'hold':
      return `${name(supports[remedy.support]!.point)} ${remedy.as}`;
    case 'close':
      return `no hinge ${name(hinges[remedy.hinge]!.point)}`;
    case 'brace':
      return `brace ${name(remedy.from)} ${name(remedy.to)}`;
    case 'support':
      return `support ${name(remedy.point)} ${remedy.as}`;
  }
}

const portal: Description = {
  points: { A: [0, 0], B: [0, 3], C: [4, 3], D: [4, 0] },
  members: ['A B', 'B C', 'C D'],
  section: { EI: 1e6, EA: 1e8 },
};

describe('what would hold it', () => {
  it('of a portal on two rollers: one of them pinned', () => {
    const found = remedies({ ...portal, supports: { A: roller, D: roller } });
    expect(found.slice(0, 2)).toEqual(['A pinned', 'D pinned']);
  });

  it('of posts hinged at both ends: a fixed foot, a hinge less, a brace', () => {
    expect(remedies({ ...portal, hinges: ['B', 'C'], supports: { A: pinned, D: pinned } })).toEqual([
      'A fixed',
      'no hinge B',
      'brace B D',
    ]);
  });

  it('of a truss panel: its brace, either way', () => {
    const found = remedies({
      points: { A: [0, 0], B: [2, 0], C: [4, 0], D: [0, 2], E: [2, 2], F: [4, 2] },
      bars: ['A B', 'B C', 'D E', 'E F', 'A D', 'B E', 'C F', 'A E'],
      section: { EA: 1 },
      supports: { A: pinned, C: roller },
    });
    expect(found.slice(0, 2)).toEqual(['brace B F', 'brace C E']);
  });

  it('of what floats: several at once, the least first', () => {
    expect(remedies({ points: { A: [0, 0], B: [4, 0] }, members: ['A B'], section: { EI: 1, EA: 1 } })).toEqual([
      'support A pinned + support B roller',
      'support A fixed',
      'support B fixed',
    ]);
  });

  it('of a straight chain of bars: nothing but a support across it', () => {
    // Fixing a foot does nothing for a bar, and there is no point off the line to brace to.
    expect(
      remedies({
        points: { A: [0, 0], B: [3, 0], C: [6, 0] },
        bars: ['A B', 'B C'],
        section: { EA: 1e5 },
        supports: { A: pinned, C: pinned },
      }),
    ).toEqual(['support B roller']);
  });

  it('of a fixed foot behind a hinge: the hinge taken out', () => {
    const [first] = remedies({
      points: { A: [0, 0], B: [4, 0] },
      members: ['A B'],
      section: { EI: 1 },
      hinges: ['A'],
      supports: { A: fixed },
    });
    expect(first).toBe('no hinge A');
  });

  it('is not looked for in large structures', () => {
    const points: Record<string, readonly [number, number]> = {};
    for (let k = 0; k <= 200; k++) points[`P${k}`] = [k, 0];
    const long = { points, members: [Object.keys(points).join(' ')], section: { EI: 1, EA: 1 } };
    expect(remedies({ ...long, supports: { P0: pinned } })).toEqual([]);
  });
});

describe('the panel that is not braced', () => {
  it('is a ring of four points, the ground joining two feet', () => {
    const structure = build({ ...portal, hinges: ['B', 'C'], supports: { A: pinned, D: pinned } });
    const [mechanism] = analyse(structure).stability.mechanisms;
    const panel = findPanel(structure, mechanism!)!;
    expect(panel.map(point => structure.points[point]!.name).sort()).toEqual(['A', 'B', 'C', 'D']);
  });
});

describe('near instability', () => {
  /** Two bars that lie off one inclined line by an angle, rad. */
  const bent = (angle: number): Description => ({
    points: {
      A: [0, 0],
      B: [3 * Math.cos(0.5), 3 * Math.sin(0.5)],
      C: [3 * Math.cos(0.5) + 4 * Math.cos(0.5 + angle), 3 * Math.sin(0.5) + 4 * Math.sin(0.5 + angle)],
    },
    bars: ['A B', 'B C'],
    section: { EA: 1e8 },
    supports: { A: pinned, C: pinned },
  });

  it('is told by the condition, which grows with the square of the slope, and names what hardly resists', () => {
    const flat = analyse(build(bent(1e-3))).stability;
    expect(flat.condition).toBeLessThan(1e10);
    expect(flat.softest).toBeUndefined();
    const near = analyse(build(bent(1e-6))).stability;
    expect(near.stable).toBe(true);
    expect(near.condition / flat.condition / 1e6).toBeCloseTo(1, 2);
    // B goes at right angles to the line.
    const [x, y] = near.softest!.movements.subarray(2, 4);
    expect(x! / y!).toBeCloseTo(-Math.tan(0.5), 5);
    expect(near.softest!.points.map(point => 'ABC'[point])).toEqual(['B']);
  });
});
