// The drawing-office symbols of supports: a triangle for a pin, wheels under it for a roller, a hatched wall for a fixed
// end, a coil for a spring. Each is drawn pointing down and then turned away from the members it holds.
import type { Structure, Support } from '../model/structure.ts';
import { leftOf, px, type Spot } from './geometry.ts';
import type { LineRole } from './ink.ts';
import type { Sheet } from './sheet.ts';

/** px below the point that a support standing upright takes, hatch included. */
const SUPPORT_DEPTH = 22;

/** What a support amounts to; `held` in any other way is told by what it holds. */
type Form = 'pin' | 'roller' | 'wall' | 'guide' | 'clamp' | 'none';

/** `away`: unit vectors on the sheet in which members leave the point. */
export function drawSupport(sheet: Sheet, support: Support, at: Spot, away: readonly Spot[], size = 1): void {
  const { form, ground } = formOf(support, away);
  if (form !== 'none') group(sheet, at, turnTo(ground), size, FORMS[form](sheet));
  for (const spring of support.symbol.springs) {
    if (spring === 'rotation') group(sheet, at, 0, size, [stroke(sheet, 'spring', SPIRAL)]);
    else {
      const down = spring === 'y' ? DOWN : level(away);
      group(sheet, at, turnTo(clear(down, away)), size, [stroke(sheet, 'spring', COIL), ...earth(sheet, 23.8)]);
    }
  }
  const coils = support.symbol.springs.length > 0 ? 30 : SUPPORT_DEPTH;
  const up = ground.y < -0.5 ? coils : 13;
  sheet.reach(at.y - up * size, at.y + (ground.y > -0.5 ? coils : 8) * size);
  if (form !== 'none' || support.symbol.springs.length > 0) obstruct(sheet, at, ground, size);
}

/** Unit vectors on the sheet in which the members at a point leave it. */
export function waysFrom(structure: Structure, point: number, spotOf: (point: number) => Spot): Spot[] {
  const ways: Spot[] = [];
  const here = spotOf(point);
  for (const { legs } of structure.members) {
    for (const { from, to } of legs) {
      if (from !== point && to !== point) continue;
      const other = spotOf(from === point ? to : from);
      const length = Math.hypot(other.x - here.x, other.y - here.y);
      if (length > 0) ways.push({ x: (other.x - here.x) / length, y: (other.y - here.y) / length });
    }
  }
  return ways;
}

const DOWN: Spot = { x: 0, y: 1 };

/** `ground`: the way from the point to what holds it, on the sheet. */
function formOf(support: Support, away: readonly Spot[]): { readonly form: Form; readonly ground: Spot } {
  const { kind, angle } = support.symbol;
  switch (kind) {
    case 'pinned':
      return { form: 'pin', ground: clear(DOWN, away) };
    case 'roller':
      return { form: 'roller', ground: clear({ x: Math.sin(angle), y: Math.cos(angle) }, away) };
    case 'fixed':
      return { form: 'wall', ground: against(away) };
    case 'guided':
      return { form: 'guide', ground: level(away) };
    case 'held':
      return heldForm(support, away);
  }
}

function heldForm(support: Support, away: readonly Spot[]): { readonly form: Form; readonly ground: Spot } {
  let [x, y, rotation] = [false, false, false];
  for (const { freedom, stiffness } of support.restraints) {
    if (stiffness !== Infinity) continue;
    if (freedom.kind === 'rotation') rotation = true;
    else if (Math.abs(freedom.x) > Math.abs(freedom.y)) x = true;
    else y = true;
  }
  if (x && y) return rotation ? { form: 'wall', ground: against(away) } : { form: 'pin', ground: clear(DOWN, away) };
  const ground = x ? level(away) : clear(DOWN, away);
  if (x || y) return { form: rotation ? 'guide' : 'roller', ground };
  return { form: rotation ? 'clamp' : 'none', ground };
}

/** The ground turns to the other side where a member runs into it and none runs the other way. */
function clear(ground: Spot, away: readonly Spot[]): Spot {
  const into = Math.max(0, ...away.map(way => way.x * ground.x + way.y * ground.y));
  const opposite = Math.max(0, ...away.map(way => -way.x * ground.x - way.y * ground.y));
  return into > 0.7 && opposite < 0.5 ? { x: -ground.x, y: -ground.y } : ground;
}

function against(away: readonly Spot[]): Spot {
  const x = away.reduce((sum, way) => sum + way.x, 0);
  const y = away.reduce((sum, way) => sum + way.y, 0);
  const length = Math.hypot(x, y);
  return length < 1e-6 ? DOWN : { x: -x / length, y: -y / length };
}

function level(away: readonly Spot[]): Spot {
  return { x: away.reduce((sum, way) => sum + way.x, 0) < -1e-9 ? 1 : -1, y: 0 };
}

/** SVG's clockwise degrees that turn straight down into the ground's direction. */
function turnTo(ground: Spot): number {
  const turn = (Math.atan2(-ground.x, ground.y) * 180) / Math.PI;
  return Object.is(turn, -0) ? 0 : turn;
}

const FORMS: Readonly<Record<Exclude<Form, 'none'>, (sheet: Sheet) => string[]>> = {
  pin: sheet => [stroke(sheet, 'support', 'M0 1.5L-7.5 14H7.5Z'), ...earth(sheet, 14)],
  roller: sheet => [
    stroke(sheet, 'support', 'M0 1.5L-7 11.5H7Z'),
    wheel(sheet, -4, 14.1),
    wheel(sheet, 4, 14.1),
    ...earth(sheet, 16.8),
  ],
  wall: sheet => earth(sheet, 0, 13),
  guide: sheet => [
    stroke(sheet, 'support', 'M-10 0H10'),
    wheel(sheet, -5.5, 3.2),
    wheel(sheet, 5.5, 3.2),
    ...earth(sheet, 6, 13),
  ],
  clamp: sheet => [stroke(sheet, 'support', 'M-5 -5H5V5H-5Z')],
};

/** The ground line at a depth, hatched under it. */
function earth(sheet: Sheet, depth: number, half = 12): string[] {
  const strokes: string[] = [];
  for (let x = -half + 4; x <= half; x += 5) strokes.push(`M${x} ${depth}l-4 5`);
  return [stroke(sheet, 'support', `M${-half} ${depth}H${half}`), stroke(sheet, 'hatch', strokes.join(''))];
}

function wheel(sheet: Sheet, x: number, y: number): string {
  return `<circle ${sheet.ink.line('support')} cx="${x}" cy="${y}" r="2.2"/>`;
}

function stroke(sheet: Sheet, role: LineRole, d: string): string {
  return `<path ${sheet.ink.line(role)} d="${d}"/>`;
}

function group(sheet: Sheet, at: Spot, turn: number, size: number, parts: readonly string[]): void {
  const turned = turn === 0 ? '' : ` rotate(${px(turn)})`;
  const scaled = size === 1 ? '' : ` scale(${size})`;
  sheet.markup(`<g transform="translate(${px(at.x)} ${px(at.y)})${turned}${scaled}">${parts.join('')}</g>`, 'symbol');
}

/** Keeps labels off the symbol. */
function obstruct(sheet: Sheet, at: Spot, ground: Spot, size: number): void {
  const across = leftOf(ground);
  for (const [depth, half] of [
    [8, 6],
    [16, 12],
  ] as const) {
    const middle = { x: at.x + ground.x * depth * size, y: at.y + ground.y * depth * size };
    sheet.obstacles.push([
      { x: middle.x - across.x * half * size, y: middle.y - across.y * half * size },
      { x: middle.x + across.x * half * size, y: middle.y + across.y * half * size },
    ]);
  }
}

/** Three turns, from the point down to the ground at 23.8. */
const COIL = coil();
/** Under two turns about the point. */
const SPIRAL = 'M3 0A3.5 3.5 0 0 1-4 0A5 5 0 0 1 6 0A7 7 0 0 1-8 0';

function coil(): string {
  const steps = 24;
  let d = 'M0 1V3.5';
  for (let i = 1; i <= steps; i++) {
    const turn = (i / steps) * 6 * Math.PI;
    const x = 7.5 * Math.sin(turn);
    const y = 3.5 + (16.8 * i) / steps + 1.7 * (1 - Math.cos(turn));
    d += `L${x.toFixed(1)} ${y.toFixed(1)}`;
  }
  return `${d}V23.8`;
}
