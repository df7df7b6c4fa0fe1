// What can be asked, and limits: spans, lengths, use, the factor on stiffness, and both sides of a jump.
import { describe, expect, it } from 'vitest';
import { checkAnswers, checkNumber, codesOf, evaluated, fenced, solved } from './check-note.ts';

const EI = 10e6;

describe('limits', () => {
  // Two spans of 6 and 4 m and an overhang of 1.5 m, 2 kN/m throughout.
  const note = solved(`
section S: EI 10 MN m2
member B1: A -- 6 m -- B -- 4 m -- C -- 1.5 m -- D
support A: pinned
support B: roller
support C: roller
load live: 2 kN/m down on B1
require tip:    deflection at D <= span/150 "a"
require first:  sag of B1 between A and B <= span/300 "a"
require second: deflection at 7.5 m from A on B1 <= span/300 "a"
require own:    deflection at 3 m from A on B1 <= length(A, C)/500 "a"
require whole:  rotation at A <= length(B1)/along(B, D)/100 "a"
require again:  tip / 2 <= span(tip)/180 "a"
require mid:    deflection at 1 m from B on B1 <= min(plan(A, B), 4 m)/250 + 1 mm "a"`);

  it('take the stretch between supports, and the overhang to its end', () => {
    for (const [name, limit] of Object.entries({
      tip: 1.5 / 150,
      first: 6 / 300,
      second: 4 / 300,
      own: 10 / 500,
      whole: 11.5 / 5.5 / 100,
      again: 1.5 / 180,
      mid: 4 / 250 + 0.001,
    })) {
      const answer = note.answers.find(one => one.name === name)!;
      checkNumber(name, answer.limit, limit);
      checkNumber(`use of ${name}`, answer.utilisation, Math.abs(answer.value!) / limit);
      expect(answer.status, name).toBe('ok');
    }
    expect(codesOf(note)).toEqual([]);
  });

  it('divide a span where another member meets it, measured straight', () => {
    const frame = solved(`
section S: EI 10 MN m2
member R1: A -- 3 m right, 4 m up -- B -- 6 m -- C
member P1: B -- 4 m down -- D
support A: pinned
support D: pinned
support C: roller
load live: 2 kN/m down on R1
require low:  deflection at 1 m from A on R1 <= span/200 "a"
require high: deflection at 2 m from C on R1 <= span/200 "a"
require stay: sway at B <= height(B)/500 "a"`);
    checkAnswers(frame, { low: limitOnly(frame, 'low', 5 / 200), high: limitOnly(frame, 'high', 6 / 200) });
    checkNumber('height', frame.answers[2]!.limit, 4 / 500);
  });

  it('exceeded by the loads alone ask for stiffness in proportion', () => {
    // 5wL⁴/384EI = 16.875 mm of 10 mm.
    const result = evaluated(
      fenced(`
section S: EI 10 MN m2
member B1: A -- 6 m -- B
support A: pinned
support B: roller
load live: 10 kN/m down on B1
require mid: deflection of B1 <= 10 mm "a"`),
    );
    checkNumber('factor', result.answers[0]!.stiffnessFactor ?? null, (5 * 10e3 * 6 ** 4) / (384 * EI) / 0.01);
    expect(result.answers[0]!.status).toBe('fails');
    expect(result.diagnostics.map(({ code }) => code)).toEqual(['limit-exceeded']);
  });

  it('exceeded with a settlement ask for stiffness against the rest of it', () => {
    // Half of 4 mm at midspan, which no stiffness takes away: 16.875 / (10 − 2).
    const result = evaluated(
      fenced(`
section S: EI 10 MN m2
member B1: A -- 3 m -- M -- 3 m -- B
support A: pinned
support B: roller
load live: 10 kN/m down on B1
load sink: move B by 4 mm down
combine both: live + sink
require mid: deflection at M under both <= 10 mm "a"
require all_sunk: deflection at B under both <= 3 mm "a"`),
    );
    checkNumber('factor', result.answers[0]!.stiffnessFactor ?? null, 0.016875 / 0.008);
    expect(result.answers[1]!.status).toBe('fails');
    expect(result.answers[1]!.stiffnessFactor).toBeUndefined();
  });

  it('of an equal value are met, and compare sizes except for reactions', () => {
    const same = solved(`
section S: EI 10 MN m2
member B1: A -- 4 m -- B
support A: pinned
support B: roller
load lift: 2 kN/m up on B1
require moment_A: moment in B1 <= 4 kN m "a"
require over:     moment in B1 <= 3.9 kN m "a"
require seat:     reaction at A <= 1 kN "a"
require least:    moment in B1 >= -4 kN m "a"
require sink:     deflection of B1 >= -1 mm "a"`);
    checkAnswers(same, {
      moment_A: { value: -4e3, status: 'ok', utilisation: 1 },
      over: { value: -4e3, status: 'fails', utilisation: 4 / 3.9 },
      seat: { value: -4e3, status: 'ok' },
      least: { value: -4e3, status: 'ok', utilisation: null },
      sink: { value: -(5 * 2e3 * 4 ** 4) / (384 * EI), status: 'ok', utilisation: null },
    });
  });
});

describe('measures', () => {
  it('of a beam over three equal spans (AISC, Table 3-23, case 39, from memory)', () => {
    const note = solved(`
section S: EI 10 MN m2
member B1: A -- 5 m -- B -- 5 m -- C -- 5 m -- D
support A: pinned
support B: roller
support C: roller
support D: roller
load live: 4 kN/m down on B1
find at_A: reaction at A
find at_B: reaction at B
find over: moment in B1
find hog:  hogging in B1 between C and D
find span1: sagging in B1 between A and B
find span2: sagging in B1 between B and C
find none: hogging in B1 between A and 1 m
find shear_B: shear in B1
find drop: deflection of B1 between C and D`);
    const [w, L] = [4e3, 5];
    // EI y from the curvature M = 0.4wLx − wx²/2, with y nil at both ends of the span.
    const deflection = (x: number) =>
      (0.4 * w * L * (L * L * x - x ** 3)) / (6 * EI) - (w * (L ** 3 * x - x ** 4)) / (24 * EI);
    const peak = greatest(deflection, 0, L);
    checkAnswers(note, {
      at_A: 0.4 * w * L,
      at_B: 1.1 * w * L,
      over: { value: (-w * L * L) / 10, place: { member: 'B1', from: 'A', distance: L } },
      hog: { value: (w * L * L) / 10, place: { member: 'B1', from: 'A', distance: 2 * L } },
      span1: { value: (2 * w * L * L) / 25, place: { member: 'B1', from: 'A', distance: 0.4 * L } },
      span2: { value: (w * L * L) / 40, place: { member: 'B1', from: 'A', distance: 1.5 * L } },
      none: 0,
      // −0.6 wL before B and +0.6 wL behind C: the first along the member.
      shear_B: { value: -0.6 * w * L, place: { member: 'B1', from: 'A', distance: L } },
      drop: { value: deflection(peak), place: { member: 'B1', from: 'A', distance: 3 * L - peak } },
    });
  });

  it('sag is measured from the chord, deflection from where the beam was', () => {
    // Both supports sink; the sag between them is that of the load alone, and runs the other way from B to A.
    const note = solved(`
section S: EI 10 MN m2
member B1: A -- 6 m -- B
support A: pinned
support B: roller
load live: 3 kN/m down on B1
load sink: move A by 10 mm down
load sunk: move B by 20 mm down
combine all_of_it: live + sink + sunk
find down: deflection at 3 m from A on B1
find sag_AB: sag of B1 between A and B
find sag_BA: sag of B1 between B and A
find whole: sag of B1`);
    const sag = (5 * 3e3 * 6 ** 4) / (384 * EI);
    checkAnswers(note, {
      down: sag + 0.015,
      sag_AB: { value: sag, place: { member: 'B1', from: 'A', distance: 3 } },
      sag_BA: -sag,
      whole: sag,
    });
  });

  it('where a quantity jumps, the larger side is told, and both are shown', () => {
    // A couple at a third of the span: M0/3 before it, −2M0/3 behind it.
    const result = evaluated(
      fenced(`
section S: EI 10 MN m2
member B1: A -- 2 m -- C -- 4 m -- B
support A: pinned
support B: roller
load knob: 9 kN m anticlockwise at C
find at_C: moment at C in B1
find most: moment in B1
find other: sagging in B1`),
    );
    const [atC, most, other] = result.answers;
    checkNumber('at C', atC!.quantity!.value, -6e3);
    expect(atC!.sides).toContain('3');
    expect(atC!.sides).toContain('6');
    checkNumber('most', most!.quantity!.value, -6e3);
    checkNumber('sagging', other!.quantity!.value, 3e3);
  });

  it('of forces along a member: tension, compression, and the force at a place', () => {
    const note = solved(`
material M: E 200 GPa
section S: solid 50 mm x 100 mm, M
member C1: A -- 4 m up -- B
support A: fixed
load pull: 2 kN/m down on C1 from 0 m to 2 m
load lift: 3 kN up at B
combine both: pull + lift
find top:   force in C1 at B
find base:  force in C1 at A
find most:  force in C1
find pull_M: tension in C1
find push:  compression in C1
find side:  sway at B`);
    checkAnswers(note, {
      top: 3e3,
      base: -1e3,
      most: { value: 3e3, place: { member: 'C1', from: 'A', distance: 2 } },
      pull_M: 3e3,
      push: { value: 1e3, place: { member: 'C1', from: 'A', distance: 0 } },
      side: 0,
    });
  });

  it('of a group name the worst of its members', () => {
    const note = solved(`
section S: EI 10 MN m2
member B1: A -- 4 m -- B
member B2: B -- 5 m -- C
hinge B
group Floor: B1, B2
support A: pinned
support B: roller
support C: roller
load live: 2 kN/m down on B1, B2
find sag_floor: deflection of Floor
find bend: moment in Floor
find shear_floor: shear in Floor`);
    checkAnswers(note, {
      sag_floor: { value: (5 * 2e3 * 5 ** 4) / (384 * EI), place: { member: 'B2', from: 'B', distance: 2.5 } },
      bend: { value: (2e3 * 25) / 8, place: { member: 'B2', from: 'B', distance: 2.5 } },
      shear_floor: { value: 5e3, place: { member: 'B2', from: 'B', distance: 0 } },
    });
  });

  it('stress takes force and moment together', () => {
    const note = solved(`
material M: E 200 GPa
section S: solid 50 mm x 100 mm, M
member B1: A -- 2 m -- B
support A: fixed
load pull: 10 kN right at B
load hang: 1 kN down at B
combine both: pull + hang
find most: stress in B1`);
    checkAnswers(note, {
      most: {
        value: 10e3 / 0.005 + 2e3 / ((0.05 * 0.1 ** 2) / 6),
        unit: 'Pa',
        place: { member: 'B1', from: 'A', distance: 0 },
      },
    });
  });
});

function limitOnly(note: ReturnType<typeof solved>, name: string, limit: number) {
  return { value: note.answers.find(answer => answer.name === name)!.value, limit };
}

/** Where a function with one hump is greatest, by halving on its slope. */
function greatest(f: (x: number) => number, from: number, to: number): number {
  const step = 1e-5;
  const slope = (x: number) => f(x + step) - f(x - step);
  let [low, high] = [from + 2 * step, to - 2 * step];
  for (let i = 0; i < 200; i++) {
    const middle = (low + high) / 2;
    if (slope(middle) > 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
