// Text to statements. Each logical line is read on its own: a mistake costs its statement, and tells one diagnostic.

import { nearest } from '../quantity/nearest.ts';
import type { Diagnostic } from './diagnostic.ts';
import { faultDiagnostic } from './faults.ts';
import type { LogicalLine } from './lines.ts';
import { logicalLines } from './lines.ts';
import { asWritten, Reader, rangeOf } from './reader.ts';
import { isStatementKind, STATEMENTS } from './statements/table.ts';
import type { Name, Quoted, SourceLine, Statement, StatementKind, Value } from './syntax.ts';
import type { Token } from './tokens.ts';
import { scan } from './tokens.ts';
import { readValue } from './values.ts';

/** A line that could not be read, for those who would else report what merely follows from it. */
export interface BrokenStatement {
  /** Undefined where the line's first word begins no statement. */
  readonly kind: StatementKind | undefined;
  /** Every word of the line behind its first, as far as it could be cut: the names that it may define or use. */
  readonly names: readonly Name[];
  readonly range: Diagnostic['range'];
}

export interface Parsed {
  readonly statements: readonly Statement[];
  readonly broken: readonly BrokenStatement[];
  readonly diagnostics: readonly Diagnostic[];
}

/** Reads the lines of one fence. */
export function parseStatements(lines: readonly SourceLine[]): Parsed {
  const gathered = logicalLines(lines);
  const statements: Statement[] = [];
  const broken: BrokenStatement[] = [];
  const diagnostics: Diagnostic[] = gathered.strays.map(range => ({
    code: 'stray-continuation',
    severity: 'error',
    range,
    message: 'This indented line stands behind a blank one and continues nothing.',
    hint: 'Take out the blank line to go on with the statement above, or the indent to begin a new one.',
  }));
  for (const line of gathered.lines) {
    const read = readStatement(line);
    if ('code' in read) {
      diagnostics.push(read);
      broken.push(brokenStatement(line.tokens));
    } else {
      statements.push(read);
    }
  }
  if (gathered.strays.length > 0) diagnostics.sort((a, b) => a.range.start - b.range.start);
  return { statements, broken, diagnostics };
}

/** Reads the value of an inline span, its leading word already cut off; `start` is where `text` begins in the note. */
export function parseProse(text: string, start: number): { value: Value | undefined; diagnostics: Diagnostic[] } {
  const line: LogicalLine = { tokens: [], fault: undefined };
  scan({ text, start }, line);
  const { tokens, fault } = line;
  if (fault) return { value: undefined, diagnostics: [faultDiagnostic(fault, line, false)] };
  if (tokens.length === 0) {
    const range = { start, end: start + text.length };
    return { value: undefined, diagnostics: [error('bad-value', range, 'A value is missing here.')] };
  }
  const reader = new Reader(tokens);
  const value = readValue(reader);
  if (value && !reader.atEnd) refuseRest(reader, 'value');
  return reader.failure ? { value: undefined, diagnostics: [reader.failure] } : { value, diagnostics: [] };
}

function readStatement(line: LogicalLine): Statement | Diagnostic {
  const { tokens } = line;
  const first = tokens[0]!;
  if (first.kind !== 'word' || !isStatementKind(first.text)) return unknownStatement(first);
  const form = STATEMENTS[first.text];
  if (line.fault) return faultDiagnostic(line.fault, line, CHAINED.has(form.keyword));
  const second = secondColon(tokens);
  if (second) {
    return error('bad-statement', rangeOf(second), 'A second `:` on the line: two statements stand on it.', {
      hint: 'Begin a new line for the second.',
    });
  }
  const reader = new Reader(tokens, 1);
  const body = form.read(reader);
  const source = body && readSource(reader);
  if (body && !reader.atEnd) refuseRest(reader, 'statement');
  if (reader.failure) return reader.failure;
  if (!body) throw new Error(`the reader of \`${form.keyword}\` gave neither a statement nor a failure`);
  const range = { start: first.start, end: tokens[tokens.length - 1]!.end };
  return { ...body, range, keyword: rangeOf(first), ...(source && { source }) };
}

const CHAINED: ReadonlySet<StatementKind> = new Set<StatementKind>(['member', 'bar', 'bars']);

function readSource(reader: Reader): Quoted | undefined {
  return reader.quoted();
}

/** Words stand behind what is complete. */
function refuseRest(reader: Reader, what: 'statement' | 'value'): undefined {
  const token = reader.peek()!;
  const hint = token.kind === 'string' ? undefined : HINTS_BEHIND.get(token.text);
  const code = what === 'value' ? 'bad-value' : 'bad-statement';
  const message = `${asWritten(token)} means nothing here; the ${what} is complete before it.`;
  return reader.fail(code, token, message, hint ? { hint } : {});
}

const IN_PARENTHESES = 'A distance or a factor that begins with a name and goes on stands in parentheses.';

/** What words that stand behind a complete statement were likely meant for. */
const HINTS_BEHIND: ReadonlyMap<string, string> = new Map([
  ['--', '`--` joins the points of a chain.'],
  ...['+', '-', '*', '/', '^', 'from'].map(word => [word, IN_PARENTHESES] as const),
]);

function secondColon(tokens: readonly Token[]): Token | undefined {
  let seen = false;
  for (const token of tokens) {
    if (token.kind !== 'mark' || token.text !== ':') continue;
    if (seen) return token;
    seen = true;
  }
  return undefined;
}

function unknownStatement(first: Token): Diagnostic {
  const near = first.kind === 'word' ? nearest(first.text, Object.keys(STATEMENTS)) : undefined;
  const message = `${asWritten(first)} begins no statement.`;
  return error('unknown-statement', rangeOf(first), message, near ? { hint: `\`${near}\`?` } : {});
}

function error(
  code: Diagnostic['code'],
  range: Diagnostic['range'],
  message: string,
  remedy: Pick<Diagnostic, 'hint' | 'fix'> = {},
): Diagnostic {
  return { code, severity: 'error', range, message, ...remedy };
}

function brokenStatement(tokens: readonly Token[]): BrokenStatement {
  const first = tokens[0]!;
  const names: Name[] = [];
  for (const token of tokens) {
    if (token !== first && token.kind === 'word') names.push({ text: token.text, range: rangeOf(token) });
  }
  const range = { start: first.start, end: tokens[tokens.length - 1]!.end };
  return { kind: isStatementKind(first.text) ? first.text : undefined, names, range };
}
