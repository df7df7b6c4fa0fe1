// `combine`: cases with factors, added up.

import { readLabel } from '../measures.ts';
import type { Reader } from '../reader.ts';
import type { Name, Term, Value } from '../syntax.ts';
import type { StatementForm } from './form.ts';
import { colon, snippet } from './form.ts';
import { readNumberOrParentheses } from './load.ts';

export const COMBINE: StatementForm = {
  keyword: 'combine',
  help: 'A combination of cases; lines of one name with labels are alternatives, of which the worst governs.',
  grammar: 'combine NAME [(LABEL)]: [-] [FACTOR] CASE {(+ | - | +-) [FACTOR] CASE}',
  examples: [
    'combine service: dead + snow + lamp',
    'combine strength (b): 1.35 dead + (1.5 * psi0) snow + 1.5 wind',
    'combine strength (c): 1.0 dead + 1.5 wind +- lean',
  ],
  skeleton: snippet('combine {service}: {dead} + {snow}'),
  read: reader => {
    const name = reader.name('the name of the combination');
    if (!name) return undefined;
    const label = reader.isMark('(') ? readPlainLabel(reader) : undefined;
    if (reader.failure || !colon(reader, 'its cases')) return undefined;
    const terms = readSum(reader);
    return terms && { kind: 'combine', name, ...(label && { label }), terms };
  },
};

/** The signs of alternatives are the tool's to add. */
function readPlainLabel(reader: Reader): Name | undefined {
  const label = readLabel(reader);
  if (!label || !/[+-]/.test(label.text)) return label;
  return reader.fail('bad-statement', label.range, 'A label is a name or a whole number.');
}

function readSum(reader: Reader): Term[] | undefined {
  const terms: Term[] = [];
  let from = reader.position;
  let sign: Term['sign'] | undefined = reader.takeMark('-') ? '-' : '+';
  while (sign) {
    const term = readTerm(reader, sign, from);
    if (!term) return undefined;
    terms.push(term);
    from = reader.position;
    sign = takeSign(reader);
  }
  return terms;
}

/** `+`, `-`, or `+-` for both. */
function takeSign(reader: Reader): Term['sign'] | undefined {
  if (reader.takeMark('±')) return '+-';
  if (reader.takeMark('-')) return '-';
  if (!reader.takeMark('+')) return undefined;
  const next = reader.peek();
  if (!reader.isMark('-') || next?.spaced) return '+';
  reader.skip(1);
  return '+-';
}

function readTerm(reader: Reader, sign: Term['sign'], from: number): Term | undefined {
  const factor = readFactor(reader);
  if (reader.failure) return undefined;
  if (factor && reader.isMark('/')) {
    return reader.due('a case', { hint: 'A factor that is more than a number or a name stands in parentheses.' });
  }
  const name = reader.name('a case');
  return name && { sign, ...(factor && { factor }), case: name, range: reader.since(from) };
}

/** A number, a value in parentheses, or the name of a value: a name is one where a case or a `*` stands behind it. */
function readFactor(reader: Reader): Value | undefined {
  const token = reader.peek();
  let factor: Value | undefined;
  if (token?.kind === 'number' || reader.isMark('(')) {
    factor = readNumberOrParentheses(reader);
  } else if (token?.kind === 'word' && (reader.peek(1)?.kind === 'word' || reader.isMark('*', 1))) {
    const name = reader.name('a factor or a case');
    factor = name && { kind: 'operand', operand: { kind: 'name', name, range: name.range }, range: name.range };
  }
  if (factor) reader.takeMark('*') ?? reader.takeMark('×');
  return factor;
}
