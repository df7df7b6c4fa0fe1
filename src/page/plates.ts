// The drawings of a structure: the loads and fields of whatever combination or case the reader chooses, by radio buttons
// that the stylesheet reads, and a sketch of every case under them.
import { caseSketch, legCount, MOST_LEGS, type StructureDrawing, structureDrawing } from '../drawing/index.ts';
import type { Reaction, Solution } from '../mechanics/solution.ts';
import { spansUnder, wholeCase } from '../model/patterns.ts';
import type { Structure } from '../model/structure.ts';
import type { Alternative, StructureResult } from '../note/result.ts';
import { escapeHtml, plainHtml } from './html.ts';
import { factoredWord } from './inputs.ts';
import { alternativeName, factorsOf } from './reactions-table.ts';

interface Choice {
  readonly name: string;
  readonly text: string;
  readonly alternative: Alternative;
}

/** So many choices are drawn, and so many legs in all of them; a page with more is slow to read and to make. */
const MOST_CHOICES = 24;
const MOST_LEGS_DRAWN = 1500;

/** `index`: of the structure in the note, which keeps the groups of radio buttons apart. */
export function plates(result: StructureResult, structure: Structure, index: number): string {
  const all = choicesOf(result, structure);
  const legs = legCount(structure);
  const most = legs > MOST_LEGS ? 1 : Math.max(1, Math.min(MOST_CHOICES, Math.floor(MOST_LEGS_DRAWN / legs)));
  const choices = all.slice(0, most);
  if (choices.length === 0) return `<div class="tl-pick">${figure(drawUnloaded(structure, result), '')}</div>`;
  const left = all.length - choices.length;
  const rest = left === 0 ? '' : `<p class="tl-aside">${left} further alternatives are not drawn here.</p>`;
  if (choices.length === 1) {
    const [only] = choices as [Choice];
    return `<div class="tl-pick">${figure(draw(structure, result, only), caption(only, structure))}</div>${sketches(result, structure)}`;
  }
  const group = `tautline-${index + 1}`;
  const items = choices.map((choice, i) => {
    const id = `${group}-${i + 1}`;
    return (
      `<input type="radio" name="${group}" id="${id}"${i === 0 ? ' checked' : ''}>` +
      `<label for="${id}">${escapeHtml(choice.name)}</label>` +
      figure(draw(structure, result, choice), caption(choice, structure))
    );
  });
  return (
    `<div class="tl-pick" role="group" aria-label="Loads and fields of">` +
    `<span class="tl-lead">Loads and fields of</span>${items.join('')}</div>${rest}${sketches(result, structure)}`
  );
}

/** Combinations first, in the order of the note, then cases alone. Of a structure without a solution, its cases. */
function choicesOf({ combinations }: StructureResult, { cases }: Structure): Choice[] {
  if (combinations.length === 0)
    return cases.map(({ name }, own) =>
      unsolvedCase(
        name,
        cases.map((_, i) => (i === own ? 1 : 0)),
      ),
    );
  const ordered = [
    ...combinations.filter(({ kind }) => kind === 'combination'),
    ...combinations.filter(({ kind }) => kind === 'case'),
  ];
  return ordered.flatMap(({ name, alternatives }) =>
    alternatives.map(alternative => ({
      name: alternativeName(name, alternative),
      text: factorsOf(alternative),
      alternative,
    })),
  );
}

function unsolvedCase(name: string, factors: readonly number[]): Choice {
  const solution = (): Solution => {
    throw new Error(`case ${name} of a structure that is not solved was asked for its solution`);
  };
  return { name, text: '', alternative: { label: undefined, text: name, factors, solution } };
}

function caption({ name, text, alternative }: Choice, { cases }: Structure): string {
  const sum = text === '' || text === name ? '' : ` = ${text}`;
  const patterned = spansUnder(cases, alternative.factors).length > 0 ? ', patterned loads on all their spans' : '';
  return `${name}${sum}, ${factoredWord(alternative.factors)}${patterned}`;
}

function figure({ main, panels }: StructureDrawing, words: string): string {
  const fields = panels.map(({ svg, wide }) => `<div${wide ? ' class="tl-wide"' : ''}>${svg}</div>`).join('');
  const below = panels.length === 0 ? '' : `<div class="tl-panels">${fields}</div>`;
  const told = words === '' ? '' : `<figcaption class="tl-aside">${plainHtml(words)}</figcaption>`;
  return `<figure class="tl-plate">${told}${main}${below}</figure>`;
}

function draw(structure: Structure, result: StructureResult, { name, alternative }: Choice): StructureDrawing {
  const isSolved = result.analysis?.stability.stable === true && result.analysis.cases.length > 0;
  const solution = isSolved ? alternative.solution() : undefined;
  const make = (): StructureDrawing =>
    structureDrawing(structure, { name, factors: alternative.factors, solution }, result.display);
  return solution === undefined ? make() : remembered(solution, keyOf(structure, result, name), make);
}

function drawUnloaded(structure: Structure, { display }: StructureResult): StructureDrawing {
  return structureDrawing(
    structure,
    { name: 'no load', factors: structure.cases.map(() => 0), solution: undefined },
    display,
  );
}

/** Drawings by the solution that they show: while a note is edited elsewhere, they are not made again. */
const memory = new WeakMap<Solution, Map<string, StructureDrawing>>();

function remembered(solution: Solution, key: string, make: () => StructureDrawing): StructureDrawing {
  const known = memory.get(solution) ?? new Map<string, StructureDrawing>();
  memory.set(solution, known);
  const drawing = known.get(key) ?? make();
  known.set(key, drawing);
  return drawing;
}

/** What a drawing shows beyond what the solution depends on. */
function keyOf(structure: Structure, { display }: StructureResult, name: string): string {
  const { points, members, sections, cases, title, supports } = structure;
  return JSON.stringify([
    name,
    structure.name,
    title,
    points.map(point => point.name),
    members.map(member => member.name),
    sections.map(section => [section.name, section.description]),
    cases.map(one => one.name),
    supports.map(({ symbol }) => symbol),
    display,
  ]);
}

/** Sum of a case's loads, those of all its spans where it is patterned. */
function appliedBy({ cases }: Structure, analysis: StructureResult['analysis'], index: number): Reaction | undefined {
  if (analysis?.cases[index] === undefined) return undefined;
  let [x, y, moment] = [0, 0, 0];
  for (const [i, { applied }] of analysis.cases.entries()) {
    if (wholeCase(cases, i) !== index) continue;
    x += applied.x;
    y += applied.y;
    moment += applied.moment;
  }
  return { x, y, moment };
}

/** A small sketch of every case, so that none is hidden behind a choice; none where there is one case only. */
function sketches({ display, analysis }: StructureResult, structure: Structure): string {
  const whole = structure.cases.flatMap(({ span }, i) => (span === undefined ? [i] : []));
  if (whole.length < 2 || legCount(structure) > MOST_LEGS) return '';
  const drawn = whole.map(i => caseSketch(structure, i, appliedBy(structure, analysis, i), display, 'page'));
  return `<div class="tl-cases">${drawn.join('')}</div>`;
}
