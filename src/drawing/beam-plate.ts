// A level beam on one sheet: loads stacked over it, supports and dimensions, and its fields under it on the same scale.
import type { Structure } from '../model/structure.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { type Acting, SHEET_WIDTH } from './acting.ts';
import { actingCases } from './acting-loads.ts';
import { drawBeamFields } from './beam-fields.ts';
import { drawBeamLoads } from './beam-loads.ts';
import { drawBones } from './bones.ts';
import { tellUndrawn } from './case-name.ts';
import { distinct, drawLevelDimensions } from './dimensions.ts';
import { path } from './geometry.ts';
import type { Palette } from './ink.ts';
import { type LabelRequest, placeLabels } from './placing.ts';
import { Sheet } from './sheet.ts';
import { tellStrains } from './strain-words.ts';
import { drawSupport, waysFrom } from './supports.ts';
import { extentOf, pointsInUse, type View, viewAt } from './view.ts';
import { type Label, plain, pointName, widthOf } from './words.ts';

/** Room for case names and titles at the left, and for the last point's name at the right, px. */
const LEFT = 96.5;
const RIGHT = 39;
/** Dimensions stand this far under the axis, or under the loads that hang there. */
const DIMENSIONS = 60.5;

export function beamPlate(structure: Structure, acting: Acting, units: DisplayUnits, palette: Palette): string {
  const sheet = new Sheet(SHEET_WIDTH, palette);
  const extent = extentOf(structure);
  const scale = (SHEET_WIDTH - LEFT - RIGHT) / (extent.right - extent.left);
  const view = viewAt(structure, scale, LEFT - scale * extent.left, scale * (structure.points[0]?.y ?? 0));
  drawBones(sheet, structure, view);
  for (const support of structure.supports) {
    const at = view.point(support.point);
    drawSupport(sheet, support, at, waysFrom(structure, support.point, view.point));
  }
  const loads = drawBeamLoads(sheet, structure, view, acting.factors, units);
  const bottom = drawFoot(sheet, structure, view, loads.depth, units);
  placeLabels(sheet, [...pointLabels(structure, view), ...memberLabels(structure, view), ...loads.labels]);
  const cases = actingCases(structure, acting.factors);
  tellStrains(sheet, structure, cases, units);
  tellUndrawn(sheet, cases);
  let end = bottom;
  if (acting.solution !== undefined) {
    end = drawBeamFields(sheet, structure, acting.solution, { view, units, name: acting.name, top: bottom + 8 });
    if (end > bottom) drawGuides(sheet, structure, view, bottom, end);
  }
  sheet.reach(end);
  return sheet.svg(description(structure, acting));
}

/** The chain of dimensions; returns where the guides begin. */
function drawFoot(sheet: Sheet, structure: Structure, view: View, depth: number, units: DisplayUnits): number {
  const line = Math.max(DIMENSIONS, Math.ceil(depth) + 24.5);
  const places = distinct(pointsInUse(structure).map(point => structure.points[point]?.x ?? 0));
  const marks = places.map(x => ({ at: view.spot(x, 0).x, value: x }));
  drawLevelDimensions(sheet, marks, { line, from: () => line - 16.5, unit: units.length });
  return line + 9;
}

/** Thin lines through supports and ends, down all fields. */
function drawGuides(sheet: Sheet, structure: Structure, view: View, top: number, bottom: number): void {
  const extent = extentOf(structure);
  const supports = structure.supports.map(({ point }) => structure.points[point]?.x ?? 0);
  for (const x of distinct([extent.left, ...supports, extent.right])) {
    const at = view.spot(x, 0).x;
    sheet.line('guide', path({ x: at, y: top }, { x: at, y: bottom }), 'guide');
  }
}

function pointLabels(structure: Structure, view: View): LabelRequest[] {
  const extent = extentOf(structure);
  const held = new Set(structure.supports.map(({ point }) => point));
  return pointsInUse(structure).map(index => {
    const point = structure.points[index] as Structure['points'][number];
    const { x, y } = view.point(index);
    const labels: Label[] = [[pointName(point.name)]];
    const common = { labels, role: 'ink' as const, rank: 70 };
    if (point.x === extent.left) return { ...common, places: [{ at: { x: x - 9, y: y + 4 }, anchor: 'end' as const }] };
    if (point.x === extent.right)
      return { ...common, places: [{ at: { x: x + 8, y: y + 4 }, anchor: 'start' as const }] };
    const places = held.has(index)
      ? [
          { at: { x: x + 17, y: y + 19 }, anchor: 'start' as const },
          { at: { x: x - 17, y: y + 19 }, anchor: 'end' as const },
        ]
      : [
          { at: { x, y: y + 19 }, anchor: 'middle' as const },
          { at: { x: x + 5, y: y + 19 }, anchor: 'start' as const },
          { at: { x: x - 5, y: y + 19 }, anchor: 'end' as const },
        ];
    return { ...common, places };
  });
}

/** The member's name and section under its longest leg. */
function memberLabels(structure: Structure, view: View): LabelRequest[] {
  return structure.members.flatMap(member => {
    const leg = [...member.legs].sort((a, b) => b.length - a.length)[0];
    if (leg === undefined) return [];
    const [from, to] = [view.point(leg.from), view.point(leg.to)];
    const section = structure.sections[leg.section];
    const name: Label = plain(member.name);
    const full: Label =
      section === undefined
        ? name
        : [{ text: `${member.name}\u2002` }, { text: sectionWords(section.name, section.description), as: 'soft' }];
    const room = Math.abs(to.x - from.x);
    const middle = (from.x + to.x) / 2;
    return [
      {
        labels: [full, name].filter((label, i) => i === 1 || widthOf(label, 12) < room),
        places: [22, 36].flatMap(dy =>
          [0, -1, 1, -2, 2, -3, 3].map(step => ({
            at: { x: middle + (step * room) / 12, y: from.y + dy },
            anchor: 'middle' as const,
          })),
        ),
        role: 'ink' as const,
        rank: 40,
        optional: structure.members.length > 6,
      },
    ];
  });
}

function sectionWords(name: string, description: string): string {
  return description === '' || description === name ? name : `${name}, ${description}`;
}

function description(structure: Structure, acting: Acting): string {
  const title = structure.title ?? structure.name;
  const fields = acting.solution === undefined ? '' : ' with its fields';
  return `${title} under ${acting.name}${fields}`;
}
