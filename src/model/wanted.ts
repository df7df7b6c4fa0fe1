// The section whose I a structure leaves to be chosen.
import type { Section, Structure } from './structure.ts';

/** Undefined where every section has its figures; never more than one in a sound structure. */
export function wantedSection({ sections }: Structure): Section | undefined {
  return sections.find(({ wanted }) => wanted === true);
}
