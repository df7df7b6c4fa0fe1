import { readdirSync, readFileSync } from 'node:fs';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { evaluateNote } from '../../src/note/evaluate.ts';
import { toJson } from '../../src/note/report.ts';

// Random edits of the sample notes: words moved, dropped, doubled and replaced. Whatever comes of it, the note is read
// without a throw, every place is inside the text, no number is other than finite, and the same text says the same again.

const FOLDER = 'media/sample/';
const NOTES = readdirSync(FOLDER)
  .filter(name => name.endsWith('.md'))
  .map(name => readFileSync(FOLDER + name, 'utf8'));

const WORDS = [...new Set(NOTES.join(' ').match(/[\p{L}\d.]+|[^\s\p{L}\d]+/gu) ?? [])];

const edit = fc.record({
  at: fc.double({ min: 0, max: 1, noNaN: true }),
  drop: fc.nat({ max: 30 }),
  insert: fc.oneof(
    fc.constantFrom(...WORDS),
    fc.constantFrom('\n', ' ', '```', '  ', '\t'),
    fc.string({ maxLength: 6, unit: 'binary' }),
  ),
});

test('random edits of the sample notes', () => {
  fc.assert(
    fc.property(fc.constantFrom(...NOTES), fc.array(edit, { minLength: 1, maxLength: 8 }), (note, edits) => {
      let text = note;
      for (const { at, drop, insert } of edits) {
        const start = Math.floor(at * text.length);
        text = text.slice(0, start) + insert + text.slice(start + drop);
      }
      const result = evaluateNote(text, { path: 'note.md' });
      const inside = ({ start, end }: { start: number; end: number }) =>
        0 <= start && start <= end && end <= text.length;
      for (const { range, related } of result.diagnostics) {
        expect(inside(range)).toBe(true);
        for (const place of related ?? []) expect(inside(place.range)).toBe(true);
      }
      for (const { definition, uses } of result.names) expect([definition, ...uses].every(inside)).toBe(true);
      for (const { quantity } of [...result.answers, ...result.values, ...result.prose]) {
        if (quantity !== undefined) expect(Number.isFinite(quantity.value)).toBe(true);
      }
      const json = JSON.stringify(toJson(result));
      expect(JSON.stringify(toJson(evaluateNote(text, { path: 'note.md' })))).toBe(json);
      // An answer that is not given has a diagnostic to show for it.
      if (result.answers.some(({ quantity }) => quantity === undefined)) {
        expect(result.diagnostics.some(({ severity }) => severity === 'error')).toBe(true);
      }
    }),
    { seed: 20261201, numRuns: 400 },
  );
}, 120_000);
