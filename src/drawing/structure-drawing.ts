// A structure with what acts on it and what comes of it: a beam on one sheet, a frame with its fields on panels.
import type { Structure } from '../model/structure.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { type Acting, SHEET_WIDTH } from './acting.ts';
import { beamPlate } from './beam-plate.ts';
import { drawOutline } from './bones.ts';
import { frameFields, type Panel } from './frame-fields.ts';
import { framePlate } from './frame-plate.ts';
import type { Palette } from './ink.ts';
import { Sheet } from './sheet.ts';
import { fitted, isBeam, legCount } from './view.ts';
import { plain } from './words.ts';

export interface StructureDrawing {
  /** SVG, 680 px wide: structure, loads and dimensions; of a beam, its fields as well. */
  readonly main: string;
  /** SVG, the fields of a frame; none for a beam. */
  readonly panels: readonly Panel[];
}

/** A structure of more legs than this is drawn as an outline: at this size nothing on it could be read. */
export const MOST_LEGS = 600;

export function structureDrawing(
  structure: Structure,
  acting: Acting,
  units: DisplayUnits,
  palette: Palette = 'page',
): StructureDrawing {
  if (legCount(structure) > MOST_LEGS) return { main: outline(structure, palette), panels: [] };
  if (isBeam(structure)) return { main: beamPlate(structure, acting, units, palette), panels: [] };
  return {
    main: framePlate(structure, acting, units, palette),
    panels: frameFields(structure, acting, units, palette),
  };
}

function outline(structure: Structure, palette: Palette): string {
  const sheet = new Sheet(SHEET_WIDTH, palette);
  drawOutline(sheet, structure, fitted(structure, { left: 20, right: SHEET_WIDTH - 20, top: -330, bottom: 0 }));
  const words = `${structure.members.length} members and bars: names, loads and fields are not drawn.`;
  sheet.words(plain(words), { at: { x: 0, y: Math.ceil(sheet.bottom) + 24 }, role: 'soft' });
  return sheet.svg(`${structure.title ?? structure.name}, ${words}`);
}
