// The sum of one load: what a checker adds up in the input schedule.
import type { Structure } from '../model/structure.ts';
import { perMetre, type Stretch, spread, weights } from './acting-loads.ts';

/** Sum of one load as it is given, unfactored: N, global components. None for a couple and for what is imposed. */
export function loadSum(structure: Structure, index: number): { readonly x: number; readonly y: number } | undefined {
  const load = structure.loads[index];
  switch (load?.kind) {
    case undefined:
    case 'couple':
    case 'movement':
    case 'heat':
    case 'lengthen':
      return undefined;
    case 'force':
      return { x: load.x, y: load.y };
    case 'self-weight':
      return sumOf(weights(structure, load, index, 1));
    case 'line':
      return sumOf(spread(structure, load, index, 1));
  }
}

function sumOf(stretches: readonly Stretch[]): { readonly x: number; readonly y: number } {
  let [x, y] = [0, 0];
  for (const stretch of stretches) {
    const { start, end } = perMetre(stretch);
    const total = ((start + end) / 2) * (stretch.end - stretch.start);
    x += stretch.x * total;
    y += stretch.y * total;
  }
  return { x, y };
}
