// Every diagnostic code, with the one line that the reference prints for it. Codes are stable.
import type { ProblemCode } from '../quantity/problem.ts';

export const CODES = {
  // values
  'bad-value': 'Words that do not make a value.',
  'unknown-unit': 'Behind a number stands a word that is no unit.',
  'wrong-dimension': 'Quantities of different kinds are added or compared, or another kind is due here.',
  'number-out-of-range': 'A number is not finite or lies outside 1e-30 to 1e30.',
  'value-too-deep': 'Parentheses or operators are nested more than 64 deep.',
  'value-too-long': 'A value has more than 2000 operands and operators.',
  'decimal-comma': 'A comma stands between two digits; a decimal point is meant.',
  domain: 'A function or a division has no value here.',
  // statements
  'unknown-statement': 'A line begins with a word that begins no statement.',
  'bad-statement': 'A statement breaks off or has words where they mean nothing.',
  'stray-continuation': 'An indented line continues nothing.',
  'long-dash': 'A long dash stands where -- is meant.',
  'open-quote': 'A quoted text does not close on its line.',
  'reserved-name': 'A word that may not be a name is used as one.',
  'limit-missing': '`require` without a limit.',
  'limit-in-find': '`find` with a limit.',
  'misplaced-in-limit': 'A measure or `under` stands behind `<=` or `>=`.',
  // names
  'unknown-name': 'A name that nothing defines.',
  'defined-twice': 'A name has two definitions.',
  'circular-value': 'A value depends on itself.',
  // model
  'bad-geometry': 'A chain, a point or a member that cannot be drawn.',
  'chain-gap': 'A chain does not close on a point already placed.',
  'point-not-placed': 'A point that nothing places.',
  'missing-property': 'A section or a material lacks a figure that is needed.',
  'assumed-modulus': 'A section from a table gives no modulus, and that of a symmetrical section is taken.',
  'idle-connection': 'A semi-rigid connection to a joint that turns freely, so that no moment passes.',
  'bad-support': 'A support that cannot be read, or stands where nothing is.',
  'bad-load': 'A load that cannot act where it is put.',
  'upper-side': 'Heat above and below on a member whose upper side, the one left of its travel, does not lie above.',
  'unused-case': 'A case that has loads and is in no combination.',
  'bad-combination': 'A combination that cannot be worked.',
  'bad-question': 'A question that has no answer as it stands.',
  'unstable-structure': 'Something can move freely.',
  'nearly-unstable': 'Something hardly resists a movement; past a condition of 1e13 the answers are withheld.',
  'unused-combination': 'A combination that no question asks about.',
  // doubts about results
  'large-movement': 'A movement is more than a fiftieth of the length that it goes across.',
  'slender-compression': 'A compression is more than the elastic critical force of the member on its own length.',
  'unasked-uplift': 'A support must hold down, and no question asks about its reaction.',
  'idle-member': 'A member carries no load and no force in any case.',
  'no-weight': 'A self-weight is zero, as the density is.',
  // results
  'limit-exceeded': 'A requirement is not met.',
  'limit-without-source': 'A limit has no source.',
  'force-reversed':
    'A support that bears only would have to pull, or a bar the other way than it is said to: its answers are withheld.',
  'answer-withheld': 'The two methods or the equilibrium check disagree; the number is not shown.',
  // files
  'unreadable-note': 'A file that cannot be read as a note.',
  // bounds
  'too-large': 'A bound on the size of notes is passed.',
  // language that is read but not evaluated yet
  'not-evaluated-yet':
    'The statement is read, but this version does not evaluate it; answers that depend on it are withheld.',
} as const satisfies Record<ProblemCode, string> & Record<string, string>;

export type DiagnosticCode = keyof typeof CODES;
