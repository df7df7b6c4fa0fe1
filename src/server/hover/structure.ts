// Hovers on a structure and on a section: the state in words, and the figures behind a name.
import type { Section } from '../../model/structure.ts';
import { show } from '../../note/phrases.ts';
import type { NoteResult, StructureResult } from '../../note/result.ts';
import {
  AREA,
  BENDING_STIFFNESS,
  type Dimension,
  FORCE,
  MASS_PER_LENGTH,
  SECOND_MOMENT_OF_AREA,
  SECTION_MODULUS,
  STRESS,
} from '../../quantity/dimension.ts';
import type { DisplayUnits } from '../../quantity/display.ts';
import { stateInWords } from '../words.ts';
import type { Card, Row } from './card.ts';

export function structureCard({ answers }: NoteResult, result: StructureResult): Card {
  const { name, title = '', analysis, withheld } = result;
  const rows: Row[] = [];
  if (withheld !== undefined) rows.push({ label: 'Withheld', text: withheld });
  else if (analysis !== undefined) rows.push({ label: 'Redundancy', text: String(analysis.redundancy) });
  const required = result.answers.map(index => answers[index]).filter(answer => answer?.kind === 'require');
  const met = required.filter(answer => answer?.status === 'ok').length;
  if (required.length > 0) rows.push({ label: 'Requirements met', text: `${met} of ${required.length}` });
  for (const answer of required) {
    if (answer !== undefined && answer.status !== 'ok') rows.push({ label: answer.name, text: stateInWords(answer) });
  }
  return { title: name, about: title === '' ? 'structure' : `structure, ${title}`, rows };
}

export function sectionCard(section: Section, units: DisplayUnits): Card {
  const rows: Row[] = [];
  const add = (label: string, value: number | undefined, dimension: Dimension): void => {
    if (value !== undefined) rows.push({ label, text: show({ value, dimension }, units) });
  };
  add('E', section.youngsModulus, STRESS);
  add('I', section.secondMomentOfArea, SECOND_MOMENT_OF_AREA);
  add('A', section.area, AREA);
  add('W', section.sectionModulus, SECTION_MODULUS);
  add('EI', section.wanted ? undefined : section.bendingStiffness, BENDING_STIFFNESS);
  add('EA', section.axialStiffness, FORCE);
  add('Mass', section.massPerLength, MASS_PER_LENGTH);
  return { title: section.name, about: `section, ${section.description}`, rows };
}
