// Frames of storeys and bays, and girders of panels, of any size.
import type { Structure } from '../../src/model/structure.ts';
import { build, type Sketch } from './build.ts';

/** Storeys and bays, bending and axial force, gravity and wind. */
export function frame(
  bays: number,
  storeys: number,
  stiffness: { posts: number; beams: number; EA?: number },
  foot: 'fixed' | 'pinned',
): Structure {
  const sketch: Sketch = { points: {}, members: {}, supports: {}, loads: {} };
  const axial = stiffness.EA === undefined ? {} : { EA: stiffness.EA };
  const loads: NonNullable<Sketch['loads']>[string][number][] = [];
  for (let bay = 0; bay <= bays; bay++) {
    sketch.supports[`${bay}/0`] = foot;
    for (let storey = 0; storey <= storeys; storey++) {
      sketch.points[`${bay}/${storey}`] = [5 * bay, 3.2 * storey];
      if (storey === 0) continue;
      sketch.members![`C${bay}/${storey}`] = {
        chain: `${bay}/${storey - 1} ${bay}/${storey}`,
        EI: stiffness.posts,
        ...axial,
      };
      if (bay === 0) {
        loads.push({ force: [9e3, 0], at: `0/${storey}` });
        continue;
      }
      const chain = `${bay - 1}/${storey} ${bay}/${storey}`;
      sketch.members![`B${bay}/${storey}`] = { chain, EI: stiffness.beams, ...axial };
      loads.push({ line: `B${bay}/${storey}`, size: 4e3 });
    }
  }
  return build({ ...sketch, loads: { all: loads } });
}

/** A girder of panels with a diagonal each, or crossed. */
export function girder(panels: number, crossed: boolean): Structure {
  const sketch: Sketch = { points: {}, bars: {}, supports: { L0: 'pinned', [`L${panels}`]: 'roller' } };
  for (let panel = 0; panel <= panels; panel++) {
    sketch.points[`L${panel}`] = [2 * panel, 0];
    sketch.points[`U${panel}`] = [2 * panel, 1.7];
    sketch.bars![`v${panel}`] = { chain: `L${panel} U${panel}`, EA: 1e8 };
    if (panel === 0) continue;
    sketch.bars![`l${panel}`] = { chain: `L${panel - 1} L${panel}`, EA: 2e8 };
    sketch.bars![`u${panel}`] = { chain: `U${panel - 1} U${panel}`, EA: 2e8 };
    sketch.bars![`d${panel}`] = { chain: `L${panel - 1} U${panel}`, EA: 1e8 };
    if (crossed) sketch.bars![`e${panel}`] = { chain: `U${panel - 1} L${panel}`, EA: 1e8 };
  }
  const loads = Array.from({ length: panels + 1 }, (_, panel) => ({ force: [300, -5e3] as const, at: `U${panel}` }));
  return build({ ...sketch, loads: { all: loads } });
}
