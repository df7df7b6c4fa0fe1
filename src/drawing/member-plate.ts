// One field of one member, set level from its first point to its last: what a writer asks to be shown.
import type { Solution } from '../mechanics/solution.ts';
import type { Leg, Structure } from '../model/structure.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { type Acting, SHEET_WIDTH } from './acting.ts';
import { BETWEEN, drawBeamField } from './beam-fields.ts';
import { drawBones } from './bones.ts';
import { drawLevelDimensions } from './dimensions.ts';
import { drawEnvelope, type Envelope } from './envelope.ts';
import { FIELD_STYLES, type FieldName } from './field-curves.ts';
import type { Palette } from './ink.ts';
import { placeLabels } from './placing.ts';
import { largestSize } from './readings.ts';
import { Sheet } from './sheet.ts';
import { drawnLeg, type View, viewAt } from './view.ts';
import { plain, pointName } from './words.ts';

export interface MemberPlate {
  /** Index into the structure's members. */
  readonly member: number;
  readonly field: FieldName;
  /** One strip each, but for an envelope. Only those with a solution are drawn. */
  readonly acting: readonly Acting[];
  /** Undefined: no envelope, one strip an alternative. */
  readonly envelope: Envelope | undefined;
}

const LEFT = 96.5;
const RIGHT = 39;

export function memberPlate(
  structure: Structure,
  { member, field, acting, envelope }: MemberPlate,
  units: DisplayUnits,
  palette: Palette = 'page',
): string {
  const sheet = new Sheet(SHEET_WIDTH, palette);
  const straight = straightened(structure, member);
  const length = straight.members[0]?.length ?? 1;
  const view = viewAt(straight, (SHEET_WIDTH - LEFT - RIGHT) / length, LEFT, 0);
  drawBones(sheet, straight, view);
  drawNames(sheet, straight, view);
  let top = drawFoot(sheet, straight, view, units) + BETWEEN;
  const solved = acting.flatMap(one => {
    const own = one.solution === undefined ? undefined : onlyMember(one.solution, member);
    return own === undefined ? [] : [{ acting: one, solution: own }];
  });
  if (envelope === undefined) {
    for (const { acting: one, solution } of solved) {
      if (largestSize(solution.members, FIELD_STYLES[field].quantity) === 0) continue;
      top = drawBeamField(sheet, straight, solution, field, { view, units, name: one.name, top }).bottom + BETWEEN;
    }
  } else {
    top = drawEnvelope(sheet, envelope, field, {
      legsAt: axis => {
        const onAxis = viewAt(straight, view.scale, LEFT, axis);
        return (straight.members[0]?.legs ?? []).map(leg => drawnLeg(0, leg, onAxis));
      },
      from: straight.points[0]?.name ?? '',
      units,
      pxPerMetre: view.scale,
      top,
    });
  }
  sheet.reach(top);
  return sheet.svg(`${field} in ${straight.members[0]?.name ?? ''} of ${structure.title ?? structure.name}`);
}

/** The member alone, its chain pulled straight and level. Its points are its own, in order. */
function straightened(structure: Structure, index: number): Structure {
  const member = structure.members[index];
  if (member === undefined) throw new Error(`member ${index} of ${structure.members.length}`);
  const chain = [member.legs[0]?.from ?? 0, ...member.legs.map(({ to }) => to)];
  const distances = [0, ...member.legs.map(({ start, length }) => start + length)];
  const points = chain.map((point, i) => ({
    name: structure.points[point]?.name ?? '',
    x: distances[i] ?? 0,
    y: 0,
    range: member.range,
  }));
  const legs = member.legs.map((leg, i): Leg => ({ ...leg, from: i, to: i + 1, cosine: 1, sine: 0 }));
  return {
    ...structure,
    points,
    members: [{ ...member, legs }],
    groups: [],
    hinges: [],
    supports: [],
    cases: [],
    loads: [],
  };
}

function onlyMember(solution: Solution, member: number): Solution | undefined {
  const field = solution.members[member];
  return field === undefined ? undefined : { ...solution, members: [field] };
}

function drawNames(sheet: Sheet, { points, members }: Structure, view: View): void {
  const name = members[0]?.name ?? '';
  placeLabels(sheet, [
    ...points.map((point, i) => ({
      labels: [[pointName(point.name)]],
      places: [{ at: { x: view.point(i).x, y: -8 }, anchor: 'middle' as const }],
      role: 'ink' as const,
      rank: 2,
      optional: true,
    })),
    {
      labels: [plain(name)],
      places: [{ at: { x: (LEFT + SHEET_WIDTH - RIGHT) / 2, y: 21 }, anchor: 'middle' as const }],
      role: 'ink' as const,
      rank: 1,
    },
  ]);
}

function drawFoot(sheet: Sheet, { points }: Structure, view: View, units: DisplayUnits): number {
  const line = 44.5;
  const marks = points.map(({ x }, i) => ({ at: view.point(i).x, value: x }));
  drawLevelDimensions(sheet, marks, { line, from: () => line - 12, unit: units.length });
  return line + 6;
}
