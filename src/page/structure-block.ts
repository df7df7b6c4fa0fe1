// Everything that the page shows of one structure, top to bottom: head line, what is wrong, drawings, inputs, answers,
// reactions, what was not looked at. `show` statements choose among the middle parts and order them.
import type { ShowBody } from '../language/syntax.ts';
import type { NoteResult, StructureResult } from '../note/result.ts';
import { answersTable } from './answers-table.ts';
import { headLine } from './head.ts';
import { escapeHtml } from './html.ts';
import { inputSchedule } from './inputs.ts';
import { instability } from './instability.ts';
import { notLookedAt } from './not-looked-at.ts';
import { plates } from './plates.ts';
import { reactionRows, reactionsTable } from './reactions-table.ts';
import { combinationsUnder, shownField } from './shown-fields.ts';

/** `messages`: what is wrong with it, as HTML. */
export function structureBlock(note: NoteResult, index: number, messages: string): string {
  const result = note.structures[index];
  if (result === undefined) return '';
  const shown = result.shows.map(({ show }) => show);
  const parts =
    shown.length === 0 ? usualParts(note, result, index) : shown.map(show => part(note, result, index, show));
  // Without a result there is nothing that a caution could be about.
  const last =
    result.withheld === undefined ? notLookedAt(note, result, reactionRows(result, result.combinations)) : '';
  return [headLine(note, result), instability(note, result), messages, ...parts, last].join('');
}

/** What a page without `show` statements shows. */
function usualParts(note: NoteResult, result: StructureResult, index: number): string[] {
  const { structure, display } = result;
  return [
    structure === undefined ? '' : plates(result, structure, index),
    inputSchedule(note, result, false),
    answersTable(note, result),
    structure === undefined ? '' : reactionsTable(structure, reactionRows(result, result.combinations), display),
  ];
}

function part(note: NoteResult, result: StructureResult, index: number, show: ShowBody): string {
  const { structure, display } = result;
  switch (show.kind) {
    case 'inputs':
      return inputSchedule(note, result, true);
    case 'results':
      return answersTable(note, result);
    case 'drawing':
      return structure === undefined ? '' : plates(result, structure, index);
    case 'reactions': {
      if (structure === undefined) return '';
      const chosen = show.byCase
        ? result.combinations.filter(({ kind }) => kind === 'case')
        : show.under === undefined
          ? result.combinations
          : combinationsUnder(result, show.under);
      return reactionsTable(structure, reactionRows(result, chosen), display);
    }
    case 'field': {
      const drawn = structure === undefined ? undefined : shownField(result, structure, show);
      return drawn ?? notDrawn(note, show);
    }
    case 'working':
    case 'contributions':
      return notDrawn(note, show);
  }
}

function notDrawn(note: NoteResult, { range }: ShowBody): string {
  const words = note.text.slice(range.start, range.end).replace(/\s+/g, ' ');
  return `<p class="tl-aside">${escapeHtml(words)}: not drawn by this version.</p>`;
}
