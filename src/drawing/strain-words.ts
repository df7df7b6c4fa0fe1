// Heat and lack of fit in words. They are told, not drawn: they lie on whole members and push nowhere.
import type { Structure } from '../model/structure.ts';
import { type DisplayUnits, temperatureUnit } from '../quantity/display.ts';
import type { ActingCase, Strain } from './acting-loads.ts';
import { asGivenWithUnit } from './figures.ts';
import type { Sheet } from './sheet.ts';

/** More members of one statement are counted. */
const MOST_NAMES = 3;

/** One for each statement: `R1`, `heated 25 K`; `d1, d2`, `3 mm too long`. */
export function strainLines(
  structure: Structure,
  { strains }: ActingCase,
  units: DisplayUnits,
): { readonly who: string; readonly words: string }[] {
  const byStatement = new Map<string, Strain[]>();
  for (const strain of strains) {
    const key = `${strain.range.start} ${strain.range.end} ${strainWords(strain, units)}`;
    if (byStatement.get(key)?.push(strain) === undefined) byStatement.set(key, [strain]);
  }
  return [...byStatement.values()].map(alike => {
    const names = alike.map(({ member }) => structure.members[member]?.name ?? '');
    const who = names.length > MOST_NAMES ? `${names.length} members` : names.join(', ');
    return { who, words: strainWords(alike[0] as Strain, units) };
  });
}

/** `heated 25 K`, `heated 30 K above, 5 K below`, `3 mm too long`. */
export function strainWords(strain: Strain, units: DisplayUnits): string {
  if (strain.kind === 'lengthen') {
    return `${asGivenWithUnit(Math.abs(strain.amount), units.deflection)} too ${strain.amount < 0 ? 'short' : 'long'}`;
  }
  const unit = temperatureUnit(units);
  const { above, below } = strain;
  if (above === below) return `${above < 0 ? 'cooled' : 'heated'} ${asGivenWithUnit(Math.abs(above), unit)}`;
  return `heated ${asGivenWithUnit(above, unit)} above, ${asGivenWithUnit(below, unit)} below`;
}

/** Over everything else, at the left edge of the sheet. */
export function tellStrains(
  sheet: Sheet,
  structure: Structure,
  cases: readonly ActingCase[],
  units: DisplayUnits,
): void {
  const lines = cases.flatMap(acting => strainLines(structure, acting, units).map(line => ({ ...line, acting })));
  // From the lowest up.
  for (const { who, words, acting } of lines.toReversed()) {
    const label = [{ text: acting.name, as: 'bold' as const }, { text: ` ${who} ${words}` }];
    sheet.words(label, { at: { x: 0, y: Math.floor(Math.min(0, sheet.top)) - 8 }, role: 'load' });
  }
}
