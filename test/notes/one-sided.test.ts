// Supports that bear only, bars that pull or bear only: what reverses them is withheld, and told where they stand.
import { describe, expect, it } from 'vitest';
import type { NoteReport } from '../../src/note/report.ts';
import { checkAnswers, codesOf, solved } from './check-note.ts';

const told = (note: NoteReport, severity: string) =>
  note.diagnostics.filter(one => one.code === 'force-reversed' && one.severity === severity);

describe('a support that bears only', () => {
  // On the overhang, 3 kN/m lift A by w b²/2a = 3·4/8 = 1.5 kN.
  const BEAM = `
section S: EI 10 MN m2
member B1: A -- 4 m -- B -- 2 m -- C
support A: pinned, bears only
support B: roller
load dead: 1 kN/m down on B1
load live: 3 kN/m down on B1 from B to C
combine service (a): dead
combine service (b): dead + live
combine usual: dead
combine heavy: dead + 1.2 live`;

  it('withholds what an alternative reverses, and only that', () => {
    const note = solved(`${BEAM}
find tip:  rotation at C under service
find seat: reaction at A under usual
find both: seat + tip * 1 kN under usual
let half = tip / 2`);
    // Dead stands on 6 m, its middle 1 m left of B: A bears 6·1/4 = 1.5 kN, which live takes away exactly.
    checkAnswers(note, { seat: 1.5e3 });
    expect(note.answers.find(({ name }) => name === 'tip')!.value).not.toBeNull();

    const lifted = solved(`${BEAM}
find tip:  rotation at C under heavy
find seat: reaction at A under usual
find twice: 2 * tip
require most: reaction at B under all <= 20 kN "bearing"`);
    checkAnswers(lifted, { tip: { value: null }, twice: { value: null }, seat: 1.5e3, most: { value: null } });
    expect(told(lifted, 'error').map(({ line }) => line)).toHaveLength(3);
    expect(told(lifted, 'error')[0]!.message).toBe(
      'tip is withheld: A would have to hold with 0.3000 kN under heavy: dead + 1.2 live, and it bears only.',
    );
    expect(told(lifted, 'warning')).toMatchObject([
      { line: 5, message: 'A would have to hold with 0.3000 kN under heavy: dead + 1.2 live, and it bears only.' },
    ]);
  });

  it('bears at right angles to its surface', () => {
    const note = solved(`
section S: EI 10 MN m2
member Post: A -- 3 m up -- B
support A: pinned
support B: roller on 90 deg, bears only
load east: 2 kN right at 1.5 m from A on Post
load west: 2 kN left at 1.5 m from A on Post
find push: reaction at B horizontal under east
find pull: reaction at B horizontal under west`);
    // The surface at 90° stands to the right and pushes left.
    checkAnswers(note, { push: -1e3, pull: { value: null } });
  });

  it('must be told which way it bears', () => {
    const note = solved(`
section S: EI 10 MN m2
member B1: A -- 4 m -- B
support A: fixed
support B: hold x, bears only
load live: 1 kN down at B
find tip: deflection at B`);
    expect(codesOf(note)).toEqual(['bad-support']);
  });

  it('is tested with the spans that would lift it most', () => {
    const note = solved(`
section S: EI 10 MN m2
member R1: A -- 4 m -- B -- 4 m -- C
support A: pinned
support B: roller
support C: roller, bears only
load live: 3 kN/m down on R1, patterned
find most: sagging in R1`);
    checkAnswers(note, { most: { value: null } });
    // A single span loaded lifts the far end by wL/16.
    expect(told(note, 'warning')[0]!.message).toBe(
      'C would have to hold with 0.7500 kN under live, live on A–B, and it bears only.',
    );
  });
});

describe('a bar that pulls only', () => {
  it('is withheld in compression, one that bears only in tension', () => {
    const frame = (only: string) => `
material S355: E 210 GPa
section Rod: round 20 mm, S355
bar Tie, Rod: A -- 4 m -- B, ${only}
bar Strut, Rod: C -- 4 m right, 3 m up -- B
point C: 0 m, -3 m
support A: pinned
support C: pinned
load dead: 6 kN down at B
load wind: 9 kN up at B
find down: force in Tie under dead
find up:   force in Tie under wind`;
    // Joint B: the strut rises 3 in 4, so that the tie has 4/3 of the load.
    const pulls = solved(frame('pulls only'));
    checkAnswers(pulls, { down: 8e3, up: { value: null } });
    expect(told(pulls, 'warning')).toMatchObject([
      { message: 'Tie would be in compression, 12.00 kN, under wind, and it pulls only.' },
    ]);
    const bears = solved(frame('bears only'));
    checkAnswers(bears, { down: { value: null }, up: -12e3 });
    expect(told(bears, 'warning')).toMatchObject([
      { message: 'Tie would be in tension, 8.000 kN, under dead, and it bears only.' },
    ]);
  });
});
