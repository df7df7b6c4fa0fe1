// What an experienced checker would doubt in results that are right as far as the theory goes: movements that are not
// small, struts past their critical force, uplift that nobody asks about, members that carry nothing, weight of nothing.
import {
  type Analysis,
  doubtsOf,
  idleMembers,
  type LargeMovement,
  type SlenderCompression,
  type Stretch,
  sizesOf,
  worstPatterns,
} from '../mechanics/index.ts';
import type { AlternativeModel } from '../model/combinations.ts';
import { operandsOf } from '../model/operands.ts';
import { loadedInWords, spansUnder } from '../model/patterns.ts';
import type { ResolvedMeasure } from '../model/question.ts';
import type { Report } from '../model/report.ts';
import type { Scope } from '../model/scope.ts';
import type { Structure } from '../model/structure.ts';
import { FORCE, LENGTH } from '../quantity/dimension.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { list } from './mechanism-words.ts';
import { show } from './phrases.ts';
import type { Solved } from './solved.ts';
import type { StructureState } from './structure-state.ts';

/** Only of a structure that is solved, and of nothing that could not be read. */
export function doubtsOn(state: StructureState, units: DisplayUnits): void {
  const structure = state.structure();
  const solved = state.solved();
  if (structure === undefined || solved === undefined || state.withheld !== undefined) return;
  const doubts: Doubts = {
    structure,
    solved,
    alternatives: lookedAt(state, solved),
    combined: state.combinations().some(({ kind }) => kind === 'combination'),
    units,
    report: state.report,
  };
  notSmall(doubts);
  pastCritical(doubts);
  unaskedUplift(doubts, state.scope);
  withoutForce(doubts);
  withoutWeight(doubts);
}

interface Doubts {
  readonly structure: Structure;
  readonly solved: Solved;
  readonly alternatives: readonly Looked[];
  /** Whether these are of combinations, not of cases alone. */
  readonly combined: boolean;
  readonly units: DisplayUnits;
  readonly report: Report;
}

/** What is looked at: an alternative, of patterned loads with one of the sets of spans that may be the worst. */
interface Looked {
  /** `strength (b)`, `live on A–B, C–D` behind it. */
  readonly name: string;
  readonly factors: readonly number[];
}

/** Pieces of field, over all alternatives, that are looked through unasked. */
const MOST_PIECES = 20_000;

/**
 * The alternatives of all combinations, or the cases alone where there is no combination. Where these are too many to be
 * solved unasked, those that some question has had solved.
 */
function lookedAt(state: StructureState, solved: Solved): readonly Looked[] {
  const all = state.combinations();
  const combined = all.filter(({ kind }) => kind === 'combination');
  const { flawedCases } = state.report;
  const alternatives = (combined.length > 0 ? combined : all)
    .flatMap(combination => combination.alternatives)
    .filter(({ cases }) => !cases.some(name => flawedCases.has(name)));
  const pieces = (solved.analysis.cases[0]?.members ?? []).reduce((sum, field) => sum + field.pieces.length, 0);
  const looked = alternatives.flatMap(alternative => withPatterns(alternative, solved.analysis));
  if (pieces * looked.length <= MOST_PIECES) return looked;
  return looked.filter(({ factors }) => solved.isSolved(factors));
}

/** The sets of spans that are the worst for some reaction, some compression or some movement out of line. */
function withPatterns(alternative: AlternativeModel, analysis: Analysis): readonly Looked[] {
  const { structure } = analysis;
  const { factors } = alternative;
  const name = nameOf(alternative);
  const spans = spansUnder(structure.cases, factors);
  if (spans.length === 0) return [{ name, factors }];
  const measures: ResolvedMeasure[] = [
    ...structure.supports.map((_, support) => ({ kind: 'reaction', support, component: 'vertical' }) as const),
    ...structure.members.flatMap((_, member) => [
      { kind: 'compression', along: [member] } as const,
      { kind: 'sag', along: [member], reversed: false } as const,
    ]),
  ];
  const sets = new Map<string, readonly number[]>();
  for (const measure of measures)
    for (const set of worstPatterns(analysis, factors, measure)) sets.set(set.join(' '), set);
  return [...sets.values()].map(set => ({
    name: [name, ...loadedInWords(structure.cases, spans, k => set[k] !== 0)].join(', '),
    factors: set,
  }));
}

/** Small-displacement theory is good to some hundredths for slopes up to this. Common practice. */
const LARGEST_SLOPE = 1 / 50;

function notSmall({ structure, solved, alternatives, units, report }: Doubts): void {
  let worst: (LargeMovement & { readonly under: Looked }) | undefined;
  for (const under of alternatives) {
    const found = doubtsOf(structure, solved.solution(under.factors)).movement;
    if (found !== undefined && found.slope > Math.max(LARGEST_SLOPE, worst?.slope ?? 0)) worst = { ...found, under };
  }
  if (worst === undefined) return;
  const { stretch, movement, under } = worst;
  const member = structure.members[stretch.member]!;
  const moved = show({ value: movement, dimension: LENGTH }, units, 'deflection');
  report.warn(
    'large-movement',
    member.range,
    `${member.name} moves ${moved} across the ${lengthOf(stretch, units)} from ${ends(structure, stretch)} under ${under.name}, more than a fiftieth of it: small-displacement theory is doubtful there.`,
    { hint: 'stiffen it, or look for a load or a stiffness out by a power of ten' },
  );
}

function pastCritical({ structure, solved, alternatives, units, report }: Doubts): void {
  const worst = new Map<number, SlenderCompression & { readonly under: Looked }>();
  for (const under of alternatives) {
    for (const found of doubtsOf(structure, solved.solution(under.factors)).compressions) {
      const known = worst.get(found.stretch.member);
      if (known !== undefined && found.force / found.critical <= known.force / known.critical) continue;
      worst.set(found.stretch.member, { ...found, under });
    }
  }
  const [first, ...others] = [...worst.values()].sort((a, b) => b.force / b.critical - a.force / a.critical);
  if (first === undefined) return;
  const member = structure.members[first.stretch.member]!;
  const force = (value: number) => show({ value, dimension: FORCE }, units, 'force');
  const more = others.length === 0 ? '' : ` So ${others.length === 1 ? 'does' : 'do'} ${namesOf(structure, others)}.`;
  report.warn(
    'slender-compression',
    member.range,
    `${member.name} carries ${force(first.force)} in compression under ${first.under.name}, more than its elastic critical force of ${force(first.critical)} on its own length of ${lengthOf(first.stretch, units)}: these movements are not reliable.${more}`,
    {
      hint: 'give it more I, hold it in between, or let it pull only',
      related: others.map(({ stretch, force: carried, critical }) => ({
        range: structure.members[stretch.member]!.range,
        message: `${structure.members[stretch.member]!.name} carries ${force(carried)}, its critical force is ${force(critical)}.`,
      })),
    },
  );
}

/** Beside the largest reaction or other force, what is less is no uplift that anyone would anchor. */
const LEAST_UPLIFT = 1e-6;

interface Uplift {
  readonly support: number;
  /** N. */
  readonly force: number;
  readonly under: Looked;
}

function unaskedUplift({ structure, solved, alternatives, combined, units, report }: Doubts, scope: Scope): void {
  const asked = supportsAsked(scope);
  const name = (support: number) => structure.points[structure.supports[support]!.point]!.name;
  const worst = new Map<number, Uplift>();
  for (const under of alternatives) {
    const solution = solved.solution(under.factors);
    const least = LEAST_UPLIFT * sizesOf(solution).force;
    for (const [support, { y }] of solution.reactions.entries()) {
      // A fixed foot is anchored anyway; one that is said to bear only is tested for itself.
      const { bears, symbol } = structure.supports[support]!;
      if (bears !== undefined || symbol.kind === 'fixed' || symbol.kind === 'guided') continue;
      if (asked.has(name(support))) continue;
      if (-y <= Math.max(least, worst.get(support)?.force ?? 0)) continue;
      worst.set(support, { support, force: -y, under });
    }
  }
  const [first, ...others] = [...worst.values()].sort((a, b) => b.force - a.force || a.support - b.support);
  if (first === undefined) return;
  const holds = ({ support, force, under }: Uplift) =>
    `${name(support)} must hold down ${show({ value: force, dimension: FORCE }, units, 'force')} under ${under.name}`;
  const more = others.length === 0 ? '' : ` So must ${list(shortened(others.map(({ support }) => name(support))))}.`;
  const message = `${holds(first)}, and no question asks about this reaction.${more}`;
  const { range } = structure.supports[first.support]!;
  const details = {
    hint: `anchor it and ask: find hold: reaction at ${name(first.support)}`,
    related: others.map(one => ({ range: structure.supports[one.support]!.range, message: `${holds(one)}.` })),
  };
  // A case alone is part of a whole, where others may weigh the support down.
  if (combined) report.warn('unasked-uplift', range, message, details);
  else report.hint('unasked-uplift', range, message, details);
}

/** Points whose upright reaction some question asks about. */
function supportsAsked({ statements }: Scope): ReadonlySet<string> {
  const names = new Set<string>();
  for (const statement of statements) {
    if (statement.kind !== 'find' && statement.kind !== 'require') continue;
    for (const operand of operandsOf(statement.what)) {
      if (operand.kind !== 'measure' || operand.measure.kind !== 'reaction') continue;
      const { at, component } = operand.measure;
      if (at?.kind === 'point' && (component ?? 'vertical') === 'vertical') names.add(at.point.text);
    }
  }
  return names;
}

/** A bar without force may brace all the same: a hint; a member without is rather a load forgotten. */
function withoutForce({ structure, solved, report }: Doubts): void {
  const idle = idleMembers(solved.analysis).map(index => structure.members[index]!);
  for (const kind of ['member', 'bar'] as const) {
    const [first, ...others] = idle.filter(member => member.kind === kind);
    if (first === undefined) continue;
    const names = list(shortened([first, ...others].map(({ name }) => name)));
    const message = `${names} ${others.length === 0 ? 'carries' : 'carry'} no load and no force in any case.`;
    const related = others.map(({ name, range }) => ({ range, message: `${name} carries none either.` }));
    if (kind === 'member')
      report.warn('idle-member', first.range, message, { hint: 'load it, or leave it out', related });
    else report.hint('idle-member', first.range, message, { related });
  }
}

function withoutWeight({ structure, report }: Doubts): void {
  for (const load of structure.loads) {
    if (load.kind !== 'self-weight') continue;
    const weightless = new Set(
      load.members.flatMap(member => structure.members[member]!.legs.map(({ section }) => section)),
    );
    const names = [...weightless]
      .map(index => structure.sections[index]!)
      .filter(({ massPerLength }) => massPerLength === 0)
      .map(({ name }) => name);
    if (names.length === 0) continue;
    report.warn(
      'no-weight',
      load.range,
      `${list([...new Set(names)])} ${names.length === 1 ? 'weighs' : 'weigh'} nothing: this self-weight is zero there, as the density is.`,
      { hint: 'give the material its density, or leave the members out: self-weight of …' },
    );
  }
}

// Words

/** `strength (b)` of `strength (b): 1.35 dead + 1.5 wind`. */
function nameOf({ text }: AlternativeModel): string {
  return text.split(':')[0]!.replaceAll('-', '−');
}

function lengthOf({ start, end }: Stretch, units: DisplayUnits): string {
  return show({ value: end - start, dimension: LENGTH }, units, 'length');
}

function ends({ points }: Structure, { from, to }: Stretch): string {
  return `${points[from]!.name} to ${points[to]!.name}`;
}

const MOST_NAMED = 5;

function namesOf({ members }: Structure, found: readonly SlenderCompression[]): string {
  return list(shortened(found.map(({ stretch }) => members[stretch.member]!.name)));
}

function shortened(names: readonly string[]): readonly string[] {
  return names.length <= MOST_NAMED
    ? names
    : [...names.slice(0, MOST_NAMED - 1), `${names.length - MOST_NAMED + 1} more`];
}
