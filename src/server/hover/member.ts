// Hover on a member or a bar: the largest movement, with its place and span ratio, how far the ends move, and the moments
// and force, all under the one combination that governs the movement.
import { memberSketch } from '../../drawing/index.ts';
import type { Measured, ResolvedMeasure } from '../../model/question.ts';
import { isMovement } from '../../model/questions.ts';
import { spansAt } from '../../model/spans.ts';
import type { Location, Member, Structure } from '../../model/structure.ts';
import { wantedSection } from '../../model/wanted.ts';
import { worstAlternatives } from '../../note/patterns.ts';
import type { Alternative, NoteResult, StructureResult } from '../../note/result.ts';
import type { DisplayUnits } from '../../quantity/display.ts';
import type { Theme } from '../theme.ts';
import { length } from '../words.ts';
import type { Card, Row } from './card.ts';
import { alternativesOf, inWords, measuredOf, type Reading, readingOf } from './reading.ts';

/** `drawings`: the palette of the drawing; undefined for none. */
export function memberCard(
  note: NoteResult,
  result: StructureResult,
  index: number,
  drawings: Theme | undefined,
): Card | undefined {
  const { structure, display } = result;
  const member = structure?.members[index];
  if (structure === undefined || member === undefined) return undefined;
  const card = { title: member.name, about: aboutMember(structure, member, display) };
  const governing = governingMovement(note, result, index);
  if (governing === undefined) return { ...card, rows: withheldRows(result) };
  const { reading } = governing;
  const rows = [...movementRows(governing, member, index), ...forceRows(reading, member, index)];
  if (drawings === undefined) return { ...card, rows };
  const svg = memberSketch(structure, index, reading.solution, drawings, display);
  return { ...card, rows, drawing: { svg, words: `${member.name}: its moved shape and its moments` } };
}

interface Governing {
  readonly alternative: Alternative;
  readonly reading: Reading;
  readonly asked: ResolvedMeasure;
  readonly measured: Measured;
  /** Whether there was another alternative to choose. */
  readonly chosen: boolean;
}

function governingMovement(note: NoteResult, result: StructureResult, index: number): Governing | undefined {
  const { structure, analysis, display } = result;
  if (structure === undefined || analysis === undefined || !analysis.stability.stable) return undefined;
  const chosen = alternativesOf(result.combinations).length > 1;
  let governing: Governing | undefined;
  for (const alternative of movementAlternatives(note, result)) {
    for (const kind of ['deflection', 'sway'] as const) {
      const asked = { kind, along: [index] };
      for (const worst of worstAlternatives(analysis, alternative, asked)) {
        const reading = readingOf(structure, worst, display);
        const measured = measuredOf(reading, asked);
        if (governing !== undefined && Math.abs(measured.value) <= Math.abs(governing.measured.value)) continue;
        governing = { alternative: worst, reading, asked, measured, chosen: chosen || worst !== alternative };
      }
    }
  }
  return governing;
}

/**
 * The alternatives of the combinations under which the note asks for movements: those that it cares about. All of them,
 * where it asks for none.
 */
function movementAlternatives({ answers }: NoteResult, result: StructureResult): readonly Alternative[] {
  const asked = new Set<string | null>();
  for (const answer of result.answers) {
    const { asked: question, under } = answers[answer] ?? {};
    if (question !== undefined && under !== undefined && isMovement(question.measure.kind)) asked.add(under);
  }
  const alternatives = alternativesOf(result.combinations.filter(({ name }) => asked.has(name)));
  return alternatives.length > 0 ? alternatives : alternativesOf(result.combinations);
}

function movementRows(
  { alternative, reading, asked, measured, chosen }: Governing,
  member: Member,
  index: number,
): Row[] {
  const rows = chosen ? [{ label: 'Under', text: alternative.text }] : [];
  const distance = measured.place?.distance ?? 0;
  const place = placeInWords(reading, index, distance);
  const ratio = spanRatio(reading.structure, index, distance, measured.value);
  rows.push({ label: 'Largest movement', text: `${inWords(reading, asked, measured)}${place}${ratio}` });
  const ends = endsOf(member, index).flatMap(({ point, at }) => {
    const told = (['deflection', 'sway'] as const)
      .map(kind => ({ kind, at }))
      .filter(end => measuredOf(reading, end).value !== 0)
      .map(end => inWords(reading, end));
    return told.length === 0 ? [] : [`at ${nameOf(reading.structure, point)} ${told.join(', ')}`];
  });
  if (ends.length > 0) rows.push({ label: 'Ends move', text: ends.join('; ') });
  return rows;
}

/** `, at B`, or `, 2.224 m from A`. */
function placeInWords({ structure, units }: Reading, index: number, distance: number): string {
  const { legs = [], length: whole = 0 } = structure.members[index] ?? {};
  const slack = 1e-9 * whole;
  for (const { from, to, start, length: own } of legs) {
    if (Math.abs(distance - start) <= slack) return `, at ${nameOf(structure, from)}`;
    if (Math.abs(distance - start - own) <= slack) return `, at ${nameOf(structure, to)}`;
  }
  return `, ${length(distance, units)} from ${nameOf(structure, legs[0]?.from ?? 0)}`;
}

/** `, span/1092`: of the span through the place, the shorter where two meet. */
function spanRatio(structure: Structure, index: number, distance: number, movement: number): string {
  const spans = spansAt(structure, { kind: 'along', member: index, distance });
  if (movement === 0 || spans.length === 0) return '';
  const shortest = Math.min(...spans.map(span => span.length));
  return `, span/${Math.floor(shortest / Math.abs(movement))}`;
}

function forceRows(reading: Reading, member: Member, index: number): Row[] {
  const forces = atEnds(reading, member, index, 'force');
  const isSame = forces.every(({ words }) => words === forces[0]?.words);
  const force = { label: 'Force', text: isSame ? (forces[0]?.words ?? '') : listed(reading, forces) };
  if (member.kind === 'bar') return [force];
  const asked: ResolvedMeasure = { kind: 'moment', along: [index] };
  const largest = measuredOf(reading, asked);
  const place = largest.value === 0 ? '' : placeInWords(reading, index, largest.place?.distance ?? 0);
  return [
    { label: 'Largest moment', text: `${inWords(reading, asked, largest)}${place}` },
    { label: 'Moment', text: listed(reading, atEnds(reading, member, index, 'moment')) },
    force,
  ];
}

interface MemberEnd {
  readonly point: number;
  readonly at: Extract<Location, { readonly kind: 'along' }>;
}

function endsOf(member: Member, index: number): readonly MemberEnd[] {
  return [
    { point: member.legs[0]?.from ?? -1, at: { kind: 'along', member: index, distance: 0 } },
    { point: member.legs.at(-1)?.to ?? -1, at: { kind: 'along', member: index, distance: member.length } },
  ];
}

interface AtEnd {
  readonly point: number;
  readonly words: string;
}

function atEnds(reading: Reading, member: Member, index: number, kind: 'moment' | 'force'): readonly AtEnd[] {
  return endsOf(member, index).map(({ point, at }) => {
    const asked: ResolvedMeasure = { kind, at };
    return { point, words: inWords(reading, asked, { ...measuredOf(reading, asked), place: at }) };
  });
}

function listed({ structure }: Reading, ends: readonly AtEnd[]): string {
  return ends.map(({ point, words }) => `at ${nameOf(structure, point)} ${words}`).join('; ');
}

function nameOf({ points }: Structure, point: number): string {
  return points[point]?.name ?? '';
}

function aboutMember(structure: Structure, member: Member, units: DisplayUnits): string {
  const sections = [...new Set(member.legs.map(({ section }) => structure.sections[section]?.description ?? ''))];
  const only = member.only === undefined ? [] : [`${member.only} only`];
  return [member.kind, ...sections.filter(words => words !== ''), length(member.length, units), ...only].join(', ');
}

function withheldRows({ withheld, structure }: StructureResult): Row[] {
  const wanted = structure === undefined ? undefined : wantedSection(structure);
  const open = wanted === undefined ? undefined : `the I of ${wanted.name} is still to be chosen`;
  return [{ label: 'Movement', text: withheld ?? open ?? 'there is no load to move it' }];
}
