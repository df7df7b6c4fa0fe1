// Random supports and loads of every kind.
import type { LineDirection, Structure } from '../../src/model/structure.ts';
import { HELD, type Holding, type SketchLoad } from '../virtual-work/build.ts';
import type { Draw, Options } from './recipe.ts';

export function holding(draw: Draw, { forcesOnly = false }: Options): Holding {
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

export function lineLoad(structure: Structure, draw: Draw): SketchLoad {
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

export function pointLoad(structure: Structure, draw: Draw): SketchLoad {
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

/** Heat and lack of fit; a bar is heated evenly. */
export function strains(structure: Structure, draw: Draw): SketchLoad[] {
  return Array.from({ length: draw.below(4) }, () => {
    const { name, kind, length } = draw.of(structure.members);
    if (draw.below(3) === 0) return { lengthen: name, by: ((draw.below(21) - 10) / 5000) * length };
    const above = 5 * draw.below(17) - 30;
    return { heat: name, above, below: kind === 'bar' || draw.below(3) === 0 ? above : 5 * draw.below(17) - 30 };
  });
}

export function movements(structure: Structure, draw: Draw): SketchLoad[] {
  if (draw.below(2) === 0) return [];
  const support = draw.of(structure.supports);
  const { freedom } = draw.of(support.restraints);
  const move = structure.points[support.point]!.name;
  const amount = (draw.below(41) - 20) / 1000;
  if (amount === 0) return [];
  return [{ move, by: freedom.kind === 'rotation' ? { turn: amount / 4 } : [freedom.x * amount, freedom.y * amount] }];
}
