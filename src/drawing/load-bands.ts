// The picture of one line load: a washed band on its baseline with arrows across it.
import { arrowHead, arrowStem, SMALL_HEAD } from './arrows.ts';
import { between, distance, moved, path, type Spot } from './geometry.ts';
import type { Sheet } from './sheet.ts';

export interface Band {
  /** Of the baseline, on the sheet. */
  readonly from: Spot;
  readonly to: Spot;
  /** Unit vector from the baseline to the band's far side. */
  readonly out: Spot;
  /** px at the two ends, never negative. */
  readonly fromHeight: number;
  readonly toHeight: number;
  /** Whether the arrows point at the baseline. */
  readonly pushes: boolean;
  /** Stretch along the baseline, px from its start, that the arrows leave free for words. */
  readonly gap?: readonly [start: number, end: number];
}

/** px: a band of this height holds the words of a constant load. */
export const HOLDS_WORDS = 14;
/** px between arrows, about. */
const SPACING = 36;
/** A load lower than this has no arrows. */
const LOWEST_ARROW = 8.5;

export function drawBand(sheet: Sheet, band: Band): void {
  const far = moved(band.from, band.out, band.fromHeight);
  const farEnd = moved(band.to, band.out, band.toHeight);
  sheet.wash('load', `${path(band.from, far, farEnd, band.to)}Z`);
  sheet.line('load', path(far, farEnd));
  sheet.line('load-base', path(band.from, band.to));
  sheet.obstacles.push([far, farEnd], [band.from, band.to]);
  sheet.reach(far.y, farEnd.y, band.from.y, band.to.y);
  drawArrows(sheet, band);
}

function drawArrows(sheet: Sheet, band: Band): void {
  const length = distance(band.from, band.to);
  const count = Math.max(1, Math.round(length / SPACING));
  const stems: string[] = [];
  const heads: string[] = [];
  for (let i = 0; i <= count; i++) {
    const share = i / count;
    const isEdge = i === 0 || i === count;
    if (band.gap !== undefined && share * length > band.gap[0] && share * length < band.gap[1] && !isEdge) continue;
    const height = band.fromHeight + (band.toHeight - band.fromHeight) * share;
    const base = between(band.from, band.to, share);
    const top = moved(base, band.out, height);
    if (height < LOWEST_ARROW) {
      // The band still closes at its ends.
      if (isEdge && height > 0) stems.push(path(base, top));
      continue;
    }
    const [tail, tip] = band.pushes ? [top, base] : [base, top];
    stems.push(arrowStem(tail, tip, SMALL_HEAD));
    heads.push(arrowHead(tail, tip, SMALL_HEAD));
  }
  sheet.line('load', stems.join(''));
  sheet.fill('load', heads.join(''));
}
