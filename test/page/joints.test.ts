// What the page says of releases, semi-rigid connections and shear deformation.
import { describe, expect, it } from 'vitest';
import { checkTags } from '../drawing/svg.ts';
import { fenced, render, wordsOf } from './notes.ts';

const NOTE = fenced(`structure Frame
assume: shear deformation
material M: E 210 GPa, G 81 GPa
section S: box 100 mm x 200 mm x 6 mm, M
member P: A -- 3 m up -- B
member R: B -- 4 m -- C -- 2 m -- D
support A: fixed
support C: roller
support D: pinned
connection B in R: 850 kN m/rad "supplier's test"
release D in R: axial
hinge A in P
load live: 3 kN/m down on R
find mid: deflection of R`);

describe('a frame with joints of every kind', () => {
  const html = render(NOTE);
  const words = wordsOf(html);

  it('lists them among the inputs, with their sources', () => {
    expect(words).toContain('Joint attached source');
    expect(words).toContain("B in R semi-rigid, 850.0 kN m/rad supplier's test");
    expect(words).toContain('D in R axial force freed none given');
    expect(words).toContain('A in P hinge, moment freed none given');
  });

  it('tells the figures in shear of each section', () => {
    // 2 × 6 mm × 200 mm, times 81 GPa.
    expect(words).toContain('in shear G 81 GPa, area 24.00 cm², GAs 194400 kN');
    expect(words).toContain('Bending, shear and axial deformation.');
  });

  it('draws the connection as a half-filled circle', () => {
    expect(html).toMatch(/r="3\.8"/);
    expect(html).toMatch(/A3\.8 3\.8 0 0 1 [-\d. ]+Z/);
    checkTags(html);
  });
});
