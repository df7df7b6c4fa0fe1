// What the keeper does with a text that the program itself fails on, which no note may bring about: the evaluation is
// made to throw here.
import { expect, test, vi } from 'vitest';
import { TextDocument } from 'vscode-languageserver-textdocument';
import * as evaluation from '../../src/note/evaluate.ts';
import { NoteKeeper } from '../../src/server/note-keeper.ts';
import { fenced } from './open.ts';

vi.mock('../../src/note/evaluate.ts', { spy: true });

test('a mistake in the program is told and logged, and is over with the next version that works', () => {
  const sent: unknown[] = [];
  const logged: string[] = [];
  const keeper = new NoteKeeper(
    (_, version, diagnostics) => void sent.push([version, diagnostics.map(({ code }) => code)]),
    message => void logged.push(message),
  );
  const version = (number: number) => TextDocument.create('file:///a.md', 'markdown', number, fenced('let a = 1 m'));
  vi.mocked(evaluation.evaluateNote).mockImplementationOnce(() => {
    throw new Error('a row of length 0');
  });
  keeper.changed(version(1));
  keeper.changed(version(2));
  expect(sent).toEqual([
    [1, ['program-failure']],
    [2, []],
  ]);
  expect(logged[0]).toContain('a row of length 0');
});
