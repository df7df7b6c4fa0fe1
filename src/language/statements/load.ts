// `load`: self-weight, loads along members and at points, heat, imposed movements and lack of fit, each in a case.

import type { Range } from '../../quantity/range.ts';
import { readFromTo, readPlace } from '../places.ts';
import { readNumber } from '../quantities.ts';
import type { Reader } from '../reader.ts';
import type { Heading, LoadBody, Name, Turn, Value } from '../syntax.ts';
import { parenthesisLength, readParenthesised, readValue } from '../values.ts';
import { isHeading, isTurn } from '../words.ts';
import type { StatementForm } from './form.ts';
import { colon, snippet } from './form.ts';

export const LOAD: StatementForm = {
  keyword: 'load',
  help: 'A load in a case, which exists as soon as a load names it.',
  grammar:
    'load CASE: [FACTOR] self-weight [of MEMBERS] | VALUE [to VALUE] DIRECTION on [plan] MEMBERS [from END to END] [, patterned] | ' +
    'VALUE square DIRECTION on MEMBERS … | VALUE along MEMBERS towards P … | VALUE DIRECTION at PLACE [in MEMBER] | ' +
    'VALUE DIRECTION at every VALUE from END to END on MEMBER | heat MEMBERS by VALUE [above, VALUE below] | move P by VALUE DIRECTION | ' +
    'lengthen MEMBERS by VALUE | shorten MEMBERS by VALUE',
  examples: [
    'load dead: self-weight',
    'load dead: 1.15 kN/m down on R1, R2',
    'load snow: 0.6 kN/m to 3.1 kN/m down on R1 from B to C',
    'load snow: 0.9 kN/m down on plan Raf',
    'load wind: 1.1 kN/m square down on Raf',
    'load drag: 0.4 kN/m along Raf towards C',
    'load lamp: 0.45 kN down at C',
    'load snow: 3.1 kN down at every 1.15 m from 0.15 m to 4.5 m on Top1',
    'load knob: 6 kN m clockwise at C in R1',
    'load sun: heat R1 by 30 K above, 5 K below',
    'load sink: move B by 8 mm down',
    'load fit: lengthen d1 by 3 mm',
  ],
  skeleton: snippet('load {dead}: {1 kN/m} {down|up|left|right} on {R1}'),
  read: reader => {
    const name = reader.name('the name of the case');
    if (!name || !colon(reader, 'the load')) return undefined;
    const body = readLoad(reader);
    return body && { kind: 'load', case: name, body };
  },
};

function readLoad(reader: Reader): LoadBody | undefined {
  const from = reader.position;
  const ahead = factorLength(reader);
  if (!HEADS.some(head => isHead(reader, head, ahead))) return readForce(reader, from);
  const factor = ahead > 0 ? readFactor(reader) : undefined;
  if (reader.failure) return undefined;
  const common = factor ? { factor } : {};
  const head = HEADS.find(candidate => isHead(reader, candidate, 0))!;
  reader.skip(head === 'self-weight' ? 3 : 1);
  switch (head) {
    case 'self-weight': {
      const of = reader.takeWord('of') && reader.names('a member or a group');
      return reader.failure ? undefined : { kind: head, ...common, ...(of && { of }), range: reader.since(from) };
    }
    case 'heat': {
      const on = reader.names('a member or a group');
      const by = on && readRise(reader);
      return by && { kind: head, ...common, on, by, range: reader.since(from) };
    }
    case 'move': {
      const point = reader.name('the point of a support');
      const by = point && readBy(reader, 'how far it moves');
      const turn = by && readTurn(reader);
      return turn && { kind: head, ...common, point, by, turn, range: reader.since(from) };
    }
    case 'lengthen':
    case 'shorten': {
      const members = reader.names('a member or a group');
      const by = members && readBy(reader, 'the difference in length');
      return by && { kind: head, ...common, members, by, range: reader.since(from) };
    }
  }
}

const HEADS = ['self-weight', 'heat', 'move', 'lengthen', 'shorten'] as const;

function isHead(reader: Reader, head: (typeof HEADS)[number], ahead: number): boolean {
  return head === 'self-weight' ? reader.isHyphened('self', 'weight', ahead) : reader.isWord(head, ahead);
}

/** How many tokens a factor before a head takes, its `*` included: a number, or a value in parentheses. */
function factorLength(reader: Reader): number {
  const length = reader.peek()?.kind === 'number' ? 1 : reader.isMark('(') ? (parenthesisLength(reader) ?? 0) : 0;
  return length > 0 && reader.isMark('*', length) ? length + 1 : length;
}

function readFactor(reader: Reader): Value | undefined {
  const factor = readNumberOrParentheses(reader);
  reader.takeMark('*');
  return factor;
}

/** The factor of a load or a case, when a number or a parenthesis stands here. */
export function readNumberOrParentheses(reader: Reader): Value | undefined {
  if (reader.isMark('(')) return readParenthesised(reader);
  const operand = readNumber(reader);
  return operand && { kind: 'operand', operand, range: operand.range };
}

function readBy(reader: Reader, what: string): Value | undefined {
  return reader.word('by', what) && readValue(reader);
}

/** `by 25 K`, `by 30 K above, 5 K below`, or below first. */
function readRise(reader: Reader): Extract<LoadBody, { readonly kind: 'heat' }>['by'] | undefined {
  const rise = readBy(reader, 'the difference in temperature');
  if (!rise) return undefined;
  const side = reader.takeWord('above') ?? reader.takeWord('below');
  if (!side) return { kind: 'uniform', rise };
  const otherSide = side.text === 'above' ? 'below' : 'above';
  if (!reader.mark(',', `the difference ${otherSide}`)) return undefined;
  const other = readValue(reader);
  if (!other || !reader.word(otherSide, 'the other side')) return undefined;
  return side.text === 'above'
    ? { kind: 'gradient', above: rise, below: other }
    : { kind: 'gradient', above: other, below: rise };
}

/** A load with a size: along members, at a point, or a row of points. */
function readForce(reader: Reader, from: number): LoadBody | undefined {
  const first = reader.peek();
  if (first?.kind === 'word' && isTurn(first.text)) return reader.due('the size of the load');
  const amount = readValue(reader);
  if (!amount) return undefined;
  const to = reader.takeWord('to') && readValue(reader);
  if (reader.failure) return undefined;
  if (reader.takeWord('square')) {
    const heading = readHeading(reader, 'the side that the load comes towards');
    if (!heading || !reader.word('on', 'the member')) return undefined;
    return readLine(reader, from, amount, to, { kind: 'square', heading });
  }
  if (reader.takeWord('along')) return readAlong(reader, from, amount, to);
  const direction = readDirection(reader);
  if (!direction) return undefined;
  if (reader.takeWord('on')) {
    const onPlan = reader.takeWord('plan') !== undefined;
    if (direction.kind === 'angle') return readLine(reader, from, amount, to, { ...direction, onPlan });
    if (isHeading(direction.turn)) {
      return readLine(reader, from, amount, to, { kind: 'heading', heading: direction.turn, onPlan });
    }
    return reader.fail(
      'bad-statement',
      reader.since(reader.position - 1),
      `A couple (\`${direction.turn}\`) stands at a point.`,
      {
        hint: 'Write `at` and the point.',
      },
    );
  }
  if (!reader.word('at', 'a place; or `on` and the members')) return undefined;
  if (to) {
    const message = 'A load at a point has one size; `to` belongs to a load `on` members.';
    return reader.fail('bad-statement', to.range, message);
  }
  return reader.takeWord('every')
    ? readRow(reader, from, amount, direction)
    : readPoint(reader, from, amount, direction);
}

type Direction = Extract<LoadBody, { readonly kind: 'point' }>['direction'];
type LineDirection = Extract<LoadBody, { readonly kind: 'line' }>['direction'];

/** `down`, `clockwise`, `towards 30 deg`. */
function readDirection(reader: Reader): Direction | undefined {
  if (reader.takeWord('towards')) {
    const angle = readValue(reader);
    return angle && { kind: 'angle', angle };
  }
  const turn = readTurn(reader);
  return turn && { kind: 'turn', turn };
}

const TURN_WORDS: readonly Turn[] = ['up', 'down', 'left', 'right', 'clockwise', 'anticlockwise'];

function readTurn(reader: Reader): Turn | undefined {
  const token = reader.peek();
  if (token?.kind !== 'word' || !isTurn(token.text)) return reader.dueOneOf('a direction', TURN_WORDS);
  reader.skip(1);
  return token.text;
}

function readHeading(reader: Reader, what: string): Heading | undefined {
  const token = reader.peek();
  if (token?.kind !== 'word' || !isHeading(token.text)) return reader.dueOneOf(what, TURN_WORDS.slice(0, 4));
  reader.skip(1);
  return token.text;
}

function readAlong(reader: Reader, from: number, intensity: Value, to: Value | undefined): LoadBody | undefined {
  const on = reader.names('a member or a group');
  if (!on || !reader.word('towards', 'a point at or beyond the end of the loaded part')) return undefined;
  const towards = reader.name('a point');
  return towards && readLineBehind(reader, from, intensity, to, { kind: 'along', towards }, on);
}

function readLine(
  reader: Reader,
  from: number,
  intensity: Value,
  to: Value | undefined,
  direction: LineDirection,
): LoadBody | undefined {
  const on = reader.names('a member or a group');
  return on && readLineBehind(reader, from, intensity, to, direction, on);
}

/** The extent and `, patterned`, which every load along members may have. */
function readLineBehind(
  reader: Reader,
  from: number,
  intensity: Value,
  to: Value | undefined,
  direction: LineDirection,
  on: readonly Name[],
): LoadBody | undefined {
  const stretch = reader.isWord('from') ? readFromTo(reader) : undefined;
  if (reader.failure) return undefined;
  const patterned = reader.isMark(',') && reader.isWord('patterned', 1);
  if (patterned) reader.skip(2);
  const range: Range = reader.since(from);
  return { kind: 'line', intensity, ...(to && { to }), direction, on, ...(stretch && { stretch }), patterned, range };
}

function readPoint(reader: Reader, from: number, amount: Value, direction: Direction): LoadBody | undefined {
  const at = readPlace(reader);
  if (!at) return undefined;
  const within = reader.takeWord('in') && reader.name('a member');
  if (reader.failure) return undefined;
  return { kind: 'point', amount, direction, at, ...(within && { in: within }), range: reader.since(from) };
}

/** `at every 1.15 m from 0.15 m to 4.5 m on Top1`, behind `every`. */
function readRow(reader: Reader, from: number, amount: Value, direction: Direction): LoadBody | undefined {
  const every = readValue(reader);
  const stretch = every && readFromTo(reader);
  if (!every || !stretch || !reader.word('on', 'the member')) return undefined;
  const on = reader.name('a member');
  return on && { kind: 'row', amount, direction, every, stretch, on, range: reader.since(from) };
}
