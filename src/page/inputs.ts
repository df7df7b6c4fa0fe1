// The input schedule: values, sections, loads by case and combinations, each with where it comes from. Folded on screen.
import { loadSum } from '../drawing/index.ts';
import { wholeCase } from '../model/patterns.ts';
import type { Load, Section, Structure } from '../model/structure.ts';
import type { NamedValue, NoteResult, StructureResult } from '../note/result.ts';
import type { Dimension } from '../quantity/dimension.ts';
import {
  AREA,
  BENDING_STIFFNESS,
  FORCE,
  FORCE_PER_LENGTH,
  LENGTH,
  SECOND_MOMENT_OF_AREA,
  SECTION_MODULUS,
  STRESS,
} from '../quantity/dimension.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { showQuantity } from '../quantity/display.ts';
import { significant } from '../quantity/number.ts';
import { counted, decimalColumn, escapeHtml, listed, plainHtml, typeset, unitHtml } from './html.ts';
import { jointRows } from './joint-rows.ts';
import { statementAt } from './note-index.ts';
import { alternativeName, factorsOf } from './reactions-table.ts';

/** Standard gravity, m/s². */
const GRAVITY = 9.80665;

export function inputSchedule(note: NoteResult, result: StructureResult, open: boolean): string {
  const { structure } = result;
  if (structure === undefined) return '';
  const values = note.values.filter(({ name }) => name.startsWith(`${result.name}.`));
  const combinations = result.combinations.filter(({ kind }) => kind === 'combination');
  const loads = statementsOfLoads(note, structure);
  const bare = loads.filter(({ source, isWeight }) => source === undefined && !isWeight).length;
  const parts = [
    counted(usedSections(structure).length, 'section'),
    counted(structure.cases.filter(({ span }) => span === undefined).length, 'case'),
    counted(combinations.length, 'combination'),
  ];
  const without = bare === 0 ? '' : `; ${counted(bare, 'load')} without a source`;
  return (
    `<details class="tl-inputs"${open ? ' open' : ''}><summary>Inputs <small>${parts.join(', ')}${without}</small></summary>` +
    valueTable(note, values, result) +
    sectionTable(structure, result.display) +
    schedule(['Joint', 'attached', 'source'], ['120px', '', '190px'], jointRows(note, result)) +
    loadTable(loads, result) +
    combinationTable(result) +
    '</details>'
  );
}

/** Values, each with the words that make it and its source. */
export function valueTable(note: NoteResult, values: readonly NamedValue[], result?: StructureResult): string {
  if (values.length === 0) return '';
  const shown = values.map(({ display, quantity }) => plainHtml(quantity === undefined ? 'withheld' : display));
  const rows = values.map((value, i) => {
    const own = result === undefined ? value.name : value.name.slice(result.name.length + 1);
    const statement = statementAt(note, value.range.start);
    const words =
      statement?.kind === 'let' ? note.text.slice(statement.value.range.start, statement.value.range.end) : '';
    const source = statement?.source === undefined ? 'none given' : statement.source.text;
    return [escapeHtml(own), shown[i] ?? '', escapeHtml(oneLine(words)), escapeHtml(source)];
  });
  return schedule(['Value', '', 'as written', 'source'], ['110px', '110px', '', '190px'], rows);
}

function usedSections(structure: Structure): number[] {
  return [...new Set(structure.members.flatMap(({ legs }) => legs.map(({ section }) => section)))];
}

function sectionTable(structure: Structure, units: DisplayUnits): string {
  const used = usedSections(structure);
  const isHeated = structure.loads.some(({ kind }) => kind === 'heat');
  const rows = used.map(index => {
    const section = structure.sections[index] as Section;
    const members = structure.members.filter(({ legs }) => legs.some(leg => leg.section === index));
    const of = members.length > 6 ? `${members.length} members` : listed(members.map(({ name }) => name));
    const weight = section.massPerLength === undefined ? undefined : section.massPerLength * GRAVITY;
    const description = section.description === '' ? '' : `${plainHtml(section.description)}; `;
    return [
      `${escapeHtml(section.name)}<span class="tl-sub">${description}of ${escapeHtml(of)}${inShear(section, units)}</span>`,
      modulus(section.youngsModulus, units),
      figure(section.area, AREA, units),
      figure(section.secondMomentOfArea, SECOND_MOMENT_OF_AREA, units),
      figure(section.sectionModulus, SECTION_MODULUS, units),
      figure(section.wanted ? undefined : section.bendingStiffness, BENDING_STIFFNESS, units),
      figure(weight, FORCE_PER_LENGTH, units),
      ...(isHeated ? [figure(section.depth, LENGTH, units), expansion(section.thermalExpansion)] : []),
    ];
  });
  const heads = ['Section', 'E', 'A', 'I', 'W', 'EI', 'self-weight', ...(isHeated ? ['depth', 'alpha'] : [])];
  const widths = ['', '74px', '78px', '78px', '78px', '92px', '88px', ...(isHeated ? ['70px', '80px'] : [])];
  return schedule(heads, widths, rows);
}

function expansion(value: number | undefined): string {
  return value === undefined ? '–' : plainHtml(`${asGiven(value * 1e6)}e-6 /K`);
}

/** `; in shear G 81 GPa, area 2400 mm², GAs 194.4 MN`, of what is known and counted. */
function inShear({ shearModulus, shearArea, shearStiffness }: Section, units: DisplayUnits): string {
  if (shearStiffness === undefined) return '';
  const figures = [
    shearModulus === undefined ? '' : `G ${modulus(shearModulus, units)}`,
    shearArea === undefined ? '' : `area ${figure(shearArea, AREA, units)}`,
    `GAs ${figure(shearStiffness, FORCE, units)}`,
  ];
  return `; in shear ${figures.filter(text => text !== '').join(', ')}`;
}

/** A modulus of elasticity goes by the thousand of the unit for stresses. */
function modulus(value: number | undefined, units: DisplayUnits): string {
  if (value === undefined || units.stress.text !== 'MPa') return figure(value, STRESS, units);
  return plainHtml(`${asGiven(value / 1e9)} GPa`);
}

function asGiven(value: number): string {
  const text = significant(value);
  return text.includes('.') ? text.replace(/\.?0+$/, '') : text;
}

function figure(value: number | undefined, dimension: Dimension, units: DisplayUnits): string {
  return value === undefined ? '–' : plainHtml(showQuantity({ value, dimension }, units).text);
}

interface LoadRow {
  readonly case: number;
  readonly words: string;
  /** What a value by name comes to. */
  readonly size: string;
  readonly source: string | undefined;
  readonly isWeight: boolean;
  readonly sum: { readonly x: number; readonly y: number } | undefined;
}

/** One row a statement: what it puts on several members is one load to its writer. */
function statementsOfLoads(note: NoteResult, structure: Structure): (LoadRow & { readonly loads: readonly Load[] })[] {
  const byStatement = new Map<string, number[]>();
  for (const [index, load] of structure.loads.entries()) {
    const key = `${wholeCase(structure.cases, load.case)} ${load.range.start}`;
    byStatement.set(key, [...(byStatement.get(key) ?? []), index]);
  }
  return [...byStatement.values()].map(indices => {
    const loads = indices.map(index => structure.loads[index] as Load);
    const first = loads[0] as Load;
    const sums = indices.flatMap(index => loadSum(structure, index) ?? []);
    return {
      loads,
      case: wholeCase(structure.cases, first.case),
      words: oneLine(note.text.slice(first.range.start, first.range.end)),
      size: '',
      source: first.source,
      isWeight: first.kind === 'self-weight',
      sum: sums.length === 0 ? undefined : { x: total(sums.map(({ x }) => x)), y: total(sums.map(({ y }) => y)) },
    };
  });
}

function loadTable(rows: readonly (LoadRow & { readonly loads: readonly Load[] })[], result: StructureResult): string {
  const { structure, display } = result;
  if (structure === undefined || rows.length === 0) return '';
  const ordered = [...rows].sort((a, b) => a.case - b.case);
  const isLevel = ordered.some(({ sum }) => sum !== undefined && Math.abs(sum.x) > 1e-9 * Math.abs(sum.y));
  const downs = decimalColumn(ordered.map(({ sum }) => sumText(sum === undefined ? undefined : -sum.y, display)));
  const rights = decimalColumn(ordered.map(({ sum }) => sumText(sum?.x, display)));
  const cells = ordered.map((row, i) => {
    const { name, title } = structure.cases[row.case] ?? { name: '' };
    const isFirst = ordered[i - 1]?.case !== row.case;
    const caseCell = isFirst
      ? escapeHtml(name) + (title === undefined ? '' : `<span class="tl-sub">${escapeHtml(title)}</span>`)
      : '';
    return [
      caseCell,
      typeset(row.words, structure) + named(row, display),
      downs[i] ?? '',
      ...(isLevel ? [rights[i] ?? ''] : []),
      escapeHtml(row.source ?? (row.isWeight ? 'density' : 'none given')),
    ];
  });
  const unit = unitHtml(display.force.text);
  const heads = ['Case', 'load', `sum down, ${unit}`, ...(isLevel ? [`sum to the right, ${unit}`] : []), 'source'];
  return schedule(heads, ['120px', '', '84px', ...(isLevel ? ['84px'] : []), '170px'], cells);
}

/** What a load whose size is a name comes to. */
function named(
  { words, loads }: { readonly words: string; readonly loads: readonly Load[] },
  units: DisplayUnits,
): string {
  const load = loads[0];
  if (load === undefined || /^[\d.]/.test(words)) return '';
  const value =
    load.kind === 'line' && load.startIntensity === load.endIntensity
      ? showQuantity({ value: load.startIntensity, dimension: FORCE_PER_LENGTH }, units)
      : load.kind === 'force'
        ? showQuantity({ value: Math.hypot(load.x, load.y), dimension: FORCE }, units)
        : undefined;
  return value === undefined ? '' : ` <span class="tl-soft-text">= ${plainHtml(value.text)}</span>`;
}

function sumText(value: number | undefined, units: DisplayUnits): string {
  if (value === undefined) return '–';
  return showQuantity({ value, dimension: FORCE }, units, 'force').number.replace('-', '−');
}

function total(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0);
}

function combinationTable({ combinations }: StructureResult): string {
  const rows = combinations
    .filter(({ kind }) => kind === 'combination')
    .flatMap(({ name, alternatives }) =>
      alternatives.map(alternative => [
        escapeHtml(alternativeName(name, alternative)),
        plainHtml(factorsOf(alternative)),
        factoredWord(alternative.factors),
      ]),
    );
  return rows.length === 0 ? '' : schedule(['Combination', 'factors', 'loads'], ['130px', '', '120px'], rows);
}

export function factoredWord(factors: readonly number[]): 'factored' | 'unfactored' {
  return factors.every(factor => factor === 0 || Math.abs(factor) === 1) ? 'unfactored' : 'factored';
}

function schedule(heads: readonly string[], widths: readonly string[], rows: readonly (readonly string[])[]): string {
  if (rows.length === 0) return '';
  const head = heads
    .map((text, i) => `<th scope="col"${widths[i] === '' ? '' : ` style="width:${widths[i]}"`}>${text}</th>`)
    .join('');
  const body = rows
    .map(
      ([first = '', ...rest]) =>
        `<tr><th scope="row">${first}</th>${rest.map(cell => `<td>${cell}</td>`).join('')}</tr>`,
    )
    .join('');
  return `<div class="tl-scroll"><table class="tl-schedule"><thead><tr>${head}</tr></thead><tbody>${body}</tbody></table></div>`;
}

function oneLine(text: string): string {
  return text.replace(/\s+/g, ' ').trim();
}
