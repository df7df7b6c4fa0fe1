// `tautline print NOTE -o FILE`: a note with its results as one HTML page that needs nothing else.
import { readFileSync, realpathSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import packageFile from '../../package.json' with { type: 'json' };
import { evaluateNote } from '../note/evaluate.ts';
import { isWell } from '../note/report.ts';
import type { NoteResult } from '../note/result.ts';
import { printPage } from '../page/index.ts';
import { type FoundNote, findNotes, readNote, reasonOf } from './files.ts';
import { imageReader } from './images.ts';
import { summaryText } from './note-text.ts';
import type { Arguments } from './options.ts';
import { safeText } from './safe-text.ts';
import { styleOf } from './style.ts';
import { EXIT, UsageError, type World } from './world.ts';

/** A page is well printed whatever it says: what is not met or wrong is told on it, and in a line here. */
export function print({ positionals, values }: Arguments, world: World): number {
  const note = oneNote(positionals, world.cwd);
  const reading = readNote(note);
  if (reading.kind === 'refused') {
    world.error.write(`${safeText(note.path)}: ${reading.problem}\n`);
    return EXIT.attention;
  }
  const result = evaluateNote(reading.text, { path: note.path });
  const page = printPage(result, {
    // Two folders up from the source and from the bundle alike.
    stylesheet: readFileSync(new URL('../../media/tautline.css', import.meta.url), 'utf8'),
    version: packageFile.version,
    imageOf: imageReader(note),
  });
  if (values.output === undefined) world.out.write(page);
  else {
    writeWhole(resolve(world.cwd, values.output), page, note);
    world.out.write(`${safeText(values.output)}: ${stateLine(result)}`);
  }
  return EXIT.well;
}

function oneNote(paths: readonly string[], cwd: string): FoundNote {
  if (paths.length !== 1) throw new UsageError('print needs the path of one note');
  const [note] = findNotes(paths, cwd);
  if (note === undefined || !note.named) throw new UsageError(`${paths[0]} is a folder; print takes one note`);
  return note;
}

function stateLine(result: NoteResult): string {
  const plain = styleOf(false);
  return isWell(result) ? 'written\n' : `written; ${summaryText([result], plain)}`;
}

/** The whole page or nothing: a reader never sees half of it, and a failure leaves what was there. */
function writeWhole(file: string, page: string, note: FoundNote): void {
  const there = statSync(file, { throwIfNoEntry: false });
  if (there?.isDirectory()) throw new UsageError(`${file} is a folder`);
  if (there !== undefined && realpathSync(file) === realpathSync(note.file)) {
    throw new UsageError('the page would overwrite its note');
  }
  const draft = join(dirname(file), `.tautline-${process.pid}-${Date.now()}`);
  try {
    writeFileSync(draft, page, { flag: 'wx' });
    renameSync(draft, file);
  } catch (error) {
    rmSync(draft, { force: true });
    throw new UsageError(`${file} cannot be written: ${reasonOf(error)}`);
  }
}
