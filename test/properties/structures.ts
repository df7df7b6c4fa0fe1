// Random stable structures of 1 to 40 members, with every kind of support, hinge, spring and load: beams, frames of bays
// and storeys, girders of bars, and trees. What is drawn is a recipe of small whole numbers, so that a failing one
// shrinks; any recipe gives a structure.
import type fc from 'fast-check';
import type { Structure } from '../../src/model/structure.ts';
import { movement, prepare, primaryStructure } from '../../src/virtual-work/index.ts';
import { build, type Sketch, type SketchLoad } from '../virtual-work/build.ts';
import { described } from './described.ts';
import { holding, lineLoad, movements, pointLoad, strains } from './random-loads.ts';
import { Draw, type Options, type Recipe, recipes } from './recipe.ts';
import { bar, type Growing, SHAPES } from './shapes.ts';

/** Three cases: 0 of line loads and weight, 1 of forces and couples, 2 of all kinds, imposed movements, heat and lack of fit included. */
export function structures(options: Options = {}): fc.Arbitrary<Structure> {
  return recipes.map(recipe => described(structureOf(recipe, options)));
}

/** Statically determinate ones: trees on one fixed foot, spans end to end with hinges, girders. Each with its loads. */
export function determinateStructures(options: Options = {}): fc.Arbitrary<Structure> {
  return recipes.map(recipe => described(determinateOf(recipe, options)));
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
  const strained = options.forcesOnly ? [] : strains(bare, draw);
  for (const imposed of [[...moves, ...strained], strained, moves]) {
    const structure = build(sketchOf(sketch, { spread, single, mixed: [...mixed, ...imposed] }));
    if (imposed.length === 0 || !contradicted(structure)) return structure;
  }
  return build(sketchOf(sketch, { spread, single, mixed }));
}

function contradicted(structure: Structure): boolean {
  return Number.isNaN(movement(prepare(structure)!, [0, 0, 1], []));
}
