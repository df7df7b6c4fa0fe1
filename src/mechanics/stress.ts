// Stress: the largest |N/A ± M/W| of a section under axial force and bending.

import type { Measured } from '../model/question.ts';
import type { Structure } from '../model/structure.ts';
import { evaluate, extremes, type Polynomial, roots, sum } from './polynomial.ts';
import { rounded } from './rounding.ts';
import type { FieldPiece, Solution } from './solution.ts';

export type MissingFigure = NonNullable<Measured['missing']>;

export interface StressOnPiece {
  /** At s from the start of the piece, Pa. */
  readonly at: (s: number) => number;
  /** Where it may be largest or smallest between two places, these included, ascending. */
  readonly places: (start: number, end: number) => readonly number[];
}

/** A figure counts as missing only where the force that calls for it is not nil. */
export function stressOn(
  structure: Structure,
  solution: Solution,
  member: number,
  piece: FieldPiece,
): StressOnPiece | MissingFigure {
  const { legs } = structure.members[member]!;
  const index = legs[piece.leg]!.section;
  const { area, sectionModulus } = structure.sections[index]!;
  const axial = isNil(solution, 'force', piece, piece.axialForce) ? [0] : piece.axialForce;
  const bending = isNil(solution, 'moment', piece, piece.bendingMoment) ? [0] : piece.bendingMoment;
  if (area === undefined && axial.length > 1) return { section: index, figure: 'area' };
  if (sectionModulus === undefined && bending.length > 1) return { section: index, figure: 'sectionModulus' };
  const a = 1 / (area ?? 1);
  const w = 1 / (sectionModulus ?? 1);
  return {
    at: s => Math.abs(evaluate(axial, s)) * a + Math.abs(evaluate(bending, s)) * w,
    places: (start, end) => {
      // |N|/A + |M|/W has a level slope where N/A + M/W or N/A − M/W has one, or a kink where N or M is nil.
      const found = [
        ...extremes(sum(axial, bending, a, w), start, end),
        ...extremes(sum(axial, bending, a, -w), start, end),
        ...roots(axial, start, end),
        ...roots(bending, start, end),
      ];
      return found.sort((p, q) => p - q);
    },
  };
}

function isNil(solution: Solution, kind: 'force' | 'moment', piece: FieldPiece, polynomial: Polynomial): boolean {
  return extremes(polynomial, 0, piece.end - piece.start).every(
    s => rounded(solution, kind, evaluate(polynomial, s)) === 0,
  );
}
