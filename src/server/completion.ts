// Completion inside a fence: statements at the start of a line, and behind it the words and the names that can stand at
// the cursor. Outside the fences it is silent, since the editor asks in all of the Markdown.
import { type CompletionItem, CompletionItemKind, InsertTextFormat, type Position } from 'vscode-languageserver';
import { isStatementKind, STATEMENTS } from '../language/statements/table.ts';
import { MEASURES } from '../language/words.ts';
import type { NameEntry, Namespace } from '../note/result.ts';
import { type Offer, offersAt } from './completion-offers.ts';
import { holds, type OpenNote, structureAt } from './open-note.ts';

/** Rare in prose, and each a place where the language has something to offer. */
export const TRIGGER_CHARACTERS = [':', '=', '('] as const;

/** `snippets`: whether the editor can take a statement's form with places to fill in. */
export function completions(note: OpenNote, position: Position, snippets: boolean): CompletionItem[] {
  const typed = statementAt(note, position);
  if (typed === undefined) return [];
  const word = /[\p{L}\p{M}\p{N}_-]*$/u.exec(typed)?.[0] ?? '';
  const before = typed.slice(0, typed.length - word.length);
  const start = { line: position.line, character: position.character - word.length };
  const items = before.trim() === '' ? statementItems(snippets) : itemsFor(note, position, before);
  // Right behind a mark the word needs a blank before it; a parenthesis needs none.
  const blank = /[:=]$/.test(before) ? ' ' : '';
  return items.map(({ insertText, ...item }) => ({
    ...item,
    filterText: `${blank}${item.label}`,
    textEdit: { range: { start, end: position }, newText: `${blank}${insertText ?? item.label}` },
  }));
}

/** The statement up to the cursor, lines joined; undefined outside the lines of a calculation. */
function statementAt(note: OpenNote, position: Position): string | undefined {
  const offset = note.document.offsetAt(position);
  const fence = note.result.fences.find(({ kind, range }) => kind === 'calculation' && holds(range, offset));
  if (fence === undefined || position.line <= fence.firstLine) return undefined;
  const line = lineText(note, position.line).slice(0, position.character);
  // The closing marker is no statement, but an unclosed fence goes on to the end of the text.
  if (/^[\s>]*(`{3,}|~{3,})/.test(line)) return undefined;
  return `${linesAbove(note, fence.firstLine, position.line)}${withoutPrefix(line)}`;
}

/** The earlier lines of the statement that a line goes on with: those above, while it is indented more than the first. */
function linesAbove(note: OpenNote, opening: number, line: number): string {
  let above = '';
  const margin = prefixLength(lineText(note, opening + 1));
  for (let at = line; at > opening + 1; at -= 1) {
    if (prefixLength(lineText(note, at)) <= margin) break;
    above = `${withoutPrefix(lineText(note, at - 1))} ${above}`;
  }
  return above;
}

function firstWord(text: string): string {
  return /^[a-z]*/.exec(text)?.[0] ?? '';
}

function lineText(note: OpenNote, line: number): string {
  const range = { start: { line, character: 0 }, end: { line: line + 1, character: 0 } };
  return note.document.getText(range).replace(/[\r\n]+$/, '');
}

/** Indentation and the quote marks of what the fence stands in. */
function prefixLength(text: string): number {
  return /^[\s>]*/.exec(text)?.[0].length ?? 0;
}

function withoutPrefix(text: string): string {
  return text.slice(prefixLength(text));
}

type Draft = Pick<CompletionItem, 'label' | 'kind' | 'detail' | 'insertText' | 'insertTextFormat' | 'documentation'>;

function statementItems(snippets: boolean): Draft[] {
  return Object.values(STATEMENTS).map(({ keyword, help, grammar, skeleton }) => ({
    label: keyword,
    kind: CompletionItemKind.Keyword,
    detail: help,
    documentation: grammar,
    ...(snippets && { insertText: skeleton, insertTextFormat: InsertTextFormat.Snippet }),
  }));
}

function itemsFor(note: OpenNote, position: Position, before: string): Draft[] {
  // A word that begins no statement is the parser's business.
  const keyword = firstWord(before);
  if (!isStatementKind(keyword)) return [];
  return offersAt(keyword, before).flatMap(offer => itemsOf(note, position, offer));
}

function itemsOf(note: OpenNote, position: Position, offer: Offer): Draft[] {
  if ('names' in offer) return namesInScope(note, position, offer.names).map(nameItem);
  if ('words' in offer) return offer.words.map(label => ({ label, kind: CompletionItemKind.Keyword }));
  return Object.entries(MEASURES).map(([label, { form, help }]) => ({
    label,
    kind: CompletionItemKind.Function,
    detail: help,
    documentation: form,
  }));
}

/** Those of the structure spoken of, and those of the note's head. */
function namesInScope(note: OpenNote, position: Position, namespace: Namespace): NameEntry[] {
  const index = structureAt(note.result, note.document.offsetAt(position));
  const owner = index === undefined ? undefined : note.result.structures[index]?.name;
  return note.result.names.filter(
    entry => entry.namespace === namespace && (entry.structure === undefined || entry.structure === owner),
  );
}

const KIND: Readonly<Record<Namespace, CompletionItemKind>> = {
  structure: CompletionItemKind.Module,
  point: CompletionItemKind.Field,
  member: CompletionItemKind.Variable,
  section: CompletionItemKind.Struct,
  material: CompletionItemKind.Struct,
  case: CompletionItemKind.Event,
  combination: CompletionItemKind.Event,
  value: CompletionItemKind.Constant,
  result: CompletionItemKind.Value,
};

function nameItem({ name, namespace }: NameEntry): Draft {
  return { label: name, kind: KIND[namespace], detail: namespace };
}
