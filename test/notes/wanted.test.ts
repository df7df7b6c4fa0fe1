// Sections still to be chosen: movements as multiples of 1/EI, and the least I that meets a limit.
import { describe, expect, it } from 'vitest';
import { toJson } from '../../src/note/report.ts';
import { checkAnswers, codesOf, evaluated, fenced, solved } from './check-note.ts';

const E = 210e9;
const BEAM = `
material S355: E 210 GPa
section X: I wanted, S355
member B1, X: A -- 6 m -- B
support A: pinned
support B: roller
load live: 4 kN/m down on B1`;

describe('I wanted', () => {
  it('tells a movement times EI, and the least I for a limit', () => {
    const note = solved(`${BEAM}
find mid:  deflection of B1
find turn: rotation at A
find seat: reaction at A
find most: moment in B1
require low: deflection of B1 <= span/300 "brief"
require high: sag of B1 <= 100 mm "brief"`);
    expect(codesOf(note)).toEqual([]);
    // 5wL⁴/384, wL³/24.
    const times = (5 * 4e3 * 6 ** 4) / 384;
    checkAnswers(note, {
      mid: { value: times, unit: 'N m3', display: '67.50 kN m3 / EI down', status: 'none' },
      turn: { value: (-4e3 * 6 ** 3) / 24, unit: 'N m2', display: '36.00 kN m2 / EI clockwise' },
      seat: 12e3,
      most: 18e3,
      low: {
        value: times / E / 0.02,
        unit: 'm4',
        status: 'ok',
        limit: 0.02,
        utilisation: null,
        display: 'I ≥ 1608 cm4',
      },
      high: { value: times / E / 0.1, status: 'ok' },
    });
    expect(note.structures).toMatchObject([{ stable: true, redundancy: 0 }]);
  });

  it('finds the least I on the real model where something else gives way', () => {
    // A cantilever on a spring at its tip: δ = P / (3EI/L³ + k).
    const cantilever = (limit: string) =>
      solved(`
material S355: E 210 GPa
section X: I wanted, S355
member B1, X: A -- 2 m -- B
support A: fixed
support B: spring 200 kN/m y
load live: 6 kN down at B
require tip: deflection at B <= ${limit} "brief"
find give:   deflection at B
find share:  reaction at B`);
    const note = cantilever('10 mm');
    checkAnswers(note, {
      tip: { value: ((6e3 / 0.01 - 200e3) * 8) / 3 / E, status: 'ok' },
      give: { value: null },
      share: { value: null },
    });
    expect(codesOf(note)).toEqual(['bad-question', 'bad-question']);
    // A settlement does not give way with I.
    const sunk = solved(`${BEAM}
load sink: move B by 8 mm down
combine all_in: live + sink
require end: deflection at B under all_in <= 5 mm "brief"`);
    checkAnswers(sunk, { end: { value: null } });
  });

  it('is met exactly by the I that it is answered with, under the alternative that it names', () => {
    const portal = (section: string, question: string) =>
      solved(`
material S355: E 210 GPa
section X: ${section}, A 40 cm2, S355
member C1, X: A -- 3 m up -- B -- 5 m right -- C -- 3 m down -- D
support A: fixed
support D: fixed
load live: 10 kN right at B
load roof: 5 kN/m down on C1 from B to C
combine s (a): live + roof
combine s (b): 1.5 live
${question}`);
    // Axial strain gives way too, whatever I is.
    const [wanted] = portal('I wanted', 'require turn: rotation at B under s <= 3 mrad "x"').answers;
    const [chosen] = portal(`I ${wanted!.value} m4`, 'find turn: rotation at B under s').answers;
    expect(Math.abs(Math.abs(chosen!.value!) - 0.003)).toBeLessThan(1e-11);
    expect(wanted).toMatchObject({ unit: 'm4', status: 'ok', governing: chosen!.governing });
  });

  it('shares forces out without I where all of it has one section, and not beside others', () => {
    const two = (second: string) =>
      solved(`
material S355: E 210 GPa
section X: I wanted, S355
section Y: I 2000 cm4, S355
member B1, X: A -- 3 m -- B
member B2, ${second}: B -- 3 m -- C
support A: pinned
support B: roller
support C: roller
load live: 4 kN/m down on B1, B2
find over: moment at B in B1`);
    checkAnswers(two('X'), { over: (-4e3 * 9) / 8 });
    checkAnswers(two('Y'), { over: (-4e3 * 9) / 8 });
  });

  it('shows no figure of the trial, and refuses what it cannot tell', () => {
    const note = evaluated(
      fenced(`${BEAM}
find mid: deflection of B1
find twice: 2 * mid
require up: deflection of B1 >= 1 mm "x"`),
    );
    checkAnswers(toJson(note), { twice: { value: null }, up: { value: null } });
    expect(note.structures[0]!.combinations).toEqual([]);
    expect(note.answers[0]!.asked).toBeUndefined();
    const both = solved(`
material S355: E 210 GPa
section X: I wanted, S355
section Y: I wanted, S355
member B1, X: A -- 3 m -- B
member B2, Y: B -- 3 m -- C
support A: fixed
load live: 4 kN down at C
find tip: deflection at C`);
    expect(codesOf(both)).toEqual(['missing-property']);
  });
});
