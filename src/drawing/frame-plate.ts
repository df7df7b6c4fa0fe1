// A frame with its loads and dimensions on one sheet. Its fields are drawn on panels of their own.
import type { Structure } from '../model/structure.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { type Acting, SHEET_WIDTH } from './acting.ts';
import { type ActingCase, actingCases, type Stretch } from './acting-loads.ts';
import { drawBones } from './bones.ts';
import { tellUndrawn } from './case-name.ts';
import { distinct, drawLevelDimensions, drawUprightDimensions } from './dimensions.ts';
import { asGivenWithUnit } from './figures.ts';
import { drawLineLoads, type FrameLoadsAt, tallestIntensity } from './frame-line-loads.ts';
import { memberNames, pointNames } from './frame-names.ts';
import { drawMovements, drawSingles } from './frame-single-loads.ts';
import type { Palette } from './ink.ts';
import { placeLabels } from './placing.ts';
import { Sheet } from './sheet.ts';
import { tellStrains } from './strain-words.ts';
import { drawSupport, waysFrom } from './supports.ts';
import { extentOf, fitted, pointsInUse, type View } from './view.ts';
import type { Label } from './words.ts';

/** The tallest a frame is drawn, px. */
const TALLEST = 330;
/** The largest intensity of a plate, px. */
const TALLEST_LOAD = 32;
/** Room beside the frame, with loads that act from the side and without, px. */
const SIDE_LOADS = 148;
const NO_SIDE_LOADS = 78;
/** Upright dimensions stand this far from the right edge, level ones so far under the frame. */
const UPRIGHT = 38;
const LEVEL = 44;

export function framePlate(structure: Structure, acting: Acting, units: DisplayUnits, palette: Palette): string {
  const sheet = new Sheet(SHEET_WIDTH, palette);
  const cases = actingCases(structure, acting.factors);
  const side = cases.some(hasSideLoad) ? SIDE_LOADS : NO_SIDE_LOADS;
  const view = fitted(structure, { left: side, right: SHEET_WIDTH - side, top: -TALLEST, bottom: 0 });
  drawBones(sheet, structure, view);
  for (const support of structure.supports) {
    const ways = waysFrom(structure, support.point, view.point);
    drawSupport(sheet, support, view.point(support.point), ways);
  }
  const upright = SHEET_WIDTH - UPRIGHT;
  const top = Math.min(0, ...pointsInUse(structure).map(point => view.point(point).y));
  sheet.obstacles.push([
    { x: upright - 8, y: top },
    { x: upright - 8, y: 0 },
  ]);
  const tallest = tallestIntensity(cases);
  const at: FrameLoadsAt = {
    sheet,
    view,
    units,
    scale: tallest === 0 ? 0 : TALLEST_LOAD / tallest,
    named: cases.length > 1,
    middle: middleOf(structure, view),
    stack: new Map(),
  };
  const labels = cases.flatMap(one => [
    ...drawLineLoads(one, at),
    ...drawSingles(one, at),
    ...drawMovements(structure, one, at),
  ]);
  placeLabels(sheet, [
    ...pointNames(structure, view, pointsInUse(structure)),
    ...memberNames(structure, view),
    ...labels,
  ]);
  drawDimensions(sheet, structure, view, uprightLine(sheet, structure, view), units);
  tellWeights(sheet, structure, cases, units);
  tellStrains(sheet, structure, cases, units);
  tellUndrawn(sheet, cases);
  return sheet.svg(`${structure.title ?? structure.name} with its loads under ${acting.name}, and its dimensions`);
}

/** Near the frame, but clear of everything that stands to its right. */
function uprightLine(sheet: Sheet, structure: Structure, view: View): number {
  const edge = Math.max(0, ...pointsInUse(structure).map(point => view.point(point).x));
  const words = Math.max(0, ...sheet.taken.map(({ right }) => right));
  return Math.min(SHEET_WIDTH - UPRIGHT, Math.max(edge + NO_SIDE_LOADS - UPRIGHT, words + 22));
}

function hasSideLoad({ stretches }: ActingCase): boolean {
  return stretches.some(({ x, y }) => Math.abs(x) > Math.abs(y));
}

function middleOf(structure: Structure, view: View): { x: number; y: number } {
  const { left, right, bottom, top } = extentOf(structure);
  return view.spot((left + right) / 2, (bottom + top) / 2);
}

function drawDimensions(sheet: Sheet, structure: Structure, view: View, upright: number, units: DisplayUnits): void {
  const points = pointsInUse(structure).flatMap(index => structure.points[index] ?? []);
  const lowest = Math.max(0, ...points.map(({ x, y }) => view.spot(x, y).y));
  const line = Math.max(lowest + LEVEL, Math.ceil(sheet.bottom) + 20);
  const levels = distinct(points.map(({ x }) => x)).map(x => ({ at: view.spot(x, 0).x, value: x }));
  drawLevelDimensions(sheet, levels, { line, from: () => line - 18, unit: units.length });
  // From the foot up, so that the value reads from the right.
  const heights = distinct(points.map(({ y }) => y)).map(y => ({ at: view.spot(0, y).y, value: y }));
  const edge = Math.max(...points.map(({ x, y }) => view.spot(x, y).x));
  const rightmost = (height: number): number =>
    Math.max(
      ...points.filter(({ y }) => Math.abs(view.spot(0, y).y - height) < 0.01).map(({ x, y }) => view.spot(x, y).x),
    );
  // From inside the frame's width it starts further off, clear of what lies on the slope.
  const from = ({ at }: { at: number }): number =>
    Math.min(upright - 14, rightmost(at) + (rightmost(at) > edge - 1 ? 30 : 64));
  drawUprightDimensions(sheet, heights, { line: upright, from, unit: units.length });
}

/** Self-weight is told, not drawn: on a frame it lies on everything. */
function tellWeights(sheet: Sheet, structure: Structure, cases: readonly ActingCase[], units: DisplayUnits): void {
  const lines: Label[] = cases.flatMap(({ name, stretches }) => {
    const weights = stretches.filter(({ kind }) => kind === 'weight');
    if (weights.length === 0) return [];
    const total = weights.reduce((sum, { startIntensity, start, end }) => sum + startIntensity * (end - start), 0);
    const words = `self-weight of ${weighed(structure, weights)}, ${asGivenWithUnit(total, units.force)}`;
    return [[{ text: name, as: 'bold' as const }, { text: ` ${words}` }]];
  });
  const top = Math.floor(sheet.top) - 10;
  for (const [i, line] of lines.entries()) {
    sheet.words(line, { at: { x: 0, y: top - 15 * (lines.length - 1 - i) }, role: 'load' });
  }
}

function weighed(structure: Structure, weights: readonly Stretch[]): string {
  const members = [...new Set(weights.map(({ member }) => member))];
  if (members.length === structure.members.length && members.length > 1) return 'every member';
  const names = members.map(member => structure.members[member]?.name ?? '');
  return names.length > 6 ? `${names.length} members` : names.join(', ');
}
