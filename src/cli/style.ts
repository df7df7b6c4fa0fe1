// Colour on a terminal. Nothing is told by colour alone, so that leaving it out loses nothing.
import type { Sink, World } from './world.ts';

export const COLOUR_CHOICES = ['auto', 'always', 'never'] as const;
export type ColourChoice = (typeof COLOUR_CHOICES)[number];

/** Each wraps a text that is safe already. */
export interface Style {
  readonly strong: (text: string) => string;
  readonly soft: (text: string) => string;
  readonly error: (text: string) => string;
  readonly warning: (text: string) => string;
  readonly hint: (text: string) => string;
}

/** `auto` follows the terminal; a NO_COLOR that is not empty (no-color.org) and a dumb terminal mean none. */
export function wantsColour(choice: ColourChoice, sink: Sink, env: World['env']): boolean {
  if (choice !== 'auto') return choice === 'always';
  return sink.isTerminal && !env.NO_COLOR && env.TERM !== 'dumb';
}

export function styleOf(coloured: boolean): Style {
  return coloured ? COLOURED : PLAIN;
}

const plain = (text: string): string => text;
const PLAIN: Style = { strong: plain, soft: plain, error: plain, warning: plain, hint: plain };

/** Select Graphic Rendition (ECMA-48, 8.3.117): bold, faint, and the terminal's own red, yellow and cyan. */
const COLOURED: Style = {
  strong: rendition(1, 22),
  soft: rendition(2, 22),
  error: rendition(31, 39),
  warning: rendition(33, 39),
  hint: rendition(36, 39),
};

function rendition(on: number, off: number): (text: string) => string {
  return text => (text === '' ? '' : `\u001b[${on}m${text}\u001b[${off}m`);
}
