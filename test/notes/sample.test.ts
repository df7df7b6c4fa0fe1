// The sample project against an independent calculation: a dense stiffness matrix of the same frames in another
// language, rigid supports by Lagrange multipliers, internal forces by statics from the member ends, movements along a
// member by numerical integration of M/EI. Its figures stand here to twelve digits.
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { type NoteReport, toJson } from '../../src/note/report.ts';
import { checkAnswers, checkValues, codesOf, evaluated } from './check-note.ts';

const [kN, mm, MPa, inch, lbf, foot] = [1e3, 1e-3, 1e6, 0.0254, 4.4482216152605, 0.3048];

function sample(name: string): NoteReport {
  const path = join(import.meta.dirname, `../../media/sample/${name}.md`);
  return toJson(evaluated(readFileSync(path, 'utf8'), `${name}.md`));
}

describe('the sample project', () => {
  it('slip-canopy: one honest failure', () => {
    const note = sample('slip-canopy');
    checkAnswers(note, {
      tip: { value: -3.75296950467 * mm, limit: 0.01, status: 'ok' },
      mid: { value: 10.2054864399 * mm, limit: 4.8 / 360, status: 'ok' },
      bend: { value: 11.0878749058 * kN, limit: 33.8100520833 * kN, status: 'ok' },
      seat: { value: -1.18169067689 * kN, status: 'fails' },
      // Statics about A: the net lift at 3.3 m, on 4.8 m.
      hold: { value: (-1.18169067689 * kN * 3.3) / (4.8 - 3.3), status: 'none' },
    });
    expect(codesOf(note)).toEqual(['limit-exceeded']);
  });

  it('portal-frame', () => {
    const note = sample('portal-frame');
    checkAnswers(note, {
      eaves: { value: 19.7440416481 * mm, limit: 3.9 / 150, governing: 'service (wind):' },
      lee: { value: 19.3224010336 * mm, governing: 'service (wind):' },
      ridge: { value: 35.408355101 * mm, limit: 9.6 / 200, governing: 'service (snow):' },
      steel: { value: 201.67571756 * MPa, governing: 'strength (a+):' },
      hold: -8.89646629834 * kN,
      foot: { value: 11.0442060031 * kN, governing: 'strength (a-):' },
      knee: { value: -43.0724034122 * kN, governing: 'strength (a+):' },
      crown: { value: 31.2962312145 * kN, governing: 'strength (a+):' },
      bearing: { value: 36.777806866 * kN, governing: 'strength (a+):' },
    });
    expect(codesOf(note)).toEqual([]);
  });

  it('jetty-trestle', () => {
    const note = sample('jetty-trestle');
    checkAnswers(note, {
      'Trestle.drift': { value: 6.30888109648 * mm, limit: 4.8 / 200, governing: 'service (half):' },
      'Trestle.head': { value: 70.9908147416 * MPa, governing: 'strength (full):' },
      'Trestle.piles': { value: 87.6119309551 * MPa, governing: 'strength (light):' },
      'Trestle.brace': { value: 27.5384775314 / 52, governing: 'strength (half):' },
      'Trestle.pull': { value: -16.8636851664 * kN, governing: 'strength (light):' },
      'Trestle.push': { value: 50.1457621883 * kN, governing: 'strength (full):' },
      'Trestle.diagonal': { value: -27.5384775314 * kN, governing: 'strength (half):' },
      'Trestle.toe': { value: 6.5188425763 * kN, governing: 'strength (light):' },
      'Stringer.near': { value: 7.48763286063 * mm, governing: 'service (near):' },
      'Stringer.beyond': { value: 5.65206309793 * mm, governing: 'service (beyond):' },
      'Stringer.hog': { value: 5.570775 * kN, limit: 7.384615384615387 * kN },
      'Stringer.tie': { value: -0.6723 * kN, governing: 'strength (beyond):' },
    });
    expect(codesOf(note)).toEqual([]);
  });

  it('upper-floor: the joist by formula, the beam on its post', () => {
    const note = sample('upper-floor');
    // A simple beam: the partition of 0.9 kN stands at 1.2 m, the joist itself weighs 420 kg/m³.
    const dead = 0.3 * kN + 420 * 0.063 * 0.22 * 9.80665;
    const reaction = (dead * 3.9) / 2 + (0.9 * kN * 1.2) / 3.9;
    checkAnswers(note, {
      'Joist.Gd': reaction,
      'Joist.Qd': 2.34 * kN,
      'Beam.bend': { value: 238.500591564 * MPa, governing: 'ultimate (both):' },
      'Beam.seat': { value: 3.52685110191 * kN, governing: 'ultimate (bay1):' },
      'Beam.post': { value: 128.498855727 * kN, governing: 'ultimate (both):' },
      'Beam.AB': { value: note.answers.find(({ name }) => name === 'AB')!.value, limit: 4.5 / 360, status: 'ok' },
    });
    checkValues(note, {
      'Beam.k_post': 133535141.07008606,
      'Beam.G_line': (2 * reaction) / 0.4,
      'Beam.Q_line': 11.7 * kN,
    });
    expect(codesOf(note)).toEqual([]);
  });

  it('stair-landing, in feet and pounds', () => {
    const note = sample('stair-landing');
    const kipFoot = 1e3 * lbf * foot;
    checkAnswers(note, {
      'Stringer.bend': { value: 9.11448624918 * kipFoot, limit: 24.3660454875 * kipFoot },
      'Stringer.Rd': 525.217205871 * lbf,
      // 100 psf on 1 ft 10 in over 13 ft 8 in of plan, half to either end.
      'Stringer.Rl': ((100 * 22) / 12 / 2) * (13 + 8 / 12) * lbf,
      'Landing.live_b': { value: 0.0742458362254 * inch, limit: (100 / 360) * inch },
      'Landing.all_b': { value: 0.10789283613 * inch, limit: (100 / 240) * inch },
      'Landing.bend': { value: 6.27558168266 * kipFoot, limit: 20.971005249 * kipFoot },
      'Landing.seat': 1829.16957132 * lbf,
    });
    expect(codesOf(note)).toEqual([]);
  });

  it('basis-of-design: values only, told in the prose', () => {
    const note = sample('basis-of-design');
    expect(note.structures).toEqual([]);
    expect(note.prose.map(({ display }) => display)).toEqual(['0.7200 kN/m2', '3.240 kN/m', '2.925 kN/m']);
    expect(note.diagnostics).toEqual([]);
  });
});
