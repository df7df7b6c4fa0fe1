// Beams supported at A and B, a span L apart, that overhang by a to C; constant EI.
import { aisc, check, EI, L, P, w } from './check.ts';

const a = 1.9;

const beam = (load: string) => `
member R: A -- 4.8 m -- B -- 1.9 m -- C
support A: pinned
support B: roller
load live: ${load}
find tip:   deflection at C
find rise:  deflection of R between A and B
find most:  sagging in R
find over:  moment at B in R
find left:  reaction at A
find right: reaction at B`;

check('O01', 'point load at the tip', aisc('26'), beam('5.2 kN down at C'), {
  tip: (P * a ** 2 * (L + a)) / (3 * EI),
  right: (P * (L + a)) / L,
  rise: {
    value: (-P * a * L ** 2) / (9 * Math.sqrt(3) * EI),
    place: { member: 'R', from: 'A', distance: L / Math.sqrt(3) },
  },
});

check('O02', 'uniform load on the overhang', aisc('25'), beam('2.75 kN/m down on R from B to C'), {
  tip: (w * a ** 3 * (4 * L + 3 * a)) / (24 * EI),
  over: (-w * a ** 2) / 2,
  rise: (-w * a ** 2 * L ** 2) / (18 * Math.sqrt(3) * EI),
});

check('O03', 'uniform load throughout', aisc('24'), beam('2.75 kN/m down on R'), {
  left: (w * (L ** 2 - a ** 2)) / (2 * L),
  right: (w * (L + a) ** 2) / (2 * L),
  most: (w * (L + a) ** 2 * (L - a) ** 2) / (8 * L ** 2),
  tip: (w * a * (4 * a ** 2 * L - L ** 3 + 3 * a ** 3)) / (24 * EI),
});

// A long overhang: the tip goes down instead of up.
const long = 3.1;
check(
  'O03',
  'uniform load throughout, long overhang',
  aisc('24'),
  `
member R: A -- 4.8 m -- B -- 3.1 m -- C
support A: pinned
support B: roller
load live: 2.75 kN/m down on R
find tip: deflection at C`,
  {
    tip: (w * long * (4 * long ** 2 * L - L ** 3 + 3 * long ** 3)) / (24 * EI),
  },
);

check('O04', 'uniform load between the supports', aisc('27'), beam('2.75 kN/m down on R from A to B'), {
  tip: (-w * L ** 3 * a) / (24 * EI),
});

check(
  'O05',
  'point load midway between the supports',
  `${aisc('28')}, at L/2`,
  beam('5.2 kN down at 2.4 m from A on R'),
  {
    tip: (-P * L ** 2 * a) / (16 * EI),
  },
);
