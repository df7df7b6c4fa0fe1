// How something can move, in words: which points, which way, as one body or as a part, and what in the structure lets it.
import { findPanel, type Mechanism } from '../mechanics/index.ts';
import type { Structure } from '../model/structure.ts';

export function describeMechanism(structure: Structure, mechanism: Mechanism): string {
  if (mechanism.points.length === 0) return describeTurning(structure, mechanism);
  return mechanism.kind === 'rigid-body' ? describeBody(structure, mechanism) : describePart(structure, mechanism);
}

const MOST_NAMED = 6;

export interface Movement {
  readonly x: number;
  readonly y: number;
}

/** A mechanism runs both ways; it is told as the one in which most moves to the right, or else up. */
export function movementOf(mechanism: Mechanism, point: number): Movement {
  const sign = signOf(mechanism);
  return { x: sign * mechanism.movements[2 * point]!, y: sign * mechanism.movements[2 * point + 1]! };
}

export function direction({ x, y }: Movement): string {
  const size = Math.hypot(x, y);
  const across = Math.abs(x) > 0.02 * size ? (x > 0 ? 'to the right' : 'to the left') : '';
  const upright = Math.abs(y) > 0.02 * size ? (y > 0 ? 'up' : 'down') : '';
  return across !== '' && upright !== '' ? `${across} and ${upright}` : across + upright;
}

/** `A, B and C can move to the right together`, `B down and C to the right can move at once`. */
export function pointsInMotion(structure: Structure, mechanism: Mechanism, points = mechanism.points): string {
  const ways = new Set(points.map(point => direction(movementOf(mechanism, point))));
  const [way] = ways;
  if (ways.size === 1)
    return `${pointsNamed(structure, points)} can move ${way}${points.length > 1 ? ' together' : ''}`;
  const each = points
    .slice(0, MOST_NAMED)
    .map(point => `${structure.points[point]!.name} ${direction(movementOf(mechanism, point))}`);
  return `${list(each)} can move at once`;
}

export function pointsNamed(structure: Structure, points: readonly number[]): string {
  return list(shorten(points.map(index => structure.points[index]!.name)));
}

export function list(words: readonly string[]): string {
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}

function signOf({ movements }: Mechanism): 1 | -1 {
  let [right, up] = [0, 0];
  for (let i = 0; i < movements.length; i += 2) {
    right += movements[i]!;
    up += movements[i + 1]!;
  }
  const leading = Math.abs(right) >= 0.1 * Math.abs(up) ? right : up;
  return leading < 0 ? -1 : 1;
}

function describeTurning(structure: Structure, { turning, members }: Mechanism): string {
  const names = pointsNamed(structure, turning);
  const what =
    members.length > 0
      ? `${list(shorten(members.map(index => structure.members[index]!.name)))} can turn in place`
      : `the joint at ${names} can turn`;
  return `Nothing holds the rotation at ${names}: ${what}.`;
}

// A body that moves as one

function describeBody(structure: Structure, mechanism: Mechanism): string {
  const whole = mechanism.points.length + mechanism.turning.length >= structure.points.length;
  const what = whole ? 'this structure' : membersNamed(structure, mechanism);
  const held = supportsOf(structure, mechanism);
  const moves = pointsInMotion(structure, mechanism);
  if (held.length === 0) return `Nothing holds ${what}: it has no support.`;
  if (isTranslation(structure, mechanism)) {
    const way = isLevel(movementOf(mechanism, mechanism.points[0]!)) ? 'sideways' : 'that way';
    const names = held.map(index => structure.points[structure.supports[index]!.point]!.name);
    const roll = held.every(index => structure.supports[index]!.symbol.kind === 'roller');
    const lets = roll ? `${all(names)} ${names.length === 1 ? 'only rolls' : 'roll'}. ` : '';
    return lets === ''
      ? `Nothing holds ${what} ${way}: ${moves}.`
      : `Nothing holds ${what} ${way}: ${lets}${capital(moves)}.`;
  }
  const still = held.filter(index => sizeOf(mechanism, structure.supports[index]!.point) === 0);
  const [pivot] = still;
  if (pivot !== undefined) {
    const { name } = structure.points[structure.supports[pivot]!.point]!;
    return held.length === 1
      ? `Nothing stops ${what} from turning about ${name}, its only support: ${moves}.`
      : `Nothing stops ${what} from turning about ${name}: ${moves}.`;
  }
  const centre = centreOf(structure, mechanism);
  const names = held.map(index => structure.points[structure.supports[index]!.point]!.name);
  if (centre === undefined) return `Nothing stops ${what} from turning: ${moves}.`;
  return `Nothing stops ${what} from turning about ${centre}: the ${names.length === 1 ? 'reaction' : 'reactions'} at ${list(names)} ${names.length === 1 ? 'passes' : names.length === 2 ? 'both pass' : 'all pass'} through it. ${capital(moves)}.`;
}

/** Supports of the points that move or turn in it, as indices. */
function supportsOf(structure: Structure, { points, turning, members }: Mechanism): readonly number[] {
  const reached = new Set([...points, ...turning]);
  for (const member of members) for (const { from, to } of structure.members[member]!.legs) reached.add(from).add(to);
  return structure.supports.flatMap(({ point }, index) => (reached.has(point) ? [index] : []));
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
  const [a, b] = mechanism.points.map(index => ({ point: structure.points[index]!, ...movementOf(mechanism, index) }));
  if (a === undefined || b === undefined) return undefined;
  const [dx, dy] = [b.point.x - a.point.x, b.point.y - a.point.y];
  const angle = (dx * (b.y - a.y) - dy * (b.x - a.x)) / (dx * dx + dy * dy);
  if (Math.abs(angle) < 1e-9) return undefined;
  const [x, y] = [a.point.x - a.y / angle, a.point.y + a.x / angle];
  const size = Math.hypot(dx, dy);
  const named = structure.points.find(point => Math.hypot(point.x - x, point.y - y) < 1e-6 * size);
  if (named !== undefined) return named.name;
  const metres = (value: number) => (Math.abs(value) < 1e-9 * size ? 0 : Number(value.toPrecision(4)));
  return `a place at ${metres(x)} m, ${metres(y)} m`;
}

// Parts that move against each other

function describePart(structure: Structure, mechanism: Mechanism): string {
  const moves = pointsInMotion(structure, mechanism);
  const line = straightLine(structure, mechanism);
  if (line !== undefined) {
    const names = line.points.map(index => structure.points[index]!.name);
    const across = pointsNamed(structure, mechanism.points);
    const until = line.held ? ' until it has moved' : '';
    return `${moves}: ${list(shorten(names))} stand in one line and turn freely there, so that nothing holds ${across} across it${until}.`;
  }
  const panel = findPanel(structure, mechanism);
  if (panel !== undefined) {
    const names = panel.map(index => structure.points[index]!.name);
    return `${moves}: nothing braces the panel ${names.join('–')}.`;
  }
  return `${moves}: nothing holds this part, a mechanism of ${membersNamed(structure, mechanism)}.`;
}

/**
 * Where all that moves goes at right angles to its legs and these lie in one line: the points on it, in order, and whether
 * both its ends are held along it, so that the line would stiffen as it bends.
 */
function straightLine(
  structure: Structure,
  mechanism: Mechanism,
): { readonly points: readonly number[]; readonly held: boolean } | undefined {
  const moving = new Set(mechanism.points);
  const legs = structure.members.flatMap(member =>
    member.legs.filter(({ from, to }) => moving.has(from) || moving.has(to)),
  );
  const [first] = legs;
  if (first === undefined) return undefined;
  const origin = structure.points[first.from]!;
  const points = [...new Set(legs.flatMap(({ from, to }) => [from, to]))];
  const size = Math.max(...legs.map(({ length }) => length));
  const along = (index: number) => {
    const { x, y } = structure.points[index]!;
    return (x - origin.x) * first.cosine + (y - origin.y) * first.sine;
  };
  const straight = points.every(index => {
    const { x, y } = structure.points[index]!;
    const across = (y - origin.y) * first.cosine - (x - origin.x) * first.sine;
    const { x: dx, y: dy } = movementOf(mechanism, index);
    return Math.abs(across) < 1e-6 * size && Math.abs(dx * first.cosine + dy * first.sine) < 1e-6;
  });
  if (!straight || points.length < 3) return undefined;
  points.sort((a, b) => along(a) - along(b));
  const ends = [points[0]!, points.at(-1)!];
  // The line is told left to right, or upwards.
  if (first.cosine < -1e-9 || (Math.abs(first.cosine) <= 1e-9 && first.sine < 0)) points.reverse();
  const isHeld = (point: number) =>
    structure.supports.some(
      support =>
        support.point === point &&
        support.restraints.some(
          ({ freedom }) =>
            freedom.kind === 'movement' && Math.abs(freedom.x * first.cosine + freedom.y * first.sine) > 1e-6,
        ),
    );
  return { points, held: ends.every(isHeld) };
}

function sizeOf({ movements }: Mechanism, point: number): number {
  return Math.hypot(movements[2 * point]!, movements[2 * point + 1]!);
}

function isLevel({ x, y }: Movement): boolean {
  return Math.abs(y) <= 1e-6 * Math.abs(x);
}

function membersNamed(structure: Structure, { members }: Mechanism): string {
  return members.length === 0 ? 'this part' : list(shorten(members.map(index => structure.members[index]!.name)));
}

function shorten(names: readonly string[]): readonly string[] {
  return names.length <= MOST_NAMED
    ? names
    : [...names.slice(0, MOST_NAMED - 1), `${names.length - MOST_NAMED + 1} more`];
}

/** `A`, `A and B both`, `A, B and C all`. */
function all(names: readonly string[]): string {
  return `${list(shorten(names))}${names.length === 1 ? '' : names.length === 2 ? ' both' : ' all'}`;
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
