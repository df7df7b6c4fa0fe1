// `member`, `bar`, `bars` and `group`: chains of points joined by dimensions, and names for several of them.

import type { Range } from '../../quantity/range.ts';
import type { Reader } from '../reader.ts';
import type { Chain, ChainDimension, ChainLeg, Heading, Statement, Value } from '../syntax.ts';
import { beginsQuantity, readValue } from '../values.ts';
import { isHeading } from '../words.ts';
import type { StatementBody, StatementForm } from './form.ts';
import { colon, snippet } from './form.ts';

const CHAIN = 'P {-- [DIMENSION [of SECTION] --] P} [, pulls only | , bears only]';

export const MEMBER: StatementForm = {
  keyword: 'member',
  help: 'A member in bending and axial force, drawn as a chain of points and dimensions.',
  grammar: `member NAME [, SECTION]: ${CHAIN}`,
  examples: [
    'member R1, RHS: A -- 4.8 m -- B -- 1.8 m -- C',
    'member Post: A -- 3.2 m up -- B',
    'member Raf: B -- 6 m right, 0.9 m up -- C',
    'member Brace: B -- 4.1 m at 35 deg -- D',
    'member Ridge: B -- 6 m right at 5.7 deg -- C',
    'member J1, J: A -- 75 mm of Jn -- P -- 3.75 m -- Q -- 75 mm of Jn -- B',
  ],
  skeleton: snippet('member {R1}, {Section}: {A} -- {4.8 m} -- {B}'),
  read: reader => readChained(reader, 'member'),
};

export const BAR: StatementForm = {
  keyword: 'bar',
  help: 'A bar: axial force only, pinned at both ends.',
  grammar: `bar NAME [, SECTION]: ${CHAIN}`,
  examples: ['bar d1, Rod: A -- C', 'bar Rod, R20: T -- B, pulls only'],
  skeleton: snippet('bar {d1}, {Section}: {A} -- {B}'),
  read: reader => readChained(reader, 'bar'),
};

export const BARS: StatementForm = {
  keyword: 'bars',
  help: 'A chain of bars: `bars w` names them w1, w2, w3, and `w` is the group of them.',
  grammar: `bars NAME [, SECTION]: ${CHAIN}`,
  examples: ['bars w, Angle: B -- K -- C -- L'],
  skeleton: snippet('bars {w}, {Section}: {A} -- {B} -- {C}'),
  read: reader => readChained(reader, 'bars'),
};

export const GROUP: StatementForm = {
  keyword: 'group',
  help: 'A name for several members or bars, wherever members are listed or asked about.',
  grammar: 'group NAME: MEMBER {, MEMBER}',
  examples: ['group Roof: R1, R2'],
  skeleton: snippet('group {Roof}: {R1}, {R2}'),
  read: reader => {
    const name = reader.name('the name of the group');
    if (!name || !colon(reader, 'its members')) return undefined;
    const members = reader.names('a member');
    return members && { kind: 'group', name, members };
  },
};

function readChained(reader: Reader, kind: 'member' | 'bar' | 'bars'): StatementBody | undefined {
  const name = reader.name(`the name of the ${kind}`);
  if (!name) return undefined;
  const section = reader.takeMark(',') && reader.name('a section');
  if (reader.failure || !colon(reader, 'its chain of points')) return undefined;
  const chain = readChain(reader);
  const only = chain && readOnly(reader);
  if (!chain || reader.failure) return undefined;
  return { kind, name, ...(section && { section }), chain, ...(only && { only }) };
}

/** `, pulls only` or `, bears only`. */
function readOnly(reader: Reader): Extract<Statement, { readonly kind: 'member' | 'bar' | 'bars' }>['only'] {
  if (!reader.takeMark(',')) return undefined;
  const from = reader.position;
  const word = reader.takeWord('pulls') ?? reader.takeWord('bears');
  if (!word) return reader.dueOneOf('`pulls only` or `bears only`', ['pulls', 'bears']);
  if (!reader.word('only', 'what the bar can do')) return undefined;
  return { kind: word.text === 'pulls' ? 'pulls' : 'bears', range: reader.since(from) };
}

function readChain(reader: Reader): Chain | undefined {
  const from = reader.position;
  if (beginsQuantity(reader)) return reader.due('the point where the chain begins');
  const first = reader.name('the point where the chain begins');
  if (!first) return undefined;
  const legs: ChainLeg[] = [];
  while (reader.isMark('--')) {
    const leg = readLeg(reader);
    if (!leg) return undefined;
    legs.push(leg);
  }
  if (legs.length > 0) return { first, legs, range: reader.since(from) };
  if (reader.isMark('-')) return reader.due('`--` (two hyphens join points)');
  return reader.due('`--` (a chain goes on to a second point)');
}

function readLeg(reader: Reader): ChainLeg | undefined {
  const from = reader.position;
  reader.skip(1);
  if (!beginsQuantity(reader)) {
    const to = reader.name('a point or a dimension');
    if (!to || !endsPoint(reader)) return undefined;
    return { to, range: reader.since(from) };
  }
  const dimension = readDimension(reader);
  if (!dimension) return undefined;
  const section = reader.takeWord('of') && reader.name('a section');
  if (reader.failure || !reader.mark('--', 'the dimension ends at a point')) return undefined;
  if (beginsQuantity(reader)) {
    return reader.due('a point', { hint: 'Two dimensions do not follow one another: name the point between them.' });
  }
  const to = reader.name('a point');
  if (!to || !endsPoint(reader)) return undefined;
  return { dimension, ...(section && { section }), to, range: reader.since(from) };
}

/** A name in a chain is a point; a value that begins with a name is told from it by what follows. */
function endsPoint(reader: Reader): boolean {
  const token = reader.peek();
  if (!token || token.kind === 'string' || reader.isMark('--') || reader.isMark(',')) return true;
  const hint = 'A name in a chain is a point; the name of a value stands in parentheses: `(L)`.';
  reader.due('`--` or the end of the chain', reader.isMark('-') ? { hint: 'Two hyphens join points.' } : { hint });
  return false;
}

/** `4.8 m`, `6 m right, 0.9 m up`, `4.1 m at 35 deg`, `6 m right at 5.7 deg`. Without a heading it goes right. */
function readDimension(reader: Reader): ChainDimension | undefined {
  const from = reader.position;
  const distance = readValue(reader);
  if (!distance) return undefined;
  if (reader.takeWord('at')) {
    const angle = readValue(reader);
    return angle && { kind: 'polar', length: distance, angle, range: reader.since(from) };
  }
  const heading = takeHeading(reader) ?? 'right';
  const parts = [{ distance, heading, range: reader.since(from) }];
  if (reader.takeWord('at')) {
    if (heading !== 'left' && heading !== 'right') {
      const message = 'A pitch stands behind `left` or `right`, which say the run.';
      return reader.fail('bad-statement', reader.since(reader.position - 1), message);
    }
    const pitch = readValue(reader);
    return pitch && { kind: 'pitched', run: distance, heading, pitch, range: reader.since(from) };
  }
  if (reader.takeMark(',')) {
    const part = readSecondPart(reader);
    if (!part) return undefined;
    parts.push(part);
  }
  return { kind: 'parts', parts, range: reader.since(from) };
}

function readSecondPart(reader: Reader): { distance: Value; heading: Heading; range: Range } | undefined {
  const from = reader.position;
  const distance = readValue(reader);
  if (!distance) return undefined;
  const heading = takeHeading(reader);
  if (!heading) return reader.dueOneOf('a direction', ['up', 'down', 'left', 'right']);
  return { distance, heading, range: reader.since(from) };
}

function takeHeading(reader: Reader): Heading | undefined {
  const token = reader.peek();
  if (token?.kind !== 'word' || !isHeading(token.text)) return undefined;
  reader.skip(1);
  return token.text;
}
