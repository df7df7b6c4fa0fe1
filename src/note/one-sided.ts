// Supports that bear only, members that pull or bear only: assumptions of the writer that every alternative is tested for.
// What would reverse such a force answers for a structure that is not there, and is withheld.
import { combine, measure, worstPatterns } from '../mechanics/index.ts';
import type { AlternativeModel } from '../model/combinations.ts';
import { loadedInWords, spansUnder } from '../model/patterns.ts';
import type { ResolvedMeasure, Seek } from '../model/question.ts';
import type { Report } from '../model/report.ts';
import type { Structure } from '../model/structure.ts';
import { FORCE } from '../quantity/dimension.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import type { Range } from '../quantity/range.ts';
import { show } from './phrases.ts';
import type { Solved } from './solved.ts';

/** A force that would have to act the other way than it is assumed to. */
export interface Reversal {
  readonly name: string;
  readonly kind: 'support bears' | 'member pulls' | 'member bears';
  /** N, its size. */
  readonly force: number;
  /** The alternative that reverses it most, with the spans loaded. */
  readonly under: string;
  /** Where the support or the member is named. */
  readonly range: Range;
}

/** For each support or member whose force some alternative reverses, the largest that it would have to bear. */
export function reversalsUnder(
  solved: Solved,
  structure: Structure,
  alternatives: readonly AlternativeModel[],
): Reversal[] {
  return assumptionsOf(structure).flatMap(assumption => {
    let worst: Reversal | undefined;
    for (const alternative of alternatives) {
      const found = mostReversed(solved, structure, alternative, assumption);
      if (found !== undefined && found.force > (worst?.force ?? 0)) worst = found;
    }
    return worst ?? [];
  });
}

/** `H would have to pull with 1.250 kN under uplift: dead + wind, and it bears only.` */
export function reversalInWords({ name, kind, force, under }: Reversal, units: DisplayUnits): string {
  const size = show({ value: force, dimension: FORCE }, units, 'force');
  const what = {
    'support bears': `${name} would have to hold with ${size} under ${under}, and it bears only`,
    'member pulls': `${name} would be in compression, ${size}, under ${under}, and it pulls only`,
    'member bears': `${name} would be in tension, ${size}, under ${under}, and it bears only`,
  };
  return what[kind];
}

/** At each support or member, the worst of the alternatives that anyone reads. */
export function warnOfReversals(reversals: readonly Reversal[], units: DisplayUnits, report: Report): void {
  for (const reversal of reversals) {
    const { kind, range } = reversal;
    report.warn('force-reversed', range, `${reversalInWords(reversal, units)}.`, {
      hint:
        kind === 'support bears'
          ? 'hold it down, or write the structure without this support for what lifts it'
          : 'make it stiff against both, or write the structure without it for what reverses it',
    });
  }
}

/** What is assumed never to be below zero: a measure, times a factor. */
interface Assumption {
  readonly name: string;
  readonly kind: Reversal['kind'];
  readonly range: Range;
  readonly asked: ResolvedMeasure;
  readonly seek: Seek;
  readonly factor: number;
}

function assumptionsOf({ supports, members, points }: Structure): Assumption[] {
  const bearing = supports.flatMap(({ point, bears, range }, support): Assumption[] => {
    if (bears === undefined) return [];
    // The push has one direction, so that its larger component tells all of it.
    const isUpright = Math.abs(bears.y) >= Math.abs(bears.x);
    const asked = { kind: 'reaction', support, component: isUpright ? 'vertical' : 'horizontal' } as const;
    const factor = 1 / (isUpright ? bears.y : bears.x);
    const { name } = points[point]!;
    return [{ name, kind: 'support bears', range, asked, seek: factor > 0 ? 'least' : 'greatest', factor }];
  });
  const oneSided = members.flatMap(({ name, only, range }, member): Assumption[] => {
    if (only === undefined) return [];
    const common = { name, range, asked: { kind: 'force', along: [member] } } as const;
    return only === 'pulls'
      ? [{ ...common, kind: 'member pulls', seek: 'least', factor: 1 }]
      : [{ ...common, kind: 'member bears', seek: 'greatest', factor: -1 }];
  });
  return [...bearing, ...oneSided];
}

function mostReversed(
  solved: Solved,
  structure: Structure,
  { text, factors }: AlternativeModel,
  { name, kind, range, asked, seek, factor }: Assumption,
): Reversal | undefined {
  const { analysis } = solved;
  const spans = spansUnder(structure.cases, factors);
  let worst: Reversal | undefined;
  for (const set of spans.length === 0 ? [factors] : worstPatterns(analysis, factors, asked)) {
    const solution = set === factors ? solved.solution(factors) : combine(analysis, set);
    const force = -factor * measure(analysis.structure, solution, asked, seek).value;
    if (force <= (worst?.force ?? 0)) continue;
    const under = [text, ...loadedInWords(structure.cases, spans, k => set[k] !== 0)].join(', ');
    worst = { name, kind, range, force, under };
  }
  return worst;
}
