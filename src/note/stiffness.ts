// By what factor all stiffness must rise to meet an exceeded movement limit. What settlement, heat and lack of fit impose
// does not scale, so the factor comes from the part that stiffness governs, and is found on the real model.
import { imposedPart, loadPart, measure, superpose, worstPatterns } from '../mechanics/index.ts';
import type { ResolvedMeasure } from '../model/question.ts';
import { isMovement } from '../model/questions.ts';
import type { Solved } from './solved.ts';

/** Past this the members are no answer to the limit. */
const MOST_FACTOR = 1e6;

/** `factors`: with all spans of patterned loads. Undefined where the measure is no movement, and where the imposed part alone passes the limit. */
export function stiffnessFactor(
  asked: ResolvedMeasure,
  value: number,
  limit: number,
  factors: readonly number[],
  solved: Solved,
): number | undefined {
  if (!isMovement(asked.kind) || limit <= 0) return undefined;
  const { analysis } = solved;
  if (!analysis.parts.some((part, index) => part !== undefined && factors[index] !== 0)) return Math.abs(value) / limit;
  // With other shares of the two parts, another set of spans may be the worst.
  const parts = worstPatterns(analysis, factors, asked).map(
    set => [loadPart(analysis, set), imposedPart(analysis, set)] as const,
  );
  const sizeAt = (factor: number): number =>
    Math.max(
      ...parts.map(both => {
        const solution = superpose(analysis, both, [1 / factor, 1]);
        return Math.abs(measure(analysis.structure, solution, asked, 'size').value);
      }),
    );
  if (sizeAt(MOST_FACTOR) >= limit) return undefined;
  // The size falls from above the limit to below it; halving the range finds the crossing to all digits.
  let [low, high] = [1, MOST_FACTOR];
  for (let i = 0; i < 200 && high - low > 1e-12 * low; i++) {
    const middle = Math.sqrt(low * high);
    if (sizeAt(middle) > limit) low = middle;
    else high = middle;
  }
  return high;
}
