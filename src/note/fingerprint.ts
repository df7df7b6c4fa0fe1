// A short mark of everything that a note's results depend on. Prose, comments, layout and the order of independent lines
// do not count; any figure of a structure, a combination, a question or a limit does.
import type { Answer, NamedValue, StructureResult } from './result.ts';
import { solutionKey } from './solved.ts';

/** The major version of the solver: results of two versions may differ in digits that are shown. */
const SOLVER = 1;

/** `3f9c-a20b-771e`: 48 bits, enough to tell states of one note apart; no defence against forgery. */
export function fingerprintOf(
  structures: readonly StructureResult[],
  answers: readonly Answer[],
  values: readonly NamedValue[],
): string {
  const state = JSON.stringify([
    SOLVER,
    structures.map(({ name, structure, combinations }) => [
      name,
      structure === undefined ? '' : solutionKey(structure),
      structure === undefined
        ? []
        : [structure.points, structure.members, structure.cases].map(all => all.map(({ name }) => name)),
      combinations.map(({ name, alternatives }) => [
        name,
        alternatives.map(({ label, factors }) => [label ?? '', factors]),
      ]),
    ]),
    answers.map(({ structure, name, kind, measure, under, comparison, limit }) => [
      structure,
      name,
      kind,
      measure,
      under,
      comparison ?? '',
      limit?.value ?? '',
    ]),
    values.map(({ name, quantity }) => [name, quantity?.value ?? '', quantity?.dimension ?? '']),
  ]);
  const digits = hash(state);
  return `${digits.slice(0, 4)}-${digits.slice(4, 8)}-${digits.slice(8)}`;
}

/** 48 bits in hexadecimal: two FNV-1a sums (Fowler, Noll, Vo) over the text from both ends, mixed by the finaliser of MurmurHash3. */
function hash(text: string): string {
  let [forward, backward] = [0x811c9dc5, 0x811c9dc5];
  for (let i = 0; i < text.length; i++) {
    forward = Math.imul(forward ^ text.charCodeAt(i), 0x01000193);
    backward = Math.imul(backward ^ text.charCodeAt(text.length - 1 - i), 0x01000193);
  }
  const low = mix(forward ^ Math.imul(text.length, 0x9e3779b1));
  const high = mix(backward ^ low) & 0xffff;
  return low.toString(16).padStart(8, '0') + high.toString(16).padStart(4, '0');
}

function mix(value: number): number {
  let mixed = value;
  mixed = Math.imul(mixed ^ (mixed >>> 16), 0x85ebca6b);
  mixed = Math.imul(mixed ^ (mixed >>> 13), 0xc2b2ae35);
  return (mixed ^ (mixed >>> 16)) >>> 0;
}
