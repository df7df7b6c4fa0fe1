// Loads, real or virtual, as the force method takes them: forces and couples on points, loads within legs, movements of
// the ground, free strains of legs.
import { STANDARD_GRAVITY } from '../model/gravity.ts';
import type { LineDirection, Load, Location } from '../model/structure.ts';
import { emptySpanLoad, type SpanLoad } from './span.ts';
import { type End, releaseAt, type StaticLeg, type Statics } from './statics.ts';

export interface Loading {
  /** N and N m, by the rows of the equations. */
  readonly joints: Float64Array;
  /** By leg. */
  readonly spans: Map<number, SpanLoad>;
  /** Imposed movement of each ground along its reaction, m or rad; undefined for none. */
  ground: Float64Array | undefined;
  /** By leg: what it would take on without any force; undefined for none. */
  free: FreeStrain[] | undefined;
}

/** Of heat and lack of fit, the same all along a leg. */
export interface FreeStrain {
  /** Strain of the axis, positive where it grows longer. */
  readonly axial: number;
  /** 1/m, in the sense of M/EI. */
  readonly curvature: number;
}

export const UNSTRAINED: FreeStrain = { axial: 0, curvature: 0 };

export function emptyLoading(statics: Statics): Loading {
  return { joints: new Float64Array(statics.rowCount), spans: new Map(), ground: undefined, free: undefined };
}

/** `factor` times the load, added to the loading. */
export function addLoad(statics: Statics, loading: Loading, load: Load, factor: number): void {
  switch (load.kind) {
    case 'self-weight':
      for (const member of load.members) addSelfWeight(statics, loading, member, load.factor * factor);
      return;
    case 'line':
      addLine(statics, loading, load, factor);
      return;
    case 'force':
      addAction(statics, loading, load.at, load.x * factor, load.y * factor, 0);
      return;
    case 'couple':
      addAction(statics, loading, load.at, 0, 0, load.moment * factor);
      return;
    case 'movement':
      addMovement(statics, loading, load, factor);
      return;
    case 'heat':
      addHeat(statics, loading, load, factor);
      return;
    case 'lengthen': {
      const axial = (factor * load.amount) / statics.structure.members[load.member]!.length;
      for (const leg of legsOf(statics, load.member)) addFree(statics, loading, leg, { axial, curvature: 0 });
    }
  }
}

/**
 * A force (global components) and a couple, anticlockwise, at a place. At a point of a member the force acts on the joint,
 * or with a `side` on the end of the member that stands there (before or behind, in the direction of travel); the couple
 * turns that end, `before` if not said. It makes a difference where the end is hinged, connected or freed.
 */
export function addAction(
  statics: Statics,
  loading: Loading,
  at: Location,
  x: number,
  y: number,
  moment: number,
  side?: 'before' | 'after',
): void {
  const place = at.kind === 'point' ? at : placeOnMember(statics, at.member, at.distance);
  if (place.kind === 'point') {
    addToPoint(statics, loading, place.point, x, y);
    if (side !== undefined) addToFreedEnd(statics, loading, place, x, y, side);
    if (moment !== 0) addCouple(statics, loading, place, moment, side ?? 'before');
    return;
  }
  const leg = statics.legs[place.leg]!;
  const [along, across] = inLocalAxes(leg, x, y);
  spanOf(loading, place.leg).forces.push({ at: place.distance, along, across, couple: moment });
}

/** Places closer to an end of a leg than this share of its length stand at the point there. */
const AT_THE_END = 1e-9;

type Place =
  | { readonly kind: 'point'; readonly point: number; readonly member: number }
  | { readonly kind: 'within'; readonly leg: number; readonly distance: number };

function placeOnMember({ legs, firstLeg }: Statics, member: number, distance: number): Place {
  const end = firstLeg[member + 1]!;
  let index = firstLeg[member]!;
  while (index + 1 < end && legs[index + 1]!.start <= distance) index++;
  const leg = legs[index]!;
  const inside = distance - leg.start;
  const close = AT_THE_END * leg.length;
  if (inside <= close) return { kind: 'point', point: leg.from, member };
  if (inside >= leg.length - close) return { kind: 'point', point: leg.to, member };
  return { kind: 'within', leg: index, distance: inside };
}

function addToPoint({ forceRow }: Statics, { joints }: Loading, point: number, x: number, y: number): void {
  const row = forceRow[point]!;
  if (row < 0) return;
  joints[row]! += x;
  joints[row + 1]! += y;
}

interface MemberPoint {
  readonly point: number;
  readonly member?: number;
}

/**
 * What a force on the joint lacks to be one on the end of the member, where that end slides past the joint: the force that
 * is nil at the release stands against it within the leg.
 */
function addToFreedEnd(
  statics: Statics,
  { joints }: Loading,
  place: MemberPoint,
  x: number,
  y: number,
  side: 'before' | 'after',
): void {
  const found = endOf(statics, place, side);
  if (!found) return;
  const { leg, end } = found;
  const [along, across] = inLocalAxes(statics.legs[leg]!, x, y);
  const sign = end === 'start' ? 1 : -1;
  const axial = statics.releaseRow[releaseAt(leg, 'axial', end)]!;
  const shear = statics.releaseRow[releaseAt(leg, 'shear', end)]!;
  if (axial >= 0) joints[axial]! += sign * along;
  if (shear >= 0) joints[shear]! -= sign * across;
}

/** On the joint, or on the member's own end where that is hinged or connected. */
function addCouple(
  statics: Statics,
  loading: Loading,
  place: MemberPoint,
  moment: number,
  side: 'before' | 'after',
): void {
  const found = endOf(statics, place, side);
  if (found && turnsAlone(statics.legs[found.leg]!, found.end)) {
    // An anticlockwise couple on the start of a leg puts its upper side in tension, one on its end the underside.
    const span = spanOf(loading, found.leg);
    if (found.end === 'start') span.startMoment -= moment;
    else span.endMoment += moment;
    return;
  }
  const row = statics.coupleRow[place.point]!;
  if (row >= 0) loading.joints[row]! += moment;
}

/** Hinged, connected, or of a bar. */
function turnsAlone(leg: StaticLeg, end: End): boolean {
  return end === 'start' ? !leg.rigidStart || leg.startTurning > 0 : !leg.rigidEnd || leg.endTurning > 0;
}

/** The end of a leg of the member at its point, on the side meant if the member runs on. */
function endOf(
  { legs, firstLeg }: Statics,
  { point, member }: MemberPoint,
  side: 'before' | 'after',
): { readonly leg: number; readonly end: End } | undefined {
  if (member === undefined) return undefined;
  let found: { readonly leg: number; readonly end: End } | undefined;
  for (let leg = firstLeg[member]!; leg < firstLeg[member + 1]!; leg++) {
    if (legs[leg]!.to === point) found = { leg, end: 'end' };
    if (legs[leg]!.from === point && (!found || side === 'after')) found = { leg, end: 'start' };
  }
  return found;
}

function addSelfWeight(statics: Statics, loading: Loading, member: number, factor: number): void {
  const { structure, legs, firstLeg } = statics;
  const { kind, legs: chain } = structure.members[member]!;
  for (let index = firstLeg[member]!; index < firstLeg[member + 1]!; index++) {
    const leg = legs[index]!;
    const mass = structure.sections[chain[leg.index]!.section]!.massPerLength ?? 0;
    const weight = mass * STANDARD_GRAVITY * factor;
    if (weight === 0) continue;
    if (kind === 'bar') {
      addToPoint(statics, loading, leg.from, 0, (-weight * leg.length) / 2);
      addToPoint(statics, loading, leg.to, 0, (-weight * leg.length) / 2);
    } else {
      addStretch(loading, index, leg, 0, leg.length, 0, -1, weight, weight);
    }
  }
}

function addLine(statics: Statics, loading: Loading, load: Extract<Load, { kind: 'line' }>, factor: number): void {
  const { legs, firstLeg } = statics;
  const slope = (load.endIntensity - load.startIntensity) / (load.end - load.start);
  const intensity = (distance: number) => factor * (load.startIntensity + slope * (distance - load.start));
  for (let index = firstLeg[load.member]!; index < firstLeg[load.member + 1]!; index++) {
    const leg = legs[index]!;
    const start = Math.max(load.start, leg.start);
    const end = Math.min(load.end, leg.start + leg.length);
    if (end - start <= AT_THE_END * leg.length) continue;
    const [x, y] = perLength(leg, load.direction);
    // A stretch that reaches the leg's end does so exactly.
    const from = start - leg.start <= AT_THE_END * leg.length ? 0 : start - leg.start;
    const to = leg.start + leg.length - end <= AT_THE_END * leg.length ? leg.length : end - leg.start;
    addStretch(loading, index, leg, from, to, x, y, intensity(start), intensity(end));
  }
}

/** Global components of a line load of 1 N/m, per metre of the leg. */
function perLength(leg: StaticLeg, direction: LineDirection): [x: number, y: number] {
  switch (direction.kind) {
    case 'global': {
      const share = direction.onPlan ? Math.abs(leg.cosine) : 1;
      return [direction.x * share, direction.y * share];
    }
    case 'square': {
      const side = leg.cosine * direction.y - leg.sine * direction.x < 0 ? -1 : 1;
      return [-leg.sine * side, leg.cosine * side];
    }
    case 'along':
      return [leg.cosine * direction.sense, leg.sine * direction.sense];
  }
}

function addStretch(
  loading: Loading,
  index: number,
  leg: StaticLeg,
  start: number,
  end: number,
  x: number,
  y: number,
  startIntensity: number,
  endIntensity: number,
): void {
  const [along, across] = inLocalAxes(leg, x, y);
  spanOf(loading, index).stretches.push({
    start,
    end,
    startAlong: along * startIntensity,
    endAlong: along * endIntensity,
    startAcross: across * startIntensity,
    endAcross: across * endIntensity,
  });
}

function addMovement(
  { grounds }: Statics,
  loading: Loading,
  { point, freedom, amount }: Extract<Load, { kind: 'movement' }>,
  factor: number,
): void {
  for (const [index, ground] of grounds.entries()) {
    if (ground.point !== point) continue;
    const share = freedom.kind === 'rotation' ? ground.moment : ground.x * freedom.x + ground.y * freedom.y;
    if (share === 0) continue;
    loading.ground ??= new Float64Array(grounds.length);
    loading.ground[index]! += share * amount * factor;
  }
}

/** The upper side grows by α T above, the underside by α T below; plane sections stay plane. */
function addHeat(
  statics: Statics,
  loading: Loading,
  { member, above, below }: Extract<Load, { kind: 'heat' }>,
  factor: number,
): void {
  const { structure, legs } = statics;
  for (const index of legsOf(statics, member)) {
    const { thermalExpansion = 0, depth } =
      structure.sections[structure.members[member]!.legs[legs[index]!.index]!.section]!;
    const upper = thermalExpansion * above * factor;
    const under = thermalExpansion * below * factor;
    const curvature = upper === under || depth === undefined ? 0 : (under - upper) / depth;
    addFree(statics, loading, index, { axial: (upper + under) / 2, curvature });
  }
}

function legsOf({ firstLeg }: Statics, member: number): number[] {
  const first = firstLeg[member]!;
  return Array.from({ length: firstLeg[member + 1]! - first }, (_, index) => first + index);
}

function addFree({ legs }: Statics, loading: Loading, leg: number, { axial, curvature }: FreeStrain): void {
  loading.free ??= legs.map(() => UNSTRAINED);
  const before = loading.free[leg]!;
  loading.free[leg] = { axial: before.axial + axial, curvature: before.curvature + curvature };
}

function spanOf({ spans }: Loading, leg: number): SpanLoad {
  const known = spans.get(leg);
  if (known) return known;
  const load = emptySpanLoad();
  spans.set(leg, load);
  return load;
}

function inLocalAxes({ cosine, sine }: StaticLeg, x: number, y: number): [along: number, across: number] {
  return [cosine * x + sine * y, cosine * y - sine * x];
}
