// What is wrong in a note, as the editor underlines it.
import { DiagnosticSeverity, type Diagnostic as ProtocolDiagnostic } from 'vscode-languageserver';
import type { Diagnostic, Severity } from '../language/diagnostic.ts';
import { type OpenNote, toProtocol } from './open-note.ts';

export function diagnosticsOf(note: OpenNote): ProtocolDiagnostic[] {
  return note.result.diagnostics.map(diagnostic => protocolDiagnostic(note, diagnostic));
}

const SEVERITY: Readonly<Record<Severity, DiagnosticSeverity>> = {
  error: DiagnosticSeverity.Error,
  warning: DiagnosticSeverity.Warning,
  // An editor shows a protocol hint as three dots only; what the writer should read is information.
  hint: DiagnosticSeverity.Information,
};

function protocolDiagnostic(
  note: OpenNote,
  { code, severity, range, message, hint, related }: Diagnostic,
): ProtocolDiagnostic {
  const shown: ProtocolDiagnostic = {
    range: toProtocol(note, range),
    severity: SEVERITY[severity],
    code,
    source: 'tautline',
    message: hint === undefined ? message : `${message}\n${hint}`,
  };
  if (related === undefined || related.length === 0) return shown;
  return {
    ...shown,
    relatedInformation: related.map(place => ({
      location: { uri: note.document.uri, range: toProtocol(note, place.range) },
      message: place.message,
    })),
  };
}
