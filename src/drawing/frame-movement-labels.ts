// How far a frame's joints and members move, in words beside the moved shape.
import { evaluate } from '../mechanics/polynomial.ts';
import type { MemberField, Solution } from '../mechanics/solution.ts';
import type { Structure } from '../model/structure.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { withUnit } from './figures.ts';
import type { Spot } from './geometry.ts';
import { movedSpot } from './moved-shape.ts';
import type { LabelRequest, Place } from './placing.ts';
import { largestSize, localExtremes, type Reading } from './readings.ts';
import type { Sheet } from './sheet.ts';
import { movementInWords } from './value-words.ts';
import { type DrawnLeg, pointsInUse, type View } from './view.ts';
import { plain } from './words.ts';

/** So many joints and so many places along members are told. */
const MOST_JOINTS = 4;
const MOST_PLACES = 2;
/** A component smaller than this share of the movement is not told. */
const MINOR = 0.05;

/** A place along a member is told where it departs from the line between its leg's ends by this share of the largest. */
const OWN = 0.2;

interface Moved {
  readonly size: number;
  readonly spot: Spot;
  readonly words: readonly string[];
}

/** Draws the dots and returns the labels. */
export function movementLabels(
  sheet: Sheet,
  structure: Structure,
  solution: Solution,
  legs: readonly (readonly DrawnLeg[])[],
  view: View,
  exaggeration: number,
  units: DisplayUnits,
): LabelRequest[] {
  const joints = movedJoints(structure, solution, view, exaggeration, units).slice(0, MOST_JOINTS);
  const places = movedPlaces(structure, solution, legs, view, exaggeration, units).slice(0, MOST_PLACES);
  const largest = Math.max(...[...joints, ...places].map(({ size }) => size));
  return [...joints, ...places].map(({ size, spot, words }) => {
    sheet.dot('move', spot, 2.3);
    return {
      labels: [plain(words.join(', ')), plain(words[0] ?? '')],
      places: placesAround(spot),
      role: 'move' as const,
      rank: size / largest,
      optional: size < largest * 0.999,
    };
  });
}

/** The largest first. */
function movedJoints(
  structure: Structure,
  solution: Solution,
  view: View,
  exaggeration: number,
  units: DisplayUnits,
): Moved[] {
  const moved = pointsInUse(structure).flatMap((index): Moved[] => {
    const [x, y] = [solution.movements[3 * index] ?? 0, solution.movements[3 * index + 1] ?? 0];
    const size = Math.hypot(x, y);
    const point = structure.points[index];
    if (size === 0 || point === undefined) return [];
    const words: string[] = [];
    const level = movementInWords(x, { x: Math.sign(x), y: 0 }, units);
    const upright = movementInWords(y, { x: 0, y: -Math.sign(y) }, units);
    if (Math.abs(x) > MINOR * size) words.push(level);
    if (Math.abs(y) > MINOR * size) words.push(upright);
    if (Math.abs(y) > Math.abs(x)) words.reverse();
    return [{ size, spot: view.spot(point.x + exaggeration * x, point.y + exaggeration * y), words }];
  });
  const largest = Math.max(0, ...moved.map(({ size }) => size));
  return moved.filter(({ size }) => size > 1e-3 * largest).sort((a, b) => b.size - a.size);
}

/** Places along members that depart further from where they stood than both ends. */
function movedPlaces(
  structure: Structure,
  solution: Solution,
  legs: readonly (readonly DrawnLeg[])[],
  view: View,
  exaggeration: number,
  units: DisplayUnits,
): Moved[] {
  const largest = largestSize(solution.members, 'transverseMovement');
  const found = solution.members.flatMap((member, m) =>
    localExtremes(member, 'transverseMovement', largest).flatMap((reading): Moved[] => {
      const leg = legs[m]?.[reading.piece.leg];
      if (leg === undefined || reading.kind !== 'level' || departure(member, reading) < OWN * largest) return [];
      const way = { x: leg.left.x * Math.sign(reading.value), y: leg.left.y * Math.sign(reading.value) };
      const isSquare = Math.abs(way.x) < 0.05 || Math.abs(way.y) < 0.05;
      const name = structure.members[m]?.name ?? '';
      const words = isSquare
        ? movementInWords(reading.value, way, units)
        : `${withUnit(Math.abs(reading.value), units.deflection)} square to ${name}`;
      const spot = movedSpot(reading.piece, leg, reading.distance - reading.piece.start, exaggeration * view.scale);
      return [{ size: Math.abs(reading.value), spot, words: [words] }];
    }),
  );
  return found.filter(({ size }) => size > 0.1 * largest).sort((a, b) => b.size - a.size);
}

/** From the straight line between the leg's moved ends, m. */
function departure(member: MemberField, { piece, distance, value }: Reading): number {
  const own = member.pieces.filter(({ leg }) => leg === piece.leg);
  const first = own[0] ?? piece;
  const last = own.at(-1) ?? piece;
  const start = evaluate(first.transverseMovement, 0);
  const end = evaluate(last.transverseMovement, last.end - last.start);
  const share = (distance - first.start) / (last.end - first.start);
  return Math.abs(value - start - (end - start) * share);
}

function placesAround({ x, y }: Spot): Place[] {
  return [
    { at: { x: x + 7, y: y + 14 }, anchor: 'start' },
    { at: { x: x - 7, y: y + 14 }, anchor: 'end' },
    { at: { x, y: y - 8 }, anchor: 'middle' },
    { at: { x: x + 7, y: y - 6 }, anchor: 'start' },
    { at: { x: x - 7, y: y - 6 }, anchor: 'end' },
    { at: { x, y: y + 18 }, anchor: 'middle' },
    { at: { x, y: y - 22 }, anchor: 'middle' },
    { at: { x: x + 7, y: y + 28 }, anchor: 'start' },
    { at: { x: x - 7, y: y + 28 }, anchor: 'end' },
  ];
}
