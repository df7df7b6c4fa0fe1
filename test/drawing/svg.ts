// What the tests ask of any drawing: that it is well formed, finite, readable and complete in itself.
import { expect } from 'vitest';

/** Every text of the drawing, its runs put together. */
export function textsOf(svg: string): string[] {
  return [...svg.matchAll(/<text\b[^>]*>([\s\S]*?)<\/text>/g)].map(([, inside = '']) =>
    inside
      .replace(/<[^>]+>/g, '')
      .replaceAll('\u2009', ' ')
      .replaceAll('\u2002', ' ')
      .replace(/&(amp|lt|gt|quot|#39);/g, entity => ENTITIES[entity] ?? entity),
  );
}

const ENTITIES: Readonly<Record<string, string>> = {
  '&amp;': '&',
  '&lt;': '<',
  '&gt;': '>',
  '&quot;': '"',
  '&#39;': "'",
};

export function checkDrawing(svg: string): void {
  expect(svg).not.toMatch(/NaN|Infinity|undefined|null|\[object/);
  expect(svg).toMatch(/^<svg [^>]*role="img" aria-label="[^"]+"/);
  checkTags(svg);
  const [, width = '', height = ''] = /\bwidth="([\d.]+)" height="([\d.]+)"/.exec(svg) ?? [];
  expect(Number(width)).toBeGreaterThan(0);
  expect(Number(height)).toBeGreaterThan(0);
  expect(Number(height)).toBeLessThan(1200);
  // Words are never upside down.
  for (const [, turn] of svg.matchAll(/<text[^>]*rotate\((-?[\d.]+) /g)) {
    expect(Number(turn)).toBeGreaterThanOrEqual(-90.5);
    expect(Number(turn)).toBeLessThanOrEqual(89.5);
  }
}

/** Every element closes, in order, and attributes are quoted. */
export function checkTags(markup: string): void {
  const open: string[] = [];
  for (const [tag, closing, name, , selfClosing] of markup.matchAll(
    /<(\/?)([a-zA-Z][\w-]*)((?:\s+[\w:-]+(?:="[^"<]*")?)*)\s*(\/?)>/g,
  )) {
    if (name === undefined) throw new Error(tag);
    if (closing === '/') expect(open.pop(), tag).toBe(name);
    else if (selfClosing !== '/' && !VOID.has(name)) open.push(name);
  }
  expect(open).toEqual([]);
  // What looks like a tag and is none would be a text that escaped.
  const without = markup.replace(/<\/?[a-zA-Z][\w-]*(?:\s+[\w:-]+(?:="[^"<]*")?)*\s*\/?>/g, '');
  expect(without.replace('<!doctype html>', '')).not.toMatch(/[<]/);
}

const VOID: ReadonlySet<string> = new Set(['input', 'col', 'meta', 'br', 'hr', 'img']);
