// Random structures whose members are attached to their joints in every way: freed along or across, connected by springs
// that turn, and with shear deformation.
import fc from 'fast-check';
import type { Attachment, Leg, Structure } from '../../src/model/structure.ts';
import { primaryStructure } from '../../src/virtual-work/index.ts';
import { described } from './described.ts';
import { Draw, type Options } from './recipe.ts';
import { structures } from './structures.ts';

/** Stable; what would let something move is left out. */
export function jointedStructures(options: Options = {}): fc.Arbitrary<Structure> {
  const numbers = fc.array(fc.nat(9999), { minLength: 1, maxLength: 20 });
  return fc.tuple(structures(options), numbers).map(([structure, list]) => described(jointed(structure, list)));
}

/** Structures that can move, and could not before one end more was attached softly; by the second road. */
export function loosenedStructures(): fc.Arbitrary<Structure> {
  const numbers = fc.array(fc.nat(9999), { minLength: 20, maxLength: 40 });
  return fc
    .tuple(structures(), numbers)
    .map(([structure, list]) => loosened(structure, list))
    .filter(structure => structure !== undefined)
    .map(described);
}

function loosened(structure: Structure, list: readonly number[]): Structure | undefined {
  const draw = new Draw(list);
  const bending = structure.members.flatMap(({ kind }, index) => (kind === 'member' ? [index] : []));
  let found: Structure = { ...structure, loads: [] };
  for (let count = list.length; count > 0 && bending.length > 0; count--) {
    found = attached(found, draw.of(bending), draw) ?? found;
    if (primaryStructure(found) === undefined) return found;
  }
  return undefined;
}

function jointed(structure: Structure, list: readonly number[]): Structure {
  const draw = new Draw(list);
  let found: Structure = {
    ...structure,
    sections: structure.sections.map(section =>
      draw.below(3) === 0 ? section : { ...section, shearStiffness: 1e6 * (1 + draw.below(40)) },
    ),
  };
  const bending = structure.members.flatMap(({ kind }, index) => (kind === 'member' ? [index] : []));
  if (bending.length === 0) return found;
  for (let count = 1 + list.length; count > 0; count--) {
    const next = attached(found, draw.of(bending), draw);
    if (next !== undefined && primaryStructure({ ...next, loads: [] }) !== undefined) found = next;
  }
  return found;
}

/** With one more end of a leg attached softly; undefined where the leg would be held by nothing. */
function attached(structure: Structure, index: number, draw: Draw): Structure | undefined {
  const member = structure.members[index]!;
  const number = draw.below(member.legs.length);
  const leg = member.legs[number]!;
  const [key, other] = draw.of([
    ['startAttachment', 'endAttachment'],
    ['endAttachment', 'startAttachment'],
  ] as const);
  const point = key === 'startAttachment' ? leg.from : leg.to;
  const hinged = structure.hinges.some(hinge => hinge.point === point && (hinge.member ?? index) === index);
  const freed = draw.of([['axial'], ['shear'], ['axial', 'shear'], [], [], []] as const);
  if (freed.some(force => leg[other]?.freed.includes(force))) return undefined;
  const turning = hinged || (freed.length > 0 && draw.below(2) === 0) ? {} : { turning: 1e5 * (1 + draw.below(50)) };
  const attachment: Attachment = { freed, ...turning };
  const legs = member.legs.with(number, { ...leg, [key]: attachment } as Leg);
  return { ...structure, members: structure.members.with(index, { ...member, legs }) };
}
