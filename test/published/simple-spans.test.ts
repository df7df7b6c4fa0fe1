// Simple spans, supported at A and B, of span L, constant EI.
import { aisc, check, EI, kappa, L, M, P, roark, w } from './check.ts';

const beam = (load: string) => `
member R: A -- 4.8 m -- B
support A: pinned
support B: roller
load live: ${load}
find worst: deflection of R
find turn:  rotation at A
find other: rotation at B
find most:  moment in R
find left:  reaction at A
find right: reaction at B`;

check('S01', 'uniform load', `${aisc('1', 'seen')}; ${roark('2e')}`, beam('2.75 kN/m down on R'), {
  worst: { value: (5 * w * L ** 4) / (384 * EI), place: { member: 'R', from: 'A', distance: L / 2 } },
  turn: (-w * L ** 3) / (24 * EI),
  most: (w * L ** 2) / 8,
  left: (w * L) / 2,
});

check('S02', 'point load at midspan', `${aisc('7')}; ${roark('1e')}`, beam('5.2 kN down at 2.4 m from A on R'), {
  worst: (P * L ** 3) / (48 * EI),
  turn: (-P * L ** 2) / (16 * EI),
  most: (P * L) / 4,
});

const a = 3.1;
const b = L - a;
check(
  'S03',
  'point load off the middle',
  `${aisc('8')}; ${roark('1e')}`,
  `
${beam('5.2 kN down at 3.1 m from A on R')}
find load: deflection at 3.1 m from A on R`,
  {
    load: (P * a ** 2 * b ** 2) / (3 * EI * L),
    worst: {
      value: (P * a * b * (a + 2 * b) * Math.sqrt(3 * a * (a + 2 * b))) / (27 * EI * L),
      place: { member: 'R', from: 'A', distance: Math.sqrt((a * (a + 2 * b)) / 3) },
    },
    turn: (-P * a * b * (L + b)) / (6 * EI * L),
    most: (P * a * b) / L,
  },
);

const c = 1.3;
check(
  'S04',
  'two equal point loads',
  aisc('9'),
  `
${beam('5.2 kN down at 1.3 m from A on R')}
load live: 5.2 kN down at 1.3 m from B on R
find load: deflection at 1.3 m from A on R`,
  {
    worst: (P * c * (3 * L ** 2 - 4 * c ** 2)) / (24 * EI),
    load: (P * c ** 2 * (3 * L - 4 * c)) / (6 * EI),
    most: P * c,
  },
);

const xi = Math.sqrt(1 - Math.sqrt(8 / 15));
check('S05', 'triangular load', `${aisc('2', 'seen')}; ${roark('2e')}`, beam('0 kN/m to 2.75 kN/m down on R'), {
  left: (w * L) / 6,
  right: (w * L) / 3,
  turn: (-7 * w * L ** 3) / (360 * EI),
  other: (w * L ** 3) / (45 * EI),
  most: { value: (w * L ** 2) / (9 * Math.sqrt(3)), place: { member: 'R', from: 'A', distance: L / Math.sqrt(3) } },
  worst: {
    value: (w * L ** 4 * xi * (3 * xi ** 4 - 10 * xi ** 2 + 7)) / (360 * EI),
    place: { member: 'R', from: 'A', distance: xi * L },
  },
});

check(
  'S06',
  'triangular load, greatest at midspan',
  aisc('3', 'seen'),
  `
${beam('0 kN/m to 2.75 kN/m down on R from A to 2.4 m')}
load live: 2.75 kN/m to 0 kN/m down on R from 2.4 m to B`,
  {
    worst: (w * L ** 4) / (120 * EI),
    most: (w * L ** 2) / 12,
    turn: (-5 * w * L ** 3) / (192 * EI),
  },
);

check(
  'S07',
  'couple at one end',
  `${aisc('35', 'from memory, uncertain')}; ${roark('3e')}`,
  beam('6.3 kN m clockwise at A'),
  {
    turn: (-M * L) / (3 * EI),
    other: (M * L) / (6 * EI),
    worst: {
      value: (M * L ** 2) / (9 * Math.sqrt(3) * EI),
      place: { member: 'R', from: 'A', distance: L - L / Math.sqrt(3) },
    },
  },
);

// The movement at the couple changes its sign at midspan: both sides.
check(
  'S08',
  'couple before midspan',
  `${aisc('36', 'from memory, uncertain')}; ${roark('3e')}`,
  `
${beam('6.3 kN m clockwise at 1.3 m from A on R')}
find there: deflection at 1.3 m from A on R`,
  {
    left: -M / L,
    right: M / L,
    most: M * (1 - c / L),
    there: (M * c * (L - c) * (L - 2 * c)) / (3 * EI * L),
  },
);

check(
  'S08',
  'couple behind midspan',
  `${aisc('36', 'from memory, uncertain')}; ${roark('3e')}`,
  `
${beam('6.3 kN m clockwise at 3.1 m from A on R')}
find there: deflection at 3.1 m from A on R`,
  {
    most: (-M * a) / L,
    there: (M * a * (L - a) * (L - 2 * a)) / (3 * EI * L),
  },
);

check(
  'S09',
  'uniform load on a part',
  aisc('5'),
  `
${beam('2.75 kN/m down on R from A to 3.1 m')}
find x: deflection at 1.3 m from A on R`,
  {
    left: (w * a * (2 * L - a)) / (2 * L),
    right: (w * a ** 2) / (2 * L),
    most: ((w * a * (2 * L - a)) / (2 * L)) ** 2 / (2 * w),
    x: ((w * c) / (24 * EI * L)) * (a ** 2 * (2 * L - a) ** 2 - 2 * a * c ** 2 * (2 * L - a) + L * c ** 3),
  },
);

check(
  'S10',
  'equal couples at the ends',
  `${roark('3e')}, superposed`,
  `
${beam('6.3 kN m clockwise at A')}
load live: 6.3 kN m anticlockwise at B
find here: moment at 1.3 m from A on R`,
  {
    worst: (M * L ** 2) / (8 * EI),
    most: M,
    here: M,
  },
);

check('S11', 'warmer above than below', roark('6e'), beam('heat R by 30 K above, 5 K below'), {
  worst: (-kappa * L ** 2) / 8,
  most: 0,
});
