// The loads that act together, case by case, spread onto legs and multiplied by their factors: what both the beam's and
// the frame's drawing draw from.
import { wholeCase } from '../model/patterns.ts';
import type { Leg, LineDirection, Load, Location, Structure } from '../model/structure.ts';
import { leftOut, thinned } from './thinning.ts';

/** Standard gravity, m/s². */
const GRAVITY = 9.80665;

/** What acts: a combination's alternative or a case alone. One factor for each of the structure's cases. */
export interface ActingCase {
  readonly name: string;
  readonly factor: number;
  readonly stretches: readonly Stretch[];
  readonly singles: readonly Single[];
  readonly movements: readonly Extract<Load, { kind: 'movement' }>[];
  readonly strains: readonly Strain[];
  /** Stretches of line loads that are too many to be drawn; then `stretches` holds self-weight alone. */
  readonly undrawnLines: number;
  /** Single loads left out beside larger ones. */
  readonly undrawnSingles: number;
}

/** A case with more stretches of line loads than this cannot be read as bands. */
const MOST_STRETCHES = 400;

export type Strain = Extract<Load, { kind: 'heat' | 'lengthen' }>;

/** Part of a line load on one leg. Intensities are factored, N/m, as stated: per level length where `onPlan`. */
export interface Stretch {
  readonly member: number;
  readonly leg: Leg;
  /** m along the member. */
  readonly start: number;
  readonly end: number;
  readonly startIntensity: number;
  readonly endIntensity: number;
  /** Global unit vector. */
  readonly x: number;
  readonly y: number;
  readonly kind: 'weight' | 'global' | 'plan' | 'square' | 'along';
  /** Index of the load, or of the first that its statement made: what one statement puts on several members is one load. */
  readonly load: number;
}

/** A force (N, factored, global components) or a couple (N m, anticlockwise) at a place (m). */
export interface Single {
  readonly kind: 'force' | 'couple';
  readonly x: number;
  readonly y: number;
  readonly moment: number;
  readonly place: { readonly x: number; readonly y: number };
  /** Index of the point it stands at, where it stands at one. */
  readonly point: number | undefined;
  readonly row: number | undefined;
  /** Of its row: how many loads it has, drawn or not, and m between two of them. */
  readonly inRow: { readonly count: number; readonly step: number } | undefined;
  readonly load: number;
}

/** The cases that have a load and a factor, in order. */
export function actingCases(structure: Structure, factors: readonly number[]): ActingCase[] {
  const cases: ActingCase[] = [];
  for (const [index, { name, span }] of structure.cases.entries()) {
    if (span !== undefined) continue;
    // What is loaded of a patterned case stands with the rest of it.
    const factorOf = (of: number): number => (wholeCase(structure.cases, of) === index ? (factors[of] ?? 0) : 0);
    const acting = structure.cases.map((_, of) => factorOf(of)).find(one => one !== 0);
    if (acting === undefined) continue;
    const stretches: Stretch[] = [];
    const singles: Single[] = [];
    const movements: Extract<Load, { kind: 'movement' }>[] = [];
    const strains: Strain[] = [];
    for (const [own, statement] of structure.loads.entries()) {
      const factor = factorOf(statement.case);
      if (factor === 0) continue;
      const load = firstOfStatement(structure, own);
      switch (statement.kind) {
        case 'self-weight':
          stretches.push(...weights(structure, statement, load, factor));
          break;
        case 'line':
          stretches.push(...spread(structure, statement, load, factor));
          break;
        case 'force':
        case 'couple':
          singles.push(single(structure, statement, load, factor));
          break;
        case 'movement':
          movements.push(factor === 1 ? statement : { ...statement, amount: statement.amount * factor });
          break;
        case 'heat':
          strains.push({ ...statement, above: statement.above * factor, below: statement.below * factor });
          break;
        case 'lengthen':
          strains.push({ ...statement, amount: statement.amount * factor });
          break;
      }
    }
    if (stretches.length + singles.length + movements.length + strains.length > 0) {
      const weights = stretches.filter(({ kind }) => kind === 'weight');
      const lines = stretches.length - weights.length;
      const isTooMany = lines > MOST_STRETCHES;
      cases.push({
        name,
        factor: acting,
        stretches: isTooMany ? weights : stretches,
        singles: thinned(singles),
        movements,
        strains,
        undrawnLines: isTooMany ? lines : 0,
        undrawnSingles: leftOut(singles),
      });
    }
  }
  return cases;
}

function firstOfStatement({ loads }: Structure, index: number): number {
  const { range } = loads[index] as Load;
  if (range.end === range.start) return index;
  return loads.findIndex(load => load.range.start === range.start && load.range.end === range.end);
}

/** Global components of a stretch per metre of its leg, at its two ends, N/m. */
export function perMetre(stretch: Stretch): { readonly start: number; readonly end: number } {
  const share = stretch.kind === 'plan' ? Math.abs(stretch.leg.cosine) : 1;
  return { start: stretch.startIntensity * share, end: stretch.endIntensity * share };
}

export function weights(
  structure: Structure,
  load: Extract<Load, { kind: 'self-weight' }>,
  index: number,
  factor: number,
): Stretch[] {
  return load.members.flatMap(member =>
    (structure.members[member]?.legs ?? []).flatMap(leg => {
      const mass = structure.sections[leg.section]?.massPerLength ?? 0;
      const weight = mass * GRAVITY * load.factor * factor;
      if (weight === 0) return [];
      return [
        {
          member,
          leg,
          start: leg.start,
          end: leg.start + leg.length,
          startIntensity: weight,
          endIntensity: weight,
          x: 0,
          y: -1,
          kind: 'weight' as const,
          load: index,
        },
      ];
    }),
  );
}

export function spread(
  structure: Structure,
  load: Extract<Load, { kind: 'line' }>,
  index: number,
  factor: number,
): Stretch[] {
  const slope = (load.endIntensity - load.startIntensity) / (load.end - load.start || 1);
  const at = (along: number): number => (load.startIntensity + slope * (along - load.start)) * factor;
  return (structure.members[load.member]?.legs ?? []).flatMap(leg => {
    const start = Math.max(load.start, leg.start);
    const end = Math.min(load.end, leg.start + leg.length);
    if (end - start <= 1e-9 * leg.length) return [];
    const { x, y, kind } = directionOn(leg, load.direction);
    return [
      {
        member: load.member,
        leg,
        start,
        end,
        startIntensity: at(start),
        endIntensity: at(end),
        x,
        y,
        kind,
        load: index,
      },
    ];
  });
}

function directionOn(leg: Leg, direction: LineDirection): Pick<Stretch, 'x' | 'y' | 'kind'> {
  switch (direction.kind) {
    case 'global':
      return { x: direction.x, y: direction.y, kind: direction.onPlan ? 'plan' : 'global' };
    case 'square': {
      const side = Math.sign(-leg.sine * direction.x + leg.cosine * direction.y) || 1;
      return { x: -leg.sine * side, y: leg.cosine * side, kind: 'square' };
    }
    case 'along':
      return { x: leg.cosine * direction.sense, y: leg.sine * direction.sense, kind: 'along' };
  }
}

function single(
  structure: Structure,
  load: Extract<Load, { kind: 'force' | 'couple' }>,
  index: number,
  factor: number,
): Single {
  const { place, point } = placeOf(structure, load.at);
  const acts =
    load.kind === 'force'
      ? { x: load.x * factor, y: load.y * factor, moment: 0 }
      : { x: 0, y: 0, moment: load.moment * factor };
  return { kind: load.kind, ...acts, place, point, row: load.row, inRow: undefined, load: index };
}

function placeOf(structure: Structure, at: Location): Pick<Single, 'place' | 'point'> {
  if (at.kind === 'point') {
    const { x, y } = structure.points[at.point] ?? { x: 0, y: 0 };
    return { place: { x, y }, point: at.point };
  }
  const legs = structure.members[at.member]?.legs ?? [];
  const leg = legs.find(({ start, length }) => at.distance <= start + length * (1 + 1e-9)) ?? legs.at(-1);
  if (leg === undefined) return { place: { x: 0, y: 0 }, point: undefined };
  const from = structure.points[leg.from] ?? { x: 0, y: 0 };
  const along = at.distance - leg.start;
  const point =
    Math.abs(along) <= 1e-9 * leg.length
      ? leg.from
      : Math.abs(along - leg.length) <= 1e-9 * leg.length
        ? leg.to
        : undefined;
  return { place: { x: from.x + leg.cosine * along, y: from.y + leg.sine * along }, point };
}
