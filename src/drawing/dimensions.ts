// Chains of dimensions, level under a drawing and upright beside it: extension lines, slanted ticks, the value over the line.
import type { DisplayUnit } from '../quantity/display.ts';
import { THIN, withUnit } from './figures.ts';
import { path, type Spot } from './geometry.ts';
import type { Sheet } from './sheet.ts';
import { plain, type WordSize, widthOf } from './words.ts';

/** Places along one axis: `at` in px on the sheet, `value` in metres. Ascending in `at`. */
export interface Mark {
  readonly at: number;
  readonly value: number;
}

export interface DimensionLine {
  /** px: y of a level chain, x of an upright one. */
  readonly line: number;
  /** Where the extension line of each mark begins. */
  readonly from: (mark: Mark) => number;
  readonly unit: DisplayUnit;
}

/** Between the value and the ticks, px. */
const AIR = 8;
const TICK = 3.5;
const PAST = 5;

export function drawLevelDimensions(sheet: Sheet, marks: readonly Mark[], { line, from, unit }: DimensionLine): void {
  draw(sheet, marks, unit, (along, across) => ({ x: along, y: across }), line, from, 0);
}

export function drawUprightDimensions(sheet: Sheet, marks: readonly Mark[], { line, from, unit }: DimensionLine): void {
  draw(sheet, marks, unit, (along, across) => ({ x: across, y: along }), line, from, -90);
}

function draw(
  sheet: Sheet,
  marks: readonly Mark[],
  unit: DisplayUnit,
  spot: (along: number, across: number) => Spot,
  line: number,
  from: (mark: Mark) => number,
  turn: number,
): void {
  const { marks: shown, equal } = readable(marks, unit);
  const first = shown[0];
  const last = shown.at(-1);
  if (first === undefined || last === undefined || first === last) return;
  for (const mark of shown) {
    const begin = spot(mark.at, from(mark));
    const end = spot(mark.at, line + PAST);
    sheet.line('dimension', path(begin, end), 'back');
    sheet.reach(begin.y, end.y);
    sheet.line('tick', path(spot(mark.at - TICK, line + TICK), spot(mark.at + TICK, line - TICK)), 'back');
  }
  const sign = Math.sign(last.at - first.at);
  sheet.line('dimension', path(spot(first.at - sign * PAST, line), spot(last.at + sign * PAST, line)), 'back');
  const values =
    equal === undefined
      ? shown
          .slice(1)
          .map((mark, i) => ({ from: shown[i] as Mark, to: mark, text: lengthText(shown[i] as Mark, mark, unit) }))
      : [{ from: first, to: last, text: equal }];
  for (const value of values) {
    const middle = (value.from.at + value.to.at) / 2;
    const size: WordSize = Math.abs(value.to.at - value.from.at) < widthOf(plain(value.text), 12) + 6 ? 11 : 12;
    sheet.words(plain(value.text), { at: spot(middle, line - PAST), anchor: 'middle', size, halo: true, turn });
  }
}

function lengthText(from: Mark, to: Mark, unit: DisplayUnit): string {
  return withUnit(Math.abs(to.value - from.value), unit);
}

/**
 * The marks whose values can be written. Where a chain is too tight, equal steps are told as `6 × 1.500 m`, and any
 * other chain keeps only the steps that leave room.
 */
function readable(marks: readonly Mark[], unit: DisplayUnit): { marks: readonly Mark[]; equal?: string } {
  const steps = marks.slice(1).map((mark, i) => ({ from: marks[i] as Mark, to: mark }));
  const isTight = steps.some(({ from, to }) => !fits(from, to, unit));
  if (!isTight || steps.length < 2) return { marks };
  const first = steps[0] as { from: Mark; to: Mark };
  const step = Math.abs(first.to.value - first.from.value);
  const areEqual = steps.every(({ from, to }) => Math.abs(Math.abs(to.value - from.value) - step) <= 1e-9 * step);
  if (areEqual) return { marks, equal: `${steps.length}${THIN}×${THIN}${withUnit(step, unit)}` };
  const kept: Mark[] = [marks[0] as Mark];
  const last = marks.at(-1) as Mark;
  for (const mark of marks.slice(1, -1)) {
    const before = kept.at(-1) as Mark;
    if (fits(before, mark, unit) && fits(mark, last, unit)) kept.push(mark);
  }
  return { marks: [...kept, last] };
}

function fits(from: Mark, to: Mark, unit: DisplayUnit): boolean {
  return Math.abs(to.at - from.at) >= widthOf(plain(lengthText(from, to, unit)), 11) + AIR;
}

/** Distinct values in ascending order; those closer than a millionth of their whole extent are one. */
export function distinct(values: readonly number[]): number[] {
  const sorted = [...values].sort((a, b) => a - b);
  const extent = (sorted.at(-1) ?? 0) - (sorted[0] ?? 0);
  return sorted.filter((value, i) => i === 0 || value - (sorted[i - 1] as number) > 1e-6 * extent);
}
