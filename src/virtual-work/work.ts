// The work of one state of forces on the strains of another: the integrals of virtual work, leg by leg.
import { productIntegral, shifted } from './polynomial.ts';
import type { ForceState } from './primary.ts';
import type { SpanForces, SpanPiece } from './span.ts';
import type { StaticLeg, Statics } from './statics.ts';

/**
 * What one unit of each unknown does work on, m or rad, by unknown. For a leg's axial force its lengthening ∫N/EA; for
 * its end moments ∫M(1 − x/L)/EI and ∫M(x/L)/EI, the turns of its ends against its chord; for a reaction the movement of
 * the point, turned about: r R/k − r g.
 */
export function strainsOf(statics: Statics, { unknowns, spans, ground }: ForceState): Float64Array {
  const { legs, grounds, firstReaction } = statics;
  const strains = new Float64Array(statics.unknownCount);
  for (let index = 0; index < legs.length; index++) {
    const { length, axialFlexibility, bendingFlexibility } = legs[index]!;
    const at = 3 * index;
    const start = unknowns[at + 1]!;
    const end = unknowns[at + 2]!;
    strains[at] = axialFlexibility * length * unknowns[at]!;
    strains[at + 1] = (bendingFlexibility * length * (2 * start + end)) / 6;
    strains[at + 2] = (bendingFlexibility * length * (start + 2 * end)) / 6;
  }
  for (const [index, span] of spans) {
    const { axialFlexibility, bendingFlexibility } = legs[index]!;
    strains[3 * index]! += axialFlexibility * span.axialIntegral;
    strains[3 * index + 1]! += bendingFlexibility * span.fallingIntegral;
    strains[3 * index + 2]! += bendingFlexibility * span.risingIntegral;
  }
  for (let index = 0; index < grounds.length; index++) {
    const at = firstReaction + index;
    strains[at] = grounds[index]!.flexibility * unknowns[at]! - (ground ? ground[index]! : 0);
  }
  return strains;
}

/** A sum beside the sum of the sizes of its terms, to which its rounding is relative. */
export interface Work {
  value: number;
  size: number;
}

/** Σ∫(N n/EA + M m/EI) dx + Σ R r/k − Σ r g of a virtual state on real forces, whose strains are given. */
export function virtualWork(statics: Statics, virtual: ForceState, real: RealForces, strains: Float64Array): Work {
  let value = 0;
  let size = 0;
  const { unknowns } = virtual;
  for (let unknown = 0; unknown < unknowns.length; unknown++) {
    const term = unknowns[unknown]! * strains[unknown]!;
    value += term;
    size += Math.abs(term);
  }
  for (const [index, span] of virtual.spans) {
    const term = workWithin(statics.legs[index]!, index, span, real);
    value += term;
    size += Math.abs(term);
  }
  return { value, size };
}

/** What is read of a real state: see `ForceState`. */
export interface RealForces {
  readonly unknowns: Float64Array;
  readonly spans: ReadonlyMap<number, { readonly pieces: readonly SpanPiece[] }>;
}

/** Of what a virtual action within the leg adds to the forces that stand at its ends. */
function workWithin(leg: StaticLeg, index: number, virtual: SpanForces, real: RealForces): number {
  const { axialFlexibility, bendingFlexibility } = leg;
  const { unknowns, spans } = real;
  let axial = unknowns[3 * index]! * virtual.axialIntegral;
  let bending = unknowns[3 * index + 1]! * virtual.fallingIntegral + unknowns[3 * index + 2]! * virtual.risingIntegral;
  const pieces = spans.get(index)?.pieces ?? [];
  for (const a of virtual.pieces) {
    for (const b of pieces) {
      const start = Math.max(a.start, b.start);
      const length = Math.min(a.end, b.end) - start;
      if (length <= 0) continue;
      const inA = start - a.start;
      const inB = start - b.start;
      axial += productIntegral(shifted(a.axialForce, inA), shifted(b.axialForce, inB), length);
      bending += productIntegral(shifted(a.bendingMoment, inA), shifted(b.bendingMoment, inB), length);
    }
  }
  return axialFlexibility * axial + bendingFlexibility * bending;
}
