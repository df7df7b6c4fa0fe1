// A movement by the unit load: a virtual system in equilibrium with unit actions at the place, whose work on the real
// strains is the movement. By the reduction theorem any such system will do; the primary structure carries it.
import type { UnitAction } from '../model/question.ts';
import type { ForceMethod } from './force-method.ts';
import { type ForceState, virtualSystem } from './primary.ts';
import { type Movement, roundingOf, virtualWork, workOnImposed } from './work.ts';

/**
 * Σ action · movement, m or rad, under the cases with these factors (in the order of the structure's cases). NaN where
 * there is no answer to give: something imposed that axially stiff members contradict, or redundants that are too
 * nearly undetermined to be trusted.
 */
export function movement(forceMethod: ForceMethod, factors: readonly number[], actions: readonly UnitAction[]): number {
  return movementOf(forceMethod, factors, virtualSystem(forceMethod.primary, actions)).value;
}

/**
 * The same with the virtual system at hand, for one question under many combinations, and with its rounding: what should
 * be nil, by symmetry or as nothing bends, comes out below that on either road.
 */
export function movementOf(forceMethod: ForceMethod, factors: readonly number[], virtual: ForceState): Movement {
  const { statics } = forceMethod.primary;
  let value = forceMethod.wellConditioned ? 0 : Number.NaN;
  let force = 0;
  let imposed = 0;
  for (let index = 0; index < factors.length; index++) {
    const factor = factors[index]!;
    if (factor === 0) continue;
    const { final, strains, largest, contradicted } = forceMethod.case(index);
    value += contradicted ? Number.NaN : factor * virtualWork(statics, virtual, final, strains);
    force += Math.abs(factor) * largest;
    imposed += Math.abs(factor) * workOnImposed(statics, virtual, final.imposed);
  }
  return { value, rounding: roundingOf(statics, virtual, force, imposed) };
}
