// A structure that is not held: how it can move, beside the words that say so.
import { mechanismDrawing } from '../drawing/index.ts';
import type { NoteResult, StructureResult } from '../note/result.ts';
import { stateMark } from './marks.ts';
import { messageHtml } from './messages.ts';
import { diagnosticsIn } from './note-index.ts';

/** So many independent ways to move are drawn. */
const MOST = 3;

export function instability(note: NoteResult, { structure, analysis, range, remedies }: StructureResult): string {
  if (structure === undefined || analysis === undefined || analysis.stability.stable) return '';
  const { mechanisms } = analysis.stability;
  if (mechanisms.length === 0) return '';
  const diagnostic = diagnosticsIn(note, range).find(({ code }) => code === 'unstable-structure');
  const words = diagnostic === undefined ? '' : `<p>${messageHtml(diagnostic.message)}</p>`;
  const mend = remedies.length > 0 ? remedyList(remedies) : hintOf(diagnostic?.hint);
  const drawings = mechanisms
    .slice(0, MOST)
    .map(mechanism => `<figure>${mechanismDrawing(structure, mechanism, 'page')}</figure>`);
  return (
    `<div class="tl-keep"><h3>Not held</h3><div class="tl-unheld"><div>${drawings.join('')}</div>` +
    `<div class="tl-message"><p><b>${stateMark('withheld')}withheld</b></p>${words}${mend}</div></div></div>`
  );
}

/** Changes that were each tried and found to hold it. */
function remedyList(remedies: readonly string[]): string {
  const items = remedies.map(words => `<li>${messageHtml(words)}</li>`).join('');
  return `<p class="tl-small">Each of these was tried and holds it:</p><ul class="tl-small">${items}</ul>`;
}

function hintOf(hint: string | undefined): string {
  return hint === undefined ? '' : `<p class="tl-small tl-soft-text">${messageHtml(hint)}</p>`;
}
