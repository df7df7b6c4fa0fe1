// What `check` prints for a person: each note under its path with its answers and what is wrong, then one summary line.
import { indexLines } from '../note/line-index.ts';
import type { NoteResult } from '../note/result.ts';
import { stateOf, structureText } from './answers-text.ts';
import { diagnosticText } from './diagnostics-text.ts';
import { safeText } from './safe-text.ts';
import type { Style } from './style.ts';
import { layOut } from './table.ts';

export function noteText(result: NoteResult, width: number, style: Style): string {
  const lines = indexLines(result.text);
  const title = result.frontMatter.title;
  const blocks = [
    [style.strong(safeText(result.path)) + (title === undefined ? '' : `  ${safeText(title)}`)],
    ...(result.structures.length === 0 ? [valuesText(result)] : []),
    ...(isProse(result) ? [['  no tautline fence']] : []),
    ...result.structures.map(structure => structureText(result, structure, width, style)),
    ...result.diagnostics.map(diagnostic => diagnosticText(diagnostic, result.path, lines, style)),
  ];
  return blocks
    .filter(block => block.length > 0)
    .map(block => `${block.join('\n')}\n`)
    .join('\n');
}

export function summaryText(results: readonly NoteResult[], style: Style): string {
  const required = results.flatMap(({ answers }) => answers).filter(({ kind }) => kind === 'require');
  const met = required.filter(answer => stateOf(answer) === 'met').length;
  const notMet = required.filter(answer => stateOf(answer) === 'not met').length;
  const withheld = required.length - met - notMet;
  // A requirement that is not met is counted as such, and not again as the message that says so.
  const severities = results
    .flatMap(({ diagnostics }) => diagnostics)
    .filter(({ code }) => code !== 'limit-exceeded')
    .map(({ severity }) => severity);
  const errors = severities.filter(severity => severity === 'error').length;
  const warnings = severities.filter(severity => severity === 'warning').length;
  const parts = [
    counted(results.length, 'note'),
    `${met} of ${counted(required.length, 'requirement')} met`,
    ...(notMet > 0 ? [style.error(`${notMet} not met`)] : []),
    ...(withheld > 0 ? [style.warning(`${withheld} withheld`)] : []),
    ...(errors > 0 ? [style.error(counted(errors, 'error'))] : []),
    ...(warnings > 0 ? [style.warning(counted(warnings, 'warning'))] : []),
  ];
  return `${parts.join(', ')}\n`;
}

function isProse({ fences, structures, values, diagnostics }: NoteResult): boolean {
  return [fences, structures, values, diagnostics].every(({ length }) => length === 0);
}

/** A note that only holds values shows them; with a structure they are its inputs, and would be in the way. */
function valuesText({ values }: NoteResult): string[] {
  return layOut(
    values.map(({ name, display }) => [{ lines: [name] }, { lines: [display] }]),
    ['left', 'point'],
    '  ',
  );
}

function counted(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? '' : 's'}`;
}
