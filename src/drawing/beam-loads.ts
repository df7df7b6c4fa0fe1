// All loads on a level beam. Its axis stands at y = 0.
import type { Structure } from '../model/structure.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { actingCases } from './acting-loads.ts';
import { drawBeamBands } from './beam-line-loads.ts';
import { drawBeamMovements, drawBeamSingles } from './beam-single-loads.ts';
import type { LabelRequest } from './placing.ts';
import type { Sheet } from './sheet.ts';
import type { View } from './view.ts';

/** What the lower half of the plate needs to know of the loads. */
export interface BeamLoads {
  /** px under the axis that loads take. */
  readonly depth: number;
  /** Written when everything else has its place. */
  readonly labels: readonly LabelRequest[];
}

export function drawBeamLoads(
  sheet: Sheet,
  structure: Structure,
  view: View,
  factors: readonly number[],
  units: DisplayUnits,
): BeamLoads {
  const cases = actingCases(structure, factors);
  const labels: LabelRequest[] = [];
  const top = drawBeamBands(sheet, structure, view, cases, units, labels);
  const depth = drawBeamSingles(sheet, structure, view, cases, units, top, labels);
  const deepest = drawBeamMovements(sheet, view, cases, units, depth, labels);
  return { depth: deepest, labels };
}
