// Cantilevers, fixed at the left end A, of span L, constant EI unless the note says otherwise.
import { aisc, check, EI, kappa, L, M, P, roark, w } from './check.ts';

const ASK = `
find tip:  deflection at B
find turn: rotation at B
find wall: moment at A in R`;

const beam = (load: string) => `
member R: A -- 4.8 m -- B
support A: fixed
load live: ${load}${ASK}`;

check('C01', 'point load at the tip', `${aisc('22')}; ${roark('1a')}`, beam('5.2 kN down at B'), {
  tip: (P * L ** 3) / (3 * EI),
  turn: (-P * L ** 2) / (2 * EI),
  wall: -P * L,
});

const b = 3.1;
check(
  'C02',
  'point load at b',
  `${aisc('21')}; ${roark('1a')}`,
  `
${beam('5.2 kN down at 3.1 m from A on R')}
find load: deflection at 3.1 m from A on R`,
  {
    tip: (P * b ** 2 * (3 * L - b)) / (6 * EI),
    load: (P * b ** 3) / (3 * EI),
    wall: -P * b,
  },
);

check('C03', 'uniform load', `${aisc('19')}; ${roark('2a')}`, beam('2.75 kN/m down on R'), {
  tip: (w * L ** 4) / (8 * EI),
  turn: (-w * L ** 3) / (6 * EI),
  wall: (-w * L ** 2) / 2,
});

check(
  'C04',
  'triangular load, greatest at the wall',
  `${aisc('18')}; ${roark('2a')}`,
  beam('2.75 kN/m to 0 kN/m down on R'),
  {
    tip: (w * L ** 4) / (30 * EI),
    turn: (-w * L ** 3) / (24 * EI),
    wall: (-w * L ** 2) / 6,
  },
);

check('C05', 'triangular load, greatest at the tip', roark('2a'), beam('0 kN/m to 2.75 kN/m down on R'), {
  tip: (11 * w * L ** 4) / (120 * EI),
  turn: (-w * L ** 3) / (8 * EI),
  wall: (-w * L ** 2) / 3,
});

check('C06', 'couple at the tip', roark('3a'), beam('6.3 kN m clockwise at B'), {
  tip: (M * L ** 2) / (2 * EI),
  turn: (-M * L) / EI,
  wall: -M,
});

check('C07', 'warmer above than below', roark('6a'), beam('heat R by 30 K above, 5 K below'), {
  tip: (kappa * L ** 2) / 2,
  turn: -kappa * L,
  wall: 0,
});

check(
  'C08',
  'tip free to move, not to turn',
  `${aisc('23')}; ${roark('1b')}`,
  `
${beam('5.2 kN down at B')}
support B: guided
find end:  moment at B in R`,
  {
    tip: (P * L ** 3) / (12 * EI),
    wall: (-P * L) / 2,
    end: (P * L) / 2,
  },
);

const a = 1.7;
check(
  'C09',
  'stiffness in two steps',
  'exercise of the unit load method in textbooks',
  `
section Thin: EI 2.2 MN m2
member R: A -- 1.7 m of S -- K -- 3.1 m of Thin -- B
support A: fixed
load live: 5.2 kN down at B
find tip: deflection at B`,
  {
    tip: (P / 3) * ((L ** 3 - (L - a) ** 3) / EI + (L - a) ** 3 / 2.2e6),
  },
);
