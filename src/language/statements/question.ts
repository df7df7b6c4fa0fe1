// `find` asks for a result; `require` asks for one and holds it against a limit.

import type { Edit } from '../diagnostic.ts';
import { findInLimit, readMeasure, readUnder } from '../measures.ts';
import type { Reader } from '../reader.ts';
import { print, rangeOf } from '../reader.ts';
import type { Name, Under, Value } from '../syntax.ts';
import type { ValueContext } from '../values.ts';
import { readValue } from '../values.ts';
import type { StatementForm } from './form.ts';
import { colon, snippet } from './form.ts';
import { readValueName } from './let.ts';

export const FIND: StatementForm = {
  keyword: 'find',
  help: 'A result to be found: a measure, or an expression of measures, earlier results and values.',
  grammar: 'find NAME: MEASURE or VALUE [under COMBINATION]',
  examples: ['find slope: rotation at C under service', 'find peak: moment in R1 between A and B under all'],
  skeleton: snippet('find {name}: {deflection} at {C} under {service}'),
  read: reader => {
    const keyword = reader.position - 1;
    const question = readQuestion(reader);
    if (!question) return undefined;
    if (reader.isMark('<=') || reader.isMark('>=')) return refuseLimit(reader, keyword);
    return { kind: 'find', ...question };
  },
};

export const REQUIRE: StatementForm = {
  keyword: 'require',
  help: 'A result and the limit that it must keep.',
  grammar: 'require NAME: MEASURE or VALUE [under COMBINATION] <= LIMIT (or >=)',
  examples: [
    'require tip: deflection at C under service <= span/180',
    'require seat: reaction at A under uplift >= 0 kN',
    'require net: tip - 12 mm <= span(tip)/250',
  ],
  skeleton: snippet('require {name}: {sag of R1} under {service} <= {span/360}'),
  read: reader => {
    const keyword = reader.position - 1;
    const from = reader.position;
    const question = readQuestion(reader);
    if (!question) return undefined;
    const comparison = reader.isMark('<=') ? '<=' : reader.isMark('>=') ? '>=' : undefined;
    if (!comparison) return refuseNoLimit(reader, keyword);
    const at = reader.position;
    reader.skip(1);
    if (!checkLimit(reader, from, at, question.under)) return undefined;
    const limit = readValue(reader, { span: true });
    return limit && { kind: 'require', ...question, comparison, limit };
  },
};

const IN_QUESTION: ValueContext = { measure: readMeasure, span: true };

function readQuestion(
  reader: Reader,
): { readonly name: Name; readonly what: Value; readonly under?: Under } | undefined {
  const name = readValueName(reader, 'the name of the result');
  if (!name || !colon(reader, 'what is asked')) return undefined;
  const what = readValue(reader, IN_QUESTION);
  const under = what && reader.isWord('under') ? readUnder(reader) : undefined;
  return what && !reader.failure ? { name, what, ...(under && { under }) } : undefined;
}

function refuseLimit(reader: Reader, keyword: number): undefined {
  const range = rangeOf(reader.tokens[keyword]!);
  return reader.fail('limit-in-find', reader.here(), '`find` has no limit; `require` has one.', {
    fix: { title: 'Write `require`', edits: [{ range, text: 'require' }] },
  });
}

function refuseNoLimit(reader: Reader, keyword: number): undefined {
  const next = reader.peek();
  if (next && next.kind !== 'string') {
    const strict = next.text === '<' || next.text === '>' || next.text === '=';
    const written = next.text === '>' ? '>=' : '<=';
    return reader.due('`<=` or `>=`', strict ? { hint: `\`${written}\`?` } : undefined);
  }
  const range = rangeOf(reader.tokens[keyword]!);
  return reader.fail('limit-missing', range, '`require` needs a limit behind `<=` or `>=`; `find` has none.', {
    fix: { title: 'Write `find`', edits: [{ range, text: 'find' }] },
  });
}

/** Whether what stands behind the comparison at token `at` can be a limit. The question began at token `from`. */
function checkLimit(reader: Reader, from: number, at: number, under: Under | undefined): boolean {
  const { measure, under: late } = findInLimit(reader);
  if (measure !== undefined) {
    reader.fail(
      'misplaced-in-limit',
      reader.peek(measure)!,
      'A measure stands before the comparison; a limit has none.',
      {
        hint: 'Ask it in a statement of its own, or turn the comparison round.',
        ...(measure === 0 && !under ? turnRound(reader, from, at) : {}),
      },
    );
    return false;
  }
  if (late !== undefined) {
    const token = reader.peek(late)!;
    const why = under
      ? 'The combination is said before the comparison already.'
      : '`under` stands before the comparison.';
    reader.fail('misplaced-in-limit', token, why, under ? undefined : moveUnder(reader, at, reader.position + late));
    return false;
  }
  return true;
}

/** `10 mm >= sag of R1` becomes `sag of R1 <= 10 mm`, where the left side is a plain limit. */
function turnRound(reader: Reader, from: number, at: number): { fix?: { title: string; edits: Edit[] } } {
  const end = statementEnd(reader);
  const left = reader.tokens.slice(from + 2, at);
  const right = reader.tokens.slice(at + 1, end);
  const comparison = reader.tokens[at]!;
  const leftMeasures = left.some(
    (token, index) => token.kind === 'word' && PREPOSITIONS.has(left[index + 1]?.text ?? ''),
  );
  if (leftMeasures || left.length === 0) return {};
  const text = `${print(right)} ${comparison.text === '<=' ? '>=' : '<='} ${print(left)}`;
  const range = { start: left[0]!.start, end: right[right.length - 1]!.end };
  return { fix: { title: 'Put the measure first', edits: [{ range, text }] } };
}

const PREPOSITIONS: ReadonlySet<string> = new Set(['at', 'of', 'in']);

/** Takes `under …` from behind the limit and puts it before the comparison. */
function moveUnder(reader: Reader, at: number, late: number): { fix: { title: string; edits: Edit[] } } {
  const end = statementEnd(reader);
  const words = print(reader.tokens.slice(late, end));
  const comparison = reader.tokens[at]!;
  const edits: Edit[] = [
    { range: { start: comparison.start, end: comparison.start }, text: `${words} ` },
    { range: { start: reader.tokens[late - 1]!.end, end: reader.tokens[end - 1]!.end }, text: '' },
  ];
  return { fix: { title: 'Move `under` before the comparison', edits } };
}

/** Behind the last token that is not the source. */
function statementEnd(reader: Reader): number {
  const { tokens } = reader;
  return tokens[tokens.length - 1]!.kind === 'string' ? tokens.length - 1 : tokens.length;
}
