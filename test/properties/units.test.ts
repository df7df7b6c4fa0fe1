// A note in feet and pounds, and the same in metres and kilonewtons, word by word, give the same answers in SI.
import fc from 'fast-check';
import { expect } from 'vitest';
import { codesOf, solved } from '../notes/check-note.ts';
import { holds } from './run.ts';

interface Words {
  /** Of so many feet, pounds per foot, pounds, inches⁴, ksi, degrees … as the note says them. */
  readonly length: (feet: number) => string;
  readonly lineLoad: (poundsPerFoot: number) => string;
  readonly force: (kips: number) => string;
  readonly couple: (kipFeet: number) => string;
  readonly stress: (ksi: number) => string;
  readonly inertia: (inches4: number) => string;
  readonly area: (inches2: number) => string;
  readonly spring: (kipsPerInch: number) => string;
  readonly movement: (inches: number) => string;
}

const US: Words = {
  length: feet => `${feet} ft`,
  lineLoad: plf => `${plf} plf`,
  force: kips => `${kips} kip`,
  couple: kipFeet => `${kipFeet} kip ft`,
  stress: ksi => `${ksi} ksi`,
  inertia: inches4 => `${inches4} in4`,
  area: inches2 => `${inches2} in2`,
  spring: kipsPerInch => `${kipsPerInch} kip/in`,
  movement: inches => `${inches} in`,
};

// The foot is 0.3048 m and the pound force 4.4482216152605 N, exactly.
const FOOT = 0.3048;
const INCH = 0.0254;
const KIP = 4.4482216152605;

const METRIC: Words = {
  length: feet => `${feet * FOOT} m`,
  lineLoad: plf => `${(plf * KIP) / 1000 / FOOT} kN/m`,
  force: kips => `${kips * KIP} kN`,
  couple: kipFeet => `${kipFeet * KIP * FOOT} kN m`,
  stress: ksi => `${(ksi * KIP) / 1000 / INCH ** 2} MPa`,
  inertia: inches4 => `${inches4 * 2.54 ** 4} cm4`,
  area: inches2 => `${inches2 * 2.54 ** 2} cm2`,
  spring: kipsPerInch => `${(kipsPerInch * KIP) / 25.4} kN/mm`,
  movement: inches => `${inches * 25.4} mm`,
};

function note(words: Words, [a, b, post, load, push, turn, stiff, sink]: readonly number[]): string {
  return `
material Steel: E ${words.stress(29_000)}
section  S: I ${words.inertia(stiff!)}, A ${words.area(stiff! / 12)}, Steel
member R: A -- ${words.length(a!)} -- B -- ${words.length(b!)} -- C
member P: B -- ${words.length(post!)} down -- D
support A: pinned
support C: spring ${words.spring(stiff! / 4)} y
support D: fixed
load dead: ${words.lineLoad(10 * load!)} to ${words.lineLoad(25 * load!)} down on R from A to B
load live: ${words.force(push! / 4)} right at B
load live: ${words.couple(turn!)} clockwise at C
load live: move D by ${words.movement(sink! / 16)} down
combine all1: 1.2 dead + 1.6 live
find drop: deflection of R
find lean: sway at B
find turn: rotation at C
find most: moment in R
find push: force in P
find seat: reaction at A
find peak: sag of R between A and B`;
}

const figures = fc.tuple(...Array.from({ length: 8 }, () => fc.integer({ min: 4, max: 40 })));

/** Random figures give rise to these, and nothing else. */
const DOUBTS = ['unasked-uplift', 'large-movement', 'slender-compression'];

holds(
  'a note in US units and in metric ones',
  figures,
  numbers => {
    const us = solved(note(US, numbers));
    const metric = solved(note(METRIC, numbers));
    expect(codesOf(us)).toEqual(codesOf(metric));
    expect(codesOf(us).filter(code => !DOUBTS.includes(code))).toEqual([]);
    for (const [index, { name, value, unit }] of us.answers.entries()) {
      const other = metric.answers[index]!;
      expect(other.unit, name).toBe(unit);
      expect(Math.abs(other.value! - value!), name).toBeLessThanOrEqual(1e-10 * Math.abs(value!));
    }
  },
  50,
);
