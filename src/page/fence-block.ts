// One calculation fence on the page: what the writer wrote, what is wrong there, and the structures that end in it.
import type { Fence, NoteResult } from '../note/result.ts';
import { escapeHtml } from './html.ts';
import { valueTable } from './inputs.ts';
import { messagesIn } from './messages.ts';
import { structuresEndingIn } from './note-index.ts';
import { PATTERNS } from './patterns.ts';
import { structureBlock } from './structure-block.ts';

export interface FenceAt {
  /** The fence's content, its container's marks taken off. */
  readonly content: string;
  /** Attributes that the host wants on the outer element, escaped, each with a leading blank; `class` left out. */
  readonly attributes: string;
  /** Classes that it wants there. */
  readonly classes: string;
  /** Whether each source line is marked for the preview's scroll synchronisation. */
  readonly marksLines: boolean;
}

export function fenceBlock(note: NoteResult, fence: Fence, at: FenceAt): string {
  // A structure may be interrupted by prose; it is shown where it has been said in full.
  const ending = structuresEndingIn(note, fence);
  const code = codeBlock(fence, at);
  const messages = messagesIn(note, fence.range);
  const classes = (own: string): string => escapeHtml([own, at.classes].filter(Boolean).join(' '));
  if (ending.length === 0) {
    const values = note.values.filter(
      ({ range, name }) => !name.includes('.') && range.start >= fence.range.start && range.end <= fence.range.end,
    );
    const words = classes('tautline tl-words');
    return `<section class="${words}"${at.attributes}>${code}${messages}${valueTable(note, values)}</section>\n`;
  }
  const lines = fence.lastLine - fence.firstLine - 1;
  const source = `<details class="tl-source"><summary>As written, ${lines} ${lines === 1 ? 'line' : 'lines'}</summary>${code}</details>`;
  const patterns = ending.includes(0) ? PATTERNS : '';
  const blocks = ending.map((s, i) => structureBlock(note, s, i === 0 ? messages : ''));
  return `<section class="${classes('tautline')}"${at.attributes}>${patterns}${source}${blocks.join('')}</section>\n`;
}

function codeBlock({ firstLine }: Fence, { content, marksLines }: FenceAt): string {
  const text = content.replace(/\n$/, '');
  const code = marksLines
    ? text
        .split('\n')
        .map((line, i) => `<span class="code-line" data-line="${firstLine + 1 + i}">${escapeHtml(line)}</span>`)
        .join('\n')
    : escapeHtml(text);
  return `<pre class="tl-code"><code>${code}</code></pre>`;
}
