// Where the builders of a model put what is wrong, and what an error costs: a case, or the whole structure.

import type { DiagnosticCode } from '../language/codes.ts';
import type { Diagnostic } from '../language/diagnostic.ts';
import type { Range } from '../quantity/range.ts';

export type Details = Pick<Diagnostic, 'hint' | 'related' | 'fix'>;

/** Collects diagnostics, and what must be withheld because of them; a wrong number is worse than none. */
export class Report {
  readonly diagnostics: Diagnostic[] = [];
  /** Cases whose loads are not all known. */
  readonly flawedCases = new Set<string>();
  /** The structure is not all known: nothing that it does can be told. */
  flawed = false;

  error(code: DiagnosticCode, range: Range, message: string, details: Details = {}): void {
    this.diagnostics.push({ code, severity: 'error', range, message, ...details });
  }

  warn(code: DiagnosticCode, range: Range, message: string, details: Details = {}): void {
    this.diagnostics.push({ code, severity: 'warning', range, message, ...details });
  }

  hint(code: DiagnosticCode, range: Range, message: string, details: Details = {}): void {
    this.diagnostics.push({ code, severity: 'hint', range, message, ...details });
  }
}
