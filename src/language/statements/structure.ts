// `structure` begins a structure; `case` gives a load case its title; `use` brings in another note or a table.

import type { StatementForm } from './form.ts';
import { snippet } from './form.ts';

export const STRUCTURE: StatementForm = {
  keyword: 'structure',
  help: 'Begins a structure, which owns what follows until the next one.',
  grammar: 'structure NAME ["TITLE"]',
  examples: ['structure Rafter "Canopy rafter R1"', 'structure Gauge'],
  skeleton: snippet('structure {Name} "{Title}"'),
  read: reader => {
    const name = reader.name('the name of the structure');
    if (!name) return undefined;
    const title = reader.quoted();
    return { kind: 'structure', name, ...(title && { title }) };
  },
};

export const CASE: StatementForm = {
  keyword: 'case',
  help: 'Gives a load case a title. A case exists as soon as a load names it.',
  grammar: 'case NAME ["TITLE"]',
  examples: ['case snow "Drifted snow, north"'],
  skeleton: snippet('case {snow} "{Title}"'),
  read: reader => {
    const name = reader.name('the name of the case');
    if (!name) return undefined;
    const title = reader.quoted();
    return { kind: 'case', name, ...(title && { title }) };
  },
};

export const USE: StatementForm = {
  keyword: 'use',
  help: 'Brings in the values, materials, sections, cases and combinations of another note, or a table of sections.',
  grammar: 'use "PATH"',
  examples: ['use "../project.md"', 'use "sections.csv"'],
  skeleton: snippet('use "{path.md}"'),
  read: reader => {
    const path = reader.quoted();
    return path ? { kind: 'use', path } : reader.due('the path of a note or a table in quotes');
  },
};
