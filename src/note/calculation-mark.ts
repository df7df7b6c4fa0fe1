// The quick look that decides whether a text is any business of ours. It stands alone, so that who only looks on (an
// editor with a README open, a folder being searched) loads nothing else.

/** Whether the text can hold a fence of ours at all; cheap, and never wrong when it says no. */
export function mayHoldCalculation(text: string): boolean {
  return /[`~]{3,}[ \t]*tautline/.test(text);
}
