// The envelope of a field along a straight member: the outline of the greatest and the least value of any alternative, each
// piece the polynomial of one of them.
import { derivative, evaluate, extremes, type Polynomial, roots, shifted } from '../mechanics/polynomial.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { labelOf } from './beam-field-labels.ts';
import { drawFieldTitle, fieldUnit, LABEL_ROOM, ORDINATE, TITLE_DOWN, TITLE_UP } from './beam-fields.ts';
import { type Curve, curveTo, degreeOf } from './curves.ts';
import { FIELD_STYLES, type FieldName } from './field-curves.ts';
import { asGiven, spaced, THIN } from './figures.ts';
import { path, px, type Spot } from './geometry.ts';
import { roundedExaggeration } from './moved-shape.ts';
import { placeLabels } from './placing.ts';
import type { Sheet } from './sheet.ts';
import { type DrawnLeg, spotOnLeg } from './view.ts';
import { joined } from './words.ts';

/** A stretch of an outline, m along the member, in s = distance − start. */
export interface OutlinePiece {
  readonly start: number;
  readonly end: number;
  readonly polynomial: Polynomial;
  /** Of the alternative that gives it. */
  readonly name: string;
}

export interface Envelope {
  /** What it is taken under. */
  readonly name: string;
  /** From the member's start to its end, without gaps. */
  readonly greatest: readonly OutlinePiece[];
  readonly least: readonly OutlinePiece[];
}

export interface EnvelopeAt {
  /** Of the member, set level; on the axis once it is known. */
  readonly legsAt: (axis: number) => readonly DrawnLeg[];
  readonly from: string;
  readonly units: DisplayUnits;
  readonly pxPerMetre: number;
  readonly top: number;
}

/** One field of one member under several alternatives; returns the height at which it ends. */
export function drawEnvelope(sheet: Sheet, envelope: Envelope, name: FieldName, at: EnvelopeAt): number {
  const { side, line, wash, hue } = FIELD_STYLES[name];
  const outlines = [beyondAxis(envelope.greatest, 1), beyondAxis(envelope.least, -1)] as const;
  const peaks = outlines.map(peakOf);
  const largest = Math.max(...peaks.map(peak => Math.abs(peak?.value ?? 0)));
  if (largest === 0) return at.top;
  const exaggeration = name === 'movement' ? roundedExaggeration(ORDINATE.movement / (largest * at.pxPerMetre)) : 1;
  const scale = name === 'movement' ? exaggeration * at.pxPerMetre : ORDINATE[name] / largest;
  const [greatest, least] = [peaks[0]?.value ?? 0, -(peaks[1]?.value ?? 0)];
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
  const [first, last] = [envelope.greatest[0], envelope.greatest.at(-1)];
  if (first === undefined || last === undefined) return at.top;
  const [begin, end] = [spot(first.start, 0), spot(last.end, 0)];
  for (const outline of outlines) {
    const curves = outline.map(piece => curveOf(piece, spot, at.pxPerMetre, -side * scale));
    const d = curves.map(curve => lineTo(curve.at(0)) + curveTo(curve)).join('');
    sheet.wash(wash, `${path(begin)}${d}${lineTo(end)}Z`);
    sheet.line(line, `${path(begin)}${d}${lineTo(end)}`);
  }
  sheet.line('outline', path(begin, end));
  placeLabels(
    sheet,
    peaks.flatMap(peak => {
      if (peak === undefined || Math.abs(peak.value) <= NEGLIGIBLE * largest) return [];
      const dot = spot(peak.distance, peak.value);
      const leg =
        legs.find(({ leg: { start, length } }) => peak.distance <= start + length * (1 + 1e-9)) ?? legs.at(-1);
      if (leg === undefined) return [];
      sheet.dot(hue, dot, 2.3);
      const request = labelOf(
        { reading: peak, beside: false },
        { field: name, spot: dot, leg, from: at.from, units: at.units, largest },
      );
      return { ...request, labels: request.labels.map(label => joined(label, `, ${peak.name}`)) };
    }),
  );
  const note = name === 'movement' ? `drawn ×${THIN}${asGiven(exaggeration, { text: '', size: 1 })}` : 'envelope';
  drawFieldTitle(sheet, name, axis, [`${spaced(fieldUnit(name, at.units).text)}, ${envelope.name}`, note]);
  return axis + down;
}

/** A value smaller than this share of the largest is rounding. */
const NEGLIGIBLE = 1e-9;

/** What of an outline lies beyond the axis; where it would cross, it runs along the axis. */
function beyondAxis(outline: readonly OutlinePiece[], sense: 1 | -1): OutlinePiece[] {
  return outline.flatMap(({ start, end, polynomial, name }) => {
    const length = end - start;
    const cuts = [0, ...roots(polynomial, 0, length).filter(s => s > 0 && s < length), length];
    return cuts.slice(1).map((to, i): OutlinePiece => {
      const from = cuts[i] as number;
      const isBeyond = sense * evaluate(polynomial, 0.5 * (from + to)) > 0;
      return {
        start: start + from,
        end: to === length ? end : start + to,
        polynomial: isBeyond ? shifted(polynomial, from) : [0],
        name,
      };
    });
  });
}

interface Peak {
  readonly distance: number;
  readonly value: number;
  readonly kind: 'level' | 'before' | 'after';
  readonly name: string;
}

/** The place farthest from the axis, the first of equals; a place of level slope before an end. */
function peakOf(outline: readonly OutlinePiece[]): Peak | undefined {
  let peak: Peak | undefined;
  for (const { start, end, polynomial, name } of outline) {
    const length = end - start;
    for (const s of extremes(polynomial, 0, length)) {
      const value = evaluate(polynomial, s);
      if (Math.abs(value) <= Math.abs(peak?.value ?? 0) * (1 + NEGLIGIBLE)) continue;
      const kind = s === 0 ? 'after' : s === length ? 'before' : 'level';
      peak = { distance: s === length ? end : start + s, value, kind, name };
    }
  }
  return peak;
}

/** `across`: px downwards for one unit. */
function curveOf(
  { start, end, polynomial }: OutlinePiece,
  spot: (distance: number, value: number) => Spot,
  pxPerMetre: number,
  across: number,
): Curve {
  const slope = derivative(polynomial);
  return {
    length: end - start,
    degree: degreeOf(polynomial, end - start),
    at: s => spot(start + s, evaluate(polynomial, s)),
    slope: s => ({ x: pxPerMetre, y: across * evaluate(slope, s) }),
  };
}

function lineTo({ x, y }: Spot): string {
  return `L${px(x)} ${px(y)}`;
}
