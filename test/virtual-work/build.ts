// Structures written by hand for tests, in SI, with points by name.
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

export interface Sketch {
  points: Record<string, readonly [x: number, y: number]>;
  /** By name: its points in order, its sections (one, or one a leg). */
  members?: Record<string, Chain>;
  bars?: Record<string, Chain>;
  /** Point, or `point member`. */
  hinges?: readonly string[];
  supports: Record<string, Holding>;
  /** By case. */
  loads?: Record<string, readonly SketchLoad[]>;
}

export interface Chain {
  chain: string;
  EI?: number | readonly number[];
  EA?: number | readonly number[];
  /** kg/m. */
  mass?: number;
}

/** As in the language, or restraints: `x`, `y`, `rotation` held or with a stiffness, `angle` (of a roller's surface, rad). */
export type Holding =
  | 'pinned'
  | 'roller'
  | 'fixed'
  | 'guided'
  | { x?: number; y?: number; rotation?: number; angle?: number };

/** A place: a point, `point member`, or `distance member`. */
export type SketchLoad =
  | { selfWeight: readonly string[]; factor?: number }
  | { line: string; from?: number; to?: number; size: number | readonly [number, number]; direction?: LineDirection }
  | { force: readonly [x: number, y: number]; at: string }
  | { couple: number; at: string }
  | { move: string; by: readonly [x: number, y: number] | { turn: number } }
  /** K; sections expand by `EXPANSION` and are `DEPTH` deep. */
  | { heat: string; above: number; below: number }
  | { lengthen: string; by: number };

export const DOWN: LineDirection = { kind: 'global', x: 0, y: -1, onPlan: false };
export const HELD = Number.POSITIVE_INFINITY;
/** 1/K and m. */
export const EXPANSION = 1.2e-5;
export const DEPTH = 0.3;
const RANGE = { start: 0, end: 0 };

export function build(sketch: Sketch): Structure {
  const pointNames = Object.keys(sketch.points);
  const pointOf = (name: string) => {
    const index = pointNames.indexOf(name);
    if (index < 0) throw new Error(`no point ${name}`);
    return index;
  };
  const points = pointNames.map(name => ({
    name,
    x: sketch.points[name]![0],
    y: sketch.points[name]![1],
    range: RANGE,
  }));
  const sections: Section[] = [];
  const members: Member[] = [];
  for (const kind of ['member', 'bar'] as const) {
    for (const [name, { chain, EI, EA, mass }] of Object.entries(
      sketch[kind === 'member' ? 'members' : 'bars'] ?? {},
    )) {
      const names = chain.split(' ');
      const legs: Leg[] = [];
      let start = 0;
      for (let index = 0; index + 1 < names.length; index++) {
        const from = pointOf(names[index]!);
        const to = pointOf(names[index + 1]!);
        const x = points[to]!.x - points[from]!.x;
        const y = points[to]!.y - points[from]!.y;
        const length = Math.hypot(x, y);
        legs.push({ from, to, section: sections.length, start, length, cosine: x / length, sine: y / length });
        sections.push(section(name, pick(EI, index), pick(EA, index), mass));
        start += length;
      }
      members.push({ name, kind, legs, length: start, range: RANGE });
    }
  }
  const memberOf = (name: string) => {
    const index = members.findIndex(member => member.name === name);
    if (index < 0) throw new Error(`no member ${name}`);
    return index;
  };
  const place = (text: string): Location => {
    const [first, member] = text.split(' ');
    if (member === undefined) return { kind: 'point', point: pointOf(first!) };
    if (pointNames.includes(first!)) return { kind: 'point', point: pointOf(first!), member: memberOf(member) };
    return { kind: 'along', member: memberOf(member), distance: Number(first) };
  };
  const hinges: Hinge[] = (sketch.hinges ?? []).map(text => {
    const [point, member] = text.split(' ');
    return { point: pointOf(point!), ...(member !== undefined && { member: memberOf(member) }), range: RANGE };
  });
  const supports: Support[] = Object.entries(sketch.supports).map(([point, holding]) => ({
    point: pointOf(point),
    restraints: restraints(holding),
    symbol: { kind: 'held', angle: 0, springs: [] },
    range: RANGE,
  }));
  const cases = Object.keys(sketch.loads ?? {}).map(name => ({ name }));
  const loads: Load[] = Object.values(sketch.loads ?? {}).flatMap((list, index) =>
    list.map((load): Load => {
      const common = { case: index, range: RANGE };
      if ('selfWeight' in load) {
        return { ...common, kind: 'self-weight', members: load.selfWeight.map(memberOf), factor: load.factor ?? 1 };
      }
      if ('line' in load) {
        const member = memberOf(load.line);
        const [startIntensity, endIntensity] = typeof load.size === 'number' ? [load.size, load.size] : load.size;
        const start = load.from ?? 0;
        const end = load.to ?? members[member]!.length;
        const direction = load.direction ?? DOWN;
        return { ...common, kind: 'line', member, start, end, startIntensity, endIntensity, direction };
      }
      if ('force' in load) return { ...common, kind: 'force', x: load.force[0], y: load.force[1], at: place(load.at) };
      if ('couple' in load) return { ...common, kind: 'couple', moment: load.couple, at: place(load.at) };
      if ('heat' in load) {
        return { ...common, kind: 'heat', member: memberOf(load.heat), above: load.above, below: load.below };
      }
      if ('lengthen' in load) {
        return { ...common, kind: 'lengthen', member: memberOf(load.lengthen), amount: load.by };
      }
      const point = pointOf(load.move);
      if ('turn' in load.by) {
        return { ...common, kind: 'movement', point, freedom: { kind: 'rotation' }, amount: load.by.turn };
      }
      const amount = Math.hypot(...load.by);
      const freedom = { kind: 'movement', x: load.by[0] / amount, y: load.by[1] / amount } as const;
      return { ...common, kind: 'movement', point, freedom, amount };
    }),
  );
  return { name: 'sketch', range: RANGE, points, sections, members, groups: [], hinges, supports, cases, loads };
}

/** A place on a structure: a point, `point member`, or `distance member`. */
export function at(structure: Structure, text: string): Location {
  const [first, name] = text.split(' ');
  const point = structure.points.findIndex(candidate => candidate.name === first);
  if (name === undefined) return { kind: 'point', point };
  const member = structure.members.findIndex(candidate => candidate.name === name);
  return point >= 0 ? { kind: 'point', point, member } : { kind: 'along', member, distance: Number(first) };
}

function pick(value: number | readonly number[] | undefined, index: number): number | undefined {
  return typeof value === 'number' || value === undefined ? value : value[index];
}

function section(name: string, EI?: number, EA?: number, mass?: number): Section {
  return {
    name,
    description: name,
    bendingStiffness: EI,
    axialStiffness: EA,
    massPerLength: mass,
    sectionModulus: undefined,
    area: undefined,
    secondMomentOfArea: undefined,
    youngsModulus: undefined,
    depth: DEPTH,
    thermalExpansion: EXPANSION,
    range: RANGE,
  };
}

function restraints(holding: Holding): Restraint[] {
  const x = (stiffness: number): Restraint => ({ freedom: { kind: 'movement', x: 1, y: 0 }, stiffness });
  const y = (stiffness: number): Restraint => ({ freedom: { kind: 'movement', x: 0, y: 1 }, stiffness });
  const rotation = (stiffness: number): Restraint => ({ freedom: { kind: 'rotation' }, stiffness });
  switch (holding) {
    case 'pinned':
      return [x(HELD), y(HELD)];
    case 'roller':
      return [y(HELD)];
    case 'fixed':
      return [x(HELD), y(HELD), rotation(HELD)];
    case 'guided':
      return [x(HELD), rotation(HELD)];
  }
  const list: Restraint[] = [];
  if (holding.angle !== undefined) {
    const freedom = { kind: 'movement', x: -Math.sin(holding.angle), y: Math.cos(holding.angle) } as const;
    list.push({ freedom, stiffness: HELD });
  }
  if (holding.x !== undefined) list.push(x(holding.x));
  if (holding.y !== undefined) list.push(y(holding.y));
  if (holding.rotation !== undefined) list.push(rotation(holding.rotation));
  return list;
}
