// Every use of a name in a statement, and what kind of thing it must name there.
import type {
  CarryBody,
  ChainLeg,
  End,
  Item,
  LoadBody,
  Measure,
  Name,
  Operand,
  Place,
  ShowBody,
  Statement,
  Stretch,
  SupportItem,
  Under,
  Value,
} from '../language/syntax.ts';
import { operandsOf } from './operands.ts';

export type Sought =
  | 'point'
  | 'member'
  | 'section'
  | 'material'
  | 'case'
  | 'combination or case'
  | 'value or result'
  | 'result'
  | 'owner';

export interface NameUse {
  readonly sought: Sought;
  readonly name: Name;
  /** With `owner`: the property asked of it. */
  readonly property?: Name;
}

/** A statement does not change, so its uses are looked for once; most statements outlive a keystroke elsewhere. */
export function usesIn(statement: Statement): readonly NameUse[] {
  let uses = known.get(statement);
  if (uses === undefined) {
    uses = findUses(statement);
    known.set(statement, uses);
  }
  return uses;
}

const known = new WeakMap<Statement, readonly NameUse[]>();

function findUses(statement: Statement): NameUse[] {
  switch (statement.kind) {
    case 'structure':
    case 'case':
    case 'use':
    case 'display':
    case 'assume':
      return [];
    case 'let':
      return usesInValue(statement.value);
    case 'hinge':
      return [...name('point', statement.point), ...name('member', statement.member)];
    case 'material':
    case 'section':
      return statement.items.flatMap(inItem);
    case 'member':
    case 'bar':
    case 'bars':
      return [...name('section', statement.section), ...statement.chain.legs.flatMap(inLeg)];
    case 'group':
      return names('member', statement.members);
    case 'point':
      return statement.at.kind === 'coordinates' ? inValues([statement.at.x, statement.at.y]) : inPlace(statement.at);
    case 'connection':
      return [
        ...name('point', statement.point),
        ...name('member', statement.member),
        ...usesInValue(statement.stiffness),
      ];
    case 'release':
      return [...name('point', statement.point), ...name('member', statement.member)];
    case 'support':
      return [...name('point', statement.point), ...statement.items.flatMap(inSupportItem)];
    case 'load':
      return [...name('case', statement.case), ...inLoad(statement.body)];
    case 'combine':
      return statement.terms.flatMap(term => [...name('case', term.case), ...inOptional(term.factor)]);
    case 'find':
      return [...usesInValue(statement.what), ...inUnder(statement.under)];
    case 'require':
      return [...usesInValue(statement.what), ...inUnder(statement.under), ...usesInValue(statement.limit)];
    case 'show':
      return inShow(statement.show);
    case 'carry':
      return inCarry(statement.carry);
  }
}

export function usesInValue(value: Value): NameUse[] {
  return operandsOf(value).flatMap(inOperand);
}

function inOperand(operand: Operand): NameUse[] {
  switch (operand.kind) {
    case 'quantity':
    case 'constant':
    case 'span':
      return [];
    case 'name':
      return name('value or result', operand.name);
    case 'property':
      return [{ sought: 'owner', name: operand.of, property: operand.property }];
    case 'extent': {
      if (operand.function === 'span') return names('result', operand.arguments);
      const isMember = operand.function === 'length' && operand.arguments.length === 1;
      return names(isMember ? 'member' : 'point', operand.arguments);
    }
    case 'measure':
      return inMeasure(operand.measure);
  }
}

function inLeg({ section, dimension }: ChainLeg): NameUse[] {
  return [...name('section', section), ...inValues(figuresOf(dimension))];
}

function figuresOf(dimension: ChainLeg['dimension']): readonly Value[] {
  switch (dimension?.kind) {
    case undefined:
      return [];
    case 'parts':
      return dimension.parts.map(({ distance }) => distance);
    case 'polar':
      return [dimension.length, dimension.angle];
    case 'pitched':
      return [dimension.run, dimension.pitch];
  }
}

function inSupportItem(item: SupportItem): NameUse[] {
  if (item.kind === 'spring') return usesInValue(item.stiffness);
  return item.kind === 'roller' ? inOptional(item.on) : [];
}

function inMeasure(measure: Measure): NameUse[] {
  return [
    ...(measure.at === undefined ? [] : inPlace(measure.at)),
    ...name('member', measure.in),
    ...inStretch(measure.between),
  ];
}

function inPlace(place: Place): NameUse[] {
  if (place.kind === 'point') return name('point', place.point);
  const { distance, from, towards, member } = place;
  return [...usesInValue(distance), ...name('point', from), ...name('point', towards), ...name('member', member)];
}

function inStretch(stretch: Stretch | undefined): NameUse[] {
  return stretch === undefined ? [] : [...inEnd(stretch.from), ...inEnd(stretch.to)];
}

function inEnd(end: End): NameUse[] {
  return end.kind === 'point' ? name('point', end.point) : usesInValue(end.distance);
}

function inUnder(under: Under | undefined): NameUse[] {
  return under?.kind === 'named' ? name('combination or case', under.name) : [];
}

function inItem(item: Item): NameUse[] {
  switch (item.kind) {
    case 'turned':
    case 'wanted':
      return [];
    case 'material':
      return name('material', item.name);
    case 'multiple':
      return name('section', item.section);
    case 'shape':
      return inValues([...item.dimensions, ...(item.taper ?? [])]);
    case 'property':
      return usesInValue(item.value);
  }
}

function inLoad(body: LoadBody): NameUse[] {
  switch (body.kind) {
    case 'self-weight':
      return [...inOptional(body.factor), ...names('member', body.of ?? [])];
    case 'heat': {
      const amounts = body.by.kind === 'uniform' ? [body.by.rise] : [body.by.above, body.by.below];
      return [...inOptional(body.factor), ...names('member', body.on), ...inValues(amounts)];
    }
    case 'move':
      return [...inOptional(body.factor), ...name('point', body.point), ...usesInValue(body.by)];
    case 'lengthen':
    case 'shorten':
      return [...inOptional(body.factor), ...names('member', body.members), ...usesInValue(body.by)];
    case 'line':
      return [
        ...usesInValue(body.intensity),
        ...inOptional(body.to),
        ...(body.direction.kind === 'angle' ? usesInValue(body.direction.angle) : []),
        ...(body.direction.kind === 'along' ? name('point', body.direction.towards) : []),
        ...names('member', body.on),
        ...inStretch(body.stretch),
      ];
    case 'point':
      return [...inAction(body), ...inPlace(body.at), ...name('member', body.in)];
    case 'row':
      return [...inAction(body), ...usesInValue(body.every), ...inStretch(body.stretch), ...name('member', body.on)];
  }
}

function inAction({ amount, direction }: Extract<LoadBody, { kind: 'point' | 'row' }>): NameUse[] {
  return [...usesInValue(amount), ...(direction.kind === 'angle' ? usesInValue(direction.angle) : [])];
}

function inShow(show: ShowBody): NameUse[] {
  switch (show.kind) {
    case 'inputs':
    case 'drawing':
    case 'results':
      return [];
    case 'reactions':
      return inUnder(show.under);
    case 'working':
      return name('result', show.of);
    case 'contributions':
      return name('result', show.to);
    case 'field':
      return [...inMeasure(show.measure), ...inUnder(show.under)];
  }
}

/** What is carried may come from another note, so its names are looked for there; only the place is ours. */
function inCarry({ factor, every, onto }: CarryBody): NameUse[] {
  const place =
    onto.kind === 'member'
      ? [...name('member', onto.member), ...inStretch(onto.stretch)]
      : [...inPlace(onto.place), ...name('member', onto.in)];
  return [...inOptional(factor), ...inOptional(every), ...place];
}

function inValues(values: readonly Value[]): NameUse[] {
  return values.flatMap(usesInValue);
}

function inOptional(value: Value | undefined): NameUse[] {
  return value === undefined ? [] : usesInValue(value);
}

function name(sought: Sought, used: Name | undefined): NameUse[] {
  return used === undefined ? [] : [{ sought, name: used }];
}

function names(sought: Sought, used: readonly Name[]): NameUse[] {
  return used.map(each => ({ sought, name: each }));
}
