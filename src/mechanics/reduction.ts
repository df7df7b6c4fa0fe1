// From the freedoms of a structure to the unknowns of its solve: held freedoms drop out, and each axially stiff leg makes
// one movement follow from others, exactly.

import type { Freedoms } from './freedoms.ts';
import { keepsLength, type Legs } from './legs.ts';

/**
 * freedom f = Σ value × unknown + what is imposed gives it. A free freedom is an unknown itself, a held one has no terms,
 * a dependent one follows from others.
 */
export interface Reduction {
  /** Number of unknowns. */
  readonly size: number;
  /** The terms of freedom f are `starts[f]` up to `starts[f + 1]`; freedoms + 1. */
  readonly starts: Int32Array;
  readonly unknowns: Int32Array;
  readonly values: Float64Array;
  /** The freedom that each unknown is. */
  readonly freedoms: Int32Array;
  /**
   * Dependent freedoms that follow what is imposed: `freedom` moves by value × the movement of `moved`, a held freedom
   * or, with the number of freedoms added to its own, a leg that heat or lack of fit lengthens.
   */
  readonly followers: readonly { readonly freedom: number; readonly moved: number; readonly value: number }[];
  /** Axially stiff legs that nothing free can lengthen: Σ value × what `moved` is given (as above) must be 0. */
  readonly closures: readonly { readonly leg: number; readonly terms: ReadonlyMap<number, number> }[];
}

/**
 * Terms of dependent freedoms, in sum, beyond which their elimination is given up. The stiffness matrix of so many is
 * nearly full, of a thousand unknowns, and takes about a second; frames with level beams and upright posts have one
 * term a freedom and never come near.
 */
export const MAX_DEPENDENT_TERMS = 500_000;

/**
 * `moved`: by freedom, 1 where a held freedom has an imposed movement in some case; `lengthened`: by leg, 1 where it is
 * axially stiff and some case would change its length. Undefined where axially stiff legs tie so many movements together
 * that the terms pass `MAX_DEPENDENT_TERMS`.
 */
export function reduce(
  legs: Legs,
  freedoms: Freedoms,
  moved: Uint8Array,
  lengthened: Uint8Array,
): Reduction | undefined {
  const { count, held } = freedoms;
  const given = new Uint8Array(count + legs.count);
  given.set(moved);
  given.set(lengthened, count);
  const tied = tieStiffLegs(legs, freedoms, given);
  if (tied === undefined) return undefined;
  const { dependents, closures } = tied;

  const unknownOf = new Int32Array(count).fill(-1);
  const starts = new Int32Array(count + 1);
  let size = 0;
  let terms = 0;
  for (let f = 0; f < count; f++) {
    const dependent = dependents.get(f);
    if (dependent !== undefined) for (const on of dependent.keys()) terms += 1 - given[on]!;
    else if (held[f] === 0) {
      unknownOf[f] = size++;
      terms++;
    }
    starts[f + 1] = terms;
  }
  const unknowns = new Int32Array(terms);
  const values = new Float64Array(terms);
  const own = new Int32Array(size);
  const followers: { freedom: number; moved: number; value: number }[] = [];
  for (let f = 0; f < count; f++) {
    let k = starts[f]!;
    const dependent = dependents.get(f);
    if (dependent === undefined) {
      const unknown = unknownOf[f]!;
      if (unknown < 0) continue;
      own[unknown] = f;
      unknowns[k] = unknown;
      values[k] = 1;
      continue;
    }
    for (const [on, value] of dependent) {
      const unknown = given[on] === 1 ? -1 : unknownOf[on]!;
      if (unknown < 0) followers.push({ freedom: f, moved: on, value });
      else {
        unknowns[k] = unknown;
        values[k] = value;
        k++;
      }
    }
  }
  return { size, starts, unknowns, values, freedoms: own, followers, closures };
}

/** Adds to the movement of every freedom what the unknowns give it. */
export function expand(reduction: Reduction, solution: Float64Array, movement: Float64Array): void {
  const { starts, unknowns, values } = reduction;
  for (let f = 0; f < movement.length; f++) {
    for (let k = starts[f]!; k < starts[f + 1]!; k++) movement[f]! += values[k]! * solution[unknowns[k]!]!;
  }
}

/** The forces on the unknowns that forces on the freedoms amount to: virtual work is the same. */
export function gather(reduction: Reduction, force: Float64Array): Float64Array {
  const { size, starts, unknowns, values } = reduction;
  const gathered = new Float64Array(size);
  for (let f = 0; f < force.length; f++) {
    for (let k = starts[f]!; k < starts[f + 1]!; k++) gathered[unknowns[k]!]! += values[k]! * force[f]!;
  }
  return gathered;
}

/**
 * A term is taken for rounding when it is this much smaller than the terms that cancelled in it. Directions are unit
 * vectors known to some ε; terms grow little on the way, as each pivot is among the largest of its row.
 */
const CANCELLED = 1e-11;

/** A pivot may be this much smaller than the largest of its row if that keeps the terms few. */
const PIVOT_CHOICE = 0.5;

type Terms = Map<number, number>;

/**
 * Gauss-Jordan elimination, leg by leg: no lengthening, or only the one that is given, is one equation between the
 * movements of the leg's ends. What earlier legs settled is put in, and the equation gives one more movement from the
 * others; if nothing is left, the leg is held at its length already.
 */
function tieStiffLegs(legs: Legs, freedoms: Freedoms, moved: Uint8Array) {
  const dependents = new Map<number, Terms>();
  const closures: { leg: number; terms: Terms }[] = [];
  // Which dependents may mention a freedom; some may have lost it since.
  const mentions = new Map<number, number[]>();
  let total = 0;
  for (let e = 0; e < legs.count; e++) {
    if (!keepsLength(legs, e)) continue;
    const { row, largest } = lengthening(e, legs, freedoms, moved, dependents);
    let pivot = -1;
    let greatest = 0;
    for (const [f, value] of row) {
      if (Math.abs(value) <= CANCELLED * largest) row.delete(f);
      else if (moved[f] === 0) greatest = Math.max(greatest, Math.abs(value));
    }
    let fewest = Number.POSITIVE_INFINITY;
    for (const [f, value] of row) {
      if (moved[f] === 1 || Math.abs(value) < PIVOT_CHOICE * greatest) continue;
      const uses = mentions.get(f)?.length ?? 0;
      if (uses > fewest) continue;
      pivot = f;
      fewest = uses;
    }
    if (pivot < 0) {
      if (row.size > 0) closures.push({ leg: e, terms: row });
      continue;
    }

    const scale = -1 / row.get(pivot)!;
    const terms: Terms = new Map();
    for (const [f, value] of row) if (f !== pivot) terms.set(f, value * scale);
    dependents.set(pivot, terms);
    total += terms.size;
    for (const f of terms.keys()) mention(mentions, f, pivot);
    for (const user of mentions.get(pivot) ?? []) {
      const other = dependents.get(user)!;
      const factor = other.get(pivot);
      if (factor === undefined) continue;
      total -= other.size;
      other.delete(pivot);
      for (const [f, value] of terms) {
        const before = other.get(f);
        const after = (before ?? 0) + factor * value;
        if (before !== undefined && Math.abs(after) <= CANCELLED * Math.abs(before)) other.delete(f);
        else {
          other.set(f, after);
          if (before === undefined) mention(mentions, f, user);
        }
      }
      total += other.size;
    }
    mentions.delete(pivot);
    if (total > MAX_DEPENDENT_TERMS) return undefined;
  }
  return { dependents, closures };
}

/**
 * The lengthening of a leg, less the one it is given, in terms of freedoms that are neither dependent nor held still; and
 * the largest term on the way.
 */
function lengthening(e: number, legs: Legs, freedoms: Freedoms, moved: Uint8Array, dependents: Map<number, Terms>) {
  const row: Terms = new Map();
  let largest = 0;
  const add = (f: number, value: number) => {
    row.set(f, (row.get(f) ?? 0) + value);
    largest = Math.max(largest, Math.abs(value));
  };
  const cosine = legs.cosine[e]!;
  const sine = legs.sine[e]!;
  if (moved[freedoms.count + e] === 1) add(freedoms.count + e, -1);
  for (let end = 0; end < 2; end++) {
    const p = (end === 0 ? legs.from : legs.to)[e]!;
    const sign = end === 0 ? -1 : 1;
    const axisX = freedoms.axisX[p]!;
    const axisY = freedoms.axisY[p]!;
    for (let k = 0; k < 2; k++) {
      const f = freedoms.first[p]! + k;
      if (freedoms.held[f] === 1 && moved[f] === 0) continue;
      const value = sign * (k === 0 ? cosine * axisX + sine * axisY : sine * axisX - cosine * axisY);
      const dependent = dependents.get(f);
      if (dependent === undefined) add(f, value);
      else for (const [on, factor] of dependent) add(on, value * factor);
    }
  }
  return { row, largest };
}

function mention(mentions: Map<number, number[]>, freedom: number, user: number): void {
  const users = mentions.get(freedom);
  if (users === undefined) mentions.set(freedom, [user]);
  else users.push(user);
}
