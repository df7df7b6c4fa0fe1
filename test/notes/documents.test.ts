// The reference and the README hold what the program does. `UPDATE=1` writes what is drawn from it anew; the difference
// is then read.
import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { noteText, summaryText } from '../../src/cli/note-text.ts';
import { styleOf } from '../../src/cli/style.ts';
import { CODES } from '../../src/language/codes.ts';
import { parseStatements } from '../../src/language/parse.ts';
import { STATEMENTS } from '../../src/language/statements/table.ts';
import { MEASURES } from '../../src/language/words.ts';
import { toJson } from '../../src/note/report.ts';
import { codesOf, evaluated } from './check-note.ts';

const REFERENCE = join(import.meta.dirname, '../../media/reference.md');
const README = join(import.meta.dirname, '../../README.md');

const TABLES = {
  measures: table(
    ['measure', 'means', 'positive'],
    Object.values(MEASURES).map(({ form, help, positive }) => [codeSpans(form), escaped(help), positive]),
  ),
  statements: table(
    ['statement', 'says'],
    Object.values(STATEMENTS).map(({ grammar, help }) => [codeSpan(grammar), escaped(help)]),
  ),
  codes: table(
    ['code', 'says'],
    Object.entries(CODES).map(([code, help]) => [codeSpan(code), escaped(help)]),
  ),
};

describe('the reference', () => {
  const text = readFileSync(REFERENCE, 'utf8');

  it('draws its tables from the program', () => {
    const drawn = Object.entries(TABLES).reduce((whole, [name, rows]) => withPart(whole, name, rows), text);
    checkDrawn(REFERENCE, text, drawn);
  });

  it('lists forms that are read without complaint', () => {
    const blocks = [...text.matchAll(/^```text\n([\s\S]*?)^```/gm)].map(([, block]) => block!);
    expect(blocks.length).toBeGreaterThan(7);
    for (const block of blocks) {
      const lines = block.trimEnd().split('\n');
      const parsed = parseStatements(lines.map((line, index) => ({ text: line, start: index * 1000 })));
      expect(parsed.diagnostics, block).toEqual([]);
      expect(parsed.statements, block).toHaveLength(lines.length);
    }
  });

  it('is a note whose examples solve themselves', () => {
    const note = toJson(evaluated(text, 'reference.md'));
    expect(note.diagnostics).toEqual([]);
    expect(note.answers.map(({ name, status }) => [name, status])).toEqual([
      ['tip', 'ok'],
      ['mid', 'ok'],
      ['slope', 'none'],
    ]);
    expect(note.prose.every(({ value }) => value !== null)).toBe(true);
  });
});

describe('the README', () => {
  it('shows what its note comes to', () => {
    const text = readFileSync(README, 'utf8');
    const note = /````markdown\n([\s\S]*?)````\n/.exec(text)![1]!;
    expect(note.trimEnd().split('\n').length).toBeLessThanOrEqual(22);
    const result = evaluated(note, 'slip-beam.md');
    expect(result.diagnostics).toEqual([]);
    const plain = styleOf(false);
    const shown = `${noteText(result, 100, plain)}\n${summaryText([result], plain)}`;
    checkDrawn(README, text, withPart(text, 'result', `\`\`\`text\n${shown}\`\`\`\n`));
  });
});

describe('what is not evaluated yet', () => {
  it('is refused by name, as the reference says', () => {
    const text = readFileSync(REFERENCE, 'utf8');
    const section = text.slice(text.indexOf('## What is not evaluated yet'));
    const lines = /```text\n([\s\S]*?)```/.exec(section)![1]!.trimEnd().split('\n');
    for (const line of lines) {
      const note = toJson(evaluated(`\`\`\`tautline\n${FRAME}\n${line}\n\`\`\`\n`));
      expect(codesOf(note), line).toContain('not-evaluated-yet');
    }
  });
});

/** Enough of a structure for every line of that list to mean something. */
const FRAME = `
material S355: E 210 GPa
material GL28: E 12 GPa
section Rod: round 20 mm, S355
section R20: round 20 mm, S355
structure Rafter
member Q1, Rod: A -- 2 m -- B
support A: fixed
load dead: 1 kN down at B
structure Frame
member R1, Rod: A -- 3 m -- B -- 2 m -- D
member P1, Rod: D -- 2 m up -- T
bar d1, Rod: A -- T
point H: 1 m from A on R1
support A: pinned
support B: roller
load dead: 1 kN/m down on R1
find tip: deflection at D under dead`;

/** The text with what stands between a part's marks replaced. */
function withPart(text: string, name: string, part: string): string {
  return text.replace(new RegExp(`(<!-- ${name} -->\n)[\\s\\S]*?(?=<!-- end -->)`), (_, mark) => mark + part);
}

function checkDrawn(path: string, text: string, drawn: string): void {
  if (process.env.UPDATE) writeFileSync(path, drawn);
  else expect(text).toBe(drawn);
}

function table(head: readonly string[], rows: readonly (readonly string[])[]): string {
  const line = (cells: readonly string[]) => `| ${cells.join(' | ')} |\n`;
  return line(head) + line(head.map(() => '---')) + rows.map(line).join('');
}

function codeSpan(text: string): string {
  return `\`${escaped(text)}\``;
}

/** A stroke parts cells, in code too. */
function escaped(text: string): string {
  return text.replaceAll('|', '\\|');
}

function codeSpans(forms: string): string {
  return forms.split(' · ').map(codeSpan).join(' · ');
}
