// Every statement of the language, by its keyword. A new statement is one more line here.

import type { StatementKind } from '../syntax.ts';
import { CARRY } from './carry.ts';
import { COMBINE } from './combine.ts';
import type { StatementForm } from './form.ts';
import { LET } from './let.ts';
import { LOAD } from './load.ts';
import { BAR, BARS, GROUP, MEMBER } from './member.ts';
import { CONNECTION, HINGE, POINT, RELEASE } from './point.ts';
import { FIND, REQUIRE } from './question.ts';
import { MATERIAL, SECTION } from './section.ts';
import { ASSUME, DISPLAY } from './settings.ts';
import { SHOW } from './show.ts';
import { CASE, STRUCTURE, USE } from './structure.ts';
import { SUPPORT } from './support.ts';

export const STATEMENTS: Readonly<Record<StatementKind, StatementForm>> = {
  structure: STRUCTURE,
  use: USE,
  let: LET,
  material: MATERIAL,
  section: SECTION,
  member: MEMBER,
  bar: BAR,
  bars: BARS,
  group: GROUP,
  point: POINT,
  hinge: HINGE,
  connection: CONNECTION,
  release: RELEASE,
  support: SUPPORT,
  case: CASE,
  load: LOAD,
  carry: CARRY,
  combine: COMBINE,
  find: FIND,
  require: REQUIRE,
  display: DISPLAY,
  assume: ASSUME,
  show: SHOW,
};

export function isStatementKind(word: string): word is StatementKind {
  return Object.hasOwn(STATEMENTS, word);
}
