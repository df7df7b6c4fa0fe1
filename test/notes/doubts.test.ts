// What an experienced checker would doubt although the theory is followed: each warning where it is due, with its figure
// worked by hand, and none where it is not.
import { describe, expect, it } from 'vitest';
import { codesOf, solved } from './check-note.ts';

/** The messages of one code. */
function told(body: string, code: string): string[] {
  return solved(body).diagnostics.flatMap(one => (one.code === code ? [one.message] : []));
}

describe('a movement that is not small', () => {
  // PL³/3EI on 2 m with EI 10 kN m²: 267 mm a kN, a fiftieth being 40 mm.
  const cantilever = (load: string) => `
section S: EI 10 kN m2
member R1: A -- 2 m -- B
support A: fixed
load live: ${load} down at B
find tip: deflection at B`;

  it('is told with the length that it goes across', () => {
    expect(told(cantilever('0.2 kN'), 'large-movement')).toEqual([
      'R1 moves 53.33 mm across the 2.000 m from A to B under live, more than a fiftieth of it: small-displacement theory is doubtful there.',
    ]);
    expect(codesOf(solved(cantilever('0.149 kN')))).toEqual([]);
  });

  it('is not told of what moves as a whole with its supports', () => {
    const note = solved(`
section S: EI 10 MN m2
member R1: A -- 2 m -- B
support A: pinned
support B: roller
load sink: move A by 200 mm down
load sink: move B by 200 mm down
find drop: deflection at A`);
    expect(codesOf(note)).toEqual([]);
  });

  it('names the worst of the alternatives, once', () => {
    const found = told(
      `${cantilever('0.1 kN')} under strength
combine strength (a): 1.35 live
combine strength (b): 2 live`,
      'large-movement',
    );
    expect(found).toHaveLength(1);
    expect(found[0]).toContain('53.33 mm across the 2.000 m from A to B under strength (b)');
  });
});

describe('a strut past its elastic critical force', () => {
  /** Euler: π² · 100 kN m² / (3 m)² = 109.66 kN. */
  const strut = (load: string, more = '') => `
section S: EI 100 kN m2
member C1: A -- 1.5 m up -- M -- 1.5 m up -- B
support A: pinned
support B: hold x
${more}
load dead: ${load} down at B
find push: compression in C1`;

  it('is told with both forces', () => {
    expect(told(strut('142 kN'), 'slender-compression')).toEqual([
      'C1 carries 142.0 kN in compression under dead, more than its elastic critical force of 109.7 kN on its own length of 3.000 m: these movements are not reliable.',
    ]);
    expect(codesOf(solved(strut('109 kN')))).toEqual([]);
    expect(codesOf(solved(strut('110 kN')))).toEqual(['slender-compression']);
  });

  it('is stronger by four where it is held in the middle', () => {
    expect(codesOf(solved(strut('438 kN', 'support M: hold x')))).toEqual([]);
    expect(codesOf(solved(strut('439 kN', 'support M: hold x')))).toEqual(['slender-compression']);
  });

  it('is not told of tension, nor of a bar whose I is not known', () => {
    expect(codesOf(solved(strut('142 kN').replace('down', 'up')))).not.toContain('slender-compression');
    const truss = `
section Rod: EA 1000 MN
bars r, Rod: A -- 3 m right, 2 m up -- K -- 3 m right, 2 m down -- B
bar t, Rod: A -- B
support A: pinned
support B: roller
load dead: 900 kN down at K
find push: compression in r`;
    expect(codesOf(solved(truss))).toEqual([]);
    // Each rafter carries 900/2 · √13/2; π² · 100 kN m² / 13 m² = 75.92 kN.
    const [found, ...others] = told(truss.replace('EA 1000 MN', 'EA 1000 MN, EI 100 kN m2'), 'slender-compression');
    expect(others).toEqual([]);
    expect(found).toContain('r1 carries 811.2 kN in compression');
    expect(found).toContain('of 75.92 kN');
    expect(found).toMatch(/So does r2\.$/);
  });
});

describe('uplift that nobody asks about', () => {
  // 6 kN at the end of an overhang of 1 m lifts A by 6 · 1/4 = 1.5 kN.
  const beam = (questions: string, support = 'pinned') => `
section S: EI 10 MN m2
member R1: A -- 4 m -- B -- 1 m -- C
support A: ${support}
support B: roller
load live: 6 kN down at C
find tip: deflection at C
${questions}`;

  it('is told at its support, with its force', () => {
    expect(told(beam(''), 'unasked-uplift')).toEqual([
      'A must hold down 1.500 kN under live, and no question asks about this reaction.',
    ]);
  });

  it('is not told where a question asks about it', () => {
    expect(told(beam('find seat: reaction at A'), 'unasked-uplift')).toEqual([]);
    expect(told(beam('find both: reaction at A + 2 kN'), 'unasked-uplift')).toEqual([]);
    // Another component does not look at it.
    expect(told(beam('find thrust: reaction at A horizontal'), 'unasked-uplift')).toHaveLength(1);
    // A fixed foot is anchored anyway.
    expect(told(beam('', 'fixed'), 'unasked-uplift')).toEqual([]);
  });

  it('is a warning under a combination, and a hint under a case alone, which others may weigh down', () => {
    expect(codesOf(solved(beam('')))).toEqual([]);
    expect(codesOf(solved(beam('combine service: 1.0 live')))).toEqual(['unasked-uplift']);
  });

  it('finds the spans of a patterned load that lift most', () => {
    // Three equal spans of 4 m: an end support is lifted by wL/20 with the middle span loaded, an inner one by wL/10 with
    // the far end span loaded (three moments).
    const note = solved(`
section S: EI 10 MN m2
member R1: A -- 4 m -- B -- 4 m -- C -- 4 m -- D
support A: pinned
support B: roller
support C: roller
support D: roller
load live: 5 kN/m down on R1, patterned
find mid: sagging in R1`);
    expect(note.diagnostics.map(({ message }) => message)).toEqual([
      'B must hold down 2.000 kN under live, live on C–D, and no question asks about this reaction. So must C, A and D.',
    ]);
  });

  it('looks at combinations, not at their cases alone', () => {
    const note = solved(`${beam('').replace('find tip: deflection at C', 'find tip: deflection at C under service')}
load dead: 3 kN/m down on R1 from A to B
combine service: dead + live`);
    // 3 · 4/2 − 1.5 > 0.
    expect(codesOf(note)).toEqual([]);
  });
});

describe('what is said and not used', () => {
  const note = (more: string) => `
section S: EI 10 MN m2
member R1: A -- 4 m -- B
support A: pinned
support B: roller
load live: 6 kN/m down on R1
combine service: live
combine strength: 1.5 live
${more}`;

  it('is told of a combination that nothing asks about', () => {
    expect(told(note('find mid: deflection of R1 under service'), 'unused-combination')).toEqual([
      'Nothing asks about strength.',
    ]);
  });

  it('is not told where all are asked about, or shown, or nothing is asked yet', () => {
    expect(codesOf(solved(note('find mid: deflection of R1 under all')))).toEqual([]);
    expect(
      codesOf(solved(note('find mid: deflection of R1 under service\nshow: moment in R1 under strength'))),
    ).toEqual([]);
    expect(codesOf(solved(note('find mid: deflection of R1 under service\nshow: reactions')))).toEqual([]);
    expect(codesOf(solved(note('')))).toEqual([]);
  });

  it('is told of one in the head that no structure asks about', () => {
    const found = told(
      `combine service: live
combine storm: 2 live
section S: EI 10 MN m2
structure One
member R1: A -- 4 m -- B
support A: fixed
load live: 6 kN/m down on R1
find mid: deflection of R1 under service`,
      'unused-combination',
    );
    expect(found).toEqual(['Nothing asks about storm.']);
  });
});

describe('what carries nothing', () => {
  it('is told of a member without load and force', () => {
    const found = told(
      `
section S: EI 10 MN m2
member R1: A -- 4 m -- B
member R2: B -- 2 m -- C
support A: fixed
load live: 6 kN/m down on R1
find mid: deflection at C`,
      'idle-member',
    );
    expect(found).toEqual(['R2 carries no load and no force in any case.']);
  });

  it('is a hint only of a bar, which may brace all the same', () => {
    // The post of a truss under a load at its head carries nothing.
    const note = solved(`
section Rod: EA 100 MN
bars b, Rod: A -- 2 m -- M -- 2 m -- B
bars r, Rod: A -- 2 m right, 2 m up -- K -- B
bar  p, Rod: M -- K
support A: pinned
support B: roller
load live: 6 kN down at K
find drop: deflection at K`);
    expect(codesOf(note)).toEqual([]);
    expect(note.diagnostics.map(({ code, message }) => [code, message])).toEqual([
      ['idle-member', 'p carries no load and no force in any case.'],
    ]);
  });

  it('is told of a self-weight without density', () => {
    const note = solved(`
material M: E 10 GPa, density 0 kg/m3
section S: solid 100 mm x 200 mm, M
member R1: A -- 4 m -- B
support A: fixed
load dead: self-weight
load dead: 1 kN down at B
find tip: deflection at B`);
    expect(note.diagnostics.map(({ code, message }) => [code, message])).toEqual([
      ['no-weight', 'S weighs nothing: this self-weight is zero there, as the density is.'],
    ]);
  });
});
