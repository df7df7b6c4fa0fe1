// Values of fields in words: the side in tension, tension or compression, which way a movement goes.
import type { DisplayUnits } from '../quantity/display.ts';
import { signed, withUnit } from './figures.ts';
import type { Spot } from './geometry.ts';

/** `side`: unit vector on the sheet, towards the side meant. */
export function sideWord(side: Spot): string {
  if (Math.abs(side.x) > Math.abs(side.y)) return side.x > 0 ? 'right' : 'left';
  return side.y > 0 ? 'below' : 'above';
}

export function momentWords(value: number, side: Spot, units: DisplayUnits): string {
  return `${withUnit(Math.abs(value), units.moment)}, tension ${sideWord(side)}`;
}

export function shearWords(value: number, units: DisplayUnits): string {
  return `${signed(value, units.force)} ${units.force.text}`.replace(' ', '\u2009');
}

export function forceWords(value: number, units: DisplayUnits): string {
  return `${withUnit(Math.abs(value), units.force)} ${value < 0 ? 'compression' : 'tension'}`;
}

/** `way`: unit vector on the sheet in which the movement goes. */
export function movementInWords(value: number, way: Spot, units: DisplayUnits): string {
  return `${withUnit(Math.abs(value), units.deflection)} ${wayWord(way)}`;
}

function wayWord(way: Spot): string {
  if (Math.abs(way.x) > Math.abs(way.y)) return way.x > 0 ? 'to the right' : 'to the left';
  return way.y > 0 ? 'down' : 'up';
}
