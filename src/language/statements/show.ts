// `show` says what the page shows of a structure.

import { readMeasure, readUnder } from '../measures.ts';
import type { Reader } from '../reader.ts';
import type { ShowBody } from '../syntax.ts';
import { MEASURES } from '../words.ts';
import type { StatementForm } from './form.ts';
import { colon, snippet } from './form.ts';

export const SHOW: StatementForm = {
  keyword: 'show',
  help: 'What the page shows of the structure, in this order.',
  grammar:
    'show: inputs | drawing | results | reactions [under COMBINATION | by case] | ' +
    'working of RESULT [by direct integration | by conjugate beam] | contributions to RESULT | [envelope of] MEASURE [under COMBINATION]',
  examples: [
    'show: reactions under service',
    'show: working of tip',
    'show: moment in R1 under service',
    'show: envelope of moment in R1 under strength',
  ],
  skeleton: snippet('show: {inputs|drawing|results|reactions}'),
  read: reader => {
    if (!colon(reader, 'what is shown')) return undefined;
    const show = readShow(reader);
    return show && { kind: 'show', show };
  },
};

const WORDS = ['inputs', 'drawing', 'results', 'reactions', 'working', 'contributions', 'envelope'] as const;

function readShow(reader: Reader): ShowBody | undefined {
  const from = reader.position;
  const word = WORDS.find(known => reader.takeWord(known));
  switch (word) {
    case 'inputs':
    case 'drawing':
    case 'results':
      return { kind: word, range: reader.since(from) };
    case 'reactions':
      return readReactions(reader, from);
    case 'working':
      return readWorking(reader, from);
    case 'contributions': {
      const to = reader.word('to', 'a result') && reader.name('a result');
      return to && { kind: word, to, range: reader.since(from) };
    }
    case 'envelope':
      return reader.word('of', 'a measure') && readField(reader, from, true);
    case undefined: {
      const token = reader.peek();
      if (token?.kind !== 'word' || !Object.hasOwn(MEASURES, token.text)) {
        return reader.dueOneOf('what to show', [...WORDS, ...Object.keys(MEASURES)]);
      }
      return readField(reader, from, false);
    }
  }
}

function readReactions(reader: Reader, from: number): ShowBody | undefined {
  if (reader.takeWord('by')) {
    return reader.word('case', 'one row for each') && { kind: 'reactions', byCase: true, range: reader.since(from) };
  }
  const under = reader.isWord('under') ? readUnder(reader) : undefined;
  if (reader.failure) return undefined;
  return { kind: 'reactions', ...(under && { under }), byCase: false, range: reader.since(from) };
}

function readWorking(reader: Reader, from: number): ShowBody | undefined {
  const of = reader.word('of', 'a result') && reader.name('a result');
  if (!of) return undefined;
  if (!reader.takeWord('by')) return { kind: 'working', of, range: reader.since(from) };
  for (const by of ['direct integration', 'conjugate beam'] as const) {
    const [first, second] = by.split(' ') as [string, string]; // two words each
    if (!reader.isWord(first) || !reader.isWord(second, 1)) continue;
    reader.skip(2);
    return { kind: 'working', of, by, range: reader.since(from) };
  }
  return reader.due('`direct integration` or `conjugate beam`');
}

function readField(reader: Reader, from: number, envelope: boolean): ShowBody | undefined {
  const measure = readMeasure(reader);
  const under = measure && reader.isWord('under') ? readUnder(reader) : undefined;
  if (!measure || reader.failure) return undefined;
  return { kind: 'field', envelope, measure, ...(under && { under }), range: reader.since(from) };
}
