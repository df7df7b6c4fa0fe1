// Releases, semi-rigid connections and shear deformation in whole notes, with answers worked by hand.
import { describe, expect, it } from 'vitest';
import { checkAnswers, checkValues, codesOf, solved } from './check-note.ts';

// EI = 10 MN m², EA = 500 MN, legs of 4 m.
const BEAM = 'section S: EI 10 MN m2, EA 500 MN\nmember R: A -- 4 m -- B -- 4 m -- C\n';

describe('a semi-rigid connection', () => {
  it('at a fixed foot lets the member turn by M/k against it', () => {
    const note = solved(`
section S: EI 10 MN m2
member R: A -- 4 m -- B
support A: fixed
connection A in R: 5 MN m/rad "supplier's test"
load live: 3 kN down at B
find tip: deflection at B
find foot: rotation at A in R
find joint: rotation at A`);
    expect(codesOf(note)).toEqual([]);
    // PL³/3EI + PL·L/k, and PL/k.
    checkAnswers(note, { tip: 6.4e-3 + 9.6e-3, foot: -2.4e-3, joint: 0 });
    expect(note.structures[0]!.redundancy).toBe(0);
  });

  it('joins the two sides of a member that runs on', () => {
    const note = solved(`${BEAM}
support A: pinned
support C: roller
connection B in R: 5 MN m/rad
load live: 3 kN/m down on R
find mid: deflection at B
find turn: rotation at B in R
find most: moment at B in R`);
    expect(codesOf(note)).toEqual([]);
    // 5wL⁴/384EI and half of the turn wL²/8k times L/2; the turn goes half to either side.
    checkAnswers(note, { mid: 16e-3 + 9.6e-3, turn: -2.4e-3, most: 24e3 });
  });

  it('stands between each end and the joint where others meet', () => {
    const foot = `
section S: EI 10 MN m2
member R: A -- 4 m -- B -- 4 m -- C
member P: B -- 3 m up -- D
support A: pinned
support C: roller
load live: 6 kN m clockwise at D
connection B in R: 5 MN m/rad
find turn: rotation at B
find own: rotation at B in R`;
    const note = solved(foot);
    expect(codesOf(note)).toEqual([]);
    // Each side takes half of the couple: M L/3EI of its own and M/k in the connection.
    const half = 3e3;
    checkAnswers(note, { turn: -(half * 4) / 3e7 - half / 5e6, own: -(half * 4) / 3e7 });
  });

  it('runs from the hinge to the rigid joint, as 1/k', () => {
    const middle = (joint: string) => {
      const note = solved(`${BEAM}
support A: fixed
support C: fixed
load live: 3 kN/m down on R
${joint}
find mid: deflection at B`);
      expect(codesOf(note)).toEqual([]);
      return note.answers[0]!.value!;
    };
    const both = (stiffness: string) => middle(`connection A in R: ${stiffness}\nconnection C in R: ${stiffness}`);
    const [hinged, rigid] = [middle('hinge A in R\nhinge C in R'), middle('')];
    let before = hinged;
    for (let power = -2; power <= 9; power++) {
      const value = both(`1e${power} MN m/rad`);
      expect(value).toBeLessThan(before);
      expect(value).toBeGreaterThan(rigid * (1 - 1e-12));
      before = value;
    }
    expect(Math.abs(both('1 N m/rad') - hinged)).toBeLessThan(1e-6 * hinged);
    // Ten times the stiffness, a tenth of what is left.
    const left = [1e5, 1e6].map(stiffness => both(`${stiffness} MN m/rad`) - rigid);
    expect(left[0]! / left[1]!).toBeCloseTo(10, 2);
  });

  it('warms: a gradient bends the ends by EIκ / (1 + 2EI/kL)', () => {
    const note = solved(`
section S: EI 10 MN m2, EA 500 MN, depth 200 mm, alpha 12e-6 /K
member R: A -- 4 m -- B
support A: fixed
support B: fixed
connection A in R: 5 MN m/rad
connection B in R: 5 MN m/rad
load sun: heat R by 0 K above, 30 K below
find root: moment at A in R
find foot: rotation at A in R`);
    expect(codesOf(note)).toEqual([]);
    const [curvature, EI, k, span] = [(12e-6 * 30) / 0.2, 1e7, 5e6, 4];
    const M = (EI * curvature) / (1 + (2 * EI) / (k * span));
    // The underside is warmer and pressed: tension above. The end turns by M/k.
    checkAnswers(note, { root: -M, foot: -M / k });
  });

  it('to a joint that turns freely is warned of', () => {
    const codes = (lines: string) =>
      codesOf(
        solved(`${BEAM}${lines}
load live: 3 kN down at B
find mid: deflection at B`),
      );
    const line = 'support C: roller\nconnection A in R: 5 MN m/rad';
    expect(codes(`support A: pinned\n${line}`)).toEqual(['idle-connection']);
    expect(codes(`support A: hold x, y, spring 2 MN m/rad rotation\n${line}`)).toEqual([]);
  });

  it('counts as rigid among the redundants', () => {
    const redundancy = (line: string) =>
      solved(`${BEAM}\nsupport A: fixed\nsupport C: fixed\nload live: 3 kN down at B\n${line}\nfind x1: sway at B`)
        .structures[0]!.redundancy;
    expect(redundancy('')).toBe(3);
    expect(redundancy('connection A in R: 1 MN m/rad')).toBe(3);
    expect(redundancy('connection B in R: 1 MN m/rad')).toBe(3);
    expect(redundancy('hinge B in R')).toBe(2);
  });
});

describe('a release', () => {
  it('of the moment is a hinge', () => {
    const note = solved(`${BEAM}
support A: fixed
support C: fixed
release B in R: moment
load live: 3 kN down at B
find mid: deflection at B
find root: moment at A in R`);
    expect(codesOf(note)).toEqual([]);
    // Two cantilevers, half of the load each: (P/2) L³/3EI.
    checkAnswers(note, { mid: (1.5e3 * 64) / 3e7, root: -6e3 });
  });

  it('of the axial force cuts a member that runs on', () => {
    const note = solved(`${BEAM}
support A: pinned
support B: roller
support C: pinned
release B in R: axial
load live: 3 kN right at B
load live: 2 kN/m along R towards C
find shift: sway at B
find left: force in R at 1 m from A on R
find right: force in R at 5 m from A on R`);
    expect(codesOf(note)).toEqual([]);
    // B goes with the part before it: (3 kN L + 2 kN/m L²/2)/EA. Behind it the force begins at nil.
    checkAnswers(note, { shift: (3e3 * 4 + 2e3 * 8) / 5e8, left: 3e3 + 2e3 * 3, right: -2e3 });
  });

  it('of the axial force at an end leaves the thrust to the rest', () => {
    const note = solved(`
section S: EI 10 MN m2
member P: A -- 3 m up -- B
member R: B -- 4 m -- C
support A: fixed
support C: fixed
release B in R: axial
load live: 6 kN right at B
find shift: sway at B
find turn: rotation at B
find push: force in R`);
    expect(codesOf(note)).toEqual([]);
    // Slope-deflection: (4EI/h + 4EI/L) θ + 6EI u/h² = 0 and 12EI u/h³ + 6EI θ/h² = H.
    const [h, span, EI, H] = [3, 4, 1e7, 6e3];
    const stiffness = (4 * EI) / h + (4 * EI) / span;
    const u = H / ((12 * EI) / h ** 3 - (6 * EI) ** 2 / h ** 4 / stiffness);
    checkAnswers(note, { shift: u, turn: (-6 * EI * u) / h ** 2 / stiffness, push: 0 });
  });

  it('of the axial force lets a stiff member grow by heat', () => {
    const note = solved(`
material M: E 200 GPa, alpha 12e-6 /K
section S: EI 10 MN m2, M
member R: A -- 4 m -- B
support A: fixed
support B: fixed
release B in R: axial
load sun: heat R by 30 K
find push: force in R
find grow: sway of R`);
    expect(codesOf(note)).toEqual([]);
    checkAnswers(note, { push: 0, grow: 12e-6 * 30 * 4 });
  });

  it('of the shear lets the sides slide past each other, and not turn', () => {
    const note = solved(`${BEAM}
support A: fixed
support C: fixed
release B in R: shear
load live: 3 kN down at B
find mid: deflection at B
find sides: deflection at 0 m from B towards C on R
find there: moment at B in R
find nil: shear at 5 m from A on R`);
    expect(codesOf(note)).toEqual([]);
    // Equal turns at B: M = P a/4; then the part before sinks by P a³/3EI − M a²/2EI, the other rises by M a²/2EI.
    const [P, a, EI] = [3e3, 4, 1e7];
    const M = (P * a) / 4;
    checkAnswers(note, {
      mid: (P * a ** 3) / (3 * EI) - (M * a ** 2) / (2 * EI),
      sides: (P * a ** 3) / (3 * EI) - (M * a ** 2) / (2 * EI),
      there: M,
      nil: 0,
    });
  });

  it('that lets a part move is an error that says so', () => {
    const message = (lines: string) =>
      solved(`${BEAM}${lines}\nload live: 3 kN down at B\nfind mid: deflection at B`).diagnostics.find(
        ({ code }) => code === 'unstable-structure',
      )?.message;
    expect(message('support A: fixed\nrelease B in R: axial')).toMatch(/C can move/);
    expect(message('support A: pinned\nsupport C: roller\nrelease A in R: shear')).toMatch(/can move|can turn/);
    const ends = 'support A: fixed\nsupport B: fixed\nsupport C: fixed\n';
    expect(message(`${ends}release A in R: axial\nrelease B in R: axial`)).toBe(
      'R is free to move along its axis at both A and B: nothing holds the part between them that way.',
    );
    expect(message(`${ends}release B in R: axial, shear`)).toBeUndefined();
  });
});

describe('what cannot be attached so', () => {
  const cases: Record<string, [string, string, RegExp]> = {
    'a bar': ['bar b1: A -- C\nrelease A in b1: axial', 'bad-geometry', /b1 is a bar: it carries axial force only/],
    'a member that is elsewhere': ['connection C in P: 1 MN m/rad', 'bad-geometry', /P does not run through C/],
    'a hinge as well': ['hinge B\nconnection B in R: 1 MN m/rad', 'defined-twice', /R is hinged at B/],
    'the same end twice': [
      'connection B in R: 1 MN m/rad\nconnection B in R: 2 MN m/rad',
      'defined-twice',
      /R is connected at B already/,
    ],
    'no stiffness': ['connection B in R: 0 MN m/rad', 'bad-value', /stiffness greater than zero/],
    'a stiffness in other units': ['connection B in R: 3 kN/m', 'wrong-dimension', /moment per radian/],
  };
  it.each(Object.entries(cases))('%s', (_, [lines, code, message]) => {
    const note = solved(`${BEAM}member P: B -- 3 m up -- D
support A: fixed
support C: fixed
load live: 3 kN down at B
${lines}
find mid: deflection at B`);
    const found = note.diagnostics.filter(({ severity }) => severity === 'error');
    expect(found.map(diagnostic => diagnostic.code)).toEqual([code]);
    expect(found[0]!.message).toMatch(message);
    checkAnswers(note, { mid: { value: null } });
  });
});

describe('shear deformation', () => {
  it('adds to what bends, and rotation is that of the section', () => {
    const note = solved(`
assume: shear deformation
section S: EI 6 MN m2, GAs 15 MN
member R: A -- 3 m -- B
support A: fixed
load live: 4 kN down at B
find tip: deflection at B
find turn: rotation at B`);
    expect(codesOf(note)).toEqual([]);
    checkAnswers(note, { tip: (4e3 * 27) / 18e6 + (4e3 * 3) / 15e6, turn: (-4e3 * 9) / 12e6 });
  });

  it('is assumed for every structure in the head, or for one', () => {
    const body = `section S: EI 6 MN m2, GAs 15 MN
structure One
ONE
member R: A -- 3 m -- B
support A: fixed
load live: 4 kN down at B
find tip: deflection at B
structure Two
member R: A -- 3 m -- B
support A: fixed
load live: 4 kN down at B
find tip: deflection at B`;
    const [bent, sheared] = [6e-3, 6e-3 + 0.8e-3];
    const one = solved(body.replace('ONE', 'assume: shear deformation'));
    checkAnswers(one, { 'One.tip': sheared, 'Two.tip': bent });
    const both = solved(`assume: shear deformation\n${body.replace('ONE', '')}`);
    checkAnswers(both, { 'One.tip': sheared, 'Two.tip': sheared });
  });

  it('takes the shear area of each shape, or what is given', () => {
    const note = solved(`
material M: E 210 GPa, nu 0.3
material N: E 12 GPa, G 0.7 GPa
section Solid: solid 50 mm x 200 mm, N
section Bar: round 60 mm, N
section Tube: tube 100 mm x 5 mm, M
section Box: box 100 mm x 200 mm x 6 mm, M
section Flat: box 100 mm x 200 mm x 6 mm, M, turned
section I1: i-shape 200 mm x 100 mm x 8 mm x 5 mm, M
section I2: i-shape 200 mm x 100 mm x 8 mm x 5 mm, M, turned
section U1: channel 200 mm x 75 mm x 12 mm x 8 mm, M
section U2: channel 200 mm x 75 mm x 12 mm x 8 mm, M, turned
section T1: tee 120 mm x 100 mm x 10 mm x 8 mm, M
section T2: tee 120 mm x 100 mm x 10 mm x 8 mm, M, turned
section Two: 2 x I1
section Own: solid 50 mm x 200 mm, N, shear-area 6000 mm2
let G_M = 210 GPa / 2.6
let solid_ = GAs of Solid / 0.7 GPa
let bar_ = GAs of Bar / 0.7 GPa
let tube_ = GAs of Tube / G_M / A of Tube
let box_ = GAs of Box / G_M
let flat_ = GAs of Flat / G_M
let i1 = GAs of I1 / G_M
let i2 = GAs of I2 / G_M
let u1 = GAs of U1 / G_M
let u2 = GAs of U2 / G_M
let t1 = GAs of T1 / G_M
let t2 = GAs of T2 / G_M
let two = GAs of Two / G_M
let own = GAs of Own / 0.7 GPa`);
    expect(codesOf(note)).toEqual([]);
    checkValues(note, {
      solid_: (5 / 6) * 0.05 * 0.2,
      bar_: 0.9 * Math.PI * 0.03 ** 2,
      tube_: 0.5,
      box_: 2 * 0.006 * 0.2,
      flat_: (5 / 6) * 2 * 0.006 * 0.1,
      i1: 0.005 * 0.2,
      i2: (5 / 6) * 2 * 0.008 * 0.1,
      u1: 0.008 * 0.2,
      u2: (5 / 6) * 2 * 0.012 * 0.075,
      t1: 0.008 * 0.12,
      t2: (5 / 6) * 0.01 * 0.1,
      two: 2 * 0.005 * 0.2,
      own: 0.006,
    });
  });

  it('needs a shear modulus, which is told at the section', () => {
    const note = solved(`
assume: shear deformation
material M: E 210 GPa
section S: box 100 mm x 200 mm x 6 mm, M
section K: EI 5 MN m2
member R, S: A -- 3 m -- B
member Q, K: B -- 3 m -- C
support A: fixed
load live: 4 kN down at B
find tip: deflection at B`);
    expect(codesOf(note)).toEqual(['missing-property', 'missing-property']);
    expect(note.diagnostics.map(({ line, message }) => [line, message]).slice(0, 2)).toEqual([
      [5, 'S has no shear stiffness, and shear deformation is to be counted: G or nu is missing.'],
      [6, 'K has no shear stiffness, and shear deformation is to be counted: G and shear-area are missing.'],
    ]);
    checkAnswers(note, { tip: { value: null } });
  });

  it('leaves bars as they are', () => {
    const note = solved(`
assume: shear deformation
section Rod: EA 50 MN
bar d1, Rod: A -- 3 m -- B
support A: pinned
support B: roller
load live: 4 kN right at B
find shift: sway at B`);
    expect(codesOf(note)).toEqual([]);
    checkAnswers(note, { shift: (4e3 * 3) / 50e6 });
  });
});
