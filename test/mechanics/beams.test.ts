// Beams against closed formulas. L, EI, w, P are odd figures so that no two formulas agree by chance; the formulas are
// those of handbook tables (Roark's Formulas for Stress and Strain, table 8.1) and hold without shear flexibility.

import { describe, it } from 'vitest';
import { fixed, guided, pinned, roller, turning } from './building.ts';
import { close, solve } from './reading.ts';

const L = 4.7;
const EI = 3.1e6;
const w = 2700;
const P = 1900;
const M0 = 1300;
const section = { EI };
const members = ['A B'];
const points = { A: [0, 0], B: [L, 0] } as const;
const at = (distance: number) => ({ member: 'A B', distance });

describe('cantilevers, fixed at A', () => {
  const cantilever = (load: object) =>
    solve({ points, members, section, supports: { A: fixed }, cases: [[load as never]] });

  it('point load at the tip', () => {
    const beam = cantilever({ at: 'B', y: -P });
    close(beam.deflection('B'), (P * L ** 3) / (3 * EI));
    close(beam.rotation('B'), (-P * L ** 2) / (2 * EI));
    close(beam.moment('A B', 0), -P * L);
    close(beam.reaction('A').moment, P * L);
    close(beam.reaction('A').y, P);
  });

  it('point load on the way', () => {
    const b = 2.3;
    const beam = cantilever({ at: at(b), y: -P });
    close(beam.deflection('B'), (P * b ** 2 * (3 * L - b)) / (6 * EI));
    close(beam.moment('A B', 0), -P * b);
  });

  it('uniform load', () => {
    const beam = cantilever({ on: 'A B', w });
    close(beam.deflection('B'), (w * L ** 4) / (8 * EI));
    close(beam.rotation('B'), (-w * L ** 3) / (6 * EI));
    close(beam.moment('A B', 0), (-w * L ** 2) / 2);
  });

  it('triangular load, largest at the fixed end', () => {
    const beam = cantilever({ on: 'A B', w: [w, 0] });
    close(beam.deflection('B'), (w * L ** 4) / (30 * EI));
    close(beam.rotation('B'), (-w * L ** 3) / (24 * EI));
    close(beam.moment('A B', 0), (-w * L ** 2) / 6);
  });

  it('triangular load, largest at the tip', () => {
    const beam = cantilever({ on: 'A B', w: [0, w] });
    close(beam.deflection('B'), (11 * w * L ** 4) / (120 * EI));
    close(beam.rotation('B'), (-w * L ** 3) / (8 * EI));
    close(beam.moment('A B', 0), (-w * L ** 2) / 3);
  });

  it('couple at the tip', () => {
    const beam = cantilever({ at: 'B', couple: -M0 });
    close(beam.deflection('B'), (M0 * L ** 2) / (2 * EI));
    close(beam.rotation('B'), (-M0 * L) / EI);
  });

  it('tip that moves but does not turn', () => {
    const beam = solve({
      points,
      members,
      section,
      supports: { A: fixed, B: [turning()] },
      cases: [[{ at: 'B', y: -P }]],
    });
    close(beam.deflection('B'), (P * L ** 3) / (12 * EI));
    close(beam.moment('A B', 0), (-P * L) / 2);
    close(beam.moment('A B', L), (P * L) / 2);
  });

  it('stepped stiffness', () => {
    const a = 1.7;
    const beam = solve({
      points: { A: [0, 0], B: [a, 0], C: [L, 0] },
      members: ['A B', 'B C'],
      sections: { 'A B': { EI }, 'B C': { EI: EI / 3 } },
      supports: { A: fixed },
      cases: [[{ at: 'C', y: -P }]],
    });
    close(beam.deflection('C'), (P / 3) * ((L ** 3 - (L - a) ** 3) / EI + (3 * (L - a) ** 3) / EI));
  });
});

describe('simple beams, A to B', () => {
  const simple = (...loads: object[]) =>
    solve({ points, members, section, supports: { A: pinned, B: roller }, cases: [loads as never] });

  it('uniform load', () => {
    const beam = simple({ on: 'A B', w });
    const largest = beam.along('deflection', 'A B');
    close(largest.value, (5 * w * L ** 4) / (384 * EI));
    close(largest.distance, L / 2);
    close(beam.along('moment', 'A B').value, (w * L ** 2) / 8);
    close(beam.rotation('A'), (-w * L ** 3) / (24 * EI));
    close(beam.rotation('B'), (w * L ** 3) / (24 * EI));
    close(beam.reaction('B').y, (w * L) / 2);
  });

  it('point load off the middle', () => {
    const a = 3.1;
    const b = L - a;
    const beam = simple({ at: at(a), y: -P });
    const largest = beam.along('deflection', 'A B');
    close(largest.value, (P * a * b * (a + 2 * b) * Math.sqrt(3 * a * (a + 2 * b))) / (27 * EI * L));
    close(largest.distance, Math.sqrt((a * (a + 2 * b)) / 3));
    close(beam.rotation('A'), (-P * a * b * (L + b)) / (6 * EI * L));
    close(beam.along('moment', 'A B').value, (P * a * b) / L);
    close(beam.along('moment', 'A B').distance, a);
  });

  it('two equal point loads', () => {
    const a = 1.3;
    const beam = simple({ at: at(a), y: -P }, { at: at(L - a), y: -P });
    close(beam.along('deflection', 'A B').value, (P * a * (3 * L ** 2 - 4 * a ** 2)) / (24 * EI));
    close(beam.along('moment', 'A B').value, P * a);
  });

  it('triangular load rising to B', () => {
    const beam = simple({ on: 'A B', w: [0, w] });
    const xi = Math.sqrt(1 - Math.sqrt(8 / 15));
    const largest = beam.along('deflection', 'A B');
    close(largest.distance, xi * L);
    close(largest.value, (w * L ** 4 * xi * (3 * xi ** 4 - 10 * xi ** 2 + 7)) / (360 * EI));
    close(beam.along('moment', 'A B').value, (w * L ** 2) / (9 * Math.sqrt(3)));
    close(beam.along('moment', 'A B').distance, L / Math.sqrt(3));
    close(beam.rotation('A'), (-7 * w * L ** 3) / (360 * EI));
    close(beam.rotation('B'), (w * L ** 3) / (45 * EI));
    close(beam.reaction('A').y, (w * L) / 6);
  });

  it('triangular load with its peak in the middle', () => {
    const beam = simple({ on: 'A B', w: [0, w], from: 0, to: L / 2 }, { on: 'A B', w: [w, 0], from: L / 2, to: L });
    close(beam.along('deflection', 'A B').value, (w * L ** 4) / (120 * EI));
    close(beam.along('moment', 'A B').value, (w * L ** 2) / 12);
    close(beam.rotation('A'), (-5 * w * L ** 3) / (192 * EI));
  });

  it('couple at one end', () => {
    const beam = simple({ at: 'A', couple: -M0 });
    close(beam.rotation('A'), (-M0 * L) / (3 * EI));
    close(beam.rotation('B'), (M0 * L) / (6 * EI));
    const largest = beam.along('deflection', 'A B');
    close(largest.value, (M0 * L ** 2) / (9 * Math.sqrt(3) * EI));
    close(L - largest.distance, L / Math.sqrt(3));
  });

  it('couple on the way', () => {
    const a = 1.9;
    const beam = solve({
      points: { A: [0, 0], C: [a, 0], B: [L, 0] },
      members: ['A C B'],
      section,
      supports: { A: pinned, B: roller },
      cases: [[{ at: { member: 'A C B', distance: a }, couple: M0 }]],
    });
    close(beam.deflection('C'), (-M0 * a * (L - a) * (L - 2 * a)) / (3 * EI * L));
    close(beam.reaction('A').y, M0 / L);
    close(beam.along('moment', 'A C B', 'greatest').value, (M0 * a) / L);
    close(beam.along('moment', 'A C B', 'least').value, (-M0 * (L - a)) / L);
  });

  it('uniform load on a part', () => {
    const a = 2.2;
    const beam = simple({ on: 'A B', w, from: 0, to: a });
    const R = (w * a * (2 * L - a)) / (2 * L);
    close(beam.reaction('A').y, R);
    close(beam.reaction('B').y, (w * a ** 2) / (2 * L));
    close(beam.along('moment', 'A B').value, R ** 2 / (2 * w));
    close(beam.along('moment', 'A B').distance, R / w);
  });

  it('uniform bending', () => {
    const beam = simple({ at: 'A', couple: -M0 }, { at: 'B', couple: M0 });
    close(beam.along('deflection', 'A B').value, (M0 * L ** 2) / (8 * EI));
    close(beam.moment('A B', 1.1), M0);
  });
});

describe('propped cantilevers, prop at A, fixed at B', () => {
  const propped = (load: object) =>
    solve({ points, members, section, supports: { A: roller, B: fixed }, cases: [[load as never]] });

  it('uniform load', () => {
    const beam = propped({ on: 'A B', w });
    const xi = (1 + Math.sqrt(33)) / 16;
    close(beam.reaction('A').y, (3 * w * L) / 8);
    close(beam.moment('A B', L), (-w * L ** 2) / 8);
    close(beam.along('sagging', 'A B').value, (9 * w * L ** 2) / 128);
    const largest = beam.along('deflection', 'A B');
    close(largest.distance, xi * L);
    close(largest.value, (w * L ** 4 * xi * (1 - 3 * xi ** 2 + 2 * xi ** 3)) / (48 * EI));
  });

  it('point load in the middle', () => {
    const beam = propped({ at: at(L / 2), y: -P });
    close(beam.reaction('A').y, (5 * P) / 16);
    close(beam.moment('A B', L), (-3 * P * L) / 16);
    const largest = beam.along('deflection', 'A B');
    close(largest.value, (P * L ** 3) / (48 * Math.sqrt(5) * EI));
    close(largest.distance, L / Math.sqrt(5));
  });

  it('triangular loads', () => {
    const rising = propped({ on: 'A B', w: [0, w] });
    close(rising.reaction('A').y, (w * L) / 10);
    close(rising.moment('A B', L), (-w * L ** 2) / 15);
    close(rising.along('deflection', 'A B').value, (2 * w * L ** 4) / (375 * Math.sqrt(5) * EI));
    const falling = propped({ on: 'A B', w: [w, 0] });
    close(falling.reaction('A').y, (11 * w * L) / 40);
    close(falling.moment('A B', L), (-7 * w * L ** 2) / 120);
  });

  it('couple at the prop carries half of it over', () => {
    const beam = propped({ at: 'A', couple: -M0 });
    close(beam.moment('A B', 0), M0);
    close(beam.moment('A B', L), -M0 / 2);
    close(beam.rotation('A'), (-M0 * L) / (4 * EI));
  });

  it('settlement of the prop', () => {
    const beam = propped({ move: 'A', y: -0.01 });
    close(beam.reaction('A').y, (-3 * EI * 0.01) / L ** 3);
    close(beam.moment('A B', L), (-3 * EI * 0.01) / L ** 2);
  });
});

describe('beams fixed at both ends', () => {
  const clamped = (load: object) =>
    solve({ points, members, section, supports: { A: fixed, B: fixed }, cases: [[load as never]] });

  it('uniform load', () => {
    const beam = clamped({ on: 'A B', w });
    const hogging = beam.along('hogging', 'A B');
    close(hogging.value, (w * L ** 2) / 12);
    close(hogging.distance, 0);
    close(beam.along('sagging', 'A B').value, (w * L ** 2) / 24);
    close(beam.along('deflection', 'A B').value, (w * L ** 4) / (384 * EI));
  });

  it('point load off the middle', () => {
    const a = 2.9;
    const b = L - a;
    const beam = clamped({ at: at(a), y: -P });
    close(beam.moment('A B', 0), (-P * a * b ** 2) / L ** 2);
    close(beam.moment('A B', L), (-P * a ** 2 * b) / L ** 2);
    close(beam.reaction('A').y, (P * b ** 2 * (3 * a + b)) / L ** 3);
    const largest = beam.along('deflection', 'A B');
    close(largest.value, (2 * P * a ** 3 * b ** 2) / (3 * EI * (3 * a + b) ** 2));
    close(largest.distance, (2 * a * L) / (3 * a + b));
  });

  it('triangular load', () => {
    const beam = clamped({ on: 'A B', w: [0, w] });
    close(beam.moment('A B', 0), (-w * L ** 2) / 30);
    close(beam.moment('A B', L), (-w * L ** 2) / 20);
    close(beam.reaction('A').y, (3 * w * L) / 20);
  });

  it('couple on the way', () => {
    const a = 1.9;
    const b = L - a;
    const beam = clamped({ at: at(a), couple: M0 });
    close(beam.reaction('A').y, (6 * M0 * a * b) / L ** 3);
    close(beam.moment('A B', 0), (-M0 * b * (2 * a - b)) / L ** 2);
    close(beam.moment('A B', L), (M0 * a * (2 * b - a)) / L ** 2);
  });

  it('settlement and rotation of one end', () => {
    const settled = clamped({ move: 'B', y: -0.01 });
    close(settled.moment('A B', 0), (-6 * EI * 0.01) / L ** 2);
    close(settled.reaction('B').y, (-12 * EI * 0.01) / L ** 3);
    const turned = clamped({ move: 'A', rotation: -0.002 });
    close(turned.moment('A B', 0), (4 * EI * 0.002) / L);
    close(turned.moment('A B', L), (-2 * EI * 0.002) / L);
  });

  it('guided at one end', () => {
    const beam = solve({
      points,
      members,
      section,
      supports: { A: guided, B: fixed },
      cases: [[{ on: 'A B', w }]],
    });
    close(beam.deflection('A'), (w * L ** 4) / (24 * EI));
    close(beam.reaction('A').moment, (-w * L ** 2) / 6);
  });
});

describe('overhanging beams', () => {
  const a = 1.6;
  const overhang = (load: object) =>
    solve({
      points: { A: [0, 0], B: [L, 0], C: [L + a, 0] },
      members: ['A B C'],
      section,
      supports: { A: pinned, B: roller },
      cases: [[load as never]],
    });

  it('point load at the tip', () => {
    const beam = overhang({ at: 'C', y: -P });
    close(beam.deflection('C'), (P * a ** 2 * (L + a)) / (3 * EI));
    close(beam.reaction('B').y, (P * (L + a)) / L);
    const up = beam.along('deflection', 'A B C', 'least');
    close(up.value, (-P * a * L ** 2) / (9 * Math.sqrt(3) * EI));
    close(up.distance, L / Math.sqrt(3));
  });

  it('uniform load throughout', () => {
    const beam = overhang({ on: 'A B C', w });
    close(beam.reaction('A').y, (w * (L ** 2 - a ** 2)) / (2 * L));
    close(beam.along('sagging', 'A B C').value, (w * (L + a) ** 2 * (L - a) ** 2) / (8 * L ** 2));
    close(beam.deflection('C'), (w * a * (4 * a ** 2 * L - L ** 3 + 3 * a ** 3)) / (24 * EI));
  });

  it('uniform load between the supports lifts the tip', () => {
    close(overhang({ on: 'A B C', w, to: L }).deflection('C'), (-w * L ** 3 * a) / (24 * EI));
  });
});

describe('continuous beams', () => {
  const chain = 'A B C D';
  const three = (loads: readonly object[]) =>
    solve({
      points: { A: [0, 0], B: [L, 0], C: [2 * L, 0], D: [3 * L, 0] },
      members: [chain],
      section,
      supports: { A: pinned, B: roller, C: roller, D: roller },
      cases: [loads as never],
    });

  it('two unequal spans, by the equation of three moments', () => {
    const L2 = 3.3;
    const beam = solve({
      points: { A: [0, 0], B: [L, 0], C: [L + L2, 0] },
      members: ['A B C'],
      section,
      supports: { A: pinned, B: roller, C: roller },
      cases: [[{ on: 'A B C', w }]],
    });
    close(beam.moment('A B C', L), (-w * (L ** 3 + L2 ** 3)) / (8 * (L + L2)));
  });

  it('three spans, all loaded', () => {
    const beam = three([{ on: chain, w }]);
    close(beam.reaction('A').y, 0.4 * w * L);
    close(beam.reaction('B').y, 1.1 * w * L);
    close(beam.along('hogging', chain).value, (w * L ** 2) / 10);
    close(beam.along('hogging', chain).distance, L);
    close(beam.along('sagging', chain).value, (2 * w * L ** 2) / 25);
    close(beam.along('sagging', chain).distance, 0.4 * L);
  });

  it('three spans, the last one unloaded', () => {
    const beam = three([{ on: chain, w, to: 2 * L }]);
    close(beam.reaction('A').y, (23 / 60) * w * L);
    close(beam.reaction('B').y, (6 / 5) * w * L);
    close(beam.reaction('C').y, (9 / 20) * w * L);
    close(beam.reaction('D').y, (-1 / 30) * w * L);
    close(beam.moment(chain, L), (-7 / 60) * w * L ** 2);
  });

  it('a middle support that sinks', () => {
    const beam = solve({
      points: { A: [0, 0], B: [L, 0], C: [2 * L, 0] },
      members: ['A B C'],
      section,
      supports: { A: pinned, B: roller, C: roller },
      cases: [[{ move: 'B', y: -0.012 }]],
    });
    close(beam.moment('A B C', L), (3 * EI * 0.012) / L ** 2);
    close(beam.reaction('B').y, (-6 * EI * 0.012) / L ** 3);
  });
});
