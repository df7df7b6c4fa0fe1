// Hovers on a load, a case and a combination: what they put on the structure.
import { strainWords } from '../../drawing/index.ts';
import { wholeCase } from '../../model/patterns.ts';
import type { Load, Structure } from '../../model/structure.ts';
import type { Combination, StructureResult } from '../../note/result.ts';
import type { DisplayUnits } from '../../quantity/display.ts';
import { inAllDirections } from '../words.ts';
import type { Card, Row } from './card.ts';
import { resultantOf } from './resultant.ts';

/** `loads`: those that one statement puts on the structure. */
export function loadCard({ structure, display }: StructureResult, loads: readonly Load[]): Card | undefined {
  const [first] = loads;
  if (structure === undefined || first === undefined) return undefined;
  const title = structure.cases[first.case]?.name ?? '';
  return { title, about: 'load, unfactored', rows: [resultantRow(structure, loads, display), ...sourceRow(first)] };
}

export function caseCard({ structure, display }: StructureResult, name: string): Card | undefined {
  const index = structure?.cases.findIndex(one => one.name === name) ?? -1;
  if (structure === undefined || index < 0) return undefined;
  const loads = structure.loads.filter(load => wholeCase(structure.cases, load.case) === index);
  const title = structure.cases[index]?.title;
  const about = title === undefined ? 'case, unfactored' : `case, ${title}, unfactored`;
  return { title: name, about, rows: [resultantRow(structure, loads, display)] };
}

/** More alternatives than this are counted, not listed. */
const MOST_LISTED = 6;

export function combinationCard({ name, alternatives }: Combination): Card {
  const rows = alternatives.slice(0, MOST_LISTED).map(({ text }) => {
    const colon = text.indexOf(':');
    return { label: text.slice(0, Math.max(colon, 0)), text: text.slice(colon + 1).trim() };
  });
  const more = alternatives.length - rows.length;
  if (more > 0) rows.push({ label: 'And', text: `${more} more` });
  return { title: name, about: 'combination', rows };
}

function resultantRow(structure: Structure, loads: readonly Load[], units: DisplayUnits): Row {
  const imposed = [...new Set(loads.map(load => imposedWords(load, units)))];
  if (loads.length > 0 && imposed.every(words => words !== undefined)) {
    return { label: 'Resultant', text: `none; ${imposed.join(', ')}` };
  }
  return { label: 'Resultant', text: inAllDirections(resultantOf(structure, loads), units) };
}

/** Of a load that puts no force on anything. */
function imposedWords(load: Load, units: DisplayUnits): string | undefined {
  switch (load.kind) {
    case 'movement':
      return 'a movement of a support';
    case 'heat':
    case 'lengthen':
      return strainWords(load, units).replaceAll('\u2009', ' ');
    default:
      return undefined;
  }
}

function sourceRow({ source }: Load): Row[] {
  return source === undefined ? [] : [{ label: 'Source', text: source }];
}
