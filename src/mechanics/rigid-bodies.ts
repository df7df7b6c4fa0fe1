// The parts of a structure that are joined to nothing else, and how each can move as one rigid body past its supports.

import { extend, NO_DIRECTION, type Span } from './supports.ts';
import type { System } from './system.ts';

export interface Part {
  readonly points: readonly number[];
  /** Its first leg, −1 for a point on its own. */
  readonly leg: number;
}

/** Points joined by legs, directly or through others, are of one part. In the order of their first points. */
export function findParts(system: System): readonly Part[] {
  const { legs, freedoms } = system;
  const points = system.structure.points.length;
  const roots = Int32Array.from({ length: points }, (_, p) => p);
  const rootOf = (p: number) => {
    let root = p;
    while (roots[root] !== root) root = roots[root]!;
    for (let next = p; roots[next] !== root; ) {
      const above = roots[next]!;
      roots[next] = root;
      next = above;
    }
    return root;
  };
  for (let e = 0; e < legs.count; e++) {
    const a = rootOf(legs.from[e]!);
    const b = rootOf(legs.to[e]!);
    roots[Math.max(a, b)] = Math.min(a, b);
  }
  const members = new Map<number, { points: number[]; leg: number }>();
  for (let p = 0; p < points; p++) {
    if (freedoms.first[p] === freedoms.first[p + 1]) continue;
    const root = rootOf(p);
    const part = members.get(root);
    if (part === undefined) members.set(root, { points: [p], leg: -1 });
    else part.points.push(p);
  }
  for (let e = legs.count - 1; e >= 0; e--) members.get(rootOf(legs.from[e]!))!.leg = e;
  return [...members.values()];
}

/** Rows of a rigid movement that differ by less than this, levers over the size of the structure, are dependent. */
const DEPENDENT = 1e-9;

/**
 * The independent rigid movements of a part that no support resists, by freedom: translations first, level before upright,
 * then at most one rotation. `turning`: see `jointsThatTurn`.
 */
export function rigidMovements(system: System, part: Part, turning: Uint8Array): readonly Float64Array[] {
  const { structure, freedoms, supports } = system;
  const { size } = freedoms;
  let x = 0;
  let y = 0;
  for (const p of part.points) {
    x += structure.points[p]!.x / part.points.length;
    y += structure.points[p]!.y / part.points.length;
  }

  // What resists: each direction as a unit row in (movement x, movement y, rotation × size) of the middle of the part.
  let resisted: Span = NO_DIRECTION;
  const rows: Row[] = part.leg < 0 ? [[0, 0, 1]] : [];
  for (const p of part.points) {
    const support = supports.get(p);
    if (support === undefined) continue;
    const armX = (structure.points[p]!.x - x) / size;
    const armY = (structure.points[p]!.y - y) / size;
    for (const [nx, ny] of directionsOf(support.resisted)) {
      resisted = extend(resisted, nx, ny);
      addRow(rows, [nx, ny, ny * armX - nx * armY]);
    }
    if (support.rotationResisted && turning[p] === 1) addRow(rows, [0, 0, 1]);
  }

  const found: Float64Array[] = [];
  const translations =
    resisted.rank === 0
      ? [
          [1, 0],
          [0, 1],
        ]
      : resisted.rank === 1
        ? [[resisted.y, -resisted.x]]
        : [];
  for (const [a, b] of translations) found.push(rigidMovement(system, part, [a!, b!, 0], x, y));
  if (rows.length + found.length < 3) {
    found.push(rigidMovement(system, part, remainder(rows, [0, 0, 1]), x, y));
  }
  return found;
}

/** By point: 1 where some member end is fixed to the joint or connected to it, so that holding the joint holds the member. */
export function jointsThatTurn(system: System): Uint8Array {
  const { legs, freedoms } = system;
  const turning = new Uint8Array(system.structure.points.length);
  for (let e = 0; e < legs.count; e++) {
    if (legs.bending[e] === 0) continue;
    const from = legs.from[e]!;
    const to = legs.to[e]!;
    if (freedoms.startRotation[e] === freedoms.joint[from]) turning[from] = 1;
    if (freedoms.endRotation[e] === freedoms.joint[to]) turning[to] = 1;
  }
  for (const { kind, point } of freedoms.springs) if (kind === 'connection') turning[point] = 1;
  return turning;
}

type Row = readonly [x: number, y: number, turning: number];

function directionsOf(span: Span): readonly (readonly [number, number])[] {
  if (span.rank === 2)
    return [
      [1, 0],
      [0, 1],
    ];
  return span.rank === 1 ? [[span.x, span.y]] : [];
}

function addRow(rows: Row[], row: Row): void {
  const length = Math.hypot(...row);
  const rest = remainder(rows, [row[0] / length, row[1] / length, row[2] / length]);
  const size = Math.hypot(...rest);
  if (size > DEPENDENT) rows.push([rest[0] / size, rest[1] / size, rest[2] / size]);
}

/** What of a row is at right angles to orthonormal ones; twice, against rounding. */
function remainder(rows: readonly Row[], row: Row): Row {
  let [a, b, c] = row;
  for (let pass = 0; pass < 2; pass++) {
    for (const other of rows) {
      const share = a * other[0] + b * other[1] + c * other[2];
      a -= share * other[0];
      b -= share * other[1];
      c -= share * other[2];
    }
  }
  return [a, b, c];
}

/** By freedom: the middle (x, y) moves by the first two of the row, and the part turns by the third over the size. */
function rigidMovement(system: System, part: Part, row: Row, x: number, y: number): Float64Array {
  const { structure, freedoms, legs } = system;
  const { first, axisX, axisY, startRotation, endRotation } = freedoms;
  const movement = new Float64Array(freedoms.count);
  const turning = row[2] / freedoms.size;
  const inPart = new Set(part.points);
  for (const p of part.points) {
    const dx = row[0] - turning * (structure.points[p]!.y - y);
    const dy = row[1] + turning * (structure.points[p]!.x - x);
    movement[first[p]!] = dx * axisX[p]! + dy * axisY[p]!;
    movement[first[p]! + 1] = dy * axisX[p]! - dx * axisY[p]!;
  }
  if (turning === 0) return movement;
  for (let e = 0; e < legs.count; e++) {
    if (legs.bending[e] === 0 || !inPart.has(legs.from[e]!)) continue;
    movement[startRotation[e]!] = turning;
    movement[endRotation[e]!] = turning;
  }
  for (const spring of freedoms.springs) {
    if (spring.kind === 'connection' && inPart.has(spring.point)) movement[spring.freedoms[0]!] = turning;
  }
  return movement;
}
