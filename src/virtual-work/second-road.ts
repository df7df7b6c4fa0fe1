// The second road to the movements of one structure, by whichever way is in reach: the force method, which finds the
// redundants itself, or the forces of the first road, held to leave no gap.
import type { UnitAction } from '../model/question.ts';
import type { Structure } from '../model/structure.ts';
import { type Balance, balanceOf, type SolvedState } from './balance.ts';
import { type ForceMethod, prepare } from './force-method.ts';
import { type GivenForces, givenForces, largestGap, movementFromForces } from './given-forces.ts';
import type { InternalForces } from './internal-forces.ts';
import { movementOf } from './movement.ts';
import { type PrimaryStructure, primaryStructure, virtualSystem } from './primary.ts';
import { type Statics, staticsOf } from './statics.ts';
import type { Movement } from './work.ts';

export interface SecondMovement extends Movement {
  /** What the forces of the first road leave open, relative to the largest movement; 0 by the force method. */
  readonly gap: number;
}

/** Of what cannot be shown to balance. */
const UNBALANCED: Balance = { equilibrium: Infinity, energy: Infinity };

export class SecondRoad {
  readonly #structure: Structure;
  #forceMethod: ForceMethod | undefined | 'not asked' = 'not asked';
  #primary: PrimaryStructure | undefined | 'not asked' = 'not asked';
  #statics: Statics | undefined | 'not asked' = 'not asked';
  readonly #balances = new WeakMap<SolvedState, Balance>();
  readonly #given = new WeakMap<InternalForces, { readonly forces: GivenForces; readonly gap: number }>();

  constructor(structure: Structure) {
    this.#structure = structure;
  }

  /** Undefined where the structure is unstable, or the force method is out of reach. */
  get forceMethod(): ForceMethod | undefined {
    if (this.#forceMethod === 'not asked') this.#forceMethod = prepare(this.#structure);
    return this.#forceMethod;
  }

  /**
   * Σ action · movement under the cases with these factors; `forces` are those of the first road under the same, read
   * only if need be, and one object for one combination. Undefined where no way is in reach.
   */
  movement(
    factors: readonly number[],
    forces: () => InternalForces,
    actions: readonly UnitAction[],
  ): SecondMovement | undefined {
    const { forceMethod } = this;
    if (forceMethod) {
      return { ...movementOf(forceMethod, factors, virtualSystem(forceMethod.primary, actions)), gap: 0 };
    }
    if (this.#primary === 'not asked') this.#primary = primaryStructure(this.#structure);
    const primary = this.#primary;
    if (!primary) return undefined;
    const given = this.#givenBy(primary, factors, forces());
    return { ...movementFromForces(primary, given.forces, actions), gap: given.gap };
  }

  /** Whether a solution of the first road balances, and its work with it; one object for one combination. */
  balance(factors: readonly number[], solution: SolvedState): Balance {
    let balance = this.#balances.get(solution);
    if (!balance) {
      if (this.#statics === 'not asked') this.#statics = staticsOf(this.#structure);
      balance = this.#statics ? balanceOf(this.#statics, factors, solution) : UNBALANCED;
      this.#balances.set(solution, balance);
    }
    return balance;
  }

  #givenBy(primary: PrimaryStructure, factors: readonly number[], internal: InternalForces) {
    let given = this.#given.get(internal);
    if (!given) {
      const forces = givenForces(primary, factors, internal);
      given = { forces, gap: largestGap(primary, forces) };
      this.#given.set(internal, given);
    }
    return given;
  }
}
