// Materials and sections as figures that can be read back: what the writer gave, what a shape gives, and what follows
// from the two. Every figure is worked out once, when first asked for.
import type { Item, Name, StatementOf, Value } from '../language/syntax.ts';
import {
  AREA,
  BENDING_STIFFNESS,
  DENSITY,
  DIMENSIONLESS,
  type Dimension,
  FORCE,
  LENGTH,
  MASS_PER_LENGTH,
  PER_TEMPERATURE,
  SECOND_MOMENT_OF_AREA,
  SECTION_MODULUS,
  STRESS,
  sameDimension,
  UNIT_WEIGHT,
} from '../quantity/dimension.ts';
import { nearest } from '../quantity/nearest.ts';
import type { Quantity } from '../quantity/quantity.ts';
import { A_LENGTH } from './dues.ts';
import type { Due, Figures } from './figures.ts';
import { STANDARD_GRAVITY } from './gravity.ts';
import type { Definition, Names } from './names.ts';
import type { Report } from './report.ts';
import { SHAPE_DIMENSIONS, shapeProblem, shapeProperties } from './shapes.ts';

/** Figures by the writer's words for them: `E`, `I`, `modulus`, `fy` …; SI. */
export type Properties = ReadonlyMap<string, Quantity>;

export interface SectionFigures {
  readonly properties: Properties;
  readonly material: string | undefined;
  /** The modulus is neither given nor a shape's: it is 2 I / depth, which holds for a symmetrical section. */
  readonly modulusAssumed: boolean;
  /** In the writer's words: `box 100 mm × 200 mm × 6 mm, S355`. */
  readonly description: string;
  /** `I wanted`: it has no I and no EI. */
  readonly wanted: boolean;
  readonly statement: StatementOf<'section'>;
}

/** What a figure of a section or a material must be; any other word is the writer's own and may be anything. */
const KNOWN: Readonly<Record<string, Due>> = {
  E: { dimension: STRESS, words: 'a modulus of elasticity' },
  G: { dimension: STRESS, words: 'a shear modulus' },
  nu: { dimension: DIMENSIONLESS, words: 'a number' },
  density: { dimension: DENSITY, words: 'a density' },
  alpha: { dimension: PER_TEMPERATURE, words: 'a thermal expansion per kelvin' },
  I: { dimension: SECOND_MOMENT_OF_AREA, words: 'a second moment of area' },
  A: { dimension: AREA, words: 'an area' },
  'shear-area': { dimension: AREA, words: 'an area' },
  modulus: { dimension: SECTION_MODULUS, words: 'a section modulus' },
  depth: { dimension: LENGTH, words: 'a length' },
  width: { dimension: LENGTH, words: 'a length' },
  wall: { dimension: LENGTH, words: 'a length' },
  flange: { dimension: LENGTH, words: 'a length' },
  web: { dimension: LENGTH, words: 'a length' },
  EI: { dimension: BENDING_STIFFNESS, words: 'a bending stiffness' },
  EA: { dimension: FORCE, words: 'an axial stiffness, a force' },
  GAs: { dimension: FORCE, words: 'a shear stiffness, a force' },
};

/** Figures of two sections side by side are twice these; the others stay. */
const ADDED = new Set(['I', 'A', 'shear-area', 'modulus', 'EI', 'EA', 'GAs', 'mass']);

export class Library {
  readonly #names: Names;
  readonly #figuresOf: (definition: Definition) => Figures;
  readonly #wordsOf: (item: Item) => string;
  readonly #report: Report;
  readonly #materials = new Map<Definition, Properties | undefined>();
  readonly #sections = new Map<Definition, SectionFigures | undefined | 'working'>();

  /** `figuresOf` reads values as the definition's own scope sees them. */
  constructor(
    names: Names,
    figuresOf: (definition: Definition) => Figures,
    wordsOf: (item: Item) => string,
    report: Report,
  ) {
    this.#names = names;
    this.#figuresOf = figuresOf;
    this.#wordsOf = wordsOf;
    this.#report = report;
  }

  /** Undefined where a figure of it cannot be had (reported). */
  material(definition: Definition): Properties | undefined {
    if (!this.#materials.has(definition)) this.#materials.set(definition, this.#readMaterial(definition));
    return this.#materials.get(definition);
  }

  /** Undefined where it cannot be had (reported). */
  section(definition: Definition): SectionFigures | undefined {
    const known = this.#sections.get(definition);
    if (known === 'working') {
      this.#report.error('circular-value', definition.definition, `${definition.name} is made of itself.`);
      return undefined;
    }
    if (known !== undefined || this.#sections.has(definition)) return known;
    this.#sections.set(definition, 'working');
    const section = this.#readSection(definition);
    this.#sections.set(definition, section);
    return section;
  }

  /** `NAME of X` for a section or a material. */
  property(definition: Definition, property: Name): Quantity | undefined {
    const section = definition.namespace === 'section' ? this.section(definition) : undefined;
    const properties =
      section?.properties ?? (definition.namespace === 'material' ? this.material(definition) : undefined);
    if (properties === undefined) return undefined;
    const found = properties.get(property.text);
    if (found !== undefined && property.text === 'modulus' && section?.modulusAssumed) {
      this.#report.hint('assumed-modulus', property.range, assumedModulus(definition.name), ASSUMED_MODULUS_REMEDY);
    }
    if (found !== undefined) return found;
    const close = nearest(property.text, properties.keys());
    this.#report.error('missing-property', property.range, `${definition.name} has no ${property.text}.`, {
      hint:
        close === undefined
          ? `give it in the ${definition.namespace} line: ${property.text} …`
          : `did you mean ${close}?`,
      related: [{ range: definition.definition, message: `${definition.name} is described here.` }],
    });
    return undefined;
  }

  #readMaterial(definition: Definition): Properties | undefined {
    const { statement } = definition;
    if (statement.kind !== 'material') return undefined;
    const figures = this.#figuresOf(definition);
    const properties = new Map<string, Quantity>();
    let sound = true;
    for (const item of statement.items) {
      if (item.kind === 'property') sound = this.#readProperty(item, figures, properties) && sound;
      else {
        sound = false;
        this.#report.error(
          'bad-statement',
          item.range,
          'A material is described by words with a figure, such as E 210 GPa.',
        );
      }
    }
    return sound ? properties : undefined;
  }

  #readProperty(item: Extract<Item, { kind: 'property' }>, figures: Figures, into: Map<string, Quantity>): boolean {
    const { key, value } = item;
    if (into.has(key.text)) {
      this.#report.error('defined-twice', key.range, `${key.text} is given twice.`);
      return false;
    }
    const quantity = figures.quantity(value);
    if (quantity === undefined) return false;
    const due = KNOWN[key.text];
    if (due === undefined) {
      into.set(key.text, quantity);
      return true;
    }
    const isUnitWeight = key.text === 'density' && sameDimension(quantity.dimension, UNIT_WEIGHT);
    if (!isUnitWeight && !sameDimension(quantity.dimension, due.dimension)) {
      figures.wrongKind(value, quantity, due);
      return false;
    }
    if (!inBounds(key.text, quantity.value)) {
      const bound =
        key.text === 'nu'
          ? 'lies between -1 and 0.5'
          : MAY_BE_ZERO.has(key.text)
            ? 'is never negative'
            : 'must be greater than zero';
      this.#report.error('bad-value', value.range, `${key.text} ${bound}.`);
      return false;
    }
    into.set(key.text, isUnitWeight ? { value: quantity.value / STANDARD_GRAVITY, dimension: DENSITY } : quantity);
    return true;
  }

  #readSection(definition: Definition): SectionFigures | undefined {
    const { statement } = definition;
    if (statement.kind !== 'section') return undefined;
    const reading = new SectionReading(statement, definition, this.#figuresOf(definition), this.#report);
    const material = this.#materialOf(statement, definition, reading);
    const given = new Map<string, Quantity>();
    const shaped = new Map<string, Quantity>();
    let wanted = false;
    for (const item of statement.items) {
      if (item.kind === 'property') reading.sound = this.#readProperty(item, reading.figures, given) && reading.sound;
      if (item.kind === 'shape') reading.shape(item, shaped);
      if (item.kind === 'multiple') this.#multiply(item, definition, reading, shaped, material);
      if (item.kind === 'wanted') {
        wanted = true;
        if (item.key.text !== 'I' || statement.items.some(({ kind }) => kind === 'shape' || kind === 'multiple')) {
          reading.sound = false;
          this.#report.error('bad-statement', item.range, 'Only the I of a section without a shape can be wanted.', {
            hint: 'write I wanted, and a material',
          });
        }
      }
    }
    reading.checkTurned(shaped);
    if (wanted && (given.has('I') || given.has('EI'))) {
      reading.sound = false;
      this.#report.error(
        'defined-twice',
        definition.definition,
        `${definition.name} has a stiffness, and one is wanted.`,
      );
    }
    if (!reading.sound) return undefined;
    const properties = new Map([...(material?.properties ?? []), ...shaped, ...given]);
    const modulusAssumed = reading.modulusAssumed || !properties.has('modulus');
    derive(properties);
    const description = statement.items.map(this.#wordsOf).join(', ').replace(/ x /g, ' × ');
    return { properties, material: material?.name, modulusAssumed, description, statement, wanted };
  }

  #materialOf(
    statement: StatementOf<'section'>,
    definition: Definition,
    reading: SectionReading,
  ): { readonly name: string; readonly properties: Properties } | undefined {
    const named = statement.items.filter(item => item.kind === 'material');
    const [first, second] = named;
    if (second !== undefined) {
      reading.sound = false;
      this.#report.error(
        'bad-statement',
        second.range,
        `A section has one material; ${first!.name.text} is given already.`,
      );
    }
    if (first === undefined) return undefined;
    const found = this.#names.find(definition.scope, ['material'], first.name.text);
    const properties = found === undefined ? undefined : this.material(found);
    if (properties === undefined) reading.sound = false;
    return properties === undefined ? undefined : { name: first.name.text, properties };
  }

  #multiply(
    item: Extract<Item, { kind: 'multiple' }>,
    definition: Definition,
    reading: SectionReading,
    into: Map<string, Quantity>,
    material: { readonly name: string } | undefined,
  ): void {
    const found = this.#names.find(definition.scope, ['section'], item.section.text);
    const base = found === undefined ? undefined : this.section(found);
    if (base === undefined || item.count < 1) {
      if (base !== undefined) this.#report.error('bad-value', item.range, 'A section is made of one part at least.');
      reading.sound = false;
      return;
    }
    if (base.material !== undefined && material !== undefined && base.material !== material.name) {
      reading.sound = false;
      this.#report.error(
        'bad-statement',
        item.range,
        `${item.section.text} is of ${base.material} already, not of ${material.name}.`,
      );
    }
    reading.modulusAssumed = base.modulusAssumed && base.properties.has('modulus');
    for (const [key, { value, dimension }] of base.properties) {
      if (key === 'width' && item.count > 1) continue;
      into.set(key, ADDED.has(key) ? { value: value * item.count, dimension } : { value, dimension });
    }
  }
}

/** One section's statement while its parts are read. */
class SectionReading {
  sound = true;
  /** The section that it is made of takes its modulus for that of a symmetrical one. */
  modulusAssumed = false;
  readonly figures: Figures;
  readonly #statement: StatementOf<'section'>;
  readonly #definition: Definition;
  readonly #report: Report;

  constructor(statement: StatementOf<'section'>, definition: Definition, figures: Figures, report: Report) {
    this.#statement = statement;
    this.#definition = definition;
    this.#report = report;
    this.figures = figures;
  }

  shape(item: Extract<Item, { kind: 'shape' }>, into: Map<string, Quantity>): void {
    if (item.taper !== undefined) {
      this.sound = false;
      this.#report.error(
        'not-evaluated-yet',
        item.range,
        'A tapered section is read but not evaluated by this version: give one depth, or a section to each leg.',
      );
      return;
    }
    const names = SHAPE_DIMENSIONS[item.shape];
    if (item.dimensions.length !== names.length) {
      this.sound = false;
      this.#report.error(
        'bad-statement',
        item.range,
        `A ${item.shape} has ${names.length === 1 ? 'one dimension' : `${names.length} dimensions`}: ${names.join(' x ')}.`,
      );
      return;
    }
    const sizes: number[] = [];
    for (const [i, value] of item.dimensions.entries()) {
      const size = this.#size(value, names[i]!);
      if (size === undefined) {
        this.sound = false;
        return;
      }
      sizes.push(size);
    }
    const problem = shapeProblem(item.shape, sizes);
    if (problem !== undefined) {
      this.sound = false;
      this.#report.error('bad-value', item.range, `This is no ${item.shape}: ${problem}.`, {
        hint: `the order is ${names.join(' x ')}`,
      });
      return;
    }
    const turned = this.#turned() !== undefined;
    const found = shapeProperties(item.shape, sizes, turned);
    for (const [i, name] of names.entries()) into.set(name, { value: sizes[i]!, dimension: LENGTH });
    into.set('A', { value: found.area, dimension: AREA });
    into.set('I', { value: found.secondMomentOfArea, dimension: SECOND_MOMENT_OF_AREA });
    into.set('modulus', { value: found.sectionModulus, dimension: SECTION_MODULUS });
    into.set('shear-area', { value: found.shearArea, dimension: AREA });
    into.set('depth', { value: found.depth, dimension: LENGTH });
    into.set('width', { value: found.width, dimension: LENGTH });
  }

  /** Only a shape has another axis to bend about. */
  checkTurned(shaped: Map<string, Quantity>): void {
    const turned = this.#turned();
    if (turned === undefined || !this.sound) return;
    const isShape = this.#statement.items.some(item => item.kind === 'shape');
    if (isShape && shaped.size > 0) return;
    this.sound = false;
    this.#report.error('bad-statement', turned.range, `${this.#definition.name} has no shape to turn.`, {
      hint: 'give the figures of the other axis',
    });
  }

  #turned(): Item | undefined {
    return this.#statement.items.find(item => item.kind === 'turned');
  }

  #size(value: Value, name: string): number | undefined {
    return this.figures.positive(value, A_LENGTH, `The ${name} of a shape`);
  }
}

export function assumedModulus(section: string): string {
  return `${section} gives no modulus: 2 I / depth is taken, that of a symmetrical section.`;
}

export const ASSUMED_MODULUS_REMEDY = { hint: 'give its smaller modulus: modulus 351 cm3' } as const;

const MAY_BE_ZERO = new Set(['density', 'alpha']);

function inBounds(key: string, value: number): boolean {
  if (key === 'nu') return value > -1 && value <= 0.5;
  if (key === 'alpha') return true;
  return MAY_BE_ZERO.has(key) ? value >= 0 : value > 0;
}

/** What follows from the figures that are there; a figure that is given wins. */
function derive(properties: Map<string, Quantity>): void {
  const set = (key: string, a: string, b: string, dimension: Dimension): void => {
    const [first, second] = [properties.get(a), properties.get(b)];
    if (properties.has(key) || first === undefined || second === undefined) return;
    properties.set(key, { value: first.value * second.value, dimension });
  };
  const [modulus, poisson] = [properties.get('E'), properties.get('nu')];
  if (!properties.has('G') && modulus !== undefined && poisson !== undefined) {
    properties.set('G', { value: modulus.value / (2 * (1 + poisson.value)), dimension: STRESS });
  }
  set('EI', 'E', 'I', BENDING_STIFFNESS);
  set('EA', 'E', 'A', FORCE);
  set('GAs', 'G', 'shear-area', FORCE);
  set('mass', 'density', 'A', MASS_PER_LENGTH);
  const [inertia, depth] = [properties.get('I'), properties.get('depth')];
  if (!properties.has('modulus') && inertia !== undefined && depth !== undefined) {
    properties.set('modulus', { value: (2 * inertia.value) / depth.value, dimension: SECTION_MODULUS });
  }
}
