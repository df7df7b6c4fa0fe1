// Quick fixes: the edits that diagnostics bring along.
import { type CodeAction, CodeActionKind, type Range as ProtocolRange } from 'vscode-languageserver';
import { meets, type OpenNote, toOffsets, toProtocol } from './open-note.ts';

export function codeActions(note: OpenNote, range: ProtocolRange): CodeAction[] {
  const asked = toOffsets(note, range);
  const actions: CodeAction[] = [];
  for (const { fix, range: about } of note.result.diagnostics) {
    if (fix === undefined || !meets(about, asked)) continue;
    const edits = fix.edits.map(edit => ({ range: toProtocol(note, edit.range), newText: edit.text }));
    actions.push({
      title: fix.title,
      kind: CodeActionKind.QuickFix,
      isPreferred: true,
      edit: { changes: { [note.document.uri]: edits } },
    });
  }
  return actions;
}
