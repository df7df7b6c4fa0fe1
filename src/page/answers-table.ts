// The answers: what was asked in the writer's words, the result and its place, the limit spelt out, the use and the state.
import type { Structure } from '../model/structure.ts';
import type { Answer, NoteResult, StructureResult } from '../note/result.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { showQuantity } from '../quantity/display.ts';
import { significant } from '../quantity/number.ts';
import { sentence, useText } from './head.ts';
import { escapeHtml, listed, plainHtml, typeset } from './html.ts';
import { stateMark, stateOf, useBar } from './marks.ts';
import { messageHtml } from './messages.ts';
import { diagnosticsIn, statementAt } from './note-index.ts';

export function answersTable(note: NoteResult, result: StructureResult): string {
  const answers = result.answers.flatMap(index => note.answers[index] ?? []);
  if (answers.length === 0) return '';
  const rows = answers.map(answer => row(note, answer, result)).join('');
  const longest = Math.max(...answers.map(({ name }) => name.length));
  const name = Math.min(118, Math.max(52, Math.round(longest * 7.2 + 12)));
  const widths = [`${name}px`, '', '166px', '116px', '88px'];
  const columns = widths.map(width => (width === '' ? '<col>' : `<col style="width:${width}">`)).join('');
  const head = ['Name', 'Asked, and its limit', 'Result and place', 'Use', 'State']
    .map(text => `<th scope="col">${text}</th>`)
    .join('');
  return (
    `<div class="tl-keep"><h3>Answers</h3><div class="tl-scroll"><table class="tl-answers"><colgroup>${columns}</colgroup>` +
    `<thead><tr>${head}</tr></thead><tbody>${rows}</tbody></table></div>${foot(answers)}</div>`
  );
}

function row(note: NoteResult, answer: Answer, result: StructureResult): string {
  const state = stateOf(answer);
  const cells = [
    `<th scope="row">${escapeHtml(answer.name)}</th>`,
    `<td>${asked(note, answer, result.structure)}</td>`,
    `<td>${answer.quantity === undefined ? whyWithheld(note, answer, result) : resultCell(answer, result)}</td>`,
    `<td class="tl-nowrap">${useCell(answer, result.display)}</td>`,
    `<td class="tl-nowrap">${stateMark(state)}${state}</td>`,
  ];
  return `<tr${state === 'not met' ? ' class="tl-fails"' : ''}>${cells.join('')}</tr>`;
}

function asked(note: NoteResult, answer: Answer, structure: Structure | undefined): string {
  const under = answer.under === null ? '' : ` under ${escapeHtml(answer.under)}`;
  const source = answer.source === undefined ? '' : sub(escapeHtml(answer.source));
  return `${typeset(answer.measure, structure)}${under}${sub(limitWords(note, answer, structure))}${source}`;
}

function limitWords(note: NoteResult, answer: Answer, structure: Structure | undefined): string {
  if (answer.kind === 'find') return 'no limit asked';
  const limit = typeset(answer.limitDisplay ?? writtenLimit(note, answer), structure);
  return `${answer.comparison === '>=' ? 'at least' : 'at most'} ${limit}`;
}

/** Where the limit has no value, its words. */
function writtenLimit(note: NoteResult, { range }: Answer): string {
  const statement = statementAt(note, range.start);
  return statement?.kind === 'require' ? note.text.slice(statement.limit.range.start, statement.limit.range.end) : '';
}

/** The mistake in the question itself, or why nothing of the structure is told. */
function whyWithheld(note: NoteResult, answer: Answer, { withheld }: StructureResult): string {
  const own = diagnosticsIn(note, answer.range).find(({ severity }) => severity === 'error');
  return messageHtml(own?.message ?? withheld ?? 'something that it depends on is withheld');
}

function resultCell(answer: Answer, { display, structure }: StructureResult): string {
  const shown = plainHtml(shownResult(answer, display));
  const lines = [placeWords(answer, display, structure), answer.sides === undefined ? '' : plainHtml(answer.sides)];
  const governing = governingName(answer);
  if (governing !== '') lines.push(`<span title="${plainHtml(answer.governing ?? '')}">${governing}</span>`);
  return `<span title="${plainHtml(allDigits(answer, display))}">${shown}</span>${sub(lines.filter(Boolean).join('; '))}`;
}

/** What the note shows; where four figures would hide on which side of its limit a result lies, as many as it takes. */
function shownResult(answer: Answer, units: DisplayUnits): string {
  const { quantity, limit, display } = answer;
  if (quantity === undefined || limit === undefined || quantity.value === limit.value) return display;
  const unit = unitOf(answer, units);
  const size = Math.abs(quantity.value) / unit.size;
  const bound = Math.abs(limit.value) / unit.size;
  for (let figures = 4; figures <= 12; figures++) {
    if (significant(size, figures) === significant(bound, figures)) continue;
    return figures === 4 ? display : display.replace(/\d+(?:\.\d+)?(?:e-?\d+)?/, significant(size, figures));
  }
  return display;
}

/** What lies past this many digits is not established by the two methods' agreement. */
const ALL_DIGITS = 10;

/** `4.443278203 mm down`. */
export function allDigits(answer: Pick<Answer, 'quantity' | 'display' | 'unit'>, units: DisplayUnits): string {
  const { quantity, display } = answer;
  if (quantity === undefined) return '';
  const number = trimmed(significant(Math.abs(quantity.value) / unitOf(answer, units).size, ALL_DIGITS));
  return display.replace(/\d+(?:\.\d+)?(?:e-?\d+)?/, number);
}

function trimmed(number: string): string {
  return number.includes('.') && !number.includes('e') ? number.replace(/\.?0+$/, '') : number;
}

/** The unit that the shown words are in. */
function unitOf(answer: Pick<Answer, 'display' | 'quantity'>, units: DisplayUnits): { readonly size: number } {
  const behind = answer.display.replace(/^[−-]?[\d.]+(?:e-?\d+)?\s*/, '');
  const known = Object.values(units)
    .filter(({ text }) => behind === text || behind.startsWith(`${text} `) || behind.startsWith(`${text},`))
    .sort((a, b) => b.text.length - a.text.length)[0];
  if (known !== undefined) return known;
  // A unit of no kind: what one of it is worth follows from the figure itself.
  const { quantity } = answer;
  if (quantity === undefined || quantity.value === 0) return { size: 1 };
  const shown = Number(showQuantity(quantity, units).number);
  if (!(Math.abs(shown) > 0)) return { size: 1 };
  const ratio = quantity.value / shown;
  const power = 10 ** Math.round(Math.log10(Math.abs(ratio)));
  return { size: Math.abs(ratio / power - 1) < 1e-3 ? power : 1 };
}

function placeWords(answer: Answer, units: DisplayUnits, structure: Structure | undefined): string {
  const { place } = answer;
  if (place === undefined) return '';
  const distance = showQuantity({ value: place.distance, dimension: [1, 0, 0, 0, 0] }, units, 'length').text;
  const inMember = (structure?.members.length ?? 0) > 1 ? ` in ${escapeHtml(place.member)}` : '';
  const from = `<i class="tl-name-of-point">${escapeHtml(place.from)}</i>`;
  return place.distance === 0 ? `at ${from}${inMember}` : `${plainHtml(distance)} from ${from}${inMember}`;
}

/** `strength (b)` of `strength (b): 1.35 dead + 1.5 wind`; with the spans that are loaded behind it. */
function governingName({ governing, loaded }: Answer): string {
  if (governing === null) return '';
  if (loaded === undefined) return escapeHtml(governing.split(':', 1)[0] ?? '');
  const alternative = governing.slice(0, -loaded.length).split(':', 1)[0]?.replace(/, $/, '') ?? '';
  return escapeHtml(alternative === '' ? loaded : `${alternative}, ${loaded}`);
}

function useCell(answer: Answer, units: DisplayUnits): string {
  const { quantity, limit, utilisation, comparison } = answer;
  if (quantity === undefined || limit === undefined) return '';
  if (comparison === '>=') {
    const margin = { ...quantity, value: quantity.value - limit.value };
    const kind = (Object.keys(units) as (keyof DisplayUnits)[]).find(key =>
      answer.display.includes(` ${units[key].text}`),
    );
    return `<span style="font-weight:400">margin</span> ${plainHtml(showQuantity(margin, units, kind).text)}`;
  }
  return utilisation === undefined ? '' : `${useText(answer)}${useBar(utilisation)}`;
}

function sub(html: string): string {
  return html === '' ? '' : `<span class="tl-sub">${html}</span>`;
}

/** The two methods' largest difference, the residual, limits without a source, and what more stiffness would do. */
function foot(answers: readonly Answer[]): string {
  const sentences: string[] = [];
  const checks = answers.flatMap(({ name, check }) => (check === undefined ? [] : [{ name, ...check }]));
  const twice = checks.filter(({ difference }) => difference > 0);
  if (twice.length > 0) {
    const worst = twice.reduce((a, b) => (b.difference > a.difference ? b : a));
    sentences.push(
      `Two methods, stiffness and virtual work, differ by at most ${power(worst.difference)} of the answer (${escapeHtml(worst.name)}).`,
    );
  }
  if (checks.length > 0) {
    const residual = Math.max(...checks.map(check => check.residual));
    sentences.push(
      residual === 0 ? 'Equilibrium is exact.' : `Equilibrium leaves at most ${power(residual)} of the loads.`,
    );
    const energy = Math.max(...checks.map(check => check.energy));
    if (energy > 0) sentences.push(`Work and stored energy differ by at most ${power(energy)}.`);
  }
  for (const { name, stiffnessFactor } of answers) {
    if (stiffnessFactor === undefined) continue;
    sentences.push(
      `For ${escapeHtml(name)} all stiffness must rise by a factor of ${significant(stiffnessFactor, 3)}.`,
    );
  }
  const bare = answers
    .filter(({ kind, source }) => kind === 'require' && source === undefined)
    .map(({ name }) => escapeHtml(name));
  if (bare.length > 0)
    sentences.push(
      sentence(
        `${bare.length === 1 ? 'the limit' : 'the limits'} of ${listed(bare)} ${bare.length === 1 ? 'has' : 'have'} no source`,
      ),
    );
  return sentences.length === 0 ? '' : `<p class="tl-aside">${sentences.join(' ')}</p>`;
}

/** One digit, rounded up: `8 × 10⁻¹⁵`. */
function power(value: number): string {
  const exponent = Math.floor(Math.log10(value));
  const digit = Math.ceil(value / 10 ** exponent - 1e-9);
  const [shown, tens] = digit === 10 ? [1, exponent + 1] : [digit, exponent];
  return `${shown} × 10<sup>${String(tens).replace('-', '−')}</sup>`;
}
