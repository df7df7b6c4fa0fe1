// A structure moved as a whole: turned, shifted, mirrored. What knows which way is down must be made explicit first.
import { STANDARD_GRAVITY } from '../../src/model/gravity.ts';
import type { LineDirection, Load, Member, Restraint, Structure } from '../../src/model/structure.ts';

type Vector = readonly [x: number, y: number];

/** A distance-keeping map of the plane: of directions, and where the origin goes. */
interface Motion {
  readonly turn: (x: number, y: number) => Vector;
  readonly origin: Vector;
  /** 1 where turning senses stay, −1 where they are mirrored. */
  readonly sense: 1 | -1;
}

/** Weight and loads on plan, which know which way is down, as plain line loads and forces. */
export function explicit(structure: Structure): Structure {
  return { ...structure, loads: structure.loads.flatMap(load => explicitLoad(structure, load)) };
}

export function rotated(structure: Structure, angle: number): Structure {
  const [cosine, sine] = [Math.cos(angle), Math.sin(angle)];
  return carried(structure, {
    turn: (x, y) => [cosine * x - sine * y, sine * x + cosine * y],
    origin: [0, 0],
    sense: 1,
  });
}

export function translated(structure: Structure, x: number, y: number): Structure {
  return carried(structure, { turn: (a, b) => [a, b], origin: [x, y], sense: 1 });
}

/** Left becomes right. The underside of a member becomes its upper side. */
export function mirrored(structure: Structure): Structure {
  return carried(structure, { turn: (x, y) => [-x, y], origin: [0, 0], sense: -1 });
}

function carried(structure: Structure, { turn, origin, sense }: Motion): Structure {
  const freedomOf = (freedom: Restraint['freedom']): Restraint['freedom'] => {
    if (freedom.kind === 'rotation') return freedom;
    const [x, y] = turn(freedom.x, freedom.y);
    return { kind: 'movement', x, y };
  };
  const member = (old: Member): Member => ({
    ...old,
    legs: old.legs.map(leg => {
      const [cosine, sine] = turn(leg.cosine, leg.sine);
      return { ...leg, cosine, sine };
    }),
  });
  const direction = (old: LineDirection): LineDirection => {
    if (old.kind === 'along') return old;
    if (old.kind === 'global' && old.onPlan) throw new Error('a load on plan does not turn: make it explicit first');
    const [x, y] = turn(old.x, old.y);
    return { ...old, x, y };
  };
  const carry = (load: Load): Load => {
    switch (load.kind) {
      case 'self-weight':
        throw new Error('weight does not turn: make it explicit first');
      case 'line':
        return { ...load, direction: direction(load.direction) };
      case 'force': {
        const [x, y] = turn(load.x, load.y);
        return { ...load, x, y };
      }
      case 'couple':
        return { ...load, moment: load.moment * sense };
      case 'movement': {
        const amount = load.freedom.kind === 'rotation' ? load.amount * sense : load.amount;
        return { ...load, freedom: freedomOf(load.freedom), amount };
      }
      case 'heat':
        return sense < 0 ? { ...load, above: load.below, below: load.above } : load;
      case 'lengthen':
        return load;
    }
  };
  return {
    ...structure,
    points: structure.points.map(point => {
      const [x, y] = turn(point.x, point.y);
      return { ...point, x: x + origin[0], y: y + origin[1] };
    }),
    members: structure.members.map(member),
    supports: structure.supports.map(support => ({
      ...support,
      restraints: support.restraints.map(({ freedom, stiffness }) => ({ freedom: freedomOf(freedom), stiffness })),
    })),
    loads: structure.loads.map(carry),
  };
}

function explicitLoad(structure: Structure, load: Load): Load[] {
  const common = { case: load.case, range: load.range };
  if (load.kind === 'self-weight') {
    return load.members.flatMap(member => {
      const { kind, legs } = structure.members[member]!;
      return legs.flatMap(({ from, to, section, start, length }): Load[] => {
        const weight = (structure.sections[section]!.massPerLength ?? 0) * STANDARD_GRAVITY * load.factor;
        if (kind === 'bar') {
          const half = (point: number): Load => ({
            ...common,
            kind: 'force',
            x: 0,
            y: (-weight * length) / 2,
            at: { kind: 'point', point },
          });
          return [half(from), half(to)];
        }
        const direction: LineDirection = { kind: 'global', x: 0, y: -1, onPlan: false };
        const end = start + length;
        return [
          { ...common, kind: 'line', member, start, end, startIntensity: weight, endIntensity: weight, direction },
        ];
      });
    });
  }
  if (load.kind !== 'line' || load.direction.kind !== 'global' || !load.direction.onPlan) return [load];
  const { member, direction } = load;
  const intensity = (distance: number) =>
    load.startIntensity +
    ((load.endIntensity - load.startIntensity) * (distance - load.start)) / (load.end - load.start);
  return structure.members[member]!.legs.flatMap((leg): Load[] => {
    const start = Math.max(load.start, leg.start);
    const end = Math.min(load.end, leg.start + leg.length);
    if (end - start <= 1e-9 * leg.length) return [];
    const share = Math.abs(leg.cosine);
    const [startIntensity, endIntensity] = [share * intensity(start), share * intensity(end)];
    return [{ ...load, start, end, startIntensity, endIntensity, direction: { ...direction, onPlan: false } }];
  });
}
