// The rows of the input schedule for hinges, releases and semi-rigid connections: where, what passes, and the source.
import type { Statement, StatementOf } from '../language/syntax.ts';
import { attachmentsAt } from '../model/joints.ts';
import type { NoteResult, StructureResult } from '../note/result.ts';
import { MOMENT } from '../quantity/dimension.ts';
import { showQuantity } from '../quantity/display.ts';
import { escapeHtml, listed, plainHtml } from './html.ts';

/** Joint, what of it is free or soft, source; as HTML. */
export function jointRows(note: NoteResult, result: StructureResult): readonly (readonly string[])[] {
  return statementsOf(note, result)
    .filter(isJoint)
    .map(statement => {
      const where = [statement.point.text, ...(statement.member === undefined ? [] : ['in', statement.member.text])];
      return [
        escapeHtml(where.join(' ')),
        plainHtml(wordsOf(statement, result)),
        escapeHtml(statement.source?.text ?? 'none given'),
      ];
    });
}

type Joint = StatementOf<'hinge' | 'release' | 'connection'>;

function isJoint(statement: Statement): statement is Joint {
  return statement.kind === 'hinge' || statement.kind === 'release' || statement.kind === 'connection';
}

function wordsOf(statement: Joint, { structure, display }: StructureResult): string {
  switch (statement.kind) {
    case 'hinge':
      return 'hinge, moment freed';
    case 'release': {
      const words = { axial: 'axial force', shear: 'shear', moment: 'moment' };
      return `${listed(statement.freed.map(force => words[force]))} freed`;
    }
    case 'connection': {
      const point = structure?.points.findIndex(({ name }) => name === statement.point.text) ?? -1;
      const member = structure?.members.find(({ name }) => name === statement.member.text);
      const ends = member === undefined ? [] : attachmentsAt(member, point);
      const turning = ends.find(end => end.turning !== undefined)?.turning;
      if (turning === undefined) return 'semi-rigid';
      return `semi-rigid, ${showQuantity({ value: turning, dimension: MOMENT }, display).text}/rad`;
    }
  }
}

/** Statements from the structure's own line to that of the next; of the only one, all. */
function statementsOf(note: NoteResult, result: StructureResult): readonly Statement[] {
  const statements = note.fences.flatMap(fence => fence.statements);
  if (note.structures.length < 2) return statements;
  const start = result.range.start;
  const next = Math.min(...note.structures.map(({ range }) => range.start).filter(other => other > start));
  return statements.filter(({ range }) => range.end > start && range.start < next);
}
