// From a structure's metres to the sheet's px, and the parts of a structure that every drawing asks for.
import type { Leg, Structure } from '../model/structure.ts';
import { type Box, direction, distance, leftOf, type Segment, type Spot } from './geometry.ts';

/** Metres, y upwards. */
export interface Extent {
  readonly left: number;
  readonly right: number;
  readonly bottom: number;
  readonly top: number;
}

export interface View {
  /** px a metre. */
  readonly scale: number;
  spot(x: number, y: number): Spot;
  point(index: number): Spot;
}

/** A leg on the sheet. `left` is the side away from the underside. */
export interface DrawnLeg {
  readonly member: number;
  readonly leg: Leg;
  readonly from: Spot;
  readonly to: Spot;
  readonly length: number;
  readonly along: Spot;
  readonly left: Spot;
}

export function extentOf(structure: Structure): Extent {
  let [left, right, bottom, top] = [Infinity, -Infinity, Infinity, -Infinity];
  for (const { x, y } of structure.points) {
    left = Math.min(left, x);
    right = Math.max(right, x);
    bottom = Math.min(bottom, y);
    top = Math.max(top, y);
  }
  return structure.points.length === 0 ? { left: 0, right: 0, bottom: 0, top: 0 } : { left, right, bottom, top };
}

/** Fits the structure into the box, at its own proportions, in the middle of the width and at the foot. */
export function fitted(structure: Structure, box: Box): View {
  const extent = extentOf(structure);
  const width = extent.right - extent.left;
  const height = extent.top - extent.bottom;
  const scale = Math.min(
    width > 0 ? (box.right - box.left) / width : Infinity,
    height > 0 ? (box.bottom - box.top) / height : Infinity,
  );
  const used = Number.isFinite(scale) ? scale : 1;
  const x0 = (box.left + box.right) / 2 - (used * width) / 2;
  return viewAt(structure, used, x0 - used * extent.left, box.bottom + used * extent.bottom);
}

/** `x0`, `y0`: where the origin stands on the sheet. */
export function viewAt(structure: Structure, scale: number, x0: number, y0: number): View {
  const spot = (x: number, y: number): Spot => ({ x: x0 + scale * x, y: y0 - scale * y });
  return {
    scale,
    spot,
    point: index => {
      const point = structure.points[index];
      if (point === undefined) throw new Error(`point ${index} of ${structure.points.length}`);
      return spot(point.x, point.y);
    },
  };
}

export function drawnLeg(member: number, leg: Leg, view: View): DrawnLeg {
  const from = view.point(leg.from);
  const to = view.point(leg.to);
  const along = direction(from, to);
  return { member, leg, from, to, length: distance(from, to), along, left: leftOf(along) };
}

/** The spot on a drawn leg at a distance (m) along its member. */
export function spotOnLeg(drawn: DrawnLeg, along: number): Spot {
  const share = drawn.leg.length === 0 ? 0 : (along - drawn.leg.start) / drawn.leg.length;
  return {
    x: drawn.from.x + (drawn.to.x - drawn.from.x) * share,
    y: drawn.from.y + (drawn.to.y - drawn.from.y) * share,
  };
}

export function segmentOf(drawn: DrawnLeg): Segment {
  return [drawn.from, drawn.to];
}

export function legCount({ members }: Structure): number {
  return members.reduce((sum, { legs }) => sum + legs.length, 0);
}

/** All members on one level line: drawn as a beam, its fields under it. */
export function isBeam(structure: Structure): boolean {
  const { bottom, top, left, right } = extentOf(structure);
  return structure.members.length > 0 && right > left && top - bottom <= 1e-9 * (right - left);
}

/** Points where an end of a member or bar stands, in use by the structure. */
export function pointsInUse(structure: Structure): number[] {
  const used = new Set<number>();
  for (const { legs } of structure.members) for (const leg of legs) used.add(leg.from).add(leg.to);
  for (const { point } of structure.supports) used.add(point);
  return [...used].sort((a, b) => a - b);
}
