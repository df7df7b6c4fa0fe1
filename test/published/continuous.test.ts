// Beams over three and four supports, equal spans L unless the note says otherwise, constant EI.
import { aisc, check, EI, L, P, roark, root, w } from './check.ts';

const ASK = `
find first: reaction at A
find second: reaction at B
find third: reaction at C
find over: moment at B in R
find most: sagging in R
find worst: deflection of R between A and B`;

const two = (load: string) => `
member R: A -- 4.8 m -- B -- 4.8 m -- C
support A: pinned
support B: roller
support C: roller
load live: ${load}${ASK}`;

const three = (load: string) => `
member R: A -- 4.8 m -- B -- 4.8 m -- C -- 4.8 m -- D
support A: pinned
support B: roller
support C: roller
support D: roller
load live: ${load}${ASK}
find fourth: reaction at D
find next: moment at C in R`;

/** Largest movement of a uniformly loaded end span whose outer reaction is r w L: from M = r w L x − w x²/2. */
function endSpan(r: number) {
  const c = r / 6 - 1 / 24;
  const xi = root(x => c - (r * x ** 2) / 2 + x ** 3 / 6, 0.2, 0.6);
  return {
    value: ((w * L ** 4) / EI) * (c * xi - (r * xi ** 3) / 6 + xi ** 4 / 24),
    place: { member: 'R', from: 'A', distance: xi * L },
  };
}

check(
  'N01',
  'two spans, uniform load',
  'Civil Engineering Formulas (McGraw-Hill), Table 2.1 (seen)',
  two('2.75 kN/m down on R'),
  {
    first: (3 * w * L) / 8,
    second: (5 * w * L) / 4,
    third: (3 * w * L) / 8,
    over: (-w * L ** 2) / 8,
    worst: endSpan(3 / 8),
  },
);

check(
  'N02',
  'two spans, uniform load on one',
  aisc('29', 'from memory, uncertain'),
  two('2.75 kN/m down on R from A to B'),
  {
    first: (7 * w * L) / 16,
    second: (5 * w * L) / 8,
    third: (-w * L) / 16,
    over: (-w * L ** 2) / 16,
    most: (49 * w * L ** 2) / 512,
  },
);

check(
  'N03',
  'two spans, point load at the middle of one',
  aisc('30', 'from memory, uncertain'),
  two('5.2 kN down at 2.4 m from A on R'),
  {
    first: (13 * P) / 32,
    second: (11 * P) / 16,
    third: (-3 * P) / 32,
    over: (-3 * P * L) / 32,
    most: (13 * P * L) / 64,
  },
);

const L2 = 3.7;
check(
  'N04',
  'two unequal spans, uniform load',
  "Clapeyron's three-moment equation",
  `
member R: A -- 4.8 m -- B -- 3.7 m -- C
support A: pinned
support B: roller
support C: roller
load live: 2.75 kN/m down on R${ASK}`,
  {
    over: (-w * (L ** 3 + L2 ** 3)) / (8 * (L + L2)),
  },
);

check(
  'N05',
  'three spans, uniform load',
  `${aisc('39', 'from memory, uncertain')}, which prints 0.0069; Civil Engineering Formulas (McGraw-Hill), Table 2.1 (seen)`,
  `
${three('2.75 kN/m down on R')}
find mid: sagging in R between B and C`,
  {
    first: (2 * w * L) / 5,
    second: (11 * w * L) / 10,
    over: (-w * L ** 2) / 10,
    most: (2 * w * L ** 2) / 25,
    mid: (w * L ** 2) / 40,
    worst: endSpan(2 / 5),
  },
);

check(
  'N06',
  'three spans, uniform load on the outer ones',
  `${aisc('38', 'from memory, uncertain')}, which prints 0.0099`,
  `
${three('2.75 kN/m down on R from A to B')}
load live: 2.75 kN/m down on R from C to D`,
  {
    first: (9 * w * L) / 20,
    second: (11 * w * L) / 20,
    over: (-w * L ** 2) / 20,
    most: (81 * w * L ** 2) / 800,
    worst: endSpan(9 / 20),
  },
);

check(
  'N07',
  'three spans, an outer one without load',
  `${aisc('37', 'from memory, uncertain')}, which prints 0.0059`,
  three('2.75 kN/m down on R from A to C'),
  {
    first: (23 * w * L) / 60,
    second: (6 * w * L) / 5,
    third: (9 * w * L) / 20,
    fourth: (-w * L) / 30,
    over: (-7 * w * L ** 2) / 60,
    next: (-w * L ** 2) / 30,
    worst: endSpan(23 / 60),
  },
);

check(
  'N08',
  'two spans, the middle support settles',
  'three-moment equation with settlement',
  two('move B by 8 mm down'),
  {
    over: (3 * EI * 0.008) / L ** 2,
    second: (-6 * EI * 0.008) / L ** 3,
  },
);

check(
  'N09',
  'two spans on a spring, uniform load',
  `exercise of compatibility in textbooks; stiff spring: ${roark('2c')}`,
  `
member R: A -- 4.8 m -- B -- 4.8 m -- C
support A: pinned
support B: spring 0.9 MN/m y
support C: roller
load live: 2.75 kN/m down on R${ASK}`,
  {
    second: (5 * w * L) / 4 / (1 + (6 * EI) / (0.9e6 * L ** 3)),
  },
);

/** Any of the spans loaded: the envelope's coefficients are those of the worst arrangement of each table. */
const patterned = (spans: 'two' | 'three', ask: string) =>
  `${{ two, three }[spans]('2.75 kN/m down on R, patterned').split('\nfind first')[0]}\n${ask}`;

check(
  'N02, N01 patterned',
  'two spans, uniform load on any of them',
  aisc('29 for one span loaded', 'from memory, uncertain'),
  patterned('two', 'find most: sagging in R\nfind over: moment at B in R\nrequire lift: reaction at C >= -1 kN "x"'),
  {
    most: { value: (49 * w * L ** 2) / 512, governing: 'live on A–B' },
    over: { value: (-w * L ** 2) / 8, governing: 'live on A–B, B–C' },
    lift: { value: (-w * L) / 16, governing: 'live on A–B' },
  },
);

check(
  'N05, N06, N07 patterned',
  'three spans, uniform load on any of them',
  aisc('37 and 38', 'from memory, uncertain'),
  patterned(
    'three',
    'find most: sagging in R\nfind over: moment at B in R\nfind push: reaction at B\nfind worst: deflection of R',
  ),
  {
    most: { value: (81 * w * L ** 2) / 800, governing: 'live on A–B, C–D' },
    over: { value: (-7 * w * L ** 2) / 60, governing: 'live on A–B, B–C' },
    push: { value: (6 * w * L) / 5, governing: 'live on A–B, B–C' },
    worst: { ...endSpan(9 / 20), governing: 'live on A–B, C–D' },
  },
);
