import { describe, expect, test } from 'vitest';
import { readSource } from '../../src/note/fences.ts';
import { readFrontMatter } from '../../src/note/front-matter.ts';

/** The lines of every fence as [text, the text at its place in the source]; they must agree. */
function lines(text: string): string[] {
  const source = readSource(text, readFrontMatter(text).length);
  return source.fences.flatMap(fence =>
    fence.lines.map(line => {
      expect(text.slice(line.start, line.start + line.text.length)).toBe(line.text);
      return line.text;
    }),
  );
}

describe('fences', () => {
  test('plain, with tildes, longer, with more words in the info string', () => {
    expect(lines('```tautline\na\nb\n```\n')).toEqual(['a', 'b']);
    expect(lines('~~~ tautline\na\n~~~\n')).toEqual(['a']);
    expect(lines('````tautline x\n```\na\n````\n')).toEqual(['```', 'a']);
  });
  test('in a list, a quote, a quote in a list', () => {
    expect(lines('- item\n\n  ```tautline\n  a\n    b\n  ```\n')).toEqual(['a', '  b']);
    expect(lines('> ```tautline\n> a\n>   b\n> ```\n')).toEqual(['a', '  b']);
    expect(lines('1. x\n   > ```tautline\n   > a\n   > ```\n')).toEqual(['a']);
  });
  test('CRLF, CR only, a byte order mark, tabs', () => {
    expect(lines('```tautline\r\na\r\nb\r\n```\r\n')).toEqual(['a', 'b']);
    expect(lines('```tautline\ra\rb\r```\r')).toEqual(['a', 'b']);
    expect(lines('\uFEFF```tautline\na\n```\n')).toEqual(['a']);
    expect(lines('```tautline\na\n\tb\n```\n')).toEqual(['a', '\tb']);
    expect(lines('- x\n\n\t```tautline\n\ta\n\t```\n')).toEqual(['a']);
  });
  test('not closed, empty, inside another fence, in an indented block', () => {
    expect(lines('```tautline\na')).toEqual(['a']);
    expect(lines('```tautline\n```\n')).toEqual([]);
    expect(lines('````md\n```tautline\na\n```\n````\n')).toEqual([]);
    expect(lines('text\n\n    ```tautline\n    a\n    ```\n')).toEqual([]);
    expect(readSource('```tautlines\na\n```\n', 0).fences).toEqual([]);
  });
  test('behind front matter, counted in lines of the whole text', () => {
    const text = '---\ntitle: T\n---\n\n```tautline\na\n```\n';
    const { length, values } = readFrontMatter(text);
    expect(values).toEqual({ title: 'T' });
    const [fence] = readSource(text, length).fences;
    expect([fence!.firstLine, fence!.lastLine]).toEqual([4, 6]);
    expect(text.slice(fence!.range.start, fence!.range.end)).toBe('```tautline\na\n```');
  });
});

describe('values in prose', () => {
  function spans(text: string): string[] {
    const { spans } = readSource(`${text}\n\n\`\`\`tautline\n\`\`\`\n`, 0);
    return spans.map(span => {
      expect(text.slice(span.start, span.start + span.text.length)).toBe(span.text);
      return span.text;
    });
  }
  test('code spans whose first word is tautline', () => {
    expect(spans('tip `tautline tip`, ratio ``tautline tip / 2``, `tautline`, `tautlines x`')).toEqual([
      'tip',
      'tip / 2',
    ]);
  });
  test('not in code blocks, nor behind an escaped backtick', () => {
    expect(spans('\\`tautline a\\` and `tautline b`')).toEqual(['b']);
  });
  test('in lists, quotes and tables', () => {
    expect(spans('> - see `tautline a`\n')).toEqual(['a']);
    expect(spans('| a | b |\n|---|---|\n| `tautline a` | `tautline b` |')).toEqual(['a', 'b']);
  });
});
