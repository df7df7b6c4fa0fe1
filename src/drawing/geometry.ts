// Points, boxes and segments on the sheet, in px, y downwards.

export interface Spot {
  readonly x: number;
  readonly y: number;
}

export interface Box {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

export type Segment = readonly [from: Spot, to: Spot];

export function moved(spot: Spot, along: Spot, distance: number): Spot {
  return { x: spot.x + along.x * distance, y: spot.y + along.y * distance };
}

export function between(from: Spot, to: Spot, share: number): Spot {
  return { x: from.x + (to.x - from.x) * share, y: from.y + (to.y - from.y) * share };
}

export function distance(a: Spot, b: Spot): number {
  return Math.hypot(b.x - a.x, b.y - a.y);
}

/** Unit vector from one to the other; to the right where they coincide. */
export function direction(from: Spot, to: Spot): Spot {
  const length = distance(from, to);
  return length === 0 ? { x: 1, y: 0 } : { x: (to.x - from.x) / length, y: (to.y - from.y) / length };
}

/** A quarter turn to the left of the way, as seen on the sheet. */
export function leftOf(way: Spot): Spot {
  return { x: way.y, y: -way.x };
}

/** Common area, px². */
export function overlap(a: Box, b: Box): number {
  const width = Math.min(a.right, b.right) - Math.max(a.left, b.left);
  const height = Math.min(a.bottom, b.bottom) - Math.max(a.top, b.top);
  return width > 0 && height > 0 ? width * height : 0;
}

/** Length of the segment inside the box (Liang and Barsky, 1984). */
export function lengthInside([from, to]: Segment, box: Box): number {
  if (from.x < box.left && to.x < box.left) return 0;
  if (from.x > box.right && to.x > box.right) return 0;
  if (from.y < box.top && to.y < box.top) return 0;
  if (from.y > box.bottom && to.y > box.bottom) return 0;
  const dx = to.x - from.x;
  const dy = to.y - from.y;
  let enter = 0;
  let leave = 1;
  const edges = [
    [-dx, from.x - box.left],
    [dx, box.right - from.x],
    [-dy, from.y - box.top],
    [dy, box.bottom - from.y],
  ] as const;
  for (const [run, room] of edges) {
    if (run === 0) {
      if (room < 0) return 0;
      continue;
    }
    const share = room / run;
    if (run < 0) enter = Math.max(enter, share);
    else leave = Math.min(leave, share);
    if (enter > leave) return 0;
  }
  return (leave - enter) * Math.hypot(dx, dy);
}

/** To two decimals, as short as SVG allows. */
export function px(value: number): string {
  const rounded = Math.round(value * 100) / 100;
  return Object.is(rounded, -0) ? '0' : String(rounded);
}

export function path(...spots: readonly Spot[]): string {
  return spots.map((spot, i) => `${i === 0 ? 'M' : 'L'}${px(spot.x)} ${px(spot.y)}`).join('');
}
