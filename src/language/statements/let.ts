// `let` names a value.

import type { Reader } from '../reader.ts';
import type { Name } from '../syntax.ts';
import { readValue } from '../values.ts';
import { whyNoValueName } from '../words.ts';
import type { StatementForm } from './form.ts';
import { snippet } from './form.ts';

export const LET: StatementForm = {
  keyword: 'let',
  help: 'Names a value for later expressions, loads, limits and prose.',
  grammar: 'let NAME = VALUE',
  examples: ['let w = 0.75 kN/m2 * 3.2 m', 'let k = sqrt(2) * a / 3', 'let h = 12 ft 6 1/2 in'],
  skeleton: snippet('let {name} = {1 kN}'),
  read: reader => {
    const name = readValueName(reader, 'the name of the value');
    if (!name) return undefined;
    const sign = reader.peek();
    if (!reader.takeMark('=')) {
      const fix =
        sign && reader.isMark(':')
          ? { fix: { title: 'Write `=`', edits: [{ range: reader.here(), text: ' =' }] } }
          : {};
      return reader.due('`=` (the value stands behind it)', fix);
    }
    const value = readValue(reader);
    return value && { kind: 'let', name, value };
  },
};

/** The name of a value or a result, which stands in expressions and so may not be a unit, a function or a measure. */
export function readValueName(reader: Reader, role: string): Name | undefined {
  const token = reader.peek();
  const why = token?.kind === 'word' ? whyNoValueName(token.text) : undefined;
  return token && why ? reader.fail('reserved-name', token, why) : reader.name(role);
}
