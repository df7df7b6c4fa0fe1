// What a `show` statement asks to see of a field: one member's moment, shear, force or movement, or an envelope of it.
import { type Acting, type FieldName, memberPlate } from '../drawing/index.ts';
import type { MeasureKind, ShowBody, Under } from '../language/syntax.ts';
import type { Structure } from '../model/structure.ts';
import type { Combination, StructureResult } from '../note/result.ts';
import { escapeHtml } from './html.ts';
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
  const envelope = show.envelope ? under : undefined;
  const drawings = members.slice(0, MOST).map(member => {
    const plate = { member, field, acting: show.envelope ? acting : acting.slice(0, MOST), envelope };
    return `<figure>${memberPlate(structure, plate, result.display)}</figure>`;
  });
  const what = `${show.envelope ? 'Envelope of ' : ''}${show.measure.kind} in ${show.measure.in?.text ?? ''}`;
  const title = what.charAt(0).toUpperCase() + what.slice(1);
  return `<div class="tl-keep"><h3>${escapeHtml(title)} <small>${escapeHtml(under)}</small></h3>${drawings.join('')}</div>`;
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
