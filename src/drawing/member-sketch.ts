// A small picture of one member for a hover: its moment and its moved shape, complete in itself.
import type { Solution } from '../mechanics/solution.ts';
import type { Structure } from '../model/structure.ts';
import { type DisplayUnits, METRIC } from '../quantity/display.ts';
import { drawFieldOnLegs, FIELD_STYLES } from './field-curves.ts';
import { asGiven, THIN } from './figures.ts';
import { barLabels, fieldLabels } from './frame-field-labels.ts';
import { movementLabels } from './frame-movement-labels.ts';
import { pointNames } from './frame-names.ts';
import { path } from './geometry.ts';
import type { Palette } from './ink.ts';
import { largestMovement, movedPath, roundedExaggeration } from './moved-shape.ts';
import { placeLabels } from './placing.ts';
import { largestSize } from './readings.ts';
import { Sheet } from './sheet.ts';
import { drawSupport, waysFrom } from './supports.ts';
import { drawnLeg, fitted } from './view.ts';
import { plain } from './words.ts';

const WIDTH = 360;
const MARGIN = 46;
const TALLEST = 150;

/** `member`: index into the structure's members. At most 20 kB; colours are written into it. */
export function memberSketch(
  structure: Structure,
  member: number,
  solution: Solution,
  palette: Exclude<Palette, 'page'>,
  units: DisplayUnits = METRIC,
): string {
  const sheet = new Sheet(WIDTH, palette);
  const { structure: alone, solution: own } = onlyMember(structure, member, solution);
  const view = fitted(alone, { left: MARGIN, right: WIDTH - MARGIN, top: 0, bottom: TALLEST });
  const [drawn] = alone.members;
  const legs = (drawn?.legs ?? []).map(leg => drawnLeg(0, leg, view));
  for (const leg of legs) {
    sheet.line(drawn?.kind === 'bar' ? 'bar' : 'member', path(leg.from, leg.to));
    sheet.obstacles.push([leg.from, leg.to]);
    sheet.reach(leg.from.y - 34, leg.to.y - 34, leg.from.y + 22, leg.to.y + 22);
  }
  for (const support of alone.supports) {
    drawSupport(sheet, support, view.point(support.point), waysFrom(structure, support.point, view.point), 0.85);
  }
  const field = own.members[0];
  if (field === undefined) return sheet.svg(`Member ${drawn?.name ?? ''}`);
  const labels = drawn?.kind === 'bar' ? barLabels(alone, own, [legs], units) : [];
  const moment = largestSize([field], 'bendingMoment');
  if (moment > 0) {
    drawFieldOnLegs(sheet, field, legs, FIELD_STYLES.moment, 26 / moment);
    labels.push(...fieldLabels(sheet, alone, own, 'moment', [legs], 26 / moment, units));
  }
  const movement = largestMovement(own);
  if (movement > 0) {
    const exaggeration = roundedExaggeration(22 / (movement * view.scale));
    sheet.line('moved', movedPath(field, legs, exaggeration, view.scale));
    const words = movementLabels(sheet, alone, own, [legs], view, exaggeration, units);
    labels.push(...words.map(label => ({ ...label, rank: label.rank + 0.5 })));
    const told = `movement ×${THIN}${asGiven(exaggeration, { text: '', size: 1 })}`;
    placeLabels(sheet, [...labels, ...pointNames(alone, view, ends(alone))]);
    sheet.words(plain(told), {
      at: { x: WIDTH - 2, y: Math.ceil(sheet.bottom) + 14 },
      anchor: 'end',
      size: 11,
      role: 'soft',
    });
  } else placeLabels(sheet, [...labels, ...pointNames(alone, view, ends(alone))]);
  return sheet.svg(`Member ${drawn?.name ?? ''}: moment and moved shape`);
}

/** The member as a structure of its own, with what stands at its points. Indices of points stay. */
function onlyMember(
  structure: Structure,
  member: number,
  solution: Solution,
): { structure: Structure; solution: Solution } {
  const only = structure.members[member];
  const field = solution.members[member];
  if (only === undefined || field === undefined) throw new Error(`member ${member} of ${structure.members.length}`);
  const own = new Set(only.legs.flatMap(({ from, to }) => [from, to]));
  const anchor = structure.points[only.legs[0]?.from ?? 0];
  const movements = solution.movements.map((value, i) => (own.has(Math.floor(i / 3)) ? value : 0));
  return {
    structure: {
      ...structure,
      // Points elsewhere neither count for the extent nor are drawn.
      points: structure.points.map((point, i) =>
        own.has(i) || anchor === undefined ? point : { ...point, x: anchor.x, y: anchor.y },
      ),
      members: [only],
      supports: structure.supports.filter(({ point }) => own.has(point)),
      hinges: [],
      groups: [],
      loads: [],
    },
    solution: { ...solution, movements, members: [field] },
  };
}

function ends({ members }: Structure): number[] {
  return [...new Set(members.flatMap(({ legs }) => legs.flatMap(({ from, to }) => [from, to])))];
}
