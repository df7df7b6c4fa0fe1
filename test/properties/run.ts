// How properties are run: on so many random structures, from a fixed seed, which a failure prints beside the structure.
import fc from 'fast-check';
import { test } from 'vitest';
import { analyse } from '../../src/mechanics/analyse.ts';
import type { Analysis } from '../../src/mechanics/solution.ts';
import type { Structure } from '../../src/model/structure.ts';

export const SEED = 40_213;
export const RUNS = 200;

/** The property holds for every value; `analysed` says how the structure answers. */
export function holds<T>(name: string, values: fc.Arbitrary<T>, property: (value: T) => void, runs = RUNS): void {
  test(`${name} (${runs} structures, seed ${SEED})`, { timeout: 120_000 }, () => {
    fc.assert(
      fc.property(values, value => property(value)),
      { seed: SEED, numRuns: runs, endOnFailure: false },
    );
  });
}

/** The analysis of a structure that is stable. */
export function analysed(structure: Structure): Analysis {
  const analysis = analyse(structure);
  if (!analysis.stability.stable) throw new Error('a stable structure was found unstable');
  if (analysis.conflict) throw new Error('a movement was found in conflict with axially stiff members');
  return analysis;
}

/** What of a tolerance the conditioning leaves: a few roundings times the condition, if that is more. */
export function allowed({ stability }: Analysis, tolerance: number): number {
  return Math.max(tolerance, Number.EPSILON * stability.condition);
}
