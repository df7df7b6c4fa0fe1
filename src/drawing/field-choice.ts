// Which fields there is anything to draw of.
import type { Solution } from '../mechanics/solution.ts';
import type { Structure } from '../model/structure.ts';
import type { FieldName } from './field-curves.ts';
import { largestMovement } from './moved-shape.ts';
import { largestSize } from './readings.ts';

/** A force below this share of the largest force, or a moment below it of that force at the arm of a member, is rounding. */
const NO_FORCE = 1e-9;

/** Axial force, shear, moment, movement: in this order, as far as they are not nil. */
export function fieldsToDraw(structure: Structure, solution: Solution): FieldName[] {
  const axial = largestSize(solution.members, 'axialForce');
  const shear = largestSize(solution.members, 'shearForce');
  const moment = largestSize(solution.members, 'bendingMoment');
  const force = Math.max(axial, shear, Math.hypot(solution.applied.x, solution.applied.y));
  const length = Math.max(0, ...structure.members.map(member => member.length));
  const fields: FieldName[] = [];
  if (axial > NO_FORCE * force) fields.push('axial');
  if (shear > NO_FORCE * force) fields.push('shear');
  if (moment > NO_FORCE * force * length) fields.push('moment');
  if (largestMovement(solution) > 0) fields.push('movement');
  return fields;
}
