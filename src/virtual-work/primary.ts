// The primary structure: what is left when the redundants are freed. It is statically determinate and stable, so that
// equilibrium alone gives its forces under any loads, real or virtual.
import type { UnitAction } from '../model/question.ts';
import type { Structure } from '../model/structure.ts';
import { type Elimination, eliminate } from './elimination.ts';
import { addAction, emptyLoading, type FreeStrain, type Loading } from './loading.ts';
import { type Preference, stiffestFromTheGround } from './preference.ts';
import { type SpanForces, spanForces } from './span.ts';
import { ENTRIES_PER_UNKNOWN, entriesOf, releaseAt, type Statics, staticsOf, toPhysicalUnits } from './statics.ts';
import { balance } from './substitution.ts';

export interface PrimaryStructure {
  readonly statics: Statics;
  readonly elimination: Elimination;
}

/** Forces in equilibrium with a loading: the unknowns of statics.ts, and what the loads within legs add. */
export interface ForceState {
  /** N and N m; 0 where there is no unknown. */
  readonly unknowns: Float64Array;
  /** By leg. */
  readonly spans: ReadonlyMap<number, SpanForces>;
  readonly imposed: Imposed;
}

/** What is there without a force. */
export interface Imposed {
  /** Movement of each ground along its reaction, m or rad. */
  readonly ground: Float64Array | undefined;
  /** By leg. */
  readonly free: readonly FreeStrain[] | undefined;
}

export const NOTHING_IMPOSED: Imposed = { ground: undefined, free: undefined };

/** Multiplications that a primary structure may take, about a second's work. */
const MOST_EFFORT = 5e8;

/**
 * Undefined where the structure can move without strain, where a bending stiffness is not known, or where finding the
 * primary structure would take more than about a second.
 */
export function primaryStructure(structure: Structure, preference?: Preference): PrimaryStructure | undefined {
  const statics = staticsOf(structure);
  return statics && primaryStructureOf(statics, preference);
}

export function primaryStructureOf(
  statics: Statics,
  preference: Preference = stiffestFromTheGround,
): PrimaryStructure | undefined {
  const columns = {
    rowCount: statics.rowCount,
    maximumEntries: ENTRIES_PER_UNKNOWN,
    entries: (unknown: number, rows: Int32Array, values: Float64Array) => entriesOf(statics, unknown, rows, values),
  };
  const elimination = eliminate(columns, preference(statics), MOST_EFFORT);
  return elimination && elimination.rank === statics.rowCount ? { statics, elimination } : undefined;
}

/** The forces of the primary structure under the loading, every redundant zero. */
export function primaryForces({ statics, elimination }: PrimaryStructure, loading: Loading): ForceState {
  const { legs, forceRow, coupleRow, releaseRow, lever } = statics;
  const spans = new Map<number, SpanForces>();
  const load = loading.joints.slice();
  for (const [index, span] of loading.spans) {
    const leg = legs[index]!;
    const forces = spanForces(span, leg.length);
    spans.set(index, forces);
    // What the leg, resting at its ends, does to the points there.
    const { startShear, endShear, endAxial } = forces;
    const start = forceRow[leg.from]!;
    const end = forceRow[leg.to]!;
    load[start]! += leg.sine * startShear;
    load[start + 1]! -= leg.cosine * startShear;
    load[end]! -= leg.cosine * endAxial + leg.sine * endShear;
    load[end + 1]! += leg.cosine * endShear - leg.sine * endAxial;
    // Where a force is freed, what the leg has of it there; the axial force of a span begins at nil.
    addTo(load, releaseRow[releaseAt(index, 'axial', 'end')]!, endAxial);
    addTo(load, releaseRow[releaseAt(index, 'shear', 'start')]!, startShear);
    addTo(load, releaseRow[releaseAt(index, 'shear', 'end')]!, endShear);
  }
  for (let point = 0; point < coupleRow.length; point++) {
    const row = coupleRow[point]!;
    if (row >= 0) load[row]! /= lever[point]!;
  }
  const unknowns = new Float64Array(statics.unknownCount);
  balance(elimination, load, unknowns);
  toPhysicalUnits(statics, unknowns);
  return { unknowns, spans, imposed: { ground: loading.ground, free: loading.free } };
}

/** The virtual system of the actions, carried by the primary structure alone. */
export function virtualSystem(primary: PrimaryStructure, actions: readonly UnitAction[]): ForceState {
  const loading = emptyLoading(primary.statics);
  for (const { at, x, y, moment, side } of actions) addAction(primary.statics, loading, at, x, y, moment, side);
  return primaryForces(primary, loading);
}

function addTo(load: Float64Array, row: number, force: number): void {
  if (row >= 0) load[row]! += force;
}
