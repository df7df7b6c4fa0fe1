// Text from a note on its way to a terminal: nothing in it may steer the terminal or reorder what is read, and its width
// must be known for carets and columns to stand under the words.

/**
 * C0 and C1 controls, the marks that reorder text (bidirectional), line and paragraph separators, the byte order mark,
 * interlinear and tag characters, and halves of surrogate pairs.
 */
const UNSAFE =
  // biome-ignore lint/suspicious/noControlCharactersInRegex: they are what is looked for.
  /[\u0000-\u001f\u007f-\u009f\u061c\u200e\u200f\u2028-\u202e\u2066-\u206f\ufeff\ufff9-\ufffb\u{e0000}-\u{e007f}]|\p{Surrogate}/gu;

/** The text with every unsafe character told by its number, `‹U+202E›`; a tab becomes one space. */
export function safeText(text: string): string {
  return text.replace(UNSAFE, character =>
    character === '\t' ? ' ' : `‹U+${character.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0')}›`,
  );
}

/** JSON with the unsafe characters that `JSON.stringify` leaves as they are written as escapes. */
export function safeJson(value: unknown): string {
  return JSON.stringify(value, null, 2).replace(UNSAFE, character => {
    if (character === '\n') return character;
    return Array.from({ length: character.length }, (_, unit) => escapeUnit(character.charCodeAt(unit))).join('');
  });
}

/** Columns that a terminal gives to safe text: none to combining marks, two to wide East Asian characters and pictures. */
export function widthOf(text: string): number {
  if (PLAIN.test(text)) return text.length;
  let width = 0;
  for (const character of text) {
    if (!ZERO_WIDTH.test(character)) width += WIDE.test(character) ? 2 : 1;
  }
  return width;
}

/** Latin letters, dashes, quotes, arrows and signs: one column each, known without the slow look at Unicode's properties. */
const PLAIN = /^[ -~\u00a0-\u00ac\u00ae-\u02ff\u2010-\u2027\u2190-\u22ff]*$/;
const ZERO_WIDTH = /^[\p{Mn}\p{Me}\p{Cf}]$/u;
const WIDE =
  /^[\p{Script=Han}\p{Script=Hiragana}\p{Script=Katakana}\p{Script=Hangul}\u3000-\u303e\uff01-\uff60\uffe0-\uffe6\p{Emoji_Presentation}]$/u;

function escapeUnit(unit: number): string {
  return `\\u${unit.toString(16).padStart(4, '0')}`;
}
