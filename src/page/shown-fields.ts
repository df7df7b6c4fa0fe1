// What a `show` statement asks to see of a field: one member's moment, shear, force or movement, or an envelope of it.
import {
  type Acting,
  type Envelope,
  FIELD_STYLES,
  type FieldName,
  memberPlate,
  type OutlinePiece,
} from '../drawing/index.ts';
import type { MeasureKind, ShowBody, Under } from '../language/syntax.ts';
import { envelopeAlong, type LinearQuantity, roundingIn, shifted } from '../mechanics/index.ts';
import type { Solution } from '../mechanics/solution.ts';
import { loadedInWords, spansUnder } from '../model/patterns.ts';
import type { Structure } from '../model/structure.ts';
import type { Combination, StructureResult } from '../note/result.ts';
import { LENGTH } from '../quantity/dimension.ts';
import { type DisplayUnits, showQuantity } from '../quantity/display.ts';
import { escapeHtml, plainHtml } from './html.ts';
import { alternativeName } from './reactions-table.ts';

type ShownField = Extract<ShowBody, { readonly kind: 'field' }>;

/** So many strips or members are drawn for one statement. */
const MOST = 12;

/** Undefined where this version has no drawing for it, or there is nothing solved to draw. */
export function shownField(result: StructureResult, structure: Structure, show: ShownField): string | undefined {
  const field = FIELDS[show.measure.kind];
  const members = membersOf(structure, show.measure.in?.text);
  const combinations = combinationsUnder(result, show.under);
  const isSolved = result.analysis?.stability.stable === true && result.analysis.cases.length > 0;
  if (field === undefined || members.length === 0 || combinations.length === 0 || !isSolved) return undefined;
  const acting = actingOf(combinations);
  const under = show.under?.kind === 'all' ? 'all' : (combinations[0]?.name ?? '');
  const drawings = members.slice(0, MOST).map(member => {
    const envelope = show.envelope ? envelopeOf(result, structure, member, field, acting, under) : undefined;
    const plate = { member, field, acting: acting.slice(0, MOST), envelope };
    const drawn = `<figure>${memberPlate(structure, plate, result.display)}</figure>`;
    return envelope === undefined ? drawn : `${drawn}${governingWords(envelope, structure, member, result.display)}`;
  });
  const what = `${show.envelope ? 'Envelope of ' : ''}${show.measure.kind} in ${show.measure.in?.text ?? ''}`;
  const title = what.charAt(0).toUpperCase() + what.slice(1);
  return `<div class="tl-keep"><h3>${escapeHtml(title)} <small>${escapeHtml(under)}</small></h3>${drawings.join('')}</div>`;
}

/** Exact over all alternatives, each with the spans loaded that are worst at a place. */
function envelopeOf(
  { analysis }: StructureResult,
  { cases }: Structure,
  member: number,
  field: FieldName,
  acting: readonly Acting[],
  under: string,
): Envelope {
  if (analysis === undefined) throw new Error('an envelope of a structure without an analysis was asked for');
  const { quantity } = FIELD_STYLES[field];
  const kind = ({ moment: 'moment', movement: 'movement', shear: 'force', axial: 'force' } as const)[field];
  const quantityOf = (solution: Solution): LinearQuantity => ({
    polynomial: piece => piece[quantity],
    rounding: () => roundingIn(solution, kind),
  });
  const alternatives = acting.map(({ factors }) => factors);
  // Of a patterned case alone the name says no more than its spans do.
  const isAlone = (name: string): boolean => cases.some(one => one.span !== undefined && one.name === name);
  const outline = (sense: 1 | -1): OutlinePiece[] =>
    envelopeAlong(analysis, member, quantityOf, alternatives, sense).map(
      ({ start, from, end, polynomial, alternative, factors }) => {
        const { name, factors: all } = acting[alternative] as Acting;
        const loaded = loadedInWords(cases, spansUnder(cases, all), k => factors[k] !== 0);
        return {
          start: start + from,
          end,
          polynomial: shifted(polynomial, from),
          name: isAlone(name) ? loaded.join() : [name, ...loaded].join(', '),
        };
      },
    );
  return { name: under, greatest: outline(1), least: outline(-1) };
}

/** So many stretches are told of each outline. */
const MOST_STRETCHES = 8;

/** Which alternative gives the greatest and the least values, stretch by stretch; nothing where there is one only. */
function governingWords(
  { greatest, least }: Envelope,
  structure: Structure,
  member: number,
  units: DisplayUnits,
): string {
  const from = structure.points[structure.members[member]?.legs[0]?.from ?? 0]?.name ?? '';
  const sentences = (
    [
      ['Greatest', greatest],
      ['Least', least],
    ] as const
  ).map(([word, outline]) => {
    const stretches: { name: string; end: number }[] = [];
    for (const { name, end } of outline) {
      const last = stretches.at(-1);
      if (last?.name === name) last.end = end;
      else stretches.push({ name, end });
    }
    const told = stretches.slice(0, MOST_STRETCHES).map(({ name, end }, i) => {
      if (i === stretches.length - 1) return i === 0 ? `${name} throughout` : `${name} from there on`;
      const to = showQuantity({ value: end, dimension: LENGTH }, units, 'length').text;
      return i === 0 ? `${name} to ${to} from ${from}` : `${name} to ${to}`;
    });
    const more = stretches.length > MOST_STRETCHES ? `; ${stretches.length - MOST_STRETCHES} further stretches` : '';
    return `${word}: ${told.join('; ')}${more}.`;
  });
  return `<p class="tl-aside">${plainHtml(sentences.join(' '))}</p>`;
}

const FIELDS: Readonly<Record<MeasureKind, FieldName | undefined>> = {
  deflection: 'movement',
  sway: 'movement',
  sag: 'movement',
  rotation: undefined,
  moment: 'moment',
  sagging: 'moment',
  hogging: 'moment',
  shear: 'shear',
  force: 'axial',
  tension: 'axial',
  compression: 'axial',
  stress: undefined,
  reaction: undefined,
};

function membersOf({ members, groups }: Structure, name: string | undefined): readonly number[] {
  if (name === undefined) return [];
  const own = members.findIndex(member => member.name === name);
  return own >= 0 ? [own] : (groups.find(group => group.name === name)?.members ?? []);
}

/** What stands behind `under`; without it the first combination, or the first case where there is none. */
export function combinationsUnder({ combinations }: StructureResult, under: Under | undefined): readonly Combination[] {
  const own = combinations.filter(({ kind }) => kind === 'combination');
  if (under === undefined) return (own.length > 0 ? own : combinations).slice(0, 1);
  if (under.kind === 'all') return own.length > 0 ? own : combinations;
  const found = combinations.filter(({ name }) => name === under.name.text);
  const label = under.label?.text;
  if (label === undefined) return found;
  return found.map(one => ({
    ...one,
    alternatives: one.alternatives.filter(
      alternative => alternative.label === label || alternative.label?.replace(/[+-]+$/, '') === label,
    ),
  }));
}

function actingOf(combinations: readonly Combination[]): Acting[] {
  return combinations.flatMap(({ name, alternatives }) =>
    alternatives.map(alternative => ({
      name: alternativeName(name, alternative),
      factors: alternative.factors,
      solution: alternative.solution(),
    })),
  );
}
