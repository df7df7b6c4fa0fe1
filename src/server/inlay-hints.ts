// Values beside the text: what a question or a value comes to, at the end of its statement or of its code span.
import type { InlayHint, Range as ProtocolRange } from 'vscode-languageserver';
import type { Answer } from '../note/result.ts';
import type { Range } from '../quantity/range.ts';
import { meets, type OpenNote, toOffsets } from './open-note.ts';
import { requirementInWords, stateInWords } from './words.ts';

export function inlayHints(note: OpenNote, range: ProtocolRange): InlayHint[] {
  const { answers, values, prose } = note.result;
  const asked = toOffsets(note, range);
  const hints: InlayHint[] = [];
  const add = (about: Range, label: string, tooltip?: string): void => {
    if (!meets(about, asked)) return;
    const hint = { position: note.document.positionAt(about.end), label, paddingLeft: true };
    hints.push(tooltip === undefined ? hint : { ...hint, tooltip });
  };
  for (const answer of answers) add(answer.range, answerLabel(answer), requirementInWords(answer));
  for (const value of [...values, ...prose]) if (value.quantity !== undefined) add(value.range, `= ${value.display}`);
  return hints;
}

function answerLabel(answer: Answer): string {
  if (answer.quantity === undefined) return stateInWords(answer);
  return answer.kind === 'find' ? `= ${answer.display}` : `= ${answer.display}, ${stateInWords(answer)}`;
}
