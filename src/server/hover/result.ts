// Hover on a result: the value with its place, the limit with its source, the use, and how well it was checked.
import type { Answer, AnswerPlace } from '../../note/result.ts';
import type { DisplayUnits } from '../../quantity/display.ts';
import { allDigits, length, limitInWords, stateInWords } from '../words.ts';
import type { Card, Row } from './card.ts';

export function resultCard(answer: Answer, units: DisplayUnits): Card {
  const asked = answer.under === null ? answer.measure : `${answer.measure}, ${answer.under}`;
  return { title: answer.name, about: asked, rows: [...valueRows(answer, units), ...limitRows(answer)] };
}

function valueRows(answer: Answer, units: DisplayUnits): Row[] {
  const { quantity, unit, display, place, governing, sides, check } = answer;
  if (quantity === undefined) return [{ label: 'Value', text: 'withheld; the diagnostic says why' }];
  const where = place === undefined ? '' : `, ${placeInWords(place, units)}`;
  const rows: Row[] = [{ label: 'Value', text: `${display}${where}` }];
  if (sides !== undefined) rows.push({ label: 'Either side', text: sides });
  if (governing !== null) rows.push({ label: 'Governed by', text: governing });
  rows.push({ label: 'All digits', text: allDigits(quantity, unit) });
  // Only a movement is worked by two methods.
  const isMovement = unit === 'm' || unit === 'rad';
  if (check !== undefined && isMovement)
    rows.push({ label: 'Two methods differ by', text: check.difference.toExponential(1) });
  return rows;
}

function limitRows(answer: Answer): Row[] {
  const limit = limitInWords(answer);
  if (limit === undefined) return [];
  const rows: Row[] = [{ label: 'Limit', text: answer.source === undefined ? limit : `${limit} (${answer.source})` }];
  if (answer.quantity !== undefined) rows.push({ label: 'State', text: stateInWords(answer) });
  if (answer.stiffnessFactor !== undefined) {
    rows.push({ label: 'Stiffness must rise by', text: `a factor of ${answer.stiffnessFactor.toPrecision(3)}` });
  }
  return rows;
}

function placeInWords({ member, from, distance }: AnswerPlace, units: DisplayUnits): string {
  return `${length(distance, units)} from ${from} on ${member}`;
}
