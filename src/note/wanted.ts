// A section whose I is still to be chosen. The structure is solved with a trial I; what of it depends on I, and how, is
// found by solving it with others. A movement that goes with 1/I is told as a multiple of 1/EI; a limit, by the least I.
import {
  type Analysis,
  analyse,
  combine,
  type Polynomial,
  sizesOf,
  measure as takeMeasure,
  worstPatterns,
} from '../mechanics/index.ts';
import type { AlternativeModel } from '../model/combinations.ts';
import type { ResolvedMeasure } from '../model/question.ts';
import { isMovement } from '../model/questions.ts';
import type { Structure } from '../model/structure.ts';
import { wantedSection } from '../model/wanted.ts';
import type { Taken } from './second-road.ts';
import type { Series } from './series.ts';
import { Solved } from './solved.ts';

/** Whether I takes part in the question at all: in a measure of its own, or of a result in it. */
export function isWanted({ taken }: Series): boolean {
  return taken.some(({ solved }) => wantedSection(solved.analysis.structure) !== undefined);
}

/** Whether its value is the same whatever I is: forces only, and none that any case would share out otherwise. */
export function isIndependent({ taken }: Series): boolean {
  return taken.every(
    ({ measure: { kind }, solved }) =>
      wantedSection(solved.analysis.structure) === undefined || (!isMovement(kind) && forcesAreSame(solved)),
  );
}

/** Whether no case shares its forces out otherwise with another I. */
export function forcesAreSame(solved: Solved): boolean {
  return dependenceOf(solved).every(({ forces }) => forces);
}

/** Whether all movements under these factors go with 1/I. */
export function movementsScale(solved: Solved, alternatives: readonly (readonly number[])[]): boolean {
  return dependenceOf(solved).every(({ movements }, k) => movements || alternatives.every(factors => factors[k] === 0));
}

/** With some I: the largest size of a movement, and what gives it. */
export interface Largest {
  /** Of the trial I. */
  readonly multiple: number;
  readonly taken: Taken;
  readonly alternative: AlternativeModel;
}

/**
 * The least I from which on the largest size of a movement over the alternatives (with all spans of patterned loads) keeps
 * to a limit, as a multiple of the trial I; undefined where no I does. Found on the real model.
 */
export function leastInertia(
  { analysis: { structure } }: Solved,
  measure: ResolvedMeasure,
  alternatives: readonly AlternativeModel[],
  limit: number,
): Largest | undefined {
  const largestWith = (multiple: number) => largest(structure, measure, alternatives, multiple);
  const isMet = (multiple: number): boolean => Math.abs(largestWith(multiple).taken.value) <= limit;
  // From the stiffest down to the first that does not do: between the last two lies the least.
  let high = MOST;
  if (!isMet(high)) return undefined;
  let low = high / STEP;
  while (low > LEAST && isMet(low)) [high, low] = [low, low / STEP];
  for (let i = 0; i < 100 && high - low > 1e-13 * high; i++) {
    const middle = Math.sqrt(low * high);
    if (isMet(middle)) high = middle;
    else low = middle;
  }
  return largestWith(high);
}

function largest(
  structure: Structure,
  measure: ResolvedMeasure,
  alternatives: readonly AlternativeModel[],
  multiple: number,
): Largest {
  const solved = new Solved(withInertia(structure, multiple));
  const found = alternatives.flatMap(alternative =>
    worstPatterns(solved.analysis, alternative.factors, measure).map((factors): Largest => {
      const { value, place } = takeMeasure(structure, combine(solved.analysis, factors), measure, 'size');
      return { multiple, alternative, taken: { measure, place, value, factors, solved } };
    }),
  );
  return found.reduce((most, one) => (Math.abs(one.taken.value) > Math.abs(most.taken.value) ? one : most));
}

/** Multiples of the trial I beyond which no section is looked for, and the factor between two that are looked at. */
const [LEAST, MOST, STEP] = [1e-6, 1e4, 2];

/** The structure with the wanted section's I multiplied. */
export function withInertia(structure: Structure, multiple: number): Structure {
  return {
    ...structure,
    sections: structure.sections.map(section =>
      section.wanted && section.bendingStiffness !== undefined
        ? { ...section, bendingStiffness: section.bendingStiffness * multiple }
        : section,
    ),
  };
}

/** Of one case: whether its forces stay as they are with another I, and whether its movements go with 1/I. */
interface Dependence {
  readonly forces: boolean;
  readonly movements: boolean;
}

const known = new WeakMap<Solved, readonly Dependence[]>();

function dependenceOf(solved: Solved): readonly Dependence[] {
  let dependence = known.get(solved);
  if (dependence === undefined) {
    const others = OTHERS.map(multiple => ({
      multiple,
      analysis: analyse(withInertia(solved.analysis.structure, multiple)),
    }));
    dependence = solved.analysis.cases.map((_, k) => ({
      forces: others.every(({ analysis }) => sameForces(solved.analysis, analysis, k)),
      movements: others.every(({ analysis, multiple }) => scaledMovements(solved.analysis, analysis, k, multiple)),
    }));
    known.set(solved, dependence);
  }
  return dependence;
}

/** What is the same, or in proportion, for two more values of I without a common measure is so for all. */
const OTHERS = [1 / 7.3, 41];

/** Differences smaller than this, relative to the largest of their kind, are rounding. */
const SAME = 1e-9;

function sameForces(one: Analysis, other: Analysis, k: number): boolean {
  const [a, b] = [one.cases[k]!, other.cases[k]!];
  const sizes = sizesOf(a);
  const differ = (p: Polynomial, q: Polynomial, length: number, size: number): boolean =>
    p.some((coefficient, power) => Math.abs(coefficient - (q[power] ?? 0)) * length ** power > SAME * size);
  return (
    a.members.every(({ pieces }, m) =>
      pieces.every((piece, p) => {
        const there = b.members[m]!.pieces[p]!;
        const length = piece.end - piece.start;
        return (
          !differ(piece.axialForce, there.axialForce, length, sizes.force) &&
          !differ(piece.shearForce, there.shearForce, length, sizes.force) &&
          !differ(piece.bendingMoment, there.bendingMoment, length, sizes.moment)
        );
      }),
    ) &&
    a.reactions.every(({ x, y, moment }, s) => {
      const at = b.reactions[s]!;
      const isForce = Math.max(Math.abs(x - at.x), Math.abs(y - at.y)) <= SAME * sizes.force;
      return isForce && Math.abs(moment - at.moment) <= SAME * sizes.moment;
    })
  );
}

/** `multiple`: of I in the other. */
function scaledMovements(one: Analysis, other: Analysis, k: number, multiple: number): boolean {
  const [a, b] = [one.cases[k]!, other.cases[k]!];
  const sizes = sizesOf(a);
  const scaled = (p: Polynomial, q: Polynomial, length: number, size: number): boolean =>
    p.every(
      (coefficient, power) => Math.abs(coefficient - multiple * (q[power] ?? 0)) * length ** power <= SAME * size,
    );
  return a.members.every(({ pieces }, m) =>
    pieces.every((piece, p) => {
      const there = b.members[m]!.pieces[p]!;
      const length = piece.end - piece.start;
      return (
        scaled(piece.transverseMovement, there.transverseMovement, length, sizes.movement) &&
        scaled(piece.axialMovement, there.axialMovement, length, sizes.movement) &&
        scaled(piece.rotation, there.rotation, length, sizes.rotation)
      );
    }),
  );
}
