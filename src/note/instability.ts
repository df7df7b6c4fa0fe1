// What is said of a structure that is not held, or hardly: how it can move, how many restraints are missing, and which
// changes were tried and found to hold it.
import type { Diagnostic } from '../language/diagnostic.ts';
import type { Statement, StatementOf } from '../language/syntax.ts';
import {
  type Analysis,
  MAX_CONDITION,
  MAX_MECHANISMS,
  type Mechanism,
  type Remedy,
  SUSPICIOUS_CONDITION,
} from '../mechanics/index.ts';
import type { Structure } from '../model/structure.ts';
import { describeMechanism, direction, list, movementOf, pointsInMotion } from './mechanism-words.ts';

/** Sets of changes, each tried and found to hold the structure, the least first. */
export type Remedies = readonly (readonly Remedy[])[];

/** One diagnostic, at the structure's own line; what moves and what lets it are its related places. */
export function describeInstability(
  structure: Structure,
  { stability }: Analysis,
  remedies: Remedies,
  statements: readonly Statement[],
): Diagnostic[] {
  const { mechanisms } = stability;
  const [first] = mechanisms;
  if (first === undefined) return [];
  const sentences = [...new Set(mechanisms.map(mechanism => describeMechanism(structure, mechanism)))];
  const fix = fixFor(structure, remedies, statements);
  return [
    {
      code: 'unstable-structure',
      severity: 'error',
      range: structure.range,
      message: `${sentences.slice(0, MOST_TOLD).join(' ')} ${missing(mechanisms.length)}`,
      hint: hintFor(structure, mechanisms, remedies),
      related: relatedPlaces(structure, first),
      ...(fix && { fix }),
    },
  ];
}

/** Undefined where the structure is well held; past `MAX_CONDITION` an error, as no answer can be trusted. */
export function describeNearInstability(structure: Structure, { stability }: Analysis): Diagnostic | undefined {
  const { stable, condition, softest } = stability;
  if (!stable || condition <= SUSPICIOUS_CONDITION) return undefined;
  const lost = condition > MAX_CONDITION;
  const digits = Math.max(0, Math.floor(16 - Math.log10(condition)));
  const what = softest === undefined ? '' : ` ${hardlyHeld(structure, softest)}`;
  const consequence = lost
    ? 'too few for an answer'
    : 'and answers are given only where both methods and equilibrium bear them out';
  return {
    code: 'nearly-unstable',
    severity: lost ? 'error' : 'warning',
    range: structure.range,
    message: `This structure is nearly unstable: the condition of its stiffness is ${powerOfTen(condition)}, which leaves some ${digits} of 16 digits, ${consequence}.${what}`,
    hint: 'look for parts almost in line, a support or a stiffness out by a power of ten, or very short legs',
  };
}

/** `make D pinned`, `support A: pinned and support B: roller`: each set of changes in words. */
export function remedyWords(structure: Structure, remedies: Remedies): string[] {
  return remedies.map(changes =>
    list(changes.map(change => wordsOf(structure, change))).replaceAll(WRITE_AGAIN, '$1support '),
  );
}

const MOST_TOLD = 3;

/** Behind the first change, one `write` serves for all. */
const WRITE_AGAIN = /(, | and )write support /g;

function missing(count: number): string {
  if (count >= MAX_MECHANISMS) return `At least ${count} restraints are missing.`;
  return count === 1 ? 'One restraint is missing.' : `${count} restraints are missing.`;
}

function hintFor(structure: Structure, mechanisms: readonly Mechanism[], remedies: Remedies): string {
  if (remedies.length > 0) return alternatives(remedyWords(structure, remedies));
  if (mechanisms.length > 1) return `${mechanisms.length} more restraints are needed`;
  const [only] = mechanisms;
  const [largest] = [...only!.points].sort((a, b) => sizeOf(only!, b) - sizeOf(only!, a));
  if (largest === undefined) return 'hold the rotation there, or take a hinge out';
  return `hold ${structure.points[largest]!.name} so that it cannot move ${direction(movementOf(only!, largest))}`;
}

function alternatives(words: readonly string[]): string {
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')}, or ${words.at(-1)}`;
}

function wordsOf(structure: Structure, remedy: Remedy): string {
  const name = (point: number) => structure.points[point]!.name;
  switch (remedy.kind) {
    case 'hold':
      return `make ${name(structure.supports[remedy.support]!.point)} ${remedy.as}`;
    case 'close': {
      const { point, member } = structure.hinges[remedy.hinge]!;
      return `take out the hinge at ${name(point)}${member === undefined ? '' : ` in ${structure.members[member]!.name}`}`;
    }
    case 'brace':
      return `brace ${name(remedy.from)}–${name(remedy.to)} with a bar`;
    case 'support':
      return `write support ${name(remedy.point)}: ${remedy.as === 'sideways' ? 'hold x' : remedy.as}`;
  }
}

/** The edit of the least change that is sure in the text: a support that is one word, or a hinge of its own line. */
function fixFor(structure: Structure, remedies: Remedies, statements: readonly Statement[]): Diagnostic['fix'] {
  for (const [remedy, another] of remedies) {
    if (remedy === undefined || another !== undefined) continue;
    const edit = editFor(structure, remedy, statements);
    if (edit !== undefined) return { title: capital(wordsOf(structure, remedy)), edits: [edit] };
  }
  return undefined;
}

function editFor(structure: Structure, remedy: Remedy, statements: readonly Statement[]) {
  if (remedy.kind === 'hold') {
    const { name } = structure.points[structure.supports[remedy.support]!.point]!;
    const statement = statements.find(
      (one): one is StatementOf<'support'> => one.kind === 'support' && one.point.text === name,
    );
    const [item, another] = statement?.items ?? [];
    if (item === undefined || another !== undefined || item.kind === 'spring') return undefined;
    return { range: item.range, text: remedy.as };
  }
  if (remedy.kind === 'close') {
    const { range } = structure.hinges[remedy.hinge]!;
    const statement = statements.find(one => one.kind === 'hinge' && one.point.range.start === range.start);
    return statement === undefined ? undefined : { range: statement.range, text: '' };
  }
  return undefined;
}

/** Points that move, supports that let them, hinges that take part. */
function relatedPlaces(structure: Structure, mechanism: Mechanism): NonNullable<Diagnostic['related']> {
  const name = (point: number) => structure.points[point]!.name;
  const moving = new Set(mechanism.points);
  const taking = new Set([...mechanism.points, ...mechanism.turning]);
  const points = mechanism.points.slice(0, MOST_TOLD).map(point => ({
    range: structure.points[point]!.range,
    message: `${name(point)} can move ${direction(movementOf(mechanism, point))}.`,
  }));
  const supports = structure.supports
    .filter(({ point }) => moving.has(point))
    .slice(0, MOST_TOLD)
    .map(({ point, range, symbol }) => ({
      range,
      message: `${symbol.kind === 'roller' ? 'The roller' : 'The support'} at ${name(point)} lets it move.`,
    }));
  const hinges = structure.hinges
    .filter(({ point }) => taking.has(point))
    .slice(0, MOST_TOLD)
    .map(({ point, range }) => ({ range, message: `The hinge at ${name(point)} lets it turn.` }));
  return [...points, ...supports, ...hinges];
}

/** `3 × 10¹¹`: a condition is an estimate, of which one digit is known at most. */
function powerOfTen(value: number): string {
  const [digit, exponent] = value.toExponential(0).split('e+');
  return `${digit} × 10${[...(exponent ?? '')].map(figure => '⁰¹²³⁴⁵⁶⁷⁸⁹'[Number(figure)]).join('')}`;
}

/** Points that move at least a third as far as the one that moves most. */
function hardlyHeld(structure: Structure, softest: Mechanism): string {
  const most = softest.points.filter(point => sizeOf(softest, point) > 1 / 3);
  if (most.length === 0) return describeMechanism(structure, softest).replace('Nothing holds', 'Hardly anything holds');
  return `It hardly resists that ${pointsInMotion(structure, softest, most).replace(' can move', most.length > 1 ? ' move' : ' moves')}.`;
}

function sizeOf({ movements }: Mechanism, point: number): number {
  return Math.hypot(movements[2 * point]!, movements[2 * point + 1]!);
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
