// A note's result made by hand, so that what is printed of it can be told to the letter.
import type { Diagnostic } from '../../src/language/diagnostic.ts';
import type { Answer, NoteResult, StructureResult } from '../../src/note/result.ts';
import { FORCE, LENGTH } from '../../src/quantity/dimension.ts';
import { METRIC } from '../../src/quantity/display.ts';

export function resultWith(parts: Partial<NoteResult>): NoteResult {
  return {
    path: 'rafter.md',
    text: '',
    frontMatter: {},
    isCalculation: true,
    fences: [],
    structures: [],
    answers: [],
    values: [],
    prose: [],
    names: [],
    diagnostics: [],
    fingerprint: '3f9c-a20b-771e',
    ...parts,
  };
}

export function structureWith(parts: Partial<StructureResult>): StructureResult {
  return {
    structure: undefined,
    name: 'Rafter',
    range: { start: 0, end: 0 },
    analysis: undefined,
    combinations: [],
    answers: [],
    assumptions: [],
    display: METRIC,
    shows: [],
    withheld: undefined,
    remedies: [],
    ...parts,
  };
}

export function answerWith(parts: Partial<Answer>): Answer {
  return {
    structure: 0,
    name: 'tip',
    kind: 'require',
    measure: 'deflection at C',
    under: 'service',
    governing: null,
    loaded: undefined,
    quantity: { value: -0.001648703049, dimension: LENGTH },
    unit: 'm',
    display: '1.649 mm up',
    place: undefined,
    sides: undefined,
    asked: undefined,
    comparison: '<=',
    limit: { value: 0.01, dimension: LENGTH },
    limitDisplay: 'span B–C 1.800 m / 180 = 10.00 mm',
    source: undefined,
    utilisation: 0.1648703,
    status: 'ok',
    stiffnessFactor: undefined,
    check: { difference: 1e-13, residual: 1e-15, energy: 0 },
    range: { start: 0, end: 0 },
    nameRange: { start: 0, end: 0 },
    ...parts,
  };
}

/** The four answers of a canopy rafter: met, met with a place, not met, not checked. */
export const RAFTER = resultWith({
  frontMatter: { title: 'Slip canopy' },
  structures: [structureWith({ title: 'Canopy rafter R1', answers: [0, 1, 2, 3] })],
  answers: [
    answerWith({}),
    answerWith({
      name: 'mid',
      measure: 'sag of R1 between A and B',
      governing: 'service (b): dead + 0.7 snow',
      display: '14.443 mm',
      limitDisplay: 'span A–B 4.800 m / 360 = 13.33 mm',
      utilisation: 1.0832,
      status: 'fails',
    }),
    answerWith({
      name: 'seat',
      measure: 'reaction at A',
      under: 'uplift',
      quantity: { value: 998.1, dimension: FORCE },
      display: '0.9981 kN',
      comparison: '>=',
      limitDisplay: '0 kN',
      utilisation: undefined,
    }),
    answerWith({
      name: 'slope',
      kind: 'find',
      measure: 'rotation at C',
      display: '0.0005924 rad',
      comparison: undefined,
      limit: undefined,
      limitDisplay: undefined,
      utilisation: undefined,
      status: 'none',
    }),
  ],
});

/** A diagnostic at the words, which stand once in the text. */
export function diagnosticAt(text: string, words: string, parts: Partial<Diagnostic> = {}): Diagnostic {
  const start = text.indexOf(words);
  if (start < 0) throw new Error(`"${words}" is not in the text`);
  return {
    code: 'unknown-name',
    severity: 'error',
    range: { start, end: start + words.length },
    message: 'No section named RSH.',
    ...parts,
  };
}
