// The result of a file that was not read as a note: nothing but the reason, in the form that every face reads.
import type { DiagnosticCode } from '../language/codes.ts';
import type { NoteResult } from '../note/result.ts';

export function refusedNote(path: string, code: DiagnosticCode, message: string): NoteResult {
  return {
    path,
    text: '',
    frontMatter: {},
    isCalculation: true,
    fences: [],
    structures: [],
    answers: [],
    values: [],
    prose: [],
    names: [],
    diagnostics: [{ code, severity: 'error', range: { start: 0, end: 0 }, message }],
    fingerprint: '',
  };
}
