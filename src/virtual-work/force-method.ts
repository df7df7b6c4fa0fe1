// The force method: redundants found from compatibility, case by case. Everything is worked out when first asked for and
// then kept.
import type { Load, Structure } from '../model/structure.ts';
import { type Cholesky, cholesky, solveCholesky } from './cholesky.ts';
import { addLoad, emptyLoading, type Loading } from './loading.ts';
import type { Preference } from './preference.ts';
import { type ForceState, type PrimaryStructure, primaryForces, primaryStructureOf } from './primary.ts';
import { flexibilityOf, isUnknown, type Statics, staticsOf } from './statics.ts';
import { addState, forcesOfUnit, type UnitState, unitStates, workOf } from './unit-states.ts';
import { largestForce, strainsOf } from './work.ts';

/** The response to one loading. */
export interface Response {
  /** Of the primary structure, every redundant zero. */
  readonly primary: ForceState;
  /** δ₀ at each redundant, m or rad: the work of its unit state on the strains of `primary`, movements, heat and lack of fit included. */
  readonly gaps: Float64Array;
  /** X, N or N m. */
  readonly redundants: Float64Array;
  /** Of the structure itself: primary + Σ X · unit state. Undetermined thrusts are left at zero. */
  readonly final: ForceState;
  /** Of `final`, as `strainsOf` in work.ts lays them out. */
  readonly strains: Float64Array;
  /** The largest force, of `primary` or `final`, N; see `largestForce` in work.ts. */
  readonly largest: number;
  /** What is imposed would need axially stiff members of another length: there is no answer. */
  readonly contradicted: boolean;
}

/**
 * Multiplications for the flexibilities of the redundants past which the force method is not tried: some tenths of a
 * second. A frame of ten storeys and ten bays has 300 redundants and takes half of it.
 */
const MOST_DENSE_WORK = 1e8;

/**
 * Undefined for the reasons of `primaryStructure`, and where the redundants are too many (found out before any work is
 * spent on the structure). The primary structure alone may then still serve: see given-forces.ts.
 */
export function prepare(structure: Structure, preference?: Preference): ForceMethod | undefined {
  const statics = staticsOf(structure);
  if (!statics || denseWork(statics) > MOST_DENSE_WORK) return undefined;
  const primary = primaryStructureOf(statics, preference);
  return primary && new ForceMethod(primary);
}

/** Of a stable structure: it has as many redundants as unknowns more than equations. */
function denseWork(statics: Statics): number {
  let redundants = -statics.rowCount;
  for (let unknown = 0; unknown < statics.unknownCount; unknown++) if (isUnknown(statics, unknown)) redundants++;
  return redundants <= 0 ? 0 : (redundants ** 2 * (statics.unknownCount + redundants)) / 2;
}

/**
 * Smallest pivot of the scaled flexibilities with which the redundants are still trusted: with it, refinement gains
 * three digits a step.
 */
const LEAST_PIVOT = 1e-13;
/** Refinements of the redundants at most; each gains all the digits that the condition leaves. */
const REFINEMENTS = 3;
/** Step of a redundant, relative to it, that is rounding. */
const SETTLED = 1e-14;
/** Share of the terms of a sum that counts as nothing left: their rounding. */
const CANCELLED = 1e-9;

export class ForceMethod {
  readonly primary: PrimaryStructure;
  readonly #loads: readonly (readonly Load[])[];
  readonly #cases: (Response | undefined)[] = [];
  #states: { determined: UnitState[]; undetermined: UnitState[] } | undefined;
  #flexibility: Float64Array | undefined;
  #factor: Cholesky | undefined;

  constructor(primary: PrimaryStructure) {
    this.primary = primary;
    const { structure } = primary.statics;
    const loads: Load[][] = structure.cases.map(() => []);
    for (const load of structure.loads) loads[load.case]!.push(load);
    this.#loads = loads;
  }

  /** Of the redundants that compatibility determines. */
  get unitStates(): readonly UnitState[] {
    return this.#allStates().determined;
  }

  /** Of those that nothing flexible determines: thrusts in axially stiff members between held points. */
  get undeterminedStates(): readonly UnitState[] {
    return this.#allStates().undetermined;
  }

  /** f, m/N, rad/(N m) or 1/N: lower triangle by rows, entry (i, j) at i(i + 1)/2 + j. */
  get flexibility(): Float64Array {
    this.#flexibility ??= flexibilities(this.primary, this.unitStates);
    return this.#flexibility;
  }

  /** False where the flexibilities are too nearly singular for the redundants to be trusted. */
  get wellConditioned(): boolean {
    return this.unitStates.length === 0 || this.#cholesky().smallestPivot > LEAST_PIVOT;
  }

  /** `index`: into the structure's cases. */
  case(index: number): Response {
    this.#cases[index] ??= this.respond(this.loading(this.#loads.map((_, other) => Number(other === index))));
    return this.#cases[index];
  }

  /** The response to any loading, real or virtual. */
  respond(loading: Loading): Response {
    const { primary, unitStates: states } = this;
    const { statics } = primary;
    const released = primaryForces(primary, loading);
    let strains = strainsOf(statics, released);
    const contradicted = this.undeterminedStates.some(state => contradicts(state, strains));
    const gaps = gapsAt(states, strains);
    const largest = largestForce(statics, released);
    if (states.length === 0) {
      return { primary: released, gaps, redundants: gaps, final: released, strains, largest, contradicted };
    }

    const redundants = new Float64Array(states.length);
    const unknowns = released.unknowns.slice();
    const final = { ...released, unknowns };
    let open = gaps;
    for (let round = 0; round <= REFINEMENTS; round++) {
      // f · X = −δ for the gaps that are open, which come from the strains themselves and not from f.
      const step = open.map(gap => -gap);
      solveCholesky(this.#cholesky(), step);
      let settled = true;
      for (let at = 0; at < states.length; at++) {
        settled &&= Math.abs(step[at]!) <= SETTLED * Math.abs(redundants[at]!);
        redundants[at]! += step[at]!;
        addState(states[at]!, step[at]!, unknowns);
      }
      strains = strainsOf(statics, final);
      if (settled) break;
      open = gapsAt(states, strains);
    }
    const most = Math.max(largest, largestForce(statics, final));
    return { primary: released, gaps, redundants, final, strains, largest: most, contradicted };
  }

  /** The cases with these factors, as one loading. */
  loading(factors: readonly number[]): Loading {
    const { statics } = this.primary;
    const loading = emptyLoading(statics);
    for (const [index, loads] of this.#loads.entries()) {
      const factor = factors[index] ?? 0;
      if (factor !== 0) for (const load of loads) addLoad(statics, loading, load, factor);
    }
    return loading;
  }

  #allStates() {
    if (!this.#states) {
      const { statics } = this.primary;
      const rigid = ({ unknowns }: UnitState) => unknowns.every(unknown => flexibilityOf(statics, unknown) === 0);
      const determined: UnitState[] = [];
      const undetermined: UnitState[] = [];
      for (const state of unitStates(this.primary)) (rigid(state) ? undetermined : determined).push(state);
      this.#states = { determined, undetermined };
    }
    return this.#states;
  }

  #cholesky(): Cholesky {
    this.#factor ??= cholesky(this.flexibility.slice(), this.unitStates.length);
    return this.#factor;
  }
}

function gapsAt(states: readonly UnitState[], strains: Float64Array): Float64Array {
  const gaps = new Float64Array(states.length);
  for (let at = 0; at < states.length; at++) gaps[at] = workOf(states[at]!, strains);
  return gaps;
}

function flexibilities({ statics }: PrimaryStructure, states: readonly UnitState[]): Float64Array {
  const result = new Float64Array((states.length * (states.length + 1)) / 2);
  let at = 0;
  for (let row = 0; row < states.length; row++) {
    const strains = strainsOf(statics, forcesOfUnit(statics, states[row]!));
    for (let column = 0; column <= row; column++) result[at++] = workOf(states[column]!, strains);
  }
  return result;
}

/** Whether the gap at a redundant without flexibility, which no force can close, is more than rounding. */
function contradicts({ unknowns, forces }: UnitState, strains: Float64Array): boolean {
  let gap = 0;
  let size = 0;
  for (let index = 0; index < unknowns.length; index++) {
    const work = forces[index]! * strains[unknowns[index]!]!;
    gap += work;
    size += Math.abs(work);
  }
  return Math.abs(gap) > CANCELLED * size;
}
