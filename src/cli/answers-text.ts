// The answers of one structure as a person reads them: a head line, then a row for each question.
import type { Answer, AnswerPlace, NoteResult, StructureResult } from '../note/result.ts';
import { LENGTH } from '../quantity/dimension.ts';
import { type DisplayUnits, showQuantity } from '../quantity/display.ts';
import { safeText } from './safe-text.ts';
import type { Style } from './style.ts';
import { type Alignment, type Cell, layOut, widthOfColumns, wrap } from './table.ts';

const ALIGNMENTS: readonly Alignment[] = ['left', 'left', 'point', 'point', 'right', 'left'];
const INDENT = '    ';
const NARROWEST_QUESTION = 28;
const WIDEST_QUESTION = 60;

/** `width`: of the terminal; the question gives way. */
export function structureText(result: NoteResult, structure: StructureResult, width: number, style: Style): string[] {
  const answers = structure.answers.map(index => result.answers[index]!);
  return [
    `  ${headLine(structure, answers, style)}`,
    ...(structure.withheld === undefined
      ? []
      : [`${INDENT}${safeText(`answers are withheld: ${structure.withheld}`)}`]),
    ...layOut(rowsOf(answers, structure.display, width, style), ALIGNMENTS, INDENT),
  ];
}

/** `met`, `not met`, `withheld`, or `not checked` for what has no limit. */
export function stateOf({ kind, status, quantity }: Answer): 'met' | 'not met' | 'withheld' | 'not checked' {
  if (quantity === undefined) return 'withheld';
  if (kind === 'find') return 'not checked';
  return status === 'ok' ? 'met' : status === 'fails' ? 'not met' : 'withheld';
}

function headLine({ name, title }: StructureResult, answers: readonly Answer[], style: Style): string {
  const heading = style.strong(safeText(name)) + (title === undefined ? '' : ` ${safeText(title)}`);
  const state = stateLine(answers);
  return state === '' ? heading : `${heading} ${style.soft('·')} ${state}`;
}

function stateLine(answers: readonly Answer[]): string {
  const required = answers.filter(({ kind }) => kind === 'require');
  if (required.length === 0) return '';
  const met = required.filter(answer => stateOf(answer) === 'met').length;
  const highest = required
    .filter(({ utilisation }) => utilisation !== undefined)
    .reduce<Answer | undefined>(
      (worst, answer) => (answer.utilisation! > (worst?.utilisation ?? -1) ? answer : worst),
      undefined,
    );
  const counted = `${met} of ${required.length} ${required.length === 1 ? 'requirement' : 'requirements'} met`;
  return highest === undefined ? counted : `${counted}, highest use ${useOf(highest)} (${safeText(highest.name)})`;
}

function rowsOf(answers: readonly Answer[], display: DisplayUnits, width: number, style: Style): Cell[][] {
  const others = answers.map(answer => cells(answer, [], style));
  const left = width - INDENT.length - widthOfColumns(others, ALIGNMENTS);
  const questionWidth = Math.max(NARROWEST_QUESTION, Math.min(WIDEST_QUESTION, left));
  return answers.map(answer => {
    const under = answer.under === null ? '' : ` under ${answer.under}`;
    const question = [`${answer.measure}${under}`, ...remarks(answer, display)];
    return cells(
      answer,
      question.flatMap(part => wrap(part, questionWidth)),
      style,
    );
  });
}

function cells(answer: Answer, question: readonly string[], style: Style): Cell[] {
  const state = stateOf(answer);
  const emphasis = state === 'not met' ? style.error : state === 'withheld' ? style.warning : undefined;
  return [
    { lines: [answer.name] },
    { lines: question },
    { lines: [state === 'withheld' ? '–' : answer.display] },
    { lines: [limitOf(answer)] },
    { lines: [useOf(answer)] },
    { lines: [state], ...(emphasis === undefined ? {} : { style: emphasis }) },
  ];
}

/** What stands under the question: where the answer lies, the alternative that governs, both sides of a jump. */
function remarks({ place, governing, sides }: Answer, display: DisplayUnits): string[] {
  const where = place === undefined ? [] : [placeInWords(place, display)];
  const which = governing === null ? [] : [governing];
  return [[...where, ...which].join(' · '), sides ?? ''].filter(remark => remark !== '');
}

function placeInWords({ member, from, distance }: AnswerPlace, display: DisplayUnits): string {
  if (distance === 0) return `in ${member} at ${from}`;
  return `in ${member}, ${showQuantity({ value: distance, dimension: LENGTH }, display, 'length').text} from ${from}`;
}

/** The limit itself, without the way to it. */
function limitOf({ comparison, limitDisplay }: Answer): string {
  if (comparison === undefined || limitDisplay === undefined) return '';
  return `${comparison === '<=' ? '≤' : '≥'} ${limitDisplay.split(' = ').at(-1)}`;
}

/** Three decimals, and as many more as it takes not to round a requirement across its limit. */
function useOf({ utilisation, status }: Answer): string {
  if (utilisation === undefined) return '';
  for (let decimals = 3; decimals < 15; decimals++) {
    const shown = utilisation.toFixed(decimals);
    if (Number(shown) > 1 === (status === 'fails')) return shown;
  }
  return String(utilisation);
}
