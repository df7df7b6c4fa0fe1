// `tautline check PATH…`: solves notes and reports answers and mistakes, for a person or as JSON.
import { evaluateNote } from '../note/evaluate.ts';
import { isWell, reportOf } from '../note/report.ts';
import type { NoteResult } from '../note/result.ts';
import { type FoundNote, findNotes, readNote, speaksOfTautline } from './files.ts';
import { noteText, summaryText } from './note-text.ts';
import type { Arguments } from './options.ts';
import { refusedNote } from './refused-note.ts';
import { safeJson } from './safe-text.ts';
import { type ColourChoice, styleOf, wantsColour } from './style.ts';
import { EXIT, UsageError, type World } from './world.ts';

const WIDTH_WITHOUT_TERMINAL = 118;

export function check({ positionals, flags, values }: Arguments, world: World): number {
  if (positionals.length === 0) throw new UsageError('check needs the path of a note or of a folder');
  const results = findNotes(positionals, world.cwd).flatMap(solve);
  if (flags.json) world.out.write(`${safeJson(reportOf(results))}\n`);
  else writeForPerson(results, world, (values.color ?? 'auto') as ColourChoice);
  return results.every(isWell) ? EXIT.well : EXIT.attention;
}

/** Nothing for a file that was only come across and is no calculation. */
function solve(note: FoundNote): NoteResult[] {
  const reading = readNote(note);
  if (reading.kind === 'refused') {
    if (!note.named && !speaksOfTautline(note)) return [];
    return [refusedNote(note.path, reading.tooLarge ? 'too-large' : 'unreadable-note', reading.problem)];
  }
  const result = evaluateNote(reading.text, { path: note.path });
  return note.named || result.isCalculation ? [result] : [];
}

function writeForPerson(results: readonly NoteResult[], world: World, colour: ColourChoice): void {
  const style = styleOf(wantsColour(colour, world.out, world.env));
  const width = world.out.columns ?? WIDTH_WITHOUT_TERMINAL;
  for (const result of results) world.out.write(`${noteText(result, width, style)}\n`);
  if (results.length === 0) world.error.write('No note with a tautline fence was found.\n');
  else world.out.write(summaryText(results, style));
}
