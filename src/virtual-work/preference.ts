// Which forces the primary structure would rather keep. What is kept and what is freed does not change any answer, only
// how well the equations of compatibility are conditioned and how simple the working is.
import { flexibilityOf, isUnknown, type Statics } from './statics.ts';

/**
 * All unknowns that there are, in groups, the most wanted in the primary structure first; those without any flexibility
 * before all others (so that what nothing flexible can decide comes out as a redundant of its own).
 */
export type Preference = (statics: Statics) => number[][];

/** Unknowns whose flexibilities differ by less than this are taken in the order of the ground, not of stiffness. */
const BAND = 1e6;

/**
 * Stiff before flexible, so that a redundant never has to hold back a force that acts through a soft spring; among
 * unknowns of like stiffness, from the supports outwards, so that the primary structure is a set of short branches.
 */
export const stiffestFromTheGround: Preference = statics => {
  const { legs, firstReaction, unknownCount } = statics;
  const flexibility = new Float64Array(unknownCount).fill(-1);
  let least = Infinity;
  for (let unknown = 0; unknown < unknownCount; unknown++) {
    if (!isUnknown(statics, unknown)) continue;
    const value = flexibilityOf(statics, unknown);
    flexibility[unknown] = value;
    if (value > 0 && value < least) least = value;
  }
  const steps = stepsFromTheGround(statics);
  const distance = new Int32Array(unknownCount);
  const bands: number[][] = [];
  for (let unknown = 0; unknown < unknownCount; unknown++) {
    const value = flexibility[unknown]!;
    if (value < 0) continue;
    if (unknown < firstReaction) {
      const leg = legs[Math.floor(unknown / 3)]!;
      distance[unknown] = 1 + steps[leg.from]! + steps[leg.to]!;
    }
    const band = value === 0 ? 0 : 1 + Math.floor(Math.log(value / least) / Math.log(BAND));
    (bands[band] ??= []).push(unknown);
  }
  const groups = bands.filter(group => group !== undefined);
  for (const group of groups) group.sort((a, b) => distance[a]! - distance[b]! || a - b);
  return groups;
};

/** Legs between each point and the nearest support. */
function stepsFromTheGround({ structure, legs, grounds }: Statics): Int32Array {
  const pointCount = structure.points.length;
  // The legs at point p: `ends` from `first[p]` to `first[p + 1]`, each as the point at the other end.
  const first = new Int32Array(pointCount + 2);
  for (const { from, to } of legs) {
    first[from + 2]!++;
    first[to + 2]!++;
  }
  for (let point = 2; point <= pointCount + 1; point++) first[point]! += first[point - 1]!;
  const ends = new Int32Array(2 * legs.length);
  for (const { from, to } of legs) {
    ends[first[from + 1]!++] = to;
    ends[first[to + 1]!++] = from;
  }

  const steps = new Int32Array(pointCount).fill(pointCount);
  const queue = new Int32Array(pointCount);
  let size = 0;
  for (const { point } of grounds) {
    if (steps[point] === 0) continue;
    steps[point] = 0;
    queue[size++] = point;
  }
  for (let head = 0; head < size; head++) {
    const point = queue[head]!;
    for (let end = first[point]!; end < first[point + 1]!; end++) {
      const other = ends[end]!;
      if (steps[other]! < pointCount) continue;
      steps[other] = steps[point]! + 1;
      queue[size++] = other;
    }
  }
  return steps;
}
