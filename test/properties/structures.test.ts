// That the random structures are what they are said to be: of all kinds.
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { RUNS, SEED } from './run.ts';
import { structures } from './structures.ts';

const sample = fc.sample(structures(), { seed: SEED, numRuns: RUNS });

test('from one member to forty, of one leg and of many, members and bars', () => {
  const counts = sample.map(({ members }) => members.length);
  expect(Math.min(...counts)).toBe(1);
  expect(Math.max(...counts)).toBeGreaterThan(30);
  expect(Math.max(...counts)).toBeLessThanOrEqual(40);
  const members = sample.flatMap(structure => structure.members);
  expect(members.some(({ legs }) => legs.length > 4)).toBe(true);
  expect(new Set(members.map(({ kind }) => kind))).toEqual(new Set(['member', 'bar']));
  const sections = sample.flatMap(structure => structure.sections);
  expect(sections.some(({ axialStiffness }) => axialStiffness === undefined)).toBe(true);
});

test('held, sprung, askew, hinged', () => {
  const restraints = sample.flatMap(({ supports }) => supports.flatMap(support => support.restraints));
  for (const kind of ['movement', 'rotation']) {
    const own = restraints.filter(({ freedom }) => freedom.kind === kind);
    expect(own.some(({ stiffness }) => stiffness === Infinity)).toBe(true);
    expect(own.some(({ stiffness }) => stiffness < Infinity)).toBe(true);
  }
  expect(restraints.some(({ freedom }) => freedom.kind === 'movement' && freedom.x !== 0 && freedom.y !== 0)).toBe(
    true,
  );
  const hinges = sample.flatMap(structure => structure.hinges);
  expect(hinges.some(({ member }) => member === undefined)).toBe(true);
  expect(hinges.some(({ member }) => member !== undefined)).toBe(true);
});

test('every kind of load', () => {
  const loads = sample.flatMap(structure => structure.loads);
  const kinds = loads.map(load => (load.kind === 'line' ? `line ${load.direction.kind}` : load.kind));
  expect(new Set(kinds)).toEqual(
    new Set([
      'self-weight',
      'line global',
      'line square',
      'line along',
      'force',
      'couple',
      'movement',
      'heat',
      'lengthen',
    ]),
  );
  expect(loads.some(load => load.kind === 'line' && load.direction.kind === 'global' && load.direction.onPlan)).toBe(
    true,
  );
  expect(loads.some(load => load.kind === 'line' && load.startIntensity !== load.endIntensity)).toBe(true);
  expect(loads.some(load => load.kind === 'line' && load.start > 0)).toBe(true);
  expect(loads.some(load => load.kind === 'force' && load.at.kind === 'along')).toBe(true);
  expect(loads.some(load => load.kind === 'movement' && load.freedom.kind === 'rotation')).toBe(true);
});
