// Shear deformation and semi-rigid ends. GAs = κGA; φ = 12 EI/GAs L².
import { check, checkLets, EI, L, M, P, w } from './check.ts';

const GAs = 9.1e6;
const k = 3.7e6;
const TIMOSHENKO =
  "Timoshenko beam theory; Roark's Formulas for Stress and Strain, 8th ed., section 8.10 (from memory)";

const sheared = (body: string) => `
assume: shear deformation
section V: EI 6.4 MN m2, GAs 9.1 MN
member R, V: A -- 4.8 m -- B
point C: 2.4 m from A on R
${body}`;

check(
  'C10',
  'cantilever with shear flexibility, point load at the tip',
  TIMOSHENKO,
  sheared('support A: fixed\nload live: 5.2 kN down at B\nfind tip: deflection at B\nfind turn: rotation at B'),
  { tip: (P * L ** 3) / (3 * EI) + (P * L) / GAs, turn: (-P * L ** 2) / (2 * EI) },
);

check(
  'S12',
  'simple beam with shear flexibility, uniform load',
  TIMOSHENKO,
  sheared('support A: pinned\nsupport B: roller\nload live: 2.75 kN/m down on R\nfind mid: deflection at C'),
  { mid: (5 * w * L ** 4) / (384 * EI) + (w * L ** 2) / (8 * GAs) },
);

check(
  'S12',
  'simple beam with shear flexibility, point load at midspan',
  TIMOSHENKO,
  sheared('support A: pinned\nsupport B: roller\nload live: 5.2 kN down at C\nfind mid: deflection at C'),
  { mid: (P * L ** 3) / (48 * EI) + (P * L) / (4 * GAs) },
);

// The shear of the end couple is M/L throughout, and the section turns by M/L GAs more.
check(
  'S07',
  'simple beam with shear flexibility, couple at one end',
  TIMOSHENKO,
  sheared(`support A: pinned
support B: roller
load live: 6.3 kN m clockwise at B
find near: rotation at B
find far: rotation at A`),
  {
    near: (-M * L) / (3 * EI) - M / (L * GAs),
    far: (M * L) / (6 * EI) - M / (L * GAs),
  },
);

check(
  'P01',
  'propped cantilever with shear flexibility, uniform load',
  'compatibility of the prop: (wL⁴/8EI + wL²/2GAs) / (L³/3EI + L/GAs)',
  sheared('support A: roller\nsupport B: fixed\nload live: 2.75 kN/m down on R\nfind prop: reaction at A'),
  {
    prop: ((w * L ** 4) / (8 * EI) + (w * L ** 2) / (2 * GAs)) / (L ** 3 / (3 * EI) + L / GAs),
  },
);

const phi = (12 * EI) / (GAs * L ** 2);
check(
  'X06',
  'fixed beam with shear flexibility, one end settles',
  'slope-deflection with shear: R = 12EIΔ/L³(1 + φ), M = 6EIΔ/L²(1 + φ); Przemieniecki, Theory of Matrix Structural Analysis, 1968, section 5.6 (from memory)',
  sheared(`support A: fixed
support B: fixed
load sink: move B by 7 mm down
find wall: moment at A in R
find force_A: reaction at A`),
  {
    wall: (-6 * EI * 7e-3) / (L ** 2 * (1 + phi)),
    force_A: (12 * EI * 7e-3) / (L ** 3 * (1 + phi)),
  },
);

// Both ends on springs that turn: M = wL²/12 · 1/(1 + 2EI/kL), by slope-deflection 2EIθ/L = kθ − fixed-end moment.
const semiRigid = (w * L ** 2) / 12 / (1 + (2 * EI) / (k * L));
check(
  'X01',
  'semi-rigid at both ends, uniform load',
  'Monforton and Wu, Matrix analysis of semi-rigidly connected frames, Journal of the Structural Division, ASCE, 1963 (from memory)',
  `
member R: A -- 4.8 m -- B
point C: 2.4 m from A on R
support A: fixed
support B: fixed
connection A in R: 3.7 MN m/rad
connection B in R: 3.7 MN m/rad
load live: 2.75 kN/m down on R
find wall: moment at A in R
find most: moment at C in R
find mid: deflection at C
find turn: rotation at A in R`,
  {
    wall: -semiRigid,
    most: (w * L ** 2) / 8 - semiRigid,
    mid: (5 * w * L ** 4) / (384 * EI) - (semiRigid * L ** 2) / (8 * EI),
    turn: -semiRigid / k,
  },
);

// One end rigid, the other on a spring that turns: the far end's couple is that of a propped cantilever, softened.
check(
  'P01',
  'semi-rigid at one end, hinged at the other, uniform load',
  'compatibility exercise (textbook): M = (wL²/8) / (1 + 3EI/kL)',
  `
member R: A -- 4.8 m -- B
support A: fixed
support B: roller
connection A in R: 3.7 MN m/rad
load live: 2.75 kN/m down on R
find wall: moment at A in R
find prop: reaction at B`,
  {
    wall: -(w * L ** 2) / 8 / (1 + (3 * EI) / (k * L)),
    prop: (w * L) / 2 - (w * L) / 8 / (1 + (3 * EI) / (k * L)),
  },
);

const ENERGY = "Roark's Formulas for Stress and Strain, 8th ed., section 8.10 (from memory)";
checkLets(
  'K01–K03',
  'shear factors by energy: rectangle, circle, thin tube',
  ENERGY,
  `
material M: E 12 GPa, G 0.7 GPa
section Rect: solid 90 mm x 315 mm, M
section Circle: round 140 mm, M
section Thin: tube 114.3 mm x 5 mm, M
let k1 = GAs of Rect / (G of Rect * A of Rect)
let k2 = GAs of Circle / (G of Circle * A of Circle)
let k3 = GAs of Thin / (G of Thin * A of Thin)`,
  { k1: 5 / 6, k2: 9 / 10, k3: 1 / 2 },
);
