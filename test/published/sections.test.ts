// Properties of sections from their dimensions; sharp corners.
import { checkLets } from './check.ts';

const ROARK = "Roark's Formulas for Stress and Strain, 8th ed., Table A.1 (from memory)";

const mm2 = 1e-6;
const mm3 = 1e-9;
const mm4 = 1e-12;

checkLets(
  'G01',
  'rectangle',
  `${ROARK}; AISC Steel Construction Manual, Table 17-27 (from memory)`,
  `
section T: solid 47 mm x 220 mm
let area = A of T
let second = I of T
let bend = modulus of T`,
  {
    area: 47 * 220 * mm2,
    second: ((47 * 220 ** 3) / 12) * mm4,
    bend: ((47 * 220 ** 2) / 6) * mm3,
  },
);

checkLets(
  'G02',
  'circular tube',
  ROARK,
  `
section T: tube 114.3 mm x 5 mm
let second = I of T
let bend = modulus of T`,
  {
    second: ((Math.PI * (114.3 ** 4 - 104.3 ** 4)) / 64) * mm4,
    bend: ((Math.PI * (114.3 ** 4 - 104.3 ** 4)) / 32 / 114.3) * mm3,
  },
);

checkLets(
  'G03',
  'rectangular box',
  ROARK,
  `
section T: box 100 mm x 200 mm x 6 mm
let area = A of T
let second = I of T`,
  {
    area: (100 * 200 - 88 * 188) * mm2,
    second: ((100 * 200 ** 3 - 88 * 188 ** 3) / 12) * mm4,
  },
);

const web = 203 - 2 * 7.8;
checkLets(
  'G04',
  'doubly symmetric I, about both axes',
  ROARK,
  `
section T: i-shape 203 mm x 133 mm x 7.8 mm x 5.8 mm
section U: i-shape 203 mm x 133 mm x 7.8 mm x 5.8 mm, turned
let area = A of T
let second = I of T
let other = I of U`,
  {
    area: (2 * 133 * 7.8 + 5.8 * web) * mm2,
    second: ((133 * 203 ** 3 - (133 - 5.8) * web ** 3) / 12) * mm4,
    other: ((2 * 7.8 * 133 ** 3) / 12 + (web * 5.8 ** 3) / 12) * mm4,
  },
);
