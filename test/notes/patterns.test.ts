// Patterned loads: for each result the worst set of loaded spans, exactly, and named.
import { describe, expect, it } from 'vitest';
import { printPage } from '../../src/page/print-page.ts';
import { checkAnswers, codesOf, evaluated, fenced, solved } from './check-note.ts';

/** Three equal spans L under w on any of them: coefficients of wL and wL². */
const [L, w] = [4, 3e3];
const THREE = `
section S: EI 20 MN m2
member R1: A -- 4 m -- B -- 4 m -- C -- 4 m -- D
support A: pinned
support B: roller
support C: roller
support D: roller
load live: 3 kN/m down on R1, patterned`;

describe('a patterned load', () => {
  it('is on the spans that are worst for each result', () => {
    const note = solved(`${THREE}
find over:   moment at B in R1 under live
find most:   sagging in R1 under live
find inner:  sagging in R1 between B and C under live
find upper:  hogging in R1 under live
find end:    reaction at A under live
require low: reaction at A under live >= -1 kN "clips"
require mid: reaction at B under live <= 15 kN "bearing"
find jump:   shear at B in R1 under live`);
    expect(codesOf(note)).toEqual([]);
    checkAnswers(note, {
      // By the three-moment equation: 7/60 with the spans either side, 1/60 less with the third.
      over: { value: (-7 / 60) * w * L ** 2, governing: 'live on A–B, B–C' },
      // The outer reaction is 9/20 wL with both end spans, and M = R²/2w.
      most: {
        value: (0.45 ** 2 / 2) * w * L ** 2,
        governing: 'live on A–B, C–D',
        place: { member: 'R1', from: 'A', distance: 0.45 * L },
      },
      // Supports at 1/20 with the inner span alone.
      inner: { value: (1 / 8 - 1 / 20) * w * L ** 2, governing: 'live on B–C' },
      upper: { value: (7 / 60) * w * L ** 2, governing: 'live on A–B, B–C' },
      end: { value: 0.45 * w * L, governing: 'live on A–B, C–D' },
      low: { value: -0.05 * w * L, governing: 'live on B–C', status: 'ok' },
      mid: { value: 1.2 * w * L, governing: 'live on A–B, B–C', status: 'ok' },
      jump: { value: (-37 / 60) * w * L, governing: 'live on A–B, B–C' },
    });
  });

  it('takes part in a combination with its factor, beside what always acts', () => {
    const note = solved(`${THREE}
load dead: 2 kN/m down on R1
combine strength (a): 1.35 dead + 1.5 live
combine strength (b): 1.0 dead + 1.5 live
find most:    sagging in R1 between B and C under strength
require seat: reaction at A under strength >= 0 kN "clips"
find lone:    reaction at A under strength (b)`);
    const dead = 2e3;
    checkAnswers(note, {
      most: {
        value: (1.35 * dead * 0.025 + 1.5 * w * 0.075) * L ** 2,
        governing: 'strength (a): 1.35 dead + 1.5 live, live on B–C',
      },
      seat: {
        value: (0.4 * dead - 0.05 * 1.5 * w) * L,
        governing: 'strength (b): 1.0 dead + 1.5 live, live on B–C',
        status: 'ok',
      },
      lone: {
        value: (0.4 * dead + 0.45 * 1.5 * w) * L,
        governing: 'strength (b): 1.0 dead + 1.5 live, live on A–B, C–D',
      },
    });
  });

  it('counts an overhang as a span, and parts of a load where spans end', () => {
    const note = solved(`
section S: EI 20 MN m2
member R1: A -- 6 m -- B -- 2 m -- C
support A: pinned
support B: roller
load live: 1 kN/m to 3 kN/m down on R1 from 2 m to 8 m, patterned
find tip:  moment at B in R1
find most: sagging in R1
require lift: reaction at A >= 0 kN "clips"`);
    // Over B–C the load rises from 7/3 to 3 kN/m.
    const overhang = ((7 / 3) * 2 ** 2) / 2 + ((2 / 3 / 2) * 2 ** 3) / 3;
    checkAnswers(note, {
      tip: { value: -overhang * 1e3, governing: 'live on B–C' },
      lift: { value: (-overhang / 6) * 1e3, governing: 'live on B–C', status: 'fails' },
    });
    expect(note.answers.find(({ name }) => name === 'most')!.governing).toBe('live on A–B');
  });

  it('in an expression has one set of spans for all its measures', () => {
    const note = solved(`${THREE}
find one:   reaction at A - reaction at D under live
find both:  reaction at A + reaction at D under live
find mixed: sagging in R1 / 1 kN m + hogging in R1 / 1 kN m under live
find less:  moment at B in R1 under live
find moved: less + 20 kN m`);
    checkAnswers(note, {
      // A–B puts 13/30 on A and 1/60 on D; C–D the reverse; B–C the same on both.
      one: { value: (13 / 30 - 1 / 60) * w * L, governing: 'live on A–B' },
      both: { value: 0.9 * w * L, governing: 'live on A–B, C–D' },
      // With the spans either side of B, the outer reaction is 1/2 − 7/60.
      mixed: { value: (((1 / 2 - 7 / 60) ** 2 / 2 + 7 / 60) * w * L ** 2) / 1e3, governing: 'live on A–B, B–C' },
      // 20 − 5.6 with the worst set for the moment; more with the one that relieves B, by 1/60.
      moved: { value: 20e3 + (1 / 60) * w * L ** 2, governing: 'live on C–D' },
    });
  });

  it('has alternatives, so that a value cannot hold its result', () => {
    const note = solved(`${THREE}
find most: sagging in R1 under live
let half = most / 2`);
    expect(codesOf(note)).toContain('bad-value');
  });

  it('is refused in an expression that would need too many sets of spans', () => {
    const spans = Array.from({ length: 13 }, (_, i) => ` -- 3 m -- P${i + 1}`).join('');
    const supports = Array.from({ length: 13 }, (_, i) => `support P${i + 1}: roller`).join('\n');
    const beam = `section S: EI 20 MN m2
member R1: P0${spans}
support P0: pinned
${supports}
load live: 3 kN/m down on R1, patterned`;
    const note = solved(`${beam}
find sum:  sagging in R1 + hogging in R1
find most: sagging in R1
find ends: reaction at P0 + reaction at P1`);
    expect(codesOf(note)).toEqual(['too-large']);
    checkAnswers(note, { sum: { value: null } });
    expect(note.answers.find(({ name }) => name === 'most')!.governing).toBe(
      `live on P0–P1${[2, 4, 6, 8, 10, 12].map(i => `, P${i}–P${i + 1}`).join('')}`,
    );
  });

  it('says on the page which spans are loaded, and where all are', () => {
    const html = printPage(evaluated(fenced(`${THREE}\nfind most: sagging in R1 under live`)), {
      stylesheet: '',
      version: '1',
    });
    expect(html).toContain('live on A–B, C–D');
    expect(html).toContain('Patterned loads stand on all their spans here: live.');
  });
});
