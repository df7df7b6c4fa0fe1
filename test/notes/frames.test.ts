// Portals, hinges, bars and unstable structures.
import { describe, expect, it } from 'vitest';
import { checkAnswers, codesOf, solved } from './check-note.ts';

/** Height 4 m, span 6 m, EI of the column 8 and of the beam 12 MN m²: k = Ib h / Ic L = 1. No axial strain. */
const PORTAL = `
section Col: EI 8 MN m2
section Bm:  EI 12 MN m2
member C1, Col: A -- 4 m up -- B
member B1, Bm:  B -- 6 m -- C
member C2, Col: C -- 4 m down -- D
`;
const [h, L, EIc] = [4, 6, 8e6];
const k = (12e6 * h) / (EIc * L);

describe('portals (Kleinlogel, Rigid Frame Formulas)', () => {
  it('on pinned bases, pushed at the beam', () => {
    const note = solved(`${PORTAL}
support A: pinned
support D: pinned
load push: 10 kN right at B
find sway_B: sway at B
find left_H: reaction at A horizontal
find up_D:   reaction at D
find knee:   moment at B in B1
find other:  moment at C in B1`);
    checkAnswers(note, {
      sway_B: (10e3 * h ** 3 * (2 + 1 / k)) / (12 * EIc),
      left_H: -5e3,
      up_D: (10e3 * h) / L,
      // Pushed to the right, the beam is in tension below at its left end.
      knee: (10e3 * h) / 2,
      other: (-10e3 * h) / 2,
    });
    expect(note.structures).toEqual([{ name: 'note', redundancy: 1, stable: true }]);
  });

  it('on pinned bases, under a load on the beam', () => {
    const note = solved(`${PORTAL}
support A: pinned
support D: pinned
load live: 5 kN/m down on B1
find sway_B: sway at B
find thrust: reaction at A horizontal
find push:   compression in B1
find knee:   moment at B in B1
find column: moment at B in C1
find middle: sagging in B1`);
    const H = (5e3 * L * L) / (4 * h * (2 * k + 3));
    checkAnswers(note, {
      sway_B: 0,
      thrust: H,
      push: H,
      knee: -H * h,
      // The same corner, seen from the column that goes up: its underside is the inner side too.
      column: -H * h,
      middle: { value: (5e3 * L * L) / 8 - H * h, place: { member: 'B1', from: 'B', distance: 3 } },
    });
  });

  it('on fixed bases, pushed and loaded', () => {
    const note = solved(`${PORTAL}
support A: fixed
support D: fixed
load push: 10 kN right at B
load live: 5 kN/m down on B1
find sway_B: sway at B under push
find base:   reaction at A moment under push
find up_D:   reaction at D under push
find knee:   moment at B in B1 under push
find foot:   moment at A in C1 under live
find corner: moment at B in B1 under live
find thrust: reaction at A horizontal under live`);
    const [P, w] = [10e3, 5e3];
    checkAnswers(note, {
      sway_B: (P * h ** 3 * (3 * k + 2)) / (12 * EIc * (6 * k + 1)),
      base: (((P * h) / 2) * (3 * k + 1)) / (6 * k + 1),
      up_D: (3 * P * h * k) / (L * (6 * k + 1)),
      knee: (((P * h) / 2) * 3 * k) / (6 * k + 1),
      foot: (w * L * L) / (12 * (k + 2)),
      corner: (-w * L * L) / (6 * (k + 2)),
      thrust: (w * L * L) / (4 * h * (k + 2)),
    });
    expect(note.structures[0]).toEqual({ name: 'note', redundancy: 3, stable: true });
  });
});

describe('hinges', () => {
  it('make a run of beams determinate', () => {
    // The far beam of 2.4 m hangs in the hinge, 0.6 m beyond B.
    const note = solved(`
section S: EI 10 MN m2
member S1: A -- 3 m -- B -- 0.6 m -- J -- 2.4 m -- C
hinge J
support A: pinned
support B: roller
support C: roller
load near:   4 kN/m down on S1 from A to B
load beyond: 4 kN/m down on S1 from B to C
find over:  moment at B in S1 under beyond
find at_A:  reaction at A under beyond
find at_C:  reaction at C under beyond
find hung:  moment at J in S1 under beyond
find drop:  deflection at J under near`);
    const hangs = (4e3 * 2.4) / 2;
    const over = -(hangs * 0.6 + (4e3 * 0.6 ** 2) / 2);
    checkAnswers(
      note,
      {
        over,
        at_A: over / 3,
        at_C: hangs,
        hung: 0,
        // The overhang rises by the slope at B, wL³/24EI.
        drop: (-4e3 * 27 * 0.6) / (24 * 10e6),
      },
      1e3,
    );
    expect(note.structures).toEqual([{ name: 'note', redundancy: 0, stable: true }]);
  });

  it('in the crown make an arch of three hinges: H = wL²/8h', () => {
    const note = solved(`
section S: EI 10 MN m2
member C1: A -- 4 m up -- B
member B1: B -- 4 m -- M -- 4 m -- C
member C2: C -- 4 m down -- D
hinge M
support A: pinned
support D: pinned
load live: 5 kN/m down on B1
find thrust: reaction at A horizontal
find knee:   moment at B in B1`);
    const H = (5e3 * 64) / 32;
    checkAnswers(note, { thrust: H, knee: -H * 4 });
  });

  it('of one member leave the others rigid', () => {
    // The beam is pinned to the left column; the right column holds it, and sways as a cantilever: PL³/3EI.
    const note = solved(`
section S: EI 8 MN m2
member C1: A -- 4 m up -- B
member B1: B -- 6 m -- C
member C2: C -- 4 m down -- D
hinge B in B1
hinge C in B1
support A: fixed
support D: fixed
load push: 10 kN right at B
find sway_B: sway at B
find foot:   moment at A in C1`);
    checkAnswers(note, { sway_B: (5e3 * 64) / (3 * 8e6), foot: -5e3 * 4 });
  });
});

describe('bars', () => {
  it('share a load by their stiffness: δ = PL/EA(1 + 2cos³t) (Timoshenko, Strength of Materials)', () => {
    const note = solved(`
material S: E 200 GPa
section Rod: A 5 cm2, S
point T: 0 m, 0 m
point Q: 3 m, 0 m
point U: -3 m, 0 m
point P: 0 m, -4 m
bar v, Rod: P -- T
bar l, Rod: P -- U
bar r, Rod: P -- Q
support T: pinned
support U: pinned
support Q: pinned
load hang: 20 kN down at P
find drop: deflection at P
find mid:  force in v
find side: tension in l`);
    const [P, EA, c] = [20e3, 200e9 * 5e-4, 4 / 5];
    const drop = (P * 4) / (EA * (1 + 2 * c ** 3));
    checkAnswers(note, { drop, mid: (EA * drop) / 4, side: (EA * drop * c ** 2) / 4 });
    expect(note.structures).toEqual([{ name: 'note', redundancy: 1, stable: true }]);
  });

  it('make a king post: δ = (P/EA)(a³/2h² + l³/2h² + h) (unit load)', () => {
    const note = solved(`
material S: E 200 GPa
section Rod: A 5 cm2, S
bars t, Rod: A -- 3 m -- M -- 3 m -- B
bars r, Rod: A -- 3 m right, 2 m up -- K -- B
bar  p, Rod: K -- M
support A: pinned
support B: roller
load hang: 30 kN down at M
find drop: deflection at M
find tie:  tension in t
find raf:  compression in r
find post: force in p`);
    const [P, EA, a, rise, l] = [30e3, 200e9 * 5e-4, 3, 2, Math.hypot(3, 2)];
    checkAnswers(note, {
      drop: (P / EA) * (a ** 3 / (2 * rise ** 2) + l ** 3 / (2 * rise ** 2) + rise),
      tie: (P / 2) * (a / rise),
      raf: (P / 2) * (l / rise),
      post: P,
    });
  });
});

describe('what can move freely', () => {
  it('is told at the structure, and the other structures are answered', () => {
    const note = solved(`
section S: EI 10 MN m2
structure Frame
member C1: A -- 3 m up -- B
member B1: B -- 5 m -- C
member C2: C -- 3 m down -- D
support A: roller
support D: roller
load push: 1 kN right at B
find sway_B: sway at B

structure Beam
member B1: A -- 4 m -- B
support A: pinned
support B: roller
load live: 3 kN/m down on B1
find most: moment in B1`);
    expect(codesOf(note)).toEqual(['unstable-structure']);
    expect(note.diagnostics.find(({ code }) => code === 'unstable-structure')).toMatchObject({
      line: 4,
      severity: 'error',
    });
    expect(note.structures).toEqual([
      { name: 'Frame', redundancy: null, stable: false },
      { name: 'Beam', redundancy: 0, stable: true },
    ]);
    checkAnswers(note, { 'Frame.sway_B': { value: null, status: 'none', display: '' }, 'Beam.most': 6e3 });
  });
});
