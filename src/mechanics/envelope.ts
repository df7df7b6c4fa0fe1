// Envelopes: the greatest (or least) value of a quantity at every place of a member over several alternatives, each with
// the spans loaded that are worst there. Exact: on every piece it is the polynomial of one alternative and one set of spans.

import type { Leg } from '../model/structure.ts';
import { bound, evaluate, type Polynomial, roots, sum } from './polynomial.ts';
import type { Analysis, FieldPiece, Solution } from './solution.ts';

/** A quantity that is linear in the loads and a polynomial on every piece of a field. */
export interface LinearQuantity {
  readonly polynomial: (piece: FieldPiece, leg: Leg) => Polynomial;
  /** Values on the leg that are no larger are rounding. */
  readonly rounding: (leg: Leg) => number;
}

export interface EnvelopePiece {
  /** Index into the member's legs. */
  readonly leg: number;
  /** Distance along the member at which s = 0. */
  readonly start: number;
  /** The piece in s, from < to; at its last `to` a piece of the field ends at the distance `end`. */
  readonly from: number;
  readonly to: number;
  readonly end: number;
  /** In s; the quantity itself. */
  readonly polynomial: Polynomial;
  /** Index of the alternative that gives it. */
  readonly alternative: number;
  /** By case: the alternative's factors, 0 for a span that is better left unloaded. */
  readonly factors: readonly number[];
}

/**
 * The upper envelope (sense 1) or the lower one (−1) along a member, in order, without gaps. `quantityOf` is asked once for
 * each case. Among alternatives that are equal on a stretch the first gives it.
 */
export function envelopeAlong(
  analysis: Analysis,
  member: number,
  quantityOf: (solution: Solution) => LinearQuantity,
  alternatives: readonly (readonly number[])[],
  sense: 1 | -1,
): EnvelopePiece[] {
  const quantities = analysis.cases.map(quantityOf);
  const { legs } = analysis.structure.members[member]!;
  const pieces = analysis.cases[0]?.members[member]?.pieces ?? [];
  return pieces.flatMap((piece, p) => {
    const leg = legs[piece.leg]!;
    const effects = analysis.cases.map((solution, k) => {
      const { polynomial, rounding } = quantities[k]!;
      return { polynomial: polynomial(solution.members[member]!.pieces[p]!, leg), rounding: rounding(leg) };
    });
    const length = piece.end - piece.start;
    let best: Part[] = [];
    for (const [alternative, factors] of alternatives.entries()) {
      const own = partsOf(analysis, effects, factors, length, sense).map(part => ({ ...part, alternative }));
      best = alternative === 0 ? own : greaterOf(best, own);
    }
    return best.map(
      ({ from, to, polynomial, alternative, factors }): EnvelopePiece => ({
        leg: piece.leg,
        start: piece.start,
        from,
        to,
        end: to === length ? piece.end : piece.start + to,
        polynomial: polynomial.map(coefficient => sense * coefficient),
        alternative,
        factors,
      }),
    );
  });
}

interface Effect {
  readonly polynomial: Polynomial;
  readonly rounding: number;
}

/** Of the envelope of `sense` × the quantity, which is an upper one whatever the sense. */
interface Part {
  readonly from: number;
  readonly to: number;
  readonly polynomial: Polynomial;
  readonly factors: readonly number[];
  readonly alternative: number;
}

/** One alternative: between two neighbouring zeros of the spans' effects the same spans are worst. */
function partsOf(
  { structure }: Analysis,
  effects: readonly Effect[],
  factors: readonly number[],
  length: number,
  sense: number,
): Omit<Part, 'alternative'>[] {
  let fixed: Polynomial = [0];
  const free: { readonly index: number; readonly polynomial: Polynomial }[] = [];
  for (const [index, { polynomial, rounding }] of effects.entries()) {
    const factor = factors[index]!;
    if (factor === 0) continue;
    if (structure.cases[index]!.span === undefined) fixed = sum(fixed, polynomial, 1, sense * factor);
    else if (bound(polynomial, length) > rounding)
      free.push({ index, polynomial: polynomial.map(coefficient => sense * factor * coefficient) });
  }
  const zeros = free.flatMap(({ polynomial }) => roots(polynomial, 0, length));
  return stretches(zeros, length).map(({ from, to }) => {
    const middle = 0.5 * (from + to);
    const loaded = free.filter(({ polynomial }) => evaluate(polynomial, middle) > 0);
    return {
      from,
      to,
      polynomial: loaded.reduce((total, { polynomial }) => sum(total, polynomial), fixed),
      factors: factors.map((factor, k) =>
        structure.cases[k]!.span === undefined || loaded.some(({ index }) => index === k) ? factor : 0,
      ),
    };
  });
}

/** At each place the greater of two, the first where they are equal to within rounding. */
function greaterOf(first: readonly Part[], second: readonly Part[]): Part[] {
  const result: Part[] = [];
  const length = first.at(-1)?.to ?? 0;
  const ends = [...first, ...second].map(({ to }) => to);
  let [i, j] = [0, 0];
  for (const { from, to } of stretches(ends, length)) {
    const middle = 0.5 * (from + to);
    while (first[i]!.to < middle) i++;
    while (second[j]!.to < middle) j++;
    const [a, b] = [first[i]!, second[j]!];
    const gain = sum(b.polynomial, a.polynomial, 1, -1);
    const noise = EQUAL * Math.max(bound(a.polynomial, length), bound(b.polynomial, length));
    if (bound(gain, length) <= noise) {
      join(result, { ...a, from, to });
      continue;
    }
    for (const stretch of stretches(roots(gain, from, to), to, from)) {
      const isGreater = evaluate(gain, 0.5 * (stretch.from + stretch.to)) > 0;
      join(result, { ...(isGreater ? b : a), ...stretch });
    }
  }
  return result;
}

/** Two alternatives whose difference is smaller, relative to the larger, are equal. */
const EQUAL = 1e-12;

/** Neighbours of one polynomial are one part. */
function join(parts: Part[], part: Part): void {
  const last = parts.at(-1);
  if (last !== undefined && last.polynomial === part.polynomial && last.alternative === part.alternative)
    parts[parts.length - 1] = { ...last, to: part.to };
  else parts.push(part);
}

/** From `from` to `end`, cut at the places given; slivers no longer than rounding go with what follows. */
function stretches(cuts: readonly number[], end: number, start = 0): { readonly from: number; readonly to: number }[] {
  const sliver = 1e-12 * end;
  const result: { readonly from: number; readonly to: number }[] = [];
  let from = start;
  for (const cut of [...cuts].sort((a, b) => a - b)) {
    if (cut - from <= sliver || end - cut <= sliver) continue;
    result.push({ from, to: cut });
    from = cut;
  }
  result.push({ from, to: end });
  return result;
}
