// Where along each leg the loads of any case begin, end or act: the segments that every field is a polynomial on. They are
// the same for all cases, so that fields can be superposed term by term.

import type { Location, Structure } from '../model/structure.ts';
import type { Legs } from './legs.ts';

/** Segments in order along each leg. */
export interface Segments {
  readonly count: number;
  /** First segment of each leg; legs + 1. */
  readonly first: Int32Array;
  /** Distances from the leg's start, m; segments + legs numbers, those of leg e from `first[e] + e`, its ends included. */
  readonly breaks: Float64Array;
}

/** A place on a leg; at an end of it, `end` says which. */
export interface Place {
  readonly leg: number;
  /** From the leg's start, m. */
  readonly distance: number;
  readonly end: 'start' | 'end' | undefined;
}

export function findSegments(structure: Structure, legs: Legs): Segments {
  const inner = innerBreaks(structure, legs);
  const first = new Int32Array(legs.count + 1);
  for (let e = 0; e < legs.count; e++) first[e + 1] = first[e]! + 1 + (inner.get(e)?.length ?? 0);
  const count = first[legs.count]!;
  const breaks = new Float64Array(count + legs.count);
  for (let e = 0; e < legs.count; e++) {
    const start = first[e]! + e;
    inner.get(e)?.forEach((distance, k) => {
      breaks[start + 1 + k] = distance;
    });
    breaks[first[e + 1]! + e] = legs.length[e]!;
  }
  return { count, first, breaks };
}

/**
 * Two places closer than this, relative to the leg, are one: distances are sums of written figures, and what they differ
 * by is rounding.
 */
export const SAME_PLACE = 1e-9;

/** The leg that holds a distance along a member. On a point between two legs it is the end of the first. */
export function findPlace(structure: Structure, legs: Legs, member: number, distance: number): Place {
  const chain = structure.members[member]!.legs;
  let k = 0;
  while (k < chain.length - 1 && distance > chain[k]!.start + chain[k]!.length * (1 + SAME_PLACE)) k++;
  const leg = legs.first[member]! + k;
  const length = legs.length[leg]!;
  const along = distance - chain[k]!.start;
  if (along <= length * SAME_PLACE) return { leg, distance: 0, end: 'start' };
  if (along >= length * (1 - SAME_PLACE)) return { leg, distance: length, end: 'end' };
  return { leg, distance: along, end: undefined };
}

/** The segment that starts at a place within a leg, or the one that the place lies in or ends. */
export function segmentAt(segments: Segments, legs: Legs, leg: number, distance: number): number {
  const start = segments.first[leg]! + leg;
  const end = segments.first[leg + 1]! + leg;
  const tolerance = SAME_PLACE * legs.length[leg]!;
  let k = start;
  while (k + 1 < end && segments.breaks[k + 1]! <= distance + tolerance) k++;
  return k - leg;
}

function innerBreaks(structure: Structure, legs: Legs): ReadonlyMap<number, readonly number[]> {
  const found = new Map<number, number[]>();
  const add = (member: number, distance: number) => {
    const { leg, distance: along, end } = findPlace(structure, legs, member, distance);
    if (end !== undefined) return;
    const others = found.get(leg);
    if (others === undefined) found.set(leg, [along]);
    else others.push(along);
  };
  const addLocation = (at: Location) => {
    if (at.kind === 'along') add(at.member, at.distance);
  };
  for (const load of structure.loads) {
    if (load.kind === 'line') {
      add(load.member, load.start);
      add(load.member, load.end);
    } else if (load.kind === 'force' || load.kind === 'couple') addLocation(load.at);
  }
  for (const [leg, distances] of found) found.set(leg, distinct(distances, SAME_PLACE * legs.length[leg]!));
  return found;
}

/** In ascending order, without those that one before stands for. */
function distinct(distances: number[], tolerance: number): number[] {
  const kept: number[] = [];
  for (const distance of distances.sort((a, b) => a - b)) {
    if (kept.length === 0 || distance - kept[kept.length - 1]! > tolerance) kept.push(distance);
  }
  return kept;
}
