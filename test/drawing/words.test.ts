import { describe, expect, it } from 'vitest';
import { asGivenWithUnit, signed, withUnit } from '../../src/drawing/figures.ts';
import { overlap } from '../../src/drawing/geometry.ts';
import { structureDrawing } from '../../src/drawing/index.ts';
import { roundedExaggeration } from '../../src/drawing/moved-shape.ts';
import { placeLabels } from '../../src/drawing/placing.ts';
import { Sheet } from '../../src/drawing/sheet.ts';
import { escapeText, plain, widthOf } from '../../src/drawing/words.ts';
import { METRIC } from '../../src/quantity/display.ts';
import { acting, build } from './structures.ts';
import { checkDrawing, textsOf } from './svg.ts';

describe('text from a note', () => {
  it('is escaped', () => {
    expect(escapeText(`<b a="1">&'`)).toBe('&lt;b a=&quot;1&quot;&gt;&amp;&#39;');
  });

  it('loses what XML does not allow and what turns the direction of text', () => {
    expect(escapeText('a\u0000b\u202ec\ud800d\u0007')).toBe('a\ufffdb\ufffdc\ufffdd\ufffd');
  });

  it('keeps letters of any script', () => {
    expect(escapeText('δé梁𝛿')).toBe('δé梁𝛿');
  });

  it('is escaped wherever a drawing shows it', () => {
    const name = '<script>"&';
    const structure = build({
      name,
      title: name,
      points: { A: [0, 0], [name]: [2, 0] },
      members: { M: ['A', name] },
      supports: [['A', 'fixed']],
      cases: [name],
      loads: () => [{ case: name, kind: 'force', x: 0, y: -1000, at: { kind: 'point', point: 1 } }],
    });
    const { main } = structureDrawing(structure, acting(structure, [1], name), METRIC);
    checkDrawing(main);
    expect(main).not.toContain('<script');
    expect(textsOf(main)).toContain(name);
  });
});

describe('figures', () => {
  it('have four digits, a thin space and a true minus', () => {
    expect(withUnit(-7746.854, METRIC.force)).toBe('−7.747\u2009kN');
    expect(withUnit(6776, METRIC.moment)).toBe('6.776\u2009kN\u2009m');
    expect(signed(7746.854, METRIC.force)).toBe('+7.747');
  });

  it('keep the digits of a writer', () => {
    expect(asGivenWithUnit(2400, METRIC['line load'])).toBe('2.4\u2009kN/m');
    expect(asGivenWithUnit(100_000, METRIC.force)).toBe('100\u2009kN');
  });
});

describe('an exaggeration', () => {
  it.each([
    [87, 80],
    [120, 100],
    [199, 150],
    [6.1, 6],
    [0.9, 0.8],
    [2.5, 2.5],
  ])('of at most %d is %d', (most, rounded) => {
    expect(roundedExaggeration(most)).toBe(rounded);
  });
});

describe('labels', () => {
  const place = (x: number) => ({ at: { x, y: 20 }, anchor: 'start' as const });

  it('give way to the one of higher rank', () => {
    const sheet = new Sheet(300, 'page');
    placeLabels(sheet, [
      { labels: [plain('second')], places: [place(10), place(100)], role: 'ink', rank: 1 },
      { labels: [plain('first')], places: [place(10)], role: 'ink', rank: 2 },
    ]);
    const [first, second] = sheet.taken;
    expect(overlap(first!, second!)).toBe(0);
  });

  it('are shortened before they are written over a line', () => {
    const sheet = new Sheet(300, 'page');
    sheet.obstacles.push([
      { x: 60, y: 0 },
      { x: 60, y: 40 },
    ]);
    placeLabels(sheet, [
      { labels: [plain('a longer label'), plain('short')], places: [place(10)], role: 'ink', rank: 1 },
    ]);
    expect(textsOf(sheet.svg('test'))).toEqual(['short']);
  });

  it('are left out where there is no room and they may be', () => {
    const sheet = new Sheet(300, 'page');
    placeLabels(sheet, [
      { labels: [plain('first')], places: [place(10)], role: 'ink', rank: 2 },
      { labels: [plain('other')], places: [place(10)], role: 'ink', rank: 1, optional: true },
    ]);
    expect(textsOf(sheet.svg('test'))).toEqual(['first']);
  });

  it('stay on the sheet', () => {
    const sheet = new Sheet(80, 'page');
    placeLabels(sheet, [
      { labels: [plain('at the edge')], places: [{ at: { x: 78, y: 20 }, anchor: 'start' }], role: 'ink', rank: 1 },
    ]);
    expect(sheet.taken[0]!.right).toBeLessThanOrEqual(80);
  });

  it('are as wide as a common sans serif sets them', () => {
    // Advance widths of Helvetica: digits 556, comma 278, blank 278, of a thousand.
    expect(widthOf(plain('12, 34'), 12)).toBeCloseTo(12 * (4 * 0.556 + 2 * 0.278), 6);
  });
});
