// A measure along members: the sought value on all of them, with its place.

import type { Measured, MemberStretch, ResolvedMeasure, Seek } from '../model/question.ts';
import type { Structure } from '../model/structure.ts';
import { measureBeside } from './measure-beside.ts';
import { evaluate, extremes } from './polynomial.ts';
import { type AlongQuantity, PLAIN_QUANTITIES } from './quantities.ts';
import { rounded } from './rounding.ts';
import { sagOf } from './sag.ts';
import { Search } from './seeking.ts';
import type { FieldPiece, Solution } from './solution.ts';
import { type MissingFigure, stressOn } from './stress.ts';

export type AskedAlong = Extract<ResolvedMeasure, { readonly along: readonly number[] }>;

/** Members in the order given, each along its travel; among equal values the first. */
export function measureAlong(structure: Structure, solution: Solution, asked: AskedAlong, seek: Seek): Measured {
  const search = new Search(seek);
  for (const member of asked.along) {
    const stretch = asked.stretch ?? { start: 0, end: structure.members[member]!.length };
    if (asked.kind === 'stress') {
      const missing = searchStress(structure, solution, member, stretch, search);
      if (missing !== undefined) return { value: Number.NaN, missing };
      continue;
    }
    const quantity =
      asked.kind === 'sag'
        ? sagOf(structure, solution.members[member]!, member, stretch, asked.reversed)
        : PLAIN_QUANTITIES[asked.kind];
    searchQuantity(structure, solution, member, stretch, quantity, search);
  }
  const { best } = search;
  if (best?.place === undefined) return { value: 0 };
  // Both sides of a jump inside the stretch were looked at; they are told with it.
  const { member, distance } = best.place;
  const start = asked.stretch?.start ?? 0;
  const end = asked.stretch?.end ?? structure.members[member]!.length;
  if (asked.kind === 'sag' || distance <= start || distance >= end) return best;
  const { sides } = measureBeside(structure, solution, asked.kind, member, distance, seek);
  return sides === undefined ? best : { ...best, sides };
}

function searchQuantity(
  structure: Structure,
  solution: Solution,
  member: number,
  stretch: MemberStretch,
  quantity: AlongQuantity,
  search: Search,
): void {
  const { legs } = structure.members[member]!;
  for (const { piece, from, to } of piecesWithin(solution, member, stretch)) {
    const polynomial = quantity.polynomial(piece, legs[piece.leg]!);
    for (const s of extremes(polynomial, from, to)) {
      const value = quantity.read(rounded(solution, quantity.kind, evaluate(polynomial, s)));
      search.offer({ value, place: { member, distance: placeOf(piece, s, to, stretch) } });
    }
  }
}

function searchStress(
  structure: Structure,
  solution: Solution,
  member: number,
  stretch: MemberStretch,
  search: Search,
): MissingFigure | undefined {
  for (const { piece, from, to } of piecesWithin(solution, member, stretch)) {
    const stress = stressOn(structure, solution, member, piece);
    if ('figure' in stress) return stress;
    for (const s of stress.places(from, to)) {
      search.offer({ value: stress.at(s), place: { member, distance: placeOf(piece, s, to, stretch) } });
    }
  }
  return undefined;
}

/** Pieces that share more than rounding with the stretch, and from where to where, measured from the start of each. */
function piecesWithin(solution: Solution, member: number, stretch: MemberStretch) {
  const { pieces } = solution.members[member]!;
  const tolerance = 1e-9 * pieces[pieces.length - 1]!.end;
  const found: { readonly piece: FieldPiece; readonly from: number; readonly to: number }[] = [];
  for (const piece of pieces) {
    const from = Math.max(piece.start, stretch.start);
    const to = Math.min(piece.end, stretch.end);
    if (to - from > tolerance) found.push({ piece, from: from - piece.start, to: to - piece.start });
  }
  return found;
}

/** Along the member; at the end of a piece or of the stretch exactly as these have it. */
function placeOf(piece: FieldPiece, s: number, to: number, stretch: MemberStretch): number {
  return s === to ? Math.min(piece.end, stretch.end) : Math.max(piece.start + s, stretch.start);
}
