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
  const { marks: shown, values } = readable(marks, unit);
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
  for (const { text, middle, size, row } of values) {
    const at = spot(middle, line - PAST - 12 * row);
    sheet.words(plain(text), { at, anchor: 'middle', size, halo: true, turn });
  }
}

interface Value {
  readonly text: string;
  readonly middle: number;
  readonly size: WordSize;
  /** 0 on the line, 1 over its neighbours. */
  readonly row: 0 | 1;
}

/**
 * The marks whose values can be written. Where a chain is too tight, equal steps are told as `6 × 1.500 m`, a value that
 * does not fit between its neighbours stands over them, and what has no room there either is left out with its mark.
 */
function readable(marks: readonly Mark[], unit: DisplayUnit): { marks: readonly Mark[]; values: readonly Value[] } {
  const first = marks[0];
  const last = marks.at(-1);
  if (first === undefined || last === undefined) return { marks: [], values: [] };
  const steps = marks.slice(1).map((mark, i) => Math.abs(mark.value - (marks[i] as Mark).value));
  const step = steps[0] ?? 0;
  const isTight = marks.slice(1).some((mark, i) => !fits(marks[i] as Mark, mark, unit));
  if (isTight && steps.length > 2 && steps.every(other => Math.abs(other - step) <= 1e-9 * step)) {
    const text = `${steps.length}${THIN}×${THIN}${withUnit(step, unit)}`;
    return { marks, values: [{ text, middle: (first.at + last.at) / 2, size: 12, row: 0 }] };
  }
  const all = written(marks, unit);
  if (all !== undefined) return { marks, values: all };
  const kept: Mark[] = [first];
  for (const mark of marks.slice(1, -1)) {
    if (fits(kept.at(-1) as Mark, mark, unit) && fits(mark, last, unit)) kept.push(mark);
  }
  return { marks: [...kept, last], values: written([...kept, last], unit) ?? [] };
}

/** Undefined where two values would still run into each other. */
function written(marks: readonly Mark[], unit: DisplayUnit): Value[] | undefined {
  const values: Value[] = [];
  const ends: [number, number] = [Number.NEGATIVE_INFINITY, Number.NEGATIVE_INFINITY];
  const along = (marks.at(-1) as Mark).at >= (marks[0] as Mark).at ? 1 : -1;
  for (const [i, mark] of marks.slice(1).entries()) {
    const before = marks[i] as Mark;
    const text = withUnit(Math.abs(mark.value - before.value), unit);
    const middle = (before.at + mark.at) / 2;
    const room = Math.abs(mark.at - before.at);
    const size: WordSize = room < widthOf(plain(text), 12) + 6 ? 11 : 12;
    const half = widthOf(plain(text), size) / 2 + 3;
    const row = middle * along - half >= ends[0] ? 0 : 1;
    if (middle * along - half < ends[row]) return undefined;
    ends[row] = middle * along + half;
    values.push({ text, middle, size, row });
  }
  return values;
}

function fits(from: Mark, to: Mark, unit: DisplayUnit): boolean {
  const text = withUnit(Math.abs(to.value - from.value), unit);
  return Math.abs(to.at - from.at) >= widthOf(plain(text), 11) + AIR;
}

/** Distinct values in ascending order; those closer than a millionth of their whole extent are one. */
export function distinct(values: readonly number[]): number[] {
  const sorted = [...values].sort((a, b) => a - b);
  const extent = (sorted.at(-1) ?? 0) - (sorted[0] ?? 0);
  return sorted.filter((value, i) => i === 0 || value - (sorted[i - 1] as number) > 1e-6 * extent);
}
