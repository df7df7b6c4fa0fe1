// Line loads on a level beam: bands stacked over it, case by case, each case on one baseline, and loads along it as a row of
// arrows. The beam's axis stands at y = 0; everything above it is negative.
import type { Structure } from '../model/structure.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import type { ActingCase } from './acting-loads.ts';
import { drawArrow, LOAD_INK } from './arrows.ts';
import { acrossBands, alongBands, type BeamBand } from './beam-bands.ts';
import { drawCaseName } from './case-name.ts';
import { asGiven, asGivenWithUnit, spaced, THIN } from './figures.ts';
import type { Spot } from './geometry.ts';
import { drawBand, HOLDS_WORDS } from './load-bands.ts';
import type { LabelRequest } from './placing.ts';
import type { Sheet } from './sheet.ts';
import type { View } from './view.ts';
import { type Label, plain, widthOf } from './words.ts';

/** The largest intensity of a plate, px. */
const TALLEST = 42;
/** All bands together, px. */
const ALL_BANDS = 150;
const FIRST_BASELINE = 2.2;
const BETWEEN_BANDS = 4;

/** Lowest case nearest to the beam. Returns the height that the stack takes. */
export function drawBeamBands(
  sheet: Sheet,
  structure: Structure,
  view: View,
  cases: readonly ActingCase[],
  units: DisplayUnits,
  labels: LabelRequest[],
): number {
  const rows = cases.map(acting => ({
    acting,
    bands: acrossBands(structure, acting),
    along: alongBands(structure, acting),
  }));
  const peaks = rows.map(({ bands }) => peak(bands));
  const tallest = Math.max(...peaks, 0);
  const total = peaks.reduce((sum, value) => sum + value, 0);
  const scale = tallest === 0 ? 0 : Math.min(TALLEST / tallest, Math.max(ALL_BANDS / total, 24 / tallest));
  let height = 0;
  for (const { acting, bands, along } of rows) {
    if (bands.length > 0) {
      const baseline = height + (height === 0 ? FIRST_BASELINE : BETWEEN_BANDS);
      const tall = Math.max(scale * peak(bands), 2.5);
      const overhead = drawRow(sheet, view, bands, -baseline, scale, units, labels);
      drawCaseName(sheet, acting, -baseline - tall / 2 + 4);
      height = baseline + tall + overhead;
    }
    if (along.length > 0) {
      const baseline = height + 8;
      drawAlong(sheet, view, along, -baseline, units);
      if (bands.length === 0) drawCaseName(sheet, acting, -baseline - 2);
      height = baseline + 20;
    }
  }
  return height;
}

function peak(bands: readonly BeamBand[]): number {
  return Math.max(0, ...bands.flatMap(band => [Math.abs(band.fromIntensity), Math.abs(band.toIntensity)]));
}

/** Returns the height over the bands that their words need. */
function drawRow(
  sheet: Sheet,
  view: View,
  bands: readonly BeamBand[],
  y: number,
  scale: number,
  units: DisplayUnits,
  labels: LabelRequest[],
): number {
  let overhead = 0;
  for (const [i, band] of bands.entries()) {
    // Two bands that meet with a step stand a little apart.
    const follows = bands[i - 1]?.to === band.from && bands[i - 1]?.toIntensity !== band.fromIntensity;
    const from: Spot = { x: view.spot(band.from, 0).x + (follows ? 3 : 0), y };
    const to: Spot = { x: view.spot(band.to, 0).x, y };
    const fromHeight = Math.max(scale * Math.abs(band.fromIntensity), band.fromIntensity === 0 ? 0 : 1.5);
    const toHeight = Math.max(scale * Math.abs(band.toIntensity), band.toIntensity === 0 ? 0 : 1.5);
    const pushes = band.fromIntensity + band.toIntensity > 0;
    const common = { from, to, out: { x: 0, y: -1 }, fromHeight, toHeight, pushes };
    const width = to.x - from.x;
    if (Math.abs(band.fromIntensity - band.toIntensity) <= 1e-9 * Math.abs(band.fromIntensity)) {
      const words = constantWords(band, units).find(label => widthOf(label, 12) < width - 12);
      const middle = (from.x + to.x) / 2;
      if (words !== undefined && fromHeight >= HOLDS_WORDS) {
        const half = widthOf(words, 12) / 2 + 4;
        drawBand(sheet, { ...common, gap: [width / 2 - half, width / 2 + half] });
        sheet.words(words, { at: { x: middle, y: y - fromHeight / 2 + 4.2 }, anchor: 'middle', role: 'load' });
      } else {
        drawBand(sheet, common);
        const short = words ?? (constantWords(band, units).at(-1) as Label);
        sheet.words(short, { at: { x: middle, y: y - fromHeight - 5 }, anchor: 'middle', role: 'load', halo: true });
        overhead = Math.max(overhead, 16);
      }
    } else {
      drawBand(sheet, common);
      overhead = Math.max(overhead, 16);
      labels.push(...endWords(band, from, to, fromHeight, toHeight, units));
    }
  }
  return overhead;
}

/** The longest wording first. */
function constantWords(band: BeamBand, units: DisplayUnits): Label[] {
  const unit = units['line load'];
  const size = Math.abs(band.fromIntensity);
  const up = band.fromIntensity < 0 ? ' up' : '';
  const value = `${asGiven(size, unit)}${THIN}${spaced(unit.text)}${up}`;
  if (band.weight === 0) return [plain(value)];
  if (Math.abs(band.weight - band.fromIntensity) <= 1e-9 * size) return [plain(`self-weight ${value}`), plain(value)];
  const rest = asGiven(band.fromIntensity - band.weight, unit);
  return [plain(`${rest} + self-weight ${asGiven(band.weight, unit)} = ${value}`), plain(value)];
}

/** A varying load's values stand over its ends, the unit with the larger one. */
function endWords(
  band: BeamBand,
  from: Spot,
  to: Spot,
  fromHeight: number,
  toHeight: number,
  units: DisplayUnits,
): LabelRequest[] {
  const unit = units['line load'];
  const up = band.fromIntensity + band.toIntensity < 0 ? ' up' : '';
  const isLast = toHeight >= fromHeight;
  const word = (value: number, isLarger: boolean): Label =>
    plain(isLarger ? `${asGivenWithUnit(Math.abs(value), unit)}${up}` : asGiven(Math.abs(value), unit));
  const requests: LabelRequest[] = [];
  if (band.fromIntensity !== 0) {
    const y = from.y - fromHeight - 6;
    requests.push({
      labels: [word(band.fromIntensity, !isLast)],
      places: isLast
        ? [{ at: { x: from.x + 2, y: y - 1 }, anchor: 'start' }]
        : [
            { at: { x: from.x, y }, anchor: 'middle' },
            { at: { x: from.x, y }, anchor: 'start' },
          ],
      role: 'load',
      rank: 50,
    });
  }
  if (band.toIntensity !== 0) {
    const y = to.y - toHeight - 6;
    requests.push({
      labels: [word(band.toIntensity, isLast)],
      places: isLast
        ? [
            { at: { x: to.x, y }, anchor: 'middle' },
            { at: { x: to.x, y }, anchor: 'end' },
          ]
        : [{ at: { x: to.x - 2, y: y - 1 }, anchor: 'end' }],
      role: 'load',
      rank: 50,
    });
  }
  return requests;
}

/** Loads along the beam: a row of level arrows in a lane of their own. */
function drawAlong(sheet: Sheet, view: View, bands: readonly BeamBand[], y: number, units: DisplayUnits): void {
  for (const band of bands) {
    const from = view.spot(band.from, 0).x;
    const to = view.spot(band.to, 0).x;
    const count = Math.max(1, Math.floor((to - from) / 40));
    const step = (to - from) / count;
    const right = band.fromIntensity + band.toIntensity > 0;
    for (let i = 0; i < count; i++) {
      const start = { x: from + step * i + 5, y };
      const end = { x: from + step * (i + 1) - 5, y };
      drawArrow(sheet, right ? start : end, right ? end : start, LOAD_INK);
    }
    const unit = units['line load'];
    const sizes = [Math.abs(band.fromIntensity), Math.abs(band.toIntensity)] as const;
    const values =
      sizes[0] === sizes[1] ? asGiven(sizes[0], unit) : `${asGiven(sizes[0], unit)} to ${asGiven(sizes[1], unit)}`;
    const words = `${values}${THIN}${spaced(unit.text)} along, to the ${right ? 'right' : 'left'}`;
    sheet.words(plain(words), { at: { x: (from + to) / 2, y: y - 8 }, anchor: 'middle', role: 'load', halo: true });
  }
}
