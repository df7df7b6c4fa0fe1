// Measures: what a question asks of a solution. Extremes come from the roots of polynomials, never from sampling.

import type { Measured, ResolvedMeasure, Seek } from '../model/question.ts';
import type { Structure } from '../model/structure.ts';
import { measureAlong } from './measure-along.ts';
import { measureBeside } from './measure-beside.ts';
import { distanceOf } from './quantities.ts';
import { rounded } from './rounding.ts';
import { Search } from './seeking.ts';
import type { Solution } from './solution.ts';

/** The answer to one measure; its signs are those of ResolvedMeasure. Where the quantity jumps, the side that is sought. */
export function measure(structure: Structure, solution: Solution, asked: ResolvedMeasure, seek: Seek): Measured {
  if (asked.kind === 'reaction') return measureReaction(solution, asked);
  if ('along' in asked) return measureAlong(structure, solution, asked, seek);
  const { kind, at } = asked;
  if (at.kind === 'along') return measureBeside(structure, solution, kind, at.member, at.distance, seek);
  switch (asked.kind) {
    case 'deflection':
      return { value: rounded(solution, 'movement', -solution.movements[3 * at.point + 1]!) };
    case 'sway':
      return { value: rounded(solution, 'movement', solution.movements[3 * at.point]!) };
    default:
      return measureRotation(structure, solution, at.point, at.member, seek);
  }
}

function measureReaction(solution: Solution, asked: Extract<ResolvedMeasure, { kind: 'reaction' }>): Measured {
  const { x, y, moment } = solution.reactions[asked.support]!;
  switch (asked.component) {
    case 'horizontal':
      return { value: rounded(solution, 'force', x) };
    case 'vertical':
      return { value: rounded(solution, 'force', y) };
    case 'moment':
      return { value: rounded(solution, 'moment', moment) };
  }
}

/**
 * Of a member's end where a member is named; else of the joint or, where every end there is hinged, of the end that is
 * sought, bars left aside if there are others.
 */
function measureRotation(
  structure: Structure,
  solution: Solution,
  point: number,
  named: number | undefined,
  seek: Seek,
): Measured {
  const joint = { value: rounded(solution, 'rotation', solution.movements[3 * point + 2]!) };
  if (named === undefined && hasRigidEnd(structure, point)) return joint;
  const search = new Search(seek);
  for (const kind of ['member', 'bar']) {
    structure.members.forEach((candidate, member) => {
      if (candidate.kind !== kind || (named !== undefined && named !== member)) return;
      const distance = distanceOf(structure, member, point);
      if (distance === undefined) return;
      search.offer(measureBeside(structure, solution, 'rotation', member, distance, seek));
    });
    if (search.best !== undefined) return search.best;
  }
  return joint;
}

function hasRigidEnd(structure: Structure, point: number): boolean {
  const hinges = structure.hinges.filter(hinge => hinge.point === point);
  if (hinges.some(hinge => hinge.member === undefined)) return false;
  return structure.members.some(
    ({ kind }, member) =>
      kind === 'member' &&
      distanceOf(structure, member, point) !== undefined &&
      !hinges.some(hinge => hinge.member === member),
  );
}
