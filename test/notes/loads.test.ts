// Loads in every form of the language, against statics and published beam formulas.
import { describe, expect, it } from 'vitest';
import { checkAnswers, codesOf, solved } from './check-note.ts';

describe('on a sloping member', () => {
  // A to B: 4 m right, 3 m up, 5 m long; B rolls level, so that the ends of the rafter carry no moment.
  const note = solved(`
section S: EI 10 MN m2
member Raf: A -- 4 m right, 3 m up -- B
support A: pinned
support B: roller

load dead:  2 kN/m down on Raf
load snow:  2 kN/m down on plan Raf
load wind:  1 kN/m square down on Raf
load drag:  1 kN/m along Raf towards A
load skew:  5 kN towards 30 deg at B
load level: 2 kN/m right on Raf

find dead_B:  reaction at B under dead
find dead_M:  moment at 2.5 m from A on Raf under dead
find dead_N:  force in Raf under dead
find dead_NB: force in Raf at B under dead
find snow_B:  reaction at B under snow
find snow_M:  sagging in Raf under snow
find wind_A:  reaction at A under wind
find wind_H:  reaction at A horizontal under wind
find wind_B:  reaction at B under wind
find wind_M:  sagging in Raf under wind
find drag_A:  reaction at A under drag
find drag_H:  reaction at A horizontal under drag
find drag_B:  reaction at B under drag
find skew_H:  reaction at A horizontal under skew
find skew_B:  reaction at B under skew
find level_B: reaction at B under level`);

  it('down along its length, and down on plan', () => {
    checkAnswers(note, {
      dead_B: 5e3,
      // W · plan / 8 of a simple beam, W = 10 kN over 4 m.
      dead_M: 5e3,
      // The upright reaction of 5 kN has sin = 0.6 of it along the rafter: compression at A, tension at B; the first is told.
      dead_N: { value: -3e3, place: { member: 'Raf', from: 'A', distance: 0 } },
      dead_NB: 3e3,
      snow_B: 4e3,
      snow_M: { value: 4e3, place: { member: 'Raf', from: 'A', distance: 2.5 } },
    });
  });

  it('square to it: half to the right, down by the rest', () => {
    // 5 kN at (2, 1.5) m, 3 kN to the right and 4 kN down; turning about A: 4 B = 2 · 4 + 1.5 · 3.
    checkAnswers(note, { wind_H: -3e3, wind_B: 3.125e3, wind_A: 0.875e3, wind_M: (1e3 * 25) / 8 });
  });

  it('along it: the line of the load passes through A', () => {
    checkAnswers(note, { drag_H: 4e3, drag_A: 3e3, drag_B: 0 }, 5e3);
  });

  it('askew and level', () => {
    const [x, y] = [5e3 * Math.cos(Math.PI / 6), 2.5e3];
    checkAnswers(note, { skew_H: -x, skew_B: (3 * x - 4 * y) / 4, level_B: (2e3 * 5 * 1.5) / 4 });
    expect(codesOf(note)).toEqual([]);
  });
});

describe('on a simple beam', () => {
  it('over a part of it (AISC, Table 3-23, case 5, from memory)', () => {
    const note = solved(`
section S: EI 10 MN m2
member B1: A -- 6 m -- B
support A: pinned
support B: roller
load live: 2 kN/m down on B1 from A to 2 m
find near:  reaction at A
find other: reaction at B
find most:  moment in B1
find at_1:  deflection at 1 m from A on B1`);
    const [w, a, L] = [2e3, 2, 6];
    const R = (w * a * (2 * L - a)) / (2 * L);
    checkAnswers(note, {
      near: R,
      other: (w * a * a) / (2 * L),
      most: { value: R ** 2 / (2 * w), place: { member: 'B1', from: 'A', distance: R / w } },
      // wx[a²(2L − a)² − 2ax²(2L − a) + Lx³]/24EIL at x = 1 m.
      at_1: (w * (a ** 2 * (2 * L - a) ** 2 - 2 * a * (2 * L - a) + L)) / (24 * 10e6 * L),
    });
  });

  it('growing from nothing (AISC, Table 3-23, case 2)', () => {
    const note = solved(`
section S: EI 10 MN m2
member B1: A -- 6 m -- B
support A: pinned
support B: roller
load snow: 0 kN/m to 3 kN/m down on B1
find first: reaction at A
find last:  reaction at B
find most:  moment in B1
find sink:  deflection of B1`);
    const [w, L, EI] = [3e3, 6, 10e6];
    const xi = Math.sqrt(1 - Math.sqrt(8 / 15));
    checkAnswers(note, {
      first: (w * L) / 6,
      last: (w * L) / 3,
      most: { value: (w * L * L) / (9 * Math.sqrt(3)), place: { member: 'B1', from: 'A', distance: L / Math.sqrt(3) } },
      sink: {
        value: (w * L ** 4 * xi * (3 * xi ** 4 - 10 * xi ** 2 + 7)) / (360 * EI),
        place: { member: 'B1', from: 'A', distance: xi * L },
      },
    });
  });

  it('as a force anywhere, counted from either end (AISC, Table 3-23, case 8)', () => {
    const note = solved(`
section S: EI 10 MN m2
member B1: A -- 5 m -- B
support A: pinned
support B: roller
load one: 6 kN down at 3 m from A on B1
load two: 6 kN down at 2 m from B towards A on B1
find here:  deflection at 3 m from A on B1 under one
find there: deflection at 3 m from A on B1 under two
find most:  deflection of B1 under one
find slope: rotation at A under one`);
    const [P, a, b, L, EI] = [6e3, 3, 2, 5, 10e6];
    checkAnswers(note, {
      here: (P * a * a * b * b) / (3 * EI * L),
      there: (P * a * a * b * b) / (3 * EI * L),
      most: {
        value: (P * a * b * (a + 2 * b) * Math.sqrt(3 * a * (a + 2 * b))) / (27 * EI * L),
        place: { member: 'B1', from: 'A', distance: Math.sqrt((a * (a + 2 * b)) / 3) },
      },
      slope: -(P * a * b * (L + b)) / (6 * EI * L),
    });
  });

  it('as a row, to the last that fits, the end included', () => {
    const note = solved(`
section S: EI 10 MN m2
member B1: A -- 6 m -- B
support A: pinned
support B: roller
load some: 3 kN down at every 1.5 m from 0.5 m to 5.2 m on B1
load ends: 3 kN down at every 0.4 m from 0.2 m to 1.8 m on B1
load all_along: 1 kN down at every 1.5 m from A to B on B1
find some_A: reaction at A under some
find some_B: reaction at B under some
find ends_B: reaction at B under ends
find whole:  reaction at A under all_along`);
    checkAnswers(note, {
      // At 0.5, 2.0, 3.5 and 5.0 m.
      some_A: 3e3 * (4 - 11 / 6),
      some_B: (3e3 * 11) / 6,
      // At 0.2, 0.6, 1.0, 1.4 and 1.8 m.
      ends_B: (3e3 * 5) / 6,
      // Five of them, one over each support.
      whole: 2.5e3,
    });
  });
});

describe('self-weight', () => {
  it('of members and of bars, with an allowance and of some only', () => {
    // A bar gives half its weight to each end and bends nothing; g = 9.80665 m/s².
    const note = solved(`
material S: E 210 GPa, density 7850 kg/m3
section Big: solid 100 mm x 200 mm, S
section Rod: round 20 mm, S
member B1, Big: A -- 4 m -- B
bar    T1, Rod: B -- 3 m up -- T
support A: pinned
support T: pinned
load dead: 1.1 self-weight
load rods: self-weight of T1
find at_A: reaction at A under dead
find at_T: reaction at T under dead
find rod:  reaction at T under rods
find most: moment in B1 under dead`);
    const beam = 7850 * 9.80665 * 0.02;
    const rod = 7850 * 9.80665 * ((Math.PI * 0.02 ** 2) / 4) * 3;
    checkAnswers(note, {
      at_A: 1.1 * beam * 2,
      at_T: 1.1 * (beam * 2 + rod),
      rod,
      most: (1.1 * beam * 16) / 8,
    });
  });

  it('of a density given as a unit weight', () => {
    const note = solved(`
material A36: E 29000 ksi, density 490 pcf
section P: solid 2 in x 6 in, A36
member B1: A -- 10 ft -- B
support A: pinned
support B: roller
load dead: self-weight
find at_A: reaction at A`);
    // 490 lbf/ft³ · 12 in² · 5 ft.
    checkAnswers(note, { at_A: 490 * 4.4482216152605 * (12 / 144) * 5 });
  });
});

describe('couples', () => {
  it('turn a beam between its supports (AISC, Table 3-23, case 36, from memory)', () => {
    const note = solved(`
section S: EI 10 MN m2
member B1: A -- 2 m -- C -- 4 m -- B
support A: pinned
support B: roller
load knob: 6 kN m anticlockwise at C
load back: 6 kN m clockwise at C
find up_A:   reaction at A under knob
find down_A: reaction at A under back
find there:  deflection at C under knob`);
    const [M0, a, L, EI] = [6e3, 2, 6, 10e6];
    checkAnswers(note, {
      up_A: M0 / L,
      down_A: -M0 / L,
      // Sagging over the shorter part, hogging over the longer: C rises.
      there: -(M0 * a * (L - a) * (L - 2 * a)) / (3 * EI * L),
    });
  });
});
