// Lays a structure out: chains of dimensions become points with coordinates and members with straight legs.
// A chain is laid as soon as its first point stands, whatever the order of the lines; a point that nothing places, a gap
// and a leg without length are told at their words.
import type { Chain, ChainLeg, Name, PlaceOnMember, Statement, StatementOf } from '../language/syntax.ts';
import type { Range } from '../quantity/range.ts';
import { A_LENGTH, AN_ANGLE } from './dues.ts';
import type { Figures } from './figures.ts';
import { CLOSING_TOLERANCE, type Geometry, type LaidLeg, type LaidMember } from './geometry.ts';
import { cleanCosine, cleanSine } from './headings.ts';
import { headings, metres, millimetres } from './length-words.ts';
import { locateOnMember } from './places.ts';
import type { Report } from './report.ts';
import type { Scope } from './scope.ts';
import type { Group, Point } from './structure.ts';

export function layOut(scope: Scope, figures: Figures, report: Report): Geometry {
  return new Layout(scope, figures, report).run();
}

interface Position {
  readonly x: number;
  readonly y: number;
}

type Strand = StatementOf<'member' | 'bar' | 'bars'> & { readonly chain: Chain };

/** A chain on its way: the legs behind `next` are still to be laid. */
interface Progress {
  readonly statement: Strand;
  next: number;
  readonly passed: Set<string>;
}

class Layout {
  readonly #scope: Scope;
  readonly #figures: Figures;
  readonly #report: Report;
  readonly #points: Point[] = [];
  readonly #pointNamed = new Map<string, number>();
  readonly #members: LaidMember[] = [];
  readonly #memberNamed = new Map<string, number>();
  readonly #groups: Group[] = [];
  /** Chains that wait for a point to stand. */
  readonly #waiting = new Map<string, Progress[]>();
  readonly #laid = new Set<Strand>();
  #size = 0;

  constructor(scope: Scope, figures: Figures, report: Report) {
    this.#scope = scope;
    this.#figures = figures;
    this.#report = report;
  }

  run(): Geometry {
    const strands = this.#scope.statements.filter(isStrand);
    this.#placeGiven();
    this.#placeFirst(strands);
    for (const statement of strands) this.#advance({ statement, next: -1, passed: new Set() });
    this.#placeOnMembers(strands);
    for (const waiting of this.#waiting.values()) for (const progress of waiting) this.#stuck(progress);
    this.#groupMembers();
    this.#checkDoubles();
    return {
      points: this.#points,
      pointNamed: this.#pointNamed,
      members: this.#members,
      memberNamed: this.#memberNamed,
      groups: this.#groups,
      size: this.#size,
    };
  }

  // Placing

  #placeGiven(): void {
    for (const statement of this.#scope.statements) {
      if (statement.kind !== 'point' || statement.at.kind !== 'coordinates') continue;
      const x = this.#figures.number(statement.at.x, A_LENGTH);
      const y = this.#figures.number(statement.at.y, A_LENGTH);
      if (x === undefined || y === undefined) this.#report.flawed = true;
      this.#place(statement.name, { x: x ?? 0, y: y ?? 0 });
    }
  }

  /** The first point of a structure's first chain stands at the origin unless a line of its own places it. */
  #placeFirst(strands: readonly Strand[]): void {
    const [first] = strands;
    if (first === undefined || this.#pointNamed.has(first.chain.first.text)) return;
    const name = first.chain.first.text;
    const onMember = this.#scope.statements.some(
      statement => statement.kind === 'point' && statement.name.text === name,
    );
    if (!onMember) this.#place(first.chain.first, { x: 0, y: 0 });
  }

  #place(name: Name, at: Position): number {
    const index = this.#points.length;
    this.#points.push({ name: name.text, x: at.x, y: at.y, range: name.range });
    this.#pointNamed.set(name.text, index);
    this.#size = Math.max(this.#size, Math.abs(at.x - this.#points[0]!.x), Math.abs(at.y - this.#points[0]!.y));
    const waiting = this.#waiting.get(name.text);
    if (waiting !== undefined) {
      this.#waiting.delete(name.text);
      this.#ready.push(...waiting);
    }
    return index;
  }

  /** Chains whose next point came to stand while another chain was being laid. */
  readonly #ready: Progress[] = [];

  #advance(progress: Progress): void {
    this.#ready.push(progress);
    for (let next = this.#ready.pop(); next !== undefined; next = this.#ready.pop()) this.#lay(next);
  }

  #lay(progress: Progress): void {
    const { statement, passed } = progress;
    const { chain } = statement;
    if (progress.next < 0) {
      if (!this.#pointNamed.has(chain.first.text)) {
        this.#wait(progress, chain.first);
        return;
      }
      passed.add(chain.first.text);
      progress.next = 0;
    }
    while (progress.next < chain.legs.length) {
      const leg = chain.legs[progress.next]!;
      const from = progress.next === 0 ? chain.first : chain.legs[progress.next - 1]!.to;
      if (!this.#layLeg(leg, from, passed, progress)) return;
      progress.next++;
    }
    this.#laid.add(statement);
    this.#finish(statement);
  }

  /** Brings the leg's far point to stand; false where it has to wait or cannot be. */
  #layLeg(leg: ChainLeg, from: Name, passed: Set<string>, progress: Progress): boolean {
    if (passed.has(leg.to.text)) {
      this.#fault(
        leg.to.range,
        `${leg.to.text} stands twice in this chain.`,
        'end the chain here and begin another member',
      );
      return false;
    }
    const start = this.#points[this.#pointNamed.get(from.text)!]!;
    const known = this.#pointNamed.get(leg.to.text);
    if (leg.dimension === undefined) {
      if (known === undefined) {
        this.#wait(progress, leg.to);
        return false;
      }
      const to = this.#points[known]!;
      if (!this.#hasLength(start, to)) {
        this.#fault(leg.to.range, `${from.text} and ${leg.to.text} stand at the same place: this leg has no length.`);
        return false;
      }
    } else {
      const step = this.#step(leg);
      if (step === undefined) {
        this.#report.flawed = true;
        return false;
      }
      const to = { x: start.x + step.x, y: start.y + step.y };
      if (!this.#hasLength(start, to)) {
        this.#fault(leg.dimension.range, 'This leg has no length.', 'give it a dimension greater than zero');
        return false;
      }
      if (known === undefined) this.#place(leg.to, to);
      else this.#closes(leg, start, to, this.#points[known]!);
    }
    passed.add(leg.to.text);
    return true;
  }

  /** Rise and run of a leg's dimension, m; undefined where it cannot be had (reported). */
  #step(leg: ChainLeg): Position | undefined {
    const dimension = leg.dimension!;
    switch (dimension.kind) {
      case 'parts': {
        let [x, y] = [0, 0];
        for (const { distance, heading } of dimension.parts) {
          const length = this.#distance(distance, heading);
          if (length === undefined) return undefined;
          if (heading === 'right') x += length;
          if (heading === 'left') x -= length;
          if (heading === 'up') y += length;
          if (heading === 'down') y -= length;
        }
        return { x, y };
      }
      case 'polar': {
        const length = this.#distance(dimension.length, undefined);
        const angle = this.#figures.number(dimension.angle, AN_ANGLE);
        if (length === undefined || angle === undefined) return undefined;
        return { x: length * cleanCosine(angle), y: length * cleanSine(angle) };
      }
      case 'pitched': {
        const run = this.#distance(dimension.run, dimension.heading);
        const pitch = this.#figures.number(dimension.pitch, AN_ANGLE);
        if (run === undefined || pitch === undefined) return undefined;
        if (Math.abs(pitch) > Math.PI / 2 - 1e-6) {
          this.#fault(dimension.pitch.range, 'A pitch is less than a right angle.', 'write the rise instead: 3.2 m up');
          return undefined;
        }
        return { x: dimension.heading === 'right' ? run : -run, y: run * Math.tan(pitch) };
      }
    }
  }

  #distance(value: Parameters<Figures['number']>[0], heading: string | undefined): number | undefined {
    const length = this.#figures.number(value, A_LENGTH);
    if (length === undefined || length >= 0) return length;
    const opposite = { right: 'left', left: 'right', up: 'down', down: 'up' }[heading ?? ''];
    const hint = opposite === undefined ? 'turn the angle instead' : `write ${metres(-length)} ${opposite}`;
    this.#fault(value.range, `A dimension of a chain is never negative; this is ${metres(length)}.`, hint);
    return undefined;
  }

  #closes(leg: ChainLeg, start: Position, to: Position, placed: Point): void {
    const gap = Math.hypot(placed.x - to.x, placed.y - to.y);
    const size = Math.max(this.#size, Math.hypot(to.x - start.x, to.y - start.y));
    if (gap <= CLOSING_TOLERANCE * size) return;
    this.#report.flawed = true;
    const [dx, dy] = [placed.x - start.x, placed.y - start.y];
    const length = Math.hypot(to.x - start.x, to.y - start.y);
    const along = ((to.x - start.x) * dx + (to.y - start.y) * dy) / length;
    const needed = Math.abs(along - Math.hypot(dx, dy)) <= CLOSING_TOLERANCE * size ? metres(along) : headings(dx, dy);
    const short = along > length ? 'short of' : along < length ? 'past' : 'beside';
    this.#report.error(
      'chain-gap',
      leg.to.range,
      `The chain closes ${millimetres(gap)} ${short} ${placed.name}, which stands at ${metres(placed.x)}, ${metres(placed.y)}.`,
      {
        hint: `check the last leg: ${needed} would close it`,
        related: [{ range: placed.range, message: `${placed.name} is placed here.` }],
      },
    );
  }

  // Members

  #finish(statement: Strand): void {
    if (statement.kind === 'bar' && statement.chain.legs.length > 1) {
      const keyword = statement.keyword;
      this.#report.flawed = true;
      this.#report.error(
        'bad-geometry',
        statement.chain.range,
        `A bar runs between two points; this chain has ${statement.chain.legs.length + 1}.`,
        {
          hint: `write bars ${statement.name.text} for a chain of bars, or member`,
          fix: { title: 'Make it a chain of bars', edits: [{ range: keyword, text: 'bars' }] },
        },
      );
      return;
    }
    if (statement.kind === 'bars') {
      const indices = statement.chain.legs.map((leg, i) => {
        const from = i === 0 ? statement.chain.first : statement.chain.legs[i - 1]!.to;
        return this.#addMember(`${statement.name.text}${i + 1}`, 'bar', statement, from, [leg]);
      });
      this.#groups.push({ name: statement.name.text, members: indices });
      return;
    }
    this.#addMember(statement.name.text, statement.kind, statement, statement.chain.first, statement.chain.legs);
  }

  #addMember(
    name: string,
    kind: 'member' | 'bar',
    statement: Strand,
    first: Name,
    chainLegs: readonly ChainLeg[],
  ): number {
    const legs: LaidLeg[] = [];
    let from = this.#pointNamed.get(first.text)!;
    let start = 0;
    for (const { to: name, section } of chainLegs) {
      const to = this.#pointNamed.get(name.text)!;
      const leg = this.#leg(from, to, start, section ?? statement.section);
      legs.push(leg);
      start += leg.length;
      from = to;
    }
    const index = this.#members.length;
    this.#members.push({ name, kind, legs, length: start, range: statement.name.range, only: statement.only });
    this.#memberNamed.set(name, index);
    return index;
  }

  #leg(from: number, to: number, start: number, section: Name | undefined): LaidLeg {
    const [a, b] = [this.#points[from]!, this.#points[to]!];
    const length = Math.hypot(b.x - a.x, b.y - a.y);
    return { from, to, start, length, cosine: (b.x - a.x) / length, sine: (b.y - a.y) / length, section };
  }

  /** Points given by a distance along a member cut its leg in two. Chains that wait for such a point go on from it. */
  #placeOnMembers(strands: readonly Strand[]): void {
    const open = this.#scope.statements.filter(isOnMember);
    for (let again = true; again; ) {
      again = false;
      for (const [i, statement] of open.entries()) {
        const at = statement.at as PlaceOnMember;
        const member = this.#memberNamed.get(at.member.text);
        if (member === undefined || !this.#pointNamed.has(at.from.text)) continue;
        open.splice(i, 1);
        this.#placeOnMember(statement.name, at, member);
        for (let next = this.#ready.pop(); next !== undefined; next = this.#ready.pop()) this.#lay(next);
        again = true;
        break;
      }
    }
    // What is left stands on a member that could not be laid; where the member is at fault, its own words say so.
    if (open.length > 0) this.#report.flawed = true;
    for (const { at } of open) {
      const place = at as PlaceOnMember;
      const blocked = strands.some(strand => !this.#laid.has(strand));
      if (!blocked && this.#memberNamed.has(place.member.text)) {
        this.#fault(place.from.range, `${place.from.text} is not placed.`);
      }
    }
  }

  #placeOnMember(name: Name, at: PlaceOnMember, index: number): void {
    const member = this.#members[index]!;
    const distance = this.locate(at, member);
    if (distance === undefined) {
      this.#report.flawed = true;
      return;
    }
    if (member.kind === 'bar') {
      this.#fault(
        at.range,
        `${member.name} is a bar and runs straight between its two points.`,
        'make it a member, or two bars',
      );
      return;
    }
    const cut = member.legs.findIndex(leg => distance <= leg.start + leg.length);
    const leg = member.legs[cut] ?? member.legs.at(-1)!;
    const offset = distance - leg.start;
    const slack = CLOSING_TOLERANCE * Math.max(this.#size, member.length);
    const near = offset <= slack ? leg.from : leg.length - offset <= slack ? leg.to : undefined;
    if (near !== undefined) {
      const other = this.#points[near]!.name;
      this.#fault(name.range, `${name.text} would stand on ${other}.`, `use ${other} instead`);
      return;
    }
    const base = this.#points[leg.from]!;
    const point = this.#place(name, { x: base.x + offset * leg.cosine, y: base.y + offset * leg.sine });
    const halves: LaidLeg[] = [
      { ...leg, to: point, length: offset },
      { ...leg, from: point, start: distance, length: leg.length - offset },
    ];
    const legs = [...member.legs];
    legs.splice(member.legs.indexOf(leg), 1, ...halves);
    this.#members[index] = { ...member, legs };
  }

  locate(at: PlaceOnMember, member: LaidMember): number | undefined {
    return locateOnMember(at, member, this.#pointNamed, this.#figures, this.#report);
  }

  #groupMembers(): void {
    for (const statement of this.#scope.statements) {
      if (statement.kind !== 'group') continue;
      const members: number[] = [];
      for (const { text } of statement.members) {
        const index = this.#memberNamed.get(text);
        const group = this.#groups.find(other => other.name === text);
        if (index !== undefined) members.push(index);
        else if (group !== undefined) members.push(...group.members);
      }
      this.#groups.push({ name: statement.name.text, members: [...new Set(members)] });
    }
  }

  // Faults

  #wait(progress: Progress, on: Name): void {
    const waiting = this.#waiting.get(on.text);
    if (waiting === undefined) this.#waiting.set(on.text, [progress]);
    else waiting.push(progress);
  }

  #stuck({ statement, next }: Progress): void {
    this.#report.flawed = true;
    if (this.#scope.broken.some(({ keyword }) => !HARMLESS.has(keyword))) return;
    const { chain } = statement;
    const name = next < 0 ? chain.first : chain.legs[next]!.to;
    // Where another chain could not be laid, and that was told, this one only follows from it.
    const placer = this.#scope.statements.some(
      other =>
        other !== statement &&
        isStrand(other) &&
        !this.#laid.has(other) &&
        other.chain.legs.some(leg => leg.to.text === name.text && leg.dimension !== undefined),
    );
    const onMember = this.#scope.statements.some(other => isOnMember(other) && other.name.text === name.text);
    if (placer || onMember) return;
    const start = next < 0;
    this.#report.error(
      'point-not-placed',
      name.range,
      start
        ? `${name.text} is not placed, so this chain has nowhere to start.`
        : `${name.text} is not placed, and no dimension leads to it.`,
      {
        hint: start
          ? `start at a point that stands already, or place this one: point ${name.text}: 0 m, 0 m`
          : `give the leg a dimension, or place the point: point ${name.text}: 0 m, 0 m`,
      },
    );
  }

  #checkDoubles(): void {
    const legs = new Map<string, LaidMember>();
    for (const member of this.#members) {
      for (const leg of member.legs) {
        const ends = leg.from < leg.to ? `${leg.from} ${leg.to}` : `${leg.to} ${leg.from}`;
        const first = legs.get(ends);
        if (first === undefined) {
          legs.set(ends, member);
          continue;
        }
        const names = [this.#points[leg.from]!.name, this.#points[leg.to]!.name];
        this.#report.flawed = true;
        this.#report.error(
          'bad-geometry',
          member.range,
          `${member.name} and ${first.name} lie on the same line between ${names[0]} and ${names[1]}.`,
          {
            hint: 'take one away, or make it 2 x the section',
            related: [{ range: first.range, message: `${first.name} stands here.` }],
          },
        );
      }
    }
    const places = new Map<string, Point>();
    const grid = Math.max(this.#size, Number.MIN_VALUE) * CLOSING_TOLERANCE;
    for (const point of this.#points) {
      const cell = `${Math.round(point.x / grid)} ${Math.round(point.y / grid)}`;
      const first = places.get(cell);
      if (first === undefined) places.set(cell, point);
      else {
        this.#report.warn(
          'bad-geometry',
          point.range,
          `${point.name} stands where ${first.name} stands, and the two are not joined.`,
          {
            hint: `use ${first.name} for both where they are one joint`,
            related: [{ range: first.range, message: `${first.name} is placed here.` }],
          },
        );
      }
    }
  }

  #hasLength(from: Position, to: Position): boolean {
    const length = Math.hypot(to.x - from.x, to.y - from.y);
    return length > 0 && length > 1e-9 * this.#size;
  }

  #fault(range: Range, message: string, hint?: string): void {
    this.#report.flawed = true;
    this.#report.error('bad-geometry', range, message, hint === undefined ? {} : { hint });
  }
}

/** Keywords that place nothing: a broken line of theirs leaves the geometry whole. */
const HARMLESS = new Set([
  'load',
  'case',
  'combine',
  'find',
  'require',
  'show',
  'display',
  'assume',
  'material',
  'section',
  'support',
  'hinge',
  'let',
]);

function isStrand(statement: Statement): statement is Strand {
  return statement.kind === 'member' || statement.kind === 'bar' || statement.kind === 'bars';
}

function isOnMember(statement: Statement): statement is StatementOf<'point'> {
  return statement.kind === 'point' && statement.at.kind === 'on-member';
}
