import { readdirSync, readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { createMemory, evaluateNote } from '../../src/note/evaluate.ts';
import type { NoteResult } from '../../src/note/result.ts';

// A result that came of the one before, by moving what did not change, must be the result of the text alone.

const FOLDER = 'media/sample/';
const NOTES = readdirSync(FOLDER)
  .filter(name => name.endsWith('.md'))
  .map(name => readFileSync(FOLDER + name, 'utf8'));

/** Everything a face can see, solutions and analyses left out. */
function seen({ names, structures, ...rest }: NoteResult): unknown {
  return JSON.parse(
    JSON.stringify({
      ...rest,
      names: names.map(({ namespace, name, structure, definition, uses }) => [
        namespace,
        name,
        structure,
        definition,
        uses,
      ]),
      structures: structures.map(({ analysis: _, ...structure }) => structure),
    }),
  );
}

const PIECES = ['x', ' ', '', '1', '`', '\n', '# ', 'kN', '"', '(', '```', '- ', '>', 'A', ' of ', '\t', '|'];

const edits = fc.array(
  fc.record({
    at: fc.double({ min: 0, max: 1, noNaN: true }),
    drop: fc.integer({ min: 0, max: 6 }),
    insert: fc.constantFrom(...PIECES),
  }),
  { minLength: 1, maxLength: 12 },
);

describe('keystrokes', () => {
  test('give what the text alone gives', () => {
    fc.assert(
      fc.property(fc.constantFrom(...NOTES), edits, (note, keystrokes) => {
        const memory = createMemory();
        let text = note;
        evaluateNote(text, { path: 'note.md', memory });
        for (const { at, drop, insert } of keystrokes) {
          const start = Math.floor(at * text.length);
          text = text.slice(0, start) + insert + text.slice(start + drop);
          const result = evaluateNote(text, { path: 'note.md', memory });
          expect(seen(result)).toEqual(seen(evaluateNote(text, { path: 'note.md' })));
        }
      }),
      { seed: 20261201, numRuns: 120 },
    );
  }, 120_000);

  test('in prose solve nothing and keep the answers', () => {
    const memory = createMemory();
    const [note] = NOTES.filter(text => text.includes('```tautline\nstructure'));
    const before = evaluateNote(note!, { path: 'note.md', memory });
    const at = note!.indexOf('\n', note!.indexOf('# '));
    const after = evaluateNote(`${note!.slice(0, at)} more${note!.slice(at)}`, { path: 'note.md', memory });
    expect(after.structures[0]!.analysis).toBe(before.structures[0]!.analysis);
    expect(after.answers[0]!.range.start).toBe(before.answers[0]!.range.start + 5);
  });
});
