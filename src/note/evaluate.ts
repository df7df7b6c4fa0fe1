// From a note's text to all that it says: the one function that server, page and command line are faces of. Pure: the same
// text gives the same result, and no text makes it fail.

import type { Diagnostic } from '../language/diagnostic.ts';
import { wordsOf } from '../language/lines.ts';
import { parseProse, parseStatements } from '../language/parse.ts';
import { resolveNames } from '../model/names.ts';
import { divide, type Part } from '../model/scope.ts';
import { changeBetween } from './change.ts';
import { NoteEvaluation } from './evaluation.ts';
import { readSource, type Source, type SourceFence } from './fences.ts';
import { fingerprintOf } from './fingerprint.ts';
import { type FrontMatterBlock, readFrontMatter } from './front-matter.ts';
import { type FenceRead, Memory, type NoteState, SolvedStructures } from './memory.ts';
import { movedResult } from './moved-result.ts';
import { movedSource } from './moved-source.ts';
import type { Fence, NoteResult } from './result.ts';
import { shifted } from './shift.ts';

export type { Memory } from './memory.ts';

export interface EvaluateOptions {
  /** Names the note in messages, and its structure where it never says `structure`. Forward slashes. */
  readonly path: string;
  /** What earlier evaluations solved; without it everything is worked out afresh. */
  readonly memory?: Memory;
}

/** A note larger than this is refused: 1 MB of text. */
const MOST_TEXT = 1_000_000;
/** A fence larger than this is refused: 64 kB of text. */
const MOST_FENCE = 65_536;

export function createMemory(): Memory {
  return new Memory();
}

export function evaluateNote(text: string, options: EvaluateOptions): NoteResult {
  if (text.length > MOST_TEXT) return tooLarge(text, options);
  const memory = options.memory ?? createMemory();
  const state = advance(memory.lastOf(options.path), text, options);
  memory.keep(options.path, state);
  return state.result;
}

/** The state of a note, from that before a change where the change leaves its blocks as they were. */
function advance(last: NoteState | undefined, text: string, options: EvaluateOptions): NoteState {
  const change = last === undefined ? undefined : changeBetween(last.result.text, text);
  if (last !== undefined && change === undefined) return last;
  const moved =
    last === undefined || change === undefined || change.start < last.front.length
      ? undefined
      : movedSource(last.source, last.result.text, text, change);
  if (last === undefined || change === undefined || moved === undefined) return begin(text, options, last?.solved);
  const { source, changed } = moved;
  if (changed === undefined) return { ...last, source, result: movedResult(last.result, text, change) };
  const reads = source.fences.map((fence, i) =>
    i === changed ? readFence(fence, text) : readAt(last.reads[i]!, fence),
  );
  const solved = new SolvedStructures(last.solved);
  const { front } = last;
  return { front, source, reads, solved, result: resultOf(text, options, solved, front, source, reads) };
}

function begin(text: string, options: EvaluateOptions, before: SolvedStructures | undefined): NoteState {
  const solved = new SolvedStructures(before);
  const front = readFrontMatter(text);
  const source = readSource(text, front.length);
  const reads = source.fences.map(fence => readFence(fence, text));
  const result =
    source.fences.length === 0 ? nothing(text, options, front) : resultOf(text, options, solved, front, source, reads);
  return { front, source, reads, solved, result };
}

function resultOf(
  text: string,
  { path }: EvaluateOptions,
  solved: SolvedStructures,
  front: FrontMatterBlock,
  source: Source,
  reads: readonly FenceRead[],
): NoteResult {
  const scopes = divide(
    reads.flatMap(({ parts }) => parts),
    fileName(path),
  );
  const names = resolveNames(scopes);
  const evaluation = new NoteEvaluation({ text, scopes, names, solved, wordsOf: range => wordsOf(text, range) });
  const { structures, answers, values } = evaluation.run();
  const prose = source.spans.map(span => {
    const { value, diagnostics } = parseProse(span.text, span.start);
    return evaluation.prose(span, value, diagnostics);
  });
  let fingerprint: string | undefined;
  const diagnostics = [...reads.flatMap(fence => fence.diagnostics), ...names.diagnostics, ...evaluation.diagnostics()];
  return {
    path,
    text,
    frontMatter: front.values,
    isCalculation: true,
    fences: fencesOf(source, reads, evaluation),
    structures,
    answers,
    values,
    prose,
    names: names.entries,
    diagnostics: inOrder(diagnostics),
    get fingerprint() {
      return (fingerprint ??= fingerprintOf(structures, answers, values));
    },
  };
}

function readFence(fence: SourceFence, text: string): FenceRead {
  if (fence.kind !== 'calculation') {
    const what = fence.kind === 'record' ? 'A record' : 'A signature';
    return {
      start: fence.range.start,
      statements: [],
      parts: [],
      diagnostics: [
        error(
          'not-evaluated-yet',
          firstLine(fence, text),
          `${what} is read but not evaluated by this version: what it says is neither written nor checked.`,
        ),
      ],
    };
  }
  const size = fence.range.end - fence.range.start;
  if (size > MOST_FENCE) {
    const message = `This fence holds ${size} characters; at most ${MOST_FENCE} are read.`;
    // What it would have defined is unknown, and so is all that may depend on it.
    const broken: Part = { kind: 'broken', broken: { keyword: '', name: undefined, start: fence.range.start } };
    return {
      start: fence.range.start,
      statements: [],
      parts: [broken],
      diagnostics: [error('too-large', firstLine(fence, text), message)],
    };
  }
  const { statements, broken, diagnostics } = parseStatements(fence.lines);
  const parts: Part[] = statements.map(statement => ({ kind: 'statement', statement }));
  for (const { range, names } of broken) {
    const keyword = /^\S*/.exec(text.slice(range.start, range.end))![0];
    parts.push({ kind: 'broken', broken: { keyword, name: names[0]?.text, start: range.start } });
  }
  for (const { code, range } of diagnostics) {
    if (code === 'stray-continuation')
      parts.push({ kind: 'broken', broken: { keyword: '', name: undefined, start: range.start } });
  }
  parts.sort((a, b) => startOf(a) - startOf(b));
  return { start: fence.range.start, statements, parts, diagnostics };
}

/** What was read of a fence, where it stands now: it moved as a whole, or not at all. */
function readAt(read: FenceRead, { range }: SourceFence): FenceRead {
  const shift = range.start - read.start;
  if (shift === 0) return read;
  const moved = [{ oldEnd: 0, shift }];
  const statements = shifted(read.statements, moved);
  const renewed = new Map(read.statements.map((statement, i) => [statement, statements[i]!]));
  const parts = read.parts.map(
    (part): Part =>
      part.kind === 'statement' ? { kind: 'statement', statement: renewed.get(part.statement)! } : shifted(part, moved),
  );
  return { start: range.start, statements, parts, diagnostics: shifted(read.diagnostics, moved) };
}

function startOf(part: Part): number {
  return part.kind === 'statement' ? part.statement.range.start : part.broken.start;
}

function firstLine(fence: SourceFence, text: string): { readonly start: number; readonly end: number } {
  const { start } = fence.range;
  const ending = text.slice(start, fence.range.end).search(/[\r\n]/);
  return { start, end: ending < 0 ? fence.range.end : start + ending };
}

function fencesOf(source: Source, read: readonly FenceRead[], evaluation: NoteEvaluation): Fence[] {
  return source.fences.map(({ kind, range, firstLine, lastLine }, i) => ({
    kind,
    range,
    firstLine,
    lastLine,
    statements: read[i]!.statements,
    structures: evaluation.structuresIn(read[i]!.statements),
  }));
}

/** By place, each once: an expression that is worked for several alternatives tells its mistake for each. */
function inOrder(diagnostics: readonly Diagnostic[]): Diagnostic[] {
  const seen = new Set<string>();
  const unique = diagnostics.filter(({ code, range, message }) => {
    const key = `${range.start} ${range.end} ${code} ${message}`;
    if (seen.has(key)) return false;
    seen.add(key);
    return true;
  });
  return unique.sort((a, b) => a.range.start - b.range.start || a.range.end - b.range.end);
}

function error(code: Diagnostic['code'], range: Diagnostic['range'], message: string): Diagnostic {
  return { code, severity: 'error', range, message };
}

function fileName(path: string): string {
  const name = path.slice(path.lastIndexOf('/') + 1);
  return name.replace(/\.[^.]+$/, '') || name;
}

function nothing(text: string, { path }: EvaluateOptions, front: FrontMatterBlock): NoteResult {
  return {
    path,
    text,
    frontMatter: front.values,
    isCalculation: false,
    fences: [],
    structures: [],
    answers: [],
    values: [],
    prose: [],
    names: [],
    diagnostics: [],
    fingerprint: '',
  };
}

function tooLarge(text: string, options: EvaluateOptions): NoteResult {
  const message = `This note holds ${text.length} characters; at most ${MOST_TEXT} are read.`;
  const diagnostics = [error('too-large', { start: 0, end: Math.min(1, text.length) }, message)];
  return { ...nothing(text, options, { values: {}, length: 0 }), diagnostics };
}
