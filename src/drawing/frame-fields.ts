// The fields of a frame, each on the frame's own outline on a panel of its own; where every member is a bar, its force
// is written along it.
import type { Solution } from '../mechanics/solution.ts';
import type { Structure } from '../model/structure.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { type Acting, PANEL_WIDTH, SHEET_WIDTH } from './acting.ts';
import { drawJoints, drawOutline } from './bones.ts';
import { fieldsToDraw } from './field-choice.ts';
import { drawFieldOnLegs, FIELD_STYLES, type FieldName } from './field-curves.ts';
import { asGiven, spaced, THIN } from './figures.ts';
import { barLabels, fieldLabels } from './frame-field-labels.ts';
import { movementLabels } from './frame-movement-labels.ts';
import { pointNames } from './frame-names.ts';
import type { Palette } from './ink.ts';
import { largestMovement, movedPath, roundedExaggeration } from './moved-shape.ts';
import { placeLabels } from './placing.ts';
import { largestSize } from './readings.ts';
import { Sheet } from './sheet.ts';
import { drawSupport, waysFrom } from './supports.ts';
import { type DrawnLeg, drawnLeg, extentOf, fitted, legCount, pointsInUse, type View } from './view.ts';
import { plain } from './words.ts';

export interface Panel {
  readonly field: FieldName;
  readonly svg: string;
  /** Takes the whole width of the page. */
  readonly wide: boolean;
}

/** Largest ordinate, px. */
const ORDINATE: Readonly<Record<FieldName, number>> = { axial: 15, shear: 18, moment: 24, movement: 16 };
/** The frame takes this share of a panel's width, and no more than so many px of height. */
const SHARE = 0.62;
const TALLEST = 190;
/** Over the frame: labels, and the two lines of the title above them, px. */
const HEAD = 48;
const BARS_HEAD = 22;

export function frameFields(structure: Structure, acting: Acting, units: DisplayUnits, palette: Palette): Panel[] {
  const { solution } = acting;
  if (solution === undefined) return [];
  const wide = isWide(structure);
  return fieldsToDraw(structure, solution).map(field => ({
    field,
    svg: drawPanel(structure, solution, acting.name, field, units, palette, wide),
    wide,
  }));
}

/** Long or many-membered frames need the page's width for their figures. */
function isWide(structure: Structure): boolean {
  const { left, right, bottom, top } = extentOf(structure);
  const legs = legCount(structure);
  return legs > 12 || (right - left > 3.2 * (top - bottom) && legs > 3) || structure.members.every(isBar);
}

function isBar({ kind }: { kind: 'member' | 'bar' }): boolean {
  return kind === 'bar';
}

function drawPanel(
  structure: Structure,
  solution: Solution,
  name: string,
  field: FieldName,
  units: DisplayUnits,
  palette: Palette,
  wide: boolean,
): string {
  const width = wide ? SHEET_WIDTH : PANEL_WIDTH;
  const sheet = new Sheet(width, palette);
  const margin = wide ? 70 : (width * (1 - SHARE)) / 2;
  const view = fitted(structure, { left: margin, right: width - margin, top: 0, bottom: TALLEST });
  const head = field === 'axial' && structure.members.every(isBar) ? BARS_HEAD : HEAD;
  const top = Math.min(...pointsInUse(structure).map(point => view.point(point).y)) - head;
  sheet.reach(top - 28);
  const legs = structure.members.map((member, m) => member.legs.map(leg => drawnLeg(m, leg, view)));
  drawOutline(sheet, structure, view);
  const size = wide ? 1 : 0.85;
  for (const support of structure.supports) {
    drawSupport(sheet, support, view.point(support.point), waysFrom(structure, support.point, view.point), size);
  }
  drawJoints(sheet, structure, view);
  const exaggeration = roundedExaggeration(ORDINATE.movement / (largestMovement(solution) * view.scale));
  const unit = { axial: units.force, shear: units.force, moment: units.moment, movement: units.deflection }[field];
  sheet.words([{ text: FIELD_STYLES[field].title, as: 'bold' }], { at: { x: 0, y: top - 16 } });
  const line = `${spaced(unit.text)}, ${name}; ${noteOf(structure, field, exaggeration)}`;
  sheet.words(plain(line), { at: { x: 0, y: top - 1 }, size: 11, role: 'soft' });
  drawField(sheet, structure, solution, field, { legs, view, units, exaggeration });
  return sheet.svg(`${FIELD_STYLES[field].title} of ${structure.title ?? structure.name} under ${name}`);
}

/** What the title has to say of the way the field is drawn. */
function noteOf(structure: Structure, field: FieldName, exaggeration: number): string {
  switch (field) {
    case 'axial':
      return structure.members.every(isBar) ? 'plus is tension' : 'compression on the left of the travel';
    case 'shear':
      return 'plus on the left of the travel';
    case 'moment':
      return 'on the tension side';
    case 'movement':
      return `drawn ×${THIN}${asGiven(exaggeration, { text: '', size: 1 })}`;
  }
}

interface FieldAt {
  readonly legs: readonly (readonly DrawnLeg[])[];
  readonly view: View;
  readonly units: DisplayUnits;
  readonly exaggeration: number;
}

function drawField(
  sheet: Sheet,
  structure: Structure,
  solution: Solution,
  field: FieldName,
  { legs, view, units, exaggeration }: FieldAt,
): void {
  const used = pointsInUse(structure);
  const held = structure.supports.map(({ point }) => point);
  const names = pointNames(structure, view, used.length <= 12 ? used : held).map(name => ({ ...name, rank: 0.01 }));
  if (field === 'movement') {
    for (const [m, member] of solution.members.entries()) {
      sheet.line('moved', movedPath(member, legs[m] ?? [], exaggeration, view.scale));
    }
    placeLabels(sheet, [...movementLabels(sheet, structure, solution, legs, view, exaggeration, units), ...names]);
    return;
  }
  const style = FIELD_STYLES[field];
  const scale = ORDINATE[field] / largestSize(solution.members, style.quantity);
  const bars = structure.members.map(isBar);
  for (const [m, member] of solution.members.entries()) {
    if (!bars[m]) drawFieldOnLegs(sheet, member, legs[m] ?? [], style, scale);
  }
  placeLabels(sheet, [
    ...fieldLabels(sheet, structure, solution, field, legs, scale, units),
    ...(field === 'axial' ? barLabels(structure, solution, legs, units) : []),
    ...names,
  ]);
}
