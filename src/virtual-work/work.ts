// The work of one state of forces on the strains of another: the integrals of virtual work, leg by leg.

import { type FreeStrain, UNSTRAINED } from './loading.ts';
import { bound, derivative, productIntegral, shifted } from './polynomial.ts';
import type { ForceState, Imposed } from './primary.ts';
import type { SpanForces, SpanPiece } from './span.ts';
import type { StaticLeg, Statics } from './statics.ts';

/**
 * What one unit of each unknown does work on, m or rad, by unknown. For a leg's axial force its lengthening ∫(N/EA + ε) dx;
 * for its end moments ∫(M/EI + κ)(1 − x/L) − V/GAs L dx and ∫(M/EI + κ)(x/L) + V/GAs L dx, the turns of its ends against its
 * chord, ε and κ being what heat and lack of fit do, and M/k more where the end is connected; for a reaction the movement
 * of the point, turned about: r R/k − r g.
 */
export function strainsOf(statics: Statics, { unknowns, spans, imposed }: ForceState): Float64Array {
  const { legs, grounds, firstReaction } = statics;
  const strains = new Float64Array(statics.unknownCount);
  for (let index = 0; index < legs.length; index++) {
    const { length, axialFlexibility, bendingFlexibility, shearFlexibility, startTurning, endTurning } = legs[index]!;
    const at = 3 * index;
    const start = unknowns[at + 1]!;
    const end = unknowns[at + 2]!;
    strains[at] = axialFlexibility * length * unknowns[at]!;
    const sliding = (shearFlexibility * (end - start)) / length;
    strains[at + 1] = (bendingFlexibility * length * (2 * start + end)) / 6 - sliding + startTurning * start;
    strains[at + 2] = (bendingFlexibility * length * (start + 2 * end)) / 6 + sliding + endTurning * end;
  }
  for (const [index, span] of spans) {
    const { length, axialFlexibility, bendingFlexibility, shearFlexibility } = legs[index]!;
    const sliding = (shearFlexibility * span.shearIntegral) / length;
    strains[3 * index]! += axialFlexibility * span.axialIntegral;
    strains[3 * index + 1]! += bendingFlexibility * span.fallingIntegral - sliding;
    strains[3 * index + 2]! += bendingFlexibility * span.risingIntegral + sliding;
  }
  addFreeStrains(statics, imposed.free, strains);
  const { ground } = imposed;
  for (let index = 0; index < grounds.length; index++) {
    const at = firstReaction + index;
    strains[at] = grounds[index]!.flexibility * unknowns[at]! - (ground ? ground[index]! : 0);
  }
  return strains;
}

/** Adds the lengthening of each leg by heat and lack of fit, and the turns of the ends that bend. */
export function addFreeStrains(
  { legs }: Statics,
  free: readonly FreeStrain[] | undefined,
  strains: Float64Array,
): void {
  if (!free) return;
  for (let index = 0; index < legs.length; index++) {
    const { length, bendingFlexibility } = legs[index]!;
    const { axial, curvature } = free[index]!;
    strains[3 * index]! += axial * length;
    if (bendingFlexibility === 0) continue;
    strains[3 * index + 1]! += (curvature * length) / 2;
    strains[3 * index + 2]! += (curvature * length) / 2;
  }
}

/**
 * Σ∫((N/EA + ε) n + (M/EI + κ) m + V v/GAs) dx + Σ M m/k of connections + Σ R r/k − Σ r g of a virtual state on real forces,
 * whose strains are given.
 */
export function virtualWork(statics: Statics, virtual: ForceState, real: RealForces, strains: Float64Array): number {
  let work = 0;
  const { unknowns } = virtual;
  for (let unknown = 0; unknown < unknowns.length; unknown++) work += unknowns[unknown]! * strains[unknown]!;
  for (const [index, span] of virtual.spans) work += workWithin(statics.legs[index]!, index, span, real);
  return work;
}

/** A movement, and the size below which it is nothing but rounding; m or rad. */
export interface Movement {
  readonly value: number;
  readonly rounding: number;
}

/** Roundings of the largest force that a movement may have in it: some hundreds of terms, each of several steps. */
const ROUNDING = 1e3 * Number.EPSILON;

/**
 * The rounding of a movement: of the work that the virtual state would do if all real forces were as large as the largest
 * of them, N. That may be far more than the movement, as for the sway of a post that is only pressed. `imposed`: the sizes
 * of Σ r g and of Σ∫(ε n + κ m) dx.
 */
export function roundingOf(statics: Statics, virtual: ForceState, largest: number, imposed: number): number {
  return ROUNDING * (largest === 0 ? imposed : largest * workOfUnitForce(statics, virtual) + imposed);
}

/** The sizes of Σ r g and Σ∫(ε n + κ m) dx, summed, for imposed movements g, free strains ε and free curvatures κ. */
export function workOnImposed(statics: Statics, { unknowns, spans }: ForceState, { ground, free }: Imposed): number {
  const { legs, firstReaction } = statics;
  let work = 0;
  for (let index = 0; ground !== undefined && index < ground.length; index++) {
    work += Math.abs(unknowns[firstReaction + index]! * ground[index]!);
  }
  for (let index = 0; free !== undefined && index < free.length; index++) {
    const { length, bendingFlexibility } = legs[index]!;
    const { axial, curvature } = free[index]!;
    const [start, end] = [unknowns[3 * index + 1]!, unknowns[3 * index + 2]!];
    work += Math.abs(axial * unknowns[3 * index]!) * length;
    if (bendingFlexibility === 0) continue;
    work += (Math.abs(curvature) * length * (Math.abs(start) + Math.abs(end))) / 2;
    const span = spans.get(index);
    if (span) work += length * (Math.abs(axial * span.endAxial) + Math.abs(curvature * span.startShear * length));
  }
  return work;
}

function workOfUnitForce({ legs, grounds, firstReaction }: Statics, { unknowns, spans }: ForceState): number {
  let work = 0;
  for (let index = 0; index < legs.length; index++) {
    const { length, axialFlexibility, bendingFlexibility, shearFlexibility, startTurning, endTurning } = legs[index]!;
    const start = Math.abs(unknowns[3 * index + 1]!);
    const end = Math.abs(unknowns[3 * index + 2]!);
    work += axialFlexibility * length * Math.abs(unknowns[3 * index]!);
    work += (bendingFlexibility * length ** 2 + shearFlexibility) * (start + end);
    work += length * (startTurning * start + endTurning * end);
  }
  for (let index = 0; index < grounds.length; index++) {
    work += grounds[index]!.flexibility * Math.abs(unknowns[firstReaction + index]!);
  }
  for (const [index, { startShear, endShear, endAxial }] of spans) {
    const { length, axialFlexibility, bendingFlexibility, shearFlexibility } = legs[index]!;
    const shear = Math.abs(startShear) + Math.abs(endShear);
    work += axialFlexibility * length * Math.abs(endAxial);
    work += (bendingFlexibility * length ** 3 + shearFlexibility * length) * shear;
  }
  return work;
}

/** The largest force of a state, N: of moments, with the leg's length for a lever. */
export function largestForce({ legs, firstReaction }: Statics, { unknowns, spans }: ForceState): number {
  let force = 0;
  for (let index = 0; index < legs.length; index++) {
    const moments = Math.max(Math.abs(unknowns[3 * index + 1]!), Math.abs(unknowns[3 * index + 2]!));
    force = Math.max(force, Math.abs(unknowns[3 * index]!), moments / legs[index]!.length);
  }
  for (let reaction = firstReaction; reaction < unknowns.length; reaction++) {
    force = Math.max(force, Math.abs(unknowns[reaction]!));
  }
  for (const [index, { pieces }] of spans) {
    for (const { start, end, axialForce, bendingMoment } of pieces) {
      const span = end - start;
      force = Math.max(force, bound(axialForce, span), bound(bendingMoment, span) / legs[index]!.length);
    }
  }
  return force;
}

/** What is read of a real state: see `ForceState`. */
export interface RealForces {
  readonly imposed: Imposed;
  readonly unknowns: Float64Array;
  readonly spans: ReadonlyMap<number, { readonly pieces: readonly SpanPiece[] }>;
}

/** Of what a virtual action within the leg adds to the forces that stand at its ends. */
function workWithin(leg: StaticLeg, index: number, virtual: SpanForces, real: RealForces): number {
  const { length: whole, axialFlexibility, bendingFlexibility, shearFlexibility } = leg;
  const { unknowns, spans, imposed } = real;
  let axial = unknowns[3 * index]! * virtual.axialIntegral;
  let bending = unknowns[3 * index + 1]! * virtual.fallingIntegral + unknowns[3 * index + 2]! * virtual.risingIntegral;
  let shear = ((unknowns[3 * index + 2]! - unknowns[3 * index + 1]!) / whole) * virtual.shearIntegral;
  const pieces = spans.get(index)?.pieces ?? [];
  for (const a of virtual.pieces) {
    for (const b of pieces) {
      const start = Math.max(a.start, b.start);
      const length = Math.min(a.end, b.end) - start;
      if (length <= 0) continue;
      const inA = start - a.start;
      const inB = start - b.start;
      axial += productIntegral(shifted(a.axialForce, inA), shifted(b.axialForce, inB), length);
      const m = shifted(a.bendingMoment, inA);
      const M = shifted(b.bendingMoment, inB);
      bending += productIntegral(m, M, length);
      if (shearFlexibility !== 0) shear += productIntegral(derivative(m), derivative(M), length);
    }
  }
  const free = imposed.free?.[index] ?? UNSTRAINED;
  const unforced =
    free.axial * virtual.axialIntegral + free.curvature * (virtual.fallingIntegral + virtual.risingIntegral);
  return axialFlexibility * axial + bendingFlexibility * bending + shearFlexibility * shear + unforced;
}
