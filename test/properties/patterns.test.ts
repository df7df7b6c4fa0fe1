// The worst set of loaded spans is found without trying any: it is as bad as the worst of all sets, tried one by one.
import fc from 'fast-check';
import { expect } from 'vitest';
import {
  combine,
  envelopeAlong,
  evaluate,
  type FieldPiece,
  fieldAt,
  measure,
  roundingIn,
  type Solution,
  sizesOf,
  worstPatterns,
} from '../../src/mechanics/index.ts';
import { dividePatterns, spansUnder } from '../../src/model/patterns.ts';
import type { ResolvedMeasure } from '../../src/model/question.ts';
import type { Structure } from '../../src/model/structure.ts';
import { analysed, holds } from './run.ts';
import { structures } from './structures.ts';

const ALONG = [
  'deflection',
  'sway',
  'rotation',
  'moment',
  'shear',
  'sagging',
  'hogging',
  'force',
  'compression',
] as const;

const SEEKS = ['size', 'greatest', 'least'] as const;

/** Past so many spans a structure is left out: their sets double with each. */
const MOST_SPANS = 6;

holds('the worst set of spans', fc.tuple(structures(), fc.nat(999), fc.nat(99)), ([plain, number, place]) => {
  const structure = patterned(plain);
  const factors = structure.cases.map((_, k) => [1, -0.4, 1.5][k % 3]!);
  const spans = spansUnder(structure.cases, factors);
  if (spans.length === 0) return;
  const analysis = analysed(structure);
  const sets = Array.from({ length: 2 ** spans.length }, (_, set) =>
    factors.map((factor, k) => (spans.includes(k) && ((set >> spans.indexOf(k)) & 1) === 0 ? 0 : factor)),
  ).map(set => combine(analysis, set));
  for (const asked of measuresOf(structure, number, place)) {
    for (const seek of SEEKS) {
      const worked = (solution: (typeof sets)[number]) => measure(structure, solution, asked, seek).value;
      const score = (value: number) => (seek === 'size' ? Math.abs(value) : seek === 'least' ? -value : value);
      const all = sets.map(worked);
      const found = worstPatterns(analysis, factors, asked).map(set => worked(combine(analysis, set)));
      const rounding = 1e-9 * Math.max(...all.map(Math.abs));
      const best = Math.max(...found.map(score));
      expect(Math.abs(best - Math.max(...all.map(score))), `${seek} ${JSON.stringify(asked)}`).toBeLessThanOrEqual(
        rounding,
      );
    }
  }
});

holds('an envelope over sets of spans and alternatives', fc.tuple(structures(), fc.nat(999)), ([plain, number]) => {
  const structure = patterned(plain);
  const alternatives = [1, 2].map(turn => structure.cases.map((_, k) => [1, -0.4, 1.5, 0][(turn * k + turn) % 4]!));
  const analysis = analysed(structure);
  const member = number % structure.members.length;
  const sets = alternatives.flatMap(factors => {
    const spans = spansUnder(structure.cases, factors);
    return Array.from({ length: 2 ** spans.length }, (_, set) =>
      combine(
        analysis,
        factors.map((factor, k) => (spans.includes(k) && ((set >> spans.indexOf(k)) & 1) === 0 ? 0 : factor)),
      ),
    );
  });
  const scale = Math.max(...sets.map(solution => sizesOf(solution).moment));
  for (const sense of [1, -1] as const) {
    const quantityOf = (solution: Solution) => ({
      polynomial: (piece: FieldPiece) => piece.bendingMoment,
      rounding: () => roundingIn(solution, 'moment'),
    });
    const pieces = envelopeAlong(analysis, member, quantityOf, alternatives, sense);
    let reached = 0;
    for (const { start, from, to, end, polynomial, factors } of pieces) {
      expect(start + from).toBeCloseTo(reached, 9);
      reached = end;
      const s = from + (0.1 + 0.008 * (number % 100)) * (to - from);
      const distance = start + s;
      const all = sets.map(({ members }) => fieldAt(members[member]!, distance).bendingMoment);
      const own = fieldAt(combine(analysis, factors).members[member]!, distance).bendingMoment;
      const value = evaluate(polynomial, s);
      expect(Math.abs(sense * value - Math.max(...all.map(one => sense * one)))).toBeLessThanOrEqual(1e-9 * scale);
      expect(Math.abs(value - own)).toBeLessThanOrEqual(1e-9 * scale);
    }
    expect(reached).toBeCloseTo(structure.members[member]!.length, 9);
  }
});

/** Line loads are patterned, as many of them as keep the number of spans small. */
function patterned(structure: Structure): Structure {
  let divided = structure;
  for (const [index, load] of structure.loads.entries()) {
    if (load.kind !== 'line') continue;
    const loads = divided.loads;
    const at = loads.indexOf(structure.loads[index]!);
    const next = dividePatterns({ ...divided, loads: loads.with(at, { ...load, patterned: true }) });
    if (next.cases.length - structure.cases.length <= MOST_SPANS) divided = next;
  }
  return divided;
}

function measuresOf(structure: Structure, number: number, place: number): ResolvedMeasure[] {
  const member = number % structure.members.length;
  const { length } = structure.members[member]!;
  const kind = ALONG[number % ALONG.length]!;
  const at = { kind: 'along', member, distance: (place / 99) * length } as const;
  const stretch = { start: 0.1 * length, end: 0.7 * length };
  return [
    { kind, along: [member, (member + 1) % structure.members.length] },
    { kind, along: [member], stretch },
    { kind: 'sag', along: [member], stretch, reversed: number % 2 === 0 },
    { kind: 'shear', at },
    { kind: 'moment', at },
    { kind: 'deflection', at: { kind: 'point', point: number % structure.points.length } },
    { kind: 'rotation', at: { kind: 'point', point: number % structure.points.length } },
    { kind: 'reaction', support: number % structure.supports.length, component: 'vertical' },
  ];
}
