// Patterned loads: each is divided at the ends of its member's spans, and what stands on one span becomes a case of its
// own behind the whole ones. Which of them act is found for each result.
import { spansAlong } from './spans.ts';
import type { Load, LoadCase, Structure } from './structure.ts';

type LineLoad = Extract<Load, { kind: 'line' }>;

/** The structure with its patterned loads divided; the spans of one case share theirs, whatever statement they come from. */
export function dividePatterns(structure: Structure): Structure {
  if (!structure.loads.some(isPatterned)) return structure;
  const cases = [...structure.cases];
  const known = new Map<string, number>();
  const loads: Load[] = [];
  for (const load of structure.loads) {
    if (!isPatterned(load)) {
      loads.push(load);
      continue;
    }
    const { patterned: _patterned, ...plain } = load;
    const member = structure.members[load.member]!;
    for (const { start, end, from, to } of spansAlong(structure, member)) {
      const part = within(plain, start, end, 1e-9 * member.length);
      if (part === undefined) continue;
      const key = `${load.case} ${load.member} ${start}`;
      const { name } = structure.cases[load.case]!;
      const index = known.get(key) ?? cases.push({ name, span: { of: load.case, name: `${from}–${to}` } }) - 1;
      known.set(key, index);
      loads.push({ ...part, case: index });
    }
  }
  return { ...structure, cases, loads };
}

/** The case that a case belongs to: itself, or the one whose span it stands for. */
export function wholeCase(cases: readonly LoadCase[], index: number): number {
  return cases[index]?.span?.of ?? index;
}

/** The cases that take part with a factor and may be left out: the spans of patterned loads. */
export function spansUnder(cases: readonly LoadCase[], factors: readonly number[]): number[] {
  return cases.flatMap(({ span }, k) => (span !== undefined && factors[k] !== 0 ? [k] : []));
}

/** `live on A–B, C–D` for each patterned case among these cases (indices), of which some spans are loaded. */
export function loadedInWords(
  cases: readonly LoadCase[],
  spans: readonly number[],
  isLoaded: (index: number) => boolean,
): string[] {
  const byCase = new Map<string, string[]>();
  for (const index of spans) {
    const { name, span } = cases[index]!;
    const loaded = byCase.get(name) ?? [];
    byCase.set(name, loaded);
    if (isLoaded(index)) loaded.push(span!.name);
  }
  return [...byCase].map(([name, loaded]) => `${name} on ${loaded.join(', ') || 'no span'}`);
}

function isPatterned(load: Load): load is LineLoad & { readonly patterned: true } {
  return load.kind === 'line' && load.patterned === true;
}

/** What of a load stands on a stretch; undefined for nothing, or no more than rounding. */
function within(load: LineLoad, start: number, end: number, slack: number): LineLoad | undefined {
  const [from, to] = [Math.max(load.start, start), Math.min(load.end, end)];
  if (to - from <= slack) return undefined;
  const slope = (load.endIntensity - load.startIntensity) / (load.end - load.start);
  const intensityAt = (distance: number): number =>
    distance === load.end ? load.endIntensity : load.startIntensity + slope * (distance - load.start);
  return { ...load, start: from, end: to, startIntensity: intensityAt(from), endIntensity: intensityAt(to) };
}
