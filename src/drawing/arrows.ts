// Arrows of loads: straight ones with a small head, and arcs for couples and turns.
import { leftOf, moved, path, px, type Spot } from './geometry.ts';
import type { FillRole, LineRole } from './ink.ts';
import type { Layer, Sheet } from './sheet.ts';

export interface Head {
  readonly length: number;
  readonly width: number;
}

/** Of the many arrows of a line load. */
export const SMALL_HEAD: Head = { length: 5.5, width: 4.4 };
/** Of an arrow that stands alone. */
export const HEAD: Head = { length: 6.5, width: 5 };

export interface ArrowInk {
  readonly line: LineRole;
  readonly fill: FillRole;
}

export const LOAD_INK: ArrowInk = { line: 'load', fill: 'load' };
export const MOVEMENT_INK: ArrowInk = { line: 'load-dashed', fill: 'load' };
export const FREE_INK: ArrowInk = { line: 'free-arrow', fill: 'move' };

/** From tail to tip; the words of a drawing keep clear of it. */
export function drawArrow(
  sheet: Sheet,
  tail: Spot,
  tip: Spot,
  inks = LOAD_INK,
  head = HEAD,
  layer: Layer = 'line',
): void {
  sheet.line(inks.line, arrowStem(tail, tip, head), layer);
  sheet.fill(inks.fill, arrowHead(tail, tip, head), layer);
  sheet.obstacles.push([tail, tip]);
  sheet.reach(tail.y, tip.y);
}

export function arrowStem(tail: Spot, tip: Spot, head: Head): string {
  const length = Math.hypot(tip.x - tail.x, tip.y - tail.y);
  if (length <= head.length) return '';
  const way = { x: (tip.x - tail.x) / length, y: (tip.y - tail.y) / length };
  return path(tail, moved(tip, way, -head.length));
}

export function arrowHead(tail: Spot, tip: Spot, head: Head): string {
  const length = Math.hypot(tip.x - tail.x, tip.y - tail.y);
  if (length === 0) return '';
  const way = { x: (tip.x - tail.x) / length, y: (tip.y - tail.y) / length };
  const foot = moved(tip, way, -head.length);
  const across = leftOf(way);
  return `${path(tip, moved(foot, across, head.width / 2), moved(foot, across, -head.width / 2))}Z`;
}

/** Three quarters of a circle about the place, with a head at its end. */
export function drawTurn(sheet: Sheet, at: Spot, anticlockwise: boolean, radius: number, inks = LOAD_INK): void {
  const side = anticlockwise ? -1 : 1;
  // Both begin at the lower side and pass over the top, so that the gap is always below.
  const start = { x: at.x - side * radius * Math.SQRT1_2, y: at.y + radius * Math.SQRT1_2 };
  const end = { x: at.x + side * radius * Math.SQRT1_2, y: at.y + radius * Math.SQRT1_2 };
  const sweep = anticlockwise ? 0 : 1;
  sheet.line(inks.line, `${path(start)}A${px(radius)} ${px(radius)} 0 1 ${sweep} ${px(end.x)} ${px(end.y)}`);
  // The way at the end is the circle's tangent there.
  const way = { x: -side * Math.SQRT1_2, y: Math.SQRT1_2 };
  const tip = moved(end, way, HEAD.length * 0.75);
  sheet.fill(inks.fill, arrowHead(end, tip, { length: HEAD.length, width: HEAD.width }));
  for (const [dx, dy] of [
    [-1, 0],
    [0, -1],
    [1, 0],
  ] as const) {
    const edge = { x: at.x + dx * radius, y: at.y + dy * radius };
    sheet.obstacles.push([moved(edge, { x: dy, y: dx }, -4), moved(edge, { x: dy, y: dx }, 4)]);
  }
  sheet.reach(at.y - radius, at.y + radius);
}
