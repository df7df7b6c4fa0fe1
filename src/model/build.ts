// Builds a structure from its statements: geometry is laid out already; sections, hinges, supports and loads are put on it.
import type { Name } from '../language/syntax.ts';
import type { Figures } from './figures.ts';
import type { Geometry, LaidLeg, LaidMember } from './geometry.ts';
import { attachMembers, readHinges } from './joints.ts';
import type { Library, SectionFigures } from './library.ts';
import { readLoads } from './loads.ts';
import type { Definition, Names } from './names.ts';
import { dividePatterns } from './patterns.ts';
import type { Report } from './report.ts';
import type { Scope } from './scope.ts';
import type { Member, Section, Structure } from './structure.ts';
import { readSupports } from './supports.ts';

export interface Building {
  readonly scope: Scope;
  readonly names: Names;
  readonly geometry: Geometry;
  /** Materials and sections. */
  readonly stock: Library;
  readonly figures: Figures;
  readonly report: Report;
  /** Titles of cases, from `case` lines of the structure and of the head. */
  readonly titles: ReadonlyMap<string, string>;
  /** `assume: axially stiff`: members, not bars, keep their length whatever their section. */
  readonly axiallyStiff: boolean;
  /** `assume: shear deformation`: counted in members, with the shear stiffness of their sections. */
  readonly shearDeformation: boolean;
}

/** What could be built. `report.flawed` says whether anything is missing from it, `report.flawedCases` of which cases. */
export function buildStructure(building: Building): Structure {
  const { scope, geometry, figures, report } = building;
  const sections = new Sections(building);
  const bare = geometry.members.map(member => sections.give(member));
  const hinges = readHinges(scope, geometry, report);
  const supports = readSupports(scope, geometry, figures, report);
  const members = attachMembers(scope, figures, { geometry, members: bare }, { hinges, supports }, report);
  const sectionOf = (member: number, leg: number): Section | undefined =>
    sections.list[members[member]!.legs[leg]!.section];
  const { cases, loads } = readLoads(
    scope,
    building.titles,
    { geometry, supports, hinges, sectionOf },
    figures,
    report,
  );
  const title = scope.structure?.title?.text;
  return dividePatterns({
    name: scope.name ?? '',
    ...(title === undefined ? {} : { title }),
    range: scope.structure?.name.range ?? geometry.members[0]?.range ?? { start: 0, end: 0 },
    points: geometry.points,
    sections: sections.list,
    members,
    groups: geometry.groups,
    hinges,
    supports,
    cases,
    loads,
  });
}

/** Sections in the order in which legs first name them. */
class Sections {
  readonly list: Section[] = [];
  readonly #building: Building;
  readonly #indices = new Map<string, number>();
  readonly #told = new Set<string>();
  #firstWanted: Definition | undefined;

  constructor(building: Building) {
    this.#building = building;
  }

  give(member: LaidMember): Member {
    const legs = member.legs.map(leg => ({ ...leg, section: this.#sectionOf(leg, member) }));
    return {
      name: member.name,
      kind: member.kind,
      legs,
      length: member.length,
      ...(member.only === undefined ? {} : { only: member.only.kind }),
      range: member.range,
    };
  }

  /** Index of the leg's section; that of an empty one, and the structure flawed, where there is none. */
  #sectionOf(leg: LaidLeg, member: LaidMember): number {
    const definition = leg.section === undefined ? this.#onlySection(member) : this.#find(leg.section);
    const found = definition === undefined ? undefined : this.#building.stock.section(definition);
    if (definition === undefined || found === undefined) {
      this.#building.report.flawed = true;
      return this.#index('', () => UNKNOWN_SECTION);
    }
    const key = `${definition.structure ?? ''} ${definition.name}`;
    const stiff = this.#building.axiallyStiff && member.kind === 'member';
    const shears = this.#building.shearDeformation && member.kind === 'member';
    if (member.kind === 'member') this.#needBending(definition, found, member);
    if (shears) this.#needShear(definition, found, member);
    return this.#index(`${key}${stiff ? ' stiff' : ''}${shears ? ' shears' : ''}`, () => {
      const section = toSection(definition, found);
      return {
        ...section,
        ...(stiff && { axialStiffness: undefined }),
        ...(shears && figuresInShear(found)),
      };
    });
  }

  #index(key: string, make: () => Section): number {
    let index = this.#indices.get(key);
    if (index === undefined) {
      index = this.list.push(make()) - 1;
      this.#indices.set(key, index);
    }
    return index;
  }

  #find(name: Name): Definition | undefined {
    return this.#building.names.find(this.#building.scope, ['section'], name.text);
  }

  /** A member need not name its section where there is one only. */
  #onlySection(member: LaidMember): Definition | undefined {
    const { names, scope, report } = this.#building;
    const inReach = names.entries.filter(
      ({ namespace, structure, scope: owner }) =>
        namespace === 'section' && (owner === scope || structure === undefined),
    );
    const [only, another] = inReach;
    if (only !== undefined && another === undefined) return only;
    if (this.#told.has(member.name) || scope.broken.some(({ keyword }) => keyword === 'section')) return undefined;
    this.#told.add(member.name);
    const hint =
      only === undefined
        ? 'describe one: section S: solid 50 mm x 200 mm, E 11 GPa'
        : `write ${member.kind} ${member.name}, ${only.name}: …`;
    report.error(
      'missing-property',
      member.range,
      only === undefined
        ? `${member.name} has no section, and there is none to take.`
        : `There are several sections: say which ${member.name} has.`,
      { hint },
    );
    return undefined;
  }

  #needShear(definition: Definition, { properties }: SectionFigures, member: LaidMember): void {
    const key = `${definition.name} in shear`;
    if (properties.has('GAs') || this.#told.has(key)) return;
    this.#told.add(key);
    this.#building.report.flawed = true;
    const area = properties.has('shear-area') ? [] : ['shear-area'];
    const modulus = properties.has('G') ? [] : [properties.has('E') ? 'G or nu' : 'G'];
    const missing = [...modulus, ...area];
    this.#building.report.error(
      'missing-property',
      definition.definition,
      `${definition.name} has no shear stiffness, and shear deformation is to be counted: ${missing.join(' and ')} ${missing.length > 1 ? 'are' : 'is'} missing.`,
      {
        hint: `${modulus.length > 0 ? 'give its material a G or a nu' : 'give its shear-area'}, or give GAs`,
        related: [{ range: member.range, message: `${member.name} has this section.` }],
      },
    );
  }

  /** What each of two should be cannot be told from one movement. */
  #wanted(definition: Definition): void {
    this.#firstWanted ??= definition;
    if (this.#firstWanted === definition || this.#told.has(definition.name)) return;
    this.#told.add(definition.name);
    this.#building.report.flawed = true;
    this.#building.report.error(
      'missing-property',
      definition.definition,
      `${this.#firstWanted.name} and ${definition.name} are both still to be chosen.`,
      { hint: 'give one of them a figure, or give both members one section' },
    );
  }

  #needBending(definition: Definition, { properties, wanted }: SectionFigures, member: LaidMember): void {
    if (wanted) this.#wanted(definition);
    if (properties.has('EI') || (wanted && properties.has('E')) || this.#told.has(definition.name)) return;
    this.#told.add(definition.name);
    this.#building.report.flawed = true;
    const missing = !properties.has('E') && !properties.has('I') ? 'E and I, or EI' : properties.has('E') ? 'I' : 'E';
    this.#building.report.error(
      'missing-property',
      definition.definition,
      `${definition.name} has no bending stiffness, and ${member.name} bends: ${missing} is missing.`,
      {
        hint: missing === 'E' ? 'name a material with an E, or give EI' : 'give EI, or I and a material with an E',
        related: [{ range: member.range, message: `${member.name} has this section.` }],
      },
    );
  }
}

/** What shear deformation is counted with. */
function figuresInShear({ properties }: SectionFigures): Partial<Section> {
  const [stiffness, area, modulus] = ['GAs', 'shear-area', 'G'].map(key => properties.get(key)?.value);
  return {
    ...(stiffness !== undefined && { shearStiffness: stiffness }),
    ...(area !== undefined && { shearArea: area }),
    ...(modulus !== undefined && { shearModulus: modulus }),
  };
}

/** Stands for a section that could not be read, so that a drawing can still be made. */
const UNKNOWN_SECTION: Section = {
  name: '',
  description: '',
  bendingStiffness: undefined,
  axialStiffness: undefined,
  massPerLength: undefined,
  sectionModulus: undefined,
  area: undefined,
  secondMomentOfArea: undefined,
  youngsModulus: undefined,
  depth: undefined,
  range: { start: 0, end: 0 },
};

/** What stands in for an I that is wanted, m⁴. */
const TRIAL_INERTIA = 1e-4;

function toSection(
  definition: Definition,
  { properties, material, modulusAssumed, description, wanted }: SectionFigures,
): Section {
  const value = (key: string): number | undefined => properties.get(key)?.value;
  return {
    name: definition.name,
    ...(material === undefined ? {} : { material }),
    description,
    bendingStiffness: wanted ? (value('E') ?? Number.NaN) * TRIAL_INERTIA : value('EI'),
    ...(wanted && { wanted }),
    axialStiffness: value('EA'),
    massPerLength: value('mass'),
    sectionModulus: value('modulus'),
    sectionModulusAssumed: modulusAssumed,
    area: value('A'),
    secondMomentOfArea: value('I'),
    youngsModulus: value('E'),
    depth: value('depth'),
    thermalExpansion: value('alpha'),
    range: definition.definition,
  };
}
