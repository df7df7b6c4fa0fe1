// Thrusts that nothing flexible determines: axially stiff members between held points. They are the limit of equal large
// axial stiffness, for which the complementary energy, and so Σ∫N² dx over the axially stiff legs, is least.
import { cholesky, solveCholesky } from './cholesky.ts';
import type { ForceState } from './primary.ts';
import type { Statics } from './statics.ts';
import { addState, type UnitState } from './unit-states.ts';

/** The state with each of the undetermined states in it as much as makes Σ∫N² dx least. */
export function withLeastThrusts(statics: Statics, state: ForceState, undetermined: readonly UnitState[]): ForceState {
  if (undetermined.length === 0) return state;
  const matrix = new Float64Array((undetermined.length * (undetermined.length + 1)) / 2);
  const factors = new Float64Array(undetermined.length);
  let at = 0;
  for (const [row, one] of undetermined.entries()) {
    const dense = new Float64Array(statics.unknownCount);
    addState(one, 1, dense);
    for (let column = 0; column <= row; column++) matrix[at++] = axialWork(statics, undetermined[column]!, dense);
    factors[row] = -axialWork(statics, one, state.unknowns);
    for (const [leg, span] of state.spans) {
      if (statics.legs[leg]!.axialFlexibility === 0) factors[row]! -= dense[3 * leg]! * span.axialIntegral;
    }
  }
  solveCholesky(cholesky(matrix, undetermined.length), factors);
  const unknowns = state.unknowns.slice();
  for (const [index, one] of undetermined.entries()) addState(one, factors[index]!, unknowns);
  return { ...state, unknowns };
}

/** Σ N n L over the axially stiff legs. */
function axialWork({ legs, firstReaction }: Statics, { unknowns, forces }: UnitState, other: Float64Array): number {
  let work = 0;
  for (let index = 0; index < unknowns.length; index++) {
    const unknown = unknowns[index]!;
    if (unknown >= firstReaction || unknown % 3 !== 0) continue;
    const leg = legs[unknown / 3]!;
    if (leg.axialFlexibility === 0) work += forces[index]! * other[unknown]! * leg.length;
  }
  return work;
}
