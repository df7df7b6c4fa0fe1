// Panels that a mechanism skews: four points joined in a ring, legs or the ground between them, without a diagonal. They
// say what is not braced, and where a brace would go.

import type { Structure } from '../model/structure.ts';
import type { Mechanism } from './solution.ts';

export interface Brace {
  readonly from: number;
  readonly to: number;
}

/** Points in the order of the ring. */
export type Panel = readonly [a: number, b: number, c: number, d: number];

/** The first panel that the mechanism skews, its diagonals changing their lengths; undefined where there is none. */
export function findPanel(structure: Structure, mechanism: Mechanism): Panel | undefined {
  return panelsOf(structure, mechanism, 1)[0];
}

/** Bars that would resist the mechanism: diagonals of the panels that it skews, then stays to a neighbour's neighbour. */
export function findBraces(structure: Structure, mechanism: Mechanism): readonly Brace[] {
  const joined = neighbours(structure);
  const braces: Brace[] = [];
  const told = new Set<string>();
  const add = (p: number, q: number) => {
    const [from, to] = p < q ? [p, q] : [q, p];
    if (told.has(`${from} ${to}`) || joined[from]!.has(to)) return;
    if (isBlocked(structure, from, to) || Math.abs(lengthening(structure, mechanism, from, to)) <= SKEWED) return;
    told.add(`${from} ${to}`);
    braces.push({ from, to });
  };
  for (const [a, b, c, d] of panelsOf(structure, mechanism, MOST_PANELS)) {
    add(a, c);
    add(b, d);
  }
  for (const p of mechanism.points) {
    for (const q of joined[p]!) for (const r of joined[q]!) if (r !== p && braces.length < MOST_BRACES) add(p, r);
  }
  return braces;
}

const MOST_PANELS = 2;
const MOST_BRACES = 6;

/** Lengthening for a largest movement of 1 that counts: less hardly resists. */
const SKEWED = 0.05;

/** Level or upright panels first among equals come of themselves, as points are looked at in order. */
function panelsOf(structure: Structure, mechanism: Mechanism, most: number): Panel[] {
  const joined = withGround(structure, neighbours(structure));
  const panels: Panel[] = [];
  for (const a of mechanism.points) {
    for (const b of joined[a]!) {
      for (const c of joined[b]!) {
        if (c === a || joined[a]!.has(c)) continue;
        for (const d of joined[c]!) {
          if (d === b || d === a || !joined[a]!.has(d) || joined[b]!.has(d)) continue;
          if (panels.some(panel => [a, b, c, d].every(point => panel.includes(point)))) continue;
          if (!isConvex(structure, [a, b, c, d])) continue;
          const skew = Math.max(
            Math.abs(lengthening(structure, mechanism, a, c)),
            Math.abs(lengthening(structure, mechanism, b, d)),
          );
          if (skew <= SKEWED) continue;
          panels.push([a, b, c, d]);
          if (panels.length === most) return panels;
        }
      }
    }
  }
  return panels;
}

function neighbours({ points, members }: Structure): Set<number>[] {
  const joined = points.map(() => new Set<number>());
  for (const { legs } of members) {
    for (const { from, to } of legs) {
      joined[from]!.add(to);
      joined[to]!.add(from);
    }
  }
  return joined;
}

/** The ground joins points that it holds in both directions. */
function withGround({ supports }: Structure, joined: readonly Set<number>[]): readonly Set<number>[] {
  const held = supports.filter(({ restraints }) => holdsBothWays(restraints)).map(({ point }) => point);
  const all = joined.map(set => new Set(set));
  for (const p of held) for (const q of held) if (p !== q) all[p]!.add(q);
  return all;
}

function holdsBothWays(restraints: Structure['supports'][number]['restraints']): boolean {
  const ways = restraints.flatMap(({ freedom }) => (freedom.kind === 'movement' ? [freedom] : []));
  return ways.some(a => ways.some(b => Math.abs(a.x * b.y - a.y * b.x) > 1e-6));
}

function lengthening({ points }: Structure, { movements }: Mechanism, p: number, q: number): number {
  const [x, y] = [points[q]!.x - points[p]!.x, points[q]!.y - points[p]!.y];
  const length = Math.hypot(x, y);
  const along = (movements[2 * q]! - movements[2 * p]!) * x + (movements[2 * q + 1]! - movements[2 * p + 1]!) * y;
  return length === 0 ? 0 : along / length;
}

/** Four corners that turn the same way, none of them straight. */
function isConvex({ points }: Structure, panel: Panel): boolean {
  const turns = panel.map((_, k) => {
    const [p, q, r] = [0, 1, 2].map(step => points[panel[(k + step) % 4]!]!);
    const [ux, uy, vx, vy] = [q!.x - p!.x, q!.y - p!.y, r!.x - q!.x, r!.y - q!.y];
    return (ux * vy - uy * vx) / (Math.hypot(ux, uy) * Math.hypot(vx, vy));
  });
  return turns.every(turn => turn > 0.05) || turns.every(turn => turn < -0.05);
}

/** Whether another point stands on the straight line between the two. */
function isBlocked({ points }: Structure, p: number, q: number): boolean {
  const [a, b] = [points[p]!, points[q]!];
  const [x, y] = [b.x - a.x, b.y - a.y];
  const square = x * x + y * y;
  return points.some((point, index) => {
    if (index === p || index === q) return false;
    const along = ((point.x - a.x) * x + (point.y - a.y) * y) / square;
    const across = (x * (point.y - a.y) - y * (point.x - a.x)) / square;
    return along > 1e-6 && along < 1 - 1e-6 && Math.abs(across) < 1e-6;
  });
}
