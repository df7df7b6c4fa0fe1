// The equilibrium of a structure laid out for the force method: which internal forces and reactions are unknown, and
// which equations of the points they enter.
//
// Unknowns of leg i stand at 3i, 3i + 1, 3i + 2: its axial force at the start (N, tension positive), and its bending
// moments at start and end (N m, positive with tension on the underside). The reactions follow from `firstReaction` on.
// Equations: a force to the right and a force up for each point that a leg reaches, and a couple, anticlockwise, where
// ends are rigidly joined or connected or the rotation is held; then one for each force that is freed at an end, which is
// nil there. Each says: internal forces + reactions + loads = 0.
import type { Attachment, FreedForce, Structure } from '../model/structure.ts';
import { type Ground, groundsOf } from './grounds.ts';

export interface Statics {
  readonly structure: Structure;
  /** Of all members, in order. */
  readonly legs: readonly StaticLeg[];
  /** Index into `legs` of each member's first leg, and the number of legs last. */
  readonly firstLeg: Int32Array;
  readonly grounds: readonly Ground[];
  readonly firstReaction: number;
  readonly unknownCount: number;
  /** Per point: the row of the horizontal force, the vertical one following; −1 where no leg reaches. */
  readonly forceRow: Int32Array;
  /** Per point: the row of the couple, −1 where there is none. */
  readonly coupleRow: Int32Array;
  /** Four per leg: the rows of what is freed, as `releaseAt` numbers them; −1 where it passes. */
  readonly releaseRow: Int32Array;
  readonly rowCount: number;
  /** Per point: the longest leg that reaches it, m; the lever by which couples are compared with forces. */
  readonly lever: Float64Array;
}

export interface StaticLeg {
  readonly member: number;
  /** Index into the member's `legs`. */
  readonly index: number;
  readonly from: number;
  readonly to: number;
  readonly start: number;
  readonly length: number;
  readonly cosine: number;
  readonly sine: number;
  /** 1/EA, 1/N; 0 for an axially stiff leg. */
  readonly axialFlexibility: number;
  /** 1/EI, 1/(N m²); 0 for a bar, which does not bend. */
  readonly bendingFlexibility: number;
  /** 1/GAs, 1/N; 0 where shear deformation is not counted. */
  readonly shearFlexibility: number;
  /** Of the connection at the end, rad/(N m): how far it turns for a moment of 1 N m; 0 where there is none. */
  readonly startTurning: number;
  readonly endTurning: number;
  /** Whether the end is joined rigidly or by a connection, so that it can carry a moment. */
  readonly rigidStart: boolean;
  readonly rigidEnd: boolean;
}

/** The most equations that one unknown enters: two forces at each end, a couple at one, and a release. */
export const ENTRIES_PER_UNKNOWN = 6;

export type End = 'start' | 'end';

/** Index into `releaseRow`. */
export function releaseAt(leg: number, force: FreedForce, end: End): number {
  return 4 * leg + (force === 'axial' ? 0 : 2) + (end === 'start' ? 0 : 1);
}

/** Undefined where a member's bending stiffness is not known. */
export function staticsOf(structure: Structure): Statics | undefined {
  const legs = legsOf(structure);
  if (!legs) return undefined;
  const firstLeg = new Int32Array(structure.members.length + 1);
  structure.members.forEach((member, index) => {
    firstLeg[index + 1] = firstLeg[index]! + member.legs.length;
  });

  const pointCount = structure.points.length;
  const reached = new Uint8Array(pointCount);
  const turning = new Uint8Array(pointCount);
  const lever = new Float64Array(pointCount);
  for (const leg of legs) {
    reached[leg.from] = reached[leg.to] = 1;
    if (leg.rigidStart) turning[leg.from] = 1;
    if (leg.rigidEnd) turning[leg.to] = 1;
    lever[leg.from] = Math.max(lever[leg.from]!, leg.length);
    lever[leg.to] = Math.max(lever[leg.to]!, leg.length);
  }
  const grounds = groundsOf(structure).filter(ground => reached[ground.point]);
  for (const ground of grounds) if (ground.moment) turning[ground.point] = 1;

  const forceRow = new Int32Array(pointCount).fill(-1);
  const coupleRow = new Int32Array(pointCount).fill(-1);
  let rowCount = 0;
  for (let point = 0; point < pointCount; point++) {
    if (!reached[point]) continue;
    forceRow[point] = rowCount;
    rowCount += 2;
    if (turning[point]) coupleRow[point] = rowCount++;
  }
  const releaseRow = new Int32Array(4 * legs.length).fill(-1);
  for (const [leg, { member, index }] of legs.entries()) {
    const { startAttachment, endAttachment } = structure.members[member]!.legs[index]!;
    for (const force of freedOf(startAttachment)) releaseRow[releaseAt(leg, force, 'start')] = rowCount++;
    for (const force of freedOf(endAttachment)) releaseRow[releaseAt(leg, force, 'end')] = rowCount++;
  }
  const firstReaction = 3 * legs.length;
  const unknownCount = firstReaction + grounds.length;
  return {
    structure,
    legs,
    firstLeg,
    grounds,
    firstReaction,
    unknownCount,
    forceRow,
    coupleRow,
    releaseRow,
    rowCount,
    lever,
  };
}

/** Whether there is such an unknown: hinged ends and bars have no end moments. */
export function isUnknown(statics: Statics, unknown: number): boolean {
  if (unknown >= statics.firstReaction) return true;
  const leg = statics.legs[Math.floor(unknown / 3)]!;
  const which = unknown % 3;
  return which === 0 || (which === 1 ? leg.rigidStart : leg.rigidEnd);
}

/**
 * The equations that a unit of the unknown enters, dimensionless: a couple's equation is divided by its point's lever,
 * and the unit is that of `unitOf`. Writes into `rows` and `values`, returns how many; no row comes twice.
 */
export function entriesOf(statics: Statics, unknown: number, rows: Int32Array, values: Float64Array): number {
  const { forceRow, coupleRow, releaseRow, lever } = statics;
  if (unknown >= statics.firstReaction) {
    const { point, x, y, moment } = statics.grounds[unknown - statics.firstReaction]!;
    if (moment) {
      rows[0] = coupleRow[point]!;
      values[0] = 1;
      return 1;
    }
    rows[0] = forceRow[point]!;
    values[0] = x;
    rows[1] = forceRow[point]! + 1;
    values[1] = y;
    return 2;
  }
  const leg = statics.legs[Math.floor(unknown / 3)]!;
  const which = unknown % 3;
  // On the point at the start, N pulls along the travel; the shear dM/dx = (end moment − start moment)/L pushes against
  // the left-hand normal there. For the unit of a moment, 1/L per metre, that shear is −1 or 1.
  const x = which === 0 ? leg.cosine : which === 1 ? -leg.sine : leg.sine;
  const y = which === 0 ? leg.sine : which === 1 ? leg.cosine : -leg.cosine;
  rows[0] = forceRow[leg.from]!;
  values[0] = x;
  rows[1] = forceRow[leg.from]! + 1;
  values[1] = y;
  rows[2] = forceRow[leg.to]!;
  values[2] = -x;
  rows[3] = forceRow[leg.to]! + 1;
  values[3] = -y;
  let count = 4;
  if (which !== 0) {
    const point = which === 1 ? leg.from : leg.to;
    rows[4] = coupleRow[point]!;
    values[4] = ((which === 1 ? 1 : -1) * leg.length) / lever[point]!;
    count = 5;
  }
  // The force itself, at whichever end it is freed: N, or the shear of the end moments.
  const release = releaseAt(Math.floor(unknown / 3), which === 0 ? 'axial' : 'shear', 'start');
  const row = Math.max(releaseRow[release]!, releaseRow[release + 1]!);
  if (row < 0) return count;
  rows[count] = row;
  values[count] = which === 1 ? -1 : 1;
  return count + 1;
}

/** What a dimensionless unit of the unknown is: 1 N, or the couple of 1 N on the leg's length or on the point's lever. */
export function unitOf(statics: Statics, unknown: number): number {
  if (unknown < statics.firstReaction) return unknown % 3 === 0 ? 1 : statics.legs[Math.floor(unknown / 3)]!.length;
  const ground = statics.grounds[unknown - statics.firstReaction]!;
  return ground.moment ? statics.lever[ground.point]! : 1;
}

/** From dimensionless units of the unknowns to N and N m. */
export function toPhysicalUnits(statics: Statics, unknowns: Float64Array): void {
  for (let unknown = 0; unknown < unknowns.length; unknown++) {
    if (unknowns[unknown] !== 0) unknowns[unknown]! *= unitOf(statics, unknown);
  }
}

/** Movement per N of a dimensionless unit of the unknown by itself, m/N: L/EA, L³/3EI + L/GAs + L²/k of a connection, 1/k, lever²/k. */
export function flexibilityOf(statics: Statics, unknown: number): number {
  if (unknown >= statics.firstReaction) {
    return statics.grounds[unknown - statics.firstReaction]!.flexibility * unitOf(statics, unknown) ** 2;
  }
  const leg = statics.legs[Math.floor(unknown / 3)]!;
  const { length } = leg;
  if (unknown % 3 === 0) return leg.axialFlexibility * length;
  const turning = unknown % 3 === 1 ? leg.startTurning : leg.endTurning;
  return (leg.bendingFlexibility * length ** 3) / 3 + leg.shearFlexibility * length + turning * length ** 2;
}

function legsOf(structure: Structure): StaticLeg[] | undefined {
  const hinged = new Set<string>();
  for (const { point, member } of structure.hinges) hinged.add(hingeKey(point, member));
  const free = (point: number, member: number) =>
    hinged.size > 0 && (hinged.has(hingeKey(point)) || hinged.has(hingeKey(point, member)));
  const legs: StaticLeg[] = [];
  for (const [member, { kind, legs: chain }] of structure.members.entries()) {
    for (const [index, leg] of chain.entries()) {
      const section = structure.sections[leg.section]!;
      if (kind === 'member' && section.bendingStiffness === undefined) return undefined;
      legs.push({
        member,
        index,
        from: leg.from,
        to: leg.to,
        start: leg.start,
        length: leg.length,
        cosine: leg.cosine,
        sine: leg.sine,
        axialFlexibility: section.axialStiffness === undefined ? 0 : 1 / section.axialStiffness,
        bendingFlexibility: kind === 'bar' ? 0 : 1 / section.bendingStiffness!,
        shearFlexibility: kind === 'bar' || section.shearStiffness === undefined ? 0 : 1 / section.shearStiffness,
        startTurning: turningOf(leg.startAttachment),
        endTurning: turningOf(leg.endAttachment),
        rigidStart: kind === 'member' && !free(leg.from, member),
        rigidEnd: kind === 'member' && !free(leg.to, member),
      });
    }
  }
  return legs;
}

function freedOf(attachment: Attachment | undefined): readonly FreedForce[] {
  return attachment?.freed ?? [];
}

function turningOf(attachment: Attachment | undefined): number {
  return attachment?.turning === undefined ? 0 : 1 / attachment.turning;
}

function hingeKey(point: number, member?: number): string {
  return member === undefined ? `${point}` : `${point} ${member}`;
}
