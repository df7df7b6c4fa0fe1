// What tests ask of an analysis, by the names that the structure was built with.

import { expect } from 'vitest';
import { analyse, combine, measure, type Solution } from '../../src/mechanics/index.ts';
import type { Seek } from '../../src/model/question.ts';
import type { Structure } from '../../src/model/structure.ts';
import { build, type Description, member, point } from './building.ts';

export interface Solved {
  readonly structure: Structure;
  readonly solution: Solution;
  /** Up, right, anticlockwise. */
  readonly reaction: (point: string) => { readonly x: number; readonly y: number; readonly moment: number };
  /** Down. */
  readonly deflection: (point: string) => number;
  readonly sway: (point: string) => number;
  readonly rotation: (point: string) => number;
  readonly moment: (chain: string, distance: number) => number;
  readonly along: (
    kind: 'deflection' | 'moment' | 'shear' | 'force' | 'sagging' | 'hogging' | 'rotation' | 'stress' | 'sway',
    chain: string,
    seek?: Seek,
  ) => { readonly value: number; readonly distance: number };
  readonly force: (chain: string) => number;
}

/** All cases together, each with factor 1. */
export function solve(description: Description): Solved {
  const structure = build(description);
  const analysis = analyse(structure);
  if (!analysis.stability.stable) throw new Error('unstable');
  const solution = combine(
    analysis,
    structure.cases.map(() => 1),
  );
  const along: Solved['along'] = (kind, chain, seek = 'size') => {
    const measured = measure(structure, solution, { kind, along: [member(structure, chain)] }, seek);
    return { value: measured.value, distance: measured.place!.distance };
  };
  const at = (name: string) => ({ kind: 'point', point: point(structure, name) }) as const;
  return {
    structure,
    solution,
    reaction: name => solution.reactions[structure.supports.findIndex(s => s.point === point(structure, name))]!,
    deflection: name => measure(structure, solution, { kind: 'deflection', at: at(name) }, 'size').value,
    sway: name => measure(structure, solution, { kind: 'sway', at: at(name) }, 'size').value,
    rotation: name => measure(structure, solution, { kind: 'rotation', at: at(name) }, 'size').value,
    moment: (chain, distance) =>
      measure(
        structure,
        solution,
        { kind: 'moment', at: { kind: 'along', member: member(structure, chain), distance } },
        'size',
      ).value,
    along,
    force: chain => along('force', chain).value,
  };
}

/** Equal to within 1e-11 of the expected value, or of `scale` where that is given. */
export function close(actual: number, expected: number, scale = Math.abs(expected)): void {
  expect(Math.abs(actual - expected), `${actual} for ${expected}`).toBeLessThanOrEqual(1e-11 * scale);
}
