// Random sketches of beams, frames of bays and storeys, girders of bars, and trees: without loads, and with the supports
// that belong to the shape.
import { type Chain, HELD, type Holding } from '../virtual-work/build.ts';
import { Draw, type Options, type Recipe } from './recipe.ts';

/** Widened, so that a sketch can grow. */
export interface Growing {
  readonly points: Record<string, [number, number]>;
  readonly members: Record<string, Chain>;
  readonly bars: Record<string, Chain>;
  hinges: string[];
  supports: Record<string, Holding>;
}

export const SHAPES = { beam, frame, girder, tree };

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

export function bar(chain: readonly string[], draw: Draw, { stretching = false }: Options): Chain {
  const stiff = !stretching && draw.below(12) === 0;
  return { chain: chain.join(' '), ...(!stiff && { EA: 2e7 * (1 + draw.below(20)) }), mass: draw.below(20) };
}

function joined(sketch: Growing, from: string, to: string): boolean {
  return [...Object.values(sketch.members), ...Object.values(sketch.bars)].some(({ chain }) => {
    const names = chain.split(' ');
    return names.some(
      (name, index) => (name === from && names[index + 1] === to) || (name === to && names[index + 1] === from),
    );
  });
}
