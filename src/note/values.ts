// What the operands of a value mean in a note: values and results by name, properties, lengths between points, the span.
// Everything is worked out when it is first asked for, so the order of the lines does not matter.
import type { Measure, Name, Operand } from '../language/syntax.ts';
import { Figures } from '../model/figures.ts';
import { distanceOf, type Geometry } from '../model/geometry.ts';
import type { Library } from '../model/library.ts';
import type { Definition, Names } from '../model/names.ts';
import type { Report } from '../model/report.ts';
import type { Scope } from '../model/scope.ts';
import { LENGTH } from '../quantity/dimension.ts';
import type { Quantity } from '../quantity/quantity.ts';
import type { Range } from '../quantity/range.ts';
import { CONSTANTS } from '../quantity/units.ts';
import { type Descent, MOST_IN_A_ROW, Once, type Refusal } from './once.ts';

/** What is special about the place where a value stands. */
export interface Frame {
  /** In a limit: the span through the place of the measure. */
  readonly span?: (range: Range) => Quantity | undefined;
  /** In a question: a measure, one alternative at a time. */
  readonly measure?: (measure: Measure) => Quantity | undefined;
  /** In a question: an earlier result, one alternative at a time. */
  readonly result?: (definition: Definition, range: Range) => Quantity | undefined;
  /** A `let` keeps one figure, so a result with alternatives is none. */
  readonly single?: boolean;
}

/** What only the structures of the note can answer. Undefined where there is no answer, and a diagnostic stands somewhere. */
export interface Structures {
  readonly geometry: (scope: Scope, range: Range) => Geometry | undefined;
  readonly supported: (scope: Scope) => readonly string[];
  /** The governing value, and whether it was chosen among alternatives. */
  readonly result: (
    definition: Definition,
    range: Range,
  ) => { readonly quantity: Quantity; readonly chosen: boolean } | undefined;
  readonly span: (definition: Definition, range: Range) => Quantity | undefined;
}

export class Values {
  readonly #names: Names;
  readonly #report: Report;
  readonly #structures: Structures;
  readonly #descent: Descent;
  readonly #lets = new Map<Definition, Once<Quantity>>();
  /** Materials and sections, set once they are there: materials are read with values, and values read materials. */
  stock: Library | undefined;

  constructor(names: Names, report: Report, structures: Structures, descent: Descent) {
    this.#descent = descent;
    this.#names = names;
    this.#report = report;
    this.#structures = structures;
  }

  /** Reads values as they are meant in a scope, in a frame; what is wrong goes to the report given. */
  figures(scope: Scope, report: Report, frame: Frame = {}): Figures {
    return new Figures(operand => this.#operand(scope, operand, report, frame), report);
  }

  /** The figure of a `let`. */
  named(definition: Definition, range: Range): Quantity | undefined {
    let once = this.#lets.get(definition);
    if (once === undefined) {
      once = new Once(this.#descent, () => this.#let(definition));
      this.#lets.set(definition, once);
    }
    return once.get(why => refuseNamed(this.#report, definition, range, why));
  }

  #let(definition: Definition): Quantity | undefined {
    if (definition.statement.kind !== 'let') return undefined;
    const { value } = definition.statement;
    return this.figures(definition.scope, this.#report, { single: true }).quantity(value);
  }

  #operand(scope: Scope, operand: Operand, report: Report, frame: Frame): Quantity | undefined {
    switch (operand.kind) {
      case 'quantity':
        return operand.quantity;
      case 'constant':
        return CONSTANTS[operand.name];
      case 'name': {
        const found = this.#names.find(scope, ['value', 'result'], operand.name.text);
        return found === undefined ? undefined : this.#definition(found, operand.range, report, frame);
      }
      case 'property':
        return this.#property(scope, operand.property, operand.of, operand.range, report, frame);
      case 'extent':
        return this.#extent(scope, operand, report);
      case 'span':
        if (frame.span !== undefined) return frame.span(operand.range);
        report.error('bad-value', operand.range, '`span` is that of a question: it stands in a limit only.', {
          hint: 'say length(P, Q)',
        });
        return undefined;
      case 'measure':
        if (frame.measure !== undefined) return frame.measure(operand.measure);
        report.error('bad-value', operand.range, 'A measure is asked for in `find` or `require` only.', {
          hint: 'ask for it in a find line, and use its name here',
        });
        return undefined;
    }
  }

  #definition(found: Definition, range: Range, report: Report, frame: Frame): Quantity | undefined {
    if (found.namespace === 'value') return this.named(found, range);
    if (frame.result !== undefined) return frame.result(found, range);
    const result = this.#structures.result(found, range);
    if (result === undefined || !result.chosen || !frame.single) return result?.quantity;
    report.error('bad-value', range, `${found.name} has alternatives, and a value has one figure.`, {
      hint: 'write the expression in a find line, where it is worked one alternative at a time',
      related: [{ range: found.definition, message: `${found.name} is asked for here.` }],
    });
    return undefined;
  }

  #property(scope: Scope, property: Name, of: Name, range: Range, report: Report, frame: Frame): Quantity | undefined {
    const owner = this.#names.find(scope, ['section', 'material', 'structure'], of.text);
    if (owner === undefined) return undefined;
    if (owner.namespace !== 'structure') return this.stock?.property(owner, property);
    const found = this.#names.entries.find(
      entry =>
        entry.name === property.text &&
        (entry.namespace === 'value' || entry.namespace === 'result') &&
        entry.scope.structure === owner.statement,
    );
    return found === undefined ? undefined : this.#definition(found, range, report, frame);
  }

  #extent(scope: Scope, operand: Extract<Operand, { kind: 'extent' }>, report: Report): Quantity | undefined {
    const [first, second] = operand.arguments;
    if (operand.function === 'span') {
      const result = first === undefined ? undefined : this.#names.find(scope, ['result'], first.text);
      return result === undefined ? undefined : this.#structures.span(result, operand.range);
    }
    const geometry = this.#structures.geometry(scope, operand.range);
    if (geometry === undefined || first === undefined) return undefined;
    const extent = new Extent(geometry, report, operand.range);
    switch (operand.function) {
      case 'length':
        return second === undefined ? extent.ofMember(first) : extent.straight(first, second);
      case 'along':
        return second === undefined ? undefined : extent.along(first, second);
      case 'plan':
        return second === undefined ? undefined : extent.plan(first, second);
      case 'height':
        return extent.height(first, this.#structures.supported(scope));
    }
  }
}

/** Tells, at a use of it, why a value or a result cannot be worked out. */
export function refuseNamed(report: Report, { name, definition }: Definition, range: Range, why: Refusal): void {
  if (why === 'circle') {
    report.error('circular-value', range, `${name} depends on itself.`, {
      hint: 'take one of the values of the circle from elsewhere',
      related: [{ range: definition, message: `${name} is defined here.` }],
    });
    return;
  }
  report.error('value-too-deep', range, `${name} is the last of ${MOST_IN_A_ROW} values that each need the next.`, {
    hint: 'write the values that others need first',
  });
}

/** Lengths between points of a structure. */
class Extent {
  readonly #geometry: Geometry;
  readonly #report: Report;
  readonly #range: Range;

  constructor(geometry: Geometry, report: Report, range: Range) {
    this.#geometry = geometry;
    this.#report = report;
    this.#range = range;
  }

  ofMember(name: Name): Quantity | undefined {
    const index = this.#geometry.memberNamed.get(name.text);
    if (index !== undefined) return metre(this.#geometry.members[index]!.length);
    if (this.#geometry.groups.some(group => group.name === name.text)) {
      return this.#fault(name.range, `${name.text} is a group; a length is that of one member.`);
    }
    return undefined;
  }

  straight(from: Name, to: Name): Quantity | undefined {
    const [a, b] = [this.#point(from), this.#point(to)];
    return a === undefined || b === undefined ? undefined : metre(Math.hypot(b.x - a.x, b.y - a.y));
  }

  plan(from: Name, to: Name): Quantity | undefined {
    const [a, b] = [this.#point(from), this.#point(to)];
    return a === undefined || b === undefined ? undefined : metre(Math.abs(b.x - a.x));
  }

  along(from: Name, to: Name): Quantity | undefined {
    const [a, b] = [this.#geometry.pointNamed.get(from.text), this.#geometry.pointNamed.get(to.text)];
    if (a === undefined || b === undefined) return undefined;
    const lengths = this.#geometry.members.flatMap(member => {
      const [start, end] = [distanceOf(member, a), distanceOf(member, b)];
      return start === undefined || end === undefined ? [] : [Math.abs(end - start)];
    });
    const [first] = lengths;
    if (first === undefined)
      return this.#fault(
        this.#range,
        `No member runs from ${from.text} to ${to.text}.`,
        'write length(P, Q) for the straight length',
      );
    if (lengths.every(length => Math.abs(length - first) <= 1e-9 * first)) return metre(first);
    return this.#fault(this.#range, `Several members run from ${from.text} to ${to.text}, and their lengths differ.`);
  }

  height(name: Name, supported: readonly string[]): Quantity | undefined {
    const point = this.#point(name);
    if (point === undefined) return undefined;
    const levels = supported.flatMap(other => {
      const index = this.#geometry.pointNamed.get(other);
      return index === undefined ? [] : [this.#geometry.points[index]!.y];
    });
    if (levels.length === 0)
      return this.#fault(this.#range, 'A height is measured above the lowest support, and there is none.');
    return metre(point.y - Math.min(...levels));
  }

  #point(name: Name): { readonly x: number; readonly y: number } | undefined {
    const index = this.#geometry.pointNamed.get(name.text);
    return index === undefined ? undefined : this.#geometry.points[index];
  }

  #fault(range: Range, message: string, hint?: string): undefined {
    this.#report.error('bad-value', range, message, hint === undefined ? {} : { hint });
    return undefined;
  }
}

function metre(value: number): Quantity {
  return { value, dimension: LENGTH };
}
