// Holds each movement against the second road: the virtual work of unit actions at the place that the first road found.
import { sizesOf } from '../mechanics/index.ts';
import type { ResolvedMeasure, UnitAction } from '../model/question.ts';
import { isMovement } from '../model/questions.ts';
import { positionAlong } from '../model/spans.ts';
import type { Location, Structure } from '../model/structure.ts';
import type { Check } from './result.ts';
import type { Solved } from './solved.ts';

/** Past this relative difference, or residual, an answer is withheld. */
export const MOST_DIFFERENCE = 1e-9;

/** Answers smaller than this part of the largest movement are held against that part instead: rounding grows as they shrink. */
const SMALL_ANSWER = 1e-3;

/** A measure as it was taken under one alternative. */
export interface Taken {
  readonly measure: ResolvedMeasure;
  /** Where along a member its value stands, for an extreme. */
  readonly place: Place | undefined;
  readonly value: number;
  readonly factors: readonly number[];
  readonly solved: Solved;
}

interface Place {
  readonly member: number;
  readonly distance: number;
}

/** What the second road says of a measure. */
export interface Held {
  /** Relative difference of the two roads, 0 where the measure is no movement, Infinity where the second has no answer. */
  readonly difference: number;
  /** The size below which a movement is rounding and nothing else, m or rad. */
  readonly rounding: number;
}

/** Everything that a measure is held against, and its rounding as in `Held`. */
export function checkOf(taken: Taken): Check & Pick<Held, 'rounding'> {
  const { solved, factors } = taken;
  const { difference, rounding } = hold(taken);
  const solution = solved.solution(factors);
  const { equilibrium, energy } = solved.secondRoad.balance(factors, solution);
  return { difference, residual: Math.max(solution.residual, equilibrium), energy, rounding };
}

export function isBorneOut({ difference, residual, energy }: Check): boolean {
  return difference <= MOST_DIFFERENCE && residual <= MOST_DIFFERENCE && energy <= MOST_DIFFERENCE;
}

function hold({ measure, place, value, factors, solved }: Taken): Held {
  const actions = unitActions(measure, place, solved.analysis.structure);
  if (actions === undefined) return { difference: 0, rounding: 0 };
  // Over a hinge, a connection or a release a member that runs on moves by another amount on either side: the one that was
  // meant is the nearer.
  const parted = measure.kind === 'rotation' || hasReleases(solved.analysis.structure);
  const ways = parted && place !== undefined ? [onSide(actions, 'before'), onSide(actions, 'after')] : [actions];
  const solution = solved.solution(factors);
  const largest = sizesOf(solution)[measure.kind === 'rotation' ? 'rotation' : 'movement'];
  let held: Held = { difference: Infinity, rounding: 0 };
  for (const way of ways) {
    const other = solved.secondRoad.movement(factors, () => solution, way);
    if (other === undefined || Number.isNaN(other.value)) continue;
    const apart = Math.abs(value - other.value);
    // Against the last term, two roads that differ by rounding alone agree.
    const scale = Math.max(
      Math.abs(value),
      Math.abs(other.value),
      SMALL_ANSWER * largest,
      other.rounding / MOST_DIFFERENCE,
    );
    const difference = (scale === 0 ? 0 : apart / scale) + other.gap;
    if (difference < held.difference) held = { difference, rounding: other.rounding };
  }
  return held;
}

/** The first action is the one at the place; the ends of a sag's chord are those behind the points. */
function onSide(actions: readonly UnitAction[], side: 'before' | 'after'): readonly UnitAction[] {
  return actions.map((action, index) => ({ ...action, side: index === 0 ? side : 'after' }));
}

function hasReleases({ members }: Structure): boolean {
  return members.some(({ legs }) =>
    legs.some(leg => [leg.startAttachment, leg.endAttachment].some(end => end !== undefined && end.freed.length > 0)),
  );
}

/** The virtual loads of a movement, in the sense in which the measure is positive; undefined for what is no movement. */
function unitActions(
  measure: ResolvedMeasure,
  place: Place | undefined,
  structure: Structure,
): readonly UnitAction[] | undefined {
  if (!isMovement(measure.kind)) return undefined;
  const at: Location | undefined =
    place !== undefined ? { kind: 'along', ...place } : 'at' in measure ? measure.at : undefined;
  if (at === undefined) return undefined;
  switch (measure.kind) {
    case 'deflection':
      return [{ at, x: 0, y: -1, moment: 0 }];
    case 'sway':
      return [{ at, x: 1, y: 0, moment: 0 }];
    case 'rotation':
      return [{ at, x: 0, y: 0, moment: 1 }];
    case 'sag':
      return at.kind === 'along' ? sagActions(measure, at, structure) : undefined;
    default:
      return undefined;
  }
}

/** A unit force at the place towards the underside of the chord, held by its parts against it at the chord's ends. */
function sagActions(measure: ResolvedMeasure, at: Place, structure: Structure): readonly UnitAction[] {
  const member = structure.members[at.member]!;
  const stretch = ('stretch' in measure ? measure.stretch : undefined) ?? { start: 0, end: member.length };
  const [start, end] = [positionAlong(structure, member, stretch.start), positionAlong(structure, member, stretch.end)];
  const length = Math.hypot(end.x - start.x, end.y - start.y);
  const reversed = 'reversed' in measure && measure.reversed;
  const [along, across] = [(end.x - start.x) / length, (end.y - start.y) / length];
  const sign = reversed ? -1 : 1;
  const [x, y] = [sign * across, -sign * along];
  const here = positionAlong(structure, member, at.distance);
  const part = ((here.x - start.x) * along + (here.y - start.y) * across) / length;
  const on = (distance: number): Location => ({ kind: 'along', member: at.member, distance });
  return [
    { at: on(at.distance), x, y, moment: 0 },
    { at: on(stretch.start), x: -(1 - part) * x, y: -(1 - part) * y, moment: 0 },
    { at: on(stretch.end), x: -part * x, y: -part * y, moment: 0 },
  ];
}
