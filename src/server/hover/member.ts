// Hover on a member or a bar: the largest movement of any combination, with its place and span ratio, and the moments
// and force at the member's ends under the combination that governs it.
import { memberSketch } from '../../drawing/index.ts';
import type { Measured, ResolvedMeasure } from '../../model/question.ts';
import { spansAt } from '../../model/spans.ts';
import type { Member, Structure } from '../../model/structure.ts';
import type { Alternative, StructureResult } from '../../note/result.ts';
import type { DisplayUnits } from '../../quantity/display.ts';
import type { Theme } from '../theme.ts';
import { length } from '../words.ts';
import type { Card, Row } from './card.ts';
import { alternativesOf, inWords, measuredOf, type Reading, readingOf } from './reading.ts';

/** `drawings`: the palette of the drawing; undefined for none. */
export function memberCard(result: StructureResult, index: number, drawings: Theme | undefined): Card | undefined {
  const member = result.structure?.members[index];
  if (result.structure === undefined || member === undefined) return undefined;
  const card = { title: member.name, about: aboutMember(result.structure, member, result.display) };
  const governing = governingMovement(result, index);
  if (governing === undefined) return { ...card, rows: withheldRows(result) };
  const rows = [...movementRows(governing, index), ...endRows(governing.reading, index)];
  if (drawings === undefined) return { ...card, rows };
  const svg = memberSketch(result.structure, index, governing.reading.solution, drawings, result.display);
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

function governingMovement(
  { structure, analysis, combinations, display }: StructureResult,
  index: number,
): Governing | undefined {
  if (structure === undefined || analysis === undefined || !analysis.stability.stable) return undefined;
  const alternatives = alternativesOf(combinations);
  let governing: Governing | undefined;
  for (const alternative of alternatives) {
    const reading = readingOf(structure, alternative, display);
    for (const kind of ['deflection', 'sway'] as const) {
      const asked = { kind, along: [index] };
      const measured = measuredOf(reading, asked);
      if (governing !== undefined && Math.abs(measured.value) <= Math.abs(governing.measured.value)) continue;
      governing = { alternative, reading, asked, measured, chosen: alternatives.length > 1 };
    }
  }
  return governing;
}

function movementRows({ alternative, reading, asked, measured, chosen }: Governing, index: number): Row[] {
  const { structure, units } = reading;
  const words = inWords(reading, asked, measured);
  const distance = measured.place?.distance;
  const place = distance === undefined ? '' : `, ${placeInWords(structure, index, distance, units)}`;
  const ratio = distance === undefined ? '' : spanRatio(structure, index, distance, measured.value);
  const rows = [{ label: 'Largest movement', text: `${words}${place}${ratio}` }];
  if (chosen) rows.push({ label: 'Under', text: alternative.text });
  return rows;
}

/** `at B`, or `2.224 m from A`. */
function placeInWords(structure: Structure, index: number, distance: number, units: DisplayUnits): string {
  const legs = structure.members[index]?.legs ?? [];
  const slack = 1e-9 * (structure.members[index]?.length ?? 0);
  const nameOf = (point: number): string => structure.points[point]?.name ?? '';
  for (const leg of legs) {
    if (Math.abs(distance - leg.start) <= slack) return `at ${nameOf(leg.from)}`;
    if (Math.abs(distance - leg.start - leg.length) <= slack) return `at ${nameOf(leg.to)}`;
  }
  return `${length(distance, units)} from ${nameOf(legs[0]?.from ?? 0)}`;
}

/** `, span/1092`: of the span through the place, the shorter where two meet. */
function spanRatio(structure: Structure, index: number, distance: number, movement: number): string {
  const spans = spansAt(structure, { kind: 'along', member: index, distance });
  if (movement === 0 || spans.length === 0) return '';
  const shortest = Math.min(...spans.map(span => span.length));
  return `, span/${Math.floor(shortest / Math.abs(movement))}`;
}

function endRows(reading: Reading, index: number): Row[] {
  const member = reading.structure.members[index];
  if (member === undefined) return [];
  const forces = atEnds(reading, member, index, 'force');
  const rows = [
    { label: 'Force', text: forces[0]?.words === forces[1]?.words ? (forces[0]?.words ?? '') : listed(forces) },
  ];
  if (member.kind === 'bar') return rows;
  return [{ label: 'Moment', text: listed(atEnds(reading, member, index, 'moment')) }, ...rows];
}

interface AtEnd {
  readonly point: string;
  readonly words: string;
}

function atEnds(reading: Reading, member: Member, index: number, kind: 'moment' | 'force'): readonly AtEnd[] {
  const { points } = reading.structure;
  const first = points[member.legs[0]?.from ?? -1]?.name ?? '';
  const last = points[member.legs.at(-1)?.to ?? -1]?.name ?? '';
  const wordsAt = (distance: number): string => {
    const asked: ResolvedMeasure = { kind, at: { kind: 'along', member: index, distance } };
    const measured = measuredOf(reading, asked);
    return inWords(reading, asked, { ...measured, place: { member: index, distance } });
  };
  return [
    { point: first, words: wordsAt(0) },
    { point: last, words: wordsAt(member.length) },
  ];
}

function listed(ends: readonly AtEnd[]): string {
  return ends.map(({ point, words }) => `at ${point} ${words}`).join('; ');
}

function aboutMember(structure: Structure, member: Member, units: DisplayUnits): string {
  const sections = [...new Set(member.legs.map(({ section }) => structure.sections[section]?.description ?? ''))];
  return [member.kind, ...sections.filter(words => words !== ''), length(member.length, units)].join(', ');
}

function withheldRows({ withheld }: StructureResult): Row[] {
  return [{ label: 'Movement', text: withheld ?? 'there is no load to move it' }];
}
