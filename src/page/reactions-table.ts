// Reactions by case and by alternative, and beside them what a checker looks for first: the sum of the loads against the
// sum of the reactions, level, upright and turning.
import type { Reaction, Solution } from '../mechanics/solution.ts';
import type { Structure } from '../model/structure.ts';
import type { Alternative, Combination, StructureResult } from '../note/result.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { significant } from '../quantity/number.ts';
import { decimalColumn, escapeHtml, listed, plainHtml, unitHtml } from './html.ts';

export interface ReactionRow {
  readonly name: string;
  /** Its factors, where there is more to say than the name. */
  readonly text: string;
  readonly solution: Solution;
  readonly isCombination: boolean;
}

/** Cases first, then the alternatives of every combination. */
export function reactionRows(result: StructureResult, combinations: readonly Combination[]): ReactionRow[] {
  const ordered = [
    ...combinations.filter(({ kind }) => kind === 'case'),
    ...combinations.filter(({ kind }) => kind === 'combination'),
  ];
  if (result.structure === undefined || result.analysis?.stability.stable !== true) return [];
  return ordered.flatMap(({ name, kind, alternatives }) =>
    alternatives.map(alternative => ({
      name: alternativeName(name, alternative),
      text: kind === 'case' ? '' : factorsOf(alternative),
      solution: alternative.solution(),
      isCombination: kind === 'combination',
    })),
  );
}

export function alternativeName(name: string, { label }: Alternative): string {
  return label === undefined ? name : `${name} (${label.replaceAll('-', '−')})`;
}

/** `1.35 dead + 1.5 wind` of `strength (b): 1.35 dead + 1.5 wind`. */
export function factorsOf({ text }: Alternative): string {
  const colon = text.indexOf(':');
  return colon < 0 ? '' : text.slice(colon + 1).trim();
}

/** So many rows, and so many supports, a reader can take in. */
const MOST_ROWS = 64;
const MOST_SUPPORTS = 42;

export function reactionsTable(structure: Structure, all: readonly ReactionRow[], units: DisplayUnits): string {
  if (all.length === 0 || structure.supports.length === 0) return '';
  const rows = all.slice(0, MOST_ROWS);
  const reactions = reactionGroups(structure, rows, units);
  const sums = sumGroups(structure, rows, units);
  const count = (groups: readonly Group[]): number => groups.reduce((sum, { columns }) => sum + columns.length, 0);
  const tables =
    count(reactions) + count(sums) <= 6
      ? [table(rows, [...reactions, ...sums])]
      : [...chunks(reactions).map(groups => table(rows, groups)), table(rows, sums)];
  return `<div class="tl-keep"><h3>Reactions</h3>${tables.join('<p class="tl-aside"></p>')}${foot(structure, all)}</div>`;
}

interface Group {
  readonly title: string;
  readonly columns: readonly Column[];
}

interface Column {
  readonly head: string;
  /** SI, one a row. */
  readonly values: readonly number[];
  readonly unit: number;
  /** Of the largest value that the column is compared with. */
  readonly largest: number;
}

const COMPONENTS = [
  { key: 'y', title: 'up', kind: 'force' },
  { key: 'x', title: 'to the right', kind: 'force' },
  { key: 'moment', title: 'anticlockwise', kind: 'moment' },
] as const;

/** A value below this share of the largest of its kind is rounding. */
const NOISE = 1e-9;

function reactionGroups(structure: Structure, rows: readonly ReactionRow[], units: DisplayUnits): Group[] {
  const force = largestForce(rows);
  return COMPONENTS.flatMap(({ key, title, kind }) => {
    const largest = kind === 'force' ? force : Math.max(...allReactions(rows).map(({ moment }) => Math.abs(moment)));
    const columns = structure.supports.slice(0, MOST_SUPPORTS).flatMap(({ point }, s) => {
      const values = rows.map(({ solution }) => solution.reactions[s]?.[key] ?? 0);
      if (values.every(value => Math.abs(value) <= NOISE * largest)) return [];
      return [{ head: `at ${pointHtml(structure, point)}`, values, unit: units[kind].size, largest }];
    });
    if (columns.length === 0) return [];
    return [{ title: `Reactions, ${title}, ${unitHtml(units[kind].text)}`, columns }];
  });
}

function sumGroups(structure: Structure, rows: readonly ReactionRow[], units: DisplayUnits): Group[] {
  const origin = structure.supports[0];
  if (origin === undefined) return [];
  const at = structure.points[origin.point] ?? { x: 0, y: 0 };
  const force = largestForce(rows);
  const applied = rows.map(({ solution }) => aboutPoint(solution.applied, at.x, at.y));
  const held = rows.map(({ solution }) => sumOfReactions(structure, solution, at.x, at.y));
  const turning = Math.max(...[...applied, ...held].map(({ moment }) => Math.abs(moment)));
  const level = [...applied, ...held].some(({ x }) => Math.abs(x) > NOISE * force);
  const pair = (
    title: string,
    heads: readonly [string, string],
    values: (sum: Reaction) => number,
    unit: number,
    largest: number,
  ): Group => ({
    title,
    columns: [
      { head: heads[0], values: applied.map(sum => -values(sum)), unit, largest },
      { head: heads[1], values: held.map(values), unit, largest },
    ],
  });
  const [forceUnit, momentUnit] = [units.force, units.moment].map(({ text }) => unitHtml(text));
  return [
    pair(`Upright, ${forceUnit}`, ['loads, down', 'reactions, up'], ({ y }) => y, units.force.size, force),
    ...(level
      ? [
          pair(
            `Level, ${forceUnit}`,
            ['loads, to the right', 'reactions, to the left'],
            ({ x }) => -x,
            units.force.size,
            force,
          ),
        ]
      : []),
    pair(
      `Turning about ${pointHtml(structure, origin.point)}, ${momentUnit}`,
      ['loads, clockwise', 'reactions, anticlockwise'],
      ({ moment }) => moment,
      units.moment.size,
      turning,
    ),
  ];
}

function allReactions(rows: readonly ReactionRow[]): Reaction[] {
  return rows.flatMap(({ solution }) => solution.reactions);
}

function largestForce(rows: readonly ReactionRow[]): number {
  let largest = 0;
  for (const { solution } of rows) {
    for (const { x, y } of [...solution.reactions, solution.applied])
      largest = Math.max(largest, Math.abs(x), Math.abs(y));
  }
  return largest;
}

/** The moment of a system given about the origin, taken about another point. */
function aboutPoint({ x, y, moment }: Reaction, px: number, py: number): Reaction {
  return { x, y, moment: moment - (px * y - py * x) };
}

function sumOfReactions(structure: Structure, solution: Solution, px: number, py: number): Reaction {
  let [x, y, moment] = [0, 0, 0];
  for (const [s, { point }] of structure.supports.entries()) {
    const reaction = solution.reactions[s];
    const at = structure.points[point];
    if (reaction === undefined || at === undefined) continue;
    x += reaction.x;
    y += reaction.y;
    moment += reaction.moment + (at.x - px) * reaction.y - (at.y - py) * reaction.x;
  }
  return { x, y, moment };
}

/** At most so many columns of reactions in one table. */
const MOST_COLUMNS = 7;

function chunks(groups: readonly Group[]): Group[][] {
  const tables: Group[][] = [];
  for (const { title, columns } of groups) {
    for (let from = 0; from < columns.length; from += MOST_COLUMNS) {
      const part = { title, columns: columns.slice(from, from + MOST_COLUMNS) };
      const last = tables.at(-1);
      const used = last?.reduce((sum, group) => sum + group.columns.length, 0) ?? MOST_COLUMNS;
      if (last !== undefined && used + part.columns.length <= MOST_COLUMNS) last.push(part);
      else tables.push([part]);
    }
  }
  return tables;
}

function table(rows: readonly ReactionRow[], groups: readonly Group[]): string {
  const columns = groups.flatMap(group => group.columns);
  const cells = columns.map(column => decimalColumn(column.values.map(value => shown(value, column))));
  const titles = groups
    .map(({ title, columns: own }) => `<th scope="colgroup" colspan="${own.length}"><span>${title}</span></th>`)
    .join('');
  const heads = columns.map(({ head }) => `<th scope="col">${head}</th>`).join('');
  const body = rows
    .map((row, r) => `<tr>${rowHead(row)}${cells.map(column => `<td>${column[r] ?? ''}</td>`).join('')}</tr>`)
    .join('');
  return (
    `<div class="tl-scroll"><table class="tl-fixed"><colgroup><col style="width:148px"><col span="${columns.length}"></colgroup>` +
    `<thead><tr class="tl-groups"><td></td>${titles}</tr><tr><th scope="col">Case or combination</th>${heads}</tr></thead>` +
    `<tbody>${body}</tbody></table></div>`
  );
}

function rowHead({ name, text, isCombination }: ReactionRow): string {
  const sub = text === '' || text === name ? '' : `<span class="tl-sub">${plainHtml(text)}</span>`;
  return `<th scope="row"${isCombination ? '' : ' class="tl-plain"'}>${escapeHtml(name)}${sub}</th>`;
}

function shown(value: number, { unit, largest }: Column): string {
  return Math.abs(value) <= NOISE * largest ? '0' : significant(value / unit).replace('-', '−');
}

function pointHtml(structure: Structure, point: number): string {
  return `<i class="tl-name-of-point">${escapeHtml(structure.points[point]?.name ?? '')}</i>`;
}

function foot(structure: Structure, rows: readonly ReactionRow[]): string {
  const sentences: string[] = [];
  const largest = largestForce(rows);
  if (rows.length > MOST_ROWS)
    sentences.push(`The first ${MOST_ROWS} of ${rows.length} cases and alternatives are shown.`);
  if (structure.supports.length > MOST_SUPPORTS) {
    sentences.push(
      `The first ${MOST_SUPPORTS} of ${structure.supports.length} supports are shown; the sums are those of all.`,
    );
  }
  if (allReactions(rows).every(({ x }) => Math.abs(x) <= NOISE * largest))
    sentences.push('No support carries a level force.');
  const lifts = structure.supports.some((_, s) =>
    rows.some(({ solution }) => (solution.reactions[s]?.y ?? 0) < -NOISE * largest),
  );
  const patterned = structure.cases.filter(({ span }) => span !== undefined).map(({ name }) => escapeHtml(name));
  if (patterned.length > 0)
    sentences.push(`Patterned loads stand on all their spans here: ${listed([...new Set(patterned)])}.`);
  if (lifts) sentences.push('Minus in an upward reaction means that the support holds down.');
  return sentences.length === 0 ? '' : `<p class="tl-aside">${sentences.join(' ')}</p>`;
}
