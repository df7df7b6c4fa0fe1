// Hovers on a value, at its name or in the prose: what the page shows, and every digit.
import type { NamedValue, ProseValue } from '../../note/result.ts';
import { allDigits } from '../words.ts';
import type { Card } from './card.ts';

export function valueCard(value: NamedValue): Card {
  return { title: value.name, about: 'value', rows: valueRows(value) };
}

export function proseCard(value: ProseValue): Card {
  return { title: value.text, about: 'value in the text', rows: valueRows(value) };
}

function valueRows({ quantity, unit, display }: NamedValue | ProseValue): Card['rows'] {
  if (quantity === undefined) return [{ label: 'Value', text: 'cannot be given; the diagnostic says why' }];
  return [
    { label: 'Value', text: display },
    { label: 'All digits', text: allDigits(quantity, unit) },
  ];
}
