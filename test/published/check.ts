// Notes against published formulas. In each case the note, the formula for what it asks and the source stand together;
// `from memory` means that the number of a table or a case was not looked up (the formula does not depend on it).
import { expect, test } from 'vitest';
import { checkAnswers, checkValues, codesOf, type Expected, solved } from '../notes/check-note.ts';

/** The figures that the notes write out: span L, stiffness EI, point load P, line load w, couple M. SI. */
export const L = 4.8;
export const EI = 6.4e6;
export const P = 5.2e3;
export const w = 2.75e3;
export const M = 6.3e3;

/** Free curvature, convex upward, where S is 25 K warmer above than below. */
export const kappa = (12e-6 * 25) / 0.4;

/** Put before each note. */
const SECTION = 'section S: EI 6.4 MN m2, depth 0.4 m, alpha 12e-6 /K\n';

/** `id` is for finding a case again. Every answer is held to 1e-9, an answer that should be nil to 1e-9 of `scale`. */
export function check(
  id: string,
  what: string,
  source: string,
  body: string,
  expected: Readonly<Record<string, number | Expected>>,
  scale = 1,
): void {
  test(`${id} ${what} [${source}]`, () => {
    const note = solved(SECTION + body.trim());
    expect(codesOf(note), JSON.stringify(note.diagnostics)).toEqual([]);
    checkAnswers(note, expected, scale);
  });
}

/** The same for the values of a note. */
export function checkLets(
  id: string,
  what: string,
  source: string,
  body: string,
  expected: Readonly<Record<string, number>>,
): void {
  test(`${id} ${what} [${source}]`, () => {
    const note = solved(body.trim());
    expect(codesOf(note), JSON.stringify(note.diagnostics)).toEqual([]);
    checkValues(note, expected);
  });
}

/** Steel Construction Manual, American Institute of Steel Construction. */
export function aisc(number: string, how = 'from memory'): string {
  return `AISC Steel Construction Manual, 15th ed., Table 3-23, case ${number} (${how})`;
}

/** Young, Budynas, Sadegh: Roark's Formulas for Stress and Strain. */
export function roark(number: string): string {
  return `Roark's Formulas for Stress and Strain, 8th ed., Table 8.1, case ${number} (from memory)`;
}

/** The root of a function between two places where its signs differ. */
export function root(f: (x: number) => number, from: number, to: number): number {
  let [low, high] = [from, to];
  for (let step = 0; step < 200; step++) {
    const middle = (low + high) / 2;
    if (Math.sign(f(middle)) === Math.sign(f(low))) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
