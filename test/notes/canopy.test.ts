// A canopy rafter with an overhang: the whole of a plain note, from values in prose to a requirement that is not met.
import { describe, expect, it } from 'vitest';
import { toJson } from '../../src/note/report.ts';
import { evaluated } from './check-note.ts';

const NOTE = `# Boathouse canopy

The rafter overhangs the slip by 1.8 m.

\`\`\`tautline
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
\`\`\`

The tip moves \`tautline tip\`, which is \`tautline tip / length(B, C)\` of the overhang.
`;

describe('the canopy rafter', () => {
  const note = toJson(evaluated(NOTE, 'rafter.md'));

  // Integrated by hand from the moment range by range, A to B and C to B, with E = 210 GPa and the box of sharp corners,
  // I = (100 · 200³ − 88 · 188³)/12 mm⁴ = 1793.9072 cm⁴; self-weight 7850 kg/m³ · 9.80665 m/s² · 3456 mm² = 0.26605049 kN/m.
  it('gives the movements', () => {
    expect(note.answers.map(({ name }) => name)).toEqual(['tip', 'mid', 'seat', 'slope']);
    const tip = answer('tip');
    expect(tip).toMatchObject({ structure: 'Rafter', kind: 'require', under: 'service', governing: null, unit: 'm' });
    near(tip.value, -0.001648703049, 1e-12);
    near(tip.limit, 0.01, 1e-15);
    near(tip.utilisation, 0.1648703049, 1e-10);
    expect(tip).toMatchObject({ status: 'ok', display: '1.649 mm up', measure: 'deflection at C' });

    const mid = answer('mid');
    near(mid.value, 0.004443278203, 1e-12);
    near(mid.limit, 4.8 / 360, 1e-15);
    expect(mid).toMatchObject({ status: 'ok', display: '4.443 mm', measure: 'sag of R1 between A and B' });
    expect(mid.place).toMatchObject({ member: 'R1', from: 'A' });
    near(mid.place?.distance, 2.2241524, 1e-6);

    near(answer('slope').value, 0.0005923905501, 1e-13);
    expect(answer('slope')).toMatchObject({ unit: 'rad', status: 'none', limit: null, utilisation: null });
  });

  // Turning about B: (1.15 + 0.26605049 − 1.9) kN/m · 6.6 m · (4.8 − 3.3) m / 4.8 m.
  it('finds that the seat lifts', () => {
    near(answer('seat').value, -998.1458606, 1e-4);
    expect(answer('seat')).toMatchObject({ status: 'fails', unit: 'N', utilisation: null, limit: 0 });
    expect(note.diagnostics.filter(({ code }) => code === 'limit-exceeded')).toMatchObject([{ line: 28 }]);
  });

  it('puts values in the prose', () => {
    expect(note.prose).toMatchObject([
      { line: 32, text: 'tip', unit: 'm', display: '1.649 mm up' },
      { line: 32, text: 'tip / length(B, C)', unit: '' },
    ]);
    near(note.prose[0]!.value, -0.001648703049, 1e-12);
    near(note.prose[1]!.value, -0.0009159461386, 1e-12);
  });

  it('is determinate and stable, and both methods agree', () => {
    expect(note.structures).toEqual([{ name: 'Rafter', redundancy: 0, stable: true }]);
    for (const { check } of note.answers) {
      expect(check!.difference).toBeLessThan(1e-9);
      expect(check!.residual).toBeLessThan(1e-9);
    }
  });

  it('hints at limits that have no source, warns of the uplift at B that it does not ask about, and at nothing else', () => {
    const others = note.diagnostics.filter(({ code }) => code !== 'limit-exceeded').map(({ code }) => code);
    expect(others).toEqual(['unasked-uplift', 'limit-without-source', 'limit-without-source', 'limit-without-source']);
    // About A: (1.9 − 1.15 − 0.26605049) kN/m × 6.6 m × 3.3 m / 4.8 m.
    const { message } = note.diagnostics.find(({ code }) => code === 'unasked-uplift')!;
    expect(message).toBe('B must hold down 2.196 kN under uplift, and no question asks about this reaction.');
  });

  function answer(name: string) {
    return note.answers.find(one => one.name === name)!;
  }
});

function near(value: number | null | undefined, wanted: number, tolerance: number): void {
  expect(Math.abs(value! - wanted), `${value}, expected ${wanted}`).toBeLessThanOrEqual(tolerance);
}
