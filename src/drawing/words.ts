// Words on a drawing: runs of text, how wide they are, and how they are written as SVG. Text from a note is escaped here.
import type { Ink, WordRole } from './ink.ts';

/** `point`: a point's name, in italic. `soft` and `load` change the colour within a label. */
export interface Run {
  readonly text: string;
  readonly as?: 'point' | 'bold' | 'soft' | 'load';
}

export type Label = readonly Run[];

export type Anchor = 'start' | 'middle' | 'end';

/** px. Labels are 12, second lines 11. */
export type WordSize = 12 | 11;

export function plain(text: string): Label {
  return [{ text }];
}

export function pointName(name: string): Run {
  return { text: name, as: 'point' };
}

export function joined(...parts: readonly (Label | string)[]): Label {
  return parts.flatMap(part => (typeof part === 'string' ? plain(part) : part));
}

export function textOf(label: Label): string {
  return label.map(run => run.text).join('');
}

/** px, close enough to keep labels apart: the advance widths of a common sans serif. */
export function widthOf(label: Label, size: WordSize): number {
  let sum = 0;
  for (const run of label) {
    const weight = run.as === 'bold' ? 1.07 : 1;
    for (const character of run.text) sum += weight * advance(character);
  }
  return sum * size;
}

/** The inside of a text element. */
export function runsToSvg(label: Label, ink: Ink): string {
  return label.map(run => runToSvg(run, ink)).join('');
}

function runToSvg(run: Run, ink: Ink): string {
  const text = escapeText(run.text);
  if (run.as === undefined) return text;
  switch (run.as) {
    case 'point':
      return `<tspan font-style="italic">${text}</tspan>`;
    case 'bold':
      return `<tspan font-weight="600">${text}</tspan>`;
    case 'soft':
    case 'load':
      return `<tspan ${ink.words(run.as satisfies WordRole)}>${text}</tspan>`;
  }
}

/** For the text of an element or a quoted attribute. Characters that XML does not allow, and those that turn the direction of text, become a mark. */
export function escapeText(text: string): string {
  let escaped = '';
  for (const character of text) {
    escaped += isForbidden(character.codePointAt(0) ?? 0) ? '\ufffd' : (ENTITIES[character] ?? character);
  }
  return escaped;
}

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** Whether XML does not allow the character, or it turns the direction of the text around it. */
function isForbidden(code: number): boolean {
  if (code < 0x20) return code !== 0x09 && code !== 0x0a && code !== 0x0d;
  return (
    (code >= 0x7f && code <= 0x9f) ||
    (code >= 0x202a && code <= 0x202e) ||
    (code >= 0x2066 && code <= 0x2069) ||
    (code >= 0xd800 && code <= 0xdfff) ||
    code === 0xfffe ||
    code === 0xffff
  );
}

/** Advance over the size of the type. */
function advance(character: string): number {
  const known = ADVANCES.get(character);
  if (known !== undefined) return known;
  const code = character.codePointAt(0) ?? 0;
  if (code >= 0x300 && code < 0x370) return 0;
  if (code >= 0x2e80) return 1;
  return character.toLowerCase() === character ? 0.556 : 0.69;
}

const ADVANCES: ReadonlyMap<string, number> = new Map([
  ...spread(' .,:;/!|ftI', 0.278),
  ...spread('ijl', 0.222),
  ...spread('r()-', 0.333),
  ...spread('cksvxyzJ', 0.5),
  ...spread('+−=<>×', 0.584),
  ...spread('wCDHNRU', 0.722),
  ...spread('mM', 0.833),
  ...spread('GOQ', 0.778),
  ...spread('W', 0.944),
  ...spread('\u2009\u202f', 0.2),
  ...spread('²³⁴', 0.35),
]);

function spread(characters: string, width: number): [string, number][] {
  return [...characters].map(character => [character, width]);
}
