// `material` and `section`: items separated by commas.

import type { Reader } from '../reader.ts';
import type { Item, Name, ShapeKind, Value } from '../syntax.ts';
import { readValue } from '../values.ts';
import { isShapeKind, SHAPES } from '../words.ts';
import type { StatementForm } from './form.ts';
import { colon, snippet } from './form.ts';

export const MATERIAL: StatementForm = {
  keyword: 'material',
  help: 'A material: stiffness, density, expansion, and any figure of its own to be read back with `of`.',
  grammar: 'material NAME: KEY VALUE {, KEY VALUE}',
  examples: [
    'material S355: E 210 GPa, density 7850 kg/m3, fy 355 MPa',
    'material C24:  E 11 GPa, G 0.69 GPa, density 420 kg/m3, alpha 5e-6 /K',
  ],
  skeleton: snippet('material {S355}: E {210 GPa}, density {7850 kg/m3}'),
  read: reader => {
    const name = reader.name('the name of the material');
    if (!name || !colon(reader, 'what the material has')) return undefined;
    const items = readItems(reader);
    const odd = items?.find(item => item.kind !== 'property');
    if (odd)
      return reader.fail('bad-statement', odd.range, 'A material takes figures only, each a word and its value.');
    return items && { kind: 'material', name, items };
  },
};

export const SECTION: StatementForm = {
  keyword: 'section',
  help: 'A cross-section: a shape with its dimensions or figures from a table, and a material.',
  grammar:
    'section NAME: SHAPE DIMENSIONS [to DIMENSIONS] | INT x SECTION | KEY VALUE | KEY wanted | MATERIAL | turned, …',
  examples: [
    'section RHS: box 100 mm x 200 mm x 6 mm, S355',
    'section G: I 4410 cm4, A 39.7 cm2, depth 251 mm, S275',
    'section Z: 2 x C1',
    'section T: solid 90 mm x 200 mm to 90 mm x 450 mm, GL28',
    'section X: I wanted, S355',
    'section J2: solid 47 mm x 220 mm, C24, turned',
  ],
  skeleton: snippet('section {Name}: {box} {100 mm x 200 mm x 6 mm}, {S355}'),
  read: reader => {
    const name = reader.name('the name of the section');
    if (!name || !colon(reader, 'its shape or its figures')) return undefined;
    const items = readItems(reader);
    return items && { kind: 'section', name, items };
  },
};

function readItems(reader: Reader): Item[] | undefined {
  const items: Item[] = [];
  do {
    const item = readItem(reader, items.length === 0);
    if (!item) return undefined;
    items.push(item);
  } while (reader.takeMark(','));
  return items;
}

/** One word alone is a material or `turned`; more are a shape, in the first item, or a key with its value. */
function readItem(reader: Reader, first: boolean): Item | undefined {
  const from = reader.position;
  if (reader.peek()?.kind === 'number') return readMultiple(reader);
  const key = readKey(reader);
  if (!key) return undefined;
  if (endsItem(reader)) {
    if (key.text === 'turned') return { kind: 'turned', range: key.range };
    if (isShapeKind(key.text)) return reader.due(`${SHAPES[key.text].join(' x ')} of the ${key.text}`);
    return { kind: 'material', name: key, range: key.range };
  }
  if (isShapeKind(key.text)) {
    if (first) return readShape(reader, key.text, from);
    return reader.fail('bad-statement', key.range, `A shape (\`${key.text}\`) stands first, before the other items.`);
  }
  if (reader.takeWord('wanted')) return { kind: 'wanted', key, range: reader.since(from) };
  const value = readValue(reader);
  return value && { kind: 'property', key, value, range: reader.since(from) };
}

function endsItem(reader: Reader): boolean {
  return reader.atEnd || reader.isMark(',') || reader.peek()?.kind === 'string';
}

/** A word, or one of the two with a hyphen: `i-shape`, `shear-area`. */
function readKey(reader: Reader): Name | undefined {
  for (const [first, second] of [
    ['i', 'shape'],
    ['shear', 'area'],
  ] as const) {
    if (!reader.isHyphened(first, second)) continue;
    const from = reader.position;
    reader.skip(3);
    return { text: `${first}-${second}`, range: reader.since(from) };
  }
  return reader.name('a shape, a figure or a material');
}

/** `2 x C1`. */
function readMultiple(reader: Reader): Item | undefined {
  const from = reader.position;
  const number = reader.next()!;
  const count = Number(number.text);
  if (!reader.takeWord('x') && !reader.takeMark('×')) return reader.due('`x` (how many of which section: `2 x C1`)');
  if (!Number.isInteger(count) || count < 1 || count > MOST_ALIKE) {
    return reader.fail(
      'bad-statement',
      number,
      `Sections stand side by side in whole numbers from 1 to ${MOST_ALIKE}.`,
    );
  }
  const section = reader.name('a section');
  return section && { kind: 'multiple', count, section, range: reader.since(from) };
}

const MOST_ALIKE = 1000;

function readShape(reader: Reader, shape: ShapeKind, from: number): Item | undefined {
  const dimensions = readDimensions(reader, shape);
  if (!dimensions) return undefined;
  const taper = reader.takeWord('to') && readDimensions(reader, shape);
  if (reader.failure) return undefined;
  return { kind: 'shape', shape, dimensions, ...(taper && { taper }), range: reader.since(from) };
}

function readDimensions(reader: Reader, shape: ShapeKind): Value[] | undefined {
  const from = reader.position;
  const dimensions: Value[] = [];
  do {
    const dimension = readValue(reader, { timesEnds: true });
    if (!dimension) return undefined;
    dimensions.push(dimension);
  } while (reader.takeWord('x') ?? reader.takeMark('×'));
  const due = SHAPES[shape];
  if (dimensions.length === due.length) return dimensions;
  const given = dimensions.length === 1 ? '1 is given' : `${dimensions.length} are given`;
  return reader.fail('bad-statement', reader.since(from), `\`${shape}\` takes ${due.join(' x ')}; ${given}.`);
}
