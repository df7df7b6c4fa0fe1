// Hovers on a point and on a support: where it stands, how far it moves, and what the support gives.

import { attachmentsAt } from '../../model/joints.ts';
import type { ResolvedMeasure } from '../../model/question.ts';
import type { Structure } from '../../model/structure.ts';
import type { Alternative, StructureResult } from '../../note/result.ts';
import { MOMENT } from '../../quantity/dimension.ts';
import { type DisplayUnits, showQuantity } from '../../quantity/display.ts';
import { length } from '../words.ts';
import type { Card, Row } from './card.ts';
import { alternativesOf, inWords, measuredOf, type Reading, readingOf } from './reading.ts';

/** More alternatives than this are not listed one by one. */
const MOST_LISTED = 6;

export function pointCard(result: StructureResult, index: number): Card | undefined {
  const { structure, display } = result;
  const point = structure?.points[index];
  if (structure === undefined || point === undefined) return undefined;
  const support = structure.supports.findIndex(one => one.point === index);
  const only = structure.supports[support]?.bears === undefined ? '' : ', bears only';
  const about = `point at ${length(point.x, display)}, ${length(point.y, display)}${only}`;
  const rows = isSolved(result)
    ? [...movementRows(structure, index, result), ...(support >= 0 ? reactionRows(structure, support, result) : [])]
    : [];
  return { title: point.name, about, rows: [...jointRows(structure, index, display), ...rows] };
}

/** How members are attached there other than rigidly, `R1: semi-rigid, 850.0 kN m/rad`; the hinge has its symbol. */
function jointRows({ members }: Structure, point: number, units: DisplayUnits): Row[] {
  return members.flatMap(member => {
    const ends = attachmentsAt(member, point);
    const freed = [...new Set(ends.flatMap(end => end.freed))];
    const turning = ends.find(end => end.turning !== undefined)?.turning;
    const words = [
      ...(turning === undefined
        ? []
        : [`semi-rigid, ${showQuantity({ value: turning, dimension: MOMENT }, units).text}/rad`]),
      ...freed.map(force => (force === 'axial' ? 'free along its axis' : 'free across its axis')),
    ];
    return words.length === 0 ? [] : [{ label: member.name, text: words.join(', ') }];
  });
}

function isSolved({ analysis }: StructureResult): boolean {
  return analysis?.stability.stable === true;
}

function movementRows(structure: Structure, point: number, { combinations, display }: StructureResult): Row[] {
  const at = { kind: 'point', point } as const;
  const measures: readonly ResolvedMeasure[] = [
    { kind: 'deflection', at },
    { kind: 'sway', at },
    { kind: 'rotation', at },
  ];
  const largest = largestOf(structure, alternativesOf(combinations), display, measures.slice(0, 2));
  if (largest === undefined) return [];
  const moves = measures.filter(asked => measuredOf(largest.reading, asked).value !== 0);
  const text = moves.length === 0 ? 'none' : moves.map(asked => inWords(largest.reading, asked)).join(', ');
  return [{ label: `Movement, ${largest.alternative.text}`, text }];
}

function reactionRows(structure: Structure, support: number, { combinations, display }: StructureResult): Row[] {
  return alternativesOf(combinations)
    .slice(0, MOST_LISTED)
    .map(alternative => ({
      label: `Reaction, ${alternative.text}`,
      text: reactionInAllDirections(readingOf(structure, alternative, display), support),
    }));
}

function reactionInAllDirections(reading: Reading, support: number): string {
  const components = (['vertical', 'horizontal', 'moment'] as const)
    .map(component => ({ kind: 'reaction' as const, support, component }))
    .filter(asked => measuredOf(reading, asked).value !== 0);
  return components.length === 0 ? 'none' : components.map(asked => inWords(reading, asked)).join(', ');
}

interface Largest {
  readonly alternative: Alternative;
  readonly reading: Reading;
}

function largestOf(
  structure: Structure,
  alternatives: readonly Alternative[],
  units: DisplayUnits,
  measures: readonly ResolvedMeasure[],
): Largest | undefined {
  let largest: Largest | undefined;
  let size = -1;
  for (const alternative of alternatives) {
    const reading = readingOf(structure, alternative, units);
    const moved = Math.max(...measures.map(asked => Math.abs(measuredOf(reading, asked).value)));
    if (moved <= size) continue;
    size = moved;
    largest = { alternative, reading };
  }
  return largest;
}
