import { describe, expect, it } from 'vitest';
import { memberSketch } from '../../src/drawing/index.ts';
import { acting, PORTAL, RAFTER, TRUSS } from './structures.ts';
import { checkDrawing, textsOf } from './svg.ts';

describe('the sketch of a member', () => {
  const cases = [
    { name: 'of a beam', structure: RAFTER, factors: [1, 1, 0, 1], member: 0 },
    { name: 'of a rafter', structure: PORTAL, factors: [1, 1, 1], member: 1 },
    { name: 'of a bar', structure: TRUSS, factors: [1], member: 3 },
  ];

  it.each(cases)('$name is complete in itself and small', ({ structure, factors, member }) => {
    const { solution } = acting(structure, factors);
    for (const palette of ['light', 'dark'] as const) {
      const svg = memberSketch(structure, member, solution!, palette);
      checkDrawing(svg);
      expect(svg.length).toBeLessThan(20_000);
      expect(svg).toContain('xmlns="http://www.w3.org/2000/svg"');
      expect(svg).not.toMatch(/class=|var\(|url\(|href/);
    }
  });

  it('tells the moments and the largest movement', () => {
    const { solution } = acting(RAFTER, [1, 1, 0, 1]);
    const texts = textsOf(memberSketch(RAFTER, 0, solution!, 'light'));
    expect(texts.some(text => text.endsWith('tension below'))).toBe(true);
    expect(texts.some(text => text.endsWith('mm down'))).toBe(true);
    expect(texts.some(text => text.startsWith('movement × '))).toBe(true);
  });
});
