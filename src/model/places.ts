// Where things stand: points, distances along members and stretches of them, as words of a statement name them. A place
// that is none is told at its words.
import type { End, Name, Place, PlaceOnMember, Stretch } from '../language/syntax.ts';
import { A_LENGTH } from './dues.ts';
import type { Figures } from './figures.ts';
import { CLOSING_TOLERANCE, distanceOf, type Geometry, type LaidMember } from './geometry.ts';
import { metres } from './length-words.ts';
import type { Report } from './report.ts';
import type { Location } from './structure.ts';

/** The members that have an end, or run through, at a point: one entry for each leg end, bars left out. */
export function endsAt(geometry: Geometry, point: number): number[] {
  return geometry.members.flatMap((member, index) =>
    member.kind === 'bar'
      ? []
      : member.legs.flatMap(leg => [leg.from, leg.to].flatMap(end => (end === point ? [index] : []))),
  );
}

/** Members, bars and groups by name, each member once; undefined where one does not resolve. */
export function membersNamed(names: readonly Name[], geometry: Geometry): number[] | undefined {
  const members = new Set<number>();
  for (const { text } of names) {
    const index = geometry.memberNamed.get(text);
    const group = geometry.groups.find(other => other.name === text);
    if (index !== undefined) members.add(index);
    else if (group !== undefined) for (const member of group.members) members.add(member);
    else return undefined;
  }
  return [...members];
}

/** Where a load or a question stands; undefined where it does not (reported, under the code given). */
export function readPlace(
  place: Place,
  within: Name | undefined,
  geometry: Geometry,
  figures: Figures,
  report: Report,
  code: 'bad-load' | 'bad-question',
): Location | undefined {
  if (place.kind === 'point') {
    const point = geometry.pointNamed.get(place.point.text);
    if (point === undefined) return undefined;
    if (within === undefined) return { kind: 'point', point };
    const member = geometry.memberNamed.get(within.text);
    if (member === undefined) {
      if (geometry.groups.some(group => group.name === within.text))
        report.error(code, within.range, `${within.text} is a group: name the member that is meant.`);
      return undefined;
    }
    if (distanceOf(geometry.members[member]!, point) !== undefined) return { kind: 'point', point, member };
    report.error(code, place.range, `${place.point.text} is not on ${within.text}.`);
    return undefined;
  }
  const index = geometry.memberNamed.get(place.member.text);
  if (index === undefined) return undefined;
  const member = geometry.members[index]!;
  if (within !== undefined && within.text !== place.member.text) {
    report.error(code, within.range, `The place is on ${place.member.text}, so it cannot be in ${within.text}.`);
    return undefined;
  }
  const distance = locateOnMember(place, member, geometry.pointNamed, figures, report);
  return distance === undefined ? undefined : { kind: 'along', member: index, distance };
}

export interface ReadStretch {
  /** Distances along the member, start < end. */
  readonly start: number;
  readonly end: number;
  /** Whether the writer went against the member's travel. */
  readonly reversed: boolean;
}

export function readStretch(
  stretch: Stretch,
  member: LaidMember,
  geometry: Geometry,
  figures: Figures,
  report: Report,
  code: 'bad-load' | 'bad-question',
): ReadStretch | undefined {
  const from = readEnd(stretch.from, member, geometry, figures, report, code);
  const to = readEnd(stretch.to, member, geometry, figures, report, code);
  if (from === undefined || to === undefined) return undefined;
  if (Math.abs(to - from) <= 1e-9 * member.length) {
    report.error(code, stretch.range, `This part of ${member.name} has no length.`);
    return undefined;
  }
  return from < to ? { start: from, end: to, reversed: false } : { start: to, end: from, reversed: true };
}

function readEnd(
  end: End,
  member: LaidMember,
  geometry: Geometry,
  figures: Figures,
  report: Report,
  code: 'bad-load' | 'bad-question',
): number | undefined {
  if (end.kind === 'point') {
    const point = geometry.pointNamed.get(end.point.text);
    if (point === undefined) return undefined;
    const distance = distanceOf(member, point);
    if (distance === undefined) report.error(code, end.range, `${end.point.text} is not on ${member.name}.`);
    return distance;
  }
  const distance = figures.number(end.distance, A_LENGTH);
  if (distance === undefined) return undefined;
  if (distance < 0 || distance > member.length * (1 + 1e-6)) {
    report.error(
      code,
      end.range,
      distance < 0
        ? `A distance along ${member.name} is never negative.`
        : `${metres(distance)} along ${member.name} is past its end (${metres(member.length)}).`,
    );
    return undefined;
  }
  return Math.min(distance, member.length);
}

/** A place `2.4 m from A on R1` as a distance from the member's first point; undefined where it is none (reported). */
export function locateOnMember(
  at: PlaceOnMember,
  member: LaidMember,
  pointNamed: ReadonlyMap<string, number>,
  figures: Figures,
  report: Report,
): number | undefined {
  const distance = figures.number(at.distance, A_LENGTH);
  const from = pointNamed.get(at.from.text);
  if (distance === undefined || from === undefined) return undefined;
  const start = distanceOf(member, from);
  if (start === undefined) {
    report.error('bad-geometry', at.from.range, `${at.from.text} is not on ${member.name}.`, {
      hint: `measure from a point of ${member.name}`,
    });
    return undefined;
  }
  const sense = senseOf(at, member, start, pointNamed, report);
  if (sense === undefined) return undefined;
  if (distance < 0) {
    report.error('bad-geometry', at.distance.range, `A distance along ${member.name} is never negative.`, {
      hint: 'say towards which point it is measured',
    });
    return undefined;
  }
  const room = sense > 0 ? member.length - start : start;
  const slack = CLOSING_TOLERANCE * member.length;
  if (distance > room + slack) {
    report.error('bad-geometry', at.distance.range, pastEnd(distance, room, member, at.from.text, start), {});
    return undefined;
  }
  return Math.min(member.length, Math.max(0, start + sense * distance));
}

function pastEnd(distance: number, room: number, member: LaidMember, from: string, start: number): string {
  const measured = start === 0 ? '' : ` from ${from}`;
  return `${metres(distance)}${measured} along ${member.name} is past its end (${metres(room)}).`;
}

function senseOf(
  at: PlaceOnMember,
  member: LaidMember,
  start: number,
  pointNamed: ReadonlyMap<string, number>,
  report: Report,
): 1 | -1 | undefined {
  if (at.towards === undefined) return start >= member.length * (1 - 1e-12) ? -1 : 1;
  const point = pointNamed.get(at.towards.text);
  const towards = point === undefined ? undefined : distanceOf(member, point);
  if (point !== undefined && (towards === undefined || towards === start)) {
    report.error(
      'bad-geometry',
      at.towards.range,
      towards === undefined
        ? `${at.towards.text} is not on ${member.name}.`
        : `${at.towards.text} gives no direction from itself.`,
    );
  }
  if (towards === undefined || towards === start) return undefined;
  return towards > start ? 1 : -1;
}
