// The public form of results: what the schema says, and what one note comes to in it.
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { Ajv2020 } from 'ajv/dist/2020.js';
import { describe, expect, it } from 'vitest';
import { reportOf, toJson } from '../../src/note/report.ts';
import { evaluated, fenced } from '../notes/check-note.ts';
import { diagnosticAt, RAFTER, resultWith } from './result.ts';

const root = join(import.meta.dirname, '../..');
const schema = JSON.parse(readFileSync(join(root, 'media/result.schema.json'), 'utf8'));
const validate = new Ajv2020({ strict: true, allErrors: true, allowUnionTypes: true }).compile(schema);

function errorsOf(report: unknown): unknown {
  // Through the text, as a program reads it.
  validate(JSON.parse(JSON.stringify(report)));
  return validate.errors ?? [];
}

describe('the schema', () => {
  it('holds for the sample notes and for notes gone wrong', () => {
    const names = ['basis-of-design', 'slip-canopy', 'upper-floor', 'portal-frame', 'jetty-trestle', 'stair-landing'];
    const notes = names.map(name =>
      evaluated(readFileSync(join(root, `media/sample/${name}.md`), 'utf8'), `${name}.md`),
    );
    const wrong = [
      'member B1: A -- 4 m -- B\nfind tip: deflection at B',
      'section S: EI 1 MN m2\nmember B1: A -- 4 m -- B\nsupport A: roller\nload d: 1 kN down at B\nrequire tip: deflection at B <= 1 mm',
      'let a = 1 kN + 1 m\nlet constructor = 2',
      'noise',
      '',
    ].map(body => evaluated(fenced(body)));
    expect(errorsOf(reportOf([...notes, ...wrong, evaluated('# Prose\n'), RAFTER]))).toEqual([]);
  });

  it('refuses what is not in the form', () => {
    expect(errorsOf({ tautline: 2, notes: [] })).not.toEqual([]);
    expect(errorsOf({ tautline: 1, notes: [{ ...toJson(RAFTER), extra: 1 }] })).not.toEqual([]);
  });
});

describe('the public form', () => {
  it('of an answer', () => {
    expect(toJson(RAFTER).answers[1]).toEqual({
      structure: 'Rafter',
      name: 'mid',
      kind: 'require',
      measure: 'sag of R1 between A and B',
      under: 'service',
      governing: 'service (b): dead + 0.7 snow',
      value: -0.001648703049,
      unit: 'm',
      display: '14.443 mm',
      place: null,
      limit: 0.01,
      utilisation: 1.0832,
      status: 'fails',
      check: { difference: 1e-13, residual: 1e-15 },
    });
    expect(toJson(RAFTER).answers[3]).toMatchObject({ kind: 'find', limit: null, utilisation: null, status: 'none' });
  });

  it('of a diagnostic, in lines and columns from 1', () => {
    const text = 'a\r\nbc RSH';
    expect(
      toJson(resultWith({ text, diagnostics: [diagnosticAt(text, 'RSH', { hint: 'did you mean RHS?' })] })).diagnostics,
    ).toEqual([
      {
        code: 'unknown-name',
        severity: 'error',
        message: 'No section named RSH.',
        line: 2,
        column: 4,
        endLine: 2,
        endColumn: 7,
      },
    ]);
  });

  it('of values, by names that an object has anyway', () => {
    const { values } = toJson(evaluated(fenced('let constructor = 3 m')));
    expect(JSON.stringify(values)).toBe('{"constructor":{"value":3,"unit":"m"}}');
  });
});
