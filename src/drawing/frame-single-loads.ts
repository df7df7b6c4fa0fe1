// Forces, couples and imposed movements on a frame. A force pushes onto its point unless something is in the way there.
import type { Structure } from '../model/structure.ts';
import type { ActingCase, Single } from './acting-loads.ts';
import { drawArrow, drawTurn, MOVEMENT_INK } from './arrows.ts';
import { type FrameLoadsAt, named } from './frame-line-loads.ts';
import { lengthInside, moved, type Spot } from './geometry.ts';
import { movementWords, rowsOf, singleWords } from './load-words.ts';
import type { LabelRequest, Place } from './placing.ts';
import type { Sheet } from './sheet.ts';
import { waysFrom } from './supports.ts';
import { textOf } from './words.ts';

const LENGTH = 32;
/** From the point to the near end of an arrow, px. */
const CLEAR = 4;
const TURN = 11;

export function drawSingles(acting: ActingCase, at: FrameLoadsAt): LabelRequest[] {
  return rowsOf(acting.singles).flatMap(row => {
    const ends = row.map(single => drawSingle(single, at));
    const middle = Math.floor((row.length - 1) / 2);
    const single = row[middle];
    const end = ends[middle];
    if (single === undefined || end === undefined) return [];
    const words = textOf(singleWords(single, row, at.units));
    return [{ labels: [named(acting, words, at.named)], places: placesAt(end), role: 'load' as const, rank: 65 }];
  });
}

/** Returns the free end, where the words go. */
function drawSingle(single: Single, { sheet, view }: FrameLoadsAt): Spot {
  const spot = view.spot(single.place.x, single.place.y);
  if (single.kind === 'couple') {
    drawTurn(sheet, spot, single.moment > 0, TURN);
    return moved(spot, { x: 0, y: -1 }, TURN);
  }
  const size = Math.hypot(single.x, single.y);
  if (size === 0) return spot;
  const way: Spot = { x: single.x / size, y: -single.y / size };
  const candidates = [0, LENGTH + CLEAR].flatMap(off => [
    { near: moved(spot, way, -CLEAR - off), far: moved(spot, way, -CLEAR - off - LENGTH), pushes: true },
    { near: moved(spot, way, CLEAR + off), far: moved(spot, way, CLEAR + off + LENGTH), pushes: false },
  ]);
  const costs = candidates.map(({ near, far }, i) => blocked(sheet, near, far) + i * 6);
  const best = candidates[costs.indexOf(Math.min(...costs))] as (typeof candidates)[number];
  if (best.pushes) drawArrow(sheet, best.far, best.near);
  else drawArrow(sheet, best.near, best.far);
  return best.far;
}

/** px of lines that run close to where the arrow would stand. */
function blocked(sheet: Sheet, near: Spot, far: Spot): number {
  let cost = 0;
  for (let i = 1; i <= 5; i++) {
    const x = near.x + ((far.x - near.x) * i) / 5;
    const y = near.y + ((far.y - near.y) * i) / 5;
    const box = { left: x - 4, right: x + 4, top: y - 4, bottom: y + 4 };
    for (const segment of sheet.obstacles) cost += lengthInside(segment, box);
    if (x < 0 || x > sheet.width) cost += 100;
  }
  return cost;
}

function placesAt({ x, y }: Spot): Place[] {
  return [
    { at: { x: x + 7, y: y + 6 }, anchor: 'start' },
    { at: { x: x - 7, y: y + 6 }, anchor: 'end' },
    { at: { x, y: y - 5 }, anchor: 'middle' },
    { at: { x, y: y + 14 }, anchor: 'middle' },
    { at: { x: x + 12, y: y - 6 }, anchor: 'start' },
    { at: { x: x - 12, y: y - 6 }, anchor: 'end' },
  ];
}

/** Beside the support that is moved, away from its members. */
export function drawMovements(
  structure: Structure,
  acting: ActingCase,
  { sheet, view, units, named: isNamed }: FrameLoadsAt,
): LabelRequest[] {
  return acting.movements.map(movement => {
    const point = view.point(movement.point);
    const ways = waysFrom(structure, movement.point, view.point);
    const below = ways.some(way => way.y > 0.7) ? -1 : 1;
    const centre: Spot = { x: point.x, y: point.y + below * 40 };
    const { freedom, amount } = movement;
    if (freedom.kind === 'rotation') drawTurn(sheet, centre, amount > 0, 9, MOVEMENT_INK);
    else {
      const sign = Math.sign(amount) || 1;
      const way: Spot = { x: freedom.x * sign, y: -freedom.y * sign };
      drawArrow(sheet, moved(centre, way, -12), moved(centre, way, 12), MOVEMENT_INK);
    }
    return {
      labels: [named(acting, movementWords(movement, units), isNamed)],
      places: [
        { at: { x: centre.x + 16, y: centre.y + 4 }, anchor: 'start' },
        { at: { x: centre.x - 16, y: centre.y + 4 }, anchor: 'end' },
        { at: { x: centre.x, y: centre.y + 26 }, anchor: 'middle' },
      ],
      role: 'load',
      rank: 65,
    };
  });
}
