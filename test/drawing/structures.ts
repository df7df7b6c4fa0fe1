// Structures made by hand for the drawing tests, with nothing of the language in between.

import type { Acting } from '../../src/drawing/index.ts';
import { analyse } from '../../src/mechanics/analyse.ts';
import { combine } from '../../src/mechanics/superposition.ts';
import type { Hinge, Leg, Load, Member, Point, Section, Structure, Support } from '../../src/model/structure.ts';

const range = { start: 0, end: 0 };

export const STEEL: Section = {
  name: 'RHS',
  material: 'S355',
  description: 'box 100 × 200 × 6 mm, S355',
  bendingStiffness: 3.767e6,
  axialStiffness: 7.258e8,
  massPerLength: 27.13,
  sectionModulus: 1.794e-4,
  area: 3.456e-3,
  secondMomentOfArea: 1.794e-5,
  youngsModulus: 210e9,
  depth: 0.2,
  range,
};

export interface Sketch {
  readonly name?: string;
  readonly title?: string;
  /** Name: x, y in m. */
  readonly points: Readonly<Record<string, readonly [number, number]>>;
  /** Name: points of the chain; a name in lower case is a bar. */
  readonly members: Readonly<Record<string, readonly string[]>>;
  readonly supports?: readonly (readonly [
    point: string,
    kind: 'pinned' | 'roller' | 'fixed' | 'guided',
    angle?: number,
  ])[];
  readonly hinges?: readonly (readonly [point: string, member?: string])[];
  readonly cases?: readonly string[];
  readonly loads?: (of: Lookup) => readonly LoadSketch[];
  readonly section?: Section;
}

type Distribute<T> = T extends unknown ? Omit<T, 'range' | 'case'> & { readonly case: string } : never;
export type LoadSketch = Distribute<Load>;

export interface Lookup {
  point(name: string): number;
  member(name: string): number;
  length(name: string): number;
}

export function build(sketch: Sketch): Structure {
  const names = Object.keys(sketch.points);
  const point = (name: string): number => found(names.indexOf(name), name);
  const points: Point[] = names.map(name => ({ name, x: sketch.points[name]![0], y: sketch.points[name]![1], range }));
  const members: Member[] = Object.entries(sketch.members).map(([name, chain]) => {
    const legs: Leg[] = [];
    for (let i = 1; i < chain.length; i++) {
      const [from, to] = [point(chain[i - 1]!), point(chain[i]!)];
      const [dx, dy] = [points[to]!.x - points[from]!.x, points[to]!.y - points[from]!.y];
      const length = Math.hypot(dx, dy);
      const start = legs.reduce((sum, leg) => sum + leg.length, 0);
      legs.push({ from, to, section: 0, start, length, cosine: dx / length, sine: dy / length });
    }
    const kind = name === name.toLowerCase() ? 'bar' : 'member';
    return { name, kind, legs, length: legs.reduce((sum, leg) => sum + leg.length, 0), range };
  });
  const memberNames = members.map(({ name }) => name);
  const member = (name: string): number => found(memberNames.indexOf(name), name);
  const cases = (sketch.cases ?? ['dead']).map(name => ({ name }));
  const lookup: Lookup = { point, member, length: name => members[member(name)]!.length };
  const loads: Load[] = (sketch.loads?.(lookup) ?? []).map(load => {
    const index = found(
      cases.findIndex(({ name }) => name === load.case),
      load.case,
    );
    return { ...load, case: index, range } as Load; // a LoadSketch is a Load but for its case and range
  });
  return {
    name: sketch.name ?? 'Test',
    ...(sketch.title === undefined ? {} : { title: sketch.title }),
    range,
    points,
    sections: [sketch.section ?? STEEL],
    members,
    groups: [],
    hinges: (sketch.hinges ?? []).map(
      ([at, of]): Hinge => ({ point: point(at), range, ...(of === undefined ? {} : { member: member(of) }) }),
    ),
    supports: (sketch.supports ?? []).map(([at, kind, angle]) => support(point(at), kind, angle ?? 0)),
    cases,
    loads,
  };
}

export function acting(structure: Structure, factors: readonly number[], name = 'service'): Acting {
  const analysis = analyse(structure);
  return { name, factors, solution: analysis.stability.stable ? combine(analysis, factors) : undefined };
}

function support(point: number, kind: 'pinned' | 'roller' | 'fixed' | 'guided', angle: number): Support {
  const x = { freedom: { kind: 'movement' as const, x: 1, y: 0 }, stiffness: Infinity };
  const y = { freedom: { kind: 'movement' as const, x: -Math.sin(angle), y: Math.cos(angle) }, stiffness: Infinity };
  const turn = { freedom: { kind: 'rotation' as const }, stiffness: Infinity };
  const restraints = { pinned: [x, y], roller: [y], fixed: [x, y, turn], guided: [x, turn] }[kind];
  return { point, restraints, symbol: { kind, angle, springs: [] }, range };
}

function found(index: number, name: string): number {
  if (index < 0) throw new Error(`no ${name}`);
  return index;
}

/** The overhanging rafter: uniform, varying and single loads, and one that lifts. */
export const RAFTER = build({
  name: 'Rafter',
  title: 'Canopy rafter R1',
  points: { A: [0, 0], B: [4.8, 0], C: [6.6, 0] },
  members: { R1: ['A', 'B', 'C'] },
  supports: [
    ['A', 'pinned'],
    ['B', 'roller'],
  ],
  cases: ['dead', 'snow', 'wind', 'lamp'],
  loads: of => {
    const down = { kind: 'global' as const, x: 0, y: -1, onPlan: false };
    const line = { kind: 'line' as const, member: of.member('R1'), direction: down };
    return [
      { case: 'dead', kind: 'self-weight', members: [0], factor: 1 },
      { ...line, case: 'dead', start: 0, end: 6.6, startIntensity: 1150, endIntensity: 1150 },
      { ...line, case: 'snow', start: 0, end: 4.8, startIntensity: 2400, endIntensity: 2400 },
      { ...line, case: 'snow', start: 4.8, end: 6.6, startIntensity: 600, endIntensity: 3100 },
      { ...line, case: 'wind', start: 0, end: 6.6, startIntensity: -1900, endIntensity: -1900 },
      { case: 'lamp', kind: 'force', x: 0, y: -450, at: { kind: 'point', point: of.point('C') } },
    ];
  },
});

/** A pitched portal with loads on plan, along the slope and from the side. */
export const PORTAL = build({
  name: 'Portal',
  title: 'Portal frame, grid 2',
  points: { A: [0, 0], B: [0, 3.2], C: [4, 4.4], D: [8, 3.2], E: [8, 0] },
  members: { P1: ['A', 'B'], Raf: ['B', 'C', 'D'], P2: ['D', 'E'] },
  supports: [
    ['A', 'pinned'],
    ['E', 'pinned'],
  ],
  cases: ['dead', 'snow', 'wind'],
  loads: of => {
    const down = { kind: 'global' as const, x: 0, y: -1, onPlan: false };
    const right = { kind: 'global' as const, x: 1, y: 0, onPlan: false };
    const raf = of.length('Raf');
    return [
      { case: 'dead', kind: 'self-weight', members: [0, 1, 2], factor: 1 },
      {
        case: 'dead',
        kind: 'line',
        member: 1,
        start: 0,
        end: raf,
        startIntensity: 900,
        endIntensity: 900,
        direction: down,
      },
      {
        case: 'snow',
        kind: 'line',
        member: 1,
        start: 0,
        end: raf,
        startIntensity: 2600,
        endIntensity: 2600,
        direction: { ...down, onPlan: true },
      },
      {
        case: 'wind',
        kind: 'line',
        member: 0,
        start: 0,
        end: 3.2,
        startIntensity: 1900,
        endIntensity: 1900,
        direction: right,
      },
      {
        case: 'wind',
        kind: 'line',
        member: 2,
        start: 0,
        end: 3.2,
        startIntensity: 1000,
        endIntensity: 1000,
        direction: right,
      },
    ];
  },
});

/** A parallel-chord truss of bars with loads at its joints. */
export const TRUSS = build({
  name: 'Truss',
  points: { A: [0, 0], D: [2, 0], F: [4, 0], B: [6, 0], G: [2, 1.5], H: [4, 1.5] },
  members: {
    b1: ['A', 'D'],
    b2: ['D', 'F'],
    b3: ['F', 'B'],
    d1: ['A', 'G'],
    t1: ['G', 'H'],
    d2: ['H', 'B'],
    v1: ['G', 'D'],
    v2: ['H', 'F'],
    d3: ['G', 'F'],
  },
  supports: [
    ['A', 'pinned'],
    ['B', 'roller'],
  ],
  cases: ['lamps'],
  loads: of => [
    { case: 'lamps', kind: 'force', x: 0, y: -9000, at: { kind: 'point', point: of.point('G') } },
    { case: 'lamps', kind: 'force', x: 0, y: -4500, at: { kind: 'point', point: of.point('H') } },
    { case: 'lamps', kind: 'force', x: 0, y: -3000, at: { kind: 'point', point: of.point('D') } },
  ],
});
