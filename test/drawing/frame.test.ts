import { describe, expect, it } from 'vitest';
import { caseSketch, mechanismDrawing, structureDrawing } from '../../src/drawing/index.ts';
import { analyse } from '../../src/mechanics/analyse.ts';
import { METRIC } from '../../src/quantity/display.ts';
import { acting, build, PORTAL, RAFTER, type Sketch, STEEL, TRUSS } from './structures.ts';
import { checkDrawing, textsOf } from './svg.ts';

describe('a frame', () => {
  const { main, panels } = structureDrawing(PORTAL, acting(PORTAL, [1, 1, 1], 'winter'), METRIC);

  it('names points, members and loads, and tells self-weight in words', () => {
    const texts = textsOf(main);
    for (const name of ['A', 'B', 'C', 'D', 'E', 'P1', 'Raf', 'P2']) expect(texts).toContain(name);
    expect(texts).toEqual(
      expect.arrayContaining(['snow 2.6 kN/m on plan', 'dead 0.9 kN/m', 'wind 1.9 kN/m', 'wind 1 kN/m']),
    );
    expect(texts.some(text => /^dead self-weight of every member, \d/.test(text))).toBe(true);
  });

  it('dimensions it level and upright', () => {
    const texts = textsOf(main);
    expect(texts.filter(text => text === '4.000 m')).toHaveLength(2);
    expect(texts).toEqual(expect.arrayContaining(['3.200 m', '1.200 m']));
  });

  it('draws each field on a panel of its own', () => {
    expect(panels.map(({ field }) => field)).toEqual(['axial', 'shear', 'moment', 'movement']);
    for (const { svg } of panels) checkDrawing(svg);
  });

  it('tells a corner whose two ends agree once', () => {
    const moment = panels.find(({ field }) => field === 'moment')?.svg ?? '';
    const corner = textsOf(moment).filter(text => text.startsWith('22.1'));
    expect(corner).toEqual([expect.stringMatching(/tension above and right$/)]);
  });
});

describe('a truss', () => {
  const { panels } = structureDrawing(TRUSS, acting(TRUSS, [1], 'lamps'), METRIC);

  it('has the force of each bar in words along it', () => {
    // Method of sections: A = (9 + 3) 2/3 + 4.5/3 = 9.5 kN; at A: 9.5 / 0.6 in the diagonal, 9.5 / 0.75 in the chord.
    const [axial] = panels;
    expect(axial?.field).toBe('axial');
    const texts = textsOf(axial?.svg ?? '');
    expect(texts).toEqual(
      expect.arrayContaining(['15.83 compression', '12.67 tension', '9.333 compression', '3.000 tension']),
    );
  });

  it('has no field of shear or moment', () => {
    expect(panels.map(({ field }) => field)).toEqual(['axial', 'movement']);
  });
});

describe('a case', () => {
  it('is sketched unfactored, with the sum of its loads', () => {
    const applied = acting(RAFTER, [0, 1, 0, 0]).solution?.applied;
    const svg = caseSketch(RAFTER, 1, applied, METRIC, 'page');
    checkDrawing(svg);
    // 2.4 × 4.8 + (0.6 + 3.1) / 2 × 1.8
    expect(textsOf(svg)).toEqual(
      expect.arrayContaining(['snow, unfactored', 'sum 14.85 kN down', '2.4 kN/m', '0.6 to 3.1']),
    );
  });
});

describe('a case of heat', () => {
  it('is told under its sketch', () => {
    const post = build({
      points: { A: [0, 0], B: [0, 3], C: [5, 3] },
      members: { P1: ['A', 'B'], R: ['B', 'C'] },
      supports: [['A', 'fixed']],
      cases: ['sun'],
      section: { ...STEEL, thermalExpansion: 12e-6 },
      loads: () => [0, 1].map(member => ({ case: 'sun', kind: 'heat', member, above: 25, below: 25 }) as const),
    });
    const svg = caseSketch(post, 0, acting(post, [1]).solution?.applied, METRIC, 'page');
    checkDrawing(svg);
    expect(textsOf(svg)).toContain('P1, R heated 25 K');
  });
});

describe('a structure that is not held', () => {
  it('is drawn where it can go', () => {
    const rolling = build({
      points: { A: [0, 0], B: [0, 3], C: [6, 3], D: [6, 0] },
      members: { P1: ['A', 'B'], R: ['B', 'C'], P2: ['C', 'D'] },
      supports: [
        ['A', 'pinned'],
        ['D', 'pinned'],
      ],
      hinges: [['B'], ['C']],
    });
    const [mechanism] = analyse(rolling).stability.mechanisms;
    const svg = mechanismDrawing(rolling, mechanism!, 'page');
    checkDrawing(svg);
    expect(textsOf(svg)).toEqual(expect.arrayContaining(['free to move', 'A', 'B', 'C', 'D']));
  });
});

describe('very many loads', () => {
  it('are thinned, and what is left out is told', () => {
    const structure = build({
      points: { A: [0, 0], B: [10, 0] },
      members: { M: ['A', 'B'] },
      supports: [['A', 'fixed']],
      cases: ['row', 'lone'],
      loads: () => [
        ...Array.from({ length: 101 }, (_, i) => ({
          case: 'row',
          kind: 'force' as const,
          x: 0,
          y: -2000,
          at: { kind: 'along' as const, member: 0, distance: i / 10 },
          row: 0,
        })),
        ...Array.from({ length: 70 }, (_, i) => ({
          case: 'lone',
          kind: 'force' as const,
          x: 0,
          y: -1000 - i,
          at: { kind: 'along' as const, member: 0, distance: 1 + i / 10 },
        })),
      ],
    });
    const { main } = structureDrawing(structure, acting(structure, [1, 1]), METRIC);
    checkDrawing(main);
    expect(textsOf(main)).toEqual(
      expect.arrayContaining(['101 × 2 kN at every 0.1 m', 'lone not drawn: the 10 smallest of its single loads']),
    );
  });
});

describe('shapes at the edge', () => {
  const right = { kind: 'global' as const, x: 1, y: 0, onPlan: false };
  const down = { kind: 'global' as const, x: 0, y: -1, onPlan: false };
  const SHAPES: Readonly<Record<string, Sketch>> = {
    'one post': {
      points: { A: [0, 0], B: [0, 3] },
      members: { P: ['A', 'B'] },
      supports: [['A', 'fixed']],
      loads: () => [
        {
          case: 'dead',
          kind: 'line',
          member: 0,
          start: 0,
          end: 3,
          startIntensity: 0,
          endIntensity: 900,
          direction: right,
        },
        {
          case: 'dead',
          kind: 'line',
          member: 0,
          start: 0,
          end: 3,
          startIntensity: 400,
          endIntensity: 400,
          direction: down,
        },
      ],
    },
    'points alone': { points: { A: [1, 2] }, members: {}, supports: [['A', 'pinned']] },
    'very flat': {
      points: { A: [0, 0], B: [50, 0.4], C: [100, 0] },
      members: { R: ['A', 'B', 'C'] },
      supports: [
        ['A', 'pinned'],
        ['C', 'roller'],
      ],
      loads: () => [
        {
          case: 'dead',
          kind: 'line',
          member: 0,
          start: 0,
          end: 50,
          startIntensity: 900,
          endIntensity: 900,
          direction: down,
        },
      ],
    },
    'very tall': {
      points: { A: [0, 0], B: [0, 90], C: [1, 90], D: [1, 0] },
      members: { P: ['A', 'B', 'C', 'D'] },
      supports: [
        ['A', 'fixed'],
        ['D', 'fixed'],
      ],
      loads: of => [{ case: 'dead', kind: 'force', x: 900, y: 0, at: { kind: 'point', point: of.point('B') } }],
    },
    'in millimetres': {
      points: { A: [0, 0], B: [0.004, 0] },
      members: { M: ['A', 'B'] },
      supports: [['A', 'fixed']],
      loads: of => [{ case: 'dead', kind: 'couple', moment: -1, at: { kind: 'point', point: of.point('B') } }],
    },
    'far from the origin': {
      points: { A: [1e5, 1e5], B: [1e5 + 3, 1e5], C: [1e5 + 3, 1e5 + 2] },
      members: { M: ['A', 'B', 'C'] },
      supports: [['A', 'fixed']],
      loads: of => [{ case: 'dead', kind: 'force', x: 300, y: -400, at: { kind: 'point', point: of.point('C') } }],
    },
    'moved supports': {
      points: { A: [0, 0], B: [4, 0], C: [8, 0] },
      members: { M: ['A', 'B', 'C'] },
      supports: [
        ['A', 'fixed'],
        ['B', 'roller'],
        ['C', 'roller'],
      ],
      loads: of => [
        {
          case: 'dead',
          kind: 'movement',
          point: of.point('B'),
          freedom: { kind: 'movement', x: 0, y: 1 },
          amount: -0.008,
        },
        { case: 'dead', kind: 'movement', point: of.point('A'), freedom: { kind: 'rotation' }, amount: 0.002 },
      ],
    },
    'an inclined roller': {
      points: { A: [0, 0], B: [4, 1] },
      members: { M: ['A', 'B'] },
      supports: [
        ['A', 'pinned'],
        ['B', 'roller', Math.PI / 6],
      ],
      loads: () => [
        {
          case: 'dead',
          kind: 'line',
          member: 0,
          start: 0.5,
          end: 3,
          startIntensity: 1000,
          endIntensity: 2000,
          direction: { kind: 'square', x: 0, y: -1 },
        },
        {
          case: 'dead',
          kind: 'line',
          member: 0,
          start: 1,
          end: 2,
          startIntensity: 1000,
          endIntensity: 1000,
          direction: { kind: 'along', sense: -1 },
        },
      ],
    },
    'pulled along its line': {
      points: { A: [0, 0], B: [4, 0] },
      members: { M: ['A', 'B'] },
      supports: [['A', 'fixed']],
      loads: of => [{ case: 'dead', kind: 'force', x: 5000, y: 0, at: { kind: 'point', point: of.point('B') } }],
    },
    'no load at all': {
      points: { A: [0, 0], B: [4, 0] },
      members: { M: ['A', 'B'] },
      supports: [['A', 'fixed']],
    },
  };

  it.each(Object.entries(SHAPES))('%s', (_, sketch) => {
    const structure = build(sketch);
    const solvable = structure.members.length > 0;
    const what = solvable ? acting(structure, [1]) : { name: 'service', factors: [1], solution: undefined };
    const { main, panels } = structureDrawing(structure, what, METRIC);
    for (const svg of [main, ...panels.map(panel => panel.svg)]) checkDrawing(svg);
    checkDrawing(caseSketch(structure, 0, what.solution?.applied, METRIC, 'page'));
  });

  it('a hundred bars', () => {
    const points: Record<string, [number, number]> = {};
    const members: Record<string, string[]> = {};
    for (let i = 0; i <= 25; i++) points[`L${i}`] = [i, 0];
    for (let i = 1; i < 25; i++) points[`U${i}`] = [i, 1];
    for (let i = 0; i < 25; i++) members[`b${i}`] = [`L${i}`, `L${i + 1}`];
    for (let i = 1; i < 24; i++) members[`t${i}`] = [`U${i}`, `U${i + 1}`];
    for (let i = 1; i < 25; i++) members[`v${i}`] = [`L${i}`, `U${i}`];
    for (let i = 1; i < 24; i++) members[`d${i}`] = [`U${i}`, `L${i + 1}`];
    members.e1 = ['L0', 'U1'];
    members.e2 = ['U24', 'L25'];
    const structure = build({
      points,
      members,
      supports: [
        ['L0', 'pinned'],
        ['L25', 'roller'],
      ],
      loads: of =>
        Array.from({ length: 24 }, (_, i) => ({
          case: 'dead',
          kind: 'force' as const,
          x: 0,
          y: -5000,
          at: { kind: 'point' as const, point: of.point(`U${i + 1}`) },
        })),
    });
    expect(structure.members).toHaveLength(97);
    const { main, panels } = structureDrawing(structure, acting(structure, [1]), METRIC);
    for (const svg of [main, ...panels.map(panel => panel.svg)]) checkDrawing(svg);
    // Equal loads and equal steps are told once.
    expect(textsOf(main)).toContain('24 × 5 kN');
    expect(textsOf(main)).toContain('25 × 1.000 m');
  });
});
