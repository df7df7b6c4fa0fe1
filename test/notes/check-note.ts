// Whole notes against expected answers: what a note says and what should come of it stand side by side in the tests;
// the calls between are here. Answers are read in the public form, as `tautline check --json` writes it.
import { expect } from 'vitest';
import { evaluateNote } from '../../src/note/evaluate.ts';
import { type AnswerReport, type NoteReport, toJson } from '../../src/note/report.ts';
import type { NoteResult } from '../../src/note/result.ts';

export interface Expected {
  readonly value: number | null;
  readonly unit?: string;
  readonly display?: string;
  readonly under?: string | null;
  /** The beginning of it, or null. */
  readonly governing?: string | null;
  readonly place?: { readonly member: string; readonly from: string; readonly distance: number } | null;
  readonly limit?: number;
  readonly utilisation?: number | null;
  readonly status?: 'ok' | 'fails' | 'none';
}

export function evaluated(text: string, path = 'note.md'): NoteResult {
  return evaluateNote(text, { path });
}

/** The answers of a note in one fence. */
export function solved(body: string): NoteReport {
  return toJson(evaluated(fenced(body)));
}

export function fenced(body: string): string {
  return `\`\`\`tautline\n${body}\n\`\`\`\n`;
}

/**
 * Every answer named is as expected, a bare number being its value; names of several structures are told apart as
 * `Beam.mid`. Values agree to 1e-9 relative, those that should be nil to 1e-9 of `scale`.
 */
export function checkAnswers(note: NoteReport, expected: Readonly<Record<string, number | Expected>>, scale = 1): void {
  for (const [name, wanted] of Object.entries(expected)) {
    const answer = answerOf(note, name);
    checkAnswer(name, answer, typeof wanted === 'number' ? { value: wanted } : wanted, scale);
  }
}

/** Values of `let` by name. */
export function checkValues(note: NoteReport, expected: Readonly<Record<string, number>>, scale = 1): void {
  for (const [name, wanted] of Object.entries(expected)) {
    expect(note.values[name], `value ${name}`).toBeDefined();
    checkNumber(`value ${name}`, note.values[name]!.value, wanted, scale);
  }
}

/** Codes of errors and warnings, in the order of the text; hints do not count. */
export function codesOf(note: NoteReport): string[] {
  return note.diagnostics.filter(({ severity }) => severity !== 'hint').map(({ code }) => code);
}

export function checkNumber(what: string, value: number | null, wanted: number | null, scale = 1): void {
  if (value === null || wanted === null) {
    expect(value, what).toBe(wanted);
    return;
  }
  const tolerance = 1e-9 * (wanted === 0 ? scale : Math.abs(wanted));
  expect(Math.abs(value - wanted), `${what}: ${value}, expected ${wanted}`).toBeLessThanOrEqual(tolerance);
}

function answerOf(note: NoteReport, name: string): AnswerReport {
  const [first, second] = name.split('.');
  const found = note.answers.filter(answer =>
    second === undefined ? answer.name === first : answer.structure === first && answer.name === second,
  );
  expect(found, `answers named ${name}; diagnostics ${JSON.stringify(note.diagnostics)}`).toHaveLength(1);
  return found[0]!;
}

function checkAnswer(name: string, answer: AnswerReport, wanted: Expected, scale: number): void {
  checkNumber(name, answer.value, wanted.value, scale);
  if (wanted.unit !== undefined) expect(answer.unit, `unit of ${name}`).toBe(wanted.unit);
  if (wanted.display !== undefined) expect(answer.display, `display of ${name}`).toBe(wanted.display);
  if (wanted.under !== undefined) expect(answer.under, `under of ${name}`).toBe(wanted.under);
  if (wanted.status !== undefined) expect(answer.status, `status of ${name}`).toBe(wanted.status);
  if (wanted.limit !== undefined) checkNumber(`limit of ${name}`, answer.limit, wanted.limit, scale);
  if (wanted.utilisation !== undefined) checkNumber(`use of ${name}`, answer.utilisation, wanted.utilisation, scale);
  if (wanted.governing === null) expect(answer.governing, `governing of ${name}`).toBeNull();
  else if (wanted.governing !== undefined) {
    expect(answer.governing?.slice(0, wanted.governing.length), `governing of ${name}`).toBe(wanted.governing);
  }
  if (wanted.place === null) expect(answer.place, `place of ${name}`).toBeNull();
  else if (wanted.place !== undefined) {
    const { member, from, distance } = wanted.place;
    expect(answer.place, `place of ${name}`).toMatchObject({ member, from });
    // An extreme is flat, so that its place is known to half the digits of its value only.
    expect(Math.abs(answer.place!.distance - distance), `place of ${name}: ${answer.place!.distance}`).toBeLessThan(
      1e-6,
    );
  }
}
