// What a hover says, before it is written for a client: a name, a few lines of figures, and perhaps a drawing.
import type { Hover, Range as ProtocolRange } from 'vscode-languageserver';

export interface Card {
  /** The name that the pointer rests on. */
  readonly title: string;
  /** What it is, in a few words: `member, box 100 × 200 × 6, S355, 6.600 m`. */
  readonly about: string;
  readonly rows: readonly Row[];
  readonly drawing?: Drawing;
}

export interface Row {
  readonly label: string;
  readonly text: string;
}

/** `svg` stands alone, with its size and its colours; `words` say the same to who does not see it. */
export interface Drawing {
  readonly svg: string;
  readonly words: string;
}

/** Past this, VS Code may show the address of a picture in place of the picture. Characters. */
const LARGEST_DRAWING = 60_000;

export function toHover(card: Card, range: ProtocolRange, format: 'markdown' | 'plaintext'): Hover {
  const value = format === 'markdown' ? toMarkdown(card) : toPlainText(card);
  return { contents: { kind: format, value }, range };
}

function toMarkdown({ title, about, rows, drawing }: Card): string {
  const lines = [`**${escapeMarkdown(title)}** ${escapeMarkdown(about)}`];
  for (const { label, text } of rows) lines.push(`${escapeMarkdown(label)}: ${escapeMarkdown(text)}`);
  const words = lines.join('  \n');
  if (drawing === undefined || drawing.svg.length > LARGEST_DRAWING) return words;
  return `${words}\n\n![${escapeMarkdown(drawing.words)}](${dataAddress(drawing.svg)})`;
}

function toPlainText({ title, about, rows }: Card): string {
  return [`${title} ${about}`, ...rows.map(({ label, text }) => `${label}: ${text}`)].join('\n');
}

/** Words of a note never become markup or a link; a line break in them becomes a blank. */
function escapeMarkdown(text: string): string {
  return text
    .replace(/\s+/g, ' ')
    .replace(/[\\`*_{}[\]#!|~$<>&@]/g, '\\$&')
    .replace(/:\/\//g, '\\://');
}

/** The hover sees no files, so the picture travels inside its address. */
function dataAddress(svg: string): string {
  let bytes = '';
  for (const byte of new TextEncoder().encode(svg)) bytes += String.fromCharCode(byte);
  return `data:image/svg+xml;base64,${btoa(bytes)}`;
}
