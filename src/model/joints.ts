// How the ends of members are attached to their joints: hinges, releases and semi-rigid connections.
import type { Name, StatementOf } from '../language/syntax.ts';
import { MOMENT } from '../quantity/dimension.ts';
import type { Due, Figures } from './figures.ts';
import { distanceOf, type Geometry } from './geometry.ts';
import type { Report } from './report.ts';
import type { Scope } from './scope.ts';
import type { Attachment, FreedForce, Hinge, Leg, Member, Support } from './structure.ts';

/** A release of the moment is a hinge. */
export function readHinges(scope: Scope, geometry: Geometry, report: Report): Hinge[] {
  const hinges: Hinge[] = [];
  for (const statement of scope.statements) {
    if (statement.kind !== 'hinge' && !(statement.kind === 'release' && statement.freed.includes('moment'))) continue;
    const { point: name, member: of } = statement;
    if (of === undefined) {
      const point = geometry.pointNamed.get(name.text);
      if (point === undefined) report.flawed = true;
      else hinges.push({ point, range: name.range });
      continue;
    }
    const end = findEnd(name, of, geometry, report);
    if (end !== undefined) hinges.push({ ...end, range: name.range });
  }
  return hinges;
}

/** The members with what releases and connections make of their ends. */
export function attachMembers(
  scope: Scope,
  figures: Figures,
  laid: { readonly geometry: Geometry; readonly members: readonly Member[] },
  { hinges, supports }: { readonly hinges: readonly Hinge[]; readonly supports: readonly Support[] },
  report: Report,
): Member[] {
  const joints = new Joints(laid.geometry, laid.members, hinges, supports, report);
  for (const statement of scope.statements) if (statement.kind === 'release') joints.release(statement);
  for (const statement of scope.statements) if (statement.kind === 'connection') joints.connect(statement, figures);
  return joints.members();
}

/** How a member is attached at a point (an index): one for each end that it has there and that is not rigid. */
export function attachmentsAt({ legs }: Member, point: number): readonly Attachment[] {
  return legs.flatMap(({ from, to, startAttachment, endAttachment }) => [
    ...(to === point && endAttachment !== undefined ? [endAttachment] : []),
    ...(from === point && startAttachment !== undefined ? [startAttachment] : []),
  ]);
}

const STIFFNESS: Due = { dimension: MOMENT, words: 'a stiffness in moment per radian' };

/** Two directions whose cross product is smaller than this are one. */
const PARALLEL = 1e-9;

interface MemberEnd {
  readonly point: number;
  readonly member: number;
}

/** One end of a leg of a member. */
interface LegEnd {
  readonly member: number;
  readonly leg: number;
  readonly end: 'start' | 'end';
}

type Direction = readonly [x: number, y: number];

class Joints {
  readonly #geometry: Geometry;
  readonly #members: readonly Member[];
  readonly #hinges: readonly Hinge[];
  readonly #supports: readonly Support[];
  readonly #report: Report;
  readonly #attachments = new Map<string, { freed: FreedForce[]; turning?: number }>();
  /** By point and member: what has been said of it already. */
  readonly #said = new Map<string, Name>();

  constructor(
    geometry: Geometry,
    members: readonly Member[],
    hinges: readonly Hinge[],
    supports: readonly Support[],
    report: Report,
  ) {
    this.#geometry = geometry;
    this.#members = members;
    this.#hinges = hinges;
    this.#supports = supports;
    this.#report = report;
  }

  release(statement: StatementOf<'release'>): void {
    const forces = [...new Set(statement.freed)].filter(force => force !== 'moment');
    if (forces.length === 0) return;
    const end = this.#endOf(statement);
    if (end === undefined || this.#isRepeated(statement, 'released')) return;
    if (this.#members[end.member]!.kind === 'bar') {
      this.#refuse(statement.member, `${statement.member.text} is a bar: it carries axial force only.`);
      return;
    }
    for (const at of this.#freedEnds(end, forces)) {
      this.#attachment(at).freed.push(...forces);
      for (const force of forces) this.#checkHeld(at, force, statement);
    }
  }

  connect(statement: StatementOf<'connection'>, figures: Figures): void {
    const { stiffness: value, member: name, point } = statement;
    const end = this.#endOf(statement);
    const stiffness = figures.number(value, STIFFNESS);
    if (stiffness === undefined) this.#report.flawed = true;
    if (end === undefined || stiffness === undefined || this.#isRepeated(statement, 'connected')) return;
    if (this.#members[end.member]!.kind === 'bar') {
      this.#refuse(name, `${name.text} is a bar, pinned at both ends: no moment passes there.`);
      return;
    }
    if (stiffness <= 0) {
      this.#report.flawed = true;
      this.#report.error('bad-value', value.range, 'A connection has a stiffness greater than zero.', {
        hint: stiffness === 0 ? `write hinge ${point.text} in ${name.text}` : 'write the stiffness without a sign',
      });
      return;
    }
    const hinge = this.#hinges.find(one => one.point === end.point && (one.member ?? end.member) === end.member);
    if (hinge !== undefined) {
      this.#report.flawed = true;
      this.#report.error(
        'defined-twice',
        point.range,
        `${name.text} is hinged at ${point.text}: no moment passes there.`,
        {
          hint: 'leave out the hinge or the connection',
          related: [{ range: hinge.range, message: 'The hinge.' }],
        },
      );
      return;
    }
    const [before, after] = this.#endsAt(end);
    // A member that runs on by itself is joined side to side, once; any other is joined to the joint.
    const alone = !this.#turnsWithOthers(end);
    const ends = after !== undefined && alone ? [after] : [before, after];
    if (after === undefined && alone) this.#warnIdle(statement);
    for (const at of ends) if (at !== undefined) this.#attachment(at).turning = stiffness;
  }

  members(): Member[] {
    return this.#members.map((member, index) => ({
      ...member,
      legs: member.legs.map((leg, k): Leg => {
        const [start, end] = (['start', 'end'] as const).map(side =>
          this.#attachments.get(keyOf({ member: index, leg: k, end: side })),
        );
        if (start === undefined && end === undefined) return leg;
        return { ...leg, ...attached('startAttachment', start), ...attached('endAttachment', end) };
      }),
    }));
  }

  #endOf({ point, member }: { readonly point: Name; readonly member: Name }): MemberEnd | undefined {
    return findEnd(point, member, this.#geometry, this.#report);
  }

  #isRepeated({ point, member }: { readonly point: Name; readonly member: Name }, what: string): boolean {
    const key = `${point.text} ${member.text} ${what}`;
    const first = this.#said.get(key);
    if (first === undefined) {
      this.#said.set(key, point);
      return false;
    }
    this.#report.flawed = true;
    this.#report.error('defined-twice', point.range, `${member.text} is ${what} at ${point.text} already.`, {
      hint: 'say all of it in one line',
      related: [{ range: first.range, message: 'The first one.' }],
    });
    return true;
  }

  #refuse(name: Name, message: string): void {
    this.#report.flawed = true;
    this.#report.error('bad-geometry', name.range, message);
  }

  #attachment(at: LegEnd): { freed: FreedForce[]; turning?: number } {
    const key = keyOf(at);
    const known = this.#attachments.get(key) ?? { freed: [] };
    this.#attachments.set(key, known);
    return known;
  }

  /** The ends of a member at a point, before and behind it in the direction of travel. */
  #endsAt({ point, member }: MemberEnd): readonly [LegEnd, LegEnd?] {
    const { legs } = this.#members[member]!;
    const ends: LegEnd[] = [];
    for (const [leg, { to }] of legs.entries()) if (to === point) ends.push({ member, leg, end: 'end' });
    for (const [leg, { from }] of legs.entries()) if (from === point) ends.push({ member, leg, end: 'start' });
    const [first, second] = ends;
    return second === undefined ? [first!] : [first!, second];
  }

  #warnIdle({ point, member }: StatementOf<'connection'>): void {
    this.#report.warn(
      'idle-connection',
      point.range,
      `Nothing else holds the rotation at ${point.text}: the connection of ${member.text} passes no moment.`,
      { hint: `hold the rotation of ${point.text}, or give its support a spring: spring 850 kN m/rad rotation` },
    );
  }

  /** Whether a joint there turns with more than this member: another one fixed to it, or a support that resists rotation. */
  #turnsWithOthers({ point, member }: MemberEnd): boolean {
    const resisted = this.#supports.some(
      support => support.point === point && support.restraints.some(({ freedom }) => freedom.kind === 'rotation'),
    );
    return (
      resisted ||
      this.#members.some(
        ({ kind, legs }, other) =>
          other !== member &&
          kind === 'member' &&
          legs.some(({ from, to }) => from === point || to === point) &&
          !this.#hinges.some(hinge => hinge.point === point && hinge.member === other),
      )
    );
  }

  /**
   * Both ends of a member that runs on, if the joint between them is held by something else; if not, it stays with the
   * member before it, and the member is cut once.
   */
  #freedEnds(end: MemberEnd, forces: readonly FreedForce[]): readonly LegEnd[] {
    const [before, after] = this.#endsAt(end);
    if (after === undefined) return [before];
    const held: Direction[] = [];
    for (const { point, restraints } of this.#supports) {
      if (point !== end.point) continue;
      for (const { freedom } of restraints) if (freedom.kind === 'movement') held.push([freedom.x, freedom.y]);
    }
    for (const [member, { kind, legs }] of this.#members.entries()) {
      for (const { from, to, cosine, sine } of legs) {
        if (from !== end.point && to !== end.point) continue;
        const freed: readonly FreedForce[] = member === end.member ? forces : [];
        if (!freed.includes('axial')) held.push([cosine, sine]);
        if (kind === 'member' && !freed.includes('shear')) held.push([-sine, cosine]);
      }
    }
    return spansThePlane(held) ? [before, after] : [after];
  }

  /** A leg that slides at both ends would be held by nothing. */
  #checkHeld(at: LegEnd, force: FreedForce, { point, member }: StatementOf<'release'>): void {
    const other = this.#attachments.get(keyOf({ ...at, end: at.end === 'start' ? 'end' : 'start' }));
    if (!other?.freed.includes(force)) return;
    const { from, to } = this.#members[at.member]!.legs[at.leg]!;
    const [first, last] = [this.#geometry.points[from]!.name, this.#geometry.points[to]!.name];
    const way = force === 'axial' ? 'along' : 'across';
    this.#report.flawed = true;
    this.#report.error(
      'unstable-structure',
      point.range,
      `${member.text} is free to move ${way} its axis at both ${first} and ${last}: nothing holds the part between them that way.`,
      { hint: 'leave one of the two releases out' },
    );
  }
}

/** Where a member passes a point; undefined where it does not (reported), or where one of them is not there. */
function findEnd(point: Name, member: Name, geometry: Geometry, report: Report): MemberEnd | undefined {
  const end = { point: geometry.pointNamed.get(point.text), member: geometry.memberNamed.get(member.text) };
  if (end.point === undefined || end.member === undefined) {
    report.flawed = true;
    return undefined;
  }
  if (distanceOf(geometry.members[end.member]!, end.point) === undefined) {
    report.flawed = true;
    report.error('bad-geometry', member.range, `${member.text} does not run through ${point.text}.`);
    return undefined;
  }
  return { point: end.point, member: end.member };
}

function spansThePlane(directions: readonly Direction[]): boolean {
  const [first] = directions;
  return first !== undefined && directions.some(([x, y]) => Math.abs(first[0] * y - first[1] * x) > PARALLEL);
}

function keyOf({ member, leg, end }: LegEnd): string {
  return `${member} ${leg} ${end}`;
}

function attached(key: 'startAttachment' | 'endAttachment', attachment: Attachment | undefined) {
  return attachment === undefined ? {} : { [key]: attachment };
}
