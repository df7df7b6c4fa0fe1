// Line loads on a frame in words, and where the words may stand beside a band.
import type { DisplayUnits } from '../quantity/display.ts';
import type { Stretch } from './acting-loads.ts';
import { asGiven, spaced, THIN } from './figures.ts';
import { between, moved, type Spot } from './geometry.ts';
import { headingWords } from './load-words.ts';
import type { Place } from './placing.ts';

/** Beyond the band's far side, at its middle first. */
export function placesOver(from: Spot, to: Spot, out: Spot, heights: readonly [number, number]): Place[] {
  return [0.5, 0.3, 0.7, 0.1, 0.9].flatMap((share): Place[] => {
    const height = heights[0] + (heights[1] - heights[0]) * share;
    const far = moved(between(from, to, share), out, height);
    if (Math.abs(out.x) > Math.abs(out.y)) {
      const top = Math.min(from.y, to.y) - 5;
      return [
        { at: { x: far.x + Math.sign(out.x) * 6, y: far.y + 4 }, anchor: out.x > 0 ? 'start' : 'end' },
        { at: { x: far.x, y: top }, anchor: out.x > 0 ? 'start' : 'end' },
      ];
    }
    const y = far.y + (out.y < 0 ? -6 : 15);
    // A sloping band leaves room on its higher side only; a low one between two others at its ends.
    const [left, right] = from.x < to.x ? [from, to] : [to, from];
    const ends: Place[] =
      share === 0.5
        ? [
            { at: { x: left.x - 6, y: left.y + 2 }, anchor: 'end' },
            { at: { x: right.x + 6, y: right.y + 2 }, anchor: 'start' },
          ]
        : [];
    return [
      { at: { x: far.x, y }, anchor: 'middle' },
      { at: { x: far.x, y: y - 8 }, anchor: 'middle' },
      { at: { x: far.x - 8, y: y - 2 }, anchor: 'end' },
      { at: { x: far.x + 8, y: y - 2 }, anchor: 'start' },
      ...ends,
    ];
  });
}

/** `2.4 kN/m on plan`, `0.6 to 3.1 kN/m`: what the arrows do not tell is told in words. */
export function intensityWords(stretches: readonly Stretch[], units: DisplayUnits): string {
  const unit = units['line load'];
  const first = stretches[0] as Stretch;
  const last = stretches.at(-1) as Stretch;
  const [start, end] = [Math.abs(first.startIntensity), Math.abs(last.endIntensity)];
  const isConstant = Math.abs(start - end) <= 1e-9 * Math.max(start, end);
  const value = isConstant ? asGiven(start, unit) : `${asGiven(start, unit)} to ${asGiven(end, unit)}`;
  return `${value}${THIN}${spaced(unit.text)}${kindWords(first)}`;
}

function kindWords(stretch: Stretch): string {
  switch (stretch.kind) {
    case 'plan':
      return ' on plan';
    case 'square':
    case 'along':
    case 'weight':
      return '';
    case 'global': {
      const isAskew = Math.min(Math.abs(stretch.x), Math.abs(stretch.y)) > 1e-9;
      return isAskew ? ` ${headingWords(stretch.x, stretch.y)}` : '';
    }
  }
}
