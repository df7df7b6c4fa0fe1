// Heat and lack of fit, against free expansion, compatibility by hand and closed forms; and what they cannot act on.
import { describe, expect, it } from 'vitest';
import { checkAnswers, codesOf, evaluated, fenced, solved } from './check-note.ts';

const [E, ALPHA] = [210e9, 12e-6];
const STEEL = 'material Steel: E 210 GPa, alpha 12e-6 /K\n';
// A box of sharp corners.
const A = 0.1 * 0.2 - 0.088 * 0.188;
const I = (0.1 * 0.2 ** 3 - 0.088 * 0.188 ** 3) / 12;
const BOX = `${STEEL}section Box: box 100 mm x 200 mm x 6 mm, Steel\n`;

describe('heat', () => {
  it('lengthens what is free, and stresses nothing', () => {
    const note = solved(`${BOX}
member R: A -- 4 m -- B -- 2 m -- C
support A: pinned
support B: roller
load sun: heat R by 25 K
find grow: sway at C
find drop: deflection at C
find push: force in R
find most: moment in R
find side: reaction at A horizontal`);
    expect(codesOf(note)).toEqual([]);
    checkAnswers(note, { grow: ALPHA * 25 * 6, drop: 0, push: 0, most: 0, side: 0 });
  });

  it('presses what is held: N = -EAαT, stress EαT', () => {
    const note = solved(`${BOX}
member R: A -- 4 m -- B
support A: fixed
support B: fixed
load sun: heat R by 25 K
find push:   force in R
find thrust: reaction at B horizontal
find stress_R: stress in R
find still:  sway of R`);
    checkAnswers(note, {
      push: -E * A * ALPHA * 25,
      thrust: -E * A * ALPHA * 25,
      stress_R: E * ALPHA * 25,
      still: 0,
    });
  });

  it('against a spring: the gap αTL closes over member and spring together', () => {
    const note = solved(`${BOX}
member R: A -- 4 m -- B
support A: pinned
support B: hold y, spring 30 kN/mm x
load cold: heat R by -30 K
find pull: force in R
find slip: sway at B`);
    const pull = (ALPHA * 30 * 4) / (4 / (E * A) + 1 / 30e6);
    checkAnswers(note, { pull, slip: -pull / 30e6 });
  });

  it('in the half of a held bar: both halves take the same force', () => {
    const note = solved(`${STEEL}
section Thin: A 8 cm2, Steel
section Thick: A 20 cm2, Steel
bar left, Thin: A -- 3 m -- B
bar right, Thick: B -- 2 m -- C
support A: pinned
support B: hold y
support C: pinned
load sun: heat left by 40 K
find push: force in right
find slip: sway at B`);
    const push = (-ALPHA * 40 * 3) / (3 / (E * 8e-4) + 2 / (E * 20e-4));
    checkAnswers(note, { push, slip: (-push * 2) / (E * 20e-4) });
  });

  it('bends away from the warm side, over two spans as over two propped halves', () => {
    // By symmetry each span is fixed at B: the moment there is 3EIκ/2, with tension on the underside.
    const note = solved(`${BOX}
member R: A -- 4 m -- B -- 4 m -- C
support A: pinned
support B: roller
support C: roller
load sun: heat R by 30 K above, 5 K below
find middle: moment at B in R
find end: reaction at A
find hold_down: reaction at B
find grow: sway at C`);
    const kappa = (ALPHA * 25) / 0.2;
    checkAnswers(note, {
      middle: 1.5 * E * I * kappa,
      end: (1.5 * E * I * kappa) / 4,
      hold_down: (-3 * E * I * kappa) / 4,
      grow: ALPHA * 17.5 * 8,
    });
  });

  it('of the beam spreads the feet of a portal', () => {
    // One redundant H: its gap αTL, its flexibility ∫m²/EI with m = y on the posts and h on the beam.
    const note = solved(`
material Steel: alpha 12e-6 /K
section Post: EI 8 MN m2, Steel
section Beam: EI 20 MN m2, Steel
member Left, Post: A -- 3 m up -- B
member Top, Beam: B -- 6 m -- C
member Right, Post: C -- 3 m down -- D
support A: pinned
support D: pinned
load sun: heat Top by 35 K
find thrust: reaction at A horizontal
find knee: moment at B in Top
find lean: sway at C`);
    const H = (ALPHA * 35 * 6) / ((2 * 3 ** 3) / (3 * 8e6) + (3 ** 2 * 6) / 20e6);
    checkAnswers(note, { thrust: H, knee: -H * 3, lean: (ALPHA * 35 * 6) / 2 });
  });

  it('takes each leg by its own section', () => {
    // A cantilever of two depths: the tip turns by κ₁a + κ₂b and drops by κ₁a(a/2 + b) + κ₂b²/2.
    const note = solved(`
section Deep: EI 9 MN m2, depth 400 mm, alpha 12e-6 /K
section Shallow: EI 2 MN m2, depth 160 mm, alpha 9e-6 /K
member R: A -- 2 m of Deep -- K -- 3 m of Shallow -- B
support A: fixed
load sun: heat R by 5 K below, 30 K above
find turn: rotation at B
find tip: deflection at B
find grow: sway at B`);
    const [first, second] = [(12e-6 * 25) / 0.4, (9e-6 * 25) / 0.16];
    checkAnswers(note, {
      turn: -(first * 2 + second * 3),
      tip: first * 2 * (1 + 3) + (second * 9) / 2,
      grow: 17.5 * (12e-6 * 2 + 9e-6 * 3),
    });
  });

  it('has its upper side left of the travel, and says where that is not above', () => {
    const beam = (chain: string) => `${BOX}
member R: ${chain}
support A: fixed
load sun: heat R by 30 K above, 5 K below
find tip: deflection at B
find aside: sway at B`;
    const bow = (((ALPHA * 25) / 0.2) * 9) / 2;
    const forwards = solved(beam('A -- 3 m -- B'));
    checkAnswers(forwards, { tip: bow, aside: ALPHA * 17.5 * 3 });
    expect(forwards.diagnostics).toEqual([]);

    const backwards = solved(beam('B -- 3 m left -- A'));
    expect(backwards.diagnostics).toMatchObject([
      { code: 'upper-side', severity: 'hint', message: expect.stringContaining('drawn from right to left') },
    ]);
    checkAnswers(backwards, { tip: -bow });

    const upright = solved(beam('A -- 3 m up -- B'));
    expect(upright.diagnostics).toMatchObject([
      { code: 'upper-side', message: 'R stands upright: its upper side, left of its travel, lies to its left.' },
    ]);
    // Its left side is the warm one, so that it leans to the right.
    checkAnswers(upright, { aside: bow, tip: -ALPHA * 17.5 * 3 });
  });

  it('in Fahrenheit, of groups, with factors of its own and of combinations', () => {
    const note = solved(`${BOX}
section Rod: round 20 mm, Steel
member R, Box: A -- 4 m -- B
bar d, Rod: B -- 1 m -- C
group All: R, d
support A: fixed
support C: hold y
load sun: 1.5 heat All by 18 degF
load sun: (2) heat d by 10 K
combine summer: 0.6 sun
find grow: sway at C under summer
find push: force in R under summer`);
    checkAnswers(note, { grow: 0.6 * ALPHA * (15 * 5 + 20), push: 0 });
  });
});

describe('lack of fit', () => {
  it('of a bar moves a truss that is determinate, and stresses nothing', () => {
    // Unit load at the apex: each bar takes -1/(2 sin), so that it rises by δ / (2 sin) with sin = 0.6.
    const note = solved(`${STEEL}
section Rod: A 8 cm2, Steel
bar d1, Rod: A -- 4 m right, 3 m up -- B
bar d2, Rod: B -- 4 m right, 3 m down -- C
support A: pinned
support C: pinned
load fit: lengthen d1 by 3 mm
find rise: deflection at B
find aside: sway at B
find pull: force in d1`);
    checkAnswers(note, { rise: -0.003 / 1.2, aside: 0.003 / 1.6, pull: 0 });
  });

  it('of the middle one of three bars: X = -δ EA/L · 2c³/(1 + 2c³)', () => {
    // Timoshenko, Strength of Materials I, statically indeterminate bars (from memory): f = L/EA (1 + 1/(2c³)).
    const note = solved(`${STEEL}
section Rod: A 8 cm2, Steel
bar mid, Rod: T -- 4 m down -- P
bar one, Rod: P -- 3 m left, 4 m up -- L
bar two, Rod: P -- 3 m right, 4 m up -- R
support T: pinned
support L: pinned
support R: pinned
load fit: shorten mid by 2 mm
find pull: force in mid
find press: force in one
find rise: deflection at P`);
    const c = 0.8;
    const X = (((0.002 * E * 8e-4) / 4) * 2 * c ** 3) / (1 + 2 * c ** 3);
    checkAnswers(note, { pull: X, press: -X / (2 * c), rise: -(0.002 - (X * 4) / (E * 8e-4)) });
  });

  it('is spread evenly over a member, whatever its sections', () => {
    const note = solved(`${STEEL}
section Thin: I 500 cm4, A 8 cm2, Steel
section Thick: I 900 cm4, A 20 cm2, Steel
member R: A -- 1 m of Thin -- K -- 4 m of Thick -- B
support A: fixed
load fit: 2 lengthen R by 5 mm
find here: sway at K
find grow: sway at B`);
    checkAnswers(note, { here: 0.002, grow: 0.01 });
  });

  it('of axially stiff members that are free to part', () => {
    // The beam is held at C and pushes the post's head aside: P = 3EIδ/h³, and the right side of the post is in tension.
    const note = solved(`
section S: EI 10 MN m2
member Post: A -- 3 m up -- B
member Beam: B -- 5 m -- C
support A: fixed
support C: pinned
hinge B
load fit: lengthen Beam by 6 mm
find aside: sway at B
find push: force in Beam
find foot: moment at A in Post`);
    const push = (3 * 10e6 * 0.006) / 3 ** 3;
    checkAnswers(note, { aside: -0.006, push: -push, foot: push * 3 });
  });
});

describe('the factor by which stiffness must rise', () => {
  it('leaves out what heat does by itself', () => {
    // Free to bend, heat alone drops the tip by κL²/2, whatever the stiffness; the load by PL³/3EI.
    const note = (limit: string) =>
      solved(`
section S: EI 2 MN m2, depth 0.3 m, alpha 12e-6 /K
member R: A -- 3 m -- B
support A: fixed
load live: 4 kN down at B
load sun: heat R by 10 K above, -10 K below
combine both: live + sun
require tip: deflection at B under both <= ${limit} "brief"`);
    const heat = (((12e-6 * 20) / 0.3) * 9) / 2;
    const load = (4e3 * 27) / (3 * 2e6);
    const passed = note('12 mm');
    checkAnswers(passed, { tip: { value: heat + load, status: 'fails' } });
    const told = passed.diagnostics.find(({ code }) => code === 'limit-exceeded')!;
    expect(told.message).toContain((load / (0.012 - heat)).toPrecision(3));
    // κL²/2 is 3.6 mm: past that limit no stiffness helps.
    const beyond = note('3.5 mm').diagnostics.find(({ code }) => code === 'limit-exceeded')!;
    expect(beyond.message).not.toMatch(/stiffness must rise/i);
  });
});

describe('what cannot be worked', () => {
  const first = (body: string) => solved(body).diagnostics.find(({ severity }) => severity === 'error');

  it('heat without an expansion, or a difference without a depth', () => {
    const beam = (section: string, heat: string) => `
section S: ${section}
member R: A -- 3 m -- B
support A: fixed
load sun: ${heat}
load dead: 1 kN down at B
find tip: deflection at B under sun
find other: deflection at B under dead`;
    expect(first(beam('EI 2 MN m2', 'heat R by 20 K'))).toMatchObject({
      code: 'missing-property',
      line: 6,
      message: 'Heat needs a thermal expansion, and S has no alpha.',
    });
    expect(first(beam('EI 2 MN m2, alpha 12e-6 /K', 'heat R by 20 K above, 5 K below'))).toMatchObject({
      code: 'missing-property',
      message: 'A difference between above and below needs a depth, and S has none.',
    });
    // Only the case is lost.
    checkAnswers(solved(beam('EI 2 MN m2', 'heat R by 20 K')), { tip: { value: null }, other: 27e3 / 6e6 });
    expect(codesOf(solved(beam('EI 2 MN m2, alpha 12e-6 /K', 'heat R by 20 K')))).toEqual([]);
  });

  it('a bar that is warmer on one side', () => {
    const note = solved(`${STEEL}
section Rod: A 8 cm2, Steel
bar d1, Rod: A -- 3 m -- B
support A: pinned
support B: hold y
load sun: heat d1 by 20 K above, 5 K below
find grow: sway at B`);
    expect(codesOf(note)).toEqual(['bad-load']);
    checkAnswers(note, { grow: { value: null } });
  });

  it('a figure of another kind', () => {
    const beam = (load: string) => `${BOX}
member R: A -- 3 m -- B
support A: fixed
load sun: ${load}`;
    expect(first(beam('heat R by 3 mm'))?.message).toBe('A temperature difference is due here; this is a length.');
    expect(first(beam('lengthen R by 3 K'))?.message).toBe('A length is due here; this is a temperature difference.');
  });

  it('heat and lack of fit that axially stiff members would have to take up', () => {
    const held = (load: string) => `
section S: EI 2 MN m2, depth 0.3 m, alpha 12e-6 /K
member R: A -- 3 m -- B
support A: pinned
support B: pinned
load sun: ${load}
find push: force in R`;
    const told = first(held('heat R by 20 K'));
    expect(told).toMatchObject({ code: 'bad-load', line: 7 });
    expect(told?.message).toBe(
      'In sun heat has no room: R would have to change its length by 0.7200 mm against it, and it is axially stiff: the force would be without bound.',
    );
    expect(first(held('lengthen R by 3 mm'))?.message).toContain('In sun lack of fit has no room');
    const uneven = evaluated(fenced(held('heat R by 20 K above, 5 K below'))).diagnostics;
    expect(uneven.find(({ severity }) => severity === 'error')?.hint).toContain('without a mean, heat bends only');
    expect(codesOf(solved(held('heat R by 20 K above, -20 K below')))).toEqual([]);
  });
});
