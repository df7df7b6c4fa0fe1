// Supports of every kind, and movements imposed on them, against statics and published formulas.
import { describe, expect, it } from 'vitest';
import { checkAnswers, codesOf, solved } from './check-note.ts';

const EI = 10e6;
const SECTION = 'section S: EI 10 MN m2\n';

describe('held', () => {
  it('fixed, guided and by single directions', () => {
    // Fixed and guided with the load at the guided end: δ = PL³/12EI, M = PL/2 at both ends (AISC, Table 3-23, case 23).
    const note = solved(`${SECTION}
member B1: A -- 3 m -- B
support A: fixed
support B: guided
load live: 6 kN down at B
find sink: deflection at B
find root: moment at A in B1
find tip:  reaction at B moment
find turn: rotation at B`);
    checkAnswers(
      note,
      {
        sink: (6e3 * 27) / (12 * EI),
        root: (-6e3 * 3) / 2,
        // The guide turns the end anticlockwise: the underside is in tension there.
        tip: (6e3 * 3) / 2,
        turn: 0,
      },
      1e-3,
    );

    const same = solved(`${SECTION}
member B1: A -- 3 m -- B
support A: hold x, y, rotation
support B: hold x, rotation
load live: 6 kN down at B
find sink: deflection at B`);
    checkAnswers(same, { sink: (6e3 * 27) / (12 * EI) });
  });

  it('on a sloping surface, which pushes at right angles to itself', () => {
    const note = solved(`
material M: E 200 GPa
section S: solid 100 mm x 200 mm, M
member B1: A -- 6 m -- B
support A: pinned
support B: roller on 30 deg
load live: 4 kN/m down on B1
find rise:  reaction at B
find side:  reaction at B horizontal
find inner: force in B1
find slip:  sway at B
find drop:  deflection at B`);
    const R = 12e3;
    const thrust = R * Math.tan(Math.PI / 6);
    const shortening = (thrust * 6) / (200e9 * 0.02);
    checkAnswers(note, {
      rise: R,
      side: -thrust,
      inner: -thrust,
      // B moves along the surface only: left and down.
      slip: -shortening,
      drop: shortening * Math.tan(Math.PI / 6),
    });
    expect(codesOf(note)).toEqual([]);
  });
});

describe('springs', () => {
  it('under the middle of two equal spans', () => {
    // R = (5wL/4) / (1 + 6EI/kL³), by compatibility of the middle support.
    const note = solved(`${SECTION}
let k_post = 2 MN/m
member B1: A -- 4 m -- B -- 4 m -- C
support A: pinned
support B: spring k_post y
support C: roller
load live: 5 kN/m down on B1
find post: reaction at B
find sink: deflection at B`);
    const R = (5 * 5e3 * 4) / 4 / (1 + (6 * EI) / (2e6 * 64));
    checkAnswers(note, { post: R, sink: R / 2e6 });
    expect(note.structures).toEqual([{ name: 'note', redundancy: 1, stable: true }]);
  });

  it('against turning, together with held directions', () => {
    // A cantilever on a base that turns: PL³/3EI + PL · L/k.
    const note = solved(`${SECTION}
member B1: A -- 2.5 m -- B
support A: hold x, y, spring 4 MN m/rad rotation
load live: 3 kN down at B
find tip:  deflection at B
find turn: rotation at A
find base: reaction at A moment`);
    checkAnswers(note, {
      tip: (3e3 * 2.5 ** 3) / (3 * EI) + (3e3 * 2.5 ** 2) / 4e6,
      turn: (-3e3 * 2.5) / 4e6,
      base: 3e3 * 2.5,
    });
  });
});

describe('movements', () => {
  it('of a prop: R = 3EIΔ/L³ (Roark, Table 8.1, case 5c, from memory)', () => {
    const note = solved(`${SECTION}
member B1: A -- 4 m -- B
support A: roller
support B: fixed
load sink: move A by 8 mm down
find at_A: reaction at A
find root: moment at B in B1
find drop: deflection at A`);
    checkAnswers(note, {
      at_A: (-3 * EI * 0.008) / 64,
      root: (-3 * EI * 0.008) / 16,
      drop: 0.008,
    });
  });

  it('of a middle support: M = 3EIΔ/L² (three moments, with settlement)', () => {
    const note = solved(`${SECTION}
member B1: A -- 4 m -- B -- 4 m -- C
support A: pinned
support B: roller
support C: roller
load sink: move B by 6 mm down
find over: moment at B in B1
find at_B: reaction at B`);
    checkAnswers(note, { over: (3 * EI * 0.006) / 16, at_B: (-6 * EI * 0.006) / 64 });
  });

  it('of a fixed end that turns: 4EIθ/L near, 2EIθ/L far', () => {
    const note = solved(`${SECTION}
member B1: A -- 5 m -- B
support A: fixed
support B: fixed
load turn: move A by 2 mrad clockwise
find near: reaction at A moment
find far:  reaction at B moment
find up_A: reaction at A`);
    checkAnswers(note, {
      near: (-4 * EI * 0.002) / 5,
      far: (-2 * EI * 0.002) / 5,
      up_A: (-6 * EI * 0.002) / 25,
    });
  });

  it('of the ground under a spring, in a determinate beam: no force, only the movement', () => {
    const note = solved(`${SECTION}
member B1: A -- 4 m -- B
support A: pinned
support B: spring 3 MN/m y
load sink: move B by 5 mm down
find drop:  deflection at B
find bend:  moment in B1
find slope: rotation at A`);
    checkAnswers(note, { drop: 0.005, bend: 0, slope: -0.005 / 4 }, 1e3);
  });
});
