// The fields of a level beam, stacked on its own horizontal scale: axial force where there is any, shear, moment, movement.
import { evaluate } from '../mechanics/polynomial.ts';
import type { Solution } from '../mechanics/solution.ts';
import type { Structure } from '../model/structure.ts';
import type { DisplayUnit, DisplayUnits } from '../quantity/display.ts';
import { labelOf, toldReadings } from './beam-field-labels.ts';
import { fieldsToDraw } from './field-choice.ts';
import { drawFieldOnLegs, FIELD_STYLES, type FieldName, sideOf, spotOfReading } from './field-curves.ts';
import { asGiven, spaced, THIN, withUnit } from './figures.ts';
import { path, type Spot } from './geometry.ts';
import { largestMovement, roundedExaggeration } from './moved-shape.ts';
import { type LabelRequest, placeLabels } from './placing.ts';
import { largestSize, zeroCrossings } from './readings.ts';
import type { Sheet } from './sheet.ts';
import { type DrawnLeg, drawnLeg, segmentOf, spotOnLeg, type View, viewAt } from './view.ts';
import { plain } from './words.ts';

export interface BeamFieldsAt {
  readonly view: View;
  readonly units: DisplayUnits;
  /** Of the combination or case. */
  readonly name: string;
  /** px: the first free height under what stands above. */
  readonly top: number;
}

/** Largest ordinate, px. */
export const ORDINATE: Readonly<Record<FieldName, number>> = { axial: 26, shear: 33, moment: 31, movement: 30 };
/** Beyond an extreme for its label, and between fields, px. */
export const LABEL_ROOM = 17;
export const BETWEEN = 8;
/** The three lines of a title need this much over and under the axis, px. */
export const TITLE_UP = 20;
export const TITLE_DOWN = 26;

/** A movement across the beam below this share of the whole is rounding. */
const NO_MOVEMENT = 1e-9;

/** Draws them one under the other and returns the height at which they end. */
export function drawBeamFields(sheet: Sheet, structure: Structure, solution: Solution, place: BeamFieldsAt): number {
  let top = place.top;
  const dots: { readonly field: FieldName; readonly axis: number; readonly spots: readonly Spot[] }[] = [];
  for (const field of fieldsToDraw(structure, solution)) {
    // A beam that only changes its length moves along its own line, which no ordinate shows.
    const across = largestSize(solution.members, 'transverseMovement');
    if (field === 'movement' && across <= NO_MOVEMENT * largestMovement(solution)) continue;
    const drawn = drawBeamField(sheet, structure, solution, field, { ...place, top });
    dots.push({ field, axis: drawn.axis, spots: drawn.levels });
    top = drawn.bottom + BETWEEN;
  }
  guideToExtremes(sheet, dots);
  return top - BETWEEN;
}

export interface DrawnField {
  /** px, its axis and where it ends. */
  readonly axis: number;
  readonly bottom: number;
  /** Dots of level extremes. */
  readonly levels: readonly Spot[];
}

/** One field of a level beam, under `top`. */
export function drawBeamField(
  sheet: Sheet,
  structure: Structure,
  solution: Solution,
  field: FieldName,
  { view, units, name, top }: BeamFieldsAt,
): DrawnField {
  const style = FIELD_STYLES[field];
  const largest = largestSize(solution.members, style.quantity);
  const exaggeration = field === 'movement' ? roundedExaggeration(ORDINATE.movement / (largest * view.scale)) : 1;
  const scale = field === 'movement' ? exaggeration * view.scale : ORDINATE[field] / largest;

  // Find how far it reaches to either side, then set its axis on a half pixel.
  const flat = legsOf(structure, axisView(structure, view, 0));
  const told = solution.members.map(member => toldReadings(member, field, largest));
  const heights = told.flatMap((list, m) =>
    list.map(({ reading }) => spotOfReading(reading, flat[m] ?? [], style, scale).y),
  );
  const up = Math.max(TITLE_UP, -Math.min(0, ...heights) + (heights.some(y => y < 0) ? LABEL_ROOM : 0));
  const down = Math.max(TITLE_DOWN, Math.max(0, ...heights) + (heights.some(y => y > 0) ? LABEL_ROOM : 0));
  const axis = Math.ceil(top + up) + 0.5;

  const legs = legsOf(structure, axisView(structure, view, axis));
  const requests: LabelRequest[] = [];
  const levels: Spot[] = [];
  for (const [m, member] of solution.members.entries()) {
    const drawn = legs[m] ?? [];
    drawFieldOnLegs(sheet, member, drawn, style, scale);
    for (const leg of drawn) {
      sheet.line('outline', path(leg.from, leg.to));
      sheet.obstacles.push(segmentOf(leg));
    }
    const from = structure.points[drawn[0]?.leg.from ?? 0]?.name ?? '';
    for (const one of told[m] ?? []) {
      const spot = spotOfReading(one.reading, drawn, style, scale);
      const leg = drawn[one.reading.piece.leg];
      if (leg === undefined) continue;
      sheet.dot(style.hue, spot, 2.3);
      if (one.reading.kind === 'level') levels.push(spot);
      requests.push(labelOf(one, { field, spot, leg, from, units, largest }));
    }
    requests.push(...crossings(sheet, member, field, drawn, largest, units));
  }
  placeLabels(sheet, requests);
  const notes: Readonly<Record<FieldName, string>> = {
    axial: 'compression above',
    shear: everyTravelIsRight(structure) ? '+ is up on the left' : '+ left of the travel',
    moment: 'tension side',
    movement: `drawn ×${THIN}${asGiven(exaggeration, { text: '', size: 1 })}`,
  };
  drawFieldTitle(sheet, field, axis, [`${spaced(fieldUnit(field, units).text)}, ${name}`, notes[field]]);
  return { axis, bottom: axis + down, levels };
}

/** The beam's points, set on the axis of a field. */
function axisView(structure: Structure, view: View, axis: number): View {
  const height = structure.points[0]?.y ?? 0;
  return viewAt(structure, view.scale, view.spot(0, 0).x, axis + view.scale * height);
}

function legsOf(structure: Structure, view: View): DrawnLeg[][] {
  return structure.members.map((member, m) => member.legs.map(leg => drawnLeg(m, leg, view)));
}

/** A tick where the value passes through zero, and for the moment its place on the empty side. */
function crossings(
  sheet: Sheet,
  member: Solution['members'][number],
  field: FieldName,
  legs: readonly DrawnLeg[],
  largest: number,
  units: DisplayUnits,
): LabelRequest[] {
  if (field === 'movement' || field === 'axial') return [];
  const style = FIELD_STYLES[field];
  return zeroCrossings(member, style.quantity, largest).flatMap(distance => {
    const leg = legs.find(({ leg: { start, length } }) => distance <= start + length);
    if (leg === undefined) return [];
    const spot = spotOnLeg(leg, distance);
    sheet.line('tick', path({ x: spot.x, y: spot.y - 4 }, { x: spot.x, y: spot.y + 4 }));
    if (field !== 'moment') return [];
    const piece = member.pieces.find(({ end }) => distance < end);
    const slope = piece === undefined ? 0 : evaluate(piece.shearForce, distance - piece.start);
    // After the crossing the value has the sign of its slope.
    const after = sideOf(slope, leg, style);
    const onTheRight = { at: { x: spot.x + 5, y: spot.y + (after.y < 0 ? 13 : -6) }, anchor: 'start' as const };
    const onTheLeft = { at: { x: spot.x - 5, y: spot.y + (after.y < 0 ? -6 : 13) }, anchor: 'end' as const };
    const places = leg.along.x < 0 ? [onTheLeft, onTheRight] : [onTheRight, onTheLeft];
    return [
      { labels: [plain(withUnit(distance, units.length))], places, role: 'soft', size: 11, rank: -1, optional: true },
    ];
  });
}

export function fieldUnit(field: FieldName, units: DisplayUnits): DisplayUnit {
  return { axial: units.force, shear: units.force, moment: units.moment, movement: units.deflection }[field];
}

/** The quantity, and two lines in the smaller size. */
export function drawFieldTitle(sheet: Sheet, field: FieldName, axis: number, lines: readonly string[]): void {
  sheet.words([{ text: FIELD_STYLES[field].title, as: 'bold' }], { at: { x: 0, y: axis - 8 } });
  for (const [i, line] of lines.entries()) {
    sheet.words(plain(line), { at: { x: 0, y: axis + 7 + 14 * i }, size: 11, role: 'soft' });
  }
}

function everyTravelIsRight(structure: Structure): boolean {
  return structure.members.every(({ legs }) => legs.every(({ cosine }) => cosine > 0));
}

/** Zero shear leads down to the moment's dot, and the movement's axis to its own. */
function guideToExtremes(
  sheet: Sheet,
  drawn: readonly { readonly field: FieldName; readonly axis: number; readonly spots: readonly Spot[] }[],
): void {
  const shear = drawn.find(({ field }) => field === 'shear');
  for (const { field, axis, spots } of drawn) {
    if (field !== 'moment' && field !== 'movement') continue;
    const from = field === 'moment' && shear !== undefined ? shear.axis : axis;
    for (const spot of spots) sheet.line('guide', path({ x: spot.x, y: from }, spot), 'guide');
  }
}
