// Properties of shapes against their formulas for sharp corners (Roark, Table A.1), and stiffness that is given.
import { describe, expect, it } from 'vitest';
import { checkAnswers, checkValues, codesOf, solved } from './check-note.ts';

const E = 210e9;
const mm = 1e-3;

describe('shapes', () => {
  it('solid, round and tube', () => {
    const note = solved(`
material S: E 210 GPa, density 7850 kg/m3
section So: solid 50 mm x 200 mm, S
section Ro: round 20 mm, S
section Tu: tube 114.3 mm x 5 mm, S
section Tn: solid 50 mm x 200 mm, S, turned
let a = A of So
let b = I of So
let c = modulus of So
let d = depth of So + width of So
let e = EI of So
let f = mass of So
let g1 = I of Ro
let h = A of Ro
let i = I of Tu
let j = A of Tu
let k = wall of Tu
let l = I of Tn
let m1 = modulus of Tn
let n = EA of So`);
    checkValues(note, {
      a: 50 * 200 * mm ** 2,
      b: ((50 * 200 ** 3) / 12) * mm ** 4,
      c: ((50 * 200 ** 2) / 6) * mm ** 3,
      d: 0.25,
      e: E * ((50 * 200 ** 3) / 12) * mm ** 4,
      f: 7850 * 0.01,
      g1: (Math.PI * 20 ** 4 * mm ** 4) / 64,
      h: (Math.PI * 20 ** 2 * mm ** 2) / 4,
      i: (Math.PI * (114.3 ** 4 - 104.3 ** 4) * mm ** 4) / 64,
      j: (Math.PI * (114.3 ** 2 - 104.3 ** 2) * mm ** 2) / 4,
      k: 5 * mm,
      l: ((200 * 50 ** 3) / 12) * mm ** 4,
      m1: ((200 * 50 ** 2) / 6) * mm ** 3,
      n: E * 0.01,
    });
    expect(codesOf(note)).toEqual([]);
  });

  it('box, i-shape, channel and tee, upright and turned', () => {
    const note = solved(`
material S: E 210 GPa
section Bo: box 100 mm x 200 mm x 6 mm, S
section Bt: box 100 mm x 200 mm x 6 mm, S, turned
section Is: i-shape 203 mm x 133 mm x 7.8 mm x 5.8 mm, S
section It: i-shape 203 mm x 133 mm x 7.8 mm x 5.8 mm, S, turned
section Ch: channel 200 mm x 75 mm x 12.5 mm x 8.5 mm, S
section Ct: channel 200 mm x 75 mm x 12.5 mm x 8.5 mm, S, turned
section Te: tee 120 mm x 100 mm x 10 mm x 8 mm, S
section Two: 2 x Ch
let box_A = A of Bo
let box_I = I of Bo
let box_W = modulus of Bo
let box_It = I of Bt
let is_A = A of Is
let is_I = I of Is
let is_W = modulus of Is
let is_It = I of It
let is_Wt = modulus of It
let ch_A = A of Ch
let ch_I = I of Ch
let ch_It = I of Ct
let ch_Wt = modulus of Ct
let te_A = A of Te
let te_I = I of Te
let te_W = modulus of Te
let two_A = A of Two
let two_I = I of Two
let two_W = modulus of Two
let flange_is = flange of Is + web of Is`);
    const box = (b: number, d: number, t: number) => (b * d ** 3 - (b - 2 * t) * (d - 2 * t) ** 3) / 12;
    const web = 203 - 2 * 7.8;
    const iStrong = (133 * 203 ** 3 - (133 - 5.8) * web ** 3) / 12;
    const iWeak = (2 * 7.8 * 133 ** 3 + web * 5.8 ** 3) / 12;
    const channel = composite([
      { area: 175 * 8.5, centroid: 8.5 / 2, own: (175 * 8.5 ** 3) / 12 },
      { area: 2 * 75 * 12.5, centroid: 75 / 2, own: (2 * 12.5 * 75 ** 3) / 12 },
    ]);
    const channelStrong = (75 * 200 ** 3 - (75 - 8.5) * 175 ** 3) / 12;
    const tee = composite([
      { area: 100 * 10, centroid: 5, own: (100 * 10 ** 3) / 12 },
      { area: 110 * 8, centroid: 65, own: (8 * 110 ** 3) / 12 },
    ]);
    checkValues(note, {
      box_A: (100 * 200 - 88 * 188) * mm ** 2,
      box_I: box(100, 200, 6) * mm ** 4,
      box_W: (box(100, 200, 6) / 100) * mm ** 3,
      box_It: box(200, 100, 6) * mm ** 4,
      is_A: (2 * 133 * 7.8 + 5.8 * web) * mm ** 2,
      is_I: iStrong * mm ** 4,
      is_W: (iStrong / 101.5) * mm ** 3,
      is_It: iWeak * mm ** 4,
      is_Wt: (iWeak / 66.5) * mm ** 3,
      ch_A: (2 * 75 * 12.5 + 8.5 * 175) * mm ** 2,
      ch_I: channelStrong * mm ** 4,
      ch_It: channel.I * mm ** 4,
      // The smaller modulus: from the centroid to the farther edge.
      ch_Wt: (channel.I / (75 - channel.centroid)) * mm ** 3,
      te_A: (100 * 10 + 110 * 8) * mm ** 2,
      te_I: tee.I * mm ** 4,
      te_W: (tee.I / (120 - tee.centroid)) * mm ** 3,
      two_A: 2 * (2 * 75 * 12.5 + 8.5 * 175) * mm ** 2,
      two_I: 2 * channelStrong * mm ** 4,
      two_W: ((2 * channelStrong) / 100) * mm ** 3,
      flange_is: (7.8 + 5.8) * mm,
    });
    expect(codesOf(note)).toEqual([]);
  });
});

describe('given figures', () => {
  it('win over those of the shape, and properties of one’s own are kept', () => {
    const note = solved(`
material C24: E 11 GPa, density 420 kg/m3, fm 24 MPa
section J: solid 47 mm x 220 mm, C24, I 4000 cm4, kc 0.9
let i = I of J
let strength = kc of J * fm of C24
let mass_j = mass of J`);
    checkValues(note, { i: 4000e-8, strength: 0.9 * 24e6, mass_j: 420 * 0.047 * 0.22 });
  });

  it('from a table do without a shape', () => {
    // Simple beam, 5wL⁴/384EI, and the stress M/W with W = I / (depth/2).
    const note = solved(`
material S275: E 205 GPa, fy 275 MPa
section G: I 4410 cm4, A 39.7 cm2, depth 251 mm, S275
member B1: A -- 5 m -- B
support A: pinned
support B: roller
load live: 8 kN/m down on B1
find mid: deflection of B1
find top: stress in B1`);
    const M = (8e3 * 25) / 8;
    checkAnswers(note, {
      mid: { value: (5 * 8e3 * 5 ** 4) / (384 * 205e9 * 4410e-8), place: { member: 'B1', from: 'A', distance: 2.5 } },
      top: { value: (M * 0.1255) / 4410e-8, unit: 'Pa' },
    });
  });

  it('stiffness alone is enough, and makes a member axially stiff', () => {
    const note = solved(`
section H: EI 24 MN m2
member B1: A -- 3 m -- B
support A: fixed
load pull: 50 kN right at B
load hang: 6 kN down at B
combine both: pull + hang
find level: sway at B
find tip:   deflection at B
find thrust: force in B1`);
    checkAnswers(note, { level: 0, tip: (6e3 * 27) / (3 * 24e6), thrust: 50e3 });
  });

  it('of a member keep its length where that is assumed, and a bar gives way all the same', () => {
    // The post's head is held by its bending, 3EI/h³, and by the bar, EA/L, side by side; its own EA does not count.
    const note = solved(`
assume: axially stiff
section S: EI 10 MN m2, EA 100 MN
member P1: A -- 3 m up -- B
bar T1: B -- 4 m right -- C
support A: fixed
support C: pinned
load push: 8 kN right at B
load press: 90 kN down at B
combine both: push + press
find drift: sway at B
find head:  deflection at B
find strut: compression in T1`);
    const [post, bar] = [(3 * 10e6) / 27, 100e6 / 4];
    checkAnswers(note, { drift: 8e3 / (post + bar), head: 0, strut: (8e3 * bar) / (post + bar) });
  });
});

/** Centroid from the edge that the parts are measured from, and second moment of area about it (parallel axes). */
function composite(parts: readonly { area: number; centroid: number; own: number }[]) {
  const area = parts.reduce((sum, part) => sum + part.area, 0);
  const centroid = parts.reduce((sum, part) => sum + part.area * part.centroid, 0) / area;
  const I = parts.reduce((sum, part) => sum + part.own + part.area * (part.centroid - centroid) ** 2, 0);
  return { area, centroid, I };
}
