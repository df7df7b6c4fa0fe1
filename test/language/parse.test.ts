// Statements from text: the tree of what is well written, the one diagnostic of what is not.
import { describe, expect, test } from 'vitest';
import { parseProse, parseStatements } from '../../src/language/parse.ts';
import { checkCases } from './cases.ts';
import { linesOf } from './source.ts';
import { applied, pointed, showValue, summary } from './summary.ts';

const CASES = new URL('cases/', import.meta.url);

/** Statements as summaries, with the diagnostics behind them. */
function outcome(input: string): string {
  const { statements, diagnostics } = parseStatements(linesOf(input));
  return [...statements.map(summary), ...diagnostics.map(diagnostic => pointed(input, diagnostic))].join('\n');
}

checkCases(CASES, 'tree', outcome);
checkCases(CASES, 'error', outcome);
checkCases(CASES, 'lines', outcome);
checkCases(CASES, 'prose', input => {
  const { value, diagnostics } = parseProse(input, 0);
  return [...(value ? [showValue(value)] : []), ...diagnostics.map(diagnostic => pointed(input, diagnostic))].join(
    '\n',
  );
});

describe('fixes', () => {
  test.for([
    'let a = 1,5 m',
    'member R1: A – 2 m – B',
    'let a = 3 – 2',
    'load dead: self-weight “clause 3”',
    'find tip: deflection at C <= span/180',
    'require tip: deflection at C under service',
    'require tip: deflection at C <= span/180 under service "client brief"',
    'require tip: span/180 >= deflection at C under service',
    'let a: 5 m',
  ])('mend: %s', input => {
    const { diagnostics } = parseStatements(linesOf(input));
    expect(diagnostics).toHaveLength(1);
    expect(parseStatements(linesOf(applied(input, diagnostics[0]!))).diagnostics).toEqual([]);
  });
});

describe('what a broken line is known to hold', () => {
  test('its keyword and its words', () => {
    const { broken } = parseStatements(linesOf('member R1, RHS: A -- 4,8 m -- B'));
    expect(broken.map(({ kind, names }) => [kind, names.map(name => name.text)])).toEqual([
      ['member', ['R1', 'RHS', 'A', 'm', 'B']],
    ]);
  });
  test('no kind where no statement begins so', () => {
    expect(parseStatements(linesOf('memebr R1: A -- B')).broken[0]).toMatchObject({ kind: undefined });
  });
});

describe('places', () => {
  test('a statement runs from its keyword to its last word, comment left out', () => {
    const text = 'support A:\n  pinned   # as drawn';
    const [statement] = parseStatements(linesOf(text)).statements;
    expect(text.slice(statement!.range.start, statement!.range.end)).toBe('support A:\n  pinned');
    expect(statement!.keyword).toEqual({ start: 0, end: 7 });
  });
  test('lines may start anywhere in the note', () => {
    const lines = [
      { text: 'support A:', start: 100 },
      { text: '  pinned', start: 203 },
    ];
    expect(parseStatements(lines).statements[0]).toMatchObject({
      range: { start: 100, end: 211 },
      items: [{ kind: 'pinned', range: { start: 205, end: 211 } }],
    });
  });
  test('parentheses belong to the expression in them', () => {
    const [statement] = parseStatements(linesOf('let a = 2 * (b + c)')).statements;
    expect(statement).toMatchObject({
      value: { range: { start: 8, end: 19 }, right: { range: { start: 12, end: 19 } } },
    });
  });
});
