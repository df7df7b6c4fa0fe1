// Which values of a beam's field are told, in which words, and where the words may stand.
import type { MemberField } from '../mechanics/solution.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { FIELD_STYLES, type FieldName, sideOf } from './field-curves.ts';
import { withUnit } from './figures.ts';
import type { Spot } from './geometry.ts';
import type { LabelRequest, Place } from './placing.ts';
import { jumps, localExtremes, type Reading } from './readings.ts';
import { forceWords, momentWords, movementInWords, shearWords } from './value-words.ts';
import type { DrawnLeg } from './view.ts';
import { joined, type Label, plain, pointName } from './words.ts';

/** A reading that gets a dot and a label; `beside`: the label stands on that side of a jump that the value belongs to. */
export interface Told {
  readonly reading: Reading;
  readonly beside: boolean;
}

/** Two values closer than this share of the largest are one. */
const SAME = 1e-9;

export function toldReadings(member: MemberField, field: FieldName, largest: number): Told[] {
  const { quantity } = FIELD_STYLES[field];
  const peaks = localExtremes(member, quantity, largest);
  if (field === 'movement') return peaks.map(reading => ({ reading, beside: false }));
  const steps = jumps(member, quantity, largest);
  if (field === 'moment') {
    const inner = steps.filter(step => isInside(member, step));
    const isStep = (reading: Reading): boolean => inner.some(step => sameReading(step, reading));
    const others = peaks.filter(peak => !isStep(peak));
    return [
      ...others.map(reading => ({ reading, beside: false })),
      ...inner.map(reading => ({ reading, beside: true })),
    ];
  }
  // A stretch of constant force is told once.
  const told: Reading[] = [];
  for (const reading of [...steps, ...peaks]) {
    if (!told.some(other => other.run === reading.run)) told.push(reading);
  }
  return told.map(reading => ({ reading, beside: reading.kind !== 'level' }));
}

/** At a member's end the moment goes on in the next member; only a step along the member is told on both sides. */
function isInside(member: MemberField, reading: Reading): boolean {
  return reading.distance > (member.pieces[0]?.start ?? 0) && reading.distance < (member.pieces.at(-1)?.end ?? 0);
}

function sameReading(a: Reading, b: Reading): boolean {
  return a.distance === b.distance && a.piece === b.piece;
}

export interface LabelAt {
  readonly field: FieldName;
  /** Of the dot. */
  readonly spot: Spot;
  readonly leg: DrawnLeg;
  /** Name of the member's first point. */
  readonly from: string;
  readonly units: DisplayUnits;
  readonly largest: number;
}

/** What of a reading its words are made of. */
export type Value = Pick<Reading, 'value' | 'distance' | 'kind'>;

export function labelOf(
  { reading, beside }: { readonly reading: Value; readonly beside: boolean },
  at: LabelAt,
): LabelRequest {
  const side = sideOf(reading.value, at.leg, FIELD_STYLES[at.field]);
  const rank = Math.abs(reading.value) / at.largest;
  return {
    labels: wordings(reading, side, at),
    places: beside ? placesBeside(reading, side, at) : placesOver(side, at),
    role: FIELD_STYLES[at.field].hue,
    rank,
    optional: rank < 1 - SAME,
  };
}

/** The longest first. */
function wordings({ value, distance, kind }: Value, side: Spot, { field, from, units }: LabelAt): Label[] {
  const place = joined(`, ${withUnit(distance, units.length)} from `, [pointName(from)]);
  switch (field) {
    case 'axial':
      return [plain(forceWords(value, units))];
    case 'shear':
      return [plain(shearWords(value, units))];
    case 'moment': {
      const words = plain(momentWords(value, side, units));
      const short = plain(withUnit(Math.abs(value), units.moment));
      return kind === 'level' ? [joined(words, place), words, short] : [words, short];
    }
    case 'movement': {
      const words = plain(movementInWords(value, side, units));
      return kind === 'level' ? [joined(words, place), words] : [words];
    }
  }
}

function placesOver(side: Spot, { spot }: LabelAt): Place[] {
  const isOver = side.y < 0;
  return [
    { at: { x: spot.x, y: spot.y + (isOver ? -7 : 15) }, anchor: 'middle' },
    { at: { x: spot.x + 6, y: spot.y + (isOver ? -6 : 14) }, anchor: 'start' },
    { at: { x: spot.x - 6, y: spot.y + (isOver ? -6 : 14) }, anchor: 'end' },
  ];
}

function placesBeside(reading: Value, side: Spot, { spot, leg }: LabelAt): Place[] {
  const isOver = side.y < 0;
  const forwards = (reading.kind === 'before' ? -1 : 1) * (leg.along.x < 0 ? -1 : 1);
  const anchor = forwards > 0 ? 'start' : 'end';
  return [
    { at: { x: spot.x + 6 * forwards, y: spot.y + (isOver ? -5 : 13) }, anchor },
    { at: { x: spot.x + 3, y: spot.y + (isOver ? -7 : 15) }, anchor: 'middle' },
    { at: { x: spot.x + 6 * forwards, y: spot.y + 4 }, anchor },
  ];
}
