// Single loads and movements of supports in words: `0.45 kN`, `5 × 3.1 kN at every 1.15 m`, `moves 8 mm down`.

import type { Load } from '../model/structure.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import type { Single } from './acting-loads.ts';
import { asGiven, asGivenWithUnit, THIN } from './figures.ts';
import { type Label, plain } from './words.ts';

/** `row`: all the equal loads that are told together, in order along the member. */
export function singleWords(single: Single, row: readonly Single[], units: DisplayUnits): Label {
  if (single.kind === 'couple') {
    const turn = single.moment > 0 ? 'anticlockwise' : 'clockwise';
    return plain(
      `${rowCount(row)}${asGivenWithUnit(Math.abs(single.moment), units.moment)} ${turn}${rowStep(row, units)}`,
    );
  }
  const size = Math.hypot(single.x, single.y);
  return plain(`${rowCount(row)}${asGivenWithUnit(size, units.force)}${askew(single)}${rowStep(row, units)}`);
}

/** From so many on, equal loads of one case are told once. */
const MANY = 4;

/** Loads that are told together: those of one row, and equal ones where there are many. */
export function rowsOf(singles: readonly Single[]): Single[][] {
  const rows = new Map<string, Single[]>();
  for (const single of singles) {
    const key = single.row === undefined ? `${single.x} ${single.y} ${single.moment}` : `row ${single.row}`;
    if (rows.get(key)?.push(single) === undefined) rows.set(key, [single]);
  }
  return [...rows.values()].flatMap(row =>
    row[0]?.row === undefined && row.length < MANY ? row.map(one => [one]) : [row],
  );
}

/** What the arrow alone leaves open: the angle of a force that is neither level nor upright. */
function askew({ x, y }: Single): string {
  const size = Math.hypot(x, y);
  if (Math.min(Math.abs(x), Math.abs(y)) <= 1e-9 * size) return '';
  const degrees = (Math.atan2(y, x) * 180) / Math.PI;
  return ` towards ${asGiven(degrees, DEGREES)}${THIN}deg`;
}

const DEGREES = { text: 'deg', size: 1 };

function rowCount(row: readonly Single[]): string {
  const count = row[0]?.inRow?.count ?? row.length;
  return count > 1 ? `${count}${THIN}×${THIN}` : '';
}

function rowStep(row: readonly Single[], units: DisplayUnits): string {
  const inRow = row[0]?.inRow;
  return inRow === undefined || inRow.count < 2 ? '' : ` at every ${asGivenWithUnit(inRow.step, units.length)}`;
}

export function movementWords({ freedom, amount }: Extract<Load, { kind: 'movement' }>, units: DisplayUnits): string {
  if (freedom.kind === 'rotation') {
    return `turns ${asGivenWithUnit(Math.abs(amount), units.rotation)} ${amount > 0 ? 'anticlockwise' : 'clockwise'}`;
  }
  return `moves ${asGivenWithUnit(Math.abs(amount), units.deflection)} ${headingWords(freedom.x * amount, freedom.y * amount)}`;
}

/** `down`, `to the left`, or the angle. */
export function headingWords(x: number, y: number): string {
  const size = Math.hypot(x, y);
  if (Math.abs(x) <= 1e-9 * size) return y > 0 ? 'up' : 'down';
  if (Math.abs(y) <= 1e-9 * size) return x > 0 ? 'to the right' : 'to the left';
  return `towards ${asGiven((Math.atan2(y, x) * 180) / Math.PI, DEGREES)}${THIN}deg`;
}
