// Structures for tests, written as short as they are thought of: points by coordinates, members as chains of points.

import type {
  Hinge,
  Leg,
  LineDirection,
  Load,
  Location,
  Member,
  Restraint,
  Section,
  Structure,
  Support,
} from '../../src/model/structure.ts';

export interface SectionFigures {
  readonly EI?: number;
  readonly EA?: number;
  readonly mass?: number;
  readonly W?: number;
  readonly A?: number;
}

export interface Description {
  readonly points: Readonly<Record<string, readonly [x: number, y: number]>>;
  /** Named by their chain, `A B C`; bars in `bars`. */
  readonly members?: readonly string[];
  readonly bars?: readonly string[];
  /** By chain; of all others `section`. */
  readonly sections?: Readonly<Record<string, SectionFigures>>;
  readonly section?: SectionFigures;
  /** A point, or `B in A B C`. */
  readonly hinges?: readonly string[];
  readonly supports?: Readonly<Record<string, readonly Restraint[]>>;
  /** Each entry a case. */
  readonly cases?: readonly (readonly LoadFigures[])[];
}

export type LoadFigures =
  | {
      readonly on: string;
      readonly w: number | readonly [start: number, end: number];
      readonly from?: number;
      readonly to?: number;
      readonly direction?: LineDirection;
    }
  | { readonly at: Place; readonly x?: number; readonly y?: number }
  | { readonly at: Place; readonly couple: number }
  | { readonly move: string; readonly x?: number; readonly y?: number; readonly rotation?: number }
  | { readonly weightOf: readonly string[]; readonly factor?: number };

/** A point, a point of one member (`B in A B`), or a distance along a member. */
export type Place = string | { readonly member: string; readonly distance: number };

export const held = Number.POSITIVE_INFINITY;
export const alongX = (stiffness = held): Restraint => ({ freedom: { kind: 'movement', x: 1, y: 0 }, stiffness });
export const alongY = (stiffness = held): Restraint => ({ freedom: { kind: 'movement', x: 0, y: 1 }, stiffness });
export const turning = (stiffness = held): Restraint => ({ freedom: { kind: 'rotation' }, stiffness });
export const pinned = [alongX(), alongY()];
export const roller = [alongY()];
export const fixed = [alongX(), alongY(), turning()];
export const guided = [alongX(), turning()];
/** On a surface at this angle from level, rad. */
export const rollerOn = (angle: number): readonly Restraint[] => [
  { freedom: { kind: 'movement', x: -Math.sin(angle), y: Math.cos(angle) }, stiffness: held },
];

export const down: LineDirection = { kind: 'global', x: 0, y: -1, onPlan: false };

const range = { start: 0, end: 0 };

export function build(description: Description): Structure {
  const names = Object.keys(description.points);
  const points = names.map(name => {
    const [x, y] = description.points[name]!;
    return { name, x, y, range };
  });
  const pointOf = (name: string) => {
    const index = names.indexOf(name);
    if (index < 0) throw new Error(`no point ${name}`);
    return index;
  };
  const sections: Section[] = [];
  const sectionOf = (chain: string) => {
    const { EI, EA, mass, W, A } = description.sections?.[chain] ?? description.section ?? { EI: 1 };
    sections.push({
      name: chain,
      description: chain,
      bendingStiffness: EI,
      axialStiffness: EA,
      massPerLength: mass,
      sectionModulus: W,
      area: A,
      secondMomentOfArea: undefined,
      youngsModulus: undefined,
      depth: undefined,
      range,
    });
    return sections.length - 1;
  };
  const chains = [...(description.members ?? []), ...(description.bars ?? [])];
  const members = chains.map((chain, m): Member => {
    const section = sectionOf(chain);
    const ends = chain.split(' ').map(pointOf);
    const legs: Leg[] = [];
    let start = 0;
    for (let k = 0; k + 1 < ends.length; k++) {
      const from = points[ends[k]!]!;
      const to = points[ends[k + 1]!]!;
      const length = Math.hypot(to.x - from.x, to.y - from.y);
      legs.push({
        from: ends[k]!,
        to: ends[k + 1]!,
        section,
        start,
        length,
        cosine: (to.x - from.x) / length,
        sine: (to.y - from.y) / length,
      });
      start += length;
    }
    const kind = m < (description.members?.length ?? 0) ? 'member' : 'bar';
    return { name: chain, kind, legs, length: start, range };
  });
  const memberOf = (chain: string) => {
    const index = chains.indexOf(chain);
    if (index < 0) throw new Error(`no member ${chain}`);
    return index;
  };
  const locate = (place: Place): Location => {
    if (typeof place !== 'string') return { kind: 'along', member: memberOf(place.member), distance: place.distance };
    const [point, member] = place.split(' in ');
    if (member === undefined) return { kind: 'point', point: pointOf(point!) };
    return { kind: 'point', point: pointOf(point!), member: memberOf(member) };
  };
  const loads = (description.cases ?? []).flatMap((list, k) =>
    list.flatMap((figures): Load[] => {
      const common = { case: k, range };
      if ('weightOf' in figures) {
        return [
          { ...common, kind: 'self-weight', members: figures.weightOf.map(memberOf), factor: figures.factor ?? 1 },
        ];
      }
      if ('on' in figures) {
        const member = memberOf(figures.on);
        const [startIntensity, endIntensity] = typeof figures.w === 'number' ? [figures.w, figures.w] : figures.w;
        const start = figures.from ?? 0;
        const end = figures.to ?? members[member]!.length;
        const direction = figures.direction ?? down;
        return [{ ...common, kind: 'line', member, start, end, startIntensity, endIntensity, direction }];
      }
      if ('move' in figures) {
        const point = pointOf(figures.move);
        const moves: Load[] = [];
        const add = (freedom: Restraint['freedom'], amount: number | undefined) => {
          if (amount !== undefined) moves.push({ ...common, kind: 'movement', point, freedom, amount });
        };
        add({ kind: 'movement', x: 1, y: 0 }, figures.x);
        add({ kind: 'movement', x: 0, y: 1 }, figures.y);
        add({ kind: 'rotation' }, figures.rotation);
        return moves;
      }
      const at = locate(figures.at);
      if ('couple' in figures) return [{ ...common, kind: 'couple', at, moment: figures.couple }];
      return [{ ...common, kind: 'force', at, x: figures.x ?? 0, y: figures.y ?? 0 }];
    }),
  );
  const hinges = (description.hinges ?? []).map((text): Hinge => {
    const [point, member] = text.split(' in ');
    if (member === undefined) return { point: pointOf(point!), range };
    return { point: pointOf(point!), member: memberOf(member), range };
  });
  const supports = Object.entries(description.supports ?? {}).map(
    ([point, restraints]): Support => ({
      point: pointOf(point),
      restraints,
      symbol: { kind: 'held', angle: 0, springs: [] },
      range,
    }),
  );
  return {
    name: 'Test',
    range,
    points,
    sections,
    members,
    groups: [],
    hinges,
    supports,
    cases: (description.cases ?? []).map((_, k) => ({ name: `case${k}` })),
    loads,
  };
}

export function point(structure: Structure, name: string): number {
  return structure.points.findIndex(p => p.name === name);
}

export function member(structure: Structure, chain: string): number {
  return structure.members.findIndex(m => m.name === chain);
}
