// The name of a case beside its loads, with the factor it is taken with.
import type { ActingCase } from './acting-loads.ts';
import { asGiven, THIN } from './figures.ts';
import type { Sheet } from './sheet.ts';
import type { Run } from './words.ts';

/** Of a case whose loads are too many to be drawn, a line over everything else. */
export function tellUndrawn(sheet: Sheet, cases: readonly ActingCase[]): void {
  for (const { name, undrawnLines, undrawnSingles } of cases) {
    const parts = [
      ...(undrawnLines > 0 ? [`${undrawnLines} stretches of line loads`] : []),
      ...(undrawnSingles > 0 ? [`the ${undrawnSingles} smallest of its single loads`] : []),
    ];
    if (parts.length === 0) continue;
    const words: Run[] = [{ text: name, as: 'bold' }, { text: ` not drawn: ${parts.join(', ')}` }];
    sheet.words(words, { at: { x: 0, y: Math.floor(Math.min(0, sheet.top)) - 8 }, role: 'load' });
  }
}

/** At the left edge of the sheet. */
export function drawCaseName(sheet: Sheet, { name, factor }: ActingCase, baseline: number): void {
  const times: Run[] = factor === 1 ? [] : [{ text: `${THIN}×${THIN}${asGiven(factor, { text: '', size: 1 })}` }];
  sheet.words([{ text: name, as: 'bold' }, ...times], { at: { x: 0, y: baseline }, role: 'load' });
}
