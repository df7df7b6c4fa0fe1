import { expect, test } from 'vitest';
import { evaluateNote } from '../../src/note/evaluate.ts';

function answers(...lines: string[]) {
  const result = evaluateNote(`\`\`\`tautline\n${lines.join('\n')}\n\`\`\`\n`, { path: 'note.md' });
  expect(result.diagnostics.filter(({ severity }) => severity === 'error')).toEqual([]);
  return result.answers;
}

test('the largest rotation just behind a hinge is held against the second road on that side', () => {
  // B–H is a cantilever of 3 m with 3 kN at its end: PL²/2EI; A–H turns as a rigid body with its end.
  const [turn] = answers(
    'section S: EI 10 MN m2',
    'member R: A -- 4 m -- H -- 3 m -- B',
    'hinge H',
    'support A: roller',
    'support B: fixed',
    'load q: 3 kN down at H',
    'find turn: rotation of R',
  );
  expect(turn!.quantity!.value).toBeCloseTo((3e3 * 9) / (2 * 10e6), 14);
  expect(turn!.check!.difference).toBeLessThan(1e-9);
});

test('what is nothing but rounding is told as nothing', () => {
  // A load straight down an axially stiff post moves nothing.
  const [sway, turn] = answers(
    'section S: EI 10 MN m2',
    'member P: A -- 3.3 m up -- B',
    'support A: fixed',
    'load q: 0.7 kN/m along P towards A',
    'find drift: sway at B',
    'find turn: rotation at B',
  );
  expect(sway!.quantity!.value).toBe(0);
  expect(turn!.quantity!.value).toBe(0);
  expect(turn!.display).toBe('0 rad');
});

test('a reaction that is nothing does not fail a limit of nothing', () => {
  const [seat] = answers(
    'section S: EI 10 MN m2',
    'member R: A -- 1/3 * 1 m -- B -- 0.7 m -- C',
    'support A: pinned',
    'support B: roller',
    'load q: 0.1 kN down at B',
    'require seat: reaction at A >= 0 kN "brief"',
  );
  expect(seat!.status).toBe('ok');
});

test('a limit spells its span out where it stands', () => {
  const [mid] = answers(
    'section S: EI 10 MN m2',
    'member R: A -- 5 m -- B',
    'support A: pinned',
    'support B: roller',
    'load q: 1 kN/m down on R',
    'require mid: deflection of R <= min(span/200, 30 mm) "brief"',
  );
  expect(mid!.limitDisplay).toBe('min(span A–B 5.000 m / 200, 30 mm) = 25.00 mm');
});
