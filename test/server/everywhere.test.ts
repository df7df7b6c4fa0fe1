// Every feature at every place of the sample notes, whole, cut off and with a line lost: no throw, no figure that is
// none, ranges inside the text.
import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { codeActions } from '../../src/server/code-actions.ts';
import { completions } from '../../src/server/completion.ts';
import { diagnosticsOf } from '../../src/server/diagnostics.ts';
import { hover } from '../../src/server/hover/hover.ts';
import { inlayHints } from '../../src/server/inlay-hints.ts';
import { open } from './open.ts';

const folder = 'media/sample';
const samples = readdirSync(folder).filter(name => name.endsWith('.md'));

describe.each(samples)('%s', name => {
  const text = readFileSync(`${folder}/${name}`, 'utf8');
  const lines = text.split('\n');

  test('whole', () => askEverywhere(text, 3));

  test('cut off', () => {
    for (let cut = 0; cut < text.length; cut += 371) askEverywhere(text.slice(0, cut), 53);
  });

  test('with a line lost', () => {
    for (let lost = 0; lost < lines.length; lost += 3) askEverywhere(lines.toSpliced(lost, 1).join('\n'), 97);
  });
});

/** Asks at each place that is so many characters behind the one before. */
function askEverywhere(text: string, step: number): void {
  const { note } = open(text);
  const whole = { start: note.document.positionAt(0), end: note.document.positionAt(text.length) };
  const told = [...diagnosticsOf(note), ...codeActions(note, whole), ...inlayHints(note, whole)];
  for (let offset = 0; offset <= text.length; offset += step) {
    const position = note.document.positionAt(offset);
    const shown = hover(note, position, { format: 'markdown', drawings: offset % 2 === 0 ? 'light' : 'dark' });
    const offered = completions(note, position, true);
    if (shown?.range !== undefined) {
      expect(note.document.offsetAt(shown.range.start)).toBeLessThanOrEqual(offset);
      expect(note.document.offsetAt(shown.range.end)).toBeGreaterThanOrEqual(offset);
    }
    expect(words(shown) + words(offered)).not.toMatch(NO_FIGURE);
  }
  expect(words(told)).not.toMatch(NO_FIGURE);
}

const NO_FIGURE = /\bNaN\b|\bundefined\b|\bInfinity\b|\[object/;

function words(told: unknown): string {
  return JSON.stringify(told) ?? '';
}
