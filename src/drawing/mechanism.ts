// What is free to move, drawn over the structure that is not held.
import type { Mechanism } from '../mechanics/solution.ts';
import type { Structure } from '../model/structure.ts';
import { PANEL_WIDTH } from './acting.ts';
import { drawArrow, drawTurn, FREE_INK } from './arrows.ts';
import { drawJoints, drawOutline } from './bones.ts';
import { pointNames } from './frame-names.ts';
import { moved, path, type Spot } from './geometry.ts';
import type { Palette } from './ink.ts';
import { type LabelRequest, placeLabels } from './placing.ts';
import { Sheet } from './sheet.ts';
import { drawSupport, waysFrom } from './supports.ts';
import { fitted, pointsInUse, type View } from './view.ts';
import { plain } from './words.ts';

/** The largest movement is drawn this long, px. */
const AMPLITUDE = 22;
const MARGIN = 42;
const TALLEST = 170;

export function mechanismDrawing(structure: Structure, mechanism: Mechanism, palette: Palette): string {
  const sheet = new Sheet(PANEL_WIDTH, palette);
  const view = fitted(structure, { left: MARGIN, right: PANEL_WIDTH - MARGIN, top: 0, bottom: TALLEST });
  const tops = pointsInUse(structure).map(point => view.point(point).y);
  sheet.reach(Math.min(TALLEST, ...tops) - 30);
  drawOutline(sheet, structure, view);
  for (const support of structure.supports) {
    drawSupport(sheet, support, view.point(support.point), waysFrom(structure, support.point, view.point));
  }
  drawJoints(sheet, structure, view);
  const labels = [...drawMoved(sheet, structure, mechanism, view), ...drawTurning(sheet, mechanism, view)];
  placeLabels(sheet, [...labels, ...pointNames(structure, view, pointsInUse(structure))]);
  return sheet.svg(`${structure.title ?? structure.name} is free to move: ${names(structure, mechanism)}`);
}

/** To first order legs stay straight between their moved ends. */
function drawMoved(sheet: Sheet, structure: Structure, mechanism: Mechanism, view: View): LabelRequest[] {
  const sizes = structure.points.map((_, i) => Math.hypot(...wayOf(mechanism, i)));
  const largest = Math.max(0, ...sizes);
  if (largest === 0) return [];
  const spotOf = (point: number): Spot => {
    const [x, y] = wayOf(mechanism, point);
    const at = view.point(point);
    return { x: at.x + (x * AMPLITUDE) / largest, y: at.y - (y * AMPLITUDE) / largest };
  };
  for (const { legs } of structure.members) {
    const moves = legs.some(({ from, to }) => (sizes[from] ?? 0) > 1e-9 || (sizes[to] ?? 0) > 1e-9);
    const first = legs[0];
    if (!moves || first === undefined) continue;
    sheet.line('free', path(spotOf(first.from), ...legs.map(({ to }) => spotOf(to))));
    for (const leg of legs) sheet.obstacles.push([spotOf(leg.from), spotOf(leg.to)]);
  }
  const most = sizes.indexOf(largest);
  const [x, y] = wayOf(mechanism, most);
  const way = { x: x / largest, y: -y / largest };
  // The arrow stands clear of the lines, on the upper side of a level movement.
  const off = Math.abs(way.x) > Math.abs(way.y) ? { x: 0, y: -16 } : { x: way.x > 0 ? -16 : 16, y: 0 };
  const at = view.point(most);
  const tail = { x: at.x + off.x, y: at.y + off.y };
  const tip = moved(tail, way, 36);
  drawArrow(sheet, tail, tip, FREE_INK);
  return [
    {
      labels: [plain('free to move')],
      places: [
        { at: { x: tip.x + 6, y: tip.y + 4 }, anchor: 'start' },
        { at: { x: tip.x - 6, y: tip.y + 4 }, anchor: 'end' },
        { at: { x: tail.x, y: Math.min(tail.y, tip.y) - 6 }, anchor: 'middle' },
      ],
      role: 'move',
      rank: 100,
    },
  ];
}

/** A joint that only turns in its place. */
function drawTurning(sheet: Sheet, mechanism: Mechanism, view: View): LabelRequest[] {
  if (mechanism.points.length > 0) return [];
  return mechanism.turning.slice(0, 4).map(point => {
    const at = view.point(point);
    drawTurn(sheet, at, true, 12, FREE_INK);
    return {
      labels: [plain('free to turn')],
      places: [
        { at: { x: at.x + 16, y: at.y - 10 }, anchor: 'start' as const },
        { at: { x: at.x - 16, y: at.y - 10 }, anchor: 'end' as const },
      ],
      role: 'move' as const,
      rank: 100,
    };
  });
}

function wayOf({ movements }: Mechanism, point: number): [x: number, y: number] {
  return [movements[2 * point] ?? 0, movements[2 * point + 1] ?? 0];
}

function names(structure: Structure, { points, turning }: Mechanism): string {
  return [...points, ...turning].map(point => structure.points[point]?.name ?? '').join(', ');
}
