// The structure itself: members and bars, the broken line along each member's underside, first points, hinges and joints.
import type { Structure } from '../model/structure.ts';
import { moved, path, px, type Spot } from './geometry.ts';
import type { LineRole } from './ink.ts';
import type { Sheet } from './sheet.ts';
import { type DrawnLeg, drawnLeg, segmentOf, type View } from './view.ts';

const HINGE = 3.4;
const SEMI_RIGID = 3.8;
const BAR_JOINT = 2.6;
const FIRST_POINT = 2.6;
/** The underside's broken line: so far off, and short of what stands at a member's first point. */
const UNDERSIDE = 5.5;
const SHORT = 11;

/** Everything but supports and names. */
export function drawBones(sheet: Sheet, structure: Structure, view: View): void {
  for (const [index, member] of structure.members.entries()) {
    const legs = member.legs.map(leg => drawnLeg(index, leg, view));
    drawChain(sheet, legs, member.kind);
    if (member.kind === 'bar') continue;
    drawUnderside(sheet, legs);
    const first = legs[0];
    if (first !== undefined) sheet.dot('ink', first.from, FIRST_POINT);
  }
  drawJoints(sheet, structure, view);
}

/** The structure behind a field: thin, without names or undersides. */
export function drawOutline(sheet: Sheet, structure: Structure, view: View, role: LineRole = 'outline'): void {
  let d = '';
  for (const [index, member] of structure.members.entries()) {
    const legs = member.legs.map(leg => drawnLeg(index, leg, view));
    d += chainPath(legs);
    for (const leg of legs) {
      sheet.obstacles.push(segmentOf(leg));
      sheet.reach(leg.from.y, leg.to.y);
    }
  }
  sheet.line(role, d, 'back');
}

/** Hinges and semi-rigid connections of members, and the joints of bars. */
export function drawJoints(sheet: Sheet, structure: Structure, view: View): void {
  const joints = new Set<number>();
  for (const { kind, legs } of structure.members) {
    if (kind === 'bar') for (const { from, to } of legs) joints.add(from).add(to);
  }
  for (const point of joints) sheet.ring(view.point(point), BAR_JOINT);
  for (const { point, member } of structure.hinges) {
    sheet.ring(member === undefined ? view.point(point) : hingeSpot(structure, view, point, member), HINGE);
  }
  for (const [index, { legs }] of structure.members.entries()) {
    for (const leg of legs) {
      if (leg.startAttachment?.turning !== undefined) drawConnection(sheet, drawnLeg(index, leg, view), 'start');
      if (leg.endAttachment?.turning !== undefined) drawConnection(sheet, drawnLeg(index, leg, view), 'end');
    }
  }
}

/** A circle a little along the leg, filled on the side of the joint. */
function drawConnection(sheet: Sheet, { from, to, along }: DrawnLeg, end: 'start' | 'end'): void {
  const inwards = end === 'start' ? 1 : -1;
  const at = moved(end === 'start' ? from : to, along, inwards * (SEMI_RIGID + 2.5));
  sheet.ring(at, SEMI_RIGID);
  const across = { x: -inwards * along.y, y: inwards * along.x };
  const [first, last] = [moved(at, across, SEMI_RIGID), moved(at, across, -SEMI_RIGID)];
  const radius = px(SEMI_RIGID);
  sheet.fill('ink', `${path(first)}A${radius} ${radius} 0 0 1 ${px(last.x)} ${px(last.y)}Z`, 'dot');
}

/** A hinge of one member alone stands a little along it, unless the member runs through the point. */
function hingeSpot(structure: Structure, view: View, point: number, member: number): Spot {
  const at = view.point(point);
  const legs = (structure.members[member]?.legs ?? []).filter(({ from, to }) => from === point || to === point);
  const only = legs.length === 1 ? legs[0] : undefined;
  if (only === undefined) return at;
  const drawn = drawnLeg(member, only, view);
  return moved(at, drawn.along, only.from === point ? HINGE + 2.5 : -HINGE - 2.5);
}

function drawChain(sheet: Sheet, legs: readonly DrawnLeg[], role: LineRole): void {
  sheet.line(role, chainPath(legs));
  sheet.obstacles.push(...legs.map(segmentOf));
  sheet.reach(...legs.flatMap(({ from, to }) => [from.y, to.y]));
}

function chainPath(legs: readonly DrawnLeg[]): string {
  const first = legs[0];
  return first === undefined ? '' : path(first.from, ...legs.map(({ to }) => to));
}

function drawUnderside(sheet: Sheet, legs: readonly DrawnLeg[]): void {
  let d = '';
  for (const [i, leg] of legs.entries()) {
    if (leg.length < 4) continue;
    // Short of a corner as well, so that two undersides do not cross inside it.
    const start = i === 0 ? Math.min(SHORT, leg.length / 4) : cornerGap(legs[i - 1], leg);
    const end = i === legs.length - 1 ? 0 : cornerGap(leg, legs[i + 1]);
    const from = moved(moved(leg.from, leg.along, start), leg.left, -UNDERSIDE);
    const to = moved(moved(leg.to, leg.along, -end), leg.left, -UNDERSIDE);
    d += path(from, to);
  }
  sheet.line('underside', d, 'back');
}

/** How much the underside is shortened where the chain turns towards it. */
function cornerGap(before: DrawnLeg | undefined, after: DrawnLeg | undefined): number {
  if (before === undefined || after === undefined) return 0;
  const cross = before.along.x * after.along.y - before.along.y * after.along.x;
  const dot = before.along.x * after.along.x + before.along.y * after.along.y;
  // On the sheet y points down, so a positive cross product is a turn to the right, towards the underside.
  return cross > 0 ? UNDERSIDE * Math.tan(Math.atan2(cross, dot) / 2) : 0;
}
