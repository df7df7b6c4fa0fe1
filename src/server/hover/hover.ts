// What the pointer rests on, and the card that tells of it: a value in the prose, a name, or else the statement.
import type { Hover, Position } from 'vscode-languageserver';
import type { Statement } from '../../language/syntax.ts';
import type { NameEntry, NoteResult, StructureResult } from '../../note/result.ts';
import type { Range } from '../../quantity/range.ts';
import { holds, type OpenNote, structureAt, toProtocol } from '../open-note.ts';
import type { Theme } from '../theme.ts';
import { type Card, toHover } from './card.ts';
import { keywordCard } from './keyword.ts';
import { caseCard, combinationCard, loadCard } from './load.ts';
import { memberCard } from './member.ts';
import { pointCard } from './point.ts';
import { resultCard } from './result.ts';
import { sectionCard, structureCard } from './structure.ts';
import { proseCard, valueCard } from './value.ts';

export interface HoverOptions {
  readonly format: 'markdown' | 'plaintext';
  /** The palette of drawings; undefined for none. */
  readonly drawings: Theme | undefined;
}

export function hover(note: OpenNote, position: Position, options: HoverOptions): Hover | undefined {
  const offset = note.document.offsetAt(position);
  const { result } = note;
  const shown =
    ofProse(result, offset) ??
    ofName(result, offset, options.drawings) ??
    ofStatement(result, offset, options.drawings);
  return shown && toHover(shown.card, toProtocol(note, shown.range), options.format);
}

interface Shown {
  readonly card: Card;
  readonly range: Range;
}

function ofProse({ prose }: NoteResult, offset: number): Shown | undefined {
  const value = prose.find(({ range }) => holds(range, offset));
  return value && { card: proseCard(value), range: value.range };
}

function ofName(result: NoteResult, offset: number, drawings: Theme | undefined): Shown | undefined {
  for (const entry of result.names) {
    const range = [entry.definition, ...entry.uses].find(place => holds(place, offset));
    const card = range && NAMED[entry.namespace](result, entry, ownerOf(result, entry, offset), drawings);
    if (range && card) return { card, range };
  }
  return undefined;
}

function ownerOf(result: NoteResult, { structure }: NameEntry, offset: number): StructureResult | undefined {
  if (structure !== undefined) return result.structures.find(({ name }) => name === structure);
  const index = structureAt(result, offset);
  return index === undefined ? undefined : result.structures[index];
}

type CardOfName = (
  result: NoteResult,
  entry: NameEntry,
  owner: StructureResult | undefined,
  drawings: Theme | undefined,
) => Card | undefined;

/** Every namespace has its card; undefined where nothing can be told, and the statement is told of instead. */
const NAMED: Readonly<Record<NameEntry['namespace'], CardOfName>> = {
  structure: (result, { name }) => {
    const named = result.structures.find(one => one.name === name);
    return named && structureCard(result, named);
  },
  point: (_, { name }, owner) => owner && pointCard(owner, indexOf(owner.structure?.points, name)),
  member: (result, { name }, owner, drawings) =>
    owner && memberCard(result, owner, indexOf(owner.structure?.members, name), drawings),
  section: (_, { name }, owner) => {
    const section = owner?.structure?.sections[indexOf(owner.structure.sections, name)];
    return owner && section && sectionCard(section, owner.display);
  },
  material: () => undefined,
  case: (_, { name }, owner) => owner && caseCard(owner, name),
  combination: (_, { name }, owner) => {
    const combination = owner?.combinations.find(one => one.name === name);
    return combination && combinationCard(combination);
  },
  value: (result, { name, structure }) => {
    const value = result.values.find(one => one.name === (structure === undefined ? name : `${structure}.${name}`));
    return value && valueCard(value);
  },
  result: (result, { name, structure }) => {
    const answer = result.answers.find(
      one => one.name === name && (structure === undefined || result.structures[one.structure]?.name === structure),
    );
    const owner = answer && result.structures[answer.structure];
    return owner && resultCard(answer, owner.display);
  },
};

function ofStatement(result: NoteResult, offset: number, drawings: Theme | undefined): Shown | undefined {
  const statement = result.fences
    .find(({ range }) => holds(range, offset))
    ?.statements.find(({ range }) => holds(range, offset));
  if (statement === undefined) return undefined;
  if (holds(statement.keyword, offset)) return { card: keywordCard(statement.kind), range: statement.keyword };
  const index = structureAt(result, offset);
  const owner = index === undefined ? undefined : result.structures[index];
  const card = owner && cardOfStatement(result, statement, owner, drawings);
  return card && { card, range: statement.range };
}

/** Statements whose words, names left out, tell of one thing. */
function cardOfStatement(
  result: NoteResult,
  statement: Statement,
  owner: StructureResult,
  drawings: Theme | undefined,
): Card | undefined {
  switch (statement.kind) {
    case 'load': {
      const { range } = statement;
      return loadCard(owner, owner.structure?.loads.filter(load => holds(range, load.range.start)) ?? []);
    }
    case 'support':
    case 'hinge':
    case 'connection':
    case 'release':
      return pointCard(owner, indexOf(owner.structure?.points, statement.point.text));
    case 'member':
    case 'bar':
      return memberCard(result, owner, indexOf(owner.structure?.members, statement.name.text), drawings);
    case 'find':
    case 'require': {
      const answer = result.answers.find(({ range }) => range.start === statement.range.start);
      return answer && resultCard(answer, owner.display);
    }
    case 'let': {
      const value = result.values.find(({ range }) => range.start === statement.range.start);
      return value && valueCard(value);
    }
    default:
      return undefined;
  }
}

function indexOf(named: readonly { readonly name: string }[] | undefined, name: string): number {
  return named?.findIndex(one => one.name === name) ?? -1;
}
