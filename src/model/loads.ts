// Loads in SI, put where they act: on a stretch of a member, at a place, on a support. A load that cannot act where it
// is put is told at its words, and its case is then not all known.
import type { LoadBody, Name, Place, StatementOf, Stretch, Turn, Value } from '../language/syntax.ts';
import { type Dimension, FORCE, FORCE_PER_LENGTH, MOMENT, sameDimension, TEMPERATURE } from '../quantity/dimension.ts';
import type { Range } from '../quantity/range.ts';
import { A_LENGTH, A_NUMBER, AN_ANGLE } from './dues.ts';
import type { Due, Figures } from './figures.ts';
import { distanceOf, type Geometry, type LaidMember } from './geometry.ts';
import { HEADINGS, unitAt } from './headings.ts';
import { endsAt, membersNamed, type ReadStretch, readPlace, readStretch } from './places.ts';
import type { Report } from './report.ts';
import type { Scope } from './scope.ts';
import type { Hinge, LineDirection, Load, LoadCase, Location, Restraint, Section, Support } from './structure.ts';

const A_FORCE: Due = { dimension: FORCE, words: 'a force' };
const A_MOMENT: Due = { dimension: MOMENT, words: 'a moment' };
const A_LINE_LOAD: Due = { dimension: FORCE_PER_LENGTH, words: 'a force per length' };
const A_TEMPERATURE: Due = { dimension: TEMPERATURE, words: 'a temperature difference' };

/** A row longer than this is a slip of a decimal point. */
const MOST_IN_A_ROW = 10_000;

/** What loads are read against. */
export interface LoadGround {
  readonly geometry: Geometry;
  readonly supports: readonly Support[];
  readonly hinges: readonly Hinge[];
  /** The section of each leg of each member. */
  readonly sectionOf: (member: number, leg: number) => Section | undefined;
}

export interface LoadsRead {
  readonly cases: readonly LoadCase[];
  readonly loads: readonly Load[];
}

export function readLoads(
  scope: Scope,
  titles: ReadonlyMap<string, string>,
  ground: LoadGround,
  figures: Figures,
  report: Report,
): LoadsRead {
  return new LoadReader(scope, titles, ground, figures, report).run();
}

type Amount = Extract<LoadBody, { kind: 'point' | 'row' }>;

class LoadReader {
  readonly #scope: Scope;
  readonly #titles: ReadonlyMap<string, string>;
  readonly #ground: LoadGround;
  readonly #figures: Figures;
  readonly #report: Report;
  readonly #cases: LoadCase[] = [];
  readonly #caseNamed = new Map<string, number>();
  readonly #loads: Load[] = [];
  #rows = 0;

  constructor(scope: Scope, titles: ReadonlyMap<string, string>, ground: LoadGround, figures: Figures, report: Report) {
    this.#scope = scope;
    this.#titles = titles;
    this.#ground = ground;
    this.#figures = figures;
    this.#report = report;
  }

  run(): LoadsRead {
    for (const statement of this.#scope.statements) {
      if (statement.kind !== 'load') continue;
      const index = this.#case(statement.case.text);
      if (!this.#read(statement, index)) this.#report.flawedCases.add(statement.case.text);
    }
    return { cases: this.#cases, loads: this.#loads };
  }

  #case(name: string): number {
    const known = this.#caseNamed.get(name);
    if (known !== undefined) return known;
    const title = this.#titles.get(name);
    this.#caseNamed.set(name, this.#cases.length);
    return this.#cases.push(title === undefined ? { name } : { name, title }) - 1;
  }

  /** Whether all of the statement could be read. */
  #read(statement: StatementOf<'load'>, index: number): boolean {
    const { body } = statement;
    const source = statement.source?.text;
    const common = { case: index, range: statement.body.range, ...(source === undefined ? {} : { source }) };
    switch (body.kind) {
      case 'self-weight':
        return this.#selfWeight(body, common);
      case 'line':
        return this.#line(body, common);
      case 'point':
        return this.#point(body, common);
      case 'row':
        return this.#row(body, common);
      case 'move':
        return this.#move(body, common);
      case 'heat':
        return this.#heat(body, common);
      case 'lengthen':
      case 'shorten':
        return this.#lengthen(body, common);
    }
  }

  // Kinds of load

  #selfWeight(body: Extract<LoadBody, { kind: 'self-weight' }>, common: Common): boolean {
    const factor = body.factor === undefined ? 1 : this.#figures.number(body.factor, A_NUMBER);
    const members = body.of === undefined ? this.#ground.geometry.members.map((_, i) => i) : this.#membersOf(body.of);
    if (factor === undefined || members === undefined) return false;
    const weightless = new Map<string, Section>();
    for (const index of members) {
      this.#ground.geometry.members[index]!.legs.forEach((_, leg) => {
        const section = this.#ground.sectionOf(index, leg);
        // A section without a name could not be read, and that was told.
        if (section !== undefined && section.name !== '' && section.massPerLength === undefined)
          weightless.set(section.name, section);
      });
    }
    for (const section of weightless.values()) {
      const missing = section.area === undefined ? 'area A' : 'density';
      this.#report.error(
        'missing-property',
        common.range,
        `Self-weight needs a mass per length, and ${section.name} has no ${missing}.`,
        {
          hint: section.area === undefined ? `give ${section.name} an A` : 'give its material a density',
          related: [{ range: section.range, message: `${section.name} is described here.` }],
        },
      );
    }
    if (weightless.size > 0) return false;
    this.#loads.push({ ...common, kind: 'self-weight', members, factor });
    return true;
  }

  #line(body: Extract<LoadBody, { kind: 'line' }>, common: Common): boolean {
    const from = this.#intensity(body.intensity);
    const to = body.to === undefined ? from : this.#intensity(body.to);
    const members = this.#membersOf(body.on);
    if (from === undefined || to === undefined || members === undefined) return false;
    let sound = true;
    for (const index of members) {
      const member = this.#ground.geometry.members[index]!;
      const stretch =
        body.stretch === undefined
          ? { start: 0, end: member.length, reversed: false }
          : this.#stretch(body.stretch, member);
      const direction = stretch === undefined ? undefined : this.#direction(body, member, stretch);
      if (stretch === undefined || direction === undefined || !this.#mayAct(member, direction, body.range)) {
        sound = false;
        continue;
      }
      const [startIntensity, endIntensity] = stretch.reversed ? [to, from] : [from, to];
      this.#loads.push({
        ...common,
        kind: 'line',
        member: index,
        start: stretch.start,
        end: stretch.end,
        startIntensity,
        endIntensity,
        direction,
        ...(body.patterned ? { patterned: true } : {}),
      });
    }
    return sound;
  }

  #intensity(value: Value): number | undefined {
    const quantity = this.#figures.quantity(value);
    if (quantity === undefined) return undefined;
    if (sameDimension(quantity.dimension, FORCE)) {
      this.#report.error(
        'bad-load',
        value.range,
        'A load on a stretch of a member is a force per length; this is a force.',
        {
          hint: 'write kN/m, or put the force at a place: … at P',
        },
      );
      return undefined;
    }
    if (sameDimension(quantity.dimension, FORCE_PER_LENGTH)) return quantity.value;
    this.#figures.wrongKind(value, quantity, A_LINE_LOAD);
    return undefined;
  }

  #direction(
    body: Extract<LoadBody, { kind: 'line' }>,
    member: LaidMember,
    stretch: { readonly start: number; readonly end: number },
  ): LineDirection | undefined {
    const { direction } = body;
    switch (direction.kind) {
      case 'heading':
        return { kind: 'global', ...HEADINGS[direction.heading], onPlan: direction.onPlan };
      case 'angle': {
        const angle = this.#figures.number(direction.angle, AN_ANGLE);
        return angle === undefined ? undefined : { kind: 'global', ...unitAt(angle), onPlan: direction.onPlan };
      }
      case 'square': {
        const heading = HEADINGS[direction.heading];
        const parallel = member.legs.find(
          leg => overlaps(leg, stretch) && Math.abs(heading.y * leg.cosine - heading.x * leg.sine) < 1e-9,
        );
        if (parallel === undefined) return { kind: 'square', ...heading };
        this.#report.error(
          'bad-load',
          body.range,
          `${member.name} runs ${direction.heading === 'up' || direction.heading === 'down' ? 'upright' : 'level'} there, so ${direction.heading} names no side of it.`,
          {
            hint:
              direction.heading === 'up' || direction.heading === 'down'
                ? 'write square left or square right'
                : 'write square up or square down',
          },
        );
        return undefined;
      }
      case 'along': {
        const point = this.#ground.geometry.pointNamed.get(direction.towards.text);
        if (point === undefined) return undefined;
        const at = distanceOf(member, point);
        const slack = 1e-9 * member.length;
        if (at !== undefined && at >= stretch.end - slack) return { kind: 'along', sense: 1 };
        if (at !== undefined && at <= stretch.start + slack) return { kind: 'along', sense: -1 };
        const name = direction.towards.text;
        this.#report.error(
          'bad-load',
          direction.towards.range,
          at === undefined
            ? `${name} is not on ${member.name}.`
            : `${name} stands within the loaded part of ${member.name}.`,
          {
            hint: 'name a point at an end of the loaded part, or beyond it',
          },
        );
        return undefined;
      }
    }
  }

  /** A bar takes no load across it. */
  #mayAct(member: LaidMember, direction: LineDirection, range: Range): boolean {
    if (member.kind === 'member' || direction.kind === 'along') return true;
    const { cosine, sine } = member.legs[0]!;
    if (direction.kind === 'global' && Math.abs(direction.y * cosine - direction.x * sine) < 1e-12) return true;
    this.#report.error(
      'bad-load',
      range,
      `${member.name} is a bar: it carries axial force only, and no load across it.`,
      {
        hint: 'make it a member, or put the load at its ends',
      },
    );
    return false;
  }

  #point(body: Extract<LoadBody, { kind: 'point' }>, common: Common): boolean {
    const at = this.#location(body.at, body.in);
    const act = this.#action(body);
    if (at === undefined || act === undefined) return false;
    if (act.kind === 'couple' && !this.#turns(at, body)) return false;
    this.#loads.push(act.kind === 'force' ? { ...common, ...act, at } : { ...common, ...act, at });
    return true;
  }

  #row(body: Extract<LoadBody, { kind: 'row' }>, common: Common): boolean {
    const act = this.#action(body);
    const every = this.#figures.positive(body.every, A_LENGTH, 'The distance between loads of a row');
    const members = this.#membersOf([body.on]);
    if (act === undefined || every === undefined || members === undefined) return false;
    const [index] = members;
    if (members.length !== 1 || index === undefined) {
      this.#report.error('bad-load', body.on.range, `A row of loads stands on one member; ${body.on.text} is a group.`);
      return false;
    }
    const member = this.#ground.geometry.members[index]!;
    if (!this.#isMember(member, body.range)) return false;
    const stretch = this.#stretch(body.stretch, member);
    if (stretch === undefined) return false;
    const length = stretch.end - stretch.start;
    const steps = Math.floor(length / every + 1e-9);
    if (steps + 1 > MOST_IN_A_ROW) {
      this.#report.error(
        'too-large',
        body.every.range,
        `This row has ${steps + 1} loads; at most ${MOST_IN_A_ROW} are taken.`,
        { hint: 'write a load per length instead' },
      );
      return false;
    }
    const row = this.#rows++;
    for (let i = 0; i <= steps; i++) {
      const offset = Math.min(i * every, length);
      const distance = stretch.reversed ? stretch.end - offset : stretch.start + offset;
      const at: Location = { kind: 'along', member: index, distance };
      this.#loads.push(act.kind === 'force' ? { ...common, ...act, at, row } : { ...common, ...act, at, row });
    }
    return true;
  }

  /** A force or a couple in global components; the amount must be of the kind that its direction says. */
  #action(
    body: Amount,
  ):
    | { readonly kind: 'force'; readonly x: number; readonly y: number }
    | { readonly kind: 'couple'; readonly moment: number }
    | undefined {
    const { direction } = body;
    const quantity = this.#figures.quantity(body.amount);
    if (quantity === undefined) return undefined;
    const amount = quantity.value;
    if (direction.kind === 'turn' && (direction.turn === 'clockwise' || direction.turn === 'anticlockwise')) {
      if (sameDimension(quantity.dimension, MOMENT))
        return { kind: 'couple', moment: direction.turn === 'clockwise' ? -amount : amount };
      this.#misplaced(
        body,
        quantity.dimension,
        FORCE,
        'A force does not turn clockwise or anticlockwise.',
        'write down, up, left or right',
      );
      if (!sameDimension(quantity.dimension, FORCE)) this.#figures.wrongKind(body.amount, quantity, A_MOMENT);
      return undefined;
    }
    if (sameDimension(quantity.dimension, FORCE)) {
      const angle = direction.kind === 'angle' ? this.#figures.number(direction.angle, AN_ANGLE) : undefined;
      if (direction.kind === 'angle' && angle === undefined) return undefined;
      const way = direction.kind === 'turn' ? HEADINGS[direction.turn as keyof typeof HEADINGS] : unitAt(angle!);
      return { kind: 'force', x: 0 + way.x * amount, y: 0 + way.y * amount };
    }
    const isLine = this.#misplaced(
      body,
      quantity.dimension,
      FORCE_PER_LENGTH,
      'A force per length cannot act at one place.',
      'put it on a member: … on R1',
    );
    const isMoment = this.#misplaced(
      body,
      quantity.dimension,
      MOMENT,
      'A moment stands where a force belongs.',
      'write clockwise or anticlockwise',
    );
    if (!isLine && !isMoment) this.#figures.wrongKind(body.amount, quantity, A_FORCE);
    return undefined;
  }

  #misplaced(body: Amount, found: Dimension, wrong: Dimension, message: string, hint: string): boolean {
    if (!sameDimension(found, wrong)) return false;
    this.#report.error('bad-load', body.amount.range, message, { hint });
    return true;
  }

  /** Whether a couple has a joint or a member to turn there, and only one that could be meant. */
  #turns(at: Location, body: Extract<LoadBody, { kind: 'point' }>): boolean {
    if (at.kind === 'along') return true;
    const { geometry, hinges } = this.#ground;
    const name = geometry.points[at.point]!.name;
    const ends = endsAt(geometry, at.point);
    if (ends.length === 0) {
      this.#report.error('bad-load', body.range, `Only bars meet at ${name}, and bars take no couple.`);
      return false;
    }
    const here = hinges.filter(hinge => hinge.point === at.point);
    const freed = (member: number): boolean =>
      here.some(hinge => hinge.member === undefined || hinge.member === member);
    if (at.member === undefined) {
      const rigid = ends.filter(end => !freed(end));
      if (rigid.length > 0 || ends.length === 1) return true;
      this.#report.error('bad-load', body.range, `${name} is a hinge: say on which member the couple acts.`, {
        hint: `write at ${name} in ${geometry.members[ends[0]!]!.name}`,
      });
      return false;
    }
    if (!freed(at.member) || ends.filter(end => end === at.member).length < 2) return true;
    const member = geometry.members[at.member]!.name;
    this.#report.error(
      'bad-load',
      body.range,
      `${member} has a hinge at ${name}, and runs on both sides of it: the couple could act on either.`,
      {
        hint: `put it a little to one side: … at 1 mm from ${name} on ${member}`,
      },
    );
    return false;
  }

  #move(body: Extract<LoadBody, { kind: 'move' }>, common: Common): boolean {
    const factor = body.factor === undefined ? 1 : this.#figures.number(body.factor, A_NUMBER);
    const point = this.#ground.geometry.pointNamed.get(body.point.text);
    const turning = body.turn === 'clockwise' || body.turn === 'anticlockwise';
    const by = this.#figures.number(body.by, turning ? AN_ANGLE : A_LENGTH);
    if (factor === undefined || by === undefined || point === undefined) return false;
    const support = this.#ground.supports.find(other => other.point === point);
    const freedom = freedomOf(body.turn);
    const amount = factor * by * (body.turn === 'clockwise' ? -1 : 1);
    if (support !== undefined && holds(support.restraints, freedom)) {
      this.#loads.push({ ...common, kind: 'movement', point, freedom, amount });
      return true;
    }
    this.#report.error(
      'bad-load',
      body.point.range,
      support === undefined
        ? `${body.point.text} has no support to move.`
        : `The support at ${body.point.text} does not hold it that way, so it cannot move it ${body.turn}.`,
      {
        hint: 'only a held or a sprung direction of a support can be moved',
      },
    );
    return false;
  }

  #heat(body: Extract<LoadBody, { kind: 'heat' }>, common: Common): boolean {
    const { by } = body;
    const factor = body.factor === undefined ? 1 : this.#figures.number(body.factor, A_NUMBER);
    const above = this.#figures.number(by.kind === 'uniform' ? by.rise : by.above, A_TEMPERATURE);
    const below = by.kind === 'uniform' ? above : this.#figures.number(by.below, A_TEMPERATURE);
    const members = this.#membersOf(body.on);
    if (factor === undefined || above === undefined || below === undefined || members === undefined) return false;
    if (by.kind === 'gradient') {
      const bar = members.map(index => this.#ground.geometry.members[index]!).find(({ kind }) => kind === 'bar');
      if (bar !== undefined) {
        this.#report.error(
          'bad-load',
          body.range,
          `${bar.name} is a bar: it does not bend, and is as warm above as below.`,
          { hint: `write heat ${bar.name} by one difference: the mean over its depth` },
        );
        return false;
      }
    }
    if (!this.#canBeHeated(members, above !== below, common.range)) return false;
    if (above !== below) this.#tellUpperSide(members, common.range);
    for (const member of members)
      this.#loads.push({ ...common, kind: 'heat', member, above: factor * above, below: factor * below });
    return true;
  }

  /** Above is the side left of the travel, which may not be what the word says of this member. */
  #tellUpperSide(members: readonly number[], range: Range): void {
    for (const index of members) {
      const { name, legs } = this.#ground.geometry.members[index]!;
      const leg = legs.find(({ cosine }) => cosine < 1e-9);
      if (leg === undefined) continue;
      const runs = leg.cosine < -1e-9 ? 'is drawn from right to left' : 'stands upright';
      const lies = leg.cosine < -1e-9 ? 'below it' : leg.sine > 0 ? 'to its left' : 'to its right';
      this.#report.hint('upper-side', range, `${name} ${runs}: its upper side, left of its travel, lies ${lies}.`);
    }
  }

  /** Whether every section of the members has what heat needs. */
  #canBeHeated(members: readonly number[], needsDepth: boolean, range: Range): boolean {
    const lacking = new Map<string, Section>();
    for (const index of members) {
      this.#ground.geometry.members[index]!.legs.forEach((_, leg) => {
        const section = this.#ground.sectionOf(index, leg);
        // A section without a name could not be read, and that was told.
        if (section === undefined || section.name === '') return;
        const { thermalExpansion, depth } = section;
        if (thermalExpansion === undefined || (needsDepth && depth === undefined)) lacking.set(section.name, section);
      });
    }
    for (const { name, thermalExpansion, material, range: described } of lacking.values()) {
      const isDepth = thermalExpansion !== undefined;
      this.#report.error(
        'missing-property',
        range,
        isDepth
          ? `A difference between above and below needs a depth, and ${name} has none.`
          : `Heat needs a thermal expansion, and ${name} has no alpha.`,
        {
          hint: isDepth ? `give ${name} a depth` : `give ${material ?? name} one: alpha 12e-6 /K`,
          related: [{ range: described, message: `${name} is described here.` }],
        },
      );
    }
    return lacking.size === 0;
  }

  #lengthen(body: Extract<LoadBody, { kind: 'lengthen' | 'shorten' }>, common: Common): boolean {
    const factor = body.factor === undefined ? 1 : this.#figures.number(body.factor, A_NUMBER);
    const by = this.#figures.number(body.by, A_LENGTH);
    const members = this.#membersOf(body.members);
    if (factor === undefined || by === undefined || members === undefined) return false;
    const amount = factor * by * (body.kind === 'shorten' ? -1 : 1);
    for (const member of members) this.#loads.push({ ...common, kind: 'lengthen', member, amount });
    return true;
  }

  // Places

  #membersOf(names: readonly Name[]): number[] | undefined {
    return membersNamed(names, this.#ground.geometry);
  }

  #isMember(member: LaidMember, range: Range): boolean {
    if (member.kind === 'member') return true;
    this.#report.error(
      'bad-load',
      range,
      `${member.name} is a bar: it carries axial force only, and no load between its ends.`,
      { hint: 'make it a member, or put the load at its ends' },
    );
    return false;
  }

  #location(place: Place, within: Name | undefined): Location | undefined {
    const location = readPlace(place, within, this.#ground.geometry, this.#figures, this.#report, 'bad-load');
    if (location?.kind === 'along' && !this.#isMember(this.#ground.geometry.members[location.member]!, place.range))
      return undefined;
    return location;
  }

  #stretch(stretch: Stretch, member: LaidMember): ReadStretch | undefined {
    return readStretch(stretch, member, this.#ground.geometry, this.#figures, this.#report, 'bad-load');
  }
}

interface Common {
  readonly case: number;
  readonly range: Range;
  readonly source?: string;
}

function freedomOf(turn: Turn): Restraint['freedom'] {
  return turn === 'clockwise' || turn === 'anticlockwise'
    ? { kind: 'rotation' }
    : { kind: 'movement', ...HEADINGS[turn] };
}

function overlaps(
  leg: { readonly start: number; readonly length: number },
  stretch: { readonly start: number; readonly end: number },
): boolean {
  return leg.start < stretch.end && leg.start + leg.length > stretch.start;
}

/** Whether restraints resist a movement wholly: along one of them, or any way where two lie askew. */
function holds(restraints: readonly Restraint[], freedom: Restraint['freedom']): boolean {
  if (freedom.kind === 'rotation') return restraints.some(({ freedom: { kind } }) => kind === 'rotation');
  const ways = restraints.flatMap(restraint => (restraint.freedom.kind === 'movement' ? [restraint.freedom] : []));
  const across = (a: { x: number; y: number }, b: { x: number; y: number }): number => Math.abs(a.x * b.y - a.y * b.x);
  if (ways.some(way => across(way, freedom) < 1e-9)) return true;
  return ways.some((a, i) => ways.slice(i + 1).some(b => across(a, b) > 1e-9));
}
