// The values told on a frame's fields: signed shears, moments with the side in tension, axial forces in words.
import type { Solution } from '../mechanics/solution.ts';
import type { Structure } from '../model/structure.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { FIELD_STYLES, type FieldName, sideOf, spotOfReading } from './field-curves.ts';
import { inUnit, signed, withUnit } from './figures.ts';
import { placesAlong, readable } from './frame-names.ts';
import type { Spot } from './geometry.ts';
import type { LabelRequest, Place } from './placing.ts';
import { jumps, largestSize, localExtremes, type Reading } from './readings.ts';
import type { Sheet } from './sheet.ts';
import { forceWords, sideWord } from './value-words.ts';
import type { DrawnLeg } from './view.ts';
import { plain } from './words.ts';

type FrameField = Exclude<FieldName, 'movement'>;

const SAME = 1e-6;
/** A moment below this share of the largest is not told. */
const MINOR = 0.04;

interface Told {
  readonly reading: Reading;
  readonly leg: DrawnLeg;
  readonly spot: Spot;
  readonly side: Spot;
}

/** Draws the dots and returns the labels. */
export function fieldLabels(
  sheet: Sheet,
  structure: Structure,
  solution: Solution,
  field: FrameField,
  legs: readonly (readonly DrawnLeg[])[],
  scale: number,
  units: DisplayUnits,
): LabelRequest[] {
  const style = FIELD_STYLES[field];
  const largest = largestSize(solution.members, style.quantity);
  const told = solution.members.flatMap((member, m) => {
    const drawn = legs[m] ?? [];
    if (structure.members[m]?.kind === 'bar') return [];
    return readingsOf(member, field, largest).flatMap((reading): Told[] => {
      const leg = drawn[reading.piece.leg];
      if (leg === undefined) return [];
      const spot = spotOfReading(reading, drawn, style, scale);
      return [{ reading, leg, spot, side: sideOf(reading.value, leg, style) }];
    });
  });
  for (const { spot } of told) sheet.dot(style.hue, spot, 2.3);
  return groups(told, field, largest).map(group => {
    const [first] = group as [Told, ...Told[]];
    const rank = Math.abs(first.reading.value) / largest;
    const places = field === 'axial' ? axialPlaces(first) : group.flatMap(one => placesOver(one));
    return {
      labels: wordings(group, field, units).map(plain),
      places,
      role: style.hue,
      rank,
      optional: rank < 0.999,
    };
  });
}

/** A bar's force in words along it. */
export function barLabels(
  structure: Structure,
  solution: Solution,
  legs: readonly (readonly DrawnLeg[])[],
  units: DisplayUnits,
): LabelRequest[] {
  const largest = largestSize(solution.members, 'axialForce');
  return structure.members.flatMap((member, m) => {
    const field = solution.members[m];
    if (member.kind !== 'bar' || field === undefined) return [];
    const peak = localExtremes(field, 'axialForce', largest).sort((a, b) => Math.abs(b.value) - Math.abs(a.value))[0];
    const leg = legs[m]?.[peak?.piece.leg ?? 0];
    if (leg === undefined) return [];
    const labels =
      peak === undefined
        ? [plain('no force')]
        : [plain(forceShort(peak.value, units)), plain(signed(peak.value, units.force))];
    return [
      {
        labels,
        places: barPlaces(leg),
        role: 'ink' as const,
        size: 11 as const,
        rank: Math.abs(peak?.value ?? 0) / largest,
      },
    ];
  });
}

function readingsOf(member: Solution['members'][number], field: FrameField, largest: number): Reading[] {
  const { quantity } = FIELD_STYLES[field];
  const peaks = localExtremes(member, quantity, largest);
  if (field === 'moment') return peaks.filter(({ value }) => Math.abs(value) >= MINOR * largest);
  if (field === 'axial') return peaks;
  const told: Reading[] = [];
  for (const reading of [...jumps(member, quantity, largest), ...peaks]) {
    if (!told.some(other => other.run === reading.run)) told.push(reading);
  }
  return told;
}

/** A corner whose two ends agree in size is told once. */
function groups(told: readonly Told[], field: FrameField, largest: number): Told[][] {
  if (field !== 'moment') return told.map(one => [one]);
  const found: Told[][] = [];
  for (const one of told) {
    const partner = found.find(([other]) => other !== undefined && isSameCorner(other, one, largest));
    if (partner === undefined) found.push([one]);
    else partner.push(one);
  }
  return found;
}

function isSameCorner(a: Told, b: Told, largest: number): boolean {
  const [corner, other] = [cornerOf(a), cornerOf(b)];
  return (
    corner !== undefined &&
    corner === other &&
    Math.abs(Math.abs(a.reading.value) - Math.abs(b.reading.value)) <= SAME * largest
  );
}

/** The structure's point that a reading stands at, if it stands at one. */
function cornerOf({ reading, leg }: Told): number | undefined {
  const { start, length, from, to } = leg.leg;
  if (Math.abs(reading.distance - start) <= 1e-9 * length) return from;
  if (Math.abs(reading.distance - start - length) <= 1e-9 * length) return to;
  return undefined;
}

function wordings(group: readonly Told[], field: FrameField, units: DisplayUnits): string[] {
  const [first] = group as readonly [Told, ...Told[]];
  const { value } = first.reading;
  if (field === 'shear') return [signed(value, units.force)];
  if (field === 'axial') return [forceShort(value, units), signed(value, units.force)];
  const sides = [...new Set(group.map(({ side }) => sideWord(side)))].sort();
  const number = inUnit(Math.abs(value), units.moment);
  return [
    `${withUnit(Math.abs(value), units.moment)}, tension ${sides.join(' and ')}`,
    `${number}, tension ${sides[0] ?? ''}`,
    number,
  ];
}

/** The unit stands in the panel's title. */
function forceShort(value: number, units: DisplayUnits): string {
  return forceWords(value, { ...units, force: { text: '', size: units.force.size } }).replace('\u2009 ', ' ');
}

/** On the value's own side of the axis first. */
function placesOver({ spot, side }: Told): Place[] {
  const isLevel = Math.abs(side.x) < 0.35;
  const right: Place = { at: { x: spot.x + 7, y: spot.y + 4 }, anchor: 'start' };
  const left: Place = { at: { x: spot.x - 7, y: spot.y + 4 }, anchor: 'end' };
  const over: Place = { at: { x: spot.x, y: spot.y - 7 }, anchor: 'middle' };
  const under: Place = { at: { x: spot.x, y: spot.y + 15 }, anchor: 'middle' };
  const level = side.x > 0 ? [right, left] : [left, right];
  const upright = side.y < 0 ? [over, under] : [under, over];
  const corners: Place[] = [
    { at: { x: spot.x + 5, y: spot.y - 6 }, anchor: 'start' },
    { at: { x: spot.x - 5, y: spot.y - 6 }, anchor: 'end' },
    { at: { x: spot.x + 5, y: spot.y + 14 }, anchor: 'start' },
    { at: { x: spot.x - 5, y: spot.y + 14 }, anchor: 'end' },
    { at: { x: spot.x, y: spot.y - 20 }, anchor: 'middle' },
    { at: { x: spot.x, y: spot.y + 28 }, anchor: 'middle' },
    { at: { x: spot.x + 12, y: spot.y - 18 }, anchor: 'start' },
    { at: { x: spot.x - 12, y: spot.y - 18 }, anchor: 'end' },
    { at: { x: spot.x, y: spot.y - 33 }, anchor: 'middle' },
  ];
  return isLevel ? [...upright, ...level, ...corners] : [...level, ...upright, ...corners];
}

/** Beside the band at either side; the band itself takes up to 15 px. */
function axialPlaces({ leg }: Told): Place[] {
  return [...placesAlong(leg, 11), ...placesAlong(leg, 24)];
}

/** Along the bar at its middle, also where it is steep: bars lie close together. */
function barPlaces(leg: DrawnLeg): Place[] {
  const turn = readable((Math.atan2(leg.along.y, leg.along.x) * 180) / Math.PI);
  const radians = (turn * Math.PI) / 180;
  // Square to the reading direction, upwards as read.
  const up: Spot = { x: Math.sin(radians), y: -Math.cos(radians) };
  return [0.5, 0.4, 0.6].flatMap(share => {
    const x = leg.from.x + (leg.to.x - leg.from.x) * share;
    const y = leg.from.y + (leg.to.y - leg.from.y) * share;
    return [5, -13].map((off): Place => ({ at: { x: x + up.x * off, y: y + up.y * off }, anchor: 'middle', turn }));
  });
}
