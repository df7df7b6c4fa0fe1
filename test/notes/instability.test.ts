// What a note says of a structure that is not held: the mechanism in words, what is missing, and what mends it.
import { describe, expect, it } from 'vitest';
import { checkAnswers, codesOf, evaluated, fenced, solved } from './check-note.ts';

const SECTION = 'section S: EI 10 MN m2\n';
const RODS = 'material M: E 200 GPa\nsection Rod: A 5 cm2, M\n';

/** The only diagnostic of a note. */
function told(body: string) {
  const text = fenced(body);
  const { diagnostics } = evaluated(text);
  expect(diagnostics.map(({ code }) => code)).toEqual(['unstable-structure']);
  const [only] = diagnostics;
  return { ...only!, text, related: (only!.related ?? []).map(({ message }) => message) };
}

/** The note with the fix made. */
function mended({ text, fix }: ReturnType<typeof told>): string {
  const [edit] = fix!.edits;
  return text.slice(0, edit!.range.start) + edit!.text + text.slice(edit!.range.end);
}

const PORTAL = `${SECTION}
member C1: A -- 3 m up -- B
member B1: B -- 5 m -- C
member C2: C -- 3 m down -- D
load push: 1 kN right at B
load push: 4 kN/m down on B1
find drift: sway at B
`;

describe('a structure that is not held says', () => {
  it('that all its supports roll', () => {
    const found = told(`${PORTAL}support A: roller\nsupport D: roller`);
    expect(found.message).toBe(
      'Nothing holds this structure sideways: A and D both roll. A, B, C and D can move to the right together. One restraint is missing.',
    );
    expect(found.hint).toMatch(/^make A pinned, make D pinned, or /);
    expect(found.related).toContain('The roller at D lets it move.');
    expect(found.fix?.title).toBe('Make A pinned');
    expect(codesOf(solved(mended(found).replace(/```.*/g, '')))).toEqual([]);
  });

  it('which panel has no brace', () => {
    const found = told(`${PORTAL}hinge B\nhinge C\nsupport A: pinned\nsupport D: pinned`);
    expect(found.message).toBe(
      'B and C can move to the right together: nothing braces the panel B–A–D–C. One restraint is missing.',
    );
    expect(found.hint).toBe('make A fixed, take out the hinge at B, or brace B–D with a bar');
    expect(found.related).toContain('The hinge at C lets it turn.');
    expect(evaluated(mended(found)).diagnostics).toEqual([]);
  });

  it('that hinges stand in one line, and takes one out by a fix', () => {
    const found = told(`${SECTION}
member R1: A -- 3 m -- B -- 3 m -- C
hinge A
hinge B
hinge C
support A: fixed
support C: fixed
load live: 1 kN down at B
find drop: deflection at B`);
    expect(found.message).toContain('B can move up: A, B and C stand in one line and turn freely there');
    expect(found.fix?.title).toBe('Take out the hinge at A');
    expect(evaluated(mended(found)).diagnostics).toEqual([]);
  });

  it('that a straight chain of bars resists only once it has moved', () => {
    const found = told(`${RODS}
bars t: A -- 3 m -- B -- 3 m -- C
support A: pinned
support C: pinned
load hang: 1 kN down at B
find drop: deflection at B`);
    expect(found.message).toBe(
      'B can move up: A, B and C stand in one line and turn freely there, so that nothing holds B across it until it has moved. One restraint is missing.',
    );
    expect(found.hint).toBe('write support B: roller');
    expect(found.fix).toBeUndefined();
  });

  it('that all reactions pass through one point', () => {
    const found = told(`${SECTION}
member R1: A -- 2 m -- B -- 2 m -- C
support A: roller on 45 deg
support B: roller
support C: roller on -45 deg
load push: 1 kN right at B
find drift: sway at B`);
    expect(found.message).toContain(
      'Nothing stops this structure from turning about a place at 2 m, -2 m: the reactions at A, B and C all pass through it.',
    );
    expect(evaluated(mended(found)).diagnostics).toEqual([]);
  });

  it('that it has no support at all, and how many restraints are missing', () => {
    const found = told(`${SECTION}
member R1: A -- 3 m -- B
load live: 1 kN down at B
find drop: deflection at B`);
    expect(found.message).toBe('Nothing holds this structure: it has no support. 3 restraints are missing.');
    expect(found.hint).toContain('write support A: pinned and support B: roller');
  });

  it('that it turns about its only support', () => {
    const found = told(`${SECTION}
member R1: A -- 3 m -- B
support A: pinned
load live: 1 kN down at B
find drop: deflection at B`);
    expect(found.message).toBe(
      'Nothing stops this structure from turning about A, its only support: B can move up. One restraint is missing.',
    );
    expect(evaluated(mended(found)).diagnostics).toEqual([]);
  });
});

describe('a structure that is hardly held', () => {
  const bars = (angle: string) =>
    `${RODS}
bars t: A -- 3 m at 30 deg -- B -- 4 m at ${angle} deg -- C
support A: pinned
support C: pinned
load hang: 1 mN down at B
find pull: tension in t`.replace('1 mN', '0.001 N');

  it('is answered with a warning where the checks bear the answer out', () => {
    const note = solved(bars('30.0001'));
    expect(codesOf(note)).toContain('nearly-unstable');
    const found = note.diagnostics.find(({ code }) => code === 'nearly-unstable')!;
    expect(found.severity).toBe('warning');
    expect(found.message).toContain('It hardly resists that B moves');
    expect(note.structures[0]!.stable).toBe(true);
  });

  it('is refused where too few digits are left', () => {
    const note = solved(bars('30.000001'));
    expect(codesOf(note)).toEqual(['nearly-unstable']);
    expect(note.diagnostics[0]!.severity).toBe('error');
    checkAnswers(note, { pull: { value: null } });
  });
});
