// What a drawing is a drawing of: a combination's alternative or a case alone, with what comes of it.
import type { Solution } from '../mechanics/solution.ts';

export interface Acting {
  /** `service`, `strength (b)`, `dead`. */
  readonly name: string;
  /** One for each of the structure's cases. */
  readonly factors: readonly number[];
  /** Undefined where nothing could be solved: then the loads are drawn alone. */
  readonly solution: Solution | undefined;
}

/** px: a sheet is the page's column; two panels stand side by side in it. */
export const SHEET_WIDTH = 680;
export const PANEL_WIDTH = 330;
