// The same structure said otherwise: turned, moved, mirrored, with a member run the other way, with a point more, in
// another order, in other units.
import { STANDARD_GRAVITY } from '../../src/model/gravity.ts';
import type {
  Leg,
  LineDirection,
  Load,
  Location,
  Member,
  Point,
  Restraint,
  Structure,
} from '../../src/model/structure.ts';

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

/** The member runs from its last point to its first. */
export function reversed(structure: Structure, member: number): Structure {
  const old = structure.members[member]!;
  const legs = old.legs.toReversed().map(
    (leg): Leg => ({
      ...leg,
      from: leg.to,
      to: leg.from,
      start: old.length - leg.start - leg.length,
      cosine: -leg.cosine,
      sine: -leg.sine,
    }),
  );
  const place = (at: Location): Location =>
    at.kind === 'along' && at.member === member ? { ...at, distance: old.length - at.distance } : at;
  const runBack = (load: Load): Load => {
    switch (load.kind) {
      case 'line': {
        if (load.member !== member) return load;
        const { direction } = load;
        return {
          ...load,
          start: old.length - load.end,
          end: old.length - load.start,
          startIntensity: load.endIntensity,
          endIntensity: load.startIntensity,
          direction: direction.kind === 'along' ? { ...direction, sense: direction.sense === 1 ? -1 : 1 } : direction,
        };
      }
      case 'force':
      case 'couple':
        return { ...load, at: place(load.at) };
      case 'self-weight':
      case 'movement':
        return load;
    }
  };
  const members = structure.members.with(member, { ...old, legs });
  return { ...structure, members, loads: structure.loads.map(runBack) };
}

/** A point more, within a leg. */
export function subdivided(structure: Structure, member: number, leg: number, fraction: number): Structure {
  const old = structure.members[member]!;
  const whole = old.legs[leg]!;
  const first = fraction * whole.length;
  const from = structure.points[whole.from]!;
  const point: Point = {
    name: `${from.name}*`,
    x: from.x + first * whole.cosine,
    y: from.y + first * whole.sine,
    range: from.range,
  };
  const index = structure.points.length;
  const halves: Leg[] = [
    { ...whole, to: index, length: first },
    { ...whole, from: index, start: whole.start + first, length: whole.length - first },
  ];
  const legs = old.legs.toSpliced(leg, 1, ...halves);
  return {
    ...structure,
    points: [...structure.points, point],
    members: structure.members.with(member, { ...old, legs }),
  };
}

/** Points, members, supports and loads in the opposite order; cases stay. */
export function reordered(structure: Structure): Structure {
  const lastPoint = structure.points.length - 1;
  const lastMember = structure.members.length - 1;
  const place = (at: Location): Location => {
    if (at.kind === 'along') return { ...at, member: lastMember - at.member };
    const member = at.member === undefined ? {} : { member: lastMember - at.member };
    return { kind: 'point', point: lastPoint - at.point, ...member };
  };
  const renumber = (load: Load): Load => {
    switch (load.kind) {
      case 'self-weight':
        return { ...load, members: load.members.map(member => lastMember - member) };
      case 'line':
        return { ...load, member: lastMember - load.member };
      case 'force':
      case 'couple':
        return { ...load, at: place(load.at) };
      case 'movement':
        return { ...load, point: lastPoint - load.point };
    }
  };
  return {
    ...structure,
    points: structure.points.toReversed(),
    members: structure.members.toReversed().map(member => ({
      ...member,
      legs: member.legs.map(leg => ({ ...leg, from: lastPoint - leg.from, to: lastPoint - leg.to })),
    })),
    hinges: structure.hinges.toReversed().map(({ point, member, range }) => ({
      point: lastPoint - point,
      ...(member !== undefined && { member: lastMember - member }),
      range,
    })),
    supports: structure.supports.toReversed().map(support => ({ ...support, point: lastPoint - support.point })),
    loads: structure.loads.toReversed().map(renumber),
  };
}

/** With lengths and forces in other units: `length` and `force` are what 1 m and 1 N read there. */
export function inUnits(structure: Structure, length: number, force: number): Structure {
  const stiff = (value: number | undefined, factor: number) => (value === undefined ? undefined : value * factor);
  const place = (at: Location): Location => (at.kind === 'along' ? { ...at, distance: at.distance * length } : at);
  const convert = (load: Load): Load => {
    switch (load.kind) {
      case 'self-weight':
        return load;
      case 'line':
        return {
          ...load,
          start: load.start * length,
          end: load.end * length,
          startIntensity: (load.startIntensity * force) / length,
          endIntensity: (load.endIntensity * force) / length,
        };
      case 'force':
        return { ...load, x: load.x * force, y: load.y * force, at: place(load.at) };
      case 'couple':
        return { ...load, moment: load.moment * force * length, at: place(load.at) };
      case 'movement':
        return load.freedom.kind === 'rotation' ? load : { ...load, amount: load.amount * length };
    }
  };
  return {
    ...structure,
    points: structure.points.map(point => ({ ...point, x: point.x * length, y: point.y * length })),
    sections: structure.sections.map(section => ({
      ...section,
      bendingStiffness: stiff(section.bendingStiffness, force * length ** 2),
      axialStiffness: stiff(section.axialStiffness, force),
      // Such that mass times gravity comes out as force per length.
      massPerLength: stiff(section.massPerLength, force / length),
    })),
    members: structure.members.map(member => ({
      ...member,
      length: member.length * length,
      legs: member.legs.map(leg => ({ ...leg, start: leg.start * length, length: leg.length * length })),
    })),
    supports: structure.supports.map(support => ({
      ...support,
      restraints: support.restraints.map(({ freedom, stiffness }) => ({
        freedom,
        stiffness: stiffness * (freedom.kind === 'rotation' ? force * length : force / length),
      })),
    })),
    loads: structure.loads.map(convert),
  };
}

/** All stiffness, springs included, times a factor. */
export function stiffened(structure: Structure, factor: number): Structure {
  const stiff = (value: number | undefined) => (value === undefined ? undefined : value * factor);
  return {
    ...structure,
    sections: structure.sections.map(section => ({
      ...section,
      bendingStiffness: stiff(section.bendingStiffness),
      axialStiffness: stiff(section.axialStiffness),
    })),
    supports: structure.supports.map(support => ({
      ...support,
      restraints: support.restraints.map(({ freedom, stiffness }) => ({ freedom, stiffness: stiffness * factor })),
    })),
  };
}

/** One case of all loads, each times the factor of its own. */
export function merged(structure: Structure, factors: readonly number[]): Structure {
  const loads = structure.loads.map(load => ({ ...scaledLoad(load, factors[load.case]!), case: 0 }));
  return { ...structure, cases: [{ name: 'merged' }], loads };
}

export function withLoads(structure: Structure, cases: readonly (readonly WithoutCase[])[]): Structure {
  return {
    ...structure,
    cases: cases.map((_, index) => ({ name: `case ${index}` })),
    loads: cases.flatMap((loads, index) =>
      // The case is put back; the cast says that a load without its case and with one is a load.
      loads.map(load => ({ ...load, case: index, range: structure.range }) as Load),
    ),
  };
}

type Distribute<T> = T extends Load ? Omit<T, 'case' | 'range'> : never;
export type WithoutCase = Distribute<Load>;

export function scaledLoad(load: Load, factor: number): Load {
  switch (load.kind) {
    case 'self-weight':
      return { ...load, factor: load.factor * factor };
    case 'line':
      return { ...load, startIntensity: load.startIntensity * factor, endIntensity: load.endIntensity * factor };
    case 'force':
      return { ...load, x: load.x * factor, y: load.y * factor };
    case 'couple':
      return { ...load, moment: load.moment * factor };
    case 'movement':
      return { ...load, amount: load.amount * factor };
  }
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
