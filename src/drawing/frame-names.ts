// Names on a frame's drawing: points in italic beside their joints, members along their longest leg.
import type { Structure } from '../model/structure.ts';
import { between, moved } from './geometry.ts';
import type { LabelRequest, Place } from './placing.ts';
import { type DrawnLeg, drawnLeg, type View } from './view.ts';
import { plain, pointName } from './words.ts';

export function pointNames(structure: Structure, view: View, points: readonly number[]): LabelRequest[] {
  const crowded = points.length > 24;
  const held = new Set(structure.supports.map(({ point }) => point));
  return points.map(index => {
    const { x, y } = view.point(index);
    const besideSupport: Place[] = [
      { at: { x: x + 17, y: y + 12 }, anchor: 'start' },
      { at: { x: x - 17, y: y + 12 }, anchor: 'end' },
    ];
    const places: Place[] = [
      ...(held.has(index) ? besideSupport : []),
      { at: { x: x + 9, y: y + 14 }, anchor: 'start' },
      { at: { x: x - 9, y: y + 14 }, anchor: 'end' },
      { at: { x: x - 9, y: y - 5 }, anchor: 'end' },
      { at: { x: x + 9, y: y - 5 }, anchor: 'start' },
      { at: { x: x + 11, y: y + 4 }, anchor: 'start' },
      { at: { x: x - 11, y: y + 4 }, anchor: 'end' },
      { at: { x, y: y + 19 }, anchor: 'middle' },
      { at: { x, y: y - 10 }, anchor: 'middle' },
    ];
    const name = structure.points[index]?.name ?? '';
    return { labels: [[pointName(name)]], places, role: 'ink' as const, rank: 80, optional: crowded };
  });
}

export function memberNames(structure: Structure, view: View): LabelRequest[] {
  const crowded = structure.members.length > 16;
  return structure.members.flatMap((member, index) => {
    const longest = [...member.legs].sort((a, b) => b.length - a.length)[0];
    if (longest === undefined) return [];
    const leg = drawnLeg(index, longest, view);
    const size = member.kind === 'bar' || crowded ? (11 as const) : (12 as const);
    return [
      {
        labels: [plain(member.name)],
        places:
          crowded && member.kind === 'bar' ? [...placesOnLine(leg), ...placesAlong(leg, 11)] : placesAlong(leg, 14),
        role: 'ink' as const,
        size,
        rank: 40,
        optional: crowded,
      },
    ];
  });
}

/** Along a leg, under it and over it; beside it where it stands steeply. `off`: px from the axis to the middle of the words. */
export function placesAlong(leg: DrawnLeg, off: number): Place[] {
  const turn = readable((Math.atan2(leg.along.y, leg.along.x) * 180) / Math.PI);
  const isSteep = Math.abs(turn) > 60;
  return [0.5, 0.38, 0.62, 0.28, 0.72].flatMap(share => {
    const middle = between(leg.from, leg.to, share);
    return [-1, 1].map((side): Place => {
      const at = moved(middle, leg.left, side * off);
      if (isSteep) {
        const isRight = at.x > middle.x;
        return {
          at: { x: middle.x + (isRight ? off - 4 : 4 - off), y: middle.y + 4 },
          anchor: isRight ? 'start' : 'end',
        };
      }
      // The baseline lies 4 px below the middle of the words, square to them.
      const radians = (turn * Math.PI) / 180;
      return { at: { x: at.x - Math.sin(radians) * 4, y: at.y + Math.cos(radians) * 4 }, anchor: 'middle', turn };
    });
  });
}

/** On the line itself, which the words' rim interrupts. */
function placesOnLine(leg: DrawnLeg): Place[] {
  return [0.5, 0.36, 0.64].map((share): Place => {
    const { x, y } = between(leg.from, leg.to, share);
    return { at: { x, y: y + 4 }, anchor: 'middle', onLine: true };
  });
}

/** Never upside down, and upright words read from the right: −90 to just under 90 degrees. Less than half a degree is level. */
export function readable(turn: number): number {
  const upright = turn > 89.5 ? turn - 180 : turn <= -90.5 ? turn + 180 : turn;
  return Math.abs(upright) < 0.5 ? 0 : upright;
}
