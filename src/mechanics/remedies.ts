// What would hold an unstable structure: changes to it, each tried on a changed copy, of which only those are kept that
// leave nothing free to move. How to speak of them is left to others.

import type { Restraint, Structure } from '../model/structure.ts';
import { findStability, MAX_CONDITION } from './analyse.ts';
import { boundFreedoms } from './freedoms.ts';
import { MAX_MECHANISMS } from './mechanisms.ts';
import { findBraces } from './panels.ts';
import type { Mechanism } from './solution.ts';

/** One change. Numbers are indices into the structure's supports, hinges and points. */
export type Remedy =
  /** A support that holds more than it did. */
  | { readonly kind: 'hold'; readonly support: number; readonly as: 'pinned' | 'fixed' }
  | { readonly kind: 'close'; readonly hinge: number }
  /** A bar between two points that nothing joins yet. */
  | { readonly kind: 'brace'; readonly from: number; readonly to: number }
  /** A support where there is none; `sideways` holds x alone. */
  | { readonly kind: 'support'; readonly point: number; readonly as: SupportKind };

export type SupportKind = 'roller' | 'sideways' | 'pinned' | 'fixed';

/** Larger structures are not tried: each trial would take milliseconds that a keystroke has not. */
const MOST_FREEDOMS = 300;

/** Copies analysed at most. */
const MOST_TRIALS = 64;

/** Ways told at most. */
const MOST_REMEDIES = 3;

/** Changes that may be needed together. */
const MOST_TOGETHER = 4;

/**
 * Each entry is a set of changes that together leave the structure stable, the least change first; empty where none was
 * found or the structure is too large to try.
 */
export function findRemedies(structure: Structure, mechanisms: readonly Mechanism[]): readonly (readonly Remedy[])[] {
  if (mechanisms.length === 0 || mechanisms.length >= MAX_MECHANISMS) return [];
  if (boundFreedoms(structure) > MOST_FREEDOMS) return [];
  const trials = { left: MOST_TRIALS };
  const all = candidates(structure, mechanisms);
  const found = new Set<Remedy>();
  // One of each kind first, so that there is something to choose from; then others.
  for (const mostOfAKind of [1, 2]) {
    for (const remedy of all) {
      if (found.size === MOST_REMEDIES) break;
      const alike = [...found].filter(({ kind }) => kind === remedy.kind).length;
      if (found.has(remedy) || alike >= mostOfAKind) continue;
      if (freeAfter(structure, remedy, trials) === 0) found.add(remedy);
    }
  }
  const single = all.filter(remedy => found.has(remedy)).map(remedy => [remedy]);
  if (mechanisms.length === 1) return single;
  const several = severalChanges(structure, mechanisms, trials);
  return several === undefined ? single : [several, ...single.slice(0, MOST_REMEDIES - 1)];
}

/** The structure with one change made. */
export function remedied(structure: Structure, remedy: Remedy): Structure {
  switch (remedy.kind) {
    case 'hold': {
      const supports = structure.supports.map((support, index) =>
        index === remedy.support
          ? { ...support, restraints: [...support.restraints, ...RESTRAINTS[remedy.as]] }
          : support,
      );
      return { ...structure, supports };
    }
    case 'close':
      return { ...structure, hinges: structure.hinges.toSpliced(remedy.hinge, 1) };
    case 'support': {
      const { range } = structure;
      const symbol = { kind: 'held', angle: 0, springs: [] } as const;
      const support = { point: remedy.point, restraints: RESTRAINTS[remedy.as], symbol, range };
      return { ...structure, supports: [...structure.supports, support] };
    }
    case 'brace':
      return withBar(structure, remedy.from, remedy.to);
  }
}

const X: Restraint = { freedom: { kind: 'movement', x: 1, y: 0 }, stiffness: Number.POSITIVE_INFINITY };
const Y: Restraint = { freedom: { kind: 'movement', x: 0, y: 1 }, stiffness: Number.POSITIVE_INFINITY };
const ROTATION: Restraint = { freedom: { kind: 'rotation' }, stiffness: Number.POSITIVE_INFINITY };

const RESTRAINTS: Readonly<Record<SupportKind, readonly Restraint[]>> = {
  roller: [Y],
  sideways: [X],
  pinned: [X, Y],
  fixed: [X, Y, ROTATION],
};

/** Any stiffness serves: what is free is decided by geometry. N. */
const BRACE_STIFFNESS = 1e8;

function withBar(structure: Structure, from: number, to: number): Structure {
  const { points, sections, members, range } = structure;
  const [x, y] = [points[to]!.x - points[from]!.x, points[to]!.y - points[from]!.y];
  const length = Math.hypot(x, y);
  const section = { ...sections[0]!, axialStiffness: BRACE_STIFFNESS };
  const leg = { from, to, section: sections.length, start: 0, length, cosine: x / length, sine: y / length };
  const bar = { name: '', kind: 'bar', legs: [leg], length, range } as const;
  return { ...structure, sections: [...sections, section], members: [...members, bar] };
}

interface Trials {
  left: number;
}

/** How many ways to move are left after a change, MAX_MECHANISMS where that cannot be said. */
function freeAfter(structure: Structure, remedy: Remedy, trials: Trials): number {
  if (trials.left <= 0) return MAX_MECHANISMS;
  trials.left--;
  const stability = findStability(remedied(structure, remedy));
  // What is only just held is not held.
  if (stability === undefined || (stability.stable && stability.condition > MAX_CONDITION)) return MAX_MECHANISMS;
  return stability.mechanisms.length;
}

/** Several changes, one after the other: each time the one that leaves the fewest ways to move, the least among equals. */
function severalChanges(
  structure: Structure,
  mechanisms: readonly Mechanism[],
  trials: Trials,
): readonly Remedy[] | undefined {
  const chosen: Remedy[] = [];
  let [changed, free] = [structure, mechanisms];
  while (free.length > 0) {
    if (chosen.length === MOST_TOGETHER) return undefined;
    let best: { readonly remedy: Remedy; readonly left: number } | undefined;
    for (const remedy of candidates(changed, free)) {
      // Supports and hinges are told by their places in the structure as it was.
      if (remedy.kind === 'hold' && remedy.support >= structure.supports.length) continue;
      if (remedy.kind === 'close' && changed.hinges.length < structure.hinges.length) continue;
      // A fixed end is a single change, and stands there already if it serves.
      if (remedy.kind === 'support' && remedy.as === 'fixed') continue;
      const left = freeAfter(changed, remedy, trials);
      if (left < (best?.left ?? free.length)) best = { remedy, left };
      if (best?.left === 0) break;
    }
    if (best === undefined) return undefined;
    chosen.push(best.remedy);
    changed = remedied(changed, best.remedy);
    free = findStability(changed)?.mechanisms ?? [];
  }
  return chosen.length > 1 ? chosen : undefined;
}

/**
 * Changes that act on the mechanisms, the least first: a support that holds more, a hinge taken out, a brace, a support
 * more. Those that no mechanism would feel are left out.
 */
function candidates(structure: Structure, mechanisms: readonly Mechanism[]): readonly Remedy[] {
  const size = (point: number) =>
    Math.max(...mechanisms.map(({ movements }) => Math.hypot(movements[2 * point]!, movements[2 * point + 1]!)));
  const moving = structure.points.map((_, point) => point).filter(point => size(point) > STILL);
  const turning = new Set(mechanisms.flatMap(mechanism => mechanism.turning));
  const acts = (point: number) => turning.has(point) || size(point) > STILL;
  const firm: Remedy[] = [];
  const clamped: Remedy[] = [];
  structure.supports.forEach(({ point, restraints }, support) => {
    if (!acts(point)) return;
    const turns = !restraints.some(({ freedom }) => freedom.kind === 'rotation');
    if (size(point) > STILL) firm.push({ kind: 'hold', support, as: turns ? 'pinned' : 'fixed' });
    else if (turns && bends(structure, point)) clamped.push({ kind: 'hold', support, as: 'fixed' });
  });
  const closed = structure.hinges.flatMap(({ point }, hinge): Remedy[] =>
    acts(point) ? [{ kind: 'close', hinge }] : [],
  );
  const braces = mechanisms.flatMap(mechanism => findBraces(structure, mechanism));
  const held = new Set(structure.supports.map(({ point }) => point));
  const open = moving.filter(point => !held.has(point)).sort((a, b) => rounded(size(b)) - rounded(size(a)));
  const supports = open.slice(0, MOST_POINTS).flatMap(point => supportsAt(mechanisms, point));
  return [...firm, ...clamped, ...closed, ...braces.map((brace): Remedy => ({ kind: 'brace', ...brace })), ...supports];
}

/** A movement of less than this beside the largest is none. */
const STILL = 1e-6;

/** Points at which a new support is tried: where most moves. */
const MOST_POINTS = 6;

/** Equal sizes stay equal, so that the first point of them comes first. */
function rounded(size: number): number {
  return Number(size.toFixed(6));
}

/** A roller where the point goes up or down, else a hold sideways; a pin or a fixed end only where several ways are open. */
function supportsAt(mechanisms: readonly Mechanism[], point: number): readonly Remedy[] {
  const goes = (axis: 0 | 1) => mechanisms.some(({ movements }) => Math.abs(movements[2 * point + axis]!) > 0.1);
  const kinds: SupportKind[] = [];
  if (goes(1)) kinds.push('roller');
  if (goes(0)) kinds.push('sideways');
  if (mechanisms.length > 1) kinds.push('pinned', 'fixed');
  return kinds.map(as => ({ kind: 'support', point, as }));
}

function bends({ members }: Structure, point: number): boolean {
  return members.some(
    ({ kind, legs }) => kind === 'member' && legs.some(({ from, to }) => from === point || to === point),
  );
}
