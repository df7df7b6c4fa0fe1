// Rectangular portals without axial strain (height h, span L, posts of EI, beam of EIb, k = Ib h / Ic L) and trusses of
// equal EA.
import { check, EI, L, P, w } from './check.ts';

const h = 3.6;
const k = ((15.1e6 / EI) * h) / L;

const portal = (foot: string, load: string) => `
section Beam: EI 15.1 MN m2
member P1, S:    A -- 3.6 m up -- B
member G1, Beam: B -- 4.8 m -- C
member P2, S:    C -- 3.6 m down -- D
support A: ${foot}
support D: ${foot}
load live: ${load}
find thrust: reaction at A horizontal
find lift:   reaction at A
find base:   moment at A in P1
find knee:   moment at B in P1
find far:    moment at C in G1
find eaves:  sway at B`;

const KLEINLOGEL = 'Kleinlogel, Rigid Frame Formulas; Roark, Table 8.2 (from memory)';

check('F01', 'pinned feet, load at the beam', KLEINLOGEL, portal('pinned', '5.2 kN right at B'), {
  thrust: -P / 2,
  lift: (-P * h) / L,
  knee: (P * h) / 2,
  far: (-P * h) / 2,
  eaves: (P * h ** 3 * (2 + 1 / k)) / (12 * EI),
});

check(
  'F02',
  'pinned feet, uniform load on the beam',
  KLEINLOGEL,
  portal('pinned', '2.75 kN/m down on G1'),
  {
    thrust: (w * L ** 2) / (4 * h * (2 * k + 3)),
    knee: (-w * L ** 2) / (4 * (2 * k + 3)),
    eaves: 0,
  },
  1e-3,
);

check('F03', 'fixed feet, load at the beam', KLEINLOGEL, portal('fixed', '5.2 kN right at B'), {
  base: ((-P * h) / 2) * ((3 * k + 1) / (6 * k + 1)),
  knee: ((P * h) / 2) * ((3 * k) / (6 * k + 1)),
  lift: (-3 * P * h * k) / (L * (6 * k + 1)),
  eaves: (P * h ** 3 * (3 * k + 2)) / (12 * EI * (6 * k + 1)),
});

check('F04', 'fixed feet, uniform load on the beam', KLEINLOGEL, portal('fixed', '2.75 kN/m down on G1'), {
  base: (w * L ** 2) / (12 * (k + 2)),
  knee: (-w * L ** 2) / (6 * (k + 2)),
  thrust: (w * L ** 2) / (4 * h * (k + 2)),
});

const EA = 84e6;
const UNIT_LOAD = 'exercise of the unit load method in textbooks';

const s = 1 / 2.6;
check(
  'T01',
  'two bars to an apex',
  UNIT_LOAD,
  `
section Rod: EA 84 MN
bar a, Rod: A -- 2.4 m right, 1 m up -- C
bar b, Rod: C -- 2.4 m right, 1 m down -- B
support A: pinned
support B: pinned
load live: 5.2 kN down at C
find drop: deflection at C
find push: force in a`,
  {
    drop: (P * 2.6) / (2 * EA * s ** 2),
    push: -P / (2 * s),
  },
);

check(
  'T02',
  'bracket of a level bar and a tie at 45°',
  UNIT_LOAD,
  `
section Rod: EA 84 MN
point W: 0 m, 2.2 m
bar strut, Rod: A -- 2.2 m -- C
bar tie, Rod: W -- C
support A: pinned
support W: pinned
load live: 5.2 kN down at C
find drop: deflection at C
find shift: sway at C`,
  {
    drop: ((P * 2.2) / EA) * (1 + 2 * Math.SQRT2),
    shift: (-P * 2.2) / EA,
  },
);

const cosine = 0.8;
check(
  'T03',
  'three bars, one redundant',
  'Timoshenko, Strength of Materials, Part I',
  `
section Rod: EA 84 MN
point K: 3 m, -4 m
point M: 3 m, 0 m
point Z: 6 m, 0 m
bar l, Rod: A -- K
bar m, Rod: M -- K
bar r, Rod: Z -- K
support A: pinned
support M: pinned
support Z: pinned
load live: 5.2 kN down at K
find drop: deflection at K
find pull: force in m`,
  {
    drop: (P * 4) / (EA * (1 + 2 * cosine ** 3)),
    pull: P / (1 + 2 * cosine ** 3),
  },
);

const [a, rise, rafter] = [3, 1.25, 3.25];
check(
  'T04',
  'king post',
  UNIT_LOAD,
  `
section Rod: EA 84 MN
bars tie, Rod: A -- 3 m -- M -- 3 m -- B
bars rafter, Rod: A -- 3 m right, 1.25 m up -- C -- B
bar post, Rod: M -- C
support A: pinned
support B: roller
load live: 5.2 kN down at M
find drop: deflection at M`,
  {
    drop: (P / EA) * (a ** 3 / (2 * rise ** 2) + rafter ** 3 / (2 * rise ** 2) + rise),
  },
);
