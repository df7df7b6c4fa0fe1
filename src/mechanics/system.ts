// A structure made ready to be solved: everything that its load cases share.

import type { Structure } from '../model/structure.ts';
import { type Factorisation, factorise } from './factorisation.ts';
import { findLengthened } from './free-strains.ts';
import { type Freedoms, numberFreedoms } from './freedoms.ts';
import { findMoved } from './imposed.ts';
import { axialStiffness, turningStiffness } from './leg-stiffness.ts';
import { FREED_END, flattenLegs, type Legs } from './legs.ts';
import { type Reduction, reduce } from './reduction.ts';
import { findSegments, type Segments } from './segments.ts';
import { assemble, type Stiffnesses } from './stiffness.ts';
import { type Ends, relateEnds, type StrainRows, strainRows } from './strains.ts';
import { collectSupports, type PointSupport } from './supports.ts';
import type { SymmetricMatrix } from './symmetric-matrix.ts';
import { prepareThrusts, type Thrusts } from './thrusts.ts';

export interface System {
  readonly structure: Structure;
  readonly legs: Legs;
  readonly supports: ReadonlyMap<number, PointSupport>;
  readonly freedoms: Freedoms;
  readonly ends: Ends;
  readonly segments: Segments;
  readonly reduction: Reduction;
  readonly rows: StrainRows;
  readonly matrix: SymmetricMatrix;
  readonly factorisation: Factorisation;
  /** Undefined where no leg is axially stiff. */
  readonly thrusts: Thrusts | undefined;
}

/** Undefined where axially stiff legs tie too many movements together. */
export function prepareSystem(structure: Structure): System | undefined {
  const legs = flattenLegs(structure);
  const supports = collectSupports(structure);
  const freedoms = numberFreedoms(structure, legs, supports);
  const reduction = reduce(legs, freedoms, findMoved(structure.loads, freedoms), findLengthened(structure, legs));
  if (reduction === undefined) return undefined;
  const ends = relateEnds(legs, freedoms);
  const rows = strainRows(legs, ends, freedoms, reduction);
  const matrix = assemble(rows, stiffnessesOf(legs, freedoms), reduction, pointsOf(reduction, freedoms));
  return {
    structure,
    legs,
    supports,
    freedoms,
    ends,
    segments: findSegments(structure, legs),
    reduction,
    rows,
    matrix,
    factorisation: factorise(matrix),
    thrusts: prepareThrusts(legs, ends, freedoms),
  };
}

/** The point that each unknown belongs to. */
export function pointsOf(reduction: Reduction, freedoms: Freedoms): Int32Array {
  return reduction.freedoms.map(freedom => freedoms.point[freedom]!);
}

/**
 * See leg-stiffness.ts; an axially stiff leg has no lengthening left. A leg whose shear is freed has one strain of bending
 * in its row, that of its ends against each other.
 */
function stiffnessesOf(legs: Legs, freedoms: Freedoms): Stiffnesses {
  const count = legs.count + freedoms.springs.length;
  const axial = new Float64Array(count);
  const own = new Float64Array(count);
  const other = new Float64Array(count);
  for (let e = 0; e < legs.count; e++) {
    axial[e] = axialStiffness(legs, e);
    const turning = turningStiffness(legs, e);
    own[e] = turning.own;
    if (legs.freedShear[e] === FREED_END.none) other[e] = turning.other;
  }
  freedoms.springs.forEach((spring, k) => {
    axial[legs.count + k] = spring.stiffness;
  });
  return { axial, own, other };
}
