// Propped cantilevers (prop at A, fixed at B) and beams fixed at both ends, of span L, constant EI.
import { aisc, check, EI, kappa, L, M, P, roark, w } from './check.ts';

const ASK = `
find worst: deflection of R
find near:  moment at A in R
find wall:  moment at B in R
find left:  reaction at A
find right: reaction at B
find turn:  rotation at A`;

const propped = (load: string) => `
member R: A -- 4.8 m -- B
support A: roller
support B: fixed
load live: ${load}${ASK}`;

const fixed = (load: string) => `
member R: A -- 4.8 m -- B
support A: fixed
support B: fixed
load live: ${load}${ASK}`;

const xi = (1 + Math.sqrt(33)) / 16;
check(
  'P01',
  'propped, uniform load',
  `${aisc('12')}, which prints 185 for 184.634; ${roark('2c')}`,
  `
${propped('2.75 kN/m down on R')}
find most: sagging in R`,
  {
    left: (3 * w * L) / 8,
    wall: (-w * L ** 2) / 8,
    most: (9 * w * L ** 2) / 128,
    worst: {
      value: (w * L ** 4 * xi * (1 - 3 * xi ** 2 + 2 * xi ** 3)) / (48 * EI),
      place: { member: 'R', from: 'A', distance: xi * L },
    },
  },
);

check(
  'P02',
  'propped, point load at midspan',
  `${aisc('13')}; ${roark('1c')}`,
  `
${propped('5.2 kN down at 2.4 m from A on R')}
find load: deflection at 2.4 m from A on R`,
  {
    left: (5 * P) / 16,
    wall: (-3 * P * L) / 16,
    load: (7 * P * L ** 3) / (768 * EI),
    worst: {
      value: (P * L ** 3) / (48 * Math.sqrt(5) * EI),
      place: { member: 'R', from: 'A', distance: L / Math.sqrt(5) },
    },
  },
);

const a = 3.1;
const b = L - a;
check(
  'P03',
  'propped, point load off the middle',
  `${aisc('14')}; ${roark('1c')}`,
  `
${propped('5.2 kN down at 3.1 m from A on R')}
find load: deflection at 3.1 m from A on R`,
  {
    left: (P * b ** 2 * (a + 2 * L)) / (2 * L ** 3),
    wall: (-P * a * b * (a + L)) / (2 * L ** 2),
    load: (P * a ** 2 * b ** 3 * (3 * L + a)) / (12 * EI * L ** 3),
  },
);

check('P04', 'propped, triangular load, greatest at the wall', roark('2c'), propped('0 kN/m to 2.75 kN/m down on R'), {
  left: (w * L) / 10,
  wall: (-w * L ** 2) / 15,
  worst: {
    value: (2 * w * L ** 4) / (375 * Math.sqrt(5) * EI),
    place: { member: 'R', from: 'A', distance: L / Math.sqrt(5) },
  },
});

check('P05', 'propped, triangular load, greatest at the prop', roark('2c'), propped('2.75 kN/m to 0 kN/m down on R'), {
  left: (11 * w * L) / 40,
  wall: (-7 * w * L ** 2) / 120,
});

check(
  'P06',
  'propped, couple at the prop',
  `${roark('3c')}; carry-over of moment distribution`,
  propped('6.3 kN m clockwise at A'),
  {
    left: (-3 * M) / (2 * L),
    wall: -M / 2,
    near: M,
    turn: (-M * L) / (4 * EI),
  },
);

check('P07', 'propped, the prop settles', roark('5c'), propped('move A by 8 mm down'), {
  left: (-3 * EI * 0.008) / L ** 3,
  wall: (-3 * EI * 0.008) / L ** 2,
});

check('P08', 'propped, warmer above than below', roark('6c'), propped('heat R by 30 K above, 5 K below'), {
  near: 0,
  wall: (3 * EI * kappa) / 2,
  left: (3 * EI * kappa) / (2 * L),
  right: (-3 * EI * kappa) / (2 * L),
});

check(
  'P09',
  'propped by a spring, uniform load',
  'exercise of compatibility in textbooks',
  `
member R: A -- 4.8 m -- B
support A: spring 0.9 MN/m y
support B: fixed
load live: 2.75 kN/m down on R${ASK}`,
  {
    left: (3 * w * L) / 8 / (1 + (3 * EI) / (0.9e6 * L ** 3)),
  },
);

check(
  'X01',
  'fixed, uniform load',
  `${aisc('15')}; ${roark('2d')}`,
  `
${fixed('2.75 kN/m down on R')}
find mid: moment at 2.4 m from A on R`,
  {
    near: (-w * L ** 2) / 12,
    wall: (-w * L ** 2) / 12,
    mid: (w * L ** 2) / 24,
    worst: (w * L ** 4) / (384 * EI),
  },
);

check(
  'X02',
  'fixed, point load at midspan',
  `${aisc('16')}; ${roark('1d')}`,
  `
${fixed('5.2 kN down at 2.4 m from A on R')}
find mid: moment at 2.4 m from A on R`,
  {
    near: (-P * L) / 8,
    mid: (P * L) / 8,
    worst: (P * L ** 3) / (192 * EI),
  },
);

check(
  'X03',
  'fixed, point load off the middle',
  `${aisc('17')}; ${roark('1d')}`,
  `
${fixed('5.2 kN down at 3.1 m from A on R')}
find under: moment at 3.1 m from A on R
find load:  deflection at 3.1 m from A on R`,
  {
    near: (-P * a * b ** 2) / L ** 2,
    wall: (-P * a ** 2 * b) / L ** 2,
    left: (P * b ** 2 * (3 * a + b)) / L ** 3,
    under: (2 * P * a ** 2 * b ** 2) / L ** 3,
    load: (P * a ** 3 * b ** 3) / (3 * EI * L ** 3),
    worst: {
      value: (2 * P * a ** 3 * b ** 2) / (3 * EI * (3 * a + b) ** 2),
      place: { member: 'R', from: 'A', distance: (2 * a * L) / (3 * a + b) },
    },
  },
);

check('X04', 'fixed, triangular load', roark('2d'), fixed('0 kN/m to 2.75 kN/m down on R'), {
  near: (-w * L ** 2) / 30,
  wall: (-w * L ** 2) / 20,
  left: (3 * w * L) / 20,
  right: (7 * w * L) / 20,
});

check('X05', 'fixed, couple within the span', roark('3d'), fixed('6.3 kN m clockwise at 3.1 m from A on R'), {
  left: (-6 * M * a * b) / L ** 3,
  right: (6 * M * a * b) / L ** 3,
  near: (M * b * (2 * a - b)) / L ** 2,
  wall: (-M * a * (2 * b - a)) / L ** 2,
});

check('X06', 'fixed, one end settles', `${roark('5d')}; slope-deflection`, fixed('move B by 8 mm down'), {
  near: (-6 * EI * 0.008) / L ** 2,
  wall: (6 * EI * 0.008) / L ** 2,
  left: (12 * EI * 0.008) / L ** 3,
  right: (-12 * EI * 0.008) / L ** 3,
});

check('X07', 'fixed, one end turned', `${roark('4d')}; slope-deflection`, fixed('move A by 2 mrad clockwise'), {
  near: (4 * EI * 0.002) / L,
  wall: (-2 * EI * 0.002) / L,
  left: (-6 * EI * 0.002) / L ** 2,
  turn: -0.002,
});

// Its length is held and it is axially stiff: the mean over the depth must be nil.
check('X08', 'fixed, warmer above than below', roark('6d'), fixed('heat R by 12.5 K above, -12.5 K below'), {
  worst: 0,
  near: EI * kappa,
  wall: EI * kappa,
  left: 0,
  turn: 0,
});
