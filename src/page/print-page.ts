// A note as a page that stands alone: no script, nothing from the network, and running lines at the foot of every sheet.
import markdownIt, { type MarkdownIt } from 'markdown-it';
import { readFrontMatter } from '../note/front-matter.ts';
import type { FrontMatter, NoteResult } from '../note/result.ts';
import { escapeHtml } from './html.ts';
import { tautlinePlugin } from './markdown-it-plugin.ts';

export interface PrintOptions {
  /** The text of media/tautline.css. */
  readonly stylesheet: string;
  /** Of the program. */
  readonly version: string;
  /** KaTeX's stylesheet with its fonts inside; taken in only where the page holds a formula. */
  readonly katexStyles?: () => string;
  /** An image of the note as a data URI; without it, or where it has none, the image is told in words. */
  readonly imageOf?: (source: string) => string | undefined;
}

export function printPage(note: NoteResult, options: PrintOptions): string {
  const body = renderBody(note, options);
  const { frontMatter } = note;
  const katex = body.includes('class="katex') ? (options.katexStyles?.() ?? '') : '';
  const title = frontMatter.title ?? note.path;
  const styles = [options.stylesheet, katex, runningLines(note, options.version)].filter(Boolean).join('\n');
  return (
    '<!doctype html>\n<html lang="en">\n<head>\n<meta charset="utf-8">\n' +
    `<meta http-equiv="Content-Security-Policy" content="default-src 'none'; style-src 'unsafe-inline'; img-src data:; font-src data:">\n` +
    '<meta name="viewport" content="width=device-width, initial-scale=1">\n<meta name="color-scheme" content="light dark">\n' +
    `<title>${escapeHtml(title)}</title>\n<style>\n${safeStyles(styles)}\n</style>\n</head>\n<body class="tautline-page">\n` +
    `<main>\n${sheetHead(frontMatter, body)}${body}${sheetFoot(note, options.version)}</main>\n</body>\n</html>\n`
  );
}

/** The front matter leaves as many empty lines behind, so that line numbers stay true. */
function renderBody(note: NoteResult, { imageOf }: PrintOptions): string {
  const { length } = readFrontMatter(note.text);
  const lines = note.text.slice(0, length).split(/\r\n|\n|\r/).length - 1;
  return renderer(note, imageOf).render('\n'.repeat(lines) + note.text.slice(length));
}

function renderer(note: NoteResult, imageOf: PrintOptions['imageOf']): MarkdownIt {
  const md = markdownIt({ html: true });
  tautlinePlugin(md, { resultOf: () => note });
  // A note's own HTML is not trusted with a page: comments stay hidden, anything else is shown as it is written.
  const shown = (content: string): string => (/^\s*<!--[\s\S]*-->\s*$/.test(content) ? '' : escapeHtml(content));
  md.renderer.rules.html_block = (tokens, index) => shown(tokens[index]?.content ?? '');
  md.renderer.rules.html_inline = (tokens, index) => shown(tokens[index]?.content ?? '');
  md.renderer.rules.image = (tokens, index) => {
    const token = tokens[index];
    const source = String(token?.attrGet('src') ?? '');
    const words = token?.content ?? '';
    const data = source.startsWith('data:image/') ? source : imageOf?.(source);
    return data === undefined
      ? `<span class="tautline-image">[image: ${escapeHtml(words === '' ? source : words)}]</span>`
      : `<img src="${escapeHtml(data)}" alt="${escapeHtml(words)}">`;
  };
  return md;
}

/** The project over the title; the title itself where the note does not begin with one. */
function sheetHead({ title, project }: FrontMatter, body: string): string {
  const over = project === undefined ? '' : `<p class="tautline-project">${escapeHtml(project)}</p>\n`;
  const hasTitle = /^\s*<h1\b/.test(body);
  return over + (hasTitle || title === undefined ? '' : `<h1>${escapeHtml(title)}</h1>\n`);
}

function sheetFoot(note: NoteResult, version: string): string {
  const { number, revision, status, project } = note.frontMatter;
  const own = [
    number === undefined ? '' : `<b>${escapeHtml(number)}</b>`,
    revision === undefined ? '' : `revision ${escapeHtml(revision)}`,
    escapeHtml(status ?? ''),
  ].filter(Boolean);
  return (
    '<footer class="tautline-foot">' +
    `<div>${own.join(', ')}</div><div>${escapeHtml(project ?? '')}</div>` +
    `<div>inputs ${escapeHtml(note.fingerprint)}</div><div>tautline ${escapeHtml(version)}</div></footer>\n`
  );
}

/** Number, revision, status, fingerprint and version at the foot of every printed sheet, and page n of m. */
function runningLines({ frontMatter, fingerprint }: NoteResult, version: string): string {
  const { number, revision, status, title } = frontMatter;
  const first = [
    number,
    revision === undefined ? undefined : `revision ${revision}`,
    status,
    `inputs ${fingerprint}`,
    `tautline ${version}`,
  ]
    .filter(Boolean)
    .join(' · ');
  const lines = `${cssText(first)}${title === undefined ? '' : `\\A ${cssText(title)}`}`;
  const type = 'font:8pt/11pt Arial,"Liberation Sans",sans-serif;color:#444;vertical-align:top;padding-top:3mm';
  return (
    `@page{margin:14mm 15mm 19mm;@bottom-left{content:"${lines}";white-space:pre;${type}}` +
    `@bottom-right{content:"page " counter(page) " of " counter(pages);${type}}}`
  );
}

/** For the inside of a CSS string: all but letters, digits and plain punctuation is escaped by number. */
function cssText(text: string): string {
  return text.replace(/[^\p{L}\p{N} .,:;·()/–-]/gu, character => `\\${(character.codePointAt(0) ?? 32).toString(16)} `);
}

/** No stylesheet closes its own element. */
function safeStyles(styles: string): string {
  return styles.replaceAll('</', '<\\/');
}
