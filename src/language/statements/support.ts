// `support`: what holds a point.

import type { Reader } from '../reader.ts';
import type { FreedomName, SupportItem } from '../syntax.ts';
import { readValue } from '../values.ts';
import type { StatementForm } from './form.ts';
import { colon, snippet } from './form.ts';

export const SUPPORT: StatementForm = {
  keyword: 'support',
  help: 'Holds a point: pinned, roller, fixed, guided, any set of x, y, rotation, or springs.',
  grammar:
    'support P: pinned | roller [on ANGLE] | fixed | guided | hold x|y|rotation {, …} | spring VALUE x|y|rotation | bears only {, …}',
  examples: [
    'support A: pinned',
    'support C: roller on 30 deg',
    'support F: hold x, rotation',
    'support G: spring 12 kN/mm y, spring 4 MN m/rad rotation',
    'support H: roller, bears only',
  ],
  skeleton: snippet('support {A}: {pinned|roller|fixed|guided}'),
  read: reader => {
    const point = reader.name('a point');
    if (!point || !colon(reader, 'how it is held')) return undefined;
    const items: SupportItem[] = [];
    do {
      const item = readItem(reader);
      if (!item) return undefined;
      items.push(item);
    } while (reader.takeMark(','));
    return { kind: 'support', point, items };
  },
};

const WORDS = ['pinned', 'roller', 'fixed', 'guided', 'hold', 'spring', 'bears only'] as const;
const FREEDOMS: readonly FreedomName[] = ['x', 'y', 'rotation'];

function readItem(reader: Reader): SupportItem | undefined {
  const from = reader.position;
  for (const kind of ['pinned', 'fixed', 'guided'] as const) {
    if (reader.takeWord(kind)) return { kind, range: reader.since(from) };
  }
  if (reader.takeWord('roller')) {
    const on = reader.takeWord('on') && readValue(reader);
    return reader.failure ? undefined : { kind: 'roller', ...(on && { on }), range: reader.since(from) };
  }
  if (reader.takeWord('hold')) {
    const freedoms = readFreedoms(reader);
    return freedoms && { kind: 'hold', freedoms, range: reader.since(from) };
  }
  if (reader.takeWord('spring')) {
    const stiffness = readValue(reader);
    const freedom = stiffness && (takeFreedom(reader) ?? reader.dueOneOf('the direction of the spring', FREEDOMS));
    return freedom && { kind: 'spring', stiffness, freedom, range: reader.since(from) };
  }
  if (reader.takeWord('bears')) {
    return reader.word('only', 'what the support can do') && { kind: 'bears-only', range: reader.since(from) };
  }
  if (FREEDOMS.some(freedom => reader.isWord(freedom))) {
    return reader.due('`hold` or another support', { hint: `Write \`hold ${reader.peek()!.text}\`.` });
  }
  return reader.dueOneOf('a kind of support', WORDS);
}

/** Directions go on until another word. */
function readFreedoms(reader: Reader): FreedomName[] | undefined {
  const freedoms: FreedomName[] = [];
  do {
    const freedom = takeFreedom(reader);
    if (!freedom) return reader.dueOneOf('a direction to hold', FREEDOMS);
    freedoms.push(freedom);
  } while (FREEDOMS.some(freedom => reader.isMark(',') && reader.isWord(freedom, 1)) && reader.takeMark(','));
  return freedoms;
}

function takeFreedom(reader: Reader): FreedomName | undefined {
  return FREEDOMS.find(freedom => reader.takeWord(freedom));
}
