import commonmark from 'commonmark-spec';
import markdownIt from 'markdown-it';
import { describe, expect, it } from 'vitest';
import { evaluateNote } from '../../src/note/evaluate.ts';
import { tautlinePlugin } from '../../src/page/index.ts';
import { checkTags } from '../drawing/svg.ts';
import { CANTILEVER, fenced, RAFTER, render, wordsOf } from './notes.ts';

describe('a text without a fence of ours', () => {
  const examples: readonly { readonly markdown: string }[] = commonmark.tests;

  it('is rendered byte for byte as without the plugin: the examples of CommonMark', () => {
    expect(examples.length).toBeGreaterThan(600);
    for (const preset of ['default', 'commonmark'] as const) {
      const plain = markdownIt(preset);
      const ours = markdownIt(preset).use(tautlinePlugin);
      for (const { markdown } of examples) expect(ours.render(markdown)).toBe(plain.render(markdown));
    }
  });

  it.each(['```tautliner\na\n```', '```\ntautline\n```', '    ```tautline', '`tautline 1 + 1`', '```js tautline\n```'])(
    'keeps %j',
    text => {
      expect(render(text)).toBe(markdownIt().render(text));
    },
  );
});

describe('a fence', () => {
  it('becomes a block with the drawing and the answers, well formed', () => {
    const html = render(RAFTER);
    checkTags(html);
    expect(html).toContain('<section class="tautline">');
    expect(html).toContain('role="img" aria-label="Canopy rafter R1 under service with its fields"');
    expect(wordsOf(html)).toContain('2 of 3 requirements met, highest use 0.333, mid. Not met: seat.');
  });

  it.each([
    ['a list', `- first\n\n  ${fenced(CANTILEVER).replaceAll('\n', '\n  ')}`],
    ['a quotation', fenced(CANTILEVER).replace(/^/gm, '> ')],
    ['tildes', `~~~~tautline\n${CANTILEVER}~~~~\n`],
    ['Windows line endings', fenced(CANTILEVER).replaceAll('\n', '\r\n')],
  ])('is found in %s', (_, text) => {
    expect(render(text)).toContain('aria-label="Beam under live with its fields"');
  });

  it('inside another fence is text', () => {
    const text = `\`\`\`\`md\n${fenced(CANTILEVER)}\`\`\`\`\n\n${fenced(CANTILEVER)}`;
    expect(render(text).match(/class="tautline/g)).toHaveLength(1);
  });

  it('that says more of a structure later is shown as written, and the structure after its last fence', () => {
    const [first, last] = [CANTILEVER, 'find tip: deflection at B'];
    const html = render(`${fenced(first)}\nProse.\n\n${fenced(last)}`);
    const [before = '', after = ''] = html.split('<p>Prose.</p>');
    expect(before).toContain('member B1, H: A -- 2 m -- B');
    expect(before).not.toContain('<h2>');
    expect(after).toContain('<h2>Beam</h2>');
    expect(wordsOf(after)).toContain('2.000 mm down');
  });

  it('of values only shows what they come to', () => {
    const html = render(fenced('let w = 0.75 kN/m2 * 3.2 m "drawing 12"'));
    expect(wordsOf(html)).toMatch(/w 2\.400 kN\/m 0\.75 kN\/m2 \* 3\.2 m drawing 12/);
  });

  it('keeps the host’s attributes, and marks its lines for scrolling where the host does', () => {
    const md = markdownIt().use(tautlinePlugin);
    const rule = md.renderer.rules.fence!;
    md.renderer.rules.fence = (tokens, index, options, env, self) => {
      tokens[index]!.attrSet('data-line', String(tokens[index]!.map![0]));
      tokens[index]!.attrJoin('class', 'code-line');
      return rule(tokens, index, options, env, self);
    };
    const html = md.render(`text\n\n${fenced(CANTILEVER)}`);
    expect(html).toContain('<section class="tautline code-line" data-line="2">');
    expect(html).toContain('<span class="code-line" data-line="3">structure Beam</span>');
  });

  it('is worked out when it is rendered, from the text that was parsed', () => {
    const md = markdownIt();
    const seen: { readonly text: string; readonly env: unknown }[] = [];
    tautlinePlugin(md, {
      resultOf: (text, env) => {
        seen.push({ text, env });
        return evaluateNote(text, { path: 'note.md' });
      },
    });
    const text = fenced(CANTILEVER);
    const tokens = md.parse(text, {});
    expect(seen).toEqual([]);
    const env = { currentDocument: 'doc' };
    md.renderer.render(tokens, md.options, env);
    expect(seen).toEqual([{ text, env }]);
  });

  it('that fails shows its words and the page goes on', () => {
    const md = markdownIt();
    tautlinePlugin(md, {
      resultOf: () => {
        throw new Error('a <mistake> of the program');
      },
    });
    const html = md.render(`${fenced('structure <X>')}\nGoes on: \`tautline x\`.`);
    checkTags(html);
    expect(html).toContain('a &lt;mistake&gt; of the program');
    expect(html).toContain('structure &lt;X&gt;');
    expect(html).toContain('Goes on: <code>tautline x</code>.');
  });

  it('of a record or a signature stays a plain block, and what is wrong with it stands below', () => {
    const html = render(`${fenced(CANTILEVER)}\n\`\`\`tautline sign\nprepared <A>\n\`\`\`\n`);
    expect(html).toContain('<pre><code class="language-tautline">prepared &lt;A&gt;\n</code></pre>');
  });
});

describe('a value in the prose', () => {
  it('stands in place of its code span, with all its digits behind it', () => {
    const html = render(RAFTER);
    expect(html).toMatch(
      /The tip moves <output class="tautline-value" title="tip = 1\.648703049\u2009mm up">1\.649\u2009mm up<\/output>/,
    );
    expect(html).toMatch(/title="tip \/ length\(B, C\) = −0\.0009159461386">−0\.0009159<\/output>/);
    expect(html).toContain('<code>code</code> stays.');
  });

  it('is told apart from another with the same words', () => {
    const html = render(
      `${fenced(`${CANTILEVER}let a = 1 m\nlet b = 2 m`)}\n| x |\n| --- |\n| \`tautline a\` |\n\n- \`tautline b\` \`tautline a\``,
    );
    const values = [...html.matchAll(/<output[^>]*>([^<]*)</g)].map(([, text = '']) => text.replace('\u2009', ' '));
    expect(values).toEqual(['1.000 m', '2.000 m', '1.000 m']);
  });

  it('that cannot be established is withheld, with the reason behind it', () => {
    const html = render(`${fenced(CANTILEVER)}\n\`tautline nothing\``);
    expect(html).toMatch(
      /<output class="tautline-value tautline-withheld" title="[^"]*nothing[^"]*">withheld<\/output>/,
    );
  });
});
