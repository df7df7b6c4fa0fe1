// Forces, couples and imposed movements on a level beam, whose axis stands at y = 0.
import type { Structure } from '../model/structure.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import type { ActingCase, Single } from './acting-loads.ts';
import { drawArrow, drawTurn, MOVEMENT_INK } from './arrows.ts';
import { drawCaseName } from './case-name.ts';
import { path, type Spot } from './geometry.ts';
import { movementWords, rowsOf, singleWords } from './load-words.ts';
import type { LabelRequest } from './placing.ts';
import type { Sheet } from './sheet.ts';
import type { View } from './view.ts';
import { joined, type Label, plain } from './words.ts';

/** px of height for one case's forces. */
const LANE = 36;

/**
 * Forces and couples. Over the beam where no bands lie on it, each case in a lane of its own; under bands they hang below
 * the beam, and where a support stands there they are set down on top of the stack. Returns the depth used under the axis.
 */
export function drawBeamSingles(
  sheet: Sheet,
  structure: Structure,
  view: View,
  cases: readonly ActingCase[],
  units: DisplayUnits,
  stack: number,
  labels: LabelRequest[],
): number {
  const supports = structure.supports.map(({ point }) => view.point(point).x);
  let above = stack === 0 ? 2 : stack + 4;
  let below = 3;
  let used = 0;
  for (const acting of cases) {
    const nearSupport = (single: Single): boolean =>
      supports.some(x => Math.abs(x - view.spot(single.place.x, 0).x) < 16);
    const over = acting.singles.filter(single => stack === 0 || nearSupport(single));
    const under = acting.singles.filter(single => !over.includes(single));
    for (const single of over) drawSingle(sheet, single, view, -above, 'over');
    for (const single of under) drawSingle(sheet, single, view, below, 'under');
    const needsName = acting.stretches.length > 0 || stack > 0 || under.length > 0;
    if (over.length > 0 && !needsName) drawCaseName(sheet, acting, -above - LANE / 2 + 4);
    const withName = needsName ? acting : undefined;
    labels.push(...singleLabels(over, view, units, withName, x => overPlaces(x, -above)));
    labels.push(...singleLabels(under, view, units, withName, x => underPlaces(x, below)));
    if (over.length > 0) above += LANE + 16;
    if (under.length > 0) {
      used = below + LANE;
      below += LANE + 4;
    }
  }
  return used;
}

function drawSingle(sheet: Sheet, single: Single, view: View, y: number, side: 'over' | 'under'): void {
  const x = view.spot(single.place.x, 0).x;
  const anchor: Spot = { x, y };
  if (single.kind === 'couple') {
    const centre = { x, y: side === 'over' && Math.abs(y) > 3 ? y - 14 : y < 0 ? 0 : y + 16 };
    if (Math.abs(centre.y) > 14) sheet.line('guide', path({ x, y: 0 }, centre), 'guide');
    drawTurn(sheet, centre, single.moment > 0, 11);
    return;
  }
  const size = Math.hypot(single.x, single.y);
  if (size === 0) return;
  const way = { x: single.x / size, y: -single.y / size };
  const length = LANE - 4;
  // A force pushes onto the beam from the side it is drawn on, or else pulls away from it there.
  const pushes = side === 'over' ? way.y > 1e-9 : way.y < -1e-9;
  const far = { x: x + (pushes ? -1 : 1) * way.x * length, y: y + (pushes ? -1 : 1) * way.y * length };
  drawArrow(sheet, pushes ? far : anchor, pushes ? anchor : far);
  if (Math.abs(y) > 6) sheet.line('guide', path({ x, y: 0 }, anchor), 'guide');
}

function overPlaces(x: number, y: number): LabelRequest['places'] {
  const top = y - LANE;
  return [
    { at: { x, y: top - 2 }, anchor: 'middle' },
    { at: { x: x + 8, y: top + 12 }, anchor: 'start' },
    { at: { x: x - 8, y: top + 12 }, anchor: 'end' },
    { at: { x, y: top - 16 }, anchor: 'middle' },
  ];
}

function underPlaces(x: number, y: number): LabelRequest['places'] {
  const foot = y + LANE - 5;
  return [
    { at: { x: x - 8, y: foot }, anchor: 'end' },
    { at: { x: x + 8, y: foot }, anchor: 'start' },
    { at: { x: x - 8, y: foot - 12 }, anchor: 'end' },
    { at: { x: x + 8, y: foot - 12 }, anchor: 'start' },
    { at: { x, y: foot + 14 }, anchor: 'middle' },
  ];
}

/** Equal loads that are told together are labelled at the middle one. */
function singleLabels(
  singles: readonly Single[],
  view: View,
  units: DisplayUnits,
  acting: ActingCase | undefined,
  places: (x: number) => LabelRequest['places'],
): LabelRequest[] {
  return rowsOf(singles).map(row => {
    const middle = row[Math.floor((row.length - 1) / 2)] as Single;
    const words = singleWords(middle, row, units);
    const named: Label =
      acting === undefined ? words : joined([{ text: acting.name, as: 'bold' }, { text: ' ' }], words);
    return { labels: [named], places: places(view.spot(middle.place.x, 0).x), role: 'load' as const, rank: 60 };
  });
}

export function drawBeamMovements(
  sheet: Sheet,
  view: View,
  cases: readonly ActingCase[],
  units: DisplayUnits,
  depth: number,
  labels: LabelRequest[],
): number {
  let used = depth;
  for (const acting of cases) {
    for (const movement of acting.movements) {
      const x = view.point(movement.point).x;
      const { freedom, amount } = movement;
      const top = 26;
      if (freedom.kind === 'rotation') drawTurn(sheet, { x, y: top + 12 }, amount > 0, 9, MOVEMENT_INK);
      else {
        const sign = Math.sign(amount) || 1;
        const way = { x: freedom.x * sign, y: -freedom.y * sign };
        const middle = { x, y: top + 12 };
        const tail = { x: middle.x - way.x * 12, y: middle.y - way.y * 12 };
        drawArrow(sheet, tail, { x: middle.x + way.x * 12, y: middle.y + way.y * 12 }, MOVEMENT_INK);
      }
      used = Math.max(used, top + 26);
      labels.push({
        labels: [joined([{ text: acting.name, as: 'bold' }, { text: ' ' }], plain(movementWords(movement, units)))],
        places: [
          { at: { x: x + 16, y: top + 18 }, anchor: 'start' },
          { at: { x: x - 16, y: top + 18 }, anchor: 'end' },
        ],
        role: 'load',
        rank: 60,
      });
    }
  }
  return used;
}
