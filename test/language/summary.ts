// Statements and diagnostics as text that is quick to read, for tests.
import type { Diagnostic } from '../../src/language/diagnostic.ts';
import type { Operand, Statement, Value } from '../../src/language/syntax.ts';
import { siUnit } from '../../src/quantity/dimension-names.ts';
import { full } from '../../src/quantity/number.ts';

/** One line a statement: its kind, then each part that is there. */
export function summary(statement: Statement): string {
  const { kind, keyword: _keyword, range: _range, ...parts } = statement;
  return `${kind} ${fields(parts)}`;
}

/** The source line with carets under the words, then code, message, hint and fix. */
export function pointed(text: string, diagnostic: Diagnostic): string {
  const { range } = diagnostic;
  const lineStart = text.lastIndexOf('\n', range.start - 1) + 1;
  const lineEnd = text.indexOf('\n', range.start) < 0 ? text.length : text.indexOf('\n', range.start);
  const carets =
    ' '.repeat(range.start - lineStart) + '^'.repeat(Math.max(1, Math.min(range.end, lineEnd) - range.start));
  const lines = [text.slice(lineStart, lineEnd), carets, `${diagnostic.code}: ${diagnostic.message}`];
  if (diagnostic.hint) lines.push(`hint: ${diagnostic.hint}`);
  if (diagnostic.fix)
    lines.push(
      `fix: ${diagnostic.fix.title}`,
      ...applied(text, diagnostic)
        .split('\n')
        .map(line => `  ${line}`),
    );
  return lines.join('\n');
}

/** The text with the fix of a diagnostic made. */
export function applied(text: string, diagnostic: Diagnostic): string {
  const edits = [...(diagnostic.fix?.edits ?? [])].sort((a, b) => b.range.start - a.range.start);
  return edits.reduce(
    (mended, { range, text: words }) => mended.slice(0, range.start) + words + mended.slice(range.end),
    text,
  );
}

function fields(parts: object): string {
  return Object.entries(parts)
    .filter(([key, value]) => key !== 'range' && key !== 'kind' && value !== undefined)
    .map(([key, value]) => `${key}=${show(value)}`)
    .join(' ');
}

function show(part: unknown): string {
  if (Array.isArray(part)) return `[${part.map(show).join(', ')}]`;
  if (typeof part !== 'object' || part === null) return String(part);
  if (isValue(part)) return showValue(part);
  if ('text' in part && typeof part.text === 'string') return String(part.text);
  const rest = fields(part);
  if (!('kind' in part)) return `{${rest}}`;
  return rest === '' ? String(part.kind) : `${part.kind}{${rest}}`;
}

function isValue(part: object): part is Value {
  if (!('kind' in part)) return false;
  return (
    (part.kind === 'operand' && 'operand' in part) ||
    part.kind === 'negate' ||
    part.kind === 'binary' ||
    (part.kind === 'call' && 'arguments' in part)
  );
}

/** Fully in parentheses, so that precedence can be seen. */
export function showValue(value: Value): string {
  switch (value.kind) {
    case 'operand':
      return showOperand(value.operand);
    case 'negate':
      return `(-${showValue(value.of)})`;
    case 'binary':
      return `(${showValue(value.left)} ${value.operator} ${showValue(value.right)})`;
    case 'call':
      return `${value.function}(${value.arguments.map(showValue).join(', ')})`;
  }
}

function showOperand(operand: Operand): string {
  switch (operand.kind) {
    case 'quantity': {
      const { value, dimension } = operand.quantity;
      return `<${[full(value), siUnit(dimension)].join(' ').trim()}>`;
    }
    case 'constant':
      return `:${operand.name}`;
    case 'name':
      return operand.name.text;
    case 'property':
      return `${operand.property.text}~${operand.of.text}`;
    case 'extent':
      return `${operand.function}[${operand.arguments.map(name => name.text).join(', ')}]`;
    case 'span':
      return ':span';
    case 'measure':
      return `{${operand.measure.kind} ${fields(operand.measure)}}`;
  }
}
