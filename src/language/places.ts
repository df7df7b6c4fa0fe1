// Reads places and stretches of members: points, and distances along a member.

import type { Reader } from './reader.ts';
import type { End, Place, PlaceOnMember, Stretch, Value } from './syntax.ts';
import { beginsQuantity, readParenthesised, readValue } from './values.ts';

/** `C`, `2.4 m from A on R1`, `0.6 m from B towards A on R1`. A name alone is a point, with `from` behind it a distance. */
export function readPlace(reader: Reader): Place | undefined {
  if (beginsQuantity(reader) || reader.isWord('from', 1)) {
    const from = reader.position;
    const distance = readValue(reader);
    return distance && readOnMember(reader, distance, from);
  }
  const point = reader.name('a point or a distance');
  return point && { kind: 'point', point, range: point.range };
}

/** What stands behind a distance: `from A [towards B] on R1`. The place began at token `start`. */
export function readOnMember(reader: Reader, distance: Value, start: number): PlaceOnMember | undefined {
  if (!reader.word('from', 'the point that the distance is measured from')) return undefined;
  const from = reader.name('a point');
  if (!from) return undefined;
  const towards = reader.takeWord('towards') && reader.name('a point');
  if (reader.failure || !reader.word('on', 'the member that the place is on')) return undefined;
  const member = reader.name('a member');
  if (!member) return undefined;
  return { kind: 'on-member', distance, from, ...(towards && { towards }), member, range: reader.since(start) };
}

/** A point, or a distance from the member's first point. A name alone is a point. */
export function readEnd(reader: Reader): End | undefined {
  if (beginsQuantity(reader)) {
    const distance = readValue(reader);
    return distance && { kind: 'distance', distance, range: distance.range };
  }
  const point = reader.name('a point or a distance');
  return point && { kind: 'point', point, range: point.range };
}

/** `from A to 2.4 m`, when `from` stands here. */
export function readFromTo(reader: Reader): Stretch | undefined {
  const start = reader.position;
  if (!reader.word('from', 'where the stretch begins')) return undefined;
  const from = readEnd(reader);
  if (!from || !reader.word('to', 'where the stretch ends')) return undefined;
  const to = readEnd(reader);
  return to && { from, to, range: reader.since(start) };
}

/**
 * `between A and B`, when `between` stands here. It is part of an expression, so what follows its second end must be
 * told apart from it: a distance there is one quantity, or stands in parentheses.
 */
export function readBetween(reader: Reader): Stretch | undefined {
  const start = reader.position;
  reader.skip(1);
  const from = readEnd(reader);
  if (!from || !reader.word('and', 'where the stretch ends')) return undefined;
  const to = reader.isMark('(') ? readEndInParentheses(reader) : readLastEnd(reader);
  return to && { from, to, range: reader.since(start) };
}

function readEndInParentheses(reader: Reader): End | undefined {
  const distance = readParenthesised(reader);
  return distance && { kind: 'distance', distance, range: distance.range };
}

function readLastEnd(reader: Reader): End | undefined {
  const end = readEnd(reader);
  if (end?.kind !== 'distance' || end.distance.kind === 'operand') return end;
  const message = 'It is not clear whether this is all part of the distance.';
  return reader.fail('bad-statement', end.range, message, { hint: 'Put the distance in parentheses.' });
}
