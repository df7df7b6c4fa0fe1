// Chains of dimensions: where the points come to stand, told by the lengths between them and their heights.
import { describe, expect, it } from 'vitest';
import { checkAnswers, checkValues, codesOf, solved } from './check-note.ts';

const radians = (degrees: number): number => (degrees * Math.PI) / 180;

describe('chains', () => {
  it('go right, up, by rise and run, at an angle, and at a pitch', () => {
    const note = solved(`
section S: EI 10 MN m2
let L = 2 m
member Post:  A -- 3.2 m up -- B
member Raf:   B -- 6 m right, 0.9 m up -- C
member Brace: C -- 4.1 m at 35 deg -- D
member Ridge: D -- 6 m right at 5.7 deg -- E
member Back:  E -- (L) left, 50 cm down -- F -- 1.5 m left at 10 deg -- G
member Drop:  G -- (L / 4) -- H -- 2 m down -- J
member Tie:   A -- D
support A: fixed
load dead: 1 kN down at J
let raf   = length(B, C)
let rise  = height(C)
let brace = length(C, D)
let reach = plan(C, D)
let ridge = height(E) - height(D)
let back  = height(F) - height(E)
let pitch = height(G) - height(F)
let drop  = plan(G, H)
let last  = height(H) - height(J)
let tie   = length(Tie)
let level = plan(A, J)
find down: deflection at J`);
    const x = { C: 6, D: 6 + 4.1 * Math.cos(radians(35)) };
    const y = { C: 3.2 + 0.9, D: 3.2 + 0.9 + 4.1 * Math.sin(radians(35)) };
    checkValues(note, {
      raf: Math.hypot(6, 0.9),
      rise: y.C,
      brace: 4.1,
      reach: 4.1 * Math.cos(radians(35)),
      ridge: 6 * Math.tan(radians(5.7)),
      back: -0.5,
      // Behind `left` too a positive pitch rises along the way.
      pitch: 1.5 * Math.tan(radians(10)),
      // A dimension without a direction goes right, whatever went before.
      drop: 0.5,
      last: 2,
      tie: Math.hypot(x.D, y.D),
      level: x.D + 6 - 2 - 1.5 + 0.5,
    });
    expect(codesOf(note)).toEqual([]);
  });

  it('place points by coordinates and on members, counted from either end', () => {
    const note = solved(`
section S: EI 10 MN m2
point  B: 4 m, 3 m
member R1: A -- B
point  P: 1.1 m from A on R1
point  Q: 1.1 m from B on R1
point  R: 0.5 m from P towards A on R1
member Post: P -- 2 m down -- F
support A: pinned
support F: pinned
load dead: 1 kN down at B
let ap = along(A, P)
let qb = length(Q, B)
let ar = along(A, R)
let height_p = height(P) - height(F)
find down: deflection at B`);
    checkValues(note, { ap: 1.1, qb: 1.1, ar: 0.6, height_p: 2 });
    expect(codesOf(note)).toEqual([]);
  });

  it('measure straight, along and level', () => {
    const note = solved(`
section S: EI 10 MN m2
member R1: A -- 4 m right, 3 m up -- B -- 6 m -- C
support A: fixed
load dead: 1 kN down at C
let straight = length(A, C)
let bent     = along(A, C)
let level    = plan(A, C)
let whole    = length(R1)
let top      = height(C)
find down: deflection at C`);
    checkValues(note, { straight: Math.hypot(10, 3), bent: 11, level: 10, whole: 11, top: 3 });
  });

  it('may have a leg with a section of its own', () => {
    // Cantilever of two sections, load at the tip: P/3E · [(L³ − b³)/I1 + b³/I2], b the outer length (unit load).
    const note = solved(`
section Thick: EI 12 MN m2
section Thin:  EI 3 MN m2
member R1, Thick: A -- 2 m -- B -- 1.5 m of Thin -- C
support A: fixed
load dead: 4 kN down at C
find tip: deflection at C`);
    checkAnswers(note, { tip: (4e3 / 3) * ((3.5 ** 3 - 1.5 ** 3) / 12e6 + 1.5 ** 3 / 3e6) });
  });

  it('of bars are numbered, and the chain names the group of them', () => {
    // A square bay with one diagonal, pushed at the top: the diagonal is pulled by √2 P, top and far post pressed by P.
    const note = solved(`
material S: E 200 GPa
section  Rod: A 10 cm2, S
bars w, Rod: A -- 3 m up -- B -- 3 m -- C -- 3 m down -- D
bar  d: A -- C
support A: pinned
support D: pinned
load push: 8 kN right at B
find first:  force in w1
find top:    force in w2
find far:    force in w3
find diag:   force in d
find most:   compression in w`);
    checkAnswers(
      note,
      {
        first: 0,
        top: -8e3,
        far: -8e3,
        diag: 8e3 * Math.SQRT2,
        most: { value: 8e3, place: { member: 'w2', from: 'B', distance: 0 } },
      },
      8e3,
    );
  });

  it('must close on a point already placed', () => {
    const note = solved(`
section S: EI 10 MN m2
point  D: 6 m, 3.5 m
member R1: A -- 3 m right, 3.5 m up -- B -- 2.988 m -- D
support A: fixed
load dead: 1 kN down at D
find tip: deflection at D`);
    expect(codesOf(note)).toContain('chain-gap');
    expect(note.diagnostics.find(({ code }) => code === 'chain-gap')!.message).toContain('12');
  });
});
