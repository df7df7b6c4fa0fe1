// The unit states: what one unit of a redundant, and none of the others, causes in the primary structure.

import { type ForceState, NOTHING_IMPOSED, type PrimaryStructure } from './primary.ts';
import { type Statics, toPhysicalUnits, unitOf } from './statics.ts';
import { selfBalance } from './substitution.ts';

/** Forces in balance among themselves: `forces[i]`, N or N m, is that of unknown `unknowns[i]`. */
export interface UnitState {
  /** The redundant, whose own force is 1 N or 1 N m. */
  readonly redundant: number;
  readonly unknowns: Int32Array;
  readonly forces: Float64Array;
}

/** Of all redundants, in the order of the elimination. */
export function unitStates({ statics, elimination }: PrimaryStructure): UnitState[] {
  const scratch = new Float64Array(statics.rowCount);
  const dense = new Float64Array(statics.unknownCount);
  return elimination.redundants.map((redundant, index) => {
    dense.fill(0);
    selfBalance(elimination, index, scratch, dense);
    toPhysicalUnits(statics, dense);
    const unit = unitOf(statics, redundant);
    let count = 0;
    for (let unknown = 0; unknown < dense.length; unknown++) if (dense[unknown] !== 0) count++;
    const unknowns = new Int32Array(count);
    const forces = new Float64Array(count);
    for (let unknown = dense.length - 1; count > 0; unknown--) {
      if (dense[unknown] === 0) continue;
      unknowns[--count] = unknown;
      forces[count] = dense[unknown]! / unit;
    }
    return { redundant, unknowns, forces };
  });
}

/** The same as forces by unknown. */
export function forcesOfUnit(statics: Statics, state: UnitState): ForceState {
  const unknowns = new Float64Array(statics.unknownCount);
  addState(state, 1, unknowns);
  return { unknowns, spans: new Map(), imposed: NOTHING_IMPOSED };
}

/** Work of the state on strains given by unknown. */
export function workOf({ unknowns, forces }: UnitState, strains: Float64Array): number {
  let work = 0;
  for (let index = 0; index < unknowns.length; index++) work += forces[index]! * strains[unknowns[index]!]!;
  return work;
}

/** Adds `factor` times the state to forces by unknown. */
export function addState({ unknowns, forces }: UnitState, factor: number, result: Float64Array): void {
  for (let index = 0; index < unknowns.length; index++) result[unknowns[index]!]! += factor * forces[index]!;
}
