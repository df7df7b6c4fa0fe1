// The markdown-it plugin: puts what a note comes to in the place of its fences and value spans, and leaves everything else
// to the rules that were there before. It computes nothing itself.
import type { MarkdownIt, Token } from 'markdown-it';
import { mayHoldCalculation } from '../note/calculation-mark.ts';
import { createMemory, evaluateNote } from '../note/evaluate.ts';
import type { NoteResult } from '../note/result.ts';
import { fenceBlock } from './fence-block.ts';
import { escapeHtml } from './html.ts';
import { messagesIn } from './messages.ts';
import { fenceAtLine } from './note-index.ts';
import { findProseValue, isProseValue, proseValue } from './prose-value.ts';

export interface TautlineOptions {
  /**
   * What a document's text comes to; `env` is that of the rendering call. Without it the text is evaluated, and the
   * latest texts are remembered.
   */
  readonly resultOf?: (text: string, env: unknown) => NoteResult;
}

/** What the core rule leaves on a token for the renderer, which sees neither the document nor, always, the same `env`. */
interface Mark {
  readonly text: string;
  /** Of a value among the values of the document. */
  readonly ordinal: number;
}

export function tautlinePlugin(md: MarkdownIt, options: TautlineOptions = {}): void {
  const resultOf = options.resultOf ?? rememberingEvaluation();
  const fence = md.renderer.rules.fence;
  const code = md.renderer.rules.code_inline;

  md.core.ruler.push('tautline_source', state => {
    if (mayHoldCalculation(state.src)) markTokens(state.tokens, state.src);
  });

  md.renderer.rules.fence = (tokens, index, rendering, env, self) => {
    const usual = (): string =>
      fence?.(tokens, index, rendering, env, self) ?? self.renderToken(tokens, index, rendering);
    const token = tokens[index] as Token;
    const mark = markOf(token);
    if (mark === undefined) return usual();
    try {
      const note = resultOf(mark.text, env);
      const own = fenceAtLine(note, token.map?.[0] ?? -1);
      if (own === undefined) return usual();
      if (own.kind !== 'calculation') return usual() + messageBlock(messagesIn(note, own.range));
      return fenceBlock(note, own, { content: token.content, ...hostAttributes(token) });
    } catch (problem) {
      return failure(problem, token.content);
    }
  };

  md.renderer.rules.code_inline = (tokens, index, rendering, env, self) => {
    const usual = (): string =>
      code?.(tokens, index, rendering, env, self) ?? self.renderToken(tokens, index, rendering);
    const token = tokens[index] as Token;
    const mark = markOf(token);
    if (mark === undefined) return usual();
    try {
      const note = resultOf(mark.text, env);
      const value = findProseValue(note, mark.ordinal, token.content);
      return value === undefined ? usual() : proseValue(note, value);
    } catch {
      // The fence that the value comes from says what is wrong.
      return usual();
    }
  };
}

/** Runs when the document is parsed: the renderer may be given its tokens later, and without the text. */
function markTokens(tokens: readonly Token[], text: string): void {
  let ordinal = 0;
  for (const token of tokens) {
    if (token.type === 'fence' && isOurs(token.info)) mark(token, { text, ordinal: 0 });
    for (const child of token.children ?? []) {
      if (child.type === 'code_inline' && isProseValue(child.content)) mark(child, { text, ordinal: ordinal++ });
    }
  }
}

function isOurs(info: string): boolean {
  return /^\s*tautline(?=\s|$)/.test(info);
}

function mark(token: Token, tautline: Mark): void {
  const meta: object = token.meta ?? {};
  token.meta = { ...meta, tautline };
}

function markOf(token: Token): Mark | undefined {
  // Only markTokens writes this key.
  return (token.meta as { readonly tautline?: Mark } | null)?.tautline;
}

/** The preview's scroll synchronisation needs its class and line number on the outermost element, in document order. */
function hostAttributes(token: Token): { attributes: string; classes: string; marksLines: boolean } {
  let classes = '';
  let attributes = '';
  for (const [name, value] of token.attrs ?? []) {
    if (name === 'class') classes = String(value);
    else attributes += ` ${escapeHtml(name)}="${escapeHtml(String(value))}"`;
  }
  return { attributes, classes, marksLines: token.attrGet('data-line') !== null };
}

function messageBlock(messages: string): string {
  return messages === '' ? '' : `<section class="tautline tl-words">${messages}</section>\n`;
}

/** A mistake of the program in one block does not cost the page. */
function failure(problem: unknown, content: string): string {
  const words = problem instanceof Error ? problem.message : String(problem);
  return (
    '<section class="tautline"><div class="tl-message"><p><b>This block could not be worked out.</b> ' +
    `${escapeHtml(words)}</p></div><pre class="tl-code"><code>${escapeHtml(content)}</code></pre></section>\n`
  );
}

/** So many texts are remembered: an editor shows one or two, a site renders each once. */
const MOST_REMEMBERED = 8;

function rememberingEvaluation(): (text: string, env: unknown) => NoteResult {
  const memory = createMemory();
  const results = new Map<string, NoteResult>();
  return (text, env) => {
    const path = pathOf(env);
    const key = `${path}\n${text}`;
    const known = results.get(key);
    if (known !== undefined) return known;
    const result = evaluateNote(text, { path, memory });
    results.set(key, result);
    if (results.size > MOST_REMEMBERED) {
      for (const oldest of results.keys()) {
        results.delete(oldest);
        break;
      }
    }
    return result;
  };
}

/** The document's own name, where the host tells it: the editor's preview does so while rendering. */
function pathOf(env: unknown): string {
  const document = (env as { readonly currentDocument?: { readonly path?: unknown } } | null | undefined)
    ?.currentDocument;
  return typeof document?.path === 'string' ? (document.path.split('/').at(-1) ?? 'note.md') : 'note.md';
}
