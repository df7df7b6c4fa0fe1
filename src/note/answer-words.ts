// The value of a worked question in words: which way, on which side, where, under what.
import { isMovement } from '../model/questions.ts';
import { LENGTH, sameDimension } from '../quantity/dimension.ts';
import type { DisplayKind } from '../quantity/display.ts';
import type { Quantity } from '../quantity/quantity.ts';
import type { AnswerInputs } from './answer-inputs.ts';
import { answerInWords, displayKind, show } from './phrases.ts';
import type { AnswerPlace } from './result.ts';
import type { Series } from './series.ts';

export function inWords({ state, units }: AnswerInputs, series: Series): string {
  const value = series.values[series.governing]!;
  const structure = state.structure();
  if (series.measure === undefined || structure === undefined) return show(value, units, kindOf(series, value));
  return answerInWords(series.measure, value, units, structure, placeInMember(series));
}

/** How a value of the question is shown: as its measure, or as a movement where it is a length worked from movements. */
export function kindOf({ measure, taken }: Series, { dimension }: Quantity): DisplayKind | undefined {
  if (measure !== undefined) return displayKind(measure);
  const moves = taken.some(({ measure: { kind } }) => isMovement(kind));
  return moves && sameDimension(dimension, LENGTH) ? 'deflection' : undefined;
}

function placeInMember(series: Series): { readonly member: number; readonly distance: number } | undefined {
  const found = series.measured[series.governing]?.place;
  if (found !== undefined) return found;
  const { measure } = series;
  return measure !== undefined && 'at' in measure && measure.at.kind === 'along' ? measure.at : undefined;
}

export function placeOf({ measure, measured, governing, solved }: Series): AnswerPlace | undefined {
  const place = measured[governing]?.place;
  // Only an extreme has a place to tell; what is asked at a place is told there.
  if (place === undefined || measure === undefined || solved === undefined || 'at' in measure) return undefined;
  const { structure } = solved.analysis;
  const member = structure.members[place.member]!;
  return { member: member.name, from: structure.points[member.legs[0]!.from]!.name, distance: place.distance };
}

export function sidesInWords({ state, units }: AnswerInputs, series: Series): string | undefined {
  const sides = series.measured[series.governing]?.sides;
  const structure = state.structure();
  if (sides === undefined || series.measure === undefined || structure === undefined) return undefined;
  const { dimension } = series.values[series.governing]!;
  const words = sides.map(value =>
    answerInWords(series.measure!, { value, dimension }, units, structure, placeInMember(series)),
  );
  return `${words[0]} before, ${words[1]} behind`;
}

/** The alternative, where it was chosen among others, and the spans that are loaded, where they were. */
export function governingInWords({ acting, governing, loaded }: Series): string | null {
  if (acting.length < 2 && loaded === undefined) return null;
  return acting[governing]?.text ?? loaded ?? null;
}
