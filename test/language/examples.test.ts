// Every form of every statement parses without a diagnostic.
import { describe, expect, test } from 'vitest';
import { parseStatements } from '../../src/language/parse.ts';
import { snippet } from '../../src/language/statements/form.ts';
import { STATEMENTS } from '../../src/language/statements/table.ts';
import { linesOf } from './source.ts';

const FORMS = `
structure Rafter "Canopy rafter R1"
material S355: E 210 GPa, density 7850 kg/m3, fy 355 MPa
section  RHS: box 100 mm x 200 mm x 6 mm, S355
member R1, RHS: A -- 4.8 m -- B -- 1.8 m -- C
support A: pinned
support B: roller
load dead: self-weight
load dead: 1.15 kN/m down on R1
load snow: 2.4 kN/m down on R1 from A to B
load snow: 0.6 kN/m to 3.1 kN/m down on R1 from B to C
load wind: 1.9 kN/m up on R1
load lamp: 0.45 kN down at C
combine service: dead + snow + lamp
combine uplift:  dead + wind
require tip:  deflection at C under service <= span/180
require mid:  sag of R1 between A and B under service <= span/360
require seat: reaction at A under uplift >= 0 kN
find slope:   rotation at C under service
load snow: 2.4 kN/m down on R1 "EN 1991-1-3, drifted"
let L = 4.8 m
let e = 210 GPa
let w = 0.75 kN/m2 * 3.2 m
let d = sqrt(2) * a / 3
let q = 10 kN / 2 m
let k1 = k of Gauge
let h = 12 ft 6 1/2 in
let h2 = 9 1/4 in
let h3 = 12 ft 6 in
let alpha = 5e-6 /K
let ratio = 1/3
let b2 = (3 mm)^2
let b3 = 3 mm^2 + 4 mm² + 5 mm2
let i = 8360 cm⁴
let mo = 5 kN·m + 3 kNm + 2 kN m
let ei = 24 MN m2 + 24 MNm2 + 24 MNm²
let kx = 3 N/mm/mm
let gg = 2 g0 * 3 kg + g0 * 1 kg
let many = min(a, b, max(c, 2 m)) + abs(-a) + ceil(1.2) * floor(2.3) * 1 m + sin(30 deg) * cos(a) * tan(pi/4) * 1 m
let neg = -a^2 + 2^-3
let cross = 2 × 3 m
let δ = 3 mm
let d_wall = depth of RHS - 2 * wall of RHS
let sa = shear-area of RHS
let sub = (- 3.2) * 5 m
let minus = 3 m − 2 m
let hertz = 3 Hz * 2 s2
let us = 3 psi + 4 ksi + 5 psf + 6 ksf
let us2 = 3 plf + 4 klf
let half = .5 m
display: metric
display: us
display: force kN, length m, deflection mm, moment kN m, stress MPa
display: line load kN/m, rotation mrad
member Post:    A -- 3.2 m up -- B
member Raf:     B -- 6 m right, 0.9 m up -- C
member Brace:   B -- 4.1 m at 35 deg -- D
member Ridge:   B -- 6 m right at 5.7 deg -- C
member J1, J:   A -- 75 mm of Jn -- P -- 3.75 m -- Q -- 75 mm of Jn -- B
member Tie:     A -- D
member Val:     A -- (L) -- B -- (L) of Jn -- C
member Val2:    A -- 2 * L -- B -- (L + 1 m) left -- C
member Val3:    A -- min(a, b) up -- B
bar    d1, Rod: A -- C
bars   w, Angle: B -- K -- C -- L
bar Rod, R20: T -- B, pulls only
member M1: A -- 3 m right, 1 m down -- B, bears only
group  Roof: R1, R2
point  P: 2.4 m, 3.0 m
point  Q: 1.1 m from A on R1
point  Q: 1.1 m from A towards B on R1
point  Q: a from A on R1
point  Q: L / 2, -L
hinge B
hinge B in R1
connection B in R1: 850 kN m/rad
release B in R1: axial
release B in R1: axial, shear, moment
material C24:  E 11 GPa, G 0.69 GPa, density 420 kg/m3, alpha 5e-6 /K
material conc: E 30 GPa, density 150 pcf
section  J1:   solid 47 mm x 220 mm, C24
section  P1:   tube 114.3 mm x 5 mm, S355
section  B1:   box 100 mm x 200 mm x 6 mm, S355
section  U1:   i-shape 203 mm x 133 mm x 7.8 mm x 5.8 mm, S355
section  C1:   channel 200 mm x 75 mm x 12.5 mm x 8.5 mm, S355
section  R20:  round 20 mm, S355
section  G:    I 4410 cm4, A 39.7 cm2, depth 251 mm, S275
section  H:    EI 24 MN m2
section  Z:    2 x C1
section  Z:    2 × C1, turned
section  T1:   tee 120 mm x 120 mm x 10 mm x 10 mm, S355
section  X:    I wanted, S355
section  T:    solid 90 mm x 200 mm to 90 mm x 450 mm, GL28
section  V:    solid b x h, C24
section  V:    solid b × h, C24, turned
section  V:    solid 2 * b × h / 2, C24, shear-area 3 cm2, GAs 4 MN
section  V:    solid 1 1/2 in x 9 1/4 in, DF
use "sections.csv"
use "../project.md"
support A: pinned
support B: roller
support C: roller on 30 deg
support D: fixed
support E: guided
support F: hold x, rotation
support G: spring 12 kN/mm y
support G: spring 12 kN/mm y, spring 4 MN m/rad rotation
support G: hold x, spring 12 kN/mm y, hold rotation
support G: hold x, y, spring k rotation
support H: roller, bears only
case snow "Drifted snow, north"
case snow
load dead: self-weight of R1, R2
load dead: 1.1 self-weight
load dead: (1 + a) self-weight of R1
load dead: 1.15 kN/m down on R1, R2
load snow: 2.4 kN/m down on R1 from 1.2 m to 3.0 m
load snow: 0.9 kN/m down on plan Raf
load wind: 1.1 kN/m square down on Raf
load wind: 1.1 kN/m to 2 kN/m square left on Raf, R2 from A to (L)
load drag: 0.4 kN/m along Raf towards C
load drag: 0.4 kN/m along Raf, R2 towards C from A to B, patterned
load lamp: 0.45 kN down at 2.4 m from A on R1
load lamp: 0.45 kN down at 0.6 m from B towards A on R1
load snow: 3.1 kN down at every 1.15 m from 0.15 m to 4.5 m on Top1
load push: 5 kN right at B
load push: 5 kN towards 30 deg at B
load push: 5 kN/m towards 30 deg on plan R1
load knob: 6 kN m clockwise at C
load knob: 6 kN m anticlockwise at C in R1
load sun: heat R1 by 25 K
load sun: heat R1, R2 by 30 K above, 5 K below
load sun: heat R1 by 5 K below, 30 K above
load sun: 1.2 heat R1 by 30 degF
load sink: move B by 8 mm down
load sink: move A by 2 mrad clockwise
load sink: (f) move A by 2 mrad clockwise
load fit: lengthen d1 by 3 mm
load fit: shorten d1, d2 by 3 mm
load live: 4 kN/m down on R1, patterned
load live: w down on R1
load live: w * 2 m down at C
load live: (w) to (2 * w) down on R1
carry: reaction of Rafter at B onto D
carry: reaction of Joist at A every 0.4 m onto Beam from P to Q
carry: 2 * reaction of Joist at A vertical onto D
carry: (n / 2) * reaction of Joist at A moment onto D in R1
carry: reaction of Rafter at B from "rafter.md" onto D
carry: reaction of Rafter at B from "rafter.md" every 0.4 m onto Beam
carry: reaction of Rafter at B every 0.4 m from "rafter.md" onto Beam
carry: reaction of Rafter at B onto 1.2 m from A on R1 "as built"
combine strength (a): 1.35 dead + 1.5 snow + 0.9 wind
combine strength (b): 1.35 dead + (1.5 * psi0) snow + 1.5 wind
combine strength (c): 1.0 dead + 1.5 wind +- lean
combine strength (1): -dead + psi snow - 1.5 * wind ± 0.3 * lean
combine strength: 1.35 g + 1.5 s
find a1: deflection at P
find a1: deflection of M
find a1: deflection of M between P and Q
find a1: sway at P
find a1: sway of M
find a1: rotation at P
find a1: rotation at P in M
find a1: sag of M
find a1: sag of M between P and Q
find a1: sag of M between 1 m and 2 m
find a1: sag of M between 1 m and (L - 2 m) under all
find a1: moment at P in M
find a1: moment in M
find a1: moment in M between P and Q
find a1: shear at P in M
find a1: shear in M
find a1: sagging in M
find a1: hogging in M between P and Q
find a1: force in M
find a1: force in M at P
find a1: tension in M
find a1: compression in M
find a1: stress in M
find a1: reaction at P
find a1: reaction at P vertical
find a1: reaction at P horizontal
find a1: reaction at P moment
find a1: deflection at 2.4 m from A on R1
find a1: moment at 2.4 m from A towards B on R1 under strength
find a1: moment in R1 at 2.4 m from A on R1
find a1: reaction at P under strength (b)
find a1: reaction at P under strength (c+-)
find a1: reaction at P under service (+)
find a1: reaction at P moment / 2 m under strength (2)
find a1: reaction at A horizontal + reaction at B horizontal under all
require net: tip - 12 mm <= span(tip)/250
require col: compression in N1 / 620 kN + sagging in N1 / 310 kN m under strength <= 1
require bend: moment in R1 under strength <= modulus of RHS * fy of S355
require lim: deflection at C ≤ length(P, Q) / 300 "client brief"
require lim: deflection at C <= along(P, Q) / 300
require lim: deflection at C <= plan(P, Q) / 300
require lim: sway at C <= height(P) / 300
require lim: sway at C ≥ -length(M) / 300
require lim: tip of Rafter + sag of R1 / 2 <= 3 mm
require lim: deflection at C / span <= 1/180
assume: shear deformation
assume: axially stiff
assume: "Base plate on packers acts as a pin"
assume: axially stiff "as the detail shows"
show: inputs
show: drawing
show: results
show: reactions
show: reactions under service
show: reactions by case
show: moment in R1 under service
show: shear in R1
show: force in R1 under all
show: deflection of R1 under service
show: working of tip
show: working of tip by conjugate beam
show: working of tip by direct integration
show: contributions to tip
show: envelope of moment in R1 under strength
`;

describe('forms of the language', () => {
  test.for(FORMS.trim().split('\n'))('%s', line => {
    const { statements, diagnostics } = parseStatements(linesOf(line));
    expect(diagnostics).toEqual([]);
    expect(statements).toHaveLength(1);
  });
});

describe('examples shown in help', () => {
  const examples = Object.values(STATEMENTS).flatMap(form =>
    form.examples.map(example => [form.keyword, example] as const),
  );
  test.for(examples)('%s: %s', ([keyword, example]) => {
    const { statements, diagnostics } = parseStatements(linesOf(example));
    expect(diagnostics).toEqual([]);
    expect(statements.map(statement => statement.kind)).toEqual([keyword]);
  });
});

describe('skeletons', () => {
  test.for(Object.values(STATEMENTS).map(form => [form.keyword, form.skeleton] as const))(
    '%s',
    ([keyword, skeleton]) => {
      const filled = skeleton.replace(/\$\{\d+\|([^,|]*)[^}]*\}/g, '$1').replace(/\$\{\d+:([^}]*)\}/g, '$1');
      expect(filled).not.toContain('{');
      const { statements, diagnostics } = parseStatements(linesOf(filled));
      expect(diagnostics).toEqual([]);
      expect(statements.map(statement => statement.kind)).toEqual([keyword]);
    },
  );
  test('places to fill in are numbered, choices keep their words', () => {
    expect(snippet('support {A}: {pinned|roller}')).toBe(['support $', '{1:A}: $', '{2|pinned,roller|}'].join(''));
  });
});
