// Text from a note on its way into HTML: escaped, with true minus signs, thin spaces before units and points in italic.
import { escapeText } from '../drawing/index.ts';
import type { Structure } from '../model/structure.ts';

const THIN = '\u2009';

export function escapeHtml(text: string): string {
  return escapeText(text);
}

/** Words of the language, as written, with the points that they name in italic. */
export function typeset(text: string, structure: Structure | undefined): string {
  const points = new Set(structure?.points.map(({ name }) => name) ?? []);
  const others = new Set(structure?.members.map(({ name }) => name) ?? []);
  return words(figures(text).replaceAll(' * ', ' × '))
    .map(word => {
      const html = escapeHtml(word);
      // A name of a point and of a member at once is left upright: which of the two is meant is not known here.
      return points.has(word) && !others.has(word) ? `<i class="tl-name-of-point">${html}</i>` : html;
    })
    .join('');
}

/** A figure with its unit, or any other text of the program's own. */
export function plainHtml(text: string): string {
  return escapeHtml(figures(text));
}

/** A true minus before a digit, a thin space between a number and a unit and inside a unit, raised powers. */
export function figures(text: string): string {
  return text
    .replace(/(^|[\s(])-(?=[\d.])/g, '$1−')
    .replace(UNIT_BEHIND_NUMBER, (_, digit: string, unit: string) => `${digit}${THIN}${raised(unit)}`);
}

/** Names stay whole, and everything between them. */
function words(text: string): string[] {
  return text.match(/[\p{L}\p{M}][\p{L}\p{M}\p{N}_]*|[^\p{L}\p{M}]+/gu) ?? [];
}

const UNIT =
  '(?:kN|MN|N|kip|lbf|klf|plf|psf|ksf|pcf|mm|cm|km|m|in|ft|GPa|MPa|kPa|Pa|ksi|psi|rad|mrad|deg|kg|t|K)[234]?' +
  '(?:[ ·/](?:mm|cm|m|in|ft|rad|kN|kip)[234]?)*';
const UNIT_BEHIND_NUMBER = new RegExp(`(\\d) (${UNIT})(?![\\p{L}\\p{N}_])`, 'gu');

/** A unit alone: `kN m²` with its parts apart and its powers raised. */
export function unitHtml(unit: string): string {
  return escapeHtml(raised(unit));
}

function raised(unit: string): string {
  return unit.replaceAll(' ', THIN).replace(/(?<=[a-z])[234]/g, power => ({ 2: '²', 3: '³', 4: '⁴' })[power] ?? power);
}

/** Numbers of one column set so that their decimal points stand under each other. Anything that is no number stands as it is. */
export function decimalColumn(texts: readonly string[]): string[] {
  const split = texts.map(text => /^([−-]?\d+)((?:\.\d+)?)([\s\S]*)$/.exec(text));
  const whole = Math.max(0, ...split.map(parts => ems(parts?.[1] ?? '')));
  const fraction = Math.max(0, ...split.map(parts => ems(parts?.[2] ?? '')));
  return texts.map((text, i) => {
    const parts = split[i];
    if (parts === null || parts === undefined) return plainHtml(text);
    const [, before = '', behind = '', rest = ''] = parts;
    const widths = [whole, fraction].map(width => `style="min-width:${width.toFixed(2)}em"`);
    const number = `<span ${widths[0]}>${before.replace('-', '−')}</span><span ${widths[1]}>${behind}</span>`;
    return `<span class="tl-decimal">${number}</span>${rest === '' ? '' : plainHtml(rest).replace(/^ /, THIN)}`;
  });
}

/** Width of digits, point and minus in a common sans serif, over the size of the type. */
function ems(number: string): number {
  let sum = 0;
  for (const character of number) sum += character === '.' ? 0.278 : /\d/.test(character) ? 0.556 : 0.584;
  return sum;
}

/** `2 sections`, `1 case`. */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}

/** `a, b and c`. */
export function listed(items: readonly string[]): string {
  return items.length < 2 ? (items[0] ?? '') : `${items.slice(0, -1).join(', ')} and ${items.at(-1)}`;
}
