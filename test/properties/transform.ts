// The same structure said otherwise: with a member run the other way, with a point more, in another order, in other units;
// and with other stiffness and loads.
import type { Attachment, Leg, Load, Location, Point, Structure } from '../../src/model/structure.ts';

/** The member runs from its last point to its first. */
export function reversed(structure: Structure, member: number): Structure {
  const old = structure.members[member]!;
  const legs = old.legs.toReversed().map(
    ({ startAttachment, endAttachment, ...leg }): Leg => ({
      ...leg,
      ...(endAttachment !== undefined && { startAttachment: endAttachment }),
      ...(startAttachment !== undefined && { endAttachment: startAttachment }),
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
      case 'heat':
        return load.member === member ? { ...load, above: load.below, below: load.above } : load;
      case 'self-weight':
      case 'movement':
      case 'lengthen':
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
  const { startAttachment, endAttachment, ...middle } = whole;
  const halves: Leg[] = [
    { ...middle, ...(startAttachment !== undefined && { startAttachment }), to: index, length: first },
    {
      ...middle,
      ...(endAttachment !== undefined && { endAttachment }),
      from: index,
      start: whole.start + first,
      length: whole.length - first,
    },
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
      case 'heat':
      case 'lengthen':
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
      case 'heat':
        return load;
      case 'lengthen':
        return { ...load, amount: load.amount * length };
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
      ...(section.shearStiffness !== undefined && { shearStiffness: section.shearStiffness * force }),
      // Such that mass times gravity comes out as force per length.
      massPerLength: stiff(section.massPerLength, force / length),
      depth: stiff(section.depth, length),
    })),
    members: structure.members.map(member => ({
      ...member,
      length: member.length * length,
      legs: member.legs.map(leg => ({
        ...leg,
        ...attachments(leg, force * length),
        start: leg.start * length,
        length: leg.length * length,
      })),
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
      ...(section.shearStiffness !== undefined && { shearStiffness: section.shearStiffness * factor }),
    })),
    members: structure.members.map(member => ({
      ...member,
      legs: member.legs.map(leg => ({ ...leg, ...attachments(leg, factor) })),
    })),
    supports: structure.supports.map(support => ({
      ...support,
      restraints: support.restraints.map(({ freedom, stiffness }) => ({ freedom, stiffness: stiffness * factor })),
    })),
  };
}

/** The ends of a leg, connections stiffer by a factor. */
function attachments({ startAttachment, endAttachment }: Leg, factor: number): Partial<Leg> {
  const stiffer = ({ turning, ...rest }: Attachment): Attachment =>
    turning === undefined ? rest : { ...rest, turning: turning * factor };
  return {
    ...(startAttachment !== undefined && { startAttachment: stiffer(startAttachment) }),
    ...(endAttachment !== undefined && { endAttachment: stiffer(endAttachment) }),
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
    case 'lengthen':
      return { ...load, amount: load.amount * factor };
    case 'heat':
      return { ...load, above: load.above * factor, below: load.below * factor };
  }
}
