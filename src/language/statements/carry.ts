// `carry` takes a support reaction of another structure and puts it, reversed, on this one, case by case.

import { readComponent } from '../measures.ts';
import { readFromTo, readPlace } from '../places.ts';
import type { Reader } from '../reader.ts';
import type { CarryBody, Quoted, Value } from '../syntax.ts';
import { readValue } from '../values.ts';
import type { StatementForm } from './form.ts';
import { colon, snippet } from './form.ts';
import { readNumberOrParentheses } from './load.ts';

export const CARRY: StatementForm = {
  keyword: 'carry',
  help: 'Carries a support reaction of another structure onto a point or along a member of this one.',
  grammar:
    'carry: [FACTOR *] reaction of STRUCTURE at P [vertical | horizontal | moment] [every VALUE] [from "PATH"] ' +
    'onto PLACE [in MEMBER] | onto MEMBER [from END to END]',
  examples: [
    'carry: reaction of Rafter at B onto D',
    'carry: reaction of Joist at A every 0.4 m onto Beam from P to Q',
    'carry: 2 * reaction of Joist at A vertical onto D',
    'carry: reaction of Rafter at B from "rafter.md" onto D',
  ],
  skeleton: snippet('carry: reaction of {Structure} at {A} onto {D}'),
  read: reader => {
    if (!colon(reader, 'what is carried')) return undefined;
    const carry = readCarry(reader);
    return carry && { kind: 'carry', carry };
  },
};

function readCarry(reader: Reader): CarryBody | undefined {
  const start = reader.position;
  const factor = reader.peek()?.kind === 'number' || reader.isMark('(') ? readNumberOrParentheses(reader) : undefined;
  if (reader.failure) return undefined;
  if (factor) reader.takeMark('*') ?? reader.takeMark('×');
  if (!reader.word('reaction', 'what is carried') || !reader.word('of', 'the other structure')) return undefined;
  const of = reader.name('a structure');
  if (!of || !reader.word('at', 'the point of its support')) return undefined;
  const at = reader.name('a point');
  if (!at) return undefined;
  const component = readComponent(reader);
  const source = readSource(reader);
  if (!source || !reader.word('onto', 'a place or a member of this structure')) return undefined;
  const onto = source.every ? readOntoMember(reader) : readOntoPlace(reader);
  if (!onto) return undefined;
  return {
    ...(factor && { factor }),
    of,
    at,
    ...(component && { component }),
    ...source,
    onto,
    range: reader.since(start),
  };
}

/** `every VALUE` and `from "PATH"`, each at most once, in either order. */
function readSource(reader: Reader): { every?: Value; from?: Quoted } | undefined {
  let every: Value | undefined;
  let from: Quoted | undefined;
  for (;;) {
    if (!every && reader.takeWord('every')) {
      every = readValue(reader);
      if (!every) return undefined;
    } else if (!from && reader.takeWord('from')) {
      from = reader.quoted();
      if (!from) return reader.due('the path of a note in quotes');
    } else {
      return { ...(every && { every }), ...(from && { from }) };
    }
  }
}

function readOntoMember(reader: Reader): CarryBody['onto'] | undefined {
  const member = reader.name('a member');
  if (!member) return undefined;
  const stretch = reader.isWord('from') ? readFromTo(reader) : undefined;
  return reader.failure ? undefined : { kind: 'member', member, ...(stretch && { stretch }) };
}

function readOntoPlace(reader: Reader): CarryBody['onto'] | undefined {
  const place = readPlace(reader);
  const within = place && reader.takeWord('in') ? reader.name('a member') : undefined;
  return place && !reader.failure ? { kind: 'place', place, ...(within && { in: within }) } : undefined;
}
