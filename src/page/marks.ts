// State marks and the bar of use. A mark never stands without its word.
import type { Answer } from '../note/result.ts';

export type State = 'met' | 'not met' | 'not checked' | 'withheld';

export function stateOf(answer: Answer): State {
  if (answer.quantity === undefined) return 'withheld';
  switch (answer.status) {
    case 'ok':
      return 'met';
    case 'fails':
      return 'not met';
    case 'none':
      return 'not checked';
  }
}

export function stateMark(state: State): string {
  return `<svg class="tl-mark" viewBox="0 0 12 12" width="12" height="12" aria-hidden="true" fill="none" stroke="currentColor" stroke-width="1.6" stroke-linecap="round" stroke-linejoin="round">${SHAPES[state]}</svg>`;
}

/** 48 px to the limit, marked by a tick; hollow beyond it. At most so far beyond as the cell allows. */
export function useBar(use: number): string {
  const width = Math.min(use, 1.28) * 48;
  const inside = Math.min(width, 48).toFixed(2);
  const over =
    width > 48
      ? `<rect x="48" y="2.95" width="${(width - 48).toFixed(2)}" height="4.1" stroke="currentColor" stroke-width="0.9"/>`
      : '';
  return (
    '<svg class="tl-use" viewBox="0 0 62 10" width="62" height="10" aria-hidden="true" fill="none">' +
    '<path d="M0 5H48" stroke="currentColor" stroke-width="0.75"/>' +
    `<rect x="0" y="2.5" width="${inside}" height="5" fill="currentColor"/>${over}` +
    '<path d="M48 0V10" stroke="currentColor" stroke-width="1.5"/></svg>'
  );
}

const SHAPES: Readonly<Record<State, string>> = {
  met: '<path d="M1.5 6.5L4.8 10L10.5 2.5"/>',
  'not met':
    '<rect x="0" y="0" width="12" height="12" rx="1" fill="currentColor" stroke="none"/>' +
    '<path d="M3.2 3.2L8.8 8.8M8.8 3.2L3.2 8.8" style="stroke:var(--tl-paper,#fff)"/>',
  'not checked': '<path d="M2.5 6H9.5"/>',
  withheld: '<rect x="0.8" y="0.8" width="10.4" height="10.4" rx="1"/>',
};
