// Finds room for labels. Each label names the places it could stand, best first; the first that is clear is taken, and
// where none is, the least crowded, unless the label may be left out.
import { type Box, lengthInside, overlap, type Spot } from './geometry.ts';
import type { WordRole } from './ink.ts';
import { footprint, type Sheet } from './sheet.ts';
import { type Anchor, type Label, textOf, type WordSize, widthOf } from './words.ts';

export interface Place {
  /** Of the baseline. */
  readonly at: Spot;
  readonly anchor: Anchor;
  /** Degrees, clockwise. */
  readonly turn?: number;
  /** On a line that it is about: only other words are in the way. */
  readonly onLine?: true;
}

export interface LabelRequest {
  /** The same, ever shorter; the longest that finds room is written. */
  readonly labels: readonly Label[];
  readonly places: readonly Place[];
  readonly role: WordRole;
  readonly size?: WordSize;
  /** Labels of higher rank choose first. */
  readonly rank: number;
  /** Left out rather than written over other words. */
  readonly optional?: boolean;
}

/** A square px of other words costs as much as … */
const WORDS_COST = 4;
/** … and a px of a line under the label. */
const LINE_COST = 3;
/** Each place further down the list. */
const LATER_COST = 1.5;
/** Each shorter wording. */
const SHORTER_COST = 16;
/** Above this an optional label is left out. */
const TOO_CROWDED = 70;

/** More labels than this no sheet of this size can hold. */
const MOST_LABELS = 160;

/** Writes the labels on the sheet, those of highest rank first. Equal words close by stand for each other. */
export function placeLabels(sheet: Sheet, requests: readonly LabelRequest[]): void {
  const written: { readonly text: string; readonly at: Spot }[] = [];
  for (const request of [...requests].sort((a, b) => b.rank - a.rank).slice(0, MOST_LABELS)) {
    const first = request.places[0];
    const longest = request.labels[0];
    if (first === undefined || longest === undefined) continue;
    const text = textOf(longest);
    if (request.optional && written.some(other => other.text === text && near(other.at, first.at))) continue;
    const choice = choose(sheet, request);
    if (choice === undefined) continue;
    written.push({ text, at: first.at });
    const { at, anchor, turn } = choice.place;
    sheet.words(choice.label, {
      at,
      anchor,
      ...(turn === undefined ? {} : { turn }),
      role: request.role,
      halo: true,
      ...(request.size === undefined ? {} : { size: request.size }),
    });
  }
}

function near(a: Spot, b: Spot): boolean {
  return Math.abs(a.x - b.x) < 48 && Math.abs(a.y - b.y) < 40;
}

interface Choice {
  readonly label: Label;
  readonly place: Place;
  readonly cost: number;
}

function choose(sheet: Sheet, request: LabelRequest): Choice | undefined {
  let best: Choice | undefined;
  for (const [shorter, label] of request.labels.entries()) {
    for (const [later, place] of request.places.entries()) {
      const least = later * LATER_COST + shorter * SHORTER_COST;
      if (best !== undefined && least >= best.cost) break;
      const size = request.size ?? 12;
      const inside = withinSheet(sheet, label, place, size);
      const boxes = footprint(label, inside.at, inside.anchor, size, inside.turn ?? 0);
      const cost = crowding(sheet, boxes, place.onLine === true, (best?.cost ?? Infinity) - least) + least;
      if (best === undefined || cost < best.cost) best = { label, place: inside, cost };
    }
  }
  return best === undefined || (request.optional && best.cost > TOO_CROWDED) ? undefined : best;
}

/** Level labels are pushed in from the edges of the sheet. */
function withinSheet(sheet: Sheet, label: Label, place: Place, size: WordSize): Place {
  if (place.turn !== undefined && place.turn !== 0) return place;
  const width = widthOf(label, size);
  const start = place.anchor === 'start' ? 0 : place.anchor === 'middle' ? width / 2 : width;
  const left = place.at.x - start;
  const kept = Math.max(0, Math.min(left, sheet.width - width));
  return kept === left ? place : { ...place, at: { x: place.at.x + kept - left, y: place.at.y } };
}

/** Not counted on past `most`. */
function crowding(sheet: Sheet, boxes: readonly Box[], onLine: boolean, most: number): number {
  let cost = 0;
  for (const box of boxes) {
    if (box.left < 0 || box.right > sheet.width) cost += 400;
    const air = widened(box);
    for (const other of sheet.taken) cost += WORDS_COST * overlap(other, air);
    if (cost >= most) return cost;
    if (onLine) continue;
    for (const segment of sheet.obstacles) cost += LINE_COST * lengthInside(segment, box);
    if (cost >= most) return cost;
  }
  return cost;
}

/** Words need a little air between them. */
function widened(box: Box): Box {
  return { left: box.left - 3, top: box.top, right: box.right + 3, bottom: box.bottom };
}
