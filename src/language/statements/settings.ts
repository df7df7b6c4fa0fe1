// `display` chooses the units that are shown; `assume` states a modelling choice.

import type { Reader } from '../reader.ts';
import { print } from '../reader.ts';
import type { DisplaySetting, Name } from '../syntax.ts';
import type { StatementForm } from './form.ts';
import { colon, snippet } from './form.ts';

export const DISPLAY: StatementForm = {
  keyword: 'display',
  help: 'The units in which results are shown: metric (the default), us, or by kind of quantity.',
  grammar: 'display: metric | us | KIND UNITS {, KIND UNITS}',
  examples: ['display: us', 'display: force kN, length m, deflection mm, moment kN m, stress MPa'],
  skeleton: snippet('display: {metric|us}'),
  read: reader => {
    if (!colon(reader, 'the units')) return undefined;
    const setting = readSetting(reader);
    return setting && { kind: 'display', setting };
  },
};

export const ASSUME: StatementForm = {
  keyword: 'assume',
  help: 'A modelling choice, shown with the working: shear deformation, axially stiff, or a sentence in quotes.',
  grammar: 'assume: shear deformation | axially stiff | "SENTENCE"',
  examples: ['assume: shear deformation', 'assume: "Base plate on packers acts as a pin"'],
  skeleton: snippet('assume: "{Sentence}"'),
  read: reader => {
    if (!colon(reader, 'the assumption')) return undefined;
    const text = reader.quoted();
    if (text) return { kind: 'assume', assumption: { kind: 'sentence', text } };
    for (const kind of ['shear deformation', 'axially stiff'] as const) {
      const [first, second] = kind.split(' ') as [string, string]; // two words each
      if (!reader.isWord(first) || !reader.isWord(second, 1)) continue;
      reader.skip(2);
      return { kind: 'assume', assumption: { kind } };
    }
    return reader.due('`shear deformation`, `axially stiff` or a sentence in quotes');
  },
};

function readSetting(reader: Reader): DisplaySetting | undefined {
  for (const kind of ['metric', 'us'] as const) if (reader.takeWord(kind)) return { kind };
  const units: Extract<DisplaySetting, { readonly kind: 'units' }>['units'][number][] = [];
  do {
    const name = readKind(reader);
    if (!name) return undefined;
    const from = reader.position;
    while (!reader.atEnd && !reader.isMark(',') && reader.peek()!.kind !== 'string') reader.skip(1);
    if (reader.position === from) return reader.due(`the units of ${name.text}`);
    units.push({ name, units: print(reader.tokens.slice(from, reader.position)), range: reader.since(from) });
  } while (reader.takeMark(','));
  return { kind: 'units', units };
}

/** `line load` is a kind of two words. */
function readKind(reader: Reader): Name | undefined {
  const from = reader.position;
  const name = reader.name('`metric`, `us` or a kind of quantity');
  if (name?.text !== 'line' || !reader.takeWord('load')) return name;
  return { text: 'line load', range: reader.since(from) };
}
