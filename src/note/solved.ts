// A structure with what it does: its analysis, the solutions of combinations and the second road, each worked once, when
// first asked for. A structure that did not change is taken from memory with all of them.
import { type Analysis, analyse, combine, findRemedies, type Remedy, type Solution } from '../mechanics/index.ts';
import type { Leg, Structure } from '../model/structure.ts';
import { SecondRoad } from '../virtual-work/index.ts';

export class Solved {
  readonly analysis: Analysis;
  readonly secondRoad: SecondRoad;
  readonly #solutions = new Map<string, Solution>();
  #remedies: readonly (readonly Remedy[])[] | undefined;

  constructor(structure: Structure) {
    this.analysis = analyse(structure);
    this.secondRoad = new SecondRoad(structure);
  }

  /** Sets of changes that would hold an unstable structure, each tried; see `findRemedies`. */
  get remedies(): readonly (readonly Remedy[])[] {
    const { structure, stability } = this.analysis;
    this.#remedies ??= findRemedies(structure, stability.mechanisms);
    return this.#remedies;
  }

  /** Whether a combination was asked for already. */
  isSolved(factors: readonly number[]): boolean {
    return this.#solutions.has(factors.join(' '));
  }

  solution(factors: readonly number[]): Solution {
    const key = factors.join(' ');
    let solution = this.#solutions.get(key);
    if (solution === undefined) {
      solution = combine(this.analysis, factors);
      this.#solutions.set(key, solution);
    }
    return solution;
  }
}

/** All of a structure that its solution depends on, as a text: names, titles, sources and places in the note left out. */
export function solutionKey(structure: Structure): string {
  const { points, sections, members, hinges, supports, cases, loads } = structure;
  return JSON.stringify([
    points.map(({ x, y }) => [x, y]),
    sections.map(section => [
      section.depth ?? '',
      section.thermalExpansion ?? '',
      section.bendingStiffness ?? '',
      ...(section.wanted ? ['wanted'] : []),
      section.axialStiffness ?? '',
      section.massPerLength ?? '',
      section.sectionModulus ?? '',
      section.area ?? '',
      ...(section.shearStiffness === undefined ? [] : [{ shearStiffness: section.shearStiffness }]),
    ]),
    members.map(({ kind, only, legs }) => [kind, only ?? '', ...legs.map(legKey)]),
    hinges.map(({ point, member }) => [point, member ?? '']),
    supports.map(({ point, restraints, bears }) => [
      point,
      bears === undefined ? '' : [bears.x, bears.y],
      restraints.map(({ freedom, stiffness }) => [freedom, String(stiffness)]),
    ]),
    cases.map(({ span }) => span?.of ?? ''),
    loads.map(({ range: _range, source: _source, ...load }) => load),
  ]);
}

function legKey({ from, to, section, startAttachment, endAttachment }: Leg) {
  const leg = [from, to, section];
  return startAttachment === undefined && endAttachment === undefined
    ? leg
    : [...leg, startAttachment ?? '', endAttachment ?? ''];
}
