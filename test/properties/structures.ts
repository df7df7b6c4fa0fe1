// Random stable structures of 1 to 40 members, with every kind of support, hinge, spring and load: beams, frames of bays
// and storeys, girders of bars, and trees. What is drawn is a recipe of small whole numbers, so that a failing one
// shrinks; any recipe gives a structure.
import fc from 'fast-check';
import type { LineDirection, Structure } from '../../src/model/structure.ts';
import { movement, prepare, primaryStructure } from '../../src/virtual-work/index.ts';
import { build, type Chain, HELD, type Holding, type Sketch, type SketchLoad } from '../virtual-work/build.ts';
import { described } from './described.ts';

export interface Options {
  /** Without springs and imposed movements. */
  readonly forcesOnly?: boolean;
  /** Without axially stiff members. */
  readonly stretching?: boolean;
}

/** Three cases: 0 of line loads and weight, 1 of forces and couples, 2 of all kinds, imposed movements included. */
export function structures(options: Options = {}): fc.Arbitrary<Structure> {
  return recipes.map(recipe => described(structureOf(recipe, options)));
}

/** Statically determinate ones: trees on one fixed foot, spans end to end with hinges, girders. Each with its loads. */
export function determinateStructures(options: Options = {}): fc.Arbitrary<Structure> {
  return recipes.map(recipe => described(determinateOf(recipe, options)));
}

export interface Recipe {
  readonly shape: 'beam' | 'frame' | 'girder' | 'tree';
  readonly size: number;
  readonly width: number;
  /** Whole numbers that are read in turn, again from the first when they run out. */
  readonly places: readonly number[];
  readonly stiffness: readonly number[];
  readonly supports: readonly number[];
  readonly hinges: readonly number[];
  readonly loads: readonly number[];
}

const numbers = (most: number) => fc.array(fc.nat(9999), { minLength: 1, maxLength: most });

export const recipes: fc.Arbitrary<Recipe> = fc.record({
  shape: fc.constantFrom('beam', 'frame', 'girder', 'tree'),
  size: fc.nat(11),
  width: fc.nat(2),
  places: numbers(40),
  stiffness: numbers(20),
  supports: numbers(8),
  hinges: numbers(6),
  loads: numbers(60),
});

/** Reads whole numbers in turn. */
class Draw {
  #at = 0;
  readonly #numbers: readonly number[];

  constructor(list: readonly number[]) {
    this.#numbers = list;
  }

  nat(): number {
    return this.#numbers[this.#at++ % this.#numbers.length]!;
  }

  below(count: number): number {
    // The turn of the list takes part, so that a short list does not say the same for ever.
    const turn = Math.floor(this.#at / this.#numbers.length);
    return (this.nat() + 7 * turn) % count;
  }

  of<T>(list: readonly T[]): T {
    return list[this.below(list.length)]!;
  }
}

/** Widened, so that a sketch can grow. */
interface Growing {
  readonly points: Record<string, [number, number]>;
  readonly members: Record<string, Chain>;
  readonly bars: Record<string, Chain>;
  hinges: string[];
  supports: Record<string, Holding>;
}

function structureOf(recipe: Recipe, options: Options): Structure {
  const sketch = SHAPES[recipe.shape](recipe, options);
  const supports = new Draw(recipe.supports);
  for (let count = recipe.supports.length; count > 0; count--) {
    sketch.supports[supports.of(Object.keys(sketch.points))] = holding(supports, options);
  }
  stabilise(sketch);
  const hinges = new Draw(recipe.hinges);
  for (let count = recipe.hinges.length; count > 0; count--) tryHinge(sketch, hinges);
  return loaded(sketch, recipe, options);
}

const SHAPES = { beam, frame, girder, tree };

function beam(recipe: Recipe, options: Options): Growing {
  const places = new Draw(recipe.places);
  const stiffness = new Draw(recipe.stiffness);
  const sketch = empty();
  const [right, up] = places.of([
    [1, 0],
    [0.8, 0.6],
    [-1, 0],
    [0, 1],
    [-0.6, 0.8],
  ] as const);
  const names = ['P0'];
  sketch.points.P0 = [0, 0];
  let distance = 0;
  for (let index = 1; index <= 1 + recipe.size; index++) {
    distance += 1 + places.below(16) / 4;
    sketch.points[`P${index}`] = [right * distance, up * distance];
    names.push(`P${index}`);
  }
  // One member, or a new one every few points.
  const every = places.of([99, 1, 2, 3]);
  for (let start = 0; start + 1 < names.length; start += every) {
    const chain = names.slice(start, start + every + 1);
    sketch.members[`M${start}`] = member(chain, stiffness, options);
  }
  return sketch;
}

function frame(recipe: Recipe, options: Options): Growing {
  const places = new Draw(recipe.places);
  const stiffness = new Draw(recipe.stiffness);
  const sketch = empty();
  const bays = 1 + recipe.width;
  const storeys = 1 + (recipe.size % 5);
  const name = (bay: number, storey: number) => `${bay}-${storey}`;
  for (let bay = 0; bay <= bays; bay++) {
    for (let storey = 0; storey <= storeys; storey++) {
      sketch.points[name(bay, storey)] = [5 * bay + places.below(5) / 4, 3 * storey + places.below(5) / 4];
    }
    sketch.supports[name(bay, 0)] = places.of([
      'fixed',
      'pinned',
      'roller',
      { x: HELD, y: HELD, rotation: 5e6 },
    ] as const);
  }
  const through = places.below(2) === 0;
  for (let bay = 0; bay <= bays; bay++) {
    const column = Array.from({ length: storeys + 1 }, (_, storey) => name(bay, storey));
    addChain(sketch, `C${bay}`, column, through, stiffness, options);
  }
  for (let storey = 1; storey <= storeys; storey++) {
    const row = Array.from({ length: bays + 1 }, (_, bay) => name(bay, storey));
    addChain(sketch, `B${storey}`, places.below(3) === 0 ? row.toReversed() : row, through, stiffness, options);
  }
  for (let count = places.below(3); count > 0; count--) {
    const [bay, storey] = [places.below(bays), places.below(storeys)];
    sketch.bars[`X${bay}${storey}`] = bar([name(bay, storey), name(bay + 1, storey + 1)], stiffness, options);
  }
  return sketch;
}

function girder(recipe: Recipe, options: Options): Growing {
  const places = new Draw(recipe.places);
  const stiffness = new Draw(recipe.stiffness);
  const sketch = empty();
  const panels = 1 + (recipe.size % 8);
  for (let panel = 0; panel <= panels; panel++) {
    sketch.points[`L${panel}`] = [2 * panel, places.below(3) / 4];
    sketch.points[`U${panel}`] = [2 * panel, 1.5 + places.below(5) / 4];
    sketch.bars[`v${panel}`] = bar([`L${panel}`, `U${panel}`], stiffness, options);
    if (panel === 0) continue;
    const falls = places.below(2) === 0;
    sketch.bars[`d${panel}`] = bar(
      falls ? [`U${panel - 1}`, `L${panel}`] : [`L${panel - 1}`, `U${panel}`],
      stiffness,
      options,
    );
    if (recipe.width === 2 && places.below(3) === 0) {
      sketch.bars[`e${panel}`] = bar(
        falls ? [`L${panel - 1}`, `U${panel}`] : [`U${panel - 1}`, `L${panel}`],
        stiffness,
        options,
      );
    }
    sketch.bars[`u${panel}`] = bar([`U${panel - 1}`, `U${panel}`], stiffness, options);
    if (recipe.width > 0) sketch.bars[`l${panel}`] = bar([`L${panel - 1}`, `L${panel}`], stiffness, options);
  }
  // The bottom chord in one piece, that bends.
  if (recipe.width === 0) {
    sketch.members.L = member(
      Array.from({ length: panels + 1 }, (_, panel) => `L${panel}`),
      stiffness,
      options,
    );
  }
  sketch.supports.L0 = 'pinned';
  sketch.supports[`L${panels}`] = 'roller';
  return sketch;
}

function tree(recipe: Recipe, options: Options): Growing {
  const places = new Draw(recipe.places);
  const stiffness = new Draw(recipe.stiffness);
  const sketch = empty();
  const names = ['P0'];
  sketch.points.P0 = [0, 0];
  for (let index = 1; index <= 1 + recipe.size; index++) {
    const from = names[places.below(names.length)]!;
    const [x, y] = sketch.points[from]!;
    const to: [number, number] = [x + places.below(17) / 2 - 4, y + places.below(13) / 2 - 2];
    if (Object.values(sketch.points).some(other => Math.hypot(other[0] - to[0], other[1] - to[1]) < 0.5)) continue;
    const name = `P${index}`;
    sketch.points[name] = to;
    names.push(name);
    sketch.members[`M${index}`] = member([from, name], stiffness, options);
  }
  for (let count = places.below(4); count > 0; count--) {
    const [from, to] = [places.of(names), places.of(names)];
    if (from === to || joined(sketch, from, to)) continue;
    if (places.below(2) === 0) sketch.bars[`b${count}`] = bar([from, to], stiffness, options);
    else sketch.members[`N${count}`] = member([from, to], stiffness, options);
  }
  if (names.length === 1) {
    sketch.points.P1 = [3, 0];
    sketch.members.M1 = member(['P0', 'P1'], stiffness, options);
  }
  return sketch;
}

function determinateOf(recipe: Recipe, options: Options): Structure {
  const simple = {
    ...recipe,
    shape: recipe.shape === 'frame' ? 'tree' : recipe.shape,
    places: [...recipe.places],
  } as const;
  const sketch = SHAPES[simple.shape](simple, options);
  const names = Object.keys(sketch.points);
  if (simple.shape === 'tree') {
    // Only what grew from point to point.
    for (const name of Object.keys(sketch.members)) if (name.startsWith('N')) delete sketch.members[name];
    for (const name of Object.keys(sketch.bars)) delete sketch.bars[name];
    sketch.supports = { P0: 'fixed' };
  } else if (simple.shape === 'beam') {
    // Fixed at the start; a prop for every hinge behind it.
    sketch.supports = { P0: 'fixed' };
    const [first, last] = [sketch.points.P0!, sketch.points[names[names.length - 1]!]!];
    const angle = Math.atan2(last[1] - first[1], last[0] - first[0]);
    for (let index = 1; index + 1 < names.length; index += 2) {
      sketch.hinges.push(names[index]!);
      sketch.supports[names[index + 1]!] = { angle };
    }
  } else {
    for (const name of Object.keys(sketch.bars)) if (name.startsWith('e')) delete sketch.bars[name];
    if (recipe.width === 0) {
      const chain = sketch.members.L!.chain.split(' ');
      delete sketch.members.L;
      const stiffness = new Draw(recipe.stiffness);
      for (let panel = 1; panel < chain.length; panel++) {
        sketch.bars[`l${panel}`] = bar([chain[panel - 1]!, chain[panel]!], stiffness, options);
      }
    }
  }
  return loaded(sketch, recipe, options);
}

function empty(): Growing {
  return { points: {}, members: {}, bars: {}, hinges: [], supports: {} };
}

function addChain(
  sketch: Growing,
  name: string,
  chain: readonly string[],
  through: boolean,
  stiffness: Draw,
  options: Options,
): void {
  if (through) {
    sketch.members[name] = member(chain, stiffness, options);
    return;
  }
  for (let index = 0; index + 1 < chain.length; index++) {
    sketch.members[`${name}.${index}`] = member(chain.slice(index, index + 2), stiffness, options);
  }
}

/** One section throughout, or one a leg; axially stiff at times. */
function member(chain: readonly string[], draw: Draw, { stretching = false }: Options): Chain {
  const EI = () => 2e5 * (1 + draw.below(60));
  const EA = () => 1e8 * (1 + draw.below(9));
  const each = draw.below(3) === 0;
  const legs = chain.length - 1;
  const stiff = !stretching && draw.below(4) === 0;
  return {
    chain: chain.join(' '),
    EI: each ? Array.from({ length: legs }, EI) : EI(),
    ...(!stiff && { EA: each ? Array.from({ length: legs }, EA) : EA() }),
    mass: draw.below(50),
  };
}

function bar(chain: readonly string[], draw: Draw, { stretching = false }: Options): Chain {
  const stiff = !stretching && draw.below(12) === 0;
  return { chain: chain.join(' '), ...(!stiff && { EA: 2e7 * (1 + draw.below(20)) }), mass: draw.below(20) };
}

function holding(draw: Draw, { forcesOnly = false }: Options): Holding {
  const spring = () => (forcesOnly ? HELD : 1e5 * (1 + draw.below(900)));
  return draw.of<() => Holding>([
    () => 'pinned',
    () => 'roller',
    () => 'fixed',
    () => 'guided',
    () => ({ angle: draw.below(12) / 4 }),
    () => ({ y: spring() }),
    () => ({ x: spring(), y: HELD }),
    () => ({ x: HELD, y: spring(), rotation: spring() }),
    () => ({ angle: draw.below(12) / 4, y: spring(), rotation: spring() }),
    () => ({ x: spring(), y: spring(), rotation: spring() }),
  ])();
}

function joined(sketch: Growing, from: string, to: string): boolean {
  return [...Object.values(sketch.members), ...Object.values(sketch.bars)].some(({ chain }) => {
    const names = chain.split(' ');
    return names.some(
      (name, index) => (name === from && names[index + 1] === to) || (name === to && names[index + 1] === from),
    );
  });
}

function sketchOf(sketch: Growing, loads: Record<string, readonly SketchLoad[]> = {}): Sketch {
  return { ...sketch, loads };
}

function isStable(sketch: Growing): boolean {
  return primaryStructure(build(sketchOf(sketch))) !== undefined;
}

/** More and more is held until nothing can move. */
function stabilise(sketch: Growing): void {
  for (const name of Object.keys(sketch.points)) {
    for (const more of ['pinned', 'fixed'] as const) {
      if (isStable(sketch)) return;
      sketch.supports[name] = more;
    }
  }
}

function tryHinge(sketch: Growing, draw: Draw): void {
  const before = sketch.hinges;
  const point = draw.of(Object.keys(sketch.points));
  const here = Object.entries(sketch.members).filter(([, { chain }]) => chain.split(' ').includes(point));
  if (here.length === 0) return;
  const hinge = draw.below(2) === 0 ? point : `${point} ${draw.of(here)[0]}`;
  sketch.hinges = [...before, hinge];
  if (!isStable(sketch)) sketch.hinges = before;
}

function loaded(sketch: Growing, recipe: Recipe, options: Options): Structure {
  const bare = build(sketchOf(sketch));
  const draw = new Draw(recipe.loads);
  const each = 1 + Math.floor(recipe.loads.length / 12);
  const spread = Array.from({ length: each }, () => lineLoad(bare, draw));
  const single = Array.from({ length: each }, () => pointLoad(bare, draw));
  const mixed = Array.from({ length: each }, () =>
    draw.below(2) === 0 ? lineLoad(bare, draw) : pointLoad(bare, draw),
  );
  const moves = options.forcesOnly ? [] : movements(bare, draw);
  const withMoves = build(sketchOf(sketch, { spread, single, mixed: [...mixed, ...moves] }));
  if (moves.length === 0 || !contradicted(withMoves)) return withMoves;
  return build(sketchOf(sketch, { spread, single, mixed }));
}

function contradicted(structure: Structure): boolean {
  return Number.isNaN(movement(prepare(structure)!, [0, 0, 1], []));
}

function lineLoad(structure: Structure, draw: Draw): SketchLoad {
  const bending = structure.members.filter(({ kind }) => kind === 'member');
  if (bending.length === 0 || draw.below(4) === 0) {
    const factor = draw.of([1, 1.1, 1.35]);
    return { selfWeight: structure.members.map(({ name }) => name).filter(() => draw.below(3) > 0), factor };
  }
  const { name, length } = draw.of(bending);
  const angle = draw.below(24) / 4;
  const direction = draw.of<LineDirection>([
    { kind: 'global', x: 0, y: -1, onPlan: false },
    { kind: 'global', x: 0, y: -1, onPlan: true },
    { kind: 'global', x: Math.cos(angle), y: Math.sin(angle), onPlan: false },
    // Along no member that there is.
    { kind: 'square', x: 0.28, y: -0.96 },
    { kind: 'along', sense: 1 },
    { kind: 'along', sense: -1 },
  ]);
  const size = [500 * draw.below(12) - 1000, 500 * draw.below(12) - 1000] as const;
  if (draw.below(2) === 0) return { line: name, size, direction };
  const from = (draw.below(8) / 16) * length;
  const to = from + ((1 + draw.below(8)) / 16) * length;
  return { line: name, size, direction, from, to };
}

function pointLoad(structure: Structure, draw: Draw): SketchLoad {
  const bending = structure.members.filter(({ kind }) => kind === 'member');
  const force = [1000 * draw.below(9) - 4000, 1000 * draw.below(9) - 6000] as const;
  const couple = 1000 * draw.below(13) - 6000;
  if (bending.length === 0 || draw.below(2) === 0) {
    const point = draw.of(structure.points.map(({ name }) => name));
    return draw.below(3) === 0 && canTakeCouple(structure, point) ? { couple, at: point } : { force, at: point };
  }
  const { name, length } = draw.of(bending);
  const at = `${((1 + draw.below(14)) / 15) * length} ${name}`;
  return draw.below(3) === 0 ? { couple, at } : { force, at };
}

/** Whether some member's end is rigid at the point: a couple on nothing means nothing. */
function canTakeCouple(structure: Structure, name: string): boolean {
  const point = structure.points.findIndex(candidate => candidate.name === name);
  return structure.members.some(
    ({ kind, legs }, member) =>
      kind === 'member' &&
      legs.some(leg => leg.from === point || leg.to === point) &&
      !structure.hinges.some(hinge => hinge.point === point && (hinge.member ?? member) === member),
  );
}

function movements(structure: Structure, draw: Draw): SketchLoad[] {
  if (draw.below(2) === 0) return [];
  const support = draw.of(structure.supports);
  const { freedom } = draw.of(support.restraints);
  const move = structure.points[support.point]!.name;
  const amount = (draw.below(41) - 20) / 1000;
  if (amount === 0) return [];
  return [{ move, by: freedom.kind === 'rotation' ? { turn: amount / 4 } : [freedom.x * amount, freedom.y * amount] }];
}
