// Every use of a name in a statement, and what kind of thing it must name there.
import type {
  CarryBody,
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
  Under,
  Value,
} from '../language/syntax.ts';

export type Sought = 'point' | 'member' | 'section' | 'material' | 'case' | 'combination or case' | 'value or result' | 'result' | 'owner';

export interface NameUse {
  readonly sought: Sought;
  readonly name: Name;
  /** With `owner`: the property asked of it. */
  readonly property?: Name;
}

export function usesIn(statement: Statement): NameUse[] {
  const uses: NameUse[] = [];
  collect(statement, uses);
  return uses;
}

export function usesInValue(value: Value): NameUse[] {
  const uses: NameUse[] = [];
  inValue(value, uses);
  return uses;
}

function collect(statement: Statement, uses: NameUse[]): void {
  switch (statement.kind) {
    case 'structure':
    case 'case':
    case 'use':
    case 'display':
    case 'assume':
      return;
    case 'let':
      return inValue(statement.value, uses);
    case 'hinge':
      use('point', statement.point, uses);
      return useIf('member', statement.member, uses);
    case 'material':
    case 'section':
      for (const item of statement.items) inItem(item, uses);
      return;
    case 'member':
    case 'bar':
    case 'bars':
      useIf('section', statement.section, uses);
      for (const leg of statement.chain.legs) {
        useIf('section', leg.section, uses);
        const { dimension } = leg;
        if (dimension?.kind === 'parts') for (const part of dimension.parts) inValue(part.distance, uses);
        if (dimension?.kind === 'polar') inValues([dimension.length, dimension.angle], uses);
        if (dimension?.kind === 'pitched') inValues([dimension.run, dimension.pitch], uses);
      }
      return;
    case 'group':
      return useAll('member', statement.members, uses);
    case 'point':
      if (statement.at.kind === 'coordinates') return inValues([statement.at.x, statement.at.y], uses);
      return inPlace(statement.at, uses);
    case 'connection':
      use('point', statement.point, uses);
      use('member', statement.member, uses);
      return inValue(statement.stiffness, uses);
    case 'release':
      use('point', statement.point, uses);
      return use('member', statement.member, uses);
    case 'support':
      use('point', statement.point, uses);
      for (const item of statement.items) {
        if (item.kind === 'spring') inValue(item.stiffness, uses);
        if (item.kind === 'roller' && item.on !== undefined) inValue(item.on, uses);
      }
      return;
    case 'load':
      use('case', statement.case, uses);
      return inLoad(statement.body, uses);
    case 'combine':
      for (const term of statement.terms) {
        use('case', term.case, uses);
        if (term.factor !== undefined) inValue(term.factor, uses);
      }
      return;
    case 'find':
    case 'require':
      inValue(statement.what, uses);
      inUnder(statement.under, uses);
      if (statement.kind === 'require') inValue(statement.limit, uses);
      return;
    case 'show':
      return inShow(statement.show, uses);
    case 'carry':
      return inCarry(statement.carry, uses);
  }
}

function inValue(value: Value, uses: NameUse[]): void {
  switch (value.kind) {
    case 'operand':
      return inOperand(value.operand, uses);
    case 'negate':
      return inValue(value.of, uses);
    case 'binary':
      return inValues([value.left, value.right], uses);
    case 'call':
      return inValues(value.arguments, uses);
  }
}

function inValues(values: readonly Value[], uses: NameUse[]): void {
  for (const value of values) inValue(value, uses);
}

function inOperand(operand: Operand, uses: NameUse[]): void {
  switch (operand.kind) {
    case 'quantity':
    case 'constant':
    case 'span':
      return;
    case 'name':
      return use('value or result', operand.name, uses);
    case 'property':
      uses.push({ sought: 'owner', name: operand.of, property: operand.property });
      return;
    case 'extent': {
      const [only] = operand.arguments;
      if (operand.function === 'span') return useIf('result', only, uses);
      if (operand.function === 'length' && operand.arguments.length === 1) return useIf('member', only, uses);
      return useAll('point', operand.arguments, uses);
    }
    case 'measure':
      return inMeasure(operand.measure, uses);
  }
}

function inMeasure(measure: Measure, uses: NameUse[]): void {
  if (measure.at !== undefined) inPlace(measure.at, uses);
  useIf('member', measure.in, uses);
  inStretch(measure.between, uses);
}

function inPlace(place: Place, uses: NameUse[]): void {
  if (place.kind === 'point') return use('point', place.point, uses);
  inValue(place.distance, uses);
  use('point', place.from, uses);
  useIf('point', place.towards, uses);
  use('member', place.member, uses);
}

function inStretch(stretch: Stretch | undefined, uses: NameUse[]): void {
  if (stretch === undefined) return;
  inEnd(stretch.from, uses);
  inEnd(stretch.to, uses);
}

function inEnd(end: End, uses: NameUse[]): void {
  if (end.kind === 'point') use('point', end.point, uses);
  else inValue(end.distance, uses);
}

function inUnder(under: Under | undefined, uses: NameUse[]): void {
  if (under?.kind === 'named') use('combination or case', under.name, uses);
}

function inItem(item: Item, uses: NameUse[]): void {
  switch (item.kind) {
    case 'turned':
    case 'wanted':
      return;
    case 'material':
      return use('material', item.name, uses);
    case 'multiple':
      return use('section', item.section, uses);
    case 'shape':
      inValues(item.dimensions, uses);
      return inValues(item.taper ?? [], uses);
    case 'property':
      return inValue(item.value, uses);
  }
}

function inLoad(body: LoadBody, uses: NameUse[]): void {
  switch (body.kind) {
    case 'self-weight':
      inValues(body.factor === undefined ? [] : [body.factor], uses);
      return useAll('member', body.of ?? [], uses);
    case 'heat':
      inValues(body.factor === undefined ? [] : [body.factor], uses);
      useAll('member', body.on, uses);
      return inValues(body.by.kind === 'uniform' ? [body.by.rise] : [body.by.above, body.by.below], uses);
    case 'move':
      inValues(body.factor === undefined ? [] : [body.factor], uses);
      use('point', body.point, uses);
      return inValue(body.by, uses);
    case 'lengthen':
    case 'shorten':
      inValues(body.factor === undefined ? [] : [body.factor], uses);
      useAll('member', body.members, uses);
      return inValue(body.by, uses);
    case 'line':
      inValues(body.to === undefined ? [body.intensity] : [body.intensity, body.to], uses);
      if (body.direction.kind === 'angle') inValue(body.direction.angle, uses);
      if (body.direction.kind === 'along') use('point', body.direction.towards, uses);
      useAll('member', body.on, uses);
      return inStretch(body.stretch, uses);
    case 'point':
      inValue(body.amount, uses);
      if (body.direction.kind === 'angle') inValue(body.direction.angle, uses);
      inPlace(body.at, uses);
      return useIf('member', body.in, uses);
    case 'row':
      inValue(body.amount, uses);
      if (body.direction.kind === 'angle') inValue(body.direction.angle, uses);
      inValue(body.every, uses);
      inStretch(body.stretch, uses);
      return use('member', body.on, uses);
  }
}

function inShow(show: ShowBody, uses: NameUse[]): void {
  switch (show.kind) {
    case 'inputs':
    case 'drawing':
    case 'results':
      return;
    case 'reactions':
      return inUnder(show.under, uses);
    case 'working':
      return use('result', show.of, uses);
    case 'contributions':
      return use('result', show.to, uses);
    case 'field':
      inMeasure(show.measure, uses);
      return inUnder(show.under, uses);
  }
}

/** What is carried may come from another note, so its names are looked for there; only the place is ours. */
function inCarry(carry: CarryBody, uses: NameUse[]): void {
  if (carry.factor !== undefined) inValue(carry.factor, uses);
  if (carry.every !== undefined) inValue(carry.every, uses);
  if (carry.onto.kind === 'member') {
    use('member', carry.onto.member, uses);
    return inStretch(carry.onto.stretch, uses);
  }
  inPlace(carry.onto.place, uses);
  useIf('member', carry.onto.in, uses);
}

function use(sought: Sought, name: Name, uses: NameUse[]): void {
  uses.push({ sought, name });
}

function useIf(sought: Sought, name: Name | undefined, uses: NameUse[]): void {
  if (name !== undefined) uses.push({ sought, name });
}

function useAll(sought: Sought, names: readonly Name[], uses: NameUse[]): void {
  for (const name of names) uses.push({ sought, name });
}
