// Images of a note, taken into the page so that it stands alone. Only files within the root are read.
import { readFileSync, realpathSync, statSync } from 'node:fs';
import { dirname, extname, resolve } from 'node:path';
import { type FoundNote, isWithin } from './files.ts';

/** A page of a few pictures stays one that can be mailed. */
const MAX_IMAGE_BYTES = 4_000_000;

/** As an image a drawing in SVG runs no script and fetches nothing. */
const MEDIA_TYPES: Readonly<Record<string, string>> = {
  '.png': 'image/png',
  '.jpg': 'image/jpeg',
  '.jpeg': 'image/jpeg',
  '.gif': 'image/gif',
  '.webp': 'image/webp',
  '.svg': 'image/svg+xml',
};

/** A data URI for the source of an image; undefined for what lies elsewhere, is no image or is too large. */
export function imageReader(note: FoundNote): (source: string) => string | undefined {
  return source => {
    const type = MEDIA_TYPES[extname(source).toLowerCase()];
    if (type === undefined || /^[a-z][a-z0-9+.-]*:|^\/\//i.test(source)) return undefined;
    try {
      const file = realpathSync(resolve(dirname(note.file), decodeURIComponent(source)));
      const stats = statSync(file);
      if (!isWithin(file, note.root) || !stats.isFile() || stats.size > MAX_IMAGE_BYTES) return undefined;
      return `data:${type};base64,${readFileSync(file).toString('base64')}`;
    } catch {
      return undefined;
    }
  };
}
