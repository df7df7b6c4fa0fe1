// What an answer is made of: the question with its series, and the ways to read and to show that belong to its scope.
import type { Value } from '../language/syntax.ts';
import type { Report } from '../model/report.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import type { Quantity } from '../quantity/quantity.ts';
import type { Range } from '../quantity/range.ts';
import type { Question, Series } from './series.ts';
import type { StructureState } from './structure-state.ts';

export interface AnswerInputs {
  readonly question: Question;
  readonly structureIndex: number;
  readonly state: StructureState;
  readonly series: Series | undefined;
  readonly units: DisplayUnits;
  readonly wordsOf: (range: Range) => string;
  /** Reads the limit; `span` answers for the word in it. */
  readonly limitOf: (value: Value, span: (range: Range) => Quantity | undefined) => Quantity | undefined;
  readonly report: Report;
}
