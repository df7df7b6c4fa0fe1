// A measure at one place of a member, seen from both sides.

import type { Measured, ResolvedMeasure, Seek } from '../model/question.ts';
import type { Structure } from '../model/structure.ts';
import { pieceAt, type Side } from './field.ts';
import { evaluate } from './polynomial.ts';
import { PLAIN_QUANTITIES } from './quantities.ts';
import { rounded, sameValue } from './rounding.ts';
import { sagOf } from './sag.ts';
import { Search } from './seeking.ts';
import type { Solution } from './solution.ts';
import { type MissingFigure, stressOn } from './stress.ts';

export type MeasureOfMember = Exclude<ResolvedMeasure['kind'], 'reaction'>;

/** The side that is sought; both, where they differ. A sag is measured from the chord of the whole member. */
export function measureBeside(
  structure: Structure,
  solution: Solution,
  kind: MeasureOfMember,
  member: number,
  distance: number,
  seek: Seek,
): Measured {
  const before = valueBeside(structure, solution, kind, member, distance, 'before');
  if (typeof before !== 'number') return { value: Number.NaN, missing: before };
  const after = valueBeside(structure, solution, kind, member, distance, 'after');
  if (typeof after !== 'number') return { value: Number.NaN, missing: after };
  const place = { member, distance };
  const search = new Search(seek);
  for (const value of [before, after]) search.offer({ value, place });
  const measured = search.best!;
  return areEqual(solution, kind, before, after) ? measured : { ...measured, sides: [before, after] };
}

function valueBeside(
  structure: Structure,
  solution: Solution,
  kind: MeasureOfMember,
  member: number,
  distance: number,
  side: Side,
): number | MissingFigure {
  const field = solution.members[member]!;
  const piece = pieceAt(field, distance, side);
  const s = Math.min(Math.max(distance - piece.start, 0), piece.end - piece.start);
  if (kind === 'stress') {
    const stress = stressOn(structure, solution, member, piece);
    return 'figure' in stress ? stress : stress.at(s);
  }
  const { legs, length } = structure.members[member]!;
  const whole = { start: 0, end: length };
  const quantity = kind === 'sag' ? sagOf(structure, field, member, whole, false) : PLAIN_QUANTITIES[kind];
  const value = evaluate(quantity.polynomial(piece, legs[piece.leg]!), s);
  return quantity.read(rounded(solution, quantity.kind, value));
}

function areEqual(solution: Solution, kind: MeasureOfMember, before: number, after: number): boolean {
  if (kind === 'stress') return Math.abs(before - after) <= 1e-10 * Math.max(before, after);
  return sameValue(solution, kind === 'sag' ? 'movement' : PLAIN_QUANTITIES[kind].kind, before, after);
}
