// Patterned loads: which spans to load for the worst of a measure. Whatever is measured is the largest or the least of
// quantities that are linear in the loads; for each of them the worst set holds the spans that add to it, and no set of
// spans is tried out.

import type { MemberStretch, ResolvedMeasure } from '../model/question.ts';
import type { Leg, Structure } from '../model/structure.ts';
import { envelopeAlong, type LinearQuantity } from './envelope.ts';
import { pieceAt, type Side } from './field.ts';
import type { AskedAlong } from './measure-along.ts';
import { evaluate, extremes, sum } from './polynomial.ts';
import { distanceOf, PLAIN_QUANTITIES } from './quantities.ts';
import { roundingIn } from './rounding.ts';
import { sagOf } from './sag.ts';
import type { Analysis, Solution } from './solution.ts';

/**
 * The sets of loaded spans, as factors by case, among which are those with the largest and the least value of the measure;
 * not those with the least stress, which is a sum of sizes. A few, and at least one.
 */
export function worstPatterns(
  analysis: Analysis,
  factors: readonly number[],
  asked: ResolvedMeasure,
): readonly (readonly number[])[] {
  const found = new Map<string, readonly number[]>();
  const add = (pattern: readonly number[]): void => {
    found.set(pattern.join(' '), pattern);
  };
  if (asked.kind !== 'reaction' && 'along' in asked) {
    for (const quantity of quantitiesOf(analysis.structure, asked))
      for (const sense of [1, -1] as const) add(worstAlong(analysis, factors, asked, quantity, sense));
  } else {
    for (const effects of effectsAt(analysis, asked))
      for (const sense of [1, -1] as const) add(adverse(analysis.structure, factors, effects, sense));
  }
  return [...found.values()];
}

/** Of every case, the value of one linear quantity at one place. */
type Effects = readonly number[];

/** The factors, 0 for spans whose effect does not add to the sense. */
function adverse({ cases }: Structure, factors: readonly number[], effects: Effects, sense: number): readonly number[] {
  const sizes = effects.map((effect, k) => Math.abs(effect * factors[k]!));
  const noise = NEGLIGIBLE * Math.max(...sizes);
  return factors.map((factor, k) =>
    cases[k]!.span === undefined || sense * effects[k]! * factor > noise ? factor : 0,
  );
}

/** An effect that is smaller beside the largest is none. */
const NEGLIGIBLE = 1e-12;

/** For one member, the quantity as it follows from one solution. */
type QuantityOf = (member: number, stretch: MemberStretch) => (solution: Solution) => LinearQuantity;

/** A stress is the larger of N/A + M/W and N/A − M/W in size; every other measure has one quantity. */
function quantitiesOf(structure: Structure, asked: Exclude<ResolvedMeasure, { kind: 'reaction' }>): QuantityOf[] {
  const { kind } = asked;
  if (kind === 'stress')
    return [1, -1].map(side => () => (solution: Solution) => fibreStress(structure, solution, side));
  if (kind === 'sag') {
    const reversed = 'reversed' in asked && asked.reversed;
    return [
      (member, stretch) => solution => {
        const { polynomial } = sagOf(structure, solution.members[member]!, member, stretch, reversed);
        return { polynomial, rounding: () => roundingIn(solution, 'movement') };
      },
    ];
  }
  const { kind: of, polynomial } = PLAIN_QUANTITIES[kind];
  return [() => solution => ({ polynomial, rounding: () => roundingIn(solution, of) })];
}

/** A figure that the section lacks leaves its part out; the measure itself tells that it is missing. */
function fibreStress({ sections }: Structure, solution: Solution, side: number): LinearQuantity {
  const parts = ({ section }: Leg): readonly [number, number] => {
    const { area, sectionModulus } = sections[section]!;
    return [area === undefined ? 0 : 1 / area, sectionModulus === undefined ? 0 : side / sectionModulus];
  };
  return {
    polynomial: ({ axialForce, bendingMoment }, leg) => sum(axialForce, bendingMoment, ...parts(leg)),
    rounding: leg => {
      const [axial, bending] = parts(leg);
      return axial * roundingIn(solution, 'force') + Math.abs(bending) * roundingIn(solution, 'moment');
    },
  };
}

/** The set of spans with the greatest value of sense × the quantity anywhere on the members; among equals the first. */
function worstAlong(
  analysis: Analysis,
  factors: readonly number[],
  asked: AskedAlong,
  quantityOf: QuantityOf,
  sense: 1 | -1,
): readonly number[] {
  let [worst, value] = [factors, Number.NEGATIVE_INFINITY];
  for (const member of asked.along) {
    const stretch = asked.stretch ?? { start: 0, end: analysis.structure.members[member]!.length };
    const slack = 1e-9 * analysis.structure.members[member]!.length;
    for (const piece of envelopeAlong(analysis, member, quantityOf(member, stretch), [factors], sense)) {
      const from = Math.max(piece.from, stretch.start - piece.start);
      const to = Math.min(piece.to, stretch.end - piece.start);
      // A piece may be short; one that only touches the stretch belongs to what lies beside it.
      if (!(to > from) || (to - from <= slack && piece.to - piece.from > slack)) continue;
      for (const s of extremes(piece.polynomial, from, to)) {
        const here = sense * evaluate(piece.polynomial, s);
        if (here > value + EQUAL * Math.abs(value) || value === Number.NEGATIVE_INFINITY)
          [worst, value] = [piece.factors, here];
      }
    }
  }
  return worst;
}

/** As in the search along a member: values that differ by rounding are equal. */
const EQUAL = 5e-13;

/** What is measured at one place: each linear quantity that may be the answer there. */
function effectsAt(
  analysis: Analysis,
  asked: Exclude<ResolvedMeasure, { readonly along: readonly number[] }>,
): Effects[] {
  const { structure, cases } = analysis;
  if (asked.kind === 'reaction') {
    const part = ({ horizontal: 'x', vertical: 'y', moment: 'moment' } as const)[asked.component];
    const kind = part === 'moment' ? 'moment' : 'force';
    return [cases.map(solution => beyond(solution.reactions[asked.support]![part], roundingIn(solution, kind)))];
  }
  const { at, kind } = asked;
  if (at.kind === 'along') return effectsBeside(analysis, asked, at.member, at.distance);
  const freedom = { sway: 0, deflection: 1, rotation: 2 }[kind as 'sway' | 'deflection' | 'rotation'];
  const joint = cases.map(({ movements }) => (freedom === 1 ? -1 : 1) * movements[3 * at.point + freedom]!);
  if (kind !== 'rotation') return [joint];
  // The ends of members may turn apart from the joint; which of them is meant, the measure itself decides.
  const ends = structure.members.flatMap((_, member) => {
    const distance = distanceOf(structure, member, at.point);
    return distance === undefined ? [] : effectsBeside(analysis, asked, member, distance);
  });
  return [joint, ...ends];
}

function effectsBeside(
  { structure, cases }: Analysis,
  asked: Exclude<ResolvedMeasure, { kind: 'reaction' }>,
  member: number,
  distance: number,
): Effects[] {
  const { legs, length } = structure.members[member]!;
  const sides: readonly Side[] = ['before', 'after'];
  return quantitiesOf(structure, asked).flatMap(quantityOf =>
    sides.map(side =>
      cases.map(solution => {
        const { polynomial, rounding } = quantityOf(member, { start: 0, end: length })(solution);
        const piece = pieceAt(solution.members[member]!, distance, side);
        const leg = legs[piece.leg]!;
        const s = Math.min(Math.max(distance - piece.start, 0), piece.end - piece.start);
        return beyond(evaluate(polynomial(piece, leg), s), rounding(leg));
      }),
    ),
  );
}

function beyond(value: number, rounding: number): number {
  return Math.abs(value) <= rounding ? 0 : value;
}
