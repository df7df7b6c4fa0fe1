// A structure with what acts on it and what comes of it: a beam on one sheet, a frame with its fields on panels.
import type { Structure } from '../model/structure.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import type { Acting } from './acting.ts';
import { beamPlate } from './beam-plate.ts';
import { frameFields, type Panel } from './frame-fields.ts';
import { framePlate } from './frame-plate.ts';
import type { Palette } from './ink.ts';
import { isBeam } from './view.ts';

export interface StructureDrawing {
  /** SVG, 680 px wide: structure, loads and dimensions; of a beam, its fields as well. */
  readonly main: string;
  /** SVG, the fields of a frame; none for a beam. */
  readonly panels: readonly Panel[];
}

export function structureDrawing(
  structure: Structure,
  acting: Acting,
  units: DisplayUnits,
  palette: Palette = 'page',
): StructureDrawing {
  if (isBeam(structure)) return { main: beamPlate(structure, acting, units, palette), panels: [] };
  return {
    main: framePlate(structure, acting, units, palette),
    panels: frameFields(structure, acting, units, palette),
  };
}
