// What was not looked at: what the method leaves out, and what the writer did not ask.
import type { Answer, NoteResult, StructureResult } from '../note/result.ts';
import { showQuantity } from '../quantity/display.ts';
import { counted, escapeHtml, listed, plainHtml } from './html.ts';
import type { ReactionRow } from './reactions-table.ts';

export function notLookedAt(note: NoteResult, result: StructureResult, rows: readonly ReactionRow[]): string {
  const answers = result.answers.flatMap(index => note.answers[index] ?? []);
  const sentences = [
    'Buckling, lateral torsion, connections, second-order effects.',
    ...strength(answers),
    ...uplift(answers, result, rows),
    ...withoutLimit(answers),
    ...withoutSource(answers, result),
  ];
  return (
    `<div class="tl-keep"><h3>Not looked at</h3><p class="tl-small">${sentences.join(' ')}</p>` +
    '<p class="tl-small">These results support a qualified engineer’s judgement. Linear-elastic analysis with small ' +
    'movements; local codes and licensed practice govern.</p></div>'
  );
}

const STRENGTH = /\b(?:stress|moment|sagging|hogging|force|tension|compression|shear)\b/;

function strength(answers: readonly Answer[]): string[] {
  const asked = answers.some(({ kind, measure }) => kind === 'require' && STRENGTH.test(measure));
  return asked ? [] : ['Strength: no requirement asks a stress, a moment or a force.'];
}

/** Supports that hold down somewhere although no requirement looks at their reaction. */
function uplift(answers: readonly Answer[], result: StructureResult, rows: readonly ReactionRow[]): string[] {
  const { structure, display } = result;
  if (structure === undefined) return [];
  const asked = new Set(
    answers.flatMap(({ kind, asked: single }) =>
      kind === 'require' && single?.measure.kind === 'reaction' ? [single.measure.support] : [],
    ),
  );
  const combined = rows.some(({ isCombination }) => isCombination);
  return structure.supports.flatMap(({ point }, s) => {
    if (asked.has(s)) return [];
    let worst: ReactionRow | undefined;
    for (const row of rows) {
      if (combined && !row.isCombination) continue;
      if (upward(row, s) < (worst === undefined ? 0 : upward(worst, s))) worst = row;
    }
    if (worst === undefined || -upward(worst, s) <= 1e-9 * size(worst)) return [];
    const force = showQuantity({ value: -upward(worst, s), dimension: [1, 1, -2, 0, 0] }, display, 'force').text;
    const name = `<i class="tl-name-of-point">${escapeHtml(structure.points[point]?.name ?? '')}</i>`;
    return [
      `Uplift at ${name}: no requirement asks it, and under ${escapeHtml(worst.name)} it holds down ${plainHtml(force)}.`,
    ];
  });
}

function upward({ solution }: ReactionRow, support: number): number {
  return solution.reactions[support]?.y ?? 0;
}

function size({ solution }: ReactionRow): number {
  return Math.max(...solution.reactions.map(({ x, y }) => Math.max(Math.abs(x), Math.abs(y))));
}

function withoutLimit(answers: readonly Answer[]): string[] {
  const names = answers.filter(({ kind }) => kind === 'find').map(({ name }) => escapeHtml(name));
  return names.length === 0 ? [] : [`No limit: ${listed(names)}.`];
}

function withoutSource(answers: readonly Answer[], { structure }: StructureResult): string[] {
  const statements = new Set(
    (structure?.loads ?? [])
      .filter(({ source, kind }) => source === undefined && kind !== 'self-weight')
      .map(({ range }) => range.start),
  );
  const limits = answers.filter(({ kind, source }) => kind === 'require' && source === undefined).length;
  const parts = [
    ...(statements.size === 0 ? [] : [counted(statements.size, 'load')]),
    ...(limits === 0 ? [] : [counted(limits, 'limit')]),
  ];
  return parts.length === 0 ? [] : [`No source: ${listed(parts)}.`];
}
