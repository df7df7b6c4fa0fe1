// Line loads on a frame: a band on each loaded leg, outside the frame or over it, on a level baseline where the load is
// measured on plan, and a row of arrows beside a leg that it runs along.
import type { DisplayUnits } from '../quantity/display.ts';
import type { ActingCase, Stretch } from './acting-loads.ts';
import { drawArrow, LOAD_INK, SMALL_HEAD } from './arrows.ts';
import { intensityWords, placesOver } from './frame-load-words.ts';
import { between, moved, type Spot } from './geometry.ts';
import { type Band, drawBand, HOLDS_WORDS } from './load-bands.ts';
import type { LabelRequest, Place } from './placing.ts';
import type { Sheet } from './sheet.ts';
import { type DrawnLeg, drawnLeg, spotOnLeg, type View } from './view.ts';
import { joined, type Label, plain, widthOf } from './words.ts';

export interface FrameLoadsAt {
  readonly sheet: Sheet;
  readonly view: View;
  readonly units: DisplayUnits;
  /** px for one N/m. */
  readonly scale: number;
  /** Whether more than one case is drawn, so that each load tells its own. */
  readonly named: boolean;
  /** Middle of the structure on the sheet. */
  readonly middle: Spot;
  /** How far the bands on each side of each leg reach already. */
  readonly stack: Map<string, number>;
}

/** From the member's axis to the first baseline, and between bands, px. */
const FIRST = 2.4;
const BETWEEN = 4;
/** A load within about ten degrees of its leg runs along it. */
const ALONG = 0.17;
/** Of a band too low to be seen, px. */
const LOWEST = 2.5;

export function tallestIntensity(cases: readonly ActingCase[]): number {
  const sizes = cases.flatMap(({ stretches }) =>
    stretches
      .filter(({ kind }) => kind !== 'weight')
      .flatMap(({ startIntensity, endIntensity }) => [Math.abs(startIntensity), Math.abs(endIntensity)]),
  );
  return Math.max(0, ...sizes);
}

/** The loads of one case; returns their labels, one for each statement. */
export function drawLineLoads(acting: ActingCase, at: FrameLoadsAt): LabelRequest[] {
  const byLoad = new Map<number, Stretch[]>();
  for (const stretch of acting.stretches) {
    if (stretch.kind === 'weight') continue;
    if (byLoad.get(stretch.load)?.push(stretch) === undefined) byLoad.set(stretch.load, [stretch]);
  }
  const labels: LabelRequest[] = [];
  for (const stretches of [...byLoad.values()].flatMap(connected)) {
    const words = named(acting, intensityWords(stretches, at.units), at.named);
    const longest = stretches.reduce((a, b) => (b.end - b.start > a.end - a.start ? b : a));
    const drawn = stretches.map(stretch =>
      drawStretch(stretch, stretches, at, stretch === longest ? words : undefined),
    );
    if (drawn.some(({ told }) => told)) continue;
    const isLevel = stretches.every(({ kind, y }) => kind === 'plan' && y !== 0);
    labels.push({
      labels: [words],
      places: isLevel ? overAll(drawn) : (drawn[stretches.indexOf(longest)]?.places ?? []),
      role: 'load',
      rank: 60,
      optional: false,
    });
  }
  return labels;
}

/** What one statement puts on members that do not meet is told where each part stands. */
function connected(stretches: readonly Stretch[]): Stretch[][] {
  const groups: { points: Set<number>; stretches: Stretch[] }[] = [];
  for (const stretch of stretches) {
    const { from, to } = stretch.leg;
    const touching = groups.filter(({ points }) => points.has(from) || points.has(to));
    const joined = { points: new Set([from, to]), stretches: [stretch] };
    for (const group of touching) {
      for (const point of group.points) joined.points.add(point);
      joined.stretches.unshift(...group.stretches);
      groups.splice(groups.indexOf(group), 1);
    }
    groups.push(joined);
  }
  return groups.map(group => group.stretches);
}

export function named(acting: ActingCase, words: string, isNamed: boolean): Label {
  return isNamed ? joined([{ text: acting.name, as: 'bold' }, { text: ' ' }], words) : plain(words);
}

interface Drawn {
  /** Whether its words stand in its band already. */
  readonly told: boolean;
  readonly from: Spot;
  readonly to: Spot;
  readonly height: number;
  readonly places: readonly Place[];
}

/** `words`: what may be written into the band where it is wide and high enough. */
function drawStretch(stretch: Stretch, all: readonly Stretch[], at: FrameLoadsAt, words: Label | undefined): Drawn {
  const leg = drawnLeg(stretch.member, stretch.leg, at.view);
  const sign = stretch.startIntensity + stretch.endIntensity < 0 ? -1 : 1;
  const way: Spot = { x: stretch.x * sign, y: -stretch.y * sign };
  const across = Math.abs(way.x * leg.along.y - way.y * leg.along.x);
  if (across < ALONG) return drawBeside(stretch, leg, way, at);
  const heights = [stretch.startIntensity, stretch.endIntensity].map(value =>
    value === 0 ? 0 : Math.max(LOWEST, Math.abs(value) * at.scale),
  ) as [number, number];
  const isUpright = Math.abs(way.y) >= Math.abs(way.x);
  const pushes = isUpright ? way.y > 0 : isOutside(leg, { x: -way.x, y: -way.y }, at.middle);
  const out: Spot = pushes ? { x: -way.x, y: -way.y } : way;
  const [from, to] = [spotOnLeg(leg, stretch.start), spotOnLeg(leg, stretch.end)];
  const [base, baseEnd] =
    stretch.kind === 'plan' && isUpright
      ? levelBase(stretch, all, from, to, at)
      : shifted(from, to, out, offsetOn(leg, out, Math.max(...heights), at));
  const band: Band = { from: base, to: baseEnd, out, fromHeight: heights[0], toHeight: heights[1], pushes };
  const room = words === undefined || stretch.kind === 'plan' ? undefined : roomInside(band, words);
  drawBand(at.sheet, room === undefined ? band : { ...band, gap: room });
  if (room !== undefined && words !== undefined) {
    const middle = between(base, baseEnd, 0.5);
    const centre = moved(middle, out, heights[0] / 2);
    at.sheet.words(words, { at: { x: centre.x, y: centre.y + 4.2 }, anchor: 'middle', role: 'load' });
  }
  return {
    told: room !== undefined,
    from: base,
    to: baseEnd,
    height: Math.max(...heights),
    places: placesOver(base, baseEnd, out, heights),
  };
}

/** The part of a level, constant band that the words take, px along it; undefined where they do not fit. */
function roomInside(band: Band, words: Label): readonly [number, number] | undefined {
  const length = Math.hypot(band.to.x - band.from.x, band.to.y - band.from.y);
  const isLevel = Math.abs(band.to.y - band.from.y) < 0.02 * length && Math.abs(band.out.x) < 0.02;
  const isConstant = Math.abs(band.fromHeight - band.toHeight) < 0.01 && band.fromHeight >= HOLDS_WORDS;
  const half = widthOf(words, 12) / 2 + 4;
  return isLevel && isConstant && 2 * half + 16 < length ? [length / 2 - half, length / 2 + half] : undefined;
}

/** Whether a band on that side of the leg lies away from the middle of the frame. */
function isOutside(leg: DrawnLeg, out: Spot, middle: Spot): boolean {
  const centre = between(leg.from, leg.to, 0.5);
  const towards = (centre.x - middle.x) * out.x;
  return towards >= -1e-6;
}

/** The next free offset on a side of a leg; takes it. */
function offsetOn(leg: DrawnLeg, out: Spot, height: number, { stack }: FrameLoadsAt): number {
  const side = out.x * leg.left.x + out.y * leg.left.y > 0 ? 'left' : 'right';
  const key = `${leg.member}/${leg.leg.start}/${side}`;
  const used = stack.get(key);
  const offset = used === undefined ? FIRST : used + BETWEEN;
  stack.set(key, offset + height);
  return offset;
}

/** One level baseline for all legs that the load lies on, over everything that stands on them already. */
function levelBase(stretch: Stretch, all: readonly Stretch[], from: Spot, to: Spot, at: FrameLoadsAt): [Spot, Spot] {
  const key = `plan/${stretch.load}`;
  let y = at.stack.get(key);
  if (y === undefined) {
    const tops = all.flatMap(one => {
      const leg = drawnLeg(one.member, one.leg, at.view);
      const used = Math.max(
        at.stack.get(`${leg.member}/${leg.leg.start}/left`) ?? 0,
        at.stack.get(`${leg.member}/${leg.leg.start}/right`) ?? 0,
      );
      return [leg.from.y - used, leg.to.y - used];
    });
    y = Math.min(...tops) - 9;
    at.stack.set(key, y);
    // What follows on these legs stands over the band.
    for (const one of all) {
      const leg = drawnLeg(one.member, one.leg, at.view);
      const lowest = Math.max(leg.from.y, leg.to.y);
      const height = Math.max(Math.abs(one.startIntensity), Math.abs(one.endIntensity)) * at.scale;
      for (const side of ['left', 'right'])
        at.stack.set(`${leg.member}/${leg.leg.start}/${side}`, lowest - y + height + 4);
    }
  }
  return [
    { x: from.x, y },
    { x: to.x, y },
  ];
}

function shifted(from: Spot, to: Spot, out: Spot, offset: number): [Spot, Spot] {
  return [moved(from, out, offset), moved(to, out, offset)];
}

/** A row of arrows beside the leg, on the side away from the middle of the frame. */
function drawBeside(stretch: Stretch, leg: DrawnLeg, way: Spot, at: FrameLoadsAt): Drawn {
  const centre = between(leg.from, leg.to, 0.5);
  const isLeft = (centre.x - at.middle.x) * leg.left.x + (centre.y - at.middle.y) * leg.left.y >= 0;
  const out: Spot = isLeft ? leg.left : { x: -leg.left.x, y: -leg.left.y };
  const offset = offsetOn(leg, out, 8, at) + 5;
  const [from, to] = shifted(spotOnLeg(leg, stretch.start), spotOnLeg(leg, stretch.end), out, offset);
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  const count = Math.max(1, Math.round(length / 40));
  const isForwards = way.x * leg.along.x + way.y * leg.along.y > 0;
  for (let i = 0; i < count; i++) {
    const start = between(from, to, (i + 0.12) / count);
    const end = between(from, to, (i + 0.88) / count);
    drawArrow(at.sheet, isForwards ? start : end, isForwards ? end : start, LOAD_INK, SMALL_HEAD);
  }
  return { told: false, from, to, height: 4, places: placesOver(from, to, out, [4, 4]) };
}

/** Over the middle of a load that lies on one level baseline. */
function overAll(drawn: readonly Drawn[]): Place[] {
  const xs = drawn.flatMap(({ from, to }) => [from.x, to.x]);
  const y = drawn[0]?.from.y ?? 0;
  const height = Math.max(...drawn.map(one => one.height));
  return placesOver({ x: Math.min(...xs), y }, { x: Math.max(...xs), y }, { x: 0, y: -1 }, [height, height]);
}
