// Results for programs: the object that `tautline check --json` writes. Its form is public and versioned (the schema is
// media/result.schema.json); values are SI and unrounded, lines and columns count from 1.
import type { Diagnostic, Severity } from '../language/diagnostic.ts';
import { indexLines, type LineIndex } from './line-index.ts';
import type { Answer, AnswerPlace, AnswerStatus, Check, NoteResult, StructureResult } from './result.ts';

export interface Report {
  /** Version of the form. */
  readonly tautline: 1;
  readonly notes: readonly NoteReport[];
}

export interface NoteReport {
  readonly path: string;
  readonly fingerprint: string;
  readonly structures: readonly StructureReport[];
  readonly answers: readonly AnswerReport[];
  readonly values: Readonly<Record<string, ValueReport>>;
  readonly prose: readonly ProseReport[];
  readonly record: 'none' | 'current' | 'stale';
  readonly signatures: readonly [];
  readonly diagnostics: readonly DiagnosticReport[];
}

export interface StructureReport {
  readonly name: string;
  /** Null where the structure is unstable or could not be solved. */
  readonly redundancy: number | null;
  readonly stable: boolean;
}

export interface AnswerReport {
  readonly structure: string;
  readonly name: string;
  readonly kind: 'find' | 'require';
  readonly measure: string;
  readonly under: string | null;
  readonly governing: string | null;
  readonly value: number | null;
  readonly unit: string;
  readonly display: string;
  readonly place: AnswerPlace | null;
  readonly limit: number | null;
  readonly utilisation: number | null;
  readonly status: AnswerStatus;
  readonly check: Omit<Check, 'energy'> | null;
}

export interface ValueReport {
  readonly value: number | null;
  readonly unit: string;
}

export interface ProseReport {
  readonly line: number;
  readonly text: string;
  readonly value: number | null;
  readonly unit: string;
  readonly display: string;
}

export interface DiagnosticReport {
  readonly code: string;
  readonly severity: Severity;
  readonly message: string;
  readonly line: number;
  readonly column: number;
  readonly endLine: number;
  readonly endColumn: number;
}

export function reportOf(results: readonly NoteResult[]): Report {
  return { tautline: 1, notes: results.map(toJson) };
}

/** One note's result in the public form. */
export function toJson(result: NoteResult): NoteReport {
  const lines = indexLines(result.text);
  return {
    path: result.path,
    fingerprint: result.fingerprint,
    structures: result.structures.map(structureReport),
    answers: result.answers.map(answer => answerReport(answer, result.structures)),
    values: Object.fromEntries(
      result.values.map(({ name, quantity, unit }) => [name, { value: quantity?.value ?? null, unit }]),
    ),
    prose: result.prose.map(({ line, text, quantity, unit, display }) => ({
      line,
      text,
      value: quantity?.value ?? null,
      unit,
      display,
    })),
    record: 'none',
    signatures: [],
    diagnostics: result.diagnostics.map(diagnostic => diagnosticReport(diagnostic, lines)),
  };
}

/** Whether a reviewer has nothing to mend: no requirement exceeded or withheld, no error. Hints and warnings do not count. */
export function isWell(result: NoteResult): boolean {
  return (
    result.diagnostics.every(({ severity }) => severity !== 'error') &&
    result.answers.every(({ kind, status }) => kind === 'find' || status === 'ok')
  );
}

function structureReport({ name, analysis }: StructureResult): StructureReport {
  const stable = analysis?.stability.stable ?? false;
  return { name, redundancy: stable && analysis !== undefined ? analysis.redundancy : null, stable };
}

function answerReport(answer: Answer, structures: readonly StructureResult[]): AnswerReport {
  return {
    structure: structures[answer.structure]?.name ?? '',
    name: answer.name,
    kind: answer.kind,
    measure: answer.measure,
    under: answer.under,
    governing: answer.governing,
    value: answer.quantity?.value ?? null,
    unit: answer.unit,
    display: answer.display,
    place: answer.place ?? null,
    limit: answer.limit?.value ?? null,
    utilisation: answer.utilisation ?? null,
    status: answer.status,
    check: answer.check === undefined ? null : { difference: answer.check.difference, residual: answer.check.residual },
  };
}

function diagnosticReport({ code, severity, message, range }: Diagnostic, lines: LineIndex): DiagnosticReport {
  const start = lines.positionAt(range.start);
  const end = lines.positionAt(range.end);
  return {
    code,
    severity,
    message,
    line: start.line,
    column: start.column,
    endLine: end.line,
    endColumn: end.column,
  };
}
