// What heat and lack of fit would do to the legs if nothing restrained them: strain and curvature, the same all along a
// leg.

import type { Load, Structure } from '../model/structure.ts';
import { keepsLength, type Legs } from './legs.ts';

/** By leg. */
export interface FreeStrains {
  /** Strain of the axis, positive where it grows longer. */
  readonly axial: Float64Array;
  /** 1/m, as d²v/dx²: positive as a moment with tension on the underside bends the leg, so that warmth above is negative. */
  readonly curvature: Float64Array;
}

/** Undefined where the loads strain nothing. The temperature is linear over the depth, with its mean at mid-depth. */
export function freeStrains(structure: Structure, loads: readonly Load[], legs: Legs): FreeStrains | undefined {
  if (!loads.some(isStraining)) return undefined;
  const strains = { axial: new Float64Array(legs.count), curvature: new Float64Array(legs.count) };
  for (const load of loads) {
    if (!isStraining(load)) continue;
    structure.members[load.member]!.legs.forEach((_, k) => {
      const e = legs.first[load.member]! + k;
      strains.axial[e]! += axialStrain(structure, load, k);
      strains.curvature[e]! += curvature(structure, load, k);
    });
  }
  return strains;
}

/** By leg: 1 where it keeps its length and some load would change its length. */
export function findLengthened(structure: Structure, legs: Legs): Uint8Array {
  const lengthened = new Uint8Array(legs.count);
  for (const load of structure.loads) {
    if (!isStraining(load)) continue;
    structure.members[load.member]!.legs.forEach((_, k) => {
      const e = legs.first[load.member]! + k;
      if (keepsLength(legs, e) && axialStrain(structure, load, k) !== 0) lengthened[e] = 1;
    });
  }
  return lengthened;
}

/** Takes from the strains of the legs (three a leg; see `addStrains`) what they take on without force. */
export function subtractFreeStrains(legs: Legs, free: FreeStrains, strains: Float64Array): void {
  for (let e = 0; e < legs.count; e++) {
    const length = legs.length[e]!;
    strains[3 * e]! -= free.axial[e]! * length;
    if (legs.bending[e] === 0) continue;
    // A constant curvature turns each end against the chord by half of what it turns them against each other.
    const turning = (free.curvature[e]! * length) / 2;
    strains[3 * e + 1]! += turning;
    strains[3 * e + 2]! -= turning;
  }
}

type Straining = Extract<Load, { kind: 'heat' | 'lengthen' }>;

function isStraining(load: Load): load is Straining {
  return load.kind === 'heat' || load.kind === 'lengthen';
}

function axialStrain({ members, sections }: Structure, load: Straining, leg: number): number {
  const { legs, length } = members[load.member]!;
  if (load.kind === 'lengthen') return load.amount / length;
  const { thermalExpansion = 0 } = sections[legs[leg]!.section]!;
  return (thermalExpansion * (load.above + load.below)) / 2;
}

function curvature({ members, sections }: Structure, load: Straining, leg: number): number {
  if (load.kind === 'lengthen' || load.above === load.below) return 0;
  const { thermalExpansion = 0, depth } = sections[members[load.member]!.legs[leg]!.section]!;
  if (depth === undefined) throw new Error(`Heat on member ${load.member} differs over a depth that is not known`);
  return (thermalExpansion * (load.below - load.above)) / depth;
}
