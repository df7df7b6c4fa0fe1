// What a note comes to. The one immutable result that the server, the page and the command line are faces of; none of
// them computes an answer of its own.
import type { Diagnostic } from '../language/diagnostic.ts';
import type { Statement } from '../language/syntax.ts';
import type { Analysis, Solution } from '../mechanics/solution.ts';
import type { NameEntry } from '../model/names.ts';
import type { ResolvedMeasure } from '../model/question.ts';
import type { Structure } from '../model/structure.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import type { Quantity } from '../quantity/quantity.ts';
import type { Range } from '../quantity/range.ts';

export type { NameEntry, Namespace } from '../model/names.ts';

export interface NoteResult {
  /** As given by the face, with forward slashes; used in messages and in JSON. */
  readonly path: string;
  readonly text: string;
  readonly frontMatter: FrontMatter;
  /** Whether the text holds a fence of ours; without one the rest is empty. */
  readonly isCalculation: boolean;
  /** In the order of the text. */
  readonly fences: readonly Fence[];
  readonly structures: readonly StructureResult[];
  /** Every `find` and `require`, in the order of the text. */
  readonly answers: readonly Answer[];
  /** Every `let`, in the order of the text. */
  readonly values: readonly NamedValue[];
  readonly prose: readonly ProseValue[];
  readonly names: readonly NameEntry[];
  readonly diagnostics: readonly Diagnostic[];
  readonly fingerprint: string;
}

export interface FrontMatter {
  readonly title?: string;
  readonly project?: string;
  readonly number?: string;
  readonly revision?: string;
  readonly status?: string;
}

export interface Fence {
  readonly kind: 'calculation' | 'record' | 'sign';
  /** From the opening marker to the end of the closing one. */
  readonly range: Range;
  /** First and last source line, counted from 0. `firstLine` is the opening marker's. */
  readonly firstLine: number;
  readonly lastLine: number;
  readonly statements: readonly Statement[];
  /** Indices into `structures` of those that this fence says something of, in order. */
  readonly structures: readonly number[];
}

export interface StructureResult {
  /** Undefined where the model could not be built at all. */
  readonly structure: Structure | undefined;
  readonly name: string;
  readonly title?: string;
  /** `structure` line, or the first member. */
  readonly range: Range;
  /** Undefined where nothing could be solved; then diagnostics say why. */
  readonly analysis: Analysis | undefined;
  /** Combinations of the structure and of the note's head that it can use, and its cases alone as well. */
  readonly combinations: readonly Combination[];
  /** Indices into `answers`. */
  readonly answers: readonly number[];
  /** The writer's assumptions, in words, in order. */
  readonly assumptions: readonly string[];
  readonly display: DisplayUnits;
  /** `show:` statements, in order; empty: the default page. */
  readonly shows: readonly Extract<Statement, { readonly kind: 'show' }>[];
  /** Why every answer is withheld (unstable, not evaluated yet …), in one line; undefined when they are not. */
  readonly withheld: string | undefined;
  /** Changes that would hold an unstable structure, each tried, in words, the least first; empty for any other. */
  readonly remedies: readonly string[];
}

/** What may stand behind `under`. A case alone counts as a combination of one alternative. */
export interface Combination {
  readonly name: string;
  readonly kind: 'combination' | 'case';
  readonly alternatives: readonly Alternative[];
}

export interface Alternative {
  /** `b`, `c+`, `+` …; undefined for the only one of its name. */
  readonly label: string | undefined;
  /** As written, blanks normalised: `strength (b): 1.35 dead + 1.5 wind`, `service: dead + snow`, `dead`. */
  readonly text: string;
  /** One factor for each of the structure's cases. */
  readonly factors: readonly number[];
  /** By superposition, made when first asked for. */
  readonly solution: () => Solution;
}

export type AnswerStatus = 'ok' | 'fails' | 'none';

export interface Answer {
  /** Index into `structures`. */
  readonly structure: number;
  readonly name: string;
  readonly kind: 'find' | 'require';
  /** As written, blanks normalised: `sag of R1 between A and B`. */
  readonly measure: string;
  /** As written behind `under` or the one that was meant; null where there is none to say (an expression of results). */
  readonly under: string | null;
  /** The alternative that governs, with the spans of patterned loads that are loaded; null where there is nothing to choose. */
  readonly governing: string | null;
  /** Those spans alone, `live on A–B, C–D`. */
  readonly loaded: string | undefined;
  /** SI; undefined: withheld, and a diagnostic says why. */
  readonly quantity: Quantity | undefined;
  /** Of an SI unit, as JSON shows it: m, rad, N, N m, Pa, or '' for a number. */
  readonly unit: string;
  /** What the page shows, in words: `4.443 mm`, `1.649 mm up`. Empty when withheld. */
  readonly display: string;
  readonly place: AnswerPlace | undefined;
  /** Both sides where the quantity jumps at the place, in words; undefined where it does not. */
  readonly sides: string | undefined;
  /** A single measure with its solution, for drawings and hovers; undefined for an expression. */
  readonly asked: { readonly measure: ResolvedMeasure; readonly alternative: Alternative } | undefined;
  readonly comparison: '<=' | '>=' | undefined;
  readonly limit: Quantity | undefined;
  /** The limit as shown, with the span spelt out: `span A–B 4.800 m / 360 = 13.33 mm`. */
  readonly limitDisplay: string | undefined;
  readonly source: string | undefined;
  readonly utilisation: number | undefined;
  readonly status: AnswerStatus;
  /** By what factor all stiffness must rise to meet an exceeded movement limit; undefined where it does not apply. */
  readonly stiffnessFactor: number | undefined;
  readonly check: Check | undefined;
  /** The whole statement, and the name in it. */
  readonly range: Range;
  readonly nameRange: Range;
}

export interface AnswerPlace {
  readonly member: string;
  /** The member's first point, from which `distance` is measured, m. */
  readonly from: string;
  readonly distance: number;
}

export interface Check {
  /** Relative difference of the two roads; 0 where the answer is no movement. */
  readonly difference: number;
  /** Largest unbalanced force, at a point, on a leg or on the whole, over the loads. */
  readonly residual: number;
  /** Relative difference of the work of loads and ground and that of the internal forces. */
  readonly energy: number;
}

export interface NamedValue {
  /** `w_roof`, `Rafter.k` for a structure's own. */
  readonly name: string;
  readonly quantity: Quantity | undefined;
  readonly unit: string;
  readonly display: string;
  readonly range: Range;
  readonly nameRange: Range;
}

/** An inline code span `tautline EXPRESSION` in the prose. */
export interface ProseValue {
  /** Source line, from 1. */
  readonly line: number;
  /** The expression as written, without the leading word. */
  readonly text: string;
  readonly quantity: Quantity | undefined;
  readonly unit: string;
  readonly display: string;
  /** The whole code span, its backticks included. */
  readonly range: Range;
}
