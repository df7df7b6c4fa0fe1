// The envelope of a field along a straight member: the outline of the largest and the least value of any alternative. The
// outline is sampled, its told values are exact.
import { evaluate } from '../mechanics/polynomial.ts';
import type { MemberField } from '../mechanics/solution.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import type { Acting } from './acting.ts';
import { labelOf } from './beam-field-labels.ts';
import { drawFieldTitle, fieldUnit, LABEL_ROOM, ORDINATE, TITLE_DOWN, TITLE_UP } from './beam-fields.ts';
import { FIELD_STYLES, type FieldName } from './field-curves.ts';
import { asGiven, spaced, THIN } from './figures.ts';
import { path, type Spot } from './geometry.ts';
import { roundedExaggeration } from './moved-shape.ts';
import { placeLabels } from './placing.ts';
import { localExtremes, type Quantity, type Reading } from './readings.ts';
import type { Sheet } from './sheet.ts';
import { type DrawnLeg, spotOnLeg } from './view.ts';
import { joined } from './words.ts';

export interface EnvelopeAt {
  /** Of the member, set level; on the axis once it is known. */
  readonly legsAt: (axis: number) => readonly DrawnLeg[];
  readonly from: string;
  readonly units: DisplayUnits;
  /** What the envelope is taken under. */
  readonly name: string;
  readonly pxPerMetre: number;
  readonly top: number;
}

/** Between two places of the outline, as a share of a piece. */
const SAMPLES = 24;

/** One field of one member under several alternatives; returns the height at which it ends. */
export function drawEnvelope(
  sheet: Sheet,
  fields: readonly { readonly acting: Acting; readonly field: MemberField }[],
  name: FieldName,
  at: EnvelopeAt,
): number {
  const { quantity, side, line, wash, hue } = FIELD_STYLES[name];
  const hull = hullOf(
    fields.map(({ field }) => field),
    quantity,
  );
  const largest = Math.max(...hull.map(({ greatest, least }) => Math.max(greatest, -least)), 0);
  if (largest === 0) return at.top;
  const exaggeration = name === 'movement' ? roundedExaggeration(ORDINATE.movement / (largest * at.pxPerMetre)) : 1;
  const scale = name === 'movement' ? exaggeration * at.pxPerMetre : ORDINATE[name] / largest;
  const greatest = Math.max(0, ...hull.map(one => one.greatest));
  const least = Math.max(0, ...hull.map(one => -one.least));
  // Positive values lie over the axis where the side is 1.
  const [above, below] = side === 1 ? [greatest, least] : [least, greatest];
  const up = Math.max(TITLE_UP, above * scale + (above > 0 ? LABEL_ROOM : 0));
  const down = Math.max(TITLE_DOWN, below * scale + (below > 0 ? LABEL_ROOM : 0));
  const axis = Math.ceil(at.top + up) + 0.5;
  const legs = at.legsAt(axis);
  const spot = (distance: number, value: number): Spot => {
    const leg = legs.find(({ leg: { start, length } }) => distance <= start + length * (1 + 1e-9)) ?? legs.at(-1);
    const base = leg === undefined ? { x: 0, y: axis } : spotOnLeg(leg, distance);
    return { x: base.x, y: base.y - side * scale * value };
  };
  const [first, last] = [hull[0], hull.at(-1)];
  if (first === undefined || last === undefined) return at.top;
  for (const bound of ['greatest', 'least'] as const) {
    const outline = hull.map(one => spot(one.distance, one[bound]));
    sheet.wash(wash, `${path(spot(first.distance, 0), ...outline, spot(last.distance, 0))}Z`);
    sheet.line(line, path(spot(first.distance, 0), ...outline, spot(last.distance, 0)));
  }
  sheet.line('outline', path(spot(first.distance, 0), spot(last.distance, 0)));
  const told = extremesOf(fields, quantity, largest);
  placeLabels(
    sheet,
    told.map(({ reading, acting }) => {
      const dot = spot(reading.distance, reading.value);
      const leg = legs[reading.piece.leg] ?? (legs[0] as DrawnLeg);
      sheet.dot(hue, dot, 2.3);
      const request = labelOf(
        { reading, beside: false },
        { field: name, spot: dot, leg, from: at.from, units: at.units, largest },
      );
      return { ...request, labels: request.labels.map(label => joined(label, `, ${acting.name}`)) };
    }),
  );
  const note = name === 'movement' ? `drawn ×${THIN}${asGiven(exaggeration, { text: '', size: 1 })}` : 'envelope';
  drawFieldTitle(sheet, name, axis, [`${spaced(fieldUnit(name, at.units).text)}, ${at.name}`, note]);
  return axis + down;
}

interface HullPlace {
  readonly distance: number;
  /** Never below zero, and never above it. */
  readonly greatest: number;
  readonly least: number;
}

/** Pieces break at the same places under every alternative. */
function hullOf(fields: readonly MemberField[], quantity: Quantity): HullPlace[] {
  const pieces = fields[0]?.pieces ?? [];
  return pieces.flatMap((piece, p) =>
    Array.from({ length: SAMPLES + 1 }, (_, i): HullPlace => {
      const s = ((piece.end - piece.start) * i) / SAMPLES;
      const values = fields.map(field => evaluate(field.pieces[p]?.[quantity] ?? [], s));
      return { distance: piece.start + s, greatest: Math.max(0, ...values), least: Math.min(0, ...values) };
    }),
  );
}

/** The greatest and the least of all, with the alternative that gives it. */
function extremesOf(
  fields: readonly { readonly acting: Acting; readonly field: MemberField }[],
  quantity: Quantity,
  largest: number,
): { readonly reading: Reading; readonly acting: Acting }[] {
  const all = fields.flatMap(({ acting, field }) =>
    localExtremes(field, quantity, largest).map(reading => ({ reading, acting })),
  );
  const greatest = all.filter(({ reading }) => reading.value > 0).sort((a, b) => b.reading.value - a.reading.value)[0];
  const least = all.filter(({ reading }) => reading.value < 0).sort((a, b) => a.reading.value - b.reading.value)[0];
  return [greatest, least].flatMap(one => one ?? []);
}
