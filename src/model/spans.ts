// Spans of members: the stretch through a place between the points either side where the member is supported, meets
// another member, or ends. It is what `span` in a limit means.
import type { MemberStretch } from './question.ts';
import type { Location, Member, Structure } from './structure.ts';

export interface Span {
  /** Names of the points at its ends, or the distance along the member where a stretch was cut to measure. */
  readonly from: string;
  readonly to: string;
  /** Measured straight, m. */
  readonly length: number;
}

/** Two places closer than this part of a member's length are one. */
const PLACE_TOLERANCE = 1e-9;

/** The spans that meet at a place: one inside a span, two where two meet. `within` is a stretch that bounds the search. */
export function spansAt(structure: Structure, place: Location, within?: MemberStretch): Span[] {
  if (place.kind === 'along') return spansOfMember(structure, structure.members[place.member]!, place.distance, within);
  const through = place.member === undefined ? structure.members : [structure.members[place.member]!];
  return through.flatMap(member => {
    const distance = distanceAt(member, place.point);
    return distance === undefined ? [] : spansOfMember(structure, member, distance, within);
  });
}

/** The spans of a member from its start to its end, overhangs included: distances along it, and the points between which they lie. */
export function spansAlong(
  structure: Structure,
  member: Member,
): (MemberStretch & { readonly from: string; readonly to: string })[] {
  const bounds = boundsOf(structure, member, undefined, PLACE_TOLERANCE * member.length);
  return bounds.slice(1).map((to, i) => {
    const from = bounds[i]!;
    return { start: from.distance, end: to.distance, from: from.name, to: to.name };
  });
}

/** Coordinates of a place along a member. */
export function positionAlong(
  structure: Structure,
  member: Member,
  distance: number,
): { readonly x: number; readonly y: number } {
  const leg = member.legs.find(({ start, length }) => distance <= start + length) ?? member.legs.at(-1)!;
  const from = structure.points[leg.from]!;
  const to = structure.points[leg.to]!;
  const part = (distance - leg.start) / leg.length;
  if (part >= 1) return to;
  return { x: from.x + part * (to.x - from.x), y: from.y + part * (to.y - from.y) };
}

function spansOfMember(
  structure: Structure,
  member: Member,
  distance: number,
  within: MemberStretch | undefined,
): Span[] {
  const slack = PLACE_TOLERANCE * member.length;
  const bounds = boundsOf(structure, member, within, slack);
  const spans: Span[] = [];
  for (const [i, to] of bounds.entries()) {
    const from = bounds[i - 1];
    if (from === undefined || distance < from.distance - slack || distance > to.distance + slack) continue;
    const [a, b] = [positionAlong(structure, member, from.distance), positionAlong(structure, member, to.distance)];
    spans.push({ from: from.name, to: to.name, length: Math.hypot(b.x - a.x, b.y - a.y) });
  }
  return spans;
}

interface Bound {
  readonly distance: number;
  readonly name: string;
}

function boundsOf(structure: Structure, member: Member, within: MemberStretch | undefined, slack: number): Bound[] {
  const points = [member.legs[0]!.from, ...member.legs.map(leg => leg.to)];
  const distances = [0, ...member.legs.map(leg => leg.start + leg.length)];
  const all = points.map((point, i) => ({ point, distance: distances[i]!, name: structure.points[point]!.name }));
  const start = within?.start ?? 0;
  const end = within?.end ?? member.length;
  const named = (distance: number): Bound =>
    all.find(other => Math.abs(other.distance - distance) <= slack) ?? {
      distance,
      name: `${Number(distance.toPrecision(4))} m`,
    };
  const inner = all.filter(
    ({ point, distance }) => distance > start + slack && distance < end - slack && bounds(structure, member, point),
  );
  return [named(start), ...inner, named(end)];
}

function bounds(structure: Structure, member: Member, point: number): boolean {
  if (structure.supports.some(support => support.point === point)) return true;
  return structure.members.some(other => other !== member && distanceAt(other, point) !== undefined);
}

function distanceAt(member: Member, point: number): number | undefined {
  for (const leg of member.legs) {
    if (leg.from === point) return leg.start;
    if (leg.to === point) return leg.start + leg.length;
  }
  return undefined;
}
