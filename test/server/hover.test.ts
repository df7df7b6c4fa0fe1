// Hovers on a cantilever of 2 m, EI = 1 MN m², 1.5 kN at its tip: δ = P L³ / 3EI = 4 mm, θ = P L² / 2EI = 3 mrad,
// M = P L = 3 kN m with tension above; and on a beam of 6 m with 2 kN/m: δ = 5 w L⁴ / 384 EI = 33.75 mm at mid-span.
import { describe, expect, test } from 'vitest';
import { fenced, hoverLines } from './open.ts';

const CANTILEVER = `section Arm: EI 1 MN m2
member R1, Arm: A -- 2 m -- B
support A: fixed
load sign: 1.5 kN down at B
find tip: deflection at B
require root: moment at A in R1 <= 4 kN m "brief"
let half = 1.5 kN / 2`;

const cantilever = (words: string, marked: string): string => fenced(CANTILEVER.replace(words, marked));

describe('on a member', () => {
  test('the largest movement with place and span ratio, end moments and force', () => {
    const lines = hoverLines(cantilever('member R1', 'member R¦1'));
    expect(lines[0]).toMatch(/^R1 member, .*2\.000 m$/);
    expect(lines.slice(1)).toEqual([
      'Largest movement: 4.000 mm down, at B, span/500',
      'Ends move: at B 4.000 mm down',
      'Largest moment: 3.000 kN m, tension above, at A',
      'Moment: at A 3.000 kN m, tension above; at B 0 kN m',
      'Force: 0 kN',
    ]);
  });

  test('the combination that governs is named where there was a choice', () => {
    const text = `section P: EI 1 MN m2
member B1, P: A -- 6 m -- B
support A: pinned
support B: roller
load dead: 1 kN/m down on B1
load snow: 1 kN/m down on B1
combine light: dead
combine heavy: dead + snow
find most: moment in B¦1 under heavy`;
    const lines = hoverLines(fenced(text));
    expect(lines).toContain('Largest movement: 33.75 mm down, 3.000 m from A, span/177');
    expect(lines).toContain('Under: heavy: dead + snow');
  });

  test('a combination under which the note asks for no movement does not count where it asks for others', () => {
    const text = `section P: EI 1 MN m2
member B1, P: A -- 6 m -- B
support A: pinned
support B: roller
load dead: 2 kN/m down on B1
combine service: dead
combine strength: 1.35 dead
find mid: deflection of B¦1 under service
find most: moment in B1 under strength`;
    expect(hoverLines(fenced(text)).slice(1, 3)).toEqual([
      'Under: service: dead',
      'Largest movement: 33.75 mm down, 3.000 m from A, span/177',
    ]);
  });

  test('a drawing travels inside the hover, for an editor that shows Markdown', () => {
    const marked = cantilever('member R1', 'member R¦1');
    const [light, dark] = (['light', 'dark'] as const).map(
      drawings => hoverLines(marked, { format: 'markdown', drawings }).at(-1) ?? '',
    );
    expect(light).toMatch(/^!\[.+\]\(data:image\/svg\+xml;base64,[A-Za-z0-9+/=]+\)$/);
    expect(dark).not.toBe(light);
    expect(hoverLines(marked, { format: 'markdown', drawings: undefined }).join('')).not.toContain('data:');
  });

  test('of a structure that nothing holds: why there is no figure', () => {
    const lines = hoverLines(
      fenced('section P: EI 1 MN m2\nmember B¦1, P: A -- 6 m -- B\nload dead: 1 kN/m down on B1'),
    );
    expect(lines[1]).toMatch(/^Movement: ./);
    expect(lines.join()).not.toMatch(/NaN|undefined|Infinity/);
  });
});

describe('on a point and a support', () => {
  test('the reaction in every direction', () => {
    const lines = hoverLines(cantilever('support A', 'support ¦A'));
    expect(lines[0]).toBe('A point at 0 m, 0 m');
    expect(lines.at(-1)).toBe('Reaction, sign: 1.500 kN up, 3.000 kN m anticlockwise');
  });

  test('the movement of a free point', () => {
    const lines = hoverLines(cantilever('down at B', 'down at B¦'));
    expect(lines).toEqual(['B point at 2.000 m, 0 m', 'Movement, sign: 4.000 mm down, 0.003000 rad clockwise']);
  });
});

describe('on a load', () => {
  const beam = (load: string): string =>
    fenced(`section P: A 10 cm2, EI 1 MN m2, E 200 GPa
member B1, P: A -- 3 m right, 4 m up -- B
support A: pinned
support B: roller
load dead: ${load}`);

  test('a force', () => {
    expect(hoverLines(cantilever('1.5 kN down', '1.¦5 kN down'))).toEqual([
      'sign load, unfactored',
      'Resultant: 1.500 kN down',
    ]);
  });

  test('a line load along an inclined member of 5 m', () => {
    expect(hoverLines(beam('2 ¦kN/m down on B1'))[1]).toBe('Resultant: 10.00 kN down');
  });

  test('on plan, it counts the 3 m of its run', () => {
    expect(hoverLines(beam('2 ¦kN/m down on plan B1'))[1]).toBe('Resultant: 6.000 kN down');
  });

  test('square to it, downwards: 10 kN at right angles to a slope of 3 in 4', () => {
    expect(hoverLines(beam('2 ¦kN/m square down on B1'))[1]).toBe('Resultant: 6.000 kN down, 8.000 kN to the right');
  });

  test('varying, over a part: the mean of 1 and 3 kN/m over 2 m', () => {
    expect(hoverLines(beam('1 ¦kN/m to 3 kN/m right on B1 from 1 m to 3 m'))[1]).toBe(
      'Resultant: 4.000 kN to the right',
    );
  });

  test('a couple', () => {
    expect(hoverLines(beam('6 kN ¦m clockwise at B'))[1]).toBe('Resultant: 6.000 kN m clockwise');
  });

  test('heat and lack of fit have no resultant', () => {
    const frame = (load: string): string => beam(load).replace('A 10 cm2', 'A 10 cm2, alpha 12e-6 /K, depth 0.2 m');
    expect(hoverLines(frame('heat B1 ¦by 25 K'))[1]).toBe('Resultant: none; heated 25 K');
    expect(hoverLines(frame('heat B1 by 30 K ¦above, 5 K below'))[1]).toBe(
      'Resultant: none; heated 30 K above, 5 K below',
    );
    expect(hoverLines(frame('shorten B1 ¦by 3 mm'))[1]).toBe('Resultant: none; 3 mm too short');
  });

  test('a case: all its loads', () => {
    const lines = hoverLines(fenced(`${CANTILEVER}\nload sign: 0.5 kN right at B\nfind drift: sway at B under si¦gn`));
    expect(lines).toEqual(['sign case, unfactored', 'Resultant: 1.500 kN down, 0.5000 kN to the right']);
  });
});

describe('on a result and a value', () => {
  test('value, limit, use and every digit', () => {
    const lines = hoverLines(cantilever('require root', 'require ro¦ot'));
    expect(lines[0]).toMatch(/^root moment at A in R1/);
    expect(lines).toContain('Limit: at most 4 kN m (brief)');
    expect(lines).toContain('State: met, use 0.750');
    expect(lines).toContain('All digits: -3000 N m');
  });

  test('a value', () => {
    expect(hoverLines(cantilever('let half', 'let ha¦lf'))).toEqual([
      'half value',
      'Value: 0.7500 kN',
      'All digits: 750 N',
    ]);
  });

  test('a value in the prose', () => {
    const lines = hoverLines(`${fenced(CANTILEVER)}\nThe tip moves \`tautline ti¦p\`.`);
    expect(lines).toEqual(['tip value in the text', 'Value: 4.000 mm down', 'All digits: 0.004 m']);
  });
});

describe('elsewhere', () => {
  test('a keyword says what the statement is for', () => {
    expect(hoverLines(cantilever('support A', 'sup¦port A'))[0]).toMatch(/^support ./);
  });

  test('nothing in the prose', () => {
    expect(hoverLines(`One ¦arm.\n\n${fenced(CANTILEVER)}`)).toEqual([]);
  });

  test('words of a note never become markup', () => {
    const text = fenced('structure S "<b>*x*</b> [a](http://b)"\nmember R1: A -- 2 m -- B').replace(
      'structure S',
      'structure ¦S',
    );
    const [line] = hoverLines(text, { format: 'markdown', drawings: undefined });
    expect(line).toContain('\\<b\\>\\*x\\*\\</b\\> \\[a\\](http\\://b)');
  });
});

test('on a point or a joint, how members are attached there', () => {
  const text = `section P: EI 1 MN m2, EA 40 MN
member B1, P: A -- 3 m -- B -- 3 m -- C
support A: fixed
support C: fixed
conn¦ection A in B1: 850 kN m/rad
release B in B1: axial
load dead: 1 kN/m down on B1
find mid: deflection at B`;
  expect(hoverLines(fenced(text.replace('conn¦ection A in', 'connection ¦A in')))).toContain(
    'B1: semi-rigid, 850.0 kN m/rad',
  );
  const at = text.replace('¦', '').replace('release B in', 'release ¦B in');
  expect(hoverLines(fenced(at))).toContain('B1: free along its axis');
});
