// Answers in words: a movement with its direction, a moment with the side in tension, a reaction that holds down. The
// signs of the language are for programs; what a person reads says which way.
import type { ResolvedMeasure } from '../model/question.ts';
import type { Structure } from '../model/structure.ts';
import type { DisplayKind, DisplayUnits } from '../quantity/display.ts';
import { showQuantity } from '../quantity/display.ts';
import type { Quantity } from '../quantity/quantity.ts';

/** A true minus, a thin space between number and unit where asked; the text of `display` is plain. */
export function show(quantity: Quantity, units: DisplayUnits, kind?: DisplayKind): string {
  return showQuantity(quantity, units, kind).text.replace('-', '−');
}

/** The answer of a measure. `place` is where an extreme stands, for the side of a moment. */
export function answerInWords(
  measure: ResolvedMeasure,
  quantity: Quantity,
  units: DisplayUnits,
  structure: Structure,
  place: { readonly member: number; readonly distance: number } | undefined,
): string {
  const { value } = quantity;
  const size = show({ ...quantity, value: Math.abs(value) }, units, displayKind(measure));
  if (value === 0) return size;
  const positive = value > 0;
  switch (measure.kind) {
    case 'deflection':
      return `${size} ${positive ? 'down' : 'up'}`;
    case 'sway':
      return `${size} to the ${positive ? 'right' : 'left'}`;
    case 'rotation':
      return `${size} ${positive ? 'anticlockwise' : 'clockwise'}`;
    case 'sag':
      return positive ? size : `${size} towards the upper side`;
    case 'moment':
      return place === undefined ? size : `${size}, tension ${sideInTension(structure, place, positive)}`;
    case 'force':
      return `${size} ${positive ? 'tension' : 'compression'}`;
    case 'shear':
      return `${positive ? '' : '−'}${size}`;
    case 'sagging':
    case 'hogging':
    case 'tension':
    case 'compression':
    case 'stress':
      return size;
    case 'reaction':
      return reactionInWords(measure.component, size, positive);
  }
}

export function reactionInWords(
  component: 'vertical' | 'horizontal' | 'moment',
  size: string,
  positive: boolean,
): string {
  switch (component) {
    case 'vertical':
      return positive ? `${size} up` : `${size}, holds down`;
    case 'horizontal':
      return `${size} to the ${positive ? 'right' : 'left'}`;
    case 'moment':
      return `${size} ${positive ? 'anticlockwise' : 'clockwise'}`;
  }
}

export function displayKind(measure: ResolvedMeasure): DisplayKind {
  switch (measure.kind) {
    case 'deflection':
    case 'sway':
    case 'sag':
      return 'deflection';
    case 'rotation':
      return 'rotation';
    case 'moment':
    case 'sagging':
    case 'hogging':
      return 'moment';
    case 'shear':
    case 'force':
    case 'tension':
    case 'compression':
      return 'force';
    case 'stress':
      return 'stress';
    case 'reaction':
      return measure.component === 'moment' ? 'moment' : 'force';
  }
}

/** Below, above, left or right of the member as it stands: the underside is to the right of its travel. */
function sideInTension(
  structure: Structure,
  place: { readonly member: number; readonly distance: number },
  underside: boolean,
): string {
  const { legs } = structure.members[place.member]!;
  const leg = legs.find(({ start, length }) => place.distance <= start + length) ?? legs.at(-1)!;
  const sign = underside ? 1 : -1;
  const [x, y] = [sign * leg.sine, -sign * leg.cosine];
  if (Math.abs(x) > Math.abs(y)) return x > 0 ? 'right' : 'left';
  return y > 0 ? 'above' : 'below';
}
