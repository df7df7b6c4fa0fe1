// Finding notes and reading them. Nothing outside the root is opened: the root is the folder given, or the folder of
// the note given, and a link that leads out of it is refused.
import {
  closeSync,
  type Dirent,
  fstatSync,
  openSync,
  readdirSync,
  readFileSync,
  readSync,
  realpathSync,
  type Stats,
  statSync,
} from 'node:fs';
import { dirname, join, resolve, sep } from 'node:path';
import { UsageError } from './world.ts';

/** A note is prose with a few fences; a file beyond this is something else, and would only cost time. */
export const MAX_NOTE_BYTES = 1_000_000;

export interface FoundNote {
  /** As reported: the path given, or what was found below it, with forward slashes. */
  readonly path: string;
  readonly file: string;
  /** Real path of the folder outside which nothing is read. */
  readonly root: string;
  /** Named on the command line, and not only come across. */
  readonly named: boolean;
}

export type Reading =
  | { readonly kind: 'text'; readonly text: string }
  /** `problem` is one line for the engineer; `tooLarge` tells the one bound from the other reasons. */
  | { readonly kind: 'refused'; readonly problem: string; readonly tooLarge: boolean };

/** Notes in the order of the paths given, those of a folder by name; each once. Throws a `UsageError` for a path that is not there. */
export function findNotes(paths: readonly string[], cwd: string): FoundNote[] {
  const found = new Map<string, FoundNote>();
  for (const path of paths) {
    for (const note of notesAt(path, cwd)) {
      if (!found.has(note.file)) found.set(note.file, note);
    }
  }
  return [...found.values()];
}

/** Notes are UTF-8; a byte order mark is left out, as editors do. */
export function readNote(note: FoundNote): Reading {
  try {
    const real = realpathSync(note.file);
    if (!isWithin(real, note.root)) {
      return refused('This is a link that leads out of the folder; nothing outside it is read.');
    }
    const bytes = readBounded(real);
    if (bytes === 'not-a-file') return refused('This is not a file.');
    if (bytes === 'too-large') {
      return {
        kind: 'refused',
        problem: `This file is larger than ${MAX_NOTE_BYTES / 1e6} MB, the most that is read as one note.`,
        tooLarge: true,
      };
    }
    return decoded(bytes);
  } catch (error) {
    return refused(`This file cannot be read: ${reasonOf(error)}.`);
  }
}

/** Whether a file that was come across and refused is any of ours: one that never says `tautline` is left alone. */
export function speaksOfTautline({ file, root }: FoundNote): boolean {
  const word = Buffer.from('tautline');
  try {
    const real = realpathSync(file);
    if (!isWithin(real, root) || !statSync(real).isFile()) return false;
    const descriptor = openSync(real, 'r');
    try {
      const chunk = Buffer.alloc(1 << 16);
      // The end of each chunk stands again before the next, so that a word across the border is found.
      let kept = 0;
      for (;;) {
        const read = readSync(descriptor, chunk, kept, chunk.length - kept, null);
        if (read === 0) return false;
        const filled = kept + read;
        if (chunk.subarray(0, filled).includes(word)) return true;
        kept = Math.min(word.length - 1, filled);
        chunk.copyWithin(0, filled - kept, filled);
      }
    } finally {
      closeSync(descriptor);
    }
  } catch {
    return false;
  }
}

export function isWithin(path: string, root: string): boolean {
  return path === root || path.startsWith(root.endsWith(sep) ? root : root + sep);
}

/** The system's word for it, without its call and path: `permission denied`. */
export function reasonOf(error: unknown): string {
  return error instanceof Error ? error.message.replace(/^[A-Z0-9]+: /, '').replace(/, .*$/, '') : String(error);
}

function notesAt(path: string, cwd: string): FoundNote[] {
  const file = resolve(cwd, path);
  const shown = slashed(path).replace(/^(\.\/)+(?=.)/, '');
  if (!isFolder(file, path)) return [{ path: shown, file, root: realpathSync(dirname(file)), named: true }];
  const prefix = shown === '.' ? '' : `${shown.replace(/\/+$/, '')}/`;
  return notesBelow(file, prefix, realpathSync(file));
}

function isFolder(file: string, path: string): boolean {
  let stats: Stats | undefined;
  try {
    stats = statSync(file, { throwIfNoEntry: false });
  } catch (error) {
    throw new UsageError(`${path} cannot be read: ${reasonOf(error)}`);
  }
  if (stats === undefined) throw new UsageError(`${path}: there is no such file or folder`);
  return stats.isDirectory();
}

/** Markdown files below a folder, those of the folder itself first; `node_modules` and dot folders are not entered, links to folders neither. */
function notesBelow(folder: string, prefix: string, root: string): FoundNote[] {
  const entries = entriesOf(folder, prefix).sort((a, b) => (a.name < b.name ? -1 : 1));
  const notes: FoundNote[] = entries
    .filter(entry => !entry.isDirectory() && /\.md$/i.test(entry.name))
    .map(({ name }) => ({ path: prefix + name, file: join(folder, name), root, named: false }));
  const folders = entries.filter(
    entry => entry.isDirectory() && entry.name !== 'node_modules' && !entry.name.startsWith('.'),
  );
  return [...notes, ...folders.flatMap(({ name }) => notesBelow(join(folder, name), `${prefix}${name}/`, root))];
}

function entriesOf(folder: string, prefix: string): Dirent[] {
  try {
    return readdirSync(folder, { withFileTypes: true });
  } catch (error) {
    throw new UsageError(`${prefix || '.'}: the folder cannot be read: ${reasonOf(error)}`);
  }
}

/** Looks before it reads, so that a pipe or a device never holds the run up and a huge file never fills the memory. */
function readBounded(file: string): Buffer | 'not-a-file' | 'too-large' {
  if (!statSync(file).isFile()) return 'not-a-file';
  const descriptor = openSync(file, 'r');
  try {
    return fstatSync(descriptor).size > MAX_NOTE_BYTES ? 'too-large' : readFileSync(descriptor);
  } finally {
    closeSync(descriptor);
  }
}

function decoded(bytes: Buffer): Reading {
  if (bytes.includes(0)) return refused('This file holds NUL characters: it is not a text in UTF-8.');
  try {
    return { kind: 'text', text: new TextDecoder('utf-8', { fatal: true }).decode(bytes) };
  } catch {
    return refused('This file is not a text in UTF-8. Save it in that encoding.');
  }
}

function refused(problem: string): Reading {
  return { kind: 'refused', problem, tooLarge: false };
}

function slashed(path: string): string {
  return sep === '/' ? path : path.replaceAll(sep, '/');
}
