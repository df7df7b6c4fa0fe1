// A structure in few words, for the report of a property that fails.
import fc from 'fast-check';
import type { Location, Structure } from '../../src/model/structure.ts';

/** The same structure, which fast-check prints in few words. */
export function described(structure: Structure): Structure {
  return Object.defineProperty(structure, fc.toStringMethod, { value: () => inWords(structure) });
}

function inWords({ points, members, sections, hinges, supports, loads }: Structure): string {
  const point = (index: number) => points[index]!.name;
  const member = (index: number) => members[index]!.name;
  const number = (value: number | undefined) => (value === undefined ? 'stiff' : Number(value.toPrecision(6)));
  const place = (at: Location) =>
    at.kind === 'along'
      ? `${number(at.distance)} on ${member(at.member)}`
      : [point(at.point), at.member === undefined ? '' : `in ${member(at.member)}`].join(' ');
  return [
    '',
    ...points.map(({ name, x, y }) => `${name} (${number(x)}, ${number(y)})`),
    ...members.map(({ name, kind, legs }) => {
      const names = [point(legs[0]!.from), ...legs.map(leg => point(leg.to))].join(' ');
      const figures = legs.map(({ section }) => {
        const { bendingStiffness, axialStiffness, massPerLength, shearStiffness } = sections[section]!;
        return `EI ${number(bendingStiffness)} EA ${number(axialStiffness)} mass ${massPerLength} GAs ${number(shearStiffness)}`;
      });
      const ends = legs.map(({ startAttachment, endAttachment }) => [startAttachment ?? '', endAttachment ?? '']);
      const attached = ends.flat().some(end => end !== '') ? `, ends ${JSON.stringify(ends)}` : '';
      return `${kind} ${name}: ${names}, ${[...new Set(figures)].join('; ')}${attached}`;
    }),
    ...hinges.map(
      hinge => `hinge ${point(hinge.point)}${hinge.member === undefined ? '' : ` in ${member(hinge.member)}`}`,
    ),
    ...supports.map(support => {
      const held = support.restraints.map(({ freedom, stiffness }) => {
        const way = freedom.kind === 'rotation' ? 'rotation' : `(${number(freedom.x)}, ${number(freedom.y)})`;
        return stiffness === Infinity ? way : `${way} ${number(stiffness)}`;
      });
      return `support ${point(support.point)}: ${held.join(' + ')}`;
    }),
    ...loads.map(load => {
      switch (load.kind) {
        case 'self-weight':
          return `${load.case}: ${load.factor} weight of ${load.members.map(member).join(' ')}`;
        case 'line': {
          const { start, end, startIntensity, endIntensity, direction } = load;
          return `${load.case}: ${startIntensity} to ${endIntensity} on ${member(load.member)} ${number(start)} to ${number(end)} ${JSON.stringify(direction)}`;
        }
        case 'force':
          return `${load.case}: force (${load.x}, ${load.y}) at ${place(load.at)}`;
        case 'couple':
          return `${load.case}: couple ${load.moment} at ${place(load.at)}`;
        case 'movement':
          return `${load.case}: move ${point(load.point)} by ${number(load.amount)} ${JSON.stringify(load.freedom)}`;
        case 'heat':
          return `${load.case}: heat ${member(load.member)} by ${load.above} above, ${load.below} below`;
        case 'lengthen':
          return `${load.case}: lengthen ${member(load.member)} by ${number(load.amount)}`;
        default:
          return '';
      }
    }),
    '',
  ].join('\n');
}
