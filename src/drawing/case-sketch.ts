// A small sketch of one case, unfactored: enough to see what it loads and which way it acts.
import type { Reaction } from '../mechanics/solution.ts';
import { wholeCase } from '../model/patterns.ts';
import type { Structure } from '../model/structure.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { type ActingCase, actingCases } from './acting-loads.ts';
import { acrossBands } from './beam-bands.ts';
import { drawOutline } from './bones.ts';
import { asGiven, asGivenWithUnit, withUnit } from './figures.ts';
import { drawLineLoads, type FrameLoadsAt, tallestIntensity } from './frame-line-loads.ts';
import { drawMovements, drawSingles } from './frame-single-loads.ts';
import type { Palette } from './ink.ts';
import { drawBand } from './load-bands.ts';
import { type LabelRequest, placeLabels } from './placing.ts';
import { Sheet } from './sheet.ts';
import { strainLines } from './strain-words.ts';
import { drawSupport, waysFrom } from './supports.ts';
import { extentOf, fitted, isBeam, type View } from './view.ts';
import { plain, widthOf } from './words.ts';

const WIDTH = 158;
const MARGIN = 14;
/** Room for loads from the side. */
const SIDE = 42;
const TALLEST = 90;
const TALLEST_LOAD = 24;
/** The title stands at least so far under the structure's foot, px. */
const TITLE = 36;

/** `applied`: sum of the case's loads, where it is known. */
export function caseSketch(
  structure: Structure,
  index: number,
  applied: Reaction | undefined,
  units: DisplayUnits,
  palette: Palette,
): string {
  const sheet = new Sheet(WIDTH, palette);
  const factors = structure.cases.map((_, i) => (wholeCase(structure.cases, i) === index ? 1 : 0));
  const acting = actingCases(structure, factors)[0];
  const isFromSide = !isBeam(structure) && acting?.stretches.some(({ x, y }) => Math.abs(x) > Math.abs(y)) === true;
  const margin = isFromSide ? SIDE : MARGIN;
  const view = fitted(structure, { left: margin, right: WIDTH - margin, top: -TALLEST, bottom: 0 });
  sheet.reach(-36);
  drawOutline(sheet, structure, view, 'bar');
  for (const support of structure.supports) {
    drawSupport(sheet, support, view.point(support.point), waysFrom(structure, support.point, view.point), 0.72);
  }
  if (acting !== undefined) drawActing(sheet, structure, acting, view, units);
  const name = structure.cases[index]?.name ?? '';
  const foot = Math.max(TITLE, Math.ceil(sheet.bottom) + 16);
  sheet.words(
    [
      { text: name, as: 'bold' },
      { text: ', unfactored', as: 'soft' },
    ],
    { at: { x: 0, y: foot } },
  );
  // Room for two lines always, so that the titles of a row of sketches stand on one line.
  sheet.reach(foot + 34);
  for (const [i, line] of footLines(structure, acting, applied, units).entries()) {
    sheet.words(plain(line), { at: { x: 0, y: foot + 15 * (i + 1) }, size: 11, role: 'soft' });
  }
  return sheet.svg(`Case ${name}, unfactored`);
}

function drawActing(sheet: Sheet, structure: Structure, acting: ActingCase, view: View, units: DisplayUnits): void {
  const { left, right, bottom, top } = extentOf(structure);
  const isLevel = isBeam(structure);
  const tallest = tallestIntensity([acting]);
  const at: FrameLoadsAt = {
    sheet,
    view,
    units,
    scale: tallest === 0 ? 0 : TALLEST_LOAD / tallest,
    named: false,
    middle: view.spot((left + right) / 2, (bottom + top) / 2),
    stack: new Map(),
  };
  const lines = isLevel ? drawBeamBands(sheet, structure, acting, view, units) : drawLineLoads(acting, at);
  const labels = [...lines, ...drawSingles(acting, at), ...drawMovements(structure, acting, at)];
  placeLabels(
    sheet,
    labels.map(label => ({ ...label, size: 11, optional: true })),
  );
}

/** On a beam the loads of a case are one row of bands, as on its plate. */
function drawBeamBands(
  sheet: Sheet,
  structure: Structure,
  acting: ActingCase,
  view: View,
  units: DisplayUnits,
): LabelRequest[] {
  const bands = acrossBands(structure, acting);
  const tallest = Math.max(0, ...bands.flatMap(band => [Math.abs(band.fromIntensity), Math.abs(band.toIntensity)]));
  const y = view.spot(0, structure.points[0]?.y ?? 0).y - 2;
  return bands.map(band => {
    const from = { x: view.spot(band.from, 0).x, y };
    const to = { x: view.spot(band.to, 0).x, y };
    const [start, end] = [Math.abs(band.fromIntensity), Math.abs(band.toIntensity)];
    const fromHeight = (TALLEST_LOAD * start) / tallest;
    const toHeight = (TALLEST_LOAD * end) / tallest;
    const pushes = band.fromIntensity + band.toIntensity > 0;
    drawBand(sheet, { from, to, out: { x: 0, y: -1 }, fromHeight, toHeight, pushes });
    const unit = units['line load'];
    const isConstant = Math.abs(start - end) <= 1e-9 * Math.max(start, end);
    const words = isConstant
      ? [asGivenWithUnit(start, unit), asGiven(start, unit)]
      : [`${asGiven(start, unit)} to ${asGiven(end, unit)}`];
    const middle = (from.x + to.x) / 2;
    const over = y - Math.max(fromHeight, toHeight) - 5;
    return {
      labels: words.map(plain),
      places: [
        { at: { x: middle, y: over }, anchor: 'middle' as const },
        { at: { x: middle, y: over - 10 }, anchor: 'middle' as const },
      ],
      role: 'load' as const,
      rank: Math.max(start, end),
    };
  });
}

function footLines(
  structure: Structure,
  acting: ActingCase | undefined,
  applied: Reaction | undefined,
  units: DisplayUnits,
): string[] {
  const lines: string[] = [];
  for (const { who, words } of acting === undefined ? [] : strainLines(structure, acting, units)) {
    const full = `${who} ${words}`;
    lines.push(widthOf(plain(full), 11) > WIDTH ? words : full);
  }
  const weighs = acting?.stretches.some(({ kind }) => kind === 'weight') === true && !isBeam(structure);
  if (applied === undefined) return [...lines, ...(weighs ? ['with self-weight'] : [])].slice(0, 2);
  const size = Math.hypot(applied.x, applied.y);
  if (Math.abs(applied.y) > 1e-9 * size) {
    lines.push(`sum ${withUnit(Math.abs(applied.y), units.force)} ${applied.y > 0 ? 'up' : 'down'}`);
  }
  if (Math.abs(applied.x) > 1e-9 * size) {
    lines.push(`sum ${withUnit(Math.abs(applied.x), units.force)} to the ${applied.x > 0 ? 'right' : 'left'}`);
  }
  if (weighs) lines.push('with self-weight');
  return lines.slice(0, 2);
}
