// Small notes for the page tests, and the ways to render them.
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import markdownIt from 'markdown-it';
import { evaluateNote } from '../../src/note/evaluate.ts';
import { printPage, tautlinePlugin } from '../../src/page/index.ts';

export const STYLESHEET = readFileSync(fileURLToPath(new URL('../../media/tautline.css', import.meta.url)), 'utf8');

/** One requirement of each state, and one question without a limit. */
export const RAFTER = `# Boathouse canopy

The rafter overhangs the slip by 1.8 m.

\`\`\`tautline
structure Rafter "Canopy rafter R1"
material S355: E 210 GPa, density 7850 kg/m3
section  RHS: box 100 mm x 200 mm x 6 mm, S355
member R1, RHS: A -- 4.8 m -- B -- 1.8 m -- C
support A: pinned
support B: roller
assume: "Lifted only by wind"
load dead: self-weight
load dead: 1.15 kN/m down on R1 "supplier"
load snow: 2.4 kN/m down on R1 from A to B
load snow: 0.6 kN/m to 3.1 kN/m down on R1 from B to C
load wind: 1.9 kN/m up on R1
load lamp: 0.45 kN down at C
combine service: dead + snow + lamp
combine uplift:  dead + wind
require tip:  deflection at C under service <= span/180
require mid:  sag of R1 between A and B under service <= span/360 "brief, 3.2"
require seat: reaction at A under uplift >= 0 kN
find slope:   rotation at C under service
\`\`\`

The tip moves \`tautline tip\`, which is \`tautline tip / length(B, C)\` of the overhang. \`code\` stays.
`;

/** A cantilever of 2 m with 3 kN at its end: EI = 4000 kN m², so that δ = 3 × 2³ / (3 × 4000) = 2 mm exactly. */
export const CANTILEVER = `structure Beam
section H: EI 4 MN m2
member B1, H: A -- 2 m -- B
support A: fixed
load live: 3 kN down at B
`;

export function fenced(statements: string): string {
  return `\`\`\`tautline\n${statements.trimEnd()}\n\`\`\`\n`;
}

export function render(text: string): string {
  return markdownIt().use(tautlinePlugin).render(text);
}

export function print(text: string): string {
  return printPage(evaluateNote(text, { path: 'note.md' }), { stylesheet: STYLESHEET, version: '1.2.3' });
}

/** The words of a piece of HTML: tags taken out, blanks made plain. */
export function wordsOf(html: string): string {
  return html
    .replace(/<svg[\s\S]*?<\/svg>/g, '')
    .replaceAll('<span class="tl-sub">', ' ')
    .replace(/<\/?(?:i|b|a|sup|code|output|span|small)\b[^>]*>/g, '')
    .replace(/<[^>]+>/g, ' ')
    .replace(/&(amp|lt|gt|quot|#39);/g, entity => ENTITIES[entity] ?? entity)
    .replace(/[\s\u2009]+/g, ' ')
    .trim();
}

const ENTITIES: Readonly<Record<string, string>> = {
  '&amp;': '&',
  '&lt;': '<',
  '&gt;': '>',
  '&quot;': '"',
  '&#39;': "'",
};

/** The part of the page under a heading. */
export function section(html: string, title: string): string {
  const start = html.indexOf(`<h3>${title}`);
  if (start < 0) return '';
  const end = html.indexOf('<h3', start + 1);
  return html.slice(start, end < 0 ? undefined : end);
}

/** The cells of each row of a table's body, in words. */
export function rowsOf(html: string): string[][] {
  const bodies = [...html.matchAll(/<tbody>([\s\S]*?)<\/tbody>/g)].map(([, body = '']) => body).join('');
  return [...bodies.matchAll(/<tr[^>]*>([\s\S]*?)<\/tr>/g)].map(([, row = '']) =>
    [...row.matchAll(/<t[dh][^>]*>([\s\S]*?)<\/t[dh]>/g)].map(([, cell = '']) => wordsOf(cell)),
  );
}
