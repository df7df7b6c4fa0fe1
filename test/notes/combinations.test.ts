// Combinations: factors, alternatives, which of them governs, and expressions worked one alternative at a time.
import { describe, expect, it } from 'vitest';
import { checkAnswers, codesOf, solved } from './check-note.ts';

describe('alternatives', () => {
  // A simple beam of 4 m: each case acts by R = 2w and M = 2w at midspan.
  const note = solved(`
section S: EI 10 MN m2
let psi0 = 0.7
member B1: A -- 4 m -- B
support A: pinned
support B: roller
load dead: 3 kN/m down on B1
load live: 5 kN/m down on B1
load wind: 4 kN/m up on B1
load lean: 1 kN m clockwise at A

combine service: dead + live
combine strength (a): 1.35 dead + 1.5 live
combine strength (b): 1.35 dead + (1.5 * psi0) live + 1.5 wind
combine strength (c): 1.0 dead + 1.5 wind +- lean
combine light: dead - 0.5 * live

find most:  moment in B1 under strength
find one:   moment in B1 under strength (b)
find alone: moment in B1 under wind
find light_M: moment in B1 under light
find any:   moment in B1 under all
find seat:  reaction at A under strength
require pull: reaction at A under strength >= -10 kN "anchors"
require push: reaction at A under strength <= 25 kN "bearing"
find hold: reaction at B under strength
require bend: moment in B1 under strength <= 25 kN m "test"
require low:  moment at 2 m from A on B1 under strength >= -7 kN m "test"`);

  it('for a find and for <= give the largest in size, and say which governs', () => {
    checkAnswers(note, {
      most: { value: (1.35 * 3e3 + 1.5 * 5e3) * 2, under: 'strength', governing: 'strength (a): 1.35 dead + 1.5 live' },
      seat: { value: (1.35 * 3e3 + 1.5 * 5e3) * 2, governing: 'strength (a):' },
      bend: { value: 23.1e3, limit: 25e3, utilisation: 0.924, status: 'ok', governing: 'strength (a):' },
    });
  });

  it('for >= give the least', () => {
    // A clockwise couple at A is borne by B upwards, so that the reaction at A falls by M0/L.
    const lifted = (3e3 - 1.5 * 4e3) * 2 - 1e3 / 4;
    checkAnswers(note, {
      pull: { value: lifted, status: 'ok', utilisation: null, governing: 'strength (c+):' },
      push: { value: 23.1e3, status: 'ok', utilisation: 0.924 },
      // Half of the couple at midspan, hogging where it acts anticlockwise.
      low: { value: (3e3 - 6e3) * 2 - 500, status: 'ok', governing: 'strength (c-):' },
    });
  });

  it('can be asked for one at a time, and so can a case', () => {
    checkAnswers(note, {
      one: { value: (1.35 * 3e3 + 1.05 * 5e3 - 1.5 * 4e3) * 2, under: 'strength (b)', governing: null },
      alone: { value: -8e3, under: 'wind', governing: null },
      light_M: { value: (3e3 - 2.5e3) * 2, governing: null },
    });
  });

  it('are all looked through under all', () => {
    checkAnswers(note, { any: { value: 23.1e3, governing: 'strength (a)' } });
    expect(codesOf(note)).toEqual([]);
  });
});

describe('expressions of measures', () => {
  it('are worked one alternative at a time, never as a mixture', () => {
    // A post of 3 m: N = 100 kN by its head load, M = 15 kN m at the foot by its push. (a) 135/600 + 13.5/40 = 0.5625,
    // (b) 90/600 + 22.5/40 = 0.7125; the mixture of the two worst would be 0.7875.
    const note = solved(`
section S: EI 10 MN m2
member C1: A -- 3 m up -- B
support A: fixed
load dead: 100 kN down at B
load push: 5 kN right at B
combine strength (a): 1.35 dead + 0.9 push
combine strength (b): 0.9 dead + 1.5 push
require post: compression in C1 / 600 kN + hogging in C1 / 40 kN m under strength <= 1 "interaction"
find ratio: moment at A in C1 / force in C1 under strength`);
    checkAnswers(note, {
      post: { value: 90 / 600 + 22.5 / 40, unit: '', limit: 1, utilisation: 0.7125, governing: 'strength (b):' },
      ratio: { value: 22.5 / 90, unit: 'm', governing: 'strength (b):' },
    });
  });

  it('may hold earlier results, which keep their own combination', () => {
    const note = solved(`
section S: EI 10 MN m2
member B1: A -- 6 m -- B
support A: pinned
support B: roller
load dead: 2 kN/m down on B1
load live: 3 kN/m down on B1
combine total: dead + live
find first: deflection of B1 under dead
require net: deflection of B1 - first under total <= span/360 "live part"
require camber: first - 4 mm <= 2 mm "less precamber"`);
    const unit = (5 * 6 ** 4) / (384 * 10e6);
    checkAnswers(note, {
      first: { value: 2e3 * unit, under: 'dead' },
      net: { value: 3e3 * unit, under: 'total' },
      camber: { value: 2e3 * unit - 0.004, under: null, governing: null, status: 'ok' },
    });
  });

  it('of two combinations with alternatives are refused', () => {
    const note = solved(`
section S: EI 10 MN m2
member B1: A -- 6 m -- B
support A: pinned
support B: roller
load dead: 2 kN/m down on B1
load live: 3 kN/m down on B1
combine one (a): dead + live
combine one (b): dead
combine two (a): 1.2 dead + live
combine two (b): 0.9 dead
find first: deflection of B1 under one
find both:  deflection of B1 - first under two`);
    expect(codesOf(note)).toEqual(['bad-question']);
    checkAnswers(note, { both: { value: null } });
  });
});

describe('what may be left out', () => {
  it('the combination, where there is only one', () => {
    const note = solved(`
section S: EI 10 MN m2
member B1: A -- 2 m -- B
support A: fixed
load dead: 3 kN down at B
load live: 2 kN down at B
combine service: dead + live
find tip: deflection at B`);
    checkAnswers(note, { tip: { value: (5e3 * 8) / (3 * 10e6), under: 'service', governing: null } });
  });

  it('the combination and the cases’ names, where there is only one case', () => {
    const note = solved(`
section S: EI 10 MN m2
member B1: A -- 2 m -- B
support A: fixed
load dead: 3 kN down at B
find tip: deflection at B`);
    checkAnswers(note, { tip: { value: (3e3 * 8) / (3 * 10e6), under: 'dead' } });
  });

  it('but not between several', () => {
    const note = solved(`
section S: EI 10 MN m2
member B1: A -- 2 m -- B
support A: fixed
load dead: 3 kN down at B
load live: 2 kN down at B
find tip: deflection at B`);
    expect(note.answers[0]!.value).toBeNull();
    expect(codesOf(note)).toContain('bad-question');
  });
});
