// The loads of one case, worked out as forces on the freedoms and as what acts along each leg between its ends.

import type { LineDirection, Load, Structure } from '../model/structure.ts';
import type { Freedoms } from './freedoms.ts';
import type { Legs } from './legs.ts';
import { findPlace, SAME_PLACE, type Segments, segmentAt } from './segments.ts';
import { type Loading, SEGMENT_NUMBERS, shareOut } from './shares.ts';
import type { Ends } from './strains.ts';

/** Standard acceleration of gravity, m/s² (3rd CGPM, 1901). */
const GRAVITY = 9.80665;

export function loadingOf(
  structure: Structure,
  loads: readonly Load[],
  legs: Legs,
  freedoms: Freedoms,
  ends: Ends,
  segments: Segments,
): Loading {
  const sheet: Sheet = {
    structure,
    legs,
    freedoms,
    places: segments,
    nodal: new Float64Array(freedoms.count),
    segments: new Float64Array(SEGMENT_NUMBERS * segments.count),
    loaded: new Uint8Array(legs.count),
    applied: { x: 0, y: 0, moment: 0 },
  };
  for (const load of loads) apply(sheet, load);

  const shares = new Float64Array(2 * legs.count);
  const clamped = new Float64Array(3 * legs.count);
  const loading = { nodal: sheet.nodal, segments: sheet.segments, shares, clamped, applied: sheet.applied };
  for (let e = 0; e < legs.count; e++) if (sheet.loaded[e] === 1) shareOut(e, legs, ends, segments, loading);
  return loading;
}

/** What loads are entered on. */
interface Sheet {
  readonly structure: Structure;
  readonly legs: Legs;
  readonly freedoms: Freedoms;
  readonly places: Segments;
  readonly nodal: Float64Array;
  readonly segments: Float64Array;
  /** By leg: 1 where something acts between the ends. */
  readonly loaded: Uint8Array;
  readonly applied: { x: number; y: number; moment: number };
}

function apply(sheet: Sheet, load: Load): void {
  const { structure, legs, freedoms } = sheet;
  switch (load.kind) {
    case 'self-weight':
      for (const member of load.members) applyWeight(sheet, member, load.factor);
      return;
    case 'line': {
      const slope = (load.endIntensity - load.startIntensity) / (load.end - load.start);
      const { member, start, end, direction } = load;
      applyLine(sheet, member, start, end, load.startIntensity, slope, direction);
      return;
    }
    case 'force': {
      if (load.at.kind === 'point') {
        applyAtPoint(sheet, load.at.point, load.x, load.y);
        return;
      }
      const place = findPlace(structure, legs, load.at.member, load.at.distance);
      const e = place.leg;
      if (place.end !== undefined) {
        applyAtPoint(sheet, (place.end === 'start' ? legs.from : legs.to)[e]!, load.x, load.y);
        return;
      }
      const cosine = legs.cosine[e]!;
      const sine = legs.sine[e]!;
      const at = SEGMENT_NUMBERS * segmentAt(sheet.places, legs, e, place.distance);
      sheet.segments[at + 4]! += cosine * load.y - sine * load.x;
      sheet.segments[at + 5]! += cosine * load.x + sine * load.y;
      sheet.loaded[e] = 1;
      const point = structure.points[legs.from[e]!]!;
      addApplied(sheet, point.x + cosine * place.distance, point.y + sine * place.distance, load.x, load.y);
      return;
    }
    case 'couple': {
      sheet.applied.moment += load.moment;
      if (load.at.kind === 'along') {
        const { leg, distance, end } = findPlace(structure, legs, load.at.member, load.at.distance);
        applyCouple(sheet, leg, distance, end, load.moment);
        return;
      }
      const { point, member } = load.at;
      if (member === undefined) {
        sheet.nodal[freedoms.joint[point]!]! += load.moment;
        return;
      }
      const leg = legAtPoint(sheet, member, point);
      if (legs.to[leg] === point) applyCouple(sheet, leg, legs.length[leg]!, 'end', load.moment);
      else applyCouple(sheet, leg, 0, 'start', load.moment);
      return;
    }
    case 'movement':
    case 'heat':
    case 'lengthen':
      // No force: see imposed.ts.
      return;
  }
}

/** A bar has its weight half at each end. */
function applyWeight(sheet: Sheet, member: number, factor: number): void {
  const { kind, legs: chain, length } = sheet.structure.members[member]!;
  chain.forEach((leg, k) => {
    const weight = factor * GRAVITY * (sheet.structure.sections[leg.section]!.massPerLength ?? 0);
    if (weight === 0) return;
    if (kind === 'bar') {
      const e = sheet.legs.first[member]! + k;
      applyAtPoint(sheet, sheet.legs.from[e]!, 0, -0.5 * weight * leg.length);
      applyAtPoint(sheet, sheet.legs.to[e]!, 0, -0.5 * weight * leg.length);
      return;
    }
    const end = k === chain.length - 1 ? length : leg.start + leg.length;
    applyLine(sheet, member, leg.start, end, weight, 0, DOWN);
  });
}

const DOWN: LineDirection = { kind: 'global', x: 0, y: -1, onPlan: false };

/** Intensity `intensity` at `start`, from there on changing by `slope` a metre of the member. */
function applyLine(
  sheet: Sheet,
  member: number,
  start: number,
  end: number,
  intensity: number,
  slope: number,
  direction: LineDirection,
): void {
  const { structure, legs, places } = sheet;
  const chain = structure.members[member]!.legs;
  for (let k = 0; k < chain.length; k++) {
    const leg = chain[k]!;
    const tolerance = SAME_PLACE * leg.length;
    if (leg.start + leg.length <= start + tolerance) continue;
    if (leg.start >= end - tolerance) break;
    const e = legs.first[member]! + k;
    const [x, y] = forceOf(direction, leg.cosine, leg.sine);
    const along = leg.cosine * x + leg.sine * y;
    const across = leg.cosine * y - leg.sine * x;
    const point = structure.points[leg.from]!;
    for (let g = places.first[e]!; g < places.first[e + 1]!; g++) {
      const from = places.breaks[g + e]!;
      const to = places.breaks[g + e + 1]!;
      if (leg.start + from < start - tolerance || leg.start + to > end + tolerance) continue;
      const here = intensity + slope * (leg.start + from - start);
      const at = SEGMENT_NUMBERS * g;
      sheet.segments[at]! += here * across;
      sheet.segments[at + 1]! += slope * across;
      sheet.segments[at + 2]! += here * along;
      sheet.segments[at + 3]! += slope * along;
      const length = to - from;
      const total = length * (here + 0.5 * slope * length);
      // First moment about the start of the segment, over the segment.
      const moment = length * length * (here / 2 + (slope * length) / 3);
      addApplied(sheet, point.x + leg.cosine * from, point.y + leg.sine * from, total * x, total * y);
      sheet.applied.moment += moment * across;
    }
    sheet.loaded[e] = 1;
  }
}

/** Global force per length of a leg for a unit intensity. */
function forceOf(direction: LineDirection, cosine: number, sine: number): readonly [x: number, y: number] {
  switch (direction.kind) {
    case 'global': {
      const level = direction.onPlan ? Math.abs(cosine) : 1;
      return [direction.x * level, direction.y * level];
    }
    case 'square': {
      const side = cosine * direction.y - sine * direction.x < 0 ? -1 : 1;
      return [-side * sine, side * cosine];
    }
    case 'along':
      return [direction.sense * cosine, direction.sense * sine];
  }
}

function applyAtPoint(sheet: Sheet, point: number, x: number, y: number): void {
  const { first, axisX, axisY } = sheet.freedoms;
  const f = first[point]!;
  sheet.nodal[f]! += x * axisX[point]! + y * axisY[point]!;
  sheet.nodal[f + 1]! += y * axisX[point]! - x * axisY[point]!;
  const { x: atX, y: atY } = sheet.structure.points[point]!;
  addApplied(sheet, atX, atY, x, y);
}

/** On a bar, which no couple can bend, it goes to the ends as a pair of forces; see `shareOut`. */
function applyCouple(
  sheet: Sheet,
  leg: number,
  distance: number,
  end: 'start' | 'end' | undefined,
  moment: number,
): void {
  if (end !== undefined && sheet.legs.bending[leg] !== 0) {
    const { startRotation, endRotation } = sheet.freedoms;
    sheet.nodal[(end === 'start' ? startRotation : endRotation)[leg]!]! += moment;
    return;
  }
  const at = end === 'end' ? sheet.places.first[leg + 1]! - 1 : segmentAt(sheet.places, sheet.legs, leg, distance);
  sheet.segments[SEGMENT_NUMBERS * at + 6]! += moment;
  sheet.loaded[leg] = 1;
}

/** The leg of a member that ends at a point, or else the one that starts there. */
function legAtPoint({ structure, legs }: Sheet, member: number, point: number): number {
  for (let e = legs.first[member]!; e < legs.first[member + 1]!; e++) if (legs.to[e] === point) return e;
  const first = legs.first[member]!;
  if (legs.from[first] === point) return first;
  const { members, points } = structure;
  throw new Error(`A couple names ${members[member]!.name} at ${points[point]!.name}, which it does not pass`);
}

function addApplied(sheet: Sheet, atX: number, atY: number, x: number, y: number): void {
  sheet.applied.x += x;
  sheet.applied.y += y;
  sheet.applied.moment += atX * y - atY * x;
}
