// The name of a case beside its loads, with the factor it is taken with.
import type { ActingCase } from './acting-loads.ts';
import { asGiven, THIN } from './figures.ts';
import type { Sheet } from './sheet.ts';
import type { Run } from './words.ts';

/** At the left edge of the sheet. */
export function drawCaseName(sheet: Sheet, { name, factor }: ActingCase, baseline: number): void {
  const times: Run[] = factor === 1 ? [] : [{ text: `${THIN}×${THIN}${asGiven(factor, { text: '', size: 1 })}` }];
  sheet.words([{ text: name, as: 'bold' }, ...times], { at: { x: 0, y: baseline }, role: 'load' });
}
