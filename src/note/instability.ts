// An unstable structure in words: which points can move, which way, whether all of it or a part, and what would hold it.
import type { Diagnostic } from '../language/diagnostic.ts';
import type { Analysis, Mechanism } from '../mechanics/solution.ts';
import type { Structure } from '../model/structure.ts';

/** One diagnostic, at the structure's own line; the points that move are its related places. */
export function describeInstability(structure: Structure, { stability }: Analysis): Diagnostic[] {
  const { mechanisms } = stability;
  const [first] = mechanisms;
  if (first === undefined) return [];
  const sentences = mechanisms.slice(0, MOST_TOLD).map(mechanism => describe(structure, mechanism));
  const more = mechanisms.length > MOST_TOLD ? ` There are ${mechanisms.length} ways to move in all.` : '';
  const hint = mechanisms.length === 1 ? remedy(structure, first) : `${mechanisms.length} more restraints are needed`;
  const related = first.points.slice(0, MOST_TOLD).map(index => {
    const point = structure.points[index]!;
    return { range: point.range, message: `${point.name} can move ${direction(movementOf(first, index))}.` };
  });
  return [
    {
      code: 'unstable-structure',
      severity: 'error',
      range: structure.range,
      message: sentences.join(' ') + more,
      hint,
      related,
    },
  ];
}

const MOST_TOLD = 3;
const MOST_NAMED = 6;

interface Movement {
  readonly x: number;
  readonly y: number;
}

function movementOf(mechanism: Mechanism, point: number): Movement {
  const sign = signOf(mechanism);
  return { x: sign * mechanism.movements[2 * point]!, y: sign * mechanism.movements[2 * point + 1]! };
}

/** A mechanism runs both ways; it is told as the one in which most moves to the right, or else up. */
function signOf({ movements }: Mechanism): 1 | -1 {
  let [right, up] = [0, 0];
  for (let i = 0; i < movements.length; i += 2) {
    right += movements[i]!;
    up += movements[i + 1]!;
  }
  const leading = Math.abs(right) >= 0.1 * Math.abs(up) ? right : up;
  return leading < 0 ? -1 : 1;
}

function describe(structure: Structure, mechanism: Mechanism): string {
  if (mechanism.points.length === 0) return describeTurning(structure, mechanism);
  const all = mechanism.kind === 'rigid-body';
  const whole = mechanism.points.length + mechanism.turning.length >= structure.points.length;
  const what = all && whole ? 'this structure' : membersNamed(structure, mechanism);
  const ways = new Set(mechanism.points.map(point => direction(movementOf(mechanism, point))));
  const [way] = ways;
  const names = pointsNamed(structure, mechanism.points);
  const many = mechanism.points.length > 1;
  if (all && isTranslation(structure, mechanism)) {
    return `Nothing holds ${what} ${isLevel(movementOf(mechanism, mechanism.points[0]!)) ? 'sideways' : 'that way'}: ${names} can move ${way}${many ? ' together' : ''}.`;
  }
  if (all) {
    const centre = centreOf(structure, mechanism);
    return `Nothing stops ${what} from turning${centre === undefined ? '' : ` about ${centre}`}: ${names} can move.`;
  }
  if (ways.size === 1)
    return `${names} can move ${way}${many ? ' together' : ''}: nothing holds this part, a mechanism of ${what}.`;
  const each = mechanism.points
    .slice(0, MOST_NAMED)
    .map(point => `${structure.points[point]!.name} ${direction(movementOf(mechanism, point))}`);
  return `A part of the structure is a mechanism: ${list(each)} can move at once.`;
}

function describeTurning(structure: Structure, { turning, members }: Mechanism): string {
  const names = pointsNamed(structure, turning);
  const what =
    members.length > 0
      ? `${list(members.map(index => structure.members[index]!.name))} can turn in place`
      : `the joint at ${names} can turn`;
  return `Nothing holds the rotation at ${names}: ${what}.`;
}

/** What removes the only mechanism: any restraint with a part in its movement does. */
function remedy(structure: Structure, mechanism: Mechanism): string {
  const moving = new Set(mechanism.points);
  const roller = structure.supports.find(({ point, symbol }) => moving.has(point) && symbol.kind === 'roller');
  if (roller !== undefined) return `make ${structure.points[roller.point]!.name} pinned`;
  const [largest] = [...mechanism.points].sort((a, b) => sizeOf(mechanism, b) - sizeOf(mechanism, a));
  const pinned = structure.supports.find(({ point, symbol }) => symbol.kind === 'pinned' && !moving.has(point));
  if (mechanism.kind === 'rigid-body' && pinned !== undefined && structure.supports.length === 1) {
    return `make ${structure.points[pinned.point]!.name} fixed, or support another point`;
  }
  if (largest === undefined) return 'hold the rotation there, or take a hinge out';
  const name = structure.points[largest]!.name;
  return `hold ${name} so that it cannot move ${direction(movementOf(mechanism, largest))}${mechanism.kind === 'mechanism' ? ', take a hinge out, or brace the part' : ''}`;
}

function sizeOf({ movements }: Mechanism, point: number): number {
  return Math.hypot(movements[2 * point]!, movements[2 * point + 1]!);
}

/** Whether every point of the members that move does so by the same amount. */
function isTranslation(structure: Structure, mechanism: Mechanism): boolean {
  const first = movementOf(mechanism, mechanism.points[0]!);
  const body = mechanism.members.flatMap(index => structure.members[index]!.legs.flatMap(({ from, to }) => [from, to]));
  return [...mechanism.points, ...body].every(point => {
    const { x, y } = movementOf(mechanism, point);
    return Math.hypot(x - first.x, y - first.y) < 1e-6;
  });
}

/** The point about which a rigid body turns: a named one where it stands there, else its place. */
function centreOf(structure: Structure, mechanism: Mechanism): string | undefined {
  const still = structure.points.findIndex((_, index) => sizeOf(mechanism, index) < 1e-9);
  if (still >= 0 && !mechanism.points.includes(still)) return structure.points[still]!.name;
  const [a, b] = mechanism.points.map(index => ({ point: structure.points[index]!, ...movementOf(mechanism, index) }));
  if (a === undefined || b === undefined) return undefined;
  const [dx, dy] = [b.point.x - a.point.x, b.point.y - a.point.y];
  const angle = (dx * (b.y - a.y) - dy * (b.x - a.x)) / (dx * dx + dy * dy);
  if (Math.abs(angle) < 1e-9) return undefined;
  const [x, y] = [a.point.x - a.y / angle, a.point.y + a.x / angle];
  return `a place at ${Number(x.toPrecision(4))} m, ${Number(y.toPrecision(4))} m`;
}

function isLevel({ x, y }: Movement): boolean {
  return Math.abs(y) <= 1e-6 * Math.abs(x);
}

function direction({ x, y }: Movement): string {
  const size = Math.hypot(x, y);
  const across = Math.abs(x) > 0.02 * size ? (x > 0 ? 'to the right' : 'to the left') : '';
  const upright = Math.abs(y) > 0.02 * size ? (y > 0 ? 'up' : 'down') : '';
  return across !== '' && upright !== '' ? `${across} and ${upright}` : across + upright;
}

function membersNamed(structure: Structure, { members }: Mechanism): string {
  return members.length === 0 ? 'this part' : list(shorten(members.map(index => structure.members[index]!.name)));
}

function pointsNamed(structure: Structure, points: readonly number[]): string {
  return list(shorten(points.map(index => structure.points[index]!.name)));
}

function shorten(names: readonly string[]): readonly string[] {
  return names.length <= MOST_NAMED
    ? names
    : [...names.slice(0, MOST_NAMED - 1), `${names.length - MOST_NAMED + 1} more`];
}

export function list(words: readonly string[]): string {
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}
