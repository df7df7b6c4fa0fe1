// The one type of diagnostic. Every stage returns its data beside a list of these and goes on with what it can.
import type { Range } from '../quantity/range.ts';
import type { DiagnosticCode } from './codes.ts';

export type Severity = 'error' | 'warning' | 'hint';

export interface Edit {
  readonly range: Range;
  readonly text: string;
}

export interface Diagnostic {
  readonly code: DiagnosticCode;
  readonly severity: Severity;
  /** The fewest words whose change would mend it. */
  readonly range: Range;
  /** One line, in the engineer's terms, with the figure that shows it. */
  readonly message: string;
  /** The least that mends it. */
  readonly hint?: string;
  readonly related?: readonly { readonly range: Range; readonly message: string }[];
  /** Present only where it surely mends the mistake. */
  readonly fix?: { readonly title: string; readonly edits: readonly Edit[] };
}
