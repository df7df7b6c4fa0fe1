// The YAML block at the head of a note that names it for the printed page.
import { parse } from 'yaml';
import type { FrontMatter } from './result.ts';

export interface FrontMatterBlock {
  readonly values: FrontMatter;
  /** How much of the text it takes, its closing line included; a byte order mark counts. 0 where there is none and no mark. */
  readonly length: number;
}

const KEYS = ['title', 'project', 'number', 'revision', 'status'] as const satisfies readonly (keyof FrontMatter)[];

/** Unknown keys are left alone; what is not YAML is taken as none, and stays out of the Markdown all the same. */
export function readFrontMatter(text: string): FrontMatterBlock {
  const mark = text.charCodeAt(0) === 0xfeff ? 1 : 0;
  if (!text.startsWith('---', mark)) return { values: {}, length: mark };
  const block = /^---[ \t]*(?:\r\n|\n|\r)([\s\S]*?)(?:\r\n|\n|\r)---[ \t]*(?=\r|\n|$)(?:\r\n|\n|\r)?/.exec(
    mark === 0 ? text : text.slice(mark),
  );
  if (block === null) return { values: {}, length: mark };
  return { values: readValues(block[1]!), length: mark + block[0].length };
}

function readValues(block: string): FrontMatter {
  let data: unknown;
  try {
    data = parse(block, { maxAliasCount: 0, logLevel: 'silent' });
  } catch {
    return {};
  }
  if (typeof data !== 'object' || data === null) return {};
  const found: Record<string, string> = {};
  for (const key of KEYS) {
    const value: unknown = Reflect.get(data, key);
    if (typeof value === 'string' || typeof value === 'number') found[key] = String(value);
  }
  return found;
}
