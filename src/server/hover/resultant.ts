// The resultant of what one load statement puts on a structure: force, and the couple where that is what it is.
import { STANDARD_GRAVITY } from '../../model/gravity.ts';
import type { Leg, LineDirection, Load, Structure } from '../../model/structure.ts';

/** N, right and up; N m, anticlockwise, of couples alone. */
export interface Resultant {
  readonly x: number;
  readonly y: number;
  readonly couple: number;
}

/** Imposed movements, heat and lack of fit have no resultant and count as nothing. */
export function resultantOf(structure: Structure, loads: readonly Load[]): Resultant {
  let [x, y, couple] = [0, 0, 0];
  for (const load of loads) {
    const one = ofLoad(structure, load);
    x += one.x;
    y += one.y;
    couple += one.couple;
  }
  return { x, y, couple };
}

function ofLoad(structure: Structure, load: Load): Resultant {
  switch (load.kind) {
    case 'self-weight':
      return { x: 0, y: -STANDARD_GRAVITY * load.factor * massOf(structure, load.members), couple: 0 };
    case 'line':
      return ofLine(structure, load);
    case 'force':
      return { x: load.x, y: load.y, couple: 0 };
    case 'couple':
      return { x: 0, y: 0, couple: load.moment };
    case 'movement':
    case 'heat':
    case 'lengthen':
      return { x: 0, y: 0, couple: 0 };
  }
}

function massOf(structure: Structure, members: readonly number[]): number {
  let mass = 0;
  for (const index of members) {
    for (const leg of structure.members[index]?.legs ?? []) {
      mass += leg.length * (structure.sections[leg.section]?.massPerLength ?? 0);
    }
  }
  return mass;
}

/** Leg by leg, since the direction may turn at each: mean intensity times the loaded length. */
function ofLine(structure: Structure, load: Extract<Load, { readonly kind: 'line' }>): Resultant {
  let [x, y] = [0, 0];
  for (const leg of structure.members[load.member]?.legs ?? []) {
    const start = Math.max(load.start, leg.start);
    const end = Math.min(load.end, leg.start + leg.length);
    if (end <= start) continue;
    const middle = ((start + end) / 2 - load.start) / (load.end - load.start);
    const intensity = load.startIntensity + middle * (load.endIntensity - load.startIntensity);
    const along = directionOn(leg, load.direction);
    x += intensity * (end - start) * along.x;
    y += intensity * (end - start) * along.y;
  }
  return { x, y, couple: 0 };
}

function directionOn(leg: Leg, direction: LineDirection): { readonly x: number; readonly y: number } {
  switch (direction.kind) {
    case 'global': {
      const share = direction.onPlan ? Math.abs(leg.cosine) : 1;
      return { x: share * direction.x, y: share * direction.y };
    }
    case 'square': {
      const side = Math.sign(-leg.sine * direction.x + leg.cosine * direction.y) || 1;
      return { x: -side * leg.sine, y: side * leg.cosine };
    }
    case 'along':
      return { x: direction.sense * leg.cosine, y: direction.sense * leg.sine };
  }
}
