// A value in the prose: the result in place of the expression that asks for it.
import type { NoteResult, ProseValue } from '../note/result.ts';
import { METRIC } from '../quantity/display.ts';
import { allDigits } from './answers-table.ts';
import { plainHtml } from './html.ts';
import { diagnosticsIn } from './note-index.ts';

export function proseValue(note: NoteResult, value: ProseValue): string {
  if (value.quantity === undefined) {
    const [why] = diagnosticsIn(note, value.range);
    const title = `${value.text}: ${why?.message ?? 'a result that it needs is withheld'}`;
    return `<output class="tautline-value tautline-withheld" title="${plainHtml(title)}">withheld</output>`;
  }
  const units = note.structures[0]?.display ?? METRIC;
  const title = `${value.text} = ${allDigits(value, units)}`;
  return `<output class="tautline-value" title="${plainHtml(title)}">${plainHtml(value.display)}</output>`;
}

/** Finds the value that an inline code span asks for: by its place among the spans, checked by its words. */
export function findProseValue(note: NoteResult, ordinal: number, content: string): ProseValue | undefined {
  const words = wordsOf(content);
  const own = note.prose[ordinal];
  if (own !== undefined && squeezed(own.text) === words) return own;
  return note.prose.find(({ text }) => squeezed(text) === words);
}

/** Whether a code span is a value: its first word says so and something follows. */
export function isProseValue(content: string): boolean {
  return /^\s*tautline\s+\S/.test(content);
}

function wordsOf(content: string): string {
  return squeezed(content.replace(/^\s*tautline\s+/, ''));
}

/** Blanks and the marks of a quotation may differ between the source and what Markdown makes of it. */
function squeezed(text: string): string {
  return text.replace(/[\s>]+/g, '');
}
