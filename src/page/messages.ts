// Diagnostics on the page: what is wrong, at which line, and what would mend it. What a table tells already is left out.
import type { Diagnostic } from '../language/diagnostic.ts';
import type { NoteResult } from '../note/result.ts';
import type { Range } from '../quantity/range.ts';
import { escapeHtml, plainHtml } from './html.ts';
import { diagnosticsIn, lineOf } from './note-index.ts';

/** Told in the answers, or where the page leaves something out. */
const TOLD_ELSEWHERE: ReadonlySet<string> = new Set(['limit-exceeded', 'limit-without-source', 'unasked-uplift']);

/** Errors and warnings whose words lie in the range, in order. */
export function messagesIn(note: NoteResult, range: Range): string {
  return diagnosticsIn(note, range)
    .filter(diagnostic => isShown(diagnostic) && !isDrawn(note, diagnostic))
    .map(diagnostic => message(diagnostic, lineOf(note, diagnostic.range.start)))
    .join('');
}

function message(diagnostic: Diagnostic, line: number): string {
  const hint =
    diagnostic.hint === undefined
      ? ''
      : `<p class="tl-small tl-soft-text">${messageHtml(capital(diagnostic.hint))}</p>`;
  const level = diagnostic.severity === 'error' ? 'Error' : 'Remark';
  return (
    `<div class="tl-message" data-code="${escapeHtml(diagnostic.code)}">` +
    `<p><b>${level}, line ${line}.</b> ${messageHtml(diagnostic.message)}</p>${hint}</div>`
  );
}

/** What is free to move is drawn, with these words beside it. */
function isDrawn({ structures }: NoteResult, { code, range }: Diagnostic): boolean {
  return (
    code === 'unstable-structure' &&
    structures.some(
      one =>
        liesIn(range, one.range) && (one.analysis?.stability.mechanisms.length ?? 0) > 0 && one.structure !== undefined,
    )
  );
}

function isShown({ severity, code }: Diagnostic): boolean {
  return severity !== 'hint' && !TOLD_ELSEWHERE.has(code);
}

function liesIn(inner: Range, outer: Range): boolean {
  return inner.start >= outer.start && inner.start <= outer.end;
}

/** The words of a diagnostic: what it quotes between backticks is set as code. */
export function messageHtml(text: string): string {
  return text
    .split('`')
    .map((part, i, parts) =>
      i % 2 === 1 && i < parts.length - 1 ? `<code>${escapeHtml(part)}</code>` : plainHtml(part),
    )
    .join('');
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
