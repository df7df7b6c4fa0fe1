// Reads one solution for a hover: a measure's value, and the same in words. The measures are mechanics'
// own, so that a hover and an answer cannot disagree.
import { measure as take } from '../../mechanics/index.ts';
import type { Solution } from '../../mechanics/solution.ts';
import type { Measured, ResolvedMeasure } from '../../model/question.ts';
import { dimensionOf } from '../../model/questions.ts';
import type { Structure } from '../../model/structure.ts';
import { answerInWords } from '../../note/phrases.ts';
import type { Alternative, Combination } from '../../note/result.ts';
import type { DisplayUnits } from '../../quantity/display.ts';

export interface Reading {
  readonly structure: Structure;
  readonly solution: Solution;
  readonly units: DisplayUnits;
}

export function readingOf(structure: Structure, alternative: Alternative, units: DisplayUnits): Reading {
  return { structure, solution: alternative.solution(), units };
}

/** The largest in size, with its sign. */
export function measuredOf({ structure, solution }: Reading, asked: ResolvedMeasure): Measured {
  return take(structure, solution, asked, 'size');
}

/** `4.443 mm down`, `12.30 kN m, tension below`, `3.100 kN compression`. */
export function inWords(
  reading: Reading,
  asked: ResolvedMeasure,
  measured: Measured = measuredOf(reading, asked),
): string {
  const quantity = { value: measured.value, dimension: dimensionOf(asked) };
  return answerInWords(asked, quantity, reading.units, reading.structure, measured.place);
}

/** What a hover looks through: every alternative of every combination, or the cases alone where there is none. */
export function alternativesOf(combinations: readonly Combination[]): readonly Alternative[] {
  const combined = combinations.filter(({ kind }) => kind === 'combination');
  return (combined.length > 0 ? combined : combinations).flatMap(({ alternatives }) => alternatives);
}
