// The diagnostics of mistakes in spelling that no grammar is needed to see.

import type { Diagnostic } from './diagnostic.ts';
import { rangeOf } from './reader.ts';
import type { Fault, Scanned, Token } from './tokens.ts';
import { CURLY_QUOTES, LONG_DASHES } from './tokens.ts';

/** What a fault of a line says. In a chain a long dash stands for `--`, elsewhere for a minus. */
export function faultDiagnostic(fault: Fault, line: Scanned, inChain: boolean): Diagnostic {
  const range = rangeOf(fault);
  switch (fault.kind) {
    case 'decimal-comma':
      return {
        code: 'decimal-comma',
        severity: 'error',
        range,
        message: 'A comma stands between two digits; the decimal sign is a point.',
        hint: 'Between two values, a blank stands behind the comma.',
        fix: { title: 'Write a decimal point', edits: [{ range, text: '.' }] },
      };
    case 'long-dash': {
      const text = inChain ? '--' : '-';
      const message = inChain
        ? 'A long dash stands where `--` (two hyphens) is due.'
        : 'A long dash is no sign here; a minus is a hyphen.';
      return { code: 'long-dash', severity: 'error', range, message, ...replaced(line, isLongDash, text) };
    }
    case 'open-quote':
      return {
        code: 'open-quote',
        severity: 'error',
        range,
        message: 'The quoted text does not close on its line.',
        hint: 'Put `"` at its end.',
      };
    case 'curly-quote':
      return {
        code: 'open-quote',
        severity: 'error',
        range,
        message: 'A quoted text stands between straight quotes (`"`).',
        ...replaced(line, isCurlyQuote, '"'),
      };
  }
}

/** The fix that writes `text` for every such token of the line, where they are not too many to be a slip. */
function replaced(line: Scanned, which: (token: Token) => boolean, text: string): Pick<Diagnostic, 'fix'> {
  const tokens = line.tokens.filter(which);
  if (tokens.length > MOST_EDITS) return {};
  return { fix: { title: `Write \`${text}\``, edits: tokens.map(token => ({ range: rangeOf(token), text })) } };
}

const MOST_EDITS = 100;

function isLongDash(token: Token): boolean {
  return token.kind === 'stray' && LONG_DASHES.includes(token.text[0]!);
}

function isCurlyQuote(token: Token): boolean {
  return token.kind === 'stray' && CURLY_QUOTES.includes(token.text[0]!);
}
