// Measures with every name resolved, and what a measure needs from the structure before it can be taken.
import type { Measure } from '../language/syntax.ts';
import type { Dimension } from '../quantity/dimension.ts';
import { ANGLE, FORCE, LENGTH, MOMENT, STRESS } from '../quantity/dimension.ts';
import type { Figures } from './figures.ts';
import { distanceOf, type Geometry } from './geometry.ts';
import { ASSUMED_MODULUS_REMEDY, assumedModulus } from './library.ts';
import { endsAt, membersNamed, readPlace, readStretch } from './places.ts';
import type { ResolvedMeasure } from './question.ts';
import type { Report } from './report.ts';
import type { Hinge, Location, Structure } from './structure.ts';

/** The kind of answer that a measure has. A reaction may be a force or a moment. */
export function dimensionOf(measure: Pick<Measure, 'kind' | 'component'>): Dimension {
  switch (measure.kind) {
    case 'deflection':
    case 'sway':
    case 'sag':
      return LENGTH;
    case 'rotation':
      return ANGLE;
    case 'moment':
    case 'sagging':
    case 'hogging':
      return MOMENT;
    case 'shear':
    case 'force':
    case 'tension':
    case 'compression':
      return FORCE;
    case 'stress':
      return STRESS;
    case 'reaction':
      return measure.component === 'moment' ? MOMENT : FORCE;
  }
}

/** Whether a measure is a movement, which stiffness governs and the second road checks. */
export function isMovement(kind: ResolvedMeasure['kind']): kind is 'deflection' | 'sway' | 'rotation' | 'sag' {
  return kind === 'deflection' || kind === 'sway' || kind === 'rotation' || kind === 'sag';
}

/** Undefined where the measure has no answer as it stands (reported). */
export function resolveMeasure(
  measure: Measure,
  structure: Structure,
  geometry: Geometry,
  figures: Figures,
  report: Report,
): ResolvedMeasure | undefined {
  return new MeasureReader(measure, structure, geometry, figures, report).read();
}

class MeasureReader {
  readonly #measure: Measure;
  readonly #structure: Structure;
  readonly #geometry: Geometry;
  readonly #figures: Figures;
  readonly #report: Report;

  constructor(measure: Measure, structure: Structure, geometry: Geometry, figures: Figures, report: Report) {
    this.#measure = measure;
    this.#structure = structure;
    this.#geometry = geometry;
    this.#figures = figures;
    this.#report = report;
  }

  read(): ResolvedMeasure | undefined {
    const { kind, at } = this.#measure;
    if (kind === 'reaction') return this.#reaction();
    if (at !== undefined) return this.#atPlace();
    return this.#along();
  }

  #reaction(): ResolvedMeasure | undefined {
    const { at, component, range } = this.#measure;
    if (at === undefined || at.kind !== 'point') {
      return this.#fault(range, 'A reaction is that of a support: ask for it at a point.');
    }
    const point = this.#geometry.pointNamed.get(at.point.text);
    if (point === undefined) return undefined;
    const support = this.#structure.supports.findIndex(other => other.point === point);
    if (support < 0) return this.#fault(at.range, `${at.point.text} has no support.`);
    return { kind: 'reaction', support, component: component ?? 'vertical' };
  }

  #atPlace(): ResolvedMeasure | undefined {
    const { kind, at, in: within } = this.#measure;
    const isGroup = within !== undefined && this.#geometry.groups.some(group => group.name === within.text);
    const location = readPlace(
      at!,
      isGroup ? undefined : within,
      this.#geometry,
      this.#figures,
      this.#report,
      'bad-question',
    );
    if (location === undefined) return undefined;
    switch (kind) {
      case 'deflection':
      case 'sway':
        return { kind, at: location };
      case 'rotation':
        return this.#rotation(location);
      default: {
        const along = this.#onMember(location, kind);
        if (along === undefined || !this.#suits([along.member])) return undefined;
        return { kind: kind as Exclude<typeof kind, 'reaction'>, at: along };
      }
    }
  }

  /** The rotation of a joint, or of a member's end where a hinge lets the ends at a point turn each for itself. */
  #rotation(location: Location): ResolvedMeasure | undefined {
    if (location.kind === 'along') return { kind: 'rotation', at: location };
    const { point, member } = location;
    const name = this.#structure.points[point]!.name;
    const ends = endsAt(this.#geometry, point);
    if (member !== undefined) {
      const legs = ends.filter(end => end === member).length;
      if (legs === 2 && this.#freed(point, member)) {
        return this.#fault(
          this.#measure.range,
          `${this.#structure.members[member]!.name} has a hinge at ${name}, and turns on each side of it by another amount.`,
          `ask a little to one side: rotation at 1 mm from ${name} on ${this.#structure.members[member]!.name}`,
        );
      }
      return { kind: 'rotation', at: location };
    }
    if (ends.length === 0) {
      return this.#fault(
        this.#measure.range,
        `Only bars meet at ${name}: it has no rotation of its own.`,
        'say in which bar: rotation at P in d1',
      );
    }
    const rigid = ends.filter(end => !this.#freed(point, end));
    if (rigid.length === 0 && ends.length > 1) {
      return this.#fault(
        this.#measure.range,
        `${name} is a hinge: its members turn by different amounts.`,
        `say in which: rotation at ${name} in ${this.#structure.members[ends[0]!]!.name}`,
      );
    }
    // One member alone ends here: its rotation is meant, hinge or not.
    if (rigid.length === 0) return { kind: 'rotation', at: { kind: 'point', point, member: ends[0]! } };
    return { kind: 'rotation', at: location };
  }

  #freed(point: number, member: number): boolean {
    return this.#structure.hinges.some(
      (hinge: Hinge) => hinge.point === point && (hinge.member === undefined || hinge.member === member),
    );
  }

  /** Forces are of a member: the one that is said, or the only one at the point. */
  #onMember(location: Location, kind: string): Extract<Location, { kind: 'along' }> | undefined {
    if (location.kind === 'along') return location;
    const { point } = location;
    const through = this.#structure.members.flatMap((member, index) =>
      distanceOf(member, point) === undefined ? [] : [index],
    );
    const within = this.#measure.in;
    const group = within === undefined ? undefined : this.#geometry.groups.find(other => other.name === within.text);
    const candidates =
      location.member !== undefined
        ? [location.member]
        : group === undefined
          ? through
          : through.filter(index => group.members.includes(index));
    const [only, another] = candidates;
    const name = this.#structure.points[point]!.name;
    if (only === undefined) {
      this.#fault(
        this.#measure.range,
        group === undefined ? `No member runs to ${name}.` : `No member of ${group.name} runs to ${name}.`,
      );
      return undefined;
    }
    if (another !== undefined) {
      this.#fault(
        this.#measure.range,
        `Several members meet at ${name}.`,
        `say in which: ${kind} at ${name} in ${this.#structure.members[only]!.name}`,
      );
      return undefined;
    }
    return { kind: 'along', member: only, distance: distanceOf(this.#structure.members[only]!, point)! };
  }

  #along(): ResolvedMeasure | undefined {
    const { kind, in: within, between, range } = this.#measure;
    if (within === undefined)
      return this.#fault(range, 'This asks of nothing: say at which point, or of which member.');
    const along = membersNamed([within], this.#geometry);
    if (along === undefined) return undefined;
    if (along.length === 0) return this.#fault(within.range, `${within.text} has no members.`);
    if (!this.#suits(along)) return undefined;
    const [first, another] = along;
    if (between !== undefined && another !== undefined) {
      return this.#fault(between.range, `A stretch is of one member; ${within.text} is a group.`);
    }
    const stretch =
      between === undefined
        ? undefined
        : readStretch(
            between,
            this.#geometry.members[first!]!,
            this.#geometry,
            this.#figures,
            this.#report,
            'bad-question',
          );
    if (between !== undefined && stretch === undefined) return undefined;
    const part = stretch === undefined ? {} : { stretch: { start: stretch.start, end: stretch.end } };
    if (kind === 'sag') return { kind, along, reversed: stretch?.reversed ?? false, ...part };
    return { kind: kind as Exclude<typeof kind, 'sag' | 'reaction'>, along, ...part };
  }

  /** Bars have axial force only, and a stress needs an area and a modulus. */
  #suits(members: readonly number[]): boolean {
    const { kind } = this.#measure;
    if (kind !== 'stress') return true;
    let sound = true;
    for (const index of members) {
      const member = this.#structure.members[index]!;
      for (const leg of member.legs) {
        const section = this.#structure.sections[leg.section]!;
        const needsModulus = member.kind === 'member';
        if (needsModulus && section.sectionModulusAssumed && section.sectionModulus !== undefined) {
          this.#report.hint(
            'assumed-modulus',
            this.#measure.range,
            assumedModulus(section.name),
            ASSUMED_MODULUS_REMEDY,
          );
        }
        const missing =
          section.area === undefined
            ? 'area A'
            : section.sectionModulus === undefined && needsModulus
              ? 'modulus'
              : undefined;
        if (missing === undefined || !sound) continue;
        sound = false;
        this.#report.error(
          'missing-property',
          this.#measure.range,
          `A stress in ${member.name} needs an area and a section modulus, and ${section.name} has no ${missing}.`,
          {
            hint: `give ${section.name} its ${missing}`,
            related: [{ range: section.range, message: `${section.name} is described here.` }],
          },
        );
      }
    }
    return sound;
  }

  #fault(range: Measure['range'], message: string, hint?: string): undefined {
    this.#report.error('bad-question', range, message, hint === undefined ? {} : { hint });
    return undefined;
  }
}
