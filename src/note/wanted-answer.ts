// The answer to a question about a movement of a structure with a section still to be chosen: a multiple of 1/EI, or the
// least I that keeps to the limit.
import { loadedInWords, spansUnder } from '../model/patterns.ts';
import { wantedSection } from '../model/wanted.ts';
import { BENDING_STIFFNESS, multiplyDimensions, SECOND_MOMENT_OF_AREA } from '../quantity/dimension.ts';
import { siUnit } from '../quantity/dimension-names.ts';
import { type DisplayUnits, METRIC } from '../quantity/display.ts';
import type { Quantity } from '../quantity/quantity.ts';
import { show } from './phrases.ts';
import type { Answer } from './result.ts';
import { checkOf, isBorneOut } from './second-road.ts';
import type { Question, Series } from './series.ts';
import { forcesAreSame, leastInertia, movementsScale } from './wanted.ts';

export type WantedAnswer =
  | (Pick<Answer, 'quantity' | 'unit' | 'display' | 'status'> &
      Partial<Pick<Answer, 'check' | 'governing' | 'loaded'>> & { readonly kind: 'answer' })
  /** Why there is none, to go behind `is withheld: `. */
  | { readonly kind: 'none'; readonly why: string; readonly hint: string };

/** `limit`: what the movement is held to, in its own dimension. `inWords`: the movement of the trial section, in words. */
export function wantedAnswer(
  question: Question,
  series: Series,
  limit: number | undefined,
  inWords: string,
  units: DisplayUnits,
): WantedAnswer {
  const { measure, solved } = series;
  const section = solved === undefined ? undefined : wantedSection(solved.analysis.structure);
  const value = series.values[series.governing]!;
  const only = 'ask for one movement with require … <= a limit, which is answered with the least I';
  if (measure === undefined || solved === undefined || section?.bendingStiffness === undefined)
    return none('it depends on the I of a section that is still to be chosen', only);
  const { structure } = solved.analysis;
  const isAssumed = structure.supports.some(({ bears }) => bears) || structure.members.some(member => member.only);
  if (isAssumed && !forcesAreSame(solved))
    return none(
      `whether what bears or pulls only does so depends on the I of ${section.name}`,
      `choose ${section.name}`,
    );
  if (!(measure.kind in MOVES))
    return none(`it depends on the I of ${section.name}, which is still to be chosen`, only);
  const alternatives = series.alternatives.map(({ factors }) => factors);
  const isInverse = movementsScale(solved, alternatives);
  if (question.kind === 'find') {
    if (!isInverse) return none(`with the I of ${section.name} it changes otherwise than as 1/EI`, only);
    const quantity = times(value, { value: section.bendingStiffness, dimension: BENDING_STIFFNESS });
    const size = show({ ...quantity, value: Math.abs(quantity.value) }, units);
    const direction = inWords.replace(/^−?[\d.]+(?:e-?\d+)?\s*\S+/, '');
    return {
      kind: 'answer',
      quantity,
      unit: siUnit(quantity.dimension),
      display: `${size} / EI${direction}`,
      status: 'none',
    };
  }
  if (question.comparison === '>=' || limit === undefined)
    return none(`the least I of ${section.name} answers to a movement that is at most a limit`, 'write <=');
  const trial = section.bendingStiffness / (section.youngsModulus ?? Number.NaN);
  const noneMeets = none(
    `no I of ${section.name} meets its limit: what else gives way passes it`,
    'stiffen or hold the rest',
  );
  if (isInverse) return limit > 0 ? least((Math.abs(value.value) / limit) * trial, units) : noneMeets;
  const found = leastInertia(solved, measure, series.alternatives, limit);
  if (found === undefined) return noneMeets;
  const { taken, alternative, multiple } = found;
  const { difference, residual, energy } = checkOf(taken);
  const check = { difference, residual, energy };
  if (!isBorneOut(check))
    return none(
      'the two methods or equilibrium do not bear it out',
      'look for a stiffness that is out by a power of ten',
    );
  const { cases } = structure;
  const loaded = loadedInWords(cases, spansUnder(cases, alternative.factors), k => taken.factors[k] !== 0);
  return {
    ...least(multiple * trial, units),
    check,
    ...(series.alternatives.length > 1 || loaded.length > 0
      ? { governing: [alternative.text, ...loaded].join(', '), ...(loaded.length > 0 && { loaded: loaded.join(', ') }) }
      : {}),
  };
}

function least(inertia: number, units: DisplayUnits): WantedAnswer & { readonly kind: 'answer' } {
  const quantity = { value: inertia, dimension: SECOND_MOMENT_OF_AREA };
  const shown = units.length.text === METRIC.length.text ? { ...quantity, value: roundedUp(inertia) } : quantity;
  const unit = siUnit(SECOND_MOMENT_OF_AREA);
  return { kind: 'answer', quantity, unit, display: `I ≥ ${show(shown, units)}`, status: 'ok' };
}

const MOVES = { deflection: true, sway: true, sag: true, rotation: true } as const;

function none(why: string, hint: string): WantedAnswer {
  return { kind: 'none', why, hint };
}

function times(a: Quantity, b: Quantity): Quantity {
  return { value: a.value * b.value, dimension: multiplyDimensions(a.dimension, b.dimension) };
}

/** To four figures, so that the section shown is not a little too small; what is rounding does not count. */
function roundedUp(value: number): number {
  if (!(value > 0)) return value;
  const step = 10 ** (Math.floor(Math.log10(value)) - 3);
  return Math.ceil(value / step - 1e-8) * step;
}
